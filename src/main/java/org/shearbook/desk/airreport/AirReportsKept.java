package org.shearbook.desk.airreport;

import java.util.List;
import org.shearbook.desk.audit.Actor;

/**
 * Reports were kept, one or a whole batch. Not an act of its own: the batch that brought them in is.
 *
 * @param reports in the order in which they were handed over
 */
public record AirReportsKept(Actor actor, List<Kept> reports) {

    public AirReportsKept {
        reports = List.copyOf(reports);
    }
}
