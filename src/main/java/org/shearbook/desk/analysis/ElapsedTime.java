package org.shearbook.desk.analysis;

import java.util.List;
import org.shearbook.met.profile.BalloonPosition;

/** When the balloon was at a height: by the times of the sounding, or by an assumed ascent rate where it has none. */
final class ElapsedTime {

    /** Common practice, no source [m s⁻¹]. */
    private static final double ASSUMED_ASCENT_RATE = 5;

    private final double[] height;
    private final double[] elapsed;
    private final double surface;

    ElapsedTime(List<BalloonPosition> positions, double surface) {
        List<BalloonPosition> timed = positions.stream().filter(position -> !Double.isNaN(position.elapsed())).toList();
        this.height = timed.stream().mapToDouble(BalloonPosition::height).toArray();
        this.elapsed = timed.stream().mapToDouble(BalloonPosition::elapsed).toArray();
        this.surface = surface;
    }

    boolean isKnown() {
        return height.length > 1;
    }

    /** Since release [s], linear between levels; beyond the timed levels it goes on at the assumed rate. */
    double at(double z) {
        int n = height.length;
        if (n < 2) {
            return (z - surface) / ASSUMED_ASCENT_RATE;
        }
        if (z <= height[0]) {
            return elapsed[0] + (z - height[0]) / ASSUMED_ASCENT_RATE;
        }
        if (z >= height[n - 1]) {
            return elapsed[n - 1] + (z - height[n - 1]) / ASSUMED_ASCENT_RATE;
        }
        int found = java.util.Arrays.binarySearch(height, z);
        int k = found >= 0 ? Math.min(found, n - 2) : -found - 2;
        return elapsed[k] + (z - height[k]) / (height[k + 1] - height[k]) * (elapsed[k + 1] - elapsed[k]);
    }
}
