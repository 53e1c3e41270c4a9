package org.shearbook.desk.shell;

/** A short text in the top bar, asked for with each page: who holds the desk, for example. */
public interface StatusLine {

    String text();
}
