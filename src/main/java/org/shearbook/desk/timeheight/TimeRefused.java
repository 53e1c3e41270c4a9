package org.shearbook.desk.timeheight;

/** What was asked for cannot be shown; the message says what to do. */
public class TimeRefused extends RuntimeException {

    private final String field;
    private final String code;

    public TimeRefused(String field, String code, String message) {
        super(message);
        this.field = field;
        this.code = code;
    }

    /** Name of the field that has to change. */
    public String field() {
        return field;
    }

    public String code() {
        return code;
    }
}
