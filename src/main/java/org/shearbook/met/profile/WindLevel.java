package org.shearbook.met.profile;

/**
 * Wind at one height.
 *
 * @param height    geopotential height above mean sea level [m]
 * @param pressure  [Pa]; NaN when it must come from the thermodynamic levels
 * @param eastward  u [m s⁻¹]
 * @param northward v [m s⁻¹]
 */
public record WindLevel(double height, double pressure, double eastward, double northward) {

    public WindLevel {
        if (!Double.isFinite(height) || !Double.isFinite(eastward) || !Double.isFinite(northward)
                || pressure <= 0 || Double.isInfinite(pressure)) {
            throw new IllegalArgumentException("a wind level needs finite height and components, not height " + height
                    + " m, pressure " + pressure + " Pa, u " + eastward + ", v " + northward + " m/s");
        }
    }

    /** A wind whose pressure comes from the thermodynamic levels around it. */
    public WindLevel(double height, double eastward, double northward) {
        this(height, Double.NaN, eastward, northward);
    }

    /** [m s⁻¹]. */
    public double speed() {
        return Math.hypot(eastward, northward);
    }

    /** From which it blows, clockwise from true north [degrees]. */
    public double fromDirection() {
        return Units.fromDirection(eastward, northward);
    }
}
