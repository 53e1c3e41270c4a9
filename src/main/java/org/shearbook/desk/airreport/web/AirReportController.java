package org.shearbook.desk.airreport.web;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.airreport.AirReport;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.airreport.AirReportId;
import org.shearbook.desk.airreport.Attribution;
import org.shearbook.desk.airreport.AttributionRefused;
import org.shearbook.desk.airreport.UnknownAirReport;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.Moments;
import org.shearbook.desk.shell.UnreadableMoment;
import org.shearbook.desk.staff.CurrentActor;
import org.shearbook.desk.station.StationBook;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.server.ResponseStatusException;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** The page Air Reports, and one report beside its text as received. */
@Controller
@RequestMapping("/air-reports")
class AirReportController {

    private static final int PAGE = 100;
    private static final Duration SHOWN_AT_FIRST = Duration.ofHours(24);

    private final AirReportArchive archive;
    private final StationBook stations;
    private final CurrentActor actor;
    private final Clock clock;

    AirReportController(AirReportArchive archive, StationBook stations, CurrentActor actor, Clock clock) {
        this.archive = archive;
        this.stations = stations;
        this.actor = actor;
        this.clock = clock;
    }

    @GetMapping
    String list(@RequestParam(required = false) @Nullable String from, @RequestParam(required = false) @Nullable String until,
            @RequestParam(required = false) @Nullable String station, @RequestParam(required = false) @Nullable String distanceNm,
            @RequestParam(required = false) @Nullable Long after, AsKnownAt asKnownAt, Model model) {
        Instant now = asKnownAt.isNow() ? clock.instant() : asKnownAt.moment();
        Instant start = now.minus(SHOWN_AT_FIRST).truncatedTo(ChronoUnit.HOURS);
        Instant end = null;
        NearStation near = null;
        try {
            Instant asked = Moments.read("from", from);
            // A field emptied on purpose asks for everything; one not there yet for the last day.
            start = asked != null ? asked : from != null ? Moments.EARLIEST : start;
            end = Moments.read("until", until);
            near = NearStation.read(station, distanceNm, stations, asKnownAt);
        } catch (UnreadableMoment unreadable) {
            model.addAttribute("refusedField", unreadable.field());
            model.addAttribute("refused", unreadable.said());
        } catch (NearStation.Refused refused) {
            model.addAttribute("refusedField", refused.field());
            model.addAttribute("refused", refused.getMessage());
        }
        List<AirReport> found = found(near, start, end, after, asKnownAt);
        List<AirReport> shown = found.size() > PAGE ? found.subList(0, PAGE) : found;
        model.addAttribute("rows", shown.stream().map(AirReportPage::of).toList());
        model.addAttribute("from", from != null ? from : start.toString().replace(":00Z", "Z"));
        model.addAttribute("until", until);
        model.addAttribute("stations", stations.all(asKnownAt));
        model.addAttribute("station", near == null ? station : near.station().id());
        model.addAttribute("distanceNm", distanceNm == null || distanceNm.isBlank() ? "%.0f".formatted(NearStation.USUAL_NM) : distanceNm);
        model.addAttribute("older", found.size() > PAGE ? shown.get(PAGE - 1).id().value() : null);
        model.addAttribute("asKnownAt", asKnownAt.isNow() ? null : asKnownAt.moment());
        return "airreport/air-reports";
    }

    private List<AirReport> found(@Nullable NearStation near, Instant start, @Nullable Instant end, @Nullable Long after, AsKnownAt asKnownAt) {
        Instant until = end == null ? Moments.LATEST : end;
        AirReportId last = after == null ? null : new AirReportId(after);
        try {
            return near == null ? archive.newest(start, until, last, asKnownAt, PAGE + 1)
                    : archive.newestNear(near.station().latitude(), near.station().longitude(), near.distance(), start, until, last, asKnownAt, PAGE + 1);
        } catch (UnknownAirReport unknown) {
            throw new ResponseStatusException(HttpStatus.NOT_FOUND, unknown.getMessage(), unknown);
        }
    }

    @GetMapping("/{id}")
    String one(@PathVariable long id, AsKnownAt asKnownAt, Model model) {
        AirReportId reportId = new AirReportId(id);
        AirReport report = archive.find(reportId, asKnownAt)
                .orElseThrow(() -> new ResponseStatusException(HttpStatus.NOT_FOUND, "There is no air-report %d.".formatted(id)));
        model.addAttribute("row", AirReportPage.of(report));
        model.addAttribute("versions", archive.versions(reportId, asKnownAt));
        model.addAttribute("raw", archive.rawWithoutIdentity(reportId).orElse(null));
        model.addAttribute("attributions", Attribution.values());
        model.addAttribute("asKnownAt", asKnownAt.isNow() ? null : asKnownAt.moment());
        return "airreport/air-report";
    }

    @PostMapping("/{id}/attributions")
    String attribute(@PathVariable long id, @RequestParam Attribution attribution, @RequestParam(required = false) @Nullable String reason,
            RedirectAttributes said) {
        try {
            AirReport attributed = archive.attribute(actor.get(), new AirReportId(id), attribution, reason);
            said.addFlashAttribute("done", "Kept as version %d: cause %s.".formatted(attributed.version(), attribution.inWords()));
        } catch (AttributionRefused refused) {
            said.addFlashAttribute("refused", refused.getMessage());
            said.addFlashAttribute("refusedField", refused.field());
            said.addFlashAttribute("chosen", attribution);
            said.addFlashAttribute("reason", reason);
        } catch (UnknownAirReport unknown) {
            throw new ResponseStatusException(HttpStatus.NOT_FOUND, unknown.getMessage(), unknown);
        }
        return "redirect:/air-reports/{id}";
    }
}
