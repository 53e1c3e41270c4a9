package org.shearbook.met.richardson;

import java.time.Instant;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.VerticalProfile;

/**
 * A layer as one sounding saw it: what is needed to find it again in the next one.
 *
 * @param at                          time of the sounding
 * @param extent                      base and top [m]
 * @param minimumHeight               height of the smallest Ri [m]
 * @param virtualPotentialTemperature θv there [K]; NaN when not known
 * @param shearDirection              towards which the wind change across it points [° clockwise from north]; NaN when
 *                                    there is none
 * @param richardsonNumber            smallest Ri [1]; NaN when unknown
 * @param detected                    whether the sounding showed a layer (Ri below ¼); false for air that was only traced
 */
public record LayerSighting(Instant at, HeightBand extent, double minimumHeight, double virtualPotentialTemperature,
        double shearDirection, double richardsonNumber, boolean detected) {

    /**
     * A layer found in an analysis.
     *
     * @param layer   of that analysis
     * @param profile the analysis
     * @param at      time of the sounding
     */
    public static LayerSighting of(ShearLayer layer, RichardsonProfile profile, Instant at) {
        double height = layer.minimum().height();
        return new LayerSighting(at, layer.extent(), height, thetaV(profile.profile(), height),
                layer.windChange() > 0 ? layer.windChangeDirection() : Double.NaN, layer.minimum().richardsonNumber(), true);
    }

    static double thetaV(VerticalProfile profile, double height) {
        double temperature = profile.temperatureAt(height);
        double pressure = profile.pressureAt(height);
        return Double.isNaN(temperature) || Double.isNaN(pressure) ? Double.NaN
                : MoistThermodynamics.virtualPotentialTemperature(pressure, temperature, profile.dewPointAt(height));
    }
}
