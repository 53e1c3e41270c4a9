package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.shearbook.met.decode.ReportedLevel.Significance;

/** Level records are facts of the archive; expected values follow from the published column layout. */
class IgraDecoderTests {

    private static final String HEADER = "#XXM00000101 2031 03 12 00 2316    3 ncdc-nws ncdc-gts  475000  -330000\n";
    private static final String LEVELS = """
            21     0  97904B-8888   -44B  880    17   286    21\s
            10   356  85000  1487B   32B  196   211   179    59\s
            30 -9999  -9999  3000 -9999 -9999 -9999   230     5\s
            """;

    private final IgraDecoder decoder = new IgraDecoder();
    private final DecodingContext context = new DecodingContext(Instant.parse("2031-03-12T01:00:00Z"), FixLookup.NONE);

    @Test
    void theHeaderGivesStationPositionAndTimes() {
        DecodedSounding sounding = only(HEADER + LEVELS);
        assertThat(sounding.stationId()).isEqualTo("XXM00000101");
        assertThat(sounding.latitude()).isEqualTo(47.5);
        assertThat(sounding.longitude()).isEqualTo(-33.0);
        assertThat(sounding.nominalAt()).isEqualTo("2031-03-12T00:00:00Z");
        assertThat(sounding.line()).isEqualTo(1);
    }

    @Test
    void aReleaseBeforeMidnightBelongsToTheEveningBeforeItsNominalHour() {
        assertThat(only(HEADER + LEVELS).launchedAt()).isEqualTo("2031-03-11T23:16:00Z");
    }

    @Test
    void aReleaseAfterTheNominalHourStaysOnItsDate() {
        assertThat(only(HEADER.replace("00 2316", "12 1205") + LEVELS).launchedAt()).isEqualTo("2031-03-12T12:05:00Z");
    }

    @Test
    void aMissingHourLeavesTheReleaseTimeAndSaysSo() {
        DecodedSounding sounding = only(HEADER.replace("00 2316", "99 2330") + LEVELS);
        assertThat(sounding.nominalAt()).isNull();
        assertThat(sounding.launchedAt()).isEqualTo("2031-03-11T23:30:00Z");
        assertThat(sounding.remarks()).extracting(Remark::code).contains("NOMINAL_HOUR_MISSING");
    }

    @Test
    void aReleaseTimeWithoutMinutesIsTheFullHour() {
        DecodedSounding sounding = only(HEADER.replace("00 2316", "00 2399") + LEVELS);
        assertThat(sounding.launchedAt()).isEqualTo("2031-03-11T23:00:00Z");
        assertThat(sounding.remarks()).extracting(Remark::code).contains("RELEASE_MINUTE_MISSING");
    }

    @Test
    void theStandardLevelIsReadByColumns() {
        ReportedLevel level = only(HEADER + LEVELS).levels().get(1);
        assertThat(level.significance()).containsExactly(Significance.STANDARD);
        assertThat(level.elapsed()).isEqualTo(3 * 60 + 56);
        assertThat(level.pressure()).isEqualTo(85_000);
        assertThat(level.height()).isEqualTo(1487);
        assertThat(level.temperature()).isCloseTo(276.35, within(1e-9));
        assertThat(level.dewPoint()).isCloseTo(276.35 - 21.1, within(1e-9));
        assertThat(level.windFromDirection()).isEqualTo(179);
        assertThat(level.windSpeed()).isCloseTo(5.9, within(1e-9));
    }

    @Test
    void aValueTheArchiveRemovedIsMissingAndRemarked() {
        DecodedSounding sounding = only(HEADER + LEVELS);
        ReportedLevel surface = sounding.levels().get(0);
        assertThat(surface.significance()).containsExactly(Significance.SURFACE);
        assertThat(surface.height()).isNaN();
        assertThat(surface.pressure()).isEqualTo(97_904);
        assertThat(sounding.remarks()).anyMatch(r -> r.code().equals("REMOVED_BY_ARCHIVE") && r.line() == 2 && r.column() == 17);
    }

    @Test
    void aWindLevelKeepsItsHeightAndHasNoPressure() {
        ReportedLevel level = only(HEADER + LEVELS).levels().get(2);
        assertThat(level.pressure()).isNaN();
        assertThat(level.height()).isEqualTo(3000);
        assertThat(level.windFromDirection()).isEqualTo(230);
        assertThat(level.windSpeed()).isCloseTo(0.5, within(1e-9));
    }

    @Test
    void theUndocumentedLevelTypeIsKept() {
        DecodedSounding sounding = only(HEADER + LEVELS.replace("30 -9999  -9999  3000 ", "01 -9999  -9999 -9999 "));
        assertThat(sounding.levels()).hasSize(3);
        assertThat(sounding.levels().get(2).significance()).containsExactly(Significance.SURFACE);
        assertThat(sounding.levels().get(2).windSpeed()).isCloseTo(0.5, within(1e-9));
        assertThat(sounding.remarks()).anyMatch(r -> r.code().equals("LEVEL_TYPE_UNDOCUMENTED") && r.line() == 4 && r.column() == 1);
    }

    @Test
    void flagsThatTouchTheirNumbersDoNotDisturbThem() {
        ReportedLevel level = only(HEADER + LEVELS.replace("10   356  85000  1487B   32B", "20   356  16780B12941B -594B")).levels().get(1);
        assertThat(level.pressure()).isEqualTo(16_780);
        assertThat(level.height()).isEqualTo(12_941);
        assertThat(level.temperature()).isCloseTo(213.75, within(1e-9));
    }

    @Test
    void humidityStandsInForAMissingDewPoint() {
        ReportedLevel level = only(HEADER + LEVELS.replace("   32B  196   211", "  100B 1000 -9999")).levels().get(1);
        assertThat(level.dewPoint()).as("saturated: exact").isCloseTo(283.15, within(1e-6));
    }

    @Test
    void fewerLevelsThanAnnouncedAreKeptAndRemarked() {
        DecodedSounding sounding = only(HEADER.replace("   3 ncdc", "   9 ncdc") + LEVELS);
        assertThat(sounding.levels()).hasSize(3);
        assertThat(sounding.remarks()).extracting(Remark::code).contains("LEVELS_MISSING");
    }

    @Test
    void levelsBehindALostHeaderDoNotJoinTheSoundingBefore() {
        Decoding decoding = decode(HEADER + LEVELS + HEADER.replace('#', '?') + LEVELS);
        assertThat(decoding.messages()).hasSize(1);
        assertThat(((DecodedSounding) decoding.messages().get(0)).levels()).hasSize(3);
        assertThat(decoding.rejected()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("LEVELS_UNANNOUNCED");
            assertThat(r.line()).isEqualTo(5);
            assertThat(r.raw().lines()).hasSize(4);
        });
    }

    @Test
    void aBrokenHeaderRejectsItsOwnSoundingOnly() {
        Decoding decoding = decode(HEADER + LEVELS + HEADER.replace(" 03 12 ", " 13 12 ") + LEVELS + HEADER.replace("03 12", "03 13") + LEVELS);
        assertThat(decoding.messages()).hasSize(2);
        assertThat(decoding.rejected()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("IGRA_HEADER");
            assertThat(r.line()).isEqualTo(5);
            assertThat(r.raw()).contains("85000");
        });
    }

    @Test
    void aLevelThatSlippedIsLeftOutWithLineAndColumn() {
        DecodedSounding shifted = only(HEADER + LEVELS.replace("10   356  85000  1487B   32B  196   211", "10   356  85000  1487B   32B   196  211"));
        assertThat(shifted.levels()).hasSize(2);
        assertThat(shifted.remarks()).anyMatch(r -> r.code().equals("LEVEL_SHIFTED") && r.line() == 3 && r.column() == 34);
    }

    @Test
    void theSameSoundingWithAndWithoutHourIsRemarked() {
        Decoding decoding = decode(HEADER + LEVELS + HEADER.replace(" 00 2316", " 99 2316") + LEVELS);
        assertThat(decoding.messages()).hasSize(2);
        assertThat(decoding.messages().get(1).remarks()).extracting(Remark::code).contains("REPEATED_SOUNDING");
    }

    @Test
    void derivedParametersAreReadFromTheirOwnColumns() {
        String header = String.format("%-157s", "#XXM00000101 2031 03 12 00 2330    1   1350100200    92    50-99999-99999 80045");
        String level = " 101300     155     155    2826    1440    2815    1520    2836    2826   10270   11843  -99999     867   -7920     -14       0      -5       8     326";
        byte[] bytes = (header + "\n" + level + "\n").getBytes(StandardCharsets.US_ASCII);
        IgraDerivedDecoder derived = new IgraDerivedDecoder();
        assertThat(derived.recognises(bytes)).isTrue();
        assertThat(decoder.recognises(bytes)).isFalse();
        ReportedLevel read = ((DecodedSounding) derived.decode(bytes, context).messages().get(0)).levels().get(0);
        assertThat(read.pressure()).isEqualTo(101_300);
        assertThat(read.height()).isEqualTo(155);
        assertThat(read.temperature()).isCloseTo(282.6, within(1e-9));
        assertThat(read.windSpeed()).as("components -1.4 and -0.5 m/s").isCloseTo(Math.hypot(1.4, 0.5), within(1e-9));
        assertThat(read.windFromDirection()).as("computed elsewhere: atan2(1.4, 0.5)").isCloseTo(70.35, within(0.01));
        assertThat(read.dewPoint()).as("10.27 hPa; about 7.4 °C in saturation tables, from memory").isCloseTo(280.5, within(0.2));
    }

    @Test
    void everyTruncationIsReadOrRejectedAndNeverThrows() {
        String whole = HEADER + LEVELS;
        for (int i = 0; i <= whole.length(); i++) {
            Decoding decoding = decode(whole.substring(0, i));
            if (i > 0) {
                assertThat(decoding.messages().size() + decoding.rejected().size()).as("cut after %d bytes", i).isEqualTo(1);
            }
        }
    }

    @Test
    void flippedBytesNeverThrow() {
        long seed = 20310312;
        Random random = new Random(seed);
        byte[] whole = (HEADER + LEVELS + HEADER + LEVELS).getBytes(StandardCharsets.US_ASCII);
        for (int i = 0; i < 3000; i++) {
            byte[] damaged = whole.clone();
            for (int k = 0; k <= i % 5; k++) {
                damaged[random.nextInt(damaged.length)] = (byte) random.nextInt(256);
            }
            Decoding decoding = decoder.decode(damaged, context);
            assertThat(decoding.messages().size() + decoding.rejected().size()).as("seed %d, round %d", seed, i).isPositive();
        }
    }

    @Test
    void oneInAHundredBrokenLeavesTheOthers() {
        StringBuilder file = new StringBuilder();
        for (int i = 0; i < 10_000; i++) {
            file.append(i % 100 == 99 ? HEADER.replace(" 03 12 ", " xx 12 ") : HEADER).append(LEVELS);
        }
        Decoding decoding = decode(file.toString());
        assertThat(decoding.messages()).hasSize(9_900);
        assertThat(decoding.rejected()).hasSize(100);
    }

    private DecodedSounding only(String text) {
        Decoding decoding = decode(text);
        assertThat(decoding.rejected()).isEmpty();
        return (DecodedSounding) decoding.messages().get(0);
    }

    private Decoding decode(String text) {
        return decoder.decode(text.getBytes(StandardCharsets.ISO_8859_1), context);
    }
}
