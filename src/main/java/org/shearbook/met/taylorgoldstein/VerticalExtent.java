package org.shearbook.met.taylorgoldstein;

/**
 * Heights between which the vertical velocity of a wave exceeds a fraction 1/e of its greatest amplitude.
 *
 * @param base lower height [m]
 * @param top  upper height [m]
 */
public record VerticalExtent(double base, double top) {

    /** Distance from base to top [m]. */
    public double depth() {
        return top - base;
    }
}
