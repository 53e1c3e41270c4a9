package org.shearbook.met.richardson;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.RoundedCornerFunction;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.testing.AnalyticShearFlows;
import org.shearbook.testing.JetAscents;

class RichardsonUncertaintyTests {

    private static RichardsonProfile linear(double step, double window) {
        return RichardsonAnalysis.of(AnalyticShearFlows.profile(
                AnalyticShearFlows.evenly(0, 4000, step), z -> 0.01 * z, z -> 0, z -> 1e-4 * z), window);
    }

    @Test
    void whiteNoiseOnADenseAscentGivesTheClosedForm() {
        // exact in the limit of dense levels: σ √(dz / (4 √π s³)); averaging over bins of s/3 takes off about a percent
        double s = RoundedCornerFunction.standardDeviation(100);
        double expected = 0.3 * Math.sqrt(5 / (4 * Math.sqrt(Math.PI) * s * s * s));
        assertEquals(9e-4, expected, 0.2e-4);
        RichardsonUncertainty found = RichardsonUncertainty.of(linear(5, 100), new InstrumentNoise("white", 0.3, 0, 0.1, "for this test"));
        int middle = found.shearError().length / 2;
        assertEquals(expected, found.shearError()[middle], 0.03 * expected);
    }

    @ParameterizedTest
    @CsvSource({"10, 200, 60", "40, 100, 60", "350, 200, 60", "350, 200, 500", "10, 60, 0"})
    void theErrorIsTheScatterOfPerturbedAscents(double step, double window, double correlation) {
        long seed = 4711;
        System.out.println("RichardsonUncertaintyTests seed " + seed);
        Random random = new Random(seed);
        InstrumentNoise noise = new InstrumentNoise("for this test", 0.3, correlation, 0.1, "for this test");
        RichardsonProfile clean = RichardsonAnalysis.of(AnalyticShearFlows.profile(
                AnalyticShearFlows.evenly(0, 1400, step), z -> 0.01 * z, z -> 0, z -> 1e-4 * z), window);
        RichardsonUncertainty expected = RichardsonUncertainty.of(clean, noise);
        int n = clean.size();
        int[] at = {0, n / 3, n / 2, n - 1};
        double[] shear = new double[at.length];
        double[] stability = new double[at.length];
        int members = 800;
        for (int m = 0; m < members; m++) {
            RichardsonProfile noisy = RichardsonAnalysis.of(perturbed(clean.profile(), noise, random), window);
            for (int i = 0; i < at.length; i++) {
                RoundedFlow flow = noisy.flowAt(clean.heights()[at[i]]);
                double z = clean.heights()[at[i]];
                shear[i] += Math.pow(flow.northward().firstDerivative(z), 2) / members;
                stability[i] += Math.pow(flow.measuredBuoyancy().firstDerivative(z) - 1e-4, 2) / members;
            }
        }
        for (int i = 0; i < at.length; i++) {
            // 800 members know a standard deviation to 2.5 %: four of them allowed
            assertEquals(Math.sqrt(shear[i]), expected.shearError()[at[i]], 0.10 * Math.sqrt(shear[i]), "shear at point " + at[i]);
            assertEquals(Math.sqrt(stability[i]), expected.buoyancyFrequencySquaredError()[at[i]], 0.10 * Math.sqrt(stability[i]),
                    "N² at point " + at[i]);
        }
    }

    private static VerticalProfile perturbed(VerticalProfile profile, InstrumentNoise noise, Random random) {
        List<ThermodynamicLevel> temperatures = profile.thermodynamicLevels().stream().map(l -> new ThermodynamicLevel(
                l.height(), l.pressure(), l.temperature() + noise.temperature() * random.nextGaussian(), l.dewPoint())).toList();
        List<WindLevel> winds = new ArrayList<>();
        double error = random.nextGaussian();
        double last = Double.NaN;
        for (WindLevel level : profile.windLevels()) {
            if (!Double.isNaN(last)) {
                double memory = noise.windCorrelationLength() > 0 ? Math.exp(-(level.height() - last) / noise.windCorrelationLength()) : 0;
                error = memory * error + Math.sqrt(1 - memory * memory) * random.nextGaussian();
            }
            last = level.height();
            winds.add(new WindLevel(level.height(), level.pressure(), level.eastward(), level.northward() + noise.wind() * error));
        }
        return new VerticalProfile(temperatures, winds);
    }

    @Test
    void aSharpLayerIsSureAndQuietAirIsSureToo() {
        RichardsonProfile sharp = RichardsonAnalysis.of(JetAscents.KELBRITH_DAY_2_12.profile(), 200);
        RichardsonUncertainty found = RichardsonUncertainty.of(sharp, InstrumentNoise.DEFAULT);
        ShearLayer layer = sharp.layers().get(0);
        LayerProbability probability = found.at(layer);
        assertTrue(probability.isKnown());
        assertEquals(layer.minimum().height(), probability.height());
        assertTrue(probability.probability() > 0.8, "Ri " + layer.minimum().richardsonNumber() + " gives " + probability);
        RichardsonProfile quiet = RichardsonAnalysis.of(JetAscents.KELBRITH_DAY_1_00.profile(), 200);
        double[] p = RichardsonUncertainty.of(quiet, InstrumentNoise.DEFAULT).probabilityBelowQuarter();
        for (int i = 0; i < p.length; i++) {
            if (quiet.heights()[i] > 7000 && quiet.heights()[i] < 10_000) {
                assertTrue(p[i] < 0.01, p[i] + " at " + quiet.heights()[i]);
            }
        }
    }

    @Test
    void moreNoiseNeverMakesAnOutcomeSurer() {
        RichardsonProfile profile = RichardsonAnalysis.of(JetAscents.DUNVEERY_DAY_2_00.profile(), 100);
        ShearLayer layer = profile.layers().get(0);
        double before = 1;
        for (double wind : new double[] {0.1, 0.3, 0.6, 1.2}) {
            double p = RichardsonUncertainty.of(profile, new InstrumentNoise("n", wind, 60, 0.1, "for this test")).at(layer).probability();
            assertTrue(p <= before + 1e-9, wind + " m/s: " + p);
            before = p;
        }
    }

    @Test
    void twoWindLevelsInALayerMeanUnknown() {
        // a TEMP with wind at 0, 3000, 3400, 7000 m: the layer's inside was never measured
        double[] heights = {0, 3000, 3400, 7000};
        double[] wind = {0, 5, 20, 22};
        List<WindLevel> winds = new ArrayList<>();
        for (int k = 0; k < heights.length; k++) {
            winds.add(new WindLevel(heights[k], wind[k], 0));
        }
        VerticalProfile coarse = new VerticalProfile(AnalyticShearFlows.profile(
                AnalyticShearFlows.evenly(0, 7000, 500), z -> 0, z -> 0, z -> 1e-4 * z).thermodynamicLevels(), winds);
        RichardsonProfile profile = RichardsonAnalysis.of(coarse, 200);
        ShearLayer layer = profile.layers().get(0);
        assertTrue(layer.windLevelCount() < 3);
        LayerProbability found = RichardsonUncertainty.of(profile, InstrumentNoise.DEFAULT).at(layer);
        assertFalse(found.isKnown());
        assertTrue(Double.isNaN(found.probability()));
        assertTrue(found.unknownBecause().contains("wind levels"));
        List<HiddenSublayer.Stretch> stretches = HiddenSublayer.of(coarse);
        // the other two have bulk Ri above 5, which the table does not cover
        assertEquals(1, stretches.size());
        // exact: Ri = 1e-4 × 400² / 15² = 0.07
        assertEquals(0.07, stretches.get(0).bulkRichardsonNumber(), 0.005);
        assertEquals(1.0, stretches.get(0).chance());
    }

    @ParameterizedTest
    @CsvSource({
        "0.1, 200, 1.00", "0.3, 200, 0.74", "0.6, 200, 0.34", "0.8, 200, 0.24", "1.2, 200, 0.16", "1.7, 200, 0.12", "2.5, 200, 0.09", "4, 200, 0.08",
        "0.3, 400, 0.95", "0.6, 400, 0.72", "4, 400, 0.26", "0.6, 800, 0.94", "4, 800, 0.58", "4, 3000, 0.58", "-1, 200, 1.00",
        "0.25, 300, 0.845", "1.0, 600, 0.615"})
    void theChanceOfAHiddenSublayerFollowsTheTable(double bulk, double depth, double chance) {
        // computed elsewhere by our own model; the last two: linear in depth between two rows
        assertEquals(chance, HiddenSublayer.chance(bulk, depth), 1e-9);
    }

    @Test
    void whatTheTableDoesNotCoverIsNotGuessed() {
        assertTrue(Double.isNaN(HiddenSublayer.chance(0.3, 199)));
        assertTrue(Double.isNaN(HiddenSublayer.chance(5, 400)));
        assertTrue(Double.isNaN(HiddenSublayer.chance(Double.POSITIVE_INFINITY, 400)));
        assertTrue(Double.isNaN(HiddenSublayer.chance(Double.NaN, 400)));
        assertThrows(IllegalArgumentException.class, () -> HiddenSublayer.chance(0.3, 0));
        assertThrows(IllegalArgumentException.class, () -> HiddenSublayer.chance(0.3, Double.NaN));
    }

    @Test
    void noiseIsFoundByTheNameOfTheSonde() {
        assertSame(InstrumentNoise.RS41, InstrumentNoise.ofSondeType("Vaisala RS41-SGP"));
        assertSame(InstrumentNoise.RS92, InstrumentNoise.ofSondeType("rs92"));
        assertSame(InstrumentNoise.DEFAULT, InstrumentNoise.ofSondeType("unknown maker"));
        assertSame(InstrumentNoise.DEFAULT, InstrumentNoise.ofSondeType(""));
        assertThrows(IllegalArgumentException.class, () -> new InstrumentNoise("x", -1, 60, 0.1, "s"));
        assertThrows(IllegalArgumentException.class, () -> new InstrumentNoise("x", 0.3, Double.NaN, 0.1, "s"));
        assertThrows(IllegalArgumentException.class, () -> new InstrumentNoise("x", 0.3, 60, Double.POSITIVE_INFINITY, "s"));
        assertThrows(IllegalArgumentException.class, () -> new InstrumentNoise(" ", 0.3, 60, 0.1, "s"));
    }

    @Test
    void gapsStayUnknownAndConstantWindIsCalm() {
        List<HeightBand> gap = List.of(new HeightBand(1500, 2500));
        VerticalProfile whole = AnalyticShearFlows.tanhLayer(AnalyticShearFlows.evenly(0, 4000, 20), 3000, 200, 6, 1e-4);
        RichardsonProfile withGap = RichardsonAnalysis.of(new VerticalProfile(Double.NaN, whole.thermodynamicLevels(), whole.windLevels(),
                List.of(), gap, List.of()), 200);
        double[] p = RichardsonUncertainty.of(withGap, InstrumentNoise.DEFAULT).probabilityBelowQuarter();
        for (int i = 0; i < p.length; i++) {
            boolean inside = withGap.heights()[i] > 1500 && withGap.heights()[i] < 2500;
            assertEquals(inside, Double.isNaN(p[i]), "at " + withGap.heights()[i]);
        }
        RichardsonProfile constant = RichardsonAnalysis.of(AnalyticShearFlows.profile(
                AnalyticShearFlows.evenly(0, 3000, 20), z -> 12, z -> -3, z -> 1e-4 * z), 200);
        double[] still = RichardsonUncertainty.of(constant, InstrumentNoise.DEFAULT).probabilityBelowQuarter();
        for (int i = 10; i < still.length - 10; i++) {
            assertTrue(still[i] < 1e-6, "constant wind gave " + still[i]);
        }
        // at the lowest level the slope hangs on one segment and nothing smooths its noise: there N² itself is in doubt
        assertTrue(still[0] > 0.1, "at the lowest level " + still[0]);
        RichardsonProfile empty = RichardsonAnalysis.of(new VerticalProfile(List.of(new ThermodynamicLevel(0, 100_000, 280, 280)), List.of()), 200);
        assertEquals(0, RichardsonUncertainty.of(empty, InstrumentNoise.DEFAULT).probabilityBelowQuarter().length);
    }

    @Test
    void levelsAllWithinOneBinKeepTheirTwoEnds() {
        // 20 m in all at a 600 m window: only the ends carry weight, so σ_s = σ √2 / 20 for white noise
        RichardsonProfile shallow = RichardsonAnalysis.of(AnalyticShearFlows.profile(
                AnalyticShearFlows.evenly(0, 20, 5), z -> 0.01 * z, z -> 0, z -> 1e-4 * z), 600);
        double[] error = RichardsonUncertainty.of(shallow, new InstrumentNoise("white", 0.3, 0, 0.1, "for this test")).shearError();
        assertEquals(0.3 * Math.sqrt(2) / 20, error[0], 1e-9);
    }

    @Test
    void aMoistStabilityMustFitTheHeights() {
        RichardsonUncertainty found = RichardsonUncertainty.of(linear(20, 200), InstrumentNoise.DEFAULT);
        assertEquals(found.probabilityBelowQuarter().length,
                found.probabilityBelowQuarter(found.profile().measuredBuoyancyFrequencySquared()).length);
        assertThrows(IllegalArgumentException.class, () -> found.probabilityBelowQuarter(new double[3]));
    }
}
