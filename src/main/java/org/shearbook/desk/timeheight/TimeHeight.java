package org.shearbook.desk.timeheight;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What the time–height display of one station draws, and what {@code GET /api/v1/time-height} answers: names carry
 * their units, null is missing and never 0.
 *
 * @param asKnownAt            the moment whose knowledge this is; null for now
 * @param windowM              full width at half maximum of the window behind every Ri, shear and N² [m]
 * @param distanceNm           reports and forecasts farther from the station are not drawn
 * @param hiddenByDistance     how many reports that left out, of those within the widest distance offered
 * @param withoutLevel         how many reports within the distance do not say how high, and cannot be drawn
 * @param columns              soundings whose column meets the time shown, in the order of their release
 * @param boxes                every version of every forecast that meets time and distance
 * @param reports              in the order of their observation
 * @param lastSoundingBefore   nominal hour of the newest sounding before the time shown; null when there is none
 */
public record TimeHeight(
        Place station, Instant from, Instant until, @Nullable Instant asKnownAt, double windowM, int distanceNm, int hiddenByDistance,
        int withoutLevel, List<Column> columns, List<Box> boxes, List<Report> reports, @Nullable Instant lastSoundingBefore) {

    public TimeHeight {
        columns = List.copyOf(columns);
        boxes = List.copyOf(boxes);
        reports = List.copyOf(reports);
    }

    /** A launch site. */
    public record Place(String id, String name, double latitudeDeg, double longitudeDeg, @Nullable Double elevationM) {
    }

    /**
     * One sounding.
     *
     * @param nominalAt     the hour it stands for; the release where that is unknown
     * @param launchedAt    the release; 45 minutes before the nominal hour where it is unknown
     * @param carriedUntil  when it no longer says anything of the air
     * @param notAnalysed   why there are no levels, in words; null when there are
     * @param levels        null when it was not analysed
     * @param maxWindAtTopOfData whether the highest wind was at the top of what was observed, so that more may lie above
     * @param lowestRichardsonPer1000Ft the lowest Ri between flight level 10 k and 10 (k + 1) at index k; null where
     *                      nothing was observed
     * @param coarserSoundingIds the same ascent in other formats, not drawn because they hold fewer levels
     */
    public record Column(
            long soundingId, int version, Instant nominalAt, Instant launchedAt, Instant carriedUntil, @Nullable String notAnalysed,
            @Nullable Levels levels, @Nullable Double tropopauseFlightLevel, @Nullable Double maxWindKt, @Nullable Double maxWindFlightLevel,
            boolean maxWindAtTopOfData, List<@Nullable Double> lowestRichardsonPer1000Ft, List<Long> coarserSoundingIds) {
    }

    /**
     * The levels a picture needs (see {@code LevelThinning}), as arrays of one length, flight level strictly rising.
     *
     * @param minute when the balloon was there, in minutes since 1970-01-01T00:00Z
     */
    public record Levels(
            List<Double> heightM, List<Double> flightLevel, List<Double> minute, List<@Nullable Double> richardson,
            List<@Nullable Double> shearKtPer1000Ft, List<@Nullable Double> n2PerS2) {
    }

    /**
     * One version of a forecast.
     *
     * @param label      {@code SLF 02}
     * @param superseded whether a newer version is known
     * @param filedAt    when this version was filed
     * @param replacedAt when the next version was filed, which ended this one; null for the newest
     * @param intensity  {@code MOD}, {@code MOD_OCNL_SEV} or {@code SEV}
     */
    public record Box(
            long forecastId, int number, int version, String label, String state, boolean superseded, boolean cancelled, Instant filedAt, @Nullable Instant replacedAt, String intensity,
            int probabilityPercent, Instant validFrom, Instant validUntil, int baseFlightLevel, int topFlightLevel) {
    }

    /**
     * One report of turbulence, nil included.
     *
     * @param label           the sender's number, or ours
     * @param intensity       {@code NIL}, {@code LGT}, {@code MOD}, {@code SEV} or {@code EXTRM}
     * @param edrPeak         ε^⅓ [m^⅔ s⁻¹]
     * @param inCloud         null when the report does not say
     * @param bearingDeg      from the station to the report, clockwise from true north
     * @param insideForecasts the versions in force at the time that cover it, for example {@code SLF 02 v2}
     * @param excluded        left out of scoring by the cause a person gave it
     */
    public record Report(
            long reportId, int version, String label, Instant observedAt, double flightLevel, String intensity, @Nullable Double edrPeak,
            String reportClass, boolean automated, @Nullable Boolean inCloud, double distanceNm, double bearingDeg,
            List<String> insideForecasts, boolean excluded) {
    }
}
