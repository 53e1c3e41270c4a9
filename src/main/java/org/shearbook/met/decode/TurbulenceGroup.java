package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedAirReport.Frequency;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.TurbulenceWord.Kind;

/**
 * The turbulence group of a pilot report: one or several layers of {@code [frequency] intensity[-intensity] [type]
 * [altitude]} in any order.
 *
 * <p><b>Rules where the text leaves room.</b>
 * <ul>
 * <li>Two intensities side by side or joined by a dash, a slash or TO are a range; with a frequency between them they
 *     are two components of the same layer.
 * <li>A frequency belongs to the intensity behind it if there is one, else to the one before.
 * <li>An altitude belongs to the components before it that have none. It does not reach back over a slash behind a
 *     type ({@code LGT CHOP / OCNL LGT CHOP 330}) nor from smooth to rough air or back.
 * <li>A group that begins with an altitude has its altitudes in front.
 * <li>Above and below without a number mean the altitude named last, else the level of the report.
 * <li>Without any altitude base and top stay missing: the level of the report applies.
 * </ul>
 */
final class TurbulenceGroup {

    /** A group with more components than this is no observation. */
    private static final int MOST_LAYERS = 20;

    private final List<TurbulenceWord> words;
    private final double levelFeet;
    private final List<Component> components = new ArrayList<>();
    private @Nullable Frequency pendingFrequency;
    private @Nullable Band pendingBand;
    private @Nullable Kind joint;
    private @Nullable Kind before;
    private boolean namesTurbulence;
    private boolean inCloud;
    private boolean inTheClear;
    private boolean icingWords;
    private boolean frequencyRange;
    private boolean notReported;
    private int at;

    private TurbulenceGroup(String text, double flightLevel) {
        this.words = TurbulenceWord.of(text);
        this.levelFeet = flightLevel * 100.0;
    }

    /**
     * @param text        of the group without its tag, in capitals and without control characters
     * @param flightLevel of the report [hundreds of feet]; {@code NaN} when unknown
     */
    static TurbulenceGroup read(String text, double flightLevel) {
        TurbulenceGroup group = new TurbulenceGroup(text, flightLevel);
        group.readWords();
        group.finish();
        return group;
    }

    /** The layers in the order of the text; empty when the text names none. */
    List<TurbulenceLayer> layers() {
        return components.stream().limit(MOST_LAYERS).map(Component::layer).toList();
    }

    boolean saysInCloud() {
        return inCloud;
    }

    boolean saysInTheClear() {
        return inTheClear;
    }

    /** Words of icing stand in the group. */
    boolean hasIcingWords() {
        return icingWords;
    }

    /** Two frequencies were given for one intensity; the greater share of time was kept. */
    boolean hasFrequencyRange() {
        return frequencyRange;
    }

    /** The group says that there is nothing to say. */
    boolean saysNotReported() {
        return notReported;
    }

    /** More was written than was read. */
    boolean isCutShort() {
        return words.size() >= TurbulenceWord.MOST_WORDS || components.size() > MOST_LAYERS;
    }

    private void readWords() {
        while (at < words.size() && components.size() <= MOST_LAYERS) {
            TurbulenceWord word = words.get(at);
            if (word.kind() == Kind.ADVICE) {
                return;
            }
            switch (word.kind()) {
                case INTENSITY -> intensity((Intensity) valueOf(word));
                case FREQUENCY -> frequency((Frequency) valueOf(word));
                case TYPE -> type((String) valueOf(word));
                case TURBULENCE -> turbulence();
                case ALTITUDE, BELOW, ABOVE, BETWEEN, TO -> altitude();
                case DASH, SLASH, STOP, AND -> {
                    joint = stronger(joint, word.kind());
                    at++;
                    continue;
                }
                case NO -> at++;
                case ICING -> {
                    icingWords = true;
                    at++;
                }
                case IN_CLOUD -> {
                    inCloud = true;
                    at++;
                }
                case IN_THE_CLEAR -> {
                    inTheClear = true;
                    at++;
                }
                case NOT_REPORTED -> {
                    notReported = true;
                    at++;
                }
                default -> at++;
            }
            before = word.kind();
            if (endsJoint(word.kind())) {
                joint = null;
            }
        }
    }

    /** A joint reaches over a frequency to the intensity it stands before. */
    private boolean endsJoint(Kind kind) {
        return switch (kind) {
            case INTENSITY, TYPE, TURBULENCE, ALTITUDE, BELOW, ABOVE -> true;
            case FREQUENCY -> pendingFrequency == null;
            default -> false;
        };
    }

    private static Object valueOf(TurbulenceWord word) {
        Object value = word.value();
        if (value == null) {
            throw new IllegalStateException(word.kind() + " without a value");
        }
        return value;
    }

    private static Kind stronger(@Nullable Kind one, Kind other) {
        return one == Kind.STOP || one == Kind.SLASH && other != Kind.STOP ? one : other;
    }

    private @Nullable Component last() {
        return components.isEmpty() ? null : components.get(components.size() - 1);
    }

    private void intensity(Intensity intensity) {
        at++;
        Component last = last();
        boolean mixesSmoothAndRough = last != null && last.low != null && (last.low == Intensity.NIL) != (intensity == Intensity.NIL);
        boolean joins = joint == null && !mixesSmoothAndRough || joint == Kind.DASH || joint == Kind.TO
                || joint == Kind.SLASH && !mixesSmoothAndRough;
        if (last != null && last.low != null && pendingFrequency == null && last.band == null && joins
                && (before == Kind.INTENSITY || before == Kind.TO && last.type.isEmpty())) {
            last.extendTo(intensity);
            return;
        }
        boolean completes = last != null && last.low == null && last.band == null && joint != Kind.SLASH && joint != Kind.STOP
                && (last.type.equals("CHOP") || last.type.equals("CAT"));
        if (completes && last != null) {
            last.extendTo(intensity);
            if (last.frequency == null) {
                last.frequency = pendingFrequency;
            }
            pendingFrequency = null;
            return;
        }
        add(intensity, "");
    }

    private Component add(@Nullable Intensity intensity, String type) {
        Component component = new Component(intensity, type);
        component.frequency = pendingFrequency;
        component.band = pendingBand;
        component.bandInFront = pendingBand != null;
        component.joint = joint;
        pendingFrequency = null;
        pendingBand = null;
        components.add(component);
        return component;
    }

    private void frequency(Frequency frequency) {
        at++;
        Component last = last();
        Kind next = next(Kind.FREQUENCY);
        boolean belongsAhead = last == null || next == Kind.INTENSITY || last.frequency != null
                || last.band != null && (next == Kind.TYPE || next == Kind.TURBULENCE || isAltitude(next));
        if (!belongsAhead && last != null) {
            last.frequency = frequency;
            return;
        }
        if (pendingFrequency != null && pendingFrequency != frequency) {
            frequencyRange = true;
        }
        if (pendingFrequency == null || frequency.compareTo(pendingFrequency) > 0) {
            pendingFrequency = frequency;
        }
    }

    private static boolean isAltitude(@Nullable Kind kind) {
        return kind == Kind.ALTITUDE || kind == Kind.BELOW || kind == Kind.ABOVE || kind == Kind.BETWEEN;
    }

    /** The next word that is more than a joint. */
    private @Nullable Kind next(@Nullable Kind alsoSkipped) {
        for (int index = at; index < words.size() && index < at + 8; index++) {
            Kind kind = words.get(index).kind();
            if (kind != Kind.DASH && kind != Kind.TO && kind != alsoSkipped) {
                return kind;
            }
        }
        return null;
    }

    private void type(String type) {
        at++;
        Component last = last();
        boolean ofItsOwn = type.equals("MTW") || type.equals("LLWS");
        if (last == null) {
            add(null, type);
        } else if (ofItsOwn) {
            if (last.type.equals(type) && joint == null && last.band == null) {
                return;
            }
            if (last.type.isEmpty() && !last.namesTurbulence && last.band == null && joint == null && before == Kind.INTENSITY) {
                last.type = type;
            } else {
                add(null, type);
            }
        } else if (pendingFrequency != null && last.band != null) {
            Component repeated = add(last.low, type);
            repeated.high = last.high;
        } else if (last.type.isEmpty()) {
            last.type = type;
        }
    }

    private void turbulence() {
        at++;
        Component last = last();
        if (before == Kind.NO) {
            add(Intensity.NIL, "");
        } else if (last == null) {
            namesTurbulence = true;
        } else {
            last.namesTurbulence = true;
        }
    }

    private void altitude() {
        Kind first = words.get(at).kind();
        if (first == Kind.TO && !(at + 1 < words.size() && words.get(at + 1).kind() == Kind.ALTITUDE)) {
            joint = joint == null ? Kind.TO : joint;
            at++;
            return;
        }
        if (first == Kind.BETWEEN) {
            at++;
            return;
        }
        Band band = readBand();
        if (band == null) {
            return;
        }
        if (at < words.size()) {
            Kind kind = words.get(at).kind();
            if (band.isOpen() && (kind == Kind.BELOW || kind == Kind.ABOVE) && isNumber(at + 1)) {
                Band other = readBand();
                if (other != null && band.isOpen() && other.isOpen()) {
                    Band both = band.meet(other);
                    if (both != null) {
                        assign(both);
                        return;
                    }
                    assign(band);
                    band = other;
                }
            }
        }
        assign(band);
    }

    private boolean isNumber(int index) {
        return index < words.size() && words.get(index).kind() == Kind.ALTITUDE;
    }

    /** One bound, one altitude or one range; leaves {@link #at} behind it. */
    private @Nullable Band readBand() {
        Kind kind = words.get(at).kind();
        if (kind == Kind.BELOW || kind == Kind.ABOVE || kind == Kind.TO) {
            int number = at + 1;
            if (number < words.size() && words.get(number).kind() == Kind.DASH) {
                number++;
            }
            if (isNumber(number)) {
                double feet = words.get(number).feet();
                at = number + 1;
                return kind == Kind.ABOVE ? new Band(feet, Double.NaN) : new Band(Double.NaN, feet);
            }
            at++;
            return dangling(kind);
        }
        double lowest = words.get(at).feet();
        double highest = lowest;
        int numbers = 1;
        at++;
        boolean between = before == Kind.BETWEEN;
        while (at + 1 < words.size() && isNumber(at + 1) && isRangeJoint(words.get(at).kind(), between)) {
            double feet = words.get(at + 1).feet();
            lowest = Math.min(lowest, feet);
            highest = Math.max(highest, feet);
            numbers++;
            at += 2;
        }
        int bound = at;
        boolean attached = false;
        while (bound < words.size() && isPostfixJoint(words.get(bound).kind()) && bound < at + 2) {
            attached = true;
            bound++;
        }
        if (bound < words.size() && (words.get(bound).kind() == Kind.BELOW || words.get(bound).kind() == Kind.ABOVE)
                && (attached && numbers == 1 || !isNumber(bound + 1)) && !(attached && beginsNextLayer(bound))) {
            boolean below = words.get(bound).kind() == Kind.BELOW;
            at = bound + 1;
            return below ? new Band(Double.NaN, highest) : new Band(lowest, Double.NaN);
        }
        return new Band(lowest, highest);
    }

    /** {@code LGT 060/BLO 030 MOD}: a bound with a number of its own behind a slash belongs to what follows. */
    private boolean beginsNextLayer(int bound) {
        return words.get(bound - 1).kind() == Kind.SLASH && isNumber(bound + 1);
    }

    private static boolean isRangeJoint(Kind kind, boolean between) {
        return kind == Kind.DASH || kind == Kind.TO || kind == Kind.SLASH || kind == Kind.AND && between;
    }

    private static boolean isPostfixJoint(Kind kind) {
        return kind == Kind.DASH || kind == Kind.SLASH || kind == Kind.AND;
    }

    private @Nullable Band dangling(Kind kind) {
        double lowest = levelFeet;
        double highest = levelFeet;
        for (int index = components.size() - 1; index >= 0; index--) {
            Band band = components.get(index).band;
            if (band != null) {
                lowest = Double.isNaN(band.base) ? band.top : band.base;
                highest = Double.isNaN(band.top) ? band.base : band.top;
                break;
            }
        }
        double feet = kind == Kind.ABOVE ? highest : lowest;
        if (Double.isNaN(feet)) {
            return null;
        }
        return kind == Kind.ABOVE ? new Band(feet, Double.NaN) : new Band(Double.NaN, feet);
    }

    private void assign(Band band) {
        Component last = last();
        if (last == null) {
            pendingBand = pendingBand == null ? band : pendingBand;
            return;
        }
        Kind next = next(Kind.STOP);
        boolean observationFollows = next == Kind.INTENSITY || next == Kind.FREQUENCY;
        if (last.band == null) {
            last.band = band;
            for (int index = components.size() - 2; index >= 0; index--) {
                Component earlier = components.get(index);
                if (earlier.band != null || !earlier.sharesWith(components.get(index + 1))) {
                    break;
                }
                earlier.band = band;
            }
        } else if (pendingFrequency == null && observationFollows) {
            pendingBand = band;
        } else {
            Component repeated = new Component(last.low, last.type);
            repeated.high = last.high;
            repeated.frequency = pendingFrequency == null ? last.frequency : pendingFrequency;
            repeated.band = band;
            pendingFrequency = null;
            components.add(repeated);
        }
    }

    private void finish() {
        if (components.isEmpty()) {
            if (pendingFrequency != null || namesTurbulence && pendingBand != null) {
                add(null, "");
            }
            return;
        }
        Component last = last();
        if (pendingFrequency != null && last != null && last.frequency == null) {
            last.frequency = pendingFrequency;
        }
        for (int index = 1; index < components.size(); index++) {
            Component earlier = components.get(index - 1);
            Component component = components.get(index);
            if (component.band == null && earlier.bandInFront && earlier.sharesWith(component)) {
                component.band = earlier.band;
                component.bandInFront = true;
            }
        }
    }

    /** Heights in feet; {@code NaN} where open. */
    private record Band(double base, double top) {

        boolean isOpen() {
            return Double.isNaN(base) != Double.isNaN(top);
        }

        /** The band between a lower and an upper bound; null when they face away from each other. */
        @Nullable Band meet(Band other) {
            double lower = Double.isNaN(base) ? other.base : base;
            double upper = Double.isNaN(top) ? other.top : top;
            return lower < upper ? new Band(lower, upper) : null;
        }
    }

    private static final class Component {

        private @Nullable Intensity low;
        private @Nullable Intensity high;
        private @Nullable Frequency frequency;
        private String type;
        private @Nullable Band band;
        private boolean bandInFront;
        private boolean namesTurbulence;
        private @Nullable Kind joint;

        Component(@Nullable Intensity intensity, String type) {
            this.low = intensity;
            this.high = intensity;
            this.type = type;
        }

        void extendTo(Intensity intensity) {
            low = low == null || intensity.compareTo(low) < 0 ? intensity : low;
            high = high == null || intensity.compareTo(high) > 0 ? intensity : high;
        }

        /** Whether one altitude may serve this component and the one behind it. */
        boolean sharesWith(Component following) {
            if (following.joint == Kind.STOP) {
                return false;
            }
            if (following.joint == Kind.SLASH && (!type.isEmpty() || namesTurbulence)) {
                return false;
            }
            return (low == Intensity.NIL) == (following.low == Intensity.NIL);
        }

        TurbulenceLayer layer() {
            return new TurbulenceLayer(low, high, frequency, type,
                    band == null ? Double.NaN : band.base, band == null ? Double.NaN : band.top);
        }
    }
}
