package org.shearbook.desk.audit;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

@Entity
@Table(name = "audit_entry")
class AuditEntryEntity {

    @Id
    @Column(name = "entry_sequence")
    long sequence;
    Instant recordedAt;
    String actor;
    String actorRole;
    boolean holdsDesk;
    String workstation;
    String address;
    String sessionReference;
    String act;
    String subjectKind;
    String subjectId;
    int subjectVersion;
    @Nullable String beforeText;
    @Nullable String afterText;
    @Nullable String reason;
    String applicationVersion;
    String previousHash;
    String entryHash;

    protected AuditEntryEntity() {
    }

    AuditEntryEntity(AuditEntry entry) {
        sequence = entry.sequence();
        recordedAt = entry.recordedAt();
        actor = entry.actor().username();
        actorRole = entry.actor().role();
        holdsDesk = entry.actor().holdsDesk();
        workstation = entry.actor().workstation();
        address = entry.actor().address();
        sessionReference = entry.actor().session();
        act = entry.act();
        subjectKind = entry.subject().kind();
        subjectId = entry.subject().id();
        subjectVersion = entry.subject().version();
        beforeText = entry.before();
        afterText = entry.after();
        reason = entry.reason();
        applicationVersion = entry.applicationVersion();
        previousHash = entry.previousHash();
        entryHash = entry.hash();
    }

    AuditEntry toEntry() {
        return new AuditEntry(sequence, recordedAt,
                new Actor(actor, actorRole, holdsDesk, workstation, address, sessionReference),
                act, new Audited.Subject(subjectKind, subjectId, subjectVersion),
                beforeText, afterText, reason, applicationVersion, previousHash, entryHash);
    }
}
