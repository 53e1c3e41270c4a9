package org.shearbook.met.richardson;

import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.RoundedCornerFunction;

/**
 * One uninterrupted stretch of an ascent, wind and stability both known, as smooth functions of height. An ascent
 * with a gap has one flow below it and one above, and neither knows anything of the gap.
 *
 * @param extent            where it holds [m]
 * @param eastward          u [m s⁻¹]
 * @param northward         v [m s⁻¹]
 * @param measuredBuoyancy  B [m s⁻²], with {@code dB/dz = N²}; falls with height where the air is statically unstable
 * @param sortedBuoyancy    B made non-decreasing, so that {@code N² ≥ 0}
 */
public record RoundedFlow(
        HeightBand extent, RoundedCornerFunction eastward, RoundedCornerFunction northward,
        RoundedCornerFunction measuredBuoyancy, RoundedCornerFunction sortedBuoyancy) {
}
