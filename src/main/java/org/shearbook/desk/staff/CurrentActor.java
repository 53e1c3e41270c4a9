package org.shearbook.desk.staff;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpSession;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.stream.Collectors;
import org.shearbook.desk.audit.Actor;
import org.springframework.security.core.Authentication;
import org.springframework.security.core.GrantedAuthority;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.stereotype.Component;
import org.springframework.web.context.request.RequestContextHolder;
import org.springframework.web.context.request.ServletRequestAttributes;

/** Who acts in the request now served. */
@Component
public class CurrentActor {

    private final DeskHoldingBook holdings;

    CurrentActor(DeskHoldingBook holdings) {
        this.holdings = holdings;
    }

    /** The signed-in person or the key of this request; the desk itself where there is neither. */
    public Actor get() {
        Authentication authentication = SecurityContextHolder.getContext().getAuthentication();
        if (authentication == null || !authentication.isAuthenticated()) {
            return Actor.desk();
        }
        String roles = authentication.getAuthorities().stream().map(GrantedAuthority::getAuthority)
                .filter(authority -> authority.startsWith("ROLE_") || authority.startsWith("SCOPE_"))
                .map(authority -> authority.substring(authority.indexOf('_') + 1)).sorted().collect(Collectors.joining(","));
        String address = "local";
        String session = "-";
        if (RequestContextHolder.getRequestAttributes() instanceof ServletRequestAttributes attributes) {
            HttpServletRequest request = attributes.getRequest();
            address = request.getRemoteAddr();
            HttpSession open = request.getSession(false);
            session = open == null ? "-" : digest(open.getId());
        }
        return new Actor(authentication.getName(), roles, holdings.isHeldBy(authentication.getName()), address, address, session);
    }

    /** A session's identifier is as good as its password: the record holds a digest. */
    private static String digest(String sessionId) {
        try {
            byte[] hash = MessageDigest.getInstance("SHA-256").digest(sessionId.getBytes(StandardCharsets.UTF_8));
            return HexFormat.of().formatHex(hash, 0, 6);
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
    }
}
