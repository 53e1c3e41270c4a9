package org.shearbook.desk.intake.web;

import java.time.Instant;
import java.util.List;
import java.util.TreeSet;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.sounding.LevelView;
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.Remark;

/** One decoded message as scripts get it. */
sealed interface DecodedView {

    /** {@code sounding}, {@code wind} or {@code airReport}. */
    String kind();

    record Site(String id, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg, @Nullable Double elevationM) {
    }

    record Sounding(String kind, int line, Site station, @Nullable Instant nominalAt, @Nullable Instant launchedAt, List<String> parts, String correction,
            String sondeType, List<LevelView> levels, List<Remark> remarks) implements DecodedView {

        static Sounding of(DecodedSounding message, List<LevelView> levels) {
            boolean windOnly = !message.parts().isEmpty() && message.parts().stream().allMatch(part -> part.startsWith("PP"));
            return new Sounding(windOnly ? "wind" : "sounding", message.line(),
                    new Site(message.stationId(), orNull(message.latitude()), orNull(message.longitude()), orNull(message.elevation())),
                    message.nominalAt(), message.launchedAt(), List.copyOf(new TreeSet<>(message.parts())), message.correction(), message.sondeType(), levels,
                    message.remarks());
        }
    }

    record Candidate(String identifier, String kind, double latitudeDeg, double longitudeDeg, @Nullable Double magneticVariationEastDeg) {

        static Candidate of(FixLookup.Fix fix) {
            return new Candidate(fix.identifier(), fix.kind(), fix.latitude(), fix.longitude(), orNull(fix.magneticVariationEast()));
        }
    }

    record Place(String text, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg, String resolvedBy, List<Candidate> candidates) {
    }

    record Turbulence(@Nullable String intensity, @Nullable String intensityTo, @Nullable String frequency, String type, @Nullable Double baseFt,
            @Nullable Double topFt) {

        static Turbulence of(DecodedAirReport.TurbulenceLayer layer) {
            return new Turbulence(name(layer.intensity()), name(layer.intensityTo()), name(layer.frequency()), layer.type(), orNull(layer.baseFeet()),
                    orNull(layer.topFeet()));
        }
    }

    record AirReport(String kind, int line, String reportId, String reportClass, boolean urgent, String aircraft, String aircraftType, String weightClass,
            @Nullable Instant observedAt, Place place, @Nullable Double flightLevel, List<Turbulence> turbulence, @Nullable Double edrMean, @Nullable Double edrPeak,
            @Nullable Double gustMs, @Nullable Double windFromDeg, @Nullable Double windSpeedMs, @Nullable Double temperatureC, String cloud, String remark,
            List<Remark> remarks) implements DecodedView {

        static AirReport of(DecodedAirReport report) {
            DecodedAirReport.Place place = report.place();
            return new AirReport("airReport", report.line(), report.reportId(), report.reportClass().name(), report.urgent(), report.aircraft(), report.aircraftType(),
                    report.weightClass(), report.observedAt(), new Place(place.text(), orNull(place.latitude()), orNull(place.longitude()), place.resolvedBy(),
                            place.candidates().stream().map(Candidate::of).toList()), orNull(report.flightLevel()), report.turbulence().stream().map(Turbulence::of).toList(),
                    orNull(report.edrMean()), orNull(report.edrPeak()), orNull(report.gust()), orNull(report.windFromDirection()), orNull(report.windSpeed()),
                    orNull(report.temperature() - 273.15), report.cloud().name(), report.remark(), report.remarks());
        }
    }

    private static @Nullable Double orNull(double value) {
        return Double.isNaN(value) || Double.isInfinite(value) ? null : Math.round(value * 1e6) / 1e6;
    }

    private static @Nullable String name(@Nullable Enum<?> word) {
        return word == null ? null : word.name();
    }
}
