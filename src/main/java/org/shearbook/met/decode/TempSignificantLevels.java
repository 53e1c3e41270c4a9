package org.shearbook.met.decode;

import java.util.EnumSet;
import java.util.Set;
import org.shearbook.met.decode.ReportedLevel.Significance;

/**
 * Parts B and D of a TEMP: significant levels of temperature and humidity, and behind {@code 21212} those of wind.
 * Each level is two groups, the first numbered 00 (surface), 11, 22 … 99, 11 … in turn; a number may be lost.
 * A level without values bounds nothing itself: it says that between its two neighbours nothing was measured.
 */
final class TempSignificantLevels {

    private static final String WIND_SECTION = "21212";
    private static final int SOUGHT_AHEAD = 12;
    private static final int LOOKED_AHEAD = 4;
    /** How many numbers may be lost before a pair of equal figures is not taken for a number any more. */
    private static final int NUMBERS_LOST = 3;

    private final TempCursor cursor;
    private final boolean partB;
    private boolean winds;
    private int lastNumber;
    private double lastPressure;
    private boolean gapPending;

    TempSignificantLevels(TempCursor cursor, boolean partB) {
        this.cursor = cursor;
        this.partB = partB;
        startSection(false);
    }

    private void startSection(boolean ofWinds) {
        winds = ofWinds;
        lastNumber = partB ? -1 : 0;
        lastPressure = Double.POSITIVE_INFINITY;
        gapPending = false;
    }

    void read() {
        while (cursor.hasMore() && !cursor.endsLevels(cursor.at())) {
            int at = cursor.at();
            TempGroup group = cursor.group(at);
            if (group.text().equals(WIND_SECTION)) {
                startSection(true);
                cursor.moveTo(at + 1);
            } else if (levelBegins(at)) {
                readLevel();
            } else {
                cursor.remarkShift(at, "no level begins here; the group was dropped.");
                cursor.moveTo(nextLevel(at + 1));
            }
        }
    }

    private void readLevel() {
        int at = cursor.at();
        String figures = cursor.group(at).text().substring(2);
        TempGroup values = cursor.group(at + 1);
        if (at + 1 >= cursor.size()) {
            cursor.remark(at, "REPORT_CUT_OFF", "The report ends inside a level. What stands before was read; ask for the report again.");
            cursor.moveTo(cursor.size());
            return;
        }
        if (figures.equals("///")) {
            lastNumber = numberOf(cursor.group(at));
            markBoundaryBefore();
            gapPending = true;
            cursor.moveTo(at + 2);
            return;
        }
        int number = numberOf(cursor.group(at));
        double pressure = pressureOf(figures);
        int behind = chain(at + 2, number, pressure);
        boolean lost = !values.isValue() || chain(at + 1, number, pressure) > behind || behind == 0 && cursor.group(at + 2).isValue();
        lastNumber = number;
        lastPressure = pressure;
        if (lost) {
            cursor.remarkShift(at + 1, "the level at " + hectopascals(pressure) + " hPa has lost its values and was dropped.");
            cursor.moveTo(levelBegins(at + 2) ? at + 2 : nextLevel(at + 1));
            return;
        }
        Set<Significance> significance = EnumSet.of(winds ? Significance.SIGNIFICANT_WIND : Significance.SIGNIFICANT_TEMPERATURE);
        if (partB && number == 0) {
            significance.add(Significance.SURFACE);
        }
        if (gapPending) {
            significance.add(boundary());
            gapPending = false;
        }
        if (winds) {
            cursor.addLevel(pressure, Double.NaN, Double.NaN, Double.NaN, cursor.wind(at + 1), significance);
        } else {
            double[] temperature = cursor.temperatureAndDepression(at + 1);
            cursor.addLevel(pressure, Double.NaN, temperature[0], temperature[1], TempCode.Wind.MISSING, significance);
        }
        cursor.moveTo(at + 2);
    }

    private void markBoundaryBefore() {
        int last = cursor.levels().size() - 1;
        if (last < 0 || !cursor.levels().get(last).significance().contains(winds ? Significance.SIGNIFICANT_WIND : Significance.SIGNIFICANT_TEMPERATURE)) {
            return;
        }
        ReportedLevel level = cursor.levels().get(last);
        Set<Significance> significance = EnumSet.copyOf(level.significance());
        significance.add(boundary());
        cursor.levels().set(last, new ReportedLevel(level.pressure(), level.height(), level.temperature(), level.dewPoint(),
                level.windFromDirection(), level.windSpeed(), level.elapsed(), level.latitude(), level.longitude(), significance));
    }

    private Significance boundary() {
        return winds ? Significance.WIND_MISSING_BOUNDARY : Significance.TEMPERATURE_MISSING_BOUNDARY;
    }

    /** Whether at this place a level can begin, another section does, or the report ends. */
    private boolean levelBegins(int index) {
        return levelBeginsAfter(index, lastNumber, lastPressure);
    }

    private boolean levelBeginsAfter(int index, int number, double pressure) {
        return cursor.endsLevels(index) || !winds && cursor.group(index).text().equals(WIND_SECTION) || isNumbered(cursor.group(index), number, pressure);
    }

    /** How many levels in a row, up to a few, can be made out from a place on; the end and another section count as all of them. */
    private int chain(int index, int number, double pressure) {
        int length = 0;
        int at = index;
        int lastOfChain = number;
        double pressureOfChain = pressure;
        while (length < LOOKED_AHEAD) {
            if (cursor.endsLevels(at) || !winds && cursor.group(at).text().equals(WIND_SECTION)) {
                return LOOKED_AHEAD;
            }
            if (!isNumbered(cursor.group(at), lastOfChain, pressureOfChain)) {
                return length;
            }
            lastOfChain = numberOf(cursor.group(at));
            String figures = cursor.group(at).text().substring(2);
            pressureOfChain = TempCode.areDigits(figures, 0, 3) ? pressureOf(figures) : pressureOfChain;
            length++;
            at += 2;
        }
        return length;
    }

    /** Whether the group is a level's first one that may follow the given level: next in number, or a few later and higher up. */
    private boolean isNumbered(TempGroup group, int number, double pressure) {
        int own = numberOf(group);
        if (own < 0) {
            return false;
        }
        int ahead = number < 0 ? own : number == 0 ? own - 1 : Math.floorMod(own - number - 1, 9);
        if (own == 0 && number >= 0 || ahead > NUMBERS_LOST) {
            return false;
        }
        String figures = group.text().substring(2);
        return figures.equals("///") || TempCode.areDigits(figures, 0, 3) && (pressureOf(figures) < pressure || ahead == 0 && pressureOf(figures) == pressure);
    }

    /** 0 for 00, 1 for 11 … 9 for 99; −1 for anything else. */
    private static int numberOf(TempGroup group) {
        String text = group.text();
        if (!group.isValue() || text.charAt(0) != text.charAt(1) || !TempCode.isDigit(text.charAt(0))) {
            return -1;
        }
        return text.charAt(0) - '0';
    }

    private double pressureOf(String figures) {
        int value = Integer.parseInt(figures);
        if (!partB) {
            return 10.0 * value;
        }
        return 100.0 * (value < 100 ? value + 1000 : value);
    }

    private int nextLevel(int from) {
        int end = Math.min(from + SOUGHT_AHEAD, cursor.size());
        for (int i = from; i < end; i++) {
            boolean section = cursor.endsLevels(i) || !winds && cursor.group(i).text().equals(WIND_SECTION);
            if (section || levelBegins(i) && cursor.group(i + 1).isValue() && levelBeginsAfter(i + 2, numberOf(cursor.group(i)), pressureFrom(cursor.group(i)))) {
                return i;
            }
        }
        return Math.max(end, from);
    }

    private double pressureFrom(TempGroup group) {
        String figures = group.text().substring(2);
        return TempCode.areDigits(figures, 0, 3) ? pressureOf(figures) : lastPressure;
    }

    private static String hectopascals(double pressure) {
        return pressure % 100 == 0 ? String.valueOf(Math.round(pressure / 100)) : String.valueOf(pressure / 100);
    }
}
