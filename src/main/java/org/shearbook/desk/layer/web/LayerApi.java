package org.shearbook.desk.layer.web;

import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.layer.Layer;
import org.shearbook.desk.layer.LayerBook;
import org.shearbook.desk.layer.LayerId;
import org.shearbook.desk.layer.UnknownLayer;
import org.shearbook.desk.shell.Moments;
import org.shearbook.desk.shell.Problem;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.station.StationBook;
import org.springframework.http.HttpStatus;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.web.ErrorResponseException;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;

/** Shear layers for scripts, the newest first. */
@RestController
@RequestMapping("/api/v1/layers")
class LayerApi {

    private static final int LARGEST_PAGE = 1000;

    private final LayerBook layers;
    private final StationBook stations;

    LayerApi(LayerBook layers, StationBook stations) {
        this.layers = layers;
        this.stations = stations;
    }

    /** @param next give it as {@code after} for the layers that follow; null when these were the last */
    record Page(List<LayerView> layers, @Nullable Long next) {
    }

    @GetMapping
    Page list(@RequestParam(required = false) @Nullable String station, @RequestParam(required = false) @Nullable String from,
            @RequestParam(required = false) @Nullable String until, @RequestParam(defaultValue = "100") int limit,
            @RequestParam(required = false) @Nullable Long after, AsKnownAt asKnownAt) {
        if (limit < 1 || limit > LARGEST_PAGE) {
            throw new ErrorResponseException(HttpStatus.BAD_REQUEST, Problem.of(HttpStatus.BAD_REQUEST, "LIMIT_OUT_OF_RANGE",
                    "limit is 1 to %d; ask for the rest with after.".formatted(LARGEST_PAGE), Map.of("field", "limit")), null);
        }
        Instant start = Moments.read("from", from);
        Instant end = Moments.read("until", until);
        // A sounding of a station nobody listed is kept under the identifier of its message.
        String stationId = station == null || station.isBlank() ? null : stations.find(station, asKnownAt).map(Station::id).orElse(station.strip());
        List<Layer> found = layers.newest(stationId, start == null ? Moments.EARLIEST : start, end == null ? Moments.LATEST : end,
                after == null ? null : new LayerId(after), asKnownAt, limit + 1);
        List<Layer> shown = found.size() > limit ? found.subList(0, limit) : found;
        return new Page(shown.stream().map(LayerView::of).toList(), found.size() > limit ? shown.get(limit - 1).id().value() : null);
    }

    @GetMapping("/{id}")
    ResponseEntity<LayerView> one(@PathVariable long id, AsKnownAt asKnownAt) {
        Layer layer = layers.find(new LayerId(id), asKnownAt).orElseThrow(() -> new UnknownLayer(new LayerId(id)));
        return ResponseEntity.ok().eTag("\"%d-%d\"".formatted(id, layer.version())).body(LayerView.of(layer));
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.NOT_FOUND)
    ProblemDetail unknown(UnknownLayer unknown) {
        return Problem.of(HttpStatus.NOT_FOUND, "LAYER_UNKNOWN", unknown.getMessage());
    }
}
