package org.shearbook.desk.forecast;

import java.time.Duration;
import org.springframework.boot.context.properties.ConfigurationProperties;
import org.springframework.boot.context.properties.bind.DefaultValue;

/**
 * Office rules for forecasts.
 *
 * @param desk         name of the desk as it stands in every text
 * @param longest      longest validity
 * @param farthest     how far ahead validity may begin
 * @param grace        how far in the past it may begin
 * @param radiusNm     radius a draft begins with around the station of its layer [NM]; common practice, no source
 */
@ConfigurationProperties("shearbook.forecast")
record ForecastSettings(@DefaultValue("Shear-layer desk") String desk, @DefaultValue("4h") Duration longest,
        @DefaultValue("4h") Duration farthest, @DefaultValue("30m") Duration grace, @DefaultValue("60") int radiusNm) {
}
