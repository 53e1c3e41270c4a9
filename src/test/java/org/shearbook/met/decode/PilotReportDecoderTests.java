package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.time.Duration;
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

/** Reports of our own making; expected readings are by hand. */
class PilotReportDecoderTests {

    private static final Instant RECEIVED = Instant.parse("2031-03-12T12:00:00Z");
    private final PilotReportDecoder decoder = new PilotReportDecoder();

    private Decoding decode(String text) {
        return decoder.decode(text.getBytes(StandardCharsets.UTF_8), new DecodingContext(RECEIVED, FixLookup.NONE));
    }

    private DecodedAirReport only(String text) {
        Decoding decoding = decode(text);
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(1);
        return (DecodedAirReport) decoding.messages().get(0);
    }

    private static List<String> codes(DecodedAirReport report) {
        return report.remarks().stream().map(Remark::code).toList();
    }

    @Test
    void aReportGivesItsGroups() {
        DecodedAirReport report = only("XVKE UA /OV 4712N03000W/TM 1142/FL290/TP B738/SK SKC/TA M48/TB MOD CHOP 280-300/RM SMOOTH ABV");
        assertThat(report.reportClass()).isEqualTo(ReportClass.VOL);
        assertThat(report.urgent()).isFalse();
        assertThat(report.observedAt()).isEqualTo("2031-03-12T11:42:00Z");
        assertThat(report.place().latitude()).isCloseTo(47.2, within(1e-9));
        assertThat(report.place().longitude()).isCloseTo(-30.0, within(1e-9));
        assertThat(report.flightLevel()).isEqualTo(290.0);
        assertThat(report.aircraftType()).isEqualTo("B738");
        assertThat(report.temperature()).isCloseTo(225.15, within(1e-9));
        assertThat(report.turbulence()).hasSize(1);
        assertThat(report.turbulence().get(0).intensity()).isEqualTo(Intensity.MOD);
        assertThat(report.turbulence().get(0).baseFeet()).isEqualTo(28_000.0);
        assertThat(report.cloud()).isEqualTo(Cloud.CLEAR);
        assertThat(report.remark()).isEqualTo("SMOOTH ABV");
        assertThat(report.remarks()).isEmpty();
    }

    @Test
    void anUrgentReportIsVoluntaryAndUrgent() {
        DecodedAirReport report = only("XVKE UUA /OV 4712N03000W /TM 1142 /FL290 /TP A320 /TB SEV");
        assertThat(report.urgent()).isTrue();
        assertThat(report.reportClass()).isEqualTo(ReportClass.VOL);
    }

    @Test
    void smallLettersAndLetterOForZeroAreRead() {
        DecodedAirReport report = only("xvke ua /ov 47l2n /tm 1O4O /flO9O /tp c172 /tb lgt blo O8O");
        assertThat(report.observedAt()).isEqualTo("2031-03-12T10:40:00Z");
        assertThat(report.flightLevel()).isEqualTo(90.0);
        assertThat(report.turbulence().get(0).topFeet()).isEqualTo(8_000.0);
    }

    @Test
    void whatStandsBehindTheRemarksIsRemarkWhateverItLooksLike() {
        DecodedAirReport report = only("XVKE UA /OV 4712N03000W/TM 1142/FL290/TP A320/RM /TB SEV /FL100 /ZLC");
        assertThat(report.turbulence()).isEmpty();
        assertThat(report.flightLevel()).isEqualTo(290.0);
        assertThat(report.remark()).isEqualTo("/TB SEV /FL100 /ZLC");
    }

    @Test
    void groupsAreReadInTheOrderInWhichTheyStand() {
        DecodedAirReport report = only("XVKE UA /TB MOD/FL290/TM 1142/OV 4712N03000W/SK BKN020-TOP040/OVC-TOP070/SKC/TP A320");
        assertThat(report.turbulence()).hasSize(1);
        assertThat(report.place().isResolved()).isTrue();
        assertThat(report.aircraftType()).isEqualTo("A320");
    }

    @Test
    void aSecondTurbulenceGroupAddsItsLayersAndAnEmptyOneGivesWay() {
        assertThat(only("XVKE UA /OV /OV 4712N03000W/TM 1142/FL290/TP A320/TB MOD/IC NEG/TB LGT BLO 200").turbulence()).hasSize(2);
    }

    @ParameterizedTest
    @CsvSource({
        "350, 350", "095, 95", "50, 50", "8000, 80", "0260, 260", "12000, 120", "O75, 75", "2OO, 200", "16O, 160",
        "F340, 340", "FL19, 19", "A060, 60", "500', 5", "3500FT, 35", "035-027, 31", "250-, 250"})
    void levelsAreReadInAllTheirForms(String written, double level) {
        assertThat(only("XVKE UA /OV 4712N03000W/TM 1142/FL" + written + "/TP A320/TB MOD").flightLevel()).isEqualTo(level);
    }

    @ParameterizedTest
    @ValueSource(strings = {"DURD", "DURC", "UNKN", "000", "", "SFC", "FAP", "RWY", "UKN", "DRGD", "B737", "A320", "999", "1234567"})
    void anUnknownLevelIsMissingAndNeverZero(String written) {
        DecodedAirReport report = only("XVKE UA /OV 4712N03000W/TM 1142/FL" + written + "/TP A320/TB MOD 090-060");
        assertThat(report.flightLevel()).isNaN();
        assertThat(codes(report)).anyMatch(code -> code.startsWith("LEVEL_"));
        assertThat(report.turbulence().get(0).topFeet()).isEqualTo(9_000.0);
    }

    @Test
    void aTimeIsTheNewestNotMoreThanAQuarterOfAnHourAhead() {
        assertThat(only("XVKE UA /OV 4712N03000W/TM 1215/FL290/TP A320").observedAt()).isEqualTo("2031-03-12T12:15:00Z");
        assertThat(only("XVKE UA /OV 4712N03000W/TM 1216/FL290/TP A320").observedAt()).isEqualTo("2031-03-11T12:16:00Z");
    }

    @Test
    void theHeadingOfAnOldBulletinGivesTheDay() {
        String bulletin = "583 \r\r\nUBXX01 XVEN 280000\r\r\nPRCUS\r\r\nXVKE UA /OV 4712N03000W/TM 0017/FL290/TP A320/TB MOD=\r\r\n"
                + "XVKE UA /OV 4712N03000W/TM 2355/FL290/TP A320/TB LGT=\r\r\n";
        Decoding decoding = decode(bulletin);
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).extracting(message -> ((DecodedAirReport) message).observedAt())
                .containsExactly(Instant.parse("2031-02-28T00:17:00Z"), Instant.parse("2031-02-27T23:55:00Z"));
        assertThat(decoding.messages().get(1).line()).isEqualTo(5);
    }

    @ParameterizedTest
    @ValueSource(strings = {"2IE7", "2560", "1299", "LATE", ""})
    void aTimeThatIsNoneIsMissingAndRemarked(String written) {
        DecodedAirReport report = only("XVKE UA /OV 4712N03000W/TM " + written + "/FL290/TP A320/TB MOD");
        assertThat(report.observedAt()).isNull();
        assertThat(codes(report)).contains("TIME_NOT_READ");
    }

    @Test
    void foldedLinesBelongTogether() {
        Decoding decoding = decode("UBXX01 XVEN 121200\nPIRUS\nXVKE UA /OV 4712N03000W /TM 1142 /FL290 /TP A320 /SK SKC /TB MOD\n"
                + "    CHOP 280-\n300 /RM BETWEEN TWO\nLAYERS=\nXVDU UA /OV 4730N03300W /TM 1150 /FL330 /TP B738 /TB NEG=\nNNNN\n");
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(2);
        DecodedAirReport first = (DecodedAirReport) decoding.messages().get(0);
        assertThat(first.turbulence().get(0).topFeet()).isEqualTo(30_000.0);
        assertThat(first.remark()).isEqualTo("BETWEEN TWO LAYERS");
        assertThat(first.line()).isEqualTo(3);
    }

    @Test
    void aBulletinWithoutEqualsSignsEndsItsReportsAtTheNext() {
        Decoding decoding = decode("740\nUACN10 CYXX 121147\nXX\nUA /OV 4712N03000W /TM 1143 /FL350 /TP B777 /TB MDT\n"
                + "UA /OV 4730N03300W /TM 1144 /FL310 /TP B777 /TB NIL\n    /RM SECOND LINE\n");
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(2);
        assertThat(((DecodedAirReport) decoding.messages().get(1)).remark()).isEqualTo("SECOND LINE");
    }

    @Test
    void anEqualsSignStruckTooEarlyDoesNotCutTheReport() {
        Decoding decoding = decode("UBXX31 XVEN 121145\nPRCUS\nXVKE UA /OV 4712N03000W/TM 1127/FL280/TP C560/TB CONT MOD 360=\n"
                + "280-330/RM XVE=\nXVDU UA /OV 4730N03300W/TM 1134/FL230/TP E170/TB MOD=\n");
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(2);
        assertThat(((DecodedAirReport) decoding.messages().get(0)).remark()).isEqualTo("XVE");
    }

    @Test
    void aReportCutShortGoesToAPersonWithItsPlace() {
        Decoding decoding = decode("XVKE UA /OV 4712N03000W/TM 1142/FL290/TP A320/TB MOD\nXVDU UA /OV 35 SW=\n");
        assertThat(decoding.messages()).hasSize(1);
        assertThat(decoding.rejected()).hasSize(1);
        Rejection rejection = decoding.rejected().get(0);
        assertThat(rejection.code()).isEqualTo("REPORT_CUT_SHORT");
        assertThat(rejection.line()).isEqualTo(2);
        assertThat(rejection.raw()).isEqualTo("XVDU UA /OV 35 SW=");
    }

    @Test
    void ofTenThousandReportsEveryHundredthBrokenOnlyThoseAreRefused() {
        String[] broken = {
            "XVKE UX /OV 4712N03000W/TM 1142/FL290/TP A320/TB MOD", "\u0000\u0007\u00ff noise", "/OV 4712N03000W /TB MOD",
            "XVKE UA /OV", "completely something else", "12.5,270,31"};
        List<String> lines = new ArrayList<>();
        for (int number = 1; number <= 10_000; number++) {
            lines.add(number % 100 == 0 ? broken[number / 100 % broken.length]
                    : "XVKE UA /OV 4712N03000W/TM 1142/FL290/TP A320/TB MOD CHOP 280-300/RM NUMBER " + number);
        }
        for (String ending : List.of("\n", "\r\n", "\r\r\n", "=\n", "=\r\r\n")) {
            Decoding decoding = decode(String.join(ending, lines) + ending);
            assertThat(decoding.messages()).hasSize(9_900);
            assertThat(decoding.rejected()).hasSize(100);
            assertThat(decoding.rejected()).extracting(Rejection::line).allMatch(line -> line % 100 == 0);
            assertThat(decoding.messages()).extracting(message -> ((DecodedAirReport) message).remark())
                    .allMatch(remark -> remark.matches("NUMBER \\d+"));
        }
    }

    @Test
    void nothingOfTheInputIsLost() {
        String input = "XVKE UA /OV 4712N03000W/TM 1142/FL290/TP A320/TB MOD\nwhat is this\nXVDU UA /OV 4730N03300W/TM 1150/FL330/TB NEG= and this\n";
        Decoding decoding = decode(input);
        assertThat(decoding.messages()).extracting(DecodedMessage::raw).containsExactly(
                "XVKE UA /OV 4712N03000W/TM 1142/FL290/TP A320/TB MOD", "XVDU UA /OV 4730N03300W/TM 1150/FL330/TB NEG=");
        assertThat(decoding.rejected()).extracting(Rejection::raw).containsExactly("what is this", "and this");
        assertThat(decoding.rejected()).extracting(Rejection::column).containsExactly(1, 47);
    }

    @Test
    void theDirectionOfTheWindIsKeptOnlyWhereItsVariationIsKnown() {
        FixLookup fixes = name -> name.equals("ABC") ? List.of(new FixLookup.Fix("ABC", "VOR", 47.0, -30.0, -10.0)) : List.of();
        String text = "ABC UA /OV ABC/TM 1142/FL290/TP A320/WV 27045KT";
        DecodedAirReport known = (DecodedAirReport) decoder.decode(text.getBytes(StandardCharsets.UTF_8), new DecodingContext(RECEIVED, fixes)).messages().get(0);
        assertThat(known.windFromDirection()).isCloseTo(260.0, within(1e-9));
        assertThat(known.windSpeed()).isCloseTo(23.15, within(1e-9));
        DecodedAirReport unknown = only(text);
        assertThat(unknown.windFromDirection()).isNaN();
        assertThat(codes(unknown)).contains("WIND_DIRECTION_MAGNETIC");
    }

    @Test
    void pilotReportsAreRecognisedAndOtherThingsAreNot() {
        for (String yes : List.of("XVKE UA /OV 4712N03000W", "ua/ov abc", "UUA /OV X", "UBXX01 XVEN 121200\r\r\nXVKE UUA /OV A=")) {
            assertThat(decoder.recognises(yes.getBytes(StandardCharsets.US_ASCII))).as(yes).isTrue();
        }
        for (String no : List.of("", "TTAA 56121 72403 99013", "report_id,flight_level", "GUADELOUPE/X", "UA", "#USM00072403 2031")) {
            assertThat(decoder.recognises(no.getBytes(StandardCharsets.US_ASCII))).as(no).isFalse();
        }
        byte[] noise = new byte[4_096];
        new java.util.Random(7).nextBytes(noise);
        assertThat(decoder.recognises(noise)).isFalse();
    }

    /** A bound in time stands for one in steps: quadratic work on these would take minutes. */
    @ParameterizedTest
    @ValueSource(strings = {
        "XVKE UA /OV ", "UA /", "/OV/TM/FL", "=", "=\n", "\n", " \n", "\r", "XVKE UA /TB MOD ", "/", "O", "-", "9", "UA /OV A-B-C-",
        "XVKE UA /OV X/TM 1142/FL290\n", "+/-", "/TB /IC ", "                    /OV", "\u0000", "A A A UA /"})
    @Timeout(20)
    void aMegabyteOfTheSameTakesNoLongerThanAMegabyteOfReports(String piece) {
        String text = "XVKE UA /OV X/TM 1142/FL290/TB MOD" + piece.repeat(1_000_000 / piece.length());
        Decoding decoding = decode(text);
        assertThat(decoding.messages().size() + decoding.rejected().size()).isPositive();
        Decoding alone = decode(piece.repeat(1_000_000 / piece.length()));
        assertThat(alone.messages().size() + alone.rejected().size()).isPositive();
    }

    @Test
    void theEarliestAndTheLatestMomentsDoNotUpsetTheCalendar() {
        for (Instant received : List.of(Instant.EPOCH, Instant.parse("2032-03-01T00:05:00Z"), Instant.parse("1999-12-31T23:59:00Z"))) {
            DecodedAirReport report = (DecodedAirReport) decoder.decode("UBXX01 XVEN 312359\nXVKE UA /OV 4712N03000W/TM 2359/FL290/TB MOD=".getBytes(StandardCharsets.US_ASCII),
                    new DecodingContext(received, FixLookup.NONE)).messages().get(0);
            assertThat(report.observedAt()).isNotNull();
            assertThat(report.observedAt()).isBeforeOrEqualTo(received.plus(Duration.ofMinutes(15)));
        }
    }
}
