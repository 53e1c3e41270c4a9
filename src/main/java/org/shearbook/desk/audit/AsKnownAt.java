package org.shearbook.desk.audit;

import java.time.Instant;

/**
 * The moment whose knowledge a read shows: the newest version with {@code recorded_at <= moment}. Because
 * {@code recorded_at} never runs backwards, what a past moment showed once it shows for ever.
 */
public record AsKnownAt(Instant moment) {

    private static final Instant ALL_THERE_IS = Instant.parse("9999-12-31T00:00:00Z");

    /** All that is known now. */
    public static AsKnownAt now() {
        return new AsKnownAt(ALL_THERE_IS);
    }

    public boolean isNow() {
        return moment.equals(ALL_THERE_IS);
    }
}
