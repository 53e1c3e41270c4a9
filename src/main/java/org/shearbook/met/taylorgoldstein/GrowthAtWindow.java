package org.shearbook.met.taylorgoldstein;

/**
 * The stability of one layer at one smoothing of the profile.
 *
 * @param window full width at half maximum of the smoothing [m]
 * @param result what the analysis found
 */
public record GrowthAtWindow(double window, StabilityResult result) {

    /** Growth rate of the fastest wave [s⁻¹]; zero where none grows. */
    public double growthRate() {
        return result.fastest().map(Mode::growthRate).orElse(0.0);
    }
}
