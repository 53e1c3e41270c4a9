package org.shearbook.desk.shell.web;

import java.util.Map;
import org.shearbook.desk.shell.Problem;
import org.springframework.core.annotation.Order;
import org.springframework.http.HttpStatus;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.http.converter.HttpMessageNotReadableException;
import org.springframework.web.ErrorResponseException;
import org.springframework.web.bind.MissingServletRequestParameterException;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;
import org.springframework.web.bind.annotation.RestControllerAdvice;
import org.springframework.web.method.annotation.MethodArgumentTypeMismatchException;

/** Says to a script what was wrong with its call before any room saw it: which field, and what to write. */
@RestControllerAdvice(annotations = RestController.class)
@Order(100)
class ScriptRefusals {

    @ExceptionHandler
    @ResponseStatus(HttpStatus.BAD_REQUEST)
    ProblemDetail wrongType(MethodArgumentTypeMismatchException refused) {
        Class<?> wanted = refused.getRequiredType();
        String form = wanted == null ? "another form" : wanted == java.time.Instant.class ? "a moment such as 2031-03-12T06:00:00Z"
                : Number.class.isAssignableFrom(wanted) || wanted.isPrimitive() && wanted != boolean.class ? "a number"
                : wanted == boolean.class || wanted == Boolean.class ? "true or false" : "another form";
        return Problem.of(HttpStatus.BAD_REQUEST, "PARAMETER_NOT_READABLE", "The parameter %s can't be read. Write %s.".formatted(refused.getName(), form),
                Map.of("field", refused.getName()));
    }

    /** What a room refused with its own words. */
    @ExceptionHandler
    ResponseEntity<ProblemDetail> said(ErrorResponseException refused) {
        return ResponseEntity.status(refused.getStatusCode()).body(refused.getBody());
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.BAD_REQUEST)
    ProblemDetail missing(MissingServletRequestParameterException refused) {
        return Problem.of(HttpStatus.BAD_REQUEST, "PARAMETER_MISSING", "The parameter %s is missing. Add it to the address.".formatted(refused.getParameterName()),
                Map.of("field", refused.getParameterName()));
    }

    @ExceptionHandler
    @ResponseStatus(HttpStatus.BAD_REQUEST)
    ProblemDetail notReadable(HttpMessageNotReadableException refused) {
        return Problem.of(HttpStatus.BAD_REQUEST, "BODY_NOT_READABLE",
                "The body can't be read as the JSON this call takes: it is broken, or a field has a value of the wrong kind. The description is at /api/v1/openapi.json.");
    }
}
