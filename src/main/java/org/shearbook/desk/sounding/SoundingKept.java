package org.shearbook.desk.sounding;

import org.shearbook.desk.audit.Actor;

/**
 * A new version of a sounding was kept. Told inside the transaction that keeps it; it is no act of its own, the
 * intake that brought the message in is.
 */
public record SoundingKept(Actor actor, SoundingId id, int version) {
}
