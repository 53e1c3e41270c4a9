package org.shearbook.met.decode;

import java.util.EnumSet;
import java.util.Set;
import org.shearbook.met.decode.ReportedLevel.Significance;

/**
 * Parts A and C of a TEMP: surface, standard levels, tropopause, maximum wind.
 *
 * <p>A level is two groups or three: above the level named in the identification the wind group is left out. Which
 * group is which follows from its place only, because a temperature of −77 °C and a maximum wind begin with the same
 * figures. When the place and the figures contradict each other the level keeps its pressure and height, its
 * temperature and wind are dropped, and reading goes on where the next level can be made out. No position is
 * looked at more than a fixed number of times, so the work grows with the length of the report and no faster.
 */
final class TempStandardLevels {

    private static final int[] PART_A = {1000, 925, 850, 700, 500, 400, 300, 250, 200, 150, 100};
    private static final int[] PART_C = {70, 50, 30, 20, 10, 7, 5, 3, 2, 1};
    /** How far ahead a lost place is sought in one go. */
    private static final int SOUGHT_AHEAD = 12;

    private final TempCursor cursor;
    private final int[] standard;
    private final boolean partA;
    private final double lowestPressureWithWind;
    private double surfacePressure = Double.NaN;
    private int next;

    /**
     * @param partA             part A, not C
     * @param lastLevelWithWind figure of the identification; {@code /} when no standard level has a wind group
     */
    TempStandardLevels(TempCursor cursor, boolean partA, char lastLevelWithWind) {
        this.cursor = cursor;
        this.partA = partA;
        this.standard = partA ? PART_A : PART_C;
        this.lowestPressureWithWind = lowestPressureWithWind(partA, lastLevelWithWind);
    }

    private static double lowestPressureWithWind(boolean partA, char figure) {
        if (figure == '/') {
            return Double.POSITIVE_INFINITY;
        }
        int value = figure - '0';
        if (partA) {
            return value == 0 ? 1000 : 100.0 * value;
        }
        return value == 0 ? 0 : 10.0 * value;
    }

    void read() {
        if (partA) {
            readSurface();
        }
        while (cursor.hasMore() && !cursor.endsLevels(cursor.at())) {
            int at = cursor.at();
            TempGroup group = cursor.group(at);
            String indicator = group.text().length() == 5 ? group.text().substring(0, 2) : "";
            int level = group.isValue() ? levelOf(indicator) : -1;
            if (level >= 0) {
                readLevel(level);
            } else if (group.isValue() && indicator.equals("88")) {
                readTropopause();
            } else if (group.isValue() && (indicator.equals("77") || indicator.equals("66"))) {
                readMaximumWind();
            } else {
                cursor.remarkShift(at, "no level begins here; the group was dropped.");
                cursor.moveTo(nextLevel(at + 1));
            }
        }
    }

    private void readSurface() {
        int at = cursor.at();
        TempGroup group = cursor.group(at);
        if (!group.isValue() || !group.text().startsWith("99")) {
            cursor.remark(Math.min(at, cursor.size() - 1), "SURFACE_MISSING", "The report has no surface level.");
            return;
        }
        if (TempCode.areDigits(group.text(), 2, 5)) {
            int figures = Integer.parseInt(group.text().substring(2));
            surfacePressure = 100.0 * (figures < 200 ? figures + 1000 : figures);
        }
        readValues(surfacePressure, Double.NaN, EnumSet.of(Significance.SURFACE), true);
    }

    private void readLevel(int level) {
        int at = cursor.at();
        next = level + 1;
        int pressure = standard[level];
        double height = TempCode.height(pressure, cursor.group(at).text().substring(2));
        if (!Double.isNaN(height) && !TempCode.isPlausibleHeight(pressure, height)) {
            cursor.remark(at, "HEIGHT_IMPLAUSIBLE", "The height " + Math.round(height) + " m does not occur at " + pressure + " hPa; it counts as missing.");
            height = Double.NaN;
        }
        Set<Significance> significance = EnumSet.of(Significance.STANDARD);
        if (100.0 * pressure > surfacePressure) {
            significance.add(Significance.BELOW_GROUND);
        }
        readValues(100.0 * pressure, height, significance, pressure >= lowestPressureWithWind);
    }

    /** Reads the temperature and, where there is one, the wind behind the group at which the reading stands. */
    private void readValues(double pressure, double height, Set<Significance> significance, boolean windExpected) {
        int at = cursor.at();
        TempGroup temperatureGroup = cursor.group(at + 1);
        TempGroup windGroup = cursor.group(at + 2);
        boolean temperatureFits = TempCode.isPlausibleTemperature(temperatureGroup);
        boolean windFits = TempCode.isPlausibleWind(windGroup, cursor.speedUnit());
        if (at + (windExpected ? 2 : 1) >= cursor.size()) {
            readCutOff(pressure, height, significance);
        } else if (windExpected && temperatureGroup.isValue() && windGroup.isValue() && levelBegins(at + 3)) {
            readWhole(pressure, height, significance, true);
        } else if (!windExpected && temperatureGroup.isValue() && levelBegins(at + 2)) {
            readWhole(pressure, height, significance, false);
        } else if (!windExpected && temperatureFits && windFits && levelBegins(at + 3)) {
            cursor.remark(at + 2, "WIND_BEYOND_LAST_LEVEL", "The report says that this level has no wind group, but one stands here; it was read.");
            readWhole(pressure, height, significance, true);
        } else if (temperatureFits && (windFits || !windExpected) && !levelBegins(at + 2)) {
            readWhole(pressure, height, significance, windExpected);
        } else {
            cursor.addLevel(pressure, height, Double.NaN, Double.NaN, TempCode.Wind.MISSING, significance);
            cursor.remarkShift(at + 1, "temperature and wind of this level can't be told apart and were dropped.");
            cursor.moveTo(levelBegins(at + 2) ? at + 2 : levelBegins(at + 3) ? at + 3 : nextLevel(at + 1));
        }
    }

    private void readWhole(double pressure, double height, Set<Significance> significance, boolean withWind) {
        int at = cursor.at();
        double[] temperature = cursor.temperatureAndDepression(at + 1);
        TempCode.Wind wind = withWind ? cursor.wind(at + 2) : TempCode.Wind.MISSING;
        cursor.addLevel(pressure, height, temperature[0], temperature[1], wind, significance);
        cursor.moveTo(at + (withWind ? 3 : 2));
    }

    private void readCutOff(double pressure, double height, Set<Significance> significance) {
        int at = cursor.at();
        double[] temperature = TempCode.isPlausibleTemperature(cursor.group(at + 1)) ? cursor.temperatureAndDepression(at + 1) : new double[] {Double.NaN, Double.NaN};
        cursor.addLevel(pressure, height, temperature[0], temperature[1], TempCode.Wind.MISSING, significance);
        cursor.remark(cursor.size() - 1, "REPORT_CUT_OFF", "The report ends inside a level. What stands before was read; ask for the report again.");
        cursor.moveTo(cursor.size());
    }

    private void readTropopause() {
        int at = cursor.at();
        String figures = cursor.group(at).text().substring(2);
        if (figures.equals("999") && levelBegins(at + 1)) {
            cursor.moveTo(at + 1);
            return;
        }
        readValues(pressureOf(figures), Double.NaN, EnumSet.of(Significance.TROPOPAUSE), true);
    }

    private void readMaximumWind() {
        int at = cursor.at();
        String figures = cursor.group(at).text().substring(2);
        if (figures.equals("999") && levelBegins(at + 1)) {
            cursor.moveTo(at + 1);
            return;
        }
        if (at + 1 >= cursor.size()) {
            cursor.remark(at, "REPORT_CUT_OFF", "The report ends inside a level. What stands before was read; ask for the report again.");
            cursor.moveTo(cursor.size());
            return;
        }
        if (!cursor.group(at + 1).isValue()) {
            cursor.remarkShift(at + 1, "the maximum wind was dropped.");
            cursor.moveTo(nextLevel(at + 1));
            return;
        }
        cursor.addLevel(pressureOf(figures), Double.NaN, Double.NaN, Double.NaN, cursor.wind(at + 1), EnumSet.of(Significance.MAXIMUM_WIND));
        TempGroup shear = cursor.group(at + 2);
        if (shear.isValue() && shear.text().charAt(0) == '4' && !TempCursor.isLaterSection(shear.text())) {
            cursor.remark(at + 2, "REPORTED_SHEAR", "Vector difference from the wind 1 km below: " + shear.text().substring(1, 3)
                    + ", 1 km above: " + shear.text().substring(3) + ", in the report's unit.");
            cursor.moveTo(at + 3);
        } else {
            cursor.moveTo(at + 2);
        }
    }

    private double pressureOf(String figures) {
        if (!TempCode.areDigits(figures, 0, 3)) {
            return Double.NaN;
        }
        return Integer.parseInt(figures) * (partA ? 100.0 : 10.0);
    }

    /** Whether at this place a level can begin, a later section does, or the report ends. */
    private boolean levelBegins(int index) {
        if (cursor.endsLevels(index)) {
            return true;
        }
        TempGroup group = cursor.group(index);
        if (!group.isValue()) {
            return false;
        }
        String indicator = group.text().substring(0, 2);
        if (indicator.equals("88") || indicator.equals("77") || indicator.equals("66")) {
            return true;
        }
        int level = levelOf(indicator);
        return level == next || level > next && fits(level, group);
    }

    /** The nearest place from an index on where a level begins that is followed by what a level needs. */
    private int nextLevel(int from) {
        for (int i = from; i < Math.min(from + SOUGHT_AHEAD, cursor.size()); i++) {
            TempGroup group = cursor.group(i);
            if (cursor.endsLevels(i)) {
                return i;
            }
            int level = group.isValue() ? levelOf(group.text().substring(0, 2)) : -1;
            boolean special = group.text().equals("88999") || group.text().equals("77999");
            if (special || level >= 0 && fits(level, group) && (TempCode.isPlausibleTemperature(cursor.group(i + 1)) || i + 1 == cursor.size())) {
                return i;
            }
        }
        int beyond = Math.min(from + SOUGHT_AHEAD, cursor.size());
        return Math.max(beyond, from);
    }

    private boolean fits(int level, TempGroup group) {
        double height = TempCode.height(standard[level], group.text().substring(2));
        return Double.isNaN(height) ? group.text().endsWith("///") : TempCode.isPlausibleHeight(standard[level], height);
    }

    /** Place in the list of standard levels, among those not yet passed; −1 for none. */
    private int levelOf(String indicator) {
        for (int i = next; i < standard.length; i++) {
            int pressure = standard[i];
            int figures = pressure == 1000 ? 0 : partA ? pressure / 10 : pressure;
            if (indicator.length() == 2 && TempCode.areDigits(indicator, 0, 2) && Integer.parseInt(indicator) == figures) {
                return i;
            }
        }
        return -1;
    }
}
