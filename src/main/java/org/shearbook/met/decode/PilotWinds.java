package org.shearbook.met.decode;

import java.util.EnumSet;
import java.util.Set;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.Units;

/**
 * Parts of FM 32 PILOT. B and D: winds at heights, three to a leading group {@code 9tuuu} in units of 300 m
 * ({@code 8tuuu}: 500 m). Stations of the United States count in thousands of feet instead; the report does not say
 * so, hence the block of the station decides and a remark tells. A and C: winds at standard levels, {@code 55nPP} or
 * {@code 44nPP} with the first of them, and the maximum wind. Behind {@code 21212} in part B some services add winds at
 * heights in tens of metres, {@code nhhhh} with a running figure.
 */
final class PilotWinds {

    private static final String TENS_OF_METRES = "21212";
    private static final double UNIT = 300;
    private static final double LARGE_UNIT = 500;
    private static final int[] STANDARD = {1000, 925, 850, 700, 500, 400, 300, 250, 200, 150, 100, 70, 50, 30, 20, 10};

    private final TempCursor cursor;
    private final boolean upper;
    private final double unit;

    /**
     * @param upper     part C or D
     * @param stationId its block decides the unit of height
     */
    PilotWinds(TempCursor cursor, boolean upper, String stationId) {
        this.cursor = cursor;
        this.upper = upper;
        boolean inFeet = stationId.startsWith("70") || stationId.startsWith("72") || stationId.startsWith("74");
        this.unit = inFeet ? Units.THOUSAND_FEET : UNIT;
        if (inFeet && cursor.hasMore()) {
            cursor.remark(cursor.at(), "HEIGHT_UNIT_ASSUMED", "Heights were taken as thousands of feet, the practice of this station's country; the code's own unit is 300 m.");
        }
    }

    void readHeights() {
        while (cursor.hasMore() && !cursor.endsLevels(cursor.at())) {
            int at = cursor.at();
            String group = cursor.group(at).text();
            if (group.equals(TENS_OF_METRES)) {
                readTensOfMetres();
                continue;
            }
            if (!leads(cursor.group(at))) {
                cursor.remarkShift(at, "no heights stand here; the group was dropped.");
                cursor.moveTo(at + 1);
                continue;
            }
            readThree(group);
        }
    }

    /** Reads the winds behind one leading group; when one is lost or too many, nobody can say which, and none is read. */
    private void readThree(String heights) {
        int first = cursor.at() + 1;
        int winds = 0;
        for (int i = 2; i < 5; i++) {
            winds += TempCode.isDigit(heights.charAt(i)) ? 1 : 0;
        }
        boolean complete = cursor.endsLevels(first + winds) || leads(cursor.group(first + winds)) || cursor.group(first + winds).text().equals(TENS_OF_METRES);
        for (int i = first; i < first + winds; i++) {
            complete &= TempCode.isPlausibleWind(cursor.group(i), cursor.speedUnit()) && !TempCursor.isLaterSection(cursor.group(i).text());
        }
        if (!complete) {
            cursor.remarkShift(Math.min(first, cursor.size() - 1), "the winds behind '" + heights + "' are not as many as it announces and were dropped.");
            int next = first;
            while (next < cursor.size() && !cursor.endsLevels(next) && !leads(cursor.group(next)) && !cursor.group(next).text().equals(TENS_OF_METRES)) {
                next++;
            }
            cursor.moveTo(next);
            return;
        }
        double step = heights.charAt(0) == '8' ? LARGE_UNIT : unit;
        int index = first;
        for (int i = 2; i < 5; i++) {
            if (TempCode.isDigit(heights.charAt(i))) {
                int count = 10 * (heights.charAt(1) - '0') + heights.charAt(i) - '0';
                Set<Significance> significance = EnumSet.of(count == 0 ? Significance.SURFACE : Significance.SIGNIFICANT_WIND);
                cursor.addLevel(Double.NaN, count == 0 ? Double.NaN : count * step, Double.NaN, Double.NaN, cursor.wind(index), significance);
                index++;
            }
        }
        cursor.moveTo(first + winds);
    }

    private static boolean leads(TempGroup group) {
        return group.isValue() && (group.text().charAt(0) == '9' || group.text().charAt(0) == '8') && TempCode.isDigit(group.text().charAt(1))
                && !group.text().startsWith("99");
    }

    private void readTensOfMetres() {
        int at = cursor.at() + 1;
        while (!cursor.endsLevels(at) && at + 1 < cursor.size() && cursor.group(at).isValue() && TempCode.areDigits(cursor.group(at).text(), 0, 5)
                && TempCode.isPlausibleWind(cursor.group(at + 1), cursor.speedUnit())) {
            double height = 10.0 * Integer.parseInt(cursor.group(at).text().substring(1));
            cursor.addLevel(Double.NaN, height, Double.NaN, Double.NaN, cursor.wind(at + 1), EnumSet.of(Significance.SIGNIFICANT_WIND));
            at += 2;
        }
        if (!cursor.endsLevels(at)) {
            cursor.remarkShift(at, "the winds from here on were dropped.");
            while (!cursor.endsLevels(at)) {
                at++;
            }
        }
        cursor.moveTo(at);
    }

    void readPressures() {
        while (cursor.hasMore() && !cursor.endsLevels(cursor.at())) {
            int at = cursor.at();
            TempGroup group = cursor.group(at);
            String text = group.text();
            int first = group.isValue() && (text.startsWith("55") || text.startsWith("44")) ? indexOf(text.substring(3)) : -1;
            if (first >= 0 && TempCode.isDigit(text.charAt(2))) {
                readFrom(first, text.charAt(2) - '0');
            } else if (group.isValue() && (text.charAt(0) == '7' || text.charAt(0) == '6')) {
                readMaximumWind(text);
            } else {
                cursor.remarkShift(at, "no level begins here; the group was dropped.");
                cursor.moveTo(at + 1);
            }
        }
    }

    private void readFrom(int first, int count) {
        int begin = cursor.at() + 1;
        boolean complete = first + count <= STANDARD.length
                && (cursor.endsLevels(begin + count) || cursor.group(begin + count).isValue() && "4567".indexOf(cursor.group(begin + count).text().charAt(0)) >= 0);
        for (int i = begin; i < begin + count; i++) {
            complete &= TempCode.isPlausibleWind(cursor.group(i), cursor.speedUnit());
        }
        if (!complete) {
            cursor.remarkShift(Math.min(begin, cursor.size() - 1), "the winds of this row are not as many as it announces and were dropped.");
            int next = begin;
            while (next < cursor.size() && !cursor.endsLevels(next) && "4567".indexOf(cursor.group(next).text().charAt(0)) < 0) {
                next++;
            }
            cursor.moveTo(next);
            return;
        }
        for (int i = 0; i < count; i++) {
            cursor.addLevel(100.0 * STANDARD[first + i], Double.NaN, Double.NaN, Double.NaN, cursor.wind(begin + i), EnumSet.of(Significance.STANDARD));
        }
        cursor.moveTo(begin + count);
    }

    /** {@code 77PPP} with a pressure, or {@code 7HHHH} with a height in tens of metres. */
    private void readMaximumWind(String text) {
        int at = cursor.at();
        if (text.equals("77999")) {
            cursor.moveTo(at + 1);
            return;
        }
        if (!TempCode.areDigits(text, 1, 5) || !TempCode.isPlausibleWind(cursor.group(at + 1), cursor.speedUnit())) {
            cursor.remarkShift(at, "the maximum wind was dropped.");
            cursor.moveTo(at + 1);
            return;
        }
        boolean byPressure = text.startsWith("77") || text.startsWith("66");
        double pressure = byPressure ? Integer.parseInt(text.substring(2)) * (upper ? 10.0 : 100.0) : Double.NaN;
        double height = byPressure ? Double.NaN : 10.0 * Integer.parseInt(text.substring(1));
        cursor.addLevel(pressure, height, Double.NaN, Double.NaN, cursor.wind(at + 1), EnumSet.of(Significance.MAXIMUM_WIND));
        cursor.moveTo(at + 2);
        TempGroup shear = cursor.group(at + 2);
        if (shear.isValue() && shear.text().charAt(0) == '4' && !TempCursor.isLaterSection(shear.text()) && indexOf(shear.text().substring(3)) < 0) {
            cursor.moveTo(at + 3);
        }
    }

    private static int indexOf(String figures) {
        for (int i = 0; i < STANDARD.length; i++) {
            int code = STANDARD[i] == 1000 ? 0 : STANDARD[i] >= 100 ? STANDARD[i] / 10 : STANDARD[i];
            if (TempCode.areDigits(figures, 0, 2) && Integer.parseInt(figures) == code) {
                return i;
            }
        }
        return -1;
    }
}
