package org.shearbook.desk.intake;

import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/** A person decided what becomes of something in the queue. */
public record ItemSettled(Actor actor, long itemId, int version, ItemState state, String reason) implements Audited {

    @Override
    public String act() {
        return "queue item settled";
    }

    @Override
    public Subject subject() {
        return new Subject("intake item", Long.toString(itemId), version);
    }

    @Override
    public String before() {
        return ItemState.OPEN.name();
    }

    @Override
    public String after() {
        return state.name();
    }
}
