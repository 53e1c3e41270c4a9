package org.shearbook.met.decode;

/** Ends the reading of one message and becomes its {@link Rejection}; never leaves this room. */
final class Unreadable extends Exception {

    private static final long serialVersionUID = 1L;

    private final int line;
    private final int column;
    private final String code;

    Unreadable(int line, int column, String code, String text) {
        super(text, null, false, false);
        this.line = line;
        this.column = column;
        this.code = code;
    }

    /** @param raw the message as received */
    Rejection asRejection(String raw) {
        return new Rejection(line, column, code, getMessage(), raw);
    }
}
