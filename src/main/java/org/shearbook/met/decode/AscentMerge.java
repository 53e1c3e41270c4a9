package org.shearbook.met.decode;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.EnumSet;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.ToDoubleFunction;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.ReportedLevel.Significance;

/**
 * Joins the parts of one ascent into one sounding.
 *
 * <p>Parts belong together when they name the same station and their moments lie within half of {@link #WINDOW} of
 * each other, because services code the nominal hour or that of the release as they like. Of one part sent several
 * times the last correction counts, else the one with more levels. Levels are united by pressure to ±0.05 hPa: what
 * each says is kept, a lower part before a higher one, and their significances add up. Winds reported by height are
 * used where the part with winds by pressure is missing; they get their pressure by interpolation, linear in its
 * logarithm, between levels that have both. Temperature is interpolated nowhere, and a level between the two
 * bounds of a gap is marked as a bound itself, so that nobody interpolates across. Heights of significant levels
 * stay missing: they follow from the hydrostatic equation, which is no business of decoding.
 *
 * <p>Source: WMO-No. 306, Vol. I.1, FM 35 and FM 32, for what the parts contain; the order of preference is common
 * practice, no source.
 */
public final class AscentMerge {

    /** Width of the window round a release in which parts belong to it. */
    public static final Duration WINDOW = Duration.ofHours(6);

    /** Pressures this near are the same level [Pa]. */
    private static final double SAME_PRESSURE = 5.000001;
    /** The resolution of the code: two parts that differ by less say the same. */
    private static final double SAME_TEMPERATURE = 0.25;
    private static final double SAME_SPEED = 0.6;
    private static final double SAME_DIRECTION = 5.5;

    private AscentMerge() {
    }

    /** Whether two soundings are parts of one ascent. Those without any time never are. */
    public static boolean isSameAscent(DecodedSounding a, DecodedSounding b) {
        Instant first = momentOf(a);
        Instant second = momentOf(b);
        return first != null && second != null && a.stationId().equals(b.stationId())
                && Duration.between(first, second).abs().compareTo(WINDOW.dividedBy(2)) < 0;
    }

    /**
     * Sorts parts into ascents. An ascent is what lies within half a window of its earliest part.
     *
     * @param parts in the order in which they were received
     * @return groups in the order of their first member, each in the order received; soundings without parts and
     *         those without a time stand alone
     */
    public static List<List<DecodedSounding>> ascents(Collection<DecodedSounding> parts) {
        Map<String, List<List<DecodedSounding>>> byStation = new HashMap<>();
        List<List<DecodedSounding>> ascents = new ArrayList<>();
        for (DecodedSounding part : parts) {
            List<List<DecodedSounding>> ofStation = byStation.computeIfAbsent(part.stationId(), s -> new ArrayList<>());
            List<DecodedSounding> ascent = part.parts().isEmpty() ? null
                    : ofStation.stream().filter(a -> isSameAscent(a.get(0), part)).findFirst().orElse(null);
            if (ascent == null) {
                ascent = new ArrayList<>();
                ascents.add(ascent);
                if (!part.parts().isEmpty()) {
                    ofStation.add(ascent);
                }
            }
            ascent.add(part);
        }
        return ascents.stream().map(List::copyOf).toList();
    }

    /**
     * Which parts of a full ascent are not there. Radiosondes have four, dropsondes two; of reports with winds alone
     * nothing is expected.
     */
    public static Set<String> missingParts(Set<String> present) {
        Set<String> missing = new TreeSet<>();
        String kind = present.stream().filter(p -> !isPilot(p)).map(p -> p.substring(0, 2)).sorted().findFirst().orElse("");
        if (!kind.isEmpty()) {
            for (String half : kind.equals("XX") ? List.of("AA", "BB") : List.of("AA", "BB", "CC", "DD")) {
                missing.add(kind + half);
            }
        }
        missing.removeAll(present);
        return missing;
    }

    /**
     * Joins the parts of one ascent. Give all parts as they were received, not an earlier result: a correction must be
     * able to replace its own part.
     *
     * @param received parts of one ascent in the order received, each with exactly one part name
     * @return levels from the ground upwards, those without any pressure last; remarks of all parts, and
     *         {@code PARTS_MISSING}, {@code PART_REPLACED}, {@code PARTS_DIFFER}, {@code PRESSURE_INTERPOLATED}
     * @throws IllegalArgumentException if there is no part, one has not exactly one part name, or stations differ
     */
    public static DecodedSounding merge(List<DecodedSounding> received) {
        check(received);
        List<Remark> remarks = new ArrayList<>();
        Map<String, DecodedSounding> parts = counting(received, remarks);
        List<DecodedSounding> ordered = parts.values().stream().sorted(Comparator.comparingInt(p -> rank(nameOf(p)))).toList();
        ordered.forEach(p -> remarks.addAll(p.remarks()));
        DecodedSounding first = ordered.get(0);

        List<ReportedLevel> levels = new ArrayList<>();
        List<ReportedLevel> byHeight = new ArrayList<>();
        for (DecodedSounding part : ordered) {
            if (!isSuperfluous(nameOf(part), parts)) {
                part.levels().forEach(level -> (Double.isNaN(level.pressure()) ? byHeight : levels).add(level));
            }
        }
        List<ReportedLevel> unplaced = placeByHeight(byHeight, levels, first, remarks);
        List<ReportedLevel> united = markInsideGaps(markBelowGround(unite(levels, first, remarks)), ordered);
        united.addAll(unplaced);

        Set<String> names = new TreeSet<>(parts.keySet());
        remarkMissing(missingParts(names), first, remarks);
        return new DecodedSounding(first.stationId(), firstNumber(ordered, DecodedSounding::latitude), firstNumber(ordered, DecodedSounding::longitude),
                firstNumber(ordered, DecodedSounding::elevation), firstMoment(ordered, false), firstMoment(ordered, true), names,
                ordered.stream().map(DecodedSounding::correction).max(Comparator.comparingInt(AscentMerge::correctionRank)).orElse(""),
                ordered.stream().map(DecodedSounding::sondeType).filter(s -> !s.isEmpty()).findFirst().orElse(""),
                united, String.join("\n", received.stream().map(DecodedSounding::raw).toList()), first.line(), new ArrayList<>(new LinkedHashSet<>(remarks)));
    }

    private static void check(List<DecodedSounding> received) {
        if (received.isEmpty()) {
            throw new IllegalArgumentException("there is no part to merge");
        }
        for (int i = 0; i < received.size(); i++) {
            if (received.get(i).parts().size() != 1) {
                throw new IllegalArgumentException("sounding " + i + " has " + received.get(i).parts().size() + " part names, must have one");
            }
            if (!received.get(i).stationId().equals(received.get(0).stationId())) {
                throw new IllegalArgumentException("sounding " + i + " is of station " + received.get(i).stationId() + ", the first of " + received.get(0).stationId());
            }
        }
    }

    /** Of each part the one that counts. */
    private static Map<String, DecodedSounding> counting(List<DecodedSounding> received, List<Remark> remarks) {
        Map<String, DecodedSounding> parts = new LinkedHashMap<>();
        for (DecodedSounding part : received) {
            DecodedSounding before = parts.get(nameOf(part));
            if (before == null) {
                parts.put(nameOf(part), part);
                continue;
            }
            int correction = Integer.compare(correctionRank(part.correction()), correctionRank(before.correction()));
            boolean replaces = correction > 0 || correction == 0 && part.levels().size() >= before.levels().size();
            if (replaces) {
                parts.put(nameOf(part), part);
            }
            if (!part.levels().equals(before.levels())) {
                remarks.add(new Remark(part.line(), 0, "PART_REPLACED", "Part " + nameOf(part) + " came more than once; "
                        + (replaces ? "the later one counts" : "the earlier one counts") + (correction != 0 ? ", as its correction mark says." : ", it has more levels.")));
            }
        }
        return parts;
    }

    /** {@code COR} and {@code CCA} are the first correction, {@code CCB} the second. */
    private static int correctionRank(String correction) {
        if (correction.isEmpty()) {
            return 0;
        }
        return correction.equals("COR") || correction.length() < 3 ? 1 : 1 + correction.charAt(2) - 'A';
    }

    private static int rank(String part) {
        return part.charAt(3) - 'A' + (isPilot(part) ? 10 : 0);
    }

    private static boolean isPilot(String part) {
        return part.startsWith("PP") || part.startsWith("QQ") || part.startsWith("EE");
    }

    /** Winds by height where the significant winds by pressure are there. */
    private static boolean isSuperfluous(String name, Map<String, DecodedSounding> parts) {
        if (!isPilot(name) || name.charAt(3) != 'B' && name.charAt(3) != 'D') {
            return false;
        }
        return parts.entrySet().stream().anyMatch(e -> !isPilot(e.getKey()) && e.getKey().charAt(3) == name.charAt(3)
                && e.getValue().levels().stream().anyMatch(l -> l.significance().contains(Significance.SIGNIFICANT_WIND)));
    }

    /** Gives levels that have only a height a pressure and adds them to the others; returns those outside. */
    private static List<ReportedLevel> placeByHeight(List<ReportedLevel> byHeight, List<ReportedLevel> levels, DecodedSounding first, List<Remark> remarks) {
        List<ReportedLevel> ladder = levels.stream()
                .filter(l -> !Double.isNaN(l.height()) && !l.significance().contains(Significance.BELOW_GROUND))
                .sorted(Comparator.comparingDouble(ReportedLevel::height)).toList();
        double surfacePressure = surfacePressure(levels);
        List<ReportedLevel> unplaced = new ArrayList<>();
        int placed = 0;
        for (ReportedLevel level : byHeight) {
            boolean surface = level.significance().contains(Significance.SURFACE);
            double pressure = surface ? surfacePressure : pressureAt(level.height(), ladder);
            if (Double.isNaN(pressure)) {
                unplaced.add(level);
            } else {
                levels.add(new ReportedLevel(pressure, level.height(), level.temperature(), level.dewPoint(), level.windFromDirection(), level.windSpeed(),
                        level.elapsed(), level.latitude(), level.longitude(), level.significance()));
                placed += surface ? 0 : 1;
            }
        }
        if (placed > 0) {
            remarks.add(new Remark(first.line(), 0, "PRESSURE_INTERPOLATED", placed + " winds reported by height got their pressure from the standard levels around them."));
        }
        return unplaced;
    }

    /** {@code ln p} linear in height between the two levels around; {@code NaN} outside. */
    private static double pressureAt(double height, List<ReportedLevel> ladder) {
        for (int i = 1; i < ladder.size(); i++) {
            ReportedLevel below = ladder.get(i - 1);
            ReportedLevel above = ladder.get(i);
            if (height >= below.height() && height <= above.height() && above.height() > below.height() && above.pressure() < below.pressure()) {
                double part = (height - below.height()) / (above.height() - below.height());
                return below.pressure() * Math.pow(above.pressure() / below.pressure(), part);
            }
        }
        return Double.NaN;
    }

    /** One level for each pressure, from the ground upwards; what the earlier parts say comes first. */
    private static List<ReportedLevel> unite(List<ReportedLevel> levels, DecodedSounding first, List<Remark> remarks) {
        List<ReportedLevel> sorted = new ArrayList<>(levels);
        sorted.sort(Comparator.comparingDouble(ReportedLevel::pressure).reversed());
        List<ReportedLevel> united = new ArrayList<>();
        for (ReportedLevel level : sorted) {
            int last = united.size() - 1;
            if (last >= 0 && united.get(last).pressure() - level.pressure() <= SAME_PRESSURE) {
                if (differ(united.get(last), level)) {
                    remarks.add(new Remark(first.line(), 0, "PARTS_DIFFER", "Two parts say different things about " + level.pressure() / 100 + " hPa; the lower part counts."));
                }
                united.set(last, united(united.get(last), level));
            } else {
                united.add(level);
            }
        }
        return united;
    }

    private static ReportedLevel united(ReportedLevel a, ReportedLevel b) {
        EnumSet<Significance> significance = EnumSet.noneOf(Significance.class);
        significance.addAll(a.significance());
        significance.addAll(b.significance());
        ReportedLevel temperature = a.hasTemperature() ? a : b;
        ReportedLevel wind = a.hasWind() ? a : b;
        double dewPoint = Double.isNaN(temperature.dewPoint()) && temperature == a && !differ(a, b) ? b.dewPoint() : temperature.dewPoint();
        return new ReportedLevel(a.pressure(), known(a.height(), b.height()), temperature.temperature(), dewPoint,
                wind.windFromDirection(), wind.windSpeed(), known(a.elapsed(), b.elapsed()), known(a.latitude(), b.latitude()),
                known(a.longitude(), b.longitude()), significance);
    }

    private static boolean differ(ReportedLevel a, ReportedLevel b) {
        double turn = Math.abs(a.windFromDirection() - b.windFromDirection());
        return Math.abs(a.temperature() - b.temperature()) > SAME_TEMPERATURE || Math.abs(a.windSpeed() - b.windSpeed()) > SAME_SPEED
                || Math.min(turn, 360 - turn) > SAME_DIRECTION && a.windSpeed() > 0 && b.windSpeed() > 0;
    }

    private static List<ReportedLevel> markBelowGround(List<ReportedLevel> levels) {
        double surface = surfacePressure(levels);
        return new ArrayList<>(levels.stream().map(l -> l.pressure() > surface + SAME_PRESSURE ? with(l, Significance.BELOW_GROUND) : l).toList());
    }

    private static List<ReportedLevel> markInsideGaps(List<ReportedLevel> levels, List<DecodedSounding> parts) {
        for (DecodedSounding part : parts) {
            for (Significance bound : new Significance[] {Significance.TEMPERATURE_MISSING_BOUNDARY, Significance.WIND_MISSING_BOUNDARY}) {
                for (int i = 1; i < part.levels().size(); i++) {
                    ReportedLevel below = part.levels().get(i - 1);
                    ReportedLevel above = part.levels().get(i);
                    // Of equal pressures there may be any number, of falling ones no more than the code has figures.
                    if (below.pressure() > above.pressure() && below.significance().contains(bound) && above.significance().contains(bound)) {
                        levels.replaceAll(l -> l.pressure() < below.pressure() && l.pressure() > above.pressure() ? with(l, bound) : l);
                    }
                }
            }
        }
        return levels;
    }

    private static ReportedLevel with(ReportedLevel level, Significance more) {
        EnumSet<Significance> significance = EnumSet.of(more);
        significance.addAll(level.significance());
        return new ReportedLevel(level.pressure(), level.height(), level.temperature(), level.dewPoint(), level.windFromDirection(), level.windSpeed(),
                level.elapsed(), level.latitude(), level.longitude(), significance);
    }

    private static double surfacePressure(List<ReportedLevel> levels) {
        return levels.stream().filter(l -> l.significance().contains(Significance.SURFACE)).mapToDouble(ReportedLevel::pressure)
                .filter(p -> !Double.isNaN(p)).findFirst().orElse(Double.NaN);
    }

    private static void remarkMissing(Set<String> missing, DecodedSounding first, List<Remark> remarks) {
        if (!missing.isEmpty()) {
            String consequence = missing.stream().anyMatch(p -> p.endsWith("BB"))
                    ? " Without part B there are only standard levels: layers between them can't be seen." : "";
            remarks.add(new Remark(first.line(), 0, "PARTS_MISSING", "Not received: " + String.join(", ", missing) + "." + consequence));
        }
    }

    private static String nameOf(DecodedSounding part) {
        return part.parts().iterator().next();
    }

    private static @Nullable Instant momentOf(DecodedSounding sounding) {
        return sounding.launchedAt() != null ? sounding.launchedAt() : sounding.nominalAt();
    }

    private static @Nullable Instant firstMoment(List<DecodedSounding> parts, boolean ofLaunch) {
        for (DecodedSounding part : parts) {
            Instant moment = ofLaunch ? part.launchedAt() : part.nominalAt();
            if (moment != null) {
                return moment;
            }
        }
        return null;
    }

    private static double firstNumber(List<DecodedSounding> parts, ToDoubleFunction<DecodedSounding> value) {
        return parts.stream().mapToDouble(value).filter(v -> !Double.isNaN(v)).findFirst().orElse(Double.NaN);
    }

    private static double known(double a, double b) {
        return Double.isNaN(a) ? b : a;
    }
}
