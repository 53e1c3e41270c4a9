package org.shearbook.desk.timeheight;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.airreport.AirReport;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.analysis.AnalysisBook;
import org.shearbook.desk.analysis.AnalysisColumn;
import org.shearbook.desk.analysis.AnalysisSummary;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.forecast.Area;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.forecast.ForecastId;
import org.shearbook.desk.shell.Moments;
import org.shearbook.desk.layer.LayerBook;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingHeader;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.station.StationBook;
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.profile.GreatCircle;
import org.shearbook.met.profile.Units;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Gathers what the display of one station shows from the rooms that keep it. */
@Service
public class TimeHeightDisplay {

    /** How far a report or forecast may lie from the station to be drawn [NM]; the display offers these. */
    public static final List<Integer> DISTANCES = List.of(60, 120, 240);

    public static final int USUAL_DISTANCE = 120;

    /** A release is about three quarters of an hour before the hour the ascent stands for: common practice, no source. */
    private static final Duration RELEASE_BEFORE_NOMINAL = Duration.ofMinutes(45);

    /** A column is drawn half an hour before and after the balloon, which takes at most three hours to its top. */
    private static final Duration LONGEST_ASCENT = Duration.ofHours(4);

    private static final Duration AHEAD = Duration.ofHours(12);
    private static final Set<ReportClass> INSTRUMENTS = Set.of(ReportClass.TRG, ReportClass.EDR, ReportClass.QAR);

    private final StationBook stations;
    private final SoundingArchive soundings;
    private final AnalysisBook analyses;
    private final ForecastBook forecasts;
    private final AirReportArchive reports;
    private final LayerBook layers;
    private final TimeHeightSettings settings;
    private final Clock clock;

    TimeHeightDisplay(StationBook stations, SoundingArchive soundings, AnalysisBook analyses, ForecastBook forecasts, AirReportArchive reports,
            LayerBook layers, TimeHeightSettings settings, Clock clock) {
        this.stations = stations;
        this.soundings = soundings;
        this.analyses = analyses;
        this.forecasts = forecasts;
        this.reports = reports;
        this.layers = layers;
        this.settings = settings;
        this.clock = clock;
    }

    @Transactional(readOnly = true)
    public List<Station> stations(AsKnownAt asKnownAt) {
        return stations.all(asKnownAt).stream().sorted(Comparator.comparing(Station::name)).toList();
    }

    /**
     * The station asked for, or the first by name.
     *
     * @return null when nothing was asked and no station is kept
     * @throws UnknownStation when there is none of this name
     */
    @Transactional(readOnly = true)
    public @Nullable Station station(@Nullable String asked, AsKnownAt asKnownAt) {
        if (asked == null || asked.isBlank()) {
            return stations(asKnownAt).stream().findFirst().orElse(null);
        }
        return stations.find(asked, asKnownAt).orElseThrow(() -> new UnknownStation(asked));
    }

    /**
     * The time a range or two moments mean.
     *
     * @param range {@code shift}, {@code 24h}, {@code 72h} or {@code whole}; blank when the moments say it
     * @throws TimeRefused when they can't be shown
     */
    @Transactional(readOnly = true)
    public TimeShown time(@Nullable String range, @Nullable Instant from, @Nullable Instant until, Station station, AsKnownAt asKnownAt) {
        Instant now = asKnownAt.isNow() ? clock.instant() : asKnownAt.moment();
        if (range == null || range.isBlank()) {
            if (from == null && until == null) {
                return TimeShown.day(now);
            }
            Instant start = from == null ? until.minus(Duration.ofHours(24)) : from;
            Instant end = until == null ? from.plus(Duration.ofHours(24)) : until;
            return checked(new TimeShown(start, end));
        }
        return switch (range) {
            case "shift" -> TimeShown.shift(now, settings.shifts());
            case "24h" -> TimeShown.day(now);
            case "72h" -> TimeShown.threeDays(now);
            case "whole" -> whole(station, now, asKnownAt);
            default -> throw new TimeRefused("range", "RANGE_UNKNOWN", "The range is shift, 24h, 72h or whole.");
        };
    }

    private TimeShown checked(TimeShown time) {
        if (!time.until().isAfter(time.from())) {
            throw new TimeRefused("until", "UNTIL_NOT_AFTER_FROM", "Until must be later than from. Exchange them, or move one of them.");
        }
        if (time.length().compareTo(settings.longest()) > 0) {
            throw new TimeRefused("from", "TOO_LONG", "One picture shows at most %d days. Move from or until closer.".formatted(settings.longest().toDays()));
        }
        return time;
    }

    /** All soundings of the station up to the newest, as far back as one picture reaches. */
    private TimeShown whole(Station station, Instant now, AsKnownAt asKnownAt) {
        List<SoundingHeader> newest = soundings.newest(station.id(), Moments.EARLIEST, Moments.LATEST, null, asKnownAt, 1);
        if (newest.isEmpty()) {
            return TimeShown.day(now);
        }
        Instant last = newest.get(0).observedAt();
        Instant earliest = last.minus(settings.longest()).plus(Duration.ofHours(24));
        List<SoundingHeader> all = soundings.between(station.id(), earliest, last.plusSeconds(1), asKnownAt);
        Instant from = (all.isEmpty() ? last : all.get(0).observedAt()).minus(Duration.ofHours(1));
        Instant until = now.isAfter(last) && Duration.between(from, now.plus(AHEAD)).compareTo(settings.longest()) <= 0 ? now.plus(AHEAD) : last.plus(AHEAD);
        return new TimeShown(from, until);
    }

    @Transactional(readOnly = true)
    public TimeHeight of(Station station, TimeShown time, int distance, AsKnownAt asKnownAt) {
        if (!DISTANCES.contains(distance)) {
            throw new TimeRefused("distanceNm", "DISTANCE_NOT_OFFERED", "Reports are shown within 60, 120 or 240 NM.");
        }
        List<TimeHeight.Column> columns = columns(station, time, asKnownAt);
        Map<ForecastId, List<Forecast>> versions = new LinkedHashMap<>();
        for (Forecast forecast : forecasts.between(time.from(), time.until(), asKnownAt)) {
            versions.computeIfAbsent(forecast.id(), id -> forecasts.versions(id, asKnownAt));
        }
        Area.Radius near = new Area.Radius(station.name(), station.latitude(), station.longitude(), distance);
        List<TimeHeight.Box> boxes = versions.values().stream().flatMap(all -> all.stream()
                .filter(version -> version.content().validFrom().isBefore(time.until()) && version.content().validUntil().isAfter(time.from()))
                .filter(version -> Area.mayOverlap(near, version.content().area()))
                .map(version -> box(version, all))).toList();

        List<TimeHeight.Report> drawn = new ArrayList<>();
        int hidden = 0;
        int unlevelled = 0;
        double widest = DISTANCES.get(DISTANCES.size() - 1) * Units.NAUTICAL_MILE;
        for (AirReport report : reports.near(time.from(), time.until(), station.latitude(), station.longitude(), widest, asKnownAt)) {
            if (report.worstIntensity() == null) {
                continue;
            }
            double away = GreatCircle.distance(station.latitude(), station.longitude(), report.place().latitude(), report.place().longitude())
                    / Units.NAUTICAL_MILE;
            Double level = levelOf(report);
            if (away > distance) {
                hidden++;
            } else if (level == null) {
                unlevelled++;
            } else {
                drawn.add(report(report, level, away, station, versions.values()));
            }
        }
        List<SoundingHeader> before = columns.isEmpty()
                ? soundings.newest(station.id(), Moments.EARLIEST, time.from(), null, asKnownAt, 1) : List.of();
        return new TimeHeight(
                new TimeHeight.Place(station.id(), station.name(), station.latitude(), station.longitude(),
                        Double.isNaN(station.elevation()) ? null : station.elevation()),
                time.from(), time.until(), asKnownAt.isNow() ? null : asKnownAt.moment(), AnalysisBook.defaultWindow(), distance, hidden, unlevelled,
                columns, boxes, drawn, before.isEmpty() ? null : nominalOf(before.get(0)));
    }

    private List<TimeHeight.Column> columns(Station station, TimeShown time, AsKnownAt asKnownAt) {
        List<SoundingHeader> found = soundings.between(station.id(), time.from().minus(layers.evidenceLasts()).minus(LONGEST_ASCENT),
                time.until().plus(RELEASE_BEFORE_NOMINAL), asKnownAt);
        List<SoundingId> ids = found.stream().map(SoundingHeader::id).toList();
        Map<SoundingId, AnalysisSummary> summaries = analyses.summaries(ids, asKnownAt);
        Map<SoundingId, AnalysisColumn> analysed = analyses.columns(ids, asKnownAt);
        // one ascent that came in two formats is two soundings; the one with the most levels is drawn
        Map<Instant, List<SoundingHeader>> ascents = found.stream().collect(Collectors.groupingBy(TimeHeightDisplay::nominalOf));
        Comparator<SoundingHeader> finest = Comparator.comparing((SoundingHeader header) -> analysed.containsKey(header.id()))
                .thenComparing(SoundingHeader::levelCount).thenComparing(header -> header.id().value()).reversed();
        return ascents.values().stream().map(same -> same.stream().sorted(finest).toList())
                .map(same -> column(same.get(0), summaries.get(same.get(0).id()), analysed.get(same.get(0).id()),
                        same.stream().skip(1).map(other -> other.id().value()).toList()))
                .filter(column -> column.carriedUntil().isAfter(time.from()))
                .sorted(Comparator.comparing(TimeHeight.Column::launchedAt)).toList();
    }

    private TimeHeight.Column column(SoundingHeader header, @Nullable AnalysisSummary summary, @Nullable AnalysisColumn analysed,
            List<Long> coarser) {
        Instant nominal = nominalOf(header);
        Instant launched = header.launchedAt() == null ? nominal.minus(RELEASE_BEFORE_NOMINAL) : header.launchedAt();
        Instant carriedUntil = nominal.plus(layers.evidenceLasts());
        String reason = summary == null ? "no analysis is kept" : summary.notAnalysed();
        if (reason == null && (analysed == null || analysed.size() < 2)) {
            reason = "fewer than two levels have a flight level";
        }
        if (reason != null) {
            return new TimeHeight.Column(header.id().value(), header.version(), nominal, launched, carriedUntil, reason, null, null, null, null, false, List.of(), coarser);
        }
        double start = launched.getEpochSecond() / 60.0;
        double[] minute = analysed.elapsed().clone();
        for (int k = 0; k < minute.length; k++) {
            minute[k] = start + minute[k] / 60;
        }
        ColumnLevels levels = new ColumnLevels(analysed.height(), analysed.flightLevel(), minute, analysed.richardson(), analysed.shear1000FtKt(), analysed.n2());
        return new TimeHeight.Column(header.id().value(), header.version(), nominal, launched, carriedUntil, null, levels.thinned(),
                summary.tropopauseFlightLevel(),
                summary.greatestWind() == null ? null : Units.metresPerSecondToKnots(summary.greatestWind()),
                summary.greatestWindFlightLevel(), summary.windAtTopOfData(), levels.lowestPerThousandFeet(), coarser);
    }

    private static Instant nominalOf(SoundingHeader header) {
        return header.nominalAt() == null ? header.observedAt() : header.nominalAt();
    }

    private static TimeHeight.Box box(Forecast forecast, List<Forecast> versions) {
        Instant replacedAt = versions.stream().filter(later -> later.version() == forecast.version() + 1).map(Forecast::recordedAt).findFirst().orElse(null);
        return new TimeHeight.Box(forecast.id().value(), forecast.number(), forecast.version(), forecast.name(), forecast.state().name(),
                replacedAt != null, forecast.state() == Forecast.State.CANCELLED, forecast.recordedAt(), replacedAt,
                forecast.content().intensity().name(), forecast.content().probabilityPercent(), forecast.content().validFrom(),
                forecast.content().validUntil(), forecast.content().baseFlightLevel(), forecast.content().topFlightLevel());
    }

    private static TimeHeight.Report report(AirReport report, double level, double away, Station station, Iterable<List<Forecast>> versions) {
        List<String> inside = new ArrayList<>();
        for (List<Forecast> all : versions) {
            all.stream().filter(version -> !version.recordedAt().isAfter(report.observedAt())).reduce((earlier, later) -> later)
                    .filter(version -> version.state() != Forecast.State.CANCELLED)
                    .filter(version -> version.content().covers(report.place().latitude(), report.place().longitude(), level, report.observedAt()))
                    .ifPresent(version -> inside.add(version.version() == 1 ? version.name() : version.name() + " v" + version.version()));
        }
        return new TimeHeight.Report(report.id().value(), report.version(), report.sourceId().isBlank() ? "no. " + report.id() : report.sourceId(),
                report.observedAt(), level, report.worstIntensity().name(), report.edrPeak(), report.reportClass().name(),
                INSTRUMENTS.contains(report.reportClass()) || report.edrPeak() != null,
                report.cloud() == Cloud.UNKNOWN ? null : report.cloud() == Cloud.IN_CLOUD, Math.rint(away * 10) / 10,
                Math.rint(GreatCircle.bearing(station.latitude(), station.longitude(), report.place().latitude(), report.place().longitude())),
                inside, report.isExcluded());
    }

    /** Its flight level, or the middle of the first layer it names [hundreds of feet]; null when it names neither. */
    static @Nullable Double levelOf(AirReport report) {
        if (report.flightLevel() != null) {
            return report.flightLevel();
        }
        for (TurbulenceLayer layer : report.turbulence()) {
            double base = Double.isNaN(layer.baseFeet()) ? layer.topFeet() : layer.baseFeet();
            double top = Double.isNaN(layer.topFeet()) ? layer.baseFeet() : layer.topFeet();
            if (!Double.isNaN(base)) {
                return (base + top) / 200;
            }
        }
        return null;
    }
}
