package org.shearbook.met.decode;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.Place;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.profile.GreatCircle;
import org.shearbook.met.profile.Units;

/**
 * Air-reports of the International Civil Aviation Organization: routine ({@code ARP}, {@code AIREP}) and special
 * ({@code ARS}, {@code AIREP SPECIAL}), as exchanged in bulletins and as sent up to aircraft ({@code … OBS AT 1205Z
 * N2020W07005 FL390}). Routine reports are voluntary in what they say of turbulence and are of class {@code VOL};
 * special ones are {@code SPC}.
 *
 * <p>Turbulence in figures ({@code TB 0} to {@code TB 3}) is nil, light, moderate, severe. A position in a later group
 * is where the aircraft goes, and is not read.
 */
public final class AirepDecoder implements MessageDecoder {

    private static final Duration COLLECTIVE = Duration.ofMinutes(60);
    private static final Pattern BEGINNING = Pattern.compile("(?:ARP|ARS|AIREP SPECIAL|AIREP)(?= |$)");
    private static final Pattern CLOCK = Pattern.compile("(\\d{2})(\\d{2})Z?");
    private static final Pattern LEVEL = Pattern.compile("(FL?|A)(\\d{3})(?:[/-](?:FL?)?(\\d{3}))?");
    private static final Pattern TEMPERATURE = Pattern.compile("(?:([MP])S|(-))(\\d{2})");
    private static final Pattern WIND = Pattern.compile("(\\d{3})/(\\d{2,3})(?:KTS?)?");
    private static final Pattern EDR_GLUED = Pattern.compile("EDR(\\d{3})");
    private static final Pattern EDR_VALUE = Pattern.compile("\\d?\\.\\d{1,3}");
    private static final Pattern EDR_PAIR = Pattern.compile("(\\d?\\.\\d{1,3})/(\\d?\\.\\d{1,3})");
    private static final Pattern TYPE = Pattern.compile("[A-Z][A-Z0-9]{1,3}");
    private static final double LARGEST_EDR = 2.0;
    private static final double HIGHEST_LEVEL = 600.0;

    @Override
    public String format() {
        return "AIREP";
    }

    @Override
    public boolean recognises(byte[] bytes) {
        if (MessageText.isBinary(bytes)) {
            return false;
        }
        BulletinText text = BulletinText.of(bytes);
        String capitals = text.inCapitals();
        for (int line = 0; line < text.lines(); line++) {
            int start = text.lineStart(line);
            if (BEGINNING.matcher(capitals.substring(start, Math.min(text.lineEnd(line), start + 40)).strip()).lookingAt()) {
                return true;
            }
        }
        return false;
    }

    @Override
    public Decoding decode(byte[] bytes, DecodingContext context) {
        BulletinText text = BulletinText.of(bytes);
        String capitals = text.inCapitals();
        List<DecodedMessage> messages = new ArrayList<>();
        List<Rejection> rejected = new ArrayList<>();
        for (BulletinReports.Piece piece : BulletinReports.split(text, capitals, context.receivedAt(),
                line -> BEGINNING.matcher(line).lookingAt(), line -> false)) {
            String raw = text.text(piece.from(), piece.to()).strip();
            Report report = piece.isReport() ? new Report(text, capitals, piece, context) : null;
            if (piece.isTooLong()) {
                rejected.add(piece.tooLong(text));
            } else if (report == null) {
                rejected.add(new Rejection(text.lineAt(piece.from()), text.columnAt(piece.from()), "NOT_A_REPORT",
                        "The line belongs to no air-report. If it is part of one join them; otherwise reject it.", raw));
            } else if (!report.read()) {
                rejected.add(new Rejection(text.lineAt(piece.from()), text.columnAt(piece.from()), "REPORT_CUT_SHORT",
                        "The air-report has neither a position nor a time that can be read. Ask for a repetition.", raw));
            } else {
                messages.add(report.decoded());
            }
        }
        if (messages.isEmpty() && rejected.isEmpty()) {
            rejected.add(new Rejection(1, 0, "NO_REPORT", "The bulletin holds no report. If one was expected ask its sender to repeat it.", text.text()));
        }
        return new Decoding(format(), messages, rejected);
    }

    /** One report on its way through its groups. */
    private static final class Report {

        private final BulletinText text;
        private final BulletinReports.Piece piece;
        private final DecodingContext context;
        private final String report;
        private final List<Remark> remarks = new ArrayList<>();
        private final List<String> rest = new ArrayList<>();
        private int at;
        private boolean special;
        private String aircraft = "";
        private String type = "";
        private Place place = new Place("", Double.NaN, Double.NaN, "", List.of());
        private @Nullable Instant observedAt;
        private double level = Double.NaN;
        private double base = Double.NaN;
        private double top = Double.NaN;
        private double temperature = Double.NaN;
        private double windFrom = Double.NaN;
        private double windSpeed = Double.NaN;
        private double edrPeak = Double.NaN;
        private double edrMean = Double.NaN;
        private List<TurbulenceLayer> layers = List.of();
        private Cloud cloud = Cloud.UNKNOWN;

        Report(BulletinText text, String capitals, BulletinReports.Piece piece, DecodingContext context) {
            this.text = text;
            this.piece = piece;
            this.context = context;
            this.report = capitals.substring(piece.from(), piece.to()).replace('=', ' ').stripTrailing();
        }

        private void remark(int index, String code, String what) {
            int where = Math.min(piece.from() + index, piece.to() - 1);
            remarks.add(new Remark(text.lineAt(where), text.columnAt(where), code, what));
        }

        /** @return false when nothing of use could be read */
        boolean read() {
            Matcher beginning = BEGINNING.matcher(report);
            if (!beginning.lookingAt()) {
                return false;
            }
            special = beginning.group().equals("ARS") || beginning.group().endsWith("SPECIAL");
            at = beginning.end();
            name();
            boolean found = false;
            boolean placeExpected = true;
            boolean observedSaid = false;
            List<String> placeWords = new ArrayList<>();
            int placeAt = at;
            while (at < report.length()) {
                skipBlanks();
                int start = at;
                Coordinates coordinates = Coordinates.read(report, at);
                if (coordinates != null) {
                    at = coordinates.end();
                    if (placeExpected) {
                        coordinates(coordinates, start);
                        placeExpected = false;
                    }
                    found = true;
                    continue;
                }
                String word = word();
                if (word.isEmpty()) {
                    break;
                }
                if (word.equals("TO") && !placeExpected && Coordinates.read(report, at) != null) {
                    segmentTo(start);
                } else if (word.equals("OBS")) {
                    observedSaid = true;
                } else if (word.equals("AT") || word.equals("FROM") || word.equals("OVER") || word.equals("NEAR")) {
                    continue;
                } else if (observedAt == null && clock(word)) {
                    found = true;
                    placeExpected &= placeWords.isEmpty();
                } else if (!level(word) && !temperature(word) && !wind(word) && !edr(word)) {
                    // the place stands before the time, but behind it where the report says OBS AT
                    boolean inItsPlace = observedSaid ? observedAt != null && Double.isNaN(level) : observedAt == null;
                    if (placeExpected && inItsPlace && !isPhenomenon(word)) {
                        placeAt = placeWords.isEmpty() ? start : placeAt;
                        placeWords.add(word);
                    } else {
                        rest.add(word);
                    }
                }
            }
            if (!place.isResolved() && !placeWords.isEmpty()) {
                int where = placeAt;
                place = new PlaceGroup(new FixChoice(context.fixes(), ""), (code, what) -> remark(where, code, what)).read(String.join(" ", placeWords));
                found |= place.isResolved();
            } else if (place.text().isEmpty()) {
                remark(0, "PLACE_MISSING", "The report gives no position that can be read. Set it by hand.");
            }
            if (observedAt == null) {
                remark(0, "TIME_MISSING", "The report has no time of observation that can be read. Set it by hand.");
            }
            if (Double.isNaN(level)) {
                remark(0, "LEVEL_UNKNOWN", "The report gives no flight level.");
            }
            turbulence();
            return found;
        }

        private void skipBlanks() {
            while (at < report.length() && report.charAt(at) == ' ') {
                at++;
            }
        }

        private String word() {
            skipBlanks();
            int start = at;
            while (at < report.length() && report.charAt(at) != ' ') {
                at++;
            }
            return report.substring(start, at);
        }

        /** Identification or type stands first; a special report sent up to aircraft has the type. */
        private void name() {
            skipBlanks();
            if (Coordinates.read(report, at) != null) {
                return;
            }
            int back = at;
            String word = word();
            if (isPhenomenon(word)) {
                at = back;
            } else if (word.length() <= 4 && TYPE.matcher(word).matches()) {
                type = word;
            } else {
                aircraft = word;
            }
        }

        private void coordinates(Coordinates coordinates, int start) {
            String written = report.substring(start, coordinates.end()).strip();
            if (!coordinates.arePossible()) {
                remark(start, "COORDINATES_IMPOSSIBLE", "Latitude or longitude is outside its range. Set the place by hand.");
                place = new Place(written, Double.NaN, Double.NaN, "", List.of());
                return;
            }
            if (coordinates.wholeDegrees()) {
                remark(start, "PLACE_IN_WHOLE_DEGREES", "The place is given in whole degrees: it is good to half a degree.");
            }
            place = new Place(written, coordinates.latitude(), coordinates.longitude(), "coordinates", List.of());
        }

        private void segmentTo(int start) {
            Coordinates end = Coordinates.read(report, at);
            if (end == null) {
                return;
            }
            at = end.end();
            if (!place.isResolved() || !end.arePossible()) {
                return;
            }
            double length = GreatCircle.distance(place.latitude(), place.longitude(), end.latitude(), end.longitude());
            GreatCircle.Point middle = GreatCircle.destination(place.latitude(), place.longitude(),
                    GreatCircle.bearing(place.latitude(), place.longitude(), end.latitude(), end.longitude()), length / 2.0);
            List<FixLookup.Fix> ends = List.of(
                    new FixLookup.Fix("FROM", "COORDINATES", place.latitude(), place.longitude(), Double.NaN),
                    new FixLookup.Fix("TO", "COORDINATES", end.latitude(), end.longitude(), Double.NaN));
            remark(start, "MIDPOINT_ASSUMED", "The report gives a segment; its middle is assumed.");
            place = new Place(place.text() + " " + report.substring(start, at), middle.latitude(), middle.longitude(), "midpoint assumed", ends);
        }

        private boolean clock(String word) {
            Matcher matcher = CLOCK.matcher(word);
            if (!matcher.matches() || Integer.parseInt(matcher.group(1)) > 23 || Integer.parseInt(matcher.group(2)) > 59) {
                return false;
            }
            Instant latest = context.receivedAt();
            Instant heading = piece.headingAt();
            if (heading != null && heading.plus(COLLECTIVE).isBefore(latest)) {
                latest = heading.plus(COLLECTIVE);
            }
            observedAt = ReportedMoment.atOrBefore(Integer.parseInt(matcher.group(1)), Integer.parseInt(matcher.group(2)), latest.plus(ReportedMoment.TOLERANCE));
            return true;
        }

        private boolean level(String word) {
            Matcher matcher = LEVEL.matcher(word);
            if (!matcher.matches()) {
                return false;
            }
            if (!Double.isNaN(level)) {
                return true;
            }
            double one = Double.parseDouble(matcher.group(2));
            double two = matcher.group(3) == null ? one : Double.parseDouble(matcher.group(3));
            if (Math.max(one, two) > HIGHEST_LEVEL) {
                remark(at - word.length(), "LEVEL_DOUBTFUL", "The level " + word + " is higher than any aircraft flies. Set it by hand.");
                return true;
            }
            level = (one + two) / 2.0;
            if (one != two) {
                base = Math.min(one, two) * 100.0;
                top = Math.max(one, two) * 100.0;
                remark(at - word.length(), "LEVEL_RANGE", "The level is a range, " + word + "; its middle is kept and the layer has its bounds.");
            }
            return true;
        }

        private boolean temperature(String word) {
            Matcher matcher = TEMPERATURE.matcher(word);
            if (!Double.isNaN(temperature) || !matcher.matches()) {
                return false;
            }
            double celsius = Double.parseDouble(matcher.group(3));
            temperature = Units.celsiusToKelvin("M".equals(matcher.group(1)) || matcher.group(2) != null ? -celsius : celsius);
            return true;
        }

        private boolean wind(String word) {
            Matcher matcher = WIND.matcher(word);
            if (!Double.isNaN(windSpeed) || !matcher.matches()) {
                return word.equals("KT") && !Double.isNaN(windSpeed);
            }
            if (Integer.parseInt(matcher.group(1)) > 360) {
                remark(at - word.length(), "WIND_IMPOSSIBLE", "A wind direction above 360° does not exist; the wind was left out.");
                return true;
            }
            windFrom = Double.parseDouble(matcher.group(1));
            windSpeed = Units.knotsToMetresPerSecond(Double.parseDouble(matcher.group(2)));
            return true;
        }

        /** {@code EDR048} in hundredths, {@code EDR 0.48}, {@code EDR PK/AVG 0.31/0.18}. */
        private boolean edr(String word) {
            Matcher glued = EDR_GLUED.matcher(word);
            if (glued.matches()) {
                edrPeak = checkedEdr(Double.parseDouble(glued.group(1)) / 100.0);
                return true;
            }
            if (!word.equals("EDR")) {
                return false;
            }
            int back = at;
            String next = word();
            boolean peakFirst = next.equals("PK/AVG");
            if (peakFirst || next.equals("PK") || next.equals("PEAK")) {
                next = word();
            }
            Matcher pair = EDR_PAIR.matcher(next);
            if (pair.matches()) {
                edrPeak = checkedEdr(Double.parseDouble(pair.group(1)));
                edrMean = checkedEdr(Double.parseDouble(pair.group(2)));
            } else if (EDR_VALUE.matcher(next).matches()) {
                edrPeak = checkedEdr(Double.parseDouble(next));
            } else {
                at = back;
            }
            return true;
        }

        private double checkedEdr(double value) {
            if (value > LARGEST_EDR) {
                remark(at - 1, "EDR_OUT_OF_RANGE", "An eddy dissipation rate above " + LARGEST_EDR + " is no reading; it was left out.");
                return Double.NaN;
            }
            return value;
        }

        private static boolean isPhenomenon(String word) {
            return switch (word) {
                case "SEV", "MOD", "LGT", "NIL", "EXTRM", "HVY", "TURB", "TB", "MTW", "ICE", "ICG", "IC", "TS", "TSGR", "VA", "CLD", "SS", "DS",
                        "ASC", "DES", "OCNL", "CONT", "INTMT", "CAT", "SPECIAL", "CHOP" -> true;
                default -> false;
            };
        }

        /** Turbulence and cloud from the words that were no group of their own. */
        private void turbulence() {
            List<String> words = new ArrayList<>();
            boolean named = false;
            for (int index = 0; index < rest.size(); index++) {
                String word = rest.get(index);
                String next = index + 1 < rest.size() ? rest.get(index + 1) : "";
                boolean ofIcing = next.equals("ICE") || next.equals("ICG") || next.equals("ICING");
                if (ofIcing || word.equals("ICE") || word.equals("ICG") || word.equals("ICING")) {
                    continue;
                }
                if (word.equals("IC")) {
                    break;
                }
                if ((word.equals("TB") || word.equals("TURB")) && next.length() == 1 && next.charAt(0) >= '0' && next.charAt(0) <= '3') {
                    words.add(Intensity.values()[next.charAt(0) - '0'].name());
                    named = true;
                    index++;
                    continue;
                }
                switch (word) {
                    case "TURB", "TB", "CAT", "CHOP", "MTW", "LLWS" -> named = true;
                    case "CLD", "IMC" -> cloud = Cloud.IN_CLOUD;
                    case "CLR", "VMC" -> cloud = Cloud.CLEAR;
                    default -> { }
                }
                words.add(word);
            }
            if (!named) {
                return;
            }
            layers = TurbulenceGroup.read(String.join(" ", words), level).layers().stream()
                    .map(layer -> Double.isNaN(layer.baseFeet()) && Double.isNaN(layer.topFeet())
                            ? new TurbulenceLayer(layer.intensity(), layer.intensityTo(), layer.frequency(), layer.type(), base, top) : layer)
                    .toList();
            if (layers.stream().anyMatch(layer -> layer.type().equals("CAT")) && cloud == Cloud.UNKNOWN) {
                cloud = Cloud.CLEAR;
            }
            if (layers.isEmpty()) {
                remark(report.length() - 1, "TURBULENCE_NOT_READ", "Turbulence is named and could not be read. Set it by hand from the text.");
            }
        }

        DecodedAirReport decoded() {
            return new DecodedAirReport("", special ? ReportClass.SPC : ReportClass.VOL, special, aircraft, type, "", observedAt, place, level,
                    layers, edrMean, edrPeak, Double.NaN, windFrom, windSpeed, temperature, cloud, String.join(" ", rest),
                    text.text(piece.from(), piece.to()), text.lineAt(piece.from()), remarks);
        }
    }
}
