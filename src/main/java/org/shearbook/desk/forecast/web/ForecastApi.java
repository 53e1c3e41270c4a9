package org.shearbook.desk.forecast.web;

import java.net.URI;
import java.time.Clock;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.forecast.EvidenceList;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.forecast.ForecastContent;
import org.shearbook.desk.forecast.ForecastDraft;
import org.shearbook.desk.forecast.ForecastId;
import org.shearbook.desk.forecast.ForecastRefused;
import org.shearbook.desk.forecast.MayNotDraft;
import org.shearbook.desk.forecast.StaleForecast;
import org.shearbook.desk.forecast.UnknownForecast;
import org.shearbook.desk.shell.Problem;
import org.shearbook.desk.staff.CurrentActor;
import org.shearbook.desk.staff.NotHoldingDesk;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpStatus;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.web.ErrorResponseException;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestHeader;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;

/** Forecasts for scripts. Acts are resources and need a signed-in person; a change names the version it was made to. */
@RestController
@RequestMapping("/api/v1/forecasts")
class ForecastApi {

    private static final Pattern ISSUED = Pattern.compile("\"(\\d{1,9})\"");
    private static final Pattern DRAFT = Pattern.compile("\"draft-(\\d{1,9})\"");
    private static final int MOST = 500;

    private final ForecastBook forecasts;
    private final EvidenceList evidence;
    private final CurrentActor actor;
    private final Clock clock;

    ForecastApi(ForecastBook forecasts, EvidenceList evidence, CurrentActor actor, Clock clock) {
        this.forecasts = forecasts;
        this.evidence = evidence;
        this.actor = actor;
        this.clock = clock;
    }

    @GetMapping
    ForecastDocument.Page list(@RequestParam(required = false) @Nullable Instant from, @RequestParam(required = false) @Nullable Instant until,
            @RequestParam(defaultValue = "0") int after, @RequestParam(defaultValue = "100") int limit, AsKnownAt asKnownAt) {
        int most = Math.max(1, Math.min(MOST, limit));
        List<Forecast> page = forecasts.page(from == null ? Instant.EPOCH : from, until == null ? AsKnownAt.now().moment() : until, after, most, asKnownAt);
        return new ForecastDocument.Page(page.stream().map(forecast -> ForecastDocument.of(forecast, at(asKnownAt))).toList(),
                page.size() == most ? page.get(page.size() - 1).number() : null);
    }

    @GetMapping("/{id}")
    ResponseEntity<Object> one(@PathVariable long id, AsKnownAt asKnownAt) {
        ForecastId forecast = new ForecastId(id);
        return forecasts.find(forecast, asKnownAt).map(found -> issued(HttpStatus.OK, found, asKnownAt))
                .or(() -> forecasts.openDraft(forecast, asKnownAt).map(draft -> draft(HttpStatus.OK, draft)))
                .orElseThrow(ForecastApi::nothingHere);
    }

    @GetMapping("/{id}/versions")
    List<ForecastDocument> versions(@PathVariable long id, AsKnownAt asKnownAt) {
        List<Forecast> versions = forecasts.versions(new ForecastId(id), asKnownAt);
        if (versions.isEmpty()) {
            throw nothingHere();
        }
        return versions.stream().map(version -> ForecastDocument.of(version, at(asKnownAt))).toList();
    }

    @PostMapping
    ResponseEntity<Object> draft(@RequestBody ForecastEntry entry) {
        ForecastDraft draft = forecasts.draft(actor.get(), entry.fields(evidence::find), Map.of());
        return draft(HttpStatus.CREATED, draft);
    }

    @PostMapping("/{id}/issues")
    ResponseEntity<Object> issue(@PathVariable long id, @RequestHeader(name = HttpHeaders.IF_MATCH, required = false) @Nullable String match) {
        return issued(HttpStatus.CREATED, forecasts.issue(actor.get(), new ForecastId(id), version(DRAFT, match, "\"draft-1\""), null), AsKnownAt.now());
    }

    @PostMapping("/{id}/amendments")
    ResponseEntity<Object> amend(@PathVariable long id, @RequestBody ForecastEntry entry,
            @RequestHeader(name = HttpHeaders.IF_MATCH, required = false) @Nullable String match) {
        int seen = version(ISSUED, match, "\"1\"");
        return issued(HttpStatus.CREATED, forecasts.amend(actor.get(), new ForecastId(id), seen, content(entry), reason(entry)), AsKnownAt.now());
    }

    @PostMapping("/{id}/corrections")
    ResponseEntity<Object> correct(@PathVariable long id, @RequestBody ForecastEntry entry,
            @RequestHeader(name = HttpHeaders.IF_MATCH, required = false) @Nullable String match) {
        int seen = version(ISSUED, match, "\"1\"");
        return issued(HttpStatus.CREATED, forecasts.correct(actor.get(), new ForecastId(id), seen, content(entry), reason(entry)), AsKnownAt.now());
    }

    @PostMapping("/{id}/cancellations")
    ResponseEntity<Object> cancel(@PathVariable long id, @RequestBody ForecastEntry entry,
            @RequestHeader(name = HttpHeaders.IF_MATCH, required = false) @Nullable String match) {
        int seen = version(ISSUED, match, "\"1\"");
        return issued(HttpStatus.CREATED, forecasts.cancel(actor.get(), new ForecastId(id), seen, reason(entry)), AsKnownAt.now());
    }

    private ForecastContent content(ForecastEntry entry) {
        return forecasts.read(entry.fields(evidence::find));
    }

    private static String reason(ForecastEntry entry) {
        return entry.reason() == null ? "" : entry.reason();
    }

    private ResponseEntity<Object> issued(HttpStatus status, Forecast forecast, AsKnownAt asKnownAt) {
        return ResponseEntity.status(status).location(URI.create("/api/v1/forecasts/" + forecast.id().value())).eTag("\"" + forecast.version() + "\"")
                .body(ForecastDocument.of(forecast, at(asKnownAt)));
    }

    private ResponseEntity<Object> draft(HttpStatus status, ForecastDraft draft) {
        return ResponseEntity.status(status).location(URI.create("/api/v1/forecasts/" + draft.id().value())).eTag("\"draft-" + draft.version() + "\"")
                .body(ForecastDocument.DraftDocument.of(forecasts.check(draft)));
    }

    private Instant at(AsKnownAt asKnownAt) {
        return asKnownAt.isNow() ? clock.instant() : asKnownAt.moment();
    }

    private static int version(Pattern form, @Nullable String match, String example) {
        if (match == null) {
            throw new ErrorResponseException(HttpStatus.PRECONDITION_REQUIRED, Problem.of(HttpStatus.PRECONDITION_REQUIRED, "IF_MATCH_MISSING",
                    "Say which version you saw: send its ETag as If-Match, for example %s.".formatted(example)), null);
        }
        Matcher version = form.matcher(match.strip());
        if (!version.matches()) {
            throw new ErrorResponseException(HttpStatus.PRECONDITION_FAILED, Problem.of(HttpStatus.PRECONDITION_FAILED, "VERSION_CHANGED",
                    "If-Match %s is not the ETag of what this act changes. Get the record again; its ETag looks like %s.".formatted(match, example)), null);
        }
        return Integer.parseInt(version.group(1));
    }

    private static ErrorResponseException nothingHere() {
        return new ErrorResponseException(HttpStatus.NOT_FOUND, Problem.of(HttpStatus.NOT_FOUND, "FORECAST_UNKNOWN",
                "There is no such forecast, or it was not known at that moment. The list is at /api/v1/forecasts."), null);
    }

    @ExceptionHandler
    ProblemDetail unknown(UnknownForecast gone) {
        return Problem.of(HttpStatus.NOT_FOUND, "FORECAST_UNKNOWN", gone.getMessage());
    }

    @ExceptionHandler
    ProblemDetail notHolding(NotHoldingDesk refused) {
        return Problem.of(HttpStatus.FORBIDDEN, "NOT_HOLDING_DESK", refused.getMessage());
    }

    @ExceptionHandler
    ProblemDetail mayNot(MayNotDraft refused) {
        return Problem.of(HttpStatus.FORBIDDEN, "MAY_NOT_DRAFT", refused.getMessage());
    }

    @ExceptionHandler
    ProblemDetail stale(StaleForecast stale) {
        return Problem.of(HttpStatus.PRECONDITION_FAILED, "VERSION_CHANGED", stale.getMessage(), Map.of("seen", stale.seen(), "current", stale.current()));
    }

    @ExceptionHandler
    ProblemDetail refused(ForecastRefused refused) {
        return Problem.of(HttpStatus.UNPROCESSABLE_CONTENT, "FORECAST_REFUSED", refused.getMessage(),
                Map.of("refusals", refused.refusals().stream().map(ForecastDocument.RefusalDocument::of).toList()));
    }
}
