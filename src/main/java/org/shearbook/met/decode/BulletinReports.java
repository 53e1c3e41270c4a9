package org.shearbook.met.decode;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/**
 * Cuts a bulletin into its reports. A report ends at an equals sign, at the next report or heading, at {@code NNNN}
 * or at the end; never at a blank line. What belongs to no report comes out as a piece of its own.
 */
final class BulletinReports {

    /** Longer than any report of these kinds; an equals sign further away is not that of this report. */
    static final int LONGEST = 800;

    private static final Pattern HEADING =
            Pattern.compile("[A-Z]{4}\\d{0,2} {1,3}[A-Z]{4} {1,3}(\\d{2})(\\d{2})(\\d{2})(?: {1,3}[A-Z]{3})?");
    private static final Pattern SEQUENCE = Pattern.compile("(?:ZCZC ?[A-Z0-9 ]{0,12}|NNNN|\\d{1,5})");

    /**
     * A part of the input.
     *
     * @param from      index of its first character
     * @param to        index behind its last, the equals sign included
     * @param isReport  whether it begins like a report
     * @param headingAt moment of the heading above it; null when there is none
     */
    record Piece(int from, int to, boolean isReport, @Nullable Instant headingAt) {

        boolean isTooLong() {
            return to - from > 2 * LONGEST;
        }

        Rejection tooLong(BulletinText text) {
            return new Rejection(text.lineAt(from), text.columnAt(from), "REPORT_TOO_LONG", "The report is longer than " + 2 * LONGEST
                    + " characters: line ends or equals signs are missing. Cut it by hand and send the parts.", text.text(from, to).strip());
        }
    }

    private final BulletinText text;
    private final String capitals;
    private final Instant receivedAt;
    private final Predicate<String> begins;
    private final Predicate<String> preface;
    private final List<Piece> pieces = new ArrayList<>();
    private @Nullable Instant headingAt;
    private boolean hasHeading;
    private int openFrom = -1;
    private int openTo;
    private boolean awaitsEquals;
    private int linesAfterFirst;

    private BulletinReports(BulletinText text, String capitals, Instant receivedAt, Predicate<String> begins, Predicate<String> preface) {
        this.text = text;
        this.capitals = capitals;
        this.receivedAt = receivedAt;
        this.begins = begins;
        this.preface = preface;
    }

    /**
     * @param text       the input
     * @param capitals   the same in capitals
     * @param receivedAt resolves the headings
     * @param begins     whether a line, without blanks round it, begins a report
     * @param preface    whether a line belongs to the frame round the reports
     */
    static List<Piece> split(BulletinText text, String capitals, Instant receivedAt, Predicate<String> begins, Predicate<String> preface) {
        BulletinReports reports = new BulletinReports(text, capitals, receivedAt, begins, preface);
        for (int line = 0; line < text.lines(); line++) {
            int start = text.lineStart(line);
            int end = text.lineEnd(line);
            while (start < end) {
                int equals = start;
                while (equals < end && capitals.charAt(equals) != '=') {
                    equals++;
                }
                boolean ends = equals < end;
                int next = ends ? equals + 1 : end;
                reports.piece(start, next, ends);
                start = next;
            }
        }
        reports.close();
        return reports.pieces;
    }

    private void piece(int from, int to, boolean endsWithEquals) {
        int first = from;
        int last = endsWithEquals ? to - 1 : to;
        while (first < last && BulletinText.isBlank(text.text().charAt(first))) {
            first++;
        }
        while (last > first && BulletinText.isBlank(text.text().charAt(last - 1))) {
            last--;
        }
        if (first == last) {
            if (endsWithEquals && openFrom >= 0) {
                openTo = to;
                close();
            }
            return;
        }
        // only the beginning decides what a line is
        String line = capitals.substring(first, Math.min(last, first + LONGEST)).strip();
        if (isFrame(line)) {
            return;
        }
        if (begins.test(line)) {
            close();
            openFrom = first;
            openTo = to;
            linesAfterFirst = 0;
            awaitsEquals = !endsWithEquals && equalsComesFirst(to);
        } else if (openFrom >= 0 && last - openFrom <= LONGEST && (awaitsEquals || hasHeading && linesAfterFirst == 0)) {
            openTo = to;
            linesAfterFirst++;
        } else {
            close();
            pieces.add(new Piece(first, to, false, headingAt));
        }
        if (endsWithEquals) {
            close();
        }
    }

    private boolean isFrame(String line) {
        Matcher heading = line.length() <= 40 ? HEADING.matcher(line) : null;
        if (heading != null && heading.matches()) {
            close();
            hasHeading = true;
            headingAt = ReportedMoment.atOrBefore(Integer.parseInt(heading.group(1)), Integer.parseInt(heading.group(2)),
                    Integer.parseInt(heading.group(3)), receivedAt.plus(ReportedMoment.TOLERANCE));
            return true;
        }
        boolean frame = line.equals("NNNN") || line.length() <= 20 && !(openFrom >= 0 && awaitsEquals) && SEQUENCE.matcher(line).matches()
                || preface.test(line);
        if (frame) {
            close();
        }
        return frame;
    }

    private boolean equalsComesFirst(int from) {
        int limit = Math.min(capitals.length(), from + LONGEST);
        int lineStart = from;
        for (int index = from; index < limit; index++) {
            char c = capitals.charAt(index);
            if (c == '=') {
                return true;
            }
            if (text.text().charAt(index) == '\n') {
                lineStart = index + 1;
            } else if (index == lineStart && c == ' ') {
                lineStart++;
            } else if (index == lineStart && begins.test(capitals.substring(index, Math.min(capitals.length(), index + 40)).strip())) {
                return false;
            }
        }
        return false;
    }

    private void close() {
        if (openFrom >= 0) {
            int to = openTo;
            while (to > openFrom && BulletinText.isBlank(text.text().charAt(to - 1))) {
                to--;
            }
            pieces.add(new Piece(openFrom, to, true, headingAt));
            openFrom = -1;
        }
    }
}
