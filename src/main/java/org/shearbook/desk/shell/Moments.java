package org.shearbook.desk.shell;

import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** Reads moments from forms and addresses. */
public final class Moments {

    /** Before and after everything that a database can hold. */
    public static final Instant EARLIEST = Instant.parse("0001-01-01T00:00:00Z");
    public static final Instant LATEST = Instant.parse("9999-12-31T00:00:00Z");

    private Moments() {
    }

    /**
     * Reads {@code 2031-03-12T06:15Z}, with or without seconds, offset or the {@code T}; a date alone is its midnight,
     * and no offset is UTC.
     *
     * @param field name of the field, for the refusal
     * @return null for nothing or blank
     * @throws UnreadableMoment when there is something else
     */
    public static @Nullable Instant read(String field, @Nullable String text) {
        if (text == null || text.isBlank()) {
            return null;
        }
        String written = text.strip().toUpperCase(Locale.ROOT).replaceFirst("^(\\S{10}) +", "$1T").replace(" ", "+");
        try {
            Instant moment = written.length() == 10 ? LocalDate.parse(written).atStartOfDay(ZoneOffset.UTC).toInstant()
                    : written.matches(".*T.*(Z|[+-]\\d\\d(:?\\d\\d)?)") ? OffsetDateTime.parse(written).toInstant()
                    : LocalDateTime.parse(written).toInstant(ZoneOffset.UTC);
            if (moment.isBefore(EARLIEST) || moment.isAfter(LATEST)) {
                throw new DateTimeException("outside the years 1 to 9999");
            }
            return moment;
        } catch (DateTimeException unreadable) {
            throw new UnreadableMoment(field, text, unreadable);
        }
    }
}
