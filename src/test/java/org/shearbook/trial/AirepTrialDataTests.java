package org.shearbook.trial;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.shearbook.met.decode.AirepDecoder;
import org.shearbook.met.decode.AmdarDecoder;
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;

/** Air-reports and AMDAR of the trial data; expected readings are by hand from the text. */
@EnabledIfSystemProperty(named = "trial.data", matches = ".+")
class AirepTrialDataTests {

    private static final Path FOLDER = Path.of(System.getProperty("trial.data", ""));

    private static List<DecodedAirReport> reports(Decoding decoding) {
        return decoding.messages().stream().map(DecodedAirReport.class::cast).toList();
    }

    private static DecodingContext context(String receivedAt) {
        return new DecodingContext(Instant.parse(receivedAt), FixLookup.NONE);
    }

    @Test
    void realRoutineReportsAreReadAndTheCommentIsRefused() throws IOException {
        Decoding decoding = new AirepDecoder().decode(Files.readAllBytes(FOLDER.resolve("airep-ars/airep_real.txt")), context("2020-06-13T18:00:00Z"));
        assertThat(decoding.rejected()).allMatch(rejection -> rejection.raw().startsWith("#"));
        List<DecodedAirReport> reports = reports(decoding);
        assertThat(reports).hasSize(8);
        assertThat(reports).allMatch(report -> report.reportClass() == ReportClass.VOL && report.place().isResolved() && report.observedAt() != null);
        assertThat(reports).extracting(DecodedAirReport::flightLevel).containsExactly(390.0, 380.0, 360.0, 370.0, 370.0, 380.0, 350.0, 350.0);
        assertThat(reports.get(0).turbulence().get(0).intensity()).isEqualTo(Intensity.LGT);
        assertThat(reports.get(0).observedAt()).isEqualTo("2020-06-13T17:00:00Z");
        assertThat(reports.get(3).turbulence().get(0).type()).isEqualTo("CHOP");
        assertThat(reports.get(5).place().longitude()).isCloseTo(-42.683333, within(1e-6));
        assertThat(reports.get(6).turbulence().get(0).intensity()).isEqualTo(Intensity.NIL);
        assertThat(reports.get(7).place().latitude()).isEqualTo(45.0);
    }

    @Test
    void specialReportsAreRead() throws IOException {
        Decoding decoding = new AirepDecoder().decode(Files.readAllBytes(FOLDER.resolve("airep-ars/ars_synthetic.txt")), context("2031-03-15T13:30:00Z"));
        assertThat(decoding.rejected()).allMatch(rejection -> rejection.raw().startsWith("#"));
        List<DecodedAirReport> reports = reports(decoding);
        assertThat(reports).hasSize(8);
        assertThat(reports).allMatch(report -> report.reportClass() == ReportClass.SPC && report.urgent() && report.turbulence().size() == 1);
        assertThat(reports).extracting(report -> report.turbulence().get(0).intensity()).containsExactly(Intensity.MOD, Intensity.SEV, Intensity.SEV,
                Intensity.SEV, Intensity.MOD, Intensity.SEV, Intensity.MOD, Intensity.SEV);
        assertThat(reports.get(2).turbulence().get(0).baseFeet()).isEqualTo(35_000.0);
        assertThat(reports.get(4).place().latitude()).isCloseTo(50.34, within(0.01));
        assertThat(reports.get(6).edrPeak()).isEqualTo(0.31);
        assertThat(reports.get(7).edrPeak()).isEqualTo(0.48);
        // a significant point without a table of points
        assertThat(reports).filteredOn(report -> !report.place().isResolved()).hasSize(1);
    }

    @Test
    void amdarIsReadWhole() throws IOException {
        byte[] bytes = Files.readAllBytes(FOLDER.resolve("amdar-tac/UD_AMDAR_2606_converted.txt"));
        assertThat(new AmdarDecoder().recognises(bytes)).isTrue();
        Decoding decoding = new AmdarDecoder().decode(bytes, context("2019-11-26T09:00:00Z"));
        assertThat(decoding.rejected()).isEmpty();
        List<DecodedAirReport> reports = reports(decoding);
        assertThat(reports).hasSize(6);
        assertThat(reports).allMatch(report -> report.flightLevel() == 390.0 && report.turbulence().isEmpty() && report.remarks().isEmpty());
        assertThat(reports.get(0).temperature()).isCloseTo(209.65, within(1e-9));
        assertThat(reports.get(5).observedAt()).isEqualTo("2019-11-26T07:22:00Z");
    }
}
