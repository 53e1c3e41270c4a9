package org.shearbook.desk.station;

/**
 * A named place. Identifiers are not unique.
 *
 * @param kind                  {@code STATION}, {@code VORTAC}, {@code NDB}, {@code SMALL_AIRPORT} …, as in its list
 * @param latitude              [degrees north]
 * @param longitude             [degrees east]
 * @param elevation             [m]; NaN when unknown
 * @param magneticVariationEast [degrees, east positive]; NaN when unknown
 */
public record Fix(
        String identifier, String kind, String name, double latitude, double longitude, double elevation, double magneticVariationEast) {
}
