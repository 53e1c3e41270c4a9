package org.shearbook.desk.staff;

/** Somebody else holds the desk already. */
public class DeskNotVacant extends RuntimeException {

    DeskNotVacant(String holder) {
        super("The desk is held by %s. It can be taken when that person has left it.".formatted(holder));
    }
}
