package org.shearbook.desk.layer;

import java.time.Duration;
import org.springframework.boot.context.properties.ConfigurationProperties;
import org.springframework.boot.context.properties.bind.DefaultValue;

/** @param evidenceLasts how long a sounding says something about the air after it; then the state is unknown */
@ConfigurationProperties("shearbook.layer")
record LayerSettings(@DefaultValue("6h") Duration evidenceLasts) {
}
