package org.shearbook.desk.audit.web;

import java.time.DateTimeException;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.Problem;
import org.springframework.core.MethodParameter;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Component;
import org.springframework.web.ErrorResponseException;
import org.springframework.web.bind.support.WebDataBinderFactory;
import org.springframework.web.context.request.NativeWebRequest;
import org.springframework.web.method.support.HandlerMethodArgumentResolver;
import org.springframework.web.method.support.ModelAndViewContainer;
import org.springframework.web.servlet.config.annotation.WebMvcConfigurer;

/** Reads {@code ?asKnownAt=} for every page and call that takes an {@link AsKnownAt}; absent or blank is now. */
@Component
class AsKnownAtArgument implements HandlerMethodArgumentResolver, WebMvcConfigurer {

    @Override
    public void addArgumentResolvers(List<HandlerMethodArgumentResolver> resolvers) {
        resolvers.add(this);
    }

    @Override
    public boolean supportsParameter(MethodParameter parameter) {
        return parameter.getParameterType() == AsKnownAt.class;
    }

    @Override
    public AsKnownAt resolveArgument(MethodParameter parameter, @Nullable ModelAndViewContainer model, NativeWebRequest request,
            @Nullable WebDataBinderFactory binder) {
        return read(request.getParameter("asKnownAt"));
    }

    static AsKnownAt read(@Nullable String text) {
        if (text == null || text.isBlank()) {
            return AsKnownAt.now();
        }
        try {
            Instant moment = OffsetDateTime.parse(text.strip()).toInstant();
            return new AsKnownAt(moment);
        } catch (DateTimeException unreadable) {
            throw new ErrorResponseException(HttpStatus.BAD_REQUEST, Problem.of(HttpStatus.BAD_REQUEST, "AS_KNOWN_AT_UNREADABLE",
                    "asKnownAt is not a moment in UTC. Write it like 2031-03-12T06:15:00Z, or leave it blank for now.",
                    java.util.Map.of("field", "asKnownAt")), unreadable);
        }
    }
}
