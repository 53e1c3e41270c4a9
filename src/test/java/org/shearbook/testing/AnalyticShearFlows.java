package org.shearbook.testing;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import org.shearbook.met.profile.AtmosphericConstants;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;

/** Profiles whose wind and buoyancy are given as functions of height, so that Ri is known exactly. */
public final class AnalyticShearFlows {

    private AnalyticShearFlows() {
    }

    /** Levels from {@code base} to {@code top}, both included where the step divides the depth. */
    public static double[] evenly(double base, double top, double step) {
        int n = (int) Math.floor((top - base) / step + 1e-9) + 1;
        double[] heights = new double[n];
        for (int i = 0; i < n; i++) {
            heights[i] = base + i * step;
        }
        return heights;
    }

    /**
     * A profile with the given wind and buoyancy at the given heights.
     *
     * @param buoyancy B [m/s²], {@code dB/dz = N²}, 0 at sea level
     */
    public static VerticalProfile profile(
            double[] heights, DoubleUnaryOperator eastward, DoubleUnaryOperator northward, DoubleUnaryOperator buoyancy) {
        List<ThermodynamicLevel> temperatures = new ArrayList<>();
        List<WindLevel> winds = new ArrayList<>();
        for (double z : heights) {
            // any falling pressure will do; temperature is chosen so that θv = 280 K exp(B/g) exactly
            double pressure = 100_000 * Math.exp(-z / 8000);
            double theta = 280 * Math.exp(buoyancy.applyAsDouble(z) / AtmosphericConstants.GRAVITY);
            double temperature = theta * Math.pow(pressure / 100_000, AtmosphericConstants.KAPPA);
            temperatures.add(new ThermodynamicLevel(z, pressure, temperature, Double.NaN));
            winds.add(new WindLevel(z, pressure, eastward.applyAsDouble(z), northward.applyAsDouble(z)));
        }
        return new VerticalProfile(temperatures, winds);
    }

    /** A tanh layer with constant background stability. */
    public static VerticalProfile tanhLayer(
            double[] heights, double centre, double halfDepth, double halfChange, double stability) {
        return profile(heights, z -> halfChange * Math.tanh((z - centre) / halfDepth), z -> 0, z -> stability * z);
    }

    /** A wandering wind and buoyancy at random spacing; buoyancy falls here and there. */
    public static VerticalProfile random(Random random, int levels, double meanSpacing) {
        double z = 100;
        List<ThermodynamicLevel> temperatures = new ArrayList<>();
        List<WindLevel> winds = new ArrayList<>();
        double u = 5;
        double v = 0;
        double b = 0;
        for (int i = 0; i < levels; i++) {
            double pressure = 100_000 * Math.exp(-z / 8000);
            temperatures.add(new ThermodynamicLevel(z, pressure,
                    280 * Math.exp(b / AtmosphericConstants.GRAVITY) * Math.pow(pressure / 100_000, AtmosphericConstants.KAPPA), Double.NaN));
            winds.add(new WindLevel(z, u, v));
            double dz = meanSpacing * (0.2 + 1.6 * random.nextDouble());
            z += dz;
            u += 0.01 * dz * random.nextGaussian();
            v += 0.01 * dz * random.nextGaussian();
            b += dz * 1e-4 * (1 + random.nextGaussian());
        }
        return new VerticalProfile(temperatures, winds);
    }

    /** The same wind and temperature with noise of a sonde: wind correlated over 60 m, temperature white. */
    public static VerticalProfile withNoise(VerticalProfile profile, double windNoise, double temperatureNoise, Random random) {
        List<ThermodynamicLevel> temperatures = profile.thermodynamicLevels().stream().map(l -> new ThermodynamicLevel(
                l.height(), l.pressure(), l.temperature() + temperatureNoise * random.nextGaussian(), l.dewPoint())).toList();
        List<WindLevel> winds = new ArrayList<>();
        double errorU = random.nextGaussian();
        double errorV = random.nextGaussian();
        double last = Double.NaN;
        for (WindLevel level : profile.windLevels()) {
            if (!Double.isNaN(last)) {
                double memory = Math.exp(-(level.height() - last) / 60);
                double fresh = Math.sqrt(1 - memory * memory);
                errorU = memory * errorU + fresh * random.nextGaussian();
                errorV = memory * errorV + fresh * random.nextGaussian();
            }
            last = level.height();
            winds.add(new WindLevel(level.height(), level.pressure(),
                    level.eastward() + windNoise * errorU, level.northward() + windNoise * errorV));
        }
        return new VerticalProfile(temperatures, winds);
    }
}
