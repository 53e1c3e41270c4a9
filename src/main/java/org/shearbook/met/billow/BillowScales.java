package org.shearbook.met.billow;

/**
 * Expected size and speed of growth of billows in a layer.
 *
 * @param wavelength     of the fastest growing billows [m]; NaN when stable
 * @param growthRate     of their amplitude [s⁻¹]; 0 when stable
 * @param eFoldingTime   1 / growth rate [s]; infinite when stable
 * @param halfDepth      d = |ΔV| / (2 S_max), half the depth of the equivalent tanh layer [m]
 * @param stable         whether no growth is expected: smallest Ri is ¼ or more
 * @param basis          how the numbers were found, shown beside them
 */
public record BillowScales(
        double wavelength, double growthRate, double eFoldingTime, double halfDepth, boolean stable, String basis) {
}
