package org.shearbook.desk.station;

import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/** A list of fixes was loaded; it takes the place of the earlier list of that name. */
public record FixListKept(Actor actor, FixList list, String digest, @Nullable String before) implements Audited {

    @Override
    public String act() {
        return "fixes loaded";
    }

    @Override
    public Subject subject() {
        return new Subject("fix list", list.name(), list.version());
    }

    @Override
    public String after() {
        return "%d fixes; digest %s".formatted(list.fixCount(), digest);
    }

    @Override
    public @Nullable String reason() {
        return null;
    }
}
