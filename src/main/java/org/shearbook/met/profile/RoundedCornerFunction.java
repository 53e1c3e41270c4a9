package org.shearbook.met.profile;

import org.apache.commons.math3.special.Erf;

/**
 * A quantity known at levels, made smooth for work that needs derivatives: the straight-line interpolant of the
 * levels with every corner rounded by a Gaussian of that corner's own width.
 *
 * <p>Shear, vorticity gradient and stability taken from it are derivatives of one and the same function, so they fit
 * together; any spacing is allowed, and a jump between two levels never becomes a jump of a derivative. The function
 * is analytic in the whole complex plane, which is what lets a stability calculation leave the real height axis: its
 * Taylor series, from the derivatives given here, converges everywhere.
 */
public final class RoundedCornerFunction {

    /*
     * With knots z_j, slopes m_j between z_j and z_(j+1), slope changes d_j = m_j - m_(j-1) at the inner knots,
     * q_j = (z - z_j)/s_j, G and Φ density and distribution function of the standard normal law:
     *
     *   f(z)       = f_0 + m_0 (z - z_0) + Σ d_j [ (z - z_j) Φ(q_j) + s_j G(q_j) ]
     *   f'(z)      = m_0 + Σ d_j Φ(q_j)
     *   f''(z)     = Σ d_j G(q_j) / s_j
     *   f^(2+m)(z) = Σ d_j (-1)^m He_m(q_j) G(q_j) / s_j^(m+1)          He_m: Hermite polynomials, He_1(q) = q
     *
     * Where all s_j are equal to s this is the interpolant convolved with a Gaussian of standard deviation s.
     *
     * A corner that lies more than REACH widths below z has turned completely: all such corners together are the
     * straight line of the segment above the highest of them, so they cost nothing and nothing cancels. A corner that
     * lies REACH widths above z has not begun. Widths differ, so "completely turned" is not ordered like the knots;
     * the running maximum of z_j + REACH s_j and the running minimum of z_j - REACH s_j are, and two pointers that only
     * move up find the corners in between. Work is O(knots + heights x corners in reach).
     *
     * Φ and G come from a table with spacing 1/256 and a third-order Taylor step from its nearest entry, which serves
     * both from one entry since Φ' = G and G' = -qG; error below 1e-12.
     */

    /** Derivatives are given up to this order. */
    public static final int HIGHEST_DERIVATIVE = 8;

    /** Widths beyond which a corner counts as not begun or completely turned; Φ(-6) = 1e-9. */
    private static final double REACH = 6;
    private static final int ENTRIES_PER_WIDTH = 256;
    private static final double[] DENSITY = new double[(int) (2 * REACH) * ENTRIES_PER_WIDTH + 1];
    private static final double[] DISTRIBUTION = new double[DENSITY.length];

    static {
        for (int i = 0; i < DENSITY.length; i++) {
            double q = (double) i / ENTRIES_PER_WIDTH - REACH;
            DENSITY[i] = Math.exp(-0.5 * q * q) / Math.sqrt(2 * Math.PI);
            DISTRIBUTION[i] = 0.5 * Erf.erfc(-q / Math.sqrt(2));
        }
    }

    private final double[] knotHeights;
    private final double[] values;
    private final double[] cornerWidths;
    private final double[] inverseWidths;
    private final double[] slopes;
    private final double[] changes;
    private final double[] turnedAbove;
    private final double[] begunAbove;

    /**
     * The interpolant through {@code values} at {@code knotHeights}, corner {@code j} rounded over
     * {@code cornerWidths[j]}. Below the lowest and above the highest knot the end segments go on as straight lines;
     * there is no corner at an end knot, and the widths given for the two ends only count in
     * {@link #narrowestCorner}.
     *
     * @param knotHeights  heights of the knots [m], shape {@code [n]}, strictly increasing, {@code n ≥ 2}
     * @param values       the quantity at the knots [its unit], shape {@code [n]}, finite
     * @param cornerWidths standard deviation of each corner's Gaussian [m], shape {@code [n]}, positive
     * @throws IllegalArgumentException if lengths differ, {@code n < 2}, a number is not finite, heights do not
     *         strictly increase or a width is not positive (the message names the element)
     */
    public RoundedCornerFunction(double[] knotHeights, double[] values, double[] cornerWidths) {
        requireIncreasing(knotHeights);
        int n = knotHeights.length;
        if (values.length != n || cornerWidths.length != n) {
            throw new IllegalArgumentException("values (" + values.length + ") and cornerWidths ("
                    + cornerWidths.length + ") must have as many elements as knotHeights (" + n + ")");
        }
        for (int j = 0; j < n; j++) {
            if (!Double.isFinite(values[j])) {
                throw new IllegalArgumentException("values[" + j + "] is not a finite number: " + values[j]);
            }
            if (!(cornerWidths[j] > 0) || Double.isInfinite(cornerWidths[j])) {
                throw new IllegalArgumentException("cornerWidths[" + j + "] must be positive and finite: "
                        + cornerWidths[j]);
            }
        }
        this.knotHeights = knotHeights.clone();
        this.values = values.clone();
        this.cornerWidths = cornerWidths.clone();
        inverseWidths = new double[n];
        for (int j = 0; j < n; j++) {
            inverseWidths[j] = 1 / cornerWidths[j];
        }
        slopes = new double[n - 1];
        changes = new double[n];
        turnedAbove = new double[n];
        begunAbove = new double[n];
        for (int j = 0; j < n - 1; j++) {
            slopes[j] = (values[j + 1] - values[j]) / (knotHeights[j + 1] - knotHeights[j]);
        }
        for (int j = 1; j < n - 1; j++) {
            changes[j] = slopes[j] - slopes[j - 1];
        }
        turnedAbove[0] = Double.NEGATIVE_INFINITY;
        for (int j = 1; j < n - 1; j++) {
            turnedAbove[j] = Math.max(turnedAbove[j - 1], knotHeights[j] + REACH * cornerWidths[j]);
        }
        turnedAbove[n - 1] = Double.POSITIVE_INFINITY;
        begunAbove[n - 1] = Double.POSITIVE_INFINITY;
        for (int j = n - 2; j > 0; j--) {
            begunAbove[j] = Math.min(begunAbove[j + 1], knotHeights[j] - REACH * cornerWidths[j]);
        }
        begunAbove[0] = Double.NEGATIVE_INFINITY;
    }

    /**
     * Corner widths for a smoothing and the levels at hand: {@code s_j = max(smoothing, ¼ min(gap below, gap above))}.
     * A coarse ascent so rounds its own corners and no detail finer than its levels is invented.
     *
     * @param knotHeights heights of the knots [m], shape {@code [n]}, strictly increasing, {@code n ≥ 2}
     * @param smoothing   standard deviation of the smoothing [m], zero or positive; a window of full width at half
     *                    maximum {@code w} is {@code w / 2.3548}, see {@link #standardDeviation}
     * @return widths [m], shape {@code [n]}, positive
     * @throws IllegalArgumentException if heights do not strictly increase or smoothing is negative or not finite
     */
    public static double[] cornerWidths(double[] knotHeights, double smoothing) {
        requireIncreasing(knotHeights);
        if (!(smoothing >= 0) || Double.isInfinite(smoothing)) {
            throw new IllegalArgumentException("smoothing must be zero or positive and finite: " + smoothing);
        }
        int n = knotHeights.length;
        double[] widths = new double[n];
        for (int j = 0; j < n; j++) {
            double below = j > 0 ? knotHeights[j] - knotHeights[j - 1] : Double.POSITIVE_INFINITY;
            double above = j < n - 1 ? knotHeights[j + 1] - knotHeights[j] : Double.POSITIVE_INFINITY;
            widths[j] = Math.max(smoothing, 0.25 * Math.min(below, above));
        }
        return widths;
    }

    /**
     * Standard deviation of the Gaussian whose full width at half maximum is {@code window}:
     * {@code window / (2 √(2 ln 2))}.
     *
     * @param window full width at half maximum [m]
     * @return standard deviation [m]
     */
    public static double standardDeviation(double window) {
        return window / (2 * Math.sqrt(2 * Math.log(2)));
    }

    /** The function at one height [m]. */
    public double value(double z) {
        return derivative(z, 0);
    }

    /** The first derivative at one height [m], in the quantity's unit per metre. */
    public double firstDerivative(double z) {
        return derivative(z, 1);
    }

    /** The second derivative at one height [m], in the quantity's unit per square metre. */
    public double secondDerivative(double z) {
        return derivative(z, 2);
    }

    private double derivative(double z, int order) {
        double[] at = new double[order + 1];
        derivatives(z, at);
        return at[order];
    }

    /**
     * The function and its derivatives at one height.
     *
     * <p><b>Limits.</b> Corners farther than six of their widths are taken as not begun or completely turned: relative
     * to a corner's slope change this drops 1e-9 of the slope, and less than 2e-4 / s⁷ of the eighth derivative.
     *
     * @param z           height [m], finite
     * @param derivatives filled with the derivatives of order 0, 1, … {@code length - 1 ≤ 8}
     * @throws IllegalArgumentException if z is not finite or the array is empty or longer than nine
     */
    public void derivatives(double z, double[] derivatives) {
        requireOrders(derivatives.length);
        requireFinite(z, "z");
        int turned = firstAtOrAbove(turnedAbove, z);
        int begun = Math.max(turned, firstAtOrAbove(begunAbove, z));
        sum(z, turned, begun, derivatives);
    }

    /**
     * Function, first and second derivative at many heights. Method and limits as {@link #derivatives(double, double[])}
     * in O(knots + heights × corners in reach).
     *
     * @param ascendingHeights heights [m], shape {@code [m]}, finite, not decreasing
     * @param value            filled with f, shape {@code [m]} or longer
     * @param first            filled with f′, shape {@code [m]} or longer
     * @param second           filled with f″, shape {@code [m]} or longer
     * @throws IllegalArgumentException if heights decrease or are not finite (the message names the element)
     */
    public void evaluate(double[] ascendingHeights, double[] value, double[] first, double[] second) {
        derivatives(ascendingHeights, new double[][] {value, first, second});
    }

    /**
     * The function and its derivatives at many heights; method, limits and cost as
     * {@link #evaluate(double[], double[], double[], double[])}.
     *
     * @param ascendingHeights heights [m], shape {@code [m]}, finite, not decreasing
     * @param derivatives      filled so that {@code derivatives[k][i]} is the derivative of order k at height i;
     *                         shape {@code [≤ 9][m]} or longer
     * @throws IllegalArgumentException if heights decrease or are not finite (the message names the element) or more
     *         than eight derivatives are asked for
     */
    public void derivatives(double[] ascendingHeights, double[][] derivatives) {
        int orders = derivatives.length;
        requireOrders(orders);
        double[] at = new double[orders];
        int turned = 0;
        int begun = 0;
        double previous = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < ascendingHeights.length; i++) {
            double z = ascendingHeights[i];
            if (!(z >= previous) || Double.isInfinite(z)) {
                throw new IllegalArgumentException("ascendingHeights[" + i + "] must be finite and not below the one"
                        + " before it: " + z + " after " + previous);
            }
            previous = z;
            while (turnedAbove[turned] < z) {
                turned++;
            }
            begun = Math.max(begun, turned);
            while (begunAbove[begun] < z) {
                begun++;
            }
            sum(z, turned, begun, at);
            for (int k = 0; k < orders; k++) {
                derivatives[k][i] = at[k];
            }
        }
    }

    /** The line of the segment below knot {@code turned}, and the corners from there up to (not with) {@code begun}. */
    private void sum(double z, int turned, int begun, double[] at) {
        int orders = at.length;
        at[0] = values[turned - 1] + slopes[turned - 1] * (z - knotHeights[turned - 1]);
        if (orders > 1) {
            at[1] = slopes[turned - 1];
        }
        for (int k = 2; k < orders; k++) {
            at[k] = 0;
        }
        for (int j = turned; j < begun; j++) {
            double change = changes[j];
            double distance = z - knotHeights[j];
            double inverse = inverseWidths[j];
            double q = distance * inverse;
            if (change == 0 || q <= -REACH) {
                continue;
            }
            if (q >= REACH) {
                at[0] += change * distance;
                if (orders > 1) {
                    at[1] += change;
                }
                continue;
            }
            int entry = (int) ((q + REACH) * ENTRIES_PER_WIDTH + 0.5);
            double node = (double) entry / ENTRIES_PER_WIDTH - REACH;
            double t = q - node;
            double node2 = node * node;
            double density = DENSITY[entry]
                    * (1 - t * (node - t * (0.5 * (node2 - 1) - t * node * (node2 - 3) / 6)));
            double distribution = DISTRIBUTION[entry]
                    + DENSITY[entry] * t * (1 - t * (0.5 * node - t * ((node2 - 1) / 6 - t * node * (node2 - 3) / 24)));
            at[0] += change * (distance * distribution + cornerWidths[j] * density);
            if (orders > 1) {
                at[1] += change * distribution;
            }
            double scale = change * density * inverse;
            double hermite = 1;
            double lowerHermite = 0;
            for (int k = 2; k < orders; k++) {
                at[k] += scale * hermite;
                // signed Hermite polynomials h_m = (-1)^m He_m obey h_(m+1) = -(q h_m + m h_(m-1))
                double next = -(q * hermite + (k - 2) * lowerHermite);
                lowerHermite = hermite;
                hermite = next;
                scale *= inverse;
            }
        }
    }

    /** Height of the lowest knot [m]. */
    public double lowestKnot() {
        return knotHeights[0];
    }

    /** Height of the highest knot [m]. */
    public double highestKnot() {
        return knotHeights[knotHeights.length - 1];
    }

    /** Number of knots. */
    public int knotCount() {
        return knotHeights.length;
    }

    /** Heights of the knots [m], a copy. */
    public double[] knotHeights() {
        return knotHeights.clone();
    }

    /** The quantity at the knots before rounding, a copy. */
    public double[] values() {
        return values.clone();
    }

    /** Standard deviations of the corners' Gaussians [m], a copy. */
    public double[] cornerWidths() {
        return cornerWidths.clone();
    }

    /**
     * Width of the narrowest corner between two heights, which says how fine a grid must be to see the function there.
     * Where no knot lies between them it is the narrower of the two neighbouring ones.
     *
     * @param from lower height [m]
     * @param to   upper height [m]
     * @return standard deviation [m], positive
     */
    public double narrowestCorner(double from, double to) {
        int last = knotHeights.length - 1;
        int low = firstAtOrAbove(knotHeights, from);
        int high = firstAtOrAbove(knotHeights, to);
        double narrowest = Double.POSITIVE_INFINITY;
        for (int j = low; j < high; j++) {
            narrowest = Math.min(narrowest, cornerWidths[j]);
        }
        if (low == high) {
            narrowest = Math.min(cornerWidths[Math.max(0, low - 1)], cornerWidths[Math.min(last, low)]);
        }
        return narrowest;
    }

    /** Index of the first element not below {@code z} in a non-decreasing array; its length if there is none. */
    private static int firstAtOrAbove(double[] ascending, double z) {
        int low = 0;
        int high = ascending.length;
        while (low < high) {
            int middle = (low + high) >>> 1;
            if (ascending[middle] < z) {
                low = middle + 1;
            } else {
                high = middle;
            }
        }
        return low;
    }

    private static void requireIncreasing(double[] knotHeights) {
        if (knotHeights.length < 2) {
            throw new IllegalArgumentException("at least two knots are needed, got " + knotHeights.length);
        }
        for (int j = 0; j < knotHeights.length; j++) {
            requireFinite(knotHeights[j], "knotHeights[" + j + "]");
            if (j > 0 && !(knotHeights[j] > knotHeights[j - 1])) {
                throw new IllegalArgumentException("knotHeights must strictly increase: knotHeights[" + j + "] = "
                        + knotHeights[j] + " after " + knotHeights[j - 1]);
            }
        }
    }

    private static void requireFinite(double value, String name) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException(name + " is not a finite number: " + value);
        }
    }

    private static void requireOrders(int orders) {
        if (orders < 1 || orders > HIGHEST_DERIVATIVE + 1) {
            throw new IllegalArgumentException("derivatives of order 0 to " + HIGHEST_DERIVATIVE
                    + " are available, asked for " + orders + " orders");
        }
    }
}
