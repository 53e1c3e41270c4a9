package org.shearbook.met.richardson;

import org.shearbook.met.profile.RoundedCornerFunction;
import org.shearbook.met.profile.VerticalProfile;

/**
 * How sure the Richardson number of one ascent is, height by height, for a stated instrument noise and the window of its
 * {@link RichardsonProfile}. Immutable; arrays are copies with one element per height of that profile.
 *
 * <p><b>Method.</b> The noise goes through the same averaging and rounding as the levels, exactly. The prior variance of
 * a shear component at a height is the mean square of both components within 1 km, less what noise adds to it; at least
 * 10⁻⁸ s⁻². Cost O(heights × levels in reach), no iteration.
 *
 * <p><b>Limits.</b> Instrument noise only. With few levels the smooth profile between them is an assumption and its error
 * is not in here: see {@link #at(ShearLayer)} and {@link HiddenSublayer}. Within a window of the ends of the data the
 * slope hangs on few levels: errors are large there, N² may be negative within them, and the probability says so.
 */
public final class RichardsonUncertainty {

    private static final double PRIOR_REACH = 1000;
    private static final double LEAST_PRIOR_VARIANCE = 1e-8;
    private static final int FEWEST_WIND_LEVELS = 3;

    private final RichardsonProfile profile;
    private final InstrumentNoise noise;
    private final double[] shearError;
    private final double[] stabilityError;
    private final double[] priorVariance;
    private final double[] probability;

    private RichardsonUncertainty(RichardsonProfile profile, InstrumentNoise noise, double[] shearError, double[] stabilityError,
            double[] priorVariance) {
        this.profile = profile;
        this.noise = noise;
        this.shearError = shearError;
        this.stabilityError = stabilityError;
        this.priorVariance = priorVariance;
        probability = probabilityBelowQuarter(profile.measuredBuoyancyFrequencySquared());
    }

    /**
     * Uncertainty of one analysis.
     *
     * @param profile the ascent analysed for one window
     * @param noise   of its sonde
     */
    public static RichardsonUncertainty of(RichardsonProfile profile, InstrumentNoise noise) {
        VerticalProfile ascent = profile.profile();
        FlowBuilder pieces = new FlowBuilder(ascent, RoundedCornerFunction.standardDeviation(profile.window()));
        double[] z = profile.heights();
        double[] shearError = GradientError.ofShear(ascent, pieces.windPieces(), noise, z);
        double[] stabilityError = GradientError.ofBuoyancyFrequencySquared(ascent, pieces.temperaturePieces(), noise, z);
        return new RichardsonUncertainty(profile, noise, shearError, stabilityError,
                priorVariance(z, profile.shearSquared(), shearError));
    }

    private static double[] priorVariance(double[] z, double[] shearSquared, double[] shearError) {
        int n = z.length;
        double[] sum = new double[n + 1];
        int[] known = new int[n + 1];
        for (int i = 0; i < n; i++) {
            boolean counts = !Double.isNaN(shearSquared[i]) && !Double.isNaN(shearError[i]);
            sum[i + 1] = sum[i] + (counts ? 0.5 * shearSquared[i] - shearError[i] * shearError[i] : 0);
            known[i + 1] = known[i] + (counts ? 1 : 0);
        }
        double[] variance = new double[n];
        int from = 0;
        int to = 0;
        for (int i = 0; i < n; i++) {
            while (z[from] < z[i] - PRIOR_REACH) {
                from++;
            }
            while (to < n && z[to] <= z[i] + PRIOR_REACH) {
                to++;
            }
            int count = known[to] - known[from];
            variance[i] = count == 0 ? Double.NaN : Math.max(LEAST_PRIOR_VARIANCE, (sum[to] - sum[from]) / count);
        }
        return variance;
    }

    /** The analysis it speaks of. */
    public RichardsonProfile profile() {
        return profile;
    }

    /** The noise assumed. */
    public InstrumentNoise noise() {
        return noise;
    }

    /** Standard error of one shear component [s⁻¹]; NaN in gaps. */
    public double[] shearError() {
        return shearError.clone();
    }

    /** Standard error of N² as measured [s⁻²]; NaN in gaps. */
    public double[] buoyancyFrequencySquaredError() {
        return stabilityError.clone();
    }

    /** Prior variance τ² of one shear component [s⁻²]; NaN where nothing is known within 1 km. */
    public double[] priorVariance() {
        return priorVariance.clone();
    }

    /** {@code P(Ri < ¼)} of unsaturated air at each height [1]; NaN in gaps. */
    public double[] probabilityBelowQuarter() {
        return probability.clone();
    }

    /**
     * {@code P(Ri < ¼)} at each height for another N², such as that of saturated air, with the same errors.
     *
     * @param buoyancyFrequencySquared as measured [s⁻²], one per height of the profile
     * @return [1]; NaN where N² or the wind is
     * @throws IllegalArgumentException if the length differs from the profile's
     */
    public double[] probabilityBelowQuarter(double[] buoyancyFrequencySquared) {
        double[] s2 = profile.shearSquared();
        if (buoyancyFrequencySquared.length != s2.length) {
            throw new IllegalArgumentException(
                    "N² at " + buoyancyFrequencySquared.length + " heights does not fit a profile with " + s2.length);
        }
        double[] p = new double[s2.length];
        for (int i = 0; i < p.length; i++) {
            p[i] = SubcriticalProbability.of(Math.sqrt(s2[i]), shearError[i], buoyancyFrequencySquared[i], stabilityError[i], priorVariance[i]);
        }
        return p;
    }

    /**
     * {@code P(Ri < ¼)} at the height of a layer's smallest Ri: at that height, not anywhere in the layer.
     *
     * @param layer a layer of this profile
     * @return the probability, or why it is unknown: where fewer than three reported wind levels lie inside, the layer is
     *         a straight line between few points, and no noise model can say what lies between them
     */
    public LayerProbability at(ShearLayer layer) {
        double height = layer.minimum().height();
        if (layer.windLevelCount() < FEWEST_WIND_LEVELS) {
            return LayerProbability.unknown(height, "only " + layer.windLevelCount() + " reported wind levels lie in the layer; three are the least");
        }
        double[] z = profile.heights();
        int i = (int) Math.round((height - z[0]) / profile.spacing());
        double p = i >= 0 && i < z.length ? probability[i] : Double.NaN;
        return Double.isNaN(p) ? LayerProbability.unknown(height, "wind or temperature is missing at the layer's minimum")
                : new LayerProbability(p, height, "");
    }
}
