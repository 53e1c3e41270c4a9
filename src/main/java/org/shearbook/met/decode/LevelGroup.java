package org.shearbook.met.decode;

import java.util.function.BiConsumer;

/** The flight level of a pilot report. An unknown level is missing, which is not zero. */
final class LevelGroup {

    /** Higher than any report [hundreds of feet]. */
    private static final double HIGHEST = 600.0;

    private LevelGroup() {
    }

    /**
     * @param group  without its tag, in capitals
     * @param remark takes code and text of whatever was doubtful
     * @return [hundreds of feet]; {@code NaN} when unknown
     */
    static double read(String group, BiConsumer<String, String> remark) {
        String text = group.strip();
        int start = 0;
        while (start < text.length() && "/ F L A B".indexOf(text.charAt(start)) >= 0) {
            start++;
        }
        int end = numberEnd(text, start);
        String digits = text.substring(start, end).replace('O', '0');
        if (digits.isEmpty() || start > 3) {
            remark.accept("LEVEL_UNKNOWN", text.isEmpty()
                    ? "The report gives no flight level."
                    : "The report gives no flight level but " + shortened(text) + ".");
            return Double.NaN;
        }
        String rest = text.substring(end).strip();
        if (rest.startsWith("-") || rest.startsWith("/") || rest.startsWith("TO ")) {
            int second = rest.startsWith("TO ") ? 3 : 1;
            while (second < rest.length() && "FL ".indexOf(rest.charAt(second)) >= 0) {
                second++;
            }
            String other = rest.substring(second, numberEnd(rest, second)).replace('O', '0');
            if (!other.isEmpty()) {
                double one = hundreds(digits, false);
                double two = hundreds(other, false);
                if (!Double.isNaN(one) && !Double.isNaN(two)) {
                    remark.accept("LEVEL_RANGE", "The flight level is a range, " + digits + " to " + other + "; its middle is kept.");
                    return known((one + two) / 2.0, text, remark);
                }
            }
        }
        boolean feet = rest.startsWith("'") || rest.startsWith("FT") || rest.startsWith("FEET") || rest.startsWith("MSL");
        double level = hundreds(digits, feet);
        if (Double.isNaN(level)) {
            remark.accept("LEVEL_DOUBTFUL", "The flight level " + shortened(text) + " could not be read. Set it by hand.");
            return Double.NaN;
        }
        boolean perhapsType = start > 0 && "AB".indexOf(text.charAt(start - 1)) >= 0 && level >= 180.0;
        if (perhapsType) {
            remark.accept("LEVEL_DOUBTFUL", "The flight level " + shortened(text) + " looks like a type of aircraft. Set it by hand.");
            return Double.NaN;
        }
        boolean usual = digits.length() == 3 && !feet && (rest.isEmpty() || rest.equals("-"));
        if (!usual) {
            remark.accept("LEVEL_FORM", "The flight level is written " + shortened(text) + " and was taken as "
                    + Math.round(level * 100.0) + " ft.");
        }
        return known(level, text, remark);
    }

    private static double known(double level, String text, BiConsumer<String, String> remark) {
        if (level == 0.0) {
            remark.accept("LEVEL_UNKNOWN", "The flight level " + shortened(text) + " means that it is unknown.");
            return Double.NaN;
        }
        if (level > HIGHEST) {
            remark.accept("LEVEL_DOUBTFUL", "The flight level " + shortened(text) + " is higher than any report. Set it by hand.");
            return Double.NaN;
        }
        return level;
    }

    /** Two and three digits are hundreds of feet, as are four that begin with zero; other numbers are feet. */
    private static double hundreds(String digits, boolean feet) {
        int length = digits.length();
        if (length > 5) {
            return Double.NaN;
        }
        double value = Double.parseDouble(digits);
        return feet || length == 5 || length == 4 && digits.charAt(0) != '0' ? value / 100.0 : value;
    }

    private static int numberEnd(String text, int from) {
        int end = from;
        boolean hasDigit = false;
        while (end < text.length() && (Character.isDigit(text.charAt(end)) || text.charAt(end) == 'O')) {
            hasDigit |= text.charAt(end) != 'O';
            end++;
        }
        return hasDigit ? end : from;
    }

    private static String shortened(String text) {
        return text.length() <= 20 ? text : text.substring(0, 20) + "…";
    }
}
