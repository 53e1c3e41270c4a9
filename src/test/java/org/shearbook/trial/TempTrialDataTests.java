package org.shearbook.trial;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.MessageDecoders;
import org.shearbook.met.decode.Remark;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.decode.ReportedLevel.Significance;

/**
 * Every coded ascent of the trial data against the table beside it. The expected values are computed elsewhere: by an
 * independent decoder that was checked against the binary form of the same ascents.
 */
@EnabledIfSystemProperty(named = "trial.data", matches = ".+")
class TempTrialDataTests {

    /** Received at the end of a month of 31 days, so that every day of a report lies in that month. */
    private static final Instant RECEIVED_AT = Instant.parse("2026-01-31T23:59:00Z");

    private record Expected(int line, String part, String station, String day, String hour, String launch, String type,
                            double pressure, double height, double temperature, double depression, double direction, double speed) {
    }

    static Stream<Path> files() {
        return Stream.of("temp-tac", "temp-drop-tac").flatMap(folder -> {
            try {
                return Files.list(Path.of(System.getProperty("trial.data"), folder)).filter(f -> f.toString().endsWith(".txt")).sorted();
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        });
    }

    @ParameterizedTest
    @MethodSource("files")
    void everyLevelEqualsTheTableWithinTheResolutionOfTheCode(Path file) throws IOException {
        Map<String, DecodedSounding> decoded = new LinkedHashMap<>();
        Decoding decoding = MessageDecoders.all().decode(Files.readAllBytes(file), new DecodingContext(RECEIVED_AT, FixLookup.NONE));
        assertThat(decoding.format()).isEqualTo("TEMP");
        assertThat(decoding.rejected()).isEmpty();
        decoding.messages().forEach(m -> {
            DecodedSounding sounding = (DecodedSounding) m;
            String part = sounding.parts().iterator().next();
            assertThat(decoded.put(part + " " + (part.startsWith("XX") ? "DROP" : sounding.stationId()), sounding)).isNull();
            assertThat(sounding.remarks()).extracting(Remark::code).doesNotContain("GROUP_SHIFTED", "REPORT_CUT_OFF");
        });

        Map<String, List<Expected>> expected = expected(file);
        assertThat(decoded.keySet()).containsExactlyInAnyOrderElementsOf(expected.keySet());
        expected.forEach((key, rows) -> compare(key, decoded.get(key), rows));
    }

    @Test
    void everyPilotReportIsReadWhole() throws IOException {
        Path file = Path.of(System.getProperty("trial.data"), "pilot-tac", "UPCI30_BABJ_121800_20191112.txt");
        Decoding decoding = MessageDecoders.all().decode(Files.readAllBytes(file), new DecodingContext(RECEIVED_AT, FixLookup.NONE));
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).hasSize(Files.readString(file).split("PPAA").length - 1).allSatisfy(m -> {
            DecodedSounding sounding = (DecodedSounding) m;
            assertThat(sounding.remarks()).extracting(Remark::code).doesNotContain("GROUP_SHIFTED", "REPORT_CUT_OFF");
            if (!sounding.raw().contains("NIL")) {
                assertThat(sounding.levels()).as("850 to 100 hPa, and the maximum wind unless it is 77999").hasSize(sounding.raw().contains("77999") ? 9 : 10);
            }
        });
    }

    private static void compare(String key, DecodedSounding sounding, List<Expected> rows) {
        if (rows.get(0).type().equals("NIL")) {
            assertThat(sounding.levels()).isEmpty();
            return;
        }
        OffsetDateTime nominal = sounding.nominalAt().atOffset(ZoneOffset.UTC);
        assertThat(nominal.getDayOfMonth()).as(key).isEqualTo(Integer.parseInt(rows.get(0).day()));
        assertThat(nominal.getHour()).as(key).isEqualTo(Integer.parseInt(rows.get(0).hour()));
        if (!rows.get(0).launch().isEmpty()) {
            OffsetDateTime launched = sounding.launchedAt().atOffset(ZoneOffset.UTC);
            assertThat(String.format("%02d%02d", launched.getHour(), launched.getMinute())).as(key).isEqualTo(rows.get(0).launch());
        }
        assertThat(sounding.levels()).as(key).hasSameSizeAs(rows);
        for (int i = 0; i < rows.size(); i++) {
            compare(key, sounding.levels().get(i), rows.get(i));
        }
    }

    private static void compare(String key, ReportedLevel level, Expected row) {
        String at = key + ", line " + row.line() + " of the table";
        assertThat(level.significance()).as(at).contains(switch (row.type()) {
            case "SFC" -> Significance.SURFACE;
            case "STD" -> Significance.STANDARD;
            case "TROP" -> Significance.TROPOPAUSE;
            case "MAXW" -> Significance.MAXIMUM_WIND;
            case "SIGT" -> Significance.SIGNIFICANT_TEMPERATURE;
            case "SIGW" -> Significance.SIGNIFICANT_WIND;
            default -> row.height() == 0 ? Significance.SURFACE : Significance.SIGNIFICANT_WIND;
        });
        same(at + ": pressure", level.pressure() / 100, row.pressure(), 0.05);
        if (row.type().equals("PILOT")) {
            // The table counts in the code's units of 300 m; these stations count in thousands of feet.
            double units = Double.isNaN(level.height()) ? 0 : level.height() / 304.8;
            assertThat(units).as(at + ": height").isCloseTo(row.height() / 300, within(1e-6));
        } else {
            same(at + ": height", level.height(), row.height(), 0.5);
        }
        same(at + ": temperature", level.temperature() - 273.15, row.temperature(), 0.05);
        same(at + ": depression", level.temperature() - level.dewPoint(), row.depression(), 0.05);
        same(at + ": direction", level.windFromDirection(), row.direction(), 0.5);
        same(at + ": speed", level.windSpeed(), row.speed(), 0.006);
    }

    private static void same(String at, double actual, double expected, double tolerance) {
        if (Double.isNaN(expected)) {
            assertThat(actual).as(at).isNaN();
        } else {
            assertThat(actual).as(at).isCloseTo(expected, within(tolerance));
        }
    }

    private static Map<String, List<Expected>> expected(Path file) throws IOException {
        Map<String, List<Expected>> rows = new LinkedHashMap<>();
        List<String> lines = Files.readAllLines(file.resolveSibling(file.getFileName() + ".ref.csv"));
        for (int i = 1; i < lines.size(); i++) {
            String[] c = lines.get(i).split(",", -1);
            Expected row = new Expected(i + 1, c[1], c[2], c[3], c[4], c[5], c[7], number(c, 8), number(c, 9), number(c, 10), number(c, 11), number(c, 12), number(c, 13));
            rows.computeIfAbsent(row.part() + " " + row.station(), k -> new ArrayList<>()).add(row);
        }
        return rows;
    }

    private static double number(String[] cells, int index) {
        return index >= cells.length || cells[index].isEmpty() ? Double.NaN : Double.parseDouble(cells[index]);
    }
}
