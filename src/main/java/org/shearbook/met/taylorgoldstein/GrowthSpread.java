package org.shearbook.met.taylorgoldstein;

/**
 * Growth of a layer over an ensemble of perturbed copies of its ascent. Growth rates are over all members, with zero
 * where nothing grows; wavelengths over the growing members only, NaN when there is none.
 *
 * @param members       copies analysed
 * @param growing       members with a growing, converged wave
 * @param growthRate10  10th percentile of the growth rate [s⁻¹]
 * @param growthRate50  median [s⁻¹]
 * @param growthRate90  90th percentile [s⁻¹]
 * @param wavelength10  10th percentile of the wavelength [m]
 * @param wavelength50  median [m]
 * @param wavelength90  90th percentile [m]
 * @param seed          of the random numbers: the same seed gives the same members
 */
public record GrowthSpread(int members, int growing, double growthRate10, double growthRate50, double growthRate90,
        double wavelength10, double wavelength50, double wavelength90, long seed) {

    /** Fraction of the members in which a wave grows. */
    public double growingFraction() {
        return (double) growing / members;
    }
}
