package org.shearbook.met.decode;

import java.time.DateTimeException;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import org.jspecify.annotations.Nullable;

/**
 * The header record of a sounding in a station file of the Integrated Global Radiosonde Archive, version 2: the
 * columns that sounding files and files of derived parameters share.
 *
 * <p>The hour is the provider's; the release time has no date of its own. It is put on the day that brings it within
 * half a day of the hour. Where the hour is missing, a release at 21 UTC or later is put on the evening before the
 * date: the archive holds such soundings a second time with the hour 00 of that date.
 *
 * @param stationId  11 characters
 * @param nominalAt  null when the hour is missing
 * @param launchedAt null when the release time is missing
 * @param levels     how many level records the header announces
 */
record IgraHeader(String stationId, @Nullable Instant nominalAt, @Nullable Instant launchedAt, int levels) {

    private static final int LATEST_HOUR_OF_THE_SAME_DATE = 20;

    /** Whether a line has the shape of such a header: by its fixed columns, not by its values. */
    static boolean isShapeOf(CharSequence line) {
        if (line.length() < 36 || line.charAt(0) != '#') {
            return false;
        }
        for (int i = 1; i <= 11; i++) {
            char c = line.charAt(i);
            if (!(c >= 'A' && c <= 'Z' || c >= '0' && c <= '9')) {
                return false;
            }
        }
        for (int blank : new int[] {12, 17, 20, 23, 26}) {
            if (line.charAt(blank) != ' ') {
                return false;
            }
        }
        for (int digit : new int[] {13, 14, 15, 16, 18, 19, 21, 22, 24, 25, 27, 28, 29, 30}) {
            if (line.charAt(digit) < '0' || line.charAt(digit) > '9') {
                return false;
            }
        }
        return true;
    }

    /**
     * Reads the shared columns.
     *
     * @param line        the header record
     * @param lineNumber  for the remarks
     * @param levelsFrom  column in which the number of levels begins, from 1; it ends in column 36
     * @param remarks     takes what was assumed
     */
    static IgraHeader read(String line, int lineNumber, int levelsFrom, RemarkList remarks) throws Unreadable {
        if (!isShapeOf(line)) {
            throw new Unreadable(lineNumber, 1, "IGRA_HEADER", "This is not a header record: station in columns 2-12, year 14-17, month 19-20, "
                    + "day 22-23, hour 25-26, release time 28-31, number of levels 33-36. Compare the line with the archive's.");
        }
        int year = number(line, 14, 17);
        int month = number(line, 19, 20);
        int day = number(line, 22, 23);
        int hour = number(line, 25, 26);
        int releaseHour = number(line, 28, 29);
        int releaseMinute = number(line, 30, 31);
        LocalDateTime date;
        try {
            date = LocalDateTime.of(year, month, day, 0, 0);
        } catch (DateTimeException noSuchDay) {
            throw new Unreadable(lineNumber, 14, "IGRA_HEADER", "There is no such day: " + line.substring(13, 23) + ". Compare the line with the archive's.");
        }
        if (hour > 23 && hour != 99) {
            throw new Unreadable(lineNumber, 25, "IGRA_HEADER", "The hour " + hour + " is neither 00 to 23 nor 99 (missing). Compare the line with the archive's.");
        }
        int levels;
        try {
            levels = Integer.parseInt(line.substring(levelsFrom - 1, 36).strip());
        } catch (NumberFormatException notANumber) {
            throw new Unreadable(lineNumber, levelsFrom, "IGRA_HEADER", "The number of levels can't be read: '" + line.substring(levelsFrom - 1, 36) + "'. Compare the line with the archive's.");
        }
        if (levels < 0) {
            throw new Unreadable(lineNumber, levelsFrom, "IGRA_HEADER", "The number of levels is negative. Compare the line with the archive's.");
        }
        Instant nominalAt = hour == 99 ? null : date.plusHours(hour).toInstant(ZoneOffset.UTC);
        if (nominalAt == null) {
            remarks.add(lineNumber, 25, "NOMINAL_HOUR_MISSING", "The archive does not give the hour of this sounding; only its release time places it.");
        }
        return new IgraHeader(line.substring(1, 12), nominalAt,
                launch(date, nominalAt, releaseHour, releaseMinute, lineNumber, remarks), levels);
    }

    private static @Nullable Instant launch(LocalDateTime date, @Nullable Instant nominalAt, int hour, int minute, int lineNumber, RemarkList remarks) {
        if (hour == 99) {
            return null;
        }
        if (hour > 23 || minute > 59 && minute != 99) {
            remarks.add(lineNumber, 28, "RELEASE_TIME_UNREADABLE", "The release time is not a time of day and was left out.");
            return null;
        }
        if (minute == 99) {
            remarks.add(lineNumber, 30, "RELEASE_MINUTE_MISSING", "The archive gives only the hour of release; the full hour was taken.");
        }
        Instant sameDate = date.plusHours(hour).plusMinutes(minute == 99 ? 0 : minute).toInstant(ZoneOffset.UTC);
        if (nominalAt == null) {
            return hour > LATEST_HOUR_OF_THE_SAME_DATE ? sameDate.minus(Duration.ofDays(1)) : sameDate;
        }
        Duration after = Duration.between(nominalAt, sameDate);
        Duration halfDay = Duration.ofHours(12);
        if (after.compareTo(halfDay) > 0) {
            return sameDate.minus(Duration.ofDays(1));
        }
        return after.compareTo(halfDay.negated()) < 0 ? sameDate.plus(Duration.ofDays(1)) : sameDate;
    }

    private static int number(String line, int from, int to) {
        return Integer.parseInt(line.substring(from - 1, to));
    }
}
