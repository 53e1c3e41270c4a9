package org.shearbook.desk.staff;

import java.time.Instant;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Keeps who holds the desk: exactly one person at a time, or nobody. */
@Service
public class DeskHoldingBook {

    private final DeskHoldingRepository holdings;
    private final PersonBook people;
    private final AuditTrail audit;
    private final ApplicationEventPublisher events;

    DeskHoldingBook(DeskHoldingRepository holdings, PersonBook people, AuditTrail audit, ApplicationEventPublisher events) {
        this.holdings = holdings;
        this.people = people;
        this.audit = audit;
        this.events = events;
    }

    /** The holding in force; empty while the desk was never taken. */
    @Transactional(readOnly = true)
    public Optional<DeskHolding> find(AsKnownAt asKnownAt) {
        return holdings.find(asKnownAt.moment()).map(DeskHoldingEntity::toHolding);
    }

    /** Whether this person holds the desk now. */
    @Transactional(readOnly = true)
    public boolean isHeldBy(String username) {
        return find(AsKnownAt.now()).filter(holding -> username.equals(holding.holder())).isPresent();
    }

    /**
     * Takes the vacant desk. Two who try at once are put in order by the lock of the audit chain; the second is told
     * who was first.
     *
     * @throws DeskNotVacant  when somebody else holds it
     * @throws MayNotHoldDesk when the person is neither forecaster nor supervisor
     */
    @Transactional
    public DeskHolding take(Actor actor) {
        boolean allowed = people.find(actor.username(), AsKnownAt.now())
                .filter(person -> person.roles().contains(Role.FORECASTER) || person.roles().contains(Role.SUPERVISOR)).isPresent();
        if (!allowed) {
            throw new MayNotHoldDesk(actor.username());
        }
        Instant recordedAt = audit.recordingMoment();
        DeskHolding before = find(AsKnownAt.now()).orElse(null);
        if (before != null && before.holder() != null) {
            if (before.holder().equals(actor.username())) {
                return before;
            }
            throw new DeskNotVacant(before.holder());
        }
        return keep(actor, before, actor.username(), recordedAt);
    }

    /**
     * Leaves the desk vacant.
     *
     * @throws NotHoldingDesk when the person does not hold it
     */
    @Transactional
    public DeskHolding leave(Actor actor) {
        Instant recordedAt = audit.recordingMoment();
        DeskHolding before = find(AsKnownAt.now()).orElse(null);
        if (before == null || !actor.username().equals(before.holder())) {
            throw new NotHoldingDesk("leave the desk");
        }
        return keep(actor, before, null, recordedAt);
    }

    private DeskHolding keep(Actor actor, @Nullable DeskHolding before, @Nullable String holder, Instant recordedAt) {
        DeskHolding after = holdings.save(new DeskHoldingEntity(before == null ? 1 : before.version() + 1, holder, null, recordedAt)).toHolding();
        events.publishEvent(new DeskHeld(actor, after, before == null ? null : before.holder()));
        return after;
    }
}
