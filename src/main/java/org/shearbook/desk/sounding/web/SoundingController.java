package org.shearbook.desk.sounding.web;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.MenuEntry;
import org.shearbook.desk.shell.Moments;
import org.shearbook.desk.shell.UnreadableMoment;
import org.shearbook.desk.sounding.Sounding;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingHeader;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.desk.sounding.UnknownSounding;
import org.shearbook.desk.sounding.WithdrawalRefused;
import org.shearbook.desk.staff.CurrentActor;
import org.shearbook.desk.station.StationBook;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** The pages Soundings: the list, and one sounding with its strips, layers and levels. */
@Controller
class SoundingController {

    private static final int SHOWN = 100;
    /** So many strips fit beside each other on the smallest screen of the desk. */
    private static final int STRIPS = 8;
    /** Choices of the smoothing window [m], full width at half maximum; the first is for research alone. */
    private static final List<Integer> WINDOWS = List.of(60, 100, 150, 200, 300, 600);
    private static final int USUAL_WINDOW = 200;

    private final SoundingArchive archive;
    private final StationBook stations;
    private final CurrentActor actor;

    SoundingController(SoundingArchive archive, StationBook stations, CurrentActor actor) {
        this.archive = archive;
        this.stations = stations;
        this.actor = actor;
    }

    @GetMapping("/soundings")
    String list(@RequestParam(defaultValue = "") String station, @RequestParam(required = false) @Nullable String from,
            @RequestParam(required = false) @Nullable String until, @RequestParam(required = false) @Nullable Long after, AsKnownAt asKnownAt, Model model) {
        Instant start = Moments.EARLIEST;
        Instant end = Moments.LATEST;
        try {
            Instant asked = Moments.read("from", from);
            start = asked == null ? start : asked;
            asked = Moments.read("until", until);
            end = asked == null ? end : asked;
        } catch (UnreadableMoment unreadable) {
            model.addAttribute("refused", unreadable.said());
            model.addAttribute("refusedField", unreadable.field());
        }
        List<SoundingHeader> found = archive.newest(SoundingApi.stationId(stations, station), start, end, after == null ? null : new SoundingId(after), asKnownAt, SHOWN + 1);
        List<SoundingHeader> shown = found.size() > SHOWN ? found.subList(0, SHOWN) : found;
        model.addAttribute("rows", shown.stream().map(SoundingRow::of).toList());
        model.addAttribute("strips", station.isBlank() ? newestOfEachStation(shown) : shown.stream().filter(SoundingHeader::isUsable).limit(STRIPS).toList());
        model.addAttribute("older", found.size() > SHOWN ? shown.get(SHOWN - 1).id().value() : null);
        model.addAttribute("stations", stations.all(asKnownAt));
        model.addAttribute("station", station);
        model.addAttribute("from", from);
        model.addAttribute("until", until);
        model.addAttribute("asKnownAt", asKnownAt.isNow() ? null : asKnownAt.moment());
        return "sounding/soundings";
    }

    private static List<SoundingHeader> newestOfEachStation(List<SoundingHeader> newestFirst) {
        Map<String, SoundingHeader> ofStation = new LinkedHashMap<>();
        newestFirst.stream().filter(SoundingHeader::isUsable).forEach(header -> ofStation.putIfAbsent(header.stationId(), header));
        return ofStation.values().stream().limit(STRIPS).toList();
    }

    @GetMapping("/soundings/{id}")
    String one(@PathVariable long id, @RequestParam(defaultValue = "" + USUAL_WINDOW) int windowM, AsKnownAt asKnownAt, Model model) {
        SoundingId soundingId = new SoundingId(id);
        Sounding sounding = archive.find(soundingId, asKnownAt).orElseThrow(() -> new UnknownSounding(soundingId));
        model.addAttribute("sounding", sounding);
        model.addAttribute("row", SoundingRow.of(sounding.header()));
        model.addAttribute("levels", sounding.levels().stream().map(LevelRow::of).toList());
        model.addAttribute("versions", archive.versions(soundingId, asKnownAt));
        model.addAttribute("windows", WINDOWS);
        model.addAttribute("windowM", WINDOWS.contains(windowM) ? windowM : USUAL_WINDOW);
        model.addAttribute("asKnownAt", asKnownAt.isNow() ? null : asKnownAt.moment());
        return "sounding/sounding";
    }

    @PostMapping("/soundings/{id}/withdrawals")
    String withdraw(@PathVariable long id, @RequestParam(defaultValue = "") String reason, RedirectAttributes said) {
        try {
            archive.withdraw(actor.get(), new SoundingId(id), reason);
            said.addFlashAttribute("done", "The sounding is withdrawn. It stays to be read.");
        } catch (WithdrawalRefused refused) {
            said.addFlashAttribute("refused", refused.getMessage());
        }
        return "redirect:/soundings/" + id;
    }

    @ExceptionHandler(UnknownSounding.class)
    void unknown(HttpServletResponse response) throws IOException {
        response.sendError(HttpStatus.NOT_FOUND.value());
    }

    @Configuration(proxyBeanMethods = false)
    static class Menu {

        @Bean
        MenuEntry soundingsMenuEntry() {
            return MenuEntry.page(30, "Soundings", "/soundings");
        }
    }
}
