package org.shearbook.desk.audit;

import org.jspecify.annotations.Nullable;

/**
 * An act at the desk. The event of a room implements it; {@link AuditTrail} hears it inside the same transaction,
 * so that there is no act without its entry and no entry without its act.
 */
public interface Audited {

    Actor actor();

    /** What was done, in the past tense: {@code issued}. */
    String act();

    Subject subject();

    /** The value before, or null where there was none. Never the identity of an aircraft, never raw bytes that hold one. */
    @Nullable String before();

    /** The value after, or null where none is left. Under the same rule as {@link #before()}. */
    @Nullable String after();

    /** Why, in the actor's words, or null. */
    @Nullable String reason();

    /**
     * What an act was done to.
     *
     * @param kind    the room's noun: {@code forecast}
     * @param id      its identifier
     * @param version the version the act made; 0 where the thing has no versions
     */
    record Subject(String kind, String id, int version) {
    }
}
