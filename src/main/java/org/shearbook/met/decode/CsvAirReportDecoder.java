package org.shearbook.met.decode;

import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.Place;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.DelimitedLine.Cell;
import org.shearbook.met.profile.Units;

/**
 * A table of air-reports: a header whose names carry their units, one report a row. A row that can't be right is
 * refused with line, column and reason; the rows around it stay. Where a column has the text of the report as it was
 * sent, that text is read again and goes before columns that somebody else derived from it.
 *
 * <p>Missing is an empty cell, and in columns of numbers also {@code NaN}, {@code M}, slashes, -999, -9999, 9999 and
 * 99999. The separator is a comma, a semicolon or a tab; with a semicolon numbers may have a decimal comma.
 */
public final class CsvAirReportDecoder implements MessageDecoder {

    private static final int HEADER_WITHIN_BYTES = 65_536;
    private static final Set<String> MISSING_NUMBERS = Set.of("", "NAN", "M", "-999", "-9999", "9999", "99999");
    private static final Set<AirReportColumn> NEEDED = EnumSet.of(AirReportColumn.OBSERVED_AT, AirReportColumn.REPORT_TEXT);

    /** Above this a rate is no rate but hundredths of one [m^⅔ s⁻¹]. */
    private static final double LARGEST_EDR = 2.0;

    @Override
    public String format() {
        return "CSV air-reports";
    }

    @Override
    public boolean recognises(byte[] bytes) {
        if (MessageText.isBinary(bytes)) {
            return false;
        }
        MessageText text = MessageText.ofUnicode(bytes.length <= HEADER_WITHIN_BYTES ? bytes : Arrays.copyOf(bytes, HEADER_WITHIN_BYTES));
        int header = CsvSoundingDecoder.headerIndex(text);
        if (header < 0) {
            return false;
        }
        String line = text.text(text.lines().get(header));
        char separator = DelimitedLine.separatorOf(line);
        return separator != '\0' && DelimitedLine.split(line, separator).stream()
                .map(cell -> AirReportColumn.of(cell.text())).anyMatch(column -> column != null && column.isTelling());
    }

    @Override
    public Decoding decode(byte[] bytes, DecodingContext context) {
        return new Table(MessageText.ofUnicode(bytes), context).read();
    }

    /** What is wrong with a row. */
    private static final class Refused extends Exception {

        private static final long serialVersionUID = 1L;
        private final int column;
        private final String code;

        Refused(int column, String code, String text) {
            super(text, null, false, false);
            this.column = column;
            this.code = code;
        }
    }

    /** One table on its way through the decoder. */
    private final class Table {

        private final MessageText text;
        private final DecodingContext context;
        private final List<DecodedMessage> messages = new ArrayList<>();
        private final List<Rejection> rejected = new ArrayList<>();
        private final List<Remark> aboutHeader = new ArrayList<>();
        private final Map<AirReportColumn, Integer> columns = new EnumMap<>(AirReportColumn.class);
        private int width;
        private char separator;

        Table(MessageText text, DecodingContext context) {
            this.text = text;
            this.context = context;
        }

        Decoding read() {
            int header = CsvSoundingDecoder.headerIndex(text);
            if (header < 0) {
                return refuseAll(1, 0, "EMPTY_INPUT", "The table has no header. Its first line must name the columns.");
            }
            try {
                readHeader(header);
            } catch (Refused refused) {
                return refuseAll(header + 1, refused.column, refused.code, String.valueOf(refused.getMessage()));
            }
            for (int index = header + 1; index < text.lines().size(); index++) {
                MessageText.Line line = text.lines().get(index);
                String row = text.text(line);
                if (!row.isBlank() && row.charAt(0) != '#') {
                    readRow(line.number(), row);
                }
            }
            if (messages.isEmpty() && rejected.isEmpty()) {
                return refuseAll(header + 1, 0, "NO_ROWS", "The table has a header and no rows.");
            }
            return new Decoding(format(), messages, rejected);
        }

        private Decoding refuseAll(int line, int column, String code, String what) {
            return new Decoding(format(), List.of(), List.of(new Rejection(line, column, code, what, text.text())));
        }

        private void readHeader(int index) throws Refused {
            String header = text.text(text.lines().get(index));
            separator = DelimitedLine.separatorOf(header);
            List<Cell> cells = DelimitedLine.split(header, separator);
            width = cells.size();
            for (int position = 0; position < width; position++) {
                Cell cell = cells.get(position);
                if (AirReportColumn.lacksUnit(cell.text())) {
                    throw new Refused(cell.column(), "UNIT_MISSING", "The column " + cell.text()
                            + " does not say its unit. Put it in the name, for example wind_speed_kt, latitude_deg or temperature_C.");
                }
                AirReportColumn column = AirReportColumn.of(cell.text());
                if (column == null) {
                    aboutHeader.add(new Remark(index + 1, cell.column(), "COLUMN_NOT_USED", "The column " + cell.text() + " is not known and was not read."));
                } else if (columns.putIfAbsent(column, position) != null) {
                    throw new Refused(cell.column(), "COLUMN_TWICE", "The column " + cell.text() + " is there twice. Take one out.");
                }
            }
            if (NEEDED.stream().noneMatch(columns::containsKey)) {
                throw new Refused(0, "COLUMN_MISSING", "The table has neither a column observed_at nor one with the text of the report. Add one.");
            }
        }

        private void readRow(int line, String row) {
            List<Cell> cells = DelimitedLine.split(row, separator);
            try {
                if (cells.size() != width) {
                    throw new Refused(cells.size() > width ? cells.get(width).column() : row.length() + 1, "WRONG_NUMBER_OF_FIELDS",
                            "The row has " + cells.size() + " fields and the header " + width
                                    + ". A separator inside a field needs quotes round the field; a row cut short must be sent again.");
                }
                Row current = new Row(line, row, cells);
                if (messages.isEmpty()) {
                    current.remarks.addAll(aboutHeader);
                }
                messages.add(current.read());
            } catch (Refused refused) {
                rejected.add(new Rejection(line, refused.column, refused.code, String.valueOf(refused.getMessage()), row));
            }
        }

        /** One row on its way into a report. */
        private final class Row {

            private final int line;
            private final String row;
            private final List<Cell> cells;
            private final List<Remark> remarks = new ArrayList<>();

            Row(int line, String row, List<Cell> cells) {
                this.line = line;
                this.row = row;
                this.cells = cells;
            }

            DecodedAirReport read() throws Refused {
                DecodedAirReport sent = asSent();
                Instant observedAt = moment(AirReportColumn.OBSERVED_AT);
                if (observedAt == null && sent != null) {
                    observedAt = sent.observedAt();
                }
                if (observedAt == null) {
                    throw new Refused(columnOf(AirReportColumn.OBSERVED_AT), "TIME_MISSING", "The row has no time of observation. Write it as 2031-03-12T11:42:00Z.");
                }
                ReportClass reportClass = reportClass();
                double edrMean = edr(AirReportColumn.EDR_MEAN);
                double edrPeak = edr(AirReportColumn.EDR_PEAK);
                if (edrMean > edrPeak) {
                    remark(AirReportColumn.EDR_MEAN, "EDR_MEAN_ABOVE_PEAK", "The mean is larger than the peak: the columns were perhaps exchanged.");
                }
                double level = sent != null && !Double.isNaN(sent.flightLevel()) ? sent.flightLevel() : flightLevel();
                List<TurbulenceLayer> layers = sent != null && !sent.turbulence().isEmpty() ? sent.turbulence() : layers(level);
                Place place = sent != null && sent.place().isResolved() ? sent.place() : place();
                Cloud cloud = cloud();
                String type = text(AirReportColumn.AIRCRAFT_TYPE);
                String weightClass = weightClass();
                String remark = text(AirReportColumn.REMARK);
                double windFrom = range(number(AirReportColumn.WIND_DIRECTION), AirReportColumn.WIND_DIRECTION, 0.0, 360.0);
                double windSpeed = windSpeed();
                double temperature = temperature();
                double gust = range(number(AirReportColumn.GUST), AirReportColumn.GUST, 0.0, 60.0);
                boolean urgent = reportClass == ReportClass.SPC || sent != null && sent.urgent();
                return new DecodedAirReport(text(AirReportColumn.REPORT_ID), reportClass, urgent, text(AirReportColumn.AIRCRAFT),
                        type.isEmpty() && sent != null ? sent.aircraftType() : type,
                        weightClass.isEmpty() && sent != null ? sent.weightClass() : weightClass,
                        observedAt, place, level, layers, edrMean, edrPeak, gust,
                        Double.isNaN(windFrom) && sent != null ? sent.windFromDirection() : windFrom,
                        Double.isNaN(windSpeed) && sent != null ? sent.windSpeed() : windSpeed,
                        Double.isNaN(temperature) && sent != null ? sent.temperature() : temperature,
                        cloud == Cloud.UNKNOWN && sent != null ? sent.cloud() : cloud,
                        remark.isEmpty() && sent != null ? sent.remark() : remark, row, line, remarks);
            }

            /** The report read again from its own text; null when the row has none or it can't be read. */
            private @Nullable DecodedAirReport asSent() throws Refused {
                String report = text(AirReportColumn.REPORT_TEXT);
                if (report.isEmpty()) {
                    return null;
                }
                Instant received = moment(AirReportColumn.RECEIVED_AT);
                Instant observed = moment(AirReportColumn.OBSERVED_AT);
                Instant latest = received != null ? received : observed != null ? observed : context.receivedAt();
                DecodedAirReport sent = PilotReportDecoder.decodeOne(report, new DecodingContext(latest, context.fixes()));
                if (sent == null) {
                    remark(AirReportColumn.REPORT_TEXT, "REPORT_TEXT_NOT_READ", "The text of the report could not be read; the columns were used.");
                    return null;
                }
                for (Remark remark : sent.remarks()) {
                    remarks.add(new Remark(line, columnOf(AirReportColumn.REPORT_TEXT) + Math.max(0, remark.column() - 1), remark.code(), remark.text()));
                }
                return sent;
            }

            private String text(AirReportColumn column) {
                Integer position = columns.get(column);
                return position == null ? "" : cells.get(position).text();
            }

            private int columnOf(AirReportColumn column) {
                Integer position = columns.get(column);
                return position == null ? 0 : cells.get(position).column();
            }

            private void remark(AirReportColumn column, String code, String what) {
                remarks.add(new Remark(line, columnOf(column), code, what));
            }

            private double number(AirReportColumn column) throws Refused {
                String cell = text(column);
                if (MISSING_NUMBERS.contains(cell.toUpperCase(Locale.ROOT)) || isSlashes(cell)) {
                    return Double.NaN;
                }
                String decimal = separator == ';' ? cell.replace(',', '.') : cell;
                if (decimal.length() > 24 || !decimal.matches("[-+]?\\d{0,10}(?:\\.\\d{0,12})?") || decimal.chars().noneMatch(Character::isDigit)) {
                    throw new Refused(columnOf(column), "NOT_A_NUMBER", "Here a number is expected and not \"" + shortened(cell) + "\".");
                }
                double value = Double.parseDouble(decimal);
                return MISSING_NUMBERS.contains(String.valueOf(Math.round(value))) && value == Math.rint(value) ? Double.NaN : value;
            }

            private double range(double value, AirReportColumn column, double lowest, double highest) throws Refused {
                if (value < lowest || value > highest) {
                    throw new Refused(columnOf(column), "OUT_OF_RANGE", "The value " + shortened(text(column)) + " does not lie between "
                            + lowest + " and " + highest + ". Check value and unit.");
                }
                return value;
            }

            private @Nullable Instant moment(AirReportColumn column) throws Refused {
                String cell = text(column);
                if (cell.isEmpty() || isSlashes(cell)) {
                    return null;
                }
                try {
                    String iso = cell.replace(' ', 'T');
                    boolean hasZone = iso.endsWith("Z") || iso.indexOf('+', 10) > 0 || iso.lastIndexOf('-') > 10;
                    if (hasZone) {
                        return OffsetDateTime.parse(iso).toInstant();
                    }
                    Instant moment = LocalDateTime.parse(iso).toInstant(ZoneOffset.UTC);
                    remark(column, "TIME_TAKEN_AS_UTC", "The time does not say its zone and was taken as UTC.");
                    return moment;
                } catch (DateTimeException notATime) {
                    throw new Refused(columnOf(column), "NOT_A_TIME", "Here a time such as 2031-03-12T11:42:00Z is expected and not \"" + shortened(cell) + "\".");
                }
            }

            private ReportClass reportClass() throws Refused {
                String cell = text(AirReportColumn.REPORT_CLASS).toUpperCase(Locale.ROOT);
                return switch (cell) {
                    case "" -> isAutomated() ? ReportClass.EDR : ReportClass.VOL;
                    case "VOL", "VOICE", "PIREP", "UA", "UUA", "AIREP", "ARP" -> ReportClass.VOL;
                    case "SPC", "ARS", "SPECIAL" -> ReportClass.SPC;
                    case "TRG" -> ReportClass.TRG;
                    case "EDR", "AUTO", "AMDAR" -> ReportClass.EDR;
                    case "QAR" -> ReportClass.QAR;
                    default -> throw new Refused(columnOf(AirReportColumn.REPORT_CLASS), "UNKNOWN_CLASS",
                            "The class " + shortened(cell) + " is not known. Use VOL, SPC, TRG, EDR or QAR.");
                };
            }

            private boolean isAutomated() throws Refused {
                String cell = text(AirReportColumn.AUTOMATED).toUpperCase(Locale.ROOT);
                return switch (cell) {
                    case "", "NO", "N", "FALSE", "0", "VOICE" -> false;
                    case "YES", "Y", "TRUE", "1", "AUTO" -> true;
                    default -> throw new Refused(columnOf(AirReportColumn.AUTOMATED), "UNKNOWN_WORD",
                            "Whether the report was automatic is said by yes or no, not by \"" + shortened(cell) + "\".");
                };
            }

            private double edr(AirReportColumn column) throws Refused {
                double value = number(column);
                if (value < 0.0 || value > LARGEST_EDR) {
                    throw new Refused(columnOf(column), "EDR_OUT_OF_RANGE", "An eddy dissipation rate lies between 0 and " + LARGEST_EDR
                            + " m^2/3 per second; " + shortened(text(column)) + " is perhaps given in hundredths.");
                }
                return value;
            }

            private double flightLevel() throws Refused {
                String cell = text(AirReportColumn.FLIGHT_LEVEL);
                double level;
                if (cell.isEmpty() && columns.containsKey(AirReportColumn.PRESSURE_ALTITUDE_FEET)) {
                    level = range(number(AirReportColumn.PRESSURE_ALTITUDE_FEET), AirReportColumn.PRESSURE_ALTITUDE_FEET, -2_000.0, 60_000.0) / 100.0;
                } else if (!cell.isEmpty() && Character.isLetter(cell.charAt(0))) {
                    level = LevelGroup.read(cell.toUpperCase(Locale.ROOT), (code, what) -> remark(AirReportColumn.FLIGHT_LEVEL, code, what));
                } else {
                    level = number(AirReportColumn.FLIGHT_LEVEL);
                    if (level < -20.0 || level > 600.0) {
                        throw new Refused(columnOf(AirReportColumn.FLIGHT_LEVEL), "OUT_OF_RANGE", "The flight level " + shortened(cell)
                                + " is no hundreds of feet. Is it in feet? Then the column is pressure_altitude_ft.");
                    }
                }
                if (level == 0.0) {
                    remark(AirReportColumn.FLIGHT_LEVEL, "LEVEL_UNKNOWN", "A flight level of 0 means that it is unknown.");
                    return Double.NaN;
                }
                return level;
            }

            private List<TurbulenceLayer> layers(double level) throws Refused {
                String intensity = text(AirReportColumn.INTENSITY).toUpperCase(Locale.ROOT);
                String words = (text(AirReportColumn.FREQUENCY) + " " + intensity + " " + text(AirReportColumn.TYPE)).toUpperCase(Locale.ROOT).strip();
                if (words.isEmpty() || isSlashes(words)) {
                    return List.of();
                }
                List<TurbulenceLayer> read = TurbulenceGroup.read(words, level).layers();
                boolean known = !read.isEmpty() && (intensity.isEmpty() || read.stream().anyMatch(layer -> layer.intensity() != null));
                if (!known) {
                    throw new Refused(columnOf(AirReportColumn.INTENSITY), "UNKNOWN_INTENSITY",
                            "The turbulence \"" + shortened(words) + "\" is not known. Use NIL, LGT, MOD, SEV or EXTRM.");
                }
                double base = range(number(AirReportColumn.BASE_FEET), AirReportColumn.BASE_FEET, -2_000.0, 60_000.0);
                double top = range(number(AirReportColumn.TOP_FEET), AirReportColumn.TOP_FEET, -2_000.0, 60_000.0);
                if (Double.isNaN(base) && Double.isNaN(top)) {
                    return read;
                }
                if (base > top) {
                    remark(AirReportColumn.BASE_FEET, "LAYER_REVERSED", "The base lies above the top; the two were exchanged.");
                    double exchanged = base;
                    base = top;
                    top = exchanged;
                }
                List<TurbulenceLayer> layers = new ArrayList<>();
                for (TurbulenceLayer layer : read) {
                    layers.add(new TurbulenceLayer(layer.intensity(), layer.intensityTo(), layer.frequency(), layer.type(), base, top));
                }
                return layers;
            }

            private Place place() throws Refused {
                double latitude = number(AirReportColumn.LATITUDE);
                double longitude = number(AirReportColumn.LONGITUDE);
                if (!Double.isNaN(latitude) && !Double.isNaN(longitude)) {
                    range(latitude, AirReportColumn.LATITUDE, -90.0, 90.0);
                    range(longitude, AirReportColumn.LONGITUDE, -180.0, 360.0);
                    double east = longitude > 180.0 ? longitude - 360.0 : longitude;
                    return new Place(text(AirReportColumn.LATITUDE) + " " + text(AirReportColumn.LONGITUDE), latitude, east, "coordinates", List.of());
                }
                String position = text(AirReportColumn.POSITION).toUpperCase(Locale.ROOT);
                if (position.isEmpty()) {
                    throw new Refused(columnOf(AirReportColumn.LATITUDE), "PLACE_MISSING", "The row has no place. Give latitude_deg and longitude_deg or position.");
                }
                return new PlaceGroup(new FixChoice(context.fixes(), ""), (code, what) -> remark(AirReportColumn.POSITION, code, what)).read(position);
            }

            private String weightClass() throws Refused {
                String cell = text(AirReportColumn.WEIGHT_CLASS).toUpperCase(Locale.ROOT);
                return switch (cell) {
                    case "" -> "";
                    case "L", "LIGHT" -> "L";
                    case "M", "MEDIUM" -> "M";
                    case "H", "HEAVY", "J", "SUPER" -> "H";
                    default -> throw new Refused(columnOf(AirReportColumn.WEIGHT_CLASS), "UNKNOWN_WEIGHT_CLASS",
                            "The weight class " + shortened(cell) + " is not known. Use L, M or H.");
                };
            }

            private Cloud cloud() throws Refused {
                String cell = text(AirReportColumn.CLOUD).toUpperCase(Locale.ROOT);
                return switch (cell) {
                    case "", "-", "UNK", "UNKNOWN" -> Cloud.UNKNOWN;
                    case "CLR", "CLEAR", "VMC" -> Cloud.CLEAR;
                    case "CLD", "CLOUD", "IN CLOUD", "IN_CLOUD", "IMC" -> Cloud.IN_CLOUD;
                    default -> throw new Refused(columnOf(AirReportColumn.CLOUD), "UNKNOWN_WORD",
                            "In or out of cloud is said by CLD or CLR, not by \"" + shortened(cell) + "\".");
                };
            }

            private double windSpeed() throws Refused {
                double knots = number(AirReportColumn.WIND_SPEED_KNOTS);
                if (!Double.isNaN(knots)) {
                    return Units.knotsToMetresPerSecond(range(knots, AirReportColumn.WIND_SPEED_KNOTS, 0.0, 290.0));
                }
                return range(number(AirReportColumn.WIND_SPEED), AirReportColumn.WIND_SPEED, 0.0, 150.0);
            }

            private double temperature() throws Refused {
                double celsius = number(AirReportColumn.TEMPERATURE_CELSIUS);
                if (!Double.isNaN(celsius)) {
                    return Units.celsiusToKelvin(range(celsius, AirReportColumn.TEMPERATURE_CELSIUS, -120.0, 60.0));
                }
                return range(number(AirReportColumn.TEMPERATURE_KELVIN), AirReportColumn.TEMPERATURE_KELVIN, 153.0, 333.0);
            }
        }
    }

    private static boolean isSlashes(String cell) {
        return !cell.isEmpty() && cell.chars().allMatch(c -> c == '/');
    }

    private static String shortened(String cell) {
        return cell.length() <= 24 ? cell : cell.substring(0, 24) + "…";
    }
}
