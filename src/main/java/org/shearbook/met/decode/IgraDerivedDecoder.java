package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.Units;

/**
 * Files of sounding-derived parameters of the Integrated Global Radiosonde Archive, version 2: pressure levels only,
 * the first of each sounding at the surface. Only what was reported is read: pressure, reported height, temperature,
 * humidity (the archive's vapour pressure, which it computed from the reported dew point) and wind, given here as
 * components. The archive's gradients, indices and computed heights are left alone.
 *
 * <p>Source: NOAA/NCEI, format of the IGRA-derived sounding parameters files.
 */
public final class IgraDerivedDecoder implements MessageDecoder {

    private static final int HEADER_LENGTH = 157;
    private static final int LEVEL_LENGTH = 151;
    private static final int COLUMN_WIDTH = 8;
    private static final int MISSING = -99999;

    @Override
    public String format() {
        return "IGRA derived";
    }

    @Override
    public boolean recognises(byte[] bytes) {
        return isDerivedHeader(IgraDecoder.firstLine(bytes));
    }

    static boolean isDerivedHeader(String line) {
        return line.length() >= HEADER_LENGTH && IgraHeader.isShapeOf(line);
    }

    @Override
    public Decoding decode(byte[] bytes, DecodingContext context) {
        return IgraDecoder.decodeFile(format(), MessageText.ofBytes(bytes), 32, IgraDerivedDecoder::decodeSounding);
    }

    private static DecodedSounding decodeSounding(IgraHeader header, String headerText, int line, List<IgraDecoder.LevelRecord> records, String raw, RemarkList remarks) {
        List<ReportedLevel> levels = new ArrayList<>(records.size());
        for (IgraDecoder.LevelRecord record : records) {
            ReportedLevel level = level(record.text(), record.line(), levels.isEmpty() && record == records.get(0), remarks);
            if (level != null) {
                levels.add(level);
            }
        }
        return new DecodedSounding(header.stationId(), Double.NaN, Double.NaN, Double.NaN, header.nominalAt(), header.launchedAt(),
                Set.of(), "", "", levels, raw, line, remarks.toList(line));
    }

    private static @Nullable ReportedLevel level(String line, int number, boolean surface, RemarkList remarks) {
        if (line.length() < LEVEL_LENGTH) {
            remarks.add(number, line.length() + 1, "LEVEL_TRUNCATED",
                    "The level ends after " + line.length() + " of " + LEVEL_LENGTH + " columns and was left out. Fetch the file again.");
            return null;
        }
        for (int blank = COLUMN_WIDTH; blank < LEVEL_LENGTH; blank += COLUMN_WIDTH) {
            if (line.charAt(blank - 1) != ' ') {
                remarks.add(number, blank, "LEVEL_SHIFTED",
                        "Column " + blank + " must be blank: the values of this level do not stand in their columns and were left out. Fetch the file again.");
                return null;
            }
        }
        double pressure = value(line, 1, 1, number, remarks);
        if (pressure <= 0) {
            remarks.add(number, 1, "PRESSURE_OUT_OF_RANGE", "The pressure is not positive and was left out.");
            pressure = Double.NaN;
        }
        double vapourPressure = value(line, 73, 10, number, remarks);
        double eastward = value(line, 113, 10, number, remarks);
        double northward = value(line, 129, 10, number, remarks);
        Set<Significance> significance = EnumSet.noneOf(Significance.class);
        if (surface) {
            significance.add(Significance.SURFACE);
        }
        return new ReportedLevel(pressure, value(line, 9, 1, number, remarks), value(line, 25, 10, number, remarks),
                vapourPressure > 0 ? MoistThermodynamics.dewPoint(vapourPressure) : Double.NaN,
                Units.fromDirection(eastward, northward), Math.hypot(eastward, northward),
                Double.NaN, Double.NaN, Double.NaN, significance);
    }

    private static double value(String line, int from, double perUnit, int number, RemarkList remarks) {
        String field = line.substring(from - 1, from + COLUMN_WIDTH - 2).strip();
        try {
            int value = Integer.parseInt(field);
            return value == MISSING ? Double.NaN : value / perUnit;
        } catch (NumberFormatException notANumber) {
            remarks.add(number, from, "VALUE_UNREADABLE", "'" + field + "' is not a number; the value was left out.");
            return Double.NaN;
        }
    }
}
