package org.shearbook.met.richardson;

import java.util.Set;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.Units;

/**
 * A layer in which shear beats stability, found by {@link RichardsonAnalysis}. Numbers are for the window of the
 * {@link RichardsonProfile} it belongs to, except shear over 1000 ft, which is for exactly that depth.
 *
 * @param letter             A, B, C … from the lowest up
 * @param extent             base and top [m], where Ri of the sorted profile passes ½
 * @param basePressure       [Pa]; NaN when not known
 * @param topPressure        [Pa]; NaN when not known
 * @param baseFlightLevel    hundreds of feet of pressure altitude, not rounded; NaN when not known
 * @param topFlightLevel     likewise
 * @param minimum            smallest Ri, where, and the bands with Ri below ¼ and 1
 * @param bulkRichardsonNumber {@code ΔB h / |ΔV|²} of the whole layer [1]; NaN when the wind at base and top is the same
 * @param meanBuoyancyFrequency {@code √(ΔB/h)} [s⁻¹]
 * @param maximumShear       largest |∂V/∂z| [s⁻¹]
 * @param maximumShearHeight where [m]
 * @param maximumShearOverThousandFeet largest |ΔV|/304.8 m over exactly 1000 ft, of all windows centred in the layer
 *                           [s⁻¹]; NaN when none fits between gaps and ends
 * @param eastwardChange     Δu, top minus base [m s⁻¹]
 * @param northwardChange    Δv, top minus base [m s⁻¹]
 * @param meanEastward       mean u over the depth [m s⁻¹]
 * @param meanNorthward      mean v over the depth [m s⁻¹]
 * @param windLevelCount     reported wind levels inside, base and top included
 * @param saturatedFraction  of the layer, 0 to 1; NaN when humidity is not known
 * @param remarks            what to know before leaning on these numbers
 */
public record ShearLayer(
        String letter, HeightBand extent,
        double basePressure, double topPressure, double baseFlightLevel, double topFlightLevel,
        RichardsonMinimum minimum, double bulkRichardsonNumber, double meanBuoyancyFrequency,
        double maximumShear, double maximumShearHeight, double maximumShearOverThousandFeet,
        double eastwardChange, double northwardChange, double meanEastward, double meanNorthward,
        int windLevelCount, double saturatedFraction, Set<LayerRemark> remarks) {

    public ShearLayer {
        remarks = Set.copyOf(remarks);
    }

    /** [m]. */
    public double base() {
        return extent.base();
    }

    /** [m]. */
    public double top() {
        return extent.top();
    }

    /** [m]. */
    public double depth() {
        return extent.depth();
    }

    /** Vector wind change |ΔV| from base to top [m s⁻¹]. */
    public double windChange() {
        return Math.hypot(eastwardChange, northwardChange);
    }

    /** Direction towards which the wind change points, clockwise from true north [degrees]; 0 when there is none. */
    public double windChangeDirection() {
        return Units.towardsDirection(eastwardChange, northwardChange);
    }
}
