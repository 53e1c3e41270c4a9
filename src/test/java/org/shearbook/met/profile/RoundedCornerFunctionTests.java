package org.shearbook.met.profile;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.apache.commons.math3.analysis.integration.IterativeLegendreGaussIntegrator;
import org.junit.jupiter.api.Test;

/** Expected values are exact (analytic) unless a test says otherwise. */
class RoundedCornerFunctionTests {

    private static final long SEED = 20261201L;

    @Test
    void aStraightLineStaysExactlyStraight() {
        double[] knots = {0, 7, 50, 51.5, 400, 1000};
        double[] values = Arrays.stream(knots).map(z -> 3 - 0.02 * z).toArray();
        RoundedCornerFunction line = new RoundedCornerFunction(knots, values,
                RoundedCornerFunction.cornerWidths(knots, 85));
        for (double z = -500; z < 1500; z += 13) {
            assertThat(line.value(z)).isCloseTo(3 - 0.02 * z, within(1e-12));
            assertThat(line.firstDerivative(z)).isCloseTo(-0.02, within(1e-15));
            assertThat(line.secondDerivative(z)).isCloseTo(0, within(1e-15));
        }
    }

    @Test
    void aSingleCornerOfWidthOneIsTheIntegralOfTheNormalDistribution() {
        RoundedCornerFunction corner = new RoundedCornerFunction(new double[] {-10, 0, 10}, new double[] {0, 0, 10},
                new double[] {1, 1, 1});
        // G(0) and Φ(1), G(1): tables of the normal distribution, from memory, ten digits
        assertThat(corner.value(0)).isCloseTo(0.3989422804, within(1e-10));
        assertThat(corner.firstDerivative(1)).isCloseTo(0.8413447461, within(1e-10));
        assertThat(corner.value(1)).isCloseTo(0.8413447461 + 0.2419707245, within(2e-10));
        assertThat(corner.secondDerivative(1)).isCloseTo(0.2419707245, within(1e-10));
        double[] derivatives = new double[9];
        corner.derivatives(1, derivatives);
        // (-1)^m He_m(1) G(1) with He_1..He_6 at 1: 1, 0, -2, -2, 6, 16
        double[] hermite = {1, -1, 0, 2, -2, -6, 16};
        for (int m = 0; m <= 6; m++) {
            assertThat(derivatives[2 + m]).isCloseTo(hermite[m] * 0.2419707245, within(5e-9));
        }
    }

    @Test
    void equalWidthsGiveTheInterpolantConvolvedWithAGaussian() {
        double[] knots = {0, 40, 100, 130, 260, 300};
        double[] values = {1, 4, -2, 0, 3, 3};
        double width = 21;
        double[] widths = new double[knots.length];
        Arrays.fill(widths, width);
        RoundedCornerFunction rounded = new RoundedCornerFunction(knots, values, widths);
        IterativeLegendreGaussIntegrator integrator = new IterativeLegendreGaussIntegrator(8, 1e-9, 1e-12);
        for (double z : new double[] {-30, 0, 40, 77, 128, 200, 299, 340}) {
            double convolved = 0;
            // piece by piece, so that the integrand is smooth
            double[] pieces = {z - 9 * width, 40, 100, 130, 260, z + 9 * width};
            for (int i = 1; i < pieces.length; i++) {
                double from = Math.max(pieces[i - 1], z - 9 * width);
                double to = Math.min(pieces[i], z + 9 * width);
                if (to > from) {
                    convolved += integrator.integrate(100_000, x -> interpolated(knots, values, x)
                            * Math.exp(-0.5 * (x - z) * (x - z) / (width * width)) / (width * Math.sqrt(2 * Math.PI)),
                            from, to);
                }
            }
            assertThat(rounded.value(z)).isCloseTo(convolved, within(1e-7));
        }
    }

    @Test
    void everyDerivativeIsTheSlopeOfTheOneBelow() {
        Random random = new Random(SEED);
        RoundedCornerFunction function = randomFunction(random, 40, 12);
        double[] below = new double[9];
        double[] above = new double[9];
        double[] at = new double[9];
        double step = 0.05;
        for (int trial = 0; trial < 200; trial++) {
            double z = function.lowestKnot() + random.nextDouble() * (function.highestKnot() - function.lowestKnot());
            function.derivatives(z, at);
            function.derivatives(z - step, below);
            function.derivatives(z + step, above);
            double scale = 1;
            for (int order = 0; order < 8; order++) {
                assertThat((above[order] - below[order]) / (2 * step)).as("order %d at %f, seed %d", order + 1, z, SEED)
                        .isCloseTo(at[order + 1], within(5e-4 * scale));
                scale /= 3;
            }
        }
    }

    @Test
    void manyHeightsGiveTheSameAsOneByOne() {
        Random random = new Random(SEED + 1);
        RoundedCornerFunction function = randomFunction(random, 300, 20);
        double[] heights = random.doubles(500, function.lowestKnot() - 300, function.highestKnot() + 300).sorted()
                .toArray();
        double[][] bulk = new double[9][heights.length];
        function.derivatives(heights, bulk);
        double[] value = new double[500];
        double[] first = new double[500];
        double[] second = new double[500];
        function.evaluate(heights, value, first, second);
        double[] at = new double[9];
        for (int i = 0; i < heights.length; i++) {
            function.derivatives(heights[i], at);
            for (int k = 0; k < 9; k++) {
                assertThat(bulk[k][i]).isEqualTo(at[k]);
            }
            assertThat(value[i]).isEqualTo(function.value(heights[i]));
            assertThat(first[i]).isEqualTo(function.firstDerivative(heights[i]));
            assertThat(second[i]).isEqualTo(function.secondDerivative(heights[i]));
        }
    }

    @Test
    void skippingTurnedCornersAgreesWithTheFullSum() {
        Random random = new Random(SEED + 2);
        double[] knots = new double[60];
        double[] values = new double[60];
        for (int j = 0; j < 60; j++) {
            knots[j] = j == 0 ? 0 : knots[j - 1] + (j < 30 ? 10 : 300) * (0.5 + random.nextDouble());
            values[j] = random.nextGaussian();
        }
        double[] widths = RoundedCornerFunction.cornerWidths(knots, 20);
        RoundedCornerFunction function = new RoundedCornerFunction(knots, values, widths);
        for (double z = -100; z < knots[59] + 100; z += 17) {
            double sum = values[0] + (values[1] - values[0]) / knots[1] * z;
            for (int j = 1; j < 59; j++) {
                double change = (values[j + 1] - values[j]) / (knots[j + 1] - knots[j])
                        - (values[j] - values[j - 1]) / (knots[j] - knots[j - 1]);
                double q = (z - knots[j]) / widths[j];
                sum += change * ((z - knots[j]) * 0.5 * org.apache.commons.math3.special.Erf.erfc(-q / Math.sqrt(2))
                        + widths[j] * Math.exp(-0.5 * q * q) / Math.sqrt(2 * Math.PI));
            }
            assertThat(function.value(z)).isCloseTo(sum, within(1e-8));
        }
    }

    @Test
    void addingALineAddsItAndScalingHeightsScalesDerivatives() {
        Random random = new Random(SEED + 3);
        RoundedCornerFunction function = randomFunction(random, 50, 15);
        double[] knots = function.knotHeights();
        double[] shifted = new double[knots.length];
        double[] stretchedKnots = new double[knots.length];
        double[] stretchedWidths = function.cornerWidths();
        for (int j = 0; j < knots.length; j++) {
            shifted[j] = function.values()[j] + 25 + 0.003 * knots[j];
            stretchedKnots[j] = 4 * knots[j];
            stretchedWidths[j] *= 4;
        }
        RoundedCornerFunction moved = new RoundedCornerFunction(knots, shifted, function.cornerWidths());
        RoundedCornerFunction stretched = new RoundedCornerFunction(stretchedKnots, function.values(), stretchedWidths);
        for (double z = 0; z < function.highestKnot(); z += 11) {
            assertThat(moved.value(z)).isCloseTo(function.value(z) + 25 + 0.003 * z, within(1e-10));
            assertThat(moved.firstDerivative(z)).isCloseTo(function.firstDerivative(z) + 0.003, within(1e-12));
            assertThat(moved.secondDerivative(z)).isCloseTo(function.secondDerivative(z), within(1e-12));
            assertThat(stretched.value(4 * z)).isCloseTo(function.value(z), within(1e-10));
            assertThat(stretched.secondDerivative(4 * z)).isCloseTo(function.secondDerivative(z) / 16, within(1e-12));
        }
    }

    @Test
    void valuesThatNeverDecreaseGiveASlopeThatIsNeverNegative() {
        Random random = new Random(SEED + 4);
        double[] knots = new double[80];
        double[] values = new double[80];
        for (int j = 1; j < 80; j++) {
            knots[j] = knots[j - 1] + 5 + 200 * random.nextDouble() * random.nextDouble();
            values[j] = values[j - 1] + Math.max(0, random.nextGaussian());
        }
        double[] widths = new double[80];
        Arrays.fill(widths, 30);
        RoundedCornerFunction function = new RoundedCornerFunction(knots, values, widths);
        for (double z = -100; z < knots[79] + 100; z += 3) {
            assertThat(function.firstDerivative(z)).isGreaterThan(-1e-9);
        }
    }

    @Test
    void aCoarseAscentRoundsItsOwnCorners() {
        double[] knots = {100, 900, 1000, 3000};
        assertThat(RoundedCornerFunction.cornerWidths(knots, 85)).containsExactly(200, 85, 85, 500);
        assertThat(RoundedCornerFunction.cornerWidths(knots, 0)).containsExactly(200, 25, 25, 500);
        RoundedCornerFunction function = new RoundedCornerFunction(knots, new double[] {5, 9, 4, 30},
                RoundedCornerFunction.cornerWidths(knots, 85));
        assertThat(function.narrowestCorner(0, 4000)).isEqualTo(85);
        assertThat(function.narrowestCorner(1100, 2900)).isEqualTo(85);
        // far from every corner the interpolant itself
        assertThat(function.value(2000)).isCloseTo(17, within(1e-9));
        assertThat(function.firstDerivative(2000)).isCloseTo(0.013, within(1e-12));
    }

    @Test
    void twoLevelsAreALine() {
        RoundedCornerFunction line = new RoundedCornerFunction(new double[] {10, 20}, new double[] {1, 2},
                new double[] {1, 1});
        assertThat(line.value(0)).isCloseTo(0, within(1e-15));
        assertThat(line.value(30)).isCloseTo(3, within(1e-15));
        assertThat(line.secondDerivative(15)).isZero();
    }

    @Test
    void fullWidthAtHalfMaximumAndStandardDeviationBelongTogether() {
        // exact: 200 / (2 sqrt(2 ln 2)) = 84.932…
        assertThat(RoundedCornerFunction.standardDeviation(200)).isCloseTo(84.93218, within(1e-5));
    }

    @Test
    void badInputIsRefusedWithItsPlace() {
        double[] two = {0, 1};
        assertThatIllegalArgumentException().isThrownBy(() -> new RoundedCornerFunction(new double[] {5},
                new double[] {1}, new double[] {1})).withMessageContaining("at least two knots");
        assertThatIllegalArgumentException().isThrownBy(() -> new RoundedCornerFunction(new double[] {0, 10, 10},
                new double[3], new double[] {1, 1, 1})).withMessageContaining("knotHeights[2]");
        assertThatIllegalArgumentException().isThrownBy(() -> new RoundedCornerFunction(two,
                new double[] {1, Double.NaN}, new double[] {1, 1})).withMessageContaining("values[1]");
        assertThatIllegalArgumentException().isThrownBy(() -> new RoundedCornerFunction(two, two,
                new double[] {1, 0})).withMessageContaining("cornerWidths[1]");
        assertThatIllegalArgumentException().isThrownBy(() -> new RoundedCornerFunction(two, two,
                new double[] {1})).withMessageContaining("cornerWidths (1)");
        assertThatIllegalArgumentException().isThrownBy(() -> RoundedCornerFunction.cornerWidths(two, Double.NaN))
                .withMessageContaining("smoothing");
        RoundedCornerFunction line = new RoundedCornerFunction(two, two, new double[] {1, 1});
        assertThatIllegalArgumentException().isThrownBy(() -> line.value(Double.POSITIVE_INFINITY));
        assertThatIllegalArgumentException().isThrownBy(() -> line.derivatives(0, new double[10]))
                .withMessageContaining("order 0 to 8");
        assertThatIllegalArgumentException().isThrownBy(() -> line.evaluate(new double[] {1, 0}, new double[2],
                new double[2], new double[2])).withMessageContaining("ascendingHeights[1]");
    }

    private static RoundedCornerFunction randomFunction(Random random, int levels, double smoothing) {
        double[] knots = new double[levels];
        double[] values = new double[levels];
        for (int j = 0; j < levels; j++) {
            knots[j] = j == 0 ? 0 : knots[j - 1] + 5 + 60 * random.nextDouble();
            values[j] = 5 * random.nextGaussian();
        }
        return new RoundedCornerFunction(knots, values, RoundedCornerFunction.cornerWidths(knots, smoothing));
    }

    private static double interpolated(double[] knots, double[] values, double z) {
        int j = 0;
        while (j < knots.length - 2 && z > knots[j + 1]) {
            j++;
        }
        return values[j] + (values[j + 1] - values[j]) * (z - knots[j]) / (knots[j + 1] - knots[j]);
    }
}
