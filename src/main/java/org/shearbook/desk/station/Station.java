package org.shearbook.desk.station;

import java.time.Instant;
import java.util.Collections;
import java.util.LinkedHashSet;
import java.util.Set;

/**
 * One version of a launch site.
 *
 * @param id          the identifier it was first kept under
 * @param latitude    [degrees north]
 * @param longitude   [degrees east]
 * @param elevation   of the launch site above mean sea level [m]; NaN when unknown
 * @param identifiers every name it has in messages: block and station number, WIGOS identifier, indicator; the
 *                    id is one of them and stands first
 */
public record Station(
        String id, String name, double latitude, double longitude, double elevation, Set<String> identifiers,
        int version, Instant recordedAt) {

    public Station {
        identifiers = Collections.unmodifiableSet(new LinkedHashSet<>(identifiers));
    }

    boolean isSamePlaceAs(Station other) {
        return name.equals(other.name) && latitude == other.latitude && longitude == other.longitude && Double.compare(elevation, other.elevation) == 0
                && identifiers.equals(other.identifiers);
    }
}
