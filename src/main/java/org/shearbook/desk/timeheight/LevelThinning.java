package org.shearbook.desk.timeheight;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;
import java.util.stream.IntStream;

/**
 * Which levels of a sounding a picture needs. A level is left out only where straight lines between its kept
 * neighbours pass it by less than a tolerance in every quantity; of each crossing of a threshold both levels are
 * kept, so that the thinned sounding crosses at the same places, and no other, on whatever scale it is drawn.
 *
 * <p>Missing stretches keep their first and last level, and the measured level on either side of them.
 */
final class LevelThinning {

    /**
     * One quantity over the levels.
     *
     * @param values    NaN where missing
     * @param tolerance the largest error that cannot be seen, in the unit of the values, positive
     */
    record Quantity(double[] values, double tolerance) {
    }

    private LevelThinning() {
    }

    /**
     * @param coordinate what the straight lines run along, shape {@code [n]}, strictly increasing
     * @param quantities each of shape {@code [n]}
     * @param crossing   of which the crossings are kept, shape {@code [n]}
     * @param thresholds of {@code crossing}
     * @return indices of the kept levels, ascending; the first and the last are always among them
     */
    static int[] kept(double[] coordinate, List<Quantity> quantities, double[] crossing, double... thresholds) {
        int n = coordinate.length;
        if (n <= 2) {
            return IntStream.range(0, n).toArray();
        }
        boolean[] keep = new boolean[n];
        keep[0] = true;
        keep[n - 1] = true;
        for (int k = 0; k + 1 < n; k++) {
            if (crosses(crossing[k], crossing[k + 1], thresholds) || beginsOrEnds(quantities, k)) {
                keep[k] = true;
                keep[k + 1] = true;
            }
        }
        int from = 0;
        for (int k = 1; k < n; k++) {
            if (keep[k]) {
                refine(coordinate, quantities, from, k, keep);
                from = k;
            }
        }
        return IntStream.range(0, n).filter(k -> keep[k]).toArray();
    }

    private static boolean crosses(double below, double above, double[] thresholds) {
        for (double threshold : thresholds) {
            if (!Double.isNaN(below) && !Double.isNaN(above) && (below < threshold) != (above < threshold)) {
                return true;
            }
        }
        return false;
    }

    private static boolean beginsOrEnds(List<Quantity> quantities, int k) {
        return quantities.stream().anyMatch(it -> Double.isNaN(it.values()[k]) != Double.isNaN(it.values()[k + 1]));
    }

    /** Keeps the level farthest from the straight line, then does the same on either side of it, until all are near. */
    private static void refine(double[] coordinate, List<Quantity> quantities, int first, int last, boolean[] keep) {
        Deque<int[]> open = new ArrayDeque<>();
        open.push(new int[] {first, last});
        while (!open.isEmpty()) {
            int[] stretch = open.pop();
            int worst = -1;
            double error = 1;
            for (int k = stretch[0] + 1; k < stretch[1]; k++) {
                double found = error(coordinate, quantities, stretch[0], k, stretch[1]);
                if (found > error) {
                    error = found;
                    worst = k;
                }
            }
            if (worst >= 0) {
                keep[worst] = true;
                open.push(new int[] {stretch[0], worst});
                open.push(new int[] {worst, stretch[1]});
            }
        }
    }

    /** The largest departure from the straight line, in tolerances. */
    private static double error(double[] coordinate, List<Quantity> quantities, int first, int k, int last) {
        double share = (coordinate[k] - coordinate[first]) / (coordinate[last] - coordinate[first]);
        double worst = 0;
        for (Quantity quantity : quantities) {
            double[] values = quantity.values();
            double off = Math.abs(values[first] + share * (values[last] - values[first]) - values[k]) / quantity.tolerance();
            // false for missing levels, which lie between missing levels only
            if (off > worst) {
                worst = off;
            }
        }
        return worst;
    }
}
