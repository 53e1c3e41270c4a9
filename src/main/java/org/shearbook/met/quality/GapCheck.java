package org.shearbook.met.quality;

import java.util.Arrays;
import java.util.List;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.HeightBand;

/**
 * Stretches in which nothing may be interpolated. A gap lies between two neighbouring levels with a value
 * <ul>
 * <li>when the message bounds it (FM 35 part B or D, {@code nn///}), or
 * <li>in a dense ascent (usual spacing up to 100 m) when they are farther apart than ten times the usual spacing and
 *     than 200 m: a drop-out of 600 m in a 10 m ascent is a gap, or
 * <li>in a coded ascent when they are farther apart than 5000 m: significant levels are left out by design where the
 *     profile is straight, and 3 km without one is common in the lower stratosphere.
 * </ul>
 * The limits are own choices; the usual spacing is the median.
 */
final class GapCheck implements QualityCheck {

    private static final double DENSE = 100;
    private static final double USUAL_SPACINGS = 10;
    private static final double LEAST_IN_DENSE = 200;
    private static final double IN_CODED = 5000;

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
        double usual = sorted[sorted.length / 2];
        return usual > DENSE ? IN_CODED : Math.max(LEAST_IN_DENSE, USUAL_SPACINGS * usual);
    }
}
