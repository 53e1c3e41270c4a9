package org.shearbook.met.decode;

import java.util.EnumSet;
import java.util.Set;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.StandardAtmosphere;

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

    /** [Pa], from memory of the code's rule that these levels lie above 500 hPa, with room for a low polar tropopause. */
    private static final double LOWEST_TROPOPAUSE = 60_000;
    private static final double LOWEST_MAXIMUM_WIND = 50_000;

    /** How far the mean temperature of a layer goes from the standard atmosphere [K]; common practice, no source. */
    private static final double COLDER_LAYER = 65;
    private static final double WARMER_LAYER = 32;

    private final TempCursor cursor;
    private final int[] standard;
    private final boolean partA;
    private final double lowestPressureWithWind;
    private double surfacePressure = Double.NaN;
    private double lastPressure = Double.NaN;
    private double lastHeight = Double.NaN;
    private boolean tropopauseSeen;
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
            int level = levelOf(group, next);
            if (level >= 0 && (begins(at, next) || isInTurn(at))) {
                readLevel(level);
            } else if (specialBegins(at)) {
                readSpecial();
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
        if (!Double.isNaN(height)) {
            lastPressure = 100.0 * pressure;
            lastHeight = height;
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
        int width = windExpected ? 3 : 2;
        if (at + width > cursor.size()) {
            readCutOff(pressure, height, significance);
            return;
        }
        TempGroup windGroup = cursor.group(at + 2);
        boolean values = cursor.group(at + 1).isValue() && (!windExpected || windGroup.isValue());
        boolean temperatureFits = TempCode.isPlausibleTemperature(cursor.group(at + 1), pressure);
        boolean windFits = TempCode.isPlausibleWind(windGroup, cursor.speedUnit());
        boolean allFits = temperatureFits && (windFits || !windExpected);
        boolean groupLost = windExpected && begins(at + 2, next);
        if (values && (begins(at + width, next) || isInTurn(at + width)) && (allFits || !groupLost)) {
            readWhole(pressure, height, significance, windExpected);
        } else if (!windExpected && temperatureFits && windFits && begins(at + 3, next)) {
            cursor.remark(at + 2, "WIND_BEYOND_LAST_LEVEL", "The report says that this level has no wind group, but one stands here; it was read.");
            readWhole(pressure, height, significance, true);
        } else if (allFits && !groupLost && !cursor.group(at + width).isValue()) {
            // The group behind is the one that slipped.
            readWhole(pressure, height, significance, windExpected);
        } else {
            if (values) {
                // One too few or too many, and it may be the first: then what was read as height is something else.
                cursor.remarkShift(at, "the groups of this level can't be told apart and were dropped.");
            } else {
                cursor.addLevel(pressure, height, Double.NaN, Double.NaN, TempCode.Wind.MISSING, significance);
                cursor.remarkShift(at + (cursor.group(at + 1).isValue() ? 2 : 1), "temperature and wind of this level were dropped.");
            }
            cursor.moveTo(begins(at + 2, next) ? at + 2 : begins(at + 3, next) ? at + 3 : nextLevel(at + 1));
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
        double[] temperature = TempCode.isPlausibleTemperature(cursor.group(at + 1), pressure) ? cursor.temperatureAndDepression(at + 1) : new double[] {Double.NaN, Double.NaN};
        cursor.addLevel(pressure, height, temperature[0], temperature[1], TempCode.Wind.MISSING, significance);
        cursor.remark(cursor.size() - 1, "REPORT_CUT_OFF", "The report ends inside a level. What stands before was read; ask for the report again.");
        cursor.moveTo(cursor.size());
    }

    private void readSpecial() {
        TempGroup group = cursor.group(cursor.at());
        if (group.text().startsWith("88")) {
            tropopauseSeen = true;
        } else if (!tropopauseSeen) {
            cursor.remark(cursor.at(), "TROPOPAUSE_MISSING", "No tropopause group stands before the maximum wind, though the code asks for one: a group may be lost here.");
            tropopauseSeen = true;
        }
        if (group.text().endsWith("999")) {
            cursor.moveTo(cursor.at() + 1);
        } else if (group.text().startsWith("88")) {
            readValues(pressureOf(group.text().substring(2)), Double.NaN, EnumSet.of(Significance.TROPOPAUSE), true);
        } else {
            readMaximumWind(group.text().substring(2));
        }
    }

    private void readMaximumWind(String figures) {
        int at = cursor.at();
        if (at + 1 >= cursor.size()) {
            cursor.remark(at, "REPORT_CUT_OFF", "The report ends inside a level. What stands before was read; ask for the report again.");
            cursor.moveTo(cursor.size());
            return;
        }
        if (!TempCode.isPlausibleWind(cursor.group(at + 1), cursor.speedUnit())) {
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

    /**
     * Whether at this place a level begins, a later section does, or the report ends. A level out of turn must look
     * like one as a whole, with the next level behind it: wind groups from the west look like the levels 300 to 200 hPa,
     * a calm like 1000 hPa.
     *
     * @param from place in the list of standard levels of the first that may come
     */
    private boolean begins(int index, int from) {
        if (cursor.endsLevels(index)) {
            return true;
        }
        TempGroup group = cursor.group(index);
        if (specialBegins(index)) {
            return true;
        }
        int level = levelOf(group, from);
        if (level < 0 || !fits(level, group)) {
            return false;
        }
        if (index + 1 >= cursor.size()) {
            return true;
        }
        if (100.0 * standard[level] > surfacePressure && TempCode.areDigits(cursor.group(index + 1).text(), 0, Math.min(2, cursor.group(index + 1).text().length()))) {
            return false;
        }
        if (level == from && standard[level] != 1000) {
            return true;
        }
        return TempCode.isPlausibleTemperature(cursor.group(index + 1), 100.0 * standard[level]) && follows(index + width(level), level + 1);
    }

    /** Whether the next level stands here by its place and its neighbours, though its height does not fit. */
    private boolean isInTurn(int index) {
        int level = levelOf(cursor.group(index), next);
        return level >= 0 && level == next && TempCode.isPlausibleTemperature(cursor.group(index + 1), 100.0 * standard[level])
                && follows(index + width(level), level + 1);
    }

    /** Whether what stands here may follow a level: less than {@link #begins} asks, so that it asks nothing further. */
    private boolean follows(int index, int from) {
        if (index >= cursor.size() || cursor.endsLevels(index)) {
            return true;
        }
        TempGroup group = cursor.group(index);
        int level = levelOf(group, from);
        return isSpecial(group) || level >= 0 && fits(level, group);
    }

    /** Whether tropopause or maximum wind begin here: they come behind the standard levels, so none may follow. */
    private boolean specialBegins(int index) {
        TempGroup group = cursor.group(index);
        if (!isSpecial(group)) {
            return false;
        }
        if (next == standard.length || group.text().endsWith("999")) {
            return true;
        }
        boolean tropopause = group.text().startsWith("88");
        int behind = index + (tropopause ? 3 : 2);
        boolean shear = !tropopause && cursor.group(behind).isValue() && cursor.group(behind).text().charAt(0) == '4' && levelOf(cursor.group(behind), next) < 0;
        behind += shear ? 1 : 0;
        return behind >= cursor.size() || cursor.endsLevels(behind) || isSpecial(cursor.group(behind));
    }

    /** Tropopause and maximum wind, or that there are none: above the middle of the troposphere, by the code's rules. */
    private boolean isSpecial(TempGroup group) {
        if (!group.isValue()) {
            return false;
        }
        String indicator = group.text().substring(0, 2);
        if (!indicator.equals("88") && !indicator.equals("77") && !indicator.equals("66")) {
            return false;
        }
        double pressure = pressureOf(group.text().substring(2));
        return group.text().endsWith("999") || pressure >= 10_000 && pressure <= (indicator.equals("88") ? LOWEST_TROPOPAUSE : LOWEST_MAXIMUM_WIND)
                || !partA && pressure > 0;
    }

    /** The nearest place from an index on where a level stands with another behind it. */
    private int nextLevel(int from) {
        int end = Math.min(from + SOUGHT_AHEAD, cursor.size());
        for (int i = from; i < end; i++) {
            int level = levelOf(cursor.group(i), next);
            boolean stands = level >= 0 && begins(i, next) && follows(i + width(level), level + 1);
            if (stands || cursor.endsLevels(i) || specialBegins(i)) {
                return i;
            }
        }
        return Math.max(end, from);
    }

    private int width(int level) {
        return standard[level] >= lowestPressureWithWind ? 3 : 2;
    }

    /** Whether the height occurs at this level and lies above the level before by what air of some temperature gives. */
    private boolean fits(int level, TempGroup group) {
        double height = TempCode.height(standard[level], group.text().substring(2));
        if (Double.isNaN(height)) {
            return group.text().endsWith("///");
        }
        if (!TempCode.isPlausibleHeight(standard[level], height)) {
            return false;
        }
        double pressure = 100.0 * standard[level];
        if (Double.isNaN(lastHeight) || pressure >= lastPressure) {
            return true;
        }
        double middle = StandardAtmosphere.temperature(StandardAtmosphere.pressureAltitude(Math.sqrt(pressure * lastPressure)));
        return height - lastHeight > MoistThermodynamics.thickness(lastPressure, pressure, middle - COLDER_LAYER)
                && height - lastHeight < MoistThermodynamics.thickness(lastPressure, pressure, middle + WARMER_LAYER);
    }

    /** Place in the list of standard levels, among those from a place on; −1 for none. */
    private int levelOf(TempGroup group, int from) {
        if (!group.isValue() || !TempCode.areDigits(group.text(), 0, 2)) {
            return -1;
        }
        int figures = Integer.parseInt(group.text().substring(0, 2));
        for (int i = from; i < standard.length; i++) {
            if (figures == (standard[i] == 1000 ? 0 : partA ? standard[i] / 10 : standard[i])) {
                return i;
            }
        }
        return -1;
    }
}
