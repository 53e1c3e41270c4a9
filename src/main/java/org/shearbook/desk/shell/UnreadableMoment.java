package org.shearbook.desk.shell;

import java.util.Map;
import org.springframework.http.HttpStatus;
import org.springframework.web.ErrorResponseException;

/** A moment in a request could not be read. A call answers it as a problem; a page shows it beside the field. */
public class UnreadableMoment extends ErrorResponseException {

    private final String field;

    UnreadableMoment(String field, String text, Throwable cause) {
        super(HttpStatus.BAD_REQUEST, Problem.of(HttpStatus.BAD_REQUEST, "MOMENT_UNREADABLE", said(field, text), Map.of("field", field)), cause);
        this.field = field;
    }

    private static String said(String field, String text) {
        return "%s is not a moment in UTC: \"%s\". Write it like 2031-03-12T06:15Z, or leave it blank."
                .formatted(field, text.length() > 40 ? text.substring(0, 40) + "…" : text);
    }

    public String field() {
        return field;
    }

    /** What is the matter and what to do. */
    public String said() {
        return String.valueOf(getBody().getDetail());
    }
}
