package org.shearbook.met.decode;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * One report from one aircraft. {@code NaN} and the empty string are missing; null where marked.
 *
 * @param reportId     the source's own identifier; empty when it has none
 * @param reportClass  how the report came to be, which decides what may be verified with it
 * @param urgent       marked urgent or special by its sender
 * @param aircraft     identification of the aircraft: private, see {@code airreport}; empty when not given
 * @param aircraftType type designator; empty when not given
 * @param weightClass  {@code L}, {@code M} or {@code H} by wake category; empty when not given
 * @param observedAt   when the crew or the instrument observed; null when the message does not say
 * @param place        where
 * @param flightLevel  pressure altitude [hundreds of feet]; {@code NaN} when unknown, which is not zero
 * @param turbulence   one entry per layer reported; empty when turbulence was not reported (which is not nil)
 * @param edrMean      mean eddy dissipation rate ε^⅓ [m^⅔ s⁻¹]
 * @param edrPeak      peak eddy dissipation rate ε^⅓ [m^⅔ s⁻¹]
 * @param gust         derived equivalent vertical gust [m s⁻¹]
 * @param windFromDirection from true north [degrees]
 * @param windSpeed    [m s⁻¹]
 * @param temperature  [K]
 * @param cloud        in or out of cloud
 * @param remark       free text of the report
 */
public record DecodedAirReport(
        String reportId, ReportClass reportClass, boolean urgent, String aircraft, String aircraftType, String weightClass,
        @Nullable Instant observedAt, Place place, double flightLevel,
        List<TurbulenceLayer> turbulence, double edrMean, double edrPeak, double gust,
        double windFromDirection, double windSpeed, double temperature, Cloud cloud, String remark,
        String raw, int line, List<Remark> remarks) implements DecodedMessage {

    /** How a report came to be: verification.md A.1. */
    public enum ReportClass {
        /** Voluntary, subjective: a null exists only where the crew says so. */
        VOL(NullPolicy.EXPLICIT),
        /** Special air-report: positives only. */
        SPC(NullPolicy.NONE),
        /** Automatic, sent when a threshold is crossed; {@link NullPolicy#HEARTBEAT} where routine messages come too. */
        TRG(NullPolicy.NONE),
        /** Automatic at a routine interval, nulls included. */
        EDR(NullPolicy.SYSTEMATIC),
        /** From the recorder after the flight. */
        QAR(NullPolicy.SYSTEMATIC);

        private final NullPolicy nullPolicy;

        ReportClass(NullPolicy nullPolicy) {
            this.nullPolicy = nullPolicy;
        }

        /** What it means that reports of this class say nothing. */
        public NullPolicy nullPolicy() {
            return nullPolicy;
        }
    }

    public enum Cloud { CLEAR, IN_CLOUD, UNKNOWN }

    /** The standard words. */
    public enum Intensity { NIL, LGT, MOD, SEV, EXTRM }

    public enum Frequency { OCNL, INTMT, CONT }

    /**
     * Turbulence of one layer. Both intensities are equal unless the report gives a range; base and top in feet
     * as reported, {@code NaN} where open or not given.
     *
     * @param intensity   lower word of a range; null when the report names a kind without a strength
     * @param intensityTo upper word of a range
     * @param frequency   null when not given
     * @param type        {@code CAT}, {@code CHOP}, {@code LLWS}, {@code MTW}; empty when not given
     * @param baseFeet    [ft]; {@code NaN} when the layer is open below
     * @param topFeet     [ft]; {@code NaN} when the layer is open above
     */
    public record TurbulenceLayer(
            @Nullable Intensity intensity, @Nullable Intensity intensityTo, @Nullable Frequency frequency, String type,
            double baseFeet, double topFeet) {
    }

    /**
     * Where an aircraft was.
     *
     * @param text       as in the message
     * @param latitude   [degrees north]; {@code NaN} when not resolved
     * @param longitude  [degrees east]; {@code NaN} when not resolved
     * @param resolvedBy in words: {@code coordinates}, {@code fix}, {@code fix-radial-distance (magnetic)},
     *                   {@code midpoint assumed}; empty when not resolved
     * @param candidates every place the text could mean, for a person to choose from
     */
    public record Place(String text, double latitude, double longitude, String resolvedBy, List<FixLookup.Fix> candidates) {

        public Place {
            candidates = List.copyOf(candidates);
        }

        public boolean isResolved() {
            return !Double.isNaN(latitude) && !Double.isNaN(longitude);
        }
    }

    public DecodedAirReport {
        turbulence = List.copyOf(turbulence);
        remarks = List.copyOf(remarks);
    }
}
