package org.shearbook.met.quality;

/** Two temperatures or two winds at one height (to 1 mm): the first reported is used. No limit to choose. */
final class DuplicateLevelCheck implements QualityCheck {

    static final double SAME = 0.001;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        LevelsUnderCheck.Level kept = null;
        for (LevelsUnderCheck.Level level : sounding.temperatureLevels()) {
            if (kept != null && level.height - kept.height < SAME) {
                level.refuseTemperature(QualityFlag.DUPLICATE_LEVEL);
            } else {
                kept = level;
            }
        }
        kept = null;
        for (LevelsUnderCheck.Level level : sounding.windLevels()) {
            if (kept != null && level.height - kept.height < SAME) {
                level.refuseWind(QualityFlag.DUPLICATE_LEVEL);
            } else {
                kept = level;
            }
        }
    }
}
