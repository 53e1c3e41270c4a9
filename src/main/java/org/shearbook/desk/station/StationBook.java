package org.shearbook.desk.station;

import java.time.Clock;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Knows the launch sites and the fixes, every version of them. */
@Service
public class StationBook {

    private final StationRepository stations;
    private final StationIdentifierRepository identifiers;
    private final FixListRepository lists;
    private final FixRows fixes;
    private final AuditTrail audit;
    private final ApplicationEventPublisher events;
    private final Clock clock;
    private volatile Edition newest = new Edition("", new FixTable(List.of()));

    StationBook(StationRepository stations, StationIdentifierRepository identifiers, FixListRepository lists, FixRows fixes, AuditTrail audit,
            ApplicationEventPublisher events, Clock clock) {
        this.stations = stations;
        this.identifiers = identifiers;
        this.lists = lists;
        this.fixes = fixes;
        this.audit = audit;
        this.events = events;
        this.clock = clock;
    }

    /** The station that has this identifier, whichever of its identifiers it is. */
    @Transactional(readOnly = true)
    public Optional<Station> find(String idOrIdentifier, AsKnownAt asKnownAt) {
        return identifiers.findById(idOrIdentifier.strip().toUpperCase(Locale.ROOT))
                .flatMap(known -> stations.find(known.stationId, asKnownAt.moment())).map(StationEntity::toStation);
    }

    @Transactional(readOnly = true)
    public List<Station> all(AsKnownAt asKnownAt) {
        return stations.findAll(asKnownAt.moment()).stream().map(StationEntity::toStation).toList();
    }

    /**
     * Keeps one station: new, or a new version of the station that has one of these identifiers. Saying again what
     * is known already makes no version.
     *
     * @param names    identifiers; the first is the station's id when it is new
     * @param latitude  [degrees north]
     * @param longitude [degrees east]
     * @param elevation [m]; NaN when unknown
     * @throws ListRefused when the identifiers belong to two stations
     */
    @Transactional
    public Station keep(Actor actor, String name, double latitude, double longitude, double elevation, List<String> names) {
        PlaceRow row = new PlaceRow(1, names.stream().map(identifier -> identifier.strip().toUpperCase(Locale.ROOT)).distinct().toList(), "STATION", name,
                latitude, longitude, elevation, Double.NaN);
        Kept kept = keepRows(actor, List.of(row));
        return kept.stations().isEmpty() ? find(names.get(0), AsKnownAt.now()).orElseThrow() : kept.stations().get(0);
    }

    /**
     * Keeps a list of stations, all or none. Stations that the list does not name stay as they are.
     *
     * @throws ListRefused naming the lines that can't be right
     */
    @Transactional
    public StationListResult keepStations(Actor actor, byte[] csv) {
        PlaceList list = PlaceList.read(csv);
        Kept kept = keepRows(actor, list.rows());
        return new StationListResult(kept.stations().size(), kept.unchanged(), list.leftOut());
    }

    /**
     * Loads a list of fixes, all or none. It takes the place of the earlier list of that name.
     *
     * @throws ListRefused naming the lines that can't be right
     */
    @Transactional
    public FixListResult keepFixes(Actor actor, String listName, byte[] csv) {
        String name = listName.strip().toLowerCase(Locale.ROOT);
        if (!name.matches("[a-z0-9][a-z0-9 -]{0,59}")) {
            throw new ListRefused(List.of(new ListRefused.LineRefusal(0, "list", "LIST_NAME",
                    "The name of a list is 1 to 60 letters, figures, blanks and hyphens, for example navaids.")));
        }
        PlaceList list = PlaceList.read(csv);
        List<Fix> places = list.rows().stream().flatMap(row -> row.identifiers().stream().map(identifier -> new Fix(identifier, row.kind(), row.name(),
                row.latitude(), row.longitude(), row.elevation(), row.magneticVariationEast()))).toList();
        String digest = ListDigest.of(places.stream().map(Fix::toString));
        Instant receivedAt = clock.instant().truncatedTo(ChronoUnit.MICROS);
        Instant recordedAt = audit.recordingMoment();
        FixList before = lists.find(name, AsKnownAt.now().moment()).map(FixListEntity::toList).orElse(null);
        FixListEntity entity = lists.saveAndFlush(new FixListEntity(name, before == null ? 1 : before.version() + 1, places.size(), receivedAt, recordedAt));
        fixes.add(entity.rowId, places);
        FixList kept = entity.toList();
        events.publishEvent(new FixListKept(actor, kept, digest, before == null ? null : before.fixCount() + " fixes, version " + before.version()));
        return new FixListResult(kept, list.leftOut());
    }

    /** The lists of fixes in force. */
    @Transactional(readOnly = true)
    public List<FixList> fixLists(AsKnownAt asKnownAt) {
        return lists.findAll(asKnownAt.moment()).stream().map(FixListEntity::toList).toList();
    }

    /** Every fix of this name. */
    @Transactional(readOnly = true)
    public List<Fix> fixes(String identifier, AsKnownAt asKnownAt) {
        return fixes.named(identifier.strip().toUpperCase(Locale.ROOT), asKnownAt.moment());
    }

    /** Fixes in the order of their identifiers, {@code after} of them left out. */
    @Transactional(readOnly = true)
    public List<Fix> fixes(int after, int limit, AsKnownAt asKnownAt) {
        return fixes.page(asKnownAt.moment(), after, limit);
    }

    /** All names known now, the stations' among them. It is read anew only when something was kept since. */
    @Transactional(readOnly = true)
    public FixTable fixTable() {
        String edition = fixes.edition();
        Edition known = newest;
        if (known.name().equals(edition)) {
            return known.table();
        }
        List<Fix> places = new ArrayList<>(fixes.all(AsKnownAt.now().moment()));
        for (Station station : all(AsKnownAt.now())) {
            for (String identifier : station.identifiers()) {
                places.add(new Fix(identifier, "STATION", station.name(), station.latitude(), station.longitude(), station.elevation(), Double.NaN));
            }
        }
        FixTable table = new FixTable(places);
        newest = new Edition(edition, table);
        return table;
    }

    private Kept keepRows(Actor actor, List<PlaceRow> rows) {
        Instant receivedAt = clock.instant().truncatedTo(ChronoUnit.MICROS);
        Instant recordedAt = audit.recordingMoment();
        Map<String, String> owners = identifiers.findAll().stream().collect(Collectors.toMap(known -> known.identifier, known -> known.stationId, (a, b) -> a, HashMap::new));
        Map<String, Station> known = all(AsKnownAt.now()).stream().collect(Collectors.toMap(Station::id, station -> station));
        Map<String, Station> changed = new LinkedHashMap<>();
        List<ListRefused.LineRefusal> refusals = new ArrayList<>();
        int unchanged = 0;
        for (PlaceRow row : rows) {
            Set<String> owning = row.identifiers().stream().map(owners::get).filter(java.util.Objects::nonNull).collect(Collectors.toCollection(TreeSet::new));
            if (owning.size() > 1) {
                refusals.add(new ListRefused.LineRefusal(row.line(), "identifier", "IDENTIFIERS_OF_TWO_STATIONS",
                        "The identifiers belong to different stations, %s. Give each station its own row.".formatted(String.join(" and ", owning))));
                continue;
            }
            String id = owning.isEmpty() ? row.identifiers().get(0) : owning.iterator().next();
            Station before = known.get(id);
            Set<String> names = new LinkedHashSet<>();
            names.add(id);
            if (before != null) {
                names.addAll(before.identifiers());
            }
            names.addAll(row.identifiers());
            Station after = new Station(id, row.name(), row.latitude(), row.longitude(), row.elevation(), names, before == null ? 1 : before.version() + 1, recordedAt);
            if (changed.containsKey(id)) {
                refusals.add(new ListRefused.LineRefusal(row.line(), "identifier", "STATION_TWICE",
                        "Station %s is in the list twice. Keep one of the rows.".formatted(id)));
            } else if (before != null && before.isSamePlaceAs(after)) {
                unchanged++;
            } else {
                changed.put(id, after);
                names.forEach(identifier -> owners.put(identifier, id));
            }
        }
        if (!refusals.isEmpty()) {
            throw new ListRefused(refusals.stream().sorted(Comparator.comparingInt(ListRefused.LineRefusal::line)).limit(20).toList());
        }
        if (!changed.isEmpty()) {
            write(actor, known, changed, unchanged, receivedAt);
        }
        return new Kept(List.copyOf(changed.values()), unchanged);
    }

    private void write(Actor actor, Map<String, Station> known, Map<String, Station> changed, int unchanged, Instant receivedAt) {
        for (Station station : changed.values()) {
            stations.save(new StationEntity(station, receivedAt));
            Station before = known.get(station.id());
            station.identifiers().stream().filter(identifier -> before == null || !before.identifiers().contains(identifier))
                    .forEach(identifier -> identifiers.save(new StationIdentifierEntity(identifier, station.id(), station.recordedAt())));
        }
        Station only = changed.size() == 1 ? known.get(changed.keySet().iterator().next()) : null;
        events.publishEvent(new StationsKept(actor, List.copyOf(changed.values()), unchanged, only == null ? null : StationsKept.describe(only)));
    }

    private record Kept(List<Station> stations, int unchanged) {
    }

    private record Edition(String name, FixTable table) {
    }

    /**
     * @param kept      stations new or changed
     * @param unchanged rows that said what was known
     * @param leftOut   rows without an identifier or a fixed position
     */
    public record StationListResult(int kept, int unchanged, int leftOut) {
    }

    /** @param leftOut rows without an identifier */
    public record FixListResult(FixList list, int leftOut) {
    }
}
