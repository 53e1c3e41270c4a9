package org.shearbook.met.quality;

import java.util.List;

/**
 * Potential temperature that falls by more than 1 K to the next level above: air that would have overturned within
 * minutes, or a wet sensor above cloud. 1 K is ten times the usual noise of a sonde (own limit). Flagged only; such
 * layers are real near hot ground.
 */
final class SuperadiabaticCheck implements QualityCheck {

    private static final double LIMIT = 1;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        List<LevelsUnderCheck.Level> levels = sounding.temperatureLevels();
        for (int k = 1; k < levels.size(); k++) {
            if (levels.get(k).potentialTemperature() < levels.get(k - 1).potentialTemperature() - LIMIT) {
                levels.get(k).flags.add(QualityFlag.SUPERADIABATIC);
            }
        }
    }
}
