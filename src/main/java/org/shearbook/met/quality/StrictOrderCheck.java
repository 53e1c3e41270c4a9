package org.shearbook.met.quality;

/**
 * Last guard before the profile is built: a temperature whose pressure is not below that of the level beneath it has
 * no place in a profile. Completion leaves none but in contrived messages. No limit to choose.
 */
final class StrictOrderCheck implements QualityCheck {

    @Override
    public void apply(LevelsUnderCheck sounding) {
        double last = Double.POSITIVE_INFINITY;
        for (LevelsUnderCheck.Level level : sounding.temperatureLevels()) {
            if (level.pressure < last) {
                last = level.pressure;
            } else {
                level.refuseTemperature(QualityFlag.PRESSURE_NOT_DECREASING);
            }
        }
    }
}
