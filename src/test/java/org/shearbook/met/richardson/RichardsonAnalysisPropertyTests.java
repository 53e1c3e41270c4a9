package org.shearbook.met.richardson;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.AtmosphericConstants;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.testing.AnalyticShearFlows;

/** Laws that hold for any profile, on seeded random ones. */
class RichardsonAnalysisPropertyTests {

    private static final long SEED = 31_415;
    private static final int PROFILES = 40;

    private interface Law {
        void hold(VerticalProfile profile, double window, String where);
    }

    private static void forRandomProfiles(Law law) {
        System.out.println("RichardsonAnalysisPropertyTests seed " + SEED);
        Random random = new Random(SEED);
        for (int i = 0; i < PROFILES; i++) {
            double spacing = new double[] {5, 30, 200, 700}[i % 4];
            VerticalProfile profile = AnalyticShearFlows.random(random, 100, spacing);
            law.hold(profile, RichardsonAnalysis.WINDOWS.get(i % RichardsonAnalysis.WINDOWS.size()), "seed " + SEED + ", profile " + i);
        }
    }

    private static VerticalProfile winds(VerticalProfile profile, UnaryOperator<WindLevel> change) {
        return new VerticalProfile(profile.thermodynamicLevels(), profile.windLevels().stream().map(change).toList());
    }

    private static void assertSame(double[] expected, double[] actual, double relative, String where) {
        assertEquals(expected.length, actual.length, where);
        for (int i = 0; i < expected.length; i++) {
            assertEquals(expected[i], actual[i], relative * Math.max(1e-6, Math.abs(expected[i])), where + ", point " + i);
        }
    }

    @Test
    void aConstantWindAddedLeavesTheRichardsonNumberAlone() {
        forRandomProfiles((profile, window, where) -> {
            VerticalProfile moved = winds(profile, l -> new WindLevel(l.height(), l.eastward() + 37, l.northward() - 12));
            RichardsonProfile before = RichardsonAnalysis.of(profile, window);
            RichardsonProfile after = RichardsonAnalysis.of(moved, window);
            assertSame(before.shearSquared(), after.shearSquared(), 1e-7, where);
            assertEquals(before.layers().size(), after.layers().size(), where);
        });
    }

    @Test
    void aTurnedOrMirroredWindLeavesTheRichardsonNumberAlone() {
        forRandomProfiles((profile, window, where) -> {
            RichardsonProfile before = RichardsonAnalysis.of(profile, window);
            RichardsonProfile turned = RichardsonAnalysis.of(
                    winds(profile, l -> new WindLevel(l.height(), 0.6 * l.eastward() - 0.8 * l.northward(), 0.8 * l.eastward() + 0.6 * l.northward())), window);
            RichardsonProfile mirrored = RichardsonAnalysis.of(
                    winds(profile, l -> new WindLevel(l.height(), -l.eastward(), l.northward())), window);
            assertSame(before.shearSquared(), turned.shearSquared(), 1e-7, where);
            assertSame(before.shearSquared(), mirrored.shearSquared(), 1e-12, where);
        });
    }

    @Test
    void twiceTheWindHasAQuarterOfTheRichardsonNumber() {
        forRandomProfiles((profile, window, where) -> {
            RichardsonProfile before = RichardsonAnalysis.of(profile, window);
            RichardsonProfile doubled = RichardsonAnalysis.of(
                    winds(profile, l -> new WindLevel(l.height(), 2 * l.eastward(), 2 * l.northward())), window);
            double[] expected = before.measuredRichardsonNumber();
            double[] actual = doubled.measuredRichardsonNumber();
            for (int i = 0; i < expected.length; i++) {
                if (!Double.isNaN(expected[i])) {
                    assertEquals(expected[i] / 4, actual[i], 1e-9 * Math.max(1, Math.abs(expected[i])), where);
                }
            }
        });
    }

    @Test
    void sortedStabilityIsNeverNegativeAndChangesNothingWhereAirIsStable() {
        forRandomProfiles((profile, window, where) -> {
            for (double n2 : RichardsonAnalysis.of(profile, window).sortedBuoyancyFrequencySquared()) {
                assertTrue(n2 >= 0, where);
            }
            // the same heights with a buoyancy that only rises
            VerticalProfile stable = new VerticalProfile(profile.thermodynamicLevels().stream().map(l -> new ThermodynamicLevel(
                    l.height(), l.pressure(), 280 * Math.exp(1.2e-4 * l.height() / AtmosphericConstants.GRAVITY)
                            * Math.pow(l.pressure() / 100_000, AtmosphericConstants.KAPPA), Double.NaN)).toList(), profile.windLevels());
            RichardsonProfile result = RichardsonAnalysis.of(stable, window);
            assertSame(result.measuredBuoyancyFrequencySquared(), result.sortedBuoyancyFrequencySquared(), 1e-9, where);
        });
    }

    @Test
    void aProfileTurnedUpsideDownHasTheSameRichardsonNumbersUpsideDown() {
        int[] compared = {0};
        forRandomProfiles((profile, window, where) -> {
            // heights mirrored about the middle, wind and buoyancy negated: the same layer seen from above. Functions
            // are compared, not grids, because both grids start at the base.
            double sum = profile.lowestHeight() + profile.highestHeight();
            int n = profile.windLevels().size();
            double[] z = new double[n];
            double[] u = new double[n];
            double[] b = new double[n];
            for (int k = 0; k < n; k++) {
                WindLevel wind = profile.windLevels().get(n - 1 - k);
                z[k] = sum - wind.height();
                u[k] = -wind.eastward();
                b[k] = -AtmosphericConstants.GRAVITY * Math.log(profile.thermodynamicLevels().get(n - 1 - k).virtualPotentialTemperature() / 280);
            }
            VerticalProfile mirrored = AnalyticShearFlows.profile(z, h -> u[Arrays.binarySearch(z, h)], h -> 0,
                    h -> b[Arrays.binarySearch(z, h)]);
            RichardsonProfile upright = RichardsonAnalysis.of(winds(profile, l -> new WindLevel(l.height(), l.eastward(), 0)), window);
            if (hasCloseLevels(profile, upright.spacing())) {
                return; // averaged into bins counted from the base: not the same bins from the other side
            }
            compared[0]++;
            RoundedFlow other = RichardsonAnalysis.of(mirrored, window).flows().get(0);
            for (RoundedFlow flow : upright.flows()) {
                for (double h = flow.extent().base(); h <= flow.extent().top(); h += upright.spacing()) {
                    assertEquals(flow.eastward().firstDerivative(h), other.eastward().firstDerivative(sum - h), 1e-9, where);
                    assertEquals(flow.sortedBuoyancy().firstDerivative(h), other.sortedBuoyancy().firstDerivative(sum - h), 1e-11, where);
                }
            }
        });
        assertTrue(compared[0] >= 10, compared[0] + " profiles compared");
    }

    private static boolean hasCloseLevels(VerticalProfile profile, double spacing) {
        double[] heights = profile.windHeights();
        for (int k = 1; k < heights.length; k++) {
            if (heights[k] - heights[k - 1] < spacing) {
                return true;
            }
        }
        return false;
    }

    @Test
    void everyLayerKeepsItsPromises() {
        forRandomProfiles((profile, window, where) -> {
            RichardsonProfile result = RichardsonAnalysis.of(profile, window);
            double lastTop = Double.NEGATIVE_INFINITY;
            for (ShearLayer layer : result.layers()) {
                assertTrue(layer.minimum().richardsonNumber() < 0.25, where);
                assertTrue(layer.depth() >= 2 * window / 2.3549, where);
                assertTrue(layer.base() >= lastTop, where);
                assertTrue(layer.extent().contains(layer.minimum().height()), where);
                assertTrue(layer.minimum().depthBelowQuarter() > 0, where);
                assertTrue(layer.maximumShear() > 0 && Double.isFinite(layer.windChange()), where);
                lastTop = layer.top();
            }
        });
    }
}
