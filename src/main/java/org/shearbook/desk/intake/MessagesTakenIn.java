package org.shearbook.desk.intake;

import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/**
 * A batch was taken in: one act, whatever it held. The digest binds the records it made and the bytes it came in,
 * these through their salts, so that it still stands when the bytes are forgotten.
 */
public record MessagesTakenIn(Actor actor, long batchId, int accepted, int duplicates, int queued, int refused, String digest) implements Audited {

    @Override
    public String act() {
        return "messages taken in";
    }

    @Override
    public Subject subject() {
        return new Subject("intake batch", Long.toString(batchId), 0);
    }

    @Override
    public @Nullable String before() {
        return null;
    }

    @Override
    public String after() {
        return "%d accepted, %d of them known already; %d queued; %d refused; digest %s".formatted(accepted, duplicates, queued, refused, digest);
    }

    @Override
    public @Nullable String reason() {
        return null;
    }
}
