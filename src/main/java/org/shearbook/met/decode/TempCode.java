package org.shearbook.met.decode;

import org.shearbook.met.profile.StandardAtmosphere;
import org.shearbook.met.profile.Units;

/**
 * The groups of FM 35 TEMP and FM 32 PILOT one by one (WMO-No. 306, Vol. I.1): temperature with its sign in the
 * tenths, dew-point depression, wind with its odd five degrees in the speed, and heights without their thousands.
 * {@code /} is missing and becomes {@code NaN}.
 */
final class TempCode {

    /** A wind above this is not a wind [m s⁻¹]. */
    static final double HIGHEST_SPEED = 150;

    private static final double LOWEST_TEMPERATURE = Units.celsiusToKelvin(-100);
    private static final double HIGHEST_TEMPERATURE = Units.celsiusToKelvin(55);

    /** Room for the coldest surface and the warmest polar stratosphere [K]; common practice, no source. */
    private static final double MUCH_COLDER = 65;
    private static final double MUCH_WARMER = 37;

    private TempCode() {
    }

    /** Direction [degrees] and speed [m s⁻¹]; both {@code NaN} when the group gives none. */
    record Wind(double fromDirection, double speed) {

        static final Wind MISSING = new Wind(Double.NaN, Double.NaN);
    }

    static boolean isDigit(char c) {
        return c >= '0' && c <= '9';
    }

    static boolean areDigits(String text, int from, int to) {
        for (int i = from; i < to; i++) {
            if (!isDigit(text.charAt(i))) {
                return false;
            }
        }
        return true;
    }

    /**
     * {@code TTTDD}: whole degrees, then tenths that are even for temperatures of zero and above and odd below
     * (code table 3931).
     *
     * @return [K]
     */
    static double temperature(String group) {
        if (!areDigits(group, 0, 3)) {
            return Double.NaN;
        }
        double magnitude = Integer.parseInt(group.substring(0, 3)) / 10.0;
        return Units.celsiusToKelvin((group.charAt(2) - '0') % 2 == 0 ? magnitude : -magnitude);
    }

    /**
     * {@code TTTDD}: 00 to 50 are tenths, 56 to 99 are whole degrees plus 50, 51 to 55 are not used (code table 0777).
     *
     * @return dew-point depression [K]
     */
    static double depression(String group) {
        if (!areDigits(group, 3, 5)) {
            return Double.NaN;
        }
        int code = Integer.parseInt(group.substring(3));
        if (code <= 50) {
            return code / 10.0;
        }
        return code <= 55 ? Double.NaN : code - 50;
    }

    static boolean usesUnusedDepression(String group) {
        return areDigits(group, 3, 5) && group.charAt(3) == '5' && group.charAt(4) >= '1' && group.charAt(4) <= '5';
    }

    /**
     * Whether the group can be the temperature at a pressure: no unused depression, and no further from the standard
     * atmosphere than the climate goes. For telling groups apart only, not a check of what was measured.
     *
     * @param pressure [Pa]; {@code NaN} when unknown
     */
    static boolean isPlausibleTemperature(TempGroup group, double pressure) {
        if (!group.isValue() || usesUnusedDepression(group.text())) {
            return false;
        }
        double temperature = temperature(group.text());
        if (Double.isNaN(temperature)) {
            return group.text().startsWith("//");
        }
        if (!StandardAtmosphere.covers(pressure)) {
            return temperature >= LOWEST_TEMPERATURE && temperature <= HIGHEST_TEMPERATURE;
        }
        double standard = StandardAtmosphere.temperature(StandardAtmosphere.pressureAltitude(pressure));
        return temperature >= standard - MUCH_COLDER && temperature <= standard + MUCH_WARMER;
    }

    static boolean isPlausibleWind(TempGroup group, double unit) {
        return group.isValue() && (group.text().equals("/////") || !Double.isNaN(wind(group.text(), unit).speed()));
    }

    /**
     * {@code ddfff}: tens of degrees and speed; 500 added to the speed adds 5° to the direction. {@code 00000} is calm.
     * A direction above 360° or from 000° with a speed, and a speed that does not occur, give no wind. A variable
     * direction ({@code 99}) leaves the speed alone.
     *
     * @param unit of the speed [m s⁻¹]
     */
    static Wind wind(String group, double unit) {
        if (!areDigits(group, 0, 5)) {
            return Wind.MISSING;
        }
        int tens = Integer.parseInt(group.substring(0, 2));
        int speed = Integer.parseInt(group.substring(2));
        int direction = 10 * tens;
        if (speed >= 500) {
            speed -= 500;
            direction += 5;
        }
        if (tens == 99) {
            return speed * unit <= HIGHEST_SPEED ? new Wind(Double.NaN, speed * unit) : Wind.MISSING;
        }
        if (direction > 360 || direction == 0 && speed > 0 || speed * unit > HIGHEST_SPEED) {
            return Wind.MISSING;
        }
        return new Wind(direction, speed * unit);
    }

    /**
     * Geopotential height of a standard level from its three figures: metres without thousands below 500 hPa, tens of
     * metres without tens of thousands from 500 hPa up. The missing figure is the one that brings the height nearest
     * to its middle value in the climate. At 1000 hPa a height below sea level has 500 added to its amount.
     *
     * @param pressure [hPa]
     * @return [gpm]; {@code NaN} when missing
     */
    static double height(int pressure, String figures) {
        if (!areDigits(figures, 0, 3)) {
            return Double.NaN;
        }
        int value = Integer.parseInt(figures);
        if (pressure == 1000) {
            return value >= 500 ? 500 - value : value;
        }
        boolean tensOfMetres = pressure <= 500;
        double reported = tensOfMetres ? 10 * value : value;
        double turn = tensOfMetres ? 10_000 : 1_000;
        return reported + turn * Math.round((middleHeight(pressure) - reported) / turn);
    }

    /** Whether such a height of a standard level occurs anywhere. */
    static boolean isPlausibleHeight(int pressure, double height) {
        double tolerance = pressure >= 1000 ? 600 : pressure >= 850 ? 500 : pressure >= 700 ? 700 : pressure >= 400 ? 1_100 : pressure >= 100 ? 1_500 : 2_500;
        return Math.abs(height - middleHeight(pressure)) <= tolerance;
    }

    /** Middle heights of the standard levels in the climate; common practice, no source. */
    private static double middleHeight(int pressure) {
        return switch (pressure) {
            case 1000 -> 110;
            case 925 -> 700;
            case 850 -> 1_400;
            case 700 -> 2_900;
            case 500 -> 5_500;
            case 400 -> 7_100;
            case 300 -> 9_100;
            case 250 -> 10_300;
            case 200 -> 11_700;
            case 150 -> 13_500;
            case 100 -> 16_100;
            case 70 -> 18_400;
            case 50 -> 20_500;
            case 30 -> 23_700;
            case 20 -> 26_300;
            case 10 -> 30_900;
            case 7 -> 33_300;
            case 5 -> 35_800;
            case 3 -> 39_400;
            case 2 -> 42_400;
            case 1 -> 47_800;
            default -> throw new IllegalArgumentException("not a standard level: " + pressure + " hPa");
        };
    }
}
