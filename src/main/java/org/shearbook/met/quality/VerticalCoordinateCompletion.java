package org.shearbook.met.quality;

import static org.shearbook.met.profile.AtmosphericConstants.GAS_CONSTANT_DRY_AIR;
import static org.shearbook.met.profile.AtmosphericConstants.GRAVITY;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.StandardAtmosphere;

/**
 * Gives every level both height and pressure, and checks the two against each other and against the temperatures.
 *
 * <ol>
 * <li><b>Order.</b> Of the levels that report both, sorted by height, the largest set in which pressure does not rise
 *     is trusted. A level outside it keeps its height if that fits the pressure of its neighbours to 60 m plus what
 *     rounding to whole hPa explains, and is refused otherwise.
 * <li><b>Hydrostatic.</b> The thickness between neighbouring trusted levels is compared with the hypsometric one,
 *     {@code (R T_v / g) ln(p₁/p₂)}, T_v linear in ln p; tolerance 60 m (practice for heights coded in decametres),
 *     plus 1 % and the rounding. A level that disagrees with both neighbours, which agree with each other, loses its
 *     height.
 * <li><b>Missing heights</b> are hypsometric from the trusted level below, stretched to meet the one above.
 * <li><b>Missing pressures</b> are interpolated, ln p linear in height; beyond the ends the air is taken isothermal.
 * </ol>
 */
final class VerticalCoordinateCompletion implements QualityCheck {

    private static final double TOLERANCE = 60;
    private static final double THICKNESS_SHARE = 0.01;
    private static final double ROUNDING_OF_PRESSURE = 100;
    /** R T / g at 250 K [m]. */
    private static final double SCALE_HEIGHT = 7318;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        List<LevelsUnderCheck.Level> levels = new ArrayList<>(sounding.levels.stream().filter(l -> !l.isRefused()).toList());
        putSurfaceAtElevation(levels, sounding.elevation);
        refusePressuresThatRise(levels);
        List<LevelsUnderCheck.Level> byPressure = new ArrayList<>(levels.stream().filter(LevelsUnderCheck.Level::hasPressure).toList());
        if (byPressure.isEmpty()) {
            return;
        }
        byPressure.sort(Comparator.comparingDouble((LevelsUnderCheck.Level l) -> -l.pressure)
                .thenComparingDouble(l -> l.hasHeight() ? l.height : Double.NEGATIVE_INFINITY));
        double[] hypsometric = hypsometricHeights(byPressure);
        checkHydrostatic(byPressure, hypsometric);
        completeHeights(sounding, byPressure, hypsometric);
        completePressures(levels, byPressure);
        refuseImpossibleHeights(levels);
    }

    private static void putSurfaceAtElevation(List<LevelsUnderCheck.Level> levels, double elevation) {
        for (LevelsUnderCheck.Level level : levels) {
            if (level.is(Significance.SURFACE) && !level.hasHeight() && !Double.isNaN(elevation)) {
                level.height = elevation;
                level.flags.add(QualityFlag.HEIGHT_COMPUTED);
            }
        }
    }

    private static double tolerance(double pressure) {
        return TOLERANCE + SCALE_HEIGHT * ROUNDING_OF_PRESSURE / pressure;
    }

    private static void refusePressuresThatRise(List<LevelsUnderCheck.Level> levels) {
        List<LevelsUnderCheck.Level> both = LevelsUnderCheck.ascending(
                levels.stream().filter(l -> l.hasHeight() && l.hasPressure()).toList());
        boolean[] trusted = longestNotRising(both.stream().mapToDouble(l -> l.pressure).toArray());
        int below = -1;
        for (int k = 0; k < both.size(); k++) {
            LevelsUnderCheck.Level level = both.get(k);
            if (trusted[k]) {
                boolean tied = below >= 0 && both.get(below).pressure == level.pressure && both.get(below).height < level.height;
                if (tied && level.height - both.get(below).height <= tolerance(level.pressure)) {
                    // coarser in pressure than in height: one pressure for several heights
                    level.pressure = Double.NaN;
                } else if (tied) {
                    level.refuse(QualityFlag.PRESSURE_NOT_DECREASING);
                    level.pressure = Double.NaN;
                    level.height = Double.NaN;
                } else {
                    below = k;
                }
                continue;
            }
            level.flags.add(QualityFlag.PRESSURE_NOT_DECREASING);
            if (misfit(both, trusted, k) > tolerance(level.pressure)) {
                level.refuse(QualityFlag.PRESSURE_NOT_DECREASING);
                level.height = Double.NaN;
            }
            level.pressure = Double.NaN;
        }
    }

    /** How far [m] the height of an untrusted level is from where its trusted neighbours put its pressure. */
    private static double misfit(List<LevelsUnderCheck.Level> both, boolean[] trusted, int k) {
        LevelsUnderCheck.Level level = both.get(k);
        double least = Double.POSITIVE_INFINITY;
        for (int step = -1; step <= 1; step += 2) {
            int i = k + step;
            while (i >= 0 && i < both.size() && !(trusted[i] && both.get(i).hasPressure())) {
                i += step;
            }
            if (i >= 0 && i < both.size()) {
                double expected = both.get(i).height + SCALE_HEIGHT * Math.log(both.get(i).pressure / level.pressure);
                least = Math.min(least, Math.abs(level.height - expected));
            }
        }
        return least;
    }

    /** Marks a longest subsequence in which values do not rise; O(n log n). */
    static boolean[] longestNotRising(double[] values) {
        int n = values.length;
        int[] lastOfLength = new int[n + 1];
        int[] before = new int[n];
        int longest = 0;
        for (int k = 0; k < n; k++) {
            int low = 0;
            int high = longest;
            while (low < high) {
                int middle = (low + high + 1) >>> 1;
                if (values[lastOfLength[middle]] >= values[k]) {
                    low = middle;
                } else {
                    high = middle - 1;
                }
            }
            before[k] = low == 0 ? -1 : lastOfLength[low];
            lastOfLength[low + 1] = k;
            longest = Math.max(longest, low + 1);
        }
        boolean[] chosen = new boolean[n];
        for (int k = longest == 0 ? -1 : lastOfLength[longest]; k >= 0; k = before[k]) {
            chosen[k] = true;
        }
        return chosen;
    }

    /** Heights above the first level by hypsometry [m]; equal pressures get equal heights. */
    private static double[] hypsometricHeights(List<LevelsUnderCheck.Level> byPressure) {
        int n = byPressure.size();
        double[] temperature = virtualTemperatures(byPressure);
        double[] hypsometric = new double[n];
        for (int k = 1; k < n; k++) {
            double bottom = byPressure.get(k - 1).pressure;
            double top = byPressure.get(k).pressure;
            hypsometric[k] = hypsometric[k - 1]
                    + MoistThermodynamics.thickness(bottom, top, 0.5 * (temperature[k - 1] + temperature[k]));
        }
        return hypsometric;
    }

    /** T_v at every level, linear in ln p between levels that have one, constant beyond; standard where none has. */
    private static double[] virtualTemperatures(List<LevelsUnderCheck.Level> byPressure) {
        int n = byPressure.size();
        double[] temperature = new double[n];
        Arrays.fill(temperature, Double.NaN);
        int known = -1;
        for (int k = 0; k < n; k++) {
            LevelsUnderCheck.Level level = byPressure.get(k);
            if (!level.temperatureUsed) {
                continue;
            }
            temperature[k] = level.virtualTemperature();
            double from = known < 0 ? Double.NaN : Math.log(byPressure.get(known).pressure);
            double to = Math.log(level.pressure);
            for (int i = known + 1; i < k; i++) {
                double weight = known < 0 || from == to ? 1 : (Math.log(byPressure.get(i).pressure) - from) / (to - from);
                temperature[i] = known < 0 ? temperature[k] : temperature[known] + weight * (temperature[k] - temperature[known]);
            }
            known = k;
        }
        for (int i = known + 1; i < n; i++) {
            double pressure = byPressure.get(i).pressure;
            temperature[i] = known >= 0 ? temperature[known] : StandardAtmosphere.covers(pressure)
                    ? StandardAtmosphere.temperature(StandardAtmosphere.pressureAltitude(pressure)) : StandardAtmosphere.SEA_LEVEL_TEMPERATURE;
        }
        return temperature;
    }

    private static void checkHydrostatic(List<LevelsUnderCheck.Level> byPressure, double[] hypsometric) {
        List<Integer> anchors = new ArrayList<>();
        for (int k = 0; k < byPressure.size(); k++) {
            if (byPressure.get(k).hasHeight()) {
                anchors.add(k);
            }
        }
        for (int a = 1; a < anchors.size(); a++) {
            int below = anchors.get(a - 1);
            int at = anchors.get(a);
            if (!disagrees(byPressure, hypsometric, below, at)) {
                continue;
            }
            LevelsUnderCheck.Level level = byPressure.get(at);
            level.flags.add(QualityFlag.HYDROSTATIC);
            if (a + 1 < anchors.size()) {
                int above = anchors.get(a + 1);
                if (disagrees(byPressure, hypsometric, at, above) && !disagrees(byPressure, hypsometric, below, above)) {
                    level.height = Double.NaN;
                    level.flags.add(QualityFlag.HEIGHT_COMPUTED);
                    anchors.remove(a);
                    a--;
                }
            }
        }
    }

    private static boolean disagrees(List<LevelsUnderCheck.Level> byPressure, double[] hypsometric, int below, int above) {
        double thickness = hypsometric[above] - hypsometric[below];
        double reported = byPressure.get(above).height - byPressure.get(below).height;
        return Math.abs(reported - thickness) > tolerance(byPressure.get(above).pressure) + THICKNESS_SHARE * Math.abs(thickness);
    }

    private static void completeHeights(LevelsUnderCheck sounding, List<LevelsUnderCheck.Level> byPressure, double[] hypsometric) {
        int n = byPressure.size();
        int below = -1;
        for (int k = 0; k < n && below < 0; k++) {
            if (byPressure.get(k).hasHeight()) {
                below = k;
            }
        }
        if (below < 0) {
            LevelsUnderCheck.Level lowest = byPressure.get(0);
            below = 0;
            if (Double.isNaN(sounding.elevation)) {
                lowest.height = StandardAtmosphere.covers(lowest.pressure) ? StandardAtmosphere.pressureAltitude(lowest.pressure) : 0;
                sounding.flagSounding(QualityFlag.HEIGHT_FROM_STANDARD_ATMOSPHERE, QualityFlag.HEIGHT_FROM_STANDARD_ATMOSPHERE.text());
            } else {
                lowest.height = sounding.elevation;
            }
            lowest.flags.add(QualityFlag.HEIGHT_COMPUTED);
        }
        for (int k = below - 1; k >= 0; k--) {
            compute(byPressure.get(k), byPressure.get(below).height + hypsometric[k] - hypsometric[below]);
        }
        for (int k = below + 1; k < n; k++) {
            if (byPressure.get(k).hasHeight()) {
                stretch(byPressure, hypsometric, below, k);
                below = k;
            }
        }
        for (int k = below + 1; k < n; k++) {
            compute(byPressure.get(k), byPressure.get(below).height + hypsometric[k] - hypsometric[below]);
        }
    }

    private static void stretch(List<LevelsUnderCheck.Level> byPressure, double[] hypsometric, int below, int above) {
        double thickness = hypsometric[above] - hypsometric[below];
        double reported = byPressure.get(above).height - byPressure.get(below).height;
        double factor = thickness > 0 ? reported / thickness : 1;
        for (int k = below + 1; k < above; k++) {
            compute(byPressure.get(k), byPressure.get(below).height + factor * (hypsometric[k] - hypsometric[below]));
        }
    }

    private static void compute(LevelsUnderCheck.Level level, double height) {
        level.height = height;
        level.flags.add(QualityFlag.HEIGHT_COMPUTED);
    }

    private static void refuseImpossibleHeights(List<LevelsUnderCheck.Level> levels) {
        for (LevelsUnderCheck.Level level : levels) {
            if (level.hasHeight() && !CoordinateRangeCheck.isPossibleHeight(level.height)) {
                level.refuse(QualityFlag.HEIGHT_RANGE);
                level.height = Double.NaN;
            }
        }
    }

    private static void completePressures(List<LevelsUnderCheck.Level> levels, List<LevelsUnderCheck.Level> known) {
        List<LevelsUnderCheck.Level> ascending = LevelsUnderCheck.ascending(known);
        double[] height = ascending.stream().mapToDouble(l -> l.height).toArray();
        double[] log = ascending.stream().mapToDouble(l -> Math.log(l.pressure)).toArray();
        double[] temperature = virtualTemperatures(ascending);
        int last = height.length - 1;
        for (LevelsUnderCheck.Level level : levels) {
            if (level.hasPressure() || !level.hasHeight()) {
                continue;
            }
            double z = level.height;
            int found = Arrays.binarySearch(height, z);
            int k = found >= 0 ? found : -found - 2;
            double logPressure;
            if (found >= 0) {
                logPressure = log[found];
            } else if (k < 0) {
                logPressure = log[0] - GRAVITY * (z - height[0]) / (GAS_CONSTANT_DRY_AIR * temperature[0]);
            } else if (k >= last) {
                logPressure = log[last] - GRAVITY * (z - height[last]) / (GAS_CONSTANT_DRY_AIR * temperature[last]);
            } else {
                logPressure = log[k] + (z - height[k]) / (height[k + 1] - height[k]) * (log[k + 1] - log[k]);
            }
            level.pressure = Math.exp(logPressure);
            level.flags.add(QualityFlag.PRESSURE_INTERPOLATED);
        }
    }
}
