package org.shearbook.met.decode;

import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.YearMonth;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/**
 * Upper-air reports in FM 35 TEMP and its ship, drop and mobile forms, and in FM 32 PILOT (WMO-No. 306, Vol. I.1).
 * Each part of each station becomes one {@link DecodedSounding}; {@link AscentMerge} joins the parts of one ascent.
 *
 * <p>A report gives day and hour only. They become the newest such moment that is not later than the receipt plus
 * {@value #TOLERANCE_HOURS} hours. The hour is the one in the report: some services write the nominal hour, others
 * that of the release. The release time, where section 7 gives it, is the moment of that time of day nearest to it.
 */
public final class TempDecoder implements MessageDecoder {

    /** A report of a nominal hour may be sent this long before it [h]. */
    private static final int TOLERANCE_HOURS = 3;
    /** Months in which a day of the month is sought: of any three in a row at least one has 31 days. */
    private static final int MONTHS_SOUGHT = 3;
    private static final int LOOKED_AT = 65_536;

    @Override
    public String format() {
        return "TEMP";
    }

    @Override
    public boolean recognises(byte[] bytes) {
        return !MessageText.isBinary(bytes)
                && TempBulletin.isLikely(MessageText.ofBytes(bytes.length <= LOOKED_AT ? bytes : Arrays.copyOf(bytes, LOOKED_AT)));
    }

    @Override
    public Decoding decode(byte[] bytes, DecodingContext context) {
        List<DecodedMessage> messages = new ArrayList<>();
        List<Rejection> rejected = new ArrayList<>();
        for (TempBulletin.Section section : TempBulletin.sections(MessageText.ofBytes(bytes))) {
            if (section.part().isEmpty()) {
                rejected.add(new Rejection(section.line(), section.column(), "PART_UNKNOWN", "No part of a report (TTAA, TTBB, TTCC, TTDD, PPBB …) begins this text. "
                        + "If it is a report, put its part before it and paste it again.", section.raw()));
                continue;
            }
            try {
                messages.add(decode(section, context));
            } catch (Unreadable unreadable) {
                rejected.add(unreadable.asRejection(section.raw()));
            }
        }
        return new Decoding(format(), messages, rejected);
    }

    private static DecodedSounding decode(TempBulletin.Section report, DecodingContext context) throws Unreadable {
        RemarkList remarks = new RemarkList();
        TempIdentification identification = TempIdentification.read(report, remarks);
        Instant nominalAt = newest(identification.day(), identification.hour(), context.receivedAt(), report);
        TempCursor cursor = new TempCursor(report.groups(), identification.end(), identification.speedUnit(), remarks);
        if (isNil(report, identification.end())) {
            remarks.add(report.line(), report.column(), "NO_ASCENT", "The station reports that no ascent was made.");
            return sounding(report, identification, nominalAt, null, "", cursor, remarks);
        }
        readLevels(report.part(), cursor, identification);
        if (cursor.levels().isEmpty()) {
            throw new Unreadable(report.line(), report.column(), "NO_LEVELS", "No level of this report can be read. Compare with the report as sent and paste it corrected.");
        }
        Release release = release(report, cursor.at(), nominalAt, remarks);
        return sounding(report, identification, nominalAt, release.at(), release.sondeType(), cursor, remarks);
    }

    private static DecodedSounding sounding(TempBulletin.Section report, TempIdentification identification, Instant nominalAt,
                                            @Nullable Instant launchedAt, String sondeType, TempCursor cursor, RemarkList remarks) {
        return new DecodedSounding(identification.stationId(), identification.latitude(), identification.longitude(), identification.elevation(),
                nominalAt, launchedAt, Set.of(report.part()), report.correction(), sondeType, cursor.levels(),
                report.raw(), report.line(), remarks.toList(report.line()));
    }

    private static void readLevels(String part, TempCursor cursor, TempIdentification identification) {
        boolean pilot = part.startsWith("PP") || part.startsWith("QQ") || part.startsWith("EE");
        switch (part.charAt(3)) {
            case 'A', 'C' -> {
                if (pilot) {
                    new PilotWinds(cursor, part.endsWith("C"), identification.stationId()).readPressures();
                } else {
                    new TempStandardLevels(cursor, part.endsWith("A"), identification.lastWind()).read();
                }
            }
            default -> {
                if (pilot) {
                    new PilotWinds(cursor, part.endsWith("D"), identification.stationId()).readHeights();
                } else {
                    new TempSignificantLevels(cursor, part.endsWith("B")).read();
                }
            }
        }
    }

    private static boolean isNil(TempBulletin.Section report, int from) {
        return from < report.groups().size() && report.groups().get(from).text().equals("NIL");
    }

    private record Release(@Nullable Instant at, String sondeType) {
    }

    /** Section 7: {@code 31313 srrarasasa 8GGgg}. Reading stops at the sections of regional and national use behind it. */
    private static Release release(TempBulletin.Section report, int from, Instant nominalAt, RemarkList remarks) {
        List<TempGroup> groups = report.groups();
        if (from >= groups.size() || !groups.get(from).text().equals("31313")) {
            return new Release(null, "");
        }
        String sondeType = "";
        Instant releasedAt = null;
        for (int i = from + 1; i < groups.size() && !TempCursor.isLaterSection(groups.get(i).text()); i++) {
            TempGroup group = groups.get(i);
            if (i == from + 1 && group.isValue() && TempCode.areDigits(group.text(), 1, 3)) {
                sondeType = group.text().substring(1, 3);
            } else if (group.isValue() && group.text().charAt(0) == '8' && TempCode.areDigits(group.text(), 1, 5)) {
                releasedAt = timeOfDay(group, nominalAt, remarks);
            }
        }
        return new Release(releasedAt, sondeType);
    }

    private static @Nullable Instant timeOfDay(TempGroup group, Instant nominalAt, RemarkList remarks) {
        int hour = Integer.parseInt(group.text().substring(1, 3));
        int minute = Integer.parseInt(group.text().substring(3));
        if (hour > 23 || minute > 59) {
            remarks.add(group.line(), group.column(), "RELEASE_TIME_UNREADABLE", "'" + group.text() + "' is not a time of release; it counts as missing.");
            return null;
        }
        LocalDateTime midnight = LocalDateTime.ofInstant(nominalAt, ZoneOffset.UTC).toLocalDate().atStartOfDay();
        Instant sameDay = midnight.plusHours(hour).plusMinutes(minute).toInstant(ZoneOffset.UTC);
        Duration after = Duration.between(nominalAt, sameDay);
        if (after.compareTo(Duration.ofHours(12)) > 0) {
            return sameDay.minus(Duration.ofDays(1));
        }
        return after.compareTo(Duration.ofHours(-12)) < 0 ? sameDay.plus(Duration.ofDays(1)) : sameDay;
    }

    private static Instant newest(int day, int hour, Instant receivedAt, TempBulletin.Section report) throws Unreadable {
        Instant latest = receivedAt.plus(Duration.ofHours(TOLERANCE_HOURS));
        YearMonth month = YearMonth.from(latest.atOffset(ZoneOffset.UTC));
        for (int i = 0; i < MONTHS_SOUGHT; i++) {
            if (month.minusMonths(i).isValidDay(day)) {
                Instant candidate = month.minusMonths(i).atDay(day).atTime(hour, 0).toInstant(ZoneOffset.UTC);
                if (!candidate.isAfter(latest)) {
                    return candidate;
                }
            }
        }
        throw new Unreadable(report.line(), report.column(), "DATE_UNREADABLE", "There was no day " + day + " in the months before the receipt.");
    }
}
