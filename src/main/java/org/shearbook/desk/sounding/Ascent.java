package org.shearbook.desk.sounding;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.AscentMerge;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Remark;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.quality.CheckedSounding;
import org.shearbook.met.quality.SoundingQuality;

/**
 * One ascent while messages are added to it: those kept before, those that just arrived, and what they make together.
 *
 * <p>Coded parts belong to one ascent when their moments lie within three hours of each other, because services code
 * the nominal hour or that of the release as they like; but the same part for another nominal hour is another ascent.
 * A whole file belongs to the ascent whose nominal hour is the same, or, where one says no nominal hour, that was
 * released within half an hour: special ascents can follow each other closely. Where an ascent came both as coded
 * parts and as a whole file, the one with more levels is in use; the other is kept beside it.
 */
final class Ascent {

    static final Duration HALF_WINDOW = AscentMerge.WINDOW.dividedBy(2);
    private static final Duration SAME_RELEASE = Duration.ofMinutes(30);

    final Site site;
    final String format;
    final boolean coded;
    final @Nullable SoundingEntity newest;
    private final List<KnownMessage> known = new ArrayList<>();
    /** Messages that say something new, by their place in the batch. */
    final List<Integer> arrivals = new ArrayList<>();
    final List<DecodedSounding> added = new ArrayList<>();
    /** Places in the batch of messages that say nothing new. */
    final List<Integer> duplicates = new ArrayList<>();
    private final List<DecodedSounding> parts = new ArrayList<>();
    private @Nullable DecodedSounding content;
    private @Nullable CheckedSounding checked;
    private String digest = "";

    private record KnownMessage(String levelsDigest, @Nullable Instant nominalAt, @Nullable Instant launchedAt, double latitude, double longitude,
            double elevation) {

        /** Whether the message repeats this one: the same levels, and nothing said of time and place that this one does not say. */
        boolean isRepeatedBy(DecodedSounding message, String digest) {
            return levelsDigest.equals(digest)
                    && (message.nominalAt() == null || message.nominalAt().equals(nominalAt))
                    && (message.launchedAt() == null || message.launchedAt().equals(launchedAt))
                    && adds(message.latitude(), latitude) && adds(message.longitude(), longitude) && adds(message.elevation(), elevation);
        }

        private static boolean adds(double said, double known) {
            return Double.isNaN(said) || said == known;
        }
    }

    Ascent(Site site, String format, boolean coded, @Nullable SoundingEntity newest, List<SoundingMessageEntity> earlier) {
        this.site = site;
        this.format = format;
        this.coded = coded;
        this.newest = newest;
        for (SoundingMessageEntity message : earlier) {
            known.add(new KnownMessage(message.contentDigest, message.nominalAt, message.launchedAt, SoundingEntity.orNaN(message.latitudeDeg),
                    SoundingEntity.orNaN(message.longitudeDeg), SoundingEntity.orNaN(message.elevation)));
            if (coded && !message.parts.isEmpty()) {
                parts.add(ofStation(message.toMessage(), site.stationId()));
            }
        }
    }

    static Instant momentOf(DecodedSounding message) {
        Instant moment = message.launchedAt() != null ? message.launchedAt() : message.nominalAt();
        if (moment == null) {
            throw new SoundingWithoutTime(message.line());
        }
        return moment;
    }

    /** Whether a message belongs to an ascent with these times and parts. */
    static boolean belongs(DecodedSounding message, boolean coded, @Nullable Instant nominalAt, @Nullable Instant launchedAt, Set<String> parts) {
        Instant moment = launchedAt != null ? launchedAt : nominalAt;
        Duration apart = Duration.between(moment, momentOf(message)).abs();
        boolean bothNominal = nominalAt != null && message.nominalAt() != null;
        boolean sameNominal = bothNominal && nominalAt.equals(message.nominalAt());
        if (coded) {
            return sameNominal || apart.compareTo(HALF_WINDOW) < 0 && !isSamePartOfAnotherHour(message, nominalAt, parts);
        }
        return bothNominal ? sameNominal : apart.compareTo(SAME_RELEASE) <= 0;
    }

    boolean takes(DecodedSounding message) {
        boolean near = newest != null && belongs(message, coded, newest.nominalAt, newest.launchedAt, SoundingEntity.partSet(newest.parts))
                || added.stream().anyMatch(one -> belongs(message, coded, one.nominalAt(), one.launchedAt(), one.parts()));
        return near && !(coded && added.stream().anyMatch(one -> isSamePartOfAnotherHour(message, one.nominalAt(), one.parts())));
    }

    private static boolean isSamePartOfAnotherHour(DecodedSounding message, @Nullable Instant nominalAt, Set<String> parts) {
        return nominalAt != null && message.nominalAt() != null && !nominalAt.equals(message.nominalAt()) && !Collections.disjoint(parts, message.parts());
    }

    void add(int arrival, DecodedSounding message) {
        String levels = ContentDigest.ofLevels(message);
        if (known.stream().anyMatch(one -> one.isRepeatedBy(message, levels))) {
            duplicates.add(arrival);
            return;
        }
        known.add(new KnownMessage(levels, message.nominalAt(), message.launchedAt(), message.latitude(), message.longitude(), message.elevation()));
        arrivals.add(arrival);
        added.add(message);
        if (coded) {
            parts.add(ofStation(message, site.stationId()));
        }
    }

    int messageCount() {
        return known.size();
    }

    Instant observedAt() {
        return momentOf(content());
    }

    DecodedSounding content() {
        if (content == null) {
            content = coded ? AscentMerge.merge(parts) : added.get(added.size() - 1);
            digest = ContentDigest.ofAll(content);
        }
        return content;
    }

    /** Whether the messages that came in change what the ascent says. */
    boolean makesNewVersion() {
        if (added.isEmpty() || isMuchThinner() || isCoarserThanTheFile()) {
            return false;
        }
        content();
        return newest == null || newest.withdrawn || !newest.contentDigest.equals(digest);
    }

    /**
     * Whether a whole file has less than half the levels of the version in use. A file cut off on its way must not
     * push out the ascent; it is kept beside it.
     */
    boolean isMuchThinner() {
        return !coded && !added.isEmpty() && newest != null && !newest.withdrawn && 2 * content().levels().size() < newest.levelCount;
    }

    /** Whether coded parts came after the whole file of the same ascent, which says more: they are kept beside it. */
    boolean isCoarserThanTheFile() {
        return coded && !added.isEmpty() && newest != null && !newest.withdrawn && newest.parts.isEmpty() && content().levels().size() < newest.levelCount;
    }

    String digest() {
        content();
        return digest;
    }

    void check(@Nullable VerticalProfile previous) {
        checked = SoundingQuality.check(content().levels(), site.elevation(), previous);
    }

    CheckedSounding checked() {
        if (checked == null) {
            throw new IllegalStateException("The ascent was not checked yet");
        }
        return checked;
    }

    /** What there is to say about the version, beside its flags. */
    List<Remark> remarks() {
        List<Remark> remarks = new ArrayList<>(content().remarks());
        remarks.addAll(site.remarks());
        return remarks;
    }

    /** Parts of one station may name it by different identifiers of it. */
    private static DecodedSounding ofStation(DecodedSounding part, String stationId) {
        return new DecodedSounding(stationId, part.latitude(), part.longitude(), part.elevation(), part.nominalAt(), part.launchedAt(), part.parts(),
                part.correction(), part.sondeType(), part.levels(), part.raw(), part.line(), part.remarks());
    }
}
