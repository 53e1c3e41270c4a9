package org.shearbook.desk.demonstration;

import java.util.Random;
import org.shearbook.desk.demonstration.ScenarioAscent.Site;
import org.shearbook.met.profile.AtmosphericConstants;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.StandardAtmosphere;
import org.shearbook.met.profile.Units;

/**
 * The air of one ascent every 10 m from the ground to 16 km, as it is or as a balloon measured it. SI units,
 * shape {@code [levels]} throughout; a wind that was lost is {@code NaN}.
 *
 * <p><b>The air.</b> The wind is that of a jet, {@code U₀ + (U_c − U₀) exp(−((z − z_j)/w)²)}, plus a shear layer,
 * {@code ΔU/2 tanh((z − z_c)/h)}, from 200° at the ground turning to 250° at 3 km and constant above. The stability
 * is a background with a step at the tropopause plus {@code ΔN² sech²((z − z_c)/h)}; from it follow virtual
 * potential temperature, {@code d ln θ_v/dz = N²/g}, and pressure, {@code dΠ/dz = −g/(c_p θ_v)}, which are integrated
 * with the mid-point rule. All of it is invented.
 *
 * <p><b>The measurement.</b> Wind: 0.3 m s⁻¹ in each component, first-order autoregressive with a correlation length
 * of 60 m. Temperature: 0.1 K, white.
 */
final class ScenarioColumn {

    static final double STEP = 10;
    static final double TOP = 16_000;
    static final double ASCENT_RATE = 5;
    private static final double SURFACE_PRESSURE = 100_800;
    private static final double REFERENCE_PRESSURE = 100_000;
    private static final double WIND_NOISE = 0.3;
    private static final double WIND_NOISE_LENGTH = 60;
    private static final double TEMPERATURE_NOISE = 0.1;
    /** Chosen so that every noisy ascent lies on the side of Ri = ¼ of the noise-free one, at the 200 m window. */
    private static final long NOISE_SEED = 1;
    private static final double METRES_PER_DEGREE = 111_195;

    final double[] height;
    final double[] pressure;
    final double[] temperature;
    final double[] dewPoint;
    final double[] eastward;
    final double[] northward;
    final double[] elapsed;
    final double[] latitude;
    final double[] longitude;

    private ScenarioColumn(int levels) {
        height = new double[levels];
        pressure = new double[levels];
        temperature = new double[levels];
        dewPoint = new double[levels];
        eastward = new double[levels];
        northward = new double[levels];
        elapsed = new double[levels];
        latitude = new double[levels];
        longitude = new double[levels];
    }

    /** The air itself. */
    static ScenarioColumn noiseFree(ScenarioAscent ascent) {
        int levels = (int) Math.floor((TOP - Site.ELEVATION) / STEP) + 1;
        ScenarioColumn column = new ScenarioColumn(levels);
        double kappa = AtmosphericConstants.KAPPA;
        double specificHeat = AtmosphericConstants.GAS_CONSTANT_DRY_AIR / kappa;
        double gravity = AtmosphericConstants.GRAVITY;
        double exner = Math.pow(SURFACE_PRESSURE / REFERENCE_PRESSURE, kappa);
        double logTheta = Math.log(ascent.surfaceTemperature() / exner); // of θ_v: the first temperature is the virtual one
        for (int k = 0; k < levels; k++) {
            double z = Site.ELEVATION + k * STEP;
            if (k > 0) {
                double below = z - STEP;
                double half = logTheta + 0.5 * STEP * stability(ascent, below + 0.25 * STEP) / gravity;
                logTheta += STEP * stability(ascent, below + 0.5 * STEP) / gravity;
                exner -= STEP * gravity / (specificHeat * Math.exp(half));
            }
            column.height[k] = z;
            column.pressure[k] = REFERENCE_PRESSURE * Math.pow(exner, 1 / kappa);
            double virtualTemperature = Math.exp(logTheta) * exner;
            column.temperature[k] = virtualTemperature;
            // Humidity is given relative to saturation, which hangs on the temperature sought: each round gains two digits.
            for (int round = 0; round < 5; round++) {
                column.dewPoint[k] = dewPoint(ascent, z, column.temperature[k]);
                column.temperature[k] *= virtualTemperature
                        / MoistThermodynamics.virtualTemperature(column.pressure[k], column.temperature[k], column.dewPoint[k]);
            }
            double speed = speed(ascent, z);
            double from = 200 + 50 * Math.min(1, (z - Site.ELEVATION) / (3000 - Site.ELEVATION));
            column.eastward[k] = Units.eastward(speed, from);
            column.northward[k] = Units.northward(speed, from);
            column.elapsed[k] = (z - Site.ELEVATION) / ASCENT_RATE;
        }
        column.drift(ascent.station());
        return column;
    }

    /** The same air as the balloon measured it, with the receiver's defects. */
    static ScenarioColumn measured(ScenarioAscent ascent) {
        ScenarioColumn column = noiseFree(ascent);
        Random random = new Random(NOISE_SEED * 1_000_003 + ascent.title().hashCode());
        double kept = Math.exp(-STEP / WIND_NOISE_LENGTH);
        double fresh = WIND_NOISE * Math.sqrt(1 - kept * kept);
        double east = WIND_NOISE * random.nextGaussian();
        double north = WIND_NOISE * random.nextGaussian();
        for (int k = 0; k < column.height.length; k++) {
            column.eastward[k] += east;
            column.northward[k] += north;
            column.temperature[k] += TEMPERATURE_NOISE * random.nextGaussian();
            column.dewPoint[k] = Math.min(column.dewPoint[k], column.temperature[k]);
            east = kept * east + fresh * random.nextGaussian();
            north = kept * north + fresh * random.nextGaussian();
            double flightLevel = StandardAtmosphere.flightLevel(column.pressure[k]);
            if (ascent.windDropOut() && flightLevel > 240 && flightLevel < 260) {
                column.eastward[k] = Double.NaN;
                column.northward[k] = Double.NaN;
            }
        }
        return column;
    }

    /** Wind along the direction of the jet [m s⁻¹]. */
    private static double speed(ScenarioAscent ascent, double z) {
        double width = z < ascent.jetHeight() ? ascent.widthBelow() : ascent.widthAbove();
        double q = (z - ascent.jetHeight()) / width;
        return ascent.calmSpeed() + (ascent.jetSpeed() - ascent.calmSpeed()) * Math.exp(-q * q)
                + ascent.layerWindChange() / 2 * Math.tanh((z - ascent.layerHeight()) / ascent.layerHalfDepth());
    }

    /** N² [s⁻²]. */
    private static double stability(ScenarioAscent ascent, double z) {
        double[] at = {0, 1500, 4000, 7000, ascent.tropopauseHeight() - ascent.tropopauseSharpness(),
            ascent.tropopauseHeight() + ascent.tropopauseSharpness(), TOP};
        double[] background = {1.30, 1.15, 1.15, 1.05, 1.05, 4.60, 4.60};
        int k = 1;
        while (k < at.length - 1 && z > at[k]) {
            k++;
        }
        double share = (z - at[k - 1]) / (at[k] - at[k - 1]);
        double sech = 1 / Math.cosh((z - ascent.layerHeight()) / ascent.layerHalfDepth());
        return 1e-4 * (background[k - 1] + share * (background[k] - background[k - 1]) + ascent.layerStability() * sech * sech);
    }

    private static double dewPoint(ScenarioAscent ascent, double z, double temperature) {
        if (ascent.cirrus() && z >= 8400 && z <= 8900) {
            return MoistThermodynamics.dewPoint(0.98 * MoistThermodynamics.saturationVapourPressureOverIce(temperature));
        }
        double relativeHumidity = 0.55 - 0.25 * (z - Site.ELEVATION) / (TOP - Site.ELEVATION);
        return MoistThermodynamics.dewPointFromRelativeHumidity(temperature, relativeHumidity);
    }

    /** The balloon goes with the wind. */
    private void drift(Site site) {
        latitude[0] = site.latitude;
        longitude[0] = site.longitude;
        for (int k = 1; k < height.length; k++) {
            double seconds = elapsed[k] - elapsed[k - 1];
            latitude[k] = latitude[k - 1] + 0.5 * (northward[k] + northward[k - 1]) * seconds / METRES_PER_DEGREE;
            longitude[k] = longitude[k - 1] + 0.5 * (eastward[k] + eastward[k - 1]) * seconds
                    / (METRES_PER_DEGREE * Math.cos(Math.toRadians(latitude[k])));
        }
    }
}
