package org.shearbook.met.richardson;

import java.util.List;
import org.shearbook.met.profile.RoundedCornerFunction;
import org.shearbook.met.profile.VerticalProfile;

/**
 * Stability, shear, Richardson number and shear layers of one ascent, for one stated window. The entry to this room.
 *
 * <p>The Richardson number here is that of unsaturated air with virtual potential temperature; layers say which part
 * of them is saturated.
 */
public final class RichardsonAnalysis {

    /*
     * 1. θv per level gives a buoyancy B = g ln(θv/θv0), whose difference over an interval is exactly the sum of N² dz.
     * 2. The ascent is cut at its gaps. In each piece dense levels are averaged over bins of s0/3; s0 = window / 2.3548
     *    is the standard deviation of the Gaussian whose full width at half maximum is the window.
     * 3. u, v and B become straight-line interpolants with corners rounded by a Gaussian of width max(s0, a quarter of
     *    the smaller neighbouring spacing), so that coarse ascents round themselves and no detail is invented. N², S²
     *    are derivatives of those functions.
     * 4. A second B is made non-decreasing by isotonic regression before rounding: N² ≥ 0. As measured is drawn;
     *    sorted is used for layers and minima.
     * 5. Both on a grid of s0/3. Layers by hysteresis: grow where Ri < ½ and S² > 1e-5 s⁻², bridge gaps up to s0,
     *    keep what contains Ri < ¼ and is at least 2 s0 deep. A missing stretch is never bridged.
     *
     * Cost: O(levels + grid points). No iteration, so nothing can fail to converge.
     *
     * Sources: critical Ri ¼, Miles (1961) and Howard (1961), J. Fluid Mech. 10, 496 and 509. Rounded corners, bins
     * and hysteresis limits are our own construction.
     */

    /** The window every screen starts with: full width at half maximum [m]. */
    public static final double DEFAULT_WINDOW = 200;

    /** The windows offered [m]. 60 m is for research: instrument noise still shows there. */
    public static final List<Double> WINDOWS = List.of(60.0, 100.0, 150.0, 200.0, 300.0, 600.0);

    /** Height above ground from which {@link RichardsonProfile#lowestInFreeAir} looks [m]; common practice, no source. */
    public static final double FREE_AIR = 1000;

    /** Deepest ascent that is analysed [m]; no balloon rises half as high. */
    private static final double DEEPEST = 200_000;

    private RichardsonAnalysis() {
    }

    /**
     * Analyses one ascent.
     *
     * @param profile the ascent; gaps are respected
     * @param window  full width at half maximum of the smoothing [m], one of {@link #WINDOWS}
     * @return grid and layers; without points when wind and temperature nowhere overlap in two levels each
     * @throws IllegalArgumentException if the window is not offered or the ascent is deeper than 200 km
     */
    public static RichardsonProfile of(VerticalProfile profile, double window) {
        if (!WINDOWS.contains(window)) {
            throw new IllegalArgumentException("window " + window + " m is not one of " + WINDOWS);
        }
        if (profile.highestHeight() - profile.lowestHeight() > DEEPEST) {
            throw new IllegalArgumentException("the ascent reaches from " + profile.lowestHeight() + " to "
                    + profile.highestHeight() + " m: check its heights");
        }
        double smoothing = RoundedCornerFunction.standardDeviation(window);
        List<RoundedFlow> flows = new FlowBuilder(profile, smoothing).build();
        Grid grid = Grid.of(profile, flows, smoothing / 3);
        List<ShearLayer> layers = new LayerDetection(profile, flows, grid, smoothing).find();
        return new RichardsonProfile(profile, window, flows, grid, layers);
    }
}
