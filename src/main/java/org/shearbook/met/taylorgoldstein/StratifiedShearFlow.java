package org.shearbook.met.taylorgoldstein;

import org.shearbook.met.profile.RoundedCornerFunction;

/**
 * The flow whose stability is asked for: wind components and N² as smooth functions of height between a base and a
 * top, and what closes it there.
 */
public final class StratifiedShearFlow {

    private final RoundedCornerFunction eastward;
    private final RoundedCornerFunction northward;
    private final RoundedCornerFunction stability;
    private final int stabilityOrder;
    private final double base;
    private final double top;
    private final Boundary lower;
    private final Boundary upper;

    private StratifiedShearFlow(RoundedCornerFunction eastward, RoundedCornerFunction northward,
            RoundedCornerFunction stability, int stabilityOrder, double base, double top, Boundary lower,
            Boundary upper) {
        if (!(top > base) || !Double.isFinite(base) || !Double.isFinite(top)) {
            throw new IllegalArgumentException("top must be above base and both finite: base " + base + ", top " + top);
        }
        this.eastward = eastward;
        this.northward = northward;
        this.stability = stability;
        this.stabilityOrder = stabilityOrder;
        this.base = base;
        this.top = top;
        this.lower = lower;
        this.upper = upper;
    }

    /**
     * A flow whose N² is the slope of a buoyancy profile, {@code N² = dB/dz}.
     *
     * @param eastward  u(z) [m s⁻¹]
     * @param northward v(z) [m s⁻¹]
     * @param buoyancy  B(z) [m s⁻²]; it should not decrease with height, see {@link StabilityAnalysis}
     * @param base      lowest height [m]
     * @param top       highest height [m], above base
     * @param lower     closure at the base
     * @param upper     closure at the top
     * @throws IllegalArgumentException if top is not above base
     */
    public static StratifiedShearFlow ofBuoyancy(RoundedCornerFunction eastward, RoundedCornerFunction northward,
            RoundedCornerFunction buoyancy, double base, double top, Boundary lower, Boundary upper) {
        return new StratifiedShearFlow(eastward, northward, buoyancy, 1, base, top, lower, upper);
    }

    /**
     * A flow whose N² is given itself.
     *
     * @param eastward                u(z) [m s⁻¹]
     * @param northward               v(z) [m s⁻¹]
     * @param buoyancyFrequencySquared N²(z) [s⁻²]
     * @param base                    lowest height [m]
     * @param top                     highest height [m], above base
     * @param lower                   closure at the base
     * @param upper                   closure at the top
     * @throws IllegalArgumentException if top is not above base
     */
    public static StratifiedShearFlow ofBuoyancyFrequency(RoundedCornerFunction eastward,
            RoundedCornerFunction northward, RoundedCornerFunction buoyancyFrequencySquared, double base, double top,
            Boundary lower, Boundary upper) {
        return new StratifiedShearFlow(eastward, northward, buoyancyFrequencySquared, 0, base, top, lower, upper);
    }

    double base() {
        return base;
    }

    double top() {
        return top;
    }

    Boundary lower() {
        return lower;
    }

    Boundary upper() {
        return upper;
    }

    /** The narrowest corner of wind or stability inside the flow [m]: the finest detail a grid must resolve. */
    double finestDetail() {
        return Math.min(stability.narrowestCorner(base, top),
                Math.min(eastward.narrowestCorner(base, top), northward.narrowestCorner(base, top)));
    }

    /** Wind and N² with their derivatives at {@code intervals + 1} evenly spaced heights from base to top. */
    SampledFlow sampled(int intervals) {
        return sampled(intervals, SampledFlow.ORDERS);
    }

    /** Wind and N² without derivatives beyond those a march on the real axis needs. */
    SampledFlow sampled(int intervals, int orders) {
        double[] heights = new double[intervals + 1];
        double spacing = (top - base) / intervals;
        for (int i = 0; i <= intervals; i++) {
            heights[i] = base + i * spacing;
        }
        double[][] u = new double[orders][intervals + 1];
        double[][] v = new double[orders][intervals + 1];
        double[][] b = new double[orders][intervals + 1];
        eastward.derivatives(heights, u);
        northward.derivatives(heights, v);
        stability.derivatives(heights, b);
        double[][] n2 = new double[orders - 1][];
        System.arraycopy(b, stabilityOrder, n2, 0, orders - 1);
        return new SampledFlow(heights, spacing, u, v, n2, lower, upper);
    }
}
