package org.shearbook.met.decode;

import java.util.Locale;
import org.shearbook.met.profile.Units;

/**
 * The identification groups of an upper-air report: when and where, in which unit the winds are.
 *
 * @param day            of the month
 * @param hour           UTC
 * @param speedUnit      of the winds [m s⁻¹]: the day has 50 added when they are in knots
 * @param lastWind       figure of the last standard level with a wind group, or {@code /}
 * @param stationId      block and station number, call sign, or for a dropsonde its position
 * @param latitude       [degrees north]; {@code NaN} for a land station
 * @param longitude      [degrees east]; {@code NaN} for a land station
 * @param elevation      of a mobile station [m]; {@code NaN} for the others
 * @param end            index behind the last of these groups
 */
record TempIdentification(int day, int hour, double speedUnit, char lastWind, String stationId,
                          double latitude, double longitude, double elevation, int end) {

    static TempIdentification read(TempBulletin.Section report, RemarkList remarks) throws Unreadable {
        int at = 0;
        String callSign = "";
        if (!isLand(report) && at < report.groups().size() && !TempBulletin.isDayAndHour(report.groups().get(at))) {
            callSign = report.groups().get(at).text();
            at++;
        }
        TempGroup time = required(report, at, "DATE_MISSING", "The report ends before its day and hour.");
        if (!TempBulletin.isDayAndHour(time)) {
            throw new Unreadable(time.line(), time.column(), "DATE_UNREADABLE", "'" + time.text()
                    + "' is not a day and an hour (YYGG and one more figure). Compare with the report as sent and paste it corrected.");
        }
        int day = Integer.parseInt(time.text().substring(0, 2));
        double unit = day > 50 ? Units.KNOT : 1;
        int hour = Integer.parseInt(time.text().substring(2, 4));
        char lastWind = time.text().charAt(4);
        TempGroup place = required(report, at + 1, "STATION_MISSING", "The report ends before its station.");
        if (place.isValue() && place.text().startsWith("99") && !isLand(report)) {
            return mobile(report, at + 1, new TempIdentification(day % 50, hour, unit, lastWind, callSign, Double.NaN, Double.NaN, Double.NaN, at + 1), remarks);
        }
        if (place.text().length() != 5 || !TempCode.areDigits(place.text(), 0, 5)) {
            throw new Unreadable(place.line(), place.column(), "STATION_UNREADABLE", "'" + place.text()
                    + "' is not a station number of five figures. Compare with the report as sent and paste it corrected.");
        }
        return new TempIdentification(day % 50, hour, unit, lastWind, place.text(), Double.NaN, Double.NaN, Double.NaN, at + 2);
    }

    /** {@code 99LaLaLa QcLoLoLoLo MMMULaULo}, for mobile land stations also {@code h0h0h0h0im}. */
    private static TempIdentification mobile(TempBulletin.Section report, int at, TempIdentification read, RemarkList remarks) throws Unreadable {
        TempGroup latitudeGroup = report.groups().get(at);
        TempGroup longitudeGroup = required(report, at + 1, "POSITION_UNREADABLE", "The report ends inside its position.");
        TempGroup square = required(report, at + 2, "POSITION_UNREADABLE", "The report ends inside its position.");
        char quadrant = longitudeGroup.text().charAt(0);
        if (!TempCode.areDigits(latitudeGroup.text(), 2, 5) || longitudeGroup.text().length() != 5 || !TempCode.areDigits(longitudeGroup.text(), 0, 5)
                || quadrant != '1' && quadrant != '3' && quadrant != '5' && quadrant != '7') {
            throw new Unreadable(longitudeGroup.line(), longitudeGroup.column(), "POSITION_UNREADABLE", "'" + latitudeGroup.text() + " " + longitudeGroup.text()
                    + "' is not a position in tenths of a degree. Compare with the report as sent and paste it corrected.");
        }
        int latitudeTenths = Integer.parseInt(latitudeGroup.text().substring(2));
        int longitudeTenths = Integer.parseInt(longitudeGroup.text().substring(1));
        if (latitudeTenths > 900 || longitudeTenths > 1800) {
            throw new Unreadable(latitudeGroup.line(), latitudeGroup.column(), "POSITION_UNREADABLE", "The position is off the globe. Compare with the report as sent and paste it corrected.");
        }
        double latitude = (quadrant == '3' || quadrant == '5' ? -1 : 1) * latitudeTenths / 10.0;
        double longitude = (quadrant == '5' || quadrant == '7' ? -1 : 1) * longitudeTenths / 10.0;
        if (square.isValue() && TempCode.areDigits(square.text(), 3, 5)
                && (square.text().charAt(3) - '0' != latitudeTenths / 10 % 10 || square.text().charAt(4) - '0' != longitudeTenths / 10 % 10)) {
            remarks.add(square.line(), square.column(), "POSITION_DOUBTFUL", "The check figures of the position do not agree with it.");
        }
        int end = at + 3;
        double elevation = Double.NaN;
        if ((report.part().startsWith("II") || report.part().startsWith("EE")) && end < report.groups().size()) {
            elevation = elevation(report.groups().get(end), remarks);
            end++;
        }
        String stationId = read.stationId.isEmpty()
                ? String.format(Locale.ROOT, "%s%04.1f%s%05.1f", latitude < 0 ? "S" : "N", Math.abs(latitude), longitude < 0 ? "W" : "E", Math.abs(longitude))
                : read.stationId;
        return new TempIdentification(read.day, read.hour, read.speedUnit, read.lastWind, stationId, latitude, longitude, elevation, end);
    }

    /** {@code h0h0h0h0im}: the last figure is 1 to 4 for metres, 5 to 8 for feet. */
    private static double elevation(TempGroup group, RemarkList remarks) {
        if (!group.isValue() || !TempCode.areDigits(group.text(), 0, 5) || group.text().charAt(4) < '1' || group.text().charAt(4) > '8') {
            remarks.add(group.line(), group.column(), "ELEVATION_UNREADABLE", "The elevation of the mobile station can't be read; it counts as missing.");
            return Double.NaN;
        }
        int figures = Integer.parseInt(group.text().substring(0, 4));
        return group.text().charAt(4) <= '4' ? figures : Units.feetToMetres(figures);
    }

    private static boolean isLand(TempBulletin.Section report) {
        return report.part().startsWith("TT") || report.part().startsWith("PP");
    }

    private static TempGroup required(TempBulletin.Section report, int index, String code, String text) throws Unreadable {
        if (index >= report.groups().size()) {
            throw new Unreadable(report.line(), report.column(), code, text + " Ask for the report again.");
        }
        return report.groups().get(index);
    }
}
