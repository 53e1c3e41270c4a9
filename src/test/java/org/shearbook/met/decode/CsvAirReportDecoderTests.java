package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.Frequency;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;

/** Tables of our own making; expected values are by hand, conversions exact by definition of the units. */
class CsvAirReportDecoderTests {

    private static final String HEADER = "report_id,report_class,automated,observed_at,received_at,latitude_deg,longitude_deg,flight_level,"
            + "aircraft_type,flight_id,weight_class,turbulence_intensity,turbulence_frequency,turbulence_type,turbulence_base_ft,turbulence_top_ft,"
            + "edr_peak,edr_mean,dvg_max_ms,temperature_C,wind_direction_deg,wind_speed_kt,cloud,remarks\n";
    private static final String FULL = "Q1,VOL,no,2031-03-12T11:42:00Z,2031-03-12T11:48:00Z,47.20,-30.00,290,B738,TRNX101,M,LGT-MOD,OCNL,CHOP,28000,30000,"
            + "0.31,0.18,7.4,-48.5,250,120,CLR,\"curled crests, ahead\"\n";

    private final CsvAirReportDecoder decoder = new CsvAirReportDecoder();

    private Decoding decode(String text) {
        return decoder.decode(text.getBytes(StandardCharsets.UTF_8), new DecodingContext(Instant.parse("2031-03-12T12:00:00Z"), FixLookup.NONE));
    }

    private DecodedAirReport only(String text) {
        Decoding decoding = decode(text);
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(1);
        return (DecodedAirReport) decoding.messages().get(0);
    }

    @Test
    void aFullRowIsReadInSiUnits() {
        DecodedAirReport report = only(HEADER + FULL);
        assertThat(report.reportId()).isEqualTo("Q1");
        assertThat(report.reportClass()).isEqualTo(ReportClass.VOL);
        assertThat(report.urgent()).isFalse();
        assertThat(report.aircraft()).isEqualTo("TRNX101");
        assertThat(report.aircraftType()).isEqualTo("B738");
        assertThat(report.weightClass()).isEqualTo("M");
        assertThat(report.observedAt()).isEqualTo("2031-03-12T11:42:00Z");
        assertThat(report.place().latitude()).isEqualTo(47.2);
        assertThat(report.place().longitude()).isEqualTo(-30.0);
        assertThat(report.flightLevel()).isEqualTo(290.0);
        assertThat(report.turbulence()).containsExactly(
                new TurbulenceLayer(Intensity.LGT, Intensity.MOD, Frequency.OCNL, "CHOP", 28_000.0, 30_000.0));
        assertThat(report.edrPeak()).isEqualTo(0.31);
        assertThat(report.edrMean()).isEqualTo(0.18);
        assertThat(report.gust()).isEqualTo(7.4);
        assertThat(report.temperature()).isCloseTo(224.65, within(1e-9));
        assertThat(report.windFromDirection()).isEqualTo(250.0);
        assertThat(report.windSpeed()).isCloseTo(120 * 1852.0 / 3600.0, within(1e-9));
        assertThat(report.cloud()).isEqualTo(Cloud.CLEAR);
        assertThat(report.remark()).isEqualTo("curled crests, ahead");
        assertThat(report.raw()).isEqualTo(FULL.strip());
        assertThat(report.line()).isEqualTo(2);
        assertThat(report.remarks()).isEmpty();
    }

    @Test
    void whatIsMissingIsNotZeroAndNotNil() {
        DecodedAirReport report = only("report_id,observed_at,latitude_deg,longitude_deg,flight_level,turbulence_intensity,edr_peak,edr_mean,temperature_C,weight_class\n"
                + "Q1,2031-03-12T11:42:00Z,47.2,-30.0,,,-9999,NaN,/////,M\n");
        assertThat(report.flightLevel()).isNaN();
        assertThat(report.turbulence()).isEmpty();
        assertThat(report.edrPeak()).isNaN();
        assertThat(report.edrMean()).isNaN();
        assertThat(report.temperature()).isNaN();
        assertThat(report.windSpeed()).isNaN();
        assertThat(report.gust()).isNaN();
        assertThat(report.weightClass()).isEqualTo("M");
        assertThat(report.cloud()).isEqualTo(Cloud.UNKNOWN);
        assertThat(report.reportClass()).isEqualTo(ReportClass.VOL);
    }

    @ParameterizedTest
    @CsvSource({"NEG, NIL", "SMTH, NIL", "NIL, NIL", "smooth, NIL", "LIGHT, LGT", "MDT, MOD", "severe, SEV", "EXTREME, EXTRM"})
    void intensitiesAreKeptAsTheStandardWords(String written, Intensity word) {
        assertThat(only(HEADER + FULL.replace("LGT-MOD", written)).turbulence().get(0).intensity()).isEqualTo(word);
    }

    @ParameterizedTest
    @CsvSource({"VOL, VOL", "PIREP, VOL", "VOICE, VOL", "SPC, SPC", "ARS, SPC", "TRG, TRG", "EDR, EDR", "AUTO, EDR", "AMDAR, EDR", "QAR, QAR"})
    void reportClassesAreReadByTheirWords(String written, ReportClass reportClass) {
        DecodedAirReport report = only(HEADER + FULL.replace(",VOL,", "," + written + ","));
        assertThat(report.reportClass()).isEqualTo(reportClass);
        assertThat(report.urgent()).isEqualTo(reportClass == ReportClass.SPC);
    }

    @Test
    void withoutAClassAnAutomaticReportIsEdr() {
        assertThat(only(HEADER + FULL.replace(",VOL,no,", ",,yes,")).reportClass()).isEqualTo(ReportClass.EDR);
    }

    /** The expected column is that of the text in the third place. */
    @ParameterizedTest
    @CsvSource(delimiter = ';', value = {
        "2031-03-12T11:42:00Z; yesterday; yesterday; NOT_A_TIME",
        "47.20,-30.00; 97.20,-30.00; 97.20; OUT_OF_RANGE",
        "47.20,-30.00; S47,-30.00; S47; NOT_A_NUMBER",
        "47.20,-30.00; ',-30.00'; ',-30.00'; PLACE_MISSING",
        "',290,'; ',29000,'; 29000; OUT_OF_RANGE",
        "LGT-MOD; WOBBLY; WOBBLY; UNKNOWN_INTENSITY",
        "0.31; 31; 31,0.18; EDR_OUT_OF_RANGE",
        "0.31; -0.31; -0.31; EDR_OUT_OF_RANGE",
        "',M,'; ',XL,'; XL; UNKNOWN_WEIGHT_CLASS",
        "CLR; MAYBE; MAYBE; UNKNOWN_WORD",
        "VOL; RUMOUR; RUMOUR; UNKNOWN_CLASS",
        "',250,'; ',361,'; 361; OUT_OF_RANGE",
        "-48.5; 224.6; 224.6; OUT_OF_RANGE",
        "'\"curled crests, ahead\"'; 'curled crests, ahead'; ' ahead'; WRONG_NUMBER_OF_FIELDS"})
    void aRowThatCannotBeRightIsRefusedByLineColumnAndCodeAndItsNeighboursStay(String right, String wrong, String at, String code) {
        String broken = FULL.replace(right, wrong);
        assertThat(broken).isNotEqualTo(FULL);
        Decoding decoding = decode(HEADER + FULL + broken + FULL);
        assertThat(decoding.messages()).hasSize(2);
        assertThat(decoding.rejected()).hasSize(1);
        Rejection rejection = decoding.rejected().get(0);
        assertThat(rejection.code()).isEqualTo(code);
        assertThat(rejection.line()).isEqualTo(3);
        assertThat(rejection.raw()).isEqualTo(broken.strip());
        assertThat(rejection.column()).isEqualTo(broken.indexOf(at) + 1);
    }

    @Test
    void aRowCutShortIsRefusedAtItsEnd() {
        String cut = FULL.substring(0, 60);
        Decoding decoding = decode(HEADER + FULL + cut);
        assertThat(decoding.messages()).hasSize(1);
        assertThat(decoding.rejected()).singleElement().satisfies(rejection -> {
            assertThat(rejection.code()).isEqualTo("WRONG_NUMBER_OF_FIELDS");
            assertThat(rejection.column()).isEqualTo(61);
        });
    }

    @ParameterizedTest
    @ValueSource(strings = {"wind_speed", "latitude", "temperature", "turbulence_base", "lon"})
    void aColumnWithoutItsUnitRefusesTheTable(String column) {
        Decoding decoding = decode("report_id,observed_at," + column + "\nQ1,2031-03-12T11:42:00Z,5\n");
        assertThat(decoding.messages()).isEmpty();
        assertThat(decoding.rejected()).singleElement().satisfies(rejection -> {
            assertThat(rejection.code()).isEqualTo("UNIT_MISSING");
            assertThat(rejection.column()).isEqualTo(23);
            assertThat(rejection.raw()).contains("Q1,2031");
        });
    }

    @Test
    void aColumnThatIsThereTwiceOrNeededAndNotThereRefusesTheTable() {
        assertThat(decode("report_id,observed_at,observed_at\nQ1,,\n").rejected()).extracting(Rejection::code).containsExactly("COLUMN_TWICE");
        assertThat(decode("report_id,flight_level\nQ1,290\n").rejected()).extracting(Rejection::code).containsExactly("COLUMN_MISSING");
        assertThat(decode(HEADER).rejected()).extracting(Rejection::code).containsExactly("NO_ROWS");
    }

    @Test
    void aColumnNobodyKnowsIsNamedOnceAndTheRowsStay() {
        Decoding decoding = decode("report_id,observed_at,latitude_deg,longitude_deg,mood\nQ1,2031-03-12T11:42:00Z,47,-30,good\nQ2,2031-03-12T11:43:00Z,47,-30,bad\n");
        assertThat(decoding.messages()).hasSize(2);
        assertThat(decoding.messages().get(0).remarks()).extracting(Remark::code).containsExactly("COLUMN_NOT_USED");
        assertThat(decoding.messages().get(1).remarks()).isEmpty();
    }

    @Test
    void theTextOfTheReportGoesBeforeColumnsDerivedFromIt() {
        DecodedAirReport report = only("report_id,observed_at,latitude_deg,longitude_deg,flight_level,turbulence_intensity,edr_peak,report_text\n"
                + "Q1,2031-03-12T11:42:00Z,10,20,100,LGT,0.31,XVKE UUA /OV 4712N03000W/TM 1140/FL290/TP A320/TB LGT BLO 280/SEV 290/RM HARD\n");
        assertThat(report.turbulence()).hasSize(2);
        assertThat(report.turbulence().get(1).intensity()).isEqualTo(Intensity.SEV);
        assertThat(report.flightLevel()).isEqualTo(290.0);
        assertThat(report.place().latitude()).isCloseTo(47.2, within(1e-9));
        assertThat(report.edrPeak()).isEqualTo(0.31);
        assertThat(report.urgent()).isTrue();
        assertThat(report.remark()).isEqualTo("HARD");
        assertThat(report.observedAt()).isEqualTo("2031-03-12T11:42:00Z");
    }

    @Test
    void aTextThatIsNoReportLeavesTheColumns() {
        DecodedAirReport report = only("report_id,observed_at,latitude_deg,longitude_deg,turbulence_intensity,report_text\n"
                + "Q1,2031-03-12T11:42:00Z,10,20,MOD,lost on the way\n");
        assertThat(report.turbulence()).hasSize(1);
        assertThat(report.remarks()).extracting(Remark::code).containsExactly("REPORT_TEXT_NOT_READ");
    }

    @Test
    void aSemicolonAndDecimalCommasAndAByteOrderMarkAreRead() {
        DecodedAirReport report = only("\uFEFFreport_id;observed_at;latitude_deg;longitude_deg;edr_peak\r\nQ1;2031-03-12T11:42:00Z;47,25;-30,5;0,31\r\n");
        assertThat(report.reportId()).isEqualTo("Q1");
        assertThat(report.place().latitude()).isEqualTo(47.25);
        assertThat(report.edrPeak()).isEqualTo(0.31);
    }

    @Test
    void aPlaceMayStandInOneColumnAsInMessages() {
        DecodedAirReport report = only("report_id,observed_at,position\nQ1,2031-03-12T11:42:00Z,N4724 W03336\n");
        assertThat(report.place().latitude()).isCloseTo(47.4, within(1e-9));
        assertThat(report.place().longitude()).isCloseTo(-33.6, within(1e-9));
    }

    @Test
    void aBaseAboveTheTopIsTurnedRoundAndSaysSo() {
        DecodedAirReport report = only(HEADER + FULL.replace("28000,30000", "30000,28000"));
        assertThat(report.turbulence().get(0).baseFeet()).isEqualTo(28_000.0);
        assertThat(report.remarks()).extracting(Remark::code).containsExactly("LAYER_REVERSED");
    }

    @Test
    void allReportsOfTheDemonstrationAreRead() throws IOException {
        try (InputStream in = getClass().getResourceAsStream("/demo-data/airreport/reports.csv")) {
            byte[] bytes = in.readAllBytes();
            assertThat(decoder.recognises(bytes)).isTrue();
            assertThat(new CsvSoundingDecoder().recognises(bytes)).isFalse();
            Decoding decoding = decoder.decode(bytes, new DecodingContext(Instant.parse("2031-03-13T14:00:00Z"), FixLookup.NONE));
            assertThat(decoding.rejected()).isEmpty();
            List<DecodedAirReport> reports = decoding.messages().stream().map(DecodedAirReport.class::cast).filter(report -> report.reportId().startsWith("R")).toList();
            assertThat(reports).hasSize(61);
            // recorded: the counts of the scenario
            assertThat(Stream.of(Intensity.NIL, Intensity.LGT, Intensity.MOD, Intensity.SEV)
                    .map(word -> reports.stream().filter(report -> report.turbulence().get(0).intensity() == word).count())).containsExactly(23L, 12L, 24L, 2L);
            assertThat(reports.stream().filter(report -> report.reportClass() == ReportClass.SPC)).extracting(DecodedAirReport::reportId).containsExactly("R25", "R45");
            assertThat(reports).allMatch(report -> report.place().isResolved() && report.remarks().isEmpty());
        }
    }

    @Test
    @Timeout(20)
    void ofTenThousandRowsEveryHundredthBrokenOnlyThoseAreRefused() {
        StringBuilder table = new StringBuilder(HEADER);
        for (int row = 1; row <= 10_000; row++) {
            table.append(row % 100 == 0 ? FULL.replace("47.20", "north") : FULL);
        }
        Decoding decoding = decode(table.toString());
        assertThat(decoding.messages()).hasSize(9_900);
        assertThat(decoding.rejected()).hasSize(100);
        assertThat(decoding.rejected()).extracting(Rejection::line).allMatch(line -> (line - 1) % 100 == 0);
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "\n", "a,b,c\n", "pressure_hPa,temperature_C,wind_speed_kt\n", "XVKE UA /OV X", "report_id\n"})
    void otherTextsAreNotRecognised(String text) {
        assertThat(decoder.recognises(text.getBytes(StandardCharsets.UTF_8))).isFalse();
    }
}
