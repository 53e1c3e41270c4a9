package org.shearbook.met.profile;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A tropopause by lapse rate.
 *
 * @param height      [m]
 * @param pressure    [Pa]
 * @param flightLevel hundreds of feet of pressure altitude, not rounded
 * @param temperature [K]
 */
public record Tropopause(double height, double pressure, double flightLevel, double temperature) {

    /*
     * Definition (World Meteorological Organization 1957, Bulletin 6, 136; also in the International Meteorological
     * Vocabulary): the first tropopause is the lowest level at which the lapse rate decreases to 2 K/km or less,
     * provided the average lapse rate between this level and all higher levels within 2 km does not exceed 2 K/km.
     * If above it the average lapse rate between any level and all higher levels within 1 km exceeds 3 K/km, a second
     * tropopause is found by the same criterion. Common practice added: not below 500 hPa.
     *
     * In a dense ascent the lapse rate between neighbours is noise, so levels are first averaged over 100 m; a coded
     * ascent is not touched. Where the data end within 2 km above a candidate the criterion is tested as far as they go,
     * provided that is at least 1 km.
     */

    private static final double FLAT = -0.002;
    private static final double STEEP = -0.003;
    private static final double DEPTH = 2000;
    private static final double SECOND_DEPTH = 1000;
    private static final double BIN = 100;
    private static final double GREATEST_PRESSURE = 50_000;

    /**
     * First and, where there is one, second tropopause; by definition and averaging as described in the class.
     *
     * <p><b>Limits.</b> Height is known to the spacing of the (averaged) levels. A gap in temperature within the 2 km
     * hides a tropopause.
     *
     * @return none, one or two, from the lowest up
     */
    public static List<Tropopause> of(VerticalProfile profile) {
        double[][] averaged = average(profile);
        double[] z = averaged[0];
        double[] t = averaged[1];
        List<Tropopause> found = new ArrayList<>();
        int first = next(profile, z, t, 0);
        if (first < 0) {
            return found;
        }
        found.add(at(profile, z[first], t[first]));
        for (int k = first; k < z.length; k++) {
            if (isSteepAbove(z, t, k)) {
                int second = next(profile, z, t, k);
                if (second >= 0) {
                    found.add(at(profile, z[second], t[second]));
                }
                break;
            }
        }
        return found;
    }

    private static Tropopause at(VerticalProfile profile, double height, double temperature) {
        return new Tropopause(height, profile.pressureAt(height), profile.flightLevelAt(height), temperature);
    }

    private static double[][] average(VerticalProfile profile) {
        List<ThermodynamicLevel> levels = profile.thermodynamicLevels();
        double[] z = new double[levels.size()];
        double[] t = new double[levels.size()];
        int n = 0;
        int k = 0;
        while (k < levels.size()) {
            double bottom = levels.get(k).height();
            double sumZ = 0;
            double sumT = 0;
            int count = 0;
            while (k < levels.size() && levels.get(k).height() < bottom + BIN) {
                sumZ += levels.get(k).height();
                sumT += levels.get(k).temperature();
                count++;
                k++;
            }
            z[n] = sumZ / count;
            t[n] = sumT / count;
            n++;
        }
        return new double[][] {Arrays.copyOf(z, n), Arrays.copyOf(t, n)};
    }

    private static int next(VerticalProfile profile, double[] z, double[] t, int from) {
        for (int k = Math.max(1, from); k < z.length - 1; k++) {
            if (profile.pressureAt(z[k]) <= GREATEST_PRESSURE
                    && slope(z, t, k, k + 1) >= FLAT && isFlatAbove(profile, z, t, k)) {
                return k;
            }
        }
        return -1;
    }

    private static boolean isFlatAbove(VerticalProfile profile, double[] z, double[] t, int k) {
        double limit = z[k] + DEPTH;
        double reached = z[k];
        for (int i = k + 1; i < z.length && reached < limit; i++) {
            // the level that first passes 2 km is cut at 2 km, so that a coarse ascent is tested over the full depth
            double end = Math.min(z[i], limit);
            double temperature = t[i - 1] + (end - z[i - 1]) * slope(z, t, i - 1, i);
            if ((temperature - t[k]) / (end - z[k]) < FLAT) {
                return false;
            }
            reached = end;
        }
        return reached - z[k] >= SECOND_DEPTH && !profile.hasTemperatureGapBetween(z[k], reached);
    }

    private static boolean isSteepAbove(double[] z, double[] t, int k) {
        boolean reachedFar = false;
        for (int i = k + 1; i < z.length; i++) {
            double end = Math.min(z[i], z[k] + SECOND_DEPTH);
            double temperature = t[i - 1] + (end - z[i - 1]) * slope(z, t, i - 1, i);
            if ((temperature - t[k]) / (end - z[k]) >= STEEP) {
                return false;
            }
            if (end == z[k] + SECOND_DEPTH) {
                reachedFar = true;
                break;
            }
        }
        return reachedFar;
    }

    private static double slope(double[] z, double[] t, int from, int to) {
        return (t[to] - t[from]) / (z[to] - z[from]);
    }
}
