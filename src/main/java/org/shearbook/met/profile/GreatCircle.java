package org.shearbook.met.profile;

/**
 * Distances and positions on a sphere of radius {@value #EARTH_RADIUS} m, the mean radius of the Earth. Against the
 * ellipsoid a distance is wrong by up to 0.6 %, far less than the rounding of any reported position.
 */
public final class GreatCircle {

    /** Mean radius of the Earth [m]. */
    public static final double EARTH_RADIUS = 6_371_000.0;

    private GreatCircle() {
    }

    /**
     * A place on the sphere.
     *
     * @param latitude  [degrees north]
     * @param longitude [degrees east], in [-180, 180)
     */
    public record Point(double latitude, double longitude) {
    }

    /**
     * The place reached from a start along a great circle.
     *
     * @param latitude  of the start [degrees north]
     * @param longitude of the start [degrees east]
     * @param bearing   at the start, clockwise from true north [degrees]
     * @param distance  along the circle [m]
     * @return the end of the way
     */
    public static Point destination(double latitude, double longitude, double bearing, double distance) {
        double phi = Math.toRadians(latitude);
        double theta = Math.toRadians(bearing);
        double delta = distance / EARTH_RADIUS;
        double sinEnd = Math.sin(phi) * Math.cos(delta) + Math.cos(phi) * Math.sin(delta) * Math.cos(theta);
        double end = Math.asin(Math.max(-1.0, Math.min(1.0, sinEnd)));
        double turn = Math.atan2(
                Math.sin(theta) * Math.sin(delta) * Math.cos(phi), Math.cos(delta) - Math.sin(phi) * sinEnd);
        return new Point(Math.toDegrees(end), wrap(longitude + Math.toDegrees(turn)));
    }

    /**
     * Length of the shorter great-circle arc between two places, by the haversine formula, which stays exact for
     * places close together.
     *
     * @return [m], from 0 to half the circumference; {@code NaN} if any coordinate is
     */
    public static double distance(double latitude, double longitude, double otherLatitude, double otherLongitude) {
        double phi = Math.toRadians(latitude);
        double otherPhi = Math.toRadians(otherLatitude);
        double north = Math.sin((otherPhi - phi) / 2.0);
        double east = Math.sin(Math.toRadians(otherLongitude - longitude) / 2.0);
        double haversine = north * north + Math.cos(phi) * Math.cos(otherPhi) * east * east;
        return 2.0 * EARTH_RADIUS * Math.asin(Math.min(1.0, Math.sqrt(haversine)));
    }

    /**
     * Bearing of the great circle at its start.
     *
     * @return clockwise from true north [degrees], in [0, 360)
     */
    public static double bearing(double latitude, double longitude, double otherLatitude, double otherLongitude) {
        double phi = Math.toRadians(latitude);
        double otherPhi = Math.toRadians(otherLatitude);
        double turn = Math.toRadians(otherLongitude - longitude);
        double degrees = Math.toDegrees(Math.atan2(
                Math.sin(turn) * Math.cos(otherPhi),
                Math.cos(phi) * Math.sin(otherPhi) - Math.sin(phi) * Math.cos(otherPhi) * Math.cos(turn)));
        return degrees < 0.0 ? degrees + 360.0 : degrees;
    }

    private static double wrap(double longitude) {
        double wrapped = longitude - 360.0 * Math.floor((longitude + 180.0) / 360.0);
        return wrapped >= 180.0 ? wrapped - 360.0 : wrapped;
    }
}
