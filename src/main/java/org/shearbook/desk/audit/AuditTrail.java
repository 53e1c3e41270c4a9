package org.shearbook.desk.audit;

import jakarta.persistence.EntityManager;
import java.time.Clock;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.Iterator;
import java.util.List;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.context.event.EventListener;
import org.springframework.data.domain.Limit;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;
import org.springframework.transaction.support.TransactionSynchronization;
import org.springframework.transaction.support.TransactionSynchronizationManager;

/**
 * The chain of acts. An act is kept in three steps, all in one transaction: the room asks for the
 * {@link #recordingMoment()}, writes its version with it, and publishes its {@link Audited} event, which is
 * chained here.
 *
 * <p>The moment is given while the end of the chain is locked, and is later than any given before, whatever
 * the clock does: so the order of {@code recorded_at} is the order of the chain, and what was known at a past
 * minute can be told for ever. The lock is held until the transaction ends; work that takes long belongs
 * before it.
 */
@Service
public class AuditTrail {

    private final AuditChainRepository chains;
    private final AuditEntryRepository entries;
    private final EntityManager entityManager;
    private final Clock clock;
    private final String applicationVersion;

    AuditTrail(AuditChainRepository chains, AuditEntryRepository entries, EntityManager entityManager, Clock clock,
            @Value("${spring.application.version}") String applicationVersion) {
        this.chains = chains;
        this.entries = entries;
        this.entityManager = entityManager;
        this.clock = clock;
        this.applicationVersion = applicationVersion;
    }

    /**
     * The moment at which everything in the running transaction is recorded: the later of the clock and the last
     * moment given plus 1 µs. The first call of a transaction locks the end of the chain.
     */
    @Transactional(propagation = Propagation.MANDATORY)
    public Instant recordingMoment() {
        return openAct().recordedAt;
    }

    @EventListener
    @Transactional(propagation = Propagation.MANDATORY)
    void keep(Audited act) {
        OpenAct open = openAct();
        AuditEntry entry = AuditEntry.following(open.chain.lastSequence + 1, open.chain.lastHash, open.recordedAt, act, applicationVersion);
        entityManager.persist(new AuditEntryEntity(entry));
        open.chain.lastSequence = entry.sequence();
        open.chain.lastHash = entry.hash();
    }

    /** The newest entries first; {@code before} is the sequence to go on from, or null for the newest of all. */
    @Transactional(readOnly = true)
    public List<AuditEntry> newest(AsKnownAt asKnownAt, @Nullable Long before, int limit) {
        return newest(Wanted.EVERYTHING, asKnownAt, before, limit);
    }

    /** The newest of the entries asked for first; {@code before} is the sequence to go on from, or null for the newest of all. */
    @Transactional(readOnly = true)
    public List<AuditEntry> newest(Wanted wanted, AsKnownAt asKnownAt, @Nullable Long before, int limit) {
        return entries.newest(asKnownAt.moment(), before == null ? Long.MAX_VALUE : before, wanted.from(), wanted.until(), wanted.actor(), wanted.kind(),
                wanted.id(), Limit.of(limit)).stream().map(AuditEntryEntity::toEntry).toList();
    }

    /**
     * Which entries are asked for.
     *
     * @param actor who acted; empty for everybody
     * @param kind  noun of the subject; empty for all
     * @param id    identifier of the subject; empty for all
     */
    public record Wanted(String actor, String kind, String id, Instant from, Instant until) {

        public static final Wanted EVERYTHING = new Wanted("", "", "", Instant.EPOCH, AsKnownAt.now().moment());
    }

    /** The nouns that stand in the chain. */
    @Transactional(readOnly = true)
    public List<String> kinds() {
        return entries.kinds();
    }

    /** The end of the chain, as it is printed under signed papers. */
    @Transactional(readOnly = true)
    public Head head() {
        AuditChainEntity end = chains.findById(AuditChainEntity.ACTS).orElseThrow();
        return new Head(end.lastSequence, end.lastHash);
    }

    /** @param entries how many acts are in the chain */
    public record Head(long entries, String hash) {
    }

    /** Everything that was done to one thing, oldest first. */
    @Transactional(readOnly = true)
    public List<AuditEntry> ofSubject(String kind, String id, AsKnownAt asKnownAt) {
        return entries.ofSubject(kind, id, asKnownAt.moment()).stream().map(AuditEntryEntity::toEntry).toList();
    }

    /** Walks the whole chain and names the first entry that does not fit. */
    @Transactional(readOnly = true)
    public Integrity integrity() {
        try (Stream<AuditEntryEntity> all = entries.streamAll()) {
            Integrity walked = walk(all.map(AuditEntryEntity::toEntry).iterator());
            if (!walked.intact()) {
                return walked;
            }
            AuditChainEntity end = chains.findById(AuditChainEntity.ACTS).orElseThrow();
            return end.lastHash.equals(walked.headHash()) ? walked
                    : new Integrity(walked.entries(), walked.headHash(), walked.entries() + 1,
                            "The chain ends before entry %d, which was once written.".formatted(end.lastSequence));
        }
    }

    /** The same walk over entries from anywhere, for example over a copy. */
    static Integrity walk(Iterator<AuditEntry> all) {
        long expected = 1;
        String previous = ChainHash.START;
        while (all.hasNext()) {
            AuditEntry entry = all.next();
            if (entry.sequence() != expected) {
                return new Integrity(expected - 1, previous, expected, "Entry %d is missing or out of order.".formatted(expected));
            }
            if (!entry.previousHash().equals(previous)) {
                return new Integrity(expected - 1, previous, expected, "Entry %d does not follow the entry before it.".formatted(expected));
            }
            if (!entry.computedHash().equals(entry.hash())) {
                return new Integrity(expected - 1, previous, expected, "Entry %d was changed.".formatted(expected));
            }
            previous = entry.hash();
            expected++;
        }
        return new Integrity(expected - 1, previous, null, null);
    }

    private OpenAct openAct() {
        OpenAct open = (OpenAct) TransactionSynchronizationManager.getResource(this);
        if (open == null) {
            AuditChainEntity chain = chains.lock(AuditChainEntity.ACTS);
            // The row may be cached from before the lock: what counts is what the lock shows.
            entityManager.refresh(chain);
            Instant now = clock.instant().truncatedTo(ChronoUnit.MICROS);
            Instant next = chain.lastRecordedAt.plus(1, ChronoUnit.MICROS);
            chain.lastRecordedAt = now.isAfter(next) ? now : next;
            open = new OpenAct(chain, chain.lastRecordedAt);
            TransactionSynchronizationManager.bindResource(this, open);
            TransactionSynchronizationManager.registerSynchronization(new TransactionSynchronization() {
                @Override
                public void afterCompletion(int status) {
                    TransactionSynchronizationManager.unbindResourceIfPossible(AuditTrail.this);
                }
            });
        }
        return open;
    }

    private record OpenAct(AuditChainEntity chain, Instant recordedAt) {
    }

    /**
     * What a walk over the chain found.
     *
     * @param entries       how many entries were in order
     * @param headHash      hash of the last entry in order
     * @param firstBroken   sequence of the first entry that is not; null when the chain is whole
     * @param whatIsBroken  a sentence about it; null when the chain is whole
     */
    public record Integrity(long entries, String headHash, @Nullable Long firstBroken, @Nullable String whatIsBroken) {

        public boolean intact() {
            return firstBroken == null;
        }
    }
}
