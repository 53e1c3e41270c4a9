package org.shearbook.desk.forecast;

import java.time.Clock;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.NotHoldingDesk;
import org.shearbook.desk.staff.Person;
import org.shearbook.desk.staff.PersonBook;
import org.shearbook.desk.staff.Role;
import org.shearbook.desk.station.Fix;
import org.shearbook.desk.station.StationBook;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.data.domain.Limit;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/**
 * Keeps the shear-layer forecasts and their drafts. What was issued is never changed: an amendment, a correction and
 * a cancellation are further versions. Only the holder of the desk files; any forecaster may draft.
 */
@Service
public class ForecastBook {

    private final ForecastVersionRepository forecasts;
    private final ForecastDraftRepository drafts;
    private final DeskHoldingBook holdings;
    private final PersonBook people;
    private final StationBook stations;
    private final AuditTrail audit;
    private final ApplicationEventPublisher events;
    private final Clock clock;
    private final ForecastRules rules;
    private final ForecastText texts;

    ForecastBook(ForecastVersionRepository forecasts, ForecastDraftRepository drafts, DeskHoldingBook holdings, PersonBook people,
            StationBook stations, AuditTrail audit, ApplicationEventPublisher events, Clock clock, ForecastSettings settings) {
        this.forecasts = forecasts;
        this.drafts = drafts;
        this.holdings = holdings;
        this.people = people;
        this.stations = stations;
        this.audit = audit;
        this.events = events;
        this.clock = clock;
        this.rules = new ForecastRules(settings);
        this.texts = new ForecastText(settings.desk());
    }

    /**
     * Begins a new forecast with what was typed so far; nothing has to be complete or right.
     *
     * @param fields    text by field name, see {@link DraftFields}
     * @param prefilled where the text of a field came from, for fields filled by the desk
     * @throws MayNotDraft     when the actor is neither forecaster nor supervisor
     * @throws ForecastRefused when a field is longer than the desk keeps
     */
    @Transactional
    public ForecastDraft draft(Actor actor, Map<String, String> fields, Map<String, String> prefilled) {
        return keepDraft(actor, new ForecastId(drafts.nextId()), 0, ForecastDraft.Purpose.NEW, null, fields, prefilled, "");
    }

    /** Begins a new forecast whose content is complete. */
    @Transactional
    public ForecastDraft draft(Actor actor, ForecastContent content) {
        return draft(actor, DraftFields.of(content), Map.of());
    }

    /**
     * Saves a draft again, or begins one that amends or corrects an issued forecast.
     *
     * @param seen    the version of the draft the changes were made to; 0 to begin one
     * @param basedOn the issued version an amendment or correction starts from
     * @throws StaleForecast   when somebody saved it since
     * @throws UnknownForecast when there is nothing to amend or correct
     */
    @Transactional
    public ForecastDraft revise(Actor actor, ForecastId id, int seen, ForecastDraft.Purpose purpose, @Nullable Integer basedOn,
            Map<String, String> fields, Map<String, String> prefilled, String reason) {
        return keepDraft(actor, id, seen, purpose, basedOn, fields, prefilled, reason);
    }

    private ForecastDraft keepDraft(Actor actor, ForecastId id, int seen, ForecastDraft.Purpose purpose, @Nullable Integer basedOn,
            Map<String, String> fields, Map<String, String> prefilled, String reason) {
        refuseUnlessMayDraft(actor);
        if (reason.length() > DraftFields.LONGEST_FIELD) {
            throw new ForecastRefused(ForecastRules.reason(reason));
        }
        Map<String, String> kept = DraftFields.kept(fields, clock.instant());
        Map<String, String> untouched = new LinkedHashMap<>(prefilled);
        untouched.keySet().retainAll(kept.keySet());
        Instant recordedAt = audit.recordingMoment();
        ForecastDraft before = drafts.find(id.value(), AsKnownAt.now().moment()).map(ForecastDraftEntity::toDraft).orElse(null);
        boolean open = before != null && before.state() == ForecastDraft.State.OPEN;
        if (open ? before.version() != seen : seen != 0) {
            throw new StaleForecast("The draft", seen, before == null ? 0 : before.version());
        }
        if (purpose == ForecastDraft.Purpose.NEW) {
            if (before != null && !open) {
                throw new UnknownForecast("This draft was filed or discarded. Begin a new one.");
            }
        } else {
            find(id, AsKnownAt.now()).orElseThrow(() -> new UnknownForecast("There is no issued forecast to amend or correct here."));
        }
        ForecastDraft draft = new ForecastDraft(id, before == null ? 1 : before.version() + 1, purpose, basedOn, ForecastDraft.State.OPEN,
                actor.username(), kept, untouched, reason.strip(), recordedAt);
        drafts.save(new ForecastDraftEntity(drafts.nextId(), draft));
        events.publishEvent(new ForecastDrafted(actor, draft));
        return draft;
    }

    /** Puts a draft away for good. */
    @Transactional
    public ForecastDraft discard(Actor actor, ForecastId id, int seen) {
        refuseUnlessMayDraft(actor);
        Instant recordedAt = audit.recordingMoment();
        ForecastDraft discarded = closed(actor, openDraft(id, seen), ForecastDraft.State.DISCARDED, recordedAt);
        events.publishEvent(new ForecastDrafted(actor, discarded));
        return discarded;
    }

    /**
     * What filing this draft now would make: the text exactly as it would be filed, or what keeps it from being filed.
     *
     * @param number   the number the forecast has, or would get if it were issued now
     * @param version  the version filing would make
     * @param text     null while something is refused
     * @param standing the version that stands now; null for a new forecast
     * @param overlaps live forecasts that may say something of the same air
     */
    public record Check(ForecastDraft draft, int number, int version, @Nullable ForecastContent content, @Nullable String text,
            List<Refusal> refusals, @Nullable Forecast standing, List<Forecast> overlaps) {
    }

    /**
     * Checks a draft without filing it.
     */
    @Transactional(readOnly = true)
    public Check check(ForecastDraft draft) {
        Instant now = clock.instant();
        Forecast standing = draft.purpose() == ForecastDraft.Purpose.NEW ? null : find(draft.id(), AsKnownAt.now()).orElse(null);
        DraftFields.Reading reading = DraftFields.read(draft.fields(), now, this::place);
        List<Refusal> refusals = new ArrayList<>(reading.refusals());
        ForecastContent content = reading.content();
        if (content != null) {
            refusals.addAll(refusals(draft.purpose(), content, standing, draft.author(), now));
        }
        if (draft.purpose() != ForecastDraft.Purpose.NEW) {
            refusals.addAll(ForecastRules.reason(draft.reason()));
            refusals.addAll(ended(standing, now));
            if (standing != null && (draft.basedOn() == null || draft.basedOn() != standing.version())) {
                refusals.add(new Refusal("", "FORECAST_CHANGED", "%s has a version %d by now; this draft started from version %d."
                        .formatted(standing.name(), standing.version(), draft.basedOn()), "Compare the two and save the draft again."));
            }
        }
        int number = standing == null ? forecasts.highestNumber() + 1 : standing.number();
        int version = standing == null ? 1 : standing.version() + 1;
        String text = content == null || !refusals.isEmpty() ? null : texts.of(number, version, stateOf(draft.purpose()), content);
        List<Forecast> overlaps = content == null ? List.of() : inForce(now, AsKnownAt.now()).stream()
                .filter(live -> !live.id().equals(draft.id()) && live.content().mayOverlap(content)).toList();
        return new Check(draft, number, version, content, text, refusals, standing, overlaps);
    }

    /**
     * What these fields say, without keeping anything.
     *
     * @throws ForecastRefused when a field can't be read
     */
    @Transactional(readOnly = true)
    public ForecastContent read(Map<String, String> fields) {
        DraftFields.Reading reading = DraftFields.read(DraftFields.kept(fields, clock.instant()), clock.instant(), this::place);
        if (reading.content() == null) {
            throw new ForecastRefused(reading.refusals());
        }
        return reading.content();
    }

    /**
     * Files an open draft: issues it, or the amendment or correction it holds.
     *
     * @param seen          the version of the draft that was checked
     * @param checkedNumber the number on the check page; null where nobody read the text before
     * @throws NotHoldingDesk  when the actor does not hold the desk
     * @throws ForecastRefused when it can't be filed as it stands
     * @throws StaleForecast   when the draft, the forecast it changes or the next number is another by now
     */
    @Transactional
    public Forecast issue(Actor actor, ForecastId id, int seen, @Nullable Integer checkedNumber) {
        Instant recordedAt = audit.recordingMoment();
        ForecastDraft draft = openDraft(id, seen);
        mayFile(actor, draft.purpose() == ForecastDraft.Purpose.NEW ? "issue a forecast" : "amend or correct a forecast");
        DraftFields.Reading reading = DraftFields.read(draft.fields(), clock.instant(), this::place);
        if (reading.content() == null) {
            throw new ForecastRefused(reading.refusals());
        }
        Forecast filed;
        if (draft.purpose() == ForecastDraft.Purpose.NEW) {
            refuse(refusals(draft.purpose(), reading.content(), null, actor.username(), clock.instant()));
            int number = forecasts.highestNumber() + 1;
            if (checkedNumber != null && checkedNumber != number) {
                throw new StaleForecast("The next number SLF %02d was given to another forecast, so the text you read".formatted(checkedNumber), checkedNumber, number);
            }
            filed = keep(actor, null, id, number, Forecast.State.ISSUED, reading.content(), null, recordedAt);
        } else {
            filed = change(actor, id, draft.basedOn() == null ? 0 : draft.basedOn(), draft.purpose(), reading.content(), draft.reason(), recordedAt);
        }
        closed(actor, draft, ForecastDraft.State.FILED, recordedAt);
        return filed;
    }

    /**
     * Files a new version because the weather, or the view of it, changed.
     *
     * @param seen   the issued version the amendment starts from
     * @param reason what changed
     * @throws NotHoldingDesk  when the actor does not hold the desk
     * @throws ForecastRefused when it can't be filed as it stands
     * @throws StaleForecast   when there is a newer version
     */
    @Transactional
    public Forecast amend(Actor actor, ForecastId id, int seen, ForecastContent content, String reason) {
        Instant recordedAt = audit.recordingMoment();
        mayFile(actor, "amend a forecast");
        return change(actor, id, seen, ForecastDraft.Purpose.AMENDMENT, content, reason, recordedAt);
    }

    /** Files a new version because something was typed wrong; its validity stays. Throws as {@link #amend} does. */
    @Transactional
    public Forecast correct(Actor actor, ForecastId id, int seen, ForecastContent content, String reason) {
        Instant recordedAt = audit.recordingMoment();
        mayFile(actor, "correct a forecast");
        return change(actor, id, seen, ForecastDraft.Purpose.CORRECTION, content, reason, recordedAt);
    }

    /** Takes a forecast back before its end. Throws as {@link #amend} does. */
    @Transactional
    public Forecast cancel(Actor actor, ForecastId id, int seen, String reason) {
        Instant recordedAt = audit.recordingMoment();
        mayFile(actor, "cancel a forecast");
        Forecast standing = standing(id, seen);
        refuse(ForecastRules.reason(reason));
        refuse(ended(standing, clock.instant()));
        return keep(actor, standing, id, standing.number(), Forecast.State.CANCELLED, standing.content(), reason.strip(), recordedAt);
    }

    private Forecast change(Actor actor, ForecastId id, int seen, ForecastDraft.Purpose purpose, ForecastContent content, String reason, Instant recordedAt) {
        Forecast standing = standing(id, seen);
        refuse(ForecastRules.reason(reason));
        refuse(ended(standing, clock.instant()));
        refuse(refusals(purpose, content, standing, actor.username(), clock.instant()));
        return keep(actor, standing, id, standing.number(), stateOf(purpose), content, reason.strip(), recordedAt);
    }

    private Forecast keep(Actor actor, @Nullable Forecast standing, ForecastId id, int number, Forecast.State state, ForecastContent content,
            @Nullable String reason, Instant recordedAt) {
        int version = standing == null ? 1 : standing.version() + 1;
        String text = state == Forecast.State.CANCELLED ? texts.cancelling(number, version, content, recordedAt, reason)
                : texts.of(number, version, state, content);
        Forecast filed = new Forecast(id, number, version, state, content, text, actor.username(), reason,
                standing == null ? recordedAt : standing.issuedAt(), recordedAt);
        forecasts.save(new ForecastVersionEntity(drafts.nextId(), filed));
        events.publishEvent(new ForecastFiled(actor, filed, standing));
        return filed;
    }

    /** The newest issued version; empty while there is only a draft. */
    @Transactional(readOnly = true)
    public Optional<Forecast> find(ForecastId id, AsKnownAt asKnownAt) {
        return forecasts.find(id.value(), asKnownAt.moment()).map(ForecastVersionEntity::toForecast);
    }

    /** Every issued version, oldest first. */
    @Transactional(readOnly = true)
    public List<Forecast> versions(ForecastId id, AsKnownAt asKnownAt) {
        return forecasts.versions(id.value(), asKnownAt.moment()).stream().map(ForecastVersionEntity::toForecast).toList();
    }

    /** What the desk answers for: issued, neither cancelled nor ended at that moment, the first to end first. It may be still to begin. */
    @Transactional(readOnly = true)
    public List<Forecast> inForce(Instant at, AsKnownAt asKnownAt) {
        return forecasts.live(at, asKnownAt.moment()).stream().map(ForecastVersionEntity::toForecast).toList();
    }

    /** The newest version of those that ended or were cancelled, the highest number first. */
    @Transactional(readOnly = true)
    public List<Forecast> ended(Instant at, @Nullable Integer belowNumber, int limit, AsKnownAt asKnownAt) {
        return forecasts.ended(at, belowNumber == null ? Integer.MAX_VALUE : belowNumber, asKnownAt.moment(), Limit.of(limit))
                .stream().map(ForecastVersionEntity::toForecast).toList();
    }

    /** All versions whose validity meets the window, for the display that shows the superseded ones too. */
    @Transactional(readOnly = true)
    public List<Forecast> between(Instant from, Instant until, AsKnownAt asKnownAt) {
        return forecasts.between(from, until, asKnownAt.moment()).stream().map(ForecastVersionEntity::toForecast).toList();
    }

    /** The newest version of each forecast whose validity meets the window, in the order of their numbers; {@code after} is the number to go on from. */
    @Transactional(readOnly = true)
    public List<Forecast> page(Instant from, Instant until, int after, int limit, AsKnownAt asKnownAt) {
        return forecasts.page(from, until, after, asKnownAt.moment(), Limit.of(limit)).stream().map(ForecastVersionEntity::toForecast).toList();
    }

    /** The open draft of a new forecast, an amendment or a correction. */
    @Transactional(readOnly = true)
    public Optional<ForecastDraft> openDraft(ForecastId id, AsKnownAt asKnownAt) {
        return drafts.find(id.value(), asKnownAt.moment()).map(ForecastDraftEntity::toDraft).filter(draft -> draft.state() == ForecastDraft.State.OPEN);
    }

    /** All open drafts, the last saved first. */
    @Transactional(readOnly = true)
    public List<ForecastDraft> openDrafts(AsKnownAt asKnownAt) {
        return drafts.open(asKnownAt.moment()).stream().map(ForecastDraftEntity::toDraft).toList();
    }

    private ForecastDraft openDraft(ForecastId id, int seen) {
        ForecastDraft draft = openDraft(id, AsKnownAt.now())
                .orElseThrow(() -> new UnknownForecast("There is no open draft here; it may have been filed or discarded."));
        if (draft.version() != seen) {
            throw new StaleForecast("The draft", seen, draft.version());
        }
        return draft;
    }

    private ForecastDraft closed(Actor actor, ForecastDraft draft, ForecastDraft.State state, Instant recordedAt) {
        ForecastDraft closed = new ForecastDraft(draft.id(), draft.version() + 1, draft.purpose(), draft.basedOn(), state, actor.username(),
                draft.fields(), draft.prefilled(), draft.reason(), recordedAt);
        drafts.save(new ForecastDraftEntity(drafts.nextId(), closed));
        return closed;
    }

    private Forecast standing(ForecastId id, int seen) {
        Forecast standing = find(id, AsKnownAt.now()).orElseThrow(() -> new UnknownForecast("There is no issued forecast here."));
        if (standing.version() != seen) {
            throw new StaleForecast(standing.name(), seen, standing.version());
        }
        return standing;
    }

    private List<Refusal> refusals(ForecastDraft.Purpose purpose, ForecastContent content, @Nullable Forecast standing, String author, Instant now) {
        List<Refusal> refusals = new ArrayList<>(rules.refusals(purpose, content, standing, author, now));
        String looked = content.secondLookBy();
        if (looked != null && people.find(looked, AsKnownAt.now()).filter(ForecastBook::mayLook).isEmpty()) {
            refusals.add(new Refusal(DraftFields.SECOND_LOOK, "SECOND_LOOK_NOT_KNOWN", "\"%s\" is nobody who may take the second look.".formatted(looked),
                    "Choose a forecaster, scientist or supervisor of this office."));
        }
        return refusals;
    }

    /** A station by any of its identifiers or its name; else a fix, if only one has that name. */
    private Optional<DraftFields.Place> place(String typed) {
        Optional<DraftFields.Place> station = stations.find(typed, AsKnownAt.now())
                .or(() -> stations.all(AsKnownAt.now()).stream().filter(known -> known.name().equalsIgnoreCase(typed.strip())).findFirst())
                .map(known -> new DraftFields.Place(known.name(), known.latitude(), known.longitude()));
        if (station.isPresent()) {
            return station;
        }
        List<Fix> fixes = stations.fixes(typed, AsKnownAt.now());
        return fixes.size() == 1 ? Optional.of(new DraftFields.Place(fixes.get(0).identifier(), fixes.get(0).latitude(), fixes.get(0).longitude())) : Optional.empty();
    }

    /** Whether this person may be the second look of somebody else's forecast. */
    public static boolean mayLook(Person person) {
        return person.enabled() && person.roles().stream().anyMatch(Set.of(Role.FORECASTER, Role.SCIENTIST, Role.SUPERVISOR)::contains);
    }

    private static List<Refusal> ended(@Nullable Forecast standing, Instant now) {
        if (standing == null || standing.isLive(now)) {
            return List.of();
        }
        return List.of(new Refusal("", "FORECAST_ENDED", "%s is over; its record stays as it is.".formatted(standing.name()),
                "Issue a new forecast if one is needed."));
    }

    private static void refuse(List<Refusal> refusals) {
        if (!refusals.isEmpty()) {
            throw new ForecastRefused(refusals);
        }
    }

    private void mayFile(Actor actor, String act) {
        if (!holdings.isHeldBy(actor.username())) {
            throw new NotHoldingDesk(act);
        }
    }

    /** Whether this person writes forecasts at all. */
    public static boolean mayDraft(Actor actor) {
        return Arrays.stream(actor.role().split(",")).anyMatch(Set.of(Role.FORECASTER.name(), Role.SUPERVISOR.name())::contains);
    }

    private static void refuseUnlessMayDraft(Actor actor) {
        if (!mayDraft(actor)) {
            throw new MayNotDraft();
        }
    }

    private static Forecast.State stateOf(ForecastDraft.Purpose purpose) {
        return switch (purpose) {
            case NEW -> Forecast.State.ISSUED;
            case AMENDMENT -> Forecast.State.AMENDED;
            case CORRECTION -> Forecast.State.CORRECTED;
        };
    }
}
