package org.shearbook.met.billow;

import org.shearbook.met.richardson.RichardsonNumber;
import org.shearbook.met.richardson.ShearLayer;

/**
 * Billow scales by rule of thumb, without solving for the instability: right for a layer like a hyperbolic tangent,
 * and an estimate for any other.
 */
public final class DepthRule {

    /** Label that stands beside every number from here. */
    public static final String BASIS = "rule, not solved";

    /**
     * Wavelength over full depth 2d of the fastest growing wave of an unstratified tanh layer: 2π / (2 × 0.444918).
     * Computed elsewhere by shooting and by Chebyshev collocation; the often quoted maximiser 0.4446 (Michalke 1964,
     * J. Fluid Mech. 19, 543) gives the same to three digits. A broken-line layer has 7.89.
     */
    public static final double WAVELENGTH_OVER_DEPTH = 7.06;

    private static final double UNSTRATIFIED_GROWTH = 0.1897;

    private DepthRule() {
    }

    /**
     * Billow scales of a layer.
     *
     * <p><b>Method.</b> The layer is taken as {@code U = ½ΔV tanh(z/d)} with {@code d = |ΔV| / (2 S_max)}:
     * wavelength {@code 7.06 × 2d}, growth rate {@code S_max × }{@link #relativeGrowthRate}{@code (min Ri)}.
     *
     * <p><b>Limits.</b> Real profiles spread the ratio of wavelength to depth from about 5 to 8. ΔV is taken between
     * the heights where Ri passes ½, so the outer parts of a tanh layer are left out: in constant stability the
     * wavelength comes out 25 % short at min Ri 0.1 and 40 % short at 0.2. Background shear inside is counted.
     *
     * @param layer a shear layer
     * @return scales; stable when the smallest Ri is ¼ or more, or the wind does not change across the layer
     */
    public static BillowScales of(ShearLayer layer) {
        return of(layer.windChange(), layer.maximumShear(), layer.minimum().richardsonNumber());
    }

    /**
     * Billow scales from the three numbers the rule needs.
     *
     * @param windChange       |ΔV| across the layer [m s⁻¹], 0 or more
     * @param maximumShear     S_max [s⁻¹], positive
     * @param richardsonNumber smallest Ri [1], 0 or more
     * @throws IllegalArgumentException if a value is NaN, infinite, or out of range
     */
    public static BillowScales of(double windChange, double maximumShear, double richardsonNumber) {
        if (!(windChange >= 0) || !(maximumShear > 0) || Double.isInfinite(windChange) || Double.isInfinite(maximumShear)) {
            throw new IllegalArgumentException("a wind change of 0 or more and a positive shear are needed, not "
                    + windChange + " m/s and " + maximumShear + " 1/s");
        }
        double growth = maximumShear * relativeGrowthRate(richardsonNumber);
        double halfDepth = windChange / (2 * maximumShear);
        if (growth == 0 || halfDepth == 0) {
            return new BillowScales(Double.NaN, 0, Double.POSITIVE_INFINITY, halfDepth, true, BASIS);
        }
        return new BillowScales(WAVELENGTH_OVER_DEPTH * 2 * halfDepth, growth, 1 / growth, halfDepth, false, BASIS);
    }

    /**
     * Largest growth rate of a tanh layer over its largest shear,
     * {@code σ/S = 0.1897 (1 − 4J)(1 + 0.93 J + 1.4 J²)} for {@code 0 ≤ J < ¼}, else 0.
     *
     * <p><b>Method.</b> Our own fit to computed growth rates of {@code U = tanh z}, {@code N² = J sech² z} (the layer of
     * Holmboe and Hazel 1972, J. Fluid Mech. 51, 39); error at most 0.1 % of the unstratified value.
     *
     * @param j smallest Richardson number of the layer [1], 0 or more
     * @return [1], 0 to 0.1897
     * @throws IllegalArgumentException if j is negative or NaN
     */
    public static double relativeGrowthRate(double j) {
        if (!(j >= 0)) {
            throw new IllegalArgumentException("the rule needs a Richardson number of 0 or more, not " + j);
        }
        return j >= RichardsonNumber.CRITICAL ? 0 : UNSTRATIFIED_GROWTH * (1 - 4 * j) * (1 + j * (0.93 + 1.4 * j));
    }
}
