package org.shearbook.desk.forecast;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/**
 * A draft was saved or discarded. A draft is forgotten after a month, the chain is not: so the chain holds a digest
 * of the draft and not its words.
 */
public record ForecastDrafted(Actor actor, ForecastDraft draft) implements Audited {

    @Override
    public String act() {
        return draft.state() == ForecastDraft.State.DISCARDED ? "draft discarded" : "draft saved";
    }

    @Override
    public Subject subject() {
        return new Subject("forecast draft", Long.toString(draft.id().value()), draft.version());
    }

    @Override
    public @Nullable String before() {
        return null;
    }

    @Override
    public String after() {
        try {
            byte[] digest = MessageDigest.getInstance("SHA-256")
                    .digest(new TreeMap<>(draft.fields()).toString().getBytes(StandardCharsets.UTF_8));
            return "%s, SHA-256 %s".formatted(draft.purpose().name().toLowerCase(java.util.Locale.ROOT), HexFormat.of().formatHex(digest));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
    }

    @Override
    public @Nullable String reason() {
        return null;
    }
}
