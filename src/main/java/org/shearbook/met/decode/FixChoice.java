package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.FixLookup.Fix;
import org.shearbook.met.profile.GreatCircle;

/**
 * Chooses among places of the same identifier the one that is meant: the nearest to the station that leads the
 * report. A quarter of all identifiers of navigation aids exist more than once in the world.
 */
final class FixChoice {

    /** A fix further than this from the leading station is not the one meant [m]. */
    static final double FARTHEST = 500_000.0;

    /** Places of one identifier nearer together than this are one place with several facilities [m]. */
    private static final double SAME_PLACE = 60_000.0;

    /** More places than this of one name are not weighed one by one. */
    private static final int MOST_CANDIDATES = 64;

    private final FixLookup fixes;
    private final String leading;
    private final List<Fix> leadingPlaces;

    /**
     * @param fixes   where identifiers lie
     * @param leading identifier of the leading station; empty when the report has none
     */
    FixChoice(FixLookup fixes, String leading) {
        this.fixes = fixes;
        this.leading = leading;
        this.leadingPlaces = leading.isEmpty() ? List.of() : likelyLeadingPlaces(leading);
    }

    /** The leading station; null when it is unknown or could be one of several. */
    @Nullable Fix leadingStation() {
        return leadingPlaces.isEmpty() || !liesTogether(leadingPlaces) ? null : leadingPlaces.get(0);
    }

    /**
     * A three-letter identifier in front of a report is that of a US aerodrome: where {@code K} and the three
     * letters is known it is that one, and a place of that name elsewhere in the world is not meant.
     */
    private List<Fix> likelyLeadingPlaces(String identifier) {
        if (identifier.length() == 3) {
            List<Fix> aerodrome = find("K" + identifier);
            if (!aerodrome.isEmpty()) {
                return aerodrome;
            }
            return american(candidates(identifier, false));
        }
        return candidates(identifier, false);
    }

    /** Those in the United States; among several the aids with a radial, which is what reports are made from. */
    private static List<Fix> american(List<Fix> places) {
        List<Fix> american = places.stream().filter(FixChoice::liesInUnitedStates).toList();
        if (american.isEmpty() || liesTogether(american)) {
            return american;
        }
        List<Fix> withRadial = american.stream().filter(fix -> rankAsAid(fix) == 0).toList();
        return withRadial.isEmpty() ? american : withRadial;
    }

    /** By boxes: the conterminous states, Alaska, Hawaii, Puerto Rico, the Marianas. */
    private static boolean liesInUnitedStates(Fix fix) {
        return liesIn(fix, 24.0, 49.5, -125.5, -66.0) || liesIn(fix, 51.0, 72.0, -180.0, -129.0) || liesIn(fix, 18.0, 23.0, -161.0, -154.0)
                || liesIn(fix, 17.0, 19.0, -68.0, -64.0) || liesIn(fix, 13.0, 21.0, 144.0, 147.0);
    }

    private static boolean liesIn(Fix fix, double south, double north, double west, double east) {
        return fix.latitude() >= south && fix.latitude() <= north && fix.longitude() >= west && fix.longitude() <= east;
    }

    private List<Fix> find(String identifier) {
        List<Fix> found = fixes.find(identifier);
        return found.size() > MOST_CANDIDATES ? found.subList(0, MOST_CANDIDATES) : found;
    }

    /**
     * Every place an identifier could mean.
     *
     * @param ofRadial it stands before a radial, so that a navigation aid is meant
     */
    List<Fix> candidates(String identifier, boolean ofRadial) {
        Set<Fix> found = new LinkedHashSet<>(find(identifier));
        boolean prefixed = identifier.length() == 4 && "KCP".indexOf(identifier.charAt(0)) >= 0;
        if (prefixed && (ofRadial || found.isEmpty())) {
            // KABI360025 is the aid ABI: the prefix belongs to the aerodrome
            List<Fix> aids = find(identifier.substring(1));
            boolean aerodromeKnown = !found.isEmpty();
            List<Fix> aerodrome = List.copyOf(found);
            for (Fix aid : aids) {
                if (!aerodromeKnown || aerodrome.stream().anyMatch(place -> distance(place, aid) < SAME_PLACE)) {
                    found.add(aid);
                }
            }
        }
        if (identifier.length() == 3) {
            // PIT is Pittsburgh to an American crew though the only aid of that name stands in Taiwan
            found.addAll(find("K" + identifier));
            if (found.isEmpty() && (identifier.charAt(0) == 'Y' || identifier.charAt(0) == 'Z')) {
                found.addAll(find("C" + identifier));
            }
        }
        return List.copyOf(found);
    }

    /**
     * The one meant among several places of one name; null when that can't be told.
     *
     * @param places      as {@link #candidates} gives them
     * @param identifier  their name
     * @param preferAids  a navigation aid goes before an aerodrome of the same name in the same place
     */
    @Nullable Fix choose(List<Fix> places, String identifier, boolean preferAids) {
        if (places.isEmpty()) {
            return null;
        }
        List<Fix> near = liesTogether(places) ? places : nearest(places, identifier);
        if (near.isEmpty()) {
            return null;
        }
        Comparator<Fix> order = preferAids
                ? Comparator.comparingInt(FixChoice::rankAsAid) : Comparator.comparingInt(FixChoice::rankAsAerodrome);
        return near.stream().min(order).orElseThrow();
    }

    /** Those of the places that lie together where the report comes from; empty when that can't be told. */
    private List<Fix> nearest(List<Fix> places, String identifier) {
        List<Fix> references = references(identifier);
        if (references.isEmpty()) {
            // an unknown aerodrome of three letters still tells the country of the bulletin
            List<Fix> american = american(places);
            return leading.length() == 3 && liesTogether(american) ? american : List.of();
        }
        if (!liesTogether(references) && identifier.equals(leading)) {
            return List.of();
        }
        Fix nearest = places.stream().min(Comparator.comparingDouble(place -> nearestDistance(place, references))).orElseThrow();
        return places.stream().filter(place -> distance(place, nearest) < SAME_PLACE).toList();
    }

    /** Where the report comes from. Without a leading station a Canadian identifier tells it by its long form. */
    private List<Fix> references(String identifier) {
        if (!leading.isEmpty()) {
            return leadingPlaces;
        }
        return identifier.length() == 3 ? find("C" + identifier) : List.of();
    }

    /**
     * Variation around the leading station, for radials of a fix whose own is not known: it changes by less than
     * the rounding of a radial over such a distance.
     *
     * @return [degrees, east positive]; {@code NaN} when unknown
     */
    double variationNear(Fix fix) {
        Fix station = leadingStation();
        if (station == null || distance(station, fix) > FARTHEST) {
            return Double.NaN;
        }
        return variation(station, candidates(leading, true));
    }

    private static double nearestDistance(Fix place, List<Fix> references) {
        double least = Double.POSITIVE_INFINITY;
        for (Fix reference : references) {
            least = Math.min(least, distance(place, reference));
        }
        return least;
    }

    static double distance(Fix one, Fix other) {
        return GreatCircle.distance(one.latitude(), one.longitude(), other.latitude(), other.longitude());
    }

    private static boolean liesTogether(List<Fix> places) {
        for (Fix place : places) {
            if (distance(place, places.get(0)) >= SAME_PLACE) {
                return false;
            }
        }
        return !places.isEmpty();
    }

    private static int rankAsAid(Fix fix) {
        if (fix.kind().contains("VOR") || fix.kind().contains("TAC")) {
            return Double.isNaN(fix.magneticVariationEast()) ? 1 : 0;
        }
        if (fix.kind().contains("NDB") || fix.kind().contains("DME")) {
            return Double.isNaN(fix.magneticVariationEast()) ? 3 : 2;
        }
        return 4;
    }

    private static int rankAsAerodrome(Fix fix) {
        return rankAsAid(fix) == 4 ? -1 : rankAsAid(fix);
    }

    /**
     * Variation at a fix; where its entry has none that of an aid nearby with the same name.
     *
     * @return [degrees, east positive]; {@code NaN} when unknown
     */
    static double variation(Fix fix, List<Fix> sameName) {
        if (!Double.isNaN(fix.magneticVariationEast())) {
            return fix.magneticVariationEast();
        }
        List<Fix> others = new ArrayList<>(sameName);
        others.removeIf(other -> Double.isNaN(other.magneticVariationEast()) || distance(fix, other) >= SAME_PLACE);
        return others.stream().min(Comparator.comparingDouble(other -> distance(fix, other)))
                .map(Fix::magneticVariationEast).orElse(Double.NaN);
    }
}
