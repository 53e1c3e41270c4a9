package org.shearbook.desk.airreport.web;

import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.airreport.AirReport;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.airreport.AirReportId;
import org.shearbook.desk.airreport.UnknownAirReport;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.Moments;
import org.shearbook.desk.shell.Problem;
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

/** Air-reports for scripts, the newest first. */
@RestController
@RequestMapping("/api/v1/air-reports")
class AirReportApi {

    private static final int LARGEST_PAGE = 1000;

    private final AirReportArchive archive;
    private final StationBook stations;

    AirReportApi(AirReportArchive archive, StationBook stations) {
        this.archive = archive;
        this.stations = stations;
    }

    /** @param next give it as {@code after} for the reports that follow; null when these were the last */
    record Page(List<AirReportView> airReports, @Nullable Long next) {
    }

    @GetMapping
    Page list(@RequestParam(required = false) @Nullable String from, @RequestParam(required = false) @Nullable String until,
            @RequestParam(required = false) @Nullable String station, @RequestParam(required = false) @Nullable String distanceNm,
            @RequestParam(defaultValue = "100") int limit, @RequestParam(required = false) @Nullable Long after, AsKnownAt asKnownAt) {
        if (limit < 1 || limit > LARGEST_PAGE) {
            throw new ErrorResponseException(HttpStatus.BAD_REQUEST, Problem.of(HttpStatus.BAD_REQUEST, "LIMIT_OUT_OF_RANGE",
                    "limit is 1 to %d; ask for the rest with after.".formatted(LARGEST_PAGE), Map.of("field", "limit")), null);
        }
        Instant first = Moments.read("from", from);
        Instant end = Moments.read("until", until);
        Instant start = first == null ? Moments.EARLIEST : first;
        Instant before = end == null ? Moments.LATEST : end;
        AirReportId last = after == null ? null : new AirReportId(after);
        NearStation near = NearStation.read(station, distanceNm, stations, asKnownAt);
        List<AirReport> found = near == null ? archive.newest(start, before, last, asKnownAt, limit + 1)
                : archive.newestNear(near.station().latitude(), near.station().longitude(), near.distance(), start, before, last, asKnownAt, limit + 1);
        List<AirReport> shown = found.size() > limit ? found.subList(0, limit) : found;
        return new Page(shown.stream().map(AirReportView::of).toList(), found.size() > limit ? shown.get(limit - 1).id().value() : null);
    }

    @GetMapping("/{id}")
    ResponseEntity<AirReportView> one(@PathVariable long id, AsKnownAt asKnownAt) {
        AirReport report = archive.find(new AirReportId(id), asKnownAt).orElseThrow(() -> new UnknownAirReport(new AirReportId(id)));
        return ResponseEntity.ok().eTag("\"%d-%d\"".formatted(id, report.version())).body(AirReportView.of(report));
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.BAD_REQUEST)
    ProblemDetail refused(NearStation.Refused refused) {
        return Problem.of(HttpStatus.BAD_REQUEST, "STATION_FILTER_REFUSED", String.valueOf(refused.getMessage()), Map.of("field", refused.field()));
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.NOT_FOUND)
    ProblemDetail unknown(UnknownAirReport unknown) {
        return Problem.of(HttpStatus.NOT_FOUND, "AIR_REPORT_UNKNOWN", unknown.getMessage());
    }
}
