package org.shearbook.desk.shell.web;

import jakarta.servlet.http.Cookie;
import jakarta.servlet.http.HttpServletRequest;
import java.time.Clock;
import java.time.Instant;
import java.util.Arrays;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.shell.MenuEntry;
import org.shearbook.desk.shell.PageBanner;
import org.shearbook.desk.shell.Show;
import org.shearbook.desk.shell.StatusLine;
import org.springframework.security.core.Authentication;
import org.springframework.security.core.GrantedAuthority;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.ControllerAdvice;
import org.springframework.web.bind.annotation.ModelAttribute;

/** Gives every page its frame. */
@ControllerAdvice(annotations = Controller.class)
class FrameAdvice {

    private static final String AS_KNOWN_AT = "asKnownAt";

    private final ShellSettings settings;
    private final Clock clock;
    private final Show show;
    private final List<MenuEntry> menu;
    private final List<StatusLine> statuses;
    private final List<PageBanner> banners;

    FrameAdvice(ShellSettings settings, Clock clock, Show show, List<MenuEntry> menu, List<StatusLine> statuses, List<PageBanner> banners) {
        this.settings = settings;
        this.clock = clock;
        this.show = show;
        this.menu = menu.stream().sorted(Comparator.comparingInt(MenuEntry::order)).toList();
        this.statuses = statuses;
        this.banners = banners;
    }

    @ModelAttribute("frame")
    FrameView frame(HttpServletRequest request, @Nullable Authentication person) {
        return view(request, person);
    }

    FrameView view(HttpServletRequest request, @Nullable Authentication person) {
        Instant now = clock.instant();
        Set<String> roles = person == null ? Set.of()
                : person.getAuthorities().stream().map(GrantedAuthority::getAuthority).collect(Collectors.toSet());
        Map<String, List<MenuEntry>> groups = person == null ? Map.of() : menu.stream()
                .filter(entry -> entry.roles().isEmpty() || entry.roles().stream().anyMatch(role -> roles.contains("ROLE_" + role)))
                .collect(Collectors.groupingBy(MenuEntry::group, LinkedHashMap::new, Collectors.toList()));
        return new FrameView(settings.office(), now, show.utcToSecond(now), person == null ? null : nameOf(person),
                person == null ? List.of() : statuses.stream().map(line -> new FrameView.StatusCell(line.label(), line.text())).toList(),
                banners.stream().map(PageBanner::text).toList(), groups, request.getServletPath(),
                chosen(request, "shearbook-theme", "dark", "light"), chosen(request, "shearbook-brightness", "day", "evening", "night"),
                blankToNull(request.getParameter(AS_KNOWN_AT)), otherParameters(request));
    }

    private static @Nullable String blankToNull(@Nullable String text) {
        return text == null || text.isBlank() ? null : text;
    }

    private static List<Map.Entry<String, String>> otherParameters(HttpServletRequest request) {
        if (!"GET".equals(request.getMethod())) {
            return List.of();
        }
        return request.getParameterMap().entrySet().stream().filter(it -> !it.getKey().equals(AS_KNOWN_AT))
                .flatMap(it -> Arrays.stream(it.getValue()).map(value -> Map.entry(it.getKey(), value))).toList();
    }

    /** Name and roles, in words. */
    private static String nameOf(Authentication person) {
        String roles = person.getAuthorities().stream().map(GrantedAuthority::getAuthority).filter(authority -> authority.startsWith("ROLE_"))
                .map(authority -> authority.substring(5).toLowerCase(Locale.ROOT)).sorted().collect(Collectors.joining(", "));
        return person.getName() + (roles.isEmpty() ? "" : ", " + roles);
    }

    /** The value of a display cookie if it is one of those allowed, else the first of them. */
    private static String chosen(HttpServletRequest request, String cookie, String... allowed) {
        for (Cookie sent : request.getCookies() == null ? new Cookie[0] : request.getCookies()) {
            if (sent.getName().equals(cookie) && List.of(allowed).contains(sent.getValue())) {
                return sent.getValue();
            }
        }
        return allowed[0];
    }
}
