package org.shearbook.desk.staff.web;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.List;
import org.shearbook.desk.shell.Problem;
import org.shearbook.desk.staff.KeyRing;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.http.HttpMethod;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.security.authentication.AnonymousAuthenticationToken;
import org.springframework.security.authorization.AuthorizationManager;
import org.springframework.security.authorization.AuthorizationManagers;
import org.springframework.security.authorization.AuthorityAuthorizationManager;
import org.springframework.security.config.annotation.web.builders.HttpSecurity;
import org.springframework.security.core.Authentication;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.security.web.SecurityFilterChain;
import org.springframework.security.web.access.intercept.RequestAuthorizationContext;
import org.springframework.security.web.access.AccessDeniedHandlerImpl;
import org.springframework.security.web.authentication.LoginUrlAuthenticationEntryPoint;
import org.springframework.security.web.authentication.UsernamePasswordAuthenticationFilter;
import org.springframework.security.web.csrf.CsrfException;
import org.springframework.security.web.servlet.util.matcher.PathPatternRequestMatcher;
import org.springframework.security.web.util.matcher.RequestMatcher;
import tools.jackson.databind.json.JsonMapper;

/** Who may come in, by which way, and what the browser is told about this site. */
@Configuration(proxyBeanMethods = false)
class AccessRules {

    private static final String CONTENT_SECURITY_POLICY = "default-src 'self'; script-src 'self'; style-src 'self'; img-src 'self' data:; "
            + "object-src 'none'; base-uri 'self'; frame-ancestors 'none'; form-action 'self'";
    private static final String[] PEOPLE = {"ROLE_FORECASTER", "ROLE_SCIENTIST", "ROLE_SUPERVISOR", "ROLE_ADMINISTRATOR", "ROLE_OBSERVER"};

    @Bean
    SecurityFilterChain accessRulesChain(HttpSecurity http, ObjectProvider<KeyRing> rings, JsonMapper json) throws Exception {
        List<KeyRing> known = rings.orderedStream().toList();
        RequestMatcher script = PathPatternRequestMatcher.withDefaults().matcher("/api/v1/**");
        http
                .addFilterBefore(new KeyFilter(known, json), UsernamePasswordAuthenticationFilter.class)
                .authorizeHttpRequests(rules -> rules
                        .dispatcherTypeMatchers(jakarta.servlet.DispatcherType.ERROR, jakarta.servlet.DispatcherType.FORWARD).permitAll()
                        .requestMatchers("/login", "/error", "/favicon.svg", "/v*/**", "/shared/**", "/webjars/**").permitAll()
                        .requestMatchers("/actuator/health").permitAll()
                        .requestMatchers("/actuator/**").hasRole("ADMINISTRATOR")
                        .requestMatchers(HttpMethod.POST, "/api/v1/decodings", "/api/v1/profile-analyses", "/api/v1/stability-analyses")
                        .access(peopleOr("SCOPE_compute"))
                        .requestMatchers(HttpMethod.POST, "/api/v1/messages")
                        .access(anyOf("ROLE_FORECASTER", "ROLE_SCIENTIST", "ROLE_SUPERVISOR", "ROLE_OBSERVER", "SCOPE_messages"))
                        .requestMatchers(HttpMethod.GET, "/api/v1/**").access(peopleOr("SCOPE_read"))
                        .requestMatchers(HttpMethod.PUT, "/api/v1/stations", "/api/v1/fixes").hasRole("ADMINISTRATOR")
                        .requestMatchers(HttpMethod.POST, "/intake/**").hasAnyRole("FORECASTER", "SCIENTIST", "SUPERVISOR", "OBSERVER")
                        .requestMatchers(HttpMethod.POST, "/stations/**").hasRole("ADMINISTRATOR")
                        .anyRequest().access(anyOf(PEOPLE)))
                .formLogin(login -> login.loginPage("/login").defaultSuccessUrl("/", true).permitAll())
                .logout(logout -> logout.logoutSuccessUrl("/login?left"))
                // A key is sent on purpose with each request, so it can't be ridden on from another site.
                .csrf(csrf -> csrf.ignoringRequestMatchers(KeyFilter::carriesKey))
                .exceptionHandling(refusals -> refusals
                        .authenticationEntryPoint((request, response, cause) -> {
                            if (script.matches(request)) {
                                refuse(response, json, HttpStatus.UNAUTHORIZED, "NOT_SIGNED_IN", "Sign in at /login, or send a key as Authorization: Bearer.");
                            } else {
                                new LoginUrlAuthenticationEntryPoint("/login").commence(request, response, cause);
                            }
                        })
                        .accessDeniedHandler((request, response, cause) -> {
                            if (script.matches(request) && !isSignedIn()) {
                                refuse(response, json, HttpStatus.UNAUTHORIZED, "NOT_SIGNED_IN", "Sign in at /login, or send a key as Authorization: Bearer.");
                            } else if (script.matches(request) && cause instanceof CsrfException) {
                                refuse(response, json, HttpStatus.FORBIDDEN, "CSRF_TOKEN_MISSING",
                                        "A signed-in browser sends the token of its page with each change, as the header X-CSRF-TOKEN. It is missing or old: read the page again.");
                            } else if (script.matches(request)) {
                                refuse(response, json, HttpStatus.FORBIDDEN, "NOT_ALLOWED", "Your roles or the scopes of this key do not allow this call.");
                            } else {
                                new AccessDeniedHandlerImpl().handle(request, response, cause);
                            }
                        }))
                .headers(headers -> headers
                        .contentSecurityPolicy(policy -> policy.policyDirectives(CONTENT_SECURITY_POLICY))
                        .referrerPolicy(policy -> policy.policy(
                                org.springframework.security.web.header.writers.ReferrerPolicyHeaderWriter.ReferrerPolicy.SAME_ORIGIN)));
        return http.build();
    }

    /** The token of a form is looked at before the request knows its principal, so the context is asked. */
    private static boolean isSignedIn() {
        Authentication authentication = SecurityContextHolder.getContext().getAuthentication();
        return authentication != null && !(authentication instanceof AnonymousAuthenticationToken);
    }

    private static void refuse(HttpServletResponse response, JsonMapper json, HttpStatus status, String code, String detail) throws IOException {
        response.setStatus(status.value());
        response.setContentType(MediaType.APPLICATION_PROBLEM_JSON_VALUE);
        json.writeValue(response.getOutputStream(), Problem.of(status, code, detail));
    }

    private static AuthorizationManager<RequestAuthorizationContext> anyOf(String... authorities) {
        return AuthorityAuthorizationManager.hasAnyAuthority(authorities);
    }

    private static AuthorizationManager<RequestAuthorizationContext> peopleOr(String scope) {
        return AuthorizationManagers.anyOf(anyOf(PEOPLE), anyOf(scope));
    }
}
