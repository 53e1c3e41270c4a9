package org.shearbook.desk.analysis.web;

import java.time.Clock;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.analysis.Analysis;
import org.shearbook.desk.analysis.AnalysisBook;
import org.shearbook.desk.analysis.AnalysisDocument;
import org.shearbook.desk.analysis.EnsembleRequest;
import org.shearbook.desk.analysis.WindowNotOffered;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.Problem;
import org.shearbook.desk.sounding.Sounding;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.desk.sounding.UnknownSounding;
import org.shearbook.met.decode.Rejection;
import org.springframework.http.HttpStatus;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.web.ErrorResponseException;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;

/** The analysis document: of a kept sounding, or of bytes that are not kept. */
@RestController
@RequestMapping("/api/v1")
class AnalysisApi {

    private final AnalysisBook analyses;
    private final SoundingArchive soundings;
    private final Clock clock;

    AnalysisApi(AnalysisBook analyses, SoundingArchive soundings, Clock clock) {
        this.analyses = analyses;
        this.soundings = soundings;
        this.clock = clock;
    }

    @GetMapping("/soundings/{id}/analysis")
    ResponseEntity<AnalysisDocument> ofSounding(@PathVariable long id, @RequestParam(required = false) @Nullable String windowM,
            @RequestParam(required = false) @Nullable Integer ensembleMembers, @RequestParam(defaultValue = "1") long seed, AsKnownAt asKnownAt) {
        double window = window(windowM);
        EnsembleRequest spread = spread(ensembleMembers, seed);
        SoundingId soundingId = new SoundingId(id);
        Analysis kept = analyses.of(soundingId, asKnownAt).orElseThrow(() -> new UnknownSounding(soundingId));
        Analysis asked = window == AnalysisBook.defaultWindow() && spread == null ? kept
                : analyses.compute(soundings.find(soundingId, asKnownAt).orElseThrow(() -> new UnknownSounding(soundingId)), window, spread);
        return ResponseEntity.ok().eTag("\"%d-%d-%s-%.0f%s\"".formatted(id, kept.version(), asked.summary().methodVersion(), window,
                spread == null ? "" : "-" + spread.members() + "-" + spread.seed())).body(document(asked));
    }

    @PostMapping("/profile-analyses")
    AnalysisDocument ofBytes(@RequestBody(required = false) byte @Nullable [] body, @RequestParam(required = false) @Nullable String windowM,
            @RequestParam(required = false) @Nullable Integer ensembleMembers, @RequestParam(defaultValue = "1") long seed) {
        double window = window(windowM);
        EnsembleRequest spread = spread(ensembleMembers, seed);
        SoundingArchive.Reading reading = soundings.read(body == null ? new byte[0] : body, clock.instant());
        List<Sounding> read = reading.soundings();
        if (read.size() > 1) {
            throw refused("MORE_THAN_ONE_SOUNDING", "There are %d soundings in this; send one at a time.".formatted(read.size()), Map.of("soundings", read.size()));
        }
        if (read.isEmpty()) {
            List<Rejection> rejected = reading.rejected();
            throw rejected.isEmpty()
                    ? refused("NO_SOUNDING", "There is no sounding in this: only other messages were found. Send a sounding.", Map.of())
                    : refused(rejected.get(0).code(), rejected.get(0).text(), Map.of("line", rejected.get(0).line(),
                            "rejected", rejected.stream().limit(20).map(one -> new RejectionView(one.line(), one.code(), one.text())).toList()));
        }
        return document(analyses.compute(read.get(0), window, spread));
    }

    record RejectionView(int line, String code, String text) {
    }

    private static AnalysisDocument document(Analysis analysis) {
        return analysis.result().orElseThrow(() -> refused("NOT_ANALYSED", "not analysed: " + analysis.summary().notAnalysed(), Map.of()));
    }

    private static ErrorResponseException refused(String code, String text, Map<String, Object> more) {
        return new ErrorResponseException(HttpStatus.UNPROCESSABLE_CONTENT, Problem.of(HttpStatus.UNPROCESSABLE_CONTENT, code, text, more), null);
    }

    private static @Nullable EnsembleRequest spread(@Nullable Integer members, long seed) {
        if (members == null) {
            return null;
        }
        if (members < 1 || members > EnsembleRequest.MOST_MEMBERS) {
            throw new ErrorResponseException(HttpStatus.BAD_REQUEST, Problem.of(HttpStatus.BAD_REQUEST, "ENSEMBLE_OUT_OF_RANGE",
                    "ensembleMembers is 1 to %d; leave it out for none.".formatted(EnsembleRequest.MOST_MEMBERS), Map.of("field", "ensembleMembers")), null);
        }
        return new EnsembleRequest(members, seed);
    }

    static double window(@Nullable String text) {
        if (text == null || text.isBlank()) {
            return AnalysisBook.defaultWindow();
        }
        try {
            double window = Double.parseDouble(text.strip());
            if (AnalysisBook.windows().contains(window)) {
                return window;
            }
        } catch (NumberFormatException noNumber) {
            throw new WindowNotOffered("\"" + text + "\"");
        }
        throw new WindowNotOffered(text.strip());
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.BAD_REQUEST)
    ProblemDetail window(WindowNotOffered refused) {
        return Problem.of(HttpStatus.BAD_REQUEST, "WINDOW_NOT_OFFERED", refused.getMessage(), Map.of("field", "windowM", "offered", AnalysisBook.windows()));
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.NOT_FOUND)
    ProblemDetail unknown(UnknownSounding unknown) {
        return Problem.of(HttpStatus.NOT_FOUND, "SOUNDING_UNKNOWN", unknown.getMessage());
    }
}
