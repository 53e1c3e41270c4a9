package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BiConsumer;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedAirReport.Place;
import org.shearbook.met.decode.FixLookup.Fix;
import org.shearbook.met.profile.GreatCircle;
import org.shearbook.met.profile.Units;

/**
 * The place of a pilot report: coordinates, an identifier, a fix with radial and distance, a segment, a distance and
 * a direction. Radials are magnetic and are turned by the variation of their fix; compass words are taken as true.
 * Places that can't be found are not guessed: a phrase or an identifier nobody knows stands at the leading station
 * and says so, and a fix too far from it stands nowhere.
 */
final class PlaceGroup {

    /** A longer text is no place. */
    private static final int LONGEST = 80;

    /** No navigation aid is used beyond this; a larger distance is a slip of the key [NM]. */
    private static final double FARTHEST_RADIAL = 300.0;

    private static final int MOST_LEGS = 12;

    private static final Pattern BLANKS = Pattern.compile(" {2,}");
    private static final Pattern WORD = Pattern.compile("[A-Z]+");
    private static final Pattern DASH = Pattern.compile(" ?- ?");
    private static final List<String> PREFACES = List.of("/", "OV ", "OV/", "OVR ", "OVER ", "O/", "VCNTY ", "VC ", "NEAR ", "AT ");
    private static final Pattern IDENTIFIER = Pattern.compile("[A-Z0-9]{2,5}");
    private static final Pattern GLUED_RADIAL = Pattern.compile("[A-Z0-9]{7,12}");
    private static final Pattern SPACED_RADIAL =
            Pattern.compile("([A-Z0-9]{2,5})[ .]{0,3}(\\d{3})R? ?[/@ ] ?@?(\\d{1,3})(?: ?(?:DME|NM))?");
    private static final Pattern RADIAL_AFTER_BLANK = Pattern.compile("([A-Z0-9]{2,5})[ .]{1,3}(\\d{3})(\\d{2,3})");
    private static final Pattern BARE_RADIAL = Pattern.compile("(\\d{3})[/@ ]?(\\d{2,3})");
    private static final String COMPASS = "NORTH[ /]NORTH ?EAST|NORTH[ /]NORTH ?WEST|SOUTH[ /]SOUTH ?EAST|SOUTH[ /]SOUTH ?WEST|"
            + "NORTH ?EAST|NORTH ?WEST|SOUTH ?EAST|SOUTH ?WEST|NORTH|SOUTH|EAST|WEST|"
            + "NNE|ENE|ESE|SSE|SSW|WSW|WNW|NNW|NE|SE|SW|NW|N|E|S|W";
    private static final String DISTANCE = "(\\d{1,3}(?:\\.\\d)?|\\.\\d|\\d/\\d) ?(NM|MILES|MILE|MI|SM|M|N(?= [NESW]))?";
    private static final Pattern OFFSET = Pattern.compile(
            DISTANCE + " ?(" + COMPASS + ")\\.? ?(?:OF )?[- ]?(?:([A-Z0-9]{3,5})(?: (?:VOR|VORTAC|NDB|ARPT|AIRPORT|DURD|DURC))?)?");
    private static final Pattern OFFSET_BEHIND =
            Pattern.compile("([A-Z][A-Z0-9]{2,4}) " + DISTANCE + " ?(" + COMPASS + ")");

    private final FixChoice choice;
    private final BiConsumer<String, String> remark;
    private String text = "";
    private double variation = Double.NaN;

    /**
     * @param choice where identifiers lie, seen from the leading station
     * @param remark takes code and text of whatever was doubtful
     */
    PlaceGroup(FixChoice choice, BiConsumer<String, String> remark) {
        this.choice = choice;
        this.remark = remark;
    }

    /**
     * @param group of the report without its tag, in capitals and without control characters
     */
    Place read(String group) {
        text = group.strip();
        String place = withoutPreface(BLANKS.matcher(text).replaceAll(" "));
        if (place.length() > LONGEST) {
            remark.accept("PLACE_NOT_READ", "The place is longer than any place. Set it by hand from the text.");
            return unresolved(List.of());
        }
        if (place.isEmpty() || isPhase(place)) {
            return leadingStation("PLACE_MISSING", "The report gives no place of its own; the leading station stands for it.");
        }
        Coordinates coordinates = Coordinates.read(place, 0);
        if (coordinates != null) {
            return coordinates(coordinates);
        }
        if (namesRunway(place)) {
            return leadingStation("PLACE_IS_RUNWAY", "A runway or an approach is given as the place; the leading station stands for it.");
        }
        Matcher bare = BARE_RADIAL.matcher(place);
        if (bare.matches()) {
            return bareRadial(bare.group(1), bare.group(2));
        }
        Matcher offset = OFFSET.matcher(place);
        if (offset.matches()) {
            return offset(offset.group(1), offset.group(2), offset.group(3), offset.group(4));
        }
        Place single = fixOrRadial(place);
        if (single != null) {
            return single;
        }
        Matcher behind = OFFSET_BEHIND.matcher(place);
        if (behind.matches()) {
            return offset(behind.group(2), behind.group(3), behind.group(4), behind.group(1));
        }
        if (place.indexOf('-') > 0) {
            return segment(DASH.split(place, MOST_LEGS + 1));
        }
        if (IDENTIFIER.matcher(place).matches()) {
            return leadingStation("PLACE_UNKNOWN", "No fix or aerodrome " + place + " is known; the leading station stands for it. Load " + place
                    + " in Stations and Fixes or set the place by hand.");
        }
        String[] words = place.split(" ");
        if (words.length > 1 && words.length <= MOST_LEGS && allAreKnown(words)) {
            return segment(words);
        }
        return leadingStation("PLACE_NOT_READ", "The place could not be read; the leading station stands for it. Set it by hand if it matters.");
    }

    /** Variation at the fix that was used [degrees, east positive]; {@code NaN} when none was. */
    double variation() {
        return variation;
    }

    private static String withoutPreface(String place) {
        String rest = place;
        for (String preface : PREFACES) {
            if (rest.startsWith(preface)) {
                rest = rest.substring(preface.length()).strip();
            }
        }
        int end = rest.length();
        while (end > 0 && " .,:-/".indexOf(rest.charAt(end - 1)) >= 0) {
            end--;
        }
        return rest.substring(0, end);
    }

    private static boolean isPhase(String place) {
        return switch (place) {
            case "DURD", "DURC", "DURGD", "DURGC", "DRGC", "DRGD", "UNKN", "UNK", "DESCENT", "CLIMB" -> true;
            default -> false;
        };
    }

    private static boolean namesRunway(String place) {
        Matcher words = WORD.matcher(place);
        while (words.find()) {
            if (digitsFollow(place, words.end()) >= 5) {
                continue;
            }
            switch (words.group()) {
                case "RWY", "RY", "RUNWAY", "RWYS", "FINAL", "FNL", "FIN", "APCH", "APRCH", "APPROACH", "ARR", "ARRIVAL", "DEP",
                        "DEPT", "DEPARTURE", "DEPARTING", "ILS", "RNAV", "GPS", "PATTERN", "DOWNWIND", "BASE", "DURD", "DURC",
                        "FAP", "DRCLMB" -> {
                    return true;
                }
                default -> { }
            }
        }
        return false;
    }

    /** A radial and a distance behind the letters make them a fix, whatever they spell. */
    private static int digitsFollow(String place, int from) {
        int end = from;
        while (end < place.length() && place.charAt(end) >= '0' && place.charAt(end) <= '9') {
            end++;
        }
        return end - from;
    }

    private Place coordinates(Coordinates coordinates) {
        if (!coordinates.arePossible()) {
            remark.accept("COORDINATES_IMPOSSIBLE", "Latitude or longitude is outside its range. Set the place by hand.");
            return unresolved(List.of());
        }
        if (coordinates.wholeDegrees()) {
            remark.accept("PLACE_IN_WHOLE_DEGREES", "The place is given in whole degrees: it is good to half a degree.");
        }
        return new Place(text, coordinates.latitude(), coordinates.longitude(), "coordinates", List.of());
    }

    private Place unresolved(List<Fix> candidates) {
        return new Place(text, Double.NaN, Double.NaN, "", candidates);
    }

    private Place leadingStation(String code, String what) {
        Fix station = choice.leadingStation();
        if (station == null) {
            remark.accept(code, what + " That station is not known here: set the place by hand.");
            return unresolved(List.of());
        }
        remark.accept(code, what);
        return new Place(text, station.latitude(), station.longitude(), "leading station", List.of(station));
    }

    private @Nullable Place fixOrRadial(String place) {
        Matcher spaced = SPACED_RADIAL.matcher(place);
        if (spaced.matches()) {
            return radial(spaced.group(1), spaced.group(2), spaced.group(3));
        }
        Matcher afterBlank = RADIAL_AFTER_BLANK.matcher(place);
        if (afterBlank.matches()) {
            return radial(afterBlank.group(1), afterBlank.group(2), afterBlank.group(3));
        }
        if (GLUED_RADIAL.matcher(place).matches()) {
            String[] parts = gluedRadial(place);
            if (parts != null) {
                return radial(parts[0], parts[1], parts[2]);
            }
        }
        String identifier = place.endsWith(" VOR") || place.endsWith(" NDB") || place.endsWith(" VORTAC") || place.endsWith(" AIRPORT")
                || place.endsWith(" ARPT") ? place.substring(0, place.indexOf(' ')) : place;
        if (!IDENTIFIER.matcher(identifier).matches()) {
            return null;
        }
        List<Fix> candidates = choice.candidates(identifier, false);
        return candidates.isEmpty() ? null : fix(identifier, candidates, identifier.length() != 4);
    }

    /**
     * {@code ACT040035}, {@code CSN27010}, {@code P10135030}: identifiers may end in digits, so the split by which the
     * identifier is known goes before the usual one of six digits.
     */
    private String @Nullable [] gluedRadial(String place) {
        String[] usual = null;
        for (int digits : new int[] {6, 5, 7}) {
            int cut = place.length() - digits;
            if (cut < 2 || cut > 5 || !isNumber(place, cut)) {
                continue;
            }
            String[] parts = {place.substring(0, cut), place.substring(cut, cut + 3), place.substring(cut + 3)};
            if (!hasLetter(parts[0])) {
                continue;
            }
            boolean plausible = Integer.parseInt(parts[1]) <= 360;
            if (plausible && !choice.candidates(parts[0], true).isEmpty()) {
                return parts;
            }
            if (usual == null) {
                usual = parts;
            }
        }
        return usual;
    }

    private static boolean isNumber(String place, int from) {
        for (int index = from; index < place.length(); index++) {
            if (place.charAt(index) < '0' || place.charAt(index) > '9') {
                return false;
            }
        }
        return true;
    }

    private static boolean hasLetter(String identifier) {
        return identifier.chars().anyMatch(c -> c >= 'A' && c <= 'Z');
    }

    private Place fix(String identifier, List<Fix> candidates, boolean preferAids) {
        Fix fix = choice.choose(candidates, identifier, preferAids);
        if (fix == null) {
            return ambiguous(identifier, candidates);
        }
        if (isTooFar(fix)) {
            return tooFar(identifier, candidates);
        }
        variation = FixChoice.variation(fix, candidates);
        return new Place(text, fix.latitude(), fix.longitude(), "fix", candidates);
    }

    private Place ambiguous(String identifier, List<Fix> candidates) {
        remark.accept("IDENTIFIER_AMBIGUOUS", identifier + " is the name of " + candidates.size()
                + " places, and nothing in the report tells which. Choose one.");
        return unresolved(candidates);
    }

    private boolean isTooFar(Fix fix) {
        Fix station = choice.leadingStation();
        return station != null && FixChoice.distance(station, fix) > FixChoice.FARTHEST;
    }

    private Place tooFar(String identifier, List<Fix> candidates) {
        remark.accept("PLACE_FAR_FROM_STATION", identifier
                + " lies more than 500 km from the leading station: one of the two is wrong. Choose a place or set it by hand.");
        List<Fix> both = new ArrayList<>(candidates);
        Fix station = choice.leadingStation();
        if (station != null) {
            both.add(station);
        }
        return unresolved(both);
    }

    private Place radial(String identifier, String radial, String distance) {
        List<Fix> candidates = choice.candidates(identifier, true);
        if (candidates.isEmpty()) {
            return leadingStation("PLACE_UNKNOWN", "No fix " + identifier + " is known; the leading station stands for it. Load " + identifier
                    + " in Stations and Fixes or set the place by hand.");
        }
        Fix fix = choice.choose(candidates, identifier, true);
        if (fix == null) {
            return ambiguous(identifier, candidates);
        }
        if (isTooFar(fix)) {
            return tooFar(identifier, candidates);
        }
        return along(fix, candidates, Integer.parseInt(radial), Double.parseDouble(distance), "fix-radial-distance");
    }

    private Place bareRadial(String radial, String distance) {
        Fix station = choice.leadingStation();
        if (station == null) {
            remark.accept("PLACE_UNKNOWN", "A radial and a distance count from the leading station, and that is not known. Set the place by hand.");
            return unresolved(List.of());
        }
        remark.accept("RADIAL_FROM_STATION", "A radial and a distance without a fix are taken from the leading station.");
        return along(station, List.of(station), Integer.parseInt(radial), Double.parseDouble(distance), "radial and distance from the leading station");
    }

    private Place along(Fix fix, List<Fix> candidates, int radial, double miles, String how) {
        if (radial > 360) {
            remark.accept("RADIAL_OVER_360", "A radial of " + radial + "° does not exist. Set the place by hand.");
            return unresolved(List.of(fix));
        }
        variation = FixChoice.variation(fix, candidates);
        if (Double.isNaN(variation)) {
            variation = choice.variationNear(fix);
            if (!Double.isNaN(variation) && miles > 0.0) {
                remark.accept("VARIATION_OF_STATION", "The variation at " + fix.identifier() + " is not known; that of the leading station was used.");
            }
        }
        boolean known = !Double.isNaN(variation);
        if (!known && miles > 0.0) {
            remark.accept("VARIATION_UNKNOWN", "The radial is magnetic and the variation at " + fix.identifier()
                    + " is not known; it was taken as true. Load the fix with its variation.");
        }
        GreatCircle.Point point = GreatCircle.destination(
                fix.latitude(), fix.longitude(), radial + (known ? variation : 0.0), miles * Units.NAUTICAL_MILE);
        Fix station = choice.leadingStation();
        if (station != null && GreatCircle.distance(station.latitude(), station.longitude(), point.latitude(), point.longitude())
                > FixChoice.FARTHEST) {
            if (miles > FARTHEST_RADIAL) {
                remark.accept("PLACE_FAR_FROM_STATION", "The place lies more than 500 km from the leading station, and no radial is used out to "
                        + Math.round(miles) + " NM. Choose a place or set it by hand.");
                return unresolved(List.of(fix, new Fix(text, "COMPUTED", point.latitude(), point.longitude(), Double.NaN), station));
            }
            remark.accept("PLACE_FAR_FROM_STATION", "The place lies more than 500 km from the leading station. Check the distance.");
        }
        return new Place(text, point.latitude(), point.longitude(), how + (known ? " (magnetic)" : " (variation unknown)"), candidates);
    }

    private Place offset(String distance, @Nullable String unit, String direction, @Nullable String identifier) {
        double miles = distance.indexOf('/') > 0
                ? (distance.charAt(0) - '0') / (double) Math.max(1, distance.charAt(2) - '0') : Double.parseDouble(distance);
        double metres = miles * ("SM".equals(unit) ? 1609.344 : Units.NAUTICAL_MILE);
        List<Fix> candidates = List.of();
        Fix fix;
        if (identifier == null) {
            fix = choice.leadingStation();
        } else {
            candidates = choice.candidates(identifier, false);
            fix = choice.choose(candidates, identifier, identifier.length() != 4);
            if (fix == null && !candidates.isEmpty()) {
                return ambiguous(identifier, candidates);
            }
        }
        if (fix == null) {
            return leadingStation("PLACE_UNKNOWN", "The place from which distance and direction count is not known; the leading station stands for it.");
        }
        if (isTooFar(fix)) {
            return tooFar(fix.identifier(), candidates);
        }
        GreatCircle.Point point = GreatCircle.destination(fix.latitude(), fix.longitude(), compass(direction), metres);
        variation = FixChoice.variation(fix, candidates);
        return new Place(text, point.latitude(), point.longitude(),
                identifier == null ? "distance and direction from the leading station" : "distance and direction", candidates);
    }

    private static double compass(String direction) {
        String letters = direction.length() <= 3 ? direction : direction
                .replace("NORTH", "N").replace("SOUTH", "S").replace("EAST", "E").replace("WEST", "W").replace(" ", "").replace("/", "");
        List<String> points = List.of("N", "NNE", "NE", "ENE", "E", "ESE", "SE", "SSE", "S", "SSW", "SW", "WSW", "W", "WNW", "NW", "NNW");
        return Math.max(0, points.indexOf(letters)) * 22.5;
    }

    private boolean allAreKnown(String[] words) {
        for (String word : words) {
            if (word.length() < 3 || !IDENTIFIER.matcher(word).matches() || choice.candidates(word, true).isEmpty()) {
                return false;
            }
        }
        return true;
    }

    /** Half way along a chain of fixes, which is where an aircraft between them is least wrong. */
    private Place segment(String[] elements) {
        List<Fix> ends = new ArrayList<>();
        List<String> unknown = new ArrayList<>();
        for (String element : elements) {
            Fix end = element.isEmpty() || elements.length > MOST_LEGS ? null : segmentEnd(element.strip());
            if (end == null) {
                unknown.add(element);
            } else {
                ends.add(end);
            }
        }
        if (!unknown.isEmpty() || ends.size() < 2) {
            if (ends.isEmpty()) {
                return leadingStation("PLACE_UNKNOWN", "No fix of the segment is known; the leading station stands for it. Set the place by hand.");
            }
            remark.accept("PLACE_UNKNOWN", "Of the segment " + String.join(", ", unknown)
                    + " is not known. Load it in Stations and Fixes or set the place by hand.");
            return unresolved(ends);
        }
        double[] lengths = new double[ends.size() - 1];
        double total = 0.0;
        for (int leg = 0; leg < lengths.length; leg++) {
            lengths[leg] = FixChoice.distance(ends.get(leg), ends.get(leg + 1));
            total += lengths[leg];
        }
        double left = total / 2.0;
        int leg = 0;
        while (leg < lengths.length - 1 && left > lengths[leg]) {
            left -= lengths[leg++];
        }
        Fix from = ends.get(leg);
        Fix to = ends.get(leg + 1);
        GreatCircle.Point middle = GreatCircle.destination(from.latitude(), from.longitude(),
                GreatCircle.bearing(from.latitude(), from.longitude(), to.latitude(), to.longitude()), left);
        Fix station = choice.leadingStation();
        boolean far = station != null && ends.stream().allMatch(end -> FixChoice.distance(station, end) > FixChoice.FARTHEST);
        if (far) {
            return tooFar(text, ends);
        }
        remark.accept("MIDPOINT_ASSUMED", "The report gives a segment; its middle is assumed.");
        return new Place(text, middle.latitude(), middle.longitude(), "midpoint assumed", ends);
    }

    private @Nullable Fix segmentEnd(String element) {
        String identifier = element;
        String[] parts = GLUED_RADIAL.matcher(element).matches() ? gluedRadial(element) : null;
        Matcher spaced = RADIAL_AFTER_BLANK.matcher(element);
        if (spaced.matches()) {
            parts = new String[] {spaced.group(1), spaced.group(2), spaced.group(3)};
        }
        if (parts != null) {
            identifier = parts[0];
        }
        List<Fix> candidates = choice.candidates(identifier, true);
        Fix fix = choice.choose(candidates, identifier, true);
        if (fix == null || parts == null) {
            return fix;
        }
        int radial = Integer.parseInt(parts[1]);
        if (radial > 360) {
            return null;
        }
        double turn = FixChoice.variation(fix, candidates);
        GreatCircle.Point point = GreatCircle.destination(fix.latitude(), fix.longitude(),
                radial + (Double.isNaN(turn) ? 0.0 : turn), Double.parseDouble(parts[2]) * Units.NAUTICAL_MILE);
        return new Fix(element, "COMPUTED", point.latitude(), point.longitude(), turn);
    }
}
