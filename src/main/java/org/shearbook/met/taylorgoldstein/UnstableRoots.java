package org.shearbook.met.taylorgoldstein;

import java.util.Arrays;

/**
 * Every zero of a dispersion function inside a rectangle of the complex phase speed, counted first and then found.
 * One object serves one thread.
 */
final class UnstableRoots {

    /*
     * Argument principle. Around a rectangle without a zero on its border the change of log D is 2πi times the number of
     * zeros inside (D has no pole where it is used: the rectangle stays above the heights where f vanishes), and the
     * integrals of c d(log D)/2πi and c² d(log D)/2πi are the sum and the sum of squares of the zeros: one zero is given
     * by the first, two by both. Newton's method sharpens them. With more than two, or when Newton does not give as many
     * different zeros inside as were counted, the rectangle is cut and each part is counted again.
     *
     * The change of log D is added up over pairs of neighbouring pieces. A pair is accepted when the phase of both turns
     * by less than 1.3 rad, the two phase steps and the two steps of log |D| do not differ much, and no step of log |D|
     * is large; otherwise both pieces are halved, at most DEEPEST times. Such a test sees only what its points come near
     * to: a zero a height y above the lower side turns the phase by 2π within a few y, and between wider points that
     * turn looks like none. The lower side therefore starts with points at most two of its own heights apart, so that
     * every zero higher than about twice the floor of the search is seen. A negative count shows that
     * something was passed over all the same; it is repeated with four times as many pieces.
     */

    private static final double PHASE_STEP = 1.3;
    private static final double PHASE_DIFFERENCE = 0.7;
    private static final double MODULUS_STEP = 2.0;
    private static final double MODULUS_DIFFERENCE = 1.4;
    private static final int DEEPEST = 14;
    private static final int FEWEST_PIECES = 8;
    /** Right side one, upper side two, left side one. */
    private static final int OTHER_PIECES = 4;
    private static final int MOST_PIECES = 1024;
    private static final double PIECE_IN_HEIGHTS = 4;
    private static final int MOST_CUTS = 9;
    private static final int NEWTON_STEPS = 15;
    private static final double NEWTON_TOLERANCE = 1e-6;
    private static final double SAME_ROOT = 1e-5;

    private final DispersionFunction dispersion;
    private final long evaluationLimit;

    private double[] rootRe = new double[4];
    private double[] rootIm = new double[4];
    private double[] residual = new double[4];
    private int roots;
    private int missed;

    private double turned;
    private double firstRe;
    private double firstIm;
    private double secondRe;
    private double secondIm;

    /**
     * @param dispersion      the function
     * @param evaluationLimit evaluations of it after which a search ends
     */
    UnstableRoots(DispersionFunction dispersion, long evaluationLimit) {
        this.dispersion = dispersion;
        this.evaluationLimit = evaluationLimit;
    }

    /**
     * Finds the zeros for one wavenumber with {@code left ≤ Re c ≤ right}, {@code bottom ≤ Im c ≤ top}.
     *
     * @throws EvaluationLimitReached when the evaluations are used up
     */
    void find(double wavenumber, double left, double right, double bottom, double top) {
        roots = 0;
        missed = 0;
        dispersion.setWavenumber(wavenumber);
        if (top > bottom && right > left) {
            search(left, right, bottom, top, 0);
        }
    }

    private void search(double left, double right, double bottom, double top, int cuts) {
        int pieces = (int) Math.max(FEWEST_PIECES,
                Math.min(MOST_PIECES, Math.ceil((right - left) / (PIECE_IN_HEIGHTS * bottom))));
        int count = count(left, right, bottom, top, pieces);
        while (count < 0 && pieces < MOST_PIECES) {
            pieces *= 4;
            count = count(left, right, bottom, top, pieces);
        }
        if (count == 0) {
            return;
        }
        if (count < 0) {
            missed++;
            return;
        }
        double sumRe = firstRe;
        double sumIm = firstIm;
        if (count == 1) {
            sharpen(sumRe, sumIm, left, right, bottom, top);
        } else if (count == 2) {
            // the zeros solve z² - p z + q = 0 with p their sum and q = (p² - sum of squares)/2
            double discriminantRe = 2 * secondRe - (sumRe * sumRe - sumIm * sumIm);
            double discriminantIm = 2 * secondIm - 2 * sumRe * sumIm;
            double modulus = Math.sqrt(Math.hypot(discriminantRe, discriminantIm));
            double angle = 0.5 * Math.atan2(discriminantIm, discriminantRe);
            double re = modulus * Math.cos(angle);
            double im = modulus * Math.sin(angle);
            sharpen(0.5 * (sumRe + re), 0.5 * (sumIm + im), left, right, bottom, top);
            sharpen(0.5 * (sumRe - re), 0.5 * (sumIm - im), left, right, bottom, top);
        }
        if (count <= 2 && inside(left, right, bottom, top) >= count) {
            return;
        }
        if (cuts >= MOST_CUTS) {
            missed += Math.max(0, count - inside(left, right, bottom, top));
            return;
        }
        // cut off the middle: symmetric flows have their zeros there
        if (right - left > 1.2 * (top - bottom)) {
            double cut = left + 0.4871 * (right - left);
            search(left, cut, bottom, top, cuts + 1);
            search(cut, right, bottom, top, cuts + 1);
        } else {
            double cut = bottom + 0.4133 * (top - bottom);
            search(left, right, bottom, cut, cuts + 1);
            search(left, right, cut, top, cuts + 1);
        }
    }

    private void sharpen(double re, double im, double left, double right, double bottom, double top) {
        double fromRe = Math.min(Math.max(re, left), right);
        double fromIm = Math.min(Math.max(im, bottom), top);
        if (dispersion.newton(fromRe, fromIm, NEWTON_TOLERANCE, NEWTON_STEPS)) {
            double span = dispersion.highestWind() - dispersion.lowestWind();
            // Newton may wander to a wave of a neighbouring layer; only what was counted here is taken
            double slack = SAME_ROOT * span;
            if (dispersion.rootRe() >= left - slack && dispersion.rootRe() <= right + slack
                    && dispersion.rootIm() >= bottom - slack && dispersion.rootIm() <= top + slack) {
                add(dispersion.rootRe(), dispersion.rootIm(), slack);
            }
        }
        requireEvaluations();
    }

    private void add(double re, double im, double distance) {
        for (int i = 0; i < roots; i++) {
            if (Math.abs(rootRe[i] - re) < distance && Math.abs(rootIm[i] - im) < distance) {
                return;
            }
        }
        if (roots == rootRe.length) {
            rootRe = Arrays.copyOf(rootRe, 2 * roots);
            rootIm = Arrays.copyOf(rootIm, 2 * roots);
            residual = Arrays.copyOf(residual, 2 * roots);
        }
        rootRe[roots] = re;
        rootIm[roots] = im;
        residual[roots] = dispersion.lastStep();
        roots++;
    }

    private int inside(double left, double right, double bottom, double top) {
        double slack = SAME_ROOT * (dispersion.highestWind() - dispersion.lowestWind());
        int count = 0;
        for (int i = 0; i < roots; i++) {
            if (rootRe[i] >= left - slack && rootRe[i] <= right + slack && rootIm[i] >= bottom - slack
                    && rootIm[i] <= top + slack) {
                count++;
            }
        }
        return count;
    }

    /** Number of zeros inside; leaves the sums of zeros and of their squares in the fields. */
    int count(double left, double right, double bottom, double top, int lowerSidePieces) {
        turned = 0;
        firstRe = 0;
        firstIm = 0;
        secondRe = 0;
        secondIm = 0;
        double startRe = evaluateRe(left, bottom);
        double startIm = dispersion.valueIm();
        double startLog = dispersion.logScale();
        double fromRe = startRe;
        double fromIm = startIm;
        double fromLog = startLog;
        double fromX = left;
        double fromY = bottom;
        for (int piece = 1; piece <= lowerSidePieces + OTHER_PIECES; piece++) {
            boolean last = piece == lowerSidePieces + OTHER_PIECES;
            int beyond = piece - lowerSidePieces;
            double toX = beyond < 0 ? left + (right - left) * piece / lowerSidePieces
                    : beyond < 2 ? right : beyond == 2 ? 0.5 * (left + right) : left;
            double toY = beyond < 1 || last ? bottom : top;
            double toRe = last ? startRe : evaluateRe(toX, toY);
            double toIm = last ? startIm : dispersion.valueIm();
            double toLog = last ? startLog : dispersion.logScale();
            walk(fromX, fromY, fromRe, fromIm, fromLog, toX, toY, toRe, toIm, toLog, 0);
            fromX = toX;
            fromY = toY;
            fromRe = toRe;
            fromIm = toIm;
            fromLog = toLog;
        }
        // division by 2πi
        double first = firstRe;
        firstRe = firstIm / (2 * Math.PI);
        firstIm = -first / (2 * Math.PI);
        double second = secondRe;
        secondRe = secondIm / (2 * Math.PI);
        secondIm = -second / (2 * Math.PI);
        return (int) Math.round(turned / (2 * Math.PI));
    }

    private double evaluateRe(double re, double im) {
        requireEvaluations();
        dispersion.evaluate(re, im);
        return dispersion.valueRe();
    }

    private void requireEvaluations() {
        if (dispersion.evaluations() > evaluationLimit) {
            throw new EvaluationLimitReached();
        }
    }

    /** Adds the change of log D from one point of the border to the next. */
    private void walk(double fromX, double fromY, double fromRe, double fromIm, double fromLog, double toX, double toY,
            double toRe, double toIm, double toLog, int depth) {
        double x = 0.5 * (fromX + toX);
        double y = 0.5 * (fromY + toY);
        double re = evaluateRe(x, y);
        double im = dispersion.valueIm();
        double log = dispersion.logScale();
        double quotientRe = re * fromRe + im * fromIm;
        double quotientIm = im * fromRe - re * fromIm;
        double phase1 = Math.atan2(quotientIm, quotientRe);
        quotientRe = toRe * re + toIm * im;
        quotientIm = toIm * re - toRe * im;
        double phase2 = Math.atan2(quotientIm, quotientRe);
        double middle = re * re + im * im;
        double modulus1 = 0.5 * Math.log(middle / (fromRe * fromRe + fromIm * fromIm)) + log - fromLog;
        double modulus2 = 0.5 * Math.log((toRe * toRe + toIm * toIm) / middle) + toLog - log;
        boolean smooth = Math.abs(phase1) < PHASE_STEP && Math.abs(phase2) < PHASE_STEP
                && Math.abs(phase1 - phase2) < PHASE_DIFFERENCE && Math.abs(modulus1) < MODULUS_STEP
                && Math.abs(modulus2) < MODULUS_STEP && Math.abs(modulus1 - modulus2) < MODULUS_DIFFERENCE;
        if (smooth || depth >= DEEPEST) {
            accumulate(fromX, fromY, x, y, modulus1, phase1);
            accumulate(x, y, toX, toY, modulus2, phase2);
        } else {
            walk(fromX, fromY, fromRe, fromIm, fromLog, x, y, re, im, log, depth + 1);
            walk(x, y, re, im, log, toX, toY, toRe, toIm, toLog, depth + 1);
        }
    }

    private void accumulate(double fromX, double fromY, double toX, double toY, double modulus, double phase) {
        turned += phase;
        double re = 0.5 * (fromX + toX);
        double im = 0.5 * (fromY + toY);
        firstRe += re * modulus - im * phase;
        firstIm += re * phase + im * modulus;
        double lengthRe = toX - fromX;
        double lengthIm = toY - fromY;
        double squareRe = re * re - im * im + (lengthRe * lengthRe - lengthIm * lengthIm) / 12;
        double squareIm = 2 * re * im + lengthRe * lengthIm / 6;
        secondRe += squareRe * modulus - squareIm * phase;
        secondIm += squareRe * phase + squareIm * modulus;
    }

    /** Zeros found by the last search. */
    int roots() {
        return roots;
    }

    double re(int root) {
        return rootRe[root];
    }

    double im(int root) {
        return rootIm[root];
    }

    /** Newton's last step at a zero, as a fraction of the wind's range. */
    double residual(int root) {
        return residual[root];
    }

    /** Zeros counted but not found by the last search. */
    int missed() {
        return missed;
    }
}
