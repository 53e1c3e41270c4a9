package org.shearbook.desk.forecast;

import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Something a forecaster ticked as a reason for the forecast.
 *
 * @param kind  which room keeps it
 * @param id    its identifier there
 * @param label how it was called when it was ticked: {@code Kelbrith 1200Z layer A, Ri 0.17 at FL291}
 */
public record Evidence(Kind kind, long id, String label) {

    /** The rooms evidence comes from. */
    public enum Kind { LAYER, AIR_REPORT, SOUNDING }

    private static final Pattern TICKED = Pattern.compile("(LAYER|AIR_REPORT|SOUNDING) (\\d{1,18}) (.{1,200})");

    /** As it stands in a form. */
    public String ticked() {
        return kind + " " + id + " " + label;
    }

    /** What identifies it: {@code LAYER 41}. */
    public String reference() {
        return kind + " " + id;
    }

    /** Reads what {@link #ticked()} wrote. */
    public static Optional<Evidence> read(String ticked) {
        Matcher parts = TICKED.matcher(ticked.strip());
        return parts.matches() ? Optional.of(new Evidence(Kind.valueOf(parts.group(1)), Long.parseLong(parts.group(2)), parts.group(3)))
                : Optional.empty();
    }

    /** The lines of a form's field. */
    public static List<String> lines(String field) {
        return field.lines().map(String::strip).filter(line -> !line.isEmpty()).toList();
    }
}
