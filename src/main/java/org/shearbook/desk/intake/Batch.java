package org.shearbook.desk.intake;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** One act of taking in, as it stands in the record. */
public record Batch(long id, String channel, String actor, int arrivals, int accepted, int duplicates, int queued, int refused, String digest,
        Instant receivedAt, Instant recordedAt) {

    /**
     * One file of a batch.
     *
     * @param refusedCode null unless it was refused as a whole
     */
    public record Part(int number, String name, long bytes, String format, int accepted, int queued, @Nullable String refusedCode, @Nullable String refusedText) {
    }

    /** One record of a batch. */
    public record Line(String kind, long id, int version, boolean duplicate, int arrival, int line, int remarks) {
    }

    /**
     * A batch with what it held.
     *
     * @param records the first ones when there are many
     */
    public record Whole(Batch batch, List<Part> parts, List<Line> records, List<QueueItem> items) {
    }
}
