package org.shearbook.met.quality;

import java.util.List;

/**
 * A value that stands out from both neighbours, which agree with each other. Limits are own choices: 5 K and 10 m/s
 * where both neighbours are within 300 m (no layer of the free air does that and returns), 15 K and 40 m/s at any
 * distance (what a shifted group or a wrong digit makes of a coded level). The neighbours agree when they differ by
 * less than half of the deviation.
 */
final class SpikeCheck implements QualityCheck {

    private static final double NEAR = 300;
    private static final double TEMPERATURE_NEAR = 5;
    private static final double TEMPERATURE_ANY = 15;
    private static final double WIND_NEAR = 10;
    private static final double WIND_ANY = 40;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        List<LevelsUnderCheck.Level> temperatures = sounding.temperatureLevels();
        for (int k = 1; k < temperatures.size() - 1; k++) {
            LevelsUnderCheck.Level below = temperatures.get(k - 1);
            LevelsUnderCheck.Level level = temperatures.get(k);
            LevelsUnderCheck.Level above = temperatures.get(k + 1);
            double weight = weight(below, level, above);
            double expected = below.reported.temperature()
                    + weight * (above.reported.temperature() - below.reported.temperature());
            double deviation = Math.abs(level.reported.temperature() - expected);
            double disagreement = Math.abs(above.reported.temperature() - below.reported.temperature());
            if (below.temperatureUsed && deviation > (isNear(below, level, above) ? TEMPERATURE_NEAR : TEMPERATURE_ANY)
                    && disagreement < deviation / 2) {
                level.refuseTemperature(QualityFlag.TEMPERATURE_SPIKE);
            }
        }
        List<LevelsUnderCheck.Level> winds = sounding.windLevels();
        for (int k = 1; k < winds.size() - 1; k++) {
            LevelsUnderCheck.Level below = winds.get(k - 1);
            LevelsUnderCheck.Level level = winds.get(k);
            LevelsUnderCheck.Level above = winds.get(k + 1);
            double weight = weight(below, level, above);
            double u = below.eastward + weight * (above.eastward - below.eastward);
            double v = below.northward + weight * (above.northward - below.northward);
            double deviation = Math.hypot(level.eastward - u, level.northward - v);
            if (below.windUsed && deviation > (isNear(below, level, above) ? WIND_NEAR : WIND_ANY)
                    && below.windChangeTo(above) < deviation / 2) {
                level.refuseWind(QualityFlag.WIND_SPIKE);
            }
        }
    }

    private static double weight(LevelsUnderCheck.Level below, LevelsUnderCheck.Level level, LevelsUnderCheck.Level above) {
        return above.height > below.height ? (level.height - below.height) / (above.height - below.height) : 0.5;
    }

    private static boolean isNear(LevelsUnderCheck.Level below, LevelsUnderCheck.Level level, LevelsUnderCheck.Level above) {
        return level.height - below.height <= NEAR && above.height - level.height <= NEAR;
    }
}
