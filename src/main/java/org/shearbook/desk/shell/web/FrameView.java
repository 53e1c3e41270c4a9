package org.shearbook.desk.shell.web;

import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.shell.MenuEntry;

/**
 * What the page frame shows around every page.
 *
 * @param clock    the desk's UTC time, to the second
 * @param epochMilli the same moment, for the ticking clock of the page
 * @param person   who is signed in, in words; null when nobody is
 * @param statuses short texts of the rooms
 * @param banners  full-width lines
 * @param menu     the pages this person may open, by group
 * @param path     the address of this page, to mark it in the menu
 */
public record FrameView(String clock, long epochMilli, @Nullable String person, List<String> statuses, List<String> banners,
        Map<String, List<MenuEntry>> menu, String path) {

    /** Whether this menu entry is the page now shown, or the page it belongs to. */
    public boolean isHere(MenuEntry entry) {
        return entry.url().equals("/") ? path.equals("/") : path.equals(entry.url()) || path.startsWith(entry.url() + "/");
    }
}
