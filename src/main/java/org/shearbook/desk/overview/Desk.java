package org.shearbook.desk.overview;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.airreport.AirReport;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.analysis.AnalysisBook;
import org.shearbook.desk.analysis.AnalysisSummary;
import org.shearbook.desk.analysis.StabilityState;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.forecast.Area;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.forecast.ForecastDraft;
import org.shearbook.desk.layer.LayerBook;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingHeader;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Gathers what the first screen shows. Nothing live is left out, whatever else there is. */
@Service
public class Desk {

    private static final int NEWEST_REPORTS = 10;
    private static final int MOST_STATIONS = 14;
    /** A station that sent nothing for a week is not part of the picture any more. */
    private static final Duration STATION_REMEMBERED = Duration.ofDays(7);

    private final ForecastBook forecasts;
    private final AirReportArchive reports;
    private final SoundingArchive soundings;
    private final AnalysisBook analyses;
    private final LayerBook layers;
    private final Clock clock;
    private final OverviewSettings settings;
    private final AscentRhythm rhythm;

    Desk(ForecastBook forecasts, AirReportArchive reports, SoundingArchive soundings, AnalysisBook analyses, LayerBook layers, Clock clock,
            OverviewSettings settings) {
        this.forecasts = forecasts;
        this.reports = reports;
        this.soundings = soundings;
        this.analyses = analyses;
        this.layers = layers;
        this.clock = clock;
        this.settings = settings;
        this.rhythm = new AscentRhythm(settings.ascentHours(), settings.ascentGrace());
    }

    /**
     * The first screen.
     *
     * @param at        the moment it is drawn for
     * @param actNow    what must be done now; usually empty
     * @param live      forecasts in force or issued, the first to end first
     * @param lastEnded the forecast that ended last; null when none ever did
     * @param stations  one row per station that sent a sounding in the last days
     * @param moreStations how many stations have no room here
     */
    public record Situation(Instant at, List<ActNow> actNow, List<Live> live, @Nullable Forecast lastEnded, List<StationRow> stations, int moreStations,
            List<AirReport> newestReports, List<ForecastDraft> drafts) {

        /** Whether nothing was ever taken in or issued: a desk on its first day. */
        public boolean isEmpty() {
            return live.isEmpty() && lastEnded == null && stations.isEmpty() && newestReports.isEmpty() && drafts.isEmpty();
        }
    }

    /**
     * One line of the act-now row.
     *
     * @param report   the severe or special report; null for a forecast
     * @param expiring the forecast that ends with nothing to follow; null for a report
     */
    public record ActNow(@Nullable AirReport report, @Nullable Forecast expiring) {
    }

    /**
     * A live forecast and the reports inside it by time, level and place, so far.
     *
     * @param yes   moderate or greater
     * @param light light
     * @param no    explicitly smooth
     */
    public record Live(Forecast forecast, int yes, int light, int no) {

        public String inside() {
            return "%d yes, %d light, %d no".formatted(yes, light, no);
        }
    }

    /**
     * The newest sounding of a station and what its analysis says now.
     *
     * @param analysis     null when it was not analysed
     * @param state        by the newest sounding, unknown once its evidence is too old
     * @param missingSince nominal hour of the first ascent that did not arrive; null when none is missing
     * @param nextDue      nominal hour of the next one
     */
    public record StationRow(SoundingHeader sounding, @Nullable AnalysisSummary analysis, StabilityState state, @Nullable Instant missingSince, Instant nextDue) {

        public Instant nominal() {
            return sounding.nominalAt() == null ? sounding.observedAt() : sounding.nominalAt();
        }
    }

    /** The first screen as it is, or as it was known at a moment. */
    @Transactional(readOnly = true)
    public Situation situation(AsKnownAt asKnownAt) {
        Instant at = asKnownAt.isNow() ? clock.instant() : asKnownAt.moment();
        Instant soon = at.plus(Duration.ofMinutes(5));
        List<Forecast> inForce = forecasts.inForce(at, asKnownAt);
        List<AirReport> recent = reports.between(earliest(inForce, at).isBefore(at.minus(settings.actNow())) ? earliest(inForce, at) : at.minus(settings.actNow()),
                soon, asKnownAt);
        List<StationRow> stations = stations(at, soon, asKnownAt);
        return new Situation(at, actNow(recent, inForce, at), inForce.stream().map(forecast -> live(forecast, recent)).toList(),
                forecasts.ended(at, null, 20, asKnownAt).stream().max(Comparator.comparing(Forecast::endsAt)).orElse(null),
                stations.subList(0, Math.min(MOST_STATIONS, stations.size())), Math.max(0, stations.size() - MOST_STATIONS),
                reports.newest(Instant.EPOCH, soon, null, asKnownAt, NEWEST_REPORTS), forecasts.openDrafts(asKnownAt));
    }

    private static Instant earliest(List<Forecast> inForce, Instant at) {
        return inForce.stream().map(forecast -> forecast.content().validFrom()).min(Comparator.naturalOrder()).orElse(at);
    }

    private List<ActNow> actNow(List<AirReport> recent, List<Forecast> inForce, Instant at) {
        List<ActNow> lines = new ArrayList<>();
        recent.stream()
                .filter(report -> !report.observedAt().isBefore(at.minus(settings.actNow())))
                .filter(report -> report.reportClass() == ReportClass.SPC || report.urgent()
                        || report.worstIntensity() != null && report.worstIntensity().compareTo(Intensity.SEV) >= 0)
                .filter(report -> !report.isExcluded())
                .sorted(Comparator.comparing(AirReport::receivedAt).reversed())
                .forEach(report -> lines.add(new ActNow(report, null)));
        inForce.stream()
                .filter(forecast -> forecast.standing(at) == Forecast.Standing.IN_FORCE
                        && forecast.content().validUntil().isBefore(at.plus(settings.expiresSoon())) && !isFollowed(forecast, inForce))
                .forEach(forecast -> lines.add(new ActNow(null, forecast)));
        return lines;
    }

    private static boolean isFollowed(Forecast ending, List<Forecast> inForce) {
        return inForce.stream().anyMatch(other -> !other.id().equals(ending.id()) && other.content().validUntil().isAfter(ending.content().validUntil())
                && other.content().baseFlightLevel() < ending.content().topFlightLevel() && ending.content().baseFlightLevel() < other.content().topFlightLevel()
                && Area.mayOverlap(other.content().area(), ending.content().area()));
    }

    private static Live live(Forecast forecast, List<AirReport> recent) {
        int yes = 0;
        int light = 0;
        int no = 0;
        for (AirReport report : recent) {
            if (report.isExcluded() || report.flightLevel() == null || report.worstIntensity() == null || !report.place().isResolved()
                    || !forecast.content().covers(report.place().latitude(), report.place().longitude(), report.flightLevel(), report.observedAt())) {
                continue;
            }
            switch (report.worstIntensity()) {
                case NIL -> no++;
                case LGT -> light++;
                default -> yes++;
            }
        }
        return new Live(forecast, yes, light, no);
    }

    private List<StationRow> stations(Instant at, Instant soon, AsKnownAt asKnownAt) {
        Map<String, SoundingHeader> newest = new LinkedHashMap<>();
        soundings.between(null, at.minus(STATION_REMEMBERED), soon, asKnownAt).stream().filter(SoundingHeader::isUsable)
                .sorted(Comparator.comparing(SoundingHeader::observedAt)).forEach(header -> newest.put(header.stationId(), header));
        Map<SoundingId, AnalysisSummary> summaries = analyses.summaries(newest.values().stream().map(SoundingHeader::id).toList(), asKnownAt);
        return newest.values().stream().map(header -> row(header, summaries.get(header.id()), at))
                .sorted(Comparator.comparing((StationRow row) -> row.sounding().stationName()).thenComparing(row -> row.sounding().stationId())).toList();
    }

    private StationRow row(SoundingHeader header, @Nullable AnalysisSummary summary, Instant at) {
        Instant nominal = header.nominalAt() == null ? header.observedAt() : header.nominalAt();
        StabilityState state = summary == null ? StabilityState.UNKNOWN : layers.stateAt(summary.state(), header.observedAt(), at);
        return new StationRow(header, summary, state, rhythm.missingSince(nominal, at), rhythm.nextAfter(at));
    }
}
