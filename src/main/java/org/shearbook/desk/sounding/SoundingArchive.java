package org.shearbook.desk.sounding;

import jakarta.persistence.EntityManager;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.station.StationBook;
import org.shearbook.met.decode.DecodedMessage;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.MessageDecoders;
import org.shearbook.met.decode.Rejection;
import org.shearbook.met.decode.Remark;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.quality.SoundingQuality;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.data.domain.Limit;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;

/** Keeps soundings, every version of them, with the messages they came in. */
@Service
public class SoundingArchive {

    /** How far back a sounding may lie to tell whether the next one has its wind in a wrong unit. */
    private static final Duration COMPARABLE = Duration.ofHours(36);
    private static final Instant FIRST_OF_ALL = Instant.parse("0001-01-01T00:00:00Z");
    private static final int LONGEST_REASON = 400;
    private static final List<String> MAY_WITHDRAW = List.of("FORECASTER", "SUPERVISOR");

    private final SoundingRepository soundings;
    private final SoundingLevelsRepository levels;
    private final SoundingMessageRepository messages;
    private final StationBook stations;
    private final AuditTrail audit;
    private final EntityManager entityManager;
    private final ApplicationEventPublisher events;
    private final MessageDecoders decoders = MessageDecoders.all();

    SoundingArchive(SoundingRepository soundings, SoundingLevelsRepository levels, SoundingMessageRepository messages, StationBook stations, AuditTrail audit,
            EntityManager entityManager, ApplicationEventPublisher events) {
        this.soundings = soundings;
        this.levels = levels;
        this.messages = messages;
        this.stations = stations;
        this.audit = audit;
        this.entityManager = entityManager;
        this.events = events;
    }

    /** Keeps one message; see {@link #keepAll}. */
    @Transactional(propagation = Propagation.MANDATORY)
    public Kept keep(Actor actor, DecodedSounding message, String format, Instant receivedAt) {
        return keepAll(actor, List.of(new Arrived(message, format)), receivedAt).get(0);
    }

    /**
     * Keeps messages inside the act that brought them in, all or none. Messages of one ascent become one version of
     * its sounding; one that says nothing new makes none. Joining and checking are done before the end of the audit
     * chain is locked, and again only if somebody else kept a sounding meanwhile.
     *
     * @return in the order of {@code arrived}
     * @throws SoundingWithoutTime when a message says neither when it was released nor which hour it stands for
     */
    @Transactional(propagation = Propagation.MANDATORY)
    public List<Kept> keepAll(Actor actor, List<Arrived> arrived, Instant receivedAt) {
        if (arrived.isEmpty()) {
            return List.of();
        }
        Instant before = soundings.lastRecordedAt();
        List<Ascent> ascents = plan(arrived);
        Instant recordedAt = audit.recordingMoment();
        if (!Objects.equals(before, soundings.lastRecordedAt())) {
            ascents = plan(arrived);
        }
        Kept[] kept = new Kept[arrived.size()];
        List<SoundingKept> news = new ArrayList<>();
        List<Object> written = new ArrayList<>();
        for (Ascent ascent : ascents) {
            write(actor, ascent, receivedAt, recordedAt, kept, news, written);
        }
        entityManager.flush();
        // Thousands of levels need not be compared again at each flush that the listeners cause.
        written.forEach(entityManager::detach);
        news.forEach(events::publishEvent);
        return Arrays.asList(kept);
    }

    private void write(Actor actor, Ascent ascent, Instant receivedAt, Instant recordedAt, Kept[] kept, List<SoundingKept> news, List<Object> written) {
        SoundingEntity newest = ascent.newest;
        List<Remark> remarks = new ArrayList<>(ascent.site.remarks());
        long id = newest == null ? soundings.drawId() : newest.soundingId;
        int version = newest == null ? 1 : newest.version;
        if (ascent.makesNewVersion()) {
            version = newest == null ? 1 : newest.version + 1;
            SoundingEntity entity = soundings.save(new SoundingEntity(id, version, ascent.site, ascent.format, ascent.content(), ascent.digest(), ascent.checked(),
                    receivedAt, recordedAt));
            written.add(entity);
            written.add(levels.save(new SoundingLevelsEntity(entity.rowId, ascent.checked(), ascent.remarks())));
            news.add(new SoundingKept(actor, new SoundingId(id), version));
            ascent.checked().soundingFlags().forEach(flag -> remarks.add(new Remark(1, 0, flag.flag().name(), flag.text())));
            ascent.checked().refusal().ifPresent(refusal -> remarks.add(new Remark(1, 0, refusal.code(), refusal.text())));
        }
        if (ascent.isMuchThinner()) {
            remarks.add(new Remark(1, 0, "FEWER_LEVELS", "Version %d of sounding %d has %d levels, this has %d. It is kept beside that version and not used; was it cut off on its way?"
                    .formatted(version, id, newest.levelCount, ascent.content().levels().size())));
        }
        if (ascent.isCoarserThanTheFile()) {
            remarks.add(new Remark(1, 0, "COARSER_THAN_THE_FILE", "Version %d of sounding %d came as a whole file with %d levels. These parts are kept beside it."
                    .formatted(version, id, newest.levelCount)));
        }
        int number = ascent.messageCount() - ascent.added.size();
        for (int k = 0; k < ascent.added.size(); k++) {
            DecodedSounding message = ascent.added.get(k);
            written.add(messages.save(new SoundingMessageEntity(id, version, ++number, message, ContentDigest.ofLevels(message), receivedAt, recordedAt)));
            List<Remark> all = new ArrayList<>(message.remarks());
            all.addAll(remarks);
            kept[ascent.arrivals.get(k)] = new Kept(new SoundingId(id), version, false, all);
        }
        for (int duplicate : ascent.duplicates) {
            kept[duplicate] = new Kept(new SoundingId(id), version, true, List.of());
        }
    }

    private List<Ascent> plan(List<Arrived> arrived) {
        Map<String, Optional<Station>> known = new HashMap<>();
        Map<String, List<Ascent>> byStationAndFormat = new HashMap<>();
        List<Ascent> ascents = new ArrayList<>();
        for (int k = 0; k < arrived.size(); k++) {
            DecodedSounding message = arrived.get(k).message();
            Station station = known.computeIfAbsent(message.stationId(), id -> stations.find(id, AsKnownAt.now())).orElse(null);
            Site site = Site.of(message, station);
            boolean coded = !message.parts().isEmpty();
            List<Ascent> candidates = byStationAndFormat.computeIfAbsent(site.stationId() + "\n" + form(coded, arrived.get(k).format()), name -> new ArrayList<>());
            Ascent ascent = candidates.stream().filter(one -> one.takes(message)).findFirst().orElse(null);
            if (ascent == null) {
                SoundingEntity newest = stored(site, arrived.get(k).format(), coded, message);
                ascent = new Ascent(site, arrived.get(k).format(), coded, newest, newest == null ? List.of() : messages.ofSounding(newest.soundingId));
                candidates.add(ascent);
                ascents.add(ascent);
            }
            ascent.add(k, message);
        }
        check(ascents);
        return ascents;
    }

    private @Nullable SoundingEntity stored(Site site, String format, boolean coded, DecodedSounding message) {
        Instant moment = Ascent.momentOf(message);
        List<SoundingEntity> near = soundings.near(site.stationId(), moment.minus(Ascent.HALF_WINDOW.multipliedBy(2)), moment.plus(Ascent.HALF_WINDOW.multipliedBy(2)));
        SoundingEntity sameForm = nearest(moment, near.stream()
                .filter(one -> form(!one.parts.isEmpty(), one.sourceFormat).equals(form(coded, format)))
                .filter(one -> Ascent.belongs(message, coded, one.nominalAt, one.launchedAt, SoundingEntity.partSet(one.parts))));
        if (sameForm != null) {
            return sameForm;
        }
        // The same ascent in the other form: a whole file after its coded parts, or parts after the file.
        return nearest(moment, near.stream()
                .filter(one -> one.parts.isEmpty() == coded && (coded || one.levelCount < message.levels().size()))
                .filter(one -> Ascent.belongs(message, false, one.nominalAt, one.launchedAt, Set.of())));
    }

    private static @Nullable SoundingEntity nearest(Instant moment, Stream<SoundingEntity> stored) {
        return stored.min(Comparator.comparing(one -> Duration.between(one.observedAt, moment).abs())).orElse(null);
    }

    private static String form(boolean coded, String format) {
        return coded ? "parts" : format;
    }

    /** Earlier ascents first, since each is compared with the one before it at its station. */
    private void check(List<Ascent> ascents) {
        Map<String, TreeMap<Instant, VerticalProfile>> checked = new HashMap<>();
        List<Ascent> changed = ascents.stream().filter(Ascent::makesNewVersion).sorted(Comparator.comparing(Ascent::observedAt)).toList();
        for (Ascent ascent : changed) {
            TreeMap<Instant, VerticalProfile> ofStation = checked.computeIfAbsent(ascent.site.stationId(), id -> new TreeMap<>());
            ascent.check(previous(ascent, ofStation));
            ascent.checked().profile().ifPresent(profile -> ofStation.put(ascent.observedAt(), profile));
        }
    }

    private @Nullable VerticalProfile previous(Ascent ascent, TreeMap<Instant, VerticalProfile> inThisBatch) {
        Instant from = ascent.observedAt().minus(COMPARABLE);
        Map.Entry<Instant, VerticalProfile> near = inThisBatch.lowerEntry(ascent.observedAt());
        SoundingEntity stored = soundings.near(ascent.site.stationId(), from, ascent.observedAt()).stream()
                .filter(one -> !one.withdrawn && one.notUsable == null && (ascent.newest == null || one.soundingId != ascent.newest.soundingId))
                .reduce((earlier, later) -> later).orElse(null);
        if (near != null && !near.getKey().isBefore(from) && (stored == null || near.getKey().isAfter(stored.observedAt))) {
            return near.getValue();
        }
        return stored == null ? null : levels.findById(stored.rowId).map(SoundingLevelsEntity::profile).orElse(null);
    }

    /**
     * Takes a sounding out of use, in a new version; what it said stays to be read.
     *
     * @throws UnknownSounding     when there is none of this number
     * @throws WithdrawalRefused   when the actor may not, or gives no reason
     */
    @Transactional
    public SoundingHeader withdraw(Actor actor, SoundingId id, String reason) {
        if (Arrays.stream(actor.role().split(",")).noneMatch(MAY_WITHDRAW::contains)) {
            throw new WithdrawalRefused("Withdrawing a sounding is for a forecaster or a supervisor, signed in by name.");
        }
        String given = reason.strip();
        if (given.isEmpty() || given.length() > LONGEST_REASON) {
            throw new WithdrawalRefused("Say why the sounding is not to be used, in 1 to %d characters.".formatted(LONGEST_REASON));
        }
        Instant recordedAt = audit.recordingMoment();
        SoundingEntity before = soundings.find(id.value(), AsKnownAt.now().moment()).orElseThrow(() -> new UnknownSounding(id));
        if (before.withdrawn) {
            return before.toHeader();
        }
        SoundingEntity after = soundings.save(new SoundingEntity(before, given, recordedAt));
        levels.save(new SoundingLevelsEntity(after.rowId, levels.findById(before.rowId).orElseThrow()));
        events.publishEvent(new SoundingWithdrawn(actor, id, after.version, given));
        return after.toHeader();
    }

    @Transactional(readOnly = true)
    public Optional<Sounding> find(SoundingId id, AsKnownAt asKnownAt) {
        return soundings.find(id.value(), asKnownAt.moment()).map(this::withLevels);
    }

    @Transactional(readOnly = true)
    public Optional<SoundingHeader> header(SoundingId id, AsKnownAt asKnownAt) {
        return soundings.find(id.value(), asKnownAt.moment()).map(entity -> {
            entityManager.detach(entity);
            return entity.toHeader();
        });
    }

    /** Every version known at that moment, oldest first. */
    @Transactional(readOnly = true)
    public List<SoundingHeader> versions(SoundingId id, AsKnownAt asKnownAt) {
        return soundings.versions(id.value(), asKnownAt.moment()).stream().map(SoundingEntity::toHeader).toList();
    }

    /**
     * Soundings in use, released from {@code from} on and before {@code until}, in that order.
     *
     * @param stationId id of a station, or null for all
     */
    @Transactional(readOnly = true)
    public List<SoundingHeader> between(@Nullable String stationId, Instant from, Instant until, AsKnownAt asKnownAt) {
        return soundings.between(stationId == null ? "" : stationId, from, until, asKnownAt.moment()).stream().map(SoundingEntity::toHeader).toList();
    }

    /** As {@link #between}, with levels and profiles. */
    @Transactional(readOnly = true)
    public List<Sounding> wholeBetween(@Nullable String stationId, Instant from, Instant until, AsKnownAt asKnownAt) {
        List<SoundingEntity> found = soundings.between(stationId == null ? "" : stationId, from, until, asKnownAt.moment());
        Map<Long, SoundingLevelsEntity> ofRow = levels.findByRowIdIn(found.stream().map(one -> one.rowId).toList()).stream()
                .collect(Collectors.toMap(one -> one.rowId, one -> one));
        return found.stream().map(one -> ofRow.get(one.rowId).toSounding(one.toHeader())).toList();
    }

    /** The newest usable sounding of a station. */
    @Transactional(readOnly = true)
    public Optional<Sounding> latest(String stationId, AsKnownAt asKnownAt) {
        return soundings.newest(stationId, FIRST_OF_ALL, AsKnownAt.now().moment(), AsKnownAt.now().moment(), Long.MAX_VALUE, asKnownAt.moment(), Limit.of(50)).stream()
                .filter(one -> !one.withdrawn && one.notUsable == null).findFirst().map(this::withLevels);
    }

    /**
     * Soundings released in a window, the newest first, withdrawn ones too.
     *
     * @param stationId id of a station, or null for all
     * @param after     the last sounding of the part already read; null from the newest on
     * @throws UnknownSounding when there is no sounding {@code after}
     */
    @Transactional(readOnly = true)
    public List<SoundingHeader> newest(@Nullable String stationId, Instant from, Instant until, @Nullable SoundingId after, AsKnownAt asKnownAt, int limit) {
        SoundingEntity last = after == null ? null : soundings.find(after.value(), asKnownAt.moment()).orElseThrow(() -> new UnknownSounding(after));
        return soundings.newest(stationId == null ? "" : stationId, from, until, last == null ? AsKnownAt.now().moment() : last.observedAt,
                last == null ? Long.MAX_VALUE : last.soundingId, asKnownAt.moment(), Limit.of(limit)).stream().map(SoundingEntity::toHeader).toList();
    }

    /**
     * The messages that make up a version, as received, one after the other.
     *
     * @throws UnknownSounding when there is no such version
     */
    @Transactional(readOnly = true)
    public String raw(SoundingId id, int version) {
        List<SoundingMessageEntity> until = messages.ofSounding(id.value()).stream().filter(message -> message.version <= version).toList();
        if (until.isEmpty()) {
            throw new UnknownSounding(id);
        }
        List<SoundingMessageEntity> files = until.stream().filter(message -> message.parts.isEmpty()).toList();
        if (files.isEmpty()) {
            return until.stream().map(SoundingMessageEntity::rawText).collect(Collectors.joining("\n"));
        }
        // A file kept beside a version came later than the one the version was made from.
        int made = files.stream().mapToInt(message -> message.version).max().orElseThrow();
        Instant madeAt = files.stream().filter(message -> message.version == made).map(message -> message.recordedAt).min(Comparator.naturalOrder()).orElseThrow();
        return files.stream().filter(message -> message.version == made && message.recordedAt.equals(madeAt)).reduce((earlier, later) -> later).orElseThrow().rawText();
    }

    /**
     * Reads soundings without keeping anything: decoded, parts joined, checked. Their number is 0.
     *
     * @param bytes      in any format this desk reads
     * @param receivedAt resolves days without month and year
     */
    @Transactional(readOnly = true)
    public Reading read(byte[] bytes, Instant receivedAt) {
        Decoding decoding = decoders.decode(bytes, new DecodingContext(receivedAt, FixLookup.NONE));
        Map<String, List<Ascent>> ascents = new HashMap<>();
        List<Ascent> inOrder = new ArrayList<>();
        List<Rejection> rejected = new ArrayList<>(decoding.rejected());
        for (DecodedMessage message : decoding.messages()) {
            if (!(message instanceof DecodedSounding sounding)) {
                continue;
            }
            Site site = Site.of(sounding, stations.find(sounding.stationId(), AsKnownAt.now()).orElse(null));
            boolean coded = !sounding.parts().isEmpty();
            boolean timed = sounding.launchedAt() != null || sounding.nominalAt() != null;
            List<Ascent> ofStation = ascents.computeIfAbsent(site.stationId(), id -> new ArrayList<>());
            Ascent ascent = coded && timed ? ofStation.stream().filter(one -> one.takes(sounding)).findFirst().orElse(null) : null;
            if (ascent == null) {
                ascent = new Ascent(site, decoding.format(), coded, null, List.of());
                inOrder.add(ascent);
                if (coded && timed) {
                    ofStation.add(ascent);
                }
            }
            ascent.add(0, timed ? sounding : at(sounding, receivedAt));
        }
        return new Reading(inOrder.stream().map(ascent -> notKept(ascent, receivedAt)).toList(), rejected);
    }

    /** One message with the flags of its levels, nothing kept. */
    @Transactional(readOnly = true)
    public List<LevelView> levels(DecodedSounding message) {
        Site site = Site.of(message, stations.find(message.stationId(), AsKnownAt.now()).orElse(null));
        return SoundingQuality.check(message.levels(), site.elevation(), null).levels().stream().map(LevelView::of).toList();
    }

    private static DecodedSounding at(DecodedSounding untimed, Instant receivedAt) {
        return new DecodedSounding(untimed.stationId(), untimed.latitude(), untimed.longitude(), untimed.elevation(), null, receivedAt, untimed.parts(),
                untimed.correction(), untimed.sondeType(), untimed.levels(), untimed.raw(), untimed.line(), untimed.remarks());
    }

    private static Sounding notKept(Ascent ascent, Instant receivedAt) {
        ascent.check(null);
        SoundingHeader header = new SoundingEntity(0, 0, ascent.site, ascent.format, ascent.content(), ascent.digest(), ascent.checked(), receivedAt, receivedAt).toHeader();
        return new Sounding(header, ascent.checked().levels(), ascent.checked().soundingFlags(), ascent.checked().cleanProfile(), ascent.remarks());
    }

    private Sounding withLevels(SoundingEntity entity) {
        SoundingLevelsEntity ofEntity = levels.findById(entity.rowId).orElseThrow(() -> new IllegalStateException("Version %d of sounding %d has no levels"
                .formatted(entity.version, entity.soundingId)));
        // What a listener reads inside the act that keeps thousands must not stay in the session.
        entityManager.detach(ofEntity);
        entityManager.detach(entity);
        return ofEntity.toSounding(entity.toHeader());
    }

    /** Soundings that were read, and what could not be. */
    public record Reading(List<Sounding> soundings, List<Rejection> rejected) {
    }
}
