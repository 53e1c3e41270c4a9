package org.shearbook.desk.audit;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.time.Instant;

@Entity
@Table(name = "access_entry")
class AccessEntryEntity {

    @Id
    @Column(name = "entry_sequence")
    long sequence;
    String chainMonth;
    Instant recordedAt;
    String actor;
    String actorRole;
    String address;
    String sessionReference;
    String act;
    String subject;
    String previousHash;
    String entryHash;

    protected AccessEntryEntity() {
    }

    AccessEntryEntity(long sequence, Instant recordedAt, Actor actor, String act, String subject, String previousHash) {
        this.sequence = sequence;
        this.chainMonth = recordedAt.toString().substring(0, 7);
        this.recordedAt = recordedAt;
        this.actor = actor.username();
        this.actorRole = actor.role();
        this.address = actor.address();
        this.sessionReference = actor.session();
        this.act = act;
        this.subject = subject;
        this.previousHash = previousHash;
        this.entryHash = computedHash();
    }

    String computedHash() {
        return new ChainHash(previousHash)
                .field("sequence", sequence).field("month", chainMonth).field("recordedAt", recordedAt)
                .field("actor", actor).field("role", actorRole).field("address", address).field("session", sessionReference)
                .field("act", act).field("subject", subject)
                .hex();
    }
}
