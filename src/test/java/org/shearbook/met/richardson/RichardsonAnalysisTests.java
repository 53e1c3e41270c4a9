package org.shearbook.met.richardson;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.testing.AnalyticShearFlows;

class RichardsonAnalysisTests {

    private static final double[] EVERY_TEN_METRES = AnalyticShearFlows.evenly(0, 4000, 10);

    @Test
    void uniformShearAndStabilityGiveTheirRatioEverywhere() {
        // exact: N² = 1e-4, S² = 4e-4 + 0 → 0.25 at any window
        VerticalProfile profile = AnalyticShearFlows.profile(EVERY_TEN_METRES, z -> 0.012 * z, z -> 0.016 * z, z -> 1e-4 * z);
        for (double window : RichardsonAnalysis.WINDOWS) {
            RichardsonProfile result = RichardsonAnalysis.of(profile, window);
            assertTrue(result.size() > 40);
            for (double ri : result.richardsonNumber()) {
                assertEquals(0.25, ri, 1e-9);
            }
            assertEquals(0.02, Math.sqrt(result.shearSquared()[5]), 1e-12);
            assertEquals(1e-4, result.measuredBuoyancyFrequencySquared()[5], 1e-13);
            assertEquals(0.02, result.maximumShearOverThousandFeetBetween(500, 3000), 1e-12);
        }
    }

    @Test
    void aTanhLayerHasItsRichardsonNumberAtTheCentre() {
        // exact without smoothing: N² d²/U² = 1e-4 × 300² / 6.5²; the 60 m window widens the layer by (s/d)², about 0.7 %
        VerticalProfile profile = AnalyticShearFlows.tanhLayer(EVERY_TEN_METRES, 2000, 300, 6.5, 1e-4);
        RichardsonMinimum minimum = RichardsonAnalysis.of(profile, 60).minimumBetween(0, 4000).orElseThrow();
        assertEquals(9.0 / 42.25, minimum.richardsonNumber(), 0.02 * 9.0 / 42.25);
        assertEquals(2000, minimum.height(), 10);
    }

    @Test
    void aWiderWindowNeverMakesThisLayerSharper() {
        VerticalProfile profile = AnalyticShearFlows.tanhLayer(EVERY_TEN_METRES, 2000, 150, 5, 1e-4);
        double before = 0;
        for (double window : RichardsonAnalysis.WINDOWS) {
            double minimum = RichardsonAnalysis.of(profile, window).minimumBetween(0, 4000).orElseThrow().richardsonNumber();
            assertTrue(minimum > before);
            before = minimum;
        }
    }

    @Test
    void withoutShearThereIsNoRichardsonNumberButAStatus() {
        VerticalProfile profile = AnalyticShearFlows.profile(EVERY_TEN_METRES, z -> 20, z -> -5, z -> 1e-4 * z);
        RichardsonProfile result = RichardsonAnalysis.of(profile, 200);
        for (int i = 0; i < result.size(); i++) {
            assertTrue(Double.isNaN(result.richardsonNumber()[i]));
            assertEquals(PointStatus.NO_SHEAR, result.statuses().get(i));
        }
        assertTrue(result.minimumBetween(0, 4000).isEmpty());
        assertTrue(result.lowestInFreeAir().isEmpty());
        assertTrue(result.layers().isEmpty());
        assertEquals(0, result.maximumShearOverThousandFeetBetween(0, 4000), 1e-15);
    }

    @Test
    void constantThetaWithShearIsNeutral() {
        VerticalProfile profile = AnalyticShearFlows.profile(EVERY_TEN_METRES, z -> 0.01 * z, z -> 0, z -> 0);
        RichardsonProfile result = RichardsonAnalysis.of(profile, 200);
        for (double ri : result.richardsonNumber()) {
            assertEquals(0, ri, 1e-9);
        }
        assertEquals(1, result.layers().size());
        ShearLayer whole = result.layers().get(0);
        assertEquals(0, whole.base());
        assertEquals(4000, whole.top());
        assertEquals(0, whole.bulkRichardsonNumber(), 1e-9);
        assertTrue(whole.remarks().contains(LayerRemark.BOUNDED_BY_END_OF_DATA));
        assertTrue(whole.remarks().contains(LayerRemark.NEAR_GROUND));
    }

    @Test
    void unstableAirIsDrawnNegativeAndSortedToZero() {
        VerticalProfile profile = AnalyticShearFlows.profile(EVERY_TEN_METRES, z -> 0.01 * z, z -> 0, z -> -5e-5 * z);
        RichardsonProfile result = RichardsonAnalysis.of(profile, 200);
        for (int i = 0; i < result.size(); i++) {
            assertEquals(-0.5, result.measuredRichardsonNumber()[i], 1e-9);
            assertEquals(0, result.richardsonNumber()[i]);
            assertEquals(PointStatus.OVERTURNED, result.statuses().get(i));
        }
        assertTrue(result.layers().get(0).remarks().contains(LayerRemark.OVERTURNED));
    }

    @Test
    void aJumpOfWindAcrossAGapIsNeverShear() {
        // 600 m without wind at 2000 m, across which the wind changes by 30 m/s
        VerticalProfile whole = AnalyticShearFlows.profile(
                EVERY_TEN_METRES, z -> 0.002 * z + (z > 2000 ? 30 : 0), z -> 0, z -> 1e-4 * z);
        List<WindLevel> winds = whole.windLevels().stream().filter(l -> l.height() <= 1700 || l.height() >= 2300).toList();
        VerticalProfile profile = new VerticalProfile(0, whole.thermodynamicLevels(), winds,
                List.of(), List.of(new HeightBand(1700, 2300)), List.of());
        RichardsonProfile result = RichardsonAnalysis.of(profile, 200);
        for (int i = 0; i < result.size(); i++) {
            double z = result.heights()[i];
            boolean inside = z > 1700 && z < 2300;
            assertEquals(inside, result.statuses().get(i) == PointStatus.GAP, "at " + z);
            if (inside) {
                assertTrue(Double.isNaN(result.richardsonNumber()[i]));
            } else {
                assertEquals(25, result.richardsonNumber()[i], 1e-6, "at " + z);
            }
            double shear = result.shearOverThousandFeet()[i];
            assertTrue(Double.isNaN(shear) || Math.abs(shear - 0.002) < 1e-12, "at " + z);
            if (z > 1700 - 152 && z < 2300 + 152) {
                assertTrue(Double.isNaN(shear), "at " + z);
            }
        }
        assertEquals(2, result.flows().size());
        assertNull(result.flowAt(2000));
        assertNotNull(result.flowAt(1700));
        assertEquals(List.of(new HeightBand(1700, 2300)), result.gaps());
        assertTrue(result.layers().isEmpty());
    }

    @Test
    void aLayerThatEndsAtAGapSaysSo() {
        VerticalProfile whole = AnalyticShearFlows.tanhLayer(EVERY_TEN_METRES, 2000, 300, 8, 1e-4);
        List<WindLevel> winds = whole.windLevels().stream().filter(l -> l.height() <= 2000 || l.height() >= 2600).toList();
        VerticalProfile profile = new VerticalProfile(0, whole.thermodynamicLevels(), winds,
                List.of(), List.of(new HeightBand(2000, 2600)), List.of());
        ShearLayer layer = RichardsonAnalysis.of(profile, 100).layers().get(0);
        assertEquals(2000, layer.top(), 1e-9);
        assertTrue(layer.remarks().contains(LayerRemark.BOUNDED_BY_GAP));
    }

    @Test
    void aNoisyTanhLayerStaysOnePiece() {
        // 60 noisy copies of a 300 m tanh layer, as in our own design study: one piece in every copy at 42 m smoothing
        long seed = 1899;
        int single = 0;
        for (int copy = 0; copy < 60; copy++) {
            VerticalProfile noisy = AnalyticShearFlows.withNoise(
                    AnalyticShearFlows.tanhLayer(EVERY_TEN_METRES, 2000, 150, 5, 1e-4), 0.3, 0.1, new Random(seed + copy));
            List<ShearLayer> layers = RichardsonAnalysis.of(noisy, 100).layers();
            long inside = layers.stream().filter(l -> l.extent().overlaps(1850, 2150)).count();
            single += inside == 1 ? 1 : 0;
            assertTrue(layers.stream().noneMatch(l -> l.depth() < 60), "seed " + (seed + copy));
        }
        assertTrue(single >= 59, single + " of 60, seeds from " + seed);
    }

    @Test
    void layersAreLetteredUpwards() {
        VerticalProfile profile = AnalyticShearFlows.profile(AnalyticShearFlows.evenly(0, 8000, 10),
                z -> 6 * Math.tanh((z - 2000) / 200) + 6 * Math.tanh((z - 6000) / 200), z -> 0, z -> 1e-4 * z);
        List<ShearLayer> layers = RichardsonAnalysis.of(profile, 200).layers();
        assertEquals(List.of("A", "B"), layers.stream().map(ShearLayer::letter).toList());
        assertTrue(layers.get(0).top() < layers.get(1).base());
        assertEquals("Z", LayerDetection.letter(25));
        assertEquals("AA", LayerDetection.letter(26));
        assertEquals("AB", LayerDetection.letter(27));
    }

    @Test
    void saturationOfALayerIsCounted() {
        VerticalProfile dry = AnalyticShearFlows.tanhLayer(EVERY_TEN_METRES, 2000, 200, 6, 1e-4);
        List<ThermodynamicLevel> moist = dry.thermodynamicLevels().stream().map(l -> new ThermodynamicLevel(
                l.height(), l.pressure(), l.temperature(), l.temperature() - (l.height() > 1500 && l.height() < 2500 ? 0 : 10))).toList();
        ShearLayer layer = RichardsonAnalysis.of(new VerticalProfile(moist, dry.windLevels()), 200).layers().get(0);
        assertEquals(1, layer.saturatedFraction());
        assertTrue(layer.remarks().contains(LayerRemark.SATURATED));
    }

    @Test
    void fewReportedWindsInALayerAreRemarked() {
        double[] coarse = {0, 1000, 1600, 2200, 3000, 4000};
        VerticalProfile profile = AnalyticShearFlows.profile(coarse, z -> z <= 1600 ? 0 : z >= 2200 ? 20 : 0, z -> 0, z -> 1e-4 * z);
        ShearLayer layer = RichardsonAnalysis.of(profile, 200).layers().get(0);
        assertTrue(layer.windLevelCount() < 3);
        assertTrue(layer.remarks().contains(LayerRemark.FEW_WIND_LEVELS));
        // no detail is invented: in the middle of the segment, two corner widths from both ends, the shear is the plain
        // difference quotient times Φ(2) − Φ(−2) = 0.9545
        RichardsonProfile result = RichardsonAnalysis.of(profile, 200);
        int middle = (int) Math.round(1900 / result.spacing());
        assertEquals(0.9545 * 20.0 / 600, Math.sqrt(result.shearSquared()[middle]), 1e-4);
    }

    @Test
    void windAndTemperatureAtDifferentLevelsAreUsedWhereBothReach() {
        VerticalProfile base = AnalyticShearFlows.profile(EVERY_TEN_METRES, z -> 0.01 * z, z -> 0, z -> 1e-4 * z);
        List<WindLevel> winds = new ArrayList<>();
        for (double z = 505; z <= 5000; z += 70) {
            winds.add(new WindLevel(z, 0.01 * z, 0));
        }
        RichardsonProfile result = RichardsonAnalysis.of(new VerticalProfile(base.thermodynamicLevels(), winds), 200);
        assertEquals(505, result.heights()[0]);
        assertTrue(result.heights()[result.size() - 1] <= 4000);
        for (double ri : result.richardsonNumber()) {
            assertEquals(1, ri, 1e-9);
        }
    }

    @Test
    void tooLittleToAnalyseGivesAnEmptyResultNotAnError() {
        ThermodynamicLevel one = new ThermodynamicLevel(0, 100_000, 280, Double.NaN);
        RichardsonProfile single = RichardsonAnalysis.of(new VerticalProfile(List.of(one), List.of(new WindLevel(0, 1, 1))), 200);
        assertEquals(0, single.size());
        assertTrue(single.layers().isEmpty() && single.lowestInFreeAir().isEmpty() && single.gaps().isEmpty());
        RichardsonProfile apart = RichardsonAnalysis.of(new VerticalProfile(
                List.of(one, new ThermodynamicLevel(100, 98_000, 280, Double.NaN)),
                List.of(new WindLevel(500, 1, 1), new WindLevel(600, 2, 2))), 200);
        assertEquals(0, apart.size());
    }

    @Test
    void levelsOneCentimetreApartAreAveragedNotDifferenced() {
        // wind noise of ±0.5 m/s between levels 1 cm apart is a shear of 100 s⁻¹ if differenced
        VerticalProfile profile = AnalyticShearFlows.profile(AnalyticShearFlows.evenly(0, 300, 0.03),
                z -> 0.01 * z + (Math.round(z / 0.03) % 2 == 0 ? 0.5 : -0.5), z -> 0, z -> 1e-4 * z);
        RichardsonProfile result = RichardsonAnalysis.of(profile, 100);
        for (double s2 : result.shearSquared()) {
            assertEquals(0.01, Math.sqrt(s2), 0.001);
        }
        RichardsonProfile thin = RichardsonAnalysis.of(AnalyticShearFlows.profile(
                AnalyticShearFlows.evenly(0, 5, 0.01), z -> 0.01 * z, z -> 0, z -> 1e-4 * z), 200);
        assertEquals(1, thin.richardsonNumber()[0], 1e-6);
    }

    @Test
    void tenThousandLevelsAreAnalysedInTime() {
        VerticalProfile profile = AnalyticShearFlows.profile(AnalyticShearFlows.evenly(0, 30_000, 3), z -> 0.01 * z, z -> 0, z -> 1e-4 * z);
        assertTrue(profile.windLevels().size() > 10_000);
        RichardsonProfile result = assertTimeoutPreemptively(Duration.ofSeconds(5), () -> RichardsonAnalysis.of(profile, 60));
        assertFalse(result.layers().size() > 0);
    }

    @Test
    void windowsNotOfferedAndImpossibleDepthsAreRefused() {
        VerticalProfile profile = AnalyticShearFlows.profile(EVERY_TEN_METRES, z -> z, z -> 0, z -> 0);
        assertThrows(IllegalArgumentException.class, () -> RichardsonAnalysis.of(profile, 250));
        assertThrows(IllegalArgumentException.class, () -> RichardsonAnalysis.of(profile, Double.NaN));
        VerticalProfile endless = new VerticalProfile(
                List.of(new ThermodynamicLevel(0, 100_000, 280, Double.NaN), new ThermodynamicLevel(1e12, 1, 280, Double.NaN)),
                List.of(new WindLevel(0, 0, 0), new WindLevel(1e12, 1, 1)));
        assertThrows(IllegalArgumentException.class, () -> RichardsonAnalysis.of(endless, 200));
    }

    @Test
    void sortingPoolsWhatFalls() {
        // exact: isotonic regression by hand
        assertArrayEquals(new double[] {1, 2.5, 2.5, 4}, FlowBuilder.nonDecreasing(new double[] {1, 3, 2, 4}), 1e-15);
        assertArrayEquals(new double[] {2, 2, 2}, FlowBuilder.nonDecreasing(new double[] {3, 2, 1}), 1e-15);
        assertArrayEquals(new double[0], FlowBuilder.nonDecreasing(new double[0]));
    }

    @Test
    void shearOverADepthFollowsTheReportedWinds() {
        VerticalProfile profile = AnalyticShearFlows.profile(new double[] {0, 304.8, 609.6}, z -> z < 300 ? 0 : 3, z -> z < 600 ? 0 : 4, z -> 0);
        // exact: from 152.4 to 457.2 m half of each change: 1.5 and 2 m/s
        assertEquals(2.5 / 304.8, ShearOverDepth.centredOn(profile, 304.8, new double[] {304.8})[0], 1e-12);
        assertTrue(Double.isNaN(ShearOverDepth.centredOn(profile, 304.8, new double[] {100})[0]));
        assertThrows(IllegalArgumentException.class, () -> ShearOverDepth.centredOn(profile, 0, new double[] {100}));
    }
}
