package org.shearbook.desk.forecast;

import static org.assertj.core.api.Assertions.assertThat;
import static org.shearbook.desk.forecast.ForecastDraft.Purpose.AMENDMENT;
import static org.shearbook.desk.forecast.ForecastDraft.Purpose.CORRECTION;
import static org.shearbook.desk.forecast.ForecastDraft.Purpose.NEW;
import static org.shearbook.desk.forecast.ForecastSamples.moderate;
import static org.shearbook.desk.forecast.ForecastSamples.severe;
import static org.shearbook.desk.forecast.ForecastSamples.withArea;
import static org.shearbook.desk.forecast.ForecastSamples.withLevels;
import static org.shearbook.desk.forecast.ForecastSamples.withTimes;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The office's rules. Limits: validity 4 h, start at most 4 h ahead, 30 min grace (office settings). */
class ForecastRulesTests {

    private static final Instant NOW = Instant.parse("2031-03-12T07:40:00Z");
    private static final Instant NINE = Instant.parse("2031-03-12T09:00:00Z");

    private final ForecastRules rules = new ForecastRules(
            new ForecastSettings("Kelbrith desk", Duration.ofHours(4), Duration.ofHours(4), Duration.ofMinutes(30), 60));

    @Test
    void aForecastByTheBookIsNotRefused() {
        assertThat(rules.refusals(NEW, moderate(NINE), null, "forecaster-b", NOW)).isEmpty();
    }

    @ParameterizedTest
    @CsvSource({"310,270,BASE_NOT_BELOW_TOP", "270,270,BASE_NOT_BELOW_TOP", "275,310,LEVEL_NOT_IN_TENS", "270,660,LEVEL_NOT_IN_TENS"})
    void impossibleLevelsAreRefused(int base, int top, String code) {
        assertThat(codes(withLevels(moderate(NINE), base, top))).containsExactly(code);
    }

    @ParameterizedTest
    @CsvSource({
        "09:00,09:00,END_NOT_AFTER_START", "09:00,08:00,END_NOT_AFTER_START", "09:00,13:01,VALIDITY_TOO_LONG",
        "07:09,09:00,START_IN_PAST", "11:41,12:00,START_TOO_FAR", "07:15,07:40,END_IN_PAST"})
    void impossibleTimesAreRefused(String from, String until, String code) {
        assertThat(codes(withTimes(moderate(NINE), at(from), at(until)))).containsExactly(code);
    }

    @ParameterizedTest
    @CsvSource({"07:10,11:10", "11:40,15:40", "09:00,13:00", "07:40,07:41"})
    void timesAtTheVeryLimitsAreTaken(String from, String until) {
        assertThat(codes(withTimes(moderate(NINE), at(from), at(until)))).isEmpty();
    }

    @Test
    void anAreaMustEncloseSomethingAndNotCrossItself() {
        assertThat(codes(withArea(moderate(NINE), corners(46, -30, 47, -30, 48, -30)))).containsExactly("AREA_EMPTY");
        assertThat(codes(withArea(moderate(NINE), corners(46, -30, 47, -29, 46, -29, 47, -30)))).containsExactly("AREA_CROSSES_ITSELF");
        assertThat(codes(withArea(moderate(NINE), corners(46, -30, 47, -28, 46, -29, 47, -30)))).containsExactly("AREA_CROSSES_ITSELF");
        assertThat(codes(withArea(moderate(NINE), corners(80, -90, 80, 0, 80, 90, 80, 180)))).containsExactly("AREA_ROUND_POLE");
        assertThat(codes(withArea(moderate(NINE), Area.box(50, 51, 179, -178)))).isEmpty();
        assertThat(codes(withArea(moderate(NINE), new Area.Radius("", 47, -30, 4)))).containsExactly("RADIUS_OUT_OF_RANGE");
        assertThat(codes(withArea(moderate(NINE), new Area.Radius("", 89, -30, 120)))).isEmpty();
    }

    @Test
    void aSevereForecastNeedsASecondLookOrAReasonForBeingAlone() {
        assertThat(codes(severe(NINE, null, null))).containsExactly("SECOND_LOOK_MISSING");
        assertThat(codes(severe(NINE, "forecaster-b", null))).containsExactly("SECOND_LOOK_OWN");
        assertThat(codes(severe(NINE, null, "-"))).containsExactly("REASON_TOO_SHORT");
        assertThat(codes(severe(NINE, "supervisor-s", "alone at night"))).containsExactly("SECOND_LOOK_AND_ALONE");
        assertThat(codes(severe(NINE, "supervisor-s", null))).isEmpty();
        assertThat(codes(severe(NINE, null, "supervisor in a meeting"))).isEmpty();
    }

    @Test
    void aCorrectionDoesNotMoveTheClock() {
        Forecast standing = standing(moderate(NINE));
        Instant later = at("10:30");
        assertThat(rules.refusals(CORRECTION, withLevels(moderate(NINE), 260, 310), standing, "forecaster-b", later)).isEmpty();
        assertThat(rules.refusals(CORRECTION, withTimes(moderate(NINE), NINE, at("12:30")), standing, "forecaster-b", later))
                .extracting(Refusal::field, Refusal::code).containsExactly(org.assertj.core.groups.Tuple.tuple("validUntil", "CLOCK_OF_CORRECTION"));
    }

    @Test
    void anAmendmentMayExtendTheEndByTheOfficesLimitFromNow() {
        Forecast standing = standing(moderate(NINE));
        Instant later = at("11:30");
        assertThat(rules.refusals(AMENDMENT, withTimes(moderate(NINE), NINE, at("15:30")), standing, "forecaster-b", later)).isEmpty();
        assertThat(rules.refusals(AMENDMENT, withTimes(moderate(NINE), NINE, at("15:31")), standing, "forecaster-b", later))
                .extracting(Refusal::code).containsExactly("VALIDITY_TOO_LONG");
        assertThat(rules.refusals(AMENDMENT, withTimes(moderate(NINE), at("10:00"), at("13:00")), standing, "forecaster-b", later))
                .extracting(Refusal::code).containsExactly("START_IN_PAST");
    }

    @Test
    void everyRefusalNamesItsFieldAndWhatToDo() {
        ForecastContent wrong = new ForecastContent(Intensity.SEV, Conditions.CLEAR_AIR, at("08:00"), "", new Area.Radius("", 47, -30, 400), 315, 270,
                at("06:00"), at("18:00"), 55, new Movement("E", 7), StrengthChange.NC, List.of(), "x", null, null);
        assertThat(rules.refusals(NEW, wrong, null, "forecaster-b", NOW)).hasSizeGreaterThan(6).allSatisfy(refusal -> {
            assertThat(refusal.field()).isIn(DraftFields.ALL);
            assertThat(refusal.reason()).isNotBlank();
            assertThat(refusal.remedy()).isNotBlank();
        });
    }

    @ParameterizedTest
    @CsvSource({"'',REASON_MISSING", "no,REASON_MISSING", "VALID 120900/121300 XVEN,LOOKS_OFFICIAL", "layer gone=,LOOKS_OFFICIAL"})
    void aReasonMustSaySomethingAndNotLookOfficial(String reason, String code) {
        assertThat(ForecastRules.reason(reason)).extracting(Refusal::code).containsExactly(code);
    }

    private List<String> codes(ForecastContent content) {
        return rules.refusals(NEW, content, null, "forecaster-b", NOW).stream().map(Refusal::code).toList();
    }

    private static Forecast standing(ForecastContent content) {
        return new Forecast(new ForecastId(1), 2, 1, Forecast.State.ISSUED, content, "", "forecaster-b", null, NOW, NOW);
    }

    private static Area corners(double... latitudesAndLongitudes) {
        List<Area.Corner> corners = new java.util.ArrayList<>();
        for (int i = 0; i < latitudesAndLongitudes.length; i += 2) {
            corners.add(new Area.Corner(latitudesAndLongitudes[i], latitudesAndLongitudes[i + 1]));
        }
        return new Area.Corners(corners);
    }

    private static Instant at(String time) {
        return Instant.parse("2031-03-12T" + time + ":00Z");
    }
}
