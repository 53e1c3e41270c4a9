package org.shearbook.met.richardson;

/** The state of a layer in one word. Stable names; see {@link LayerStateRule}. */
public enum LayerState {
    /** Ri is 1 or more. */
    STEADY,
    /** Ri is between ¼ and 1, was not below ¼ since it last was 1, and nobody has lately reported turbulence. */
    MARGINAL,
    /** Ri is below ¼. */
    SUBCRITICAL,
    /** Ri is between ¼ and 1 after having been below ¼, or with turbulence lately reported: it can stay rough up to 1. */
    DECAYING,
    /** The evidence is too old, or there is none. */
    UNKNOWN
}
