package org.shearbook.met.profile;

/** Whether air counts as saturated, and how sure that is. Stable names. */
public enum Saturation {
    /** No humidity was measured: nothing can be said, and nothing is assumed. */
    UNKNOWN,
    /** Not saturated by the rule. */
    UNSATURATED,
    /** Saturated over water by the rule. */
    OVER_WATER,
    /**
     * Saturated over ice by the rule. <em>Assumed:</em> air may be supersaturated over ice without a cloud, and a sonde
     * does not see whether there is ice. Shown with that word.
     */
    OVER_ICE_ASSUMED;

    /** Whether moist stability applies. */
    public boolean isSaturated() {
        return this == OVER_WATER || this == OVER_ICE_ASSUMED;
    }

    /** Whether saturation is assumed rather than measured. */
    public boolean isAssumed() {
        return this == OVER_ICE_ASSUMED;
    }
}
