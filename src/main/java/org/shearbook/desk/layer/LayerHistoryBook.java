package org.shearbook.desk.layer;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.airreport.AirReport;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.analysis.AnalysisBook;
import org.shearbook.desk.analysis.StabilityState;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.sounding.Sounding;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.richardson.LayerMatching;
import org.shearbook.met.richardson.LayerSighting;
import org.shearbook.met.richardson.LayerStateRule;
import org.shearbook.met.richardson.LayerTrend;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.met.richardson.ShearLayer;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/**
 * Joins the layers of successive soundings of a station into histories. Nothing is kept: a history is worked out from the
 * soundings and reports that were known at a moment, so that the past can be shown as it was known.
 *
 * <p>A report of moderate or greater turbulence belongs to a layer when it lies within {@value #REPORT_DISTANCE} m of the
 * balloon and within {@value #REPORT_LEVELS} hundreds of feet of the layer: our own choice.
 */
@Service
public class LayerHistoryBook {

    /** Soundings of a station that are joined at most; the newest ones. */
    static final int MOST_SOUNDINGS = 60;

    private static final double REPORT_DISTANCE = 185_200;
    private static final double REPORT_LEVELS = 10;

    private final SoundingArchive soundings;
    private final AirReportArchive reports;
    private final LayerSettings settings;

    LayerHistoryBook(SoundingArchive soundings, AirReportArchive reports, LayerSettings settings) {
        this.soundings = soundings;
        this.reports = reports;
        this.settings = settings;
    }

    /** The state rule in use. */
    LayerStateRule rule() {
        LayerStateRule usual = LayerStateRule.DEFAULT;
        return new LayerStateRule(usual.critical(), usual.release(), usual.reportMemory(), settings.evidenceLasts());
    }

    /**
     * Histories of the layers of one station.
     *
     * @param stationId id of a station
     * @param from      of the soundings joined
     * @param at        the moment the states are for; soundings and reports after it are not looked at
     * @return the one seen last first; a layer of one sounding only is a history too
     */
    @Transactional(readOnly = true)
    public List<LayerHistory> of(String stationId, Instant from, Instant at, AsKnownAt asKnownAt) {
        List<Strand> strands = new ArrayList<>();
        List<Sounding> ascents = ascents(stationId, from, at, asKnownAt);
        for (Sounding ascent : ascents) {
            extend(strands, ascent);
        }
        return strands.stream().map(strand -> history(strand, stationId, ascents.get(ascents.size() - 1).header().stationName(), at, asKnownAt))
                .sorted(Comparator.comparing((LayerHistory history) -> history.last().at()).reversed()
                        .thenComparingDouble(history -> history.last().base())).toList();
    }

    /** Usable soundings in the order of their release; of one ascent in two formats the finer. */
    private List<Sounding> ascents(String stationId, Instant from, Instant at, AsKnownAt asKnownAt) {
        Map<Instant, Sounding> byMoment = new LinkedHashMap<>();
        soundings.wholeBetween(stationId, from, at.plusNanos(1000), asKnownAt).stream()
                .filter(sounding -> !sounding.header().withdrawn() && sounding.profile() != null)
                .sorted(Comparator.comparing((Sounding sounding) -> sounding.header().observedAt()))
                .forEach(sounding -> byMoment.merge(sounding.header().observedAt(), sounding,
                        (one, other) -> one.header().levelCount() >= other.header().levelCount() ? one : other));
        List<Sounding> all = List.copyOf(byMoment.values());
        return all.subList(Math.max(0, all.size() - MOST_SOUNDINGS), all.size());
    }

    /** A layer so far, with the place of the balloon when it was last seen. */
    private static final class Strand {

        private final List<LayerHistory.Sighting> shown = new ArrayList<>();
        private final List<LayerStateRule.Evidence> evidence = new ArrayList<>();
        private LayerSighting last;
        private VerticalProfile ascent;

        private Strand(LayerSighting first) {
            last = first;
        }
    }

    private static void extend(List<Strand> strands, Sounding sounding) {
        VerticalProfile profile = sounding.profile();
        RichardsonProfile analysed;
        try {
            analysed = RichardsonAnalysis.of(profile, AnalysisBook.defaultWindow());
        } catch (IllegalArgumentException impossible) {
            // Its analysis says why; it can neither show a layer nor end one.
            return;
        }
        Instant at = sounding.header().observedAt();
        List<ShearLayer> layers = analysed.layers();
        List<LayerSighting> seen = layers.stream().map(layer -> LayerSighting.of(layer, analysed, at)).toList();
        List<Strand> open = List.copyOf(strands);
        Strand[] of = new Strand[seen.size()];
        List<Strand> unmatched = new ArrayList<>(open);
        for (LayerMatching.Link link : LayerMatching.DEFAULT.join(open.stream().map(strand -> strand.last).toList(), seen)) {
            of[link.later()] = open.get(link.earlier());
            unmatched.remove(open.get(link.earlier()));
        }
        for (int k = 0; k < seen.size(); k++) {
            Strand strand = of[k];
            if (strand == null) {
                strand = new Strand(seen.get(k));
                strands.add(strand);
            }
            add(strand, seen.get(k), layers.get(k).letter(), sounding, analysed);
        }
        for (Strand strand : unmatched) {
            if (Duration.between(strand.last.at(), at).compareTo(LayerMatching.DEFAULT.longest()) <= 0) {
                LayerMatching.DEFAULT.trace(strand.last, analysed, at).ifPresent(found -> add(strand, found, null, sounding, analysed));
            }
        }
    }

    private static void add(Strand strand, LayerSighting sighting, @Nullable String letter, Sounding sounding, RichardsonProfile analysed) {
        Optional<LayerTrend> trend = strand.shown.isEmpty() ? Optional.empty() : Optional.of(LayerTrend.of(strand.last, sighting));
        strand.shown.add(new LayerHistory.Sighting(sounding.id(), sighting.at(), letter, sighting.extent().base(), sighting.extent().top(),
                sighting.minimumHeight(), known(analysed.profile().flightLevelAt(sighting.minimumHeight())), known(sighting.virtualPotentialTemperature()),
                known(sighting.shearDirection()), known(sighting.richardsonNumber()), trend.map(t -> known(t.richardsonPerHour())).orElse(null),
                trend.map(t -> known(t.descentRate())).orElse(null)));
        strand.evidence.add(new LayerStateRule.Evidence(sighting.at(), sighting.richardsonNumber()));
        strand.last = sighting;
        strand.ascent = analysed.profile();
    }

    private LayerHistory history(Strand strand, String stationId, String stationName, Instant at, AsKnownAt asKnownAt) {
        LayerStateRule.Standing standing = rule().at(strand.evidence, reports(strand, at, asKnownAt), at);
        return new LayerHistory(stationId, stationName, strand.shown, StabilityState.valueOf(standing.state().name()), standing.because(), standing.evidenceAt(),
                standing.evidenceAge());
    }

    /** Times of the reports of moderate or greater turbulence that lie near the layer as it was last seen. */
    private List<Instant> reports(Strand strand, Instant at, AsKnownAt asKnownAt) {
        var position = strand.ascent.positionAt(strand.last.minimumHeight());
        double base = strand.ascent.flightLevelAt(strand.last.extent().base());
        double top = strand.ascent.flightLevelAt(strand.last.extent().top());
        if (position == null || !Double.isFinite(position.latitude()) || !Double.isFinite(position.longitude()) || Double.isNaN(base) || Double.isNaN(top)) {
            return List.of();
        }
        return reports.near(at.minus(rule().reportMemory()), at.plusNanos(1000), position.latitude(), position.longitude(), REPORT_DISTANCE, asKnownAt).stream()
                .filter(report -> report.isModerateOrGreater() && !report.isExcluded() && report.flightLevel() != null
                        && report.flightLevel() >= base - REPORT_LEVELS && report.flightLevel() <= top + REPORT_LEVELS)
                .map(AirReport::observedAt).toList();
    }

    private static @Nullable Double known(double value) {
        return Double.isNaN(value) || Double.isInfinite(value) ? null : value;
    }
}
