package org.shearbook.desk.analysis;

import org.shearbook.desk.sounding.SoundingId;

/**
 * One sounding as a column over height: what a display draws. All arrays have one length; NaN where nothing is known.
 * Height and flight level strictly increase.
 *
 * @param window            full width at half maximum [m]
 * @param height            geopotential [m]
 * @param flightLevel       pressure altitude [hundreds of feet]
 * @param elapsed           of the balloon since release [s]
 * @param richardson        as measured, negative where statically unstable
 * @param shear1000FtKt     change of wind over exactly 1000 ft [kt]
 * @param n2                as measured [s⁻²]
 */
public record AnalysisColumn(
        SoundingId soundingId, int version, double window, double[] height, double[] flightLevel, double[] elapsed,
        double[] richardson, double[] shear1000FtKt, double[] n2) {

    public int size() {
        return height.length;
    }
}
