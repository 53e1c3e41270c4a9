package org.shearbook.desk.staff;

import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/** An account was made or changed. Its password is no part of the record. */
public record PersonKept(Actor actor, Person person, @Nullable String before, @Nullable String reason) implements Audited {

    @Override
    public String act() {
        return before == null ? "account made" : "account changed";
    }

    @Override
    public Subject subject() {
        return new Subject("person", person.username(), person.version());
    }

    @Override
    public String after() {
        return describe(person);
    }

    static String describe(Person person) {
        return "%s; roles %s; %s".formatted(person.displayName(), person.roles().stream().sorted().toList(), person.enabled() ? "enabled" : "disabled");
    }
}
