package org.shearbook.met.profile;

/**
 * A stretch of height.
 *
 * @param base geopotential height above mean sea level [m]
 * @param top  [m], above {@code base}
 */
public record HeightBand(double base, double top) {

    public HeightBand {
        if (!(base < top) || Double.isInfinite(base) || Double.isInfinite(top)) {
            throw new IllegalArgumentException("a height band needs a finite base below its top, not " + base + " to " + top + " m");
        }
    }

    /** [m]. */
    public double depth() {
        return top - base;
    }

    public boolean contains(double height) {
        return height >= base && height <= top;
    }

    /** Whether the height lies strictly inside: the bounding levels of a gap are themselves measured. */
    public boolean encloses(double height) {
        return height > base && height < top;
    }

    /** Whether the open intervals overlap. */
    public boolean overlaps(double otherBase, double otherTop) {
        return otherBase < top && otherTop > base;
    }
}
