package org.shearbook.desk.audit;

import jakarta.persistence.EntityManager;
import java.time.Clock;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;

/**
 * The chain of sign-ins and reads. It is apart from the chain of acts because it is disposed of after a year,
 * month by month, which must not touch the record of what was done. Each month begins anew, so that an old one
 * can go and the next still stands.
 */
@Service
public class AccessTrail {

    private final AuditChainRepository chains;
    private final EntityManager entityManager;
    private final Clock clock;

    AccessTrail(AuditChainRepository chains, EntityManager entityManager, Clock clock) {
        this.chains = chains;
        this.entityManager = entityManager;
        this.clock = clock;
    }

    /**
     * Keeps one access in a transaction of its own: a refused sign-in has nothing else to commit.
     *
     * @param act     what was done, in the past tense: {@code signed in}
     * @param subject what was looked at, or an empty string
     */
    @Transactional(propagation = Propagation.REQUIRES_NEW)
    public void keep(Actor actor, String act, String subject) {
        AuditChainEntity chain = chains.lock(AuditChainEntity.ACCESS);
        Instant now = clock.instant().truncatedTo(ChronoUnit.MICROS);
        Instant next = chain.lastRecordedAt.plus(1, ChronoUnit.MICROS);
        Instant recordedAt = now.isAfter(next) ? now : next;
        boolean newMonth = !recordedAt.toString().substring(0, 7).equals(chain.lastRecordedAt.toString().substring(0, 7));
        AccessEntryEntity entry = new AccessEntryEntity(chain.lastSequence + 1, recordedAt, actor, act, subject,
                newMonth ? ChainHash.START : chain.lastHash);
        entityManager.persist(entry);
        chain.lastSequence = entry.sequence;
        chain.lastHash = entry.entryHash;
        chain.lastRecordedAt = recordedAt;
    }
}
