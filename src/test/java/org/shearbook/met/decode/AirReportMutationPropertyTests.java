package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;

/**
 * Whatever becomes of the bytes on the way, a decoder gives reports and refusals and never an exception, and what it
 * gives can be true.
 */
class AirReportMutationPropertyTests {

    private static final int ROUNDS = 20_000;
    private static final long SEED = 20_310_312_1142L;

    private static final String PILOT_REPORTS = "UBXX01 XVEN 121200\r\r\nPRCUS\r\r\n"
            + "LMA UUA /OV LMA350060/TM 1142/FL290/TP B738/TB CONS LGT OCNL MOD CHOP 310-280/LGT BLO 250/RM +/-15KTS=\r\r\n"
            + "UA /OV 4712N 03000W /TM 1143 /FLDURD /TP A320 /SK OVC020-TOP040/OVC-TOP070 /TA M18 /WV 25045KT\r\r\n    /TB SEV FL290 TO SFC /RM NIL=\r\r\n"
            + "LMA UA /OV 5 NE LMB/TM 1144/FL035-027/TP C172/TB NEG=\r\r\nLMA UA /OV LMA-LMB090020/TM 1145/FL8000/TB 180-BLO MOD=\r\r\nNNNN\r\r\n";
    private static final String TABLE = "report_id,report_class,observed_at,latitude_deg,longitude_deg,flight_level,turbulence_intensity,edr_peak,cloud,report_text\n"
            + "Q1,VOL,2031-03-12T11:42:00Z,47.2,-30.0,290,LGT-MOD,0.31,CLR,\n"
            + "Q2,EDR,2031-03-12T11:43:00Z,47.2,-30.0,290,,0.05,CLD,\"LMA UA /OV LMA/TM 1142/FL290/TB MOD\"\n"
            + "Q3,SPC,2031-03-12T11:44:00Z,-47.2,170.0,310,SEV,,,\n";

    private static final String AIR_REPORTS = "UAXX01 XVEN 121145\r\r\nARP TRNX101 4712N03000W 1142 F290 MS48 250/120KT TB OCNL LGT CHOP IC=\r\r\n"
            + "ARS\r\r\nB738 SEV TURB OBS AT 1143Z FROM N4712W03000 TO N4800W02900 FL280/300=\r\r\n"
            + "AIREP SPECIAL TRNX102 LMA 1144 F310 ASC F350 TURB MOD CLD EDR PK/AVG 0.31/0.18=\r\r\nNNNN\r\r\n";
    private static final String AMDAR = "UDXX01 XVEN 121200\r\r\nAMDAR 1211\r\r\nASC TRNX1 4712N 03015W 121142 F156 MS048 278/034 TB0 S031 333 F/// VG010=\r\r\n"
            + "LVR TRNX2 4712S 17015E 121143 F390 MS635 344/076 TB2 S//0=\r\r\n/// //////// 4712N 03015W 121144 A003 PS120 ///// TB/=\r\r\nNNNN\r\r\n";

    private static final FixLookup FIXES = name -> switch (name) {
        case "LMA" -> List.of(new FixLookup.Fix("LMA", "VOR", 40.0, -100.0, 10.0), new FixLookup.Fix("LMA", "NDB", -30.0, 150.0, 12.0));
        case "LMB" -> List.of(new FixLookup.Fix("LMB", "AERODROME", 41.0, -100.0, Double.NaN));
        default -> List.of();
    };

    static List<Arguments> inputs() {
        return List.of(Arguments.of(new PilotReportDecoder(), PILOT_REPORTS), Arguments.of(new CsvAirReportDecoder(), TABLE),
                Arguments.of(new AirepDecoder(), AIR_REPORTS), Arguments.of(new AmdarDecoder(), AMDAR));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("inputs")
    @Timeout(120)
    void mutatedBytesGiveReportsOrRefusals(MessageDecoder decoder, String input) {
        System.out.println(decoder.format() + ": seed " + SEED);
        Random random = new Random(SEED);
        byte[] whole = input.getBytes(StandardCharsets.ISO_8859_1);
        for (int round = 0; round < ROUNDS; round++) {
            byte[] bytes = mutated(whole, random);
            decoder.recognises(bytes);
            Decoding decoding = decoder.decode(bytes, new DecodingContext(Instant.parse("2031-03-12T12:00:00Z"), FIXES));
            String as = "round " + round;
            assertThat(decoding.messages().size() + decoding.rejected().size()).as(as).isPositive();
            decoding.rejected().forEach(rejection -> assertThat(rejection.line()).as(as).isPositive());
            decoding.messages().forEach(message -> check((DecodedAirReport) message, as));
        }
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("inputs")
    @Timeout(120)
    void theInputCutAtEveryByteGivesReportsOrRefusals(MessageDecoder decoder, String input) {
        byte[] whole = input.getBytes(StandardCharsets.ISO_8859_1);
        for (int length = 0; length <= whole.length; length++) {
            Decoding decoding = decoder.decode(java.util.Arrays.copyOf(whole, length), new DecodingContext(Instant.parse("2031-03-12T12:00:00Z"), FIXES));
            assertThat(decoding.messages().size() + decoding.rejected().size()).as("length " + length).isPositive();
        }
    }

    private static byte[] mutated(byte[] whole, Random random) {
        byte[] bytes = whole.clone();
        int changes = 1 + random.nextInt(12);
        for (int change = 0; change < changes; change++) {
            int at = random.nextInt(bytes.length);
            switch (random.nextInt(4)) {
                case 0 -> bytes[at] = (byte) random.nextInt(256);
                case 1 -> bytes[at] = (byte) "/=-0O \n,\"NSEW9+".charAt(random.nextInt(15));
                case 2 -> {
                    int from = random.nextInt(bytes.length);
                    int length = Math.min(random.nextInt(24), bytes.length - Math.max(at, from));
                    System.arraycopy(whole, from, bytes, at, Math.max(0, length));
                }
                default -> {
                    int length = Math.min(random.nextInt(6), bytes.length - at - 1);
                    System.arraycopy(bytes, at + length, bytes, at, bytes.length - at - length);
                }
            }
        }
        return bytes;
    }

    private static void check(DecodedAirReport report, String as) {
        double level = report.flightLevel();
        assertThat(Double.isNaN(level) || level > -1_000.0 && level <= 600.0).as(as).isTrue();
        if (report.place().isResolved()) {
            assertThat(report.place().latitude()).as(as).isBetween(-90.0, 90.0);
            assertThat(report.place().longitude()).as(as).isBetween(-180.0, 180.0);
        }
        for (TurbulenceLayer layer : report.turbulence()) {
            assertThat(layer.baseFeet() > layer.topFeet()).as(as).isFalse();
            assertThat((layer.intensity() == null) == (layer.intensityTo() == null)).as(as).isTrue();
            assertThat(layer.intensity() == null || layer.intensity().compareTo(layer.intensityTo()) <= 0).as(as).isTrue();
        }
        report.remarks().forEach(remark -> assertThat(remark.line() > 0 && remark.column() >= 0 && !remark.code().isEmpty()).as(as).isTrue());
    }
}
