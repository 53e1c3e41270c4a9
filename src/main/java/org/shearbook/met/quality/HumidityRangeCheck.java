package org.shearbook.met.quality;

/**
 * A vapour pressure of more than half the air pressure: no air has it, and mixing ratio loses its meaning. Own limit.
 * Comes after completion of the pressures, which it needs.
 */
final class HumidityRangeCheck implements QualityCheck {

    @Override
    public void apply(LevelsUnderCheck sounding) {
        for (LevelsUnderCheck.Level level : sounding.levels) {
            if (!Double.isNaN(level.dewPoint) && level.hasPressure() && !level.hasPossibleHumidity()) {
                level.flags.add(QualityFlag.HUMIDITY_RANGE);
                level.dewPoint = Double.NaN;
            }
        }
    }
}
