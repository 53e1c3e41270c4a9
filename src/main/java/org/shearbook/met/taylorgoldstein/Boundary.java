package org.shearbook.met.taylorgoldstein;

/** What closes the flow at its lowest or highest height. */
public enum Boundary {

    /** No vertical motion, as at flat ground: {@code w = 0}. */
    RIGID,

    /**
     * Uniform wind and stability go on without end: the disturbance decays or carries energy away, nothing comes back.
     */
    RADIATING
}
