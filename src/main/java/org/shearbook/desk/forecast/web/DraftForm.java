package org.shearbook.desk.forecast.web;

import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.forecast.Evidence;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastDraft;
import org.shearbook.desk.forecast.Refusal;

/**
 * The form of a draft.
 *
 * @param id        null while nothing was saved yet
 * @param seen      version of the draft the form shows; 0 for none
 * @param fields    text by field name
 * @param prefilled where the text of an untouched field came from
 * @param refusals  what keeps it from being filed; empty unless it was asked for
 * @param text      how it would read; null while it can't be read
 * @param standing  the version that stands, for an amendment or correction
 * @param offered   evidence to tick, and what was ticked before
 * @param ticked    what is ticked
 * @param conflict  the other saved version, where two people changed one draft
 */
record DraftForm(@Nullable Long id, int seen, ForecastDraft.Purpose purpose, @Nullable Integer basedOn, String reason, Map<String, String> fields,
        Map<String, String> prefilled, List<Refusal> refusals, @Nullable String text, @Nullable Forecast standing,
        List<Evidence> offered, List<String> ticked, @Nullable Conflict conflict) {

    /** What the other one saved, where it differs from what is typed here. */
    record Conflict(String author, java.time.Instant savedAt, List<Row> rows, @Nullable String theirText) {
    }

    /** One field that differs. */
    record Row(String field, String theirs, String mine) {
    }

    public String field(String name) {
        return fields.getOrDefault(name, "");
    }

    public boolean is(String name, String text) {
        return field(name).equals(text);
    }

    /** Where an untouched field's text came from; null when a person typed it. */
    public @Nullable String mark(String name) {
        return prefilled.get(name);
    }

    /** What is wrong with a field; empty when nothing is. */
    public String wrong(String name) {
        return refusals.stream().filter(refusal -> refusal.field().equals(name)).map(Refusal::text).collect(Collectors.joining(" "));
    }

    public boolean isWrong(String name) {
        return refusals.stream().anyMatch(refusal -> refusal.field().equals(name));
    }

    public boolean isNew() {
        return purpose == ForecastDraft.Purpose.NEW;
    }
}
