package org.shearbook.testing;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.Set;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.profile.AtmosphericConstants;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.Units;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;

/**
 * Ascents through an analytic jet with a tanh shear layer, every 10 m from 50 m to 16 km: the formulas of the
 * invented demonstration scenario, written here on their own so that analysis is not tested with the generator that
 * feeds it. Temperature is integrated upward from surface and stability, dry.
 *
 * @param surfaceTemperature [K]
 * @param tropopause  height at which stability rises [m]
 * @param jetSpeed    [m/s]
 * @param jetHeight   [m]
 * @param widthBelow  of the jet [m]
 * @param widthAbove  of the jet [m]
 * @param surfaceWind [m/s]
 * @param layerHeight centre of the shear layer [m]
 * @param halfDepth   of the shear layer [m]
 * @param windChange  across the shear layer [m/s]
 * @param stability   extra N² in the layer [1e-4 1/s²]
 * @param ramp        half width of the rise of stability at the tropopause [m]
 */
public record JetAscents(
        double surfaceTemperature, double tropopause, double jetSpeed, double jetHeight, double widthBelow, double widthAbove,
        double surfaceWind, double layerHeight, double halfDepth, double windChange, double stability, double ramp) {

    public static final JetAscents DUNVEERY_DAY_1_00 = new JetAscents(285, 11600, 38, 10900, 4800, 2600, 6, 9300, 500, 3.0, 0.10, 250);
    public static final JetAscents DUNVEERY_DAY_1_12 = new JetAscents(285, 11400, 48, 10700, 4600, 2600, 6, 9200, 400, 5.5, 0.15, 250);
    public static final JetAscents DUNVEERY_DAY_2_00 = new JetAscents(284, 11000, 60, 10400, 4300, 2500, 7, 9000, 270, 10.4, 0.25, 250);
    public static final JetAscents DUNVEERY_DAY_2_12 = new JetAscents(281, 10000, 50, 9900, 4300, 2500, 7, 8500, 500, 8.0, 0.30, 250);
    public static final JetAscents DUNVEERY_DAY_3_00 = new JetAscents(280, 9600, 40, 9700, 4500, 2600, 6, 8300, 650, 5.0, 0.20, 250);
    public static final JetAscents KELBRITH_DAY_1_00 = new JetAscents(286, 11700, 34, 11000, 4900, 2700, 5, 9400, 600, 2.0, 0.10, 250);
    public static final JetAscents KELBRITH_DAY_2_00 = new JetAscents(285, 11300, 54, 10600, 4500, 2500, 7, 9000, 350, 7.0, 0.40, 250);
    public static final JetAscents KELBRITH_DAY_2_12 = new JetAscents(284, 10900, 62, 10400, 4300, 2500, 8, 8750, 250, 11.2, 0.45, 250);
    public static final JetAscents KELBRITH_DAY_2_18 = new JetAscents(283, 10600, 60, 10200, 4300, 2500, 8, 8700, 420, 10.5, 0.45, 250);
    public static final JetAscents KELBRITH_DAY_3_00 = new JetAscents(282, 10300, 50, 10000, 4400, 2500, 7, 8600, 600, 6.5, 0.35, 250);
    public static final JetAscents OSSENFELL_DAY_2_00 = new JetAscents(286, 11500, 42, 10900, 4800, 2600, 6, 5400, 350, 7.5, 0.90, 250);
    public static final JetAscents OSSENFELL_DAY_2_12 = new JetAscents(285, 11200, 46, 10700, 4700, 2600, 6, 5200, 220, 12.2, 0.90, 250);
    public static final JetAscents OSSENFELL_DAY_3_00 = new JetAscents(284, 10900, 44, 10500, 4700, 2600, 6, 5000, 450, 8.0, 0.90, 250);
    public static final JetAscents TARQUIDD_DAY_2_12 = new JetAscents(286, 10800, 52, 10150, 4700, 2400, 6, 11250, 300, -7.0, 0.40, 150);
    public static final JetAscents TARQUIDD_DAY_3_00 = new JetAscents(284, 10800, 57, 10400, 4400, 2500, 7, 8900, 280, 10.3, 0.25, 250);
    public static final JetAscents TARQUIDD_DAY_3_12 = new JetAscents(282, 10300, 46, 10100, 4600, 2600, 6, 8800, 600, 4.5, 0.25, 250);

    private static final double LOWEST = 50;
    private static final double HIGHEST = 16_000;
    private static final double STEP = 10;

    /** Without noise. */
    public VerticalProfile profile() {
        return profile(0, 0, new Random(0));
    }

    /**
     * With instrument noise.
     *
     * @param windNoise        per component [m/s], correlated over 60 m of ascent
     * @param temperatureNoise white [K]
     */
    public VerticalProfile profile(double windNoise, double temperatureNoise, Random random) {
        List<ThermodynamicLevel> temperatures = new ArrayList<>();
        List<WindLevel> winds = new ArrayList<>();
        double logTheta = Math.log(surfaceTemperature * Math.pow(100_000 / 100_800.0, AtmosphericConstants.KAPPA));
        double exner = Math.pow(100_800 / 100_000.0, AtmosphericConstants.KAPPA);
        double heatCapacity = AtmosphericConstants.GAS_CONSTANT_DRY_AIR / AtmosphericConstants.KAPPA;
        double memory = Math.exp(-STEP / 60);
        double fresh = Math.sqrt(1 - memory * memory);
        double errorU = random.nextGaussian();
        double errorV = random.nextGaussian();
        double theta = Math.exp(logTheta);
        for (double z = LOWEST; z <= HIGHEST; z += STEP) {
            double pressure = 100_000 * Math.pow(exner, 1 / AtmosphericConstants.KAPPA);
            temperatures.add(new ThermodynamicLevel(z, pressure, theta * exner + temperatureNoise * random.nextGaussian(), Double.NaN));
            double speed = speed(z);
            double direction = 200 + 50 * Math.min(1, z / 3000);
            winds.add(new WindLevel(z, pressure,
                    Units.eastward(speed, direction) + windNoise * errorU, Units.northward(speed, direction) + windNoise * errorV));
            errorU = memory * errorU + fresh * random.nextGaussian();
            errorV = memory * errorV + fresh * random.nextGaussian();
            double middle = z + STEP / 2;
            double nextTheta = theta * Math.exp(buoyancyFrequencySquared(middle) / AtmosphericConstants.GRAVITY * STEP);
            // hydrostatic: d(exner)/dz = -g / (cp theta)
            exner -= AtmosphericConstants.GRAVITY / (heatCapacity * 0.5 * (theta + nextTheta)) * STEP;
            theta = nextTheta;
        }
        return new VerticalProfile(temperatures, winds);
    }

    /** The same as a decoder would hand it on. */
    public List<ReportedLevel> reported() {
        VerticalProfile profile = profile();
        List<ReportedLevel> levels = new ArrayList<>();
        for (int k = 0; k < profile.windLevels().size(); k++) {
            ThermodynamicLevel temperature = profile.thermodynamicLevels().get(k);
            WindLevel wind = profile.windLevels().get(k);
            levels.add(new ReportedLevel(temperature.pressure(), temperature.height(), temperature.temperature(),
                    temperature.temperature() - 8, wind.fromDirection(), wind.speed(), (temperature.height() - LOWEST) / 5,
                    Double.NaN, Double.NaN, Set.of()));
        }
        return levels;
    }

    private double speed(double z) {
        double width = z < jetHeight ? widthBelow : widthAbove;
        double fromJet = (z - jetHeight) / width;
        return surfaceWind + (jetSpeed - surfaceWind) * Math.exp(-fromJet * fromJet)
                + windChange / 2 * Math.tanh((z - layerHeight) / halfDepth);
    }

    private double buoyancyFrequencySquared(double z) {
        double[] height = {0, 1500, 4000, 7000, tropopause - ramp, tropopause + ramp, HIGHEST};
        double[] background = {1.30, 1.15, 1.15, 1.05, 1.05, 4.60, 4.60};
        int k = 0;
        while (k < height.length - 2 && z >= height[k + 1]) {
            k++;
        }
        double linear = background[k] + (z - height[k]) / (height[k + 1] - height[k]) * (background[k + 1] - background[k]);
        double cosh = Math.cosh((z - layerHeight) / halfDepth);
        return 1e-4 * (linear + stability / (cosh * cosh));
    }
}
