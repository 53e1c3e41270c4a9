package org.shearbook.desk.overview;

import java.time.Duration;
import java.util.List;
import org.springframework.boot.context.properties.ConfigurationProperties;
import org.springframework.boot.context.properties.bind.DefaultValue;

/**
 * What the Desk counts as late; common practice, no source.
 *
 * @param ascentHours nominal hours of ascents (UTC)
 * @param ascentGrace how long after its nominal hour an ascent may still arrive before it is missing
 * @param actNow      how long a severe or special report stays in the act-now row
 * @param expiresSoon how long before its end a forecast with nothing to follow is to be acted on
 */
@ConfigurationProperties("shearbook.overview")
record OverviewSettings(@DefaultValue({"0", "12"}) List<Integer> ascentHours, @DefaultValue("90m") Duration ascentGrace,
        @DefaultValue("6h") Duration actNow, @DefaultValue("15m") Duration expiresSoon) {
}
