package org.shearbook.desk.airreport;

import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedAirReport.Frequency;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.FixLookup.Fix;
import org.shearbook.met.decode.Remark;
import tools.jackson.databind.json.JsonMapper;

/** The short lists of a report as JSON text in its row; null stands for the empty list. */
final class AirReportText {

    private static final JsonMapper JSON = JsonMapper.shared();

    private AirReportText() {
    }

    static @Nullable String ofTurbulence(List<TurbulenceLayer> layers) {
        return layers.isEmpty() ? null : JSON.writeValueAsString(layers.stream()
                .map(layer -> new Layer(layer.intensity(), layer.intensityTo(), layer.frequency(), layer.type(),
                        known(layer.baseFeet()), known(layer.topFeet()))).toList());
    }

    static List<TurbulenceLayer> toTurbulence(@Nullable String text) {
        return text == null ? List.of() : Arrays.stream(JSON.readValue(text, Layer[].class))
                .map(layer -> new TurbulenceLayer(layer.intensity, layer.intensityTo, layer.frequency, layer.type,
                        orNaN(layer.baseFt), orNaN(layer.topFt))).toList();
    }

    static @Nullable String ofCandidates(List<Fix> candidates) {
        return candidates.isEmpty() ? null : JSON.writeValueAsString(candidates.stream()
                .map(fix -> new Candidate(fix.identifier(), fix.kind(), fix.latitude(), fix.longitude(), known(fix.magneticVariationEast()))).toList());
    }

    static List<Fix> toCandidates(@Nullable String text) {
        return text == null ? List.of() : Arrays.stream(JSON.readValue(text, Candidate[].class))
                .map(fix -> new Fix(fix.identifier, fix.kind, fix.latitudeDeg, fix.longitudeDeg, orNaN(fix.variationEastDeg))).toList();
    }

    static @Nullable String ofRemarks(List<Remark> remarks, AircraftMask mask) {
        return remarks.isEmpty() ? null : JSON.writeValueAsString(remarks.stream()
                .map(remark -> new Remark(remark.line(), remark.column(), remark.code(), mask.over(remark.text()))).toList());
    }

    static List<Remark> toRemarks(@Nullable String text) {
        return text == null ? List.of() : List.of(JSON.readValue(text, Remark[].class));
    }

    private static @Nullable Double known(double value) {
        return Double.isFinite(value) ? value : null;
    }

    private static double orNaN(@Nullable Double value) {
        return value == null ? Double.NaN : value;
    }

    private record Layer(@Nullable Intensity intensity, @Nullable Intensity intensityTo, @Nullable Frequency frequency, String type,
            @Nullable Double baseFt, @Nullable Double topFt) {
    }

    private record Candidate(String identifier, String kind, double latitudeDeg, double longitudeDeg, @Nullable Double variationEastDeg) {
    }
}
