package org.shearbook.desk.timeheight;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.time.Instant;
import java.time.LocalTime;
import java.util.List;
import org.junit.jupiter.api.Test;

class TimeShownTests {

    private static final List<LocalTime> TWELVE_HOURS = List.of(LocalTime.of(6, 0), LocalTime.of(18, 0));
    private static final List<LocalTime> EIGHT_HOURS = List.of(LocalTime.of(6, 0), LocalTime.of(14, 0), LocalTime.of(22, 0));

    @Test
    void aDayAndThreeDaysReachTwelveHoursAheadOnWholeHours() {
        Instant now = Instant.parse("2031-03-12T11:42:07Z");
        assertThat(TimeShown.day(now)).isEqualTo(shown("2031-03-11T23:00:00Z", "2031-03-12T23:00:00Z"));
        assertThat(TimeShown.threeDays(now)).isEqualTo(shown("2031-03-09T23:00:00Z", "2031-03-12T23:00:00Z"));
        assertThat(TimeShown.threeDays(now).length()).isEqualTo(Duration.ofHours(72));
    }

    @Test
    void theShiftIsTheOneThatIsOnNow() {
        assertThat(TimeShown.shift(Instant.parse("2031-03-12T11:42:07Z"), TWELVE_HOURS)).isEqualTo(shown("2031-03-12T06:00:00Z", "2031-03-12T18:00:00Z"));
        assertThat(TimeShown.shift(Instant.parse("2031-03-12T18:00:00Z"), TWELVE_HOURS)).isEqualTo(shown("2031-03-12T18:00:00Z", "2031-03-13T06:00:00Z"));
        assertThat(TimeShown.shift(Instant.parse("2031-03-12T02:00:00Z"), TWELVE_HOURS)).isEqualTo(shown("2031-03-11T18:00:00Z", "2031-03-12T06:00:00Z"));
        assertThat(TimeShown.shift(Instant.parse("2031-03-12T23:59:59Z"), EIGHT_HOURS)).isEqualTo(shown("2031-03-12T22:00:00Z", "2031-03-13T06:00:00Z"));
    }

    private static TimeShown shown(String from, String until) {
        return new TimeShown(Instant.parse(from), Instant.parse(until));
    }
}
