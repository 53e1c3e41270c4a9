package org.shearbook.desk.analysis;

import org.jspecify.annotations.Nullable;

/** Numbers of a document: finite or null, with no more digits than a sounding carries. */
final class Rounded {

    private static final int DIGITS = 6;

    private Rounded() {
    }

    static @Nullable Double known(double value) {
        return Double.isFinite(value) ? finite(value) : null;
    }

    /** To six significant digits. */
    static double finite(double value) {
        if (value == 0) {
            return 0;
        }
        int decimals = DIGITS - 1 - (int) Math.floor(Math.log10(Math.abs(value)));
        if (decimals <= 0 || decimals > 300) {
            return Math.abs(value) < 1 ? 0 : Math.abs(value) < 1e15 ? Math.rint(value) : value;
        }
        double scale = Math.pow(10, decimals);
        return Math.rint(value * scale) / scale;
    }
}
