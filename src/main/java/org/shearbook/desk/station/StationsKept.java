package org.shearbook.desk.station;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/**
 * Stations were kept, one by itself or a list of them in one act.
 *
 * @param stations  the versions the act made
 * @param unchanged how many rows of the list said what was known already
 * @param before    the version before, where one station was kept by itself
 */
public record StationsKept(Actor actor, List<Station> stations, int unchanged, @Nullable String before) implements Audited {

    public StationsKept {
        stations = List.copyOf(stations);
    }

    @Override
    public String act() {
        return stations.size() == 1 ? "station kept" : "stations kept";
    }

    @Override
    public Subject subject() {
        return stations.size() == 1 ? new Subject("station", stations.get(0).id(), stations.get(0).version()) : new Subject("station", "list", 0);
    }

    @Override
    public String after() {
        return stations.size() == 1 ? describe(stations.get(0))
                : "%d stations kept, %d unchanged; digest %s".formatted(stations.size(), unchanged,
                        ListDigest.of(stations.stream().map(StationsKept::describe)));
    }

    @Override
    public @Nullable String reason() {
        return null;
    }

    static String describe(Station station) {
        return "%s v%d %s; %s N, %s E, %s m; %s".formatted(station.id(), station.version(), station.name(), station.latitude(), station.longitude(),
                station.elevation(), String.join(" ", station.identifiers()));
    }
}
