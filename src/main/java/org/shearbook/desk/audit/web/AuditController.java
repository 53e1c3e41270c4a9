package org.shearbook.desk.audit.web;

import jakarta.servlet.http.HttpServletRequest;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditEntry;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.shell.MenuEntry;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.http.HttpStatus;
import org.springframework.security.core.Authentication;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.server.ResponseStatusException;

/** The page Audit: every act, newest first, and the check of the chain. */
@Controller
class AuditController {

    private static final int PER_PAGE = 50;
    /** Up to this many entries the chain is walked with every look at the page; a longer one is walked on demand. */
    private static final long WALKED_ALONG = 20_000;

    private final AuditTrail audit;
    private final AuditReader reader;

    AuditController(AuditTrail audit, AuditReader reader) {
        this.audit = audit;
        this.reader = reader;
    }

    @GetMapping("/audit")
    String events(@RequestParam(defaultValue = "") String actor, @RequestParam(defaultValue = "") String kind, @RequestParam(defaultValue = "") String id,
            @RequestParam(defaultValue = "") String from, @RequestParam(defaultValue = "") String until, @RequestParam(required = false) @Nullable Long before,
            AsKnownAt asKnownAt, Authentication person, HttpServletRequest request, Model model) {
        boolean all = reader.readsAll(person);
        List<String> unread = new ArrayList<>();
        Instant start = read("from", from, AuditTrail.Wanted.EVERYTHING.from(), unread);
        Instant end = read("until", until, AuditTrail.Wanted.EVERYTHING.until(), unread);
        String whose = all ? actor.strip() : person.getName();
        List<AuditEntry> entries = unread.isEmpty()
                ? audit.newest(new AuditTrail.Wanted(whose, kind.strip(), id.strip(), start, end), asKnownAt, before, PER_PAGE) : List.of();
        model.addAttribute("entries", entries);
        model.addAttribute("older", entries.size() == PER_PAGE ? entries.get(entries.size() - 1).sequence() : null);
        model.addAttribute("all", all);
        model.addAttribute("kinds", audit.kinds());
        AuditTrail.Head head = audit.head();
        model.addAttribute("head", head);
        model.addAttribute("integrity", all && before == null && head.entries() <= WALKED_ALONG ? audit.integrity() : null);
        model.addAttribute("unread", unread);
        model.addAttribute("actor", actor);
        model.addAttribute("kind", kind);
        model.addAttribute("id", id);
        model.addAttribute("from", from);
        model.addAttribute("until", until);
        reader.keepReading(person, request, all ? "entries" : "own entries");
        return "audit/events";
    }

    @GetMapping("/audit/integrity")
    String integrity(Authentication person, HttpServletRequest request, Model model) {
        if (!reader.readsAll(person)) {
            throw new ResponseStatusException(HttpStatus.FORBIDDEN);
        }
        model.addAttribute("integrity", audit.integrity());
        reader.keepReading(person, request, "integrity");
        return "audit/integrity";
    }

    private static Instant read(String field, String text, Instant blank, List<String> unread) {
        if (text.isBlank()) {
            return blank;
        }
        return AuditReader.moment(text).orElseGet(() -> {
            unread.add(field);
            return blank;
        });
    }

    @Configuration(proxyBeanMethods = false)
    static class Menu {

        @Bean
        MenuEntry auditMenuEntry() {
            return MenuEntry.page(130, "Audit", "/audit");
        }
    }
}
