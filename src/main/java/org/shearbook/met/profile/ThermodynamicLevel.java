package org.shearbook.met.profile;

/**
 * Pressure, temperature and humidity at one height.
 *
 * @param height      geopotential height above mean sea level [m]
 * @param pressure    [Pa], positive
 * @param temperature [K], positive
 * @param dewPoint    over water [K]; NaN when humidity is not known, which counts as dry air; its vapour pressure must
 *                    be below the pressure
 */
public record ThermodynamicLevel(double height, double pressure, double temperature, double dewPoint) {

    public ThermodynamicLevel {
        if (!Double.isFinite(height) || !(pressure > 0) || !(temperature > 0)
                || Double.isInfinite(pressure) || Double.isInfinite(temperature) || dewPoint <= 0 || Double.isInfinite(dewPoint)) {
            throw new IllegalArgumentException("a level needs finite height and positive pressure and temperature, not height "
                    + height + " m, pressure " + pressure + " Pa, temperature " + temperature + " K, dew point " + dewPoint + " K");
        }
        if (MoistThermodynamics.saturationVapourPressureOverWater(dewPoint) >= pressure) {
            throw new IllegalArgumentException("dew point " + dewPoint + " K at " + height + " m means more vapour pressure than the "
                    + pressure + " Pa of the air");
        }
    }

    public boolean hasHumidity() {
        return !Double.isNaN(dewPoint);
    }

    /** [K]; that of dry air where humidity is not known. */
    public double virtualTemperature() {
        return MoistThermodynamics.virtualTemperature(pressure, temperature, dewPoint);
    }

    /** θ_v [K]; that of dry air where humidity is not known. */
    public double virtualPotentialTemperature() {
        return MoistThermodynamics.virtualPotentialTemperature(pressure, temperature, dewPoint);
    }
}
