package org.shearbook.met.quality;

/**
 * Temperature −115 to 60 °C, wider than the extremes observed at the ground and at the mesopause side of a balloon's
 * reach; own limits, no source. A dew point above the temperature by up to 0.5 K is rounding or calibration and
 * counts as saturated (own limit); beyond that the humidity is not used. A missing one counts as dry.
 */
final class TemperatureRangeCheck implements QualityCheck {

    private static final double COLDEST = 158.15;
    private static final double WARMEST = 333.15;
    private static final double SATURATION_TOLERANCE = 0.5;

    /** Below it vapour is too little to matter and the vapour pressure formula nears its pole [K]. */
    private static final double LOWEST_DEW_POINT = 120;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        for (LevelsUnderCheck.Level level : sounding.levels) {
            double temperature = level.reported.temperature();
            if (!level.reported.hasTemperature()) {
                level.dewPoint = Double.NaN;
                continue;
            }
            if (!(temperature >= COLDEST && temperature <= WARMEST)) {
                level.refuseTemperature(QualityFlag.TEMPERATURE_RANGE);
            }
            if (level.dewPoint > temperature) {
                level.flags.add(QualityFlag.DEW_POINT_ABOVE_TEMPERATURE);
                level.dewPoint = level.dewPoint <= temperature + SATURATION_TOLERANCE ? temperature : Double.NaN;
            } else if (!(level.dewPoint > 0)) {
                level.flags.add(QualityFlag.HUMIDITY_MISSING);
                level.dewPoint = Double.NaN;
            } else if (level.dewPoint < LOWEST_DEW_POINT) {
                level.dewPoint = LOWEST_DEW_POINT;
            }
        }
    }
}
