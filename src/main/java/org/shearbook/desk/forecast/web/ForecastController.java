package org.shearbook.desk.forecast.web;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.time.Clock;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.forecast.DraftFields;
import org.shearbook.desk.forecast.Evidence;
import org.shearbook.desk.forecast.EvidenceList;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.forecast.ForecastDraft;
import org.shearbook.desk.forecast.ForecastDraft.Purpose;
import org.shearbook.desk.forecast.ForecastId;
import org.shearbook.desk.forecast.ForecastRefused;
import org.shearbook.desk.forecast.MayNotDraft;
import org.shearbook.desk.forecast.LayerPrefill;
import org.shearbook.desk.forecast.Movement;
import org.shearbook.desk.forecast.Refusal;
import org.shearbook.desk.forecast.StaleForecast;
import org.shearbook.desk.forecast.UnknownForecast;
import org.shearbook.desk.staff.CurrentActor;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.NotHoldingDesk;
import org.shearbook.desk.staff.Person;
import org.shearbook.desk.staff.PersonBook;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.util.MultiValueMap;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.server.ResponseStatusException;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** The pages Shear-layer Forecasts: what is in force, the drafts, the form, the check page, one forecast with all its versions. */
@Controller
class ForecastController {

    private static final int ENDED_PER_PAGE = 25;
    private static final LayerPrefill.Filled NOTHING = new LayerPrefill.Filled(Map.of(), "");

    private final ForecastBook forecasts;
    private final EvidenceList evidence;
    private final LayerPrefill prefill;
    private final DeskHoldingBook holdings;
    private final PersonBook people;
    private final CurrentActor actor;
    private final Clock clock;

    ForecastController(ForecastBook forecasts, EvidenceList evidence, LayerPrefill prefill, DeskHoldingBook holdings, PersonBook people, CurrentActor actor, Clock clock) {
        this.forecasts = forecasts;
        this.evidence = evidence;
        this.prefill = prefill;
        this.holdings = holdings;
        this.people = people;
        this.actor = actor;
        this.clock = clock;
    }

    @GetMapping("/forecasts")
    String list(@RequestParam(required = false) @Nullable Integer below, AsKnownAt asKnownAt, Model model) {
        Instant at = asKnownAt.isNow() ? clock.instant() : asKnownAt.moment();
        List<Forecast> ended = forecasts.ended(at, below, ENDED_PER_PAGE, asKnownAt);
        model.addAttribute("now", at);
        model.addAttribute("live", forecasts.inForce(at, asKnownAt));
        model.addAttribute("drafts", forecasts.openDrafts(asKnownAt));
        model.addAttribute("ended", ended);
        model.addAttribute("older", ended.size() == ENDED_PER_PAGE ? ended.get(ended.size() - 1).number() : null);
        addWhoMay(model);
        return "forecast/list";
    }

    @GetMapping("/forecasts/new")
    String blank(@RequestParam(required = false) @Nullable Long layer, Model model) {
        LayerPrefill.Filled filled = layer == null ? NOTHING : prefill.of(layer).orElse(NOTHING);
        model.addAttribute("layer", filled == NOTHING ? null : layer);
        if (layer != null && filled == NOTHING) {
            model.addAttribute("refused", "There is no layer %d; the form is empty.".formatted(layer));
        }
        Map<String, String> marks = new LinkedHashMap<>();
        filled.fields().keySet().forEach(field -> marks.put(field, filled.from()));
        return form(model, new DraftForm(null, 0, Purpose.NEW, null, "", filled.fields(), marks, List.of(), null, null, offered(filled.fields()),
                Evidence.lines(filled.fields().getOrDefault(DraftFields.EVIDENCE, "")), null));
    }

    @PostMapping("/forecasts")
    String begin(@RequestParam MultiValueMap<String, String> posted, @RequestParam(defaultValue = "save") String act,
            @RequestParam(required = false) @Nullable Long layer, Model model, RedirectAttributes said) {
        LayerPrefill.Filled filled = layer == null ? NOTHING : prefill.of(layer).orElse(NOTHING);
        Map<String, String> fields = fields(posted, Evidence.lines(filled.fields().getOrDefault(DraftFields.EVIDENCE, "")));
        Map<String, String> untouched = new LinkedHashMap<>();
        filled.fields().forEach((field, text) -> {
            if (text.equals(fields.get(field))) {
                untouched.put(field, filled.from());
            }
        });
        try {
            ForecastDraft draft = forecasts.draft(actor.get(), fields, untouched);
            return next(draft, act, said);
        } catch (ForecastRefused refused) {
            model.addAttribute("layer", layer);
            return form(model, new DraftForm(null, 0, Purpose.NEW, null, "", fields, untouched, refused.refusals(), null, null,
                    offered(fields), Evidence.lines(fields.getOrDefault(DraftFields.EVIDENCE, "")), null));
        }
    }

    @GetMapping("/forecasts/{id}")
    String show(@PathVariable long id, AsKnownAt asKnownAt, Model model) {
        List<Forecast> versions = new ArrayList<>(forecasts.versions(new ForecastId(id), asKnownAt));
        if (versions.isEmpty()) {
            forecasts.openDraft(new ForecastId(id), asKnownAt).orElseThrow(ForecastController::nothingHere);
            return "redirect:/forecasts/" + id + "/draft";
        }
        Collections.reverse(versions);
        model.addAttribute("now", asKnownAt.isNow() ? clock.instant() : asKnownAt.moment());
        model.addAttribute("forecast", versions.get(0));
        model.addAttribute("versions", versions);
        model.addAttribute("draft", forecasts.openDraft(new ForecastId(id), asKnownAt).orElse(null));
        addWhoMay(model);
        return "forecast/forecast";
    }

    @GetMapping("/forecasts/{id}/draft")
    String draft(@PathVariable long id, @RequestParam(required = false) @Nullable String checked, Model model) {
        ForecastDraft draft = forecasts.openDraft(new ForecastId(id), AsKnownAt.now()).orElseThrow(ForecastController::nothingHere);
        ForecastBook.Check check = forecasts.check(draft);
        Integer basedOn = check.standing() == null ? null : Integer.valueOf(check.standing().version());
        return form(model, new DraftForm(id, draft.version(), draft.purpose(), basedOn, draft.reason(), draft.fields(), draft.prefilled(),
                checked == null ? List.of() : check.refusals(), check.text(), check.standing(), offered(draft.fields()),
                Evidence.lines(draft.fields().getOrDefault(DraftFields.EVIDENCE, "")), null));
    }

    @GetMapping("/forecasts/{id}/amend")
    String amend(@PathVariable long id, Model model, RedirectAttributes said) {
        return change(id, Purpose.AMENDMENT, model, said);
    }

    @GetMapping("/forecasts/{id}/correct")
    String correct(@PathVariable long id, Model model, RedirectAttributes said) {
        return change(id, Purpose.CORRECTION, model, said);
    }

    private String change(long id, Purpose purpose, Model model, RedirectAttributes said) {
        Forecast standing = forecasts.find(new ForecastId(id), AsKnownAt.now()).orElseThrow(ForecastController::nothingHere);
        Optional<ForecastDraft> open = forecasts.openDraft(new ForecastId(id), AsKnownAt.now());
        if (open.isPresent()) {
            if (open.get().purpose() != purpose) {
                said.addFlashAttribute("refused", "There is an open draft of another kind for this forecast. File or discard it first.");
            }
            return "redirect:/forecasts/" + id + "/draft";
        }
        Map<String, String> fields = DraftFields.of(standing.content());
        return form(model, new DraftForm(id, 0, purpose, standing.version(), "", fields, Map.of(), List.of(), null, standing, offered(fields),
                Evidence.lines(fields.getOrDefault(DraftFields.EVIDENCE, "")), null));
    }

    @PostMapping("/forecasts/{id}/draft")
    String revise(@PathVariable long id, @RequestParam int seen, @RequestParam Purpose purpose, @RequestParam(required = false) @Nullable Integer basedOn,
            @RequestParam(defaultValue = "") String reason, @RequestParam(defaultValue = "save") String act, @RequestParam MultiValueMap<String, String> posted,
            Model model, RedirectAttributes said, HttpServletResponse response) {
        ForecastId forecast = new ForecastId(id);
        if (act.equals("discard")) {
            return discard(forecast, seen, purpose, said);
        }
        ForecastDraft stored = forecasts.openDraft(forecast, AsKnownAt.now()).orElse(null);
        Forecast standing = purpose == Purpose.NEW ? null : forecasts.find(forecast, AsKnownAt.now()).orElseThrow(ForecastController::nothingHere);
        Map<String, String> known = stored != null ? stored.fields() : standing != null ? DraftFields.of(standing.content()) : Map.of();
        Map<String, String> fields = fields(posted, Evidence.lines(known.getOrDefault(DraftFields.EVIDENCE, "")));
        Map<String, String> untouched = new LinkedHashMap<>(stored == null ? Map.of() : stored.prefilled());
        untouched.keySet().removeIf(field -> !Objects.equals(fields.get(field), stored.fields().get(field)));
        try {
            return next(forecasts.revise(actor.get(), forecast, seen, purpose, basedOn, fields, untouched, reason), act, said);
        } catch (ForecastRefused refused) {
            return form(model, new DraftForm(id, seen, purpose, basedOn, reason, fields, untouched, refused.refusals(), null, standing, offered(fields),
                    Evidence.lines(fields.getOrDefault(DraftFields.EVIDENCE, "")), null));
        } catch (StaleForecast stale) {
            response.setStatus(HttpStatus.CONFLICT.value());
            ForecastDraft theirs = forecasts.openDraft(forecast, AsKnownAt.now()).orElse(null);
            if (theirs == null) {
                said.addFlashAttribute("refused", "This draft was filed or discarded while you wrote. Open the forecast to see what stands.");
                response.setStatus(HttpStatus.OK.value());
                return "redirect:/forecasts";
            }
            DraftForm.Conflict conflict = conflict(theirs, fields, reason);
            return form(model, new DraftForm(id, theirs.version(), theirs.purpose(), theirs.basedOn(), reason, fields, Map.of(),
                    List.of(new Refusal("conflict", "STALE", stale.getMessage(), "Your text is still in the form; saving again puts it in place of the other.")),
                    null, standing, offered(fields), Evidence.lines(fields.getOrDefault(DraftFields.EVIDENCE, "")), conflict));
        }
    }

    private DraftForm.Conflict conflict(ForecastDraft theirs, Map<String, String> mine, String reason) {
        List<DraftForm.Row> rows = new ArrayList<>();
        for (String name : DraftFields.ALL) {
            String theirText = theirs.fields().getOrDefault(name, "");
            String myText = mine.getOrDefault(name, "").strip();
            if (!theirText.equals(myText)) {
                rows.add(new DraftForm.Row(name, theirText, myText));
            }
        }
        if (!theirs.reason().equals(reason.strip())) {
            rows.add(new DraftForm.Row("reason", theirs.reason(), reason.strip()));
        }
        return new DraftForm.Conflict(theirs.author(), theirs.recordedAt(), rows, forecasts.check(theirs).text());
    }

    private String discard(ForecastId id, int seen, Purpose purpose, RedirectAttributes said) {
        if (seen > 0) {
            try {
                forecasts.discard(actor.get(), id, seen);
                said.addFlashAttribute("done", "The draft is discarded.");
            } catch (StaleForecast stale) {
                said.addFlashAttribute("refused", stale.getMessage());
                return "redirect:/forecasts/" + id.value() + "/draft";
            }
        }
        return purpose == Purpose.NEW ? "redirect:/forecasts" : "redirect:/forecasts/" + id.value();
    }

    private String next(ForecastDraft draft, String act, RedirectAttributes said) {
        if (!act.equals("check")) {
            said.addFlashAttribute("done", "Draft saved, version " + draft.version() + ".");
            return "redirect:/forecasts/" + draft.id().value() + "/draft";
        }
        return "redirect:/forecasts/" + draft.id().value() + (forecasts.check(draft).text() == null ? "/draft?checked=yes" : "/check");
    }

    @GetMapping("/forecasts/{id}/check")
    String check(@PathVariable long id, Model model) {
        ForecastDraft draft = forecasts.openDraft(new ForecastId(id), AsKnownAt.now()).orElseThrow(ForecastController::nothingHere);
        ForecastBook.Check check = forecasts.check(draft);
        if (check.text() == null) {
            return "redirect:/forecasts/" + id + "/draft?checked=yes";
        }
        model.addAttribute("check", check);
        model.addAttribute("secondLook", check.content() == null || check.content().secondLookBy() == null ? null
                : people.find(check.content().secondLookBy(), AsKnownAt.now()).map(Person::displayName).orElse(check.content().secondLookBy()));
        model.addAttribute("difference", check.standing() == null ? List.of() : TextDifference.between(check.standing().text(), check.text()));
        addWhoMay(model);
        return "forecast/check";
    }

    @PostMapping("/forecasts/{id}/issues")
    String issue(@PathVariable long id, @RequestParam int seen, @RequestParam int number, RedirectAttributes said) {
        try {
            Forecast filed = forecasts.issue(actor.get(), new ForecastId(id), seen, number);
            said.addFlashAttribute("done", "%s version %d is %s.".formatted(filed.name(), filed.version(), filed.state().name().toLowerCase(Locale.ROOT)));
            return "redirect:/forecasts/" + id;
        } catch (StaleForecast stale) {
            said.addFlashAttribute("refused", stale.getMessage() + " Nothing was filed. This is the text as it would be filed now.");
            return "redirect:/forecasts/" + id + "/check";
        } catch (ForecastRefused refused) {
            said.addFlashAttribute("refused", "Nothing was filed.");
            return "redirect:/forecasts/" + id + "/draft?checked=yes";
        } catch (NotHoldingDesk refused) {
            said.addFlashAttribute("refused", refused.getMessage() + " Nothing was filed; the draft is kept.");
            return "redirect:/forecasts/" + id + "/check";
        } catch (UnknownForecast gone) {
            said.addFlashAttribute("refused", gone.getMessage());
            return "redirect:/forecasts/" + (forecasts.find(new ForecastId(id), AsKnownAt.now()).isPresent() ? id : "");
        }
    }

    @GetMapping("/forecasts/{id}/cancel")
    String cancelling(@PathVariable long id, @RequestParam(required = false) @Nullable Integer saw, Model model) {
        Forecast standing = forecasts.find(new ForecastId(id), AsKnownAt.now()).orElseThrow(ForecastController::nothingHere);
        model.addAttribute("forecast", standing);
        model.addAttribute("saw", saw == null ? null : forecasts.versions(standing.id(), AsKnownAt.now()).stream()
                .filter(version -> version.version() == saw && saw != standing.version()).findFirst().orElse(null));
        addWhoMay(model);
        return "forecast/cancel";
    }

    @PostMapping("/forecasts/{id}/cancellations")
    String cancel(@PathVariable long id, @RequestParam int seen, @RequestParam(defaultValue = "") String reason, RedirectAttributes said) {
        try {
            Forecast cancelled = forecasts.cancel(actor.get(), new ForecastId(id), seen, reason);
            said.addFlashAttribute("done", cancelled.name() + " is cancelled.");
            return "redirect:/forecasts/" + id;
        } catch (ForecastRefused | NotHoldingDesk | StaleForecast refused) {
            said.addFlashAttribute("refused", refused.getMessage());
            said.addFlashAttribute("reason", reason);
            return "redirect:/forecasts/" + id + "/cancel?saw=" + seen;
        }
    }

    @ExceptionHandler(MayNotDraft.class)
    void notAllowed(HttpServletResponse response) throws IOException {
        response.sendError(HttpStatus.FORBIDDEN.value());
    }

    @ExceptionHandler(UnknownForecast.class)
    void unknown(HttpServletResponse response) throws IOException {
        response.sendError(HttpStatus.NOT_FOUND.value());
    }

    private String form(Model model, DraftForm form) {
        model.addAttribute("form", form);
        model.addAttribute("points", Movement.POINTS);
        model.addAttribute("lookers", people.all(AsKnownAt.now()).stream()
                .filter(person -> ForecastBook.mayLook(person) && !person.username().equals(actor.get().username())).toList());
        addWhoMay(model);
        return "forecast/draft";
    }

    /** The posted fields; what was ticked comes with the label the desk has for it, not with one that was sent. */
    private Map<String, String> fields(MultiValueMap<String, String> posted, List<String> tickedBefore) {
        Map<String, String> fields = new LinkedHashMap<>();
        for (String name : DraftFields.ALL) {
            List<String> texts = posted.get(name);
            if (texts != null && !texts.isEmpty()) {
                fields.put(name, String.join("\n", name.equals(DraftFields.EVIDENCE) ? labelled(texts, tickedBefore) : List.of(texts.get(0))).replace("\r\n", "\n"));
            }
        }
        return fields;
    }

    private List<String> labelled(List<String> ticked, List<String> tickedBefore) {
        List<String> labelled = new ArrayList<>();
        for (String one : ticked) {
            Optional<String> before = tickedBefore.stream().filter(line -> line.startsWith(one + " ")).findFirst();
            labelled.add(before.or(() -> evidence.find(one).map(Evidence::ticked)).orElse(one));
        }
        return labelled;
    }

    private List<Evidence> offered(Map<String, String> fields) {
        Map<String, Evidence> offered = new LinkedHashMap<>();
        for (String line : Evidence.lines(fields.getOrDefault(DraftFields.EVIDENCE, ""))) {
            Evidence.read(line).ifPresent(ticked -> offered.put(ticked.reference(), ticked));
        }
        evidence.recent().forEach(recent -> offered.putIfAbsent(recent.reference(), recent));
        return List.copyOf(offered.values());
    }

    private void addWhoMay(Model model) {
        model.addAttribute("holder", holdings.isHeldBy(actor.get().username()));
        model.addAttribute("mayDraft", ForecastBook.mayDraft(actor.get()));
    }

    private static ResponseStatusException nothingHere() {
        return new ResponseStatusException(HttpStatus.NOT_FOUND);
    }
}
