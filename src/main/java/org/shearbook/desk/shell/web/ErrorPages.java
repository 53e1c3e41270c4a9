package org.shearbook.desk.shell.web;

import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.util.Locale;
import java.util.UUID;
import org.shearbook.desk.shell.Problem;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.boot.webmvc.error.ErrorController;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.RequestMapping;

/**
 * What no room expected: one calm page, or problem details for a script, with a reference number that stands in
 * the log beside the cause.
 */
@Controller
class ErrorPages implements ErrorController {

    private static final Logger log = LoggerFactory.getLogger(ErrorPages.class);

    @RequestMapping(path = "/error", produces = MediaType.TEXT_HTML_VALUE)
    String page(HttpServletRequest request, HttpServletResponse response, Model model) {
        HttpStatus status = statusOf(request);
        response.setStatus(status.value());
        model.addAttribute("reference", logged(request, status));
        Object said = request.getAttribute(PageRefusals.SAID);
        model.addAttribute("said", said != null ? said : switch (status) {
            case NOT_FOUND -> "There is nothing at this address. It may have been typed wrong, or the record was never kept.";
            case FORBIDDEN -> "Your roles do not allow this. The page People and Keys says who may.";
            case CONTENT_TOO_LARGE -> "This is more than one upload may hold (64 MB). Send it in parts.";
            default -> status.is5xxServerError()
                    ? "Something went wrong on the server. Nothing was half kept. Try again; if it stays, tell the administrator the reference."
                    : "The server could not understand this request. Go back and check what was entered.";
        });
        model.addAttribute("status", status.value());
        return "shell/error";
    }

    @RequestMapping("/error")
    ResponseEntity<ProblemDetail> problem(HttpServletRequest request) {
        HttpStatus status = statusOf(request);
        ProblemDetail problem = Problem.of(status, status.name(), status.is5xxServerError()
                ? "Something went wrong on the server; nothing was half kept. Quote the reference to the administrator."
                : "The request could not be answered: " + status.getReasonPhrase().toLowerCase(Locale.ROOT) + ".");
        problem.setProperty("reference", logged(request, status));
        return ResponseEntity.status(status).contentType(MediaType.APPLICATION_PROBLEM_JSON).body(problem);
    }

    private static HttpStatus statusOf(HttpServletRequest request) {
        Object code = request.getAttribute(RequestDispatcher.ERROR_STATUS_CODE);
        HttpStatus status = code instanceof Integer number ? HttpStatus.resolve(number) : null;
        return status == null ? HttpStatus.NOT_FOUND : status;
    }

    private static String logged(HttpServletRequest request, HttpStatus status) {
        String reference = UUID.randomUUID().toString().substring(0, 8).toUpperCase(Locale.ROOT);
        if (status.is5xxServerError()) {
            log.error("Error {} at {}", reference, request.getAttribute(RequestDispatcher.ERROR_REQUEST_URI),
                    (Throwable) request.getAttribute(RequestDispatcher.ERROR_EXCEPTION));
        }
        return reference;
    }
}
