package org.shearbook.desk.airreport.web;

import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.station.StationBook;
import org.shearbook.met.profile.Units;

/**
 * The wish to see only the reports near a station.
 *
 * @param distanceNm along the great circle [NM]
 */
record NearStation(Station station, double distanceNm) {

    static final double USUAL_NM = 120;
    private static final double FARTHEST_NM = 2000;

    /** A filter that can't be used, with the field it stands in. */
    static final class Refused extends RuntimeException {

        private final String field;

        Refused(String field, String said) {
            super(said);
            this.field = field;
        }

        String field() {
            return field;
        }
    }

    /** @return null when no station is asked for */
    static @Nullable NearStation read(@Nullable String station, @Nullable String distance, StationBook stations, AsKnownAt asKnownAt) {
        if (station == null || station.isBlank()) {
            return null;
        }
        Station found = stations.find(station, asKnownAt).orElseThrow(() -> new Refused("station",
                "There is no station %s. The page Stations and Fixes lists those there are.".formatted(shortened(station))));
        return new NearStation(found, nauticalMiles(distance));
    }

    private static double nauticalMiles(@Nullable String distance) {
        if (distance == null || distance.isBlank()) {
            return USUAL_NM;
        }
        try {
            double nauticalMiles = Double.parseDouble(distance.strip());
            if (nauticalMiles > 0 && nauticalMiles <= FARTHEST_NM) {
                return nauticalMiles;
            }
        } catch (NumberFormatException noNumber) {
            // Said below: a word is refused like a number that is out of range.
        }
        throw new Refused("distanceNm", "The distance is a number of nautical miles above 0 and up to %.0f, not %s."
                .formatted(FARTHEST_NM, shortened(distance)));
    }

    double distance() {
        return distanceNm * Units.NAUTICAL_MILE;
    }

    private static String shortened(String text) {
        String written = text.strip().toUpperCase(Locale.ROOT);
        return written.length() > 20 ? written.substring(0, 20) + "…" : written;
    }
}
