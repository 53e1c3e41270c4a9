package org.shearbook.desk.intake;

/** Where an item of the queue stands. Only a person moves it on. */
public enum ItemState {
    OPEN,
    /** Its text was put right and taken in as a new batch. */
    CORRECTED,
    /** Looked at and left unread; it stays in the record. */
    SET_ASIDE
}
