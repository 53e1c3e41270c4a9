package org.shearbook.met.taylorgoldstein;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.RoundedCornerFunction;

/** Laws that hold for any flow, on seeded random ones; every message names seed and flow. */
class TaylorGoldsteinPropertyTests {

    private static final long SEED = 20261201L;
    private static final int FLOWS = 400;
    private static final double[] WAVENUMBERS = {0.08, 0.15, 0.25, 0.4};

    private record Root(double k, double re, double im) {
    }

    /** Every root of a flow at the wavenumbers, above a floor of 2 % of the shear and the spacing times N. */
    private static List<Root> roots(SampledFlow flow, double cosine, double sine, double[] wavenumbers, double corner) {
        DispersionFunction dispersion = new DispersionFunction(flow, cosine, sine, corner);
        UnstableRoots search = new UnstableRoots(dispersion, 1_000_000);
        List<Root> roots = new ArrayList<>();
        double stability = 0;
        for (double n2 : flow.stability[0]) {
            stability = Math.max(stability, n2);
        }
        double bound = flow.growthBoundSquared(cosine, sine);
        if (bound <= 0) {
            return roots;
        }
        for (double k : wavenumbers) {
            double floor = Math.max(0.02 * flow.greatestShear / k, flow.spacing * Math.sqrt(stability));
            double radius = 0.5 * (dispersion.highestWind() - dispersion.lowestWind());
            // wider than the laws allow, so that they are not built into the search
            search.find(k, dispersion.lowestWind() - 0.1 * radius, dispersion.highestWind() + 0.1 * radius, floor,
                    1.2 * radius);
            assertThat(search.missed()).isZero();
            for (int r = 0; r < search.roots(); r++) {
                roots.add(new Root(k, search.re(r), search.im(r)));
            }
        }
        return roots;
    }

    private static SampledFlow sampled(RandomShearFlows.Levels levels, double stepsPerCorner) {
        double extent = levels.heights()[levels.heights().length - 1] - levels.heights()[0];
        return levels.flow().sampled(2 * (int) Math.ceil(0.5 * extent * stepsPerCorner));
    }

    @Test
    void everyGrowingWaveObeysTheSemicircleAndTheGrowthBounds() {
        Random random = new Random(SEED);
        int count = 0;
        for (int number = 0; number < FLOWS; number++) {
            SampledFlow flow = sampled(RandomShearFlows.next(random), 4);
            double low = Arrays.stream(flow.eastward[0]).min().orElseThrow();
            double high = Arrays.stream(flow.eastward[0]).max().orElseThrow();
            double radius = 0.5 * (high - low);
            double least = Double.POSITIVE_INFINITY;
            double steepest = 0;
            for (int i = 0; i <= flow.intervals; i++) {
                double shear = flow.eastward[1][i];
                steepest = Math.max(steepest, Math.abs(shear));
                least = Math.min(least, shear == 0 ? Double.POSITIVE_INFINITY : flow.stability[0][i] / (shear * shear));
            }
            for (Root root : roots(flow, 1, 0, WAVENUMBERS, RandomShearFlows.CORNER)) {
                String which = "seed " + SEED + ", flow " + number + ", " + root;
                double centred = root.re - 0.5 * (low + high);
                count++;
                // Howard (1961): |c - Um| <= R, and k Im c <= max sqrt(U'^2/4 - N^2) <= max |U'|/2
                assertThat(Math.hypot(centred, root.im)).as(which).isLessThan(radius * (1 + 5e-4));
                assertThat(root.k * root.im).as(which)
                        .isLessThan(Math.sqrt(flow.growthBoundSquared(1, 0)) * (1 + 5e-4))
                        .isLessThan(0.5 * steepest * (1 + 5e-4));
                // Kochar and Jain (1979), J. Fluid Mech. 91, 489-491: the semi-ellipse; form from memory
                double ellipse = centred * centred + 2 * root.im * root.im / (1 + Math.sqrt(1 - 4 * Math.max(0, least)));
                assertThat(ellipse).as(which).isLessThan(radius * radius * (1 + 1e-3));
            }
        }
        assertThat(count).as("growing waves in all flows").isGreaterThan(FLOWS);
    }

    @Test
    void nothingGrowsWhereTheRichardsonNumberIsAboveAQuarter() {
        Random random = new Random(SEED + 1);
        for (int number = 0; number < FLOWS; number++) {
            RandomShearFlows.Levels levels = RandomShearFlows.next(random);
            SampledFlow wind = sampled(levels, 4);
            SampledFlow flow = AnalyticShearFlows.constantRichardson(wind.heights, wind.eastward, 0.255);
            assertThat(MilesHoward.of(flow).stableByTheorem()).isTrue();
            DispersionFunction dispersion = new DispersionFunction(flow, 1, 0, RandomShearFlows.CORNER);
            UnstableRoots search = new UnstableRoots(dispersion, 1_000_000);
            double stability = 0;
            for (double n2 : flow.stability[0]) {
                stability = Math.max(stability, n2);
            }
            for (double k : WAVENUMBERS) {
                double floor = Math.max(0.02 * flow.greatestShear / k, flow.spacing * Math.sqrt(stability));
                search.find(k, dispersion.lowestWind(), dispersion.highestWind(), floor,
                        0.5 * (dispersion.highestWind() - dispersion.lowestWind()));
                assertThat(search.roots() + search.missed()).as("seed %d, flow %d, k %f", SEED + 1, number, k).isZero();
            }
        }
    }

    @Test
    void finerContoursFindNoOtherWaves() {
        Random random = new Random(SEED + 2);
        int found = 0;
        int again = 0;
        for (int number = 0; number < FLOWS; number++) {
            SampledFlow flow = sampled(RandomShearFlows.next(random), 4);
            DispersionFunction dispersion = new DispersionFunction(flow, 1, 0, RandomShearFlows.CORNER);
            double stability = Arrays.stream(flow.stability[0]).max().orElseThrow();
            double radius = 0.5 * (dispersion.highestWind() - dispersion.lowestWind());
            UnstableRoots search = new UnstableRoots(dispersion, 2_000_000);
            for (double k : WAVENUMBERS) {
                double floor = Math.max(0.02 * flow.greatestShear / k, flow.spacing * Math.sqrt(stability));
                if (floor < radius) {
                    search.find(k, dispersion.lowestWind(), dispersion.highestWind(), floor, 1.0001 * radius);
                    found += search.roots();
                    again += search.count(dispersion.lowestWind(), dispersion.highestWind(), floor, 1.0001 * radius, 512);
                }
            }
        }
        // the coarser contour may pass over a zero closer to the floor than the floor is high
        assertThat(found).as("of %d, seed %d", again, SEED + 2).isBetween((int) (0.998 * again), again);
    }

    @Test
    void aConstantWindMovesThePhaseSpeedAndLeavesGrowthAlone() {
        Random random = new Random(SEED + 3);
        for (int number = 0; number < FLOWS / 4; number++) {
            RandomShearFlows.Levels levels = RandomShearFlows.next(random);
            double added = 40 * random.nextDouble() - 20;
            RandomShearFlows.Levels moved = new RandomShearFlows.Levels(levels.heights(),
                    Arrays.stream(levels.eastward()).map(u -> u + added).toArray(), levels.northward(), levels.buoyancy());
            List<Root> before = roots(sampled(levels, 4), 1, 0, WAVENUMBERS, RandomShearFlows.CORNER);
            List<Root> after = roots(sampled(moved, 4), 1, 0, WAVENUMBERS, RandomShearFlows.CORNER);
            assertSame(before, after, number, root -> new Root(root.k, root.re + added, root.im));
        }
    }

    @Test
    void aMirroredFlowGrowsTheSame() {
        Random random = new Random(SEED + 4);
        for (int number = 0; number < FLOWS / 4; number++) {
            RandomShearFlows.Levels levels = RandomShearFlows.next(random);
            int n = levels.heights().length;
            double[] z = new double[n];
            double[] u = new double[n];
            double[] b = new double[n];
            for (int j = 0; j < n; j++) {
                z[j] = -levels.heights()[n - 1 - j];
                u[j] = -levels.eastward()[n - 1 - j];
                b[j] = -levels.buoyancy()[n - 1 - j];
            }
            RandomShearFlows.Levels mirrored = new RandomShearFlows.Levels(z, u, levels.northward(), b);
            List<Root> before = roots(sampled(levels, 4), 1, 0, WAVENUMBERS, RandomShearFlows.CORNER);
            List<Root> after = roots(sampled(mirrored, 4), 1, 0, WAVENUMBERS, RandomShearFlows.CORNER);
            assertSame(before, after, number, root -> new Root(root.k, -root.re, root.im));
        }
    }

    @Test
    void growthScalesWithSpeedOverLength() {
        Random random = new Random(SEED + 5);
        double length = 87;
        double speed = 6.3;
        for (int number = 0; number < FLOWS / 4; number++) {
            RandomShearFlows.Levels levels = RandomShearFlows.next(random);
            RandomShearFlows.Levels scaled = new RandomShearFlows.Levels(
                    Arrays.stream(levels.heights()).map(z -> z * length).toArray(),
                    Arrays.stream(levels.eastward()).map(u -> u * speed).toArray(), levels.northward(),
                    Arrays.stream(levels.buoyancy()).map(b -> b * speed * speed / length).toArray());
            List<Root> before = roots(sampled(levels, 4), 1, 0, WAVENUMBERS, RandomShearFlows.CORNER);
            SampledFlow large = scaled.flow(RandomShearFlows.CORNER * length).sampled(sampled(levels, 4).intervals);
            List<Root> after = roots(large, 1, 0, Arrays.stream(WAVENUMBERS).map(k -> k / length).toArray(),
                    RandomShearFlows.CORNER * length);
            assertSame(before, after, number, root -> new Root(root.k / length, root.re * speed, root.im * speed));
        }
    }

    /** Roots of the same flow written differently: the same up to rounding, those at the floor excepted. */
    private static void assertSame(List<Root> before, List<Root> after, int number,
            java.util.function.UnaryOperator<Root> rule) {
        assertThat(after).as("seed base %d, flow %d", SEED, number).hasSameSizeAs(before);
        for (Root root : before) {
            Root expected = rule.apply(root);
            double scale = Math.abs(expected.im) + 1e-3;
            assertThat(after).as("seed base %d, flow %d: %s", SEED, number, expected).anyMatch(other ->
                    Math.abs(other.k - expected.k) < 1e-9 * expected.k && Math.abs(other.re - expected.re) < 1e-5 * scale
                            && Math.abs(other.im - expected.im) < 1e-5 * scale);
        }
    }

    @Test
    void anObliqueWaveIsAWaveAlongTheShearInStrongerStability() {
        Random random = new Random(SEED + 6);
        for (int number = 0; number < FLOWS / 4; number++) {
            RandomShearFlows.Levels levels = RandomShearFlows.next(random);
            double angle = (random.nextDouble() - 0.5) * 2;
            double cosine = Math.cos(angle);
            RandomShearFlows.Levels stronger = new RandomShearFlows.Levels(levels.heights(), levels.eastward(),
                    levels.northward(), Arrays.stream(levels.buoyancy()).map(b -> b / (cosine * cosine)).toArray());
            DispersionFunction oblique = new DispersionFunction(sampled(levels, 8), cosine, Math.sin(angle),
                    RandomShearFlows.CORNER);
            // sigma(k, phi; J) = cos(phi) sigma(k, 0; J / cos^2 phi), that is c(phi) = cos(phi) c(0)
            for (Root along : roots(sampled(stronger, 8), 1, 0, WAVENUMBERS, RandomShearFlows.CORNER)) {
                double[] c = AnalyticShearFlows.root(oblique, along.k, along.re * cosine, along.im * cosine);
                // the path differs (its offset follows the wind along the wave), so equal up to discretisation
                assertThat(c[0]).as("seed %d, flow %d, %s", SEED + 6, number, along)
                        .isCloseTo(cosine * along.re, within(2e-3 * (1 + Math.abs(along.re))));
                assertThat(c[1]).as("seed %d, flow %d, %s", SEED + 6, number, along)
                        .isCloseTo(cosine * along.im, within(2e-3));
            }
        }
    }

    @Test
    void theRootDoesNotDependOnThePath() {
        Random random = new Random(SEED + 7);
        int compared = 0;
        for (int number = 0; number < FLOWS / 4; number++) {
            RandomShearFlows.Levels levels = RandomShearFlows.next(random);
            SampledFlow fine = sampled(levels, 32);
            for (Root root : roots(sampled(levels, 4), 1, 0, new double[] {0.15, 0.3}, RandomShearFlows.CORNER)) {
                double[] wide = AnalyticShearFlows.root(new DispersionFunction(fine, 1, 0, RandomShearFlows.CORNER, 0.3),
                        root.k, root.re, root.im);
                double[] narrow = AnalyticShearFlows.root(
                        new DispersionFunction(fine, 1, 0, RandomShearFlows.CORNER, 0.15), root.k, wide[0], wide[1]);
                assertThat(narrow[0]).as("seed %d, flow %d, %s", SEED + 7, number, root).isCloseTo(wide[0], within(2e-5));
                assertThat(narrow[1]).as("seed %d, flow %d, %s", SEED + 7, number, root).isCloseTo(wide[1], within(2e-5));
                if (root.im > 0.3) {
                    // far enough from the axis for the axis itself to serve
                    double[] axis = AnalyticShearFlows.root(new DispersionFunction(fine, 1, 0, RandomShearFlows.CORNER, 0),
                            root.k, wide[0], wide[1]);
                    assertThat(axis[1]).as("seed %d, flow %d, %s", SEED + 7, number, root).isCloseTo(wide[1], within(2e-5));
                    compared++;
                }
            }
        }
        assertThat(compared).isGreaterThan(20);
    }

    @Test
    void theMapDoesNotDependOnWhichWayNorthIs() {
        Random random = new Random(SEED + 8);
        double[] z = AnalyticShearFlows.grid(-8, 8, 80);
        double[] u = new double[81];
        double[] v = new double[81];
        double[] turnedU = new double[81];
        double[] turnedV = new double[81];
        double[] n2 = new double[81];
        double turn = 2 * Math.PI * random.nextDouble();
        for (int i = 0; i < 81; i++) {
            u[i] = Math.tanh(z[i]);
            v[i] = 0.6 * Math.tanh(z[i] - 1);
            n2[i] = 0.1;
            turnedU[i] = u[i] * Math.cos(turn) - v[i] * Math.sin(turn);
            turnedV[i] = u[i] * Math.sin(turn) + v[i] * Math.cos(turn);
        }
        StabilityAnalysis analysis = new StabilityAnalysis(SearchSettings.forLevels());
        Mode mode = analysis.ofLevels(z, u, v, n2, Boundary.RADIATING, Boundary.RADIATING).fastest().orElseThrow();
        Mode turned = analysis.ofLevels(z, turnedU, turnedV, n2, Boundary.RADIATING, Boundary.RADIATING).fastest()
                .orElseThrow();
        assertThat(turned.growthRate()).isCloseTo(mode.growthRate(), within(1e-6));
        assertThat(turned.horizontalWavenumber()).isCloseTo(mode.horizontalWavenumber(), within(1e-4));
        double difference = Math.IEEEremainder(mode.azimuth() - Math.toDegrees(turn) - turned.azimuth(), 360);
        assertThat(difference).isCloseTo(0, within(0.01));
    }

    @Test
    void roundedFlowsOfAnyLevelsAreWhatTheSearchSees() {
        RoundedCornerFunction wind = AnalyticShearFlows.rounded(new double[] {0, 1, 2}, new double[] {0, 1, 1}, 0.2);
        SampledFlow flow = StratifiedShearFlow.ofBuoyancy(wind, wind, wind, 0, 2, Boundary.RIGID, Boundary.RADIATING)
                .sampled(10);
        assertThat(flow.heights).hasSize(11);
        assertThat(flow.stability[0][5]).isEqualTo(wind.firstDerivative(1));
        assertThat(flow.eastward[2][5]).isEqualTo(wind.secondDerivative(1));
    }
}
