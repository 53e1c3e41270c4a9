package org.shearbook.desk.shell;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;

/**
 * How values are shown: the bean {@code show} of every template. Missing is a dash, never zero; times are UTC, with
 * the date whenever it is not today's; decimals as the table of units says.
 */
@Component("show")
public class Show {

    /** What stands where nothing is known. */
    public static final String MISSING = "–";

    private static final double KNOT = 1852.0 / 3600.0;
    private static final double NAUTICAL_MILE = 1852.0;

    private static final DateTimeFormatter TIME = DateTimeFormatter.ofPattern("HHmm'Z'", Locale.ROOT).withZone(ZoneOffset.UTC);
    private static final DateTimeFormatter SECOND = DateTimeFormatter.ofPattern("HHmm:ss'Z'", Locale.ROOT).withZone(ZoneOffset.UTC);
    private static final DateTimeFormatter DAY = DateTimeFormatter.ofPattern("d MMM", Locale.ROOT).withZone(ZoneOffset.UTC);
    private static final DateTimeFormatter LONG_DAY = DateTimeFormatter.ofPattern("d MMMM yyyy", Locale.ENGLISH).withZone(ZoneOffset.UTC);

    private final Clock clock;

    public Show(Clock clock) {
        this.clock = clock;
    }

    /** {@code 1142Z}, or {@code 12 MAR 1142Z} when that is not today. */
    public String utc(@Nullable Instant moment) {
        if (moment == null) {
            return MISSING;
        }
        return isToday(moment) ? TIME.format(moment) : day(moment) + " " + TIME.format(moment);
    }

    /** The time of day alone, beside a date that is written out: {@code 1142Z}. */
    public String time(@Nullable Instant moment) {
        return moment == null ? MISSING : TIME.format(moment);
    }

    /** Always with the date: {@code 12 MAR 1142Z}. */
    public String utcWithDate(@Nullable Instant moment) {
        return moment == null ? MISSING : day(moment) + " " + TIME.format(moment);
    }

    /** To the second, as in the register: {@code 12 MAR 1142:07Z}. */
    public String utcToSecond(@Nullable Instant moment) {
        return moment == null ? MISSING : day(moment) + " " + SECOND.format(moment);
    }

    /** {@code 12 March 2031}. */
    public String longDate(@Nullable Instant moment) {
        return moment == null ? MISSING : LONG_DAY.format(moment);
    }

    /** {@code 12 MAR}. */
    public String day(Instant moment) {
        return DAY.format(moment).toUpperCase(Locale.ROOT);
    }

    /** Age with its moment, since relative time alone is never shown: {@code 12 min ago (1130Z)}. */
    public String ago(@Nullable Instant moment) {
        return moment == null ? MISSING : duration(Duration.between(moment, clock.instant())) + " ago (" + utc(moment) + ")";
    }

    /** As {@link #ago(Instant)}, seen from another moment than now. */
    public String ago(@Nullable Instant moment, Instant at) {
        return moment == null ? MISSING : age(moment, at) + " ago (" + utc(moment) + ")";
    }

    /** How old something is at a moment; beside a column that shows the moment itself. */
    public String age(@Nullable Instant moment, Instant at) {
        return moment == null ? MISSING : duration(Duration.between(moment, at));
    }

    /** Time from a moment until another, or {@code ended}. */
    public String left(@Nullable Instant until, Instant at) {
        if (until == null) {
            return MISSING;
        }
        return until.isAfter(at) ? duration(Duration.between(at, until)) + " left" : "ended";
    }

    /** The word for an intensity's abbreviation, which is also the name of its symbol: {@code severe}. */
    public String intensity(@Nullable String abbreviation) {
        if (abbreviation == null) {
            return MISSING;
        }
        return switch (abbreviation) {
            case "NIL" -> "nil";
            case "LGT" -> "light";
            case "MOD" -> "moderate";
            case "SEV" -> "severe";
            case "EXTRM" -> "extreme";
            default -> abbreviation;
        };
    }

    /** Time from now until a moment, or {@code ended}. */
    public String left(@Nullable Instant until) {
        if (until == null) {
            return MISSING;
        }
        Duration left = Duration.between(clock.instant(), until);
        return left.isNegative() || left.isZero() ? "ended" : duration(left) + " left";
    }

    /** {@code 12 min}, {@code 2 h 04 min}, {@code 3 d 2 h}. */
    public String duration(Duration duration) {
        long minutes = Math.max(0, duration.toMinutes());
        if (minutes < 60) {
            return minutes + " min";
        }
        if (minutes < 48 * 60) {
            return "%d h %02d min".formatted(minutes / 60, minutes % 60);
        }
        return "%d d %d h".formatted(minutes / 1440, minutes % 1440 / 60);
    }

    /** @param hundredsOfFeet pressure altitude [hundreds of feet] */
    public String flightLevel(@Nullable Double hundredsOfFeet) {
        return missing(hundredsOfFeet) ? MISSING : "FL%03d".formatted(Math.round(hundredsOfFeet));
    }

    /** @param metres height [m], shown to 10 m as kilometres */
    public String kilometres(@Nullable Double metres) {
        return missing(metres) ? MISSING : number(metres / 1000, 2) + " km";
    }

    /** @param metres length or depth [m] */
    public String metres(@Nullable Double metres) {
        return missing(metres) ? MISSING : Math.round(metres / 10) * 10 + " m";
    }

    /** Wavelength: {@code 4.5 km}. */
    public String wavelength(@Nullable Double metres) {
        return missing(metres) ? MISSING : number(metres / 1000, 1) + " km";
    }

    /** @param pascals pressure [Pa]; a tenth of a hectopascal above the 100 hPa level */
    public String hectopascals(@Nullable Double pascals) {
        return missing(pascals) ? MISSING : number(pascals / 100, pascals < 10_000 ? 1 : 0) + " hPa";
    }

    /** @param metresPerSecond speed [m s⁻¹] */
    public String knots(@Nullable Double metresPerSecond) {
        return missing(metresPerSecond) ? MISSING : Math.round(metresPerSecond / KNOT) + " kt";
    }

    /** @param knots change of wind over exactly 1000 ft [kt] */
    public String shear(@Nullable Double knots) {
        return missing(knots) ? MISSING : number(knots, 1) + " kt/1000 ft";
    }

    /** Two decimals below 1, one up to 10, then {@code >10}; overturned air has no Richardson number to show. */
    public String richardson(@Nullable Double ri) {
        if (missing(ri)) {
            return MISSING;
        }
        if (ri < 0) {
            return "overturned";
        }
        return ri > 10 ? ">10" : number(ri, ri < 1 ? 2 : 1);
    }

    /** Three figures from true north: {@code 250°}. */
    public String direction(@Nullable Double degrees) {
        return missing(degrees) ? MISSING : "%03d°".formatted(Math.round(degrees) % 360 == 0 ? 360 : Math.round(degrees) % 360);
    }

    /** @param seconds e-folding time [s]; infinite where nothing grows */
    public String eFolding(@Nullable Double seconds) {
        if (missing(seconds)) {
            return MISSING;
        }
        return Double.isInfinite(seconds) ? "stable" : number(seconds / 60, 1) + " min";
    }

    /** Eddy dissipation rate with two decimals. */
    public String edr(@Nullable Double edr) {
        return missing(edr) ? MISSING : number(edr, 2);
    }

    /** @param metres distance [m], shown in nautical miles */
    public String nauticalMiles(@Nullable Double metres) {
        return missing(metres) ? MISSING : Math.round(metres / NAUTICAL_MILE) + " NM";
    }

    /** @param kelvin temperature [K] */
    public String celsius(@Nullable Double kelvin) {
        return missing(kelvin) ? MISSING : number(kelvin - 273.15, 1) + " °C";
    }

    /** {@code N4712 W03000}, to the minute. */
    public String position(@Nullable Double latitude, @Nullable Double longitude) {
        if (missing(latitude) || missing(longitude)) {
            return MISSING;
        }
        return degreesMinutes(latitude, "N", "S", 2) + " " + degreesMinutes(longitude, "E", "W", 3);
    }

    private static String degreesMinutes(double degrees, String positive, String negative, int digits) {
        long minutes = Math.round(Math.abs(degrees) * 60);
        return (degrees < 0 ? negative : positive) + ("%0" + digits + "d%02d").formatted(minutes / 60, minutes % 60);
    }

    /** A number with a decimal point and a true minus sign. */
    public String number(@Nullable Double value, int decimals) {
        return missing(value) ? MISSING : String.format(Locale.ROOT, "%." + decimals + "f", value).replace('-', '−');
    }

    /** Whether a moment falls on today's date in UTC. */
    public boolean isToday(Instant moment) {
        return moment.atZone(ZoneOffset.UTC).toLocalDate().equals(clock.instant().atZone(ZoneOffset.UTC).toLocalDate());
    }

    private static boolean missing(@Nullable Double value) {
        return value == null || value.isNaN();
    }
}
