package org.shearbook.desk.forecast;

import java.time.Instant;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * What a forecaster typed, kept as typed: a draft may be unfinished and may be wrong.
 *
 * @param version   counts the times it was saved
 * @param purpose   what filing it would make
 * @param basedOn   the issued version an amendment or correction starts from; null for a new forecast
 * @param fields    field name to text
 * @param prefilled field name to where its text came from, for the fields nobody has touched since
 * @param reason    why, for an amendment or correction; may still be empty
 */
public record ForecastDraft(ForecastId id, int version, Purpose purpose, @Nullable Integer basedOn, State state, String author,
        Map<String, String> fields, Map<String, String> prefilled, String reason, Instant recordedAt) {

    /** What a draft is to become. */
    public enum Purpose { NEW, AMENDMENT, CORRECTION }

    /** A draft is open until it is filed or discarded. */
    public enum State { OPEN, FILED, DISCARDED }

    public ForecastDraft {
        fields = Map.copyOf(fields);
        prefilled = Map.copyOf(prefilled);
    }
}
