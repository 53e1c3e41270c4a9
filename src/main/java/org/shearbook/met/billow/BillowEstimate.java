package org.shearbook.met.billow;

import java.util.Optional;
import org.shearbook.met.richardson.ShearLayer;
import org.shearbook.met.taylorgoldstein.Mode;
import org.shearbook.met.taylorgoldstein.StabilityResult;

/**
 * What the billows of a layer would become if they grow: size, time, and what they leave behind. Lengths [m], times [s].
 *
 * @param wave             it was worked out from
 * @param initialDepth     {@code h₀ = |ΔV|/S_max}, depth of the layer as a straight line [m]
 * @param windChange       |ΔV| across the layer [m s⁻¹]
 * @param richardsonNumber Ri₀, smallest in the layer [1]
 * @param height           H of the billows, the depth they mix, for Ri_f 0.32
 * @param lowHeight        the same for Ri_f 0.25
 * @param highHeight       the same for Ri_f 0.40
 * @param timeToBreakdown  from first growth to collapse, middle estimate
 * @param shortTimeToBreakdown lower end
 * @param longTimeToBreakdown  upper end
 * @param turbulentLifetime of the turbulent patch after collapse
 */
public record BillowEstimate(
        BillowWave wave, double initialDepth, double windChange, double richardsonNumber,
        double height, double lowHeight, double highHeight,
        double timeToBreakdown, double shortTimeToBreakdown, double longTimeToBreakdown, double turbulentLifetime) {

    /*
     * Depth. Mixing stops when the bulk Richardson number has risen to Ri_f. A straight-line layer of depth h₀ with Ri₀
     * keeps its wind and buoyancy change while it deepens, so Ri grows like its depth: h_f = h₀ Ri_f / Ri₀, at most half a
     * wavelength (our own combination). Ri_f = 0.32, laboratory and simulation, 0.25 to 0.40: Thorpe 1973, J. Fluid Mech.
     * 61, 731; Smyth and Moum 2000, Phys. Fluids 12, 1327: from memory. The billow is as high as what it mixes.
     *
     * Time. Amplitude grows from a₀ to H/2 in ln(H/(2 a₀)) e-foldings, a₀ 1 to 5 m: our own choice, √5 m in the middle.
     * Independent of it, laboratory billows reach full height and start to collapse at |ΔV| t/λ of about 5 (page from memory: De Silva,
     * Fernando, Eaton and Hebert 1996, Earth Planet. Sci. Lett. 143, 217). The range spans both.
     *
     * The patch stays turbulent for about as long again, 5 λ/|ΔV|: from memory, our own choice.
     */

    /** Bulk Richardson number at which mixing stops [1]. */
    public static final double FINAL_RICHARDSON = 0.32;

    /** Lower end of what has been found [1]. */
    public static final double LOW_FINAL_RICHARDSON = 0.25;

    /** Upper end of what has been found [1]. */
    public static final double HIGH_FINAL_RICHARDSON = 0.40;

    private static final double HIGHEST_OVER_WAVELENGTH = 0.5;
    private static final double SMALL_SEED = 1;
    private static final double LARGE_SEED = 5;
    private static final double COLLAPSE = 5;

    /**
     * Billows of a layer from its solved wave, or by the depth rule where none was solved or the solution did not converge.
     *
     * @param layer   a shear layer
     * @param fastest its fastest-growing wave; empty when none was solved for
     * @return empty when neither gives a growing wave, or the wind does not change across the layer
     */
    public static Optional<BillowEstimate> of(ShearLayer layer, Optional<Mode> fastest) {
        if (!(layer.windChange() > 0)) {
            return Optional.empty();
        }
        Optional<BillowWave> wave = fastest.filter(Mode::converged).map(BillowWave::of).or(() -> BillowWave.byRule(layer));
        return wave.map(w -> of(w, layer.windChange(), layer.maximumShear(), layer.minimum().richardsonNumber()));
    }

    /**
     * Billows of a layer for which the stability problem was solved. As {@link #of(ShearLayer, Optional)}; where the
     * solution has no growing wave the depth rule serves, and its basis says that solving found none.
     *
     * @param layer  a shear layer
     * @param result of its stability analysis
     * @return empty when neither gives a growing wave, or the wind does not change across the layer
     */
    public static Optional<BillowEstimate> of(ShearLayer layer, StabilityResult result) {
        boolean solvedWithoutWave = result.complete() && result.fastest().isEmpty();
        if (!solvedWithoutWave || !(layer.windChange() > 0)) {
            return of(layer, result.fastest());
        }
        return BillowWave.byRule(layer, DepthRule.BASIS + "; solving found no growing wave")
                .map(w -> of(w, layer.windChange(), layer.maximumShear(), layer.minimum().richardsonNumber()));
    }

    /**
     * Billows from a wave and the three numbers of a layer. Method and sources in the block comment.
     *
     * <p><b>Limits.</b> Only if the wave grows undisturbed; a forecast of it is not. Ri₀ above Ri_f: nothing is mixed, the
     * height is h₀. Height carries ±25 % from Ri_f alone, times a factor of two from the seed.
     *
     * @param wave             the growing wave
     * @param windChange       |ΔV| [m s⁻¹], positive
     * @param maximumShear     S_max [s⁻¹], positive
     * @param richardsonNumber Ri₀ [1], 0 or more
     * @throws IllegalArgumentException if a value is out of range, infinite or NaN
     */
    public static BillowEstimate of(BillowWave wave, double windChange, double maximumShear, double richardsonNumber) {
        if (!(windChange > 0) || !(maximumShear > 0) || !(richardsonNumber >= 0) || Double.isInfinite(windChange)
                || Double.isInfinite(maximumShear) || Double.isInfinite(richardsonNumber)) {
            throw new IllegalArgumentException("billows need a positive wind change and shear and a Richardson number of 0 or more, not "
                    + windChange + " m/s, " + maximumShear + " 1/s, " + richardsonNumber);
        }
        double depth = windChange / maximumShear;
        double height = mixedDepth(depth, richardsonNumber, FINAL_RICHARDSON, wave.wavelength());
        double byLaboratory = COLLAPSE * wave.wavelength() / windChange;
        double quick = eFoldings(height, LARGE_SEED) / wave.growthRate();
        double slow = eFoldings(height, SMALL_SEED) / wave.growthRate();
        double middle = eFoldings(height, Math.sqrt(SMALL_SEED * LARGE_SEED)) / wave.growthRate();
        return new BillowEstimate(wave, depth, windChange, richardsonNumber, height,
                mixedDepth(depth, richardsonNumber, LOW_FINAL_RICHARDSON, wave.wavelength()),
                mixedDepth(depth, richardsonNumber, HIGH_FINAL_RICHARDSON, wave.wavelength()),
                middle, Math.min(quick, byLaboratory), Math.max(slow, byLaboratory), byLaboratory);
    }

    /** {@code h_f = h₀ Ri_f/Ri₀}, at least h₀, at most half a wavelength where that is more than h₀ [m]. */
    static double mixedDepth(double depth, double richardsonNumber, double finalRichardson, double wavelength) {
        double mixed = richardsonNumber == 0 ? Double.POSITIVE_INFINITY : depth * finalRichardson / richardsonNumber;
        return Math.max(depth, Math.min(mixed, HIGHEST_OVER_WAVELENGTH * wavelength));
    }

    private static double eFoldings(double height, double seed) {
        return Math.max(1, Math.log(height / (2 * seed)));
    }

    /** Distance between crests [m]: the wavelength. */
    public double crestSpacing() {
        return wave.wavelength();
    }

    /** Depth mixed when all is over [m]; the shear left in it is {@code |ΔV|} over this depth. */
    public double mixedDepth() {
        return height;
    }

    /** Shear left after mixing [s⁻¹]. */
    public double shearAfterMixing() {
        return windChange / height;
    }

    /** Time {@code 5 λ/|ΔV|} from growth to collapse in the laboratory [s]. */
    double laboratoryTime() {
        return COLLAPSE * wave.wavelength() / windChange;
    }
}
