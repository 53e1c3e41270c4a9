package org.shearbook.met.richardson;

import static org.shearbook.met.profile.AtmosphericConstants.GRAVITY;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.RoundedCornerFunction;
import org.shearbook.met.profile.VerticalProfile;

/** Cuts an ascent at its gaps, averages what is dense, and rounds the corners. */
final class FlowBuilder {

    private final VerticalProfile profile;
    private final double smoothing;

    /** @param smoothing standard deviation of the smoothing [m] */
    FlowBuilder(VerticalProfile profile, double smoothing) {
        this.profile = profile;
        this.smoothing = smoothing;
    }

    /** Flows from the lowest up; empty when wind and temperature nowhere overlap. */
    List<RoundedFlow> build() {
        double[] windHeight = profile.windHeights();
        double[] u = profile.eastward();
        double[] v = profile.northward();
        double[] temperatureHeight = profile.temperatureHeights();
        double[] thetaV = profile.virtualPotentialTemperatures();
        List<Piece> windPieces = pieces(windHeight, profile.windGaps(), u, v);
        List<Piece> temperaturePieces = pieces(temperatureHeight, profile.temperatureGaps(), buoyancy(thetaV));
        List<RoundedFlow> flows = new ArrayList<>();
        int t = 0;
        int w = 0;
        while (t < temperaturePieces.size() && w < windPieces.size()) {
            Piece temperature = temperaturePieces.get(t);
            Piece wind = windPieces.get(w);
            double base = Math.max(temperature.base, wind.base);
            double top = Math.min(temperature.top, wind.top);
            if (base < top) {
                flows.add(new RoundedFlow(new HeightBand(base, top), wind.rounded(0), wind.rounded(1),
                        temperature.rounded(0), temperature.sorted()));
            }
            if (temperature.top <= wind.top) {
                t++;
            } else {
                w++;
            }
        }
        return flows;
    }

    /** Cumulative {@code B = g ln(θv/θv₀)}: its difference over any interval is the sum of N² dz there, exactly. */
    private static double[] buoyancy(double[] thetaV) {
        double[] b = new double[thetaV.length];
        for (int k = 0; k < b.length; k++) {
            b[k] = GRAVITY * Math.log(thetaV[k] / thetaV[0]);
        }
        return b;
    }

    private List<Piece> pieces(double[] height, List<HeightBand> gaps, double[]... columns) {
        List<Piece> pieces = new ArrayList<>();
        int first = 0;
        for (int k = 1; k <= height.length; k++) {
            boolean cut = k == height.length || isCut(gaps, height[k - 1], height[k]);
            if (cut) {
                if (k - first >= 2) {
                    pieces.add(new Piece(height, first, k, columns));
                }
                first = k;
            }
        }
        return pieces;
    }

    private static boolean isCut(List<HeightBand> gaps, double below, double above) {
        for (HeightBand gap : gaps) {
            if (gap.overlaps(below, above)) {
                return true;
            }
        }
        return false;
    }

    /** Levels without a gap between them, averaged over bins of a third of the smoothing. */
    private final class Piece {

        private final double base;
        private final double top;
        private final double[] knots;
        private final double[][] values;
        private final double[] widths;

        Piece(double[] height, int from, int to, double[][] columns) {
            base = height[from];
            top = height[to - 1];
            double binDepth = smoothing / 3;
            double[] sumOfHeights = new double[to - from];
            double[][] sums = new double[columns.length][to - from];
            int[] count = new int[to - from];
            int bin = -1;
            double binNumber = Double.NaN;
            for (int k = from; k < to; k++) {
                double number = Math.floor((height[k] - base) / binDepth);
                if (number != binNumber) {
                    binNumber = number;
                    bin++;
                }
                count[bin]++;
                sumOfHeights[bin] += height[k] - base;
                for (int c = 0; c < columns.length; c++) {
                    sums[c][bin] += columns[c][k];
                }
            }
            int n = bin + 1;
            if (n == 1) {
                // all levels within one bin: nothing finer than their two ends can be said
                knots = new double[] {base, top};
                values = new double[columns.length][];
                for (int c = 0; c < columns.length; c++) {
                    values[c] = new double[] {columns[c][from], columns[c][to - 1]};
                }
            } else {
                knots = new double[n];
                values = new double[columns.length][n];
                for (int i = 0; i < n; i++) {
                    knots[i] = base + sumOfHeights[i] / count[i];
                    for (int c = 0; c < columns.length; c++) {
                        values[c][i] = sums[c][i] / count[i];
                    }
                }
            }
            widths = RoundedCornerFunction.cornerWidths(knots, smoothing);
        }

        RoundedCornerFunction rounded(int column) {
            return new RoundedCornerFunction(knots, values[column], widths);
        }

        RoundedCornerFunction sorted() {
            return new RoundedCornerFunction(knots, nonDecreasing(values[0]), widths);
        }
    }

    /**
     * The non-decreasing sequence nearest to the given one in the least-squares sense (isotonic regression by pooling
     * adjacent violators, equal weights), in one pass.
     */
    static double[] nonDecreasing(double[] values) {
        int n = values.length;
        double[] mean = new double[n];
        int[] size = new int[n];
        int blocks = 0;
        for (double value : values) {
            mean[blocks] = value;
            size[blocks] = 1;
            blocks++;
            while (blocks > 1 && mean[blocks - 2] > mean[blocks - 1]) {
                int together = size[blocks - 2] + size[blocks - 1];
                mean[blocks - 2] = (mean[blocks - 2] * size[blocks - 2] + mean[blocks - 1] * size[blocks - 1]) / together;
                size[blocks - 2] = together;
                blocks--;
            }
        }
        double[] sorted = new double[n];
        int at = 0;
        for (int b = 0; b < blocks; b++) {
            Arrays.fill(sorted, at, at + size[b], mean[b]);
            at += size[b];
        }
        return sorted;
    }
}
