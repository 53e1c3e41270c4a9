package org.shearbook.met.richardson;

import java.util.Arrays;
import org.shearbook.met.profile.RoundedCornerFunction;

/** Levels without a gap between them, averaged over bins of a third of the smoothing: knots of rounded functions. */
final class LevelBins {

    private final int from;
    private final double base;
    private final double top;
    private final double[] knots;
    private final double[] widths;
    /** Bin of each level, the first level of the piece being 0; −1 for a level that takes no part. */
    private final int[] binOfLevel;
    private final int[] count;

    LevelBins(double[] height, int from, int to, double smoothing) {
        this.from = from;
        base = height[from];
        top = height[to - 1];
        int levels = to - from;
        double binDepth = smoothing / 3;
        double[] sum = new double[levels];
        int[] members = new int[levels];
        binOfLevel = new int[levels];
        int bin = -1;
        double binNumber = Double.NaN;
        for (int k = from; k < to; k++) {
            double number = Math.floor((height[k] - base) / binDepth);
            if (number != binNumber) {
                binNumber = number;
                bin++;
            }
            members[bin]++;
            sum[bin] += height[k] - base;
            binOfLevel[k - from] = bin;
        }
        int n = bin + 1;
        if (n == 1) {
            // all levels within one bin: nothing finer than their two ends can be said
            knots = new double[] {base, top};
            count = new int[] {1, 1};
            Arrays.fill(binOfLevel, -1);
            binOfLevel[0] = 0;
            binOfLevel[levels - 1] = 1;
        } else {
            knots = new double[n];
            count = new int[n];
            for (int i = 0; i < n; i++) {
                knots[i] = base + sum[i] / members[i];
                count[i] = members[i];
            }
        }
        widths = RoundedCornerFunction.cornerWidths(knots, smoothing);
    }

    double base() {
        return base;
    }

    double top() {
        return top;
    }

    /** Index of the piece's first level in the ascent. */
    int firstLevel() {
        return from;
    }

    /** Number of levels in the piece. */
    int levelCount() {
        return binOfLevel.length;
    }

    double[] knots() {
        return knots;
    }

    double[] widths() {
        return widths;
    }

    int binOfLevel(int level) {
        return binOfLevel[level];
    }

    int levelsIn(int bin) {
        return count[bin];
    }

    /** Means over the bins of a quantity given at every level of the ascent. */
    double[] averaged(double[] column) {
        double[] mean = new double[knots.length];
        for (int k = 0; k < binOfLevel.length; k++) {
            if (binOfLevel[k] >= 0) {
                mean[binOfLevel[k]] += column[from + k];
            }
        }
        for (int i = 0; i < mean.length; i++) {
            mean[i] /= count[i];
        }
        return mean;
    }

    RoundedCornerFunction rounded(double[] knotValues) {
        return new RoundedCornerFunction(knots, knotValues, widths);
    }
}
