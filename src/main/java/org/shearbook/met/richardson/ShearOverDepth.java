package org.shearbook.met.richardson;

import java.util.List;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.VerticalProfile;

/**
 * Vector wind difference over a stated depth, the shear forecasters compare: {@code |V(z + h/2) − V(z − h/2)| / h}.
 *
 * <p>The reported winds are taken linear between levels and are not smoothed: the depth is the window. Anyone can
 * check it by hand from two levels.
 */
public final class ShearOverDepth {

    private ShearOverDepth() {
    }

    /**
     * Shear over a depth centred on each height.
     *
     * @param profile          the ascent
     * @param depth            h [m], positive
     * @param ascendingHeights centres [m], shape {@code [m]}, not decreasing
     * @return [s⁻¹], shape {@code [m]}; NaN where the depth reaches beyond the wind levels or touches a wind gap
     * @throws IllegalArgumentException if depth is not positive
     */
    public static double[] centredOn(VerticalProfile profile, double depth, double[] ascendingHeights) {
        if (!(depth > 0)) {
            throw new IllegalArgumentException("shear needs a positive depth, not " + depth + " m");
        }
        double[] height = profile.windHeights();
        double[] u = profile.eastward();
        double[] v = profile.northward();
        List<HeightBand> gaps = profile.windGaps();
        double[] shear = new double[ascendingHeights.length];
        int low = 0;
        int high = 0;
        for (int i = 0; i < shear.length; i++) {
            double base = ascendingHeights[i] - depth / 2;
            double top = ascendingHeights[i] + depth / 2;
            if (height.length < 2 || !(base >= height[0]) || !(top <= height[height.length - 1]) || overlapsGap(gaps, base, top)) {
                shear[i] = Double.NaN;
                continue;
            }
            low = advance(height, low, base);
            high = advance(height, Math.max(low, high), top);
            double du = linear(height, u, high, top) - linear(height, u, low, base);
            double dv = linear(height, v, high, top) - linear(height, v, low, base);
            shear[i] = Math.hypot(du, dv) / depth;
        }
        return shear;
    }

    private static boolean overlapsGap(List<HeightBand> gaps, double base, double top) {
        for (HeightBand gap : gaps) {
            if (gap.overlaps(base, top)) {
                return true;
            }
        }
        return false;
    }

    private static int advance(double[] height, int k, double z) {
        int at = k;
        while (at < height.length - 2 && height[at + 1] <= z) {
            at++;
        }
        return at;
    }

    private static double linear(double[] height, double[] value, int k, double z) {
        return value[k] + (z - height[k]) / (height[k + 1] - height[k]) * (value[k + 1] - value[k]);
    }
}
