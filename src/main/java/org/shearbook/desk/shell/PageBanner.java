package org.shearbook.desk.shell;

/** A full-width line over every page and every print, for what nobody may overlook. */
public interface PageBanner {

    String text();
}
