package org.shearbook.desk.layer.web;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.layer.Layer;

/** A layer as scripts read it: the names of the analysis document, and where and when it was found. */
record LayerView(
        long id, int version, boolean standing, long soundingId, int soundingVersion, String stationId, String stationName, String letter,
        double baseHeightM, double topHeightM, @Nullable Double baseFlightLevel, @Nullable Double topFlightLevel, double depthM,
        double minRichardson, double minRichardsonHeightM, @Nullable Double minRichardsonFlightLevel, @Nullable Double bulkRichardson, double windowM,
        double maxShearPerS, @Nullable Double shear1000FtKt, double windChangeMs, double shearDirectionDeg, double meanWindFromDeg, double meanWindMs,
        @Nullable Boolean saturated, String state, Rule rule, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg, List<String> remarks,
        Instant observedAt, Instant receivedAt, Instant recordedAt) {

    record Rule(@Nullable Double wavelengthM, @Nullable Double eFoldingMin, String basis) {
    }

    static LayerView of(Layer layer) {
        return new LayerView(layer.id().value(), layer.version(), layer.standing(), layer.soundingId().value(), layer.soundingVersion(),
                layer.stationId(), layer.stationName(), layer.letter(), layer.base(), layer.top(), layer.baseFlightLevel(), layer.topFlightLevel(), layer.depth(),
                layer.minRichardson(), layer.minRichardsonHeight(), layer.minRichardsonFlightLevel(), layer.bulkRichardson(), layer.window(),
                layer.maximumShear(), layer.shear1000FtKt(), layer.windChange(), layer.shearDirection(), layer.meanWindFromDirection(), layer.meanWind(),
                layer.saturated(), layer.state().inWords(),
                new Rule(layer.ruleWavelength(), layer.ruleEFoldingTime() == null ? null : Math.round(layer.ruleEFoldingTime() / 6) / 10.0, layer.ruleBasis()),
                layer.latitude(), layer.longitude(), layer.remarkCodes(), layer.observedAt(), layer.receivedAt(), layer.recordedAt());
    }
}
