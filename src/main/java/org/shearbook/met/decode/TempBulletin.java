package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;

/**
 * Cuts a received text into reports of upper-air observations. A report begins with its part ({@code TTAA}) and ends
 * at {@code =}, at the next part, at a new heading, at {@code NNNN}, or with the text: old sources have no end
 * sign, and blank lines stand inside reports. Headings, sequence numbers and control characters around the reports
 * are taken off; a correction mark in the heading or before the part is kept. What else stands between the reports
 * is returned too, as a section without part, because it may be a report that lost its first group.
 */
final class TempBulletin {

    /**
     * @param part       for example {@code TTAA}; empty for text that is no report
     * @param correction for example {@code COR} or {@code CCA}; empty when none
     * @param groups     behind the part, without the end sign
     * @param raw        as received
     * @param line       on which it begins
     * @param column     at which it begins
     */
    record Section(String part, String correction, List<TempGroup> groups, String raw, int line, int column) {
    }

    private static final Set<String> KINDS = Set.of("TT", "UU", "XX", "II", "PP", "QQ", "EE");

    private final MessageText text;
    private final List<TempGroup> groups;
    private final List<Section> sections = new ArrayList<>();
    private int at;
    private String correctionOfHeading = "";

    private TempBulletin(MessageText text) {
        this.text = text;
        this.groups = groups(text);
    }

    static List<Section> sections(MessageText text) {
        return new TempBulletin(text).cut();
    }

    /** Whether a text of groups is what these bytes hold: somewhere a part stands before a group with day and hour. */
    static boolean isLikely(MessageText text) {
        if (!namesAPart(text.text())) {
            return false;
        }
        List<TempGroup> groups = groups(text);
        for (int i = 0; i + 1 < groups.size(); i++) {
            if (isPart(groups.get(i).text())) {
                for (int k = i + 1; k < Math.min(groups.size(), i + 3); k++) {
                    if (isDayAndHour(groups.get(k))) {
                        return true;
                    }
                }
            }
        }
        return false;
    }

    /** A quick look: most texts that are no report are known by this alone. */
    private static boolean namesAPart(String text) {
        for (int i = 3; i < text.length(); i++) {
            char c = text.charAt(i);
            if (c >= 'A' && c <= 'D' && text.charAt(i - 1) == c && isPart(text.substring(i - 3, i + 1))) {
                return true;
            }
        }
        return false;
    }

    static boolean isPart(String text) {
        return text.length() == 4 && KINDS.contains(text.substring(0, 2)) && text.charAt(2) == text.charAt(3)
                && text.charAt(2) >= 'A' && text.charAt(2) <= 'D';
    }

    /** {@code YYGGI}: a day, 50 added for knots, and an hour. */
    static boolean isDayAndHour(TempGroup group) {
        String t = group.text();
        if (!group.isValue() || !TempCode.areDigits(t, 0, 4)) {
            return false;
        }
        int day = Integer.parseInt(t.substring(0, 2)) % 50;
        return day >= 1 && day <= 31 && Integer.parseInt(t.substring(0, 2)) <= 81 && Integer.parseInt(t.substring(2, 4)) <= 23;
    }

    private List<Section> cut() {
        while (at < groups.size()) {
            int heading = lengthOfHeading(at);
            if (heading > 0) {
                takeHeading(heading);
            } else if (isFrame(at)) {
                at++;
            } else {
                takeSection();
            }
        }
        return sections;
    }

    private void takeHeading(int length) {
        String last = groups.get(at + length - 1).text();
        correctionOfHeading = length == 4 && (last.startsWith("CC") || last.startsWith("AA")) ? last : "";
        at += length;
    }

    private void takeSection() {
        int first = at;
        String correction = correctionOfHeading;
        if (isCorrectionMark(groups.get(at).text()) && at + 1 < groups.size() && isPart(groups.get(at + 1).text())) {
            correction = groups.get(at).text();
            at++;
        }
        boolean report = isPart(groups.get(at).text());
        String part = report ? groups.get(at).text() : "";
        if (report) {
            at++;
            if (at < groups.size() && isCorrectionMark(groups.get(at).text())) {
                correction = groups.get(at).text();
                at++;
            }
        }
        int from = at;
        while (at < groups.size() && !endsReport(at)) {
            at++;
        }
        int until = at;
        if (until < groups.size() && lengthOfHeading(until) > 0 && until > from && isSequenceNumber(until - 1)) {
            until--;
        }
        int last = at < groups.size() && groups.get(at).text().equals("=") ? at : Math.max(until - 1, first);
        TempGroup begin = groups.get(first);
        if (report || hasWords(first, until)) {
            sections.add(new Section(part, correction, List.copyOf(groups.subList(from, until)),
                    text.text().substring(begin.start(), groups.get(last).end()), begin.line(), begin.column()));
        }
    }

    /** More than a sequence number or a stray sign: at least three groups, or one of at least four characters that is no number. */
    private boolean hasWords(int from, int until) {
        for (int i = from; i < until; i++) {
            String t = groups.get(i).text();
            if (i - from >= 2 || t.length() >= 4 && !TempCode.areDigits(t, 0, t.length())) {
                return true;
            }
        }
        return false;
    }

    private boolean endsReport(int i) {
        String t = groups.get(i).text();
        return t.equals("=") || isPart(t) || t.equals("NNNN") || t.equals("ZCZC") || lengthOfHeading(i) > 0
                || isCorrectionMark(t) && i + 1 < groups.size() && isPart(groups.get(i + 1).text());
    }

    private boolean isFrame(int i) {
        String t = groups.get(i).text();
        return t.equals("=") || t.equals("NNNN") || t.equals("ZCZC");
    }

    private static boolean isCorrectionMark(String t) {
        return t.equals("COR") || t.length() == 3 && t.startsWith("CC") && t.charAt(2) >= 'A' && t.charAt(2) <= 'X';
    }

    /** A number of three or four figures alone on its line, as circuits put before a heading. */
    private boolean isSequenceNumber(int i) {
        TempGroup group = groups.get(i);
        boolean alone = (i == 0 || groups.get(i - 1).line() != group.line()) && (i + 1 == groups.size() || groups.get(i + 1).line() != group.line());
        return alone && (group.text().length() == 3 || group.text().length() == 4) && TempCode.areDigits(group.text(), 0, group.text().length());
    }

    /** {@code TTAAii CCCC YYGGgg [BBB]} on one line: how many groups it has here; 0 when there is none. */
    private int lengthOfHeading(int i) {
        if (i + 2 >= groups.size()) {
            return 0;
        }
        TempGroup first = groups.get(i);
        TempGroup centre = groups.get(i + 1);
        TempGroup time = groups.get(i + 2);
        if (first.line() != centre.line() || centre.line() != time.line()
                || first.text().length() != 6 || !areLetters(first.text(), 0, 4) || !TempCode.areDigits(first.text(), 4, 6)
                || centre.text().length() != 4 || !areLetters(centre.text(), 0, 4)
                || time.text().length() != 6 || !TempCode.areDigits(time.text(), 0, 6)) {
            return 0;
        }
        boolean marked = i + 3 < groups.size() && groups.get(i + 3).line() == time.line()
                && groups.get(i + 3).text().length() == 3 && areLetters(groups.get(i + 3).text(), 0, 3) && !groups.get(i + 3).text().equals("COR");
        return marked ? 4 : 3;
    }

    private static boolean areLetters(String t, int from, int to) {
        for (int i = from; i < to; i++) {
            if (t.charAt(i) < 'A' || t.charAt(i) > 'Z') {
                return false;
            }
        }
        return true;
    }

    /** Cuts at blanks, control characters and end signs, and where a part is glued to the digits before or behind it. */
    private static List<TempGroup> groups(MessageText text) {
        List<TempGroup> groups = new ArrayList<>();
        String all = text.text();
        for (MessageText.Line line : text.lines()) {
            int i = line.start();
            while (i < line.end()) {
                if (all.charAt(i) <= ' ' || all.charAt(i) == 0x7F) {
                    i++;
                    continue;
                }
                int from = i;
                if (all.charAt(i) == '=') {
                    i++;
                } else {
                    while (i < line.end() && all.charAt(i) > ' ' && all.charAt(i) != 0x7F && all.charAt(i) != '=') {
                        i++;
                    }
                }
                add(groups, all, line, from, i);
            }
        }
        return groups;
    }

    private static void add(List<TempGroup> groups, String all, MessageText.Line line, int from, int to) {
        int cut = 0;
        if (to - from == 10 && isPart(all.substring(to - 4, to)) && TempCode.areDigits(all, from, to - 4)) {
            cut = to - 4;
        } else if (to - from == 9 && isPart(all.substring(from, from + 4)) && TempCode.areDigits(all, from + 4, to - 1)) {
            cut = from + 4;
        }
        if (cut > 0) {
            groups.add(group(all, line, from, cut));
        }
        groups.add(group(all, line, Math.max(from, cut), to));
    }

    private static TempGroup group(String all, MessageText.Line line, int from, int to) {
        return new TempGroup(all.substring(from, to), line.number(), from - line.start() + 1, from, to);
    }
}
