package org.shearbook.desk.airreport.web;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.airreport.AirReport;
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.Frequency;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.NullPolicy;
import org.shearbook.met.decode.Remark;

/** An air-report as scripts read it: the decoded fields, what the desk added, and null for whatever is missing. */
record AirReportView(
        String kind, long id, int version, @Nullable String sourceId,
        ReportClass reportClass, NullPolicy nullPolicy, boolean urgent, @Nullable String aircraft,
        @Nullable String aircraftType, @Nullable String weightClass,
        Instant observedAt, Instant receivedAt, Instant recordedAt,
        PlaceView place, @Nullable Double flightLevel, List<LayerView> turbulence,
        @Nullable Intensity worstIntensity, @Nullable String worstIntensityBasis,
        @Nullable Double edrMean, @Nullable Double edrPeak, @Nullable Double gustMs,
        @Nullable Double windFromDeg, @Nullable Double windSpeedMs, @Nullable Double temperatureC,
        Cloud cloud, @Nullable String remark,
        String attribution, @Nullable String attributionReason, boolean excluded, @Nullable String excludedReason,
        List<Remark> remarks) {

    private static final double ZERO_CELSIUS = 273.15;

    static AirReportView of(AirReport report) {
        return new AirReportView("airReport", report.id().value(), report.version(), known(report.sourceId()),
                report.reportClass(), report.nullPolicy(), report.urgent(), null, known(report.aircraftType()), known(report.weightClass()),
                report.observedAt(), report.receivedAt(), report.recordedAt(), PlaceView.of(report), report.flightLevel(),
                report.turbulence().stream().map(LayerView::of).toList(), report.worstIntensity(), report.worstBasis(),
                report.edrMean(), report.edrPeak(), report.gust(), report.windFromDirection(), report.windSpeed(),
                report.temperature() == null ? null : Math.round((report.temperature() - ZERO_CELSIUS) * 1000) / 1000.0,
                report.cloud(), known(report.remark()), report.attribution().name(), report.attributionReason(),
                report.isExcluded(), report.excludedBecause(), report.remarks());
    }

    record PlaceView(String text, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg, @Nullable String resolvedBy, List<Candidate> candidates) {

        static PlaceView of(AirReport report) {
            return new PlaceView(report.place().text(), known(report.place().latitude()), known(report.place().longitude()),
                    known(report.place().resolvedBy()), report.place().candidates().stream()
                            .map(fix -> new Candidate(fix.identifier(), fix.kind(), fix.latitude(), fix.longitude())).toList());
        }
    }

    record Candidate(String identifier, String kind, double latitudeDeg, double longitudeDeg) {
    }

    record LayerView(@Nullable Intensity intensity, @Nullable Intensity intensityTo, @Nullable Frequency frequency, @Nullable String type,
            @Nullable Double baseFt, @Nullable Double topFt) {

        static LayerView of(TurbulenceLayer layer) {
            return new LayerView(layer.intensity(), layer.intensityTo(), layer.frequency(), known(layer.type()),
                    known(layer.baseFeet()), known(layer.topFeet()));
        }
    }

    private static @Nullable Double known(double value) {
        return Double.isFinite(value) ? value : null;
    }

    private static @Nullable String known(String text) {
        return text.isEmpty() ? null : text;
    }
}
