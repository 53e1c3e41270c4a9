package org.shearbook.desk.demonstration;

import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.TreeSet;
import org.shearbook.met.profile.Units;

/**
 * An ascent of the scenario as coded text, FM 35 TEMP parts A and B (WMO-No. 306, Vol. I.1): standard levels,
 * tropopause and greatest wind, and the significant levels from which everything between can be interpolated to
 * within 1 K and 5 m s⁻¹ (common practice, no source at hand for the figures). Winds in knots, so that 50 is added to
 * the day.
 */
final class CodedAscent {

    private static final int[] STANDARD = {1000, 925, 850, 700, 500, 400, 300, 250, 200, 150, 100};
    private static final double TEMPERATURE_TOLERANCE = 1;
    private static final double WIND_TOLERANCE = 5;
    private static final double LEAST_PRESSURE = 10_000;

    private final ScenarioAscent ascent;
    private final ScenarioColumn column;
    private final int levels;

    CodedAscent(ScenarioAscent ascent) {
        this.ascent = ascent;
        this.column = ScenarioColumn.measured(ascent);
        int count = 0;
        while (count < column.pressure.length && column.pressure[count] >= LEAST_PRESSURE) {
            count++;
        }
        this.levels = count;
    }

    String partA() {
        List<String> groups = new ArrayList<>();
        int top = STANDARD[0];
        for (int standard : STANDARD) {
            if (standard * 100 >= column.pressure[levels - 1]) {
                top = standard;
            }
        }
        groups.add("99" + pressureCode(column.pressure[0]));
        groups.add(temperatureCode(0));
        groups.add(windCode(0));
        for (int standard : STANDARD) {
            if (standard >= top) {
                int level = nearest(standard * 100.0);
                groups.add("%02d%s".formatted(standard / 10 % 100, heightCode(standard, column.height[level])));
                groups.add(temperatureCode(level));
                groups.add(windCode(level));
            }
        }
        int tropopause = nearestHeight(ascent.tropopauseHeight());
        groups.add("88" + pressureCode(column.pressure[tropopause]));
        groups.add(temperatureCode(tropopause));
        groups.add(windCode(tropopause));
        int jet = strongestWind();
        groups.add("77" + pressureCode(column.pressure[jet]));
        groups.add(windCode(jet));
        groups.add("31313");
        groups.add("48308");
        ZonedDateTime launch = ascent.launchedAt().atZone(ZoneOffset.UTC);
        groups.add("8%02d%02d".formatted(launch.getHour(), launch.getMinute()));
        return bulletin("USXV01", "", "TTAA", Integer.toString(top / 100), groups);
    }

    /** @param corrected whether this is the second delivery, whose third wind level was wrong by 5 kt in the first */
    String partB(boolean corrected) {
        List<String> groups = new ArrayList<>();
        int index = 0;
        for (int level : significantTemperatures()) {
            groups.add("%d%d%s".formatted(mark(index), mark(index), pressureCode(column.pressure[level])));
            groups.add(temperatureCode(level));
            index++;
        }
        groups.add("21212");
        index = 0;
        for (int level : significantWinds()) {
            groups.add("%d%d%s".formatted(mark(index), mark(index), pressureCode(column.pressure[level])));
            groups.add(!corrected && index == 2 ? windCode(level, 5) : windCode(level));
            index++;
        }
        return bulletin("UKXV01", corrected ? " CCA" : "", "TTBB", "/", groups);
    }

    /** 0 for the ground, then 1 to 9 over and over. */
    private static int mark(int index) {
        return index == 0 ? 0 : (index - 1) % 9 + 1;
    }

    private String bulletin(String heading, String correction, String part, String last, List<String> groups) {
        ZonedDateTime nominal = ascent.nominalAt().atZone(ZoneOffset.UTC);
        StringBuilder text = new StringBuilder("%s XVEN %02d%02d00%s\r\r\n".formatted(heading, nominal.getDayOfMonth(), nominal.getHour(), correction));
        text.append("%s %02d%02d%s %s".formatted(part, nominal.getDayOfMonth() + 50, nominal.getHour(), last, ascent.station().blockNumber));
        int onLine = 3;
        for (String group : groups) {
            text.append(onLine == 10 ? "\r\r\n" : " ").append(group);
            onLine = onLine == 10 ? 1 : onLine + 1;
        }
        return text.append("=\r\r\nNNNN\r\r\n").toString();
    }

    private TreeSet<Integer> significantTemperatures() {
        return significant((from, to) -> {
            double worst = 0;
            int at = -1;
            for (int k = from + 1; k < to; k++) {
                double share = logShare(from, to, k);
                double between = column.temperature[from] + share * (column.temperature[to] - column.temperature[from]);
                double error = Math.abs(column.temperature[k] - between) / TEMPERATURE_TOLERANCE;
                if (error > worst) {
                    worst = error;
                    at = k;
                }
            }
            return worst > 1 ? at : -1;
        });
    }

    private TreeSet<Integer> significantWinds() {
        return significant((from, to) -> {
            double worst = 0;
            int at = -1;
            for (int k = from + 1; k < to; k++) {
                double share = logShare(from, to, k);
                double east = column.eastward[from] + share * (column.eastward[to] - column.eastward[from]);
                double north = column.northward[from] + share * (column.northward[to] - column.northward[from]);
                double error = Math.hypot(column.eastward[k] - east, column.northward[k] - north) / WIND_TOLERANCE;
                if (error > worst) {
                    worst = error;
                    at = k;
                }
            }
            return worst > 1 ? at : -1;
        });
    }

    /** Adds the worst level between two kept ones until none is beyond the tolerance. */
    private TreeSet<Integer> significant(WorstBetween worstBetween) {
        TreeSet<Integer> kept = new TreeSet<>(List.of(0, levels - 1));
        boolean added = true;
        while (added) {
            added = false;
            for (int from : List.copyOf(kept)) {
                Integer to = kept.higher(from);
                int worst = to == null ? -1 : worstBetween.find(from, to);
                if (worst >= 0) {
                    added |= kept.add(worst);
                }
            }
        }
        return kept;
    }

    private interface WorstBetween {
        int find(int from, int to);
    }

    private double logShare(int from, int to, int k) {
        return Math.log(column.pressure[k] / column.pressure[from]) / Math.log(column.pressure[to] / column.pressure[from]);
    }

    private int nearest(double pressure) {
        int best = 0;
        for (int k = 1; k < levels; k++) {
            if (Math.abs(column.pressure[k] - pressure) < Math.abs(column.pressure[best] - pressure)) {
                best = k;
            }
        }
        return best;
    }

    private int nearestHeight(double height) {
        return (int) Math.round((height - column.height[0]) / ScenarioColumn.STEP);
    }

    private int strongestWind() {
        int best = 0;
        for (int k = 0; k < levels; k++) {
            if (Math.hypot(column.eastward[k], column.northward[k]) > Math.hypot(column.eastward[best], column.northward[best])) {
                best = k;
            }
        }
        return best;
    }

    private static String pressureCode(double pressure) {
        return "%03d".formatted(Math.round(pressure / 100) % 1000);
    }

    /** Whole metres below 500 hPa, tens of metres from there on, without the thousands; 500 is added below sea level. */
    private static String heightCode(int standard, double height) {
        long code = standard > 500 ? Math.round(height) : Math.round(height / 10);
        return "%03d".formatted(code < 0 ? 500 - code : code % 1000);
    }

    /** Degrees with tenths that also carry the sign (code 3931), then the dew-point depression (code 0777). */
    private String temperatureCode(int level) {
        double celsius = Units.kelvinToCelsius(column.temperature[level]);
        long tenths = Math.round(Math.abs(celsius) * 10);
        long coded = celsius < 0 ? tenths % 2 == 0 ? tenths + 1 : tenths : tenths % 2 == 0 ? tenths : tenths - 1;
        double depression = column.temperature[level] - column.dewPoint[level];
        long depressionCode = depression <= 5 ? Math.round(depression * 10) : Math.min(99, Math.max(56, Math.round(depression) + 50));
        return String.format(Locale.ROOT, "%03d%02d", coded, depressionCode);
    }

    private String windCode(int level) {
        return windCode(level, 0);
    }

    /** Direction to 5°, whose odd five goes into the hundreds of the speed. */
    private String windCode(int level, int tooMuch) {
        double from = Units.fromDirection(column.eastward[level], column.northward[level]);
        long knots = Math.round(Units.metresPerSecondToKnots(Math.hypot(column.eastward[level], column.northward[level]))) + tooMuch;
        long fives = Math.round(from / 5) % 72;
        return "%02d%03d".formatted(fives / 2 == 0 && fives % 2 == 0 ? 36 : fives / 2, fives % 2 * 500 + knots);
    }
}
