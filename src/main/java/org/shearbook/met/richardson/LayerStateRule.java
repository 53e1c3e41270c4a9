package org.shearbook.met.richardson;

import java.time.Duration;
import java.time.Instant;
import java.util.Comparator;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Names the state of a layer from its history, with hysteresis: flow becomes turbulent below Ri ¼ and may stay so up to
 * about 1 (Glossary of Meteorology, "critical Richardson number"). How that becomes four words is our own design.
 *
 * @param critical     Ri below which a layer is subcritical [1], positive
 * @param release      Ri from which it is steady again [1], above {@code critical}
 * @param reportMemory how long a report of moderate or greater turbulence holds a layer in decay, positive
 * @param columnEnds   how long a sounding speaks for the air: from then on the state is unknown, positive
 */
public record LayerStateRule(double critical, double release, Duration reportMemory, Duration columnEnds) {

    /** ¼, 1, six hours, six hours. */
    public static final LayerStateRule DEFAULT = new LayerStateRule(0.25, 1, Duration.ofHours(6), Duration.ofHours(6));

    public LayerStateRule {
        if (!(critical > 0) || !(release > critical) || Double.isInfinite(release) || reportMemory.isNegative() || reportMemory.isZero()
                || columnEnds.isNegative() || columnEnds.isZero()) {
            throw new IllegalArgumentException("a state rule needs 0 < critical < release and positive durations, not " + critical + ", "
                    + release + ", " + reportMemory + ", " + columnEnds);
        }
    }

    /**
     * One sounding's word on a layer.
     *
     * @param at               time of the sounding
     * @param richardsonNumber smallest Ri in the layer's air [1]; NaN when that sounding can't say
     */
    public record Evidence(Instant at, double richardsonNumber) {
    }

    /**
     * A state and what it rests on.
     *
     * @param state       the word
     * @param evidenceAt  time of the newest sounding; null when there is none
     * @param evidenceAge its age at the moment asked for; null when there is none
     * @param because     why, in words
     */
    public record Standing(LayerState state, @Nullable Instant evidenceAt, @Nullable Duration evidenceAge, String because) {
    }

    /**
     * The state of a layer at a moment, a pure function of its arguments: evidence and reports after that moment are not
     * looked at, so the past can be shown as it was known.
     *
     * <p>A subcritical layer stays decaying until a sounding shows {@code release} or more, however long ago that was:
     * an unknown stretch between two soundings does not make air steady.
     *
     * @param history  soundings of the layer, in any order
     * @param reports  times of reports of moderate or greater turbulence linked to the layer, in any order
     * @param at       the moment asked for
     */
    public Standing at(List<Evidence> history, List<Instant> reports, Instant at) {
        List<Evidence> known = history.stream().filter(e -> !e.at.isAfter(at)).sorted(Comparator.comparing(Evidence::at)).toList();
        if (known.isEmpty()) {
            return new Standing(LayerState.UNKNOWN, null, null, "no sounding yet");
        }
        Evidence newest = known.get(known.size() - 1);
        Duration age = Duration.between(newest.at, at);
        if (age.compareTo(columnEnds) >= 0) {
            return new Standing(LayerState.UNKNOWN, newest.at, age, "the last sounding is " + words(age) + " old; it speaks for " + words(columnEnds));
        }
        double ri = newest.richardsonNumber;
        if (Double.isNaN(ri)) {
            return new Standing(LayerState.UNKNOWN, newest.at, age, "the last sounding cannot say");
        }
        if (ri < critical) {
            return new Standing(LayerState.SUBCRITICAL, newest.at, age, "Ri is below " + critical);
        }
        if (ri >= release) {
            return new Standing(LayerState.STEADY, newest.at, age, "Ri is " + release + " or more");
        }
        boolean wasSubcritical = false;
        for (Evidence evidence : known) {
            if (evidence.richardsonNumber < critical) {
                wasSubcritical = true;
            } else if (evidence.richardsonNumber >= release) {
                wasSubcritical = false;
            }
        }
        if (wasSubcritical) {
            return new Standing(LayerState.DECAYING, newest.at, age, "Ri was below " + critical + " and is not yet " + release);
        }
        boolean reported = reports.stream().anyMatch(r -> !r.isAfter(at) && Duration.between(r, at).compareTo(reportMemory) <= 0);
        return reported
                ? new Standing(LayerState.DECAYING, newest.at, age, "turbulence was reported within " + words(reportMemory))
                : new Standing(LayerState.MARGINAL, newest.at, age, "Ri is between " + critical + " and " + release);
    }

    private static String words(Duration duration) {
        return duration.toHours() + " h" + (duration.toMinutesPart() > 0 ? " " + duration.toMinutesPart() + " min" : "");
    }
}
