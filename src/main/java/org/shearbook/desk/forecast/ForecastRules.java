package org.shearbook.desk.forecast;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** What an office lets be filed. Each refusal says why and what to do. */
final class ForecastRules {

    private final ForecastSettings settings;

    ForecastRules(ForecastSettings settings) {
        this.settings = settings;
    }

    /**
     * @param purpose  what filing would make
     * @param standing the version that stands now; null for a new forecast
     */
    List<Refusal> refusals(ForecastDraft.Purpose purpose, ForecastContent content, @Nullable Forecast standing, String author, Instant now) {
        List<Refusal> refusals = new ArrayList<>();
        levels(content, refusals);
        area(content.area(), refusals);
        if (purpose == ForecastDraft.Purpose.CORRECTION) {
            clockOfCorrection(content, standing, refusals);
        } else {
            validity(content, standing, now, refusals);
        }
        if (content.probabilityPercent() < 10 || content.probabilityPercent() > 90 || content.probabilityPercent() % 10 != 0) {
            refusals.add(new Refusal(DraftFields.PROBABILITY, "PROBABILITY_NOT_IN_TENS", "%d %% is not a step of the scale.".formatted(content.probabilityPercent()),
                    "Choose tens from 10 to 90."));
        }
        if (!content.movement().isStationary()
                && (content.movement().speed() < 5 || content.movement().speed() > 150 || content.movement().speed() % 5 != 0)) {
            refusals.add(new Refusal(DraftFields.SPEED, "SPEED_NOT_IN_STEPS", "%d kt is not a step of the scale.".formatted(content.movement().speed()),
                    "Give knots in steps of 5, from 5 to 150, or choose stationary."));
        }
        if (content.reportedAt() != null && content.reportedAt().isAfter(now)) {
            refusals.add(new Refusal(DraftFields.REPORTED_AT, "REPORTED_IN_FUTURE", "The report is later than now.",
                    "Check date and time; both are UTC."));
        }
        if (content.intensity() == Intensity.SEV) {
            secondLook(content, author, refusals);
        }
        return refusals;
    }

    private static void levels(ForecastContent content, List<Refusal> refusals) {
        level(DraftFields.BASE, "base", content.baseFlightLevel(), refusals);
        level(DraftFields.TOP, "top", content.topFlightLevel(), refusals);
        if (content.baseFlightLevel() >= content.topFlightLevel()) {
            refusals.add(new Refusal(DraftFields.BASE, "BASE_NOT_BELOW_TOP",
                    "Base FL%03d is not below top FL%03d.".formatted(content.baseFlightLevel(), content.topFlightLevel()), "Exchange them, or correct one."));
        }
    }

    private static void level(String field, String name, int level, List<Refusal> refusals) {
        if (level < 0 || level > 650 || level % 10 != 0) {
            refusals.add(new Refusal(field, "LEVEL_NOT_IN_TENS", "FL%03d is not a step of the scale for the %s.".formatted(level, name),
                    "Give flight levels from 000 to 650 in steps of 10: base downward, top upward."));
        }
    }

    private static void area(Area area, List<Refusal> refusals) {
        if (area instanceof Area.Radius round) {
            if (round.nauticalMiles() < 5 || round.nauticalMiles() > 300) {
                refusals.add(new Refusal(DraftFields.RADIUS, "RADIUS_OUT_OF_RANGE", "A radius of %d NM is not possible.".formatted(round.nauticalMiles()),
                        "Give whole nautical miles from 5 to 300."));
            }
            return;
        }
        Area.Corners many = (Area.Corners) area;
        if (Math.abs(many.longitudesGoneRound()) > 180) {
            refusals.add(new Refusal(DraftFields.CORNERS, "AREA_ROUND_POLE", "The corner points go round a pole.",
                    "Give such an area as a radius around a place."));
        } else if (many.crossesItself()) {
            refusals.add(new Refusal(DraftFields.CORNERS, "AREA_CROSSES_ITSELF", "The edge of the area crosses itself.",
                    "Give the corner points in order along the edge."));
        } else if (many.squareDegrees() < 1e-4) {
            refusals.add(new Refusal(DraftFields.CORNERS, "AREA_EMPTY", "The corner points enclose no area.", "Check that they don't lie on one line."));
        }
    }

    private void validity(ForecastContent content, @Nullable Forecast standing, Instant now, List<Refusal> refusals) {
        Instant from = content.validFrom();
        Instant until = content.validUntil();
        if (!until.isAfter(from)) {
            refusals.add(new Refusal(DraftFields.UNTIL, "END_NOT_AFTER_START", "The end is not after the start.", "Check both; a time of day alone means the nearest."));
            return;
        }
        if (!until.isAfter(now)) {
            refusals.add(new Refusal(DraftFields.UNTIL, "END_IN_PAST", "The validity is over already.", "Give an end later than now."));
            return;
        }
        boolean startStands = standing != null && from.equals(standing.content().validFrom());
        if (!startStands && from.isBefore(now.minus(settings.grace()))) {
            refusals.add(new Refusal(DraftFields.FROM, "START_IN_PAST", "The start is more than %d min in the past.".formatted(settings.grace().toMinutes()),
                    "Give a start from %s on.".formatted(DraftFields.minute(now.minus(settings.grace()).plusSeconds(59)))));
        }
        if (from.isAfter(now.plus(settings.farthest()))) {
            refusals.add(new Refusal(DraftFields.FROM, "START_TOO_FAR", "The start is more than %s ahead.".formatted(hours(settings.farthest())),
                    "Keep the draft and issue it later, or start earlier."));
        }
        // An amendment may leave the start where it was; what it answers for counts from now on.
        Instant counted = startStands && from.isBefore(now) ? now : from;
        if (Duration.between(counted, until).compareTo(settings.longest()) > 0) {
            refusals.add(new Refusal(DraftFields.UNTIL, "VALIDITY_TOO_LONG", "The validity is longer than %s.".formatted(hours(settings.longest())),
                    "End it by %s; extend later by an amendment.".formatted(DraftFields.minute(counted.plus(settings.longest())))));
        }
    }

    private static void clockOfCorrection(ForecastContent content, @Nullable Forecast standing, List<Refusal> refusals) {
        if (standing == null) {
            return;
        }
        if (!content.validFrom().equals(standing.content().validFrom())) {
            refusals.add(clockRefusal(DraftFields.FROM, "start", standing.content().validFrom()));
        }
        if (!content.validUntil().equals(standing.content().validUntil())) {
            refusals.add(clockRefusal(DraftFields.UNTIL, "end", standing.content().validUntil()));
        }
    }

    private static Refusal clockRefusal(String field, String name, Instant stands) {
        return new Refusal(field, "CLOCK_OF_CORRECTION", "A correction says what was meant; it does not move the %s.".formatted(name),
                "Leave it at %s, or amend instead.".formatted(DraftFields.minute(stands)));
    }

    private static void secondLook(ForecastContent content, String author, List<Refusal> refusals) {
        String looked = content.secondLookBy();
        String alone = content.aloneReason();
        if (looked == null && alone == null) {
            refusals.add(new Refusal(DraftFields.SECOND_LOOK, "SECOND_LOOK_MISSING", "A severe forecast needs a second look.",
                    "Name who looked at it, or say why you are alone."));
        } else if (looked != null && alone != null) {
            refusals.add(new Refusal(DraftFields.ALONE, "SECOND_LOOK_AND_ALONE", "Both a second look and a reason for being alone are given.", "Keep the one that is true."));
        } else if (looked != null && looked.equalsIgnoreCase(author)) {
            refusals.add(new Refusal(DraftFields.SECOND_LOOK, "SECOND_LOOK_OWN", "The author can't be the second look.", "Name another person, or say why you are alone."));
        } else if (alone != null && alone.length() < 5) {
            refusals.add(new Refusal(DraftFields.ALONE, "REASON_TOO_SHORT", "The reason for being alone says too little.", "Say in a few words why nobody could look."));
        }
    }

    /** A reason that is mandatory: said, in one line, and not shaped like an official message. */
    static List<Refusal> reason(String reason) {
        String said = reason.strip();
        if (said.length() < 5) {
            return List.of(new Refusal("reason", "REASON_MISSING", said.isEmpty() ? "No reason is given." : "The reason says too little.",
                    "Say in a few words what changed or what was wrong."));
        }
        if (said.length() > DraftFields.LONGEST_LINE || said.codePoints().anyMatch(Character::isISOControl)) {
            return List.of(new Refusal("reason", "TOO_LONG", "The reason does not fit one line of %d characters.".formatted(DraftFields.LONGEST_LINE), "Shorten it to one line."));
        }
        return DraftFields.looksOfficial(said).map(what -> List.of(new Refusal("reason", "LOOKS_OFFICIAL",
                "It contains %s, which could be taken for part of an official message.".formatted(what), "Say it in plain words."))).orElse(List.of());
    }

    private static String hours(Duration duration) {
        return duration.toMinutesPart() == 0 ? duration.toHours() + " h" : "%d h %02d min".formatted(duration.toHours(), duration.toMinutesPart());
    }
}
