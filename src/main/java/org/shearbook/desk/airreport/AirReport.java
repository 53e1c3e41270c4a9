package org.shearbook.desk.airreport;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.Place;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.NullPolicy;
import org.shearbook.met.decode.Remark;

/**
 * One version of one air-report, without anything that names the aircraft. Null and the empty string are missing.
 *
 * @param sourceId          the sender's own number for it; empty when it has none
 * @param flightLevel       pressure altitude [hundreds of feet]; null when unknown, which is not zero
 * @param turbulence        one entry per layer reported; empty when turbulence was not reported, which is not nil
 * @param worstIntensity    the strongest word of the report, or the word its peak EDR has; null when there is neither
 * @param worstBasis        where that word comes from: {@code as reported}, or the edition of the EDR table
 * @param edrMean           mean ε^⅓ [m^⅔ s⁻¹]
 * @param edrPeak           peak ε^⅓ [m^⅔ s⁻¹]
 * @param gust              derived equivalent vertical gust [m s⁻¹]
 * @param windFromDirection from true north [degrees]
 * @param windSpeed         [m s⁻¹]
 * @param temperature       [K]
 * @param remarks           what decoding could not read or had to assume
 * @param attributionReason why a person chose the attribution; null while it is nobody's choice
 */
public record AirReport(
        AirReportId id, int version, String sourceId, ReportClass reportClass, NullPolicy nullPolicy, boolean urgent,
        Instant observedAt, Instant receivedAt, Instant recordedAt,
        Place place, @Nullable Double flightLevel,
        List<TurbulenceLayer> turbulence, @Nullable Intensity worstIntensity, @Nullable String worstBasis,
        @Nullable Double edrMean, @Nullable Double edrPeak, @Nullable Double gust,
        @Nullable Double windFromDirection, @Nullable Double windSpeed, @Nullable Double temperature,
        Cloud cloud, String aircraftType, String weightClass, String remark, List<Remark> remarks,
        Attribution attribution, @Nullable String attributionReason) {

    public AirReport {
        turbulence = List.copyOf(turbulence);
        remarks = List.copyOf(remarks);
    }

    /** Whether the report stays out of shear-layer scoring, by the cause a person gave it. */
    public boolean isExcluded() {
        return !attribution.isScored();
    }

    /** Why it stays out; null when it does not. */
    public @Nullable String excludedBecause() {
        return isExcluded() ? attribution.inWords() + (attributionReason == null ? "" : ": " + attributionReason) : null;
    }

    public boolean isModerateOrGreater() {
        return worstIntensity != null && worstIntensity.compareTo(Intensity.MOD) >= 0;
    }
}
