package org.shearbook.desk.staff;

import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/** The desk was taken, or was left vacant. */
public record DeskHeld(Actor actor, DeskHolding holding, @Nullable String before) implements Audited {

    @Override
    public String act() {
        return holding.isVacant() ? "desk left" : "desk taken";
    }

    @Override
    public Subject subject() {
        return new Subject("desk", "desk", holding.version());
    }

    @Override
    public @Nullable String after() {
        return holding.holder();
    }

    @Override
    public @Nullable String reason() {
        return holding.reason();
    }
}
