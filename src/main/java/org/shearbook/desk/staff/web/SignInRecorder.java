package org.shearbook.desk.staff.web;

import org.shearbook.desk.audit.AccessTrail;
import org.shearbook.desk.audit.Actor;
import org.springframework.context.event.EventListener;
import org.springframework.security.authentication.event.AbstractAuthenticationFailureEvent;
import org.springframework.security.authentication.event.AuthenticationSuccessEvent;
import org.springframework.security.authentication.event.LogoutSuccessEvent;
import org.springframework.security.core.Authentication;
import org.springframework.security.web.authentication.WebAuthenticationDetails;
import org.springframework.stereotype.Component;

/** Keeps who signed in and out and who failed to, in the chain of accesses. */
@Component
class SignInRecorder {

    private final AccessTrail trail;

    SignInRecorder(AccessTrail trail) {
        this.trail = trail;
    }

    @EventListener
    void signedIn(AuthenticationSuccessEvent event) {
        keep(event.getAuthentication(), "signed in");
    }

    @EventListener
    void refused(AbstractAuthenticationFailureEvent event) {
        keep(event.getAuthentication(), "sign-in refused");
    }

    @EventListener
    void signedOut(LogoutSuccessEvent event) {
        keep(event.getAuthentication(), "signed out");
    }

    private void keep(Authentication who, String act) {
        String address = who.getDetails() instanceof WebAuthenticationDetails details ? details.getRemoteAddress() : "local";
        String name = who.getName().length() > 100 ? who.getName().substring(0, 100) : who.getName();
        trail.keep(Actor.named(name, "-", false, address), act, "");
    }
}
