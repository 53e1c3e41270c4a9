package org.shearbook.met.taylorgoldstein;

import java.util.ArrayList;
import java.util.List;

/** A flow on an even grid: {@code eastward[m][i]} is the m-th derivative of u at height i; likewise v and N². */
final class SampledFlow {

    /** Derivatives 0 to 8 of the wind, 0 to 7 of N². */
    static final int ORDERS = 9;

    final double[] heights;
    final double spacing;
    final int intervals;
    final double[][] eastward;
    final double[][] northward;
    final double[][] stability;
    final Boundary lower;
    final Boundary upper;
    final double greatestShear;

    SampledFlow(double[] heights, double spacing, double[][] eastward, double[][] northward, double[][] stability,
            Boundary lower, Boundary upper) {
        this.heights = heights;
        this.spacing = spacing;
        this.intervals = heights.length - 1;
        this.eastward = eastward;
        this.northward = northward;
        this.stability = stability;
        this.lower = lower;
        this.upper = upper;
        double squared = 0;
        for (int i = 0; i <= intervals; i++) {
            squared = Math.max(squared, shearSquared(i));
        }
        greatestShear = Math.sqrt(squared);
    }

    double shearSquared(int i) {
        return eastward[1][i] * eastward[1][i] + northward[1][i] * northward[1][i];
    }

    /** Wind along the direction with the given cosine (eastward) and sine (northward). */
    double wind(int i, double cosine, double sine) {
        return eastward[0][i] * cosine + northward[0][i] * sine;
    }

    /** {@code max(¼ U′² − N²)} over the heights: no wave along this direction grows faster than its root (Howard 1961). */
    double growthBoundSquared(double cosine, double sine) {
        double greatest = Double.NEGATIVE_INFINITY;
        for (int i = 0; i <= intervals; i++) {
            double shear = eastward[1][i] * cosine + northward[1][i] * sine;
            greatest = Math.max(greatest, 0.25 * shear * shear - Math.max(0, stability[0][i]));
        }
        return greatest;
    }

    /** Heights where the wind equals the phase speed, the strongest shear first. */
    List<Double> criticalHeights(double cosine, double sine, double speed) {
        List<double[]> crossings = new ArrayList<>();
        for (int i = 0; i < intervals; i++) {
            double from = wind(i, cosine, sine) - speed;
            double to = wind(i + 1, cosine, sine) - speed;
            if (from == 0 || from * to < 0) {
                double shear = (to - from) / spacing;
                crossings.add(new double[] {heights[i] - (to == from ? 0 : from / shear), Math.abs(shear)});
            }
        }
        crossings.sort((a, b) -> Double.compare(b[1], a[1]));
        return crossings.stream().map(crossing -> crossing[0]).toList();
    }
}
