package org.shearbook.met.taylorgoldstein;

/**
 * The dispersion function D(c) of a flow along one azimuth: analytic in the upper half-plane of the phase speed c, and
 * zero exactly where a wave of the set wavenumber can grow. One object serves one thread; it keeps its work arrays.
 */
final class DispersionFunction {

    /*
     * Equation. Along the azimuth, with U the wind component and x = U - c,
     *
     *   w'' = g w,   g = k² + U''/x - N²/x²                                   (Taylor 1931, Goldstein 1931)
     *
     * Path. g is singular where U = c, and for weakly growing waves that height lies close to the real axis, where any
     * grid on the axis fails. The equation is therefore solved along z(ξ) = ξ + iη(ξ), η = -δ U'/max|dV/dz|: where the
     * wind increases upward the singularity of a growing wave lies above the axis and the path passes below, and the
     * other way round. δ = 0.3 corner widths, and η goes to zero towards both ends. The rounded-corner profile is
     * analytic everywhere, so D does not depend on the path (Cauchy); this is tested. Following singular equations off
     * the axis: Boyd 1985, J. Comput. Phys. 57, 454-471. Fields on the path come from their Taylor series in iη, up to
     * the eighth derivative.
     *
     * Discretisation. With w = sqrt(z') W the equation becomes W'' = (P g + S) W in ξ, P = z'², S = ¾(z''/z')² -
     * ½ z'''/z', which has no first derivative and suits Numerov's method, fourth order. For y = f W with
     * f = 1 - h²(P g + S)/12 it reads y_(i+1) + y_(i-1) = t_i y_i, t = 12/f - 10. Multiplied by x², f is a quadratic
     *
     *   F = x² f = A x² + B x + C,   A = 1 - h²(S + k² P)/12,   B = -h² P U''/12,   C = h² P N²/12
     *
     * so that t = 12 x²/F - 10 needs one division a level and dt/dc = -12 x (B x + 2 C)/F², dt/dk² = h² P x⁴/F².
     *
     * Ends. Rigid: y = 0 there. Radiating: outside, wind and N² stay uniform, so ρ + 1/ρ = t̂ with |ρ| > 1 is exact for
     * the discrete equation. t̂ is formed from the real end values and without U'': otherwise a branch cut enters the
     * upper half-plane and zeros are counted wrongly.
     *
     * Matching. a solves from below, b from above; D = t_m a_m b_m - a_(m-1) b_m - a_m b_(m+1) is their Wronskian and
     * does not depend on m. dD/dc comes from the differentiated recurrences. Newton's method acts on D itself: the jump
     * D/(a_m b_m) has a pole beside the root whenever the wave lives far from m.
     *
     * Scale. Both solutions are rescaled by a real factor when they become large or small; its logarithm is kept beside
     * D. Through a long quiet stretch towards an end (shear weak against stability, or wind nearly that of the end) each
     * step is scaled by the 1/ρ(c) of its own level: for phase speeds close to the wind there, the solution otherwise
     * turns through hundreds of radians, and a search would have to follow each of them. The factor is analytic in the
     * upper half-plane and has no zero, so it moves no root and changes no count.
     *
     * Cost. Per evaluation about 30 flops and one division a level in loops that a compiler can vectorise (kept short
     * and separate on purpose: one long loop is not vectorised by the JDK 17 compiler), then two interleaved scalar
     * recurrences.
     */

    private static final double PATH_OFFSET = 0.3;
    private static final double TAPER_FRACTION = 0.25;
    private static final double LONGEST_TAPER = 8;
    private static final double UNIFORM = 0.02;
    private static final int LONG_STRETCH = 64;
    private static final int BLOCK = 64;
    private static final double LARGE = 1e60;

    private final int n;
    private final int match;
    private final int lowerFirst;
    private final int upperFirst;
    private final double spacing;
    private final double twelfth;
    private final boolean lowerRigid;
    private final boolean upperRigid;
    private final double lowerWind;
    private final double upperWind;
    private final double lowerStability;
    private final double upperStability;
    private final double[] axisWind;
    private final double[] axisStability;
    private final double[] windRe;
    private final double[] windIm;
    private final double[] freeRe;
    private final double[] freeIm;
    private final double[] pathRe;
    private final double[] pathIm;
    private final double[] aRe;
    private final double[] aIm;
    private final double[] bRe;
    private final double[] bIm;
    private final double[] cRe;
    private final double[] cIm;

    private final double[] numRe;
    private final double[] numIm;
    private final double[] fRe;
    private final double[] fIm;
    private final double[] tRe;
    private final double[] tIm;
    private final double[] dRe;
    private final double[] dIm;

    private final double lowestWind;
    private final double highestWind;
    private double wavenumber = Double.NaN;
    private long evaluations;

    private double valueRe;
    private double valueIm;
    private double slopeRe;
    private double slopeIm;
    private double rootRe;
    private double rootIm;
    private double lastStep;

    private double logScale;
    private double aPrevRe;
    private double aPrevIm;
    private double aNowRe;
    private double aNowIm;
    private double aPrevSlopeRe;
    private double aPrevSlopeIm;
    private double aSlopeRe;
    private double aSlopeIm;
    private double bPrevRe;
    private double bPrevIm;
    private double bNowRe;
    private double bNowIm;
    private double bPrevSlopeRe;
    private double bPrevSlopeIm;
    private double bSlopeRe;
    private double bSlopeIm;
    private double closureRe;
    private double closureIm;
    private double closureSlopeRe;
    private double closureSlopeIm;

    /**
     * @param flow        the flow on its grid
     * @param cosine      eastward part of the azimuth's unit vector
     * @param sine        northward part
     * @param cornerWidth finest corner width [m], which sets how far the path leaves the axis
     */
    DispersionFunction(SampledFlow flow, double cosine, double sine, double cornerWidth) {
        this(flow, cosine, sine, cornerWidth, PATH_OFFSET);
    }

    /** With the path's offset in corner widths; 0 stays on the real axis. */
    DispersionFunction(SampledFlow flow, double cosine, double sine, double cornerWidth, double pathOffset) {
        n = flow.intervals;
        match = n / 2;
        spacing = flow.spacing;
        lowerRigid = flow.lower == Boundary.RIGID;
        upperRigid = flow.upper == Boundary.RIGID;
        lowerWind = flow.wind(0, cosine, sine);
        upperWind = flow.wind(n, cosine, sine);
        lowerStability = Math.max(0, flow.stability[0][0]);
        upperStability = Math.max(0, flow.stability[0][n]);
        windRe = new double[n + 1];
        windIm = new double[n + 1];
        freeRe = new double[n + 1];
        freeIm = new double[n + 1];
        pathRe = new double[n + 1];
        pathIm = new double[n + 1];
        aRe = new double[n + 1];
        aIm = new double[n + 1];
        bRe = new double[n + 1];
        bIm = new double[n + 1];
        cRe = new double[n + 1];
        cIm = new double[n + 1];
        numRe = new double[n + 1];
        numIm = new double[n + 1];
        fRe = new double[n + 1];
        fIm = new double[n + 1];
        tRe = new double[n + 1];
        tIm = new double[n + 1];
        dRe = new double[n + 1];
        dIm = new double[n + 1];

        double[] offset = pathOffset(flow, cosine, sine, pathOffset * cornerWidth,
                Math.min(TAPER_FRACTION * n, LONGEST_TAPER * cornerWidth / spacing));
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        twelfth = spacing * spacing / 12;
        double[][] u = flow.eastward;
        double[][] v = flow.northward;
        double[][] s = flow.stability;
        for (int i = 0; i <= n; i++) {
            double wind = flow.wind(i, cosine, sine);
            low = Math.min(low, wind);
            high = Math.max(high, wind);
            geometry(offset, i);
            double e = offset[i];
            double e2 = e * e;
            double u2 = u[2][i] * cosine + v[2][i] * sine;
            double u3 = u[3][i] * cosine + v[3][i] * sine;
            double u4 = u[4][i] * cosine + v[4][i] * sine;
            double u5 = u[5][i] * cosine + v[5][i] * sine;
            double u6 = u[6][i] * cosine + v[6][i] * sine;
            double u7 = u[7][i] * cosine + v[7][i] * sine;
            double u8 = u[8][i] * cosine + v[8][i] * sine;
            windRe[i] = wind - e2 / 2 * (u2 - e2 / 12 * (u4 - e2 / 30 * (u6 - e2 / 56 * u8)));
            windIm[i] = e * (u[1][i] * cosine + v[1][i] * sine - e2 / 6 * (u3 - e2 / 20 * (u5 - e2 / 42 * u7)));
            double curvatureRe = u2 - e2 / 2 * (u4 - e2 / 12 * (u6 - e2 / 30 * u8));
            double curvatureIm = e * (u3 - e2 / 6 * (u5 - e2 / 20 * u7));
            double stabilityRe = s[0][i] - e2 / 2 * (s[2][i] - e2 / 12 * (s[4][i] - e2 / 30 * s[6][i]));
            double stabilityIm = e * (s[1][i] - e2 / 6 * (s[3][i] - e2 / 20 * (s[5][i] - e2 / 42 * s[7][i])));
            bRe[i] = -(pathRe[i] * curvatureRe - pathIm[i] * curvatureIm);
            bIm[i] = -(pathRe[i] * curvatureIm + pathIm[i] * curvatureRe);
            cRe[i] = pathRe[i] * stabilityRe - pathIm[i] * stabilityIm;
            cIm[i] = pathRe[i] * stabilityIm + pathIm[i] * stabilityRe;
        }
        lowestWind = low;
        highestWind = high;
        // where the plain march begins: behind a rigid end, or behind a long quiet stretch
        double near = UNIFORM * (high - low);
        int first = 0;
        while (!lowerRigid && first < match - 1 && quiet(flow, first, cosine, sine, lowerWind, near)) {
            first++;
        }
        lowerFirst = lowerRigid ? 1 : first >= LONG_STRETCH ? first : 0;
        first = n;
        while (!upperRigid && first > match + 1 && quiet(flow, first, cosine, sine, upperWind, near)) {
            first--;
        }
        upperFirst = upperRigid ? n - 1 : n - first >= LONG_STRETCH ? first : n;
        axisWind = new double[n + 1];
        axisStability = new double[n + 1];
        for (int i = 0; i <= n; i++) {
            axisWind[i] = flow.wind(i, cosine, sine);
            axisStability[i] = Math.max(0, flow.stability[0][i]);
        }
    }

    /** Whether the wind at a level is nearly that of the end, or its shear weak against stability. */
    private static boolean quiet(SampledFlow flow, int i, double cosine, double sine, double endWind, double near) {
        double shear = flow.eastward[1][i] * cosine + flow.northward[1][i] * sine;
        return shear * shear < flow.stability[0][i] || Math.abs(flow.wind(i, cosine, sine) - endWind) < near;
    }

    private static double[] pathOffset(SampledFlow flow, double cosine, double sine, double length, double taper) {
        int n = flow.intervals;
        double[] offset = new double[n + 1];
        double scale = flow.greatestShear > 0 ? length / flow.greatestShear : 0;
        for (int i = 0; i <= n; i++) {
            double shear = flow.eastward[1][i] * cosine + flow.northward[1][i] * sine;
            double f = Math.min(1, Math.min(i, n - i) / taper);
            double ramp = f * f * f * f * (35 + f * (-84 + f * (70 - 20 * f)));
            offset[i] = -scale * shear * ramp;
        }
        return offset;
    }

    /** h²P/12 and 1 - h²S/12 at one level; all differences fourth order, the third derivative needs seven points. */
    private void geometry(double[] e, int i) {
        double l3 = at(e, i - 3);
        double l2 = at(e, i - 2);
        double l1 = at(e, i - 1);
        double r1 = at(e, i + 1);
        double r2 = at(e, i + 2);
        double r3 = at(e, i + 3);
        double h = spacing;
        double first = (l2 - 8 * l1 + 8 * r1 - r2) / (12 * h);
        double second = (-l2 + 16 * l1 - 30 * e[i] + 16 * r1 - r2) / (12 * h * h);
        double third = (l3 - 8 * l2 + 13 * l1 - 13 * r1 + 8 * r2 - r3) / (8 * h * h * h);
        double inverse = 1 / (1 + first * first);
        double ratioRe = first * second * inverse;
        double ratioIm = second * inverse;
        pathRe[i] = twelfth * (1 - first * first);
        pathIm[i] = twelfth * 2 * first;
        freeRe[i] = 1 - twelfth * (0.75 * (ratioRe * ratioRe - ratioIm * ratioIm) - 0.5 * first * third * inverse);
        freeIm[i] = -twelfth * (1.5 * ratioRe * ratioIm - 0.5 * third * inverse);
    }

    private static double at(double[] e, int i) {
        return i < 0 || i >= e.length ? 0 : e[i];
    }

    /** Sets the horizontal wavenumber [rad/m] for the evaluations that follow. */
    void setWavenumber(double k) {
        if (k == wavenumber) {
            return;
        }
        wavenumber = k;
        double k2 = k * k;
        for (int i = 0; i <= n; i++) {
            aRe[i] = freeRe[i] - k2 * pathRe[i];
            aIm[i] = freeIm[i] - k2 * pathIm[i];
        }
    }

    /** Evaluates D(c); the result is in {@link #valueRe()}, {@link #valueIm()} and {@link #logScale()}. */
    void evaluate(double speedRe, double speedIm) {
        evaluations++;
        coefficients(speedRe, speedIm);
        startBelow(speedRe, speedIm);
        startAbove(speedRe, speedIm);
        logScale = 0;
        final double[] tRe = this.tRe;
        final double[] tIm = this.tIm;
        final int m = match;
        int i = lowerFirst;
        int j = upperFirst;
        double aPrevRe = this.aPrevRe;
        double aPrevIm = this.aPrevIm;
        double aNowRe = this.aNowRe;
        double aNowIm = this.aNowIm;
        double bPrevRe = this.bPrevRe;
        double bPrevIm = this.bPrevIm;
        double bNowRe = this.bNowRe;
        double bNowIm = this.bNowIm;
        while (i < m || j > m) {
            int steps = Math.min(BLOCK, Math.min(m - i, j - m));
            if (steps > 0) {
                for (int end = i + steps; i < end; i++, j--) {
                    double re = tRe[i] * aNowRe - tIm[i] * aNowIm - aPrevRe;
                    double im = tRe[i] * aNowIm + tIm[i] * aNowRe - aPrevIm;
                    aPrevRe = aNowRe;
                    aPrevIm = aNowIm;
                    aNowRe = re;
                    aNowIm = im;
                    re = tRe[j] * bNowRe - tIm[j] * bNowIm - bPrevRe;
                    im = tRe[j] * bNowIm + tIm[j] * bNowRe - bPrevIm;
                    bPrevRe = bNowRe;
                    bPrevIm = bNowIm;
                    bNowRe = re;
                    bNowIm = im;
                }
            } else if (i < m) {
                for (int end = Math.min(m, i + BLOCK); i < end; i++) {
                    double re = tRe[i] * aNowRe - tIm[i] * aNowIm - aPrevRe;
                    double im = tRe[i] * aNowIm + tIm[i] * aNowRe - aPrevIm;
                    aPrevRe = aNowRe;
                    aPrevIm = aNowIm;
                    aNowRe = re;
                    aNowIm = im;
                }
            } else {
                for (int end = Math.max(m, j - BLOCK); j > end; j--) {
                    double re = tRe[j] * bNowRe - tIm[j] * bNowIm - bPrevRe;
                    double im = tRe[j] * bNowIm + tIm[j] * bNowRe - bPrevIm;
                    bPrevRe = bNowRe;
                    bPrevIm = bNowIm;
                    bNowRe = re;
                    bNowIm = im;
                }
            }
            double size = Math.abs(aNowRe) + Math.abs(aNowIm) + Math.abs(aPrevRe) + Math.abs(aPrevIm);
            if (size > LARGE || size < 1 / LARGE) {
                aPrevRe /= size;
                aPrevIm /= size;
                aNowRe /= size;
                aNowIm /= size;
                logScale += Math.log(size);
            }
            size = Math.abs(bNowRe) + Math.abs(bNowIm) + Math.abs(bPrevRe) + Math.abs(bPrevIm);
            if (size > LARGE || size < 1 / LARGE) {
                bPrevRe /= size;
                bPrevIm /= size;
                bNowRe /= size;
                bNowIm /= size;
                logScale += Math.log(size);
            }
        }
        double re = tRe[m] * bNowRe - tIm[m] * bNowIm - bPrevRe;
        double im = tRe[m] * bNowIm + tIm[m] * bNowRe - bPrevIm;
        valueRe = aNowRe * re - aNowIm * im - (aPrevRe * bNowRe - aPrevIm * bNowIm);
        valueIm = aNowRe * im + aNowIm * re - (aPrevRe * bNowIm + aPrevIm * bNowRe);
    }

    /** First values of the solution from below, past the quiet stretch. */
    private void startBelow(double speedRe, double speedIm) {
        aPrevRe = 0;
        aPrevIm = 0;
        aNowRe = 1;
        aNowIm = 0;
        if (lowerRigid) {
            return;
        }
        decay(speedRe, speedIm, lowerWind, lowerStability);
        double qRe = closureRe;
        double qIm = closureIm;
        // a step scaled by the 1/ρ of its level: with slowly varying wind and stability both stay near 1
        aPrevRe = 1;
        for (int i = 0; i < lowerFirst; i++) {
            double lastRe = qRe;
            double lastIm = qIm;
            decay(speedRe, speedIm, axisWind[i], axisStability[i]);
            qRe = closureRe;
            qIm = closureIm;
            double sRe = tRe[i] * aNowRe - tIm[i] * aNowIm - (lastRe * aPrevRe - lastIm * aPrevIm);
            double sIm = tRe[i] * aNowIm + tIm[i] * aNowRe - (lastRe * aPrevIm + lastIm * aPrevRe);
            aPrevRe = aNowRe;
            aPrevIm = aNowIm;
            aNowRe = sRe * qRe - sIm * qIm;
            aNowIm = sRe * qIm + sIm * qRe;
        }
        double re = aPrevRe * qRe - aPrevIm * qIm;
        aPrevIm = aPrevRe * qIm + aPrevIm * qRe;
        aPrevRe = re;
    }

    /** First values of the solution from above, past the quiet stretch. */
    private void startAbove(double speedRe, double speedIm) {
        bPrevRe = 0;
        bPrevIm = 0;
        bNowRe = 1;
        bNowIm = 0;
        if (upperRigid) {
            return;
        }
        decay(speedRe, speedIm, upperWind, upperStability);
        double qRe = closureRe;
        double qIm = closureIm;
        // a step scaled by the 1/ρ of its level: with slowly varying wind and stability both stay near 1
        bPrevRe = 1;
        for (int j = n; j > upperFirst; j--) {
            double lastRe = qRe;
            double lastIm = qIm;
            decay(speedRe, speedIm, axisWind[j], axisStability[j]);
            qRe = closureRe;
            qIm = closureIm;
            double sRe = tRe[j] * bNowRe - tIm[j] * bNowIm - (lastRe * bPrevRe - lastIm * bPrevIm);
            double sIm = tRe[j] * bNowIm + tIm[j] * bNowRe - (lastRe * bPrevIm + lastIm * bPrevRe);
            bPrevRe = bNowRe;
            bPrevIm = bNowIm;
            bNowRe = sRe * qRe - sIm * qIm;
            bNowIm = sRe * qIm + sIm * qRe;
        }
        double re = bPrevRe * qRe - bPrevIm * qIm;
        bPrevIm = bPrevRe * qIm + bPrevIm * qRe;
        bPrevRe = re;
    }

    /** t at every level, in four loops short enough to be vectorised. */
    private void coefficients(double speedRe, double speedIm) {
        final int levels = n + 1;
        final double[] windRe = this.windRe;
        final double[] windIm = this.windIm;
        final double[] numRe = this.numRe;
        final double[] numIm = this.numIm;
        final double[] fRe = this.fRe;
        final double[] fIm = this.fIm;
        final double[] bRe = this.bRe;
        final double[] bIm = this.bIm;
        final double[] cRe = this.cRe;
        final double[] cIm = this.cIm;
        final double[] aRe = this.aRe;
        final double[] aIm = this.aIm;
        final double[] tRe = this.tRe;
        final double[] tIm = this.tIm;
        for (int i = 0; i < levels; i++) {
            double x = windRe[i] - speedRe;
            double y = windIm[i] - speedIm;
            fRe[i] = bRe[i] * x - bIm[i] * y + cRe[i];
            fIm[i] = bRe[i] * y + bIm[i] * x + cIm[i];
        }
        for (int i = 0; i < levels; i++) {
            double x = windRe[i] - speedRe;
            double y = windIm[i] - speedIm;
            numRe[i] = x * x - y * y;
            numIm[i] = 2 * x * y;
        }
        for (int i = 0; i < levels; i++) {
            fRe[i] += aRe[i] * numRe[i] - aIm[i] * numIm[i];
            fIm[i] += aRe[i] * numIm[i] + aIm[i] * numRe[i];
        }
        for (int i = 0; i < levels; i++) {
            double scale = 12 / (fRe[i] * fRe[i] + fIm[i] * fIm[i]);
            tRe[i] = scale * (numRe[i] * fRe[i] + numIm[i] * fIm[i]) - 10;
            tIm[i] = scale * (numIm[i] * fRe[i] - numRe[i] * fIm[i]);
        }
    }

    /** Evaluates D and dD/dc; besides the value the slope is in {@link #slopeRe()} and {@link #slopeIm()}. */
    void evaluateWithSlope(double speedRe, double speedIm) {
        evaluations += 2;
        coefficients(speedRe, speedIm);
        // -12 x (B x + 2 C) / F²
        for (int i = 0; i <= n; i++) {
            double x = windRe[i] - speedRe;
            double y = windIm[i] - speedIm;
            double sumRe = bRe[i] * x - bIm[i] * y + 2 * cRe[i];
            double sumIm = bRe[i] * y + bIm[i] * x + 2 * cIm[i];
            dRe[i] = x * sumRe - y * sumIm;
            dIm[i] = x * sumIm + y * sumRe;
        }
        for (int i = 0; i <= n; i++) {
            double squareRe = fRe[i] * fRe[i] - fIm[i] * fIm[i];
            double squareIm = 2 * fRe[i] * fIm[i];
            double scale = -12 / (squareRe * squareRe + squareIm * squareIm);
            double re = dRe[i];
            double im = dIm[i];
            dRe[i] = scale * (re * squareRe + im * squareIm);
            dIm[i] = scale * (im * squareRe - re * squareIm);
        }
        marchWithSlope(speedRe, speedIm);
    }

    /**
     * Both solutions with their derivatives by c. The factors by which a quiet stretch is scaled count as constants, which
     * Newton's method may do: they multiply value and slope alike where the value vanishes.
     */
    private void marchWithSlope(double speedRe, double speedIm) {
        final double[] tRe = this.tRe;
        final double[] tIm = this.tIm;
        final double[] dRe = this.dRe;
        final double[] dIm = this.dIm;
        final int m = match;
        startSlopeBelow(speedRe, speedIm);
        startSlopeAbove(speedRe, speedIm);
        double pRe = aPrevRe;
        double pIm = aPrevIm;
        double pdRe = aPrevSlopeRe;
        double pdIm = aPrevSlopeIm;
        double aRe = aNowRe;
        double aIm = aNowIm;
        double adRe = aSlopeRe;
        double adIm = aSlopeIm;
        double qRe = bPrevRe;
        double qIm = bPrevIm;
        double qdRe = bPrevSlopeRe;
        double qdIm = bPrevSlopeIm;
        double bRe = bNowRe;
        double bIm = bNowIm;
        double bdRe = bSlopeRe;
        double bdIm = bSlopeIm;
        int i = lowerFirst;
        int j = upperFirst;
        while (i < m || j > m) {
            int steps = Math.min(BLOCK, Math.max(m - i, j - m));
            for (int step = 0; step < steps; step++) {
                if (i < m) {
                    double re = tRe[i] * aRe - tIm[i] * aIm - pRe;
                    double im = tRe[i] * aIm + tIm[i] * aRe - pIm;
                    double reD = tRe[i] * adRe - tIm[i] * adIm + (dRe[i] * aRe - dIm[i] * aIm) - pdRe;
                    double imD = tRe[i] * adIm + tIm[i] * adRe + (dRe[i] * aIm + dIm[i] * aRe) - pdIm;
                    pRe = aRe;
                    pIm = aIm;
                    pdRe = adRe;
                    pdIm = adIm;
                    aRe = re;
                    aIm = im;
                    adRe = reD;
                    adIm = imD;
                    i++;
                }
                if (j > m) {
                    double re = tRe[j] * bRe - tIm[j] * bIm - qRe;
                    double im = tRe[j] * bIm + tIm[j] * bRe - qIm;
                    double reD = tRe[j] * bdRe - tIm[j] * bdIm + (dRe[j] * bRe - dIm[j] * bIm) - qdRe;
                    double imD = tRe[j] * bdIm + tIm[j] * bdRe + (dRe[j] * bIm + dIm[j] * bRe) - qdIm;
                    qRe = bRe;
                    qIm = bIm;
                    qdRe = bdRe;
                    qdIm = bdIm;
                    bRe = re;
                    bIm = im;
                    bdRe = reD;
                    bdIm = imD;
                    j--;
                }
            }
            double size = Math.abs(aRe) + Math.abs(aIm) + Math.abs(pRe) + Math.abs(pIm);
            if (size > LARGE || size < 1 / LARGE) {
                double scale = 1 / size;
                pRe *= scale;
                pIm *= scale;
                pdRe *= scale;
                pdIm *= scale;
                aRe *= scale;
                aIm *= scale;
                adRe *= scale;
                adIm *= scale;
            }
            size = Math.abs(bRe) + Math.abs(bIm) + Math.abs(qRe) + Math.abs(qIm);
            if (size > LARGE || size < 1 / LARGE) {
                double scale = 1 / size;
                qRe *= scale;
                qIm *= scale;
                qdRe *= scale;
                qdIm *= scale;
                bRe *= scale;
                bIm *= scale;
                bdRe *= scale;
                bdIm *= scale;
            }
        }
        // one step more from above reaches the level below the matching one: D = a_m b_(m-1) - a_(m-1) b_m
        double re = tRe[m] * bRe - tIm[m] * bIm - qRe;
        double im = tRe[m] * bIm + tIm[m] * bRe - qIm;
        double reD = tRe[m] * bdRe - tIm[m] * bdIm + (dRe[m] * bRe - dIm[m] * bIm) - qdRe;
        double imD = tRe[m] * bdIm + tIm[m] * bdRe + (dRe[m] * bIm + dIm[m] * bRe) - qdIm;
        valueRe = aRe * re - aIm * im - (pRe * bRe - pIm * bIm);
        valueIm = aRe * im + aIm * re - (pRe * bIm + pIm * bRe);
        slopeRe = adRe * re - adIm * im + aRe * reD - aIm * imD - (pdRe * bRe - pdIm * bIm + pRe * bdRe - pIm * bdIm);
        slopeIm = adRe * im + adIm * re + aRe * imD + aIm * reD - (pdRe * bIm + pdIm * bRe + pRe * bdIm + pIm * bdRe);
    }

    private void startSlopeBelow(double speedRe, double speedIm) {
        aPrevRe = 0;
        aPrevIm = 0;
        aNowRe = 1;
        aNowIm = 0;
        aPrevSlopeRe = 0;
        aPrevSlopeIm = 0;
        aSlopeRe = 0;
        aSlopeIm = 0;
        if (lowerRigid) {
            return;
        }
        decay(speedRe, speedIm, lowerWind, lowerStability);
        decaySlope(speedRe, speedIm, lowerWind, lowerStability);
        aPrevRe = closureRe;
        aPrevIm = closureIm;
        aPrevSlopeRe = closureSlopeRe;
        aPrevSlopeIm = closureSlopeIm;
        for (int i = 0; i < lowerFirst; i++) {
            decay(speedRe, speedIm, axisWind[i], axisStability[i]);
            double re = tRe[i] * aNowRe - tIm[i] * aNowIm - aPrevRe;
            double im = tRe[i] * aNowIm + tIm[i] * aNowRe - aPrevIm;
            double reD = tRe[i] * aSlopeRe - tIm[i] * aSlopeIm + (dRe[i] * aNowRe - dIm[i] * aNowIm) - aPrevSlopeRe;
            double imD = tRe[i] * aSlopeIm + tIm[i] * aSlopeRe + (dRe[i] * aNowIm + dIm[i] * aNowRe) - aPrevSlopeIm;
            // by 1/ρ a step, values and slopes alike
            aPrevRe = aNowRe * closureRe - aNowIm * closureIm;
            aPrevIm = aNowRe * closureIm + aNowIm * closureRe;
            aPrevSlopeRe = aSlopeRe * closureRe - aSlopeIm * closureIm;
            aPrevSlopeIm = aSlopeRe * closureIm + aSlopeIm * closureRe;
            aNowRe = re * closureRe - im * closureIm;
            aNowIm = re * closureIm + im * closureRe;
            aSlopeRe = reD * closureRe - imD * closureIm;
            aSlopeIm = reD * closureIm + imD * closureRe;
        }
    }

    private void startSlopeAbove(double speedRe, double speedIm) {
        bPrevRe = 0;
        bPrevIm = 0;
        bNowRe = 1;
        bNowIm = 0;
        bPrevSlopeRe = 0;
        bPrevSlopeIm = 0;
        bSlopeRe = 0;
        bSlopeIm = 0;
        if (upperRigid) {
            return;
        }
        decay(speedRe, speedIm, upperWind, upperStability);
        decaySlope(speedRe, speedIm, upperWind, upperStability);
        bPrevRe = closureRe;
        bPrevIm = closureIm;
        bPrevSlopeRe = closureSlopeRe;
        bPrevSlopeIm = closureSlopeIm;
        for (int j = n; j > upperFirst; j--) {
            decay(speedRe, speedIm, axisWind[j], axisStability[j]);
            double re = tRe[j] * bNowRe - tIm[j] * bNowIm - bPrevRe;
            double im = tRe[j] * bNowIm + tIm[j] * bNowRe - bPrevIm;
            double reD = tRe[j] * bSlopeRe - tIm[j] * bSlopeIm + (dRe[j] * bNowRe - dIm[j] * bNowIm) - bPrevSlopeRe;
            double imD = tRe[j] * bSlopeIm + tIm[j] * bSlopeRe + (dRe[j] * bNowIm + dIm[j] * bNowRe) - bPrevSlopeIm;
            bPrevRe = bNowRe * closureRe - bNowIm * closureIm;
            bPrevIm = bNowRe * closureIm + bNowIm * closureRe;
            bPrevSlopeRe = bSlopeRe * closureRe - bSlopeIm * closureIm;
            bPrevSlopeIm = bSlopeRe * closureIm + bSlopeIm * closureRe;
            bNowRe = re * closureRe - im * closureIm;
            bNowIm = re * closureIm + im * closureRe;
            bSlopeRe = reD * closureRe - imD * closureIm;
            bSlopeIm = reD * closureIm + imD * closureRe;
        }
    }

    /** 1/ρ of a uniform flow: t̂, then the larger root of ρ² - t̂ρ + 1 = 0. */
    private void decay(double speedRe, double speedIm, double wind, double stability) {
        double a = 1 - twelfth * wavenumber * wavenumber;
        double c = twelfth * stability;
        double x = wind - speedRe;
        double y = -speedIm;
        double xxRe = x * x - y * y;
        double xxIm = 2 * x * y;
        double fRe = a * xxRe + c;
        double fIm = a * xxIm;
        double scale = 6 / (fRe * fRe + fIm * fIm);
        double halfRe = scale * (xxRe * fRe + xxIm * fIm) - 5;
        double halfIm = scale * (xxIm * fRe - xxRe * fIm);
        double discriminantRe = halfRe * halfRe - halfIm * halfIm - 1;
        double discriminantIm = 2 * halfRe * halfIm;
        double modulus = Math.sqrt(discriminantRe * discriminantRe + discriminantIm * discriminantIm);
        double large = Math.sqrt(0.5 * (modulus + Math.abs(discriminantRe)));
        double small = large == 0 ? 0 : Math.abs(discriminantIm) / (2 * large);
        double rootRe = discriminantRe >= 0 ? large : small;
        double rootIm = Math.copySign(discriminantRe >= 0 ? small : large, discriminantIm);
        if (halfRe * rootRe + halfIm * rootIm < 0) {
            rootRe = -rootRe;
            rootIm = -rootIm;
        }
        double rhoRe = halfRe + rootRe;
        double rhoIm = halfIm + rootIm;
        double size = 1 / (rhoRe * rhoRe + rhoIm * rhoIm);
        closureRe = rhoRe * size;
        closureIm = -rhoIm * size;
    }

    /** The derivative of 1/ρ by c, {@code t̂'/(1 - ρ²)}; needs {@link #decay} of the same flow before it. */
    private void decaySlope(double speedRe, double speedIm, double wind, double stability) {
        double a = 1 - twelfth * wavenumber * wavenumber;
        double c = twelfth * stability;
        double x = wind - speedRe;
        double y = -speedIm;
        double fRe = a * (x * x - y * y) + c;
        double fIm = a * 2 * x * y;
        double inverse = 1 / (fRe * fRe + fIm * fIm);
        double squareRe = (fRe * fRe - fIm * fIm) * inverse;
        double squareIm = -2 * fRe * fIm * inverse;
        double scale = -24 * c * inverse;
        double tdRe = scale * (x * squareRe - y * squareIm);
        double tdIm = scale * (x * squareIm + y * squareRe);
        // with q = 1/ρ: 1/(1 - ρ²) = q²/(q² - 1)
        double q2Re = closureRe * closureRe - closureIm * closureIm;
        double q2Im = 2 * closureRe * closureIm;
        double eSize = 1 / ((q2Re - 1) * (q2Re - 1) + q2Im * q2Im);
        double eRe = (q2Re * (q2Re - 1) + q2Im * q2Im) * eSize;
        double eIm = -q2Im * eSize;
        closureSlopeRe = tdRe * eRe - tdIm * eIm;
        closureSlopeIm = tdRe * eIm + tdIm * eRe;
    }

    /**
     * Newton's method on D from a first guess; the root is in {@link #rootRe()} and {@link #rootIm()}.
     *
     * @param tolerance   last step allowed, as a fraction of the wind's range
     * @param mostSteps   steps after which it gives up
     * @return whether it converged in the neighbourhood of the wind's range
     */
    boolean newton(double guessRe, double guessIm, double tolerance, int mostSteps) {
        double cRe = guessRe;
        double cIm = guessIm;
        double span = highestWind - lowestWind;
        for (int iteration = 0; iteration < mostSteps; iteration++) {
            evaluateWithSlope(cRe, cIm);
            double size = 1 / (slopeRe * slopeRe + slopeIm * slopeIm);
            double dRe = -(valueRe * slopeRe + valueIm * slopeIm) * size;
            double dIm = -(valueIm * slopeRe - valueRe * slopeIm) * size;
            double length = Math.sqrt(dRe * dRe + dIm * dIm);
            if (!(length < Double.MAX_VALUE)) {
                return false;
            }
            if (length > 0.25 * span) {
                dRe *= 0.25 * span / length;
                dIm *= 0.25 * span / length;
            }
            cRe += dRe;
            cIm += dIm;
            if (cRe < lowestWind - 0.3 * span || cRe > highestWind + 0.3 * span || cIm < -0.2 * span
                    || cIm > 1.2 * span) {
                return false;
            }
            if (length < tolerance * span) {
                rootRe = cRe;
                rootIm = cIm;
                lastStep = length / span;
                return true;
            }
        }
        return false;
    }

    double valueRe() {
        return valueRe;
    }

    double valueIm() {
        return valueIm;
    }

    /** D is the value times {@code exp(logScale)}, after {@link #evaluate}. */
    double logScale() {
        return logScale;
    }

    double slopeRe() {
        return slopeRe;
    }

    double slopeIm() {
        return slopeIm;
    }

    double rootRe() {
        return rootRe;
    }

    double rootIm() {
        return rootIm;
    }

    /** Length of Newton's last step as a fraction of the wind's range. */
    double lastStep() {
        return lastStep;
    }

    /** Lowest wind component over the heights [m/s]. */
    double lowestWind() {
        return lowestWind;
    }

    /** Highest wind component over the heights [m/s]. */
    double highestWind() {
        return highestWind;
    }

    /** Evaluations of D so far; one with slope counts as two. */
    long evaluations() {
        return evaluations;
    }
}
