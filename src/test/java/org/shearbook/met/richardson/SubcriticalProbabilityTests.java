package org.shearbook.met.richardson;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SubcriticalProbabilityTests {

    private static final double FLAT = Double.POSITIVE_INFINITY;

    @ParameterizedTest
    @CsvSource({
        "0.02, 0.002, 1e-4, 1e-5, 0.5214", "0.02, 0.004, 1e-4, 1e-5, 0.5412", "0.02, 0.004, 1.3e-4, 2e-5, 0.2946",
        "0.03, 0.006, 4e-4, 3e-5, 0.0634", "0.01, 0.005, 1e-4, 1e-5, 0.0375"})
    void theFlatPriorGivesTheReferenceValues(double shear, double shearError, double stability, double stabilityError, double expected) {
        // computed elsewhere by the same formula, there checked against 4e5 random samples
        assertEquals(expected, SubcriticalProbability.of(shear, shearError, stability, stabilityError, FLAT), 1e-4);
    }

    @Test
    void itAgreesWithCountingRandomSamples() {
        long seed = 20310312;
        System.out.println("SubcriticalProbabilityTests seed " + seed);
        Random random = new Random(seed);
        double[][] cases = {{0.02, 0.004, 1.0e-4, 2e-5, 1e-4}, {0.012, 0.006, 0.8e-4, 3e-5, 2e-4}, {0.03, 0.002, 2.2e-4, 1e-5, 3e-4}};
        for (double[] c : cases) {
            double k = c[4] / (c[4] + c[1] * c[1]);
            double deviation = Math.sqrt(k) * c[1];
            int samples = 200_000;
            int below = 0;
            for (int i = 0; i < samples; i++) {
                double u = k * c[0] + deviation * random.nextGaussian();
                double v = deviation * random.nextGaussian();
                below += u * u + v * v > 4 * Math.max(0, c[2] + c[3] * random.nextGaussian()) ? 1 : 0;
            }
            // three standard deviations of the count
            double p = (double) below / samples;
            assertEquals(p, SubcriticalProbability.of(c[0], c[1], c[2], c[3], c[4]), 3 * Math.sqrt(p * (1 - p) / samples) + 5e-4);
        }
    }

    @Test
    void theClosedFormIsCloseNearOneHalf() {
        for (double shear = 0.017; shear <= 0.024; shear += 0.001) {
            double exact = SubcriticalProbability.of(shear, 0.003, 1e-4, 1e-5, 1e-4);
            assertEquals(exact, SubcriticalProbability.fast(shear, 0.003, 1e-4, 1e-5, 1e-4), 0.035);
        }
    }

    @Test
    void onlyTheEmpiricalPriorIsCalibrated() {
        // direction and rough size computed elsewhere with 4e5 cases: truth 0.140, naive 0.223, flat prior 0.304, empirical 0.151
        long seed = 14;
        System.out.println("SubcriticalProbabilityTests seed " + seed);
        Random random = new Random(seed);
        double tau = 0.010;
        double noise = 0.006;
        double stabilityError = 1e-5;
        int cases = 60_000;
        double truth = 0;
        double naive = 0;
        double flat = 0;
        double empirical = 0;
        double brierFlat = 0;
        double brierEmpirical = 0;
        double observedSquares = 0;
        double[] shear = new double[cases];
        double[] stability = new double[cases];
        boolean[] subcritical = new boolean[cases];
        for (int i = 0; i < cases; i++) {
            double u = tau * random.nextGaussian();
            double v = tau * random.nextGaussian();
            // N = 0.0105 s⁻¹ give or take a fifth in N²
            double n2 = Math.max(1e-6, 1.1e-4 * (1 + 0.2 * random.nextGaussian()));
            subcritical[i] = n2 < 0.25 * (u * u + v * v);
            double measuredU = u + noise * random.nextGaussian();
            double measuredV = v + noise * random.nextGaussian();
            shear[i] = Math.hypot(measuredU, measuredV);
            stability[i] = n2 + stabilityError * random.nextGaussian();
            observedSquares += 0.5 * shear[i] * shear[i];
        }
        double prior = observedSquares / cases - noise * noise;
        double[] sumOfProbability = new double[5];
        double[] happened = new double[5];
        int[] count = new int[5];
        for (int i = 0; i < cases; i++) {
            double happens = subcritical[i] ? 1 : 0;
            double withFlat = SubcriticalProbability.of(shear[i], noise, stability[i], stabilityError, FLAT);
            double withPrior = SubcriticalProbability.of(shear[i], noise, stability[i], stabilityError, prior);
            truth += happens / cases;
            naive += (stability[i] < 0.25 * shear[i] * shear[i] ? 1.0 : 0) / cases;
            flat += withFlat / cases;
            empirical += withPrior / cases;
            brierFlat += (withFlat - happens) * (withFlat - happens) / cases;
            brierEmpirical += (withPrior - happens) * (withPrior - happens) / cases;
            int bin = Math.min(4, (int) (5 * withPrior));
            sumOfProbability[bin] += withPrior;
            happened[bin] += happens;
            count[bin]++;
        }
        assertEquals(tau * tau, prior, 0.02 * tau * tau);
        assertTrue(naive > 1.3 * truth, "naive count " + naive + ", truth " + truth);
        assertTrue(flat > 1.7 * truth, "flat prior " + flat + ", truth " + truth);
        assertEquals(truth, empirical, 0.015);
        assertTrue(brierEmpirical < 0.75 * brierFlat, brierEmpirical + " against " + brierFlat);
        assertTrue(brierEmpirical < 0.75 * truth * (1 - truth), brierEmpirical + " against climatology");
        for (int bin = 0; bin < 5; bin++) {
            assertTrue(count[bin] > 300);
            // a few hundred to a few thousand cases a bin: 0.05 is beyond three standard deviations of a calibrated one
            assertEquals(happened[bin] / count[bin], sumOfProbability[bin] / count[bin], 0.05, "bin " + bin);
        }
    }

    @Test
    void bothFormsOfTheFunctionBehindItAgreeWhereBothHold() {
        for (double a = 1; a <= 20; a += 1.7) {
            for (double b = Math.max(0.5, a - 6); b <= a + 6; b += 0.9) {
                assertEquals(MarcumQ.series(0.5 * a * a, 0.5 * b * b), MarcumQ.integral(a, b), 1e-6, a + ", " + b);
            }
        }
        // exact: without a mean the length has the Rayleigh law
        assertEquals(Math.exp(-2), MarcumQ.q1(0, 2), 1e-12);
        assertEquals(1, MarcumQ.q1(3, 0));
        // exact: Q₁(a, a) = (1 + e^(−a²) I₀(a²)) / 2
        assertEquals(0.5 * (1 + MarcumQ.scaledBessel(1)), MarcumQ.q1(1, 1), 1e-6);
        assertEquals(0.5 * (1 + MarcumQ.scaledBessel(10_000)), MarcumQ.q1(100, 100), 1e-6);
        assertEquals(0, MarcumQ.q1(1000, 1010));
        assertEquals(1, MarcumQ.q1(1010, 1000));
    }

    @Test
    void withoutErrorsItIsYesOrNo() {
        assertEquals(1, SubcriticalProbability.of(0.0201, 0, 1e-4, 0, 1e-4));
        assertEquals(0, SubcriticalProbability.of(0.0199, 0, 1e-4, 0, 1e-4));
        assertEquals(1, SubcriticalProbability.of(0.001, 0.001, -1e-4, 0, 1e-4));
        assertEquals(1, SubcriticalProbability.fast(0.0201, 0, 1e-4, 0, 1e-4));
    }

    @Test
    void missingGivesMissingAndNonsenseIsRefused() {
        assertTrue(Double.isNaN(SubcriticalProbability.of(Double.NaN, 0.001, 1e-4, 1e-5, 1e-4)));
        assertTrue(Double.isNaN(SubcriticalProbability.fast(0.01, 0.001, Double.NaN, 1e-5, 1e-4)));
        assertThrows(IllegalArgumentException.class, () -> SubcriticalProbability.of(-0.01, 0.001, 1e-4, 1e-5, 1e-4));
        assertThrows(IllegalArgumentException.class, () -> SubcriticalProbability.of(0.01, -0.001, 1e-4, 1e-5, 1e-4));
        assertThrows(IllegalArgumentException.class, () -> SubcriticalProbability.of(0.01, 0.001, 1e-4, 1e-5, 0));
        assertThrows(IllegalArgumentException.class, () -> SubcriticalProbability.of(Double.POSITIVE_INFINITY, 0.001, 1e-4, 1e-5, 1));
    }
}
