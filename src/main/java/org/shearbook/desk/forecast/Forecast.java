package org.shearbook.desk.forecast;

import java.time.Duration;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * One issued version of a forecast.
 *
 * @param number     the n of SLF n, the same for all versions
 * @param version    1 as first issued; each amendment, correction and cancellation adds one
 * @param state      which act made this version
 * @param text       exactly as filed
 * @param author     username of who filed this version
 * @param reason     why it was amended, corrected or cancelled; null as first issued
 * @param issuedAt   when the first version was issued
 * @param recordedAt when this version was filed
 */
public record Forecast(ForecastId id, int number, int version, State state, ForecastContent content, String text,
        String author, @Nullable String reason, Instant issuedAt, Instant recordedAt) {

    /** The act that made a version. */
    public enum State { ISSUED, AMENDED, CORRECTED, CANCELLED }

    /** Where a version stands at a moment; derived, never written. */
    public enum Standing { UPCOMING, IN_FORCE, EXPIRED, CANCELLED }

    /** {@code SLF 02}. */
    public String name() {
        return "SLF %02d".formatted(number);
    }

    public Standing standing(Instant at) {
        if (state == State.CANCELLED) {
            return Standing.CANCELLED;
        }
        if (!content.validUntil().isAfter(at)) {
            return Standing.EXPIRED;
        }
        return content.validFrom().isAfter(at) ? Standing.UPCOMING : Standing.IN_FORCE;
    }

    /** Neither cancelled nor ended: what the desk still answers for. */
    public boolean isLive(Instant at) {
        Standing standing = standing(at);
        return standing == Standing.IN_FORCE || standing == Standing.UPCOMING;
    }

    /** Minutes of its validity gone by at a moment, from 0 to {@link #minutesLong()}. */
    public long minutesGone(Instant at) {
        return Math.max(0, Math.min(minutesLong(), Duration.between(content.validFrom(), at).toMinutes()));
    }

    public long minutesLong() {
        return Duration.between(content.validFrom(), content.validUntil()).toMinutes();
    }

    /** When it ended or will end: the cancellation, or the end of its validity. */
    public Instant endsAt() {
        return state == State.CANCELLED && recordedAt.isBefore(content.validUntil()) ? recordedAt : content.validUntil();
    }
}
