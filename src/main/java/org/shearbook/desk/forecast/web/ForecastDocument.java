package org.shearbook.desk.forecast.web;

import java.time.Instant;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.forecast.Area;
import org.shearbook.desk.forecast.Evidence;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.forecast.ForecastContent;
import org.shearbook.desk.forecast.Refusal;

/** One issued version, as a script gets it. */
record ForecastDocument(long id, int number, String name, int version, String state, String standing, boolean advisory,
        String intensity, String conditions, @Nullable Instant reportedAt, String placeName, AreaDocument area, int baseFlightLevel, int topFlightLevel,
        Instant validFrom, Instant validUntil, int probabilityPercent, String probabilityWord, String movingToward, int movingKt, String change,
        List<EvidenceDocument> evidence, String wouldChange, @Nullable String secondLookBy, @Nullable String aloneReason,
        String text, String author, @Nullable String reason, Instant issuedAt, Instant recordedAt) {

    record AreaDocument(String kind, @Nullable String centre, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg, @Nullable Integer radiusNm,
            @Nullable List<CornerDocument> corners) {

        static AreaDocument of(Area area) {
            if (area instanceof Area.Radius round) {
                return new AreaDocument("radius", round.centre(), round.latitude(), round.longitude(), round.nauticalMiles(), null);
            }
            return new AreaDocument("corners", null, null, null, null, ((Area.Corners) area).corners().stream()
                    .map(corner -> new CornerDocument(corner.latitude(), corner.longitude())).toList());
        }
    }

    record CornerDocument(double latitudeDeg, double longitudeDeg) {
    }

    record EvidenceDocument(String kind, long id, String label) {

        static EvidenceDocument of(Evidence evidence) {
            return new EvidenceDocument(evidence.kind().name(), evidence.id(), evidence.label());
        }
    }

    static ForecastDocument of(Forecast forecast, Instant now) {
        ForecastContent content = forecast.content();
        return new ForecastDocument(forecast.id().value(), forecast.number(), forecast.name(), forecast.version(), forecast.state().name(),
                forecast.standing(now).name(), true, content.intensity().name(), content.conditions().name(), content.reportedAt(), content.placeName(),
                AreaDocument.of(content.area()), content.baseFlightLevel(), content.topFlightLevel(), content.validFrom(), content.validUntil(),
                content.probabilityPercent(), content.probabilityWord(), content.movement().toward(), content.movement().speed(), content.change().name(),
                content.evidence().stream().map(EvidenceDocument::of).toList(), content.wouldChange(), content.secondLookBy(), content.aloneReason(),
                forecast.text(), forecast.author(), forecast.reason(), forecast.issuedAt(), forecast.recordedAt());
    }

    /** A draft: what was typed, what keeps it from being filed, and how it would read. */
    record DraftDocument(long id, int draftVersion, String state, String purpose, @Nullable Integer basedOn, String author, Map<String, String> fields,
            List<RefusalDocument> refusals, @Nullable String text, Instant recordedAt) {

        static DraftDocument of(ForecastBook.Check check) {
            return new DraftDocument(check.draft().id().value(), check.draft().version(), "DRAFT", check.draft().purpose().name().toLowerCase(Locale.ROOT),
                    check.draft().basedOn(), check.draft().author(), check.draft().fields(), check.refusals().stream().map(RefusalDocument::of).toList(),
                    check.text(), check.draft().recordedAt());
        }
    }

    record RefusalDocument(String field, String code, String reason, String remedy) {

        static RefusalDocument of(Refusal refusal) {
            return new RefusalDocument(refusal.field(), refusal.code(), refusal.reason(), refusal.remedy());
        }
    }

    /** @param next number to give as {@code after} for the next page; null when this is the last */
    record Page(List<ForecastDocument> forecasts, @Nullable Integer next) {
    }
}
