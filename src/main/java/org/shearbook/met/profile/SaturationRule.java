package org.shearbook.met.profile;

/**
 * When air counts as saturated. A radiosonde's humidity is uncertain by 4 to 6 % (twice its standard deviation), so
 * cloud is often reported a little below 100 %; a dry threshold of 95 to 97 % is common practice, no source.
 *
 * @param overWater least relative humidity over water that counts as saturated [1], above 0, at most 1.2
 * @param overIce   least relative humidity over ice that counts as saturated, assumed [1], above 0, at most 2
 * @param iceBelow  temperature below which ice is considered at all [K]; −15 to −20 °C is common practice, no source
 */
public record SaturationRule(double overWater, double overIce, double iceBelow) {

    /** 95 % over water; 100 % over ice below −15 °C, assumed. */
    public static final SaturationRule DEFAULT = new SaturationRule(0.95, 1.0, 258.15);

    public SaturationRule {
        if (!(overWater > 0 && overWater <= 1.2) || !(overIce > 0 && overIce <= 2) || !(iceBelow > 0 && iceBelow <= AtmosphericConstants.ZERO_CELSIUS)) {
            throw new IllegalArgumentException("saturation needs thresholds above 0 up to 1.2 over water and 2 over ice, and ice below"
                    + " a temperature of at most 273.15 K, not " + overWater + ", " + overIce + ", " + iceBelow + " K");
        }
    }

    /**
     * Applies the rule.
     *
     * @param temperature [K]
     * @param dewPoint    over water [K]; NaN when not known
     * @return {@code OVER_WATER} before {@code OVER_ICE_ASSUMED} where both hold; {@code UNKNOWN} when either is NaN
     */
    public Saturation of(double temperature, double dewPoint) {
        if (Double.isNaN(temperature) || Double.isNaN(dewPoint)) {
            return Saturation.UNKNOWN;
        }
        if (MoistThermodynamics.relativeHumidityOverWater(temperature, dewPoint) >= overWater) {
            return Saturation.OVER_WATER;
        }
        boolean ice = temperature < iceBelow && MoistThermodynamics.relativeHumidityOverIce(temperature, dewPoint) >= overIce;
        return ice ? Saturation.OVER_ICE_ASSUMED : Saturation.UNSATURATED;
    }
}
