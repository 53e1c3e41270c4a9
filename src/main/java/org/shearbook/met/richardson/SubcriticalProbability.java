package org.shearbook.met.richardson;

import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;

/**
 * Probability that the Richardson number at one height is below ¼, given what a sonde measured there and how it errs.
 *
 * <p>Simply scattering errors around the measured shear overstates it: noise makes measured shear larger than the true
 * one on average. So the shear measured is first drawn towards what shear in this air usually is (empirical Bayes).
 */
public final class SubcriticalProbability {

    /*
     * Measured shear vector s_o, each component with error σ_s; measured N² with error σ_n. Before the measurement each
     * true component is taken as normal about zero with variance τ², found from the shear around the height. Afterwards
     *
     *   k = τ²/(τ² + σ_s²),   mean k s_o,   variance v = k σ_s²  per component,
     *
     * and S² / v is noncentral χ² with 2 degrees of freedom. With N² = max(N_o² + σ_n x, 0), x standard normal,
     *
     *   P(S² > 4 N²) = Σ_i w_i Q₁( |k s_o|/√v , √(4 N_i²/v) )      (16-point Gauss-Hermite)
     *
     * A negative N² counts as 0, and then Ri < ¼ is certain. Critical value ¼: Miles (1961) and Howard (1961), J. Fluid
     * Mech. 10, 496 and 509. The estimate is our own construction; see the calibration in its tests.
     */

    private static final int POINTS = 16;
    private static final double[] NODE = new double[POINTS];
    private static final double[] WEIGHT = new double[POINTS];

    static {
        GaussIntegrator hermite = new GaussIntegratorFactory().hermite(POINTS);
        for (int i = 0; i < POINTS; i++) {
            NODE[i] = Math.sqrt(2) * hermite.getPoint(i);
            WEIGHT[i] = hermite.getWeight(i) / Math.sqrt(Math.PI);
        }
    }

    private SubcriticalProbability() {
    }

    /**
     * {@code P(Ri < ¼)} at one height.
     *
     * <p><b>Method.</b> As the block comment says; integration error below 5e-4.
     *
     * <p><b>Limits.</b> It says nothing of what the window has smoothed away, nothing of the air a few kilometres off, and
     * must not be read as the chance that the layer anywhere has Ri &lt; ¼, let alone that billows grow.
     *
     * @param shear          |s_o| measured [s⁻¹], 0 or more
     * @param shearError     σ_s of each component [s⁻¹], 0 or more
     * @param stability      N² measured [s⁻²]
     * @param stabilityError σ_n [s⁻²], 0 or more
     * @param priorVariance  τ² of each true shear component [s⁻²], positive; +∞ for a flat prior
     * @return 0 to 1; NaN when any argument is NaN
     * @throws IllegalArgumentException if an argument is out of range
     */
    public static double of(double shear, double shearError, double stability, double stabilityError, double priorVariance) {
        if (Double.isNaN(shear + shearError + stability + stabilityError + priorVariance)) {
            return Double.NaN;
        }
        require(shear, shearError, stability, stabilityError, priorVariance);
        double k = weight(shearError, priorVariance);
        double v = k * shearError * shearError;
        double mean = k * shear;
        if (stabilityError == 0) {
            return exceeds(mean, v, 4 * Math.max(0, stability));
        }
        double probability = 0;
        for (int i = 0; i < POINTS; i++) {
            probability += WEIGHT[i] * exceeds(mean, v, 4 * Math.max(0, stability + stabilityError * NODE[i]));
        }
        return Math.min(1, probability);
    }

    /**
     * The same in closed form: the difference {@code S² − 4N²} taken as normal,
     * {@code P = Φ(m/√V)}, {@code m = |k s_o|² + 2v − 4N²}, {@code V = 4|k s_o|² v + 4v² + 16 σ_n²}.
     *
     * <p><b>Limits.</b> Within 0.035 near one half; below about 0.03 too small by a factor of 2 to 5.
     *
     * @return 0 to 1; NaN when any argument is NaN
     * @throws IllegalArgumentException if an argument is out of range
     * @see #of(double, double, double, double, double)
     */
    public static double fast(double shear, double shearError, double stability, double stabilityError, double priorVariance) {
        if (Double.isNaN(shear + shearError + stability + stabilityError + priorVariance)) {
            return Double.NaN;
        }
        require(shear, shearError, stability, stabilityError, priorVariance);
        double k = weight(shearError, priorVariance);
        double v = k * shearError * shearError;
        double mean2 = k * shear * k * shear;
        double variance = 4 * mean2 * v + 4 * v * v + 16 * stabilityError * stabilityError;
        double difference = mean2 + 2 * v - 4 * stability;
        if (variance == 0) {
            return difference > 0 ? 1 : 0;
        }
        return NormalLaw.distribution(difference / Math.sqrt(variance));
    }

    private static double weight(double shearError, double priorVariance) {
        return Double.isInfinite(priorVariance) ? 1 : priorVariance / (priorVariance + shearError * shearError);
    }

    private static double exceeds(double mean, double variance, double threshold) {
        if (variance == 0) {
            return threshold == 0 || mean * mean > threshold ? 1 : 0;
        }
        double deviation = Math.sqrt(variance);
        return MarcumQ.q1(mean / deviation, Math.sqrt(threshold) / deviation);
    }

    private static void require(double shear, double shearError, double stability, double stabilityError, double priorVariance) {
        if (shear < 0 || shearError < 0 || stabilityError < 0 || !(priorVariance > 0) || Double.isInfinite(shear)
                || Double.isInfinite(shearError) || Double.isInfinite(stability) || Double.isInfinite(stabilityError)) {
            throw new IllegalArgumentException("a probability needs shear and errors of 0 or more and a positive prior variance, not shear "
                    + shear + " ± " + shearError + " 1/s, N² " + stability + " ± " + stabilityError + " 1/s², prior " + priorVariance);
        }
    }
}
