package org.shearbook.met.decode;

import java.util.Locale;
import java.util.Map;
import org.shearbook.met.profile.AtmosphericConstants;
import org.shearbook.met.profile.Units;

/**
 * A unit in which a column of a table may be written, as the way to SI: {@code value · factor + offset}.
 */
record ColumnUnit(double factor, double offset) {

    static final ColumnUnit ONE = new ColumnUnit(1, 0);
    static final ColumnUnit CELSIUS = new ColumnUnit(1, Units.celsiusToKelvin(0));
    static final ColumnUnit PERCENT = new ColumnUnit(0.01, 0);

    static final Map<String, ColumnUnit> PRESSURES = Map.of(
            "hpa", new ColumnUnit(100, 0), "mb", new ColumnUnit(100, 0), "mbar", new ColumnUnit(100, 0), "pa", ONE, "kpa", new ColumnUnit(1000, 0));
    static final Map<String, ColumnUnit> HEIGHTS = Map.of(
            "m", ONE, "gpm", ONE, "ft", new ColumnUnit(Units.FOOT, 0), "km", new ColumnUnit(1000, 0), "dam", new ColumnUnit(10, 0), "gpdam", new ColumnUnit(10, 0),
            "m2s-2", new ColumnUnit(1 / AtmosphericConstants.GRAVITY, 0), "m2/s2", new ColumnUnit(1 / AtmosphericConstants.GRAVITY, 0), "j/kg", new ColumnUnit(1 / AtmosphericConstants.GRAVITY, 0));
    static final Map<String, ColumnUnit> LENGTHS = Map.of("m", ONE, "ft", new ColumnUnit(Units.FOOT, 0), "km", new ColumnUnit(1000, 0));
    static final Map<String, ColumnUnit> TEMPERATURES = Map.of("c", CELSIUS, "degc", CELSIUS, "celsius", CELSIUS, "k", ONE, "kelvin", ONE);
    static final Map<String, ColumnUnit> DIFFERENCES = Map.of("c", ONE, "degc", ONE, "celsius", ONE, "k", ONE, "kelvin", ONE);
    static final Map<String, ColumnUnit> HUMIDITIES = Map.of("pct", PERCENT, "%", PERCENT, "percent", PERCENT, "1", ONE, "fraction", ONE);
    static final Map<String, ColumnUnit> ANGLES = Map.of("deg", ONE, "degree", ONE, "degrees", ONE, "degn", ONE, "dege", ONE, "degt", ONE);
    static final Map<String, ColumnUnit> SPEEDS = Map.of(
            "kt", new ColumnUnit(Units.KNOT, 0), "kts", new ColumnUnit(Units.KNOT, 0), "kn", new ColumnUnit(Units.KNOT, 0), "knots", new ColumnUnit(Units.KNOT, 0),
            "ms", ONE, "m/s", ONE, "ms-1", ONE, "mps", ONE, "km/h", new ColumnUnit(1 / 3.6, 0), "kmh", new ColumnUnit(1 / 3.6, 0));
    static final Map<String, ColumnUnit> TIMES = Map.of("s", ONE, "sec", ONE, "seconds", ONE, "min", new ColumnUnit(60, 0));

    double toSi(double value) {
        return value * factor + offset;
    }

    /** A unit as the tables above spell it: lower case, without blanks and signs for powers. */
    static String canonical(String text) {
        StringBuilder unit = new StringBuilder();
        String lower = text.strip().toLowerCase(Locale.ROOT);
        for (int i = 0; i < lower.length() && unit.length() < 12; i++) {
            char c = lower.charAt(i);
            switch (c) {
                case ' ', '_', '^', '*', '·' -> { }
                case '²' -> unit.append('2');
                case '⁻', '−' -> unit.append('-');
                case '¹' -> unit.append('1');
                case '°' -> unit.append("deg");
                default -> unit.append(c);
            }
        }
        return unit.toString();
    }
}
