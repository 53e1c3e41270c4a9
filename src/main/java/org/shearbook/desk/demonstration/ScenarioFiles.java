package org.shearbook.desk.demonstration;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.shearbook.met.profile.Units;

/**
 * Writes the scenario as the files a forecast office would receive. From the repository:
 * {@code java -cp target/classes:COMMONS_MATH_JAR org.shearbook.desk.demonstration.ScenarioFiles demo-data}; a test
 * checks that the files in {@code demo-data} are those this program writes.
 */
final class ScenarioFiles {

    static final String REPORT_HEADER = "report_id,report_class,automated,observed_at,received_at,latitude_deg,longitude_deg,flight_level,"
            + "weight_class,flight_id,turbulence_intensity,edr_peak,cloud,remarks";
    /** The ascent that first arrives with knots declared as metres per second. */
    static final ScenarioAscent WRONG_UNIT = ScenarioAscent.named("KELBRITH 2 00");
    static final String WRONG_UNIT_FILE = "XVKE-D2-00Z-wrong-unit.csv";
    /** The ascent that arrives as coded text first, its second part twice. */
    static final ScenarioAscent CODED = ScenarioAscent.named("DUNVEERY 2 00");
    static final String CODED_FILE = "XVDU-D2-00Z-%s.txt";

    private ScenarioFiles() {
    }

    public static void main(String[] arguments) throws IOException {
        Path folder = Path.of(arguments[0]);
        for (Map.Entry<String, String> file : all().entrySet()) {
            Path path = folder.resolve(file.getKey());
            Files.createDirectories(path.getParent());
            Files.writeString(path, file.getValue(), StandardCharsets.UTF_8);
        }
    }

    /** Path below {@code demo-data} to content. */
    static Map<String, String> all() {
        Map<String, String> files = new TreeMap<>();
        for (ScenarioAscent ascent : ScenarioAscent.ALL) {
            files.put("sounding/" + ascent.fileName(), soundingCsv(ascent, "ms", 1));
        }
        files.put("sounding/" + WRONG_UNIT_FILE, soundingCsv(WRONG_UNIT, "ms", 1 / Units.knotsToMetresPerSecond(1)));
        CodedAscent coded = new CodedAscent(CODED);
        files.put("sounding/" + CODED_FILE.formatted("TTAA"), coded.partA());
        files.put("sounding/" + CODED_FILE.formatted("TTBB"), coded.partB(false));
        files.put("sounding/" + CODED_FILE.formatted("TTBB-corrected"), coded.partB(true));
        StringBuilder reports = new StringBuilder(REPORT_HEADER).append('\n');
        ScenarioReport.ALL.forEach(report -> reports.append(reportRow(report)).append('\n'));
        files.put("airreport/reports.csv", reports.toString());
        return files;
    }

    /** @param factor what each speed in m s⁻¹ is multiplied by: 1 for an honest file */
    private static String soundingCsv(ScenarioAscent ascent, String unit, double factor) {
        ScenarioColumn column = ScenarioColumn.measured(ascent);
        StringBuilder text = new StringBuilder(140_000);
        text.append("# DEMONSTRATION DATA, invented: no such station, no such ascent\n");
        text.append("# station_id=").append(ascent.station().ident).append('\n');
        text.append("# latitude_deg=").append(decimal(ascent.station().latitude, 4)).append('\n');
        text.append("# longitude_deg=").append(decimal(ascent.station().longitude, 4)).append('\n');
        text.append("# station_elevation_m=").append(decimal(ScenarioAscent.Site.ELEVATION, 0)).append('\n');
        text.append("# nominal_time=").append(ascent.nominalAt()).append('\n');
        text.append("# launch_time=").append(ascent.launchedAt()).append('\n');
        text.append("time_s,pressure_hPa,geopotential_height_m,temperature_C,dewpoint_C,wind_direction_deg,wind_speed_").append(unit)
                .append(",latitude_deg,longitude_deg\n");
        for (int k = 0; k < column.height.length; k++) {
            double u = column.eastward[k];
            double v = column.northward[k];
            boolean wind = !Double.isNaN(u);
            text.append(decimal(column.elapsed[k], 0)).append(',')
                    .append(decimal(column.pressure[k] / 100, 3)).append(',')
                    .append(decimal(column.height[k], 0)).append(',')
                    .append(decimal(Units.kelvinToCelsius(column.temperature[k]), 2)).append(',')
                    .append(decimal(Units.kelvinToCelsius(column.dewPoint[k]), 2)).append(',')
                    .append(wind ? decimal(Units.fromDirection(u, v), 1) : "").append(',')
                    .append(wind ? decimal(factor * Math.hypot(u, v), 2) : "").append(',')
                    .append(decimal(column.latitude[k], 4)).append(',')
                    .append(decimal(column.longitude[k], 4)).append('\n');
        }
        return text.toString();
    }

    static String reportRow(ScenarioReport report) {
        return String.join(",", report.id(), report.reportClass(), report.automatic() ? "yes" : "no",
                report.observedAt().toString(), report.receivedAt().toString(),
                decimal(report.latitude(), 4), decimal(report.longitude(), 4), Integer.toString(report.flightLevel()),
                report.weightClass(), report.aircraft(), report.intensity(),
                Double.isNaN(report.edrPeak()) ? "" : decimal(report.edrPeak(), 2), report.cloud(),
                report.remark().isEmpty() ? "" : '"' + report.remark() + '"');
    }

    private static String decimal(double number, int places) {
        String text = String.format(Locale.ROOT, "%." + places + "f", number);
        // A value that rounds to nothing has no sign.
        return text.matches("-0\\.?0*") ? text.substring(1) : text;
    }
}
