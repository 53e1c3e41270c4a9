package org.shearbook.desk.timeheight;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.timeheight.LevelThinning.Quantity;

/** Laws of the thinning, on seeded random soundings. */
class LevelThinningPropertyTests {

    private static final double[] THRESHOLDS = {0.25, 1};
    private static final int ROUNDS = 200;

    @Test
    void everyCrossingIsKeptAtItsPlaceAndNoneIsAdded() {
        forRandomSoundings((seed, coordinate, values) -> {
            int[] kept = thinned(coordinate, values);
            for (double threshold : THRESHOLDS) {
                assertThat(crossings(pick(coordinate, kept), pick(values, kept), threshold)).as("seed %d, threshold %s", seed, threshold)
                        .isEqualTo(crossings(coordinate, values, threshold));
            }
        });
    }

    @Test
    void noLevelLeftOutIsFartherFromTheStraightLineThanTheTolerance() {
        forRandomSoundings((seed, coordinate, values) -> {
            int[] kept = thinned(coordinate, values);
            for (int i = 0; i + 1 < kept.length; i++) {
                for (int k = kept[i] + 1; k < kept[i + 1]; k++) {
                    double share = (coordinate[k] - coordinate[kept[i]]) / (coordinate[kept[i + 1]] - coordinate[kept[i]]);
                    double line = values[kept[i]] + share * (values[kept[i + 1]] - values[kept[i]]);
                    assertThat(Double.isNaN(values[k]) ? 0 : Math.abs(line - values[k])).as("seed %d, level %d", seed, k).isLessThanOrEqualTo(0.01);
                }
            }
        });
    }

    @Test
    void missingStretchesStayExactlyAsLong() {
        forRandomSoundings((seed, coordinate, values) -> {
            int[] kept = thinned(coordinate, values);
            boolean[] isKept = new boolean[values.length];
            Arrays.stream(kept).forEach(k -> isKept[k] = true);
            for (int k = 0; k + 1 < values.length; k++) {
                if (Double.isNaN(values[k]) != Double.isNaN(values[k + 1])) {
                    assertThat(isKept[k] && isKept[k + 1]).as("seed %d, edge above level %d", seed, k).isTrue();
                }
            }
        });
    }

    private interface Law {
        void holds(long seed, double[] coordinate, double[] values);
    }

    private static void forRandomSoundings(Law law) {
        for (long seed = 20310312; seed < 20310312 + ROUNDS; seed++) {
            Random random = new Random(seed);
            int n = 2 + random.nextInt(400);
            double[] coordinate = new double[n];
            double[] values = new double[n];
            double at = 0;
            double value = random.nextDouble() * 2;
            boolean missing = false;
            for (int k = 0; k < n; k++) {
                at += 0.1 + random.nextDouble();
                value += random.nextGaussian() * 0.05;
                missing = random.nextDouble() < 0.03 ? !missing : missing;
                coordinate[k] = at;
                values[k] = missing ? Double.NaN : value;
            }
            law.holds(seed, coordinate, values);
        }
    }

    private static int[] thinned(double[] coordinate, double[] values) {
        return LevelThinning.kept(coordinate, List.of(new Quantity(values, 0.01)), values, THRESHOLDS);
    }

    private static double[] pick(double[] values, int[] kept) {
        return Arrays.stream(kept).mapToDouble(k -> values[k]).toArray();
    }

    private static List<Double> crossings(double[] coordinate, double[] values, double threshold) {
        List<Double> found = new ArrayList<>();
        for (int k = 0; k + 1 < values.length; k++) {
            if (!Double.isNaN(values[k]) && !Double.isNaN(values[k + 1]) && values[k] < threshold != values[k + 1] < threshold) {
                found.add(coordinate[k] + (threshold - values[k]) / (values[k + 1] - values[k]) * (coordinate[k + 1] - coordinate[k]));
            }
        }
        return found;
    }
}
