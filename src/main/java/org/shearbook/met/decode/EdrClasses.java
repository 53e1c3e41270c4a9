package org.shearbook.met.decode;

import java.util.List;
import org.shearbook.met.decode.DecodedAirReport.Intensity;

/**
 * A table that turns the eddy dissipation rate into a word. The rate is what is kept; the word is derived, and
 * always shown with the edition it was derived by, since 0.50 is moderate in one edition and severe in the next.
 * The tables here do not depend on the aircraft.
 *
 * @param edition      name and year of the table, shown beside every word derived by it
 * @param nilUpTo      largest peak rate still nil, inclusive [m^⅔ s⁻¹]
 * @param moderateFrom smallest peak rate that is moderate, inclusive [m^⅔ s⁻¹]
 * @param severeFrom   smallest peak rate that is severe, inclusive [m^⅔ s⁻¹]
 */
public record EdrClasses(String edition, double nilUpTo, double moderateFrom, double severeFrom) {

    /** Annex 3, Appendix 4: nil ≤ 0.10 &lt; light &lt; 0.20 ≤ moderate &lt; 0.45 ≤ severe. */
    public static final EdrClasses ANNEX_3_PRESENT =
            new EdrClasses("ICAO Annex 3, Appendix 4, 20th edition (2018)", 0.10, 0.20, 0.45);

    /** The older table of the same Annex, with 0.1, 0.4 and 0.7: from memory, for archives that cross the change. */
    public static final EdrClasses ANNEX_3_FORMER =
            new EdrClasses("ICAO Annex 3, Appendix 4, before the 20th edition", 0.10, 0.40, 0.70);

    public EdrClasses {
        if (edition.isBlank()) {
            throw new IllegalArgumentException("edition is blank");
        }
        if (!(nilUpTo > 0.0 && nilUpTo < moderateFrom && moderateFrom < severeFrom && severeFrom < 5.0)) {
            throw new IllegalArgumentException("boundaries must rise from above 0 to below 5: nilUpTo " + nilUpTo
                    + ", moderateFrom " + moderateFrom + ", severeFrom " + severeFrom);
        }
    }

    /** The tables this desk knows, newest first. An office may add its own. */
    public static List<EdrClasses> known() {
        return List.of(ANNEX_3_PRESENT, ANNEX_3_FORMER);
    }

    /**
     * The word for a peak rate. No table has a boundary for extreme.
     *
     * @param peak ε^⅓ [m^⅔ s⁻¹], not negative
     * @return nil, light, moderate or severe
     * @throws IllegalArgumentException if the rate is negative or not a number
     */
    public Intensity intensity(double peak) {
        if (!(peak >= 0.0)) {
            throw new IllegalArgumentException("eddy dissipation rate must not be negative or missing, was " + peak);
        }
        if (peak >= severeFrom) {
            return Intensity.SEV;
        }
        if (peak >= moderateFrom) {
            return Intensity.MOD;
        }
        return peak > nilUpTo ? Intensity.LGT : Intensity.NIL;
    }
}
