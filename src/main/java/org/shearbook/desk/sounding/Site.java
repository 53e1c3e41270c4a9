package org.shearbook.desk.sounding;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.station.Station;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Remark;
import org.shearbook.met.profile.Units;

/**
 * From where a sounding was launched: what the message says comes first, because stations move and ships more so; the
 * station table fills in what it leaves open.
 *
 * @param latitude  [degrees north]; NaN when nobody says
 * @param longitude [degrees east]; NaN likewise
 * @param elevation [m]; NaN likewise
 */
record Site(String stationId, String name, double latitude, double longitude, double elevation, List<Remark> remarks) {

    private static final int LONGEST_ID = 60;
    /** Archives keep one position per station, and stations were moved by some kilometres; more than this is an error. */
    private static final double FAR = 50_000;
    private static final double METRES_PER_DEGREE = 60 * Units.NAUTICAL_MILE;

    static Site of(DecodedSounding message, @Nullable Station station) {
        List<Remark> remarks = new ArrayList<>();
        if (station == null) {
            String id = message.stationId().strip().toUpperCase(Locale.ROOT);
            String shortId = id.isEmpty() ? "UNKNOWN" : id.substring(0, Math.min(LONGEST_ID, id.length()));
            remarks.add(new Remark(message.line(), 0, "STATION_UNKNOWN", "Station '" + shortId + "' is not in the station table; the sounding is kept under that identifier "
                    + (Double.isNaN(message.latitude()) ? "and without a position. " : "with the position of the message. ") + "An administrator can load it on the page Stations and Fixes."));
            return new Site(shortId, shortId, message.latitude(), message.longitude(), message.elevation(), remarks);
        }
        boolean positioned = !Double.isNaN(message.latitude()) && !Double.isNaN(message.longitude());
        if (positioned && distance(message, station) > FAR) {
            remarks.add(new Remark(message.line(), 0, "POSITION_DIFFERS", "The message says %.2f N %.2f E, the station table %.2f N %.2f E: more than 50 km apart. The message's position is used; check the station's identifier."
                    .formatted(message.latitude(), message.longitude(), station.latitude(), station.longitude())));
        }
        return new Site(station.id(), station.name(), positioned ? message.latitude() : station.latitude(), positioned ? message.longitude() : station.longitude(),
                Double.isNaN(message.elevation()) ? station.elevation() : message.elevation(), remarks);
    }

    private static double distance(DecodedSounding message, Station station) {
        double east = Math.IEEEremainder(message.longitude() - station.longitude(), 360) * Math.cos(Math.toRadians(station.latitude()));
        return Math.hypot(message.latitude() - station.latitude(), east) * METRES_PER_DEGREE;
    }
}
