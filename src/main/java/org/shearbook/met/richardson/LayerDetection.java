package org.shearbook.met.richardson;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.SaturationRule;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;

/** Finds and measures shear layers on the grid, as {@link RichardsonAnalysis} says. */
final class LayerDetection {

    private static final double GROW = 0.5;
    private static final double GROW_SHEAR_SQUARED = 1e-5;
    private static final int FEW_LEVELS = 3;

    private final VerticalProfile profile;
    private final List<RoundedFlow> flows;
    private final Grid grid;
    private final double smoothing;

    LayerDetection(VerticalProfile profile, List<RoundedFlow> flows, Grid grid, double smoothing) {
        this.profile = profile;
        this.flows = flows;
        this.grid = grid;
        this.smoothing = smoothing;
    }

    List<ShearLayer> find() {
        List<ShearLayer> layers = new ArrayList<>();
        for (RoundedFlow flow : flows) {
            int from = grid.firstAtOrAbove(flow.extent().base());
            int end = from;
            while (end < grid.size() && grid.height[end] <= flow.extent().top()) {
                end++;
            }
            int i = from;
            while (i < end) {
                if (!grows(i)) {
                    i++;
                    continue;
                }
                int last = lastOfRun(i, end);
                addIfLayer(layers, flow, i, last, from, end - 1);
                i = last + 1;
            }
        }
        return layers;
    }

    private boolean grows(int i) {
        return grid.ri[i] < GROW && grid.s2[i] > GROW_SHEAR_SQUARED;
    }

    private int lastOfRun(int first, int end) {
        int last = first;
        for (int i = first + 1; i < end && grid.height[i] - grid.height[last] <= smoothing + grid.spacing(); i++) {
            if (grows(i)) {
                last = i;
            }
        }
        return last;
    }

    private void addIfLayer(List<ShearLayer> layers, RoundedFlow flow, int first, int last, int flowFirst, int flowLast) {
        int least = first;
        int strongest = first;
        boolean overturned = false;
        for (int i = first; i <= last; i++) {
            // a NaN never compares as less: points without shear are bridged, not chosen
            if (grid.ri[i] < grid.ri[least]) {
                least = i;
            }
            if (grid.s2[i] > grid.s2[strongest]) {
                strongest = i;
            }
            overturned |= grid.status[i] == PointStatus.OVERTURNED;
        }
        double base = first == flowFirst ? flow.extent().base() : Math.max(flow.extent().base(), grid.edgeBelow(first, GROW));
        double top = last == flowLast ? flow.extent().top() : Math.min(flow.extent().top(), grid.edgeAbove(last, GROW));
        if (!(grid.ri[least] < RichardsonNumber.CRITICAL) || top - base < 2 * smoothing) {
            return;
        }
        Set<LayerRemark> remarks = EnumSet.noneOf(LayerRemark.class);
        if (overturned) {
            remarks.add(LayerRemark.OVERTURNED);
        }
        if (first == flowFirst) {
            remarks.add(flow == flows.get(0) ? LayerRemark.BOUNDED_BY_END_OF_DATA : LayerRemark.BOUNDED_BY_GAP);
        }
        if (last == flowLast) {
            remarks.add(flow == flows.get(flows.size() - 1) ? LayerRemark.BOUNDED_BY_END_OF_DATA : LayerRemark.BOUNDED_BY_GAP);
        }
        layers.add(measure(letter(layers.size()), flow, new HeightBand(base, top), first, last, least, strongest, remarks));
    }

    private ShearLayer measure(
            String letter, RoundedFlow flow, HeightBand extent, int first, int last, int least, int strongest, Set<LayerRemark> remarks) {
        double base = extent.base();
        double top = extent.top();
        double du = flow.eastward().value(top) - flow.eastward().value(base);
        double dv = flow.northward().value(top) - flow.northward().value(base);
        double db = Math.max(0, flow.sortedBuoyancy().value(top) - flow.sortedBuoyancy().value(base));
        double change = du * du + dv * dv;
        double meanU = 0;
        double meanV = 0;
        for (int i = first; i <= last; i++) {
            meanU += grid.u[i];
            meanV += grid.v[i];
        }
        int points = last - first + 1;
        int windLevels = 0;
        for (WindLevel level : profile.windLevels()) {
            windLevels += extent.contains(level.height()) ? 1 : 0;
        }
        if (windLevels < FEW_LEVELS) {
            remarks.add(LayerRemark.FEW_WIND_LEVELS);
        }
        if (base < profile.surfaceHeight() + RichardsonAnalysis.FREE_AIR) {
            remarks.add(LayerRemark.NEAR_GROUND);
        }
        double saturated = saturatedFraction(extent);
        if (Double.isNaN(saturated)) {
            remarks.add(LayerRemark.HUMIDITY_UNKNOWN);
        } else if (saturated >= 0.5) {
            remarks.add(LayerRemark.SATURATED);
        }
        return new ShearLayer(letter, extent,
                profile.pressureAt(base), profile.pressureAt(top), profile.flightLevelAt(base), profile.flightLevelAt(top),
                grid.minimum(least, first, last, profile),
                change == 0 ? Double.NaN : db * extent.depth() / change,
                Math.sqrt(db / extent.depth()),
                Math.sqrt(grid.s2[strongest]), grid.height[strongest],
                grid.maximumShearOverThousandFeet(base, top),
                du, dv, meanU / points, meanV / points, windLevels, saturated, remarks);
    }

    /** Share of the levels inside that are saturated; the middle of the layer where no level lies inside. */
    private double saturatedFraction(HeightBand extent) {
        int known = 0;
        int saturated = 0;
        for (ThermodynamicLevel level : profile.thermodynamicLevels()) {
            if (extent.contains(level.height()) && level.hasHumidity()) {
                known++;
                saturated += isSaturated(level.temperature(), level.dewPoint()) ? 1 : 0;
            }
        }
        if (known > 0) {
            return (double) saturated / known;
        }
        double middle = 0.5 * (extent.base() + extent.top());
        double dewPoint = profile.dewPointAt(middle);
        if (Double.isNaN(dewPoint)) {
            return Double.NaN;
        }
        return isSaturated(profile.temperatureAt(middle), dewPoint) ? 1 : 0;
    }

    private static boolean isSaturated(double temperature, double dewPoint) {
        return SaturationRule.DEFAULT.of(temperature, dewPoint).isSaturated();
    }

    /** A to Z, then AA, AB … as columns of a table are named. */
    static String letter(int index) {
        StringBuilder letters = new StringBuilder();
        for (int i = index; i >= 0; i = i / 26 - 1) {
            letters.insert(0, (char) ('A' + i % 26));
        }
        return letters.toString();
    }
}
