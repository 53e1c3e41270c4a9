package org.shearbook.desk.timeheight;

import java.time.Duration;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalTime;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.List;

/**
 * The time a picture shows.
 *
 * @param until after {@code from}
 */
public record TimeShown(Instant from, Instant until) {

    /** Half of it past, half to come, on whole hours. */
    static TimeShown day(Instant now) {
        Instant hour = now.truncatedTo(ChronoUnit.HOURS);
        return new TimeShown(hour.minus(Duration.ofHours(12)), hour.plus(Duration.ofHours(12)));
    }

    /** Two and a half days past, half a day to come. */
    static TimeShown threeDays(Instant now) {
        Instant hour = now.truncatedTo(ChronoUnit.HOURS);
        return new TimeShown(hour.minus(Duration.ofHours(60)), hour.plus(Duration.ofHours(12)));
    }

    /**
     * The shift that is on now.
     *
     * @param begins when shifts begin, ascending, at least one
     */
    static TimeShown shift(Instant now, List<LocalTime> begins) {
        LocalDate today = now.atZone(ZoneOffset.UTC).toLocalDate();
        Instant from = null;
        for (int day = -1; day <= 1; day++) {
            for (LocalTime begin : begins) {
                Instant start = today.plusDays(day).atTime(begin).toInstant(ZoneOffset.UTC);
                if (start.isAfter(now)) {
                    return new TimeShown(from == null ? start.minus(Duration.ofDays(1)) : from, start);
                }
                from = start;
            }
        }
        throw new IllegalArgumentException("no shift begins within a day of " + now);
    }

    Duration length() {
        return Duration.between(from, until);
    }
}
