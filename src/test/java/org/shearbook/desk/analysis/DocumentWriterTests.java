package org.shearbook.desk.analysis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.quality.CheckedSounding;
import org.shearbook.met.quality.SoundingQuality;
import org.shearbook.testing.AnalyticShearFlows;
import org.shearbook.testing.JetAscents;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The analysis document. */
class DocumentWriterTests {

    private static final JsonMapper JSON = JsonMapper.shared();

    @Test
    void aJetWithAShearLayerGivesOneLayerWithItsRuleLabelled() {
        AnalysisDocument document = DocumentWriter.write(7L, "XVKE", null, JetAscents.KELBRITH_DAY_2_12.profile(), 100);
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
        assertThat(layer.mode()).isNull();
        assertThat(layer.probabilityRichardsonBelowQuarter()).isNull();
        assertThat(layer.shearDirectionDeg()).isCloseTo(70, within(2.0));
        assertThat(layer.meanWindFromDeg()).isCloseTo(250, within(1.0));
        assertThat(layer.state()).isEqualTo("subcritical");
    }

    @Test
    void constantWindHasNoRichardsonNumberAndSaysSoAtEveryPoint() {
        VerticalProfile constant = AnalyticShearFlows.profile(AnalyticShearFlows.evenly(0, 3000, 10), z -> 12, z -> 0, z -> 1e-4 * z);
        AnalysisDocument document = DocumentWriter.write(null, null, null, constant, 200);
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
                String text = JSON.writeValueAsString(DocumentWriter.write(1L, "XVTA", null, profile, window));
                assertThat(text).doesNotContain("NaN").doesNotContain("Infinity");
                assertThat(JSON.readValue(text, AnalysisDocument.class).profile()).isNotEmpty();
            }
        }
        AnalysisDocument gap = DocumentWriter.write(1L, "XVTA", null, withGap, 200);
        assertThat(gap.remarks()).anySatisfy(note -> assertThat(note.code()).isEqualTo("GAP"));
        assertThat(gap.profile()).filteredOn(point -> point.heightM() > 7550 && point.heightM() < 7850)
                .allSatisfy(point -> assertThat(point.flags()).containsExactly("GAP"));
        assertThat(DocumentWriter.write(1L, "x", null, overturned, 200).remarks()).anySatisfy(note -> assertThat(note.code()).isEqualTo("OVERTURNED"));
    }

    @Test
    void theNamesOfTheTextAreThoseOfTheContract() {
        CheckedSounding checked = SoundingQuality.check(JetAscents.DUNVEERY_DAY_2_00.reported(), 50, null);
        AnalysisDocument document = DocumentWriter.write(3L, "XVDU", null, checked.profile().orElseThrow(), 200)
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
        AnalysisDocument.Point middle = DocumentWriter.write(null, null, null, linear, 200).profile().stream()
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
        assertThatThrownBy(() -> DocumentWriter.write(1L, "x", null, apart, 200)).isInstanceOf(IllegalArgumentException.class).hasMessageContaining("overlap");
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
}
