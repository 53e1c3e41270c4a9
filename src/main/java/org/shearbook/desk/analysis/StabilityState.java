package org.shearbook.desk.analysis;

import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** The state of the air in one word, by its smallest Richardson number and, for decaying, by what was known before. */
public enum StabilityState {
    /** Ri is 1 or more. */
    STEADY,
    /** Ri from ¼ to 1, and nothing says that the air was turbulent before. */
    MARGINAL,
    /** Ri below ¼. */
    SUBCRITICAL,
    /** Ri from ¼ to 1 after it was below ¼, or with a moderate report near by: rough air stays rough up to about 1. */
    DECAYING,
    /** Nothing is known, or what was known is too old. */
    UNKNOWN;

    /** Common practice; ¼ is the limit of theory, 1 where turbulence that is there is held to end. */
    public static final double SUBCRITICAL_BELOW = 0.25;
    public static final double STEADY_FROM = 1;

    /** What one sounding alone can say: never decaying. */
    public static StabilityState ofOneSounding(@Nullable Double richardsonNumber) {
        if (richardsonNumber == null || richardsonNumber.isNaN()) {
            return UNKNOWN;
        }
        return richardsonNumber < SUBCRITICAL_BELOW ? SUBCRITICAL : richardsonNumber < STEADY_FROM ? MARGINAL : STEADY;
    }

    public String inWords() {
        return name().toLowerCase(Locale.ROOT);
    }
}
