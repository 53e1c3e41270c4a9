package org.shearbook.met.taylorgoldstein;

/**
 * What the theorem of Miles (1961) and Howard (1961) says of a flow: with a gradient Richardson number of at least ¼
 * at every height no wave grows. The reverse does not hold.
 *
 * @param minRichardson   least gradient Richardson number between base and top; +∞ where the wind is constant
 * @param heightOfMinimum its height [m]
 * @param stableByTheorem whether it is at least ¼
 */
public record MilesHoward(double minRichardson, double heightOfMinimum, boolean stableByTheorem) {

    /** Rounding allowed for when ¼ is met exactly. */
    private static final double ROUNDING = 1e-9;

    /** N² this far below zero, as a fraction of the greatest shear squared, is rounding. */
    private static final double NEGATIVE_ROUNDING = 1e-6;
    private static final double NEGATIVE_ROUNDING_WITHOUT_SHEAR = 1e-12;

    static MilesHoward of(SampledFlow flow) {
        double least = Double.POSITIVE_INFINITY;
        double height = flow.heights[0];
        double negligible = NEGATIVE_ROUNDING * flow.greatestShear * flow.greatestShear + NEGATIVE_ROUNDING_WITHOUT_SHEAR;
        for (int i = 0; i <= flow.intervals; i++) {
            double n2 = flow.stability[0][i];
            if (n2 < 0 && n2 > -negligible) {
                n2 = 0;
            }
            double s2 = flow.shearSquared(i);
            double richardson = s2 > 0 ? n2 / s2
                    : n2 >= 0 ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
            if (richardson < least) {
                least = richardson;
                height = flow.heights[i];
            }
        }
        return new MilesHoward(least, height, least >= 0.25 * (1 - ROUNDING));
    }
}
