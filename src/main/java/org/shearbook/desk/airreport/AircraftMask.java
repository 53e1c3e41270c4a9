package org.shearbook.desk.airreport;

import java.util.regex.Pattern;

/** Takes the identification of an aircraft out of texts that are shown or kept beside the report. */
final class AircraftMask {

    static final String MASK = "[aircraft]";

    private final Pattern identification;

    AircraftMask(String aircraft) {
        identification = aircraft.isBlank() ? null : Pattern.compile(Pattern.quote(aircraft.strip()), Pattern.CASE_INSENSITIVE);
    }

    String over(String text) {
        return identification == null ? text : identification.matcher(text).replaceAll(MASK);
    }
}
