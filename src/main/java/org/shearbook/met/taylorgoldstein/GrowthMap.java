package org.shearbook.met.taylorgoldstein;

import java.util.ArrayList;
import java.util.List;

/** The growing waves found at every azimuth and wavenumber of a search. */
public final class GrowthMap {

    private final double[] azimuths;
    private final double[] wavenumbers;
    private final double[][][] phaseSpeeds;
    private final double[][][] growthRates;
    private final double[][][] residuals;

    /**
     * @param azimuths    [° clockwise from north], shape {@code [a]}
     * @param wavenumbers [rad m⁻¹], shape {@code [k]}
     * @param phaseSpeeds per azimuth, wavenumber and wave [m s⁻¹]
     * @param growthRates per azimuth, wavenumber and wave [s⁻¹]
     * @param residuals   Newton's last step as a fraction of the wind's range, likewise
     */
    GrowthMap(double[] azimuths, double[] wavenumbers, double[][][] phaseSpeeds, double[][][] growthRates,
            double[][][] residuals) {
        this.azimuths = azimuths;
        this.wavenumbers = wavenumbers;
        this.phaseSpeeds = phaseSpeeds;
        this.growthRates = growthRates;
        this.residuals = residuals;
    }

    /** Azimuths [° clockwise from north], a copy, shape {@code [a]}. */
    public double[] azimuths() {
        return azimuths.clone();
    }

    /** Horizontal wavenumbers [rad m⁻¹], ascending, a copy, shape {@code [k]}. */
    public double[] wavenumbers() {
        return wavenumbers.clone();
    }

    /** Growth rate of the fastest wave at an azimuth and a wavenumber [s⁻¹]; zero where none grows. */
    public double growthRate(int azimuth, int wavenumber) {
        double greatest = 0;
        for (double growthRate : growthRates[azimuth][wavenumber]) {
            greatest = Math.max(greatest, growthRate);
        }
        return greatest;
    }

    /** Number of growing waves at an azimuth and a wavenumber. */
    public int waves(int azimuth, int wavenumber) {
        return growthRates[azimuth][wavenumber].length;
    }

    /** Growth rate of one wave at an azimuth and a wavenumber [s⁻¹]. */
    public double growthRate(int azimuth, int wavenumber, int wave) {
        return growthRates[azimuth][wavenumber][wave];
    }

    /** Phase speed along the azimuth of one wave at an azimuth and a wavenumber [m s⁻¹]. */
    public double phaseSpeed(int azimuth, int wavenumber, int wave) {
        return phaseSpeeds[azimuth][wavenumber][wave];
    }

    /** Every wave of the map, by azimuth and wavenumber. */
    List<Mode> modes(SampledFlow flow) {
        List<Mode> modes = new ArrayList<>();
        for (int j = 0; j < azimuths.length; j++) {
            double angle = Math.toRadians(90 - azimuths[j]);
            for (int q = 0; q < wavenumbers.length; q++) {
                for (int r = 0; r < growthRates[j][q].length; r++) {
                    modes.add(new Mode(azimuths[j], wavenumbers[q], growthRates[j][q][r], phaseSpeeds[j][q][r],
                            flow.criticalHeights(Math.cos(angle), Math.sin(angle), phaseSpeeds[j][q][r]),
                            residuals[j][q][r], Double.NaN, null, true, ""));
                }
            }
        }
        return modes;
    }

    /** Fraction of the map's points at which some wave grows. */
    public double unstableFraction() {
        int unstable = 0;
        for (double[][] along : growthRates) {
            for (double[] at : along) {
                if (at.length > 0) {
                    unstable++;
                }
            }
        }
        return unstable / (double) Math.max(1, azimuths.length * wavenumbers.length);
    }
}
