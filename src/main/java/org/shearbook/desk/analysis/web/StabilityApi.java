package org.shearbook.desk.analysis.web;

import java.io.IOException;
import java.io.InputStream;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.taylorgoldstein.Mode;
import org.shearbook.met.taylorgoldstein.SearchSettings;
import org.shearbook.met.taylorgoldstein.StabilityAnalysis;
import org.shearbook.met.taylorgoldstein.StabilityResult;
import org.springframework.http.HttpStatus;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RestController;

/** The growing waves of a profile taken as given; nothing is kept. */
@RestController
@RequestMapping("/api/v1/stability-analyses")
class StabilityApi {

    private final StabilityAnalysis analysis = new StabilityAnalysis(SearchSettings.forLevels());

    /**
     * @param complete whether every counted wave was found and the flow is one the method covers; the remarks say what is missing
     * @param fastest  null where nothing grows
     */
    record Answer(List<Wave> modes, @Nullable Wave fastest, MilesHowardView milesHoward, boolean complete, List<String> remarks) {
    }

    record Wave(double azimuthDeg, double wavenumberPerM, double growthRatePerS, double phaseSpeedMs, @Nullable Double criticalHeightM, @Nullable Double residual,
            boolean converged, @Nullable String reason) {

        static Wave of(Mode mode) {
            return new Wave(mode.azimuth(), mode.horizontalWavenumber(), mode.growthRate(), mode.phaseSpeed(),
                    mode.criticalHeights().isEmpty() ? null : mode.criticalHeights().get(0), finite(mode.residual()), mode.converged(),
                    mode.converged() ? null : mode.reason());
        }
    }

    /** @param minRichardson null where it is without bounds, as where the wind is constant */
    record MilesHowardView(@Nullable Double minRichardson, boolean stableByTheorem) {
    }

    @PostMapping
    Answer find(InputStream body) throws IOException {
        StabilityRequest asked = StabilityRequest.read(body.readNBytes(StabilityRequest.MOST_BYTES + 1));
        StabilityResult found;
        try {
            found = analysis.ofLevels(asked.height(), asked.eastward(), asked.northward(), asked.buoyancyFrequencySquared(), asked.smoothing(), asked.azimuths(),
                    asked.wavenumbers(), asked.lower(), asked.upper());
        } catch (IllegalArgumentException impossible) {
            throw StabilityRequest.refused(HttpStatus.UNPROCESSABLE_CONTENT, "NOT_ANALYSED", String.valueOf(impossible.getMessage()), Map.of());
        }
        return new Answer(found.modes().stream().map(Wave::of).toList(), found.fastest().map(Wave::of).orElse(null),
                new MilesHowardView(finite(found.milesHoward().minRichardson()), found.milesHoward().stableByTheorem()), found.complete(), found.remarks());
    }

    private static @Nullable Double finite(double value) {
        return Double.isFinite(value) ? value : null;
    }
}
