package org.shearbook.met.quality;

import java.util.List;

/**
 * A vector change of more than 10 m/s from the level below at more than 0.1 s⁻¹: twice the sharpest shear beside
 * large billows (9 m/s per 200 m, Browning 1971, Q. J. R. Meteorol. Soc. 97, 283, is 0.045 s⁻¹; the limit is our own).
 * Flagged only: a single wrong value is a spike, a jump that stays may be true.
 */
final class WindJumpCheck implements QualityCheck {

    private static final double CHANGE = 10;
    private static final double SHEAR = 0.1;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        List<LevelsUnderCheck.Level> levels = sounding.windLevels();
        for (int k = 1; k < levels.size(); k++) {
            LevelsUnderCheck.Level below = levels.get(k - 1);
            LevelsUnderCheck.Level level = levels.get(k);
            double change = below.windChangeTo(level);
            if (change > CHANGE && change > SHEAR * (level.height - below.height)) {
                level.flags.add(QualityFlag.WIND_JUMP);
            }
        }
    }
}
