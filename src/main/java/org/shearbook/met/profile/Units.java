package org.shearbook.met.profile;

/**
 * Units of the trade to and from SI. Exact by definition: 1 nautical mile = 1852 m, 1 foot = 0.3048 m.
 */
public final class Units {

    /** One knot [m s⁻¹]. */
    public static final double KNOT = 1852.0 / 3600.0;

    /** One foot [m]. */
    public static final double FOOT = 0.3048;

    /** One thousand feet [m]: the depth for which operational shear classes are stated. */
    public static final double THOUSAND_FEET = 304.8;

    /** One nautical mile [m]. */
    public static final double NAUTICAL_MILE = 1852;

    /** One knot per thousand feet [s⁻¹], about 1.688 × 10⁻³. */
    public static final double KNOT_PER_THOUSAND_FEET = KNOT / THOUSAND_FEET;

    private Units() {
    }

    public static double knotsToMetresPerSecond(double knots) {
        return knots * KNOT;
    }

    public static double metresPerSecondToKnots(double metresPerSecond) {
        return metresPerSecond / KNOT;
    }

    public static double feetToMetres(double feet) {
        return feet * FOOT;
    }

    public static double metresToFeet(double metres) {
        return metres / FOOT;
    }

    /** @param shear [s⁻¹] */
    public static double perSecondToKnotsPerThousandFeet(double shear) {
        return shear / KNOT_PER_THOUSAND_FEET;
    }

    /** @return [s⁻¹] */
    public static double knotsPerThousandFeetToPerSecond(double knotsPerThousandFeet) {
        return knotsPerThousandFeet * KNOT_PER_THOUSAND_FEET;
    }

    public static double celsiusToKelvin(double celsius) {
        return celsius + AtmosphericConstants.ZERO_CELSIUS;
    }

    public static double kelvinToCelsius(double kelvin) {
        return kelvin - AtmosphericConstants.ZERO_CELSIUS;
    }

    /** @return hundreds of feet, not rounded */
    public static double pressureAltitudeToFlightLevel(double pressureAltitude) {
        return pressureAltitude / (100 * FOOT);
    }

    /** @return pressure altitude [m] */
    public static double flightLevelToPressureAltitude(double flightLevel) {
        return flightLevel * 100 * FOOT;
    }

    /**
     * Eastward component of a wind given as meteorologists give it.
     *
     * @param speed         [m s⁻¹]
     * @param fromDirection from which it blows, clockwise from true north [degrees]
     */
    public static double eastward(double speed, double fromDirection) {
        return -speed * Math.sin(Math.toRadians(fromDirection));
    }

    /** Northward component; arguments as {@link #eastward}. */
    public static double northward(double speed, double fromDirection) {
        return -speed * Math.cos(Math.toRadians(fromDirection));
    }

    /**
     * Direction from which a wind blows.
     *
     * @return clockwise from true north [degrees], above 0 up to 360; 0 for calm, as the codes write it
     */
    public static double fromDirection(double eastward, double northward) {
        if (eastward == 0 && northward == 0) {
            return 0;
        }
        double direction = Math.toDegrees(Math.atan2(-eastward, -northward));
        return direction <= 0 ? direction + 360 : direction;
    }

    /**
     * Direction towards which a vector points, for a change of wind rather than a wind.
     *
     * @return clockwise from true north [degrees], above 0 up to 360; 0 for the zero vector
     */
    public static double towardsDirection(double eastward, double northward) {
        return fromDirection(-eastward, -northward);
    }
}
