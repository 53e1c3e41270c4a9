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
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;

/** Air-reports of our own making; expected readings are by hand. */
class AirepDecoderTests {

    private final AirepDecoder decoder = new AirepDecoder();

    private Decoding decode(String text) {
        FixLookup fixes = name -> name.equals("MEDGO") ? List.of(new FixLookup.Fix("MEDGO", "WAYPOINT", 46.5, -28.25, Double.NaN)) : List.of();
        return decoder.decode(text.getBytes(StandardCharsets.UTF_8), new DecodingContext(Instant.parse("2031-03-12T12:00:00Z"), fixes));
    }

    private DecodedAirReport only(String text) {
        Decoding decoding = decode(text);
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(1);
        return (DecodedAirReport) decoding.messages().get(0);
    }

    @Test
    void aRoutineReportGivesPositionTimeLevelWeatherAndTurbulence() {
        DecodedAirReport report = only("ARP TRNX101 4712N03000W 1142 F290 MS48 250/120KT TB LGT=");
        assertThat(report.reportClass()).isEqualTo(ReportClass.VOL);
        assertThat(report.urgent()).isFalse();
        assertThat(report.aircraft()).isEqualTo("TRNX101");
        assertThat(report.place().latitude()).isCloseTo(47.2, within(1e-9));
        assertThat(report.place().longitude()).isCloseTo(-30.0, within(1e-9));
        assertThat(report.observedAt()).isEqualTo("2031-03-12T11:42:00Z");
        assertThat(report.flightLevel()).isEqualTo(290.0);
        assertThat(report.temperature()).isCloseTo(225.15, within(1e-9));
        assertThat(report.windFromDirection()).isEqualTo(250.0);
        assertThat(report.windSpeed()).isCloseTo(120 * 1852.0 / 3600.0, within(1e-9));
        assertThat(report.turbulence()).containsExactly(new TurbulenceLayer(Intensity.LGT, Intensity.LGT, null, "", Double.NaN, Double.NaN));
    }

    @Test
    void aSpecialReportIsOfItsClassAndUrgent() {
        DecodedAirReport report = only("ARS B738 SEV TURB OBS AT 1142Z N4712W03000 FL280/300=");
        assertThat(report.reportClass()).isEqualTo(ReportClass.SPC);
        assertThat(report.urgent()).isTrue();
        assertThat(report.aircraftType()).isEqualTo("B738");
        assertThat(report.aircraft()).isEmpty();
        assertThat(report.place().latitude()).isCloseTo(47.2, within(1e-9));
        assertThat(report.flightLevel()).isEqualTo(290.0);
        assertThat(report.turbulence()).containsExactly(new TurbulenceLayer(Intensity.SEV, Intensity.SEV, null, "", 28_000.0, 30_000.0));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '>', value = {
        "TURB SEV > SEV", "SEV TURB > SEV", "TB OCNL LGT CHOP IC > LGT", "TB 0 > NIL", "TB 3 > SEV", "TURB MOD CLD > MOD", "MOD TURB SEV ICE > MOD",
        "SEV ICE > ''", "TS > ''", "SEV MTW > SEV", "TB > ''"})
    void turbulenceIsToldFromIcingAndWeather(String words, String intensity) {
        List<TurbulenceLayer> layers = only("ARS TRNX101 4712N03000W 1142 F290 " + words + "=").turbulence();
        assertThat(layers.stream().map(layer -> String.valueOf(layer.intensity())).reduce("", String::concat)).isEqualTo(intensity);
    }

    @Test
    void theEddyDissipationRateIsReadInItsForms() {
        assertThat(only("ARS TRNX101 4712N03000W 1142 FL290 EDR048 SEV TURB=").edrPeak()).isEqualTo(0.48);
        DecodedAirReport pair = only("AIREP SPECIAL TRNX101 4712N03000W 1142 F290 TURB MOD CLD EDR PK/AVG 0.31/0.18=");
        assertThat(pair.edrPeak()).isEqualTo(0.31);
        assertThat(pair.edrMean()).isEqualTo(0.18);
        assertThat(pair.cloud()).isEqualTo(Cloud.IN_CLOUD);
        assertThat(only("ARS TRNX101 4712N03000W 1142 FL290 EDR 0.27 MOD TURB=").edrPeak()).isEqualTo(0.27);
    }

    @Test
    void whereTheAircraftGoesNextIsNotWhereItIs() {
        DecodedAirReport report = only("ARP TRNX101 4712N03000W 1142 F290 4800N02500W 1210 4900N02000W MS48 250/65 KT N395XX 121142 F56A=");
        assertThat(report.place().longitude()).isCloseTo(-30.0, within(1e-9));
        assertThat(report.observedAt()).isEqualTo("2031-03-12T11:42:00Z");
        assertThat(report.windSpeed()).isCloseTo(65 * 1852.0 / 3600.0, within(1e-9));
    }

    @Test
    void aSignificantPointIsLookedUpAndAnUnknownOneSaysSo() {
        assertThat(only("AIREP SPECIAL TRNX101 MEDGO 1142 F290 TURB SEV=").place().latitude()).isEqualTo(46.5);
        DecodedAirReport unknown = only("AIREP SPECIAL TRNX101 QQQQQ 1142 F290 TURB SEV=");
        assertThat(unknown.place().isResolved()).isFalse();
        assertThat(unknown.remarks()).extracting(Remark::code).containsExactly("PLACE_UNKNOWN");
        assertThat(only("ARS B738 SEV TURB OBS AT 1142Z OVER MEDGO FL290=").place().latitude()).isEqualTo(46.5);
    }

    @Test
    void aSegmentStandsAtItsMiddle() {
        DecodedAirReport report = only("ARS E190 MOD TURB OBS AT 1142Z FROM N4700W03000 TO N4800W03000 FL240=");
        assertThat(report.place().latitude()).isCloseTo(47.5, within(1e-9));
        assertThat(report.place().resolvedBy()).isEqualTo("midpoint assumed");
        assertThat(report.place().candidates()).hasSize(2);
    }

    @Test
    void bulletinsWithAndWithoutEqualsSignsAreCutIntoTheirReports() {
        Decoding decoding = decode("UAXX01 XVEN 121145\r\r\nARP TRNX101 4712N03000W 1142 F290 MS48\r\r\nN775XX QXT 121142 F34A\r\r\n\r\r\nUAXX02 XVEN 121150\r\r\n"
                + "ARS\r\r\nB738 MOD TURB OBS AT 1143Z N4712W03000\r\r\n FL300=\r\r\nARP TRNX102 45N040W 1144 F350 MS55 180/57=\r\r\nNNNN\r\r\n");
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(3);
        DecodedAirReport special = (DecodedAirReport) decoding.messages().get(1);
        assertThat(special.flightLevel()).isEqualTo(300.0);
        assertThat(special.line()).isEqualTo(6);
        assertThat(decoding.messages().get(2).remarks()).extracting(Remark::code).containsExactly("PLACE_IN_WHOLE_DEGREES");
    }

    @Test
    void aReportCutShortAndALineOfNoReportGoToAPerson() {
        Decoding decoding = decode("ARP TRNX101=\nsomething else=\nARP TRNX101 4712N03000W 1142 F290 TB MOD=\n");
        assertThat(decoding.messages()).hasSize(1);
        assertThat(decoding.rejected()).extracting(Rejection::code).containsExactly("REPORT_CUT_SHORT", "NOT_A_REPORT");
        assertThat(decoding.rejected()).extracting(Rejection::line).containsExactly(1, 2);
    }

    @Test
    void ofTenThousandReportsEveryHundredthBrokenOnlyThoseAreRefused() {
        List<String> lines = new ArrayList<>();
        for (int number = 1; number <= 10_000; number++) {
            lines.add(number % 100 == 0 ? "AXP TRNX101 4712N" : "ARP TRNX101 4712N03000W 1142 F290 MS48 250/120KT TB LGT");
        }
        for (String ending : List.of("=\n", "\n", "=\r\r\n")) {
            Decoding decoding = decode(String.join(ending, lines) + ending);
            assertThat(decoding.messages()).hasSize(9_900);
            assertThat(decoding.rejected()).hasSize(100).extracting(Rejection::line).allMatch(line -> line % 100 == 0);
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"ARP ", "ARS\n", "=", "ARP 4712N03000W ", "TB ", "\n", "UAXX01 XVEN 121145\n"})
    @Timeout(20)
    void aMegabyteOfTheSameIsReadInGoodTime(String piece) {
        Decoding decoding = decode("ARP TRNX101 4712N03000W 1142 F290 " + piece.repeat(1_000_000 / piece.length()));
        assertThat(decoding.messages().size() + decoding.rejected().size()).isPositive();
    }

    @Test
    void airReportsAreRecognisedAndOtherThingsAreNot() {
        for (String yes : List.of("ARP X", "UAXX01 XVEN 121145\r\r\nARS\r\r\nB738", "airep special X", "AIREP X")) {
            assertThat(decoder.recognises(yes.getBytes(StandardCharsets.US_ASCII))).as(yes).isTrue();
        }
        for (String no : List.of("", "ARPEGGIO", "XVKE UA /OV ARP", "AMDAR 1211", "TTAA 56121")) {
            assertThat(decoder.recognises(no.getBytes(StandardCharsets.US_ASCII))).as(no).isFalse();
        }
    }
}
