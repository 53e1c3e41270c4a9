package org.shearbook.met.taylorgoldstein;

/**
 * What the theorem of Miles (1961) and Howard (1961) says of a flow: with a gradient Richardson number of at least ¼
 * at every height no wave grows. The reverse does not hold.
 *
 * @param minRichardson   least gradient Richardson number between base and top; +∞ where the wind is constant
 * @param heightOfMinimum its height [m]
 * @param stableByTheorem whether it is at least ¼ and N² is nowhere negative
 */
public record MilesHoward(double minRichardson, double heightOfMinimum, boolean stableByTheorem) {

    /** Rounding allowed for when ¼ is met exactly. */
    private static final double ROUNDING = 1e-9;

    static MilesHoward of(SampledFlow flow) {
        double least = Double.POSITIVE_INFINITY;
        double height = flow.heights[0];
        boolean negative = false;
        for (int i = 0; i <= flow.intervals; i++) {
            double n2 = flow.stability[0][i];
            double s2 = flow.shearSquared(i);
            double richardson = s2 > 0 ? n2 / s2
                    : n2 >= 0 ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
            negative |= n2 < 0 && richardson < -ROUNDING;
            if (richardson < least) {
                least = richardson;
                height = flow.heights[i];
            }
        }
        return new MilesHoward(least, height, !negative && least >= 0.25 * (1 - ROUNDING));
    }
}
