package org.shearbook.desk.timeheight;

import java.time.Duration;
import java.time.LocalTime;
import java.util.List;
import org.springframework.boot.context.properties.ConfigurationProperties;
import org.springframework.boot.context.properties.bind.DefaultValue;

/**
 * How the display is drawn.
 *
 * @param shifts  when the office's shifts begin, UTC, in the order of the day
 * @param longest the longest time one picture may show
 */
@ConfigurationProperties("shearbook.time-height")
record TimeHeightSettings(@DefaultValue({"06:00", "18:00"}) List<LocalTime> shifts,
        @DefaultValue("31d") Duration longest) {

    TimeHeightSettings {
        shifts = shifts.stream().sorted().toList();
    }
}
