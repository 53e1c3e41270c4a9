package org.shearbook.met.decode;

import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import org.jspecify.annotations.Nullable;

/** What the text of one cell of a table means. */
final class CsvCell {

    private CsvCell() {
    }

    static boolean isMissing(String cell) {
        return cell.isEmpty() || cell.equals("/////") || cell.equals("//") || cell.equals("///") || cell.equalsIgnoreCase("M")
                || cell.equalsIgnoreCase("NaN") || isNegativeMark(cell);
    }

    private static boolean isNegativeMark(String cell) {
        return cell.startsWith("-9") && (cell.equals("-999") || cell.equals("-9999") || cell.equals("-99999")
                || cell.equals("-999.0") || cell.equals("-9999.0") || cell.equals("-999,0") || cell.equals("-9999,0")
                || cell.equals("-999.00") || cell.equals("-9999.00"));
    }

    /** A plain decimal number; {@code NaN} for anything else. A comma is a decimal comma where it can't be a separator. */
    static double number(String cell, char separator) {
        if (cell.isEmpty() || cell.length() > 32) {
            return Double.NaN;
        }
        boolean plain = true;
        for (int i = 0; i < cell.length(); i++) {
            char c = cell.charAt(i);
            if (c == '−' || c == ',' && separator != ',') {
                plain = false;
            } else if (!(c >= '0' && c <= '9' || c == '-' || c == '+' || c == '.' || c == 'e' || c == 'E')) {
                return Double.NaN;
            }
        }
        try {
            double number = Double.parseDouble(plain ? cell : cell.replace('−', '-').replace(',', '.'));
            return Double.isInfinite(number) ? Double.NaN : number;
        } catch (NumberFormatException notANumber) {
            return Double.NaN;
        }
    }

    /** A moment in ISO 8601; without an offset it is UTC. */
    static @Nullable Instant moment(String cell) {
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

    static String shortened(String text) {
        return text.length() <= 24 ? text : text.substring(0, 24) + "…";
    }
}
