package org.shearbook.met.decode;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.Units;

/**
 * Station files of the Integrated Global Radiosonde Archive, version 2.0 to 2.2: many soundings a file.
 *
 * <p>Values are read by their columns and never by blanks, because the archive's check flags stand against the
 * numbers. {@code -9999} (missing) and {@code -8888} (removed by the archive's checks) both become missing; the
 * second is remarked. Elapsed time is minutes and seconds: {@code 100} is one minute. Levels with wind and height
 * but without pressure stay where they stand, after the others. Level type 0 occurs in real files and in no
 * description of the format: a surface wind without pressure and height; it is kept and remarked.
 *
 * <p>Source: NOAA/NCEI, format description of IGRA 2 sounding data files, 19 January 2023.
 */
public final class IgraDecoder implements MessageDecoder {

    private static final int LEVEL_LENGTH = 51;
    private static final int MISSING = -9999;
    private static final int REMOVED = -8888;

    @Override
    public String format() {
        return "IGRA";
    }

    @Override
    public boolean recognises(byte[] bytes) {
        String first = firstLine(bytes);
        return IgraHeader.isShapeOf(first) && !IgraDerivedDecoder.isDerivedHeader(first);
    }

    @Override
    public Decoding decode(byte[] bytes, DecodingContext context) {
        return decodeFile(format(), MessageText.ofBytes(bytes), 33, IgraDecoder::decodeSounding);
    }

    /** Reads one sounding: its header record is read, its level records are at hand. */
    interface SoundingReader {

        DecodedSounding read(IgraHeader header, String headerText, int line, List<LevelRecord> levels, String raw, RemarkList remarks);
    }

    /** A level record and the number of its line. */
    record LevelRecord(int line, String text) {
    }

    /**
     * Walks through a file from header to header. Level records beyond the announced number are not added to the
     * sounding: a header between them may have been lost, and two soundings must not become one.
     *
     * @param levelCountFrom column in which the number of levels begins, from 1
     */
    static Decoding decodeFile(String format, MessageText text, int levelCountFrom, SoundingReader reader) {
        List<DecodedMessage> messages = new ArrayList<>();
        List<Rejection> rejected = new ArrayList<>();
        Map<Twin, Integer> seen = new HashMap<>();
        List<MessageText.Line> lines = text.lines();
        int from = 0;
        while (from < lines.size()) {
            if (isBlank(text, lines.get(from))) {
                from++;
                continue;
            }
            int until = from + 1;
            while (until < lines.size() && !startsSounding(text, lines.get(until))) {
                until++;
            }
            RemarkList remarks = new RemarkList();
            int line = lines.get(from).number();
            try {
                String headerText = text.text(lines.get(from));
                IgraHeader header = IgraHeader.read(headerText, line, levelCountFrom, remarks);
                List<LevelRecord> levels = new ArrayList<>(until - from);
                int end = from + 1;
                while (end < until && levels.size() < header.levels()) {
                    if (!isBlank(text, lines.get(end))) {
                        levels.add(new LevelRecord(lines.get(end).number(), text.text(lines.get(end))));
                    }
                    end++;
                }
                if (levels.size() < header.levels()) {
                    remarks.add(line, levelCountFrom, "LEVELS_MISSING", "The header announces " + header.levels() + " levels, the file has "
                            + levels.size() + ". What is there was kept; fetch the file again if it was cut off.");
                }
                messages.add(markedIfRepeated(reader.read(header, headerText, line, levels, text.raw(from, end), remarks), seen));
                while (end < until && isBlank(text, lines.get(end))) {
                    end++;
                }
                if (end < until) {
                    rejected.add(new Rejection(lines.get(end).number(), 0, "LEVELS_UNANNOUNCED", "The header in line " + line + " announces "
                            + header.levels() + " levels, but more follow. They were not added to that sounding: a header between them may be lost. "
                            + "Compare with the archive's file.", text.raw(end, until)));
                }
            } catch (Unreadable e) {
                rejected.add(e.asRejection(text.raw(from, until)));
            }
            from = until;
        }
        return new Decoding(format, messages, rejected);
    }

    private static DecodedSounding decodeSounding(IgraHeader header, String headerText, int line, List<LevelRecord> records, String raw, RemarkList remarks) {
        List<ReportedLevel> levels = new ArrayList<>(records.size());
        for (LevelRecord record : records) {
            ReportedLevel level = level(record.text(), record.line(), remarks);
            if (level != null) {
                levels.add(level);
            }
        }
        return new DecodedSounding(header.stationId(), degrees(headerText, 56, 62, 90, line, remarks), degrees(headerText, 64, 71, 180, line, remarks),
                Double.NaN, header.nominalAt(), header.launchedAt(), Set.of(), "", "", levels, raw, line, remarks.toList(line));
    }

    private static @Nullable ReportedLevel level(String line, int number, RemarkList remarks) {
        if (line.length() < LEVEL_LENGTH) {
            remarks.add(number, line.length() + 1, "LEVEL_TRUNCATED",
                    "The level ends after " + line.length() + " of " + LEVEL_LENGTH + " columns and was left out. Fetch the file again.");
            return null;
        }
        for (int blank : new int[] {3, 9, 34, 40, 46}) {
            if (line.charAt(blank - 1) != ' ') {
                remarks.add(number, blank, "LEVEL_SHIFTED",
                        "Column " + blank + " must be blank: the values of this level do not stand in their columns and were left out. Fetch the file again.");
                return null;
            }
        }
        LevelLine values = new LevelLine(line, number, remarks);
        double pressure = values.pressure();
        double height = values.value(17, 21, 1);
        double temperature = Units.celsiusToKelvin(values.value(23, 27, 10));
        double relativeHumidity = values.value(29, 33, 1000);
        double depression = values.value(35, 39, 10);
        double direction = values.value(41, 45, 1);
        double speed = values.value(47, 51, 10);
        if (direction < 0 || direction > 360) {
            remarks.add(number, 41, "DIRECTION_OUT_OF_RANGE", "A wind direction of " + direction + "° does not exist; the wind was left out.");
            direction = Double.NaN;
            speed = Double.NaN;
        }
        return new ReportedLevel(pressure, height, temperature, dewPoint(temperature, relativeHumidity, depression),
                direction, speed, values.elapsed(), Double.NaN, Double.NaN, significance(line, number, remarks));
    }

    private static double dewPoint(double temperature, double relativeHumidity, double depression) {
        if (!Double.isNaN(depression)) {
            return temperature - depression;
        }
        return relativeHumidity > 0 && temperature > 0 ? MoistThermodynamics.dewPointFromRelativeHumidity(temperature, relativeHumidity) : Double.NaN;
    }

    private static Set<Significance> significance(String line, int number, RemarkList remarks) {
        EnumSet<Significance> significance = EnumSet.noneOf(Significance.class);
        switch (line.charAt(0)) {
            case '1' -> significance.add(Significance.STANDARD);
            case '2', '3' -> { }
            default -> remarks.add(number, 1, "LEVEL_TYPE_UNDOCUMENTED",
                    "Level type " + line.charAt(0) + " stands in no description of the archive; the values were kept as they are.");
        }
        switch (line.charAt(1)) {
            case '1' -> significance.add(Significance.SURFACE);
            case '2' -> significance.add(Significance.TROPOPAUSE);
            case '0' -> { }
            default -> remarks.add(number, 2, "LEVEL_TYPE_UNDOCUMENTED",
                    "The second level type " + line.charAt(1) + " stands in no description of the archive; the values were kept as they are.");
        }
        return significance;
    }

    /** The columns of one level. */
    private record LevelLine(String line, int number, RemarkList remarks) {

        double value(int from, int to, double perUnit) {
            int value = integer(from, to);
            return value == MISSING ? Double.NaN : value / perUnit;
        }

        double pressure() {
            double pressure = value(10, 15, 1);
            if (pressure <= 0) {
                remarks.add(number, 10, "PRESSURE_OUT_OF_RANGE", "The pressure is not positive and was left out.");
                return Double.NaN;
            }
            return pressure;
        }

        double elapsed() {
            int value = integer(4, 8);
            if (value == MISSING) {
                return Double.NaN;
            }
            if (value < 0 || value % 100 > 59) {
                remarks.add(number, 4, "ELAPSED_TIME_UNREADABLE", "The elapsed time is not minutes and seconds and was left out.");
                return Double.NaN;
            }
            return value / 100 * 60 + value % 100;
        }

        private int integer(int from, int to) {
            String field = line.substring(from - 1, to).strip();
            int value;
            try {
                value = Integer.parseInt(field);
            } catch (NumberFormatException notANumber) {
                remarks.add(number, from, "VALUE_UNREADABLE", "'" + field + "' is not a number; the value was left out.");
                return MISSING;
            }
            if (value == REMOVED) {
                remarks.add(number, from, "REMOVED_BY_ARCHIVE", "The archive's own checks removed this value.");
                return MISSING;
            }
            return value;
        }
    }

    private static double degrees(String header, int from, int to, double limit, int line, RemarkList remarks) {
        if (header.length() < to) {
            remarks.add(line, header.length() + 1, "POSITION_MISSING", "The header ends before the position.");
            return Double.NaN;
        }
        try {
            double degrees = Integer.parseInt(header.substring(from - 1, to).strip()) / 10_000.0;
            if (Math.abs(degrees) <= limit) {
                return degrees;
            }
        } catch (NumberFormatException notANumber) {
            // falls through to the remark
        }
        remarks.add(line, from, "POSITION_MISSING", "The position in the header is missing or can't be read.");
        return Double.NaN;
    }

    private static DecodedSounding markedIfRepeated(DecodedSounding sounding, Map<Twin, Integer> seen) {
        if (sounding.levels().isEmpty()) {
            return sounding;
        }
        Integer first = seen.putIfAbsent(new Twin(sounding.stationId(), sounding.launchedAt(), sounding.levels()), sounding.line());
        if (first == null) {
            return sounding;
        }
        List<Remark> remarks = new ArrayList<>(sounding.remarks());
        remarks.add(new Remark(sounding.line(), 0, "REPEATED_SOUNDING", "All levels and the release time are those of the sounding in line " + first + "."));
        return new DecodedSounding(sounding.stationId(), sounding.latitude(), sounding.longitude(), sounding.elevation(),
                sounding.nominalAt(), sounding.launchedAt(), sounding.parts(), sounding.correction(), sounding.sondeType(),
                sounding.levels(), sounding.raw(), sounding.line(), remarks);
    }

    private record Twin(String stationId, @Nullable Instant launchedAt, List<ReportedLevel> levels) {
    }

    static String firstLine(byte[] bytes) {
        int from = 0;
        while (from < bytes.length && (bytes[from] == '\n' || bytes[from] == '\r' || bytes[from] == ' ')) {
            from++;
        }
        int to = from;
        while (to < bytes.length && to < from + 200 && bytes[to] != '\n' && bytes[to] != '\r') {
            to++;
        }
        return new String(bytes, from, to - from, StandardCharsets.ISO_8859_1);
    }

    private static boolean startsSounding(MessageText text, MessageText.Line line) {
        return line.length() > 0 && text.text().charAt(line.start()) == '#';
    }

    private static boolean isBlank(MessageText text, MessageText.Line line) {
        for (int i = line.start(); i < line.end(); i++) {
            if (text.text().charAt(i) > ' ') {
                return false;
            }
        }
        return true;
    }
}
