package org.shearbook.desk.sounding;

import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/** A person took a sounding out of use. It stays to be read, in all its versions. */
public record SoundingWithdrawn(Actor actor, SoundingId id, int version, String reason) implements Audited {

    @Override
    public String act() {
        return "withdrawn";
    }

    @Override
    public Subject subject() {
        return new Subject("sounding", id.toString(), version);
    }

    @Override
    public String before() {
        return "in use";
    }

    @Override
    public String after() {
        return "withdrawn";
    }
}
