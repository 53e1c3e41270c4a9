package org.shearbook.met.decode;

import java.util.List;

/** Where identifiers of stations, aerodromes, navigation aids and waypoints lie. Identifiers are not unique. */
@FunctionalInterface
public interface FixLookup {

    /** Nothing is known. */
    FixLookup NONE = identifier -> List.of();

    /**
     * @param identifier in capitals, as in the message
     * @return every place of that name, in no particular order; empty when unknown
     */
    List<Fix> find(String identifier);

    /**
     * A named place.
     *
     * @param identifier             as printed in messages
     * @param kind                   what it is, for example {@code STATION}, {@code AERODROME}, {@code VORTAC}
     * @param latitude               [degrees north]
     * @param longitude              [degrees east]
     * @param magneticVariationEast  [degrees, east positive]; {@code NaN} when unknown
     */
    record Fix(String identifier, String kind, double latitude, double longitude, double magneticVariationEast) {
    }
}
