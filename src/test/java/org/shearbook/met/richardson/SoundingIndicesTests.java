package org.shearbook.met.richardson;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.richardson.SoundingIndex.Orientation;
import org.shearbook.testing.AnalyticShearFlows;

class SoundingIndicesTests {

    private static final double[] LEVELS = AnalyticShearFlows.evenly(0, 4000, 10);

    private static double value(List<SoundingIndex> indices, String symbol, double height) {
        return indices.stream().filter(i -> i.symbol().equals(symbol)).findFirst().orElseThrow().at(height);
    }

    @Test
    void uniformShearHasItsClosedForms() {
        // exact: u = 10 + 0.01 z, N² = 4e-5: S² = 1e-4, Ri = 0.4
        List<SoundingIndex> indices = SoundingIndices.of(RichardsonAnalysis.of(
                AnalyticShearFlows.profile(LEVELS, z -> 10 + 0.01 * z, z -> 0, z -> 4e-5 * z), 200), 90);
        double knots = 592.4838 * 0.01;
        assertEquals(knots, value(indices, "VWS", 2000), 1e-3);
        assertEquals(0.4, value(indices, "Ri", 2000), 1e-6);
        assertEquals(knots * knots * (1 - 0.4 / 0.5), value(indices, "CP", 2000), 1e-3);
        assertEquals(0, value(indices, "E", 2000), 1e-12);
        assertEquals(6e-5, value(indices, "ε_K", 2000), 1e-10);
        assertEquals(4e-5 / (30 * 30), value(indices, "l²", 2000), 2e-11);
        assertEquals(0, value(indices, "A", 2000), "Ri 0.4 is above 0.32");
    }

    @Test
    void belowTheFinalRichardsonNumberThereIsEnergyToGive() {
        // exact: Ri = 0.16, ΔV = 0.02 × 304.8 m/s
        List<SoundingIndex> indices = SoundingIndices.of(RichardsonAnalysis.of(
                AnalyticShearFlows.profile(LEVELS, z -> 0.02 * z, z -> 0, z -> 6.4e-5 * z), 200), 90);
        assertEquals(Math.pow(0.02 * 304.8, 2) / 12 * 0.5, value(indices, "A", 2000), 1e-6);
    }

    @Test
    void aTurningWindHasTheIndexOfEndlich() {
        // exact: 20 m/s turning by 1 radian per 2000 m: |V| dα/dz = 0.01 s⁻¹
        List<SoundingIndex> indices = SoundingIndices.of(RichardsonAnalysis.of(AnalyticShearFlows.profile(
                LEVELS, z -> 20 * Math.sin(z / 2000), z -> 20 * Math.cos(z / 2000), z -> 1e-4 * z), 100), 0);
        assertEquals(0.01, value(indices, "E", 2000), 2e-5);
        // exact: U = 20 cos(z/2000) northward, U″/U = −1/2000²
        assertEquals(1e-4 / Math.pow(20 * Math.cos(1), 2) + 1 / 4e6, value(indices, "l²", 2000), 2e-8);
    }

    @Test
    void eachIndexSaysWhatItIsAndWhichWayMeansTurbulence() {
        List<SoundingIndex> indices = SoundingIndices.of(RichardsonAnalysis.of(
                AnalyticShearFlows.tanhLayer(LEVELS, 2000, 200, 6, 1e-4), 200), 90);
        assertEquals(List.of("VWS", "Ri", "CP", "E", "ε_K", "l²", "A"), indices.stream().map(SoundingIndex::symbol).toList());
        for (SoundingIndex index : indices) {
            assertFalse(index.name().isBlank() || index.unit().isBlank() || index.formula().isBlank() || index.source().isBlank());
            assertEquals(index.heights().length, index.values().length);
            double inside = index.at(2000);
            double outside = index.at(1500);
            if (index.orientation() == Orientation.HIGHER_IS_MORE_TURBULENT && !index.symbol().equals("E")) {
                assertTrue(inside > outside, index.symbol());
            } else if (index.orientation() == Orientation.LOWER_IS_MORE_TURBULENT) {
                assertTrue(inside < outside, index.symbol());
            }
        }
    }

    @Test
    void constantWindAndCalmGiveNoNumberWhereThereIsNone() {
        List<SoundingIndex> constant = SoundingIndices.of(RichardsonAnalysis.of(
                AnalyticShearFlows.profile(LEVELS, z -> 12, z -> 0, z -> 1e-4 * z), 200), 90);
        assertEquals(0, value(constant, "VWS", 2000), 1e-9);
        assertTrue(Double.isNaN(value(constant, "Ri", 2000)));
        assertTrue(Double.isNaN(value(constant, "A", 2000)));
        assertEquals(1e-4 / 144, value(constant, "l²", 2000), 1e-10);
        List<SoundingIndex> calm = SoundingIndices.of(RichardsonAnalysis.of(
                AnalyticShearFlows.profile(LEVELS, z -> 0, z -> 0, z -> 1e-4 * z), 200), 90);
        assertTrue(Double.isNaN(value(calm, "E", 2000)));
        assertTrue(Double.isNaN(value(calm, "l²", 2000)));
        for (SoundingIndex index : calm) {
            for (double v : index.values()) {
                assertFalse(Double.isInfinite(v));
            }
        }
    }

    @Test
    void gapsStayEmptyAndBeyondTheDataThereIsNothing() {
        VerticalProfile whole = AnalyticShearFlows.tanhLayer(LEVELS, 3000, 200, 6, 1e-4);
        VerticalProfile withGap = new VerticalProfile(Double.NaN, whole.thermodynamicLevels(), whole.windLevels(), List.of(),
                List.of(new HeightBand(1000, 1500)), List.of());
        for (SoundingIndex index : SoundingIndices.of(RichardsonAnalysis.of(withGap, 200), 90)) {
            assertTrue(Double.isNaN(index.at(1250)), index.symbol());
            assertTrue(Double.isNaN(index.at(9000)) && Double.isNaN(index.at(Double.NaN)), index.symbol());
            assertFalse(Double.isNaN(index.at(3120)), index.symbol());
        }
        RichardsonProfile empty = RichardsonAnalysis.of(new VerticalProfile(whole.thermodynamicLevels(), List.of()), 200);
        assertEquals(0, SoundingIndices.of(empty, 90).get(0).values().length);
        assertTrue(Double.isNaN(SoundingIndices.of(empty, 90).get(0).at(100)));
        assertThrows(IllegalArgumentException.class, () -> SoundingIndices.of(empty, Double.NaN));
    }
}
