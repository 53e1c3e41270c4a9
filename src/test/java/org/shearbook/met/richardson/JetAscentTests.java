package org.shearbook.met.richardson;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.Tropopause;
import org.shearbook.met.profile.Units;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindMaximum;
import org.shearbook.testing.JetAscents;

/**
 * Ascents through an analytic jet with a shear layer. Expected values were computed elsewhere, from the formulas of
 * the invented scenario without noise, by another program.
 */
class JetAscentTests {

    /**
     * @param low, high search limits [m]
     * @param depth     with Ri below ¼ [m]
     * @param quarter   flight levels between which Ri is below ¼; null for none
     * @param shear     largest over 1000 ft [kt]
     */
    record Case(String name, JetAscents ascent, double low, double high, double richardson, double flightLevel,
            double depth, int[] quarter, double shear, double jetKnots, double jetLevel, double tropopauseLevel) {

        @Override
        public String toString() {
            return name;
        }
    }

    static Stream<Case> cases() {
        return Stream.of(
                upper("Dunveery day 1 00Z", JetAscents.DUNVEERY_DAY_1_00, 2.31, 306, 0, null, 4.1, 76, 363, 391),
                upper("Dunveery day 1 12Z", JetAscents.DUNVEERY_DAY_1_12, 0.80, 304, 0, null, 7.1, 98, 356, 384),
                upper("Dunveery day 2 00Z", JetAscents.DUNVEERY_DAY_2_00, 0.19, 299, 270, new int[] {295, 304}, 14.7, 126, 347, 371),
                upper("Dunveery day 2 12Z", JetAscents.DUNVEERY_DAY_2_12, 0.70, 284, 0, null, 8.1, 104, 334, 341),
                upper("Dunveery day 3 00Z", JetAscents.DUNVEERY_DAY_3_00, 1.81, 275, 0, null, 4.9, 82, 329, 328),
                upper("Kelbrith day 2 00Z", JetAscents.KELBRITH_DAY_2_00, 0.53, 298, 0, null, 9.5, 111, 352, 380),
                upper("Kelbrith day 2 12Z", JetAscents.KELBRITH_DAY_2_12, 0.16, 291, 330, new int[] {286, 296}, 16.8, 131, 347, 368),
                upper("Kelbrith day 2 18Z", JetAscents.KELBRITH_DAY_2_18, 0.38, 289, 0, null, 11.6, 126, 341, 359),
                upper("Kelbrith day 3 00Z", JetAscents.KELBRITH_DAY_3_00, 1.11, 283, 0, null, 6.6, 103, 336, 350),
                new Case("Ossenfell day 2 00Z", JetAscents.OSSENFELL_DAY_2_00, 4000, 6800, 0.86, 178, 0, null, 8.7, 88, 360, 384),
                new Case("Ossenfell day 2 12Z", JetAscents.OSSENFELL_DAY_2_12, 4000, 6800, 0.19, 172, 210, new int[] {169, 175}, 17.3, 101, 355, 376),
                new Case("Ossenfell day 3 00Z", JetAscents.OSSENFELL_DAY_3_00, 4000, 6800, 1.08, 167, 0, null, 7.9, 93, 349, 366),
                new Case("Tarquidd day 2 12Z", JetAscents.TARQUIDD_DAY_2_12, 10900, 11900, 0.74, 374, 0, null, 14.9, 107, 336, 360),
                upper("Tarquidd day 3 00Z", JetAscents.TARQUIDD_DAY_3_00, 0.21, 296, 230, new int[] {292, 300}, 14.1, 120, 347, 365),
                upper("Tarquidd day 3 12Z", JetAscents.TARQUIDD_DAY_3_12, 1.78, 289, 0, null, 5.0, 93, 340, 350));
    }

    private static Case upper(String name, JetAscents ascent, double richardson, double flightLevel, double depth, int[] quarter,
            double shear, double jetKnots, double jetLevel, double tropopauseLevel) {
        return new Case(name, ascent, 7500, 10400, richardson, flightLevel, depth, quarter, shear, jetKnots, jetLevel, tropopauseLevel);
    }

    @ParameterizedTest
    @MethodSource("cases")
    void theMinimumLiesWhereTheFormulasPutIt(Case c) {
        RichardsonProfile result = RichardsonAnalysis.of(c.ascent.profile(), 100);
        RichardsonMinimum minimum = result.minimumBetween(c.low, c.high).orElseThrow();
        assertEquals(c.richardson, minimum.richardsonNumber(), 0.02);
        assertEquals(c.flightLevel, minimum.flightLevel(), 3);
        assertEquals(c.depth, minimum.depthBelowQuarter(), 15);
        assertEquals(c.shear, result.maximumShearOverThousandFeetBetween(c.low, c.high) / Units.KNOT_PER_THOUSAND_FEET, 0.15);
        if (c.quarter == null) {
            assertNull(minimum.bandBelowQuarter());
        } else {
            assertBand(c.quarter, minimum.bandBelowQuarter(), result.profile());
        }
    }

    private static void assertBand(int[] flightLevels, HeightBand band, VerticalProfile profile) {
        assertNotNull(band);
        assertEquals(flightLevels[0], profile.flightLevelAt(band.base()), 1.5);
        assertEquals(flightLevels[1], profile.flightLevelAt(band.top()), 1.5);
    }

    @ParameterizedTest
    @MethodSource("cases")
    void jetAndTropopauseLieWhereTheFormulasPutThem(Case c) {
        VerticalProfile profile = c.ascent.profile();
        WindMaximum jet = WindMaximum.of(profile).orElseThrow();
        assertEquals(c.jetKnots, jet.speed() / Units.KNOT, 1);
        assertEquals(c.jetLevel, jet.flightLevel(), 10);
        assertEquals(c.tropopauseLevel, Tropopause.of(profile).get(0).flightLevel(), 10);
    }

    @ParameterizedTest
    @MethodSource("cases")
    void bandsBelowOneReachAsFarAsTheFormulasSay(Case c) {
        RichardsonMinimum minimum = RichardsonAnalysis.of(c.ascent.profile(), 100).minimumBetween(c.low, c.high).orElseThrow();
        assertEquals(c.richardson < 1, minimum.bandBelowOne() != null);
        if (c.name.equals("Ossenfell day 2 12Z")) {
            assertBand(new int[] {162, 182}, minimum.bandBelowOne(), c.ascent.profile());
        } else if (c.name.equals("Dunveery day 2 00Z")) {
            assertBand(new int[] {281, 312}, minimum.bandBelowOne(), c.ascent.profile());
        }
    }

    @ParameterizedTest
    @MethodSource("cases")
    void withInstrumentNoiseMostAscentsStayOnTheirSideOfAQuarter(Case c) {
        long seed = 40;
        int right = 0;
        for (int copy = 0; copy < 10; copy++) {
            VerticalProfile noisy = c.ascent.profile(0.3, 0.1, new Random(seed + copy));
            double minimum = RichardsonAnalysis.of(noisy, 200).minimumBetween(c.low, c.high).orElseThrow().richardsonNumber();
            right += minimum < 0.25 == c.richardson < 0.25 ? 1 : 0;
        }
        assertTrue(right >= 8, right + " of 10 copies, seeds from " + seed);
    }

    @Test
    void theLayerUnderTheJetIsFoundWholeAndMeasured() {
        RichardsonProfile result = RichardsonAnalysis.of(JetAscents.KELBRITH_DAY_2_12.profile(), 200);
        List<ShearLayer> layers = result.layers();
        assertEquals(1, layers.size());
        ShearLayer layer = layers.get(0);
        assertEquals("A", layer.letter());
        assertTrue(layer.extent().contains(8750));
        assertTrue(layer.basePressure() > layer.topPressure());
        assertEquals(result.profile().flightLevelAt(layer.base()), layer.baseFlightLevel(), 1e-9);
        // the wind blows from 250° and strengthens with height: the change points towards 070°
        assertEquals(70, layer.windChangeDirection(), 0.5);
        assertEquals(Math.round(layer.depth() / 10), layer.windLevelCount(), 1);
        assertTrue(layer.bulkRichardsonNumber() > layer.minimum().richardsonNumber());
        assertTrue(layer.bulkRichardsonNumber() < 0.5);
        assertEquals(16.8, layer.maximumShearOverThousandFeet() / Units.KNOT_PER_THOUSAND_FEET, 0.1);
        assertTrue(layer.remarks().contains(LayerRemark.HUMIDITY_UNKNOWN));
    }
}
