package org.shearbook.desk.station;

import java.io.IOException;
import java.io.StringReader;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.regex.Pattern;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.shearbook.met.profile.Units;

/**
 * Reads a list of stations or fixes. Three layouts are known by their header or shape:
 * <ul>
 * <li>the desk's own, {@code identifier,kind,name,latitude_deg,longitude_deg,elevation_m,magnetic_variation_east_deg},
 *     of which kind, name, elevation and variation may be absent; several identifiers of one station stand in one
 *     cell, with blanks between;
 * <li>the published open lists of navigation aids and aerodromes, {@code ident,type,name,latitude_deg,longitude_deg,
 *     elevation_ft,…}, with {@code magnetic_variation_deg} and, for the radials of a beacon, {@code slaved_variation_deg};
 * <li>the fixed-column station list of the Integrated Global Radiosonde Archive.
 * </ul>
 * A row that can't be right refuses the list and is named by its line. A row without any identifier, or a station
 * that moves and so has no position, is left out and counted.
 */
final class PlaceList {

    private static final int REFUSALS_SHOWN = 20;
    private static final int LONGEST_IDENTIFIER = 40;
    private static final int LONGEST_NAME = 200;
    private static final Pattern IDENTIFIER = Pattern.compile("[A-Z0-9][A-Z0-9./_-]*");
    private static final Pattern ARCHIVE_LINE = Pattern.compile("^[A-Z]{2}[A-Z0-9]\\w{8}\\s+-?\\d+\\.\\d+\\s+-?\\d+\\.\\d+\\s.*");
    /** Columns of the open aerodrome list that hold further identifiers of the same place. */
    private static final List<String> FURTHER_IDENTIFIERS = List.of("gps_code", "iata_code", "local_code", "icao_code");

    private final List<PlaceRow> rows = new ArrayList<>();
    private final List<ListRefused.LineRefusal> refusals = new ArrayList<>();
    private int leftOut;

    private PlaceList() {
    }

    /**
     * @throws ListRefused when a row can't be right, or there is no row at all
     */
    static PlaceList read(byte[] bytes) {
        PlaceList list = new PlaceList();
        String text = text(bytes);
        String firstLine = text.lines().filter(line -> !line.isBlank()).findFirst().orElse("");
        if (firstLine.isEmpty()) {
            list.refuse(1, "", "LIST_EMPTY", "The list is empty. Send a CSV file with a header row and one row per place.");
        } else if (ARCHIVE_LINE.matcher(firstLine).matches()) {
            list.readArchiveList(text);
        } else {
            list.readTable(text, firstLine);
        }
        if (list.rows.isEmpty() && list.refusals.isEmpty()) {
            list.refuse(1, "", "LIST_EMPTY", "The list has no row with an identifier and a position. Send the whole file.");
        }
        if (!list.refusals.isEmpty()) {
            throw new ListRefused(list.refusals);
        }
        return list;
    }

    List<PlaceRow> rows() {
        return rows;
    }

    /** How many rows had no identifier or no fixed position. */
    int leftOut() {
        return leftOut;
    }

    private void readTable(String text, String header) {
        char separator = header.indexOf('\t') >= 0 ? '\t' : header.indexOf(';') >= 0 && header.indexOf(',') < 0 ? ';' : ',';
        try (CSVParser table = CSVParser.parse(new StringReader(text),
                CSVFormat.DEFAULT.builder().setDelimiter(separator).setIgnoreEmptyLines(true).setTrim(true).get())) {
            Map<String, Integer> columns = null;
            for (CSVRecord record : table) {
                int line = (int) table.getCurrentLineNumber();
                if (columns == null) {
                    columns = columns(record);
                    if (!requireColumns(columns, line)) {
                        return;
                    }
                } else {
                    readRow(new Cells(columns, record, line));
                }
            }
        } catch (IOException | UncheckedIOException broken) {
            refuse(1, "", "NOT_A_TABLE", "The list can't be read as CSV: a quotation mark is opened and not closed, or the file is no text.");
        }
    }

    private static Map<String, Integer> columns(CSVRecord header) {
        Map<String, Integer> columns = new HashMap<>();
        for (int i = 0; i < header.size(); i++) {
            columns.putIfAbsent(header.get(i).toLowerCase(Locale.ROOT), i);
        }
        return columns;
    }

    private boolean requireColumns(Map<String, Integer> columns, int line) {
        boolean identified = columns.containsKey("identifier") || columns.containsKey("ident");
        if (identified && columns.containsKey("latitude_deg") && columns.containsKey("longitude_deg")) {
            return true;
        }
        refuse(line, "", "HEADER_NOT_KNOWN", "The header must name the columns identifier (or ident), latitude_deg and longitude_deg. "
                + "Complete: identifier,kind,name,latitude_deg,longitude_deg,elevation_m,magnetic_variation_east_deg.");
        return false;
    }

    private void readRow(Cells cells) {
        Set<String> identifiers = new LinkedHashSet<>();
        for (String identifier : cells.text("identifier", "ident").split("\\s+")) {
            addIdentifier(identifiers, identifier, cells.line);
        }
        for (String column : FURTHER_IDENTIFIERS) {
            addIdentifier(identifiers, cells.text(column), cells.line);
        }
        if (identifiers.isEmpty()) {
            leftOut++;
            return;
        }
        double latitude = cells.number("latitude_deg", -90, 90, true);
        double longitude = cells.number("longitude_deg", -180, 180, true);
        double metres = cells.number("elevation_m", -500, 9000, false);
        double feet = cells.number("elevation_ft", -1600, 29_500, false);
        double variation = Double.NaN;
        for (String column : List.of("magnetic_variation_east_deg", "slaved_variation_deg", "magnetic_variation_deg")) {
            if (Double.isNaN(variation)) {
                variation = cells.number(column, -180, 180, false);
            }
        }
        add(cells.line, identifiers, cells.text("kind", "type"), cells.text("name"), latitude, longitude,
                Double.isNaN(metres) ? feet * Units.FOOT : metres, variation);
    }

    private void readArchiveList(String text) {
        int number = 0;
        for (String line : (Iterable<String>) text.lines()::iterator) {
            number++;
            if (line.isBlank()) {
                continue;
            }
            if (!ARCHIVE_LINE.matcher(line).matches() || line.length() < 41) {
                refuse(number, "", "ARCHIVE_LINE", "The line does not have the columns of the archive's station list.");
                continue;
            }
            double latitude = Double.parseDouble(line.substring(12, 20).strip());
            double longitude = Double.parseDouble(line.substring(21, 30).strip());
            double elevation = Double.parseDouble(line.substring(31, 37).strip());
            if (Math.abs(latitude) > 90 || Math.abs(longitude) > 180) {
                leftOut++;
                continue;
            }
            String id = line.substring(0, 11);
            Set<String> identifiers = new LinkedHashSet<>();
            identifiers.add(id);
            if (id.charAt(2) == 'M') {
                identifiers.add(id.substring(6));
            }
            add(number, identifiers, "STATION", line.substring(41, Math.min(71, line.length())).strip(), latitude, longitude,
                    elevation < -900 ? Double.NaN : elevation, Double.NaN);
        }
    }

    private void add(int line, Set<String> identifiers, String kind, String name, double latitude, double longitude, double elevation, double variation) {
        if (Double.isNaN(latitude) || Double.isNaN(longitude)) {
            return;
        }
        String first = identifiers.iterator().next();
        String shownName = name.isEmpty() ? first : name;
        rows.add(new PlaceRow(line, List.copyOf(identifiers), kind.isEmpty() ? "FIX" : kind.toUpperCase(Locale.ROOT).substring(0, Math.min(40, kind.length())),
                shownName.substring(0, Math.min(LONGEST_NAME, shownName.length())), latitude, longitude, elevation, variation));
    }

    private void addIdentifier(Set<String> identifiers, String text, int line) {
        String identifier = text.strip().toUpperCase(Locale.ROOT);
        if (identifier.isEmpty()) {
            return;
        }
        if (identifier.length() > LONGEST_IDENTIFIER || !IDENTIFIER.matcher(identifier).matches()) {
            refuse(line, "identifier", "IDENTIFIER", "'" + shortened(identifier)
                    + "' can't be an identifier: letters, figures, hyphen, point, stroke, at most 40. Correct the row or take it out.");
            return;
        }
        identifiers.add(identifier);
    }

    private void refuse(int line, String column, String code, String text) {
        if (refusals.size() < REFUSALS_SHOWN) {
            refusals.add(new ListRefused.LineRefusal(line, column, code, text));
        }
    }

    private static String shortened(String text) {
        return text.length() <= 30 ? text : text.substring(0, 30) + "…";
    }

    private static String text(byte[] bytes) {
        String text;
        try {
            text = StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
        } catch (CharacterCodingException notUnicode) {
            text = new String(bytes, StandardCharsets.ISO_8859_1);
        }
        return text.startsWith("\uFEFF") ? text.substring(1) : text;
    }

    /** The cells of one row by the name of their column. */
    private final class Cells {

        private final Map<String, Integer> columns;
        private final CSVRecord record;
        private final int line;

        Cells(Map<String, Integer> columns, CSVRecord record, int line) {
            this.columns = columns;
            this.record = record;
            this.line = line;
        }

        String text(String... names) {
            for (String name : names) {
                Integer column = columns.get(name);
                if (column != null && column < record.size()) {
                    return record.get(column);
                }
            }
            return "";
        }

        double number(String name, double lowest, double highest, boolean required) {
            String cell = text(name);
            if (cell.isEmpty()) {
                if (required) {
                    refuse(line, name, "VALUE_MISSING", name + " is empty. Give the position, or take the row out.");
                }
                return Double.NaN;
            }
            double number = parsed(cell);
            if (!(number >= lowest && number <= highest)) {
                refuse(line, name, "VALUE_OUT_OF_RANGE", name + " is '" + shortened(cell) + "'; it must be a number from " + plain(lowest) + " to " + plain(highest)
                        + ", with a decimal point.");
                return Double.NaN;
            }
            return number;
        }

        private double parsed(String cell) {
            try {
                return Double.parseDouble(cell);
            } catch (NumberFormatException noNumber) {
                return Double.NaN;
            }
        }

        private String plain(double limit) {
            return Long.toString(Math.round(limit));
        }
    }
}
