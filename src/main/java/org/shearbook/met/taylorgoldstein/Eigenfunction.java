package org.shearbook.met.taylorgoldstein;

import java.util.Arrays;

/**
 * Vertical structure of a growing wave on the real height axis: the complex vertical-velocity amplitude ŵ(z), scaled so
 * that its greatest modulus is one and its phase is zero there.
 */
public final class Eigenfunction {

    /*
     * The phase speed is known from the complex path. On the real axis the same Numerov recurrence is marched from both
     * ends with that phase speed, on a grid fine enough for the nearby singularity (a third of Im c per shear, at most
     * MOST_INTERVALS). At an eigenvalue the solutions from below (a) and above (b) are the same function up to a factor;
     * they are joined where |a b| is greatest, so that neither is used where it has become contaminated by growth away
     * from the wave.
     */

    private static final int MOST_INTERVALS = 8000;

    private final double[] heights;
    private final double[] re;
    private final double[] im;
    private final VerticalExtent extent;

    private Eigenfunction(double[] heights, double[] re, double[] im, VerticalExtent extent) {
        this.heights = heights;
        this.re = re;
        this.im = im;
        this.extent = extent;
    }

    static Eigenfunction of(StratifiedShearFlow flow, int intervals, double greatestShear, Mode mode) {
        double angle = Math.toRadians(90 - mode.azimuth());
        double cosine = Math.cos(angle);
        double sine = Math.sin(angle);
        double k = mode.horizontalWavenumber();
        double cRe = mode.phaseSpeed();
        double cIm = mode.growthRate() / k;
        double wanted = cIm / (3 * greatestShear);
        int n = (int) Math.min(MOST_INTERVALS, Math.max(intervals, Math.ceil((flow.top() - flow.base()) / wanted)));
        SampledFlow sampled = flow.sampled(n, 3);
        double h = sampled.spacing;
        double[] tRe = new double[n + 1];
        double[] tIm = new double[n + 1];
        double[] fRe = new double[n + 1];
        double[] fIm = new double[n + 1];
        double step = Math.exp(-0.5 * k * h);
        double twelfth = h * h / 12;
        for (int i = 0; i <= n; i++) {
            double x = sampled.wind(i, cosine, sine) - cRe;
            double inverse = 1 / (x * x + cIm * cIm);
            double pRe = x * inverse;
            double pIm = cIm * inverse;
            double curvature = sampled.eastward[2][i] * cosine + sampled.northward[2][i] * sine;
            double n2 = sampled.stability[0][i];
            fRe[i] = 1 - twelfth * (k * k + curvature * pRe - n2 * (pRe * pRe - pIm * pIm));
            fIm[i] = -twelfth * (curvature * pIm - n2 * 2 * pRe * pIm);
            double size = 12 * step / (fRe[i] * fRe[i] + fIm[i] * fIm[i]);
            tRe[i] = size * fRe[i] - 10 * step;
            tIm[i] = -size * fIm[i];
        }
        double[][] a = march(tRe, tIm, step, sampled.lower == Boundary.RIGID, decay(sampled, 0, cosine, sine, mode));
        double[] tReUp = reversed(tRe);
        double[] tImUp = reversed(tIm);
        double[][] b = march(tReUp, tImUp, step, sampled.upper == Boundary.RIGID,
                decay(sampled, n, cosine, sine, mode));
        double[] bRe = reversed(b[0]);
        double[] bIm = reversed(b[1]);
        int join = 0;
        double greatest = -1;
        for (int i = 0; i <= n; i++) {
            double product = Math.hypot(a[0][i], a[1][i]) * Math.hypot(bRe[i], bIm[i]);
            if (product > greatest) {
                greatest = product;
                join = i;
            }
        }
        return joined(sampled, k, cRe, cIm, cosine, sine, fRe, fIm, step, a, bRe, bIm, join);
    }

    private static Eigenfunction joined(SampledFlow sampled, double k, double cRe, double cIm, double cosine,
            double sine, double[] fRe, double[] fIm, double step, double[][] a, double[] bRe, double[] bIm, int join) {
        int n = sampled.intervals;
        double[] re = new double[n + 1];
        double[] im = new double[n + 1];
        double size = bRe[join] * bRe[join] + bIm[join] * bIm[join];
        double ratioRe = (a[0][join] * bRe[join] + a[1][join] * bIm[join]) / size;
        double ratioIm = (a[1][join] * bRe[join] - a[0][join] * bIm[join]) / size;
        int peak = 0;
        double greatest = 0;
        double logStep = Math.log(step);
        for (int i = 0; i <= n; i++) {
            // the march scales every step by "step"; seen from the join that is undone on both sides
            double scale = Math.exp(Math.abs(i - join) * logStep);
            double yRe = i <= join ? a[0][i] * scale : (bRe[i] * ratioRe - bIm[i] * ratioIm) * scale;
            double yIm = i <= join ? a[1][i] * scale : (bRe[i] * ratioIm + bIm[i] * ratioRe) * scale;
            double f = fRe[i] * fRe[i] + fIm[i] * fIm[i];
            re[i] = (yRe * fRe[i] + yIm * fIm[i]) / f;
            im[i] = (yIm * fRe[i] - yRe * fIm[i]) / f;
            double modulus = re[i] * re[i] + im[i] * im[i];
            if (modulus > greatest) {
                greatest = modulus;
                peak = i;
            }
        }
        double peakRe = re[peak] / greatest;
        double peakIm = -im[peak] / greatest;
        for (int i = 0; i <= n; i++) {
            double r = re[i];
            re[i] = r * peakRe - im[i] * peakIm;
            im[i] = r * peakIm + im[i] * peakRe;
        }
        double base = edge(sampled, re, im, 0, 1, cosine, sine, k, cRe, cIm);
        double top = edge(sampled, re, im, n, -1, cosine, sine, k, cRe, cIm);
        return new Eigenfunction(sampled.heights, re, im, new VerticalExtent(base, top));
    }

    /** Real and imaginary part of 1/ρ beyond an end, first order in the spacing: exp(-m h), m² = k² - N²/(U - c)². */
    private static double[] decay(SampledFlow flow, int end, double cosine, double sine, Mode mode) {
        double[] m = exponent(flow, end, cosine, sine, mode.horizontalWavenumber(), mode.phaseSpeed(),
                mode.growthRate() / mode.horizontalWavenumber());
        double size = Math.exp(-m[0] * flow.spacing);
        return new double[] {size * Math.cos(m[1] * flow.spacing), -size * Math.sin(m[1] * flow.spacing)};
    }

    private static double[] exponent(SampledFlow flow, int end, double cosine, double sine, double k, double cRe,
            double cIm) {
        double x = flow.wind(end, cosine, sine) - cRe;
        double inverse = 1 / (x * x + cIm * cIm);
        double pRe = x * inverse;
        double pIm = cIm * inverse;
        double n2 = Math.max(0, flow.stability[0][end]);
        double re = k * k - n2 * (pRe * pRe - pIm * pIm);
        double im = -n2 * 2 * pRe * pIm;
        double modulus = Math.sqrt(Math.hypot(re, im));
        double half = 0.5 * Math.atan2(im, re);
        return new double[] {modulus * Math.cos(half), modulus * Math.sin(half)};
    }

    private static double[][] march(double[] tRe, double[] tIm, double step, boolean rigid, double[] decay) {
        int n = tRe.length - 1;
        double[][] y = new double[2][n + 1];
        double previousRe = decay[0] / step;
        double previousIm = decay[1] / step;
        int from = 0;
        y[0][0] = 1;
        if (rigid) {
            y[0][0] = 0;
            y[0][1] = 1;
            previousRe = 0;
            previousIm = 0;
            from = 1;
        }
        for (int i = from; i < n; i++) {
            double re = tRe[i] * y[0][i] - tIm[i] * y[1][i] - step * step * previousRe;
            double im = tRe[i] * y[1][i] + tIm[i] * y[0][i] - step * step * previousIm;
            previousRe = y[0][i];
            previousIm = y[1][i];
            y[0][i + 1] = re;
            y[1][i + 1] = im;
        }
        return y;
    }

    private static double[] reversed(double[] values) {
        double[] reversed = new double[values.length];
        for (int i = 0; i < values.length; i++) {
            reversed[i] = values[values.length - 1 - i];
        }
        return reversed;
    }

    /** Outermost height with modulus 1/e, in the uniform flow beyond the end if the wave is still stronger there. */
    private static double edge(SampledFlow flow, double[] re, double[] im, int end, int inward, double cosine,
            double sine, double k, double cRe, double cIm) {
        double threshold = Math.exp(-1);
        double atEnd = Math.hypot(re[end], im[end]);
        boolean rigid = (inward > 0 ? flow.lower : flow.upper) == Boundary.RIGID;
        if (atEnd >= threshold && !rigid) {
            double rate = exponent(flow, end, cosine, sine, k, cRe, cIm)[0];
            return flow.heights[end] - inward * Math.log(atEnd / threshold) / rate;
        }
        int i = end;
        double outer = atEnd;
        while (i + inward >= 0 && i + inward <= flow.intervals) {
            double inner = Math.hypot(re[i + inward], im[i + inward]);
            if (inner >= threshold) {
                return flow.heights[i] + (threshold - outer) / (inner - outer) * inward * flow.spacing;
            }
            outer = inner;
            i += inward;
        }
        return flow.heights[end];
    }

    /** Heights [m], ascending, a copy, shape {@code [n]}. */
    public double[] heights() {
        return heights.clone();
    }

    /** Modulus of ŵ, greatest value 1, shape {@code [n]}. */
    public double[] amplitude() {
        double[] amplitude = new double[re.length];
        Arrays.setAll(amplitude, i -> Math.hypot(re[i], im[i]));
        return amplitude;
    }

    /** Phase of ŵ [rad], zero where the modulus is greatest, shape {@code [n]}. */
    public double[] phase() {
        double[] phase = new double[re.length];
        Arrays.setAll(phase, i -> Math.atan2(im[i], re[i]));
        return phase;
    }

    /** Heights between which the modulus exceeds 1/e. */
    public VerticalExtent extent() {
        return extent;
    }
}
