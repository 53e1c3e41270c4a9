package org.shearbook.desk.overview;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Nominal hours 00 and 12, 90 minutes to arrive (common practice, no source). */
class AscentRhythmTests {

    private final AscentRhythm rhythm = new AscentRhythm(List.of(12, 0), Duration.ofMinutes(90));

    @Test
    void theNextAscentIsDueAtTheNextNominalHour() {
        assertThat(rhythm.nextAfter(Instant.parse("2031-03-12T11:59:00Z"))).isEqualTo("2031-03-12T12:00:00Z");
        assertThat(rhythm.nextAfter(Instant.parse("2031-03-12T12:00:00Z"))).isEqualTo("2031-03-13T00:00:00Z");
    }

    @Test
    void anAscentIsMissingOnceItsTimeToArriveIsOver() {
        Instant newest = Instant.parse("2031-03-11T00:00:00Z");
        assertThat(rhythm.missingSince(newest, Instant.parse("2031-03-11T13:29:00Z"))).isNull();
        assertThat(rhythm.missingSince(newest, Instant.parse("2031-03-11T13:30:00Z"))).isEqualTo("2031-03-11T12:00:00Z");
        // however long it lasts, it is missing since the first that did not come
        assertThat(rhythm.missingSince(newest, Instant.parse("2031-03-12T06:15:00Z"))).isEqualTo("2031-03-11T12:00:00Z");
    }

    @Test
    void aSpecialAscentBetweenTheHoursIsFollowedByTheNextHour() {
        assertThat(rhythm.missingSince(Instant.parse("2031-03-12T18:00:00Z"), Instant.parse("2031-03-12T23:00:00Z"))).isNull();
        assertThat(rhythm.missingSince(Instant.parse("2031-03-12T18:00:00Z"), Instant.parse("2031-03-13T01:30:00Z"))).isEqualTo("2031-03-13T00:00:00Z");
    }
}
