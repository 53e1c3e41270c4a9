package org.shearbook.met.decode;

import java.util.Arrays;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import org.shearbook.met.decode.SoundingColumn.Quantity;

/**
 * A table with one sounding: metadata lines {@code # key=value}, a header whose names carry their units
 * ({@code pressure_hPa}, {@code Wind speed (kt)}, or the units in a row of their own below), one level a row.
 *
 * <p>Nothing is guessed. A column whose unit is not stated refuses the file, because a wind in knots read as metres
 * per second looks like a wind. A value that can't be (a speed above 150 m/s, a direction above 360°, a temperature
 * outside −120 to 60 °C) refuses it too: it says that a column is not what the header declares. A single cell that
 * is no number is only remarked.
 *
 * <p>Missing is an empty cell, {@code NaN}, {@code M}, {@code /////}, −999, −9999, 9999 or 99999. The last two are
 * also ordinary heights, times and pressures in Pa: there they count as missing only when they don't lie between
 * their neighbours.
 */
public final class CsvSoundingDecoder implements MessageDecoder {

    private static final int HEADER_SOUGHT_WITHIN = 200;
    private static final int LOOKED_AT = 16_384;

    private static final Set<String> AIR_REPORT_WORDS = Set.of("report_id", "report_kind", "report_class", "observed_at", "flight_level", "aircraft_type",
            "aircraft", "flight_id", "edr_peak", "edr_mean", "turbulence_intensity");

    @Override
    public String format() {
        return "CSV sounding";
    }

    @Override
    public boolean recognises(byte[] bytes) {
        if (MessageText.isBinary(bytes)) {
            return false;
        }
        int looked = Math.min(bytes.length, LOOKED_AT);
        MessageText text = MessageText.ofUnicode(looked == bytes.length ? bytes : Arrays.copyOf(bytes, looked));
        int header = headerIndex(text);
        return header >= 0 && isSoundingHeader(text.text(text.lines().get(header)));
    }

    @Override
    public Decoding decode(byte[] bytes, DecodingContext context) {
        MessageText text = MessageText.ofUnicode(bytes);
        try {
            return new Decoding(format(), List.of(new CsvSoundingTable(text).read()), List.of());
        } catch (Unreadable refused) {
            return new Decoding(format(), List.of(), List.of(refused.asRejection(text.text())));
        }
    }

    static int headerIndex(MessageText text) {
        int sought = Math.min(text.lines().size(), HEADER_SOUGHT_WITHIN);
        for (int i = 0; i < sought; i++) {
            String line = text.text(text.lines().get(i)).strip();
            if (!line.isEmpty() && line.charAt(0) != '#') {
                return i;
            }
        }
        return -1;
    }

    private static boolean isSoundingHeader(String line) {
        char separator = DelimitedLine.separatorOf(line);
        if (separator == '\0') {
            return false;
        }
        List<DelimitedLine.Cell> cells = DelimitedLine.split(line, separator);
        Set<Quantity> quantities = EnumSet.noneOf(Quantity.class);
        for (DelimitedLine.Cell cell : cells) {
            if (AIR_REPORT_WORDS.contains(cell.text().toLowerCase(Locale.ROOT))) {
                return false;
            }
            SoundingColumn column = SoundingColumn.of(cell);
            if (column.quantity() != null && column.quantity().isMeteorological()) {
                quantities.add(column.quantity());
            }
        }
        return quantities.size() >= 2;
    }
}
