package org.shearbook.desk.forecast;

import java.time.Duration;
import java.time.Instant;
import java.util.List;

/** Forecasts of an invented sea, for the tests of this room. */
public final class ForecastSamples {

    private ForecastSamples() {
    }

    /** Moderate, occasionally severe, in a box, from now on for three hours. */
    public static ForecastContent moderate(Instant from) {
        return new ForecastContent(Intensity.MOD_OCNL_SEV, Conditions.CLEAR_AIR, null, "Kelbrith",
                Area.box(46 + 42 / 60.0, 47 + 42 / 60.0, -(30 + 48 / 60.0), -(29 + 24 / 60.0)), 270, 310, from, from.plus(Duration.ofHours(3)),
                70, new Movement("E", 25), StrengthChange.NC, List.of(), "cancel if Ri is 0.5 or more at 1800Z and no yes-report in 90 min", null, null);
    }

    public static ForecastContent severe(Instant from, String secondLook, String alone) {
        ForecastContent moderate = moderate(from);
        return new ForecastContent(Intensity.SEV, moderate.conditions(), null, moderate.placeName(), moderate.area(), 270, 310, from,
                moderate.validUntil(), 80, moderate.movement(), moderate.change(), List.of(), moderate.wouldChange(), secondLook, alone);
    }

    public static ForecastContent withLevels(ForecastContent content, int base, int top) {
        return new ForecastContent(content.intensity(), content.conditions(), content.reportedAt(), content.placeName(), content.area(), base, top,
                content.validFrom(), content.validUntil(), content.probabilityPercent(), content.movement(), content.change(), content.evidence(),
                content.wouldChange(), content.secondLookBy(), content.aloneReason());
    }

    public static ForecastContent withArea(ForecastContent content, Area area) {
        return new ForecastContent(content.intensity(), content.conditions(), content.reportedAt(), content.placeName(), area, content.baseFlightLevel(),
                content.topFlightLevel(), content.validFrom(), content.validUntil(), content.probabilityPercent(), content.movement(), content.change(),
                content.evidence(), content.wouldChange(), content.secondLookBy(), content.aloneReason());
    }

    public static ForecastContent withTimes(ForecastContent content, Instant from, Instant until) {
        return new ForecastContent(content.intensity(), content.conditions(), content.reportedAt(), content.placeName(), content.area(),
                content.baseFlightLevel(), content.topFlightLevel(), from, until, content.probabilityPercent(), content.movement(), content.change(),
                content.evidence(), content.wouldChange(), content.secondLookBy(), content.aloneReason());
    }

    public static ForecastContent withEvidence(ForecastContent content, List<Evidence> evidence) {
        return new ForecastContent(content.intensity(), content.conditions(), content.reportedAt(), content.placeName(), content.area(),
                content.baseFlightLevel(), content.topFlightLevel(), content.validFrom(), content.validUntil(), content.probabilityPercent(),
                content.movement(), content.change(), evidence, content.wouldChange(), content.secondLookBy(), content.aloneReason());
    }
}
