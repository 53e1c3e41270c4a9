package org.shearbook.desk.intake;

/** The way bytes came in. */
public enum Channel {
    UPLOAD, PASTE, HTTP, DEMONSTRATION
}
