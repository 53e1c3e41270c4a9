package org.shearbook.desk.forecast;

import java.time.Duration;
import java.time.Instant;
import java.time.LocalTime;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/** Turns the typed fields of a draft into what a forecast says, and back. Says of each field it can't read what to do. */
public final class DraftFields {

    public static final String INTENSITY = "intensity";
    public static final String CONDITIONS = "conditions";
    public static final String REPORTED_AT = "reportedAt";
    public static final String PLACE_NAME = "placeName";
    public static final String AREA = "area";
    public static final String CENTRE = "centre";
    public static final String RADIUS = "radiusNm";
    public static final String CORNERS = "corners";
    public static final String BASE = "baseFlightLevel";
    public static final String TOP = "topFlightLevel";
    public static final String FROM = "validFrom";
    public static final String UNTIL = "validUntil";
    public static final String PROBABILITY = "probabilityPercent";
    public static final String TOWARD = "movingToward";
    public static final String SPEED = "movingKt";
    public static final String CHANGE = "change";
    public static final String EVIDENCE = "evidence";
    public static final String WOULD_CHANGE = "wouldChange";
    public static final String SECOND_LOOK = "secondLookBy";
    public static final String ALONE = "aloneReason";
    public static final String CONVECTIVE = "convective";

    /** Every field of a draft, in the order of the form. */
    public static final List<String> ALL = List.of(INTENSITY, CONDITIONS, CONVECTIVE, REPORTED_AT, PLACE_NAME, AREA, CENTRE, RADIUS, CORNERS,
            BASE, TOP, FROM, UNTIL, PROBABILITY, TOWARD, SPEED, CHANGE, EVIDENCE, WOULD_CHANGE, SECOND_LOOK, ALONE);

    static final int LONGEST_LINE = 300;
    static final int LONGEST_FIELD = 4000;

    private static final DateTimeFormatter MINUTE = DateTimeFormatter.ofPattern("yyyy-MM-dd'T'HH:mm'Z'", Locale.ROOT).withZone(ZoneOffset.UTC);
    private static final Pattern CLOCK = Pattern.compile("([01]\\d|2[0-3]):?([0-5]\\d)\\s*Z?");
    private static final Pattern LEVEL = Pattern.compile("(?:FL)?\\s*(\\d{1,3})", Pattern.CASE_INSENSITIVE);
    private static final Pattern NAME_AND_POSITION = Pattern.compile("(.+?)\\s+([NS]\\d{4}\\s?[EW]\\d{5})");
    private static final Pattern POSITION = Pattern.compile(
            "([NS])\\s?(\\d{2})[°\\s]?(\\d{2})?'?[\\s/,]*([EW])\\s?(\\d{3})[°\\s]?(\\d{2})?'?"
                    + "|(\\d{2})[°\\s]?(\\d{2})?'?\\s?([NS])[\\s/,]*(\\d{3})[°\\s]?(\\d{2})?'?\\s?([EW])", Pattern.CASE_INSENSITIVE);

    private final Map<String, String> fields;
    private final Instant now;
    private final Function<String, Optional<Place>> places;
    private final List<Refusal> refusals = new ArrayList<>();

    private DraftFields(Map<String, String> fields, Instant now, Function<String, Optional<Place>> places) {
        this.fields = fields;
        this.now = now;
        this.places = places;
    }

    /** A station or fix by the name it has at the desk. */
    record Place(String name, double latitude, double longitude) {
    }

    /**
     * What could be read.
     *
     * @param content  null where something could not
     * @param refusals what, and what to do
     */
    record Reading(@Nullable ForecastContent content, List<Refusal> refusals) {
    }

    /**
     * @param now    against which a time of day without a date is understood: the nearest such moment
     * @param places finds a station or fix by what was typed
     */
    static Reading read(Map<String, String> fields, Instant now, Function<String, Optional<Place>> places) {
        return new DraftFields(fields, now, places).read();
    }

    private Reading read() {
        Intensity intensity = choice(INTENSITY, Intensity.class, "Choose what you expect: MOD, MOD OCNL SEV or SEV.");
        Conditions conditions = choice(CONDITIONS, Conditions.class, "Choose clear air, cloud or both.");
        if (!text(CONVECTIVE).isEmpty()) {
            refuse(CONVECTIVE, "CONVECTIVE_CAUSE", "Turbulence of convective clouds is no shear-layer forecast.",
                    "Take the tick away if the layer is the cause; otherwise discard the draft.");
        }
        Instant reportedAt = text(REPORTED_AT).isEmpty() ? null : moment(REPORTED_AT, "the time of the report");
        String placeName = line(PLACE_NAME);
        Area area = area();
        Integer base = level(BASE, "base");
        Integer top = level(TOP, "top");
        Instant from = moment(FROM, "the start");
        Instant until = moment(UNTIL, "the end");
        Integer probability = number(PROBABILITY, "A probability", "Choose tens from 10 to 90.");
        Movement movement = movement();
        StrengthChange change = choice(CHANGE, StrengthChange.class, "Choose intensifying, weakening or no change.");
        List<Evidence> evidence = new ArrayList<>();
        for (String ticked : Evidence.lines(text(EVIDENCE))) {
            Evidence.read(ticked).ifPresentOrElse(evidence::add, () -> refuse(EVIDENCE, "EVIDENCE_NOT_READ",
                    "\"%s\" is no layer, report or sounding.".formatted(shortened(ticked)), "Tick the evidence from the list again."));
        }
        String wouldChange = line(WOULD_CHANGE);
        if (wouldChange.isEmpty()) {
            refuse(WOULD_CHANGE, "WOULD_CHANGE_MISSING", "What would change this forecast is not said.",
                    "Write one line, for example: cancel if Ri is 0.5 or more at 1800Z and no yes-report in 90 min.");
        }
        String secondLook = line(SECOND_LOOK);
        String alone = line(ALONE);
        if (!refusals.isEmpty()) {
            return new Reading(null, refusals);
        }
        return new Reading(new ForecastContent(intensity, conditions, reportedAt, placeName, area, base, top, from, until, probability, movement,
                change, evidence, wouldChange, secondLook.isEmpty() ? null : secondLook, alone.isEmpty() ? null : alone), List.of());
    }

    /** The fields that read back to this content. */
    public static Map<String, String> of(ForecastContent content) {
        Map<String, String> fields = new LinkedHashMap<>();
        fields.put(INTENSITY, content.intensity().name());
        fields.put(CONDITIONS, content.conditions().name());
        fields.put(REPORTED_AT, content.reportedAt() == null ? "" : minute(content.reportedAt()));
        fields.put(PLACE_NAME, content.placeName());
        if (content.area() instanceof Area.Radius round) {
            fields.put(AREA, "RADIUS");
            fields.put(CENTRE, round.centre().isBlank() ? position(round.latitude(), round.longitude())
                    : round.centre() + " " + position(round.latitude(), round.longitude()));
            fields.put(RADIUS, Integer.toString(round.nauticalMiles()));
        } else if (content.area() instanceof Area.Corners many) {
            fields.put(AREA, "CORNERS");
            fields.put(CORNERS, many.corners().stream().map(corner -> position(corner.latitude(), corner.longitude())).collect(Collectors.joining("\n")));
        }
        fields.put(BASE, "%03d".formatted(content.baseFlightLevel()));
        fields.put(TOP, "%03d".formatted(content.topFlightLevel()));
        fields.put(FROM, minute(content.validFrom()));
        fields.put(UNTIL, minute(content.validUntil()));
        fields.put(PROBABILITY, Integer.toString(content.probabilityPercent()));
        fields.put(TOWARD, content.movement().toward());
        fields.put(SPEED, content.movement().isStationary() ? "" : Integer.toString(content.movement().speed()));
        fields.put(CHANGE, content.change().name());
        fields.put(EVIDENCE, content.evidence().stream().map(Evidence::ticked).collect(Collectors.joining("\n")));
        fields.put(WOULD_CHANGE, content.wouldChange());
        fields.put(SECOND_LOOK, content.secondLookBy() == null ? "" : content.secondLookBy());
        fields.put(ALONE, content.aloneReason() == null ? "" : content.aloneReason());
        return fields;
    }

    /**
     * The fields as they are kept: known names only, times of day with their date, so that a draft opened tomorrow
     * does not mean another day.
     *
     * @throws ForecastRefused when a field is longer than any that makes sense
     */
    static Map<String, String> kept(Map<String, String> typed, Instant now) {
        Map<String, String> fields = new LinkedHashMap<>();
        List<Refusal> tooLong = new ArrayList<>();
        for (String name : ALL) {
            String text = typed.getOrDefault(name, "").strip();
            if (text.length() > LONGEST_FIELD) {
                tooLong.add(new Refusal(name, "TOO_LONG", "%,d characters are too many; a field keeps %,d.".formatted(text.length(), LONGEST_FIELD),
                        "Shorten it; nothing was saved yet."));
                continue;
            }
            if (List.of(FROM, UNTIL, REPORTED_AT).contains(name)) {
                text = readMoment(text, now).map(DraftFields::minute).orElse(text);
            }
            if (!text.isEmpty()) {
                fields.put(name, text);
            }
        }
        if (!tooLong.isEmpty()) {
            throw new ForecastRefused(tooLong);
        }
        return fields;
    }

    /** A moment of a form: {@code 1150Z}, the nearest such moment, or {@code 2031-03-12T11:50Z}. */
    static Optional<Instant> readMoment(String text, Instant now) {
        Matcher clock = CLOCK.matcher(text.strip().toUpperCase(Locale.ROOT));
        if (clock.matches()) {
            Instant today = now.atZone(ZoneOffset.UTC).toLocalDate()
                    .atTime(LocalTime.of(Integer.parseInt(clock.group(1)), Integer.parseInt(clock.group(2)))).toInstant(ZoneOffset.UTC);
            Duration ahead = Duration.between(now, today);
            if (ahead.compareTo(Duration.ofHours(12)) > 0) {
                return Optional.of(today.minus(Duration.ofDays(1)));
            }
            return Optional.of(ahead.compareTo(Duration.ofHours(-12)) <= 0 ? today.plus(Duration.ofDays(1)) : today);
        }
        try {
            return Optional.of(OffsetDateTime.parse(text.strip()).toInstant());
        } catch (DateTimeParseException e) {
            return Optional.empty();
        }
    }

    /** {@code 2031-03-12T11:50Z}. */
    public static String minute(Instant moment) {
        return MINUTE.format(moment);
    }

    /** {@code N4712 W03000}. */
    public static String position(double latitude, double longitude) {
        return degreesMinutes(latitude, "N", "S", 2) + " " + degreesMinutes(longitude, "E", "W", 3);
    }

    private static String degreesMinutes(double degrees, String positive, String negative, int digits) {
        long minutes = Math.round(Math.abs(degrees) * 60);
        return (degrees < 0 ? negative : positive) + ("%0" + digits + "d%02d").formatted(minutes / 60, minutes % 60);
    }

    private static Optional<Area.Corner> readPosition(String text) {
        Matcher parts = POSITION.matcher(text.strip());
        if (!parts.matches()) {
            return Optional.empty();
        }
        boolean letterFirst = parts.group(1) != null;
        Double latitude = degrees(parts.group(letterFirst ? 2 : 7), parts.group(letterFirst ? 3 : 8), parts.group(letterFirst ? 1 : 9), 90);
        Double longitude = degrees(parts.group(letterFirst ? 5 : 10), parts.group(letterFirst ? 6 : 11), parts.group(letterFirst ? 4 : 12), 180);
        return latitude == null || longitude == null ? Optional.empty() : Optional.of(new Area.Corner(latitude, longitude));
    }

    private static @Nullable Double degrees(String whole, @Nullable String minutes, String letter, int most) {
        int minute = minutes == null ? 0 : Integer.parseInt(minutes);
        double degrees = (Integer.parseInt(whole) * 60 + minute) / 60.0;
        if (minute > 59 || degrees > most) {
            return null;
        }
        boolean negative = letter.equalsIgnoreCase("S") || letter.equalsIgnoreCase("W");
        return negative && degrees != 0 ? -degrees : degrees;
    }

    private @Nullable Area area() {
        return switch (text(AREA)) {
            case "RADIUS" -> radius();
            case "CORNERS" -> corners();
            default -> {
                refuse(AREA, "AREA_MISSING", "The area is not given.", "Choose a radius around a place, or corner points.");
                yield null;
            }
        };
    }

    private @Nullable Area radius() {
        Integer miles = number(RADIUS, "The radius", "Give whole nautical miles from 5 to 300.");
        String centre = line(CENTRE);
        if (centre.isEmpty()) {
            refuse(CENTRE, "CENTRE_MISSING", "The middle of the radius is not given.", "Give a station, a fix or a position such as N4712 W03000.");
            return null;
        }
        Optional<Place> place = readPosition(centre).map(position -> new Place("", position.latitude(), position.longitude()));
        if (place.isEmpty()) {
            // "Kelbrith N4712 W03000": a name with its position, as an earlier version wrote it
            Matcher parts = NAME_AND_POSITION.matcher(centre);
            place = parts.matches() ? readPosition(parts.group(2)).map(position -> new Place(parts.group(1), position.latitude(), position.longitude()))
                    : places.apply(centre);
        }
        if (place.isEmpty()) {
            refuse(CENTRE, "CENTRE_NOT_KNOWN", "\"%s\" is no known station, no position, and not the name of exactly one fix.".formatted(shortened(centre)),
                    "Write a position as N4712 W03000, or the station's identifier as the page Stations and Fixes shows it.");
        }
        if (place.isEmpty() || miles == null) {
            return null;
        }
        return new Area.Radius(place.get().name(), minute(place.get().latitude()), minute(place.get().longitude()), miles);
    }

    private static double minute(double degrees) {
        return Math.round(degrees * 60) / 60.0;
    }

    private @Nullable Area corners() {
        List<Area.Corner> corners = new ArrayList<>();
        for (String line : text(CORNERS).split("[\\n;]")) {
            if (line.isBlank()) {
                continue;
            }
            Optional<Area.Corner> corner = readPosition(line);
            if (corner.isEmpty()) {
                refuse(CORNERS, "CORNER_NOT_READ", "Corner point \"%s\" can't be read.".formatted(shortened(line.strip())),
                        "Write one position a line, in degrees and whole minutes: N4712 W03000.");
                return null;
            }
            corners.add(corner.get());
        }
        if (corners.size() < 3 || corners.size() > 12) {
            refuse(CORNERS, "CORNER_COUNT", "An area needs 3 to 12 corner points; there are %d.".formatted(corners.size()),
                    "Write one position a line, in order along the edge.");
            return null;
        }
        return new Area.Corners(corners);
    }

    private @Nullable Movement movement() {
        String toward = text(TOWARD);
        if (toward.equals(Movement.STATIONARY)) {
            return Movement.stationary();
        }
        if (!Movement.POINTS.contains(toward)) {
            refuse(TOWARD, "MOVEMENT_MISSING", "Where the area moves is not said.", "Choose a direction, or stationary.");
            return null;
        }
        Integer speed = number(SPEED, "The speed", "Give knots in steps of 5, from 5 to 150.");
        return speed == null ? null : new Movement(toward, speed);
    }

    private @Nullable Integer level(String field, String name) {
        Matcher level = LEVEL.matcher(text(field));
        if (!level.matches()) {
            refuse(field, "LEVEL_NOT_READ", text(field).isEmpty() ? "The %s is not given.".formatted(name)
                    : "The %s \"%s\" is no flight level.".formatted(name, shortened(text(field))), "Give a flight level in steps of 10, for example 270.");
            return null;
        }
        return Integer.parseInt(level.group(1));
    }

    private @Nullable Integer number(String field, String name, String remedy) {
        String text = text(field);
        if (!text.matches("\\d{1,4}")) {
            refuse(field, "NUMBER_NOT_READ", text.isEmpty() ? name + " is not given." : "%s \"%s\" is no whole number.".formatted(name, shortened(text)), remedy);
            return null;
        }
        return Integer.parseInt(text);
    }

    private @Nullable Instant moment(String field, String name) {
        Optional<Instant> moment = readMoment(text(field), now);
        if (moment.isEmpty()) {
            refuse(field, "TIME_NOT_READ", text(field).isEmpty() ? "For " + name + " no time is given."
                    : "For %s \"%s\" is no time.".formatted(name, shortened(text(field))), "Write 1150Z, or with the date 2031-03-12T11:50Z, in UTC.");
        }
        return moment.orElse(null);
    }

    private <E extends Enum<E>> @Nullable E choice(String field, Class<E> type, String remedy) {
        for (E constant : type.getEnumConstants()) {
            if (constant.name().equals(text(field))) {
                return constant;
            }
        }
        refuse(field, "CHOICE_MISSING", text(field).isEmpty() ? "Nothing is chosen here." : "\"%s\" is none of the choices.".formatted(shortened(text(field))), remedy);
        return null;
    }

    /** A text of one line that goes into the product: nothing in it may break the text or look like an official message. */
    private String line(String field) {
        String text = text(field);
        if (text.length() > LONGEST_LINE) {
            refuse(field, "TOO_LONG", "%,d characters are too many for one line; %d fit.".formatted(text.length(), LONGEST_LINE), "Shorten it.");
        }
        if (text.codePoints().anyMatch(c -> Character.isISOControl(c) || c >= 0x202A && c <= 0x202E || c >= 0x2066 && c <= 0x2069
                || Character.getType(c) == Character.LINE_SEPARATOR || Character.getType(c) == Character.PARAGRAPH_SEPARATOR
                || Character.getType(c) == Character.SURROGATE)) {
            refuse(field, "LINE_BROKEN", "There is a line break or a control character in it.", "Write it in one plain line.");
        }
        looksOfficial(text).ifPresent(what -> refuse(field, "LOOKS_OFFICIAL", "It contains %s, which could be taken for part of an official message.".formatted(what),
                "Say it in plain words, times as 1150Z."));
        return text;
    }

    /** What in a text belongs to official messages: a pair of day-hour-minute groups, or the end sign. */
    static Optional<String> looksOfficial(String text) {
        if (Pattern.compile("\\b\\d{6}\\s?/\\s?\\d{6}\\b").matcher(text).find()) {
            return Optional.of("a pair of day and time groups");
        }
        return text.endsWith("=") ? Optional.of("an end sign") : Optional.empty();
    }

    private String text(String field) {
        return fields.getOrDefault(field, "").strip();
    }

    private static String shortened(String text) {
        return text.length() <= 40 ? text : text.substring(0, text.offsetByCodePoints(0, Math.min(39, text.codePointCount(0, text.length())))) + "…";
    }

    private void refuse(String field, String code, String reason, String remedy) {
        refusals.add(new Refusal(field, code, reason, remedy));
    }
}
