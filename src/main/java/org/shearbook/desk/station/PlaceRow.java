package org.shearbook.desk.station;

import java.util.List;

/**
 * One row of a list of places.
 *
 * @param line        of the list, from 1
 * @param identifiers every identifier the row gives, without repetition; the first is the row's own
 * @param elevation   [m]; NaN when not given
 * @param magneticVariationEast [degrees, east positive]; NaN when not given
 */
record PlaceRow(
        int line, List<String> identifiers, String kind, String name, double latitude, double longitude, double elevation,
        double magneticVariationEast) {

    PlaceRow {
        identifiers = List.copyOf(identifiers);
    }
}
