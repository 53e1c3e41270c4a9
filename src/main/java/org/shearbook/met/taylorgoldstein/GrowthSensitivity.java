package org.shearbook.met.taylorgoldstein;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.met.richardson.RoundedFlow;

/**
 * How far the growth of a layer can be trusted: over the smoothing of the profile, which changes it by a factor of two
 * and more, and over the errors of the instrument.
 */
public final class GrowthSensitivity {

    /** The windows at which growth is always given: full width at half maximum [m]. */
    public static final List<Double> WINDOWS = List.of(100.0, 150.0, 200.0);

    private static final int MOST_MEMBERS = 1000;

    private final StabilityAnalysis analysis;

    /** @param analysis searches each copy */
    public GrowthSensitivity(StabilityAnalysis analysis) {
        this.analysis = analysis;
    }

    /**
     * Growth of one layer at several windows. The layer keeps its base and top; the profile around it changes.
     *
     * @param atWindows the ascent analysed at each window, see {@link #WINDOWS}
     * @param layer     base and top of the layer [m]
     * @return one result per window, in their order
     * @throws IllegalArgumentException if a profile has no flow at the layer
     */
    public List<GrowthAtWindow> overWindows(List<RichardsonProfile> atWindows, HeightBand layer) {
        List<GrowthAtWindow> growth = new ArrayList<>();
        for (RichardsonProfile profile : atWindows) {
            growth.add(new GrowthAtWindow(profile.window(), analysis.ofLayer(profile, layer)));
        }
        return growth;
    }

    /**
     * Growth of one layer over perturbed copies of its ascent.
     *
     * <p><b>Method.</b> Each member adds to every level errors drawn from the perturbation, within the heights the layer's
     * analysis reaches, and is searched anew. Percentiles by linear interpolation between order statistics.
     *
     * <p><b>Limits.</b> The ascent carries its own errors already, so the members have them twice and their shear is on
     * average a little stronger than the true one. A member that does not converge counts as not growing.
     *
     * @param profile      the ascent
     * @param window       full width at half maximum of the smoothing [m], one of {@link RichardsonAnalysis#WINDOWS}
     * @param layer        base and top of the layer [m]
     * @param perturbation the errors
     * @param members      number of copies, 1 to 1000
     * @param seed         of the random numbers
     * @return spread of growth rate and wavelength
     * @throws IllegalArgumentException if the window is not offered, members are out of range, or wind and temperature
     *         do not both reach the layer
     */
    public GrowthSpread overPerturbations(VerticalProfile profile, double window, HeightBand layer,
            ProfilePerturbation perturbation, int members, long seed) {
        if (members < 1 || members > MOST_MEMBERS) {
            throw new IllegalArgumentException("members must be 1 to " + MOST_MEMBERS + ": " + members);
        }
        RichardsonProfile whole = RichardsonAnalysis.of(profile, window);
        RoundedFlow flow = StabilityAnalysis.flowOf(whole, layer);
        // beyond the margin of the analysis a corner still reaches six of its widths
        double corner = Math.max(flow.eastward().narrowestCorner(layer.base(), layer.top()),
                flow.sortedBuoyancy().narrowestCorner(layer.base(), layer.top()));
        double reach = Math.max(layer.depth(), 4 * corner) + 10 * corner;
        List<ThermodynamicLevel> thermodynamic = around(profile.thermodynamicLevels(), profile.temperatureHeights(),
                layer.base() - reach, layer.top() + reach);
        List<WindLevel> wind = around(profile.windLevels(), profile.windHeights(), layer.base() - reach,
                layer.top() + reach);
        Random random = new Random(seed);
        double[] growthRates = new double[members];
        double[] wavelengths = new double[members];
        int growing = 0;
        for (int member = 0; member < members; member++) {
            VerticalProfile copy = new VerticalProfile(profile.surfaceHeight(),
                    perturbedTemperatures(thermodynamic, perturbation, random), perturbedWinds(wind, perturbation, random),
                    profile.temperatureGaps(), profile.windGaps(), List.of());
            StabilityResult result = analysis.ofLayer(RichardsonAnalysis.of(copy, window), layer);
            if (result.fastest().isPresent() && result.fastest().get().converged()) {
                growthRates[member] = result.fastest().get().growthRate();
                wavelengths[growing++] = result.fastest().get().wavelength();
            }
        }
        Arrays.sort(growthRates);
        wavelengths = Arrays.copyOf(wavelengths, growing);
        Arrays.sort(wavelengths);
        return new GrowthSpread(members, growing, percentile(growthRates, 0.1), percentile(growthRates, 0.5),
                percentile(growthRates, 0.9), percentile(wavelengths, 0.1), percentile(wavelengths, 0.5),
                percentile(wavelengths, 0.9), seed);
    }

    private static <L> List<L> around(List<L> levels, double[] heights, double base, double top) {
        int from = 0;
        while (from + 1 < heights.length && heights[from + 1] <= base) {
            from++;
        }
        int to = heights.length;
        while (to - 1 > from + 1 && heights[to - 2] >= top) {
            to--;
        }
        return levels.subList(from, to);
    }

    private static List<ThermodynamicLevel> perturbedTemperatures(List<ThermodynamicLevel> levels,
            ProfilePerturbation perturbation, Random random) {
        List<ThermodynamicLevel> perturbed = new ArrayList<>(levels.size());
        for (ThermodynamicLevel level : levels) {
            perturbed.add(new ThermodynamicLevel(level.height(), level.pressure(),
                    level.temperature() + perturbation.temperature() * random.nextGaussian(), level.dewPoint()));
        }
        return perturbed;
    }

    private static List<WindLevel> perturbedWinds(List<WindLevel> levels, ProfilePerturbation perturbation, Random random) {
        List<WindLevel> perturbed = new ArrayList<>(levels.size());
        double eastward = 0;
        double northward = 0;
        double previous = Double.NEGATIVE_INFINITY;
        for (WindLevel level : levels) {
            double length = perturbation.windCorrelationLength();
            double kept = length > 0 ? Math.exp((previous - level.height()) / length) : 0;
            double fresh = perturbation.wind() * Math.sqrt(1 - kept * kept);
            eastward = kept * eastward + fresh * random.nextGaussian();
            northward = kept * northward + fresh * random.nextGaussian();
            previous = level.height();
            perturbed.add(new WindLevel(level.height(), level.pressure(), level.eastward() + eastward,
                    level.northward() + northward));
        }
        return perturbed;
    }

    private static double percentile(double[] ascending, double fraction) {
        if (ascending.length == 0) {
            return Double.NaN;
        }
        double position = fraction * (ascending.length - 1);
        int below = (int) position;
        int above = Math.min(below + 1, ascending.length - 1);
        return ascending[below] + (position - below) * (ascending[above] - ascending[below]);
    }
}
