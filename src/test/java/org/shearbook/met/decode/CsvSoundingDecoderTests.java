package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.shearbook.met.decode.ReportedLevel.Significance;

class CsvSoundingDecoderTests {

    private static final String METADATA = """
            # station_id=0-999-1-S102
            # latitude_deg=47.2
            # longitude_deg=-30.0
            # station_elevation_m=50
            # nominal_time=2031-03-12T12:00:00Z
            # launch_time=2031-03-12T11:15:00Z
            """;
    private static final String HEADER = "time_s,pressure_hPa,geopotential_height_m,temperature_C,dewpoint_C,wind_direction_deg,wind_speed_kt,latitude_deg,longitude_deg,level_type\n";
    private static final String ROWS = """
            0,1004.3,87,9.2,7.4,240,14,47.2001,-30.0021,surface
            6,1000.0,123,8.7,7.1,241,17,47.2002,-30.0017,standard
            300,,2950,,,270,51,,,significant_wind
            560,500.0,5480,-26.1,-41.0,275,72,50.2631,-5.0011,standard|tropopause
            """;

    private final CsvSoundingDecoder decoder = new CsvSoundingDecoder();
    private final DecodingContext context = new DecodingContext(Instant.parse("2031-03-12T13:00:00Z"), FixLookup.NONE);

    @Test
    void aFullFileIsRead() {
        DecodedSounding sounding = read(METADATA + HEADER + ROWS);
        assertThat(sounding.stationId()).isEqualTo("0-999-1-S102");
        assertThat(sounding.latitude()).isEqualTo(47.2);
        assertThat(sounding.longitude()).isEqualTo(-30);
        assertThat(sounding.elevation()).isEqualTo(50);
        assertThat(sounding.nominalAt()).isEqualTo("2031-03-12T12:00:00Z");
        assertThat(sounding.launchedAt()).isEqualTo("2031-03-12T11:15:00Z");
        assertThat(sounding.remarks()).isEmpty();
        assertThat(sounding.levels()).hasSize(4);
        ReportedLevel first = sounding.levels().get(0);
        assertThat(first.pressure()).isCloseTo(100_430, within(1e-6));
        assertThat(first.height()).isEqualTo(87);
        assertThat(first.temperature()).isCloseTo(282.35, within(1e-9));
        assertThat(first.dewPoint()).isCloseTo(280.55, within(1e-9));
        assertThat(first.windFromDirection()).isEqualTo(240);
        assertThat(first.windSpeed()).as("14 kt, exact: 14 · 1852 / 3600").isCloseTo(7.2022222, within(1e-6));
        assertThat(first.elapsed()).isZero();
        assertThat(first.latitude()).isEqualTo(47.2001);
        assertThat(first.significance()).containsExactly(Significance.SURFACE);
        assertThat(sounding.levels().get(3).significance()).containsExactlyInAnyOrder(Significance.STANDARD, Significance.TROPOPAUSE);
    }

    @Test
    void missingValuesStayMissing() {
        ReportedLevel wind = read(METADATA + HEADER + ROWS).levels().get(2);
        assertThat(wind.pressure()).isNaN();
        assertThat(wind.temperature()).isNaN();
        assertThat(wind.height()).isEqualTo(2950);
        assertThat(wind.hasWind()).isTrue();
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "-999", "-9999", "9999", "99999", "NaN", "/////", "M", "-999.0"})
    void everyUsualMarkForMissingIsKnown(String mark) {
        DecodedSounding sounding = read("pressure_hPa,temperature_C\n1000," + mark + "\n900,1.0\n");
        assertThat(sounding.levels().get(0).temperature()).isNaN();
        assertThat(sounding.remarks()).noneMatch(r -> r.code().equals("VALUE_UNREADABLE"));
    }

    @Test
    void aHeightOf9999BetweenItsNeighboursIsAHeight() {
        DecodedSounding sounding = read("geopotential_height_m,temperature_C\n9989,-50\n9999,-50.1\n10009,-50.2\n9999,-50\n");
        assertThat(sounding.levels().get(1).height()).isEqualTo(9999);
        assertThat(sounding.levels().get(3).height()).as("out of order, so a mark").isNaN();
    }

    @Test
    void aPressureOf99999PascalBetweenItsNeighboursIsAPressure() {
        assertThat(read("pressure_Pa,temperature_C\n100100,9\n99999,8.9\n99800,8.8\n").levels().get(1).pressure()).isEqualTo(99_999);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "pressure_Pa|100430|100430", "pressure_hPa|1004.3|100430", "pressure_kPa|100.43|100430", "Pressure (hPa)|1004.3|100430", "P [mb]|1004.3|100430", "pressure mbar|1004.3|100430"})
    void pressureIsTakenInItsStatedUnit(String name, String value, double expected) {
        assertThat(read(name + ";temperature_C\n" + value + ";9\n").levels().get(0).pressure()).isCloseTo(expected, within(1e-6));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "wind_speed_ms|10|10", "wind_speed_kt|10|5.1444444", "Wind speed (m/s)|10|10", "Wind speed [knots]|10|5.1444444", "wind_speed_m/s|10|10", "ff (m s-1)|10|10", "speed_km/h|36|10", "wind speed (m·s⁻¹)|10|10"})
    void speedIsTakenInItsStatedUnit(String name, String value, double expected) {
        assertThat(read("pressure_hPa;wind_direction_deg;" + name + "\n1000;270;" + value + "\n").levels().get(0).windSpeed()).isCloseTo(expected, within(1e-6));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "temperature_C|1.85|275", "temperature_K|275|275", "Temp (°C)|1.85|275", "t [degC]|1.85|275", "air_temperature_K|275|275"})
    void temperatureIsTakenInItsStatedUnit(String name, String value, double expected) {
        assertThat(read("pressure_hPa;" + name + "\n1000;" + value + "\n").levels().get(0).temperature()).isCloseTo(expected, within(1e-6));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "geopotential_m2s-2|980.665|100", "geopotential (m²/s²)|980.665|100", "geopotential_height_gpm|100|100", "height_ft|1000|304.8", "Height (km)|1.5|1500"})
    void heightIsTakenInItsStatedUnit(String name, String value, double expected) {
        assertThat(read(name + ";temperature_C\n" + value + ";1\n").levels().get(0).height()).isCloseTo(expected, within(1e-6));
    }

    @Test
    void geometricHeightIsConvertedAndRemarked() {
        DecodedSounding sounding = read("geometric_height_m,temperature_C\n10000,-50\n");
        assertThat(sounding.levels().get(0).height()).as("published: ICAO Doc 7488, table: 10 000 m is 9 984 gpm").isCloseTo(9984, within(0.5));
        assertThat(sounding.remarks()).extracting(Remark::code).contains("GEOMETRIC_HEIGHT_CONVERTED");
    }

    @Test
    void semicolonsAllowADecimalComma() {
        ReportedLevel level = read("Pressure (hPa);Height (m);Temp (C);RH (%);Wind dir;Wind speed (m/s)\r\n1004,3;87;9,2;88;240;7,2\r\n925,0;781;4,1;86;252;17,0\r\n").levels().get(0);
        assertThat(level.pressure()).isCloseTo(100_430, within(1e-6));
        assertThat(level.windSpeed()).isEqualTo(7.2);
        assertThat(level.dewPoint()).as("about 7.3 °C at 9.2 °C and 88 %, from memory").isCloseTo(280.45, within(0.15));
    }

    @Test
    void unitsMayStandInTheirOwnRow() {
        ReportedLevel level = read("press;geopot;air_temp;dew_point;dir;speed\nhPa;m;degC;degC;deg;kt\n1004.3;87;9.2;7.4;240;14\n").levels().get(0);
        assertThat(level.pressure()).isCloseTo(100_430, within(1e-6));
        assertThat(level.height()).isEqualTo(87);
        assertThat(level.windSpeed()).isCloseTo(7.2022222, within(1e-6));
    }

    @Test
    void windMayComeAsComponents() {
        ReportedLevel level = read("pressure_Pa,geopotential_m2s-2,temperature_K,u_wind_ms,v_wind_ms\n100430,853.2,282.35,3,4\n").levels().get(0);
        assertThat(level.windSpeed()).isCloseTo(5, within(1e-12));
        assertThat(level.windFromDirection()).as("blows towards north-east").isCloseTo(216.87, within(0.01));
    }

    @Test
    void byteOrderMarkTabsAndCarriageReturnsAreNoObstacle() {
        DecodedSounding sounding = read("\uFEFF" + (METADATA + HEADER + ROWS).replace(',', '\t').replace("\n", "\r\n"));
        assertThat(sounding.levels()).hasSize(4);
        assertThat(sounding.stationId()).isEqualTo("0-999-1-S102");
    }

    @Test
    void textThatIsNotUnicodeIsReadAsLatin() {
        byte[] bytes = ("# station_name=Kelbrith h\u00E4gen\n" + HEADER + ROWS).getBytes(StandardCharsets.ISO_8859_1);
        assertThat(decoder.recognises(bytes)).isTrue();
        assertThat(decoder.decode(bytes, context).messages()).hasSize(1);
    }

    @Test
    void metadataMayTrailTheSeparatorsOfATableProgram() {
        assertThat(read("# station_id=XVKE,,,,\n" + HEADER + ROWS).stationId()).isEqualTo("XVKE");
    }

    @Test
    void timesOfDayBecomeElapsedTime() {
        DecodedSounding sounding = read("time,pressure_hPa,temperature_C\n2031-03-12T11:15:00Z,1000,9\n2031-03-12T11:15:06Z,997,8.8\n");
        assertThat(sounding.launchedAt()).isEqualTo("2031-03-12T11:15:00Z");
        assertThat(sounding.levels().get(1).elapsed()).isEqualTo(6);
    }

    @Test
    void withoutUnitsTheFileIsRefusedAndTheMessageSaysWhichColumnAndWhatToWrite() {
        Rejection rejection = refused("# station_id=X\npressure_hPa,height_m,temperature_C,dir,speed\n1000,100,9,240,14\n", "UNITS_MISSING");
        assertThat(rejection.line()).isEqualTo(2);
        assertThat(rejection.column()).isEqualTo(41);
        assertThat(rejection.text()).contains("'speed'").contains("wind_speed_kt").contains("wind_speed_ms").doesNotContain("'dir'");
        assertThat(rejection.raw()).contains("1000,100,9,240,14");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "SPEED_OUT_OF_RANGE|5|560,500.0,5480,-26.1,-41.0,275,300,,,",
        "SPEED_NEGATIVE|5|560,500.0,5480,-26.1,-41.0,275,-3,,,",
        "DIRECTION_OUT_OF_RANGE|5|560,500.0,5480,-26.1,-41.0,370,12,,,",
        "TEMPERATURE_OUT_OF_RANGE|5|560,500.0,5480,261.3,-41.0,270,12,,,",
        "PRESSURE_OUT_OF_RANGE|5|560,50000,5480,-26.1,-41.0,270,12,,,",
        "HEIGHT_OUT_OF_RANGE|5|560,500.0,548000,-26.1,-41.0,270,12,,,"})
    void aValueThatCannotBeRefusesTheFileWithItsLine(String code, int line, String row) {
        Rejection rejection = refused(HEADER + ROWS.lines().limit(3).reduce("", (a, b) -> a + b + "\n") + row + "\n", code);
        assertThat(rejection.line()).isEqualTo(line);
        assertThat(rejection.column()).isPositive();
    }

    @Test
    void aRefusalNamesTheColumnOfTheCell() {
        assertThat(refused("pressure_hPa,wind_direction_deg,wind_speed_ms\n1000,240,14\n900,370,20\n", "DIRECTION_OUT_OF_RANGE").column()).isEqualTo(5);
    }

    @Test
    void aFileWithoutVerticalCoordinateIsRefused() {
        refused("temperature_C,wind_direction_deg,wind_speed_kt\n9,240,14\n", "NO_VERTICAL_COORDINATE");
    }

    @Test
    void aSinglePressureStepUpwardsIsRemarkedAndALongerOneRefused() {
        assertThat(read("pressure_hPa,temperature_C\n1000,9\n900,5\n905,5.1\n800,1\n").remarks()).extracting(Remark::code).contains("PRESSURE_RISES");
        assertThat(refused("pressure_hPa,temperature_C\n1000,9\n900,5\n905,5.1\n910,5.2\n800,1\n", "PRESSURE_RISES").line()).isEqualTo(5);
    }

    @Test
    void aRepeatedRowIsLeftOutAndAContradictingOneRefuses() {
        DecodedSounding sounding = read("pressure_hPa,temperature_C\n1000,9\n1000,9\n900,5\n");
        assertThat(sounding.levels()).hasSize(2);
        assertThat(sounding.remarks()).extracting(Remark::code).contains("LEVEL_REPEATED");
        assertThat(refused("pressure_hPa,temperature_C\n1000,9\n900,5\n900,4\n", "LEVEL_TWICE").line()).isEqualTo(4);
    }

    @Test
    void aDecimalCommaInACommaSeparatedFileIsRefused() {
        assertThat(refused("pressure_hPa,temperature_C\n1004,3,9,2\n", "ROW_TOO_LONG").text()).contains("semicolons");
    }

    @Test
    void anUnreadableCellIsRemarkedAndTheRestKept() {
        DecodedSounding sounding = read("pressure_hPa,temperature_C,wind_direction_deg,wind_speed_kt\n1000,9,240,14\n900,abc,250,20\n");
        assertThat(sounding.levels().get(1).temperature()).isNaN();
        assertThat(sounding.levels().get(1).windFromDirection()).isEqualTo(250);
        assertThat(sounding.remarks()).anyMatch(r -> r.code().equals("VALUE_UNREADABLE") && r.line() == 3 && r.column() == 5);
    }

    @Test
    void theSameRemarkFiveThousandTimesIsSummedUp() {
        StringBuilder file = new StringBuilder("pressure_Pa,temperature_C\n");
        for (int i = 0; i < 5000; i++) {
            file.append(100_000 - 10 * i).append(",abc\n");
        }
        assertThat(read(file.toString()).remarks()).hasSizeLessThan(30).anyMatch(r -> r.text().startsWith("4980 more"));
    }

    @Test
    void unknownUnitsAreNamed() {
        assertThat(refused("pressure_hPa,wind speed (furlongs),wind_direction_deg\n1000,3,270\n", "UNIT_UNKNOWN").text()).contains("furlongs");
    }

    @Test
    void aHeaderWithoutRowsIsRefused() {
        refused(METADATA + HEADER, "NO_LEVELS");
    }

    @Test
    void otherTablesAndNoiseAreNotRecognised() {
        assertThat(recognises("")).isFalse();
        assertThat(recognises("report_id,observed_at,latitude_deg,longitude_deg,flight_level,temperature_C,wind_direction_deg,wind_speed_kt\n")).isFalse();
        assertThat(recognises("id,ident,name,latitude_deg,longitude_deg,elevation_ft,type\n")).isFalse();
        assertThat(recognises("TTAA 28231 51463 99919 06664 20504=")).isFalse();
        assertThat(recognises("\0\1\2pressure_hPa,temperature_C\n")).isFalse();
        assertThat(recognises(HEADER + ROWS)).isTrue();
    }

    @Test
    void everyTruncationIsReadOrRefusedAndNeverThrows() {
        String whole = METADATA + HEADER + ROWS;
        for (int i = 0; i <= whole.length(); i++) {
            Decoding decoding = decode(whole.substring(0, i));
            assertThat(decoding.messages().size() + decoding.rejected().size()).as("cut after %d", i).isEqualTo(1);
        }
    }

    @Test
    void flippedBytesNeverThrow() {
        long seed = 20310313;
        Random random = new Random(seed);
        byte[] whole = (METADATA + HEADER + ROWS).getBytes(StandardCharsets.UTF_8);
        for (int i = 0; i < 5000; i++) {
            byte[] damaged = whole.clone();
            for (int k = 0; k <= i % 5; k++) {
                damaged[random.nextInt(damaged.length)] = (byte) random.nextInt(256);
            }
            decoder.recognises(damaged);
            Decoding decoding = decoder.decode(damaged, context);
            assertThat(decoding.messages().size() + decoding.rejected().size()).as("seed %d, round %d", seed, i).isEqualTo(1);
        }
    }

    private boolean recognises(String text) {
        return decoder.recognises(text.getBytes(StandardCharsets.UTF_8));
    }

    private DecodedSounding read(String text) {
        Decoding decoding = decode(text);
        assertThat(decoding.rejected()).isEmpty();
        return (DecodedSounding) decoding.messages().get(0);
    }

    private Rejection refused(String text, String code) {
        Decoding decoding = decode(text);
        assertThat(decoding.messages()).isEmpty();
        assertThat(decoding.rejected()).hasSize(1);
        assertThat(decoding.rejected().get(0).code()).isEqualTo(code);
        return decoding.rejected().get(0);
    }

    private Decoding decode(String text) {
        byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
        return decoder.decode(bytes, context);
    }
}
