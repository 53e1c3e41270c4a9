package org.shearbook.met.quality;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;

/**
 * Knots taken for metres per second make every speed 1.944 times too large. Suspected when a speed exceeds 100 m/s,
 * or when, against the previous sounding of the station at the same heights, the middle ratio of the speeds lies
 * between 1.85 and 2.05 and four fifths of the ratios between 1.6 and 2.4 (own limits; the weather of twelve hours
 * doubles the wind somewhere, but not everywhere alike). Speeds under 5 m/s before are left out, and ten levels at
 * least must be comparable. Flagged only: a person decides.
 */
final class UnitSlipCheck implements QualityCheck {

    private static final double SUSPICIOUS_SPEED = 100;
    private static final double LEAST_PREVIOUS_SPEED = 5;
    private static final int ENOUGH = 10;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        List<LevelsUnderCheck.Level> winds = sounding.windLevels();
        double fastest = winds.stream().mapToDouble(l -> l.reported.windSpeed()).max().orElse(0);
        if (fastest > SUSPICIOUS_SPEED) {
            sounding.flagSounding(QualityFlag.POSSIBLE_UNIT_SLIP, String.format(Locale.ROOT,
                    "The strongest wind is %.1f m/s, above 100 m/s. Were the speeds knots?", fastest));
            return;
        }
        VerticalProfile previous = sounding.previous;
        if (previous == null) {
            return;
        }
        double[] ratios = winds.stream().mapToDouble(l -> ratio(l, previous)).filter(r -> !Double.isNaN(r)).sorted().toArray();
        if (ratios.length < ENOUGH) {
            return;
        }
        double middle = ratios[ratios.length / 2];
        long alike = Arrays.stream(ratios).filter(r -> r >= 1.6 && r <= 2.4).count();
        if (middle >= 1.85 && middle <= 2.05 && alike >= 0.8 * ratios.length) {
            sounding.flagSounding(QualityFlag.POSSIBLE_UNIT_SLIP, String.format(Locale.ROOT,
                    "Speeds are %.2f times those of the previous sounding, at %d of %d heights alike. Were they knots?",
                    middle, alike, ratios.length));
        }
    }

    private static double ratio(LevelsUnderCheck.Level level, VerticalProfile previous) {
        WindLevel before = previous.windAt(level.height);
        return before == null || before.speed() < LEAST_PREVIOUS_SPEED ? Double.NaN : level.reported.windSpeed() / before.speed();
    }
}
