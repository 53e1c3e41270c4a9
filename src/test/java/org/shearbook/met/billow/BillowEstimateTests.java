package org.shearbook.met.billow;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.shearbook.met.decode.EdrClasses;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.met.richardson.ShearLayer;
import org.shearbook.met.taylorgoldstein.Mode;
import org.shearbook.met.taylorgoldstein.SearchSettings;
import org.shearbook.met.taylorgoldstein.StabilityAnalysis;
import org.shearbook.met.taylorgoldstein.StabilityResult;
import org.shearbook.testing.AnalyticShearFlows;
import org.shearbook.testing.JetAscents;

class BillowEstimateTests {

    private static BillowWave wave(double wavelength, double growthRate) {
        return new BillowWave(wavelength, growthRate, 270, 20, true, BillowWave.SOLVED);
    }

    @ParameterizedTest
    @CsvSource({
        // ΔU, h₀, Ri, λ, H, e-folding, event means of EDR: computed elsewhere with Ri_f 0.32
        "8, 200, 0.1, 1417, 640, 198, 0.12, 0.15", "12, 300, 0.1, 2125, 960, 198, 0.15, 0.19",
        "15, 400, 0.1, 2833, 1280, 210, 0.18, 0.22", "20, 500, 0.05, 3555, 1777, 157, 0.23, 0.29", "5, 100, 0.2, 668, 160, 424, 0.08, 0.10"})
    void heightAndMeanDissipationMeetTheWorkedExamples(double change, double depth, double richardson, double wavelength, double height,
            double eFolding, double least, double most) {
        BillowEstimate billows = BillowEstimate.of(wave(wavelength, 1 / eFolding), change, change / depth, richardson);
        assertEquals(depth, billows.initialDepth(), 1e-9);
        assertEquals(height, billows.height(), 0.01 * height);
        double time = billows.laboratoryTime();
        assertEquals(most, Math.cbrt(TurbulenceEstimate.meanDissipation(billows, billows.height(), time)), 0.006);
        assertEquals(least, Math.cbrt(TurbulenceEstimate.meanDissipation(billows, billows.height(), 2 * time)), 0.006);
    }

    @ParameterizedTest
    @CsvSource({"0.03, 7.08, 0.50", "0.05, 7.09, 0.50", "0.10, 7.08, 0.45", "0.15, 6.89, 0.31", "0.20, 6.68, 0.24", "0.22, 6.55, 0.22"})
    void heightOverWavelengthFallsWithStability(double richardson, double wavelengthOverDepth, double ratio) {
        // computed elsewhere: the same combination; 0.2 to 0.5 is usually quoted, from memory
        BillowEstimate billows = BillowEstimate.of(wave(wavelengthOverDepth * 200, 0.005), 8, 0.04, richardson);
        assertEquals(ratio, billows.height() / billows.crestSpacing(), 0.006);
    }

    @ParameterizedTest
    @CsvSource({"0.10, 6.4e-4, 1.3e-3, 7.08", "0.15, 4.9e-4, 9.8e-4, 6.89", "0.20, 3.5e-4, 6.9e-4, 6.68", "0.05, 7.5e-4, 1.5e-3, 7.09"})
    void dissipationScalesWithTheCubeOfTheWindChange(double richardson, double least, double most, double wavelengthOverDepth) {
        // computed elsewhere: ε = c ΔU³/h₀
        BillowEstimate billows = BillowEstimate.of(wave(wavelengthOverDepth * 200, 0.005), 8, 0.04, richardson);
        double scale = 8 * 8 * 8 / 200.0;
        assertEquals(most, TurbulenceEstimate.meanDissipation(billows, billows.height(), billows.laboratoryTime()) / scale, 0.04 * most);
        assertEquals(least, TurbulenceEstimate.meanDissipation(billows, billows.height(), 2 * billows.laboratoryTime()) / scale, 0.04 * least);
    }

    @Test
    void theRangeOfHeightAndTimeIsOrdered() {
        BillowEstimate billows = BillowEstimate.of(wave(1417, 1 / 198.0), 8, 0.04, 0.1);
        // exact: 200 m × 0.25/0.1 and 0.40/0.1, the latter above half a wavelength
        assertEquals(500, billows.lowHeight(), 1e-9);
        assertEquals(708.5, billows.highHeight(), 1e-9);
        assertEquals(0.0125, billows.shearAfterMixing(), 1e-9);
        // exact: ln(640 / 2√5) e-foldings of 198 s; 5 λ/ΔU = 886 s lies between ln(64) and ln(320) e-foldings
        assertEquals(198 * Math.log(320 / Math.sqrt(5)), billows.timeToBreakdown(), 1e-6);
        assertEquals(198 * Math.log(64), billows.shortTimeToBreakdown(), 1e-6);
        assertEquals(198 * Math.log(320), billows.longTimeToBreakdown(), 1e-6);
        assertEquals(5 * 1417 / 8.0, billows.turbulentLifetime(), 1e-9);
    }

    @Test
    void turbulenceIsARangeWithWordsEditionAndAnHonestSentence() {
        TurbulenceEstimate turbulence = TurbulenceEstimate.of(BillowEstimate.of(wave(1417, 1 / 198.0), 8, 0.04, 0.1));
        assertEquals(0.12, turbulence.low(), 0.011);
        assertEquals(0.13, turbulence.middle(), 0.011);
        assertEquals(0.32, turbulence.high(), 0.021);
        for (double edr : new double[] {turbulence.low(), turbulence.middle(), turbulence.high()}) {
            assertEquals(Math.round(edr * 100), edr * 100, 1e-9, "not more than two decimals");
        }
        EdrClasses table = EdrClasses.ANNEX_3_PRESENT;
        String words = turbulence.inWords(edr -> switch (table.intensity(edr)) {
            case NIL -> "nil";
            case LGT -> "light";
            case MOD -> "moderate";
            default -> "severe";
        }, table.edition());
        assertTrue(words.contains("light to moderate") && words.endsWith("(" + table.edition() + ")"), words);
        assertTrue(turbulence.basis().contains("Only if they grow and break"));
        assertTrue(turbulence.basis().contains(BillowWave.SOLVED));
        assertEquals("0.10-0.10, x (e)", new TurbulenceEstimate(0.1, 0.1, 0.1, "b").inWords(edr -> "x", "e"));
    }

    @ParameterizedTest
    @CsvSource({"1400, 230, 6.1", "2800, 230, 12.2"})
    void atTheCriticalLevelCrestsPassAsTheAirspeedSays(double wavelength, double airspeed, double seconds) {
        // computed elsewhere: 1.4 km at 230 m/s 6.1 s, 2.8 km 12.2 s; there the wind along the wave is its phase speed
        BillowWave wave = new BillowWave(wavelength, 0.005, 90, 20, true, BillowWave.SOLVED);
        assertEquals(seconds, wave.passingInterval(airspeed, 90, 20, 0), 0.05);
        assertEquals(seconds, wave.passingInterval(airspeed, 270, 20, 0), 0.05);
    }

    @Test
    void offTheWaveVectorCrestsPassMoreSlowlyAndAlongThemNever() {
        BillowWave wave = new BillowWave(2000, 0.005, 90, 0, true, BillowWave.SOLVED);
        assertEquals(2000 / (200 * Math.cos(Math.toRadians(60))), wave.passingInterval(200, 30, 0, 0), 1e-6);
        assertEquals(Double.POSITIVE_INFINITY, wave.passingInterval(200, 0, 0, 0));
        // the track is held: 30 m/s from the side cost 200 − √(200² − 30²) of ground speed
        assertEquals(2000 / Math.sqrt(200 * 200 - 30 * 30), wave.passingInterval(200, 90, 0, 30), 1e-6);
        assertTrue(Double.isNaN(wave.passingInterval(40, 90, 0, 50)), "a wind too strong to hold the track");
        assertTrue(Double.isNaN(wave.passingInterval(40, 90, -50, 0)), "a head wind too strong to advance");
        assertThrows(IllegalArgumentException.class, () -> wave.passingInterval(0, 90, 0, 0));
        assertThrows(IllegalArgumentException.class, () -> wave.passingInterval(100, Double.NaN, 0, 0));
    }

    @Test
    void theOppositeWayOfWritingAWaveChangesNothing() {
        BillowWave one = new BillowWave(2000, 0.005, 90, 15, true, BillowWave.SOLVED);
        BillowWave same = new BillowWave(2000, 0.005, 270, -15, true, BillowWave.SOLVED);
        for (double track = 0; track < 360; track += 17) {
            assertEquals(one.passingInterval(220, track, 12, -7), same.passingInterval(220, track, 12, -7), 1e-6);
        }
        assertEquals(2000 / 15.0, one.passingIntervalAtFixedPoint(), 1e-9);
        assertEquals(one.passingIntervalAtFixedPoint(), same.passingIntervalAtFixedPoint(), 1e-9);
        assertEquals(Double.POSITIVE_INFINITY, new BillowWave(2000, 0.005, 90, 0, true, "x").passingIntervalAtFixedPoint());
    }

    @Test
    void withoutASolvedWaveTheRuleServesAndSaysSo() {
        ShearLayer layer = layer();
        BillowEstimate byRule = BillowEstimate.of(layer, Optional.empty()).orElseThrow();
        assertFalse(byRule.wave().solved());
        assertEquals(DepthRule.BASIS, byRule.wave().basis());
        assertEquals(DepthRule.of(layer).wavelength(), byRule.crestSpacing(), 1e-9);
        assertTrue(TurbulenceEstimate.of(byRule).basis().contains(DepthRule.BASIS));
        assertEquals(90, byRule.wave().azimuth(), 1e-6);
        Mode bad = new Mode(90, 0.004, 0.005, 0, List.of(), 1, 1, null, false, "not converged");
        assertFalse(BillowEstimate.of(layer, Optional.of(bad)).orElseThrow().wave().solved());
        Mode good = new Mode(80, 0.004, 0.005, 3, List.of(2000.0), 1e-9, 1e-4, null, true, "");
        BillowEstimate solved = BillowEstimate.of(layer, Optional.of(good)).orElseThrow();
        assertTrue(solved.wave().solved());
        assertEquals(2 * Math.PI / 0.004, solved.crestSpacing(), 1e-9);
        assertEquals(3, solved.wave().phaseSpeed());
    }

    private static ShearLayer layer() {
        return RichardsonAnalysis.of(AnalyticShearFlows.tanhLayer(AnalyticShearFlows.evenly(0, 4000, 10), 2000, 200, 6, 1e-4), 60).layers().get(0);
    }

    @Test
    void impossibleNumbersAreRefusedAndExtremesStayFinite() {
        assertThrows(IllegalArgumentException.class, () -> wave(0, 0.005));
        assertThrows(IllegalArgumentException.class, () -> wave(1000, Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> BillowEstimate.of(wave(1000, 0.005), 0, 0.04, 0.1));
        assertThrows(IllegalArgumentException.class, () -> BillowEstimate.of(wave(1000, 0.005), 8, Double.NaN, 0.1));
        assertThrows(IllegalArgumentException.class, () -> BillowEstimate.of(wave(1000, 0.005), 8, 0.04, Double.POSITIVE_INFINITY));
        // Ri 0: half a wavelength; Ri above every Ri_f: nothing mixes and nothing dissipates
        assertEquals(500, BillowEstimate.of(wave(1000, 0.005), 8, 0.04, 0).height(), 1e-9);
        BillowEstimate still = BillowEstimate.of(wave(1000, 0.005), 8, 0.04, 0.9);
        assertEquals(200, still.height(), 1e-9);
        assertEquals(0, TurbulenceEstimate.of(still).high());
        assertThrows(IllegalArgumentException.class, () -> new TurbulenceEstimate(0.2, 0.1, 0.3, "b"));
    }

    private static VerticalProfile humid(double surfaceTemperature, double depression) {
        List<ThermodynamicLevel> levels = IntStream.rangeClosed(0, 60).mapToObj(k -> {
            double z = 100.0 * k;
            double temperature = surfaceTemperature - 0.0065 * z;
            return new ThermodynamicLevel(z, 100_000 * Math.exp(-z / 8000), temperature, temperature - depression);
        }).toList();
        return new VerticalProfile(levels, List.of());
    }

    @Test
    void cloudShowsWhereHalfTheBillowHeightReachesSaturation() {
        // common practice, no source: 125 m of lift per kelvin between temperature and dew point
        CloudPossibility needs = CloudPossibility.of(humid(290, 2), new HeightBand(1000, 1400), 600);
        assertEquals(250, needs.liftToWater(), 15);
        assertEquals(CloudPossibility.Answer.WATER_CLOUD, needs.answer());
        assertEquals(300, needs.lift());
        assertEquals(CloudPossibility.Answer.NO_CLOUD, CloudPossibility.of(humid(290, 2), new HeightBand(1000, 1400), 400).answer());
        // −36 °C: 4 K below over water is still at saturation over ice
        double cold = 237;
        assertTrue(MoistThermodynamics.relativeHumidityOverIce(cold, cold - 3) > 1);
        CloudPossibility ice = CloudPossibility.of(humid(276, 3), new HeightBand(5900, 6000), 100);
        assertEquals(CloudPossibility.Answer.ICE_CLOUD_POSSIBLE, ice.answer());
        assertEquals(0, ice.liftToIce());
        assertTrue(ice.liftToWater() > 250);
    }

    @Test
    void withoutHumidityCloudIsUnknown() {
        VerticalProfile dry = AnalyticShearFlows.tanhLayer(AnalyticShearFlows.evenly(0, 4000, 10), 2000, 200, 6, 1e-4);
        CloudPossibility answer = CloudPossibility.of(dry, new HeightBand(1800, 2200), 800);
        assertEquals(CloudPossibility.Answer.UNKNOWN, answer.answer());
        assertTrue(Double.isNaN(answer.height()) && Double.isNaN(answer.liftToWater()) && Double.isNaN(answer.liftToIce()));
        assertEquals(CloudPossibility.Answer.UNKNOWN, CloudPossibility.of(dry, new HeightBand(9000, 9100), 800).answer());
        assertEquals(CloudPossibility.Answer.NO_CLOUD, CloudPossibility.of(humid(290, 90), new HeightBand(1000, 1400), 600).answer());
        assertThrows(IllegalArgumentException.class, () -> CloudPossibility.of(dry, new HeightBand(1800, 2200), Double.NaN));
    }

    @Test
    void aWaveNeedsFiveEFoldingsToShow() {
        // published: σ T above about 5, Barad and Fringer 2010, as summarised elsewhere
        assertTrue(wave(1000, 0.002).hasTimeToGrow(2501));
        assertFalse(wave(1000, 0.002).hasTimeToGrow(2499));
        assertThrows(IllegalArgumentException.class, () -> wave(1000, 0.002).hasTimeToGrow(Double.NaN));
    }

    @Test
    void whereSolvingFindsNoWaveTheRuleSaysThatToo() {
        // Tarquidd, day 3, at 200 m: Ri 0.23, so close to a quarter that no wave grows above the floor of the search
        RichardsonProfile weak = RichardsonAnalysis.of(JetAscents.TARQUIDD_DAY_3_00.profile(), 200);
        StabilityResult none = new StabilityAnalysis(SearchSettings.forLayers()).ofLayer(weak, weak.layers().get(0).extent());
        assertTrue(none.complete() && none.fastest().isEmpty());
        BillowEstimate byRule = BillowEstimate.of(weak.layers().get(0), none).orElseThrow();
        assertFalse(byRule.wave().solved());
        assertEquals("rule, not solved; solving found no growing wave", byRule.wave().basis());

        RichardsonProfile strong = RichardsonAnalysis.of(JetAscents.KELBRITH_DAY_2_12.profile(), 100);
        StabilityResult found = new StabilityAnalysis(SearchSettings.forLayers()).ofLayer(strong, strong.layers().get(0).extent());
        BillowEstimate solved = BillowEstimate.of(strong.layers().get(0), found).orElseThrow();
        assertTrue(solved.wave().solved());
        // computed elsewhere for this ascent: 4.5 km, 8.6 min
        assertEquals(4500, solved.crestSpacing(), 450);
        assertEquals(8.6, solved.wave().eFoldingTime() / 60, 1.7);
    }
}
