package org.shearbook.desk.shell.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import org.springframework.core.annotation.Order;
import org.springframework.stereotype.Controller;
import org.springframework.web.ErrorResponseException;
import org.springframework.web.bind.annotation.ControllerAdvice;
import org.springframework.web.bind.annotation.ExceptionHandler;

/** Hands the words with which a page refused on to the error page; scripts are answered by {@link ScriptRefusals}. */
@ControllerAdvice(annotations = Controller.class)
@Order(200)
class PageRefusals {

    static final String SAID = PageRefusals.class.getName() + ".said";

    @ExceptionHandler
    void said(ErrorResponseException refused, HttpServletRequest request, HttpServletResponse response) throws IOException {
        request.setAttribute(SAID, refused.getBody().getDetail());
        response.sendError(refused.getStatusCode().value());
    }
}
