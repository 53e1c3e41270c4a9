package org.shearbook.met.decode;

import org.jspecify.annotations.Nullable;

/**
 * Latitude and longitude at the start of a text, in the forms found in aircraft messages: {@code 3810N07009W},
 * {@code 2802N 08219W}, {@code 62N040W}, {@code 3900N 4500W}, {@code N2020W07005}, {@code 38.5N 70.25W}.
 *
 * @param latitude     [degrees north]; {@code NaN} when the digits can't be a latitude
 * @param longitude    [degrees east]; {@code NaN} when the digits can't be a longitude
 * @param wholeDegrees neither number has minutes or decimals
 * @param end          index in the text behind the last character read
 */
record Coordinates(double latitude, double longitude, boolean wholeDegrees, int end) {

    private static final int MOST_DIGITS = 9;

    /** Whether the digits make a place on the Earth. */
    boolean arePossible() {
        return !Double.isNaN(latitude) && !Double.isNaN(longitude);
    }

    /**
     * @param text in capitals
     * @param from where to begin
     * @return null when no coordinates stand there
     */
    static @Nullable Coordinates read(String text, int from) {
        int start = skip(text, from, " ");
        if (start >= text.length()) {
            return null;
        }
        boolean hemisphereFirst = isOneOf(text, start, "NS");
        Angle north = Angle.read(text, start, "NS", 90.0, hemisphereFirst);
        if (north == null) {
            return null;
        }
        Angle east = Angle.read(text, skip(text, north.end, " /,-"), "EW", 180.0, hemisphereFirst);
        if (east == null) {
            return null;
        }
        return new Coordinates(north.degrees, east.degrees, north.whole && east.whole, east.end);
    }

    private static int skip(String text, int from, String blanks) {
        int index = from;
        while (index < text.length() && blanks.indexOf(text.charAt(index)) >= 0) {
            index++;
        }
        return index;
    }

    private static boolean isOneOf(String text, int index, String letters) {
        return index < text.length() && letters.indexOf(text.charAt(index)) >= 0;
    }

    private record Angle(double degrees, boolean whole, int end) {

        static @Nullable Angle read(String text, int from, String hemispheres, double limit, boolean hemisphereFirst) {
            int index = from;
            char hemisphere = 0;
            if (hemisphereFirst) {
                if (!isOneOf(text, index, hemispheres)) {
                    return null;
                }
                hemisphere = text.charAt(index++);
            }
            int start = index;
            while (index < text.length() && index - start < MOST_DIGITS && isOneOf(text, index, "0123456789O.")) {
                index++;
            }
            String digits = text.substring(start, index).replace('O', '0');
            if (digits.isEmpty() || !Character.isDigit(digits.charAt(0))) {
                return null;
            }
            if (!hemisphereFirst) {
                index = skip(text, index, " ");
                if (!isOneOf(text, index, hemispheres)) {
                    return null;
                }
                hemisphere = text.charAt(index++);
            }
            // a letter that follows makes the hemisphere the beginning of a word: 20 NE is no latitude
            if (index < text.length() && Character.isLetter(text.charAt(index)) && !hemisphereFirst) {
                return null;
            }
            double magnitude = magnitude(digits, limit);
            double signed = hemisphere == 'S' || hemisphere == 'W' ? -magnitude : magnitude;
            boolean whole = digits.indexOf('.') < 0 && digits.length() <= 3;
            return new Angle(magnitude <= limit ? signed : Double.NaN, whole, index);
        }

        /** Degrees, degrees and minutes, or degrees, minutes and seconds by the number of digits. */
        private static double magnitude(String digits, double limit) {
            int point = digits.indexOf('.');
            if (point >= 0) {
                return point <= 3 && point == digits.lastIndexOf('.') && point < digits.length() - 1
                        ? Double.parseDouble(digits) : Double.NaN;
            }
            int degreeDigits = switch (digits.length()) {
                case 1, 2 -> digits.length();
                case 3 -> limit > 90.0 ? 3 : 0;
                case 4, 6 -> 2;
                case 5, 7 -> limit > 90.0 ? 3 : 0;
                default -> 0;
            };
            if (degreeDigits == 0) {
                return Double.NaN;
            }
            int minutes = part(digits, degreeDigits);
            int seconds = part(digits, degreeDigits + 2);
            if (minutes >= 60 || seconds >= 60) {
                return Double.NaN;
            }
            return Integer.parseInt(digits.substring(0, degreeDigits)) + minutes / 60.0 + seconds / 3600.0;
        }

        private static int part(String digits, int from) {
            return digits.length() >= from + 2 ? Integer.parseInt(digits.substring(from, from + 2)) : 0;
        }
    }
}
