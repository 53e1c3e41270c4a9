package org.shearbook.desk.forecast;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What a forecast says.
 *
 * @param reportedAt         the report the forecast rests on, when the turbulence is already observed; null when it is only expected
 * @param placeName          a short name for lists and cards, for example {@code Kelbrith E}; may be empty
 * @param baseFlightLevel    lower limit [hundreds of feet], a multiple of 10
 * @param topFlightLevel     upper limit [hundreds of feet], a multiple of 10
 * @param probabilityPercent how sure, in tens from 10 to 90
 * @param evidence           what it rests on; empty for the forecaster's judgement alone
 * @param wouldChange        what would change this forecast, in one line
 * @param secondLookBy       who looked at it before issue
 * @param aloneReason        why nobody could, where a severe forecast is issued alone
 */
public record ForecastContent(
        Intensity intensity, Conditions conditions, @Nullable Instant reportedAt,
        String placeName, Area area, int baseFlightLevel, int topFlightLevel, Instant validFrom, Instant validUntil,
        int probabilityPercent, Movement movement, StrengthChange change,
        List<Evidence> evidence, String wouldChange, @Nullable String secondLookBy, @Nullable String aloneReason) {

    public ForecastContent {
        evidence = List.copyOf(evidence);
    }

    /** Whether a position, level and moment lie inside or on the edge. */
    public boolean covers(double latitude, double longitude, double flightLevel, Instant at) {
        return !at.isBefore(validFrom) && !at.isAfter(validUntil)
                && flightLevel >= baseFlightLevel && flightLevel <= topFlightLevel && area.contains(latitude, longitude);
    }

    /** Whether two forecasts can say something of the same air at the same time. */
    public boolean mayOverlap(ForecastContent other) {
        return validFrom.isBefore(other.validUntil) && other.validFrom.isBefore(validUntil)
                && baseFlightLevel < other.topFlightLevel && other.baseFlightLevel < topFlightLevel
                && Area.mayOverlap(area, other.area);
    }

    /** The area in words: its short name if it has one, else its limits. */
    public String place() {
        return placeName.isBlank() ? ForecastText.where(area) : placeName;
    }

    /** The area's limits in words: {@code 46°42'N to 47°42'N, 029°24'W to 030°48'W}. */
    public String limits() {
        return ForecastText.where(area);
    }

    /** The word that always stands beside the number: possible, even chance, probable, very probable. */
    public String probabilityWord() {
        return probabilityPercent >= 90 ? "very probable" : probabilityPercent >= 70 ? "probable" : probabilityPercent >= 40 ? "even chance" : "possible";
    }
}
