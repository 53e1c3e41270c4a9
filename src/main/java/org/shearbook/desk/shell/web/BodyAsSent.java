package org.shearbook.desk.shell.web;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletRequestWrapper;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.Collections;
import java.util.Enumeration;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.core.Ordered;
import org.springframework.core.annotation.Order;
import org.springframework.http.HttpHeaders;
import org.springframework.http.MediaType;
import org.springframework.stereotype.Component;
import org.springframework.web.filter.OncePerRequestFilter;

/**
 * No call of the interface takes a form, but common tools declare every body as one unless told otherwise. The server
 * would then take a message apart at its first ampersand, and the call would find nothing. So the body is claimed as
 * bytes before anybody can ask for the fields of a form.
 */
@Component
@Order(Ordered.HIGHEST_PRECEDENCE)
class BodyAsSent extends OncePerRequestFilter {

    @Override
    protected boolean shouldNotFilter(HttpServletRequest request) {
        String type = request.getContentType();
        return !request.getRequestURI().startsWith(request.getContextPath() + "/api/v1/") || type == null
                || !type.toLowerCase(java.util.Locale.ROOT).startsWith(MediaType.APPLICATION_FORM_URLENCODED_VALUE);
    }

    @Override
    protected void doFilterInternal(HttpServletRequest request, HttpServletResponse response, FilterChain chain) throws ServletException, IOException {
        // Whoever asked for the stream first owns the body: the server leaves its fields alone from here on.
        request.getInputStream();
        chain.doFilter(new AsBytes(request), response);
    }

    private static final class AsBytes extends HttpServletRequestWrapper {

        AsBytes(HttpServletRequest request) {
            super(request);
        }

        @Override
        public String getContentType() {
            return MediaType.APPLICATION_OCTET_STREAM_VALUE;
        }

        @Override
        public @Nullable String getHeader(String name) {
            return HttpHeaders.CONTENT_TYPE.equalsIgnoreCase(name) ? getContentType() : super.getHeader(name);
        }

        @Override
        public Enumeration<String> getHeaders(String name) {
            return HttpHeaders.CONTENT_TYPE.equalsIgnoreCase(name) ? Collections.enumeration(List.of(getContentType())) : super.getHeaders(name);
        }
    }
}
