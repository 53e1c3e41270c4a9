package org.shearbook.desk.intake;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * One item of the queue, newest version.
 *
 * @param arrivalName where it came from
 * @param whatToDo    what is the matter and what to do; null once it was disposed of
 * @param raw         the text as received, shortened when it is long; null once it was disposed of
 */
public record QueueItem(
        long id, int version, long batchId, int arrival, String arrivalName, int line, int column, String code, ItemState state,
        @Nullable String settledBy, @Nullable String settledReason, @Nullable String whatToDo, @Nullable String raw,
        Instant receivedAt, Instant recordedAt) {
}
