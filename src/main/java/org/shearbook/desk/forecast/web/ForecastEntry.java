package org.shearbook.desk.forecast.web;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.forecast.DraftFields;
import org.shearbook.desk.forecast.Evidence;

/**
 * A forecast as a script sends it; the same names as in what it gets back. Positions are taken to the whole minute.
 *
 * @param reason why, for an amendment, a correction or a cancellation
 */
record ForecastEntry(@Nullable String intensity, @Nullable String conditions, @Nullable String reportedAt, @Nullable String placeName,
        @Nullable AreaEntry area, @Nullable Integer baseFlightLevel, @Nullable Integer topFlightLevel, @Nullable String validFrom, @Nullable String validUntil,
        @Nullable Integer probabilityPercent, @Nullable String movingToward, @Nullable Integer movingKt, @Nullable String change,
        @Nullable List<EvidenceEntry> evidence, @Nullable String wouldChange, @Nullable String secondLookBy, @Nullable String aloneReason,
        @Nullable String reason) {

    record AreaEntry(@Nullable String kind, @Nullable String centre, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg, @Nullable Integer radiusNm,
            @Nullable List<CornerEntry> corners) {
    }

    record CornerEntry(@Nullable Double latitudeDeg, @Nullable Double longitudeDeg) {
    }

    record EvidenceEntry(@Nullable String kind, long id) {
    }

    /** The fields as a form would have them. */
    Map<String, String> fields(Function<String, Optional<Evidence>> known) {
        Map<String, String> fields = new LinkedHashMap<>();
        put(fields, DraftFields.INTENSITY, intensity);
        put(fields, DraftFields.CONDITIONS, conditions);
        put(fields, DraftFields.REPORTED_AT, reportedAt);
        put(fields, DraftFields.PLACE_NAME, placeName);
        if (area != null) {
            put(fields, DraftFields.AREA, area.kind() == null ? null : area.kind().toUpperCase(java.util.Locale.ROOT));
            String position = position(area.latitudeDeg(), area.longitudeDeg());
            put(fields, DraftFields.CENTRE, position.isEmpty() ? area.centre() : area.centre() == null || area.centre().isBlank() ? position : area.centre() + " " + position);
            put(fields, DraftFields.RADIUS, area.radiusNm());
            put(fields, DraftFields.CORNERS, area.corners() == null ? null
                    : area.corners().stream().map(corner -> corner == null ? "missing" : position(corner.latitudeDeg(), corner.longitudeDeg())).collect(Collectors.joining("\n")));
        }
        put(fields, DraftFields.BASE, baseFlightLevel);
        put(fields, DraftFields.TOP, topFlightLevel);
        put(fields, DraftFields.FROM, validFrom);
        put(fields, DraftFields.UNTIL, validUntil);
        put(fields, DraftFields.PROBABILITY, probabilityPercent);
        put(fields, DraftFields.TOWARD, movingToward);
        put(fields, DraftFields.SPEED, movingKt == null || "STNR".equals(movingToward) ? null : movingKt);
        put(fields, DraftFields.CHANGE, change);
        put(fields, DraftFields.EVIDENCE, evidence == null ? null : evidence.stream().map(one -> one == null ? "missing" : one.kind() + " " + one.id())
                .map(reference -> known.apply(reference).map(Evidence::ticked).orElse(reference)).collect(Collectors.joining("\n")));
        put(fields, DraftFields.WOULD_CHANGE, wouldChange);
        put(fields, DraftFields.SECOND_LOOK, secondLookBy);
        put(fields, DraftFields.ALONE, aloneReason);
        return fields;
    }

    private static void put(Map<String, String> fields, String name, @Nullable Object content) {
        if (content != null) {
            fields.put(name, content.toString());
        }
    }

    private static String position(@Nullable Double latitude, @Nullable Double longitude) {
        return latitude == null || longitude == null || Math.abs(latitude) > 90 || Math.abs(longitude) > 180 ? "" : DraftFields.position(latitude, longitude);
    }
}
