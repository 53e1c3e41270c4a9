package org.shearbook.met.richardson;

import static org.shearbook.met.profile.AtmosphericConstants.GRAVITY;

/**
 * The Richardson number straight from levels, without smoothing: for comparison with other people's figures and
 * for a whole layer. What the desk shows along an ascent comes from {@link RichardsonAnalysis}, because differences
 * between levels 5 or 10 m apart are mostly noise.
 */
public final class RichardsonNumber {

    /** Below it a steady layer may be unstable (Miles 1961, Howard 1961). */
    public static final double CRITICAL = 0.25;

    private RichardsonNumber() {
    }

    /**
     * Gradient Richardson number at the mid-points between neighbouring levels, {@code Ri = N² / S²} with
     * {@code N² = (g/θv) ∂θv/∂z} and {@code S² = (∂u/∂z)² + (∂v/∂z)²}.
     *
     * <p><b>Method.</b> Centred differences between levels {@code k} and {@code k+1}; θv in the denominator is the
     * mean of the two. Second order in the spacing on an even grid. No smoothing is applied.
     *
     * <p><b>Limits.</b> Where {@code S²} is exactly zero the result is {@code ±∞} ({@code NaN} when {@code N²} is
     * zero too). Ri depends on the level spacing: values from layers of different thickness are not comparable.
     *
     * @param height   geopotential height above mean sea level [m], shape {@code [n]}, strictly increasing, {@code n ≥ 2}
     * @param virtualPotentialTemperature θv [K], shape {@code [n]}, positive
     * @param eastward  u [m s⁻¹], shape {@code [n]}
     * @param northward v [m s⁻¹], shape {@code [n]}
     * @return Ri [1], shape {@code [n-1]}; element {@code k} lies between levels {@code k} and {@code k+1}; negative
     *         where the layer is statically unstable
     * @throws IllegalArgumentException if lengths differ, {@code n < 2}, a value is not finite, θv is not positive,
     *         or height does not strictly increase (the message names the level)
     * @see <a href="https://doi.org/10.1017/S0022112061000305">Miles (1961), J. Fluid Mech. 10, 496–508</a>
     */
    public static double[] gradient(
            double[] height, double[] virtualPotentialTemperature, double[] eastward, double[] northward) {
        int n = height.length;
        if (n < 2) {
            throw new IllegalArgumentException("a gradient needs at least two levels, got " + n);
        }
        if (virtualPotentialTemperature.length != n || eastward.length != n || northward.length != n) {
            throw new IllegalArgumentException("lengths differ: height " + n + ", virtualPotentialTemperature "
                    + virtualPotentialTemperature.length + ", eastward " + eastward.length + ", northward " + northward.length);
        }
        for (int k = 0; k < n; k++) {
            if (!Double.isFinite(height[k]) || !Double.isFinite(eastward[k]) || !Double.isFinite(northward[k])
                    || !(virtualPotentialTemperature[k] > 0) || Double.isInfinite(virtualPotentialTemperature[k])) {
                throw new IllegalArgumentException("level " + k + " is not finite with positive temperature: height " + height[k]
                        + ", θv " + virtualPotentialTemperature[k] + ", u " + eastward[k] + ", v " + northward[k]);
            }
            if (k > 0 && height[k] <= height[k - 1]) {
                throw new IllegalArgumentException(
                        "level " + k + " at " + height[k] + " m is not above level " + (k - 1) + " at " + height[k - 1] + " m");
            }
        }
        double[] ri = new double[n - 1];
        for (int k = 0; k < n - 1; k++) {
            double dz = height[k + 1] - height[k];
            double mean = 0.5 * (virtualPotentialTemperature[k] + virtualPotentialTemperature[k + 1]);
            double n2 = GRAVITY / mean * (virtualPotentialTemperature[k + 1] - virtualPotentialTemperature[k]) / dz;
            double du = (eastward[k + 1] - eastward[k]) / dz;
            double dv = (northward[k + 1] - northward[k]) / dz;
            ri[k] = n2 / (du * du + dv * dv);
        }
        return ri;
    }

    /**
     * Bulk Richardson number of a layer, {@code Ri_b = (g/θv) Δθv Δz / (Δu² + Δv²)}, θv the mean of both ends.
     *
     * <p><b>Limits.</b> {@code ±∞} when the wind does not change, {@code NaN} when θv does not either.
     *
     * @param depth       Δz [m], positive
     * @param bottomTheta θv at the base [K], positive
     * @param topTheta    θv at the top [K], positive
     * @param du          Δu, top minus base [m s⁻¹]
     * @param dv          Δv, top minus base [m s⁻¹]
     * @return Ri_b [1]
     * @throws IllegalArgumentException if depth or a temperature is not positive
     */
    public static double bulk(double depth, double bottomTheta, double topTheta, double du, double dv) {
        if (!(depth > 0) || !(bottomTheta > 0) || !(topTheta > 0)) {
            throw new IllegalArgumentException("a bulk Richardson number needs positive depth and temperatures, not depth " + depth
                    + " m, θv " + bottomTheta + " and " + topTheta + " K");
        }
        return GRAVITY * 2 / (bottomTheta + topTheta) * (topTheta - bottomTheta) * depth / (du * du + dv * dv);
    }
}
