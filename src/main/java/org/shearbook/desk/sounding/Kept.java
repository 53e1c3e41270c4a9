package org.shearbook.desk.sounding;

import java.util.List;
import org.shearbook.met.decode.Remark;

/**
 * What became of one message.
 *
 * @param version   the version of the sounding that holds it
 * @param duplicate whether the same content was kept before
 * @param remarks   about the sounding, the decoder's among them
 */
public record Kept(SoundingId id, int version, boolean duplicate, List<Remark> remarks) {

    public Kept {
        remarks = List.copyOf(remarks);
    }
}
