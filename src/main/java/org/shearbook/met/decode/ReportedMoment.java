package org.shearbook.met.decode;

import java.time.DateTimeException;
import java.time.Duration;
import java.time.Instant;
import java.time.YearMonth;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import org.jspecify.annotations.Nullable;

/**
 * Days and hours without month and year. Each is taken as the newest moment that is not later than a given one plus
 * a tolerance for clocks that run fast and minutes that were rounded.
 */
final class ReportedMoment {

    /** What a report may be ahead of the moment it is received. */
    static final Duration TOLERANCE = Duration.ofMinutes(15);

    private ReportedMoment() {
    }

    /**
     * @param hour   0 to 23
     * @param minute 0 to 59
     * @return the newest moment with this hour and minute not later than {@code latest}
     */
    static Instant atOrBefore(int hour, int minute, Instant latest) {
        ZonedDateTime limit = latest.atZone(ZoneOffset.UTC);
        ZonedDateTime moment = limit.toLocalDate().atTime(hour, minute).atZone(ZoneOffset.UTC);
        return (moment.isAfter(limit) ? moment.minusDays(1) : moment).toInstant();
    }

    /**
     * @param day    of the month, 1 to 31
     * @param hour   0 to 23
     * @param minute 0 to 59
     * @return the newest such moment not later than {@code latest}; null when there is no such day in a year
     */
    static @Nullable Instant atOrBefore(int day, int hour, int minute, Instant latest) {
        if (day < 1 || day > 31 || hour > 23 || minute > 59) {
            return null;
        }
        try {
            YearMonth month = YearMonth.from(latest.atZone(ZoneOffset.UTC));
            // a day 31 is at most two months back
            for (int back = 0; back < 3; back++) {
                if (day <= month.lengthOfMonth()) {
                    Instant moment = month.atDay(day).atTime(hour, minute).toInstant(ZoneOffset.UTC);
                    if (!moment.isAfter(latest)) {
                        return moment;
                    }
                }
                month = month.minusMonths(1);
            }
        } catch (DateTimeException outsideTheCalendar) {
            return null;
        }
        return null;
    }
}
