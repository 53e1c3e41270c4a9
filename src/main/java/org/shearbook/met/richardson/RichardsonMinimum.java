package org.shearbook.met.richardson;

import org.jspecify.annotations.Nullable;
import org.shearbook.met.profile.HeightBand;

/**
 * The smallest Richardson number of a stretch, and how far the small values around it reach. Bands may reach beyond
 * the stretch that was searched: they describe the air, not the search.
 *
 * @param richardsonNumber  smallest Ri of the sorted profile [1], 0 or more
 * @param height            where [m]
 * @param pressure          there [Pa]; NaN when not known
 * @param flightLevel       there; hundreds of feet of pressure altitude, not rounded; NaN when not known
 * @param depthBelowQuarter depth with Ri < ¼ in the band around it in which Ri < 1 [m]; 0 when there is none
 * @param bandBelowQuarter  from the lowest to the highest height with Ri < ¼ in that band; null when there is none
 * @param bandBelowOne      the band in which Ri < 1 throughout; null when even the minimum is 1 or more
 */
public record RichardsonMinimum(
        double richardsonNumber, double height, double pressure, double flightLevel,
        double depthBelowQuarter, @Nullable HeightBand bandBelowQuarter, @Nullable HeightBand bandBelowOne) {
}
