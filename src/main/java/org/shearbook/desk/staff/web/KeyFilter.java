package org.shearbook.desk.staff.web;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.net.InetAddress;
import java.util.List;
import java.util.Optional;
import org.shearbook.desk.shell.Problem;
import org.shearbook.desk.staff.Key;
import org.shearbook.desk.staff.KeyRing;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.security.authentication.UsernamePasswordAuthenticationToken;
import org.springframework.security.core.authority.SimpleGrantedAuthority;
import org.springframework.security.core.context.SecurityContext;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.web.filter.OncePerRequestFilter;
import tools.jackson.databind.json.JsonMapper;

/** Lets a request in by {@code Authorization: Bearer <key>}, for this request alone. */
class KeyFilter extends OncePerRequestFilter {

    static final String SCHEME = "Bearer ";

    private final List<KeyRing> rings;
    private final JsonMapper json;

    KeyFilter(List<KeyRing> rings, JsonMapper json) {
        this.rings = rings;
        this.json = json;
    }

    static boolean carriesKey(HttpServletRequest request) {
        String header = request.getHeader(HttpHeaders.AUTHORIZATION);
        return header != null && header.startsWith(SCHEME);
    }

    @Override
    protected void doFilterInternal(HttpServletRequest request, HttpServletResponse response, FilterChain chain) throws ServletException, IOException {
        if (!carriesKey(request)) {
            chain.doFilter(request, response);
            return;
        }
        String secret = request.getHeader(HttpHeaders.AUTHORIZATION).substring(SCHEME.length()).trim();
        Optional<Key> key = rings.stream().flatMap(ring -> ring.find(secret).stream())
                .filter(found -> !found.loopbackOnly() || isLoopback(request)).findFirst();
        if (key.isEmpty()) {
            response.setStatus(HttpStatus.UNAUTHORIZED.value());
            response.setContentType(MediaType.APPLICATION_PROBLEM_JSON_VALUE);
            json.writeValue(response.getOutputStream(), Problem.of(HttpStatus.UNAUTHORIZED, "KEY_NOT_KNOWN",
                    "This key is not known, or not accepted from this address. Ask the administrator for a key of your own."));
            return;
        }
        SecurityContext context = SecurityContextHolder.createEmptyContext();
        context.setAuthentication(UsernamePasswordAuthenticationToken.authenticated("key:" + key.get().name(), null,
                key.get().scopes().stream().map(scope -> new SimpleGrantedAuthority("SCOPE_" + scope)).toList()));
        SecurityContextHolder.setContext(context);
        try {
            chain.doFilter(request, response);
        } finally {
            SecurityContextHolder.clearContext();
        }
    }

    private static boolean isLoopback(HttpServletRequest request) {
        try {
            return InetAddress.getByName(request.getRemoteAddr()).isLoopbackAddress();
        } catch (java.net.UnknownHostException e) {
            return false;
        }
    }
}
