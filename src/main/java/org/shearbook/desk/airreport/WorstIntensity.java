package org.shearbook.desk.airreport;

import java.util.Comparator;
import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.EdrClasses;

/**
 * The one word a report is listed, drawn and compared by.
 *
 * @param word  null when the report has neither a word nor a peak EDR
 * @param basis {@code as reported}, or the edition of the table that turned EDR into the word
 */
record WorstIntensity(@Nullable Intensity word, @Nullable String basis) {

    static final String AS_REPORTED = "as reported";

    /**
     * The strongest word of all layers, the upper one of a range. Only where the crew used no word does the table
     * speak, and it speaks of peak EDR alone: a mean is not what its limits are for.
     *
     * @param edrPeak ε^⅓ [m^⅔ s⁻¹]; NaN when not given
     */
    static WorstIntensity of(List<TurbulenceLayer> turbulence, double edrPeak, EdrClasses classes) {
        return turbulence.stream().flatMap(layer -> Stream.of(layer.intensity(), layer.intensityTo()))
                .filter(Objects::nonNull).max(Comparator.naturalOrder())
                .map(word -> new WorstIntensity(word, AS_REPORTED))
                .orElseGet(() -> edrPeak >= 0 ? new WorstIntensity(classes.intensity(edrPeak), "peak EDR by " + classes.edition())
                        : new WorstIntensity(null, null));
    }
}
