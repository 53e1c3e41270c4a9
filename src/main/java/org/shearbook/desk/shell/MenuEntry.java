package org.shearbook.desk.shell;

/**
 * One line of the navigation; each room with a page declares a bean of it.
 *
 * @param order place in the menu, the order of the day
 * @param group heading the entry stands under; empty for the pages of the desk
 * @param title the page's title
 * @param url   its address
 * @param roles roles that may open it; empty for everybody signed in
 */
public record MenuEntry(int order, String group, String title, String url, java.util.Set<String> roles) {

    /** A page of the desk that everybody signed in may open. */
    public static MenuEntry page(int order, String title, String url) {
        return new MenuEntry(order, "", title, url, java.util.Set.of());
    }
}
