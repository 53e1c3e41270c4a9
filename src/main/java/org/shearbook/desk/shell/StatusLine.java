package org.shearbook.desk.shell;

/** A cell of the top bar, asked for with each page: who holds the desk, for example. */
public interface StatusLine {

    /** The small word above: {@code Desk held by}. */
    String label();

    /** What it says now. */
    String text();
}
