package org.shearbook.desk.timeheight;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** Turns a whole analysed sounding into the levels a picture needs and the lowest Ri of each thousand feet. */
final class ColumnLevels {

    /** A picture is not drawn above this flight level. */
    static final int TOP = 450;

    private static final double CRITICAL = 0.25;
    private static final double QUIET = 1;

    // what no screen shows: a hundredth of the scale, a tenth of a knot, two seconds of height, a tenth of a minute
    private static final double SCALE_TOLERANCE = 0.01;
    private static final double SHEAR_TOLERANCE = 0.1;
    private static final double STABILITY_TOLERANCE = 5e-6;
    private static final double HEIGHT_TOLERANCE = 10;
    private static final double MINUTE_TOLERANCE = 0.1;

    private final double[] flightLevel;
    private final double[] height;
    private final double[] minute;
    private final double[] richardson;
    private final double[] shear;
    private final double[] stability;

    /**
     * All of one length. Levels whose flight level does not rise above that of the level below are left out: a picture
     * against flight level cannot show them.
     *
     * @param height      above mean sea level [m], strictly increasing
     * @param flightLevel pressure altitude [hundreds of feet]; NaN where unknown, such levels are left out
     * @param minute      since 1970 [min]
     * @param richardson  NaN where missing; infinite where there is no shear
     * @param shear       over 1000 ft [kt]; NaN where missing
     * @param stability   N² [s⁻²]; NaN where missing
     */
    ColumnLevels(double[] height, double[] flightLevel, double[] minute, double[] richardson, double[] shear, double[] stability) {
        List<Integer> rising = new ArrayList<>();
        double last = Double.NEGATIVE_INFINITY;
        for (int k = 0; k < height.length; k++) {
            if (flightLevel[k] > last) {
                rising.add(k);
                last = flightLevel[k];
            }
        }
        int[] used = rising.stream().mapToInt(Integer::intValue).toArray();
        this.flightLevel = pick(flightLevel, used);
        this.height = pick(height, used);
        this.minute = pick(minute, used);
        this.richardson = pick(richardson, used);
        this.shear = pick(shear, used);
        this.stability = pick(stability, used);
    }

    TimeHeight.Levels thinned() {
        double[] scale = Arrays.stream(richardson).map(ColumnLevels::quarterScale).toArray();
        int[] kept = LevelThinning.kept(flightLevel, List.of(
                new LevelThinning.Quantity(scale, SCALE_TOLERANCE),
                new LevelThinning.Quantity(shear, SHEAR_TOLERANCE),
                new LevelThinning.Quantity(stability, STABILITY_TOLERANCE),
                new LevelThinning.Quantity(height, HEIGHT_TOLERANCE),
                new LevelThinning.Quantity(minute, MINUTE_TOLERANCE)), richardson, CRITICAL, QUIET);
        return new TimeHeight.Levels(rounded(height, kept, 0), rounded(flightLevel, kept, 2), rounded(minute, kept, 2),
                richardsonNumbers(kept), rounded(shear, kept, 2), rounded(stability, kept, 8));
    }

    /** The lowest Ri between flight level 10 k and 10 (k + 1), its lower end included, at index k. */
    List<@Nullable Double> lowestPerThousandFeet() {
        List<@Nullable Double> lowest = new ArrayList<>();
        for (int base = 0; base < TOP; base += 10) {
            double found = Double.NaN;
            for (int k = 0; k < flightLevel.length; k++) {
                if (flightLevel[k] >= base && flightLevel[k] < base + 10 && !Double.isNaN(richardson[k])
                        && !(richardson[k] >= found)) {
                    found = richardson[k];
                }
            }
            lowest.add(Double.isNaN(found) ? null : shown(found));
        }
        return lowest;
    }

    /**
     * Ri on the scale of the display, {@code Ri / (Ri + 1/4)}, carried on below zero with the slope it has there.
     *
     * @return from negative values over 0 and ½ at Ri = ¼ to 1 at infinity; NaN for NaN
     */
    static double quarterScale(double richardson) {
        if (richardson < 0) {
            return Math.max(-1000, richardson / CRITICAL);
        }
        return Double.isInfinite(richardson) ? 1 : richardson / (richardson + CRITICAL);
    }

    private List<@Nullable Double> richardsonNumbers(int[] kept) {
        List<@Nullable Double> numbers = new ArrayList<>(kept.length);
        for (int k : kept) {
            numbers.add(Double.isNaN(richardson[k]) ? null : shown(richardson[k]));
        }
        return numbers;
    }

    /** Finite, with digits enough that no threshold is crossed by rounding. */
    private static double shown(double richardson) {
        double bounded = Math.max(-1000, Math.min(1000, richardson));
        double rounded = Math.rint(bounded * 1e4) / 1e4;
        for (double threshold : new double[] {CRITICAL, QUIET}) {
            if (bounded < threshold != rounded < threshold) {
                return bounded;
            }
        }
        return rounded;
    }

    private static List<@Nullable Double> rounded(double[] values, int[] kept, int decimals) {
        double unit = Math.pow(10, decimals);
        List<@Nullable Double> rounded = new ArrayList<>(kept.length);
        for (int k : kept) {
            rounded.add(Double.isFinite(values[k]) ? Math.rint(values[k] * unit) / unit : null);
        }
        return rounded;
    }

    private static double[] pick(double[] values, int[] used) {
        return Arrays.stream(used).mapToDouble(k -> values[k]).toArray();
    }
}
