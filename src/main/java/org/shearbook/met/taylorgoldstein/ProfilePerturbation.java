package org.shearbook.met.taylorgoldstein;

/**
 * Errors of an ascent as an ensemble draws them: normal, independent for u, v and temperature.
 *
 * @param wind                  standard deviation of each wind component [m s⁻¹]
 * @param windCorrelationLength height over which wind errors lose their correlation, {@code exp(-Δz/L)} [m]; 0 for none
 * @param temperature           standard deviation of temperature, uncorrelated between levels [K]
 */
public record ProfilePerturbation(double wind, double windCorrelationLength, double temperature) {

    public ProfilePerturbation {
        requireNotNegative(wind, "wind");
        requireNotNegative(windCorrelationLength, "windCorrelationLength");
        requireNotNegative(temperature, "temperature");
    }

    private static void requireNotNegative(double value, String name) {
        if (!(value >= 0) || Double.isInfinite(value)) {
            throw new IllegalArgumentException(name + " must be zero or positive and finite: " + value);
        }
    }
}
