package org.shearbook.desk.overview;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** When the next ascent is due and since when one is missing, by the nominal hours of the office. */
final class AscentRhythm {

    private final List<Integer> hours;
    private final Duration grace;

    AscentRhythm(List<Integer> hours, Duration grace) {
        this.hours = hours.stream().sorted().toList();
        this.grace = grace;
    }

    /** The first nominal hour after a moment. */
    Instant nextAfter(Instant moment) {
        Instant day = moment.atZone(ZoneOffset.UTC).truncatedTo(ChronoUnit.DAYS).toInstant();
        for (int ahead = 0; ahead <= 1; ahead++) {
            for (int hour : hours) {
                Instant nominal = day.plus(Duration.ofDays(ahead)).plus(Duration.ofHours(hour));
                if (nominal.isAfter(moment)) {
                    return nominal;
                }
            }
        }
        throw new IllegalStateException("An office has at least one nominal hour");
    }

    /** The nominal hour of the first ascent that should have arrived by {@code now} and did not; null when none is missing. */
    @Nullable Instant missingSince(Instant newestNominal, Instant now) {
        Instant next = nextAfter(newestNominal);
        return next.plus(grace).isAfter(now) ? null : next;
    }
}
