package org.shearbook.desk.intake;

import java.util.List;

/** What became of one batch. */
public record TakenIn(long batchId, List<Accepted> accepted, List<Queued> queued, List<Refused> refused) {

    public TakenIn {
        accepted = List.copyOf(accepted);
        queued = List.copyOf(queued);
        refused = List.copyOf(refused);
    }

    public long duplicates() {
        return accepted.stream().filter(Accepted::duplicate).count();
    }
}
