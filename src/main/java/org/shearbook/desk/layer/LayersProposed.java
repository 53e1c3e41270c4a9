package org.shearbook.desk.layer;

import java.util.List;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.sounding.SoundingId;

/**
 * The layers of a sounding were found, or found again. Told in the transaction that keeps the sounding; no act of its own.
 *
 * @param standing from the lowest up; empty when there is none
 */
public record LayersProposed(Actor actor, SoundingId soundingId, List<Layer> standing) {

    public LayersProposed {
        standing = List.copyOf(standing);
    }
}
