package org.shearbook.desk.audit;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/** One act as it stands in the chain. */
public record AuditEntry(
        long sequence, Instant recordedAt, Actor actor, String act, Audited.Subject subject,
        @Nullable String before, @Nullable String after, @Nullable String reason,
        String applicationVersion, String previousHash, String hash) {

    /** The entry for an act, bound to the one before it. */
    static AuditEntry following(long sequence, String previousHash, Instant recordedAt, Audited act, String applicationVersion) {
        AuditEntry open = new AuditEntry(sequence, recordedAt, act.actor(), act.act(), act.subject(),
                act.before(), act.after(), act.reason(), applicationVersion, previousHash, "");
        return new AuditEntry(sequence, recordedAt, act.actor(), act.act(), act.subject(),
                act.before(), act.after(), act.reason(), applicationVersion, previousHash, open.computedHash());
    }

    /** The hash this content must have; differs from {@link #hash()} when somebody changed the entry. */
    String computedHash() {
        return new ChainHash(previousHash)
                .field("sequence", sequence).field("recordedAt", recordedAt)
                .field("actor", actor.username()).field("role", actor.role()).field("holdsDesk", actor.holdsDesk())
                .field("workstation", actor.workstation()).field("address", actor.address()).field("session", actor.session())
                .field("act", act).field("kind", subject.kind()).field("id", subject.id()).field("version", subject.version())
                .field("before", before).field("after", after).field("reason", reason)
                .field("application", applicationVersion)
                .hex();
    }
}
