package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Assertions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.shearbook.met.decode.ReportedLevel.Significance;

/** Expected values are those the code's own rules give for the groups, worked by hand; m/s from knots as 1852/3600. */
class TempDecoderTests {

    private final TempDecoder decoder = new TempDecoder();
    private final DecodingContext context = new DecodingContext(Instant.parse("2031-03-06T13:00:00Z"), FixLookup.NONE);

    @Test
    void partAIsReadToItsLastGroup() {
        DecodedSounding sounding = only(TempSamples.PART_A);
        assertThat(sounding.stationId()).isEqualTo("00101");
        assertThat(sounding.parts()).containsExactly("TTAA");
        assertThat(sounding.nominalAt()).isEqualTo("2031-03-06T12:00:00Z");
        assertThat(sounding.levels()).hasSize(1 + 11 + 2);
        assertThat(sounding.remarks()).extracting(Remark::code).containsExactly("REPORTED_SHEAR");
        assertThat(sounding.sondeType()).isEqualTo("54");
    }

    @Test
    void theSurfaceLevelRegainsItsThousand() {
        ReportedLevel surface = only(TempSamples.PART_A).levels().get(0);
        level(surface, 1013, Double.NaN, 8.6, 4.2, 305, 3);
        assertThat(surface.significance()).containsExactly(Significance.SURFACE);
    }

    @Test
    void standardLevelsRegainTheirHeights() {
        List<ReportedLevel> levels = only(TempSamples.PART_A).levels();
        level(levels.get(2), 925, 839, 6.8, 19, 10, 21);
        level(levels.get(4), 700, 3098, -3.9, 8, 330, 24);
        level(levels.get(8), 250, 10_730, -46.7, 16, 275, 55);
        level(levels.get(11), 100, 16_480, -60.5, 23, 275, 30);
        assertThat(levels.get(2).significance()).containsExactly(Significance.STANDARD);
    }

    @Test
    void tropopauseAndMaximumWindFollowTheStandardLevels() {
        List<ReportedLevel> levels = only(TempSamples.PART_A).levels();
        level(levels.get(12), 105, Double.NaN, -67.7, 17, 270, 49);
        assertThat(levels.get(12).significance()).containsExactly(Significance.TROPOPAUSE);
        level(levels.get(13), 159, Double.NaN, Double.NaN, Double.NaN, 265, 73);
        assertThat(levels.get(13).significance()).containsExactly(Significance.MAXIMUM_WIND);
    }

    @Test
    void aReleaseAfterMidnightsEveIsOnTheDayBefore() {
        assertThat(only("TTAA 56001 00101 99013 08642 30503 00126 08042 31005 31313 45408 82330=").launchedAt()).isEqualTo("2031-03-05T23:30:00Z");
        assertThat(only("TTAA 56121 00101 99013 08642 30503 00126 08042 31005 31313 45408 81115=").launchedAt()).isEqualTo("2031-03-06T11:15:00Z");
    }

    @Test
    void aDayThatIsNotYetReachedBelongsToTheMonthBefore() {
        assertThat(only("TTAA 81121 00101 99013 08642 30503=").nominalAt()).as("the 31st, and February has none").isEqualTo("2031-01-31T12:00:00Z");
        assertThat(only("TTAA 57121 00101 99013 08642 30503=").nominalAt()).isEqualTo("2031-02-07T12:00:00Z");
        assertThat(only("TTAA 56151 00101 99013 08642 30503=").nominalAt()).as("two hours ahead is within the tolerance").isEqualTo("2031-03-06T15:00:00Z");
    }

    @Test
    void withoutFiftyOnTheDayTheWindIsInMetresPerSecond() {
        ReportedLevel surface = only("TTAA 06121 00101 99919 06664 20504=").levels().get(0);
        assertThat(surface.windSpeed()).isEqualTo(4);
        assertThat(surface.windFromDirection()).isEqualTo(205);
        assertThat(surface.pressure()).isEqualTo(91_900);
    }

    @ParameterizedTest
    @CsvSource({"26573,265,73", "30503,305,3", "26622,265,122", "00000,0,0", "00503,5,3", "36010,360,10", "01021,10,21"})
    void windCarriesItsOddFiveDegreesInTheSpeed(String group, double direction, double knots) {
        ReportedLevel surface = only("TTAA 56121 00101 99013 08642 " + group + "=").levels().get(0);
        assertThat(surface.windFromDirection()).isEqualTo(direction);
        assertThat(surface.windSpeed()).isCloseTo(knots * 1852 / 3600, within(1e-9));
    }

    @ParameterizedTest
    @CsvSource({"36503", "37010", "00012", "27499"})
    void aWindThatCannotBeIsMissingAndRemarked(String group) {
        DecodedSounding sounding = only("TTAA 56121 00101 99013 08642 " + group + " 00126 08042 31005=");
        assertThat(sounding.levels().get(0).hasWind()).isFalse();
        assertThat(sounding.levels().get(0).temperature()).isCloseTo(281.75, within(1e-9));
        assertThat(sounding.remarks()).anyMatch(r -> r.code().equals("WIND_INVALID") && r.column() == 30);
    }

    @ParameterizedTest
    @CsvSource({"08642,8.6,4.2", "06869,6.8,19", "67767,-67.7,17", "001//,-0.1,", "16800,16.8,0", "61156,-61.1,6", "168//,16.8,", "615//,-61.5,"})
    void temperatureCarriesItsSignInTheTenths(String group, double temperature, Double depression) {
        ReportedLevel surface = only("TTAA 56121 00101 99013 " + group + " 30503=").levels().get(0);
        assertThat(surface.temperature() - 273.15).isCloseTo(temperature, within(1e-9));
        if (depression == null) {
            assertThat(surface.dewPoint()).isNaN();
        } else {
            assertThat(surface.temperature() - surface.dewPoint()).isCloseTo(depression, within(1e-9));
        }
    }

    @Test
    void theUnusedFiguresOfTheDepressionAreMissingAndRemarked() {
        DecodedSounding sounding = only("TTAA 56121 00101 99013 08653 30503=");
        assertThat(sounding.levels().get(0).dewPoint()).isNaN();
        assertThat(sounding.levels().get(0).hasTemperature()).isTrue();
        assertThat(sounding.remarks()).extracting(Remark::code).contains("DEPRESSION_CODE_UNUSED");
    }

    @Test
    void aboveTheLastLevelWithWindTheGroupIsLeftOut() {
        DecodedSounding sounding = only("TTAA 56128 00101 99013 08642 30503 00126 08042 31005 92839 06869 01021 85531 04260 02025 70098 03958 50565 17358 40728 28559 88999 77999=");
        assertThat(sounding.levels()).hasSize(7);
        assertThat(sounding.levels().get(3).hasWind()).isTrue();
        level(sounding.levels().get(4), 700, 3098, -3.9, 8, Double.NaN, Double.NaN);
        level(sounding.levels().get(6), 400, 7280, -28.5, 9, Double.NaN, Double.NaN);
        assertThat(sounding.remarks()).isEmpty();
    }

    @Test
    void aSolidusInTheIdentificationMeansNoWindAtAnyStandardLevel() {
        DecodedSounding sounding = only("TTAA 5612/ 00101 99013 08642 30503 00126 08042 92839 06869 85531 04260=");
        assertThat(sounding.levels()).hasSize(4);
        assertThat(sounding.levels().get(0).hasWind()).isTrue();
        assertThat(sounding.levels().get(3).height()).isEqualTo(1531);
    }

    @Test
    void levelsBelowTheGroundAreMarked() {
        DecodedSounding sounding = only("TTAA 56128 00101 99834 17256 22507 00031 ///// ///// 92718 ///// ///// 85452 ///// ///// 70068 03634=");
        assertThat(sounding.levels()).hasSize(5);
        assertThat(sounding.levels().get(1).significance()).containsExactlyInAnyOrder(Significance.STANDARD, Significance.BELOW_GROUND);
        assertThat(sounding.levels().get(1).height()).isEqualTo(31);
        assertThat(sounding.levels().get(1).hasTemperature()).isFalse();
        assertThat(sounding.levels().get(4).significance()).containsExactly(Significance.STANDARD);
    }

    @Test
    void levelsBelowTheGroundMayBeLeftOut() {
        DecodedSounding sounding = only("TTAA 06125 00101 99815 04118 20501 70113 04077 29006 50574 16575 28008=");
        assertThat(sounding.levels()).extracting(l -> l.pressure() / 100).containsExactly(815.0, 700.0, 500.0);
        assertThat(sounding.remarks()).isEmpty();
    }

    @Test
    void aHeightBelowSeaLevelHasFiveHundredAdded() {
        assertThat(only("TTAA 56121 00101 99998 08642 30503 00520 ///// /////=").levels().get(1).height()).isEqualTo(-20);
    }

    @Test
    void noAscentIsAMessageWithoutLevels() {
        DecodedSounding sounding = only("TTAA 0600/ 00102 NIL=");
        assertThat(sounding.levels()).isEmpty();
        assertThat(sounding.remarks()).extracting(Remark::code).containsExactly("NO_ASCENT");
    }

    @Test
    void partBHasSignificantTemperaturesAndWinds() {
        DecodedSounding sounding = only(TempSamples.PART_B);
        assertThat(sounding.levels()).hasSize(7 + 4);
        level(sounding.levels().get(0), 1013, Double.NaN, 8.6, 4.2, Double.NaN, Double.NaN);
        assertThat(sounding.levels().get(0).significance()).containsExactlyInAnyOrder(Significance.SURFACE, Significance.SIGNIFICANT_TEMPERATURE);
        level(sounding.levels().get(1), 1004, Double.NaN, 9.0, 4.3, Double.NaN, Double.NaN);
        level(sounding.levels().get(8), 900, Double.NaN, Double.NaN, Double.NaN, 15, 22);
        assertThat(sounding.levels().get(8).significance()).containsExactly(Significance.SIGNIFICANT_WIND);
        assertThat(sounding.remarks()).isEmpty();
    }

    @Test
    void aLayerWithoutMeasurementsMarksBothItsNeighbours() {
        List<ReportedLevel> levels = only(TempSamples.PART_B).levels();
        assertThat(levels).filteredOn(l -> l.significance().contains(Significance.TEMPERATURE_MISSING_BOUNDARY))
                .extracting(l -> l.pressure() / 100).containsExactly(870.0, 700.0);
        List<ReportedLevel> winds = only("TTBB 56128 00101 00013 08642 21212 00013 30503 11900 01522 22/// ///// 33500 31031 44250 27555=").levels();
        assertThat(winds).filteredOn(l -> l.significance().contains(Significance.WIND_MISSING_BOUNDARY))
                .extracting(l -> l.pressure() / 100).containsExactly(900.0, 500.0);
    }

    @Test
    void nationalSectionsAreNotReadAsLevels() {
        assertThat(only(TempSamples.PART_B).levels()).noneMatch(l -> l.pressure() == 16_400);
    }

    @Test
    void aTemperatureOfMinusSeventySevenIsNoMaximumWind() {
        DecodedSounding sounding = only(TempSamples.PART_C);
        assertThat(sounding.levels()).hasSize(5);
        level(sounding.levels().get(1), 50, 20_640, -77.7, 24, 125, 19);
        level(sounding.levels().get(4), 90.6, Double.NaN, -77.1, 12, 260, 18);
        assertThat(sounding.remarks()).isEmpty();
    }

    @Test
    void partDIsInTenthsOfHectopascals() {
        DecodedSounding sounding = only(TempSamples.PART_D);
        level(sounding.levels().get(0), 97.4, Double.NaN, -67.9, 19, Double.NaN, Double.NaN);
        level(sounding.levels().get(3), 97.4, Double.NaN, Double.NaN, Double.NaN, 255, 16);
    }

    @Test
    void windsByHeightAreInThousandsOfFeetWhereThatIsThePractice() {
        List<ReportedLevel> levels = only(TempSamples.HEIGHT_WINDS).levels();
        assertThat(levels).hasSize(8);
        assertThat(levels.get(0).significance()).containsExactly(Significance.SURFACE);
        assertThat(levels.get(1).height()).isCloseTo(304.8, within(1e-9));
        assertThat(levels.get(7).height()).isCloseTo(25 * 304.8, within(1e-9));
        assertThat(only(TempSamples.HEIGHT_WINDS.replace("72101", "08101")).levels().get(1).height()).isEqualTo(300);
    }

    @Test
    void someServicesAddWindsInTensOfMetres() {
        List<ReportedLevel> levels = only("PPBB 06120 00102 90012 33004 34505 35006 21212 10063 27010 20145 28012=").levels();
        assertThat(levels).extracting(ReportedLevel::height).containsExactly(Double.NaN, 300.0, 600.0, 630.0, 1450.0);
        assertThat(levels.get(4).windSpeed()).isEqualTo(12);
    }

    @Test
    void pilotPartAGivesWindsAtConsecutiveStandardLevels() {
        DecodedSounding sounding = only("PPAA 06123 00102 55385 25007 26007 26528 55340 26033 25036 25549 71281 26068=");
        assertThat(sounding.levels()).extracting(l -> l.pressure() / 100).containsExactly(850.0, 700.0, 500.0, 400.0, 300.0, 250.0, Double.NaN);
        assertThat(sounding.levels().get(2).windFromDirection()).isEqualTo(265);
        assertThat(sounding.levels().get(2).windSpeed()).isEqualTo(28);
        assertThat(sounding.levels().get(6).height()).isEqualTo(12_810);
    }

    @Test
    void aDropsondeAndAShipGiveTheirPosition() {
        DecodedSounding drop = only("XXAA 56127 99153 70659 04355 99007 29456 28521 00067 28856 28523 92755 22217 30027 88999 77999=".replace("56127", "56128"));
        assertThat(drop.latitude()).isEqualTo(15.3);
        assertThat(drop.longitude()).isEqualTo(-65.9);
        assertThat(drop.stationId()).isEqualTo("N15.3W065.9");
        level(drop.levels().get(0), 1007, Double.NaN, 29.4, 6, 285, 21);
        DecodedSounding ship = only("UUAA XSHIP 56121 99472 70330 14573 99013 08642 30503=");
        assertThat(ship.stationId()).isEqualTo("XSHIP");
        assertThat(ship.remarks()).extracting(Remark::code).as("74 would check 47 N 33 W, not 73").doesNotContain("POSITION_UNREADABLE");
        DecodedSounding mobile = only("IIAA XMOB 56121 99472 70330 14573 00502 99013 08642 30503=");
        assertThat(mobile.elevation()).isEqualTo(50);
    }

    @Test
    void bulletinsComeWithHeadingsControlCharactersAndDoubledReturns() {
        String bulletin = ("\u0001\n583 \nUSXX01 XVEN 061200 CCA\n" + TempSamples.PART_A + "\n\n" + TempSamples.PART_B + "\u0003\nNNNN\n").replace("\n", "\r\r\n");
        Decoding decoding = decode(bulletin);
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(2);
        assertThat(((DecodedSounding) decoding.messages().get(0)).correction()).isEqualTo("CCA");
        assertThat(((DecodedSounding) decoding.messages().get(0)).levels()).hasSize(14);
        assertThat(((DecodedSounding) decoding.messages().get(1)).levels()).hasSize(11);
        assertThat(decoding.messages().get(0).line()).isEqualTo(4);
    }

    @Test
    void withoutEndSignsAReportEndsAtTheNextPartOrHeading() {
        String bulletins = "583\nUSXX01 XVEN 061200\n" + TempSamples.PART_A.replace("=", "") + "\n\n" + TempSamples.PART_B.replace("=", "")
                + "\n584\nUSXX02 XVEN 061200\nTTAA 0612/ 00102 NIL\nNNNN\n";
        Decoding decoding = decode(bulletins);
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(3);
        assertThat(decoding.messages()).allSatisfy(m -> assertThat(m.remarks()).extracting(Remark::code).doesNotContain("GROUP_SHIFTED"));
        assertThat(((DecodedSounding) decoding.messages().get(1)).levels()).hasSize(11);
    }

    @Test
    void aPartGluedToTheHeadingOrToItsDayIsSeen() {
        assertThat(decode("USXX01 XVEN 061200TTAA 56121 00101 99013 08642 30503=").messages()).hasSize(1);
        assertThat(decode("TTAA56121 00101 99013 08642 30503=TTAA56121 00102 99013 08642 30503=").messages()).hasSize(2);
    }

    @Test
    void aCorrectionMarkMayStandBeforeThePart() {
        Decoding decoding = decode("COR " + TempSamples.PART_A + "CCB " + TempSamples.PART_B + TempSamples.PART_A);
        assertThat(decoding.messages()).extracting(m -> ((DecodedSounding) m).correction()).containsExactly("COR", "CCB", "");
    }

    @Test
    void aGroupOfFourFiguresIsDroppedAndTheNextLevelFound() {
        DecodedSounding sounding = only(TempSamples.PART_A.replace(" 03958 33024", " 0395 833024"));
        assertThat(sounding.levels()).hasSize(14);
        level(sounding.levels().get(4), 700, 3098, Double.NaN, Double.NaN, Double.NaN, Double.NaN);
        level(sounding.levels().get(5), 500, 5650, -17.3, 8, 310, 31);
        assertThat(sounding.remarks()).anyMatch(r -> r.code().equals("GROUP_SHIFTED") && r.line() == 2 && r.column() == 25);
    }

    @Test
    void aLostGroupCostsItsOwnLevelOnly() {
        DecodedSounding sounding = only(TempSamples.PART_A.replace(" 03958 33024", " 33024"));
        assertThat(sounding.levels()).as("all but 700 hPa").hasSize(13).noneMatch(l -> l.pressure() == 70_000);
        level(sounding.levels().get(3), 850, 1531, 4.2, 10, 20, 25);
        level(sounding.levels().get(4), 500, 5650, -17.3, 8, 310, 31);
        assertThat(sounding.remarks()).anyMatch(r -> r.code().equals("GROUP_SHIFTED") && r.line() == 2 && r.column() == 19);
    }

    @Test
    void aDoubledGroupCostsItsOwnLevelOnly() {
        DecodedSounding sounding = only(TempSamples.PART_A.replace(" 50565 17358 31031", " 50565 17358 17358 31031"));
        assertThat(sounding.levels()).as("all but 500 hPa").hasSize(13).noneMatch(l -> l.pressure() == 50_000);
        level(sounding.levels().get(5), 400, 7280, -28.5, 9, 305, 42);
        assertThat(sounding.remarks()).extracting(Remark::code).contains("GROUP_SHIFTED");
    }

    @Test
    void aHeightOutOfPlaceCostsNothingButItself() {
        DecodedSounding sounding = only(TempSamples.PART_A.replace(" 50565 ", " 50065 "));
        assertThat(sounding.levels()).hasSize(14);
        level(sounding.levels().get(4), 700, 3098, -3.9, 8, 330, 24);
        level(sounding.levels().get(5), 500, Double.NaN, -17.3, 8, 310, 31);
        assertThat(sounding.remarks()).extracting(Remark::code).contains("HEIGHT_IMPLAUSIBLE");
    }

    @Test
    void aLostGroupInPartBCostsItsOwnLevelOnly() {
        DecodedSounding sounding = only(TempSamples.PART_B.replace(" 22925 06869", " 22925"));
        assertThat(sounding.levels()).extracting(l -> l.pressure() / 100).containsExactly(1013.0, 1004.0, 870.0, 700.0, 400.0, 250.0, 1013.0, 900.0, 500.0, 250.0);
        assertThat(sounding.remarks()).anyMatch(r -> r.code().equals("GROUP_SHIFTED") && r.line() == 1);
    }

    @Test
    void aGroupOfSixFiguresInPartBCostsItsOwnLevelOnly() {
        DecodedSounding sounding = only(TempSamples.PART_B.replace(" 22925 06869", " 229250 06869"));
        assertThat(sounding.levels()).hasSize(10);
        assertThat(sounding.levels()).noneMatch(l -> l.pressure() == 92_500);
        assertThat(sounding.remarks()).extracting(Remark::code).contains("GROUP_SHIFTED");
    }

    @Test
    void aPilotRowWithAWindTooFewIsDropped() {
        DecodedSounding sounding = only(TempSamples.HEIGHT_WINDS.replace("90346 00518 02021 36028", "90346 00518 36028"));
        assertThat(sounding.levels()).hasSize(5);
        assertThat(sounding.remarks()).extracting(Remark::code).contains("GROUP_SHIFTED");
    }

    @Test
    void aReportWithoutReadableDayOrStationIsRejectedWithItsPlace() {
        Decoding decoding = decode("TTAA 5612 00101 99013 08642 30503=\nTTAA 56121 0O101 99013 08642 30503=\n" + TempSamples.PART_A);
        assertThat(decoding.messages()).hasSize(1);
        assertThat(decoding.rejected()).extracting(Rejection::code).containsExactly("DATE_UNREADABLE", "STATION_UNREADABLE");
        assertThat(decoding.rejected().get(1).line()).isEqualTo(2);
        assertThat(decoding.rejected().get(1).column()).isEqualTo(12);
        assertThat(decoding.rejected().get(1).raw()).isEqualTo("TTAA 56121 0O101 99013 08642 30503=");
    }

    @Test
    void textThatIsNoReportIsNotDropped() {
        Decoding decoding = decode("TXAA 56121 00101 99013 08642 30503=\n" + TempSamples.PART_A);
        assertThat(decoding.messages()).hasSize(1);
        assertThat(decoding.rejected()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("PART_UNKNOWN");
            assertThat(r.raw()).startsWith("TXAA");
        });
    }

    @Test
    void onlyTextWithAPartAndADayIsRecognised() {
        assertThat(recognises(TempSamples.PART_A)).isTrue();
        assertThat(recognises("UUAA XSHIP 56121 99472 70330")).isTrue();
        assertThat(recognises("")).isFalse();
        assertThat(recognises("TTAA is the first part")).isFalse();
        assertThat(recognises("XVDU UA /OV XVDU/TM 1200/FL350/TP M/TB MOD")).isFalse();
        assertThat(recognises("\0\0TTAA 56121 00101")).isFalse();
    }

    @Test
    void everyTruncationIsReadOrRejectedAndNeverThrows() {
        for (String whole : List.of(TempSamples.PART_A, TempSamples.PART_B, TempSamples.PART_C, TempSamples.PART_D, TempSamples.HEIGHT_WINDS)) {
            for (int i = 4; i < whole.length(); i++) {
                Decoding decoding = decode(whole.substring(0, i));
                assertThat(decoding.messages().size() + decoding.rejected().size()).as("cut after %d", i).isEqualTo(1);
            }
        }
    }

    @Test
    void flippedBytesNeverThrowAndTouchOnlyTheirOwnReport() {
        long seed = 20310306;
        Random random = new Random(seed);
        String tail = "\nTTAA 56121 00109 99013 08642 30503 00126 08042 31005=\n";
        byte[] whole = (TempSamples.PART_A + TempSamples.PART_B + TempSamples.PART_C + TempSamples.PART_D + TempSamples.HEIGHT_WINDS + "=\n").getBytes(StandardCharsets.US_ASCII);
        for (int i = 0; i < 4000; i++) {
            byte[] damaged = whole.clone();
            for (int k = 0; k <= i % 6; k++) {
                damaged[random.nextInt(damaged.length - 2)] = (byte) random.nextInt(256);
            }
            Decoding decoding = decode(new String(damaged, StandardCharsets.ISO_8859_1) + tail);
            boolean untouched = decoding.messages().stream().anyMatch(m -> ((DecodedSounding) m).stationId().equals("00109"));
            assertThat(untouched).as("seed %d, round %d", seed, i).isTrue();
        }
    }

    @Test
    void oneInAHundredBrokenLeavesTheOthers() {
        StringBuilder input = new StringBuilder();
        String[] broken = {"TTAA 561 00101 99013 08642 30503=\n", "TTAA 56121 ABCDE 99013 08642 30503=\n", "TAAA 56121 00101 99013 08642 30503=\n", "TTAA 56121 00101 xxxxxx=\n"};
        for (int i = 0; i < 10_000; i++) {
            input.append(i % 100 == 99 ? broken[i / 100 % broken.length] : TempSamples.PART_A);
        }
        Decoding decoding = decode(input.toString());
        assertThat(decoding.messages()).hasSize(9_900);
        assertThat(decoding.rejected()).hasSize(100);
        assertThat(decoding.rejected()).allSatisfy(r -> assertThat(r.raw()).isNotEmpty());
    }

    @Test
    void halfAMegabyteOfEvilGroupsDoesNotHang() {
        for (String evil : List.of("11111 ", "00/// ", "77777 ", "88888 ", "50505 ", "21212 ", "1 ", "99///", "31313 ")) {
            String input = "TTBB 56121 00101 " + evil.repeat(500_000 / evil.length()) + "=TTAA 56121 00101 99013 08642 30503 " + evil.repeat(50_000);
            Assertions.assertTimeoutPreemptively(Duration.ofSeconds(30), () -> decode(input), evil);
        }
    }

    private static void level(ReportedLevel level, double hectopascals, double height, double celsius, double depression, double direction, double knots) {
        same("pressure", level.pressure() / 100, hectopascals);
        same("height", level.height(), height);
        same("temperature", level.temperature() - 273.15, celsius);
        same("depression", level.temperature() - level.dewPoint(), depression);
        same("direction", level.windFromDirection(), direction);
        same("speed", level.windSpeed(), knots * 1852 / 3600);
    }

    private static void same(String what, double actual, double expected) {
        if (Double.isNaN(expected)) {
            assertThat(actual).as(what).isNaN();
        } else {
            assertThat(actual).as(what).isCloseTo(expected, within(1e-6));
        }
    }

    private boolean recognises(String text) {
        return decoder.recognises(text.getBytes(StandardCharsets.ISO_8859_1));
    }

    private DecodedSounding only(String text) {
        Decoding decoding = decode(text);
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(1);
        return (DecodedSounding) decoding.messages().get(0);
    }

    private Decoding decode(String text) {
        return decoder.decode(text.getBytes(StandardCharsets.ISO_8859_1), context);
    }
}
