package org.shearbook.met.taylorgoldstein;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * One growing wave: {@code w ∝ Re ŵ(z) exp(i k (s - c t))} with s the distance along the azimuth.
 *
 * @param azimuth              direction of the wave vector [° clockwise from north]; the same wave can be written with
 *                             the opposite azimuth and the opposite phase speed
 * @param horizontalWavenumber k [rad m⁻¹], positive
 * @param growthRate           {@code σ = k Im c} [s⁻¹], positive
 * @param phaseSpeed           {@code Re c} along the azimuth [m s⁻¹]
 * @param criticalHeights      heights where the wind along the azimuth equals the phase speed [m], the one nearest to
 *                             the strongest shear first; empty where there is none
 * @param residual             length of the last Newton step as a fraction of the wind's range along the azimuth
 * @param numericalError       relative change of the growth rate between the last two grids; NaN for the waves of a
 *                             map, which are solved on one grid
 * @param extent               heights the wave reaches; null for the waves of a map
 * @param converged            whether root and grid have converged
 * @param reason               why not, in words; empty when converged
 */
public record Mode(double azimuth, double horizontalWavenumber, double growthRate, double phaseSpeed,
        List<Double> criticalHeights, double residual, double numericalError, @Nullable VerticalExtent extent,
        boolean converged, String reason) {

    public Mode {
        criticalHeights = List.copyOf(criticalHeights);
    }

    /** Horizontal wavelength {@code 2π/k} [m]. */
    public double wavelength() {
        return 2 * Math.PI / horizontalWavenumber;
    }

    /** Time in which the amplitude grows by the factor e, {@code 1/σ} [s]. */
    public double eFoldingTime() {
        return 1 / growthRate;
    }
}
