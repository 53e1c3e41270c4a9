package org.shearbook.met.richardson;

import java.util.ArrayList;
import java.util.List;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;

/**
 * The chance that between two levels of a coarse ascent lies a thin layer with Ri &lt; ¼ which the ascent cannot show.
 */
public final class HiddenSublayer {

    /*
     * Chance of at least one 100 m sublayer with Ri < ¼ in a depth L whose bulk Ri lies in a class. Our own model, no
     * published authority: random shear with a saturated vertical spectrum, energy N²/(6 m³), N = 0.0105 s⁻¹; computed
     * once by simulation. Rows by depth, columns by class of bulk Ri.
     */

    private static final double[] DEPTH = {200, 400, 800};
    private static final double[] CLASS_EDGE = {0, 0.25, 0.5, 0.75, 1, 1.5, 2, 3, 5};
    private static final double[][] CHANCE = {
        {1.00, 0.74, 0.34, 0.24, 0.16, 0.12, 0.09, 0.08},
        {1.00, 0.95, 0.72, 0.57, 0.45, 0.32, 0.30, 0.26},
        {1.00, 1.00, 0.94, 0.86, 0.78, 0.74, 0.66, 0.58}};

    /** Depth of the sublayer asked for [m]. */
    public static final double SUBLAYER = 100;

    private HiddenSublayer() {
    }

    /**
     * Chance of at least one 100 m sublayer with Ri &lt; ¼.
     *
     * <p><b>Method.</b> Table; a step by class of bulk Ri, as it was computed, and linear in depth between 200, 400
     * and 800 m.
     *
     * <p><b>Limits.</b> A model of free air with the stability of the troposphere. Not covered, and NaN: depths below 200 m,
     * which hide nothing worth the name, and bulk Ri of 5 and more. Beyond 800 m the value for 800 m is given: the true
     * chance is higher. A negative bulk Ri counts as 0.
     *
     * @param bulkRichardsonNumber of the depth between two levels [1]
     * @param depth                between them [m], positive
     * @return 0 to 1; NaN where not covered or where the bulk Ri is NaN
     * @throws IllegalArgumentException if depth is not positive
     */
    public static double chance(double bulkRichardsonNumber, double depth) {
        if (!(depth > 0)) {
            throw new IllegalArgumentException("a hidden layer needs a positive depth to hide in, not " + depth + " m");
        }
        int last = CLASS_EDGE.length - 1;
        if (Double.isNaN(bulkRichardsonNumber) || bulkRichardsonNumber >= CLASS_EDGE[last] || depth < DEPTH[0]) {
            return Double.NaN;
        }
        int column = 0;
        while (column < last - 1 && bulkRichardsonNumber >= CLASS_EDGE[column + 1]) {
            column++;
        }
        double capped = Math.min(depth, DEPTH[2]);
        int row = capped < DEPTH[1] ? 0 : 1;
        double weight = (capped - DEPTH[row]) / (DEPTH[row + 1] - DEPTH[row]);
        return CHANCE[row][column] + weight * (CHANCE[row + 1][column] - CHANCE[row][column]);
    }

    /**
     * The stretches between reported wind levels at least 200 m apart, each with its bulk Ri and its chance.
     *
     * @param profile the ascent; stretches that touch a gap, or whose ends have no temperature, are left out
     * @return from the lowest up; stretches with a chance that is not covered are left out
     */
    public static List<Stretch> of(VerticalProfile profile) {
        List<Stretch> stretches = new ArrayList<>();
        List<WindLevel> winds = profile.windLevels();
        for (int k = 1; k < winds.size(); k++) {
            WindLevel below = winds.get(k - 1);
            WindLevel above = winds.get(k);
            double depth = above.height() - below.height();
            if (depth < DEPTH[0] || profile.hasWindGapBetween(below.height(), above.height())
                    || profile.hasTemperatureGapBetween(below.height(), above.height())) {
                continue;
            }
            double lower = thetaV(profile, below.height());
            double upper = thetaV(profile, above.height());
            if (Double.isNaN(lower) || Double.isNaN(upper)) {
                continue;
            }
            double bulk = RichardsonNumber.bulk(depth, lower, upper, above.eastward() - below.eastward(), above.northward() - below.northward());
            double chance = chance(bulk, depth);
            if (!Double.isNaN(chance)) {
                stretches.add(new Stretch(below.height(), above.height(), bulk, chance));
            }
        }
        return List.copyOf(stretches);
    }

    private static double thetaV(VerticalProfile profile, double height) {
        double temperature = profile.temperatureAt(height);
        double pressure = profile.pressureAt(height);
        return Double.isNaN(temperature) || Double.isNaN(pressure) ? Double.NaN
                : MoistThermodynamics.virtualPotentialTemperature(pressure, temperature, profile.dewPointAt(height));
    }

    /**
     * A stretch between two wind levels.
     *
     * @param base   [m]
     * @param top    [m]
     * @param bulkRichardsonNumber layer mean [1]
     * @param chance of a 100 m sublayer with Ri &lt; ¼ inside [1]
     */
    public record Stretch(double base, double top, double bulkRichardsonNumber, double chance) {
    }
}
