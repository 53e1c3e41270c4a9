package org.shearbook.met.taylorgoldstein;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.RoundedCornerFunction;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.met.richardson.RoundedFlow;

/**
 * The stability of a stratified shear flow by the Taylor–Goldstein equation: for a layer of a measured profile, or for
 * a profile taken as given. Immutable; each call works for itself and may run beside others.
 */
public final class StabilityAnalysis {

    /*
     * For waves exp(i k (s - c t)) along an azimuth, with U the wind along it,
     *
     *   w'' = [ k² + U''/(U - c) - N²/(U - c)² ] w,       growth rate σ = k Im c.
     *
     * Neglected: density decrease with height beyond buoyancy (relative 1/(4 H² k²), 4e-4 at a wavelength of 2 km),
     * viscosity, the earth's rotation, horizontal differences, and moisture beyond what N² carries. How the equation is
     * solved stands in DispersionFunction, how no growing wave is overlooked in UnstableRoots, how the search runs in
     * ModeSearch.
     *
     * Limits. N² must not be negative: where it is, convection grows without a preferred scale and Howard's bounds do
     * not hold. Growth depends strongly on the smoothing of the profile, much more than on anything numerical:
     * see GrowthSensitivity. Waves whose critical level lies at a jet's nose (U' = 0) cannot be bypassed by the complex
     * path and are found only while Im c exceeds the spacing times N.
     *
     * References
     * 1 G. I. Taylor 1931, Proc. R. Soc. A 132, 499-523, doi 10.1098/rspa.1931.0115
     * 2 S. Goldstein 1931, Proc. R. Soc. A 132, 524-548, doi 10.1098/rspa.1931.0116
     * 3 J. W. Miles 1961, J. Fluid Mech. 10, 496-508, doi 10.1017/S0022112061000305
     * 4 L. N. Howard 1961, J. Fluid Mech. 10, 509-512, doi 10.1017/S0022112061000317
     * 5 J. P. Boyd 1985, J. Comput. Phys. 57, 454-471
     */

    private static final double LAYER_STEPS_PER_CORNER = 4;
    private static final double LAYER_STEPS_PER_DEPTH = 24;
    private static final int FEWEST_INTERVALS = 64;
    private static final int MOST_INTERVALS = 2400;
    private static final double LONGEST_WAVE_IN_DEPTHS = 15;
    private static final double SHORTEST_WAVE_IN_DEPTHS = 1.5;
    private static final double EXPECTED_WAVE_IN_DEPTHS = 7;
    private static final int FEW_INTERVALS = 800;
    private static final double WELL_MET = 2e-5;
    private static final double NOT_MET = 2e-3;
    private static final int MANY_LEVELS = 24;
    private static final int INTERPOLATION_PASSES = 4;
    private static final int MOST_MAP_POINTS = 20_000;

    private final SearchSettings settings;

    /** @param settings how wide and how hard to look */
    public StabilityAnalysis(SearchSettings settings) {
        this.settings = settings;
    }

    /**
     * The growing waves of one layer of an ascent.
     *
     * <p>The layer's uninterrupted stretch of the ascent is used, with its buoyancy sorted. The lowest level is taken as
     * the ground when it lies within a corner width of the launch site's height.
     *
     * @param profile the ascent analysed for one window
     * @param layer   base and top of the layer [m]
     * @return the waves found, or why there is none
     * @throws IllegalArgumentException if wind and temperature do not both reach the middle of the layer
     * @see #ofLayer(RoundedFlow, HeightBand, Boundary)
     */
    public StabilityResult ofLayer(RichardsonProfile profile, HeightBand layer) {
        RoundedFlow flow = flowOf(profile, layer);
        double ground = profile.profile().surfaceHeight();
        double corner = flow.eastward().narrowestCorner(flow.extent().base(), layer.top());
        Boundary lowest = flow.extent().base() <= ground + corner ? Boundary.RIGID : Boundary.RADIATING;
        return ofLayer(flow, layer, lowest);
    }

    static RoundedFlow flowOf(RichardsonProfile profile, HeightBand layer) {
        RoundedFlow flow = profile.flowAt(0.5 * (layer.base() + layer.top()));
        if (flow == null) {
            throw new IllegalArgumentException("wind and temperature do not both reach the middle of the layer from "
                    + layer.base() + " to " + layer.top() + " m");
        }
        return flow;
    }

    /**
     * The growing waves of one layer of a smooth flow.
     *
     * <p><b>Method.</b> The layer is taken with a margin of its own depth, at least four corner widths, on either side.
     * Beyond that window wind and stability go on uniformly; where the window reaches the lowest height of the flow
     * the closure given for it holds. The grid has at least four steps per corner width and 24 per layer depth. Azimuths
     * lie within 90° of the shear across the layer; wavelengths from 1.5 to 15 layer depths. Fourth order in the spacing.
     *
     * <p><b>Limits.</b> A neighbouring layer closer than about one depth must be part of the same layer, otherwise
     * their common wave is missed. A layer thinner than two corner widths counts as two corner widths deep. Where N² is
     * negative nothing is given.
     *
     * @param rounded wind [m s⁻¹] and sorted buoyancy [m s⁻²] as functions of height
     * @param layer   base and top of the layer [m]
     * @param lowest  what closes the flow at its lowest height: {@code RIGID} if that is the ground
     * @return the waves found, or why there is none
     * @throws IllegalArgumentException if the layer lies outside the flow
     */
    public StabilityResult ofLayer(RoundedFlow rounded, HeightBand layer, Boundary lowest) {
        RoundedCornerFunction eastward = rounded.eastward();
        RoundedCornerFunction northward = rounded.northward();
        RoundedCornerFunction buoyancy = rounded.sortedBuoyancy();
        double base = layer.base();
        double top = layer.top();
        double lowestKnot = rounded.extent().base();
        double highestKnot = rounded.extent().top();
        if (!(base < highestKnot) || !(top > lowestKnot)) {
            throw new IllegalArgumentException("the layer from " + base + " to " + top
                    + " m lies outside the flow from " + lowestKnot + " to " + highestKnot + " m");
        }
        double corner = Math.min(buoyancy.narrowestCorner(base, top),
                Math.min(eastward.narrowestCorner(base, top), northward.narrowestCorner(base, top)));
        double depth = Math.max(top - base, 2 * corner);
        double margin = Math.max(depth, 4 * corner);
        double from = Math.max(lowestKnot, base - margin);
        double to = Math.min(highestKnot, top + margin);
        Boundary lower = from == lowestKnot ? lowest : Boundary.RADIATING;
        StratifiedShearFlow flow = StratifiedShearFlow.ofBuoyancy(eastward, northward, buoyancy, from, to, lower,
                Boundary.RADIATING);
        double finest = flow.finestDetail();
        double wanted = (to - from) / Math.min(finest / LAYER_STEPS_PER_CORNER, depth / LAYER_STEPS_PER_DEPTH);
        List<String> remarks = new ArrayList<>();
        int intervals = intervals(wanted, remarks);
        SampledFlow sampled = flow.sampled(intervals);
        MilesHoward theorem = MilesHoward.of(sampled);
        double shearAngle = shearAngle(eastward, northward, base, top);
        double[] angles = new double[settings.azimuths()];
        // the shear itself at an even index, where the search is closest
        int centre = angles.length / 4 * 2;
        for (int j = 0; j < angles.length; j++) {
            angles[j] = shearAngle + Math.PI * (j - centre) / angles.length;
        }
        double[] wavenumbers = logarithmic(2 * Math.PI / (LONGEST_WAVE_IN_DEPTHS * depth),
                2 * Math.PI / (SHORTEST_WAVE_IN_DEPTHS * Math.min(depth, 6 * finest)));
        boolean[][] searched = searched(wavenumbers, 2 * Math.PI / (EXPECTED_WAVE_IN_DEPTHS * depth));
        int rangeFrom = (int) Math.max(0, Math.floor((base - corner - from) / sampled.spacing));
        int rangeTo = (int) Math.min(intervals, Math.ceil((top + corner - from) / sampled.spacing));
        ModeSearch search = new ModeSearch(flow, sampled, finest, angles, wavenumbers, searched, rangeFrom, rangeTo,
                growthFloor(sampled), settings.workLimit(), true, true);
        boolean convective = theorem.minRichardson() < 0;
        if (convective) {
            remarks.add("statically unstable: N² is negative inside the layer or beside it; what grows there is"
                    + " convection, which this analysis does not cover");
        }
        return result(flow, sampled, theorem, search, remarks, convective);
    }

    /**
     * The growing waves of a profile taken as given, between its lowest and its highest level.
     *
     * @see #ofLevels(double[], double[], double[], double[], double, double[], double[], Boundary, Boundary)
     */
    public StabilityResult ofLevels(double[] height, double[] eastward, double[] northward,
            double[] buoyancyFrequencySquared, Boundary lower, Boundary upper) {
        return ofLevels(height, eastward, northward, buoyancyFrequencySquared, 0, new double[0], new double[0], lower,
                upper);
    }

    /**
     * The growing waves of a profile taken as given, between its lowest and its highest level, for the azimuths and
     * wavenumbers given or searched.
     *
     * <p><b>Method.</b> Wind and N² become straight lines between levels with rounded corners. Without smoothing the
     * corners are as narrow as half the distance to the next level (with fewer than 24 levels narrower still, so that the
     * lines between levels stay straight), and corner values are set so that the rounded profile goes through the
     * levels. The grid has 800 steps if they do justice to the levels, at most 2400; a profile with finer detail is
     * smoothed to what that grid resolves, and a remark says so. Without azimuths the search covers 180° around the strongest shear; without wavenumbers
     * it covers what the depths of the regions with Ri &lt; ¼ suggest. Phase speeds are sought among the winds of those
     * regions and a quarter of their depth beyond. All waves are counted at every azimuth and at every wavenumber given, or every
     * searchStride-th of those searched. The fastest wave is refined to the maximum over whatever was searched.
     *
     * <p><b>Limits.</b> N² below zero at less than half of the levels is taken as zero, with a remark; otherwise the
     * flow is convective and no wave is given. A wavelength shorter than twelve grid steps is not solved for.
     *
     * @param height                   heights [m], shape {@code [n]}, strictly increasing, {@code n ≥ 2}
     * @param eastward                 u [m s⁻¹], shape {@code [n]}
     * @param northward                v [m s⁻¹], shape {@code [n]}
     * @param buoyancyFrequencySquared N² [s⁻²], shape {@code [n]}
     * @param window                   smoothing, full width at half maximum [m]; 0 for none
     * @param azimuths                 [° clockwise from north], any number of them; empty to search
     * @param wavenumbers              [rad m⁻¹], positive; empty to search
     * @param lower                    closure at the lowest level
     * @param upper                    closure at the highest level
     * @return the waves found, or why there is none
     * @throws IllegalArgumentException if lengths differ, {@code n < 2}, a number is not finite, heights do not strictly
     *         increase, a wavenumber is not positive, or more than 20 000 combinations are asked for (the message names
     *         the element)
     */
    public StabilityResult ofLevels(double[] height, double[] eastward, double[] northward,
            double[] buoyancyFrequencySquared, double window, double[] azimuths, double[] wavenumbers, Boundary lower,
            Boundary upper) {
        requireLevels(height, eastward, northward, buoyancyFrequencySquared, window, azimuths, wavenumbers);
        List<String> remarks = new ArrayList<>();
        double[] n2 = buoyancyFrequencySquared.clone();
        int negative = 0;
        for (int i = 0; i < n2.length; i++) {
            if (n2[i] < 0) {
                negative++;
                n2[i] = 0;
            }
        }
        double range = height[height.length - 1] - height[0];
        RoundedCornerFunction u;
        RoundedCornerFunction v;
        RoundedCornerFunction stability;
        if (window > 0) {
            double[] widths = smoothedWidths(height, window, remarks);
            u = new RoundedCornerFunction(height, eastward, widths);
            v = new RoundedCornerFunction(height, northward, widths);
            stability = new RoundedCornerFunction(height, n2, widths);
        } else {
            double[] widths = interpolationWidths(height, range * LAYER_STEPS_PER_CORNER / FEW_INTERVALS);
            u = through(height, eastward, widths, false);
            v = through(height, northward, widths, false);
            stability = through(height, n2, widths, true);
            boolean finer = closestLevels(height) < 2 * range * LAYER_STEPS_PER_CORNER / FEW_INTERVALS;
            if (finer && (misses(u, v, height, eastward, northward) > WELL_MET
                    || misses(stability, height, n2) > WELL_MET)) {
                double narrowest = range * LAYER_STEPS_PER_CORNER / MOST_INTERVALS;
                widths = interpolationWidths(height, narrowest);
                u = through(height, eastward, widths, false);
                v = through(height, northward, widths, false);
                stability = through(height, n2, widths, true);
                if (misses(u, v, height, eastward, northward) > NOT_MET || misses(stability, height, n2) > NOT_MET) {
                    remarks.add(smoothed(narrowest));
                }
            }
        }
        StratifiedShearFlow flow = StratifiedShearFlow.ofBuoyancyFrequency(u, v, stability, height[0],
                height[height.length - 1], lower, upper);
        double finest = flow.finestDetail();
        int intervals = intervals(range / (finest / LAYER_STEPS_PER_CORNER), new ArrayList<>());
        SampledFlow sampled = flow.sampled(intervals);
        MilesHoward theorem = MilesHoward.of(sampled);
        boolean convective = 2 * negative >= n2.length;
        if (negative > 0) {
            theorem = new MilesHoward(leastRichardson(height, eastward, northward, buoyancyFrequencySquared, theorem),
                    theorem.heightOfMinimum(), false);
            remarks.add(convective
                    ? "statically unstable: N² is negative at " + negative + " of " + n2.length + " levels; what grows"
                            + " there is convection, which this analysis does not cover"
                    : "N² is negative at " + negative + " of " + n2.length + " levels and was taken as zero there");
        }
        SubcriticalRegions regions = SubcriticalRegions.of(sampled);
        double[] angles = angles(sampled, azimuths);
        double[] ks = wavenumbers.length > 0 ? wavenumbers.clone() : wavenumbersOf(regions, sampled, finest);
        Arrays.sort(ks);
        boolean[] searched = new boolean[ks.length];
        for (int q = 0; q < ks.length; q++) {
            boolean resolved = ks[q] * sampled.spacing <= ModeSearch.LARGEST_WAVENUMBER_STEP;
            searched[q] = resolved && (wavenumbers.length > 0 || q % settings.searchStride() == 0 || q == ks.length - 1);
            if (!resolved) {
                remarks.add(String.format(Locale.ROOT, "not converged: a wavelength of %.4g m is shorter than twelve"
                        + " steps of the grid (%.4g m each)", 2 * Math.PI / ks[q], sampled.spacing));
            }
        }
        ModeSearch search = new ModeSearch(flow, sampled, finest, angles, ks, new boolean[][] {searched, searched},
                regions.from(), regions.to(),
                growthFloor(sampled), settings.workLimit(), azimuths.length == 0, wavenumbers.length == 0);
        return result(flow, sampled, theorem, search, remarks, convective);
    }

    private StabilityResult result(StratifiedShearFlow flow, SampledFlow sampled, MilesHoward theorem,
            ModeSearch search, List<String> remarks, boolean convective) {
        boolean complete = !convective && remarks.stream().noneMatch(remark -> remark.startsWith("not converged"));
        @Nullable Mode fastest = null;
        if (!convective && !theorem.stableByTheorem()) {
            search.run();
            fastest = search.fastest();
            if (search.exhausted()) {
                complete = false;
                remarks.add("not converged: the search was stopped after " + search.evaluations()
                        + " evaluations, its limit; waves may be missing");
            }
            if (search.missed() > 0) {
                complete = false;
                remarks.add("not converged: " + search.missed() + " growing waves were counted but not found");
            }
            if (fastest != null && !fastest.converged()) {
                remarks.add(fastest.reason());
            }
        }
        if (theorem.stableByTheorem()) {
            remarks.add("stable: the Richardson number is at least ¼ at every height (theorem of Miles and Howard)");
        } else if (fastest == null && complete) {
            remarks.add(String.format(Locale.ROOT, "no wave grows faster than %.3g per second",
                    growthFloor(sampled)));
        }
        return new StabilityResult(fastest, search.map(), theorem, complete, remarks, search.evaluations(), flow, sampled);
    }

    private double growthFloor(SampledFlow sampled) {
        return Math.max(settings.relativeGrowthFloor() * sampled.greatestShear, settings.growthFloor());
    }

    private static int intervals(double wanted, List<String> remarks) {
        int intervals = (int) Math.ceil(Math.max(FEWEST_INTERVALS, Math.min(MOST_INTERVALS, wanted)));
        if (wanted > 1.001 * MOST_INTERVALS) {
            remarks.add("the layer is deep for its detail: the grid has " + MOST_INTERVALS + " steps, "
                    + Math.round(wanted) + " were wanted");
        }
        return intervals + intervals % 2;
    }

    private static double shearAngle(RoundedCornerFunction eastward, RoundedCornerFunction northward, double base,
            double top) {
        return Math.atan2(northward.value(top) - northward.value(base), eastward.value(top) - eastward.value(base));
    }

    private double[] logarithmic(double least, double greatest) {
        int count = settings.wavenumbers();
        double[] wavenumbers = new double[count];
        for (int q = 0; q < count; q++) {
            wavenumbers[q] = count == 1 ? Math.sqrt(least * greatest)
                    : least * Math.pow(greatest / least, q / (count - 1.0));
        }
        return wavenumbers;
    }

    /** Along azimuths of even index every stride-th wavenumber, along the others every second one of those. */
    private boolean[][] searched(double[] wavenumbers, double expected) {
        boolean[][] searched = new boolean[2][wavenumbers.length];
        int stride = settings.searchStride();
        int nearest = 0;
        for (int q = 0; q < wavenumbers.length; q++) {
            searched[0][q] = q % stride == 0 || q == wavenumbers.length - 1;
            searched[1][q] = stride == 1 || q % (2 * stride) == stride;
            if (Math.abs(Math.log(wavenumbers[q] / expected)) < Math.abs(Math.log(wavenumbers[nearest] / expected))) {
                nearest = q;
            }
        }
        // thin unstable bands lie near seven depths: never leave that wavenumber to its neighbours
        searched[0][nearest] = true;
        searched[1][nearest] = true;
        return searched;
    }

    /** Given azimuths, or 180° around the direction of the strongest shear. */
    private double[] angles(SampledFlow sampled, double[] azimuths) {
        if (azimuths.length > 0) {
            return Arrays.stream(azimuths).map(azimuth -> Math.toRadians(90 - azimuth)).toArray();
        }
        int strongest = 0;
        for (int i = 0; i <= sampled.intervals; i++) {
            if (sampled.shearSquared(i) > sampled.shearSquared(strongest)) {
                strongest = i;
            }
        }
        double along = Math.atan2(sampled.northward[1][strongest], sampled.eastward[1][strongest]);
        double[] angles = new double[settings.azimuths()];
        for (int j = 0; j < angles.length; j++) {
            angles[j] = along + Math.PI * (j - angles.length / 2) / angles.length;
        }
        return angles;
    }

    /** Wavenumbers worth searching for the depths of the regions that may drive growth. */
    private double[] wavenumbersOf(SubcriticalRegions regions, SampledFlow flow, double finest) {
        double longest = Math.max(20 * regions.deepest(), 4 * regions.extent());
        double shortest = Math.max(SHORTEST_WAVE_IN_DEPTHS * regions.shallowest(), Math.max(3 * finest,
                2 * Math.PI / ModeSearch.LARGEST_WAVENUMBER_STEP * flow.spacing * 1.0001));
        return logarithmic(2 * Math.PI / Math.max(longest, 2 * shortest), 2 * Math.PI / shortest);
    }

    private static double[] smoothedWidths(double[] height, double window, List<String> remarks) {
        double narrowest = (height[height.length - 1] - height[0]) * LAYER_STEPS_PER_CORNER / MOST_INTERVALS;
        double smoothing = RoundedCornerFunction.standardDeviation(window);
        if (smoothing < narrowest) {
            remarks.add(smoothed(narrowest));
        }
        return RoundedCornerFunction.cornerWidths(height, Math.max(smoothing, narrowest));
    }

    private static double[] interpolationWidths(double[] height, double narrowest) {
        int n = height.length;
        double range = height[n - 1] - height[0];
        double[] widths = new double[n];
        for (int j = 0; j < n; j++) {
            double below = j > 0 ? height[j] - height[j - 1] : Double.POSITIVE_INFINITY;
            double above = j < n - 1 ? height[j + 1] - height[j] : Double.POSITIVE_INFINITY;
            double own = 0.5 * Math.min(below, above);
            if (n < MANY_LEVELS) {
                own = Math.min(own, range / 240);
            }
            widths[j] = Math.max(own, narrowest);
        }
        return widths;
    }

    private static double closestLevels(double[] height) {
        double closest = Double.POSITIVE_INFINITY;
        for (int j = 1; j < height.length; j++) {
            closest = Math.min(closest, height[j] - height[j - 1]);
        }
        return closest;
    }

    /** Greatest distance between the rounded wind and the levels, as a fraction of the wind's range. */
    private static double misses(RoundedCornerFunction u, RoundedCornerFunction v, double[] height, double[] eastward,
            double[] northward) {
        double scale = Math.max(spread(eastward), spread(northward));
        return scale == 0 ? 0 : Math.max(misses(u, height, eastward) * spread(eastward),
                misses(v, height, northward) * spread(northward)) / scale;
    }

    private static double misses(RoundedCornerFunction function, double[] height, double[] values) {
        double[][] at = new double[1][height.length];
        function.derivatives(height, at);
        double greatest = 0;
        for (int j = 0; j < height.length; j++) {
            greatest = Math.max(greatest, Math.abs(at[0][j] - values[j]));
        }
        double spread = spread(values);
        return spread == 0 ? 0 : greatest / spread;
    }

    private static double spread(double[] values) {
        return Arrays.stream(values).max().orElse(0) - Arrays.stream(values).min().orElse(0);
    }

    private static String smoothed(double width) {
        return String.format(Locale.ROOT, "levels are closer than a grid of %d steps resolves: the profile was smoothed"
                + " over %.3g m (full width at half maximum)", MOST_INTERVALS, width * 2 * Math.sqrt(2 * Math.log(2)));
    }

    /** The rounded-corner function that goes through the values: its corners are moved by what it misses. */
    private static RoundedCornerFunction through(double[] height, double[] values, double[] widths,
            boolean neverNegative) {
        double[] corners = values.clone();
        double[][] at = new double[1][height.length];
        RoundedCornerFunction function = new RoundedCornerFunction(height, corners, widths);
        for (int pass = 0; pass < INTERPOLATION_PASSES; pass++) {
            function.derivatives(height, at);
            for (int j = 0; j < corners.length; j++) {
                corners[j] += values[j] - at[0][j];
                if (neverNegative) {
                    corners[j] = Math.max(0, corners[j]);
                }
            }
            function = new RoundedCornerFunction(height, corners, widths);
        }
        return function;
    }

    private static double leastRichardson(double[] height, double[] eastward, double[] northward, double[] n2,
            MilesHoward theorem) {
        double least = theorem.minRichardson();
        for (int i = 1; i < height.length; i++) {
            double du = eastward[i] - eastward[i - 1];
            double dv = northward[i] - northward[i - 1];
            double dz = height[i] - height[i - 1];
            double mean = 0.5 * (n2[i] + n2[i - 1]);
            double s2 = (du * du + dv * dv) / (dz * dz);
            if (s2 > 0) {
                least = Math.min(least, mean / s2);
            } else if (mean < 0) {
                least = Double.NEGATIVE_INFINITY;
            }
        }
        return least;
    }

    private static void requireLevels(double[] height, double[] eastward, double[] northward, double[] n2,
            double window, double[] azimuths, double[] wavenumbers) {
        int n = height.length;
        requireLength(eastward, n, "eastward");
        requireLength(northward, n, "northward");
        requireLength(n2, n, "buoyancyFrequencySquared");
        if (n < 2) {
            throw new IllegalArgumentException("at least two levels are needed for a shear, got " + n);
        }
        requireFinite(height, "height");
        requireFinite(eastward, "eastward");
        requireFinite(northward, "northward");
        requireFinite(n2, "buoyancyFrequencySquared");
        for (int i = 1; i < n; i++) {
            if (!(height[i] > height[i - 1])) {
                throw new IllegalArgumentException("height must strictly increase: height[" + i + "] = " + height[i]
                        + " after " + height[i - 1]);
            }
        }
        if (!(window >= 0) || Double.isInfinite(window)) {
            throw new IllegalArgumentException("window must be zero or positive and finite: " + window);
        }
        requireFinite(azimuths, "azimuths");
        requireFinite(wavenumbers, "wavenumbers");
        for (int q = 0; q < wavenumbers.length; q++) {
            if (!(wavenumbers[q] > 0)) {
                throw new IllegalArgumentException("wavenumbers[" + q + "] must be positive: " + wavenumbers[q]);
            }
        }
        long points = Math.max(1L, azimuths.length) * Math.max(1, wavenumbers.length);
        if (points > MOST_MAP_POINTS) {
            throw new IllegalArgumentException("at most " + MOST_MAP_POINTS
                    + " combinations of azimuth and wavenumber, got " + points);
        }
    }

    private static void requireLength(double[] values, int n, String name) {
        if (values.length != n) {
            throw new IllegalArgumentException(name + " has " + values.length + " elements, height has " + n);
        }
    }

    private static void requireFinite(double[] values, String name) {
        for (int i = 0; i < values.length; i++) {
            if (!Double.isFinite(values[i])) {
                throw new IllegalArgumentException(name + "[" + i + "] is not a finite number: " + values[i]);
            }
        }
    }
}
