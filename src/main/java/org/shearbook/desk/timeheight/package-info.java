/**
 * The time–height display: what was forecast beside what was observed, on one frame of time and flight level. It
 * reads and writes nothing.
 *
 * <p><b>Door.</b> None for other rooms: a small display on another page embeds {@code frontend/timeheight/display}
 * over {@code /api/v1/time-height}. <b>News.</b> None. <b>Tables.</b> None.
 */
@ApplicationModule(displayName = "Time–height", allowedDependencies = {"audit", "shell", "station", "sounding", "analysis", "layer", "forecast", "airreport", "profile", "decode"})
@NullMarked
package org.shearbook.desk.timeheight;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
