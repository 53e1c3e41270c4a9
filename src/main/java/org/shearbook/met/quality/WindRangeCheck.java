package org.shearbook.met.quality;

/** Direction 0 to 360°, the range of the code; speed 0 to 150 m/s, above the strongest jets reported. Own limit for speed. */
final class WindRangeCheck implements QualityCheck {

    private static final double FASTEST = 150;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        for (LevelsUnderCheck.Level level : sounding.levels) {
            double direction = level.reported.windFromDirection();
            double speed = level.reported.windSpeed();
            if (direction < 0 || direction > 360) {
                level.refuseWind(QualityFlag.WIND_DIRECTION_RANGE);
            }
            if (speed < 0 || speed > FASTEST) {
                level.refuseWind(QualityFlag.WIND_SPEED_RANGE);
            }
        }
    }
}
