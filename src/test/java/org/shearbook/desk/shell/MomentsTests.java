package org.shearbook.desk.shell;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Instant;
import org.junit.jupiter.api.Test;

/** Moments as people and scripts write them. */
class MomentsTests {

    @Test
    void secondsOffsetAndLetterTMayBeLeftOutAndUtcIsMeant() {
        Instant expected = Instant.parse("2031-03-12T06:15:00Z");
        for (String text : new String[] {"2031-03-12T06:15:00Z", "2031-03-12T06:15Z", "2031-03-12 06:15Z", " 2031-03-12t06:15 ", "2031-03-12T08:15+02:00",
                "2031-03-12T08:15 02:00"}) {
            assertThat(Moments.read("from", text)).as(text).isEqualTo(expected);
        }
        assertThat(Moments.read("from", "2031-03-12")).isEqualTo(Instant.parse("2031-03-12T00:00:00Z"));
        assertThat(Moments.read("from", " ")).isNull();
        assertThat(Moments.read("from", null)).isNull();
    }

    @Test
    void whatIsNoMomentIsRefusedWithItsField() {
        for (String text : new String[] {"yesterday", "2031-13-01", "12 MAR 1142Z", "+999999999-12-31T00:00:00Z", "-5", "T"}) {
            assertThatThrownBy(() -> Moments.read("until", text)).as(text).isInstanceOf(UnreadableMoment.class)
                    .satisfies(thrown -> assertThat(((UnreadableMoment) thrown).field()).isEqualTo("until"));
        }
    }
}
