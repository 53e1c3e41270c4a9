package org.shearbook.met.taylorgoldstein;

/**
 * How wide and how hard a search looks.
 *
 * @param azimuths            directions over 180°, evenly spaced, one of them along the shear
 * @param wavenumbers         wavenumbers, evenly spaced in their logarithm
 * @param searchStride        every how many wavenumbers all waves are counted and found, in a layer half as often at every
 *                            second azimuth; in between they are followed. 1: everywhere
 * @param relativeGrowthFloor slowest growth looked for, as a fraction of the greatest shear
 * @param growthFloor         slowest growth looked for [s⁻¹]; the larger of the two floors counts
 * @param workLimit           evaluations of the dispersion function times grid levels after which a search stops and
 *                            says so; about 5 to 20 ns each
 */
public record SearchSettings(int azimuths, int wavenumbers, int searchStride, double relativeGrowthFloor,
        double growthFloor, long workLimit) {

    public SearchSettings {
        requirePositive(azimuths, "azimuths");
        requirePositive(wavenumbers, "wavenumbers");
        requirePositive(searchStride, "searchStride");
        if (!(relativeGrowthFloor >= 0) || !(growthFloor >= 0) || !(relativeGrowthFloor + growthFloor > 0)
                || Double.isInfinite(relativeGrowthFloor + growthFloor)) {
            throw new IllegalArgumentException("the growth floors must not be negative, and not both zero: "
                    + relativeGrowthFloor + ", " + growthFloor);
        }
        if (workLimit < 1) {
            throw new IllegalArgumentException("workLimit must be positive: " + workLimit);
        }
    }

    /**
     * For a layer of a measured profile: 24 azimuths by 40 wavenumbers, growth above 2 % of the shear and faster than
     * an e-folding an hour.
     */
    public static SearchSettings forLayers() {
        return new SearchSettings(24, 40, 4, 0.02, 1 / 3600.0, 300_000_000L);
    }

    /** For a profile taken as given: 24 azimuths by 40 wavenumbers, growth above 0.2 % of the shear. */
    public static SearchSettings forLevels() {
        return new SearchSettings(24, 40, 2, 0.002, 0, 300_000_000L);
    }

    private static void requirePositive(int value, String name) {
        if (value < 1) {
            throw new IllegalArgumentException(name + " must be at least 1: " + value);
        }
    }
}
