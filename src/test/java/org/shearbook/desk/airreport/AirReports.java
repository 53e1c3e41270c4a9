package org.shearbook.desk.airreport;

import java.time.Instant;
import java.util.List;
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.Place;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.FixLookup.Fix;
import org.shearbook.met.decode.Remark;

/** Decoded reports for tests, all invented. */
public final class AirReports {

    private AirReports() {
    }

    /** A moderate voluntary report over a fix with two candidates, from an aircraft named in text, remark and number. */
    public static DecodedAirReport voluntary(Instant observedAt, String aircraft) {
        return new DecodedAirReport(aircraft + "-7", ReportClass.VOL, false, aircraft, "A320", "M", observedAt,
                new Place("KEL", 47.2, -30.0, "fix",
                        List.of(new Fix("KEL", "VORTAC", 47.2, -30.0, Double.NaN), new Fix("KEL", "AERODROME", 12.5, 3.0, -1.5))),
                290, List.of(new TurbulenceLayer(Intensity.LGT, Intensity.MOD, DecodedAirReport.Frequency.OCNL, "CAT", 28_000, Double.NaN),
                        new TurbulenceLayer(null, null, null, "CHOP", Double.NaN, Double.NaN)),
                Double.NaN, Double.NaN, Double.NaN, 250, 62.5, 228.15, Cloud.CLEAR, aircraft.toLowerCase() + " says bumpy below",
                "UA /OV KEL /TM 0412 /FL290 /TP A320 /TB LGT-MOD " + aircraft, 3,
                List.of(new Remark(3, 8, "PLACE_AMBIGUOUS", "KEL of " + aircraft + " means two places; the nearer one was taken.")));
    }

    /** An automatic report with a peak EDR and no words. */
    public static DecodedAirReport automatic(Instant observedAt, double edrPeak, double flightLevel, double latitude, double longitude) {
        return new DecodedAirReport("", ReportClass.EDR, false, "HRNX101", "", "H", observedAt,
                new Place("%.2f %.2f".formatted(latitude, longitude), latitude, longitude, "coordinates", List.of()),
                flightLevel, List.of(), 0.05, edrPeak, Double.NaN, Double.NaN, Double.NaN, Double.NaN, Cloud.UNKNOWN, "",
                "HRNX101;%s;%s".formatted(observedAt, edrPeak), 1, List.of());
    }
}
