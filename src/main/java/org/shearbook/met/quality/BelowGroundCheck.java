package org.shearbook.met.quality;

import java.util.OptionalDouble;
import org.shearbook.met.decode.ReportedLevel.Significance;

/**
 * Standard levels below the ground are sent extrapolated by some countries (WMO-No. 306, FM 35 and national
 * practices). Below ground is what the message marks so, a pressure more than 0.5 hPa above that of the surface
 * level, and, where no surface pressure is known, a height more than 20 m below the launch site. The two tolerances
 * are own choices: rounding of the surface pressure, and of station heights.
 */
final class BelowGroundCheck implements QualityCheck {

    private static final double PRESSURE_TOLERANCE = 50;
    private static final double HEIGHT_TOLERANCE = 20;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        OptionalDouble surfacePressure = sounding.levels.stream()
                .filter(l -> l.is(Significance.SURFACE) && l.hasPressure()).mapToDouble(l -> l.pressure).findFirst();
        for (LevelsUnderCheck.Level level : sounding.levels) {
            boolean byPressure = surfacePressure.isPresent() && level.pressure > surfacePressure.getAsDouble() + PRESSURE_TOLERANCE;
            boolean byHeight = surfacePressure.isEmpty() && level.height < sounding.elevation - HEIGHT_TOLERANCE;
            if (level.is(Significance.BELOW_GROUND) || !level.is(Significance.SURFACE) && (byPressure || byHeight)) {
                level.refuse(QualityFlag.BELOW_GROUND);
            }
        }
    }
}
