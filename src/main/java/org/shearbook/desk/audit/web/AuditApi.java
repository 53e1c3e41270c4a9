package org.shearbook.desk.audit.web;

import jakarta.servlet.http.HttpServletRequest;
import java.time.Clock;
import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditEntry;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.shell.Problem;
import org.springframework.http.HttpStatus;
import org.springframework.security.core.Authentication;
import org.springframework.web.ErrorResponseException;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;

/** The chain of acts for scripts; under the same rule of who reads what as the page. */
@RestController
@RequestMapping("/api/v1/audit-entries")
class AuditApi {

    private static final int MOST = 500;

    private final AuditTrail audit;
    private final AuditReader reader;
    private final Clock clock;

    AuditApi(AuditTrail audit, AuditReader reader, Clock clock) {
        this.audit = audit;
        this.reader = reader;
        this.clock = clock;
    }

    /** @param next sequence to give as {@code after} for the next page; null when this is the last */
    record Page(List<EntryDocument> entries, @Nullable Long next) {
    }

    /** One act. */
    record EntryDocument(long sequence, Instant recordedAt, String actor, String role, boolean holdsDesk, String workstation, String act,
            String subjectKind, String subjectId, int subjectVersion, @Nullable String before, @Nullable String after, @Nullable String reason,
            String applicationVersion, String previousHash, String hash) {

        static EntryDocument of(AuditEntry entry) {
            return new EntryDocument(entry.sequence(), entry.recordedAt(), entry.actor().username(), entry.actor().role(), entry.actor().holdsDesk(),
                    entry.actor().workstation(), entry.act(), entry.subject().kind(), entry.subject().id(), entry.subject().version(), entry.before(),
                    entry.after(), entry.reason(), entry.applicationVersion(), entry.previousHash(), entry.hash());
        }
    }

    /** What a walk over the chain found. */
    record IntegrityDocument(boolean intact, long entries, String headHash, @Nullable Long firstBroken, @Nullable String whatIsBroken, Instant checkedAt) {
    }

    @GetMapping
    Page entries(@RequestParam(defaultValue = "") String actor, @RequestParam(defaultValue = "") String subjectKind, @RequestParam(defaultValue = "") String subjectId,
            @RequestParam(required = false) @Nullable Instant from, @RequestParam(required = false) @Nullable Instant until,
            @RequestParam(required = false) @Nullable Long after, @RequestParam(defaultValue = "100") int limit, AsKnownAt asKnownAt,
            Authentication person, HttpServletRequest request) {
        boolean all = reader.readsAll(person);
        int most = Math.max(1, Math.min(MOST, limit));
        List<AuditEntry> page = audit.newest(new AuditTrail.Wanted(all ? actor : person.getName(), subjectKind, subjectId,
                from == null ? AuditTrail.Wanted.EVERYTHING.from() : from, until == null ? AuditTrail.Wanted.EVERYTHING.until() : until), asKnownAt, after, most);
        reader.keepReading(person, request, all ? "entries" : "own entries");
        return new Page(page.stream().map(EntryDocument::of).toList(), page.size() == most ? page.get(page.size() - 1).sequence() : null);
    }

    @GetMapping("/integrity")
    IntegrityDocument integrity(Authentication person, HttpServletRequest request) {
        if (!reader.readsAll(person)) {
            throw new ErrorResponseException(HttpStatus.FORBIDDEN, Problem.of(HttpStatus.FORBIDDEN, "NOT_ALLOWED",
                    "The check of the chain is for supervisors and administrators. Ask one of them."), null);
        }
        AuditTrail.Integrity integrity = audit.integrity();
        reader.keepReading(person, request, "integrity");
        return new IntegrityDocument(integrity.intact(), integrity.entries(), integrity.headHash(), integrity.firstBroken(), integrity.whatIsBroken(), clock.instant());
    }
}
