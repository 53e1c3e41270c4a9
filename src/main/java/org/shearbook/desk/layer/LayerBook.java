package org.shearbook.desk.layer;

import jakarta.persistence.EntityManager;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.analysis.AnalysisDocument;
import org.shearbook.desk.analysis.AnalysisKept;
import org.shearbook.desk.analysis.AnalysisSummary;
import org.shearbook.desk.analysis.StabilityState;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingHeader;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.desk.sounding.SoundingWithdrawn;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.context.event.EventListener;
import org.springframework.data.domain.Limit;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;

/**
 * Keeps the shear layers that analysis proposes. When a sounding is analysed again, a layer that overlaps an earlier
 * one is its next version, so that what was drawn from it still finds it.
 */
@Service
public class LayerBook {

    private final LayerRepository layers;
    private final SoundingArchive soundings;
    private final EntityManager entityManager;
    private final AuditTrail audit;
    private final ApplicationEventPublisher events;
    private final LayerSettings settings;

    LayerBook(LayerRepository layers, SoundingArchive soundings, EntityManager entityManager, AuditTrail audit, ApplicationEventPublisher events, LayerSettings settings) {
        this.layers = layers;
        this.soundings = soundings;
        this.entityManager = entityManager;
        this.audit = audit;
        this.events = events;
        this.settings = settings;
    }

    @EventListener
    @Transactional(propagation = Propagation.MANDATORY)
    void propose(AnalysisKept kept) {
        AnalysisSummary analysis = kept.analysis().summary();
        SoundingHeader sounding = soundings.header(analysis.soundingId(), AsKnownAt.now()).orElseThrow();
        List<AnalysisDocument.Layer> found = sounding.withdrawn() ? List.of()
                : kept.analysis().result().map(AnalysisDocument::layers).orElse(List.of());
        replace(kept.actor(), sounding, analysis, found);
    }

    @EventListener
    @Transactional(propagation = Propagation.MANDATORY)
    void drop(SoundingWithdrawn withdrawn) {
        Instant recordedAt = audit.recordingMoment();
        keep(standing(withdrawn.id()).stream().map(layer -> new LayerEntity(layer, withdrawn.version(), recordedAt)).toList());
        events.publishEvent(new LayersProposed(withdrawn.actor(), withdrawn.id(), List.of()));
    }

    private void replace(Actor actor, SoundingHeader sounding, AnalysisSummary analysis, List<AnalysisDocument.Layer> found) {
        List<LayerEntity> earlier = new ArrayList<>(standing(sounding.id()));
        if (earlier.isEmpty() && found.isEmpty()) {
            return;
        }
        Instant recordedAt = audit.recordingMoment();
        List<LayerEntity> kept = new ArrayList<>();
        for (AnalysisDocument.Layer layer : found) {
            LayerEntity same = earlier.stream().filter(one -> overlap(one, layer) > 0).max(Comparator.comparingDouble(one -> overlap(one, layer))).orElse(null);
            earlier.remove(same);
            long id = same == null ? layers.drawId() : same.layerId;
            kept.add(new LayerEntity(id, same == null ? 1 : same.version + 1, sounding, analysis, layer, recordedAt));
        }
        keep(kept);
        keep(earlier.stream().map(gone -> new LayerEntity(gone, analysis.soundingVersion(), recordedAt)).toList());
        events.publishEvent(new LayersProposed(actor, sounding.id(), kept.stream().map(LayerEntity::toLayer).toList()));
    }

    /** Writes and lets go, so that of thousands of soundings in one act none is compared again with those after it. */
    private void keep(List<LayerEntity> versions) {
        versions.forEach(entityManager::persist);
        entityManager.flush();
        versions.forEach(entityManager::detach);
    }

    private static double overlap(LayerEntity one, AnalysisDocument.Layer other) {
        return Math.min(one.top, other.topHeightM()) - Math.max(one.base, other.baseHeightM());
    }

    private List<LayerEntity> standing(SoundingId id) {
        List<LayerEntity> found = layers.standingOf(List.of(id.value()), AsKnownAt.now().moment());
        found.forEach(entityManager::detach);
        return found;
    }

    /** The standing layers of a sounding, from the lowest up. */
    @Transactional(readOnly = true)
    public List<Layer> ofSounding(SoundingId id, AsKnownAt asKnownAt) {
        return layers.standingOf(List.of(id.value()), asKnownAt.moment()).stream().map(LayerEntity::toLayer).toList();
    }

    /** The standing layers of some soundings, from the lowest up; a sounding without any is missing. */
    @Transactional(readOnly = true)
    public Map<SoundingId, List<Layer>> ofSoundings(Collection<SoundingId> ids, AsKnownAt asKnownAt) {
        return ids.isEmpty() ? Map.of() : layers.standingOf(ids.stream().map(SoundingId::value).distinct().toList(), asKnownAt.moment()).stream()
                .map(LayerEntity::toLayer).collect(Collectors.groupingBy(Layer::soundingId));
    }

    /** The newest version of a layer, even one that no longer stands. */
    @Transactional(readOnly = true)
    public Optional<Layer> find(LayerId id, AsKnownAt asKnownAt) {
        return layers.find(id.value(), asKnownAt.moment()).map(LayerEntity::toLayer);
    }

    /** Standing layers that a balloon passed from {@code from} on and before {@code until}, in that order. */
    @Transactional(readOnly = true)
    public List<Layer> between(Instant from, Instant until, AsKnownAt asKnownAt) {
        return layers.between(from, until, asKnownAt.moment()).stream().map(LayerEntity::toLayer).toList();
    }

    /**
     * Standing layers of a window, the newest first.
     *
     * @param stationId id of a station, or null for all
     * @param after     the last layer of the part already read; null from the newest on
     * @throws UnknownLayer when there is no layer {@code after}
     */
    @Transactional(readOnly = true)
    public List<Layer> newest(@Nullable String stationId, Instant from, Instant until, @Nullable LayerId after, AsKnownAt asKnownAt, int limit) {
        LayerEntity last = after == null ? null : layers.find(after.value(), asKnownAt.moment()).orElseThrow(() -> new UnknownLayer(after));
        return layers.newest(stationId == null ? "" : stationId, from, until, last == null ? AsKnownAt.now().moment() : last.observedAt,
                last == null ? Long.MAX_VALUE : last.layerId, asKnownAt.moment(), Limit.of(limit)).stream().map(LayerEntity::toLayer).toList();
    }

    /** How long a sounding says something about the air after it. */
    public Duration evidenceLasts() {
        return settings.evidenceLasts();
    }

    /** The state in words at a moment: that of the sounding while its evidence lasts, then unknown. */
    public StabilityState stateAt(StabilityState ofSounding, Instant observedAt, Instant moment) {
        return moment.isAfter(observedAt.plus(settings.evidenceLasts())) ? StabilityState.UNKNOWN : ofSounding;
    }
}
