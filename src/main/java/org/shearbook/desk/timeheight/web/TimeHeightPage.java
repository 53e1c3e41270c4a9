package org.shearbook.desk.timeheight.web;

import java.time.Instant;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.timeheight.TimeHeight;
import org.shearbook.desk.timeheight.TimeHeightDisplay;
import org.springframework.web.util.UriComponentsBuilder;

/**
 * What the page shows: the choices, the address the picture is drawn from, and the same numbers as tables.
 *
 * @param range       the range chosen; empty when the two moments were
 * @param address     of the answer the picture is drawn from
 * @param empty       whether there is neither a sounding nor a report
 * @param lastAddress of the display of the last sounding before; null when there is none
 * @param heights     rows of lowest Ri, the highest first, down to the lowest level anybody observed
 */
record TimeHeightPage(
        List<Station> stations, TimeHeight shown, String range, List<Integer> distances, String address, boolean empty,
        @Nullable String lastAddress, List<HeightRow> heights) {

    private static final DateTimeFormatter FIELD = DateTimeFormatter.ofPattern("yyyy-MM-dd'T'HH:mm'Z'", Locale.ROOT).withZone(ZoneOffset.UTC);
    private static final Map<String, String> WORDS = Map.of("NIL", "nil", "LGT", "light", "MOD", "moderate", "SEV", "severe", "EXTRM", "extreme",
            "MOD_OCNL_SEV", "moderate, occasionally severe");

    /**
     * Lowest Ri of each sounding within a thousand feet.
     *
     * @param base       flight level
     * @param richardson in the order of the soundings that were analysed; null where nothing was observed
     */
    record HeightRow(int base, List<@Nullable Double> richardson) {
    }

    static TimeHeightPage of(List<Station> stations, TimeHeight shown, @Nullable String range) {
        Instant last = shown.lastSoundingBefore();
        return new TimeHeightPage(stations, shown, range == null ? "" : range, TimeHeightDisplay.DISTANCES, address("/api/v1/time-height", shown),
                shown.columns().isEmpty() && shown.reports().isEmpty(), last == null ? null : UriComponentsBuilder.fromPath("/time-height")
                        .queryParam("station", shown.station().id()).queryParam("from", field(last.minusSeconds(6 * 3600)))
                        .queryParam("until", field(last.plusSeconds(18 * 3600))).queryParam("distanceNm", shown.distanceNm()).encode().toUriString(),
                heights(shown));
    }

    private static String address(String path, TimeHeight shown) {
        UriComponentsBuilder address = UriComponentsBuilder.fromPath(path).queryParam("station", shown.station().id())
                .queryParam("from", shown.from()).queryParam("until", shown.until()).queryParam("distanceNm", shown.distanceNm());
        if (shown.asKnownAt() != null) {
            address.queryParam("asKnownAt", shown.asKnownAt());
        }
        return address.encode().toUriString();
    }

    private static List<HeightRow> heights(TimeHeight shown) {
        List<TimeHeight.Column> analysed = analysed(shown);
        List<HeightRow> rows = new ArrayList<>();
        int most = analysed.stream().mapToInt(column -> column.lowestRichardsonPer1000Ft().size()).max().orElse(0);
        for (int k = most - 1; k >= 0; k--) {
            List<@Nullable Double> row = new ArrayList<>();
            for (TimeHeight.Column column : analysed) {
                row.add(k < column.lowestRichardsonPer1000Ft().size() ? column.lowestRichardsonPer1000Ft().get(k) : null);
            }
            rows.add(new HeightRow(10 * k, Collections.unmodifiableList(row)));
        }
        while (!rows.isEmpty() && rows.get(0).richardson().stream().allMatch(Objects::isNull)) {
            rows.remove(0);
        }
        return rows;
    }

    /** A moment as the fields want it. */
    static String field(Instant moment) {
        return FIELD.format(moment);
    }

    public String fromText() {
        return field(shown.from());
    }

    public String untilText() {
        return field(shown.until());
    }

    /** The soundings that were analysed: the columns of {@link #heights}. */
    public List<TimeHeight.Column> analysedColumns() {
        return analysed(shown);
    }

    private static List<TimeHeight.Column> analysed(TimeHeight shown) {
        return shown.columns().stream().filter(column -> column.levels() != null).toList();
    }

    /** The word of an intensity. */
    public String word(String intensity) {
        return WORDS.getOrDefault(intensity, intensity.toLowerCase(Locale.ROOT));
    }

    /** The symbol of an intensity in symbols.svg. */
    public String symbol(String intensity) {
        return intensity.equals("MOD_OCNL_SEV") ? "moderate" : word(intensity);
    }

    /** Whether the row holds a value below the critical 1/4, which the table sets bold. */
    public boolean isCritical(@Nullable Double richardson) {
        return richardson != null && richardson < 0.25;
    }
}
