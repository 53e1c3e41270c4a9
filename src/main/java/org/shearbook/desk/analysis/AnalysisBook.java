package org.shearbook.desk.analysis;

import jakarta.persistence.EntityManager;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.sounding.Sounding;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.desk.sounding.SoundingKept;
import org.shearbook.met.profile.RoundedCornerFunction;
import org.shearbook.met.richardson.InstrumentNoise;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.context.event.EventListener;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;
import tools.jackson.databind.json.JsonMapper;

/**
 * Analyses every sounding that is kept, at the default window and in the transaction that keeps it, and keeps what
 * came out. Other windows are computed when asked for. A sounding that can't be analysed is kept as that, with the
 * reason: it never stops the intake.
 */
@Service
public class AnalysisBook {

    /** Of the methods together. It changes with every change that can change a number. */
    public static final String METHOD_VERSION = "2";

    private static final Logger log = LoggerFactory.getLogger(AnalysisBook.class);
    private static final JsonMapper JSON = JsonMapper.shared();
    private static final int LONGEST_REASON = 400;
    /** Soundings asked for in one statement. */
    private static final int PART = 500;

    private final AnalysisRepository analyses;
    private final SoundingArchive soundings;
    private final EntityManager entityManager;
    private final AuditTrail audit;
    private final ApplicationEventPublisher events;

    AnalysisBook(AnalysisRepository analyses, SoundingArchive soundings, EntityManager entityManager, AuditTrail audit, ApplicationEventPublisher events) {
        this.analyses = analyses;
        this.soundings = soundings;
        this.entityManager = entityManager;
        this.audit = audit;
        this.events = events;
    }

    /** The windows that may be asked for [m]. */
    public static List<Double> windows() {
        return RichardsonAnalysis.WINDOWS;
    }

    /** The window of everything that is kept [m]. */
    public static double defaultWindow() {
        return RichardsonAnalysis.DEFAULT_WINDOW;
    }

    /** Standard deviation [m] of the Gaussian whose full width at half maximum is the window. */
    public static double smoothing(double window) {
        return RoundedCornerFunction.standardDeviation(window);
    }

    @EventListener
    @Transactional(propagation = Propagation.MANDATORY)
    void analyse(SoundingKept kept) {
        Sounding sounding = soundings.find(kept.id(), AsKnownAt.now()).orElseThrow();
        Analysis analysis = compute(sounding, defaultWindow());
        int version = analyses.newestVersion(kept.id().value()).orElse(0) + 1;
        String document = analysis.document() == null ? null : JSON.writeValueAsString(analysis.document().withLevels(List.of()));
        AnalysisEntity entity = new AnalysisEntity(analysis.summary(), document, version, audit.recordingMoment());
        entityManager.persist(entity);
        entityManager.flush();
        // Of thousands of soundings in one act none need be compared again at the flushes for those after it.
        entityManager.detach(entity);
        events.publishEvent(new AnalysisKept(kept.actor(), new Analysis(entity.toSummary(), analysis.document())));
    }

    /** The kept analysis, at the default window; empty when there is no such sounding. */
    @Transactional(readOnly = true)
    public Optional<Analysis> of(SoundingId id, AsKnownAt asKnownAt) {
        return analyses.find(id.value(), asKnownAt.moment()).map(entity -> new Analysis(entity.toSummary(), withLevels(entity)));
    }

    private @Nullable AnalysisDocument withLevels(AnalysisEntity entity) {
        if (entity.resultDocument == null) {
            return null;
        }
        // The sounding as it was when it was analysed: both were recorded at one moment.
        Sounding sounding = soundings.find(new SoundingId(entity.soundingId), new AsKnownAt(entity.recordedAt)).orElseThrow();
        return JSON.readValue(entity.resultDocument, AnalysisDocument.class).withLevels(DocumentWriter.levels(sounding.levels()));
    }

    /**
     * Analyses a sounding without keeping anything.
     *
     * @param window full width at half maximum [m], one of {@link #windows()}
     * @throws WindowNotOffered when it is another
     */
    public Analysis compute(Sounding sounding, double window) {
        return compute(sounding, window, null);
    }

    /**
     * Analyses a sounding without keeping anything, with the spread of growth over the instrument's errors.
     *
     * @param window full width at half maximum [m], one of {@link #windows()}
     * @param spread null for none
     * @throws WindowNotOffered when it is another
     */
    public Analysis compute(Sounding sounding, double window, @Nullable EnsembleRequest spread) {
        if (!windows().contains(window)) {
            throw new WindowNotOffered(String.valueOf(window));
        }
        AnalysisDocument document = null;
        String notAnalysed = sounding.notUsable();
        if (notAnalysed == null && sounding.profile() != null) {
            try {
                document = DocumentWriter.write(sounding.id().value() == 0 ? null : sounding.id().value(), sounding.stationId(), sounding.launchedAt(),
                        sounding.profile(), InstrumentNoise.ofSondeType(sounding.header().sondeType()), window, spread).withLevels(DocumentWriter.levels(sounding.levels()));
            } catch (IllegalArgumentException impossible) {
                notAnalysed = impossible.getMessage();
            } catch (RuntimeException failed) {
                // A fault of the methods must be seen and repaired, but the sounding is kept all the same.
                log.error("Analysis of sounding {} failed", sounding.id(), failed);
                notAnalysed = "the methods failed on this sounding: " + failed;
            }
        }
        if (document == null && notAnalysed == null) {
            notAnalysed = "the sounding has no usable profile";
        }
        return new Analysis(summary(sounding, window, document, notAnalysed), document);
    }

    private static AnalysisSummary summary(Sounding sounding, double window, @Nullable AnalysisDocument document, @Nullable String notAnalysed) {
        String reason = notAnalysed != null && notAnalysed.length() > LONGEST_REASON ? notAnalysed.substring(0, LONGEST_REASON) : notAnalysed;
        AnalysisDocument.Lowest lowest = document == null ? null : document.lowest();
        AnalysisDocument.References references = document == null ? null : document.references();
        return new AnalysisSummary(sounding.id(), sounding.version(), 0, METHOD_VERSION, window, reason,
                StabilityState.ofOneSounding(lowest == null ? null : lowest.richardson()),
                lowest == null ? null : lowest.richardson(), lowest == null ? null : lowest.heightM(),
                lowest == null ? null : lowest.flightLevel(), lowest == null ? null : lowest.shear1000FtKt(),
                references == null ? null : references.tropopauseHeightM(), references == null ? null : references.tropopauseFlightLevel(),
                references == null ? null : references.maxWindMs(), references == null ? null : references.maxWindFlightLevel(),
                references != null && Boolean.TRUE.equals(references.maxWindAtTopOfData()),
                document == null ? 0 : document.layers().size(), sounding.observedAt(), sounding.receivedAt(), sounding.recordedAt());
    }

    /** What lists show of many soundings, by sounding; one that was not yet known at that moment is missing. */
    @Transactional(readOnly = true)
    public Map<SoundingId, AnalysisSummary> summaries(Collection<SoundingId> ids, AsKnownAt asKnownAt) {
        Map<SoundingId, AnalysisSummary> found = new HashMap<>();
        for (List<Long> part : parts(ids)) {
            analyses.summaries(part, asKnownAt.moment()).forEach(summary -> found.put(summary.soundingId(), summary));
        }
        return found;
    }

    /** The columns a display draws, by sounding; one that was not analysed, or not yet known, is missing. */
    @Transactional(readOnly = true)
    public Map<SoundingId, AnalysisColumn> columns(Collection<SoundingId> ids, AsKnownAt asKnownAt) {
        Map<SoundingId, AnalysisColumn> found = new HashMap<>();
        for (List<Long> part : parts(ids)) {
            for (AnalysisEntity entity : analyses.findAll(part, asKnownAt.moment())) {
                if (entity.resultDocument != null) {
                    SoundingId id = new SoundingId(entity.soundingId);
                    found.put(id, column(id, entity.version, JSON.readValue(entity.resultDocument, AnalysisDocument.class)));
                }
            }
        }
        return found;
    }

    private static List<List<Long>> parts(Collection<SoundingId> ids) {
        List<Long> all = ids.stream().map(SoundingId::value).distinct().toList();
        List<List<Long>> parts = new ArrayList<>();
        for (int from = 0; from < all.size(); from += PART) {
            parts.add(all.subList(from, Math.min(all.size(), from + PART)));
        }
        return parts;
    }

    /** The column of a document, whatever its window. Points whose flight level is not known are left out. */
    public static AnalysisColumn column(SoundingId id, int version, AnalysisDocument document) {
        List<AnalysisDocument.Point> points = new ArrayList<>(document.profile().size());
        double last = Double.NEGATIVE_INFINITY;
        for (AnalysisDocument.Point point : document.profile()) {
            if (point.flightLevel() != null && point.flightLevel() > last) {
                points.add(point);
                last = point.flightLevel();
            }
        }
        return new AnalysisColumn(id, version, document.method().windowM(),
                points.stream().mapToDouble(AnalysisDocument.Point::heightM).toArray(),
                points.stream().mapToDouble(point -> orNaN(point.flightLevel())).toArray(),
                points.stream().mapToDouble(point -> orNaN(point.elapsedS())).toArray(),
                points.stream().mapToDouble(point -> orNaN(point.richardson())).toArray(),
                points.stream().mapToDouble(point -> orNaN(point.shear1000FtKt())).toArray(),
                points.stream().mapToDouble(point -> orNaN(point.n2PerS2())).toArray());
    }

    private static double orNaN(@Nullable Double value) {
        return value == null ? Double.NaN : value;
    }
}
