package org.shearbook.met.richardson;

import java.util.Arrays;
import java.util.List;
import org.shearbook.met.profile.AtmosphericConstants;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;

/** Standard errors of shear and N² that instrument noise leaves in the rounded functions of an ascent. */
final class GradientError {

    /*
     * The slope of a rounded function is linear in the level values:
     *
     *   f'(z) = Σ_j m_j [Φ(q_j) − Φ(q_(j+1))],   q_j = (z − z_j)/s_j,   m_j slope between knots j and j+1,
     *
     * with Φ = 1 for the lowest knot and 0 for the highest, since end segments go on. With a_j the bracket over the
     * distance of the two knots, the weight of knot j is a_(j−1) − a_j, and a level's weight is that of its bin over the
     * number of levels in it. The variance of the slope is then the quadratic form of the weights with the covariance of
     * the levels. For errors with correlation exp(−Δz/L) it needs one pass: with r_k what is carried up from below,
     *
     *   r_k = exp(−Δz_k/L) (r_(k−1) + W_(k−1)),   variance = σ² Σ_k W_k (W_k + 2 r_k).
     *
     * Corners further than REACH widths away weigh nothing, so a height costs only the levels around it.
     *
     * Exact for u, v and the measured buoyancy. The sorted buoyancy is not linear in the levels; it differs only where
     * the air is overturned. Errors of pressure and humidity are left out: over one window they are small beside that
     * of temperature except in warm cloud.
     */

    private static final double REACH = 6;

    private GradientError() {
    }

    /**
     * Standard error of one shear component.
     *
     * @param ascendingHeights [m], shape {@code [m]}
     * @return [s⁻¹], shape {@code [m]}; NaN outside the pieces
     */
    static double[] ofShear(VerticalProfile profile, List<LevelBins> pieces, InstrumentNoise noise, double[] ascendingHeights) {
        double[] height = profile.windHeights();
        double[] scale = new double[height.length];
        Arrays.fill(scale, noise.wind());
        return errors(pieces, height, scale, noise.windCorrelationLength(), ascendingHeights);
    }

    /** Standard error of N² as measured [s⁻²]; an error δT moves B by g δT/T. */
    static double[] ofBuoyancyFrequencySquared(
            VerticalProfile profile, List<LevelBins> pieces, InstrumentNoise noise, double[] ascendingHeights) {
        double[] height = profile.temperatureHeights();
        double[] scale = profile.thermodynamicLevels().stream().mapToDouble(ThermodynamicLevel::temperature)
                .map(t -> AtmosphericConstants.GRAVITY * noise.temperature() / t).toArray();
        return errors(pieces, height, scale, 0, ascendingHeights);
    }

    private static double[] errors(
            List<LevelBins> pieces, double[] height, double[] scale, double correlationLength, double[] ascendingHeights) {
        double[] errors = new double[ascendingHeights.length];
        Arrays.fill(errors, Double.NaN);
        for (LevelBins piece : pieces) {
            Weights weights = new Weights(piece, height, scale, correlationLength);
            for (int i = 0; i < errors.length; i++) {
                if (ascendingHeights[i] >= piece.base() && ascendingHeights[i] <= piece.top()) {
                    errors[i] = Math.sqrt(weights.variance(ascendingHeights[i]));
                }
            }
        }
        return errors;
    }

    private static final class Weights {

        private final LevelBins piece;
        private final double[] scale;
        private final double[] memory;
        private final double[] knots;
        private final double[] widths;
        /** Weight of each bin at the height last asked for. */
        private final double[] weight;
        private final double[] turnedAbove;
        private final double[] begunAbove;

        Weights(LevelBins piece, double[] height, double[] scale, double correlationLength) {
            this.piece = piece;
            this.scale = scale;
            knots = piece.knots();
            widths = piece.widths();
            weight = new double[knots.length];
            memory = new double[piece.levelCount()];
            for (int k = 1; k < memory.length; k++) {
                double distance = height[piece.firstLevel() + k] - height[piece.firstLevel() + k - 1];
                memory[k] = correlationLength > 0 ? Math.exp(-distance / correlationLength) : 0;
            }
            turnedAbove = new double[knots.length];
            begunAbove = new double[knots.length];
            for (int j = 0; j < knots.length; j++) {
                turnedAbove[j] = Math.max(j == 0 ? Double.NEGATIVE_INFINITY : turnedAbove[j - 1], knots[j] + REACH * widths[j]);
            }
            for (int j = knots.length - 1; j >= 0; j--) {
                begunAbove[j] = Math.min(j == knots.length - 1 ? Double.POSITIVE_INFINITY : begunAbove[j + 1], knots[j] - REACH * widths[j]);
            }
        }

        double variance(double z) {
            int last = knots.length - 1;
            // bins below `from` have Φ = 1, those above `to` have Φ = 0
            int from = Math.max(0, Math.min(last - 1, firstAbove(turnedAbove, z) - 1));
            int to = Math.min(last, Math.max(from + 1, firstAbove(begunAbove, z)));
            double below = 0;
            double phi = from == 0 ? 1 : fraction(from, z);
            for (int j = from; j <= to; j++) {
                double here = 0;
                double next = 0;
                if (j < last) {
                    next = j + 1 == last ? 0 : fraction(j + 1, z);
                    here = (phi - next) / (knots[j + 1] - knots[j]);
                }
                weight[j] = below - here;
                below = here;
                phi = next;
            }
            double variance = 0;
            double carried = 0;
            double previous = 0;
            for (int k = firstLevelOf(from); k < memory.length; k++) {
                int bin = piece.binOfLevel(k);
                if (bin > to) {
                    break;
                }
                double w = bin < 0 ? 0 : weight[bin] / piece.levelsIn(bin) * scale[piece.firstLevel() + k];
                carried = memory[k] * (carried + previous);
                variance += w * (w + 2 * carried);
                previous = w;
            }
            return Math.max(0, variance);
        }

        private double fraction(int knot, double z) {
            return NormalLaw.distribution((z - knots[knot]) / widths[knot]);
        }

        private int firstLevelOf(int bin) {
            int low = 0;
            int high = memory.length - 1;
            while (low < high) {
                int middle = (low + high) >>> 1;
                // a level without a bin lies between the only two bins there are then
                int found = piece.binOfLevel(middle) < 0 ? 0 : piece.binOfLevel(middle);
                if (found < bin) {
                    low = middle + 1;
                } else {
                    high = middle;
                }
            }
            return low;
        }

        private static int firstAbove(double[] ascending, double z) {
            int low = 0;
            int high = ascending.length;
            while (low < high) {
                int middle = (low + high) >>> 1;
                if (ascending[middle] <= z) {
                    low = middle + 1;
                } else {
                    high = middle;
                }
            }
            return low;
        }
    }
}
