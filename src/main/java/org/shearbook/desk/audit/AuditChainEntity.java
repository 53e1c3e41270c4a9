package org.shearbook.desk.audit;

import jakarta.persistence.Entity;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.time.Instant;

/** The end of one chain; its row is the lock under which the chain is extended. */
@Entity
@Table(name = "audit_chain")
class AuditChainEntity {

    static final String ACTS = "acts";
    static final String ACCESS = "access";

    @Id
    String chainName;
    long lastSequence;
    String lastHash;
    Instant lastRecordedAt;

    protected AuditChainEntity() {
    }
}
