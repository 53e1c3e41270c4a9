package org.shearbook.desk.intake;

import java.util.List;
import org.shearbook.met.decode.Remark;

/**
 * A message that was kept, or was known already.
 *
 * @param kind      {@code sounding} or {@code airReport}
 * @param id        number of the record
 * @param version   the version that holds the message
 * @param duplicate whether it was kept before
 * @param arrival   which arrival it came in, from 1
 * @param line      of the arrival, from 1
 */
public record Accepted(String kind, long id, int version, boolean duplicate, int arrival, int line, List<Remark> remarks) {

    static final String SOUNDING = "sounding";
    static final String AIR_REPORT = "airReport";

    public Accepted {
        remarks = List.copyOf(remarks);
    }
}
