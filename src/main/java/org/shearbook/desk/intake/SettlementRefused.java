package org.shearbook.desk.intake;

/** An item of the queue can't be settled like this. */
public class SettlementRefused extends RuntimeException {

    private final String field;

    SettlementRefused(String field, String message) {
        super(message);
        this.field = field;
    }

    /** The field that must change; empty when it is none. */
    public String field() {
        return field;
    }
}
