package org.shearbook.met.richardson;

import static org.shearbook.met.profile.AtmosphericConstants.GRAVITY;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.VerticalProfile;

/** Cuts an ascent at its gaps, averages what is dense, and rounds the corners. */
final class FlowBuilder {

    private final VerticalProfile profile;
    private final double smoothing;
    private final double[] buoyancy;

    /** @param smoothing standard deviation of the smoothing [m] */
    FlowBuilder(VerticalProfile profile, double smoothing) {
        this(profile, smoothing, buoyancy(profile.virtualPotentialTemperatures()));
    }

    /**
     * @param smoothing standard deviation of the smoothing [m]
     * @param buoyancy  cumulative B at the thermodynamic levels [m s⁻²], in place of that of unsaturated air
     */
    FlowBuilder(VerticalProfile profile, double smoothing, double[] buoyancy) {
        this.profile = profile;
        this.smoothing = smoothing;
        this.buoyancy = buoyancy;
    }

    /** Flows from the lowest up; empty when wind and temperature nowhere overlap. */
    List<RoundedFlow> build() {
        List<LevelBins> windPieces = windPieces();
        List<LevelBins> temperaturePieces = temperaturePieces();
        double[] u = profile.eastward();
        double[] v = profile.northward();
        List<RoundedFlow> flows = new ArrayList<>();
        int t = 0;
        int w = 0;
        while (t < temperaturePieces.size() && w < windPieces.size()) {
            LevelBins temperature = temperaturePieces.get(t);
            LevelBins wind = windPieces.get(w);
            double base = Math.max(temperature.base(), wind.base());
            double top = Math.min(temperature.top(), wind.top());
            if (base < top) {
                double[] b = temperature.averaged(buoyancy);
                flows.add(new RoundedFlow(new HeightBand(base, top), wind.rounded(wind.averaged(u)), wind.rounded(wind.averaged(v)),
                        temperature.rounded(b), temperature.rounded(nonDecreasing(b))));
            }
            if (temperature.top() <= wind.top()) {
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

    /** Stretches of wind levels without a gap, from the lowest up. */
    List<LevelBins> windPieces() {
        return pieces(profile.windHeights(), profile.windGaps());
    }

    /** Stretches of thermodynamic levels without a gap, from the lowest up. */
    List<LevelBins> temperaturePieces() {
        return pieces(profile.temperatureHeights(), profile.temperatureGaps());
    }

    private List<LevelBins> pieces(double[] height, List<HeightBand> gaps) {
        List<LevelBins> pieces = new ArrayList<>();
        int first = 0;
        for (int k = 1; k <= height.length; k++) {
            boolean cut = k == height.length || isCut(gaps, height[k - 1], height[k]);
            if (cut) {
                if (k - first >= 2) {
                    pieces.add(new LevelBins(height, first, k, smoothing));
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
