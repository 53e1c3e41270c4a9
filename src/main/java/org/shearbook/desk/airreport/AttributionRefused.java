package org.shearbook.desk.airreport;

/** An attribution that can't be kept as it is; the field says which part. */
public class AttributionRefused extends RuntimeException {

    private final String field;

    AttributionRefused(String field, String message) {
        super(message);
        this.field = field;
    }

    /** {@code attribution}, {@code reason}, or empty when it is the person and not the entry. */
    public String field() {
        return field;
    }
}
