package org.shearbook.met.richardson;

import java.util.List;
import java.util.Locale;

/**
 * How a kind of sonde errs, as far as it matters for gradients: only the part of an error that differs between
 * neighbouring heights does, a bias cancels. An office may use its own figures; they are kept with every result.
 *
 * @param name                  of the kind of sonde, shown beside what was computed with it
 * @param wind                  standard deviation of each wind component [m s⁻¹], 0 or more
 * @param windCorrelationLength height over which wind errors lose their correlation, {@code exp(−Δz/L)} [m]; 0 for none
 * @param temperature           standard deviation of temperature, uncorrelated between levels [K], 0 or more
 * @param source                where the figures come from
 */
public record InstrumentNoise(String name, double wind, double windCorrelationLength, double temperature, String source) {

    /** For a sonde of unknown kind. */
    public static final InstrumentNoise DEFAULT = new InstrumentNoise("any sonde", 0.3, 60, 0.1,
            "our own choice, no source: pendulum motion left after the ground station's filter, and the scatter of a modern sensor");

    /** The reference network's processing of this sonde. */
    public static final InstrumentNoise RS92 = new InstrumentNoise("RS92", 0.4, 60, 0.15,
            "temperature 0.15 K at night: Dirksen et al. 2014, Atmos. Meas. Tech. 7, 4463, abstract; wind 0.4 to 1.0 m/s in all, lower"
                    + " end taken since biases cancel: from memory; correlation length: our own choice");

    public static final InstrumentNoise RS41 = new InstrumentNoise("RS41", 0.3, 60, 0.09,
            "temperature 0.17 K at twice the standard deviation: Lee et al. 2022, Atmos. Meas. Tech. 15, 1107; satellite-navigation wind"
                    + " 0.15 m/s before pendulum motion: from memory, doubled for it: our own choice; correlation length: our own choice");

    public InstrumentNoise {
        if (name.isBlank() || source.isBlank()) {
            throw new IllegalArgumentException("instrument noise needs a name and a source");
        }
        requireNotNegative(wind, "wind");
        requireNotNegative(windCorrelationLength, "windCorrelationLength");
        requireNotNegative(temperature, "temperature");
    }

    /** The kinds this desk knows, the default first. */
    public static List<InstrumentNoise> known() {
        return List.of(DEFAULT, RS92, RS41);
    }

    /**
     * The noise of a sonde by the type name of a code table, such as "RS41-SGP".
     *
     * @param sondeType may be empty
     * @return the first known kind whose name the type begins with or contains as a word, else {@link #DEFAULT}
     */
    public static InstrumentNoise ofSondeType(String sondeType) {
        String type = sondeType.toUpperCase(Locale.ROOT);
        for (InstrumentNoise noise : known()) {
            if (type.matches(".*\\b" + noise.name.toUpperCase(Locale.ROOT) + "\\b.*")) {
                return noise;
            }
        }
        return DEFAULT;
    }

    private static void requireNotNegative(double value, String name) {
        if (!(value >= 0) || Double.isInfinite(value)) {
            throw new IllegalArgumentException(name + " must be zero or positive and finite: " + value);
        }
    }
}
