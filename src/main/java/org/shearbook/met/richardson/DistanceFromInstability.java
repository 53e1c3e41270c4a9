package org.shearbook.met.richardson;

/**
 * How far a layer is from the critical Richardson number ¼, in the terms a forecaster can watch: the shear or the
 * stability that would have to change.
 *
 * @param shearIncrease     fraction by which shear must grow to reach ¼ at the same stability, {@code √(Ri/¼) − 1};
 *                          negative: by which it may fall before the layer leaves the unstable range
 * @param stabilityDecrease fraction by which N² must fall to reach ¼ at the same shear, {@code 1 − ¼/Ri}; negative: by
 *                          which it may rise; −∞ for Ri = 0
 */
public record DistanceFromInstability(double shearIncrease, double stabilityDecrease) {

    /**
     * @param richardsonNumber smallest Ri [1], 0 or more
     * @throws IllegalArgumentException if Ri is negative, infinite or NaN
     */
    public static DistanceFromInstability of(double richardsonNumber) {
        if (!(richardsonNumber >= 0) || Double.isInfinite(richardsonNumber)) {
            throw new IllegalArgumentException("the distance from instability needs a finite Ri of 0 or more, not " + richardsonNumber);
        }
        double ratio = richardsonNumber / RichardsonNumber.CRITICAL;
        return new DistanceFromInstability(Math.sqrt(ratio) - 1, 1 - 1 / ratio);
    }
}
