package org.shearbook.met.richardson;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.VerticalProfile;

/**
 * Stability, shear and Richardson number of one ascent on an even height grid, and its layers: what
 * {@link RichardsonAnalysis} found for one window. Immutable; arrays are handed out as copies, all of one length.
 *
 * <p>Two profiles are kept. <em>As measured</em>, N² and Ri are negative where the air is statically unstable: that
 * is what is drawn. <em>Sorted</em>, N² is 0 or more: that is what layers and minima are taken from.
 */
public final class RichardsonProfile {

    private final VerticalProfile profile;
    private final double window;
    private final List<RoundedFlow> flows;
    private final Grid grid;
    private final List<ShearLayer> layers;

    RichardsonProfile(VerticalProfile profile, double window, List<RoundedFlow> flows, Grid grid, List<ShearLayer> layers) {
        this.profile = profile;
        this.window = window;
        this.flows = List.copyOf(flows);
        this.grid = grid;
        this.layers = List.copyOf(layers);
    }

    /** The ascent it belongs to. */
    public VerticalProfile profile() {
        return profile;
    }

    /** Full width at half maximum of the smoothing [m]: belongs beside every number taken from here. */
    public double window() {
        return window;
    }

    /** Spacing of the grid [m]. */
    public double spacing() {
        return grid.spacing();
    }

    /** Number of grid points; 0 when wind and temperature nowhere overlap. */
    public int size() {
        return grid.size();
    }

    /** [m], ascending and even. */
    public double[] heights() {
        return grid.height.clone();
    }

    /** Pressure [Pa]; NaN where not known. */
    public double[] pressures() {
        return grid.pressure.clone();
    }

    /** Smoothed u [m s⁻¹]; NaN in gaps. */
    public double[] eastward() {
        return grid.u.clone();
    }

    /** Smoothed v [m s⁻¹]; NaN in gaps. */
    public double[] northward() {
        return grid.v.clone();
    }

    /** N² as measured [s⁻²]; NaN in gaps. */
    public double[] measuredBuoyancyFrequencySquared() {
        return grid.measuredN2.clone();
    }

    /** N² of the sorted profile [s⁻²], 0 or more; NaN in gaps. */
    public double[] sortedBuoyancyFrequencySquared() {
        return grid.sortedN2.clone();
    }

    /** |∂V/∂z|² [s⁻²]; NaN in gaps. */
    public double[] shearSquared() {
        return grid.s2.clone();
    }

    /** Ri as measured [1], negative where statically unstable; NaN in gaps and where there is no shear. */
    public double[] measuredRichardsonNumber() {
        return grid.measuredRi.clone();
    }

    /** Ri of the sorted profile [1], 0 or more; NaN in gaps and where there is no shear. */
    public double[] richardsonNumber() {
        return grid.ri.clone();
    }

    /** |ΔV|/304.8 m over exactly 1000 ft centred on each point, from the winds as reported [s⁻¹]; NaN where it does not fit. */
    public double[] shearOverThousandFeet() {
        return grid.shearOverThousandFeet.clone();
    }

    /** What can be said at each point. */
    public List<PointStatus> statuses() {
        return List.of(grid.status);
    }

    /** From the lowest up. */
    public List<ShearLayer> layers() {
        return layers;
    }

    /** The smooth functions behind the grid, one per uninterrupted stretch, from the lowest up. */
    public List<RoundedFlow> flows() {
        return flows;
    }

    /** The flow that holds at a height; null in gaps and beyond the data. */
    public @Nullable RoundedFlow flowAt(double height) {
        for (RoundedFlow flow : flows) {
            if (flow.extent().contains(height)) {
                return flow;
            }
        }
        return null;
    }

    /**
     * The smallest Ri of the sorted profile between two heights, found on the grid.
     *
     * @param base [m]
     * @param top  [m], not below {@code base}
     * @return the lowest place of the smallest value; empty when no point between the heights has an Ri
     */
    public Optional<RichardsonMinimum> minimumBetween(double base, double top) {
        return grid.minimumBetween(base, top, profile);
    }

    /**
     * The smallest Ri at least {@value RichardsonAnalysis#FREE_AIR} m above the ground: below that it is small every
     * afternoon for reasons of its own.
     *
     * @return empty when no point there has an Ri
     */
    public Optional<RichardsonMinimum> lowestInFreeAir() {
        return minimumBetween(profile.surfaceHeight() + RichardsonAnalysis.FREE_AIR, Double.POSITIVE_INFINITY);
    }

    /**
     * The largest shear over exactly 1000 ft, of all windows centred on a grid point between two heights.
     *
     * @return [s⁻¹]; NaN when none fits
     */
    public double maximumShearOverThousandFeetBetween(double base, double top) {
        return grid.maximumShearOverThousandFeet(base, top);
    }

    /** Bands in which nothing is known, between the lowest and the highest flow. */
    public List<HeightBand> gaps() {
        List<HeightBand> gaps = new ArrayList<>();
        for (int i = 1; i < flows.size(); i++) {
            double from = flows.get(i - 1).extent().top();
            double to = flows.get(i).extent().base();
            if (from < to) {
                gaps.add(new HeightBand(from, to));
            }
        }
        return List.copyOf(gaps);
    }
}
