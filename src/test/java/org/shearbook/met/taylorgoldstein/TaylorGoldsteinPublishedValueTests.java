package org.shearbook.met.taylorgoldstein;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.shearbook.met.taylorgoldstein.AnalyticShearFlows.TANH_CORNER;
import static org.shearbook.met.taylorgoldstein.AnalyticShearFlows.root;
import static org.shearbook.met.taylorgoldstein.AnalyticShearFlows.throughKnots;

import java.util.function.DoubleFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Flows whose stability is known. Units: half the velocity difference 1, half the depth 1. Beside each value stands
 * where it comes from: "closed form" is a formula of the paper evaluated here; "computed elsewhere" means shooting
 * (DOP853) and mapped Chebyshev collocation, which agree to the digits given, unless only one of them is named.
 */
class TaylorGoldsteinPublishedValueTests {

    /** Rayleigh (1880), Proc. London Math. Soc. 11, 57-70: U = z for |z| < 1, uniform beyond. Closed form. */
    private static double rayleighGrowth(double k) {
        double square = ((1 - 2 * k) * (1 - 2 * k) - Math.exp(-4 * k)) / (4 * k * k);
        return square < 0 ? k * Math.sqrt(-square) : 0;
    }

    @Test
    void rayleighsLayerGrowsFastestAtHisWavenumber() {
        // computed elsewhere (layered eigenproblem, 1e-13)
        assertThat(rayleighGrowth(0.398406065010)).isCloseTo(0.201185585637, within(1e-10));
        assertThat(rayleighGrowth(0.2)).isCloseTo(0.149439757, within(1e-9));
        assertThat(rayleighGrowth(0.6)).isCloseTo(0.112603234, within(1e-9));
        assertThat(rayleighGrowth(0.639232271381 - 1e-9)).isPositive();
        assertThat(rayleighGrowth(0.639232271381 + 1e-9)).isZero();
    }

    @ParameterizedTest
    // computed elsewhere (real-axis and complex-path Numerov), of the profile with Gaussian corners
    @CsvSource({"0.3984, 0.1, 0.201146", "0.3984, 0.05, 0.201182", "0.3984, 0.025, 0.201185",
            "0.6, 0.1, 0.117268", "0.6, 0.05, 0.113771", "0.6, 0.025, 0.112892"})
    void rayleighsLayerWithRoundedCorners(double k, double corner, double growth) {
        assertThat(k * roundedRayleigh(k, corner)).isCloseTo(growth, within(2e-5));
    }

    @ParameterizedTest
    @CsvSource({"0.2", "0.398406065010", "0.6"})
    void roundedCornersTendToRayleighsLayerWithTheSquareOfTheirWidth(double k) {
        double coarse = k * roundedRayleigh(k, 0.05);
        double fine = k * roundedRayleigh(k, 0.025);
        assertThat(fine + (fine - coarse) / 3).isCloseTo(rayleighGrowth(k), within(2e-5));
    }

    private static double roundedRayleigh(double k, double corner) {
        StratifiedShearFlow flow = throughKnots(new double[] {-3, -1, 1, 3}, new double[] {-1, -1, 1, 1},
                new double[] {-3, 3}, new double[2], corner, 2);
        DispersionFunction dispersion = new DispersionFunction(flow.sampled((int) Math.round(40 / corner)), 1, 0, corner);
        return root(dispersion, k, 0, rayleighGrowth(k) / k)[1];
    }

    @ParameterizedTest
    // Michalke (1964), J. Fluid Mech. 19, 543-556: U = tanh z; computed elsewhere (last two: shooting only)
    @CsvSource({"0.1, 0.8364428, 1e-6", "0.2, 0.6974558832, 1e-7", "0.4, 0.4704507056, 1e-7",
            "0.4446, 0.4266802197, 1e-7", "0.5, 0.3750219008, 1e-7", "0.6, 0.2883242991, 1e-7",
            "0.8, 0.134668954, 1e-7", "0.9, 0.0653869, 1e-6", "0.95, 0.0322495, 1e-6"})
    void michalkesTanhLayer(double k, double im, double tolerance) {
        DispersionFunction dispersion = tanh(0, 1, 10, 1200);
        double[] c = root(dispersion, k, 0, im + 0.01);
        assertThat(c[0]).isCloseTo(0, within(1e-9));
        assertThat(c[1]).isCloseTo(im, within(tolerance));
    }

    @Test
    void michalkesTanhLayerGrowsFastestAtItsWavenumber() {
        DispersionFunction dispersion = tanh(0, 1, 10, 1200);
        // computed elsewhere; in Michalke's own scaling U = (1 + tanh)/2 this is 0.09485
        double greatest = 0.444918 * root(dispersion, 0.444918, 0, 0.42)[1];
        assertThat(greatest).isCloseTo(0.1897021005, within(2e-8));
        assertThat(0.4446 * root(dispersion, 0.4446, 0, 0.42)[1]).isCloseTo(0.1897020257, within(2e-8));
        assertThat(0.4440 * root(dispersion, 0.4440, 0, 0.42)[1]).isLessThan(greatest);
        assertThat(0.4458 * root(dispersion, 0.4458, 0, 0.42)[1]).isLessThan(greatest);
    }

    @ParameterizedTest
    // Hazel (1972), J. Fluid Mech. 51, 39-61 (flow of Holmboe): N² = J sech² z; neutral curve J = k(1 - k)
    @CsvSource({"0.2", "0.5", "0.8"})
    void holmboesNeutralCurve(double k) {
        double j = k * (1 - k);
        assertThat(root(tanh(j, 1, 10, 640), k, 0, 0.001)[1]).isCloseTo(0, within(2e-5));
        assertThat(root(tanh(0.98 * j, 1, 10, 640), k, 0, 0.01)[1]).isPositive();
    }

    @ParameterizedTest
    // computed elsewhere; 0.24 by shooting, 0.025, 0.075 and 0.175 by one method only
    @CsvSource({"0.05, 0.44192, 0.1592919120, 2e-7", "0.10, 0.44348, 0.1259415399, 2e-7",
            "0.20, 0.47060, 0.0471300408, 2e-7", "0.24, 0.49327, 0.0098837, 2e-7", "0.025, 0.44298, 0.17482145, 2e-7",
            "0.075, 0.44199, 0.14303025, 2e-7", "0.175, 0.46003, 0.06862575, 2e-7"})
    void holmboesFastestGrowth(double j, double k, double growth, double tolerance) {
        DispersionFunction dispersion = tanh(j, 1, 10, 1200);
        double at = k * root(dispersion, k, 0, growth / k + 0.005)[1];
        assertThat(at).isCloseTo(growth, within(tolerance));
        assertThat(0.99 * k * root(dispersion, 0.99 * k, 0, growth / k)[1]).isLessThan(at);
        assertThat(1.01 * k * root(dispersion, 1.01 * k, 0, growth / k)[1]).isLessThan(at);
    }

    @ParameterizedTest
    // computed elsewhere
    @CsvSource({"0.1, 0.2, 0.36312605", "0.1, 0.3, 0.36324768", "0.1, 0.4, 0.31119171", "0.1, 0.5, 0.24717818",
            "0.1, 0.6, 0.18110597", "0.1, 0.8, 0.05311237", "0.2, 0.3, 0.04576149", "0.2, 0.4, 0.10604778",
            "0.2, 0.5, 0.09278979", "0.2, 0.7, 0.01130908"})
    void holmboesGrowthAtFixedWavenumber(double j, double k, double im) {
        assertThat(root(tanh(j, 1, 12, 1440), k, 0, im + 0.005)[1]).isCloseTo(im, within(2e-6));
    }

    @ParameterizedTest
    // Drazin (1958), J. Fluid Mech. 4, 214-224: N² = J; neutral curve J = k²(1 - k²); computed elsewhere at 0.999 of it
    @CsvSource({"0.3, 0.00184", "0.5, 0.00063", "0.7071, 0.00025"})
    void drazinsNeutralCurve(double k, double im) {
        double j = 0.999 * k * k * (1 - k * k);
        double close = root(new DispersionFunction(AnalyticShearFlows.drazin(8, 2000, j), 1, 0, TANH_CORNER), k, 0, im)[1];
        assertThat(close).isCloseTo(im, within(3e-5));
        // linear to zero: at twice the distance from the curve twice the growth
        double far = root(new DispersionFunction(AnalyticShearFlows.drazin(8, 2000, 0.998 / 0.999 * j), 1, 0, TANH_CORNER),
                k, 0, 2 * im)[1];
        assertThat(far / close).isCloseTo(2, within(0.1));
    }

    @ParameterizedTest
    // computed elsewhere, the maxima by one method
    @CsvSource({"0.05, 0.50031, 0.15117532", "0.10, 0.55694, 0.11226587", "0.20, 0.66210, 0.03614797"})
    void drazinsFastestGrowth(double j, double k, double growth) {
        DispersionFunction dispersion = new DispersionFunction(AnalyticShearFlows.drazin(10, 1200, j), 1, 0, TANH_CORNER);
        double at = k * root(dispersion, k, 0, growth / k + 0.005)[1];
        assertThat(at).isCloseTo(growth, within(1e-6));
        assertThat(0.98 * k * root(dispersion, 0.98 * k, 0, growth / k)[1]).isLessThan(at);
        assertThat(1.02 * k * root(dispersion, 1.02 * k, 0, growth / k)[1]).isLessThan(at);
    }

    @ParameterizedTest
    // computed elsewhere
    @CsvSource({"0.1, 0.4, 0.19786079", "0.1, 0.7, 0.13487554", "0.2, 0.6621, 0.05459593"})
    void drazinsGrowthAtFixedWavenumber(double j, double k, double im) {
        DispersionFunction dispersion = new DispersionFunction(AnalyticShearFlows.drazin(10, 1200, j), 1, 0, TANH_CORNER);
        assertThat(root(dispersion, k, 0, im + 0.005)[1]).isCloseTo(im, within(1e-6));
    }

    @Test
    void aVanishingLayerTendsToTheKelvinHelmholtzSheet() {
        // closed form (Kelvin 1871, Boussinesq): c² = g'/2k - (ΔU/2)²; 10 m/s and 2 K at 300 K, wavelength 1 km
        double reduced = 9.80665 * 2 / 300;
        double k = 2 * Math.PI / 1000;
        double sheet = Math.sqrt(25 - reduced / (2 * k));
        assertThat(sheet).isCloseTo(4.449428, within(1e-6));
        double[] im = new double[3];
        for (int i = 0; i < 3; i++) {
            im[i] = thinLayer(8 >> i, reduced, k, sheet);
        }
        // the error is first order in depth; two halvings remove it to third order
        double first = 2 * im[1] - im[0];
        double second = 2 * im[2] - im[1];
        assertThat(second + (second - first) / 3).isCloseTo(sheet, within(2e-3));
        assertThat(Math.abs(im[2] - sheet)).isLessThan(Math.abs(im[0] - sheet) / 3);
    }

    private static double thinLayer(double halfDepth, double reduced, double k, double guess) {
        StratifiedShearFlow flow = throughKnots(new double[] {-400, -halfDepth, halfDepth, 400},
                new double[] {-5, -5, 5, 5}, new double[] {-400, -halfDepth, halfDepth, 400},
                new double[] {0, 0, reduced, reduced}, halfDepth / 4, 3 * halfDepth);
        return root(new DispersionFunction(flow.sampled(400), 1, 0, halfDepth / 4), k, 0, guess)[1];
    }

    @Test
    void theSheetIsStableForLongWaves() {
        double reduced = 9.80665 * 2 / 300;
        // closed form: neutral at k = 2 g'/ΔU², wavelength 4805.3 m
        assertThat(2 * Math.PI / (2 * reduced / 100)).isCloseTo(4805.3, within(0.1));
        StratifiedShearFlow flow = throughKnots(new double[] {-400, -5, 5, 400}, new double[] {-5, -5, 5, 5},
                new double[] {-400, -5, 5, 400}, new double[] {0, 0, reduced, reduced}, 1.25, 15);
        UnstableRoots roots = new UnstableRoots(new DispersionFunction(flow.sampled(400), 1, 0, 1.25), 1_000_000);
        roots.find(2 * Math.PI / 4500, -5, 5, 0.1, 5);
        assertThat(roots.roots()).isEqualTo(1);
        roots.find(2 * Math.PI / 5100, -5, 5, 0.1, 5);
        assertThat(roots.roots()).isZero();
    }

    @ParameterizedTest
    // Holmboe (1962), Geofys. Publ. 24, 67-113: Rayleigh's layer with a density jump in its middle, closed form
    // (2kX/J - 1)((2k-1)² - 4k²X - e^-4k) = e^-2k (4k - 2 + 2e^-2k), X = c²
    @CsvSource({"0.5, 0.2, 0.31373002, 0.25708785", "0.5, 0.5, 0.47035221, 0.19722790", "1, 1, 0.62213832, 0.11977290",
            "0.3, 0.1, 0, 0.40300859"})
    void holmboesBrokenLineWithADensityJump(double k, double j, double re, double im) {
        double[] square = squareAtVanishingWidth(corner -> brokenLine(k, j, corner, re, im));
        assertThat(square[0]).isCloseTo(re * re - im * im, within(5e-4));
        assertThat(square[1]).isCloseTo(2 * re * im, within(5e-4));
    }

    /**
     * c², smooth in every parameter, for a jump of no width: a jump spread over a width changes it to first order, two
     * halvings of the width remove first and second order.
     */
    private static double[] squareAtVanishingWidth(DoubleFunction<double[]> root) {
        double[] square = new double[2];
        double[][] c = {root.apply(0.04), root.apply(0.02), root.apply(0.01)};
        for (int part = 0; part < 2; part++) {
            double[] x = new double[3];
            for (int i = 0; i < 3; i++) {
                x[i] = part == 0 ? c[i][0] * c[i][0] - c[i][1] * c[i][1] : 2 * c[i][0] * c[i][1];
            }
            double first = 2 * x[1] - x[0];
            double second = 2 * x[2] - x[1];
            square[part] = second + (second - first) / 3;
        }
        return square;
    }

    @ParameterizedTest
    // Taylor (1931) and Goldstein (1931): unbounded linear shear, equal density jumps at z = ±1, closed form
    // m²(1-X)² - 2m(1+X) + 1 - e^-4k = 0, m = 2k/J, X = c²
    @CsvSource({"1, 2.0, 0.06762899", "1, 2.3, 0.02001320"})
    void taylorsThreeLayers(double k, double j, double im) {
        double[] square = squareAtVanishingWidth(corner -> root(linear(j, corner), k, 0, im + corner));
        assertThat(square[0]).isCloseTo(-im * im, within(1e-4));
        assertThat(square[1]).isCloseTo(0, within(1e-6));
    }

    @ParameterizedTest
    // closed form: unstable for 2k/(1+e^-2k) < J < 2k/(1-e^-2k); at k = 1 between 1.761594 and 2.313035
    @CsvSource({"1.70, 0", "1.85, 1", "2.25, 1", "2.40, 0"})
    void taylorsThreeLayersAreUnstableInABandOnly(double j, int waves) {
        UnstableRoots roots = new UnstableRoots(linear(j, 0.01), 1_000_000);
        roots.find(1, -0.5, 0.5, 0.015, 1);
        assertThat(roots.roots()).isEqualTo(waves);
    }

    private static DispersionFunction linear(double j, double corner) {
        StratifiedShearFlow flow = throughKnots(new double[] {-4, 4}, new double[] {-4, 4},
                new double[] {-4, -1 - corner, -1 + corner, 1 - corner, 1 + corner, 4},
                new double[] {0, 0, j, j, 2 * j, 2 * j}, corner, 1.5);
        return new DispersionFunction(flow.sampled((int) Math.round(24 / corner)), 1, 0, corner);
    }

    private static double[] brokenLine(double k, double j, double corner, double re, double im) {
        StratifiedShearFlow flow = throughKnots(new double[] {-3, -1, 1, 3}, new double[] {-1, -1, 1, 1},
                new double[] {-3, -corner, corner, 3}, new double[] {0, 0, j, j}, corner, 1.5);
        return root(new DispersionFunction(flow.sampled((int) Math.round(30 / corner)), 1, 0, corner), k, re, im);
    }

    @ParameterizedTest
    // Hazel (1972), ratio of shear to density depth R = 3: N² = J R sech²(R z); computed elsewhere, one method
    @CsvSource({"0.2, 0.3, 0.505467, 0.083321", "0.5, 0.8, 0.684537, 0.031457"})
    void smoothHolmboeWavesTravel(double j, double k, double re, double im) {
        for (int sign = -1; sign <= 1; sign += 2) {
            // the thinner stability layer bounds how far the path may leave the axis
            DispersionFunction dispersion = new DispersionFunction(AnalyticShearFlows.tanh(8, 1600, j, 3), 1, 0,
                    TANH_CORNER / 2);
            double[] c = root(dispersion, k, sign * re, im);
            assertThat(c[0]).isCloseTo(sign * re, within(5e-6));
            assertThat(c[1]).isCloseTo(im, within(5e-6));
        }
    }

    @ParameterizedTest
    // computed elsewhere, one method: growth over rigid ground H below the centre, J = 0.1, over unbounded growth
    @CsvSource({"1, 0.14, 0.006", "1.5, 0.455, 0.006", "2, 0.69, 0.006", "3, 0.90, 0.006", "4, 0.96, 0.006",
            "6, 0.99, 0.006"})
    void rigidGroundSlowsGrowth(double height, double ratio, double tolerance) {
        DispersionFunction dispersion = new DispersionFunction(
                AnalyticShearFlows.tanhAboveGround(height, 8, 1200, 0.1), 1, 0, TANH_CORNER);
        UnstableRoots roots = new UnstableRoots(dispersion, 10_000_000);
        double greatest = 0;
        for (double k = 0.1; k < 0.9; k += 0.02) {
            roots.find(k, -1, 1, 0.005, 1);
            for (int r = 0; r < roots.roots(); r++) {
                greatest = Math.max(greatest, k * roots.im(r));
            }
        }
        assertThat(greatest / 0.1259415).isCloseTo(ratio, within(tolerance));
    }

    @Test
    void theEigenfunctionOfHolmboesLayer() {
        double[] z = AnalyticShearFlows.grid(-8, 8, 320);
        double[] u = new double[z.length];
        double[] n2 = new double[z.length];
        for (int i = 0; i < z.length; i++) {
            u[i] = Math.tanh(z[i]);
            n2[i] = 0.1 / (Math.cosh(z[i]) * Math.cosh(z[i]));
        }
        StabilityResult result = new StabilityAnalysis(SearchSettings.forLevels()).ofLevels(z, u, new double[z.length],
                n2, 0, new double[] {90}, new double[] {0.44348}, Boundary.RADIATING, Boundary.RADIATING);
        Mode mode = result.fastest().orElseThrow();
        Eigenfunction eigenfunction = result.eigenfunction(mode);
        double[] heights = eigenfunction.heights();
        double[] amplitude = eigenfunction.amplitude();
        int peak = 0;
        int centre = 0;
        double half = 0;
        for (int i = 0; i < heights.length; i++) {
            peak = amplitude[i] > amplitude[peak] ? i : peak;
            centre = Math.abs(heights[i]) < Math.abs(heights[centre]) ? i : centre;
            if (i > 0 && amplitude[i - 1] > 0.5 && amplitude[i] <= 0.5) {
                half = heights[i] - (0.5 - amplitude[i]) / (amplitude[i - 1] - amplitude[i]) * (heights[i] - heights[i - 1]);
            }
        }
        // computed elsewhere, one method
        assertThat(Math.abs(heights[peak])).isCloseTo(0.83, within(0.02));
        assertThat(amplitude[centre]).isCloseTo(0.8033, within(0.001));
        assertThat(half).isCloseTo(2.918, within(0.003));
        assertThat(eigenfunction.extent().base()).isCloseTo(-3.616, within(0.003));
        assertThat(eigenfunction.extent().top()).isCloseTo(3.616, within(0.003));
        assertThat(mode.criticalHeights()).hasSize(1);
        assertThat(mode.criticalHeights().get(0)).isCloseTo(0, within(1e-6));
    }

    @ParameterizedTest
    // computed elsewhere: the whole search, given nothing but levels, against the maxima above
    @CsvSource({"0, 0.444918, 0.1897021, 90", "0.1, 0.44348, 0.1259415, 90", "0.2, 0.47060, 0.0471300, 30",
            "0.24, 0.49327, 0.0098837, 200"})
    void theSearchFindsTheFastestWaveFromLevelsAlone(double j, double k, double growth, double azimuth) {
        double[] z = AnalyticShearFlows.grid(-8, 8, 200);
        double[] u = new double[z.length];
        double[] v = new double[z.length];
        double[] n2 = new double[z.length];
        double angle = Math.toRadians(90 - azimuth);
        for (int i = 0; i < z.length; i++) {
            u[i] = Math.cos(angle) * Math.tanh(z[i]) + 3;
            v[i] = Math.sin(angle) * Math.tanh(z[i]) - 2;
            n2[i] = j / (Math.cosh(z[i]) * Math.cosh(z[i]));
        }
        StabilityResult result = new StabilityAnalysis(SearchSettings.forLevels()).ofLevels(z, u, v, n2,
                Boundary.RADIATING, Boundary.RADIATING);
        Mode mode = result.fastest().orElseThrow();
        assertThat(result.complete()).isTrue();
        assertThat(mode.converged()).isTrue();
        assertThat(mode.growthRate()).isCloseTo(growth, within(2e-6));
        assertThat(mode.horizontalWavenumber()).isCloseTo(k, within(1e-3));
        assertThat(mode.azimuth()).isCloseTo(azimuth, within(0.1));
        assertThat(mode.phaseSpeed()).isCloseTo(3 * Math.cos(angle) - 2 * Math.sin(angle), within(1e-4));
        assertThat(mode.eFoldingTime()).isCloseTo(1 / mode.growthRate(), within(1e-12));
        assertThat(mode.wavelength()).isCloseTo(2 * Math.PI / mode.horizontalWavenumber(), within(1e-9));
        assertThat(mode.numericalError()).isLessThan(1e-3);
    }

    private static DispersionFunction tanh(double j, double ratio, double halfHeight, int intervals) {
        return new DispersionFunction(AnalyticShearFlows.tanh(halfHeight, intervals, j, ratio), 1, 0, TANH_CORNER);
    }
}
