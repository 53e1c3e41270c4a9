package org.shearbook.desk.station.web;

import jakarta.servlet.http.HttpServletRequest;
import java.io.IOException;
import java.util.List;
import java.util.Locale;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.MenuEntry;
import org.shearbook.desk.staff.CurrentActor;
import org.shearbook.desk.station.ListRefused;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.station.StationBook;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.multipart.MultipartFile;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** The page Stations and Fixes: what is known, and where an administrator loads a list. */
@Controller
class StationController {

    private static final int STATIONS_SHOWN = 200;

    private final StationBook book;
    private final CurrentActor actor;

    StationController(StationBook book, CurrentActor actor) {
        this.book = book;
        this.actor = actor;
    }

    @GetMapping("/stations")
    String page(@RequestParam(defaultValue = "") String fix, @RequestParam(defaultValue = "") String station, AsKnownAt asKnownAt, HttpServletRequest request, Model model) {
        List<Station> all = book.all(asKnownAt);
        String sought = station.strip().toUpperCase(Locale.ROOT);
        model.addAttribute("stations", all.stream().filter(one -> sought.isEmpty() || one.name().toUpperCase(Locale.ROOT).contains(sought)
                || one.identifiers().stream().anyMatch(identifier -> identifier.contains(sought))).limit(STATIONS_SHOWN).toList());
        model.addAttribute("stationCount", all.size());
        model.addAttribute("stationSought", station.strip());
        model.addAttribute("lists", book.fixLists(asKnownAt));
        model.addAttribute("sought", fix.strip());
        model.addAttribute("found", fix.isBlank() ? List.of() : book.fixes(fix, asKnownAt));
        model.addAttribute("asKnownAt", asKnownAt.isNow() ? null : asKnownAt.moment());
        model.addAttribute("mayLoad", request.isUserInRole("ADMINISTRATOR"));
        return "station/stations";
    }

    @PostMapping("/stations/lists")
    String loadStations(@RequestParam MultipartFile file, RedirectAttributes said) throws IOException {
        try {
            StationBook.StationListResult result = book.keepStations(actor.get(), file.getBytes());
            said.addFlashAttribute("done", "%d stations kept, %d unchanged, %d rows without a fixed position left out."
                    .formatted(result.kept(), result.unchanged(), result.leftOut()));
        } catch (ListRefused refused) {
            refuse(said, "stations-file", refused);
        }
        return "redirect:/stations";
    }

    @PostMapping("/stations/fix-lists")
    String loadFixes(@RequestParam MultipartFile file, @RequestParam(defaultValue = "") String list, RedirectAttributes said) throws IOException {
        try {
            StationBook.FixListResult result = book.keepFixes(actor.get(), list, file.getBytes());
            said.addFlashAttribute("done", "%d fixes are now the list '%s', version %d; %d rows without an identifier left out."
                    .formatted(result.list().fixCount(), result.list().name(), result.list().version(), result.leftOut()));
        } catch (ListRefused refused) {
            refuse(said, refused.refusals().get(0).column().equals("list") ? "fixes-list" : "fixes-file", refused);
        }
        return "redirect:/stations";
    }

    private static void refuse(RedirectAttributes said, String field, ListRefused refused) {
        said.addFlashAttribute("refusedField", field);
        said.addFlashAttribute("refusals", refused.refusals());
    }

    @Configuration(proxyBeanMethods = false)
    static class Menu {

        @Bean
        MenuEntry stationsMenuEntry() {
            return MenuEntry.page(150, "Stations and Fixes", "/stations");
        }
    }
}
