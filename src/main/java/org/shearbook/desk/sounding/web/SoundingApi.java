package org.shearbook.desk.sounding.web;

import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.Moments;
import org.shearbook.desk.shell.Problem;
import org.shearbook.desk.sounding.LevelView;
import org.shearbook.desk.sounding.Sounding;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingHeader;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.desk.sounding.UnknownSounding;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.station.StationBook;
import org.shearbook.met.decode.Remark;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
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

/** Soundings for scripts, the newest first. */
@RestController
@RequestMapping("/api/v1/soundings")
class SoundingApi {

    private static final int LARGEST_PAGE = 1000;

    private final SoundingArchive archive;
    private final StationBook stations;

    SoundingApi(SoundingArchive archive, StationBook stations) {
        this.archive = archive;
        this.stations = stations;
    }

    /** @param next give it as {@code after} for the soundings that follow; null when these were the last */
    record Page(List<SoundingView> soundings, @Nullable Long next) {
    }

    record Finding(String flag, String text) {
    }

    record Whole(SoundingView sounding, List<Finding> flags, List<Remark> remarks) {
    }

    record Levels(long soundingId, int version, List<LevelView> levels) {
    }

    @GetMapping
    Page list(@RequestParam(defaultValue = "") String station, @RequestParam(required = false) @Nullable String from,
            @RequestParam(required = false) @Nullable String until, @RequestParam(defaultValue = "100") int limit,
            @RequestParam(required = false) @Nullable Long after, AsKnownAt asKnownAt) {
        if (limit < 1 || limit > LARGEST_PAGE) {
            throw new ErrorResponseException(HttpStatus.BAD_REQUEST, Problem.of(HttpStatus.BAD_REQUEST, "LIMIT_OUT_OF_RANGE",
                    "limit is 1 to %d; ask for the rest with after.".formatted(LARGEST_PAGE), Map.of("field", "limit")), null);
        }
        Instant start = Moments.read("from", from);
        Instant end = Moments.read("until", until);
        List<SoundingHeader> found = archive.newest(stationId(stations, station), start == null ? Moments.EARLIEST : start, end == null ? Moments.LATEST : end,
                after == null ? null : new SoundingId(after), asKnownAt, limit + 1);
        List<SoundingHeader> shown = found.size() > limit ? found.subList(0, limit) : found;
        return new Page(shown.stream().map(SoundingView::of).toList(), found.size() > limit ? shown.get(limit - 1).id().value() : null);
    }

    @GetMapping("/{id}")
    ResponseEntity<Whole> one(@PathVariable long id, AsKnownAt asKnownAt) {
        Sounding sounding = found(id, asKnownAt);
        return ResponseEntity.ok().eTag(tag(sounding)).body(new Whole(SoundingView.of(sounding.header()),
                sounding.soundingFlags().stream().map(one -> new Finding(one.flag().name(), one.text())).toList(), sounding.remarks()));
    }

    @GetMapping("/{id}/versions")
    List<SoundingView> versions(@PathVariable long id, AsKnownAt asKnownAt) {
        List<SoundingView> versions = archive.versions(new SoundingId(id), asKnownAt).stream().map(SoundingView::of).toList();
        if (versions.isEmpty()) {
            throw new UnknownSounding(new SoundingId(id));
        }
        return versions;
    }

    @GetMapping("/{id}/levels")
    ResponseEntity<Levels> levels(@PathVariable long id, AsKnownAt asKnownAt) {
        Sounding sounding = found(id, asKnownAt);
        return ResponseEntity.ok().eTag(tag(sounding)).body(new Levels(id, sounding.version(), sounding.levels().stream().map(LevelView::of).toList()));
    }

    @GetMapping(path = "/{id}/raw", produces = "text/plain;charset=UTF-8")
    ResponseEntity<String> raw(@PathVariable long id, AsKnownAt asKnownAt) {
        Sounding sounding = found(id, asKnownAt);
        return ResponseEntity.ok().eTag(tag(sounding)).header("X-Content-Type-Options", "nosniff").contentType(MediaType.parseMediaType("text/plain;charset=UTF-8"))
                .body(archive.raw(sounding.id(), sounding.version()));
    }

    private Sounding found(long id, AsKnownAt asKnownAt) {
        return archive.find(new SoundingId(id), asKnownAt).orElseThrow(() -> new UnknownSounding(new SoundingId(id)));
    }

    private static String tag(Sounding sounding) {
        return "\"%s-%d\"".formatted(sounding.id(), sounding.version());
    }

    /** The id of a station named by any of its identifiers; one that is not in the table has its own identifier as its id. */
    static @Nullable String stationId(StationBook stations, String named) {
        return named.isBlank() ? null : stations.find(named, AsKnownAt.now()).map(Station::id).orElse(named.strip().toUpperCase(java.util.Locale.ROOT));
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.NOT_FOUND)
    ProblemDetail unknown(UnknownSounding unknown) {
        return Problem.of(HttpStatus.NOT_FOUND, "SOUNDING_UNKNOWN", unknown.getMessage());
    }
}
