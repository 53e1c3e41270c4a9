package org.shearbook.desk.staff;

/** An act that only the holder of the desk may do was tried by somebody else. */
public class NotHoldingDesk extends RuntimeException {

    public NotHoldingDesk(String act) {
        super("Only the person who holds the desk may %s. Take the desk first if it is vacant.".formatted(act));
    }
}
