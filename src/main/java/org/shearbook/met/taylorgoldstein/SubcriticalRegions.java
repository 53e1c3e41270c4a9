package org.shearbook.met.taylorgoldstein;

/**
 * Where a flow can drive growth, as far as a search needs it: the stretches with Ri below ¼ and a shear of at least a
 * tenth of the greatest.
 *
 * @param shallowest smallest depth [m]: a region is as deep as its shear exceeds half its peak, or, where stability divides
 *                   the shear, as deep as the stretch, but no less than a tenth of the former
 * @param deepest    greatest depth over which a region's shear exceeds half its peak [m]
 * @param extent     from the lowest to the highest such height [m]
 * @param from       grid level a quarter of the greatest depth below the lowest
 * @param to         grid level a quarter of the greatest depth above the highest
 */
record SubcriticalRegions(double shallowest, double deepest, double extent, int from, int to) {

    private static final double WEAKEST = 0.1;
    private static final double MARGIN = 0.25;

    static SubcriticalRegions of(SampledFlow flow) {
        double shallowest = Double.POSITIVE_INFINITY;
        double deepest = 0;
        int first = -1;
        int last = -1;
        double weakest = WEAKEST * flow.greatestShear;
        for (int i = 0; i <= flow.intervals; i++) {
            if (!subcritical(flow, i, weakest)) {
                continue;
            }
            int end = i;
            int peak = i;
            while (end < flow.intervals && subcritical(flow, end + 1, weakest)) {
                end++;
                if (flow.shearSquared(end) > flow.shearSquared(peak)) {
                    peak = end;
                }
            }
            double depth = depthOfShear(flow, peak);
            shallowest = Math.min(shallowest, Math.min(depth, Math.max((end - i + 1) * flow.spacing, 0.1 * depth)));
            deepest = Math.max(deepest, depth);
            first = first < 0 ? i : first;
            last = end;
            i = end;
        }
        if (first < 0) {
            double whole = flow.heights[flow.intervals] - flow.heights[0];
            return new SubcriticalRegions(whole, whole, whole, 0, flow.intervals);
        }
        int margin = 1 + (int) Math.ceil(MARGIN * deepest / flow.spacing);
        return new SubcriticalRegions(shallowest, deepest, (last - first) * flow.spacing, Math.max(0, first - margin),
                Math.min(flow.intervals, last + margin));
    }

    private static double depthOfShear(SampledFlow flow, int peak) {
        int low = peak;
        int high = peak;
        double quarter = 0.25 * flow.shearSquared(peak);
        while (low > 0 && flow.shearSquared(low - 1) >= quarter) {
            low--;
        }
        while (high < flow.intervals && flow.shearSquared(high + 1) >= quarter) {
            high++;
        }
        return (high - low + 1) * flow.spacing;
    }

    private static boolean subcritical(SampledFlow flow, int i, double weakest) {
        double s2 = flow.shearSquared(i);
        return s2 > weakest * weakest && flow.stability[0][i] < 0.25 * s2;
    }
}
