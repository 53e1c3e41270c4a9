package org.shearbook.desk.analysis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.met.quality.CheckedSounding;
import org.shearbook.met.quality.SoundingQuality;
import org.shearbook.met.richardson.InstrumentNoise;
import org.shearbook.testing.AnalyticShearFlows;
import org.shearbook.testing.JetAscents;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The analysis document. */
class DocumentWriterTests {

    private static final JsonMapper JSON = JsonMapper.shared();

    private static AnalysisDocument document(VerticalProfile profile, double window) {
        return DocumentWriter.write(1L, "XV", null, profile, InstrumentNoise.DEFAULT, window, null);
    }

    @Test
    void aJetWithAShearLayerGivesOneLayerWithItsRuleLabelled() {
        AnalysisDocument document = document(JetAscents.KELBRITH_DAY_2_12.profile(), 100);
        // Computed elsewhere for the same formulas: min Ri 0.16 at FL291, shear 16.8 kt over 1000 ft, tropopause FL368,
        // jet 131 kt at FL347, wavelength 4.5 km and e-folding 8.8 min solved.
        assertThat(document.lowest().richardson()).isCloseTo(0.16, within(0.02));
        assertThat(document.lowest().flightLevel()).isCloseTo(291, within(3.0));
        assertThat(document.lowest().windowM()).isEqualTo(100);
        assertThat(document.lowest().shear1000FtKt()).isCloseTo(16.8, within(0.1));
        assertThat(document.references().tropopauseFlightLevel()).isCloseTo(368, within(10.0));
        assertThat(document.references().maxWindFlightLevel()).isCloseTo(347, within(10.0));
        assertThat(document.references().maxWindMs() / 0.514444).isCloseTo(131, within(1.0));
        assertThat(document.state()).isEqualTo("subcritical");
        AnalysisDocument.Layer layer = document.layers().get(document.layers().size() - 1);
        assertThat(layer.rule().basis()).isEqualTo("rule, not solved");
        assertThat(layer.rule().wavelengthM()).isBetween(3_000.0, 6_000.0);
        assertThat(layer.rule().eFoldingMin()).isBetween(4.0, 18.0);
        assertThat(layer.mode().wavelengthM()).isCloseTo(4_500, within(450.0));
        assertThat(layer.mode().eFoldingMin()).isCloseTo(8.8, within(1.3));
        assertThat(layer.mode().converged()).isTrue();
        assertThat(layer.mode().criticalHeightM()).isBetween(layer.baseHeightM(), layer.topHeightM());
        assertThat(layer.modeReason()).isNull();
        assertThat(layer.probabilityRichardsonBelowQuarter()).isBetween(0.5, 1.0);
        assertThat(layer.probabilityUnknownBecause()).isNull();
        assertThat(layer.shearDirectionDeg()).isCloseTo(70, within(2.0));
        assertThat(layer.meanWindFromDeg()).isCloseTo(250, within(1.0));
        assertThat(layer.state()).isEqualTo("subcritical");
    }

    @Test
    void constantWindHasNoRichardsonNumberAndSaysSoAtEveryPoint() {
        VerticalProfile constant = AnalyticShearFlows.profile(AnalyticShearFlows.evenly(0, 3000, 10), z -> 12, z -> 0, z -> 1e-4 * z);
        AnalysisDocument document = document(constant, 200);
        assertThat(document.profile()).isNotEmpty().allSatisfy(point -> {
            assertThat(point.richardson()).isNull();
            assertThat(point.flags()).containsExactly("NO_SHEAR");
            assertThat(point.shearPerS()).isEqualTo(0);
        });
        assertThat(document.lowest()).isNull();
        assertThat(document.state()).isEqualTo("unknown");
        assertThat(document.layers()).isEmpty();
    }

    @Test
    void neitherNaNNorInfinityStandsInTheTextWhateverTheProfile() {
        VerticalProfile whole = JetAscents.TARQUIDD_DAY_2_12.profile();
        VerticalProfile withGap = new VerticalProfile(Double.NaN, whole.thermodynamicLevels(), whole.windLevels(), List.of(),
                List.of(new HeightBand(7500, 7900)), List.of());
        VerticalProfile overturned = AnalyticShearFlows.profile(AnalyticShearFlows.evenly(0, 4000, 20), z -> z / 100, z -> 0,
                z -> 1e-4 * z - 0.05 * Math.sin(z / 150));
        for (VerticalProfile profile : List.of(whole, withGap, overturned)) {
            for (double window : AnalysisBook.windows()) {
                String text = JSON.writeValueAsString(document(profile, window));
                assertThat(text).doesNotContain("NaN").doesNotContain("Infinity");
                assertThat(JSON.readValue(text, AnalysisDocument.class).profile()).isNotEmpty();
            }
        }
        AnalysisDocument gap = document(withGap, 200);
        assertThat(gap.remarks()).anySatisfy(note -> assertThat(note.code()).isEqualTo("GAP"));
        assertThat(gap.profile()).filteredOn(point -> point.heightM() > 7550 && point.heightM() < 7850)
                .allSatisfy(point -> assertThat(point.flags()).containsExactly("GAP"));
        assertThat(document(overturned, 200).remarks()).anySatisfy(note -> assertThat(note.code()).isEqualTo("OVERTURNED"));
    }

    @Test
    void theNamesOfTheTextAreThoseOfTheContract() {
        CheckedSounding checked = SoundingQuality.check(JetAscents.DUNVEERY_DAY_2_00.reported(), 50, null);
        AnalysisDocument document = document(checked.profile().orElseThrow(), 200)
                .withLevels(DocumentWriter.levels(checked.levels()));
        JsonNode json = JSON.readTree(JSON.writeValueAsString(document));
        assertThat(json.propertyNames()).contains("soundingId", "station", "launchedAt", "method", "levels", "profile", "layers", "references", "indices", "remarks");
        assertThat(json.get("method").propertyNames()).contains("version", "windowM", "smoothing", "noise", "moist");
        assertThat(json.get("levels").get(0).propertyNames()).containsExactlyInAnyOrder("heightM", "pressureHpa", "flightLevel", "temperatureC", "dewPointC",
                "windFromDeg", "windSpeedMs", "latitudeDeg", "longitudeDeg", "elapsedS", "flags");
        assertThat(json.get("profile").get(0).propertyNames()).contains("heightM", "flightLevel", "n2PerS2", "n2MoistPerS2", "shearPerS", "shearKtPer1000Ft",
                "richardson", "richardsonMoist", "probabilityRichardsonBelowQuarter");
        assertThat(json.get("layers").get(0).propertyNames()).contains("letter", "baseHeightM", "topHeightM", "baseFlightLevel", "topFlightLevel", "depthM",
                "minRichardson", "bulkRichardson", "windowM", "maxShearPerS", "shear1000FtKt", "windChangeMs", "shearDirectionDeg", "meanWindFromDeg",
                "meanWindMs", "probabilityRichardsonBelowQuarter", "saturated", "state", "mode", "billow", "turbulence", "remarks");
        assertThat(json.get("references").propertyNames()).contains("tropopauseHeightM", "tropopauseFlightLevel", "maxWindMs", "maxWindFlightLevel", "maxWindAtTopOfData");
        assertThat(json.get("levels").size()).isEqualTo(checked.levels().size());
        assertThat(json.get("levels").get(0).get("pressureHpa").asDouble()).isCloseTo(1008 * Math.exp(0), within(0.01));
    }

    @Test
    void localShearIsOneQuantityInTwoUnitsAndTheChangeOverAThousandFeetIsAnother() {
        // Exact: 10 m/s per km is 0.01 1/s, which is 5.925 kt per 1000 ft, over any depth.
        VerticalProfile linear = AnalyticShearFlows.profile(AnalyticShearFlows.evenly(0, 6000, 20), z -> 0.01 * z, z -> 0, z -> 1e-4 * z);
        AnalysisDocument.Point middle = document(linear, 200).profile().stream()
                .filter(point -> point.heightM() > 3000).findFirst().orElseThrow();
        assertThat(middle.shearPerS()).isCloseTo(0.01, within(1e-6));
        assertThat(middle.shearKtPer1000Ft()).isCloseTo(5.92484, within(1e-4));
        assertThat(middle.shear1000FtKt()).isCloseTo(5.92484, within(1e-4));
        assertThat(middle.richardson()).isCloseTo(1.0, within(1e-3));
        // No times in this sounding: 5 m/s is assumed and said.
        assertThat(middle.elapsedS()).isCloseTo(middle.heightM() / 5, within(0.01));
    }

    @Test
    void whereWindAndTemperatureDoNotMeetThereIsNoDocument() {
        VerticalProfile whole = JetAscents.KELBRITH_DAY_2_12.profile();
        VerticalProfile apart = new VerticalProfile(whole.thermodynamicLevels().subList(0, 300), whole.windLevels().subList(400, 700));
        assertThatThrownBy(() -> document(apart, 200)).isInstanceOf(IllegalArgumentException.class).hasMessageContaining("overlap");
    }

    @Test
    void numbersCarrySixDigits() {
        assertThat(Rounded.finite(1.23456789e-4)).isEqualTo(1.23457e-4);
        assertThat(Rounded.finite(-8691.23456)).isEqualTo(-8691.23);
        assertThat(Rounded.finite(123456789.4)).isEqualTo(123456789.0);
        assertThat(Rounded.finite(0)).isEqualTo(0);
        assertThat(Rounded.known(Double.NaN)).isNull();
        assertThat(Rounded.known(Double.POSITIVE_INFINITY)).isNull();
        assertThat(Rounded.finite(1e300)).isEqualTo(1e300);
        assertThat(Rounded.finite(4e-320)).isEqualTo(0);
    }

    @Test
    void aLayerThatGrowsSaysWhatItWouldBecome() {
        AnalysisDocument document = document(JetAscents.KELBRITH_DAY_2_12.profile(), 200);
        AnalysisDocument.Layer layer = document.layers().get(document.layers().size() - 1);
        assertThat(layer.growthByWindow()).extracting(AnalysisDocument.GrowthInWindow::windowM).containsExactly(100.0, 150.0, 200.0);
        assertThat(layer.growthByWindow()).extracting(AnalysisDocument.GrowthInWindow::growthRatePerS).doesNotContainNull();
        assertThat(layer.growthByWindow().get(0).growthRatePerS()).as("smoothing only takes growth away")
                .isGreaterThan(layer.growthByWindow().get(2).growthRatePerS());
        assertThat(layer.growthByWindow().get(2).growthRatePerS()).isEqualTo(layer.mode().growthRatePerS());
        assertThat(layer.billow().crestSpacingM()).isEqualTo(layer.mode().wavelengthM());
        assertThat(layer.billow().heightM()).isBetween(layer.billow().heightLowM(), layer.billow().heightHighM());
        assertThat(layer.billow().timeToBreakdownMin()).isGreaterThan(layer.mode().eFoldingMin());
        // Exact: towards 70 degrees the wave and the wind go with the aircraft, |230 + U cos - c| is near 230 where U is near c.
        AnalysisDocument.AtAirspeed along = layer.billow().atAirspeed().get(0);
        assertThat(along.direction()).isEqualTo("ALONG");
        assertThat(along.intervalS()).isCloseTo(layer.mode().wavelengthM() / 230, within(2.0));
        AnalysisDocument.AtAirspeed across = layer.billow().atAirspeed().get(1);
        assertThat(across.direction()).isEqualTo("ACROSS");
        assertThat(across.intervalS() == null || across.intervalS() > 2 * along.intervalS()).as("fewer crests are met across").isTrue();
        AnalysisDocument.Turbulence turbulence = layer.turbulence();
        for (double edr : new double[] {turbulence.edrLow(), turbulence.edr(), turbulence.edrHigh()}) {
            assertThat(Math.rint(edr * 100) / 100).as("two decimals and no more").isEqualTo(edr);
        }
        assertThat(turbulence.edrLow()).isLessThan(turbulence.edrHigh());
        assertThat(turbulence.edition()).contains("Annex 3");
        assertThat(turbulence.inWords()).contains(" to ").contains("Annex 3");
        // Exact: sqrt(Ri/0.25) - 1.
        assertThat(layer.distance().shearIncrease()).isCloseTo(Math.sqrt(layer.minRichardson() / 0.25) - 1, within(1e-5));
        assertThat(layer.cloud().answer()).isIn("WATER_CLOUD", "ICE_CLOUD_POSSIBLE", "NO_CLOUD", "UNKNOWN");
        assertThat(layer.hiddenSublayerChance()).as("levels every 10 m hide nothing").isNull();
        assertThat(layer.ensemble()).isNull();
        assertThat(document.method().noise().source()).isNotBlank();
        assertThat(document.method().moist()).isTrue();
        assertThat(document.method().version()).isEqualTo("2");
    }

    @Test
    void growthIsUnknownWithFewerThanThreeWindLevelsInTheLayer() {
        // 16 m/s over 400 m between two wind levels: Ri is 0.06, and nobody knows how the wind changes between them.
        VerticalProfile dense = AnalyticShearFlows.profile(AnalyticShearFlows.evenly(0, 5000, 20), z -> 0, z -> 0, z -> 1e-4 * z);
        List<WindLevel> coarse = List.of(new WindLevel(0, 101_325, 5, 0), new WindLevel(1000, 89_875, 5, 0), new WindLevel(2000, 79_495, 5, 0),
                new WindLevel(2400, 75_630, 21, 0), new WindLevel(3400, 66_600, 21, 0), new WindLevel(4400, 58_500, 21, 0));
        List<AnalysisDocument.Layer> layers = document(new VerticalProfile(dense.thermodynamicLevels(), coarse), 200).layers();
        assertThat(layers).filteredOn(layer -> layer.windLevels() < 3).isNotEmpty().allSatisfy(layer -> {
            assertThat(layer.mode()).isNull();
            assertThat(layer.modeReason()).startsWith("unknown: only");
            assertThat(layer.growthByWindow()).isEmpty();
            assertThat(layer.billow()).isNull();
            assertThat(layer.turbulence()).isNull();
            assertThat(layer.rule().wavelengthM()).isNull();
            assertThat(layer.rule().eFoldingMin()).isNull();
            assertThat(layer.rule().basis()).startsWith("unknown");
            assertThat(layer.probabilityRichardsonBelowQuarter()).isNull();
            assertThat(layer.probabilityUnknownBecause()).contains("three are the least");
            assertThat(layer.hiddenSublayerChance()).isBetween(0.5, 1.0);
        });
    }

    @Test
    void theSameSeedGivesTheSameSpreadOfGrowth() {
        VerticalProfile profile = JetAscents.KELBRITH_DAY_2_12.profile();
        AnalysisDocument once = DocumentWriter.write(1L, "XV", null, profile, InstrumentNoise.DEFAULT, 100, new EnsembleRequest(8, 5));
        AnalysisDocument again = DocumentWriter.write(1L, "XV", null, profile, InstrumentNoise.DEFAULT, 100, new EnsembleRequest(8, 5));
        assertThat(once).isEqualTo(again);
        AnalysisDocument.Ensemble spread = once.layers().get(once.layers().size() - 1).ensemble();
        assertThat(spread.members()).isEqualTo(8);
        assertThat(spread.growthRate10PerS()).isLessThanOrEqualTo(spread.growthRate50PerS());
        assertThat(spread.growthRate50PerS()).isLessThanOrEqualTo(spread.growthRate90PerS());
        assertThat(spread.growing()).isPositive();
        assertThatThrownBy(() -> new EnsembleRequest(0, 1)).isInstanceOf(IllegalArgumentException.class).hasMessageContaining("1 to 200");
    }

    @Test
    void nearOneQuarterAGrowthRateCarriesItsRemark() {
        // Exact to first order: growth goes like 1 - 4 Ri, so 0.03 takes 0.12/(1 - 4 Ri) of it: half at 0.19, a quarter at 0.13.
        assertThat(LayerStability.nearQuarter(0.10)).isEmpty();
        assertThat(LayerStability.nearQuarter(0.19)).singleElement().satisfies(note -> {
            assertThat(note.code()).isEqualTo("GROWTH_NEAR_QUARTER");
            assertThat(note.text()).contains("0.03").contains("half of the growth rate");
        });
        assertThat(LayerStability.nearQuarter(0.24)).singleElement().satisfies(note -> assertThat(note.text()).contains("all of the growth rate"));
    }

    @Test
    void indicesStandInTheDocumentWithFormulaUnitOrientationAndSource() {
        AnalysisDocument document = document(JetAscents.KELBRITH_DAY_2_12.profile(), 200);
        assertThat(document.indices()).hasSize(7).allSatisfy(index -> {
            assertThat(index.formula()).isNotBlank();
            assertThat(index.unit()).isNotBlank();
            assertThat(index.source()).isNotBlank();
            assertThat(index.values()).hasSizeBetween(document.profile().size() / 3, document.profile().size() / 3 + 1);
        });
    }

    @Test
    void aDocumentOfTheFirstMethodVersionStillReads() {
        // As that version wrote it.
        String kept = """
                {"soundingId":3,"station":"XVDU","launchedAt":null,
                "method":{"version":"1","windowM":200.0,"smoothing":"corners","noise":null,"moist":false},"levels":[],
                "profile":[{"heightM":100.0,"flightLevel":3.1,"n2PerS2":1.0E-4,"n2MoistPerS2":null,"shearPerS":0.01,"shearKtPer1000Ft":5.9,
                "shear1000FtKt":null,"richardson":1.0,"richardsonMoist":null,"probabilityRichardsonBelowQuarter":null,"elapsedS":20.0,"flags":[]}],
                "layers":[{"letter":"A","baseHeightM":8900.0,"topHeightM":9300.0,"baseFlightLevel":290.0,"topFlightLevel":303.0,"depthM":400.0,
                "minRichardson":0.2,"minRichardsonHeightM":9100.0,"minRichardsonFlightLevel":297.0,"bulkRichardson":0.3,"windowM":200.0,"maxShearPerS":0.02,
                "shear1000FtKt":14.0,"windChangeMs":7.0,"shearDirectionDeg":70.0,"meanWindFromDeg":250.0,"meanWindMs":55.0,"windLevels":40,
                "latitudeDeg":null,"longitudeDeg":null,"elapsedS":1800.0,"probabilityRichardsonBelowQuarter":null,"saturated":false,"state":"subcritical",
                "rule":{"wavelengthM":4100.0,"eFoldingMin":15.0,"basis":"rule, not solved"},"mode":null,"billow":null,"turbulence":null,"remarks":[]}],
                "lowest":null,"state":"subcritical","references":{"tropopauseHeightM":null,"tropopauseFlightLevel":null,"secondTropopauseHeightM":null,
                "secondTropopauseFlightLevel":null,"maxWindMs":null,"maxWindFromDeg":null,"maxWindHeightM":null,"maxWindFlightLevel":null,
                "maxWindAtTopOfData":null},"indices":[],"remarks":[]}""";
        AnalysisDocument read = JSON.readValue(kept, AnalysisDocument.class);
        assertThat(read.method().version()).isEqualTo("1");
        assertThat(read.method().search()).isNull();
        assertThat(read.layers()).singleElement().satisfies(layer -> {
            assertThat(layer.growthByWindow()).isEmpty();
            assertThat(layer.modeReason()).isNull();
            assertThat(layer.rule().eFoldingMin()).isEqualTo(15);
        });
        assertThat(JSON.readValue(JSON.writeValueAsString(read), AnalysisDocument.class)).isEqualTo(read);
    }

    @Test
    void aLayerInCloudHasItsMoistRichardsonNumberBesideTheDryOne() {
        // Warm, saturated, nearly moist-neutral: 0.6 K/100 m at +5 C.
        List<ThermodynamicLevel> levels = new ArrayList<>();
        List<WindLevel> winds = new ArrayList<>();
        for (int k = 0; k <= 400; k++) {
            double z = 10 * k;
            double t = 283.15 - 0.006 * z;
            double p = 100_000 * Math.exp(-z / 8200);
            levels.add(new ThermodynamicLevel(z, p, t, z > 1500 && z < 3000 ? t : t - 8));
            winds.add(new WindLevel(z, p, 5 + 6 * Math.tanh((z - 2200) / 300), 0));
        }
        AnalysisDocument document = document(new VerticalProfile(levels, winds), 200);
        assertThat(document.profile()).filteredOn(point -> point.heightM() > 1800 && point.heightM() < 2700).isNotEmpty().allSatisfy(point -> {
            assertThat(point.saturation()).isEqualTo("OVER_WATER");
            assertThat(point.n2MoistPerS2()).isLessThan(point.n2PerS2());
            assertThat(point.richardsonMoist()).isLessThan(point.richardson());
        });
        assertThat(document.profile()).filteredOn(point -> point.heightM() < 1000)
                .allSatisfy(point -> assertThat(point.n2MoistPerS2()).isCloseTo(point.n2PerS2(), within(1e-8)));
    }
}
