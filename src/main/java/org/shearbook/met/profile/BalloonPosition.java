package org.shearbook.met.profile;

/**
 * Where and when the balloon was at a height. NaN where not known.
 *
 * @param height    geopotential height above mean sea level [m]
 * @param elapsed   since release [s]
 * @param latitude  [degrees north]
 * @param longitude [degrees east]
 */
public record BalloonPosition(double height, double elapsed, double latitude, double longitude) {

    public BalloonPosition {
        if (!Double.isFinite(height)) {
            throw new IllegalArgumentException("a balloon position needs a finite height, not " + height);
        }
    }
}
