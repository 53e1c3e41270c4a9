package org.shearbook.desk.intake;

import java.util.List;
import java.util.Optional;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** What needs a person, and what was taken in. */
@Service
public class IntakeQueue {

    private static final int LONGEST_REASON = 400;
    private static final int RECORDS_SHOWN = 200;

    private final IntakeRows rows;
    private final AuditTrail audit;
    private final ApplicationEventPublisher events;

    IntakeQueue(IntakeRows rows, AuditTrail audit, ApplicationEventPublisher events) {
        this.rows = rows;
        this.audit = audit;
        this.events = events;
    }

    /** Open items, the newest first. */
    @Transactional(readOnly = true)
    public List<QueueItem> open(AsKnownAt asKnownAt, int limit) {
        return rows.open(asKnownAt.moment(), limit);
    }

    @Transactional(readOnly = true)
    public int openCount(AsKnownAt asKnownAt) {
        return rows.openCount(asKnownAt.moment());
    }

    /** One item; where the whole arrival is meant, with the beginning of that as its text. */
    @Transactional(readOnly = true)
    public Optional<QueueItem> find(long id, AsKnownAt asKnownAt) {
        return rows.item(id, asKnownAt.moment()).map(item -> item.raw() != null || item.whatToDo() == null ? item
                : new QueueItem(item.id(), item.version(), item.batchId(), item.arrival(), item.arrivalName(), item.line(), item.column(), item.code(), item.state(),
                        item.settledBy(), item.settledReason(), item.whatToDo(), rows.raw(item.batchId(), item.arrival()).map(ReceivedBytes::readable).map(IntakeRows::shown).orElse(null),
                        item.receivedAt(), item.recordedAt()));
    }

    /**
     * Says what becomes of an open item.
     *
     * @param state  {@link ItemState#CORRECTED} or {@link ItemState#SET_ASIDE}
     * @param reason why, or what was done
     * @throws SettlementRefused when the item is not open, or the reason is missing or too long
     */
    @Transactional
    public void settle(Actor actor, long id, ItemState state, String reason) {
        String given = reason.strip();
        if (given.isEmpty() || given.length() > LONGEST_REASON) {
            throw new SettlementRefused("reason", "Say why, in 1 to %d characters.".formatted(LONGEST_REASON));
        }
        var recordedAt = audit.recordingMoment();
        QueueItem before = rows.item(id, AsKnownAt.now().moment()).orElseThrow(() -> new SettlementRefused("", "There is no item %d in the queue.".formatted(id)));
        if (before.state() != ItemState.OPEN || state == ItemState.OPEN) {
            throw new SettlementRefused("", "Item %d was settled already by %s.".formatted(id, before.settledBy()));
        }
        rows.addVersion(before, state, actor.username(), given, recordedAt);
        events.publishEvent(new ItemSettled(actor, id, before.version() + 1, state, given));
    }

    /** Batches, the newest first. */
    @Transactional(readOnly = true)
    public List<Batch> batches(AsKnownAt asKnownAt, long before, int limit) {
        return rows.newest(asKnownAt.moment(), before, limit);
    }

    @Transactional(readOnly = true)
    public Optional<Batch.Whole> batch(long id) {
        return rows.batch(id).map(batch -> new Batch.Whole(batch, rows.parts(id), rows.records(id, RECORDS_SHOWN),
                rows.itemsOf(id, AsKnownAt.now().moment(), RECORDS_SHOWN)));
    }
}
