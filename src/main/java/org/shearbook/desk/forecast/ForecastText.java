package org.shearbook.desk.forecast;

import java.time.Instant;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;

/**
 * The text of a forecast: labelled lines, so that it can't be taken for an official message. There is no group
 * order, no day-hour-minute pair and no end sign in it.
 */
final class ForecastText {

    private static final DateTimeFormatter DATE = DateTimeFormatter.ofPattern("d MMMM yyyy", Locale.ENGLISH).withZone(ZoneOffset.UTC);
    private static final DateTimeFormatter SHORT_DATE = DateTimeFormatter.ofPattern("d MMMM", Locale.ENGLISH).withZone(ZoneOffset.UTC);
    private static final DateTimeFormatter TIME = DateTimeFormatter.ofPattern("HHmm'Z'", Locale.ROOT).withZone(ZoneOffset.UTC);

    private final String desk;

    ForecastText(String desk) {
        this.desk = desk;
    }

    /** The text of a version that forecasts something. */
    String of(int number, int version, Forecast.State state, ForecastContent content) {
        StringBuilder text = new StringBuilder(head(number, version, state));
        line(text, "What", what(content));
        line(text, "Where", where(content));
        line(text, "Levels", levels(content));
        line(text, "When", when(content.validFrom(), content.validUntil()));
        line(text, "How sure", content.probabilityPercent() + " %, " + content.probabilityWord());
        line(text, "Moving", content.movement().words() + ", " + content.change().words());
        line(text, "Would change it", content.wouldChange());
        if (content.evidence().isEmpty()) {
            text.append("BASIS: FORECASTER JUDGEMENT\n");
        } else {
            line(text, "Basis", content.evidence().stream().map(Evidence::label).collect(Collectors.joining("; ")));
        }
        return text.append(foot()).toString();
    }

    /** The text that takes a forecast back. */
    String cancelling(int number, int version, ForecastContent content, Instant at, String reason) {
        StringBuilder text = new StringBuilder(head(number, version, Forecast.State.CANCELLED));
        line(text, "Cancelled", DATE.format(at) + ", " + TIME.format(at));
        line(text, "Reason", reason);
        line(text, "It said", what(content));
        line(text, "Where", where(content));
        line(text, "Levels", levels(content));
        line(text, "When", when(content.validFrom(), content.validUntil()));
        return text.append(foot()).toString();
    }

    private String head(int number, int version, Forecast.State state) {
        String act = state == Forecast.State.ISSUED ? "" : " (" + state.name().toLowerCase(Locale.ROOT) + ")";
        return "SHEAR-LAYER FORECAST %d · version %d%s · %s · ADVISORY, NOT A SIGMET\n".formatted(number, version, act, desk);
    }

    private String foot() {
        return "ADVISORY ONLY. Internal product of %s. Not for flight planning by itself.\n".formatted(desk);
    }

    private static void line(StringBuilder text, String label, String content) {
        text.append("%-17s%s\n".formatted(label, content));
    }

    private static String what(ForecastContent content) {
        String what = content.intensity().words() + " " + content.conditions().words();
        Instant reported = content.reportedAt();
        if (reported == null) {
            return what + "; forecast";
        }
        boolean sameDay = DATE.format(reported).equals(DATE.format(content.validFrom()));
        return what + "; reported " + (sameDay ? "" : SHORT_DATE.format(reported) + " ") + TIME.format(reported) + ", expected to continue";
    }

    private static String levels(ForecastContent content) {
        return "FL%03d to FL%03d".formatted(content.baseFlightLevel(), content.topFlightLevel());
    }

    static String when(Instant from, Instant until) {
        String start = DATE.format(from) + ", " + TIME.format(from);
        return start + " to " + (DATE.format(from).equals(DATE.format(until)) ? "" : DATE.format(until) + ", ") + TIME.format(until);
    }

    private static String where(ForecastContent content) {
        String place = content.placeName().isBlank() ? "" : content.placeName() + ", ";
        return place + where(content.area());
    }

    static String where(Area area) {
        if (area instanceof Area.Radius round) {
            String position = latitude(round.latitude()) + " " + longitude(round.longitude());
            return "within %d NM of %s".formatted(round.nauticalMiles(),
                    round.centre().isBlank() ? position : round.centre() + " (" + position + ")");
        }
        Area.Corners many = (Area.Corners) area;
        if (many.isBox()) {
            double south = many.corners().stream().mapToDouble(Area.Corner::latitude).min().orElseThrow();
            double north = many.corners().stream().mapToDouble(Area.Corner::latitude).max().orElseThrow();
            List<Double> sides = many.corners().stream().map(Area.Corner::longitude).distinct().toList();
            double one = sides.get(0);
            double other = sides.get(1);
            // The smaller figure first, as latitudes and longitudes are said; across Greenwich or the date line from west to east.
            boolean sameSign = one < 0 == other < 0;
            boolean oneFirst = sameSign ? Math.abs(one) < Math.abs(other) : Math.abs(one - other) > 180 == one > other;
            boolean southFirst = south >= 0 || north > 0;
            return "%s to %s, %s to %s".formatted(latitude(southFirst ? south : north), latitude(southFirst ? north : south),
                    longitude(oneFirst ? one : other), longitude(oneFirst ? other : one));
        }
        return "between " + many.corners().stream().map(corner -> latitude(corner.latitude()) + " " + longitude(corner.longitude()))
                .collect(Collectors.joining(", "));
    }

    private static String latitude(double degrees) {
        return degreesAndMinutes(degrees, "N", "S", 2);
    }

    private static String longitude(double degrees) {
        return degreesAndMinutes(degrees, "E", "W", 3);
    }

    private static String degreesAndMinutes(double degrees, String positive, String negative, int digits) {
        long minutes = Math.round(Math.abs(degrees) * 60);
        return ("%0" + digits + "d°%02d'%s").formatted(minutes / 60, minutes % 60, degrees < 0 ? negative : positive);
    }
}
