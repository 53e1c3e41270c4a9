package org.shearbook.met.quality;

import java.util.Collections;
import java.util.EnumSet;
import java.util.Set;
import org.shearbook.met.decode.ReportedLevel;

/**
 * A level as reported, with what the checks say of it.
 *
 * @param reported        untouched
 * @param height          height used [gpm]: reported, or computed (then flagged); NaN when there is none
 * @param pressure        pressure used [Pa]: reported, or interpolated (then flagged); NaN when there is none
 * @param flags           in the order of {@link QualityFlag}
 * @param temperatureUsed whether its temperature is in the clean profile
 * @param windUsed        whether its wind is in the clean profile
 */
public record CheckedLevel(
        ReportedLevel reported, double height, double pressure, Set<QualityFlag> flags, boolean temperatureUsed, boolean windUsed) {

    public CheckedLevel {
        EnumSet<QualityFlag> ordered = EnumSet.noneOf(QualityFlag.class);
        ordered.addAll(flags);
        flags = Collections.unmodifiableSet(ordered);
    }
}
