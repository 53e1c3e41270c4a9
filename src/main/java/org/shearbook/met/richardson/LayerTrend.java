package org.shearbook.met.richardson;

import java.time.Duration;

/**
 * How a layer changed between two soundings of one station, as rates over the time between them. Two soundings are two
 * balloons in different air: the rates are differences, not a forecast.
 *
 * @param between           the two soundings
 * @param richardsonPerHour dRi/dt [h⁻¹], negative where it becomes less stable; NaN when either Ri is unknown
 * @param descentRate       of the height of the smallest Ri [m s⁻¹], positive downward
 * @param temperatureChange of θv there [K]: near 0 where the layer moved with the air; NaN when unknown
 */
public record LayerTrend(Duration between, double richardsonPerHour, double descentRate, double temperatureChange) {

    /**
     * @param earlier sighting
     * @param later   sighting of the same layer
     * @throws IllegalArgumentException if {@code later} is not later
     */
    public static LayerTrend of(LayerSighting earlier, LayerSighting later) {
        Duration between = Duration.between(earlier.at(), later.at());
        if (between.isNegative() || between.isZero()) {
            throw new IllegalArgumentException("a trend needs a later sounding, not " + later.at() + " after " + earlier.at());
        }
        double seconds = between.toMillis() / 1000.0;
        return new LayerTrend(between, (later.richardsonNumber() - earlier.richardsonNumber()) / seconds * 3600,
                (earlier.minimumHeight() - later.minimumHeight()) / seconds,
                later.virtualPotentialTemperature() - earlier.virtualPotentialTemperature());
    }
}
