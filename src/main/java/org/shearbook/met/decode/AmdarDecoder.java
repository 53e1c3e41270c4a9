package org.shearbook.met.decode;

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
import org.shearbook.met.profile.Units;

/**
 * FM 42 AMDAR, automatic aircraft reports in letters and figures: phase of flight, aircraft, position, day and time,
 * level, temperature, wind, turbulence, gust. The class is {@code EDR}: sent at an interval, nulls included.
 */
public final class AmdarDecoder implements MessageDecoder {

    private static final Pattern SECTION = Pattern.compile("AMDAR {1,3}\\d{4}");
    private static final Pattern BEGINNING = Pattern.compile("(?:LVR|LVW|UNS|ASC|DES|///) {1,3}[A-Z0-9/]{3,8} {1,3}\\d{4}[NS].*");
    private static final Pattern MOMENT = Pattern.compile("(\\d{2})(\\d{2})(\\d{2})");
    private static final Pattern LEVEL = Pattern.compile("([FA])(\\d{3})");
    private static final Pattern TEMPERATURE = Pattern.compile("([MP])S(\\d{3})");
    private static final Pattern WIND = Pattern.compile("(\\d{3})/(\\d{2,3})");
    private static final Pattern TURBULENCE = Pattern.compile("TB([0-3])");
    private static final Pattern GUST = Pattern.compile("VG(\\d{3})");
    private static final double HIGHEST_LEVEL = 600.0;
    private static final int MOST_WORDS = 40;

    @Override
    public String format() {
        return "AMDAR";
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
            if (SECTION.matcher(capitals.substring(start, Math.min(text.lineEnd(line), start + 40)).strip()).matches()) {
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
                line -> BEGINNING.matcher(line).matches(), line -> SECTION.matcher(line).matches())) {
            if (piece.isTooLong()) {
                rejected.add(piece.tooLong(text));
            } else if (piece.isReport()) {
                messages.add(new Report(text, capitals, piece).read(context.receivedAt()));
            } else {
                rejected.add(new Rejection(text.lineAt(piece.from()), text.columnAt(piece.from()), "NOT_A_REPORT",
                        "The line begins with no phase of flight and position. Check it for an error of transmission.", text.text(piece.from(), piece.to()).strip()));
            }
        }
        if (messages.isEmpty() && rejected.isEmpty()) {
            rejected.add(new Rejection(1, 0, "NO_REPORT", "The bulletin holds no report. If one was expected ask its sender to repeat it.", text.text()));
        }
        return new Decoding(format(), messages, rejected);
    }

    /** One report on its way through its groups, whose order is fixed. */
    private static final class Report {

        private final BulletinText text;
        private final BulletinReports.Piece piece;
        private final String capitals;
        private final List<Remark> remarks = new ArrayList<>();

        Report(BulletinText text, String capitals, BulletinReports.Piece piece) {
            this.text = text;
            this.capitals = capitals;
            this.piece = piece;
        }

        private void remark(int at, String code, String what) {
            remarks.add(new Remark(text.lineAt(at), text.columnAt(at), code, what));
        }

        DecodedAirReport read(Instant receivedAt) {
            String report = capitals.substring(piece.from(), piece.to()).replace('=', ' ');
            int phaseEnd = report.indexOf(' ');
            int aircraftAt = skipBlanks(report, phaseEnd);
            int aircraftEnd = Math.max(aircraftAt, report.indexOf(' ', aircraftAt));
            String aircraft = report.substring(aircraftAt, aircraftEnd);
            Place place = new Place("", Double.NaN, Double.NaN, "", List.of());
            int at = aircraftEnd;
            Coordinates coordinates = Coordinates.read(report, aircraftEnd);
            if (coordinates == null) {
                remark(piece.from() + aircraftEnd, "PLACE_NOT_READ", "The position could not be read. Set it by hand.");
            } else {
                at = coordinates.end();
                String written = report.substring(aircraftEnd, at).strip();
                if (coordinates.arePossible()) {
                    place = new Place(written, coordinates.latitude(), coordinates.longitude(), "coordinates", List.of());
                } else {
                    place = new Place(written, Double.NaN, Double.NaN, "", List.of());
                    remark(piece.from() + aircraftEnd, "COORDINATES_IMPOSSIBLE", "Latitude or longitude is outside its range. Set the place by hand.");
                }
            }
            Instant observedAt = null;
            double level = Double.NaN;
            double temperature = Double.NaN;
            double windFrom = Double.NaN;
            double windSpeed = Double.NaN;
            double gust = Double.NaN;
            List<TurbulenceLayer> layers = List.of();
            boolean momentSeen = false;
            int words = 0;
            while (at < report.length() && words++ < MOST_WORDS) {
                at = skipBlanks(report, at);
                int end = at;
                while (end < report.length() && report.charAt(end) != ' ') {
                    end++;
                }
                String word = report.substring(at, end);
                Matcher matcher;
                if (!momentSeen && (matcher = MOMENT.matcher(word)).matches()) {
                    momentSeen = true;
                    observedAt = moment(matcher, receivedAt);
                } else if (Double.isNaN(level) && (matcher = LEVEL.matcher(word)).matches()) {
                    level = matcher.group(1).equals("A") ? -Double.parseDouble(matcher.group(2)) : Double.parseDouble(matcher.group(2));
                } else if (Double.isNaN(temperature) && (matcher = TEMPERATURE.matcher(word)).matches()) {
                    double celsius = Double.parseDouble(matcher.group(2)) / 10.0;
                    temperature = Units.celsiusToKelvin(matcher.group(1).equals("M") ? -celsius : celsius);
                } else if (Double.isNaN(windSpeed) && (matcher = WIND.matcher(word)).matches()) {
                    if (Integer.parseInt(matcher.group(1)) <= 360) {
                        windFrom = Double.parseDouble(matcher.group(1));
                        windSpeed = Units.knotsToMetresPerSecond(Double.parseDouble(matcher.group(2)));
                    } else {
                        remark(piece.from() + at, "WIND_IMPOSSIBLE", "A wind direction above 360° does not exist; the wind was left out.");
                    }
                } else if ((matcher = TURBULENCE.matcher(word)).matches()) {
                    Intensity intensity = Intensity.values()[Integer.parseInt(matcher.group(1))];
                    layers = List.of(new TurbulenceLayer(intensity, intensity, null, "", Double.NaN, Double.NaN));
                } else if ((matcher = GUST.matcher(word)).matches()) {
                    gust = Double.parseDouble(matcher.group(1)) / 10.0;
                }
                at = end;
            }
            if (level > HIGHEST_LEVEL) {
                remark(piece.from(), "LEVEL_DOUBTFUL", "The level is higher than any aircraft flies. Set it by hand.");
                level = Double.NaN;
            }
            if (observedAt == null) {
                remark(piece.from(), "TIME_NOT_READ", "The report has no time of observation that can be read. Set it by hand.");
            }
            if (Double.isNaN(level)) {
                remark(piece.from(), "LEVEL_UNKNOWN", "The report gives no level.");
            }
            return new DecodedAirReport("", ReportClass.EDR, false, aircraft.indexOf('/') >= 0 ? "" : aircraft, "", "", observedAt, place, level,
                    layers, Double.NaN, Double.NaN, gust, windFrom, windSpeed, temperature, Cloud.UNKNOWN, "",
                    text.text(piece.from(), piece.to()), text.lineAt(piece.from()), remarks);
        }

        private @Nullable Instant moment(Matcher matcher, Instant receivedAt) {
            return ReportedMoment.atOrBefore(Integer.parseInt(matcher.group(1)), Integer.parseInt(matcher.group(2)),
                    Integer.parseInt(matcher.group(3)), receivedAt.plus(ReportedMoment.TOLERANCE));
        }

        private static int skipBlanks(String report, int from) {
            int index = Math.max(0, from);
            while (index < report.length() && report.charAt(index) == ' ') {
                index++;
            }
            return index;
        }
    }
}
