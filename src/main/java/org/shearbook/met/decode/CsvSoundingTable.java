package org.shearbook.met.decode;

import java.time.DateTimeException;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.decode.SoundingColumn.Quantity;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.Units;

/**
 * One table with a sounding while it is read: header, metadata, rows, checks, in the order of the methods. Use once.
 */
final class CsvSoundingTable {

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

    private record Offence(int line, int column, String code, String text) {
    }

    private final MessageText text;
    private final RemarkList remarks = new RemarkList();
    private final List<Offence> offences = new ArrayList<>();
    private final Map<String, String> metadata = new HashMap<>();
    private final Map<String, Integer> metadataLines = new HashMap<>();
    private final Map<Quantity, Integer> position = new EnumMap<>(Quantity.class);
    private final List<Row> rows = new ArrayList<>();
    private List<SoundingColumn> columns = List.of();
    private char separator;
    private int headerLine;
    private boolean timesAreMoments;
    private @Nullable Instant firstMoment;

    /** One row; {@code values} as written, in the unit of the column. */
    private record Row(int line, double[] values, int[] places, String levelType) {
    }

    CsvSoundingTable(MessageText text) {
        this.text = text;
    }

    DecodedSounding read() throws Unreadable {
        int header = CsvSoundingDecoder.headerIndex(text);
        if (header < 0) {
            throw new Unreadable(1, 0, "HEADER_MISSING", "There is no header row. Begin the table with a row of column names that carry their units, for example pressure_hPa,geopotential_height_m,temperature_C,wind_direction_deg,wind_speed_kt.");
        }
        int firstRow = readHeader(header);
        readMetadata();
        readRows(firstRow);
        if (rows.isEmpty()) {
            throw new Unreadable(headerLine, 0, "NO_LEVELS", "Below the header there is no row with values. Send the whole file.");
        }
        resolveDoubtfulMarks();
        List<ReportedLevel> levels = levels();
        refuseIfOffended();
        return sounding(levels);
    }

    private int readHeader(int index) throws Unreadable {
        MessageText.Line line = text.lines().get(index);
        headerLine = line.number();
        String header = text.text(line);
        separator = DelimitedLine.separatorOf(header);
        columns = new ArrayList<>(SoundingColumn.of(DelimitedLine.split(header, separator)));
        int firstRow = index + 1;
        int next = nextRow(firstRow);
        if (next >= 0) {
            List<DelimitedLine.Cell> cells = DelimitedLine.split(text.text(text.lines().get(next)), separator);
            if (isUnitsRow(cells)) {
                takeUnits(cells);
                firstRow = next + 1;
            } else {
                timesAreMoments = timesAreMoments(cells);
            }
        }
        settleColumns();
        return firstRow;
    }

    private int nextRow(int from) {
        for (int i = from; i < text.lines().size(); i++) {
            String line = text.text(text.lines().get(i)).strip();
            if (!line.isEmpty() && line.charAt(0) != '#') {
                return i;
            }
        }
        return -1;
    }

    /** A row of units has no number and at least one unit that fits the column above it. */
    private boolean isUnitsRow(List<DelimitedLine.Cell> cells) {
        boolean fits = false;
        for (int i = 0; i < cells.size(); i++) {
            String cell = cells.get(i).text();
            if (!cell.isEmpty() && !isMissing(cell) && !Double.isNaN(number(cell, separator))) {
                return false;
            }
            Quantity quantity = i < columns.size() ? columns.get(i).quantity() : null;
            fits |= quantity != null && quantity.unit(cell) != null;
        }
        return fits;
    }

    private void takeUnits(List<DelimitedLine.Cell> cells) {
        for (int i = 0; i < Math.min(cells.size(), columns.size()); i++) {
            SoundingColumn column = columns.get(i);
            if (column.quantity() != null && column.unit() == null) {
                columns.set(i, column.withUnit(column.quantity().unit(cells.get(i).text())));
            }
        }
    }

    private boolean timesAreMoments(List<DelimitedLine.Cell> cells) {
        for (int i = 0; i < Math.min(cells.size(), columns.size()); i++) {
            if (columns.get(i).quantity() == Quantity.TIME && columns.get(i).unit() == null && moment(cells.get(i).text()) != null) {
                return true;
            }
        }
        return false;
    }

    private void settleColumns() throws Unreadable {
        List<SoundingColumn> withoutUnit = new ArrayList<>();
        for (int i = 0; i < columns.size(); i++) {
            SoundingColumn column = columns.get(i);
            Quantity quantity = column.quantity();
            if (quantity == null) {
                if (!column.name().isEmpty()) {
                    remarks.add(headerLine, column.column(), "COLUMN_IGNORED", "Column '" + column.name() + "' is none this desk reads; it stays in the raw text.");
                }
            } else if (!column.unknownUnit().isEmpty()) {
                throw new Unreadable(headerLine, column.column(), "UNIT_UNKNOWN", "'" + column.unknownUnit() + "' is not a unit of " + quantity.words
                        + " that this desk knows. Convert the column and write " + quantity.header + ".");
            } else if (position.containsKey(quantity)) {
                remarks.add(headerLine, column.column(), "COLUMN_TWICE", "There are two columns with " + quantity.words + "; '"
                        + columns.get(position.get(quantity)).name() + "' was read, '" + column.name() + "' was not.");
                columns.set(i, column.ignored());
            } else {
                position.put(quantity, i);
                if (column.unit() == null) {
                    ColumnUnit unit = quantity == Quantity.TIME && timesAreMoments ? ColumnUnit.ONE : quantity.unitWithoutSaying();
                    columns.set(i, column.withUnit(unit));
                    if (unit == null) {
                        withoutUnit.add(column);
                    }
                }
            }
        }
        if (!withoutUnit.isEmpty()) {
            throw unitsMissing(withoutUnit);
        }
        if (position.keySet().stream().noneMatch(Quantity::isVertical)) {
            throw new Unreadable(headerLine, 0, "NO_VERTICAL_COORDINATE", "No column gives pressure or height. Add pressure_hPa or geopotential_height_m.");
        }
    }

    private Unreadable unitsMissing(List<SoundingColumn> withoutUnit) {
        StringBuilder message = new StringBuilder("The unit is not stated, and this desk does not guess it:");
        for (SoundingColumn column : withoutUnit) {
            message.append(" column '").append(column.name()).append("', write ").append(column.quantity().header).append(';');
        }
        message.setCharAt(message.length() - 1, '.');
        message.append(" Rename the columns, or put a row of units below the header.");
        return new Unreadable(headerLine, withoutUnit.get(0).column(), "UNITS_MISSING", message.toString());
    }

    private void readMetadata() {
        for (MessageText.Line line : text.lines()) {
            String comment = text.text(line).strip();
            if (!comment.startsWith("#")) {
                continue;
            }
            comment = comment.substring(1);
            int equals = comment.indexOf('=');
            if (equals > 0) {
                String key = comment.substring(0, equals).strip().toLowerCase(Locale.ROOT);
                if (metadata.putIfAbsent(key, trimmedOfSeparators(comment.substring(equals + 1))) == null) {
                    metadataLines.put(key, line.number());
                }
            }
        }
    }

    /** A table program writes a comment line with a separator for every column of the table. */
    private String trimmedOfSeparators(String value) {
        int end = value.length();
        while (end > 0 && (value.charAt(end - 1) == separator || value.charAt(end - 1) <= ' ')) {
            end--;
        }
        return value.substring(0, end).strip();
    }

    private void readRows(int from) throws Unreadable {
        for (int i = from; i < text.lines().size(); i++) {
            MessageText.Line line = text.lines().get(i);
            String row = text.text(line);
            if (row.isBlank() || row.strip().startsWith("#")) {
                continue;
            }
            readRow(DelimitedLine.split(row, separator), line.number());
        }
    }

    private void readRow(List<DelimitedLine.Cell> cells, int line) throws Unreadable {
        for (int i = columns.size(); i < cells.size(); i++) {
            if (!cells.get(i).text().isEmpty()) {
                throw new Unreadable(line, cells.get(i).column(), "ROW_TOO_LONG", "The row has " + cells.size() + " cells, the header " + columns.size()
                        + ". If commas stand for decimal points, separate the columns with semicolons; if not, remove what is too much.");
            }
        }
        if (cells.size() < columns.size()) {
            remarks.add(line, 0, "ROW_TOO_SHORT", "The row has " + cells.size() + " cells, the header " + columns.size() + "; the rest counts as missing.");
        }
        double[] values = new double[columns.size()];
        int[] places = new int[columns.size()];
        String levelType = "";
        boolean anything = false;
        for (int i = 0; i < columns.size(); i++) {
            values[i] = Double.NaN;
            Quantity quantity = columns.get(i).quantity();
            if (i >= cells.size() || quantity == null) {
                continue;
            }
            DelimitedLine.Cell cell = cells.get(i);
            places[i] = cell.column();
            if (quantity == Quantity.LEVEL_TYPE) {
                levelType = cell.text();
            } else if (!isMissing(cell.text())) {
                values[i] = quantity == Quantity.TIME && timesAreMoments ? secondsSinceRelease(cell.text()) : number(cell.text(), separator);
                if (Double.isNaN(values[i])) {
                    remarks.add(line, cell.column(), "VALUE_UNREADABLE", "'" + shortened(cell.text()) + "' is not a value of " + quantity.words + "; it counts as missing.");
                }
            }
            anything |= !Double.isNaN(values[i]);
        }
        if (anything) {
            rows.add(new Row(line, values, places, levelType));
        } else {
            remarks.add(line, 0, "ROW_EMPTY", "The row has no value at all and was left out.");
        }
    }

    private double secondsSinceRelease(String cell) {
        Instant moment = moment(cell);
        if (moment == null) {
            return Double.NaN;
        }
        if (firstMoment == null) {
            firstMoment = moment;
        }
        Instant release = moment(metadata.getOrDefault("launch_time", ""));
        return Duration.between(release == null ? firstMoment : release, moment).toMillis() / 1000.0;
    }

    /** 9999 and 99999 in a column where they are ordinary values too: missing unless between their neighbours. */
    private void resolveDoubtfulMarks() {
        for (Map.Entry<Quantity, Integer> entry : position.entrySet()) {
            if (entry.getKey() == Quantity.LEVEL_TYPE || entry.getKey() == Quantity.TIME && timesAreMoments) {
                continue;
            }
            int column = entry.getValue();
            boolean ordinaryToo = entry.getKey() == Quantity.TIME || entry.getKey().isVertical();
            double[] above = new double[rows.size()];
            double next = Double.NaN;
            for (int i = rows.size() - 1; i >= 0; i--) {
                above[i] = next;
                double value = rows.get(i).values()[column];
                if (!Double.isNaN(value) && !isMark(value)) {
                    next = value;
                }
            }
            double below = Double.NaN;
            for (int i = 0; i < rows.size(); i++) {
                double value = rows.get(i).values()[column];
                if (!isMark(value)) {
                    below = Double.isNaN(value) ? below : value;
                } else if (!ordinaryToo || !((below < value && value < above[i]) || (below > value && value > above[i]))) {
                    rows.get(i).values()[column] = Double.NaN;
                }
            }
        }
    }

    private static boolean isMark(double value) {
        return value == 9999 || value == 99999;
    }

    private List<ReportedLevel> levels() {
        List<ReportedLevel> levels = new ArrayList<>(rows.size());
        Map<List<Double>, Integer> places = new HashMap<>();
        double lastPressure = Double.NaN;
        int rises = 0;
        for (Row row : rows) {
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
                Integer before = places.putIfAbsent(List.of(level.pressure(), level.height(), level.elapsed()), levels.size());
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
        return levels;
    }

    private ReportedLevel level(Row row) {
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

    private double[] wind(Row row) {
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

    private double dewPoint(Row row, double temperature) {
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

    private Set<Significance> significance(Row row) {
        Set<Significance> significance = EnumSet.noneOf(Significance.class);
        String rest = row.levelType().toLowerCase(Locale.ROOT);
        for (String word : rest.split("[|+; ]")) {
            Significance one = LEVEL_TYPES.get(word);
            if (one != null) {
                significance.add(one);
            } else if (!word.isEmpty() && !isMissing(word)) {
                remarks.add(row.line(), place(row, Quantity.LEVEL_TYPE), "LEVEL_TYPE_UNKNOWN", "Level type '" + shortened(word) + "' is not one of "
                        + String.join(", ", LEVEL_TYPES.keySet().stream().sorted().toList()) + "; the level was kept without it.");
            }
        }
        return significance;
    }

    private double within(Row row, Quantity quantity, double limit) {
        double degrees = si(row, quantity);
        if (Math.abs(degrees) > limit) {
            remarks.add(row.line(), place(row, quantity), "POSITION_OUT_OF_RANGE", "A " + quantity.words + " of " + plain(degrees) + "° does not exist; it counts as missing.");
            return Double.NaN;
        }
        return degrees > 180 ? degrees - 360 : degrees;
    }

    private double si(Row row, Quantity quantity) {
        Integer column = position.get(quantity);
        return column == null ? Double.NaN : columns.get(column).unit().toSi(row.values()[column]);
    }

    private int place(Row row, Quantity quantity) {
        Integer column = position.get(quantity);
        return column == null ? 0 : row.places()[column];
    }

    private void offend(Row row, Quantity quantity, String code, String message) {
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

    private DecodedSounding sounding(List<ReportedLevel> levels) {
        String stationId = metadata.getOrDefault("station_id", "");
        if (stationId.isEmpty()) {
            remarks.add(headerLine, 0, "STATION_MISSING", "The file does not say which station this is. Add a line '# station_id=…', or choose the station when you send it.");
        }
        Instant nominalAt = momentOf("nominal_time");
        Instant launchedAt = momentOf("launch_time");
        if (launchedAt == null && firstMoment != null) {
            launchedAt = firstMoment;
            remarks.add(rows.get(0).line(), 0, "LAUNCH_TIME_FROM_FIRST_ROW", "The time of the first row was taken as the time of release.");
        }
        if (nominalAt == null && launchedAt == null) {
            remarks.add(headerLine, 0, "TIME_MISSING", "The file does not say when the ascent was made. Add a line '# nominal_time=2031-03-12T12:00:00Z' or '# launch_time=…'.");
        }
        return new DecodedSounding(stationId, numberOf("latitude_deg", 90), numberOf("longitude_deg", 180), numberOf("station_elevation_m", HIGHEST_HEIGHT),
                nominalAt, launchedAt, Set.of(), metadata.getOrDefault("correction", ""), metadata.getOrDefault("sonde_type", ""),
                levels, text.text(), 1, remarks.toList(1));
    }

    private @Nullable Instant momentOf(String key) {
        String value = metadata.getOrDefault(key, "");
        Instant moment = moment(value);
        if (moment == null && !value.isEmpty()) {
            remarks.add(metadataLines.get(key), 0, "METADATA_UNREADABLE", "'" + shortened(value) + "' is not a time as 2031-03-12T12:00:00Z; " + key + " counts as missing.");
        }
        return moment;
    }

    private double numberOf(String key, double limit) {
        String value = metadata.getOrDefault(key, "");
        double number = isMissing(value) ? Double.NaN : number(value, separator);
        if (!isMissing(value) && !(Math.abs(number) <= limit)) {
            remarks.add(metadataLines.get(key), 0, "METADATA_UNREADABLE", "'" + shortened(value) + "' is not a value of " + key + "; it counts as missing.");
            return Double.NaN;
        }
        return number;
    }

    /** Whether two rows of the same place say different things; what only one of them says is no contradiction. */
    private static boolean contradict(ReportedLevel a, ReportedLevel b) {
        return differ(a.temperature(), b.temperature()) || differ(a.dewPoint(), b.dewPoint())
                || differ(a.windFromDirection(), b.windFromDirection()) || differ(a.windSpeed(), b.windSpeed());
    }

    private static boolean differ(double a, double b) {
        return !Double.isNaN(a) && !Double.isNaN(b) && a != b;
    }

    private static boolean isMissing(String cell) {
        return cell.isEmpty() || cell.equals("/////") || cell.equals("//") || cell.equals("///") || cell.equalsIgnoreCase("M")
                || cell.equalsIgnoreCase("NaN") || isNegativeMark(cell);
    }

    private static boolean isNegativeMark(String cell) {
        return cell.startsWith("-9") && (cell.equals("-999") || cell.equals("-9999") || cell.equals("-99999")
                || cell.equals("-999.0") || cell.equals("-9999.0") || cell.equals("-999,0") || cell.equals("-9999,0")
                || cell.equals("-999.00") || cell.equals("-9999.00"));
    }

    /** A plain decimal number; {@code NaN} for anything else. A comma is a decimal comma where it can't be a separator. */
    private static double number(String cell, char separator) {
        if (cell.isEmpty() || cell.length() > 32) {
            return Double.NaN;
        }
        StringBuilder digits = new StringBuilder(cell.length());
        for (int i = 0; i < cell.length(); i++) {
            char c = cell.charAt(i);
            if (c == '−') {
                c = '-';
            } else if (c == ',' && separator != ',') {
                c = '.';
            }
            if (!(c >= '0' && c <= '9' || c == '-' || c == '+' || c == '.' || c == 'e' || c == 'E')) {
                return Double.NaN;
            }
            digits.append(c);
        }
        try {
            double number = Double.parseDouble(digits.toString());
            return Double.isInfinite(number) ? Double.NaN : number;
        } catch (NumberFormatException notANumber) {
            return Double.NaN;
        }
    }

    /** A moment in ISO 8601; without an offset it is UTC. */
    private static @Nullable Instant moment(String cell) {
        if (cell.length() < 16 || cell.length() > 40 || cell.charAt(10) != 'T' && cell.charAt(10) != ' ') {
            return null;
        }
        String text = cell.replace(' ', 'T');
        boolean hasOffset = text.endsWith("Z") || text.indexOf('+', 16) > 0 || text.indexOf('-', 16) > 0;
        try {
            return hasOffset ? OffsetDateTime.parse(text).toInstant() : LocalDateTime.parse(text).toInstant(ZoneOffset.UTC);
        } catch (DateTimeException notATime) {
            return null;
        }
    }

    private static String shortened(String text) {
        return text.length() <= 24 ? text : text.substring(0, 24) + "…";
    }

    private static String plain(double value) {
        return String.format(Locale.ROOT, "%.1f", value);
    }
}
