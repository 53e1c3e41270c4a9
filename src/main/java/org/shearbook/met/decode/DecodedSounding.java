package org.shearbook.met.decode;

import java.time.Instant;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/**
 * One ascent, or one part of one, as reported. Values are SI, as in {@link ReportedLevel}; nothing was
 * interpolated, sorted out or corrected.
 *
 * @param stationId  as in the message: block and station number, ship's call sign, WIGOS or archive identifier
 * @param latitude   [degrees north]; {@code NaN} when the message does not say
 * @param longitude  [degrees east]; {@code NaN} when the message does not say
 * @param elevation  of the launch site above mean sea level [m]; {@code NaN} when the message does not say
 * @param nominalAt  the hour the ascent stands for; null when unknown
 * @param launchedAt the moment of release; null when unknown
 * @param parts      which parts were in the message, for example {@code TTAA}; empty for formats without parts
 * @param correction the correction mark of the message, for example {@code COR} or {@code CCA}; empty when none
 * @param sondeType  code or name of the instrument; empty when unknown
 * @param levels     in the order of the message; may be empty (a message that says no ascent was made)
 */
public record DecodedSounding(
        String stationId, double latitude, double longitude, double elevation,
        @Nullable Instant nominalAt, @Nullable Instant launchedAt,
        Set<String> parts, String correction, String sondeType,
        List<ReportedLevel> levels,
        String raw, int line, List<Remark> remarks) implements DecodedMessage {

    public DecodedSounding {
        parts = Set.copyOf(parts);
        levels = List.copyOf(levels);
        remarks = List.copyOf(remarks);
    }
}
