package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;

/** Reports of our own making; expected readings are by hand. */
class AmdarDecoderTests {

    private final AmdarDecoder decoder = new AmdarDecoder();

    private Decoding decode(String text) {
        return decoder.decode(text.getBytes(StandardCharsets.UTF_8), new DecodingContext(Instant.parse("2031-03-12T12:00:00Z"), FixLookup.NONE));
    }

    private DecodedAirReport only(String report) {
        Decoding decoding = decode("UDXX01 XVEN 121200\r\r\nAMDAR 1211\r\r\n" + report + "=\r\r\nNNNN\r\r\n");
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(1);
        return (DecodedAirReport) decoding.messages().get(0);
    }

    @Test
    void aReportGivesItsGroupsInSiUnits() {
        DecodedAirReport report = only("ASC TRNX1 4712N 03015W 121142 F156 MS048 278/034 TB0 S031 333 F/// VG010");
        assertThat(report.reportClass()).isEqualTo(ReportClass.EDR);
        assertThat(report.aircraft()).isEqualTo("TRNX1");
        assertThat(report.place().latitude()).isCloseTo(47.2, within(1e-9));
        assertThat(report.place().longitude()).isCloseTo(-30.25, within(1e-9));
        assertThat(report.observedAt()).isEqualTo("2031-03-12T11:42:00Z");
        assertThat(report.flightLevel()).isEqualTo(156.0);
        assertThat(report.temperature()).isCloseTo(268.35, within(1e-9));
        assertThat(report.windFromDirection()).isEqualTo(278.0);
        assertThat(report.windSpeed()).isCloseTo(34 * 1852.0 / 3600.0, within(1e-9));
        assertThat(report.turbulence()).extracting(layer -> layer.intensity()).containsExactly(Intensity.NIL);
        assertThat(report.gust()).isEqualTo(1.0);
        assertThat(report.remarks()).isEmpty();
    }

    @ParameterizedTest
    @CsvSource({"TB0, NIL", "TB1, LGT", "TB2, MOD", "TB3, SEV"})
    void turbulenceIsReadFromItsFigure(String group, Intensity intensity) {
        assertThat(only("LVR TRNX1 4712N 03015W 121142 F290 MS448 250/120 " + group + " S///").turbulence().get(0).intensity()).isEqualTo(intensity);
    }

    @ParameterizedTest
    @ValueSource(strings = {"TB/", "TB7", "", "TB"})
    void turbulenceNotGivenIsNotNil(String group) {
        assertThat(only("LVR TRNX1 4712N 03015W 121142 F290 MS448 250/120 " + group).turbulence()).isEmpty();
    }

    @Test
    void whatIsMissingIsMissingAndSaysSo() {
        DecodedAirReport report = only("/// //////// 4712N 03015W 129942 F/// MS/// ///// TB/ S///");
        assertThat(report.aircraft()).isEmpty();
        assertThat(report.observedAt()).isNull();
        assertThat(report.flightLevel()).isNaN();
        assertThat(report.temperature()).isNaN();
        assertThat(report.windSpeed()).isNaN();
        assertThat(report.remarks()).extracting(Remark::code).containsExactly("TIME_NOT_READ", "LEVEL_UNKNOWN");
    }

    @Test
    void aLevelBelowTheStandardPressureIsNegative() {
        assertThat(only("ASC TRNX1 4712N 03015W 121142 A003 PS120 250/012 TB0").flightLevel()).isEqualTo(-3.0);
    }

    @Test
    void aDayThatHasNotComeIsOfTheMonthBefore() {
        assertThat(only("LVR TRNX1 4712N 03015W 131142 F290 MS448").observedAt()).isEqualTo("2031-02-13T11:42:00Z");
    }

    @Test
    void ofTenThousandReportsEveryHundredthBrokenOnlyThoseAreRefused() {
        List<String> lines = new ArrayList<>();
        for (int number = 1; number <= 10_000; number++) {
            lines.add(number % 100 == 0 ? "LVR TRNX1 47?2N 03" : "LVR TRNX1 4712N 03015W 121142 F290 MS448 250/120 TB1 S///");
        }
        Decoding decoding = decode("AMDAR 1211\n" + String.join("=\n", lines) + "=\n");
        assertThat(decoding.messages()).hasSize(9_900);
        assertThat(decoding.rejected()).hasSize(100).extracting(Rejection::line).allMatch(line -> (line - 1) % 100 == 0);
    }

    @ParameterizedTest
    @ValueSource(strings = {"LVR TRNX1 4712N 03015W ", "F290 ", "=", "\n", "AMDAR 1211\n", "/"})
    @Timeout(20)
    void aMegabyteOfTheSameIsReadInGoodTime(String piece) {
        Decoding decoding = decode("AMDAR 1211\nLVR TRNX1 4712N 03015W " + piece.repeat(1_000_000 / piece.length()));
        assertThat(decoding.messages().size() + decoding.rejected().size()).isPositive();
    }

    @Test
    void onlyASectionOfAmdarIsRecognised() {
        assertThat(decoder.recognises("UDXX01 XVEN 121200\r\r\nAMDAR 1211\r\r\n".getBytes(StandardCharsets.US_ASCII))).isTrue();
        for (String no : List.of("", "AMDAR", "report_id,AMDAR 1211", "ARP X", "XVKE UA /OV AMDAR")) {
            assertThat(decoder.recognises(no.getBytes(StandardCharsets.US_ASCII))).as(no).isFalse();
        }
    }
}
