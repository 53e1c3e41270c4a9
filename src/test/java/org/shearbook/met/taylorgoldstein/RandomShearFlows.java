package org.shearbook.met.taylorgoldstein;

import java.util.Random;
import org.shearbook.met.profile.RoundedCornerFunction;

/** Random layered flows with rounded corners of width 1: winds along the eastward axis unless turned. */
final class RandomShearFlows {

    static final double CORNER = 1;

    private RandomShearFlows() {
    }

    /** Knots, wind, second wind component and buoyancy of one random flow. */
    record Levels(double[] heights, double[] eastward, double[] northward, double[] buoyancy) {

        StratifiedShearFlow flow(double corner) {
            double[] widths = new double[heights.length];
            java.util.Arrays.fill(widths, corner);
            return StratifiedShearFlow.ofBuoyancy(new RoundedCornerFunction(heights, eastward, widths),
                    new RoundedCornerFunction(heights, northward, widths),
                    new RoundedCornerFunction(heights, buoyancy, widths), heights[0], heights[heights.length - 1],
                    Boundary.RADIATING, Boundary.RADIATING);
        }

        StratifiedShearFlow flow() {
            return flow(CORNER);
        }
    }

    /** Two to five sheared layers between quiet ones; N² from none to stronger than neutral; straight shear. */
    static Levels next(Random random) {
        int layers = 2 + random.nextInt(4);
        int n = 2 * layers + 2;
        double[] z = new double[n];
        double[] u = new double[n];
        double[] b = new double[n];
        double strength = random.nextDouble() < 0.25 ? 0 : 0.35 * random.nextDouble();
        for (int j = 1; j < n; j++) {
            boolean sheared = j % 2 == 0;
            double gap = j == 1 || j == n - 1 ? 8 : 2 + 4 * random.nextDouble();
            double shear = sheared ? random.nextGaussian() : 0.15 * random.nextGaussian();
            z[j] = z[j - 1] + gap;
            u[j] = u[j - 1] + (j == 1 || j == n - 1 ? 0 : shear * gap);
            b[j] = b[j - 1] + strength * random.nextDouble() * shear * shear * gap;
        }
        return new Levels(z, u, new double[n], b);
    }
}
