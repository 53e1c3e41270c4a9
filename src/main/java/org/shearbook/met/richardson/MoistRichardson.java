package org.shearbook.met.richardson;

import static org.shearbook.met.profile.AtmosphericConstants.GRAVITY;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.profile.MoistStability;
import org.shearbook.met.profile.RoundedCornerFunction;
import org.shearbook.met.profile.Saturation;
import org.shearbook.met.profile.SaturationRule;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;

/**
 * Stability and Richardson number with the saturated parts of an ascent taken as saturated: what stands beside the dry
 * {@link RichardsonProfile}, on the same heights and for the same window. Immutable; arrays are handed out as copies.
 *
 * <p><b>Method.</b> The cumulative buoyancy B is built interval by interval: {@code g ln(θv₂/θv₁)} where either level is
 * unsaturated or its humidity unknown, {@code N_m² Δz} (Durran and Klemp 1982, see {@link MoistStability}) where both
 * are saturated by the rule. From there on everything is as in {@link RichardsonAnalysis}. Where both ends are
 * saturated over ice only, latent heat and saturation are those of ice.
 *
 * <p><b>Limits.</b> Condensed water is not measured and taken as none. A humidity sensor lags in cold air, so the edge of
 * a cloud may be off by tens of metres. Within about a window of an edge, moist and dry values blend. Just above a
 * cloud's top a wet sensor cools by evaporation and feigns instability.
 */
public final class MoistRichardson {

    private final RichardsonProfile dry;
    private final List<RoundedFlow> flows;
    private final Grid grid;
    private final Saturation[] saturations;
    private final SaturationRule rule;

    private MoistRichardson(RichardsonProfile dry, List<RoundedFlow> flows, Grid grid, Saturation[] saturations, SaturationRule rule) {
        this.dry = dry;
        this.flows = List.copyOf(flows);
        this.grid = grid;
        this.saturations = saturations;
        this.rule = rule;
    }

    /**
     * The moist counterpart of a dry analysis.
     *
     * @param dry  the ascent analysed for one window
     * @param rule when air counts as saturated
     * @return moist values at the heights of {@code dry}; equal to the dry ones where nothing is saturated
     */
    public static MoistRichardson of(RichardsonProfile dry, SaturationRule rule) {
        VerticalProfile profile = dry.profile();
        double smoothing = RoundedCornerFunction.standardDeviation(dry.window());
        List<RoundedFlow> flows = new FlowBuilder(profile, smoothing, buoyancy(profile, rule)).build();
        Grid grid = Grid.of(profile, flows, dry.spacing());
        Saturation[] saturations = new Saturation[grid.size()];
        for (int i = 0; i < saturations.length; i++) {
            saturations[i] = rule.of(profile.temperatureAt(grid.height[i]), profile.dewPointAt(grid.height[i]));
        }
        return new MoistRichardson(dry, flows, grid, saturations, rule);
    }

    private static double[] buoyancy(VerticalProfile profile, SaturationRule rule) {
        List<ThermodynamicLevel> levels = profile.thermodynamicLevels();
        double[] thetaV = profile.virtualPotentialTemperatures();
        double[] b = new double[levels.size()];
        Saturation below = rule.of(levels.get(0).temperature(), levels.get(0).dewPoint());
        for (int k = 1; k < b.length; k++) {
            ThermodynamicLevel level = levels.get(k);
            Saturation here = rule.of(level.temperature(), level.dewPoint());
            if (below.isSaturated() && here.isSaturated()) {
                boolean overIce = below == Saturation.OVER_ICE_ASSUMED && here == Saturation.OVER_ICE_ASSUMED;
                double depth = level.height() - levels.get(k - 1).height();
                b[k] = b[k - 1] + depth * MoistStability.OF_THE_HOUSE.between(levels.get(k - 1), level, overIce);
            } else {
                b[k] = b[k - 1] + GRAVITY * Math.log(thetaV[k] / thetaV[k - 1]);
            }
            below = here;
        }
        return b;
    }

    /** The analysis it stands beside. */
    public RichardsonProfile dry() {
        return dry;
    }

    /** By which air counts as saturated. */
    public SaturationRule rule() {
        return rule;
    }

    /** Whether each height of the grid is saturated, and whether that is assumed. */
    public List<Saturation> saturations() {
        return List.of(saturations);
    }

    /** Whether any height of the grid is saturated: else moist equals dry. */
    public boolean hasSaturation() {
        return Arrays.stream(saturations).anyMatch(Saturation::isSaturated);
    }

    /** N² as measured, moist where saturated [s⁻²]; NaN in gaps. */
    public double[] measuredBuoyancyFrequencySquared() {
        return grid.measuredN2.clone();
    }

    /** N² of the sorted profile, moist where saturated [s⁻²], 0 or more; NaN in gaps. */
    public double[] sortedBuoyancyFrequencySquared() {
        return grid.sortedN2.clone();
    }

    /** Ri as measured, moist where saturated [1]; NaN in gaps and where there is no shear. */
    public double[] measuredRichardsonNumber() {
        return grid.measuredRi.clone();
    }

    /** Ri of the sorted profile, moist where saturated [1], 0 or more; NaN in gaps and where there is no shear. */
    public double[] richardsonNumber() {
        return grid.ri.clone();
    }

    /** The smooth functions behind the grid, for a stability analysis of the moist air. */
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
     * The smallest moist Ri between two heights, found on the grid.
     *
     * @param base [m]
     * @param top  [m], not below {@code base}
     * @return the lowest place of the smallest value; empty when no point between the heights has an Ri
     */
    public Optional<RichardsonMinimum> minimumBetween(double base, double top) {
        return grid.minimumBetween(base, top, dry.profile());
    }

    /**
     * How much of a layer is saturated, at the heights of the grid, and whether any of it is assumed.
     *
     * @param layer a layer of the dry analysis
     * @return {@code UNKNOWN} when no humidity is known inside; {@code UNSATURATED} when less than half is saturated;
     *         {@code OVER_ICE_ASSUMED} when the saturation of any saturated height is assumed
     */
    public Saturation saturationOf(ShearLayer layer) {
        int known = 0;
        int saturated = 0;
        boolean assumed = false;
        for (int i = grid.firstAtOrAbove(layer.base()); i < grid.size() && grid.height[i] <= layer.top(); i++) {
            known += saturations[i] == Saturation.UNKNOWN ? 0 : 1;
            saturated += saturations[i].isSaturated() ? 1 : 0;
            assumed |= saturations[i].isAssumed();
        }
        if (known == 0) {
            return Saturation.UNKNOWN;
        }
        if (2 * saturated < known) {
            return Saturation.UNSATURATED;
        }
        return assumed ? Saturation.OVER_ICE_ASSUMED : Saturation.OVER_WATER;
    }
}
