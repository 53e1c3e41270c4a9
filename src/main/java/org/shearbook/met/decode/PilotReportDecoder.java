package org.shearbook.met.decode;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.Place;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.PilotReportGroups.Tag;
import org.shearbook.met.profile.Units;

/**
 * Pilot reports as the United States and Canada exchange them: {@code [place] UA|UUA /OV … /TM … /FL … /TP … /TB …},
 * in bulletins or one on each line.
 *
 * <p><b>Where a report ends.</b> At an equals sign, at the next report or heading, at {@code NNNN}, at the end. Lines
 * without a mark of their own belong to the report before them if it is still open to an equals sign, or if they are
 * indented; otherwise they are refused one by one, so that a broken report never swallows or spoils its neighbour.
 *
 * <p><b>Cost.</b> Linear in the length of the input; no group is searched twice.
 */
public final class PilotReportDecoder implements MessageDecoder {

    private static final String FORMAT = "pilot report";

    /** Longer than any report. What is longer has lost its line ends and goes to a person. */
    static final int LONGEST_REPORT = 4_000;

    /** A collective carries reports of the hour that begins with the time of its heading. */
    private static final Duration COLLECTIVE = Duration.ofMinutes(60);

    private static final Pattern HEADING =
            Pattern.compile("([A-Z]{4}\\d{0,2}) {1,3}([A-Z]{4}) {1,3}(\\d{2})(\\d{2})(\\d{2})(?: {1,3}[A-Z]{3})?");
    private static final Pattern MARK = Pattern.compile("(?:([A-Z0-9]{2,5}) {1,3})?(?:[A-Z0-9]{2,5} {1,3})?(UUA|UA) {0,3}(?=/)");
    private static final Pattern SEQUENCE = Pattern.compile("(?:ZCZC ?[A-Z0-9 ]{0,12}|NNNN|\\d{1,5})");
    private static final Pattern WHITE_SPACE = Pattern.compile("\\s+");
    private static final Pattern CLOCK = Pattern.compile("(\\d{2}):?(\\d{2}) ?(?:Z|UTC)?");
    private static final Pattern WIND = Pattern.compile("(\\d{3})[ /@]?(\\d{2,3})(?:G\\d{2,3})? ?(?:KTS?)?");
    private static final Pattern TEMPERATURE = Pattern.compile("(?:OAT ?)?(M|MS|-|\\+|P|PS)? ?(\\d{1,2})(?: ?C)?");

    @Override
    public String format() {
        return FORMAT;
    }

    @Override
    public boolean recognises(byte[] bytes) {
        if (MessageText.isBinary(bytes)) {
            return false;
        }
        for (int index = 1; index + 1 < bytes.length; index++) {
            if ((bytes[index] == 'A' || bytes[index] == 'a') && (bytes[index - 1] == 'U' || bytes[index - 1] == 'u')
                    && slashFollows(bytes, index + 1) && beginsWord(bytes, index - 1)) {
                return true;
            }
        }
        return false;
    }

    private static boolean slashFollows(byte[] bytes, int from) {
        int index = from;
        while (index < bytes.length && index < from + 3 && bytes[index] == ' ') {
            index++;
        }
        return index < bytes.length && bytes[index] == '/';
    }

    private static boolean beginsWord(byte[] bytes, int u) {
        int before = u - 1;
        if (before >= 0 && (bytes[before] == 'U' || bytes[before] == 'u')) {
            before--;
        }
        return before < 0 || bytes[before] <= ' ' && bytes[before] >= 0 || bytes[before] == '=';
    }

    @Override
    public Decoding decode(byte[] bytes, DecodingContext context) {
        return new Input(BulletinText.of(bytes), context).read();
    }

    /**
     * Reads one report that stands alone, for sources that carry it as a column of a table.
     *
     * @return null when the text is no report
     */
    static @Nullable DecodedAirReport decodeOne(String report, DecodingContext context) {
        Decoding decoding = new Input(new BulletinText(report), context).read();
        return decoding.messages().size() == 1 && decoding.rejected().isEmpty()
                && decoding.messages().get(0) instanceof DecodedAirReport found ? found : null;
    }

    /** One input on its way through the decoder. */
    private static final class Input {

        private final BulletinText text;
        private final String capitals;
        private final DecodingContext context;
        private final List<DecodedMessage> messages = new ArrayList<>();
        private final List<Rejection> rejected = new ArrayList<>();
        private @Nullable Instant headingAt;
        private boolean hasHeading;
        private boolean justAfterHeading;
        /** The open report or the run of lines nobody claims; -1 when there is none. */
        private int openFrom = -1;
        private int openTo = -1;
        private boolean openIsReport;
        /** An equals sign comes before the next report begins. */
        private boolean openAwaitsEquals;
        private boolean openHasPlace;
        private int nextEquals = -2;

        Input(BulletinText text, DecodingContext context) {
            this.text = text;
            this.capitals = text.inCapitals();
            this.context = context;
        }

        Decoding read() {
            for (int line = 0; line < text.lines(); line++) {
                readLine(text.lineStart(line), text.lineEnd(line));
            }
            close();
            if (messages.isEmpty() && rejected.isEmpty()) {
                rejected.add(new Rejection(1, 0, "NO_REPORT", "The bulletin holds no report. If one was expected ask its sender to repeat it.",
                        text.text()));
            }
            return new Decoding(FORMAT, messages, rejected);
        }

        /** Splits a line at its equals signs: each piece is a report, a part of one, or nothing known. */
        private void readLine(int from, int to) {
            int start = from;
            while (start < to) {
                int end = start;
                while (end < to && capitals.charAt(end) != '=') {
                    end++;
                }
                boolean ends = end < to;
                end = ends ? end + 1 : to;
                readPiece(start, end, start == from, ends);
                start = end;
            }
        }

        private void readPiece(int from, int to, boolean beginsLine, boolean endsWithEquals) {
            int first = from;
            while (first < to && capitals.charAt(first) == ' ') {
                first++;
            }
            int last = endsWithEquals ? to - 1 : to;
            while (last > first && capitals.charAt(last - 1) == ' ') {
                last--;
            }
            int begin = from;
            while (begin < first && BulletinText.isBlank(text.text().charAt(begin))) {
                begin++;
            }
            if (first == last && begin < first) {
                close();
                open(begin, to, false);
                close();
                return;
            }
            if (first == last) {
                if (endsWithEquals && openFrom >= 0) {
                    openTo = to;
                    close();
                }
                return;
            }
            boolean indented = begin > from && begin == first && beginsLine;
            if (last - first <= LONGEST_REPORT && isEnvelope(first, last)) {
                return;
            }
            justAfterHeading = false;
            if (marks(first, last)) {
                close();
                open(first, to, true);
            } else if (openFrom >= 0 && openIsReport && continues(first, last, indented)) {
                openTo = to;
            } else if (openFrom < 0 && continuesClosedReport(first, last)) {
                reopen(to);
            } else {
                close();
                open(begin, to, false);
            }
            if (openIsReport && !openHasPlace) {
                openHasPlace = contains("/OV", first, last);
            }
            if (endsWithEquals || !openIsReport) {
                close();
            }
        }

        private boolean isEnvelope(int first, int last) {
            String line = capitals.substring(first, last);
            Matcher heading = line.length() <= 40 ? HEADING.matcher(line) : null;
            if (heading != null && heading.matches()) {
                close();
                hasHeading = true;
                justAfterHeading = true;
                headingAt = ReportedMoment.atOrBefore(Integer.parseInt(heading.group(3)), Integer.parseInt(heading.group(4)),
                        Integer.parseInt(heading.group(5)), context.receivedAt().plus(ReportedMoment.TOLERANCE));
                return true;
            }
            if (line.equals("PRCUS") || line.equals("PIRUS") || justAfterHeading && line.length() == 2 && isWord(line)) {
                close();
                return true;
            }
            boolean awaitsText = openFrom >= 0 && openIsReport && openAwaitsEquals;
            if (line.length() <= 20 && !awaitsText && SEQUENCE.matcher(line).matches() || line.equals("NNNN")) {
                close();
                return true;
            }
            return false;
        }

        private static boolean isWord(String line) {
            return Character.isLetter(line.charAt(0)) && Character.isLetter(line.charAt(1));
        }

        private Matcher markAt(int first, int last) {
            return MARK.matcher(capitals).region(first, Math.min(last, first + 24)).useTransparentBounds(true);
        }

        private boolean marks(int first, int last) {
            return markAt(first, last).lookingAt();
        }

        private boolean continues(int first, int last, boolean indented) {
            boolean anotherPlace = openHasPlace && contains("/OV ", first, last);
            if (anotherPlace || first - openFrom > LONGEST_REPORT) {
                return false;
            }
            return openAwaitsEquals || indented || hasHeading && wasWrapped(first);
        }

        /** Senders fold lines at 69 characters; a line of about that length goes on in the next. */
        private boolean wasWrapped(int next) {
            int before = text.lineAt(next) - 2;
            if (before < 0) {
                return false;
            }
            int length = text.lineEnd(before) - text.lineStart(before);
            return length >= 45 && length <= 80;
        }

        /** {@code CONT MOD 360=} and on the next line {@code 280-330/RM ZME=}: the sign was struck too early. */
        private boolean continuesClosedReport(int first, int last) {
            if (messages.isEmpty() || closedTo < 0 || !hasHeading || first - closedFrom > LONGEST_REPORT || contains("/OV", first, last)) {
                return false;
            }
            return Character.isDigit(capitals.charAt(first))
                    && (contains("/RM", first, last) || contains("/TB", first, last) || contains("/IC", first, last));
        }

        private int closedFrom = -1;
        private int closedTo = -1;

        private void reopen(int to) {
            messages.remove(messages.size() - 1);
            openFrom = closedFrom;
            openTo = to;
            openIsReport = true;
            openAwaitsEquals = true;
            openHasPlace = true;
            closedTo = -1;
        }

        private boolean contains(String part, int from, int to) {
            int last = Math.min(to, from + LONGEST_REPORT) - part.length();
            for (int index = from; index <= last; index++) {
                if (capitals.startsWith(part, index)) {
                    return true;
                }
            }
            return false;
        }

        private void open(int from, int to, boolean isReport) {
            openFrom = from;
            openTo = to;
            openIsReport = isReport;
            openHasPlace = false;
            openAwaitsEquals = isReport && equalsComesFirst(to);
        }

        /** Whether the report that begins here ends with an equals sign of its own. Each sign is looked for once. */
        private boolean equalsComesFirst(int from) {
            if (capitals.charAt(from - 1) == '=') {
                return false;
            }
            if (nextEquals != -1 && nextEquals < from) {
                nextEquals = capitals.indexOf('=', from);
            }
            if (nextEquals < 0 || nextEquals - from > LONGEST_REPORT) {
                return false;
            }
            int line = text.lineAt(from);
            for (int next = line - 1; next < text.lines(); next++) {
                int start = Math.max(from, text.lineStart(next));
                if (start > nextEquals) {
                    return true;
                }
                int first = start;
                int end = text.lineEnd(next);
                while (first < end && capitals.charAt(first) == ' ') {
                    first++;
                }
                if (first < end && marks(first, end)) {
                    return false;
                }
            }
            return true;
        }

        private void close() {
            if (openFrom < 0) {
                return;
            }
            int from = openFrom;
            int to = openTo;
            openFrom = -1;
            closedTo = -1;
            while (to > from && BulletinText.isBlank(text.text().charAt(to - 1))) {
                to--;
            }
            if (!openIsReport) {
                refuseUnmarked(from, to);
                return;
            }
            int count = messages.size();
            readReport(from, to);
            if (messages.size() > count) {
                closedFrom = from;
                closedTo = to;
            }
        }

        private void refuseUnmarked(int from, int to) {
            boolean hasGroups = contains("/OV", from, to) || contains("/TB", from, to) || contains("/TM", from, to);
            refuse(from, to, from, hasGroups ? "REPORT_WITHOUT_MARK" : "NOT_A_REPORT", hasGroups
                    ? "The line has the groups of a pilot report but neither UA nor UUA before them. Put the mark in and send it again."
                    : "The line belongs to no report. If it is part of one join them; otherwise reject it.");
        }

        private void refuse(int from, int to, int at, String code, String what) {
            rejected.add(new Rejection(text.lineAt(at), text.columnAt(at), code, what, text.text(from, to)));
        }

        private void readReport(int from, int to) {
            if (to - from > LONGEST_REPORT) {
                refuse(from, to, from, "REPORT_TOO_LONG", "The report is longer than " + LONGEST_REPORT
                        + " characters: line ends or an equals sign are missing. Cut it by hand and send the parts.");
                return;
            }
            Matcher mark = markAt(from, to);
            if (!mark.lookingAt()) {
                refuseUnmarked(from, to);
                return;
            }
            String leading = mark.group(1) == null ? "" : mark.group(1);
            int end = to > from && capitals.charAt(to - 1) == '=' ? to - 1 : to;
            PilotReportGroups groups = new PilotReportGroups(capitals, mark.end(), end);
            if (!groups.has(Tag.TM) && !groups.has(Tag.FL) && !groups.has(Tag.TB)) {
                refuse(from, to, mark.end(), "REPORT_CUT_SHORT",
                        "The report has neither time nor level nor turbulence: its end is missing. Ask for a repetition.");
                return;
            }
            messages.add(new Report(groups, leading, from, to).read(mark.group(2).equals("UUA")));
        }

        /** One report on its way through its groups. */
        private final class Report {

            private final PilotReportGroups groups;
            private final String leading;
            private final int from;
            private final int to;
            private final List<Remark> remarks = new ArrayList<>();

            Report(PilotReportGroups groups, String leading, int from, int to) {
                this.groups = groups;
                this.leading = leading;
                this.from = from;
                this.to = to;
            }

            private void remark(Tag tag, String code, String what) {
                int at = groups.has(tag) ? Math.min(groups.start(tag), to - 1) : from;
                remarks.add(new Remark(text.lineAt(at), text.columnAt(at), code, what));
            }

            DecodedAirReport read(boolean urgent) {
                PlaceGroup places = new PlaceGroup(new FixChoice(context.fixes(), leading), (code, what) -> remark(Tag.OV, code, what));
                Place place = places.read(groups.text(Tag.OV));
                Instant observedAt = observedAt();
                double level = LevelGroup.read(groups.text(Tag.FL), (code, what) -> remark(Tag.FL, code, what));
                TurbulenceGroup turbulence = TurbulenceGroup.read(groups.text(Tag.TB), level);
                List<TurbulenceLayer> layers = turbulence.layers();
                remarkOn(turbulence, layers);
                Wind wind = wind(places.variation());
                String type = aircraftType();
                return new DecodedAirReport("", ReportClass.VOL, urgent, "", type.startsWith("H/") ? type.substring(2) : type,
                        type.startsWith("H/") ? "H" : "", observedAt, place, level, layers, Double.NaN, Double.NaN, Double.NaN,
                        wind.fromDirection, wind.speed, temperature(), cloud(turbulence, layers), remarkText(),
                        text.text(from, to), text.lineAt(from), remarks);
            }

            private String remarkText() {
                if (!groups.has(Tag.RM)) {
                    return "";
                }
                int start = groups.start(Tag.RM);
                int end = capitals.charAt(to - 1) == '=' ? Math.max(start, to - 1) : to;
                return WHITE_SPACE.matcher(text.text(start, end)).replaceAll(" ").strip();
            }

            private @Nullable Instant observedAt() {
                String clock = groups.text(Tag.TM).replace('O', '0').replace("UTC", "Z");
                Matcher matcher = CLOCK.matcher(clock);
                boolean isTime = clock.length() <= 12 && matcher.matches() && Integer.parseInt(matcher.group(1)) <= 23
                        && Integer.parseInt(matcher.group(2)) <= 59;
                if (!isTime) {
                    remark(Tag.TM, groups.has(Tag.TM) ? "TIME_NOT_READ" : "TIME_MISSING",
                            "The report has no time of observation that can be read. Set it by hand.");
                    return null;
                }
                Instant latest = context.receivedAt();
                if (headingAt != null && headingAt.plus(COLLECTIVE).isBefore(latest)) {
                    latest = headingAt.plus(COLLECTIVE);
                }
                return ReportedMoment.atOrBefore(Integer.parseInt(matcher.group(1)), Integer.parseInt(matcher.group(2)),
                        latest.plus(ReportedMoment.TOLERANCE));
            }

            private void remarkOn(TurbulenceGroup turbulence, List<TurbulenceLayer> layers) {
                String group = groups.text(Tag.TB);
                if (group.isEmpty()) {
                    return;
                }
                if (layers.isEmpty() && turbulence.saysNotReported()) {
                    remark(Tag.TB, "TURBULENCE_NOT_REPORTED", "The group says that turbulence was not reported, which is not nil.");
                } else if (layers.isEmpty()) {
                    remark(Tag.TB, "TURBULENCE_NOT_READ", "No turbulence could be read from the group. Set it by hand from the text.");
                }
                if (layers.stream().anyMatch(layer -> layer.intensity() == null)) {
                    remark(Tag.TB, "INTENSITY_MISSING", "A kind of turbulence is named without its strength.");
                }
                if (turbulence.hasIcingWords()) {
                    remark(Tag.TB, "ICING_WORDS", "Words of icing stand in the turbulence group: perhaps the groups were exchanged.");
                }
                if (turbulence.hasFrequencyRange()) {
                    remark(Tag.TB, "FREQUENCY_RANGE", "Two frequencies are given for one intensity; the greater share of time was kept.");
                }
                if (turbulence.isCutShort()) {
                    remark(Tag.TB, "TURBULENCE_TOO_LONG", "The turbulence group is too long; its beginning was read.");
                }
            }

            private String aircraftType() {
                String type = groups.text(Tag.TP);
                int end = type.indexOf(' ');
                String first = end < 0 ? type : type.substring(0, end);
                boolean unknown = first.length() > 12 || first.startsWith("UNK") || first.equals("ANY") || first.equals("ALL")
                        || first.startsWith("DUR") || first.equals("NUMS") || first.equals("UKN");
                return unknown ? "" : first;
            }

            private Cloud cloud(TurbulenceGroup turbulence, List<TurbulenceLayer> layers) {
                if (turbulence.saysInCloud()) {
                    return Cloud.IN_CLOUD;
                }
                boolean clearAir = turbulence.saysInTheClear()
                        || !layers.isEmpty() && layers.stream().allMatch(layer -> layer.type().equals("CAT"));
                String sky = groups.text(Tag.SK);
                if (clearAir || sky.equals("SKC") || sky.equals("CLR") || sky.equals("VMC")) {
                    return Cloud.CLEAR;
                }
                return sky.equals("IMC") || groups.text(Tag.WX).equals("IMC") ? Cloud.IN_CLOUD : Cloud.UNKNOWN;
            }

            private double temperature() {
                String group = groups.text(Tag.TA);
                Matcher matcher = TEMPERATURE.matcher(group);
                if (group.length() > 12 || !matcher.matches()) {
                    return Double.NaN;
                }
                String sign = matcher.group(1);
                boolean below = sign != null && (sign.startsWith("M") || sign.equals("-"));
                double celsius = Double.parseDouble(matcher.group(2));
                return Units.celsiusToKelvin(below ? -celsius : celsius);
            }

            /** The direction is magnetic in these reports and is kept only where the variation is known. */
            private Wind wind(double variation) {
                String group = groups.text(Tag.WV);
                Matcher matcher = WIND.matcher(group);
                if (group.length() > 16 || !matcher.matches() || Integer.parseInt(matcher.group(1)) > 360) {
                    return new Wind(Double.NaN, Double.NaN);
                }
                double speed = Units.knotsToMetresPerSecond(Double.parseDouble(matcher.group(2)));
                if (Double.isNaN(variation)) {
                    remark(Tag.WV, "WIND_DIRECTION_MAGNETIC", "The wind direction is magnetic and the variation here is not known: only the speed is kept.");
                    return new Wind(Double.NaN, speed);
                }
                double direction = Integer.parseInt(matcher.group(1)) + variation;
                return new Wind(direction - 360.0 * Math.floor(direction / 360.0), speed);
            }
        }
    }

    /** From true north [degrees] and [m s⁻¹]. */
    private record Wind(double fromDirection, double speed) {
    }
}
