package org.shearbook.met.taylorgoldstein;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** The search over azimuth and wavenumber for one flow, and the refinement of its fastest wave. */
final class ModeSearch {

    /*
     * 1 Azimuths along which ¼U′² - N² nowhere exceeds the square of the slowest growth looked for are skipped: Howard's
     *   bound leaves nothing to find there.
     * 2 At the wavenumbers named for it all waves are counted and found (UnstableRoots), at every second azimuth at those
     *   named for there. The rectangle is
     *     Re c: the wind's range over the heights of interest
     *     Im c: from max(σ_min/k, h N_max, ¼ h S_max) to min(half the wind's range, σ_Howard/k)
     *   The part h N_max of the floor keeps out the false zeros of the grid: f has zeros near c = U + 0.29 i h N. Below
     *   ¼ h S_max the critical level is thinner than the grid can tell.
     * 3 In between, waves are followed by Newton's method from their neighbours in wavenumber and in azimuth.
     * 4 The fastest wave of the map is refined over wavenumber and azimuth, then re-solved at twice (if need be four
     *   times) the number of levels. One that the finer grid does not confirm is set aside and the next one is tried.
     *
     * Cost: azimuths x wavenumbers x about 50/searchStride evaluations, each proportional to the levels of the grid. It
     * does not depend on the length of the sounding.
     */

    /** Wavenumber times spacing beyond which a wave has fewer than twelve levels to its length. */
    static final double LARGEST_WAVENUMBER_STEP = 0.5;

    private static final double SHEAR_FLOOR = 0.25;
    private static final double FOLLOW_TOLERANCE = 1e-5;
    private static final double FINAL_TOLERANCE = 1e-10;
    private static final double GRID_TOLERANCE = 0.02;
    private static final double[] NO_ROOTS = {};
    private static final int MOST_CANDIDATES = 4;
    private static final int MOST_CLIMBS = 20;

    private final StratifiedShearFlow flow;
    private final SampledFlow sampled;
    private final double cornerWidth;
    private final double[] angles;
    private final double[] wavenumbers;
    private final boolean[][] searched;
    private final int rangeFrom;
    private final int rangeTo;
    private final double growthFloor;
    private final double gridFloor;
    private final long evaluationLimit;
    private final boolean refineAngle;
    private final boolean refineWavenumber;

    private final boolean[] followable;
    private final double[][][] rootRe;
    private final double[][][] rootIm;
    private final double[][][] residual;
    private long evaluations;
    private int missed;
    private boolean exhausted;

    /**
     * @param flow             the flow
     * @param sampled          the flow on the grid of the search
     * @param cornerWidth      finest corner width [m]
     * @param angles           azimuths as mathematical angles [rad], ascending
     * @param wavenumbers      [rad/m], ascending
     * @param searched         at which of them all waves are searched, along the azimuths of even and of odd index
     * @param rangeFrom        lowest grid level whose wind counts as a possible phase speed
     * @param rangeTo          highest such level
     * @param growthFloor      slowest growth looked for [s⁻¹]
     * @param workLimit        evaluations times levels after which the search stops
     * @param refineAngle      whether the fastest wave may leave the given azimuths
     * @param refineWavenumber whether it may leave the given wavenumbers
     */
    ModeSearch(StratifiedShearFlow flow, SampledFlow sampled, double cornerWidth, double[] angles, double[] wavenumbers,
            boolean[][] searched, int rangeFrom, int rangeTo, double growthFloor, long workLimit, boolean refineAngle,
            boolean refineWavenumber) {
        this.flow = flow;
        this.sampled = sampled;
        this.cornerWidth = cornerWidth;
        this.angles = angles;
        this.wavenumbers = wavenumbers;
        this.searched = new boolean[][] {searched[0].clone(), searched[1].clone()};
        this.rangeFrom = rangeFrom;
        this.rangeTo = rangeTo;
        this.growthFloor = growthFloor;
        this.evaluationLimit = Math.max(1, workLimit / (sampled.intervals + 1));
        this.refineAngle = refineAngle;
        this.refineWavenumber = refineWavenumber;
        double greatest = 0;
        for (int i = rangeFrom; i <= rangeTo; i++) {
            greatest = Math.max(greatest, sampled.stability[0][i]);
        }
        gridFloor = sampled.spacing * Math.max(Math.sqrt(greatest), SHEAR_FLOOR * sampled.greatestShear);
        followable = new boolean[wavenumbers.length];
        for (int q = 0; q < followable.length; q++) {
            followable[q] = wavenumbers[q] * sampled.spacing <= LARGEST_WAVENUMBER_STEP;
        }
        rootRe = nothing(angles.length, wavenumbers.length);
        rootIm = nothing(angles.length, wavenumbers.length);
        residual = nothing(angles.length, wavenumbers.length);
    }

    private static double[][][] nothing(int angles, int wavenumbers) {
        double[][][] map = new double[angles][wavenumbers][];
        for (double[][] along : map) {
            Arrays.fill(along, NO_ROOTS);
        }
        return map;
    }

    /**
     * Fills the map. Where the thin search finds nothing at all, a band one wavenumber wide may have slipped through, and
     * every second wavenumber is searched.
     */
    void run() {
        sweep();
        if (!exhausted && best(List.of()) == null) {
            for (int q = 0; q < wavenumbers.length; q += 2) {
                boolean again = followable[q] && !searched[0][q];
                searched[0][q] = again;
                searched[1][q] = false;
                if (q + 1 < wavenumbers.length) {
                    searched[0][q + 1] = false;
                    searched[1][q + 1] = false;
                }
            }
            sweep();
        }
    }

    private void sweep() {
        for (int j = 0; j < angles.length && !exhausted; j++) {
            double cosine = Math.cos(angles[j]);
            double sine = Math.sin(angles[j]);
            double bound = sampled.growthBoundSquared(cosine, sine);
            if (bound > growthFloor * growthFloor) {
                DispersionFunction dispersion = new DispersionFunction(sampled, cosine, sine, cornerWidth);
                try {
                    along(j, dispersion, Math.sqrt(bound), cosine, sine);
                } catch (EvaluationLimitReached reached) {
                    exhausted = true;
                }
                evaluations += dispersion.evaluations();
            }
        }
    }

    private void along(int j, DispersionFunction dispersion, double bound, double cosine, double sine) {
        double left = Double.POSITIVE_INFINITY;
        double right = Double.NEGATIVE_INFINITY;
        for (int i = rangeFrom; i <= rangeTo; i++) {
            double wind = sampled.wind(i, cosine, sine);
            left = Math.min(left, wind);
            right = Math.max(right, wind);
        }
        double radius = 0.5 * (dispersion.highestWind() - dispersion.lowestWind());
        boolean[] here = searched[j % 2];
        UnstableRoots roots = new UnstableRoots(dispersion, evaluationLimit - evaluations);
        for (int q = 0; q < wavenumbers.length; q++) {
            if (!here[q]) {
                continue;
            }
            double k = wavenumbers[q];
            roots.find(k, left, right, floor(k), Math.min(radius, bound / k) * 1.0001);
            missed += roots.missed();
            int count = roots.roots();
            if (count == 0) {
                continue;
            }
            rootRe[j][q] = new double[count];
            rootIm[j][q] = new double[count];
            residual[j][q] = new double[count];
            for (int r = 0; r < count; r++) {
                rootRe[j][q][r] = roots.re(r);
                rootIm[j][q][r] = roots.im(r);
                residual[j][q][r] = roots.residual(r);
            }
        }
        int below = -1;
        for (int q = 0; q < wavenumbers.length; q++) {
            if (here[q]) {
                for (int between = below + 1; between < q; between++) {
                    follow(j, dispersion, below, between, q, left, right, bound);
                }
                below = q;
            }
        }
        for (int between = below + 1; below >= 0 && between < wavenumbers.length; between++) {
            follow(j, dispersion, below, between, -1, left, right, bound);
        }
    }

    private double floor(double k) {
        return Math.max(growthFloor / k, gridFloor);
    }

    /**
     * Follows waves to a wavenumber that is not searched: from the searched ones below and above it (index -1 where there
     * is none) and from the same wavenumber at the azimuth before.
     */
    private void follow(int j, DispersionFunction dispersion, int lower, int at, int upper, double left, double right,
            double bound) {
        double k = wavenumbers[at];
        if (!followable[at]) {
            return;
        }
        double[] lowerRe = lower < 0 ? NO_ROOTS : rootRe[j][lower];
        double[] lowerIm = lower < 0 ? NO_ROOTS : rootIm[j][lower];
        double[] upperRe = upper < 0 ? NO_ROOTS : rootRe[j][upper];
        double[] upperIm = upper < 0 ? NO_ROOTS : rootIm[j][upper];
        double[] besideRe = j % 2 == 1 ? rootRe[j - 1][at] : NO_ROOTS;
        double[] besideIm = j % 2 == 1 ? rootIm[j - 1][at] : NO_ROOTS;
        int wanted = Math.max(besideRe.length, Math.max(lowerRe.length, upperRe.length));
        double floor = floor(k);
        if (wanted == 0 || Math.min(0.5 * (dispersion.highestWind() - dispersion.lowestWind()), bound / k) <= floor) {
            return;
        }
        if (dispersion.evaluations() + evaluations > evaluationLimit) {
            throw new EvaluationLimitReached();
        }
        dispersion.setWavenumber(k);
        double[] re = new double[lowerRe.length + upperRe.length + besideRe.length];
        double[] im = new double[re.length];
        double[] last = new double[re.length];
        int found = 0;
        for (int r = 0; r < besideRe.length; r++) {
            found = followed(dispersion, besideRe[r], besideIm[r], left, right, floor, re, im, last, found);
        }
        if (found < wanted && lower >= 0 && upper >= 0 && lowerRe.length == upperRe.length) {
            double weight = Math.log(k / wavenumbers[lower]) / Math.log(wavenumbers[upper] / wavenumbers[lower]);
            for (int r = 0; r < lowerRe.length && found < wanted; r++) {
                int partner = nearest(lowerRe[r], lowerIm[r], upperRe, upperIm);
                found = followed(dispersion, lowerRe[r] + weight * (upperRe[partner] - lowerRe[r]),
                        lowerIm[r] + weight * (upperIm[partner] - lowerIm[r]), left, right, floor, re, im, last, found);
            }
        }
        for (int r = 0; r < lowerRe.length && found < wanted; r++) {
            found = followed(dispersion, lowerRe[r], lowerIm[r], left, right, floor, re, im, last, found);
        }
        for (int r = 0; r < upperRe.length && found < wanted; r++) {
            found = followed(dispersion, upperRe[r], upperIm[r], left, right, floor, re, im, last, found);
        }
        rootRe[j][at] = Arrays.copyOf(re, found);
        rootIm[j][at] = Arrays.copyOf(im, found);
        residual[j][at] = Arrays.copyOf(last, found);
    }

    private static int nearest(double re, double im, double[] othersRe, double[] othersIm) {
        int nearest = 0;
        double least = Double.POSITIVE_INFINITY;
        for (int r = 0; r < othersRe.length; r++) {
            double distance = Math.hypot(othersRe[r] - re, othersIm[r] - im);
            if (distance < least) {
                least = distance;
                nearest = r;
            }
        }
        return nearest;
    }

    private static int followed(DispersionFunction dispersion, double guessRe, double guessIm, double left,
            double right, double floor, double[] re, double[] im, double[] last, int found) {
        if (!dispersion.newton(guessRe, guessIm, FOLLOW_TOLERANCE, 8) || dispersion.rootIm() < floor
                || dispersion.rootRe() < left || dispersion.rootRe() > right) {
            return found;
        }
        double same = 1e-3 * (right - left);
        for (int r = 0; r < found; r++) {
            if (Math.hypot(re[r] - dispersion.rootRe(), im[r] - dispersion.rootIm()) < same) {
                return found;
            }
        }
        re[found] = dispersion.rootRe();
        im[found] = dispersion.rootIm();
        last[found] = dispersion.lastStep();
        return found + 1;
    }

    /**
     * The fastest wave, refined and confirmed; null when the map is empty. One that no finer grid confirms is returned
     * only when no other is left, and says so.
     */
    @Nullable Mode fastest() {
        List<double[]> refused = new ArrayList<>();
        Mode firstRefused = null;
        for (int candidate = 0; candidate < MOST_CANDIDATES; candidate++) {
            int[] best = best(refused);
            if (best == null) {
                return firstRefused;
            }
            Mode mode = refined(best[0], best[1], best[2]);
            if (mode.converged()) {
                return mode;
            }
            if (firstRefused == null) {
                firstRefused = mode;
            }
            refused.add(new double[] {angles[best[0]], rootRe[best[0]][best[1]][best[2]]});
        }
        return firstRefused;
    }

    private int @Nullable [] best(List<double[]> refused) {
        int[] best = null;
        double greatest = 0;
        for (int j = 0; j < angles.length; j++) {
            for (int q = 0; q < wavenumbers.length; q++) {
                for (int r = 0; r < rootIm[j][q].length; r++) {
                    double growth = wavenumbers[q] * rootIm[j][q][r];
                    if (growth > greatest && !near(refused, angles[j], rootRe[j][q][r])) {
                        greatest = growth;
                        best = new int[] {j, q, r};
                    }
                }
            }
        }
        return best;
    }

    private boolean near(List<double[]> refused, double angle, double speed) {
        for (double[] other : refused) {
            if (Math.abs(speed - other[1] * Math.cos(angle - other[0])) < 0.05 * sampled.greatestShear * cornerWidth) {
                return true;
            }
        }
        return false;
    }

    private Mode refined(int j, int q, int r) {
        Point best = new Point(angles[j], wavenumbers[q], rootRe[j][q][r], rootIm[j][q][r]);
        DispersionFunction dispersion = dispersion(sampled, best.angle);
        if (refineWavenumber) {
            best = fastestAlong(dispersion, best);
        }
        evaluations += dispersion.evaluations();
        if (refineAngle && angles.length > 1) {
            best = turned(best);
        }
        return confirmed(best);
    }

    private DispersionFunction dispersion(SampledFlow on, double angle) {
        return new DispersionFunction(on, Math.cos(angle), Math.sin(angle), cornerWidth);
    }

    /** Turns the wave vector to the top of the parabola through three azimuths, as long as growth gains. */
    private Point turned(Point start) {
        double turn = 0.5 * (angles[1] - angles[0]);
        Point best = start;
        Point left = along(start, start.angle - turn);
        Point right = along(start, start.angle + turn);
        if (left != null && left.growth() > best.growth()) {
            best = left;
        }
        if (right != null && right.growth() > best.growth()) {
            best = right;
        }
        double down = left == null ? 0 : left.growth();
        double up = right == null ? 0 : right.growth();
        double curvature = down + up - 2 * start.growth();
        if (curvature < 0) {
            double vertex = 0.5 * turn * (down - up) / curvature;
            if (Math.abs(vertex) > 1e-6) {
                Point top = along(start, start.angle + Math.max(-2 * turn, Math.min(2 * turn, vertex)));
                if (top != null && top.growth() > best.growth()) {
                    best = top;
                }
            }
        }
        return best;
    }

    private @Nullable Point along(Point start, double angle) {
        DispersionFunction dispersion = dispersion(sampled, angle);
        Point point = at(dispersion, new Point(angle, start.wavenumber, start.speed, start.im), start.wavenumber);
        if (point != null && refineWavenumber) {
            point = vertex(dispersion, point, 0.03);
        }
        evaluations += dispersion.evaluations();
        return point;
    }

    /** Climbs to the wavenumber of fastest growth, then takes the tops of two parabolas in log k. */
    private Point fastestAlong(DispersionFunction dispersion, Point start) {
        Point best = start;
        double ratio = 1.08;
        for (int climb = 0; climb < MOST_CLIMBS; climb++) {
            Point up = at(dispersion, best, best.wavenumber * ratio);
            Point down = at(dispersion, best, best.wavenumber / ratio);
            Point higher = up == null || down != null && down.growth() > up.growth() ? down : up;
            if (higher == null || higher.growth() <= best.growth()) {
                break;
            }
            best = higher;
        }
        return vertex(dispersion, vertex(dispersion, best, 0.05), 0.01);
    }

    private Point vertex(DispersionFunction dispersion, Point middle, double width) {
        Point up = at(dispersion, middle, middle.wavenumber * Math.exp(width));
        Point down = at(dispersion, middle, middle.wavenumber * Math.exp(-width));
        if (up == null || down == null) {
            return middle;
        }
        double curvature = up.growth() + down.growth() - 2 * middle.growth();
        if (!(curvature < 0)) {
            return middle;
        }
        double shift = 0.5 * width * (down.growth() - up.growth()) / curvature;
        Point top = at(dispersion, middle, middle.wavenumber * Math.exp(Math.max(-2 * width, Math.min(2 * width, shift))));
        return top != null && top.growth() > middle.growth() ? top : middle;
    }

    private @Nullable Point at(DispersionFunction dispersion, Point near, double k) {
        dispersion.setWavenumber(k);
        if (!dispersion.newton(near.speed, near.im, 1e-8, 12) || dispersion.rootIm() < floor(k)) {
            return null;
        }
        // a jump to another wave is no refinement
        double jump = Math.hypot(dispersion.rootRe() - near.speed, dispersion.rootIm() - near.im);
        if (jump > 0.2 * (dispersion.highestWind() - dispersion.lowestWind())) {
            return null;
        }
        return new Point(near.angle, k, dispersion.rootRe(), dispersion.rootIm());
    }

    private Mode confirmed(Point found) {
        Point coarse = found;
        double change = Double.NaN;
        double lastStep = Double.NaN;
        for (int factor = 2; factor <= 4; factor *= 2) {
            DispersionFunction finer = dispersion(flow.sampled(factor * sampled.intervals), found.angle);
            finer.setWavenumber(found.wavenumber);
            boolean solved = finer.newton(coarse.speed, coarse.im, FINAL_TOLERANCE, 20);
            evaluations += factor * finer.evaluations();
            if (!solved || finer.rootIm() <= 0) {
                return mode(coarse, lastStep, change, false, "not converged: the wave is not found again on a grid "
                        + factor + " times as fine");
            }
            Point fine = new Point(found.angle, found.wavenumber, finer.rootRe(), finer.rootIm());
            change = Math.abs(fine.im - coarse.im) / fine.im;
            lastStep = finer.lastStep();
            coarse = fine;
            if (change <= GRID_TOLERANCE) {
                return mode(fine, lastStep, change, true, "");
            }
        }
        return mode(coarse, lastStep, change, false, String.format(Locale.ROOT,
                "not converged: the growth rate still changes by %.0f %% between the two finest grids", 100 * change));
    }

    private Mode mode(Point point, double lastStep, double change, boolean converged, String reason) {
        double azimuth = azimuth(point.angle);
        Mode bare = new Mode(azimuth, point.wavenumber, point.growth(), point.speed,
                sampled.criticalHeights(Math.cos(point.angle), Math.sin(point.angle), point.speed), lastStep, change, null,
                converged, reason);
        VerticalExtent extent = Eigenfunction.of(flow, sampled.intervals, sampled.greatestShear, bare).extent();
        return new Mode(azimuth, bare.horizontalWavenumber(), bare.growthRate(), bare.phaseSpeed(),
                bare.criticalHeights(), lastStep, change, extent, converged, reason);
    }

    /** Degrees clockwise from north of a mathematical angle. */
    static double azimuth(double angle) {
        // to a billionth, so that a given azimuth comes back as it was given
        double degrees = Math.rint((90 - Math.toDegrees(angle)) * 1e9) / 1e9 % 360;
        return degrees < 0 ? degrees + 360 : degrees;
    }

    /** The map; ends the use of this search. */
    GrowthMap map() {
        double[] azimuths = new double[angles.length];
        double[][][] growth = new double[angles.length][wavenumbers.length][];
        for (int j = 0; j < angles.length; j++) {
            azimuths[j] = azimuth(angles[j]);
            for (int q = 0; q < wavenumbers.length; q++) {
                growth[j][q] = rootIm[j][q];
                for (int r = 0; r < growth[j][q].length; r++) {
                    growth[j][q][r] *= wavenumbers[q];
                }
            }
        }
        return new GrowthMap(azimuths, wavenumbers.clone(), rootRe, growth, residual);
    }

    long evaluations() {
        return evaluations;
    }

    /** Waves counted but not found. */
    int missed() {
        return missed;
    }

    /** Whether the work limit ended the search. */
    boolean exhausted() {
        return exhausted;
    }

    private record Point(double angle, double wavenumber, double speed, double im) {

        double growth() {
            return wavenumber * im;
        }
    }
}
