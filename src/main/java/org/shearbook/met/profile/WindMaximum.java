package org.shearbook.met.profile;

import java.util.Optional;

/**
 * The strongest wind of an ascent.
 *
 * @param height      [m]
 * @param pressure    [Pa]; NaN when not known
 * @param flightLevel hundreds of feet of pressure altitude, not rounded; NaN when not known
 * @param eastward    u [m s⁻¹]
 * @param northward   v [m s⁻¹]
 * @param atTopOfWind whether it is the highest wind level: the true maximum may lie above it
 */
public record WindMaximum(
        double height, double pressure, double flightLevel, double eastward, double northward, boolean atTopOfWind) {

    /** [m s⁻¹]. */
    public double speed() {
        return Math.hypot(eastward, northward);
    }

    /** From which it blows, clockwise from true north [degrees]. */
    public double fromDirection() {
        return Units.fromDirection(eastward, northward);
    }

    /**
     * The wind level of greatest speed as reported, the lowest of equals. Not smoothed: in a noisy ascent it is a
     * little too strong, and its height uncertain by the width over which the speed changes by the noise.
     *
     * @return empty when the ascent has no wind
     */
    public static Optional<WindMaximum> of(VerticalProfile profile) {
        WindLevel strongest = null;
        for (WindLevel level : profile.windLevels()) {
            if (strongest == null || level.speed() > strongest.speed()) {
                strongest = level;
            }
        }
        if (strongest == null) {
            return Optional.empty();
        }
        double height = strongest.height();
        boolean top = height == profile.windLevels().get(profile.windLevels().size() - 1).height();
        return Optional.of(new WindMaximum(height, profile.pressureAt(height), profile.flightLevelAt(height),
                strongest.eastward(), strongest.northward(), top));
    }
}
