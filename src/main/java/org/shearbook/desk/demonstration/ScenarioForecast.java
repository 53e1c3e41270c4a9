package org.shearbook.desk.demonstration;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.forecast.Area;
import org.shearbook.desk.forecast.Conditions;
import org.shearbook.desk.forecast.ForecastContent;
import org.shearbook.desk.forecast.Intensity;
import org.shearbook.desk.forecast.Movement;
import org.shearbook.desk.forecast.StrengthChange;

/**
 * One version of a forecast of the invented scenario.
 *
 * @param number  SLF number
 * @param act     {@code issue}, {@code amend} or {@code correct}
 * @param at      when it is filed
 * @param author  who files it
 * @param reason  of an amendment or correction; empty for the first version
 */
record ScenarioForecast(int number, String act, Instant at, DemonstrationPerson author, ForecastContent content, String reason) {

    private static final DemonstrationPerson A = DemonstrationPerson.FORECASTER_A;
    private static final DemonstrationPerson B = DemonstrationPerson.FORECASTER_B;
    private static final DemonstrationPerson C = DemonstrationPerson.FORECASTER_C;
    private static final String SUPERVISOR = DemonstrationPerson.SUPERVISOR_S.username;

    /** In the order in which they are filed. */
    static final List<ScenarioForecast> ALL = List.of(
            new ScenarioForecast(1, "issue", at(2, 130), A, forecast(Intensity.MOD, null, "Dunveery", box(4654, 4800, 3212, 3354), 280, 310,
                    at(2, 200), at(2, 600), 60, "cancel if no yes-report by 0430Z", null, null), ""),
            new ScenarioForecast(2, "issue", at(2, 740), B, forecast(Intensity.MOD_OCNL_SEV, null, "Kelbrith", box(4642, 4742, 2924, 3048), 270, 310,
                    at(2, 900), at(2, 1300), 70, "cancel if Ri is 0.5 or more at 1200Z and no yes-report in 90 min", null, null), ""),
            new ScenarioForecast(2, "amend", at(2, 1150), B, forecast(Intensity.SEV, at(2, 1142), "Kelbrith", box(4642, 4742, 2924, 3048), 270, 310,
                    at(2, 1150), at(2, 1300), 80, "cancel if Ri is 0.5 or more at 1200Z and no yes-report in 90 min", SUPERVISOR, null),
                    "severe turbulence reported at 1142Z, FL290"),
            new ScenarioForecast(3, "issue", at(2, 1255), B, forecast(Intensity.SEV, null, "Tarquidd", box(4630, 4730, 2630, 2736), 360, 390,
                    at(2, 1300), at(2, 1600), 50, "cancel if no yes-report by 1500Z", null, "supervisor in a meeting"), ""),
            new ScenarioForecast(4, "issue", at(2, 1545), B, forecast(Intensity.MOD, null, "Kelbrith E", box(4642, 4742, 2830, 2954), 260, 310,
                    at(2, 1600), at(2, 2000), 60, "cancel if Ri is 1 or more at 1800Z; move the east edge with the next yes-report outside", null, null), ""),
            new ScenarioForecast(4, "amend", at(2, 1905), C, forecast(Intensity.SEV, at(2, 1752), "Kelbrith E", box(4630, 4742, 2736, 2954), 260, 310,
                    at(2, 1905), at(2, 2000), 80, "let it end at 2000Z unless a yes-report comes after 1930Z", null, "alone on the night shift"),
                    "severe turbulence reported at 1752Z east of the area"),
            new ScenarioForecast(5, "issue", at(2, 1950), C, forecast(Intensity.MOD, null, "Tarquidd W", box(4630, 4730, 2642, 2800), 160, 310,
                    at(2, 2000), at(2, 2359), 60, "cancel if two smooth reports and no yes-report in 120 min", null, null), ""),
            new ScenarioForecast(5, "correct", at(2, 1956), C, forecast(Intensity.MOD, null, "Tarquidd W", box(4630, 4730, 2642, 2800), 260, 310,
                    at(2, 2000), at(2, 2359), 60, "cancel if two smooth reports and no yes-report in 120 min", null, null),
                    "base typed as FL160 instead of FL260"),
            new ScenarioForecast(6, "issue", at(3, 150), C, forecast(Intensity.MOD, null, "Tarquidd", box(4630, 4730, 2618, 2712), 260, 300,
                    at(3, 200), at(3, 600), 40, "cancel if no yes-report by 0430Z", null, null), ""));

    private static ForecastContent forecast(Intensity intensity, @Nullable Instant reportedAt, String place, Area area, int base, int top, Instant from,
            Instant until, int percent, String wouldChange, @Nullable String secondLookBy, @Nullable String aloneReason) {
        return new ForecastContent(intensity, Conditions.CLEAR_AIR, reportedAt, place, area, base, top, from, until, percent,
                new Movement("E", 25), StrengthChange.NC, List.of(), wouldChange, secondLookBy, aloneReason);
    }

    /** A moment of the scenario: day 1 to 3, and hour and minute as they are written. */
    static Instant at(int day, int hourMinute) {
        return ScenarioAscent.DAY_ONE.plus(Duration.ofDays(day - 1)).plus(Duration.ofHours(hourMinute / 100)).plus(Duration.ofMinutes(hourMinute % 100));
    }

    /** A box between two parallels in degrees and minutes north and two meridians in degrees and minutes west. */
    private static Area box(int south, int north, int east, int west) {
        return new Area.Corners(List.of(
                new Area.Corner(degrees(south), -degrees(west)), new Area.Corner(degrees(north), -degrees(west)),
                new Area.Corner(degrees(north), -degrees(east)), new Area.Corner(degrees(south), -degrees(east))));
    }

    private static double degrees(int degreesMinutes) {
        return degreesMinutes / 100 + degreesMinutes % 100 / 60.0;
    }
}
