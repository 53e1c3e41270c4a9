package org.shearbook.met.richardson;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.Saturation;
import org.shearbook.met.profile.SaturationRule;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.testing.AnalyticShearFlows;

class MoistRichardsonTests {

    private static final double LAPSE = 0.0055;
    private static final double SURFACE = 283.15;

    /** 5.5 K/km and a uniform shear of 0.01 s⁻¹, cloud between two heights. */
    private static VerticalProfile cloud(double base, double top, double humidityInside, List<HeightBand> temperatureGaps) {
        List<ThermodynamicLevel> temperatures = new ArrayList<>();
        List<WindLevel> winds = new ArrayList<>();
        for (double z = 0; z <= 6000; z += 20) {
            double temperature = SURFACE - LAPSE * z;
            double pressure = 100_000 * Math.pow(temperature / SURFACE, 9.80665 / (287.05287 * LAPSE));
            double humidity = z >= base && z <= top ? humidityInside : 0.3;
            temperatures.add(new ThermodynamicLevel(z, pressure, temperature,
                    MoistThermodynamics.dewPointFromRelativeHumidity(temperature, humidity)));
            winds.add(new WindLevel(z, 0.01 * z, 0));
        }
        return new VerticalProfile(Double.NaN, temperatures, winds, temperatureGaps, List.of(), List.of());
    }

    @Test
    void insideCloudTheMoistValueIsMuchLowerAndOutsideItIsTheDryOne() {
        RichardsonProfile dry = RichardsonAnalysis.of(cloud(2000, 4000, 1.0, List.of()), 200);
        MoistRichardson moist = MoistRichardson.of(dry, SaturationRule.DEFAULT);
        double[] z = dry.heights();
        double[] dryRi = dry.richardsonNumber();
        double[] moistRi = moist.measuredRichardsonNumber();
        assertEquals(z.length, moistRi.length);
        assertTrue(moist.hasSaturation());
        for (int i = 0; i < z.length; i++) {
            boolean inside = z[i] > 2600 && z[i] < 3400;
            boolean outside = z[i] < 1400 || z[i] > 4600;
            if (inside) {
                assertEquals(Saturation.OVER_WATER, moist.saturations().get(i));
                // computed elsewhere at 0 °C, 700 hPa: dry N² falls by about 1.2e-4 when saturated, at 0.01 s⁻¹ by 1.2 in Ri
                assertEquals(dryRi[i] - 1.15, moistRi[i], 0.25);
            } else if (outside) {
                assertEquals(Saturation.UNSATURATED, moist.saturations().get(i));
                assertEquals(dryRi[i], moistRi[i], 1e-6 * dryRi[i] + 1e-9);
            }
        }
        assertTrue(moist.minimumBetween(2600, 3400).orElseThrow().richardsonNumber() < 0.6);
        assertNotNull(moist.flowAt(3000));
        assertEquals(1, moist.flows().size());
    }

    @Test
    void theDryResultDoesNotChangeForStandingBesideAMoistOne() {
        RichardsonProfile dry = RichardsonAnalysis.of(cloud(2000, 4000, 1.0, List.of()), 200);
        double[] before = dry.richardsonNumber();
        MoistRichardson moist = MoistRichardson.of(dry, SaturationRule.DEFAULT);
        assertArrayEquals(before, moist.dry().richardsonNumber());
        assertArrayEquals(before, RichardsonAnalysis.of(cloud(2000, 4000, 1.0, List.of()), 200).richardsonNumber());
    }

    @Test
    void iceIsMarkedAsAssumed() {
        // 90 % over water between −19 and −22 °C
        RichardsonProfile dry = RichardsonAnalysis.of(cloud(5300, 5900, 0.90, List.of()), 100);
        MoistRichardson moist = MoistRichardson.of(dry, SaturationRule.DEFAULT);
        int at = 0;
        while (dry.heights()[at] < 5600) {
            at++;
        }
        assertEquals(Saturation.OVER_ICE_ASSUMED, moist.saturations().get(at));
        assertTrue(moist.measuredRichardsonNumber()[at] < dry.measuredRichardsonNumber()[at] - 0.1);
    }

    @Test
    void withoutHumidityMoistIsDryAndSaturationUnknown() {
        VerticalProfile profile = AnalyticShearFlows.tanhLayer(AnalyticShearFlows.evenly(0, 4000, 10), 2000, 200, 6, 1e-4);
        RichardsonProfile dry = RichardsonAnalysis.of(profile, 200);
        MoistRichardson moist = MoistRichardson.of(dry, SaturationRule.DEFAULT);
        assertFalse(moist.hasSaturation());
        assertTrue(moist.saturations().stream().allMatch(Saturation.UNKNOWN::equals));
        double[] expected = dry.measuredRichardsonNumber();
        double[] found = moist.measuredRichardsonNumber();
        for (int i = 0; i < expected.length; i++) {
            if (Double.isNaN(expected[i])) {
                assertTrue(Double.isNaN(found[i]));
            } else {
                assertEquals(expected[i], found[i], 1e-9 * Math.abs(expected[i]) + 1e-12);
            }
        }
        assertEquals(Saturation.UNKNOWN, moist.saturationOf(dry.layers().get(0)));
    }

    @Test
    void nothingIsMadeUpInsideAGap() {
        RichardsonProfile dry = RichardsonAnalysis.of(cloud(1000, 5000, 1.0, List.of(new HeightBand(2500, 3000))), 200);
        MoistRichardson moist = MoistRichardson.of(dry, SaturationRule.DEFAULT);
        for (int i = 0; i < dry.size(); i++) {
            if (dry.heights()[i] > 2500 && dry.heights()[i] < 3000) {
                assertTrue(Double.isNaN(moist.richardsonNumber()[i]));
                assertEquals(Saturation.UNKNOWN, moist.saturations().get(i));
            }
        }
        assertEquals(2, moist.flows().size());
    }

    @Test
    void anAscentWithoutOverlapHasNoMoistPoints() {
        VerticalProfile single = new VerticalProfile(List.of(new ThermodynamicLevel(0, 100_000, 280, 280)), List.of());
        MoistRichardson moist = MoistRichardson.of(RichardsonAnalysis.of(single, 200), SaturationRule.DEFAULT);
        assertEquals(0, moist.richardsonNumber().length);
        assertFalse(moist.hasSaturation());
        assertTrue(moist.minimumBetween(0, 1000).isEmpty());
    }
}
