package org.shearbook.desk.audit.web;

import jakarta.servlet.http.HttpServletRequest;
import java.time.DateTimeException;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.Optional;
import java.util.stream.Collectors;
import org.shearbook.desk.audit.AccessTrail;
import org.shearbook.desk.audit.Actor;
import org.springframework.security.core.Authentication;
import org.springframework.security.core.GrantedAuthority;
import org.springframework.stereotype.Component;

/** Who may read which entries. Supervisors and administrators read all; everybody else what he or she did. Each reading is kept. */
@Component
class AuditReader {

    private final AccessTrail accesses;

    AuditReader(AccessTrail accesses) {
        this.accesses = accesses;
    }

    boolean readsAll(Authentication reader) {
        return reader.getAuthorities().stream().map(GrantedAuthority::getAuthority)
                .anyMatch(authority -> authority.equals("ROLE_SUPERVISOR") || authority.equals("ROLE_ADMINISTRATOR"));
    }

    void keepReading(Authentication reader, HttpServletRequest request, String what) {
        String roles = reader.getAuthorities().stream().map(GrantedAuthority::getAuthority)
                .filter(authority -> authority.startsWith("ROLE_") || authority.startsWith("SCOPE_"))
                .map(authority -> authority.substring(authority.indexOf('_') + 1)).sorted().collect(Collectors.joining(","));
        accesses.keep(Actor.named(reader.getName(), roles, false, request.getRemoteAddr()), "audit read", what);
    }

    /** A moment with its offset; empty where it can't be read. */
    static Optional<Instant> moment(String text) {
        try {
            return Optional.of(OffsetDateTime.parse(text.strip()).toInstant());
        } catch (DateTimeException unreadable) {
            return Optional.empty();
        }
    }
}
