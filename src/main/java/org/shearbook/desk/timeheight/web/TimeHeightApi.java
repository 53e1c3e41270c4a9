package org.shearbook.desk.timeheight.web;

import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.Moments;
import org.shearbook.desk.shell.Problem;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.timeheight.TimeHeight;
import org.shearbook.desk.timeheight.TimeHeightDisplay;
import org.shearbook.desk.timeheight.TimeRefused;
import org.shearbook.desk.timeheight.UnknownStation;
import org.springframework.http.HttpStatus;
import org.springframework.http.ProblemDetail;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;

/** What the display draws, for scripts. The answer holds every quantity, so {@code shading} changes nothing in it yet. */
@RestController
@RequestMapping("/api/v1/time-height")
class TimeHeightApi {

    private final TimeHeightDisplay display;

    TimeHeightApi(TimeHeightDisplay display) {
        this.display = display;
    }

    /**
     * @param station any identifier of the station
     * @param range   {@code shift}, {@code 24h}, {@code 72h} or {@code whole}, in place of the two moments
     * @param shading {@code richardson}
     */
    @GetMapping
    TimeHeight timeHeight(@RequestParam String station, @RequestParam(required = false) @Nullable String from,
            @RequestParam(required = false) @Nullable String until, @RequestParam(required = false) @Nullable String range,
            @RequestParam(defaultValue = "richardson") String shading, @RequestParam(defaultValue = "" + TimeHeightDisplay.USUAL_DISTANCE) int distanceNm,
            AsKnownAt asKnownAt) {
        if (!shading.equals("richardson")) {
            throw new TimeRefused("shading", "SHADING_NOT_OFFERED", "The shading offered is richardson.");
        }
        Station found = display.station(station, asKnownAt);
        if (found == null) {
            throw new UnknownStation(station);
        }
        return display.of(found, display.time(range, Moments.read("from", from), Moments.read("until", until), found, asKnownAt), distanceNm, asKnownAt);
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.NOT_FOUND)
    ProblemDetail unknown(UnknownStation unknown) {
        return Problem.of(HttpStatus.NOT_FOUND, "STATION_UNKNOWN", unknown.getMessage(), Map.of("field", "station"));
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.BAD_REQUEST)
    ProblemDetail refused(TimeRefused refused) {
        return Problem.of(HttpStatus.BAD_REQUEST, refused.code(), refused.getMessage(), Map.of("field", refused.field()));
    }
}
