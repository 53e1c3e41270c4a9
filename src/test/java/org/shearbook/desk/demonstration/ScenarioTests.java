package org.shearbook.desk.demonstration;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.MessageDecoders;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.Tropopause;
import org.shearbook.met.profile.Units;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.met.quality.CheckedSounding;
import org.shearbook.met.quality.SoundingQuality;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonMinimum;
import org.shearbook.met.richardson.RichardsonProfile;

/**
 * The scenario gives what its table says. The expected values were computed elsewhere, by a program of our own in
 * another language, from the same formulas without noise.
 */
class ScenarioTests {

    static Stream<ScenarioAscent> ascents() {
        return ScenarioAscent.ALL.stream();
    }

    @ParameterizedTest
    @CsvSource(nullValues = "-", value = {
        // ascent, min Ri, its FL, jet kt, jet FL, tropopause FL
        "DUNVEERY 1 00, 2.31, 306,  76, 363, 391",
        "DUNVEERY 1 12, 0.80, 304,  98, 356, 384",
        "DUNVEERY 2 00, 0.19, 299, 126, 347, 371",
        "DUNVEERY 2 12, 0.70, 284, 104, 334, 341",
        "DUNVEERY 3 00, 1.81, 275,  82, 329, 328",
        "KELBRITH 1 00, 4.07, 303,  68, 365, 393",
        "KELBRITH 2 00, 0.53, 298, 111, 352, 380",
        "KELBRITH 2 12, 0.16, 291, 131, 347, 368",
        "KELBRITH 2 18, 0.38, 289, 126, 341, 359",
        "KELBRITH 3 00, 1.11, 283, 103, 336, 350",
        "OSSENFELL 2 00, 0.86, 178, 88, 360, 384",
        "OSSENFELL 2 12, 0.19, 172, 101, 355, 376",
        "OSSENFELL 3 00, 1.08, 167, 93, 349, 366",
        "TARQUIDD 2 12, 0.74, 374, 107, 336, 360",
        "TARQUIDD 3 00, 0.21, 296, 120, 347, 365",
        "TARQUIDD 3 12, 1.78, 289, 93, 340, 350"
    })
    void withoutNoiseTheSmallestRichardsonNumberLiesWhereTheTableSays(
            String title, double minimum, double flightLevel, double jetKnots, double jetFlightLevel, double tropopauseFlightLevel) {
        ScenarioAscent ascent = ScenarioAscent.named(title);
        VerticalProfile profile = profile(ScenarioColumn.noiseFree(ascent));
        RichardsonMinimum found = layerMinimum(profile, ascent, 100);
        assertThat(found.richardsonNumber()).as("minimum Ri").isCloseTo(minimum, within(0.02));
        assertThat(found.flightLevel()).as("its flight level").isCloseTo(flightLevel, within(3.0));
        WindLevel jet = profile.windLevels().stream().max((a, b) -> Double.compare(a.speed(), b.speed())).orElseThrow();
        assertThat(Units.metresPerSecondToKnots(jet.speed())).as("jet").isCloseTo(jetKnots, within(1.0));
        assertThat(profile.flightLevelAt(jet.height())).as("jet").isCloseTo(jetFlightLevel, within(10.0));
        assertThat(Tropopause.of(profile)).as("tropopause").first()
                .satisfies(tropopause -> assertThat(tropopause.flightLevel()).isCloseTo(tropopauseFlightLevel, within(10.0)));
    }

    @ParameterizedTest
    @CsvSource({"DUNVEERY 3 12", "KELBRITH 1 12", "KELBRITH 3 12", "OSSENFELL 1 00", "OSSENFELL 1 12", "OSSENFELL 3 12", "TARQUIDD 1 00"})
    void theOtherAscentsAreQuiet(String title) {
        ScenarioAscent ascent = ScenarioAscent.named(title);
        assertThat(minimum(profile(ScenarioColumn.noiseFree(ascent)), ascent, 100).richardsonNumber()).isGreaterThan(1.6);
    }

    @ParameterizedTest
    @MethodSource("ascents")
    void everyNoisyFileLiesOnTheSideOfOneQuarterThatTheTableGives(ScenarioAscent ascent) throws IOException {
        boolean subcritical = List.of("DUNVEERY 2 00", "KELBRITH 2 12", "OSSENFELL 2 12", "TARQUIDD 3 00").contains(ascent.title());
        byte[] file = Files.readAllBytes(Path.of("demo-data/sounding", ascent.fileName()));
        Decoding decoding = MessageDecoders.all().decode(file, new DecodingContext(ascent.receivedAt(), FixLookup.NONE));
        assertThat(decoding.rejected()).isEmpty();
        DecodedSounding sounding = (DecodedSounding) decoding.messages().get(0);
        CheckedSounding checked = SoundingQuality.check(sounding.levels(), sounding.elevation(), null);
        VerticalProfile profile = checked.profile().orElseThrow();
        RichardsonMinimum found = minimum(profile, ascent, 200);
        assertThat(found.richardsonNumber() < 0.25).as("%s has %s", ascent.title(), found).isEqualTo(subcritical);
        assertThat(RichardsonAnalysis.of(profile, 200).lowestInFreeAir().orElseThrow().richardsonNumber() < 0.25)
                .as("anywhere in the free air of %s", ascent.title()).isEqualTo(subcritical);
    }

    @Test
    void theFilesAreThoseTheGeneratorWrites() throws IOException {
        for (Map.Entry<String, String> file : ScenarioFiles.all().entrySet()) {
            assertThat(Files.readString(Path.of("demo-data", file.getKey()), StandardCharsets.UTF_8)).as(file.getKey()).isEqualTo(file.getValue());
        }
    }

    @Test
    void thereAreTwentyThreeAscentsAndSixtyOneReportsWithTheCountsOfTheScenario() {
        assertThat(ScenarioAscent.ALL).hasSize(23);
        assertThat(ScenarioReport.ALL).hasSize(61);
        assertThat(ScenarioReport.ALL).filteredOn(report -> report.intensity().equals("NIL")).hasSize(23);
        assertThat(ScenarioReport.ALL).filteredOn(report -> report.intensity().equals("LGT")).hasSize(12);
        assertThat(ScenarioReport.ALL).filteredOn(report -> report.intensity().equals("MOD")).hasSize(24);
        assertThat(ScenarioReport.ALL).filteredOn(report -> report.intensity().equals("SEV")).hasSize(2);
    }

    @Test
    void theReportFileIsReadWholly() throws IOException {
        byte[] file = Files.readAllBytes(Path.of("demo-data/airreport/reports.csv"));
        Decoding decoding = MessageDecoders.all().decode(file, new DecodingContext(Instant.parse("2031-03-14T00:00:00Z"), FixLookup.NONE));
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(61);
    }

    @Test
    void theCodedAscentIsReadAsItWasCoded() throws IOException {
        ScenarioColumn column = ScenarioColumn.measured(ScenarioFiles.CODED);
        for (String part : List.of("TTAA", "TTBB", "TTBB-corrected")) {
            byte[] file = Files.readAllBytes(Path.of("demo-data/sounding", ScenarioFiles.CODED_FILE.formatted(part)));
            Decoding decoding = MessageDecoders.all().decode(file,
                    new DecodingContext(ScenarioFiles.CODED.nominalAt().plus(Duration.ofMinutes(30)), FixLookup.NONE));
            assertThat(decoding.rejected()).isEmpty();
            DecodedSounding sounding = (DecodedSounding) decoding.messages().get(0);
            assertThat(sounding.stationId()).isEqualTo("00101");
            assertThat(sounding.nominalAt()).isEqualTo(ScenarioFiles.CODED.nominalAt());
            assertThat(sounding.levels()).hasSizeGreaterThan(8).filteredOn(level -> level.hasTemperature()).allSatisfy(level -> {
                int nearest = nearest(column, level.pressure());
                // Pressure is coded to 1 hPa, which is up to 60 m at 100 hPa; temperature to 0.2 K.
                assertThat(level.temperature()).isCloseTo(column.temperature[nearest], within(0.9));
            });
        }
    }

    private static int nearest(ScenarioColumn column, double pressure) {
        int best = 0;
        for (int k = 1; k < column.pressure.length; k++) {
            if (Math.abs(column.pressure[k] - pressure) < Math.abs(column.pressure[best] - pressure)) {
                best = k;
            }
        }
        return best;
    }

    /** The smallest Ri between the heights where the table looked for it. */
    private static RichardsonMinimum minimum(VerticalProfile profile, ScenarioAscent ascent, double window) {
        double base = ascent.station() == ScenarioAscent.Site.OSSENFELL ? 4000 : ascent.title().equals("TARQUIDD 2 12") ? 10_900 : 7500;
        double top = ascent.station() == ScenarioAscent.Site.OSSENFELL ? 6800 : ascent.title().equals("TARQUIDD 2 12") ? 11_900 : 10_400;
        return RichardsonAnalysis.of(profile, window).minimumBetween(base, top).orElseThrow();
    }

    /** The minimum of the layer: in quiet air the broad shear below the jet has another of nearly the same depth. */
    private static RichardsonMinimum layerMinimum(VerticalProfile profile, ScenarioAscent ascent, double window) {
        RichardsonProfile analysed = RichardsonAnalysis.of(profile, window);
        double[] height = analysed.heights();
        double[] ri = analysed.richardsonNumber();
        int nearest = -1;
        for (int k = 1; k < ri.length - 1; k++) {
            if (ri[k] <= ri[k - 1] && ri[k] <= ri[k + 1]
                    && (nearest < 0 || Math.abs(height[k] - ascent.layerHeight()) < Math.abs(height[nearest] - ascent.layerHeight()))) {
                nearest = k;
            }
        }
        return analysed.minimumBetween(height[nearest] - analysed.spacing() / 2, height[nearest] + analysed.spacing() / 2).orElseThrow();
    }

    static VerticalProfile profile(ScenarioColumn column) {
        List<ThermodynamicLevel> levels = new ArrayList<>();
        List<WindLevel> winds = new ArrayList<>();
        for (int k = 0; k < column.height.length; k++) {
            levels.add(new ThermodynamicLevel(column.height[k], column.pressure[k], column.temperature[k], column.dewPoint[k]));
            winds.add(new WindLevel(column.height[k], column.pressure[k], column.eastward[k], column.northward[k]));
        }
        return new VerticalProfile(levels, winds);
    }
}
