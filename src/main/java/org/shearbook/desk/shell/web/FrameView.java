package org.shearbook.desk.shell.web;

import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.shell.MenuEntry;

/**
 * What the page frame shows around every page.
 *
 * @param office     name of the office
 * @param now        the desk's moment, from which the page's clock counts on
 * @param clock      the same in words
 * @param person     who is signed in, in words; null when nobody is
 * @param statuses   cells of the rooms
 * @param banners    full-width lines
 * @param menu       the pages this person may open, by group
 * @param path       the address of this page, to mark it in the menu
 * @param theme      {@code dark} or {@code light}
 * @param brightness {@code day}, {@code evening} or {@code night}
 * @param asKnownAt  the moment the page is drawn for, as it was asked; null for now
 * @param otherParameters what else the address asks for, kept when the moment changes
 */
public record FrameView(String office, Instant now, String clock, @Nullable String person, List<StatusCell> statuses, List<String> banners,
        Map<String, List<MenuEntry>> menu, String path, String theme, String brightness, @Nullable String asKnownAt,
        List<Map.Entry<String, String>> otherParameters) {

    /** A cell of the top bar. */
    public record StatusCell(String label, String text) {
    }

    /** Whether this menu entry is the page now shown, or the page it belongs to. */
    public boolean isHere(MenuEntry entry) {
        return entry.url().equals("/") ? path.equals("/") : path.equals(entry.url()) || path.startsWith(entry.url() + "/");
    }

    /** The digit that opens this page together with Alt; empty beyond the ninth. */
    public String keyOf(MenuEntry entry) {
        int place = menu.values().stream().flatMap(List::stream).toList().indexOf(entry) + 1;
        return place <= 9 ? Integer.toString(place) : "";
    }
}
