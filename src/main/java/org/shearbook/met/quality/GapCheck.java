package org.shearbook.met.quality;

import java.util.Arrays;
import java.util.List;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.HeightBand;

/**
 * Stretches in which nothing may be interpolated. A gap lies between two neighbouring levels with a value
 * <ul>
 * <li>when the message bounds it (FM 35 part B or D, {@code nn///}), or
 * <li>when they are farther apart than ten times the usual spacing of this ascent, but never below 200 m nor above
 *     5000 m (own limits: a drop-out of 600 m in a 10 m ascent is a gap, 4 km between coded levels is not).
 * </ul>
 */
final class GapCheck implements QualityCheck {

    private static final double USUAL_SPACINGS = 10;
    private static final double NEVER_BELOW = 200;
    private static final double ALWAYS_ABOVE = 5000;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        find(sounding, sounding.windLevels(), Significance.WIND_MISSING_BOUNDARY, QualityFlag.WIND_GAP, sounding.windGaps);
        find(sounding, sounding.temperatureLevels(), Significance.TEMPERATURE_MISSING_BOUNDARY,
                QualityFlag.TEMPERATURE_GAP, sounding.temperatureGaps);
    }

    private static void find(
            LevelsUnderCheck sounding, List<LevelsUnderCheck.Level> levels, Significance bound, QualityFlag flag, List<HeightBand> gaps) {
        if (levels.size() < 2) {
            return;
        }
        double[] bounds = sounding.levels.stream().filter(l -> l.is(bound) && l.hasHeight() && !l.isRefused())
                .mapToDouble(l -> l.height).sorted().toArray();
        double limit = limit(levels);
        int next = 0;
        for (int k = 1; k < levels.size(); k++) {
            LevelsUnderCheck.Level below = levels.get(k - 1);
            LevelsUnderCheck.Level above = levels.get(k);
            while (next < bounds.length && bounds[next] < below.height) {
                next++;
            }
            // two bounding marks between, or at, neighbouring levels: the message says there is nothing in between
            boolean marked = next + 1 < bounds.length && bounds[next + 1] <= above.height;
            if (above.height > below.height && (marked || above.height - below.height > limit)) {
                gaps.add(new HeightBand(below.height, above.height));
                below.flags.add(flag);
                above.flags.add(flag);
            }
        }
    }

    private static double limit(List<LevelsUnderCheck.Level> levels) {
        double[] sorted = new double[levels.size() - 1];
        for (int k = 0; k < sorted.length; k++) {
            sorted[k] = levels.get(k + 1).height - levels.get(k).height;
        }
        Arrays.sort(sorted);
        return Math.min(ALWAYS_ABOVE, Math.max(NEVER_BELOW, USUAL_SPACINGS * sorted[sorted.length / 2]));
    }
}
