package org.shearbook.met.decode;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.SoundingColumn.Quantity;

/**
 * One table with a sounding while it is read: header, metadata, rows, in the order of the methods. What the rows
 * mean and whether that can be is left to {@link CsvSoundingLevels}. Use once.
 */
final class CsvSoundingTable {

    private static final double HIGHEST_ELEVATION = 9_000;

    private final MessageText text;
    private final RemarkList remarks = new RemarkList();
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
    record Row(int line, double[] values, int[] places, String levelType) {
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
        return sounding(new CsvSoundingLevels(columns, position, rows, remarks).read());
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
            if (!cell.isEmpty() && !CsvCell.isMissing(cell) && !Double.isNaN(CsvCell.number(cell, separator))) {
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
            if (columns.get(i).quantity() == Quantity.TIME && columns.get(i).unit() == null && CsvCell.moment(cells.get(i).text()) != null) {
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
            } else if (!CsvCell.isMissing(cell.text())) {
                values[i] = quantity == Quantity.TIME && timesAreMoments ? secondsSinceRelease(cell.text()) : CsvCell.number(cell.text(), separator);
                if (Double.isNaN(values[i])) {
                    remarks.add(line, cell.column(), "VALUE_UNREADABLE", "'" + CsvCell.shortened(cell.text()) + "' is not a value of " + quantity.words + "; it counts as missing.");
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
        Instant moment = CsvCell.moment(cell);
        if (moment == null) {
            return Double.NaN;
        }
        if (firstMoment == null) {
            firstMoment = moment;
        }
        Instant release = CsvCell.moment(metadata.getOrDefault("launch_time", ""));
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
        return new DecodedSounding(stationId, numberOf("latitude_deg", 90), numberOf("longitude_deg", 180), numberOf("station_elevation_m", HIGHEST_ELEVATION),
                nominalAt, launchedAt, Set.of(), metadata.getOrDefault("correction", ""), metadata.getOrDefault("sonde_type", ""),
                levels, text.text(), 1, remarks.toList(1));
    }

    private @Nullable Instant momentOf(String key) {
        String value = metadata.getOrDefault(key, "");
        Instant moment = CsvCell.moment(value);
        if (moment == null && !value.isEmpty()) {
            remarks.add(metadataLines.get(key), 0, "METADATA_UNREADABLE", "'" + CsvCell.shortened(value) + "' is not a time as 2031-03-12T12:00:00Z; " + key + " counts as missing.");
        }
        return moment;
    }

    private double numberOf(String key, double limit) {
        String value = metadata.getOrDefault(key, "");
        double number = CsvCell.isMissing(value) ? Double.NaN : CsvCell.number(value, separator);
        if (!CsvCell.isMissing(value) && !(Math.abs(number) <= limit)) {
            remarks.add(metadataLines.get(key), 0, "METADATA_UNREADABLE", "'" + CsvCell.shortened(value) + "' is not a value of " + key + "; it counts as missing.");
            return Double.NaN;
        }
        return number;
    }

}
