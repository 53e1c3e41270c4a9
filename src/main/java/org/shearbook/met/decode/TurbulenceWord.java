package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedAirReport.Frequency;
import org.shearbook.met.decode.DecodedAirReport.Intensity;

/**
 * One word, sign or number of a turbulence group with its meaning. The reading is tolerant: crews and keyboards
 * have hundreds of spellings for a dozen words, and numbers stand glued to the word before or after.
 *
 * @param kind   what it stands for
 * @param value  {@link Intensity}, {@link Frequency}, the type in standard spelling, or null
 * @param feet   of an {@link Kind#ALTITUDE}; {@code NaN} otherwise
 * @param column index of its first character in the group
 */
record TurbulenceWord(Kind kind, @Nullable Object value, double feet, int column) {

    enum Kind {
        INTENSITY, FREQUENCY, TYPE, TURBULENCE, ALTITUDE, BELOW, ABOVE, BETWEEN, TO, AND, DASH, SLASH, STOP, NO,
        /** Ends what was observed; what follows is advice or a wish. */
        ADVICE,
        ICING, IN_CLOUD, IN_THE_CLEAR, NOT_REPORTED, OTHER
    }

    /** A group longer than this is not read to its end. */
    static final int MOST_WORDS = 240;

    private static final int LONGEST_WORD = 24;

    /** Highest level taken for an altitude [ft]. */
    private static final double HIGHEST = 60_000.0;

    private static final Map<String, Meaning> EXACT = new HashMap<>();

    /** Words long enough that one wrong letter leaves no doubt. */
    private static final List<String> LONG_WORDS = List.of(
            "LIGHT", "MODERATE", "SEVERE", "EXTREME", "SMOOTH", "NEGATIVE", "OCCASIONAL", "OCCASIONALLY",
            "INTERMITTENT", "CONTINUOUS", "CONSTANT", "TURBULENCE", "THROUGH", "SURFACE", "BELOW", "ABOVE", "BETWEEN");

    private record Meaning(Kind kind, @Nullable Object value) {
    }

    static {
        words(Kind.INTENSITY, Intensity.NIL,
                "NEG NIL NONE SMTH SMOOTH SMOOTHE SMOTH SMOTHE SMTHH NEGATIVE NEGS NEGT NEH NGE NEGTIVE");
        words(Kind.INTENSITY, Intensity.LGT,
                "LGT LT LIT LITE LIGHT LGHT LHT GLT LG LIGT LGTT LLIGHT LGR LGTR LIGHTLY LTE LHGT");
        words(Kind.INTENSITY, Intensity.MOD, "MOD MDT MODT MD MODERATE MDO MODR MODS MODE MDDT MODERATELY MORERATE OMD MMOD");
        words(Kind.INTENSITY, Intensity.SEV, "SEV SVR SEVERE SEVER SEVR SVRE HVY HEAVY SERVERE SEVERVE");
        words(Kind.INTENSITY, Intensity.EXTRM, "EXTRM EXTREME EXTRME EXTM EXTR EXTREM EXREME XTRM XTRME EXTRMEE");
        words(Kind.FREQUENCY, Frequency.OCNL, "OCNL ONCL OCC OCL OCCASIONAL OCCASIONALLY OCASIONAL OCASIONALLY OCNLY OCNAL");
        words(Kind.FREQUENCY, Frequency.INTMT,
                "INTMT INTMNT INMT INT INTMTT INTM INTRMT INTER INTERMITTENT INTERMITTENTLY INTERMITTANT INTERMITTANTLY");
        words(Kind.FREQUENCY, Frequency.CONT,
                "CONT CONS CONST CONTS CON CNT CNTS CTNS COMS CNS CNST CONTD CONTINUOUS CONTINUOUSLY CONTINOUS CONTINUAL "
                + "CONSTANT CONSTANTLY CONSISTENT CONSISTANT CTS CONNT");
        words(Kind.TYPE, "CHOP", "CHOP CHP CHOPP CHOPS CHOPPY COP CHOPY CHPO CHHOP CHOOP CHIP");
        words(Kind.TYPE, "CAT", "CAT");
        words(Kind.TYPE, "LLWS", "LLWS WINDSHEAR SHEAR WSHR");
        words(Kind.TYPE, "MTW", "MTW MWAVE MTNWAVE MTNWV WAVE WAVES WV");
        words(Kind.TURBULENCE, null,
                "TURB TURBC TURBULENCE TURBULANCE TURBULENT TB TRB TUB TBC TRUB TURBS TURBO BUMP BUMPS BUMPY TUBULENCE TUR "
                + "TURBULENCES TURD TURN TUBR");
        words(Kind.BELOW, null, "BLO BLW BELOW BOL BELO BLOW BL UNDER BENEATH AOB BLWO");
        words(Kind.ABOVE, null, "ABV ABOVE ABO AVB ABVE AOA ABOV");
        words(Kind.BETWEEN, null, "BTN BTWN BETWEEN BTW BETW BTWEEN BETWN FROM");
        words(Kind.TO, null, "TO THRU THROUGH THRO THROUGHT TRHOUGH TIL TILL UNTIL TP");
        words(Kind.AND, null, "AND N");
        words(Kind.NO, null, "NO");
        words(Kind.NOT_REPORTED, null, "NA UNK UNKN UNKNOWN");
        words(Kind.ADVICE, null, "BETTER SMOOTHER IMPROVED IMPROVING IMPRVD REQUESTED REQUESTING REQ TRYING");
        words(Kind.ICING, null, "RIME ICE ICING MIX MIXED MX CLR TRACE FRZ FREEZING");
        words(Kind.IN_CLOUD, null, "CLOUD CLOUDS CLD CLDS IMC");
        words(Kind.IN_THE_CLEAR, null, "VMC CLEAR");
    }

    private static void words(Kind kind, @Nullable Object value, String spellings) {
        for (String spelling : spellings.split(" ")) {
            EXACT.put(spelling, new Meaning(kind, value));
        }
    }

    /**
     * Splits a group into its words.
     *
     * @param group in capitals, without control characters
     */
    static List<TurbulenceWord> of(String group) {
        return new Reader(group).read();
    }

    private static @Nullable Meaning meaning(String word) {
        if (word.length() > LONGEST_WORD) {
            return null;
        }
        Meaning exact = EXACT.get(word);
        if (exact != null) {
            return exact;
        }
        if (isOccasional(word)) {
            return EXACT.get("OCNL");
        }
        if (word.length() < 5) {
            return null;
        }
        int allowed = word.length() >= 8 ? 2 : 1;
        for (String known : LONG_WORDS) {
            // the first letter must be right: RIGHT and NIGHT are not LIGHT
            if (known.charAt(0) == word.charAt(0) && Math.abs(known.length() - word.length()) <= allowed
                    && distance(word, known) <= allowed) {
                return EXACT.get(known);
            }
        }
        return null;
    }

    /** OCCL, OCCNL, OCSNL, OCDNL and their kin: nothing else in these groups begins with OC. */
    private static boolean isOccasional(String word) {
        if (word.length() < 3 || word.length() > 8 || !word.startsWith("OC")) {
            return false;
        }
        for (int index = 2; index < word.length(); index++) {
            if ("OCNSLADI".indexOf(word.charAt(index)) < 0) {
                return false;
            }
        }
        return true;
    }

    /** Letters to change, leave out, put in or swap with a neighbour to get from one word to the other. */
    private static int distance(String one, String other) {
        int[][] cost = new int[one.length() + 1][other.length() + 1];
        for (int i = 0; i <= one.length(); i++) {
            for (int j = 0; j <= other.length(); j++) {
                if (i == 0 || j == 0) {
                    cost[i][j] = i + j;
                    continue;
                }
                boolean same = one.charAt(i - 1) == other.charAt(j - 1);
                int least = Math.min(cost[i - 1][j - 1] + (same ? 0 : 1), Math.min(cost[i - 1][j], cost[i][j - 1]) + 1);
                if (i > 1 && j > 1 && one.charAt(i - 1) == other.charAt(j - 2) && one.charAt(i - 2) == other.charAt(j - 1)) {
                    least = Math.min(least, cost[i - 2][j - 2] + 1);
                }
                cost[i][j] = least;
            }
        }
        return cost[one.length()][other.length()];
    }

    /** Goes once through the text. */
    private static final class Reader {

        private final String text;
        private final List<TurbulenceWord> words = new ArrayList<>();
        private int at;
        /** The next numbers are the strength of a gust, not an altitude. */
        private boolean afterSign;
        /** The next number names a runway, a distance or a duration. */
        private boolean afterRunway;

        Reader(String text) {
            this.text = text;
        }

        List<TurbulenceWord> read() {
            while (at < text.length() && words.size() < MOST_WORDS) {
                char c = text.charAt(at);
                if (isDigit(c) || c == 'O' && isNumberOfLettersO() || c == '.' && isDigit(charAt(at + 1))) {
                    number();
                } else if (isLetter(c)) {
                    letters();
                } else {
                    sign(c);
                }
            }
            return words;
        }

        private void sign(char c) {
            int start = at++;
            switch (c) {
                case '+' -> {
                    afterSign = true;
                    while (at < text.length() && "/- ".indexOf(text.charAt(at)) >= 0) {
                        at++;
                    }
                }
                case '-' -> {
                    if (isDigit(charAt(at)) && isAmplitude(at)) {
                        afterSign = true;
                    } else {
                        add(Kind.DASH, start);
                    }
                }
                case '/' -> add(Kind.SLASH, start);
                case ',', ';', '.' -> add(Kind.STOP, start);
                case '&' -> add(Kind.AND, start);
                default -> { }
            }
        }

        /** Whether the number here carries a unit of gust or speed. */
        private boolean isAmplitude(int from) {
            int end = from;
            while (isDigit(charAt(end))) {
                end++;
            }
            String unit = lettersAt(skipBlanks(end));
            return isUnit(unit) || isFeet(unit) && end - from < 5;
        }

        private boolean isNumberOfLettersO() {
            int end = at;
            boolean hasDigit = false;
            while (isDigit(charAt(end)) || charAt(end) == 'O') {
                hasDigit |= isDigit(charAt(end));
                end++;
            }
            return hasDigit && end - at >= 2 && end - at <= 5 && !isLetter(charAt(end));
        }

        private void number() {
            int start = at;
            while (isDigit(charAt(at)) || charAt(at) == 'O' || charAt(at) == '.' && isDigit(charAt(at + 1))) {
                at++;
            }
            while (at > start && isLetter(charAt(at)) && charAt(at - 1) == 'O') {
                at--;
            }
            String digits = text.substring(start, at).replace('O', '0');
            char next = charAt(at);
            if ("LRC".indexOf(next) >= 0 && !isLetter(charAt(at + 1))) {
                at++;
                afterRunway = false;
                add(Kind.OTHER, start);
                return;
            }
            int unitAt = skipBlanks(at);
            String unit = lettersAt(unitAt);
            if (isUnit(unit)) {
                at = unitAt + unit.length();
                afterRunway = false;
                afterSign = false;
                forgetRangeOfAmplitudes();
                add(Kind.OTHER, start);
                return;
            }
            boolean inFeet = isFeet(unit) || charAt(unitAt) == '\'';
            if (inFeet) {
                at = unitAt + Math.max(1, unit.length());
            }
            if (afterSign || afterRunway) {
                // +/-15-20KTS and +/-100/200FT: the whole chain is amplitude
                if (afterSign && "-/".indexOf(charAt(at)) >= 0 && isDigit(charAt(at + 1))) {
                    at++;
                } else {
                    afterSign = false;
                }
                afterRunway = false;
                add(Kind.OTHER, start);
                return;
            }
            double feet = inFeet ? feetAsFeet(digits) : feet(digits);
            if (Double.isNaN(feet)) {
                add(Kind.OTHER, start);
            } else {
                words.add(new TurbulenceWord(Kind.ALTITUDE, null, feet, start));
            }
        }

        /** {@code 15-20KTS} is known to be a speed only at its end. */
        private void forgetRangeOfAmplitudes() {
            int last = words.size() - 1;
            if (last >= 1 && words.get(last).kind == Kind.DASH && words.get(last - 1).kind == Kind.ALTITUDE) {
                words.set(last - 1, new TurbulenceWord(Kind.OTHER, null, Double.NaN, words.get(last - 1).column));
                words.remove(last);
            }
        }

        /** A height in feet without a bound beside it is the depth of a bump unless it is as high as a level. */
        private double feetAsFeet(String digits) {
            if (digits.indexOf('.') >= 0 || digits.length() > 5) {
                return Double.NaN;
            }
            double feet = Double.parseDouble(digits);
            Kind before = words.isEmpty() ? Kind.OTHER : words.get(words.size() - 1).kind;
            boolean bounded = before == Kind.BELOW || before == Kind.ABOVE;
            return feet <= HIGHEST && (feet >= 1000.0 || bounded) ? feet : Double.NaN;
        }

        private static double feet(String digits) {
            int point = digits.indexOf('.');
            if (point >= 0) {
                // 11.5 is thousands of feet; anything else with a point is no altitude
                return digits.length() - point == 2 && point >= 1 && point <= 2 && digits.lastIndexOf('.') == point
                        ? Math.rint(Double.parseDouble(digits) * 1000.0) : Double.NaN;
            }
            int length = digits.length();
            if (length < 2 || length > 5) {
                return Double.NaN;
            }
            double value = Double.parseDouble(digits);
            double feet = length <= 3 || digits.charAt(0) == '0' && length == 4 ? value * 100.0 : value;
            return feet <= HIGHEST ? feet : Double.NaN;
        }

        private void letters() {
            int start = at;
            while (isLetter(charAt(at))) {
                at++;
            }
            String word = text.substring(start, at);
            if (word.length() == 1 && word.charAt(0) == 'N' && charAt(at) == '/' && charAt(at + 1) == 'A') {
                at += 2;
                add(Kind.NOT_REPORTED, start);
                return;
            }
            boolean digitsFollow = isDigit(charAt(at)) || charAt(at) == 'O' && isDigit(charAt(at + 1));
            if (isFlightLevelMark(word)) {
                if (!digitsFollow && word.length() == 1) {
                    add(Kind.OTHER, start);
                }
                return;
            }
            if (isRunway(word)) {
                afterRunway = true;
                add(Kind.OTHER, start);
                return;
            }
            if (word.equals("SFC") || word.equals("SURFACE") || word.equals("SURF") || word.equals("GND")
                    || word.equals("GROUND") || word.equals("SRFC")) {
                words.add(new TurbulenceWord(Kind.ALTITUDE, null, 0.0, start));
                return;
            }
            if (isMountain(word)) {
                int next = skipBlanks(at);
                String wave = lettersAt(next);
                if (wave.equals("WAVE") || wave.equals("WV") || wave.equals("WAVES") || wave.equals("WVS")) {
                    at = next + wave.length();
                    words.add(new TurbulenceWord(Kind.TYPE, "MTW", Double.NaN, start));
                } else {
                    add(Kind.OTHER, start);
                }
                return;
            }
            if (word.equals("WIND") && lettersAt(skipBlanks(at)).equals("SHEAR")) {
                at = skipBlanks(at) + 5;
                words.add(new TurbulenceWord(Kind.TYPE, "LLWS", Double.NaN, start));
                return;
            }
            Meaning meaning = meaning(word);
            if (meaning != null) {
                add(meaning, start);
                return;
            }
            if (digitsFollow) {
                // B737, RWY27, J75: letters we don't know make the digits part of a name
                while (isLetter(charAt(at)) || isDigit(charAt(at))) {
                    at++;
                }
                add(Kind.OTHER, start);
                return;
            }
            if (!gluedWords(word, start)) {
                add(Kind.OTHER, start);
            }
        }

        /** {@code CONSMOD}, {@code LGTCHOP}: two known words without the blank. */
        private boolean gluedWords(String word, int start) {
            if (word.length() < 5 || word.length() > LONGEST_WORD) {
                return false;
            }
            for (int cut = word.length() - 3; cut >= 2; cut--) {
                Meaning first = EXACT.get(word.substring(0, cut));
                Meaning second = EXACT.get(word.substring(cut));
                if (first != null && second != null && isObservation(first.kind) && isObservation(second.kind)) {
                    add(first, start);
                    add(second, start + cut);
                    return true;
                }
            }
            return false;
        }

        private static boolean isObservation(Kind kind) {
            return kind == Kind.INTENSITY || kind == Kind.FREQUENCY || kind == Kind.TYPE || kind == Kind.TURBULENCE
                    || kind == Kind.BELOW || kind == Kind.ABOVE;
        }

        private boolean isFlightLevelMark(String word) {
            return word.equals("FL") || word.equals("F") || word.equals("A") && isDigit(charAt(at)) || word.equals("FLT");
        }

        private static boolean isRunway(String word) {
            return switch (word) {
                case "RY", "RWY", "RWYS", "RUNWAY", "RNY", "ILS", "FNL", "FINAL", "FOR", "HDG", "HEADING" -> true;
                default -> false;
            };
        }

        private static boolean isMountain(String word) {
            return word.equals("MTN") || word.equals("MNT") || word.equals("MOUNTAIN") || word.equals("MOUNT")
                    || word.equals("MT");
        }

        private static boolean isFeet(String word) {
            return word.equals("FT") || word.equals("FEET") || word.equals("FOOT") || word.equals("SFT");
        }

        private static boolean isUnit(String word) {
            return switch (word) {
                case "KT", "KTS", "KNOT", "KNOTS", "KNTS", "KTN", "FPM", "MPH", "SEC", "SECS", "SECOND", "SECONDS", "MIN",
                        "MINS", "MINUTE", "MINUTES", "NM", "MI", "MILE", "MILES", "SM", "MF", "MNTS", "DEG", "DEGREES",
                        "G", "GS", "HR", "HRS", "C" -> true;
                default -> false;
            };
        }

        private void add(Kind kind, int start) {
            words.add(new TurbulenceWord(kind, null, Double.NaN, start));
            if (kind != Kind.OTHER) {
                afterSign = false;
                afterRunway = false;
            }
        }

        private void add(Meaning meaning, int start) {
            afterSign = false;
            afterRunway = false;
            words.add(new TurbulenceWord(meaning.kind, meaning.value, Double.NaN, start));
        }

        private int skipBlanks(int from) {
            int index = from;
            while (charAt(index) == ' ') {
                index++;
            }
            return index;
        }

        private String lettersAt(int from) {
            int end = from;
            while (isLetter(charAt(end)) && end - from <= LONGEST_WORD) {
                end++;
            }
            return text.substring(Math.min(from, text.length()), Math.min(end, text.length()));
        }

        private char charAt(int index) {
            return index < text.length() ? text.charAt(index) : 0;
        }

        private static boolean isDigit(char c) {
            return c >= '0' && c <= '9';
        }

        private static boolean isLetter(char c) {
            return c >= 'A' && c <= 'Z';
        }
    }
}
