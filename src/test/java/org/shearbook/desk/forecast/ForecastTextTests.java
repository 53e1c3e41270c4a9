package org.shearbook.desk.forecast;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The text of a forecast, line by line. The expected texts are the office's own form (exact). */
class ForecastTextTests {

    private static final Instant START = Instant.parse("2031-03-12T11:50:00Z");
    private final ForecastText text = new ForecastText("Kelbrith desk");

    @Test
    void anAmendedSevereForecastReadsAsTheOfficesFormSays() {
        ForecastContent content = new ForecastContent(Intensity.SEV, Conditions.CLEAR_AIR, Instant.parse("2031-03-12T11:42:00Z"), "",
                Area.box(46.7, 47.7, -30.8, -29.4), 270, 310, START, Instant.parse("2031-03-12T13:00:00Z"), 80, new Movement("E", 25), StrengthChange.NC,
                List.of(), "cancel if Ri is 0.5 or more at 1800Z and no yes-report in 90 min", "supervisor-s", null);
        assertThat(text.of(2, 2, Forecast.State.AMENDED, content)).isEqualTo("""
                SHEAR-LAYER FORECAST 2 · version 2 (amended) · Kelbrith desk · ADVISORY, NOT A SIGMET
                What             severe turbulence in clear air; reported 1142Z, expected to continue
                Where            46°42'N to 47°42'N, 029°24'W to 030°48'W
                Levels           FL270 to FL310
                When             12 March 2031, 1150Z to 1300Z
                How sure         80 %, probable
                Moving           east 25 kt, no change in strength
                Would change it  cancel if Ri is 0.5 or more at 1800Z and no yes-report in 90 min
                BASIS: FORECASTER JUDGEMENT
                ADVISORY ONLY. Internal product of Kelbrith desk. Not for flight planning by itself.
                """);
    }

    @Test
    void aFirstVersionOverMidnightAroundAPlaceNamesBothDaysAndItsEvidence() {
        ForecastContent content = new ForecastContent(Intensity.MOD, Conditions.BOTH, Instant.parse("2031-03-11T23:40:00Z"), "Kelbrith",
                new Area.Radius("XVKE", 47.2, -30, 60), 40, 90, Instant.parse("2031-03-12T22:00:00Z"), Instant.parse("2031-03-13T01:30:00Z"), 40,
                Movement.stationary(), StrengthChange.WKN,
                List.of(new Evidence(Evidence.Kind.LAYER, 7, "XVKE 1200Z layer A, Ri 0.17 at FL291"), new Evidence(Evidence.Kind.AIR_REPORT, 9, "2340Z FL290 MOD")),
                "cancel when the 00Z ascent is steady", null, null);
        assertThat(text.of(7, 1, Forecast.State.ISSUED, content)).isEqualTo("""
                SHEAR-LAYER FORECAST 7 · version 1 · Kelbrith desk · ADVISORY, NOT A SIGMET
                What             moderate turbulence in clear air and in cloud; reported 11 March 2340Z, expected to continue
                Where            Kelbrith, within 60 NM of XVKE (47°12'N 030°00'W)
                Levels           FL040 to FL090
                When             12 March 2031, 2200Z to 13 March 2031, 0130Z
                How sure         40 %, even chance
                Moving           stationary, weakening
                Would change it  cancel when the 00Z ascent is steady
                Basis            XVKE 1200Z layer A, Ri 0.17 at FL291; 2340Z FL290 MOD
                ADVISORY ONLY. Internal product of Kelbrith desk. Not for flight planning by itself.
                """);
    }

    @Test
    void aCancellationSaysWhatItTakesBackAndWhy() {
        assertThat(text.cancelling(2, 3, ForecastSamples.moderate(Instant.parse("2031-03-12T09:00:00Z")), Instant.parse("2031-03-12T10:30:20Z"), "layer gone at 1015Z"))
                .isEqualTo("""
                SHEAR-LAYER FORECAST 2 · version 3 (cancelled) · Kelbrith desk · ADVISORY, NOT A SIGMET
                Cancelled        12 March 2031, 1030Z
                Reason           layer gone at 1015Z
                It said          moderate, occasionally severe turbulence in clear air; forecast
                Where            Kelbrith, 46°42'N to 47°42'N, 029°24'W to 030°48'W
                Levels           FL270 to FL310
                When             12 March 2031, 0900Z to 1200Z
                ADVISORY ONLY. Internal product of Kelbrith desk. Not for flight planning by itself.
                """);
    }

    @Test
    void cornersThatAreNoBoxAreSaidInTheirOrder() {
        Area corners = new Area.Corners(List.of(new Area.Corner(46.5, -30), new Area.Corner(47.5, -29.5), new Area.Corner(47, -28.25)));
        assertThat(ForecastText.where(corners)).isEqualTo("between 46°30'N 030°00'W, 47°30'N 029°30'W, 47°00'N 028°15'W");
    }

    @Test
    void aBoxAcrossGreenwichOrTheDateLineIsSaidFromWestToEast() {
        assertThat(ForecastText.where(Area.box(50, 51, -1.5, 2))).isEqualTo("50°00'N to 51°00'N, 001°30'W to 002°00'E");
        assertThat(ForecastText.where(Area.box(50, 51, 179, -178))).isEqualTo("50°00'N to 51°00'N, 179°00'E to 178°00'W");
        assertThat(ForecastText.where(Area.box(-51, -50, 10, 12))).isEqualTo("50°00'S to 51°00'S, 010°00'E to 012°00'E");
    }

    @Test
    void noTextCanBeTakenForAnOfficialMessage() {
        for (Intensity intensity : Intensity.values()) {
            ForecastContent content = ForecastSamples.severe(START, null, "night shift, one person");
            ForecastContent varied = new ForecastContent(intensity, content.conditions(), START, content.placeName(), content.area(), 270, 310, START,
                    content.validUntil(), 50, content.movement(), content.change(), List.of(), content.wouldChange(), null, content.aloneReason());
            String said = text.of(1, 1, Forecast.State.ISSUED, varied);
            assertThat(said).contains("ADVISORY, NOT A SIGMET").doesNotContain("=").doesNotContain("VALID").doesNotContainPattern("\\d{6}/\\d{6}");
        }
    }

    @Test
    void everyStepOfTheScaleHasItsWord() {
        // office rule: possible 10-30, even chance 40-60, probable 70-80, very probable 90
        List<String> words = List.of("possible", "possible", "possible", "even chance", "even chance", "even chance", "probable", "probable", "very probable");
        for (int i = 0; i < 9; i++) {
            ForecastContent content = ForecastSamples.moderate(START);
            ForecastContent varied = new ForecastContent(content.intensity(), content.conditions(), null, "", content.area(), 270, 310, START,
                    content.validUntil(), 10 * (i + 1), content.movement(), content.change(), List.of(), "x", null, null);
            assertThat(varied.probabilityWord()).as("%d %%", 10 * (i + 1)).isEqualTo(words.get(i));
        }
    }

    @Test
    void aMovementIsSaidByTheCompassPointItGoesTo() {
        assertThat(Movement.toward(70, 41).words()).isEqualTo("east-northeast 40 kt");
        assertThat(Movement.toward(315, 13).words()).isEqualTo("northwest 15 kt");
        assertThat(Movement.toward(359, 7).words()).isEqualTo("north 5 kt");
        assertThat(Movement.toward(123, 2).words()).isEqualTo("stationary");
    }
}
