/**
 * The Desk, the first screen of a shift: what is live, late and open, and who is responsible. It reads and writes nothing.
 *
 * <p><b>Door.</b> {@link org.shearbook.desk.overview.Desk}. <b>Tables.</b> None.
 */
@ApplicationModule(displayName = "The Desk", allowedDependencies = {"forecast", "layer", "airreport", "analysis", "sounding", "station", "staff",
        "audit", "shell", "decode"})
@NullMarked
package org.shearbook.desk.overview;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
