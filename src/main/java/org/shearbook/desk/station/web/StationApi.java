package org.shearbook.desk.station.web;

import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.Problem;
import org.shearbook.desk.staff.CurrentActor;
import org.shearbook.desk.station.Fix;
import org.shearbook.desk.station.ListRefused;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.station.StationBook;
import org.springframework.http.HttpStatus;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PutMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;

/** Stations and fixes for scripts. */
@RestController
@RequestMapping("/api/v1")
class StationApi {

    private static final int MOST = 1000;

    private final StationBook book;
    private final CurrentActor actor;

    StationApi(StationBook book, CurrentActor actor) {
        this.book = book;
        this.actor = actor;
    }

    @GetMapping("/stations")
    StationPage stations(@RequestParam(defaultValue = "") String after, @RequestParam(defaultValue = "100") int limit, AsKnownAt asKnownAt) {
        int most = Math.max(1, Math.min(limit, MOST));
        List<Station> all = book.all(asKnownAt).stream().filter(station -> station.id().compareTo(after) > 0).limit(most + 1L).toList();
        boolean more = all.size() > most;
        List<StationView> shown = all.stream().limit(most).map(StationView::of).toList();
        return new StationPage(shown, more ? shown.get(most - 1).id() : null);
    }

    @GetMapping("/fixes")
    FixPage fixes(@RequestParam(defaultValue = "") String identifier, @RequestParam(defaultValue = "0") int after,
            @RequestParam(defaultValue = "100") int limit, AsKnownAt asKnownAt) {
        if (!identifier.isBlank()) {
            return new FixPage(book.fixes(identifier, asKnownAt).stream().map(FixView::of).toList(), null);
        }
        int most = Math.max(1, Math.min(limit, MOST));
        List<Fix> found = book.fixes(Math.max(0, after), most + 1, asKnownAt);
        return new FixPage(found.stream().limit(most).map(FixView::of).toList(), found.size() > most ? Integer.toString(Math.max(0, after) + most) : null);
    }

    @PutMapping("/stations")
    StationBook.StationListResult keepStations(@RequestBody(required = false) byte @Nullable [] csv) {
        return book.keepStations(actor.get(), csv == null ? new byte[0] : csv);
    }

    @PutMapping("/fixes")
    FixListView keepFixes(@RequestParam(defaultValue = "fixes") String list, @RequestBody(required = false) byte @Nullable [] csv) {
        StationBook.FixListResult result = book.keepFixes(actor.get(), list, csv == null ? new byte[0] : csv);
        return new FixListView(result.list().name(), result.list().version(), result.list().fixCount(), result.leftOut());
    }

    @ExceptionHandler(ListRefused.class)
    ResponseEntity<ProblemDetail> refused(ListRefused refused) {
        ListRefused.LineRefusal first = refused.refusals().get(0);
        return ResponseEntity.unprocessableContent().body(Problem.of(HttpStatus.UNPROCESSABLE_CONTENT, "LIST_REFUSED",
                "Nothing was kept. Line " + first.line() + ": " + first.text(), Map.of("lines", refused.refusals())));
    }

    /** @param next give it as {@code after} for the stations that follow; null when these were the last */
    record StationPage(List<StationView> stations, @Nullable String next) {
    }

    record StationView(String id, String name, double latitudeDeg, double longitudeDeg, @Nullable Double elevationM, Set<String> identifiers,
            int version, Instant recordedAt) {

        static StationView of(Station station) {
            return new StationView(station.id(), station.name(), station.latitude(), station.longitude(), orNull(station.elevation()),
                    station.identifiers(), station.version(), station.recordedAt());
        }
    }

    /** @param next give it as {@code after} for the fixes that follow; null when these were the last */
    record FixPage(List<FixView> fixes, @Nullable String next) {
    }

    record FixView(String identifier, String kind, String name, double latitudeDeg, double longitudeDeg, @Nullable Double elevationM,
            @Nullable Double magneticVariationEastDeg) {

        static FixView of(Fix fix) {
            return new FixView(fix.identifier(), fix.kind(), fix.name(), fix.latitude(), fix.longitude(), orNull(fix.elevation()),
                    orNull(fix.magneticVariationEast()));
        }
    }

    record FixListView(String list, int version, int fixes, int leftOut) {
    }

    private static @Nullable Double orNull(double value) {
        return Double.isNaN(value) ? null : value;
    }
}
