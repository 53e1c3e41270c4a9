package org.shearbook.met.quality;

import java.util.List;

/**
 * Says when values come rounded: directions to 5° as in FM 35, temperatures to whole degrees. Needs at least ten
 * levels, so that chance plays no part (own limit). Rounded directions alone make shear errors of up to
 * 4 % of the wind speed per level pair.
 */
final class RoundingCheck implements QualityCheck {

    private static final int ENOUGH = 10;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        List<LevelsUnderCheck.Level> winds = sounding.windLevels();
        if (winds.size() >= ENOUGH && winds.stream().allMatch(l -> isMultiple(l.reported.windFromDirection(), 5))) {
            sounding.flagSounding(QualityFlag.DIRECTION_ROUNDED, QualityFlag.DIRECTION_ROUNDED.text());
        }
        List<LevelsUnderCheck.Level> temperatures = sounding.temperatureLevels();
        if (temperatures.size() >= ENOUGH && temperatures.stream().allMatch(l -> isMultiple(l.reported.temperature() - 273.15, 1))) {
            sounding.flagSounding(QualityFlag.TEMPERATURE_ROUNDED, QualityFlag.TEMPERATURE_ROUNDED.text());
        }
        if (!temperatures.isEmpty() && temperatures.stream().allMatch(l -> Double.isNaN(l.dewPoint))) {
            sounding.flagSounding(QualityFlag.NO_HUMIDITY, QualityFlag.NO_HUMIDITY.text());
        }
    }

    private static boolean isMultiple(double value, double step) {
        return Math.abs(value - step * Math.rint(value / step)) < 1e-6;
    }
}
