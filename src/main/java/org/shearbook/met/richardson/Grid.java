package org.shearbook.met.richardson;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.Units;
import org.shearbook.met.profile.VerticalProfile;

/** The columns of a {@link RichardsonProfile}; never changed after {@link #of}. */
final class Grid {

    /** Shear squared [s⁻²] below which the wind counts as not changing: 10⁻⁵ s⁻¹ is 0.006 kt per 1000 ft. */
    private static final double NO_SHEAR = 1e-10;

    final double[] height;
    final double[] pressure;
    final double[] u;
    final double[] v;
    final double[] measuredN2;
    final double[] sortedN2;
    final double[] s2;
    final double[] measuredRi;
    final double[] ri;
    final double[] shearOverThousandFeet;
    final PointStatus[] status;
    private final double spacing;

    private Grid(double[] height, double spacing, VerticalProfile profile) {
        int n = height.length;
        this.height = height;
        this.spacing = spacing;
        pressure = new double[n];
        for (int i = 0; i < n; i++) {
            pressure[i] = profile.pressureAt(height[i]);
        }
        u = missing(n);
        v = missing(n);
        measuredN2 = missing(n);
        sortedN2 = missing(n);
        s2 = missing(n);
        measuredRi = missing(n);
        ri = missing(n);
        status = new PointStatus[n];
        Arrays.fill(status, PointStatus.GAP);
        shearOverThousandFeet = ShearOverDepth.centredOn(profile, Units.THOUSAND_FEET, height);
    }

    private static double[] missing(int n) {
        double[] column = new double[n];
        Arrays.fill(column, Double.NaN);
        return column;
    }

    static Grid of(VerticalProfile profile, List<RoundedFlow> flows, double spacing) {
        if (flows.isEmpty()) {
            return new Grid(new double[0], spacing, profile);
        }
        double base = flows.get(0).extent().base();
        double top = flows.get(flows.size() - 1).extent().top();
        double[] height = new double[(int) Math.floor((top - base) / spacing) + 1];
        for (int i = 0; i < height.length; i++) {
            height[i] = base + i * spacing;
        }
        Grid grid = new Grid(height, spacing, profile);
        for (RoundedFlow flow : flows) {
            grid.fill(flow);
        }
        return grid;
    }

    private void fill(RoundedFlow flow) {
        int from = firstAtOrAbove(flow.extent().base());
        int to = from;
        while (to < height.length && height[to] <= flow.extent().top()) {
            to++;
        }
        if (to == from) {
            return;
        }
        double[] z = Arrays.copyOfRange(height, from, to);
        double[][] east = new double[2][z.length];
        double[][] north = new double[2][z.length];
        double[][] measured = new double[2][z.length];
        double[][] sorted = new double[2][z.length];
        flow.eastward().derivatives(z, east);
        flow.northward().derivatives(z, north);
        flow.measuredBuoyancy().derivatives(z, measured);
        flow.sortedBuoyancy().derivatives(z, sorted);
        for (int k = 0; k < z.length; k++) {
            int i = from + k;
            u[i] = east[0][k];
            v[i] = north[0][k];
            measuredN2[i] = measured[1][k];
            // rounding of sums may leave −1e-20 where the sorted profile is flat
            sortedN2[i] = Math.max(0, sorted[1][k]);
            s2[i] = east[1][k] * east[1][k] + north[1][k] * north[1][k];
            if (s2[i] < NO_SHEAR) {
                status[i] = PointStatus.NO_SHEAR;
            } else {
                status[i] = measuredN2[i] < 0 ? PointStatus.OVERTURNED : PointStatus.KNOWN;
                measuredRi[i] = measuredN2[i] / s2[i];
                ri[i] = sortedN2[i] / s2[i];
            }
        }
    }

    int size() {
        return height.length;
    }

    double spacing() {
        return spacing;
    }

    int firstAtOrAbove(double z) {
        int found = Arrays.binarySearch(height, z);
        return found >= 0 ? found : -found - 1;
    }

    Optional<RichardsonMinimum> minimumBetween(double base, double top, VerticalProfile profile) {
        int from = firstAtOrAbove(base);
        int least = -1;
        int to = from;
        while (to < height.length && height[to] <= top) {
            if (ri[to] < (least < 0 ? Double.POSITIVE_INFINITY : ri[least])) {
                least = to;
            }
            to++;
        }
        return least < 0 ? Optional.empty() : Optional.of(minimum(least, least, least, profile));
    }

    /** Describes the minimum at {@code least}, taking {@code from} to {@code to} as belonging to its band. */
    RichardsonMinimum minimum(int least, int from, int to, VerticalProfile profile) {
        int low = from;
        while (low > 0 && ri[low] < 1 && ri[low - 1] < 1) {
            low--;
        }
        int high = to;
        while (high < height.length - 1 && ri[high] < 1 && ri[high + 1] < 1) {
            high++;
        }
        HeightBand below1 = ri[least] < 1 ? band(edgeBelow(low, 1), edgeAbove(high, 1)) : null;
        double depth = 0;
        double bottom = Double.NaN;
        double topOfBand = Double.NaN;
        for (int i = low; i <= high; i++) {
            if (ri[i] < RichardsonNumber.CRITICAL) {
                double lower = i == low || !(ri[i - 1] < RichardsonNumber.CRITICAL)
                        ? edgeBelow(i, RichardsonNumber.CRITICAL) : height[i];
                if (Double.isNaN(bottom)) {
                    bottom = lower;
                }
                while (i < high && ri[i + 1] < RichardsonNumber.CRITICAL) {
                    i++;
                }
                topOfBand = edgeAbove(i, RichardsonNumber.CRITICAL);
                depth += topOfBand - lower;
            }
        }
        return new RichardsonMinimum(ri[least], height[least], pressure[least], profile.flightLevelAt(height[least]),
                depth, Double.isNaN(bottom) ? null : band(bottom, topOfBand), below1);
    }

    private static @Nullable HeightBand band(double base, double top) {
        return base < top ? new HeightBand(base, top) : null;
    }

    /** Where Ri passes the limit between a point below it and the next lower point; the point itself at a gap or end. */
    double edgeBelow(int i, double limit) {
        return i == 0 ? height[0] : edge(i, i - 1, limit);
    }

    /** Where Ri passes the limit between a point below it and the next higher point; the point itself at a gap or end. */
    double edgeAbove(int i, double limit) {
        return i == height.length - 1 ? height[i] : edge(i, i + 1, limit);
    }

    private double edge(int inside, int outside, double limit) {
        if (!(ri[inside] < limit) || !(ri[outside] >= limit)) {
            return height[inside];
        }
        double weight = (limit - ri[inside]) / (ri[outside] - ri[inside]);
        return height[inside] + weight * (height[outside] - height[inside]);
    }

    double maximumShearOverThousandFeet(double base, double top) {
        double maximum = Double.NaN;
        for (int i = firstAtOrAbove(base); i < height.length && height[i] <= top; i++) {
            if (!(shearOverThousandFeet[i] <= maximum) && !Double.isNaN(shearOverThousandFeet[i])) {
                maximum = shearOverThousandFeet[i];
            }
        }
        return maximum;
    }
}
