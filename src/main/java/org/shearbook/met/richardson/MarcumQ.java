package org.shearbook.met.richardson;

import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;

/**
 * Marcum's function of first order: the probability that a plane vector of mean length a, each component with standard
 * deviation 1, is longer than b, {@code Q₁(a, b) = ∫_b^∞ x exp(−(x² + a²)/2) I₀(a x) dx}.
 */
final class MarcumQ {

    /*
     * Small arguments: the vector's squared length is χ² with a Poisson number of extra pairs of degrees of freedom,
     *
     *   Q₁(a, b) = Σ_k e^(−x) x^k/k! · e^(−y) Σ_(j≤k) y^j/j!,   x = a²/2, y = b²/2,
     *
     * summed until less than 1e-14 of the Poisson law is left. Large arguments, where e^(−x) is lost: the integral itself
     * from b to a + FAR, or from a − FAR to b for the complement, whichever is smaller, by 48-point Gauss-Legendre with
     * the Bessel function scaled. Beyond FAR standard deviations it is 0 or 1.
     */

    private static final double FAR = 9;
    private static final double LARGEST_EXPONENT = 600;
    private static final int POINTS = 48;
    private static final double[] NODE = new double[POINTS];
    private static final double[] WEIGHT = new double[POINTS];

    static {
        GaussIntegrator legendre = new GaussIntegratorFactory().legendre(POINTS);
        for (int i = 0; i < POINTS; i++) {
            NODE[i] = legendre.getPoint(i);
            WEIGHT[i] = legendre.getWeight(i);
        }
    }

    private MarcumQ() {
    }

    /**
     * @param a 0 or more
     * @param b 0 or more
     * @return 0 to 1; absolute error below 1e-6
     */
    static double q1(double a, double b) {
        if (b == 0 || b <= a - FAR) {
            return 1;
        }
        if (b >= a + FAR) {
            return 0;
        }
        double x = 0.5 * a * a;
        double y = 0.5 * b * b;
        return x + y < LARGEST_EXPONENT ? series(x, y) : integral(a, b);
    }

    static double series(double x, double y) {
        double poisson = Math.exp(-x);
        double term = Math.exp(-y);
        double inner = term;
        double counted = poisson;
        double sum = poisson * inner;
        // the law of mean x has no mass worth counting beyond x + 12 √x + 60
        int most = (int) (x + 12 * Math.sqrt(x)) + 60;
        for (int k = 1; k < most && 1 - counted > 1e-14; k++) {
            poisson *= x / k;
            term *= y / k;
            inner += term;
            counted += poisson;
            sum += poisson * inner;
        }
        return Math.min(1, sum + Math.max(0, 1 - counted) * inner);
    }

    static double integral(double a, double b) {
        boolean complement = b < a;
        double from = complement ? Math.max(0, a - FAR) : b;
        double to = complement ? b : a + FAR;
        double half = 0.5 * (to - from);
        double sum = 0;
        for (int i = 0; i < POINTS; i++) {
            double x = from + half * (1 + NODE[i]);
            double apart = x - a;
            sum += WEIGHT[i] * x * Math.exp(-0.5 * apart * apart) * scaledBessel(a * x);
        }
        double area = Math.min(1, half * sum);
        return complement ? 1 - area : area;
    }

    /** {@code e^(−t) I₀(t)}, Abramowitz and Stegun 1964, 9.8.1 and 9.8.2; relative error below 2e-7. */
    static double scaledBessel(double t) {
        if (t < 3.75) {
            double s = t / 3.75 * (t / 3.75);
            return Math.exp(-t) * (1 + s * (3.5156229 + s * (3.0899424 + s * (1.2067492 + s * (0.2659732 + s * (0.0360768 + s * 0.0045813))))));
        }
        double s = 3.75 / t;
        return (0.39894228 + s * (0.01328592 + s * (0.00225319 + s * (-0.00157565 + s * (0.00916281 + s * (-0.02057706
                + s * (0.02635537 + s * (-0.01647633 + s * 0.00392377)))))))) / Math.sqrt(t);
    }
}
