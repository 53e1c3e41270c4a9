package org.shearbook.trial;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.shearbook.met.decode.CsvAirReportDecoder;
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.DecodedMessage;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.FixLookup.Fix;
import org.shearbook.met.decode.PilotReportDecoder;
import org.shearbook.met.profile.GreatCircle;

/** Real pilot reports against tables of hand-checked readings. */
@EnabledIfSystemProperty(named = "trial.data", matches = ".+")
class PilotReportTrialDataTests {

    private static final Path FOLDER = Path.of(System.getProperty("trial.data", ""));
    private static final Instant LONG_AFTER = Instant.parse("2020-09-01T00:00:00Z");

    /** Where a turbulence group begins and ends, written apart from the decoder; everything behind /RM is remark. */
    private static final Pattern TURBULENCE_GROUP =
            Pattern.compile("^(?:(?!/ *RM).)*?/ *TB *((?:(?!/ *(?:RM|IC|WV|TA|WX|SK|TP|FL|TM|OV)(?![A-Z]{3})).)*)");

    private static Map<String, List<Fix>> fixes;
    private final PilotReportDecoder decoder = new PilotReportDecoder();

    @BeforeAll
    static void loadsFixes() throws IOException {
        fixes = new HashMap<>();
        for (CSVRecord row : rows(FOLDER.resolve("fixes/ourairports_navaids.csv"))) {
            // the alignment of the station itself goes before the variation of the place, which is of another year
            String variation = row.get("slaved_variation_deg").isEmpty() ? row.get("magnetic_variation_deg") : row.get("slaved_variation_deg");
            add(new Fix(row.get("ident"), row.get("type"), Double.parseDouble(row.get("latitude_deg")),
                    Double.parseDouble(row.get("longitude_deg")), variation.isEmpty() ? Double.NaN : Double.parseDouble(variation)));
        }
        Matcher airport = Pattern.compile("\"ident\": \"(\\w+)\".*?\"latitude_deg\": \"([-0-9.]+)\",\\s*\"longitude_deg\": \"([-0-9.]+)\"", Pattern.DOTALL)
                .matcher(Files.readString(FOLDER.resolve("fixes/ourairports_airports_medium_large.json")));
        while (airport.find()) {
            add(new Fix(airport.group(1), "AERODROME", Double.parseDouble(airport.group(2)), Double.parseDouble(airport.group(3)), Double.NaN));
        }
    }

    private static void add(Fix fix) {
        fixes.computeIfAbsent(fix.identifier(), identifier -> new ArrayList<>()).add(fix);
    }

    private static DecodingContext context(Instant receivedAt) {
        FixLookup lookup = identifier -> fixes.getOrDefault(identifier, List.of());
        return new DecodingContext(receivedAt, lookup);
    }

    private static List<CSVRecord> rows(Path file) {
        try (Reader reader = Files.newBufferedReader(file);
                CSVParser parser = CSVFormat.DEFAULT.builder().setHeader().setSkipHeaderRecord(true).get().parse(reader)) {
            return parser.getRecords();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static List<Path> archiveFiles() throws IOException {
        try (Stream<Path> files = Files.list(FOLDER.resolve("pirep"))) {
            return files.filter(file -> file.getFileName().toString().matches("dev_pireps.*\\.csv")).sorted().toList();
        }
    }

    private Decoding decode(String text, Instant receivedAt) {
        return decoder.decode(text.getBytes(StandardCharsets.UTF_8), context(receivedAt));
    }

    private DecodedAirReport only(String text) {
        Decoding decoding = decode(text, LONG_AFTER);
        assertThat(decoding.rejected()).as(text).isEmpty();
        assertThat(decoding.messages()).as(text).hasSize(1);
        return (DecodedAirReport) decoding.messages().get(0);
    }

    @Test
    void allNinetyTruthCasesOfTurbulenceAreRight() {
        List<String> wrong = new ArrayList<>();
        List<CSVRecord> cases = rows(FOLDER.resolve("pirep/dev_tb_truth.csv"));
        for (CSVRecord row : cases) {
            List<String> expected = Stream.of("layer_1", "layer_2", "layer_3").map(row::get).filter(layer -> !layer.isEmpty()).toList();
            List<String> found = only(row.get("example_report")).turbulence().stream().map(PilotReportTrialDataTests::written).toList();
            if (!found.equals(expected)) {
                wrong.add(row.get("tb_text") + " -> " + found + " instead of " + expected);
            }
        }
        assertThat(wrong).isEmpty();
        assertThat(cases).hasSize(90);
    }

    /** A layer as the truth table writes it. */
    private static String written(TurbulenceLayer layer) {
        List<String> words = new ArrayList<>();
        if (layer.frequency() != null) {
            words.add(layer.frequency().name());
        }
        if (layer.intensity() != null) {
            String low = layer.intensity().name();
            words.add((layer.intensity() == layer.intensityTo() ? low : low + "-" + layer.intensityTo()).replace("NIL", "NEG"));
        }
        words.add(layer.type());
        double base = layer.baseFeet();
        double top = layer.topFeet();
        if (base == top) {
            words.add("AT " + Math.round(base));
        } else if (Double.isNaN(base) && !Double.isNaN(top)) {
            words.add("BLO " + Math.round(top));
        } else if (Double.isNaN(top) && !Double.isNaN(base)) {
            words.add("ABV " + Math.round(base));
        } else if (!Double.isNaN(base)) {
            words.add(Math.round(base) + "-" + Math.round(top));
        }
        return String.join(" ", words.stream().filter(word -> !word.isEmpty()).toList());
    }

    @Test
    void allFiftyTruthCasesOfPlaceAreRight() {
        List<String> wrong = new ArrayList<>();
        List<CSVRecord> cases = rows(FOLDER.resolve("pirep/dev_ov_truth.csv"));
        double largest = 0.0;
        for (CSVRecord row : cases) {
            DecodedAirReport.Place place = only(row.get("report")).place();
            double latitude = Double.parseDouble(row.get("expected_lat"));
            double longitude = Double.parseDouble(row.get("expected_lon"));
            // the table has four decimals; its middles of segments are means of the coordinates, ours lie on the great circle
            double tolerance = row.get("form").startsWith("segment") ? 500.0 : 15.0;
            double error = GreatCircle.distance(latitude, longitude, place.latitude(), place.longitude());
            largest = Math.max(largest, Double.isNaN(error) ? Double.POSITIVE_INFINITY : error);
            if (!(error <= tolerance)) {
                wrong.add(row.get("report") + " -> " + place + ", " + Math.round(error) + " m off " + latitude + " " + longitude);
            }
        }
        System.out.println("Places: " + cases.size() + " cases, largest difference " + Math.round(largest) + " m");
        assertThat(wrong).isEmpty();
        assertThat(cases).hasSize(50);
    }

    @Test
    void ninetyNineOfAHundredTurbulenceGroupsGiveALayer() throws IOException {
        int groups = 0;
        List<String> without = new ArrayList<>();
        for (Path file : archiveFiles()) {
            for (CSVRecord row : rows(file)) {
                Matcher matcher = TURBULENCE_GROUP.matcher(row.get("REPORT"));
                if (!matcher.find() || matcher.group(1).isBlank()) {
                    continue;
                }
                groups++;
                if (only(row.get("REPORT")).turbulence().isEmpty()) {
                    without.add(matcher.group(1).strip());
                }
            }
        }
        System.out.printf("Turbulence groups: %d, with a layer %.2f %%; without: %s%n", groups, 100.0 - 100.0 * without.size() / groups, without);
        assertThat(groups).isGreaterThan(5_000);
        assertThat(without.size()).isLessThanOrEqualTo(groups / 100);
    }

    @Test
    void everyRowOfTheArchiveIsAReportOfItsDay() throws IOException {
        DateTimeFormatter valid = DateTimeFormatter.ofPattern("uuuuMMddHHmm");
        int rows = 0;
        int resolved = 0;
        Map<String, Integer> ways = new HashMap<>();
        Map<String, Integer> codes = new HashMap<>();
        for (Path file : archiveFiles()) {
            for (CSVRecord row : rows(file)) {
                Instant validAt = LocalDateTime.parse(row.get("VALID"), valid).toInstant(ZoneOffset.UTC);
                Decoding decoding = decode(row.get("REPORT"), validAt.plus(Duration.ofMinutes(20)));
                assertThat(decoding.messages().size() + decoding.rejected().size()).as(row.get("REPORT")).isEqualTo(1);
                rows++;
                if (decoding.messages().isEmpty()) {
                    System.out.println("Refused: " + decoding.rejected());
                    continue;
                }
                DecodedAirReport report = (DecodedAirReport) decoding.messages().get(0);
                report.remarks().forEach(remark -> codes.merge(remark.code(), 1, Integer::sum));
                ways.merge(report.place().resolvedBy(), 1, Integer::sum);
                resolved += report.place().isResolved() ? 1 : 0;
                // the archive marks no report as urgent that has no station in front
                assertThat(report.urgent()).as(row.get("REPORT"))
                        .isEqualTo(row.get("URGENT").equals("T") || row.get("REPORT").startsWith("UUA"));
                if (report.observedAt() != null) {
                    assertThat(Duration.between(report.observedAt(), validAt).abs()).as(row.get("REPORT")).isLessThan(Duration.ofMinutes(20));
                }
            }
        }
        System.out.println("Rows: " + rows + ", places resolved: " + resolved + " by " + ways + ", remarks: " + codes);
        assertThat(rows).isGreaterThan(8_000);
    }

    @Test
    void allRowsAreReadInOneUpload() throws IOException {
        List<String> reports = new ArrayList<>();
        for (Path file : archiveFiles()) {
            rows(file).forEach(row -> reports.add(row.get("REPORT")));
        }
        long begun = System.nanoTime();
        Decoding decoding = decode(String.join("\n", reports), LONG_AFTER);
        System.out.printf("One upload of %d reports: %d read, %d refused, %d ms on a shared machine%n", reports.size(),
                decoding.messages().size(), decoding.rejected().size(), (System.nanoTime() - begun) / 1_000_000);
        assertThat(decoding.messages().size() + decoding.rejected().size()).isEqualTo(reports.size());
        assertThat(decoding.messages().stream().map(DecodedMessage::raw)).allMatch(reports::contains);
        assertThat(decoding.rejected().size()).isLessThan(10);
    }

    @Test
    void bulletinsAreReadWhole() throws IOException {
        Map<String, Integer> expected = Map.of("KNKA_022300.txt", 3, "OVO.txt", 2, "PIREP.txt", 4, "PRCUS.txt", 2,
                "badgeom.txt", 7, "canada.txt", 1, "latlonloc.txt", 3, "no_newline_space.txt", 12);
        for (Map.Entry<String, Integer> file : expected.entrySet()) {
            byte[] bytes = Files.readAllBytes(FOLDER.resolve("pirep/bulletins").resolve(file.getKey()));
            assertThat(decoder.recognises(bytes)).isTrue();
            Decoding decoding = decoder.decode(bytes, context(LONG_AFTER));
            assertThat(decoding.messages()).as(file.getKey() + decoding).hasSize(file.getValue());
            // one report of PRCUS.txt has lost everything behind its place
            assertThat(decoding.rejected()).as(file.getKey()).hasSize(file.getKey().equals("PRCUS.txt") ? 1 : 0);
        }
    }

    @Test
    void theExampleTableOfAirReportsIsReadWhole() throws IOException {
        byte[] bytes = Files.readAllBytes(FOLDER.resolve("csv/aircraft_design_example.csv"));
        Decoding decoding = new CsvAirReportDecoder().decode(bytes, context(LONG_AFTER));
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).extracting(message -> ((DecodedAirReport) message).edrPeak()).containsExactly(Double.NaN, 0.36, Double.NaN);
        assertThat(decoding.messages()).extracting(message -> ((DecodedAirReport) message).turbulence().size()).containsExactly(1, 0, 1);
    }
}
