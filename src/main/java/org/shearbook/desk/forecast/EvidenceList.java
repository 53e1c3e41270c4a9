package org.shearbook.desk.forecast;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.shearbook.desk.airreport.AirReport;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.airreport.AirReportId;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.layer.Layer;
import org.shearbook.desk.layer.LayerBook;
import org.shearbook.desk.layer.LayerId;
import org.shearbook.desk.shell.Show;
import org.springframework.stereotype.Component;

/** What a forecast can rest on, as it is offered for ticking. */
@Component
public class EvidenceList {

    private static final Duration RECENT_REPORTS = Duration.ofHours(6);
    private static final Duration RECENT_LAYERS = Duration.ofHours(12);
    private static final int MOST = 40;

    private final LayerBook layers;
    private final AirReportArchive reports;
    private final Clock clock;
    private final Show show;

    EvidenceList(LayerBook layers, AirReportArchive reports, Clock clock, Show show) {
        this.layers = layers;
        this.reports = reports;
        this.clock = clock;
        this.show = show;
    }

    /** Layers, then reports, the newest first; smooth reports too, since they count as much. */
    public List<Evidence> recent() {
        Instant now = clock.instant();
        List<Evidence> recent = new ArrayList<>();
        layers.between(now.minus(RECENT_LAYERS), now.plus(Duration.ofMinutes(5)), AsKnownAt.now()).stream()
                .sorted(Comparator.comparing(Layer::observedAt).reversed()).limit(MOST).map(this::of).forEach(recent::add);
        reports.between(now.minus(RECENT_REPORTS), now.plus(Duration.ofMinutes(5)), AsKnownAt.now()).stream()
                .filter(report -> report.worstIntensity() != null)
                .sorted(Comparator.comparing(AirReport::observedAt).reversed()).limit(MOST).map(this::of).forEach(recent::add);
        return recent;
    }

    /** One thing by its reference, {@code AIR_REPORT 25}; empty when the desk does not keep it. */
    public Optional<Evidence> find(String reference) {
        return Evidence.read(reference + " -").flatMap(wanted -> find(wanted.kind(), wanted.id()));
    }

    private Optional<Evidence> find(Evidence.Kind kind, long id) {
        return switch (kind) {
            case AIR_REPORT -> reports.find(new AirReportId(id), AsKnownAt.now()).map(this::of);
            case LAYER -> layers.find(new LayerId(id), AsKnownAt.now()).map(this::of);
            case SOUNDING -> Optional.empty();
        };
    }

    Evidence of(Layer layer) {
        return new Evidence(Evidence.Kind.LAYER, layer.id().value(), "%s %s layer %s, Ri %s%s (%.0f m window)".formatted(layer.stationName(),
                show.utcWithDate(layer.observedAt()), layer.letter(), show.richardson(layer.minRichardson()),
                layer.minRichardsonFlightLevel() == null ? "" : " at " + show.flightLevel(layer.minRichardsonFlightLevel()), layer.window()));
    }

    private Evidence of(AirReport report) {
        List<String> words = new ArrayList<>();
        words.add("air-report " + show.utcWithDate(report.observedAt()));
        if (report.flightLevel() != null) {
            words.add(show.flightLevel(report.flightLevel()));
        }
        words.add(report.worstIntensity() == null ? "turbulence not reported" : report.worstIntensity().name());
        if (report.edrPeak() != null) {
            words.add("EDR " + show.edr(report.edrPeak()));
        }
        if (!Double.isNaN(report.place().latitude())) {
            words.add(show.position(report.place().latitude(), report.place().longitude()));
        }
        return new Evidence(Evidence.Kind.AIR_REPORT, report.id().value(), String.join(" ", words));
    }
}
