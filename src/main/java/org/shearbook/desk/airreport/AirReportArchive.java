package org.shearbook.desk.airreport;

import jakarta.persistence.EntityManager;
import java.security.SecureRandom;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.profile.GreatCircle;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.data.domain.Limit;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;

/** Keeps air-reports, every version of them, and apart from them what names an aircraft. */
@Service
public class AirReportArchive {

    /** Rows written together before the session lets go of them. */
    private static final int BATCH = 400;

    private static final int SALT_BYTES = 16;
    private static final int LONGEST_REASON = 400;
    private static final Set<String> MAY_ATTRIBUTE = Set.of("FORECASTER", "SCIENTIST", "SUPERVISOR");

    private final AirReportRepository reports;
    private final AirReportIdentityRepository identities;
    private final EntityManager entityManager;
    private final AuditTrail audit;
    private final ApplicationEventPublisher events;
    private final AirReportSettings settings;
    private final SecureRandom random = new SecureRandom();

    AirReportArchive(AirReportRepository reports, AirReportIdentityRepository identities, EntityManager entityManager, AuditTrail audit,
            ApplicationEventPublisher events, AirReportSettings settings) {
        this.reports = reports;
        this.identities = identities;
        this.entityManager = entityManager;
        this.audit = audit;
        this.events = events;
        this.settings = settings;
    }

    /**
     * Keeps one report as a first version. Whether it was kept before is known by the door the bytes came through.
     *
     * @throws AirReportWithoutTime when the report does not say when it was observed
     */
    @Transactional(propagation = Propagation.MANDATORY)
    public Kept keep(Actor actor, DecodedAirReport decoded, Instant receivedAt) {
        return keepAll(actor, List.of(decoded), receivedAt).get(0);
    }

    /**
     * Keeps many reports, all or none, inside the act that brought them in.
     *
     * @return in the order of {@code decoded}
     * @throws AirReportWithoutTime when a report does not say when it was observed; nothing is kept then
     */
    @Transactional(propagation = Propagation.MANDATORY)
    public List<Kept> keepAll(Actor actor, List<DecodedAirReport> decoded, Instant receivedAt) {
        if (decoded.isEmpty()) {
            return List.of();
        }
        List<byte[]> salts = new ArrayList<>(decoded.size());
        List<AirReportEntity> rows = new ArrayList<>(decoded.size());
        for (DecodedAirReport report : decoded) {
            byte[] salt = new byte[SALT_BYTES];
            random.nextBytes(salt);
            salts.add(salt);
            rows.add(row(report, salt, receivedAt));
        }
        List<Long> ids = reports.draw(decoded.size());
        Instant recordedAt = audit.recordingMoment();
        List<Kept> kept = new ArrayList<>(decoded.size());
        List<Object> written = new ArrayList<>(2 * BATCH);
        for (int k = 0; k < rows.size(); k++) {
            AirReportEntity row = rows.get(k);
            row.reportId = ids.get(k);
            row.recordedAt = recordedAt;
            entityManager.persist(row);
            AirReportIdentityEntity identity = new AirReportIdentityEntity(row, salts.get(k), decoded.get(k).aircraft(), decoded.get(k).raw());
            entityManager.persist(identity);
            kept.add(new Kept(new AirReportId(row.reportId), row.version));
            written.add(row);
            written.add(identity);
            if (written.size() >= 2 * BATCH || k == rows.size() - 1) {
                entityManager.flush();
                // One by one: the session also holds rows of others, the end of the audit chain among them.
                written.forEach(entityManager::detach);
                written.clear();
            }
        }
        events.publishEvent(new AirReportsKept(actor, kept));
        return kept;
    }

    private AirReportEntity row(DecodedAirReport report, byte[] salt, Instant receivedAt) {
        if (report.observedAt() == null) {
            throw new AirReportWithoutTime(report.line());
        }
        WorstIntensity worst = WorstIntensity.of(report.turbulence(), report.edrPeak(), settings.edrClassesAt(report.observedAt()));
        return new AirReportEntity(report, worst, AirReportIdentityEntity.digest(salt, report.aircraft(), report.raw()), receivedAt);
    }

    /**
     * Says what caused the turbulence of a report, in a new version. It is a person's choice, never the desk's own
     * and never a key's; a cause that takes the report out of scoring needs a reason.
     *
     * @throws UnknownAirReport   when there is no such report
     * @throws AttributionRefused when the actor may not, or the reason is missing or too long
     */
    @Transactional
    public AirReport attribute(Actor actor, AirReportId id, Attribution attribution, @Nullable String reason) {
        if (Arrays.stream(actor.role().split(",")).noneMatch(MAY_ATTRIBUTE::contains)) {
            throw new AttributionRefused("", "Attributing a report is for a forecaster, a scientist or a supervisor, signed in by name.");
        }
        String given = reason == null || reason.isBlank() ? null : reason.strip();
        if (given == null && !attribution.isScored()) {
            throw new AttributionRefused("reason", "Say why: a report with this cause is left out of scoring.");
        }
        if (given != null && given.length() > LONGEST_REASON) {
            throw new AttributionRefused("reason", "The reason has %d characters; shorten it to %d.".formatted(given.length(), LONGEST_REASON));
        }
        Instant recordedAt = audit.recordingMoment();
        AirReportEntity earlier = reports.find(id.value(), AsKnownAt.now().moment()).orElseThrow(() -> new UnknownAirReport(id));
        AirReport attributed = reports.save(new AirReportEntity(earlier, attribution, given, recordedAt)).toReport();
        events.publishEvent(new AirReportAttributed(actor, attributed, earlier.attribution));
        return attributed;
    }

    @Transactional(readOnly = true)
    public Optional<AirReport> find(AirReportId id, AsKnownAt asKnownAt) {
        return reports.find(id.value(), asKnownAt.moment()).map(AirReportEntity::toReport);
    }

    /** Every version known at that moment, oldest first. */
    @Transactional(readOnly = true)
    public List<AirReport> versions(AirReportId id, AsKnownAt asKnownAt) {
        return reports.versions(id.value(), asKnownAt.moment()).stream().map(AirReportEntity::toReport).toList();
    }

    /** Reports observed from {@code from} on and before {@code until}, in the order of their observation. */
    @Transactional(readOnly = true)
    public List<AirReport> between(Instant from, Instant until, AsKnownAt asKnownAt) {
        return reports.between(from, until, asKnownAt.moment()).stream().map(AirReportEntity::toReport).toList();
    }

    /**
     * Reports observed from {@code from} on and before {@code until} whose place lies within a distance of a position,
     * in the order of their observation.
     *
     * @param latitude  [degrees north]
     * @param longitude [degrees east]
     * @param distance  along the great circle [m]
     */
    @Transactional(readOnly = true)
    public List<AirReport> near(Instant from, Instant until, double latitude, double longitude, double distance, AsKnownAt asKnownAt) {
        double up = Math.toDegrees(distance / GreatCircle.EARTH_RADIUS);
        double across = Math.abs(latitude) + up >= 89 ? 180 : Math.toDegrees(Math.asin(Math.sin(Math.toRadians(up)) / Math.cos(Math.toRadians(latitude))));
        double west = longitude - across;
        double east = longitude + across;
        // a box over the date line is two boxes; twice the same where it is not
        double otherWest = west < -180 ? west + 360 : east > 180 ? -180 : west;
        double otherEast = west < -180 ? 180 : east > 180 ? east - 360 : east;
        return reports.near(from, until, latitude - up, latitude + up, west, east, otherWest, otherEast, asKnownAt.moment()).stream()
                .filter(report -> GreatCircle.distance(latitude, longitude, report.latitudeDeg, report.longitudeDeg) <= distance)
                .map(AirReportEntity::toReport).toList();
    }

    /**
     * Reports observed in a window, the newest first.
     *
     * @param after the last report of the part already read, which need not be of the window; null from the newest on
     */
    @Transactional(readOnly = true)
    public List<AirReport> newest(Instant from, Instant until, @Nullable AirReportId after, AsKnownAt asKnownAt, int limit) {
        AirReportEntity last = after == null ? null
                : reports.find(after.value(), asKnownAt.moment()).orElseThrow(() -> new UnknownAirReport(after));
        return reports.newest(from, until, last == null ? AsKnownAt.now().moment() : last.observedAt, last == null ? Long.MAX_VALUE : last.reportId,
                asKnownAt.moment(), Limit.of(limit)).stream().map(AirReportEntity::toReport).toList();
    }

    /**
     * As {@link #newest}, of the reports whose place lies within a distance of a position; one without a place never does.
     *
     * @param latitude  [degrees north]
     * @param longitude [degrees east]
     * @param distance  along the great circle [m]
     */
    @Transactional(readOnly = true)
    public List<AirReport> newestNear(double latitude, double longitude, double distance, Instant from, Instant until, @Nullable AirReportId after,
            AsKnownAt asKnownAt, int limit) {
        AirReport last = after == null ? null : find(after, asKnownAt).orElseThrow(() -> new UnknownAirReport(after));
        Comparator<AirReport> newestFirst = Comparator.comparing(AirReport::observedAt).thenComparing(report -> report.id().value()).reversed();
        return near(from, until, latitude, longitude, distance, asKnownAt).stream().sorted(newestFirst)
                .filter(report -> last == null || newestFirst.compare(report, last) > 0).limit(limit).toList();
    }

    /**
     * The text as received, with the aircraft's identification masked.
     *
     * @return empty once the text was disposed of
     */
    @Transactional(readOnly = true)
    public Optional<String> rawWithoutIdentity(AirReportId id) {
        return identities.findByReportIdAndVersion(id.value(), 1)
                .map(identity -> new AircraftMask(identity.aircraft).over(identity.rawText));
    }
}
