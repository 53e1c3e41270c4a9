package org.shearbook.met.billow;

import org.shearbook.met.profile.AtmosphericConstants;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.VerticalProfile;

/**
 * Whether the crests of billows would show as cloud.
 *
 * @param answer       in one word
 * @param height       where the least lift is needed [m]; NaN when unknown
 * @param lift         what the billows give, half their height [m]
 * @param liftToWater  least lift to saturation over water [m], 0 when saturated already; NaN when unknown, or more than 5 km
 * @param liftToIce    likewise over ice; NaN also where the air stays above freezing
 */
public record CloudPossibility(Answer answer, double height, double lift, double liftToWater, double liftToIce) {

    /** Stable names. */
    public enum Answer {
        /** The crests saturate over water. */
        WATER_CLOUD,
        /** The crests saturate over ice only: cloud needs ice nuclei, and shows less sharply. */
        ICE_CLOUD_POSSIBLE,
        /** The air is too dry. */
        NO_CLOUD,
        /** Humidity is not known in the layer. */
        UNKNOWN
    }

    private static final double STEP = 20;
    private static final double HIGHEST_LIFT = 5000;

    /**
     * Lifts the air of a layer by half the billow height.
     *
     * <p><b>Method.</b> At every 20 m of the layer a parcel rises dry-adiabatically, {@code dT/dz = −g/c_p}, hydrostatic at
     * its own temperature, with its mixing ratio kept, until its vapour pressure meets saturation (bisection to 1 m). Close
     * to the rule of thumb of 125 m per kelvin between temperature and dew point (from memory), and good at low
     * temperature too, where that rule is not.
     *
     * @param profile the ascent
     * @param layer   base and top of the layer [m]
     * @param billowHeight H [m], 0 or more
     * @throws IllegalArgumentException if the billow height is negative, infinite or NaN
     */
    public static CloudPossibility of(VerticalProfile profile, HeightBand layer, double billowHeight) {
        if (!(billowHeight >= 0) || Double.isInfinite(billowHeight)) {
            throw new IllegalArgumentException("billow height must be 0 or more, not " + billowHeight + " m");
        }
        double lift = billowHeight / 2;
        double water = Double.POSITIVE_INFINITY;
        double ice = Double.POSITIVE_INFINITY;
        double height = Double.NaN;
        boolean known = false;
        int steps = (int) Math.min(2000, Math.ceil(layer.depth() / STEP));
        for (int i = 0; i <= steps; i++) {
            double z = layer.base() + layer.depth() * i / steps;
            double temperature = profile.temperatureAt(z);
            double dewPoint = profile.dewPointAt(z);
            double pressure = profile.pressureAt(z);
            if (Double.isNaN(temperature) || Double.isNaN(dewPoint) || Double.isNaN(pressure)) {
                continue;
            }
            known = true;
            double toWater = liftToSaturation(pressure, temperature, dewPoint, false);
            double toIce = liftToSaturation(pressure, temperature, dewPoint, true);
            if (Math.min(toWater, toIce) < Math.min(water, ice)) {
                height = z;
            }
            water = Math.min(water, toWater);
            ice = Math.min(ice, toIce);
        }
        Answer answer = !known ? Answer.UNKNOWN : water <= lift ? Answer.WATER_CLOUD
                : ice <= lift ? Answer.ICE_CLOUD_POSSIBLE : Answer.NO_CLOUD;
        return new CloudPossibility(answer, height, lift, orUnknown(water), orUnknown(ice));
    }

    private static double orUnknown(double lift) {
        return Double.isInfinite(lift) ? Double.NaN : lift;
    }

    /** Lift to saturation [m]; 0 when saturated; +∞ beyond 5 km, and over ice where the parcel is not below freezing. */
    static double liftToSaturation(double pressure, double temperature, double dewPoint, boolean overIce) {
        if (excess(pressure, temperature, dewPoint, 0, overIce) >= 0) {
            return 0;
        }
        double low = 0;
        double high = HIGHEST_LIFT;
        if (excess(pressure, temperature, dewPoint, high, overIce) < 0) {
            return Double.POSITIVE_INFINITY;
        }
        for (int i = 0; i < 14; i++) {
            double middle = 0.5 * (low + high);
            if (excess(pressure, temperature, dewPoint, middle, overIce) >= 0) {
                high = middle;
            } else {
                low = middle;
            }
        }
        return high;
    }

    private static double excess(double pressure, double temperature, double dewPoint, double lift, boolean overIce) {
        double lapse = AtmosphericConstants.GRAVITY * AtmosphericConstants.KAPPA / AtmosphericConstants.GAS_CONSTANT_DRY_AIR;
        double lifted = Math.max(100, temperature - lapse * lift);
        if (overIce && lifted >= AtmosphericConstants.ZERO_CELSIUS) {
            return -1;
        }
        // mixing ratio is kept, so vapour pressure falls as pressure does; p ~ T^(1/κ) along a dry adiabat
        double vapour = MoistThermodynamics.saturationVapourPressureOverWater(dewPoint)
                * Math.pow(lifted / temperature, 1 / AtmosphericConstants.KAPPA);
        return vapour - (overIce ? MoistThermodynamics.saturationVapourPressureOverIce(lifted)
                : MoistThermodynamics.saturationVapourPressureOverWater(lifted));
    }
}
