package org.shearbook.met.taylorgoldstein;

import java.util.Arrays;
import org.shearbook.met.profile.RoundedCornerFunction;

/** Flows of the literature on an even grid, with exact derivatives: half velocity difference 1, half depth 1. */
final class AnalyticShearFlows {

    /**
     * Corner width that stands for tanh: the path leaves the axis by 0.1 half depths, a sixteenth of the distance to
     * the poles of tanh, so that nine terms of its Taylor series are exact to 1e-8.
     */
    static final double TANH_CORNER = 0.1 / 0.3;

    private AnalyticShearFlows() {
    }

    /** {@code U = tanh z, N² = J R sech²(R z)}: Hazel's and Holmboe's flow for R = 1. */
    static SampledFlow tanh(double halfHeight, int intervals, double j, double ratio) {
        double[] z = grid(-halfHeight, halfHeight, intervals);
        double[][] buoyancy = tanhDerivatives(z, j, ratio);
        return flow(z, tanhDerivatives(z, 1, 1), Arrays.copyOfRange(buoyancy, 1, SampledFlow.ORDERS),
                Boundary.RADIATING, Boundary.RADIATING);
    }

    /** {@code U = tanh z} over rigid ground at {@code z = -below}, {@code N² = J sech² z}. */
    static SampledFlow tanhAboveGround(double below, double above, int intervals, double j) {
        double[] z = grid(-below, above, intervals);
        double[][] buoyancy = tanhDerivatives(z, j, 1);
        return flow(z, tanhDerivatives(z, 1, 1), Arrays.copyOfRange(buoyancy, 1, SampledFlow.ORDERS), Boundary.RIGID,
                Boundary.RADIATING);
    }

    /** {@code U = tanh z, N² = J}: Drazin's flow. */
    static SampledFlow drazin(double halfHeight, int intervals, double j) {
        double[] z = grid(-halfHeight, halfHeight, intervals);
        double[][] n2 = new double[SampledFlow.ORDERS - 1][z.length];
        Arrays.fill(n2[0], j);
        return flow(z, tanhDerivatives(z, 1, 1), n2, Boundary.RADIATING, Boundary.RADIATING);
    }

    /** A wind with {@code N² = Ri U′²} at every height. */
    static SampledFlow constantRichardson(double[] z, double[][] u, double richardson) {
        double[][] n2 = new double[SampledFlow.ORDERS - 1][z.length];
        for (int i = 0; i < z.length; i++) {
            for (int m = 0; m < n2.length; m++) {
                double binomial = 1;
                for (int q = 0; q <= m; q++) {
                    n2[m][i] += richardson * binomial * u[1 + q][i] * u[1 + m - q][i];
                    binomial = binomial * (m - q) / (q + 1);
                }
            }
        }
        return flow(z, u, n2, Boundary.RADIATING, Boundary.RADIATING);
    }

    static SampledFlow flow(double[] z, double[][] u, double[][] n2, Boundary lower, Boundary upper) {
        return new SampledFlow(z, z[1] - z[0], u, new double[SampledFlow.ORDERS][z.length], n2, lower, upper);
    }

    static double[] grid(double from, double to, int intervals) {
        double[] z = new double[intervals + 1];
        for (int i = 0; i <= intervals; i++) {
            z[i] = from + (to - from) * i / intervals;
        }
        return z;
    }

    /** Derivatives 0 to 8 of {@code amplitude tanh(rate z)}; every derivative is a polynomial in tanh. */
    static double[][] tanhDerivatives(double[] z, double amplitude, double rate) {
        double[][] derivatives = new double[SampledFlow.ORDERS][z.length];
        double[] polynomial = {0, 1};
        double scale = amplitude;
        for (int m = 0; m < SampledFlow.ORDERS; m++) {
            for (int i = 0; i < z.length; i++) {
                double t = Math.tanh(rate * z[i]);
                double sum = 0;
                for (int q = polynomial.length - 1; q >= 0; q--) {
                    sum = sum * t + polynomial[q];
                }
                derivatives[m][i] = scale * sum;
            }
            double[] next = new double[polynomial.length + 1];
            for (int q = 1; q < polynomial.length; q++) {
                next[q - 1] += q * polynomial[q];
                next[q + 1] -= q * polynomial[q];
            }
            polynomial = next;
            scale *= rate;
        }
        return derivatives;
    }

    /** A flow through knots, all corners of one width, radiating at both ends. */
    static StratifiedShearFlow throughKnots(double[] windKnots, double[] wind, double[] buoyancyKnots,
            double[] buoyancy, double corner, double halfHeight) {
        return StratifiedShearFlow.ofBuoyancy(rounded(windKnots, wind, corner),
                rounded(windKnots, new double[wind.length], corner), rounded(buoyancyKnots, buoyancy, corner),
                -halfHeight, halfHeight, Boundary.RADIATING, Boundary.RADIATING);
    }

    static RoundedCornerFunction rounded(double[] knots, double[] values, double corner) {
        double[] widths = new double[knots.length];
        Arrays.fill(widths, corner);
        return new RoundedCornerFunction(knots, values, widths);
    }

    /** Root by Newton's method from a guess. */
    static double[] root(DispersionFunction dispersion, double k, double guessRe, double guessIm) {
        dispersion.setWavenumber(k);
        if (!dispersion.newton(guessRe, guessIm, 1e-9, 40)) {
            throw new AssertionError("no root near " + guessRe + " + " + guessIm + "i for k = " + k);
        }
        return new double[] {dispersion.rootRe(), dispersion.rootIm()};
    }
}
