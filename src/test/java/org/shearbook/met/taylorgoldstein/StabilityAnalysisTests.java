package org.shearbook.met.taylorgoldstein;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;

import java.time.Duration;
import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.RoundedCornerFunction;
import org.shearbook.met.richardson.RoundedFlow;

/** What the analysis answers to layers and levels as they come, hostile ones included. */
class StabilityAnalysisTests {

    /** Far above what any of these needs, on a busy machine too: a search that hangs fails. */
    private static final Duration PATIENCE = Duration.ofSeconds(60);

    private final StabilityAnalysis analysis = new StabilityAnalysis(SearchSettings.forLevels());
    private final StabilityAnalysis layers = new StabilityAnalysis(SearchSettings.forLayers());

    private StabilityResult ofLevels(double[] z, DoubleUnaryOperator u, DoubleUnaryOperator n2) {
        return assertTimeoutPreemptively(PATIENCE, () -> analysis.ofLevels(z, Arrays.stream(z).map(u).toArray(),
                new double[z.length], Arrays.stream(z).map(n2).toArray(), Boundary.RADIATING, Boundary.RADIATING));
    }

    /** U = 6 tanh((z - 5000)/150), bulk shear 0.04 per second; N² so that Ri is j at the centre. */
    private static RoundedFlow tanhLayer(double j, double smoothing) {
        double[] z = AnalyticShearFlows.grid(3000, 7000, 200);
        double[] u = Arrays.stream(z).map(x -> 6 * Math.tanh((x - 5000) / 150)).toArray();
        double[] b = Arrays.stream(z).map(x -> j * 36 / 150.0 * Math.tanh((x - 5000) / 150)).toArray();
        double[] widths = RoundedCornerFunction.cornerWidths(z, smoothing);
        return new RoundedFlow(new HeightBand(3000, 7000), new RoundedCornerFunction(z, u, widths),
                new RoundedCornerFunction(z, new double[z.length], widths), new RoundedCornerFunction(z, b, widths),
                new RoundedCornerFunction(z, b, widths));
    }

    @Test
    void aLayerOfAnAscentGrowsAsTheTanhLayerDoes() {
        StabilityResult result = layers.ofLayer(tanhLayer(0.1, 20), new HeightBand(4800, 5200), Boundary.RIGID);
        Mode mode = result.fastest().orElseThrow();
        // computed elsewhere: 0.12594 S at k d = 0.4435; smoothing over 20 m lowers the shear and deepens the layer
        assertThat(mode.growthRate()).isCloseTo(0.12594 * 0.04, within(0.06 * 0.12594 * 0.04));
        assertThat(mode.wavelength()).isCloseTo(2 * Math.PI / 0.4435 * 150, within(60.0));
        assertThat(mode.azimuth()).isCloseTo(90, within(0.5));
        assertThat(mode.phaseSpeed()).isCloseTo(0, within(0.01));
        assertThat(mode.criticalHeights().get(0)).isCloseTo(5000, within(1.0));
        assertThat(mode.extent().depth()).isCloseTo(2 * 3.616 * 150, within(60.0));
        assertThat(mode.numericalError()).isLessThan(0.005);
        assertThat(mode.converged()).isTrue();
        assertThat(result.complete()).isTrue();
        assertThat(result.map().azimuths()).hasSize(24);
        assertThat(result.map().wavenumbers()).hasSize(40);
        assertThat(result.map().unstableFraction()).isBetween(0.1, 0.9);
        assertThat(result.modes()).allSatisfy(wave -> assertThat(wave.growthRate())
                .isLessThanOrEqualTo(mode.growthRate() * 1.001));
    }

    @Test
    void theEveryFourthWavenumberMapAgreesWithTheFullOne() {
        SearchSettings quick = SearchSettings.forLayers();
        SearchSettings full = new SearchSettings(24, 40, 1, quick.relativeGrowthFloor(), quick.growthFloor(),
                10 * quick.workLimit());
        StabilityResult followed = layers.ofLayer(tanhLayer(0.12, 40), new HeightBand(4800, 5200), Boundary.RIGID);
        StabilityResult searched = new StabilityAnalysis(full).ofLayer(tanhLayer(0.12, 40), new HeightBand(4800, 5200),
                Boundary.RIGID);
        assertThat(followed.fastest().orElseThrow().growthRate())
                .isCloseTo(searched.fastest().orElseThrow().growthRate(), within(1e-8));
        int points = 0;
        int different = 0;
        for (int j = 0; j < 24; j++) {
            for (int q = 0; q < 40; q++) {
                double a = followed.map().growthRate(j, q);
                double b = searched.map().growthRate(j, q);
                points += a > 0 || b > 0 ? 1 : 0;
                different += Math.abs(a - b) > 0.01 * Math.max(a, b) ? 1 : 0;
            }
        }
        assertThat(different).as("of %d points", points).isLessThanOrEqualTo(points / 50);
        assertThat(followed.evaluations()).isLessThan(searched.evaluations() / 2);
    }

    @Test
    void aLayerAtTheGroundGrowsMoreSlowlyOverRigidGround() {
        double[] z = AnalyticShearFlows.grid(4800, 7000, 110);
        double[] widths = RoundedCornerFunction.cornerWidths(z, 20);
        RoundedCornerFunction u = new RoundedCornerFunction(z,
                Arrays.stream(z).map(x -> 6 * Math.tanh((x - 5000) / 150)).toArray(), widths);
        RoundedCornerFunction b = new RoundedCornerFunction(z,
                Arrays.stream(z).map(x -> 0.024 * Math.tanh((x - 5000) / 150)).toArray(), widths);
        RoundedFlow flow = new RoundedFlow(new HeightBand(4800, 7000), u,
                new RoundedCornerFunction(z, new double[z.length], widths), b, b);
        double rigid = layers.ofLayer(flow, new HeightBand(4810, 5200), Boundary.RIGID).fastest().orElseThrow()
                .growthRate();
        double open = layers.ofLayer(flow, new HeightBand(4810, 5200), Boundary.RADIATING).fastest().orElseThrow()
                .growthRate();
        assertThat(rigid).isLessThan(0.8 * open);
    }

    @Test
    void aStableLayerIsStableByTheoremAndNeedsNoSearch() {
        StabilityResult result = layers.ofLayer(tanhLayer(0.4, 20), new HeightBand(4900, 5100), Boundary.RIGID);
        assertThat(result.fastest()).isEmpty();
        assertThat(result.evaluations()).isZero();
        assertThat(result.complete()).isTrue();
        assertThat(result.remarks()).anyMatch(remark -> remark.startsWith("stable:"));
    }

    @Test
    void aLayerWithoutSortedBuoyancyIsRefusedInWords() {
        RoundedFlow stable = tanhLayer(0.1, 20);
        double[] z = AnalyticShearFlows.grid(3000, 7000, 200);
        RoundedCornerFunction falling = new RoundedCornerFunction(z, Arrays.stream(z).map(x -> -1e-4 * x).toArray(),
                RoundedCornerFunction.cornerWidths(z, 20));
        RoundedFlow convective = new RoundedFlow(stable.extent(), stable.eastward(), stable.northward(), falling, falling);
        StabilityResult result = layers.ofLayer(convective, new HeightBand(4800, 5200), Boundary.RIGID);
        assertThat(result.fastest()).isEmpty();
        assertThat(result.complete()).isFalse();
        assertThat(result.remarks()).anyMatch(remark -> remark.startsWith("statically unstable"));
        assertThat(result.milesHoward().stableByTheorem()).isFalse();
    }

    @Test
    void aLayerOutsideTheFlowIsRefused() {
        assertThatIllegalArgumentException().isThrownBy(() -> layers.ofLayer(tanhLayer(0.1, 20),
                new HeightBand(8000, 8100), Boundary.RIGID)).withMessageContaining("outside the flow");
    }

    @Test
    void aSearchThatUsesUpItsWorkSaysSo() {
        SearchSettings little = new SearchSettings(24, 40, 4, 0.02, 1 / 3600.0, 100_000);
        StabilityResult result = new StabilityAnalysis(little).ofLayer(tanhLayer(0.1, 20), new HeightBand(4800, 5200),
                Boundary.RIGID);
        assertThat(result.complete()).isFalse();
        assertThat(result.remarks()).anyMatch(remark -> remark.startsWith("not converged: the search was stopped"));
        assertThat(result.evaluations()).isLessThan(10_000);
    }

    @Test
    void aConstantWindIsStable() {
        StabilityResult result = ofLevels(AnalyticShearFlows.grid(0, 1000, 50), z -> 12, z -> 1e-4);
        assertThat(result.fastest()).isEmpty();
        assertThat(result.milesHoward().stableByTheorem()).isTrue();
        assertThat(result.milesHoward().minRichardson()).isEqualTo(Double.POSITIVE_INFINITY);
    }

    @Test
    void aConstantWindWithoutStabilityIsStable() {
        StabilityResult result = ofLevels(AnalyticShearFlows.grid(0, 1000, 50), z -> 12, z -> 0);
        assertThat(result.fastest()).isEmpty();
        assertThat(result.complete()).isTrue();
    }

    @Test
    void aConstantPotentialTemperatureGrowsAsMichalkesLayer() {
        StabilityResult result = ofLevels(AnalyticShearFlows.grid(-800, 800, 160), z -> 5 * Math.tanh(z / 100), z -> 0);
        // computed elsewhere: 0.1897021 S at k d = 0.444918
        assertThat(result.fastest().orElseThrow().growthRate()).isCloseTo(0.1897021 * 0.05, within(2e-6));
        assertThat(result.milesHoward().minRichardson()).isCloseTo(0, within(1e-12));
    }

    @Test
    void uniformShearWithoutStabilityDoesNotGrow() {
        // exact: Couette flow has no inflection point (Rayleigh's criterion)
        StabilityResult result = assertTimeoutPreemptively(PATIENCE, () -> analysis.ofLevels(new double[] {0, 500, 1000},
                new double[] {0, 10, 20}, new double[3], new double[3], Boundary.RIGID, Boundary.RIGID));
        assertThat(result.fastest()).isEmpty();
        assertThat(result.remarks()).anyMatch(remark -> remark.startsWith("no wave grows faster"));
    }

    @Test
    void aSingleLevelIsRefused() {
        assertThatIllegalArgumentException().isThrownBy(() -> analysis.ofLevels(new double[] {5}, new double[1],
                new double[1], new double[1], Boundary.RIGID, Boundary.RADIATING)).withMessageContaining("two levels");
        assertThatIllegalArgumentException().isThrownBy(() -> analysis.ofLevels(new double[0], new double[0],
                new double[0], new double[0], Boundary.RIGID, Boundary.RADIATING)).withMessageContaining("two levels");
    }

    @Test
    void badNumbersAreRefusedWithTheirPlace() {
        double[] z = {0, 100, 200};
        double[] zero = new double[3];
        assertThatIllegalArgumentException().isThrownBy(() -> levels(new double[] {0, 100, Double.NaN}, zero, zero))
                .withMessageContaining("height[2]");
        assertThatIllegalArgumentException().isThrownBy(() -> levels(z, new double[] {0, Double.NaN, 1}, zero))
                .withMessageContaining("eastward[1]");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> levels(z, zero, new double[] {0, 1, Double.NEGATIVE_INFINITY}))
                .withMessageContaining("buoyancyFrequencySquared[2]");
        assertThatIllegalArgumentException().isThrownBy(() -> levels(new double[] {0, 100, 100}, zero, zero))
                .withMessageContaining("height[2]");
        assertThatIllegalArgumentException().isThrownBy(() -> levels(z, new double[2], zero))
                .withMessageContaining("eastward has 2");
        assertThatIllegalArgumentException().isThrownBy(() -> analysis.ofLevels(z, zero, zero, zero, -1, new double[0],
                new double[0], Boundary.RIGID, Boundary.RIGID)).withMessageContaining("window");
        assertThatIllegalArgumentException().isThrownBy(() -> analysis.ofLevels(z, zero, zero, zero, 0, new double[0],
                new double[] {0.1, 0}, Boundary.RIGID, Boundary.RIGID)).withMessageContaining("wavenumbers[1]");
        assertThatIllegalArgumentException().isThrownBy(() -> analysis.ofLevels(z, zero, zero, zero, 0,
                new double[] {Double.NaN}, new double[0], Boundary.RIGID, Boundary.RIGID))
                .withMessageContaining("azimuths[0]");
        assertThatIllegalArgumentException().isThrownBy(() -> analysis.ofLevels(z, zero, zero, zero, 0, new double[200],
                Arrays.stream(new double[200]).map(k -> 1).toArray(), Boundary.RIGID, Boundary.RIGID))
                .withMessageContaining("combinations");
    }

    private void levels(double[] z, double[] u, double[] n2) {
        analysis.ofLevels(z, u, new double[3], n2, Boundary.RIGID, Boundary.RADIATING);
    }

    @Test
    void negativeStabilityThroughoutIsConvectionNotAWave() {
        StabilityResult result = ofLevels(AnalyticShearFlows.grid(-800, 800, 80), z -> 5 * Math.tanh(z / 100), z -> -1e-4);
        assertThat(result.fastest()).isEmpty();
        assertThat(result.modes()).isEmpty();
        assertThat(result.complete()).isFalse();
        assertThat(result.milesHoward().stableByTheorem()).isFalse();
        assertThat(result.milesHoward().minRichardson()).isNegative();
        assertThat(result.remarks()).anyMatch(remark -> remark.startsWith("statically unstable"));
    }

    @Test
    void aFewNegativeLevelsCountAsMixed() {
        StabilityResult result = ofLevels(AnalyticShearFlows.grid(-800, 800, 80), z -> 5 * Math.tanh(z / 100),
                z -> z > 400 ? -1e-5 : 0);
        assertThat(result.remarks()).anyMatch(remark -> remark.contains("taken as zero"));
        assertThat(result.fastest().orElseThrow().growthRate()).isCloseTo(0.1897 * 0.05, within(1e-5));
    }

    @Test
    void levelsACentimetreApartAreAnswered() {
        // a tanh layer two centimetres deep in a metre of air
        double[] z = AnalyticShearFlows.grid(0, 1, 100);
        StabilityResult result = ofLevels(z, x -> 0.01 * Math.tanh((x - 0.5) / 0.05), x -> 0);
        assertThat(result.fastest().orElseThrow().growthRate()).isCloseTo(0.1897 * 0.2, within(0.0005));
    }

    @Test
    void tenThousandLevelsAreAnswered() {
        double[] z = AnalyticShearFlows.grid(0, 30_000, 10_000);
        StabilityResult result = ofLevels(z, x -> 20 * Math.tanh((x - 9000) / 400) + 0.0002 * x,
                x -> x < 11_000 ? 1.1e-4 : 4e-4);
        Mode mode = result.fastest().orElseThrow();
        assertThat(mode.converged()).isTrue();
        assertThat(mode.criticalHeights().get(0)).isCloseTo(9000, within(50.0));
        assertThat(mode.growthRate()).isBetween(0.001, 0.1897 * 0.0502);
    }

    @Test
    void manySharpStepsAreSmoothedToTheGridAndSayIt() {
        double[] z = AnalyticShearFlows.grid(0, 100, 10_000);
        StabilityResult result = ofLevels(z, x -> Math.floor(x) % 2 == 0 ? 0.1 : -0.1, x -> 1e-2);
        assertThat(result.remarks()).anyMatch(remark -> remark.contains("smoothed"));
    }

    @Test
    void aJetNoseInsideTheLayerGrowsInBothItsModes() {
        // Bickley jet U = sech² z, unstratified: the sinuous wave is neutral at k = 2, the varicose at k = 1 (exact)
        double[] z = AnalyticShearFlows.grid(-8, 8, 320);
        double[] u = Arrays.stream(z).map(x -> 1 / (Math.cosh(x) * Math.cosh(x))).toArray();
        StabilityResult result = assertTimeoutPreemptively(PATIENCE, () -> analysis.ofLevels(z, u, new double[z.length],
                new double[z.length], 0, new double[] {90}, new double[] {0.7, 0.9, 1.5, 1.9, 2.2}, Boundary.RADIATING,
                Boundary.RADIATING));
        assertThat(result.map().waves(0, 0)).isEqualTo(2);
        assertThat(result.map().waves(0, 2)).isEqualTo(1);
        assertThat(result.map().waves(0, 4)).isZero();
        Mode fastest = result.fastest().orElseThrow();
        assertThat(fastest.horizontalWavenumber()).isEqualTo(0.9);
        // Drazin and Howard (1966), Adv. Appl. Mech. 9: greatest growth 0.1605 at k = 0.90; from memory
        assertThat(fastest.growthRate()).isCloseTo(0.1605, within(0.0008));
        assertThat(fastest.criticalHeights()).hasSize(2);
    }

    @Test
    void wavesTooShortForTheGridAreNamed() {
        double[] z = AnalyticShearFlows.grid(-8, 8, 100);
        StabilityResult result = analysis.ofLevels(z, Arrays.stream(z).map(Math::tanh).toArray(), new double[101],
                new double[101], 0, new double[] {90}, new double[] {0.4, 1000}, Boundary.RADIATING, Boundary.RADIATING);
        assertThat(result.complete()).isFalse();
        assertThat(result.remarks()).anyMatch(remark -> remark.startsWith("not converged: a wavelength of"));
        assertThat(result.map().waves(0, 0)).isEqualTo(1);
        assertThat(result.map().waves(0, 1)).isZero();
    }

    @Test
    void givenAzimuthsAndWavenumbersAreKept() {
        double[] z = AnalyticShearFlows.grid(-8, 8, 100);
        StabilityResult result = analysis.ofLevels(z, Arrays.stream(z).map(Math::tanh).toArray(), new double[101],
                new double[101], 0, new double[] {90, 30, 270}, new double[] {0.6, 0.3}, Boundary.RADIATING,
                Boundary.RADIATING);
        assertThat(result.map().azimuths()).containsExactly(90, 30, 270);
        assertThat(result.map().wavenumbers()).containsExactly(0.3, 0.6);
        // computed elsewhere: c_i(0.6) = 0.2883242991; the oblique wave is slower by the cosine of 60 degrees
        assertThat(result.map().growthRate(0, 1)).isCloseTo(0.6 * 0.2883242991, within(1e-5));
        assertThat(result.map().growthRate(1, 1)).isCloseTo(0.3 * 0.2883242991, within(1e-5));
        assertThat(result.map().growthRate(2, 1)).isCloseTo(0.6 * 0.2883242991, within(1e-5));
        assertThat(result.fastest().orElseThrow().horizontalWavenumber()).isIn(0.3, 0.6);
    }

    @Test
    void smoothingTheLevelsLowersGrowth() {
        double[] z = AnalyticShearFlows.grid(-800, 800, 160);
        double[] u = Arrays.stream(z).map(x -> 5 * Math.tanh(x / 100)).toArray();
        double asGiven = growth(z, u, 0);
        double smoothed = growth(z, u, 100);
        assertThat(smoothed).isBetween(0.7 * asGiven, 0.97 * asGiven);
    }

    private double growth(double[] z, double[] u, double window) {
        return analysis.ofLevels(z, u, new double[z.length], new double[z.length], window, new double[] {90},
                new double[0], Boundary.RADIATING, Boundary.RADIATING).fastest().orElseThrow().growthRate();
    }
}
