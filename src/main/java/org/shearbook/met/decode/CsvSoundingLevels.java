package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.decode.SoundingColumn.Quantity;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.Units;

/**
 * Rows of a sounding table as levels in SI units. A value that can't be refuses the table, because it says that a
 * column is not what its header declares; a doubtful one is remarked. Use once.
 */
final class CsvSoundingLevels {

    private static final double HIGHEST_SPEED = 150;
    private static final double LOWEST_TEMPERATURE = Units.celsiusToKelvin(-120);
    private static final double HIGHEST_TEMPERATURE = Units.celsiusToKelvin(60);
    private static final double HIGHEST_PRESSURE = 110_000;
    private static final double LOWEST_HEIGHT = -1_000;
    private static final double HIGHEST_HEIGHT = 100_000;
    private static final double HIGHEST_RELATIVE_HUMIDITY = 1.2;
    /** Radius of the sphere that the standard atmosphere uses between geometric and geopotential height [m]. */
    private static final double EARTH_RADIUS = 6_356_766;

    private static final int OFFENCES_SHOWN = 6;

    private static final Map<String, Significance> LEVEL_TYPES = Map.ofEntries(
            Map.entry("surface", Significance.SURFACE), Map.entry("standard", Significance.STANDARD),
            Map.entry("tropopause", Significance.TROPOPAUSE),
            Map.entry("max_wind", Significance.MAXIMUM_WIND), Map.entry("maximum_wind", Significance.MAXIMUM_WIND),
            Map.entry("significant_temperature", Significance.SIGNIFICANT_TEMPERATURE),
            Map.entry("significant_humidity", Significance.SIGNIFICANT_HUMIDITY),
            Map.entry("significant_wind", Significance.SIGNIFICANT_WIND),
            Map.entry("below_ground", Significance.BELOW_GROUND),
            Map.entry("temperature_missing_boundary", Significance.TEMPERATURE_MISSING_BOUNDARY),
            Map.entry("wind_missing_boundary", Significance.WIND_MISSING_BOUNDARY));

    private final List<SoundingColumn> columns;
    private final Map<Quantity, Integer> position;
    private final List<CsvSoundingTable.Row> rows;
    private final RemarkList remarks;
    private final List<Offence> offences = new ArrayList<>();

    /** A place that refuses the table. */
    private record Offence(int line, int column, String code, String text) {
    }

    /** Where a level stands: two rows with the same place are one level. */
    private record Place(double pressure, double height, double elapsed) {
    }

    /** @param position index of the column of each quantity the table has */
    CsvSoundingLevels(List<SoundingColumn> columns, Map<Quantity, Integer> position, List<CsvSoundingTable.Row> rows, RemarkList remarks) {
        this.columns = columns;
        this.position = position;
        this.rows = rows;
        this.remarks = remarks;
    }

    /** @throws Unreadable naming the first place that can't be, and how many more there are */
    List<ReportedLevel> read() throws Unreadable {
        List<ReportedLevel> levels = new ArrayList<>(rows.size());
        Map<Place, Integer> places = new HashMap<>();
        double lastPressure = Double.NaN;
        int rises = 0;
        for (CsvSoundingTable.Row row : rows) {
            ReportedLevel level = level(row);
            if (!Double.isNaN(level.pressure())) {
                rises = level.pressure() > lastPressure ? rises + 1 : 0;
                if (rises == 1) {
                    remarks.add(row.line(), place(row, Quantity.PRESSURE), "PRESSURE_RISES", "The pressure is higher than in the row before.");
                } else if (rises == 2) {
                    offend(row, Quantity.PRESSURE, "PRESSURE_RISES", "The pressure rises over more than one level. Sort the rows from the ground upwards; if this is a descent, reverse them.");
                }
                lastPressure = level.pressure();
            }
            if (Double.isNaN(level.pressure()) && Double.isNaN(level.height())) {
                remarks.add(row.line(), 0, "LEVEL_WITHOUT_HEIGHT", "The row has neither pressure nor height; it can't be placed.");
            } else {
                Integer before = places.putIfAbsent(new Place(level.pressure(), level.height(), level.elapsed()), levels.size());
                if (before != null && levels.get(before).equals(level)) {
                    remarks.add(row.line(), 0, "LEVEL_REPEATED", "The row repeats an earlier one and was left out.");
                    continue;
                }
                if (before != null && contradict(levels.get(before), level)) {
                    offend(row, position.containsKey(Quantity.PRESSURE) ? Quantity.PRESSURE : Quantity.HEIGHT, "LEVEL_TWICE",
                            "The same level stands twice with different values. Remove the wrong row.");
                }
            }
            levels.add(level);
        }
        refuseIfOffended();
        return levels;
    }

    private ReportedLevel level(CsvSoundingTable.Row row) {
        double pressure = si(row, Quantity.PRESSURE);
        if (pressure <= 0 || pressure > HIGHEST_PRESSURE) {
            offend(row, Quantity.PRESSURE, "PRESSURE_OUT_OF_RANGE", "A pressure of " + plain(pressure / 100) + " hPa does not occur. Look whether the unit in the header is right.");
        }
        double height = si(row, Quantity.HEIGHT);
        if (Double.isNaN(height)) {
            double geometric = si(row, Quantity.GEOMETRIC_HEIGHT);
            height = EARTH_RADIUS * geometric / (EARTH_RADIUS + geometric);
            if (!Double.isNaN(height)) {
                remarks.add(row.line(), place(row, Quantity.GEOMETRIC_HEIGHT), "GEOMETRIC_HEIGHT_CONVERTED", "The geometric height was converted to geopotential height.");
            }
        }
        if (height < LOWEST_HEIGHT || height > HIGHEST_HEIGHT) {
            offend(row, Quantity.HEIGHT, "HEIGHT_OUT_OF_RANGE", "A height of " + plain(height) + " m does not occur. Look whether the unit in the header is right.");
        }
        double temperature = si(row, Quantity.TEMPERATURE);
        if (temperature < LOWEST_TEMPERATURE || temperature > HIGHEST_TEMPERATURE) {
            offend(row, Quantity.TEMPERATURE, "TEMPERATURE_OUT_OF_RANGE", "A temperature of " + plain(Units.kelvinToCelsius(temperature))
                    + " °C is outside −120 to 60 °C. Look whether the unit in the header is right.");
        }
        double[] wind = wind(row);
        return new ReportedLevel(pressure, height, temperature, dewPoint(row, temperature), wind[0], wind[1], si(row, Quantity.TIME),
                within(row, Quantity.LATITUDE, 90), within(row, Quantity.LONGITUDE, 360), significance(row));
    }

    private double[] wind(CsvSoundingTable.Row row) {
        double direction = si(row, Quantity.WIND_DIRECTION);
        double speed = si(row, Quantity.WIND_SPEED);
        if (direction < 0 || direction > 360) {
            offend(row, Quantity.WIND_DIRECTION, "DIRECTION_OUT_OF_RANGE", "A wind direction of " + plain(direction) + "° does not exist; it must be 0 to 360.");
        }
        if (speed < 0) {
            offend(row, Quantity.WIND_SPEED, "SPEED_NEGATIVE", "A wind speed can't be negative.");
        }
        if (Double.isNaN(direction) || Double.isNaN(speed)) {
            double eastward = si(row, Quantity.EASTWARD);
            double northward = si(row, Quantity.NORTHWARD);
            if (!Double.isNaN(eastward) && !Double.isNaN(northward)) {
                direction = Units.fromDirection(eastward, northward);
                speed = Math.hypot(eastward, northward);
            }
        }
        if (speed > HIGHEST_SPEED) {
            offend(row, position.containsKey(Quantity.WIND_SPEED) ? Quantity.WIND_SPEED : Quantity.EASTWARD, "SPEED_OUT_OF_RANGE",
                    "A wind of " + plain(speed) + " m/s does not occur. If the numbers are knots, the header must say so: wind_speed_kt.");
        }
        return new double[] {direction, speed};
    }

    private double dewPoint(CsvSoundingTable.Row row, double temperature) {
        double dewPoint = si(row, Quantity.DEW_POINT);
        if (dewPoint <= 0 || dewPoint > HIGHEST_TEMPERATURE) {
            remarks.add(row.line(), place(row, Quantity.DEW_POINT), "DEW_POINT_OUT_OF_RANGE", "The dew point does not occur; it counts as missing.");
            dewPoint = Double.NaN;
        }
        if (Double.isNaN(dewPoint)) {
            dewPoint = temperature - si(row, Quantity.DEW_POINT_DEPRESSION);
        }
        double humidity = si(row, Quantity.RELATIVE_HUMIDITY);
        if (humidity < 0 || humidity > HIGHEST_RELATIVE_HUMIDITY) {
            remarks.add(row.line(), place(row, Quantity.RELATIVE_HUMIDITY), "HUMIDITY_OUT_OF_RANGE", "The relative humidity is outside 0 to 120 %; it counts as missing.");
            humidity = Double.NaN;
        }
        boolean known = humidity > 0 && temperature >= LOWEST_TEMPERATURE && temperature <= HIGHEST_TEMPERATURE;
        return Double.isNaN(dewPoint) && known ? MoistThermodynamics.dewPointFromRelativeHumidity(temperature, humidity) : dewPoint;
    }

    private Set<Significance> significance(CsvSoundingTable.Row row) {
        if (row.levelType().isEmpty()) {
            return Set.of();
        }
        Set<Significance> significance = EnumSet.noneOf(Significance.class);
        for (String word : row.levelType().toLowerCase(Locale.ROOT).split("[|+; ]")) {
            Significance one = LEVEL_TYPES.get(word);
            if (one != null) {
                significance.add(one);
            } else if (!word.isEmpty() && !CsvCell.isMissing(word)) {
                remarks.add(row.line(), place(row, Quantity.LEVEL_TYPE), "LEVEL_TYPE_UNKNOWN", "Level type '" + CsvCell.shortened(word) + "' is not one of "
                        + String.join(", ", LEVEL_TYPES.keySet().stream().sorted().toList()) + "; the level was kept without it.");
            }
        }
        return significance;
    }

    private double within(CsvSoundingTable.Row row, Quantity quantity, double limit) {
        double degrees = si(row, quantity);
        if (Math.abs(degrees) > limit) {
            remarks.add(row.line(), place(row, quantity), "POSITION_OUT_OF_RANGE", "A " + quantity.words + " of " + plain(degrees) + "° does not exist; it counts as missing.");
            return Double.NaN;
        }
        return degrees > 180 ? degrees - 360 : degrees;
    }

    private double si(CsvSoundingTable.Row row, Quantity quantity) {
        Integer column = position.get(quantity);
        return column == null ? Double.NaN : columns.get(column).unit().toSi(row.values()[column]);
    }

    private int place(CsvSoundingTable.Row row, Quantity quantity) {
        Integer column = position.get(quantity);
        return column == null ? 0 : row.places()[column];
    }

    private void offend(CsvSoundingTable.Row row, Quantity quantity, String code, String message) {
        offences.add(new Offence(row.line(), place(row, quantity), code, message));
    }

    private void refuseIfOffended() throws Unreadable {
        if (offences.isEmpty()) {
            return;
        }
        Offence first = offences.get(0);
        StringBuilder message = new StringBuilder(first.text());
        if (offences.size() > 1) {
            message.append(" The file has ").append(offences.size()).append(" such places, among them");
            for (Offence offence : offences.subList(1, Math.min(OFFENCES_SHOWN, offences.size()))) {
                message.append(" line ").append(offence.line()).append(" (").append(offence.code()).append("),");
            }
            message.setCharAt(message.length() - 1, '.');
        }
        throw new Unreadable(first.line(), first.column(), first.code(), message.toString());
    }

    /** Whether two rows of the same place say different things; what only one of them says is no contradiction. */
    private static boolean contradict(ReportedLevel a, ReportedLevel b) {
        return differ(a.temperature(), b.temperature()) || differ(a.dewPoint(), b.dewPoint())
                || differ(a.windFromDirection(), b.windFromDirection()) || differ(a.windSpeed(), b.windSpeed());
    }

    private static boolean differ(double a, double b) {
        return !Double.isNaN(a) && !Double.isNaN(b) && a != b;
    }

    private static String plain(double value) {
        return String.format(Locale.ROOT, "%.1f", value);
    }
}
