package org.shearbook.desk.shell;

import java.net.URI;
import java.util.Map;
import org.springframework.http.HttpStatus;
import org.springframework.http.ProblemDetail;

/** RFC 9457 problem details with a stable type, so that scripts can tell one refusal from another. */
public final class Problem {

    private Problem() {
    }

    /**
     * @param code   stable name in capitals, for example {@code BASE_ABOVE_TOP}; the type is made from it
     * @param detail what is the matter and what to do
     */
    public static ProblemDetail of(HttpStatus status, String code, String detail) {
        return of(status, code, detail, Map.of());
    }

    /** @param more further members, for example the field or the line */
    public static ProblemDetail of(HttpStatus status, String code, String detail, Map<String, Object> more) {
        ProblemDetail problem = ProblemDetail.forStatusAndDetail(status, detail);
        problem.setType(URI.create("urn:shearbook:problem:" + code.toLowerCase(java.util.Locale.ROOT).replace('_', '-')));
        problem.setTitle(status.getReasonPhrase());
        problem.setProperty("code", code);
        more.forEach(problem::setProperty);
        return problem;
    }
}
