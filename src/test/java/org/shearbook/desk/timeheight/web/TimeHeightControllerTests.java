package org.shearbook.desk.timeheight.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.endsWith;
import static org.hamcrest.Matchers.hasSize;
import static org.hamcrest.Matchers.not;
import static org.hamcrest.Matchers.nullValue;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Set;
import java.util.stream.IntStream;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.airreport.AirReports;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.forecast.Area;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.forecast.ForecastSamples;
import org.shearbook.desk.sounding.Arrived;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.PersonBook;
import org.shearbook.desk.staff.Role;
import org.shearbook.desk.station.StationBook;
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.testing.JetAscents;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.SettableClock;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.security.test.context.support.WithAnonymousUser;
import org.springframework.security.test.context.support.WithMockUser;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The display as a page and as an answer, each test on a launch site of its own, far from everybody else's. */
@OnH2
@WithMockUser(username = "th-b", roles = "FORECASTER")
class TimeHeightControllerTests {

    private static final Actor B = Actor.named("th-b", "FORECASTER", true, "WS-1");
    private static final String SHOWN = "&from=2031-03-12T00:00Z&until=2031-03-13T00:00Z";
    private static final Instant SIX = Instant.parse("2031-03-12T06:00:00Z");

    @Autowired MockMvc web;
    @Autowired StationBook stations;
    @Autowired SoundingArchive soundings;
    @Autowired AirReportArchive reports;
    @Autowired ForecastBook forecasts;
    @Autowired DeskHoldingBook holdings;
    @Autowired PersonBook people;
    @Autowired TransactionTemplate transaction;
    @Autowired SettableClock clock;

    @BeforeEach
    void bHoldsTheDesk() {
        if (people.find("th-b", AsKnownAt.now()).isEmpty()) {
            people.keep(Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1"), "th-b", "Forecaster B", Set.of(Role.FORECASTER), "p");
        }
        vacate();
        holdings.take(B);
    }

    @AfterEach
    void theClockGoesBack() {
        vacate();
        clock.set(SettableClock.START);
    }

    private void vacate() {
        holdings.find(AsKnownAt.now()).filter(holding -> !holding.isVacant())
                .ifPresent(holding -> holdings.leave(Actor.named(holding.holder(), "FORECASTER", true, "WS-1")));
    }

    @Test
    void theAnswerHoldsWhatThePictureNeedsWithUnitsInItsNames() throws Exception {
        station("THAA", "Anvik", -10, 10);
        keep("THAA", JetAscents.KELBRITH_DAY_2_12.reported(), SIX);
        JsonNode answer = answer("THAA", SHOWN);
        assertThat(answer.at("/station/name").asString()).isEqualTo("Anvik");
        assertThat(answer.at("/windowM").asDouble()).isEqualTo(200);
        assertThat(answer.at("/asKnownAt").isNull()).isTrue();
        JsonNode column = answer.at("/columns/0");
        assertThat(column.at("/nominalAt").asString()).isEqualTo("2031-03-12T06:00:00Z");
        assertThat(column.at("/launchedAt").asString()).isEqualTo("2031-03-12T05:15:00Z");
        assertThat(column.at("/carriedUntil").asString()).isEqualTo("2031-03-12T12:00:00Z");
        // computed elsewhere: the scenario's table gives tropopause FL368 and jet 131 kt at FL347, to FL010
        assertThat(column.at("/tropopauseFlightLevel").asDouble()).isCloseTo(368, within(10.0));
        assertThat(column.at("/maxWindKt").asDouble()).isCloseTo(131, within(1.0));
        assertThat(column.at("/maxWindFlightLevel").asDouble()).isCloseTo(347, within(10.0));
        JsonNode levels = column.at("/levels");
        int n = levels.at("/flightLevel").size();
        assertThat(n).isBetween(20, 400);
        for (String name : List.of("heightM", "minute", "richardson", "shearKtPer1000Ft", "n2PerS2")) {
            assertThat(levels.at("/" + name).size()).as(name).isEqualTo(n);
        }
        // exact: released at 0515Z, five metres a second
        for (int k = 0; k < n; k++) {
            double minute = Instant.parse("2031-03-12T05:15:00Z").getEpochSecond() / 60.0 + (levels.at("/heightM/" + k).asDouble() - 50) / 300;
            assertThat(levels.at("/minute/" + k).asDouble()).isCloseTo(minute, within(0.02));
        }
    }

    @Test
    void theThinnedColumnCrossesTheCriticalValueAroundTheLayer() throws Exception {
        station("THAB", "Berrin", -10, 20);
        keep("THAB", JetAscents.KELBRITH_DAY_2_12.reported(), SIX);
        JsonNode levels = answer("THAB", SHOWN).at("/columns/0/levels");
        double lowest = 9;
        double at = 0;
        int crossings = 0;
        for (int k = 0; k < levels.at("/richardson").size(); k++) {
            JsonNode here = levels.at("/richardson/" + k);
            if (!here.isNull() && here.asDouble() < lowest && levels.at("/flightLevel/" + k).asDouble() > 33) {
                lowest = here.asDouble();
                at = levels.at("/flightLevel/" + k).asDouble();
            }
            JsonNode next = levels.at("/richardson/" + (k + 1));
            if (k + 1 < levels.at("/richardson").size() && !here.isNull() && !next.isNull() && here.asDouble() < 0.25 != next.asDouble() < 0.25
                    && levels.at("/flightLevel/" + k).asDouble() > 200) {
                crossings++;
            }
        }
        // computed elsewhere: the scenario's table, 0.16 at FL291; the window of 200 m widens it a little
        assertThat(lowest).isBetween(0.12, 0.25);
        assertThat(at).isCloseTo(291, within(6.0));
        assertThat(crossings).isEqualTo(2);
    }

    @Test
    void reportsBeyondTheDistanceAreCountedInsteadOfDrawn() throws Exception {
        station("THAC", "Corran", -20, 10);
        keepReport(AirReports.automatic(Instant.parse("2031-03-12T05:00:00Z"), 0.3, 290, -20, 10));
        keepReport(AirReports.automatic(Instant.parse("2031-03-12T05:10:00Z"), 0.05, 310, -20, 11.5));
        keepReport(AirReports.automatic(Instant.parse("2031-03-12T05:20:00Z"), 0.5, 290, -23, 10));
        web.perform(get("/api/v1/time-height?station=THAC" + SHOWN)).andExpect(status().isOk())
                .andExpect(jsonPath("$.distanceNm").value(120)).andExpect(jsonPath("$.hiddenByDistance").value(1))
                .andExpect(jsonPath("$.reports", hasSize(2)))
                .andExpect(jsonPath("$.reports[0].intensity").value("MOD")).andExpect(jsonPath("$.reports[0].automated").value(true))
                .andExpect(jsonPath("$.reports[0].inCloud").value(nullValue())).andExpect(jsonPath("$.reports[0].distanceNm").value(0.0))
                .andExpect(jsonPath("$.reports[1].intensity").value("NIL")).andExpect(jsonPath("$.reports[1].bearingDeg").value(90.0));
        web.perform(get("/api/v1/time-height?station=THAC&distanceNm=240" + SHOWN)).andExpect(jsonPath("$.reports", hasSize(3)))
                .andExpect(jsonPath("$.hiddenByDistance").value(0));
        web.perform(get("/api/v1/time-height?station=THAC&distanceNm=60" + SHOWN)).andExpect(jsonPath("$.reports", hasSize(1)))
                .andExpect(jsonPath("$.hiddenByDistance").value(2));
    }

    @Test
    void reportsOnTheOtherSideOfTheDateLineAreNear() throws Exception {
        station("THAJ", "Jarrow", -50, 179.5);
        station("THAK", "Kerrin", -51, -179.5);
        keepReport(AirReports.automatic(Instant.parse("2031-03-12T05:00:00Z"), 0.3, 290, -50.5, -179.6));
        keepReport(AirReports.automatic(Instant.parse("2031-03-12T05:10:00Z"), 0.3, 290, -50.5, 179.6));
        for (String station : List.of("THAJ", "THAK")) {
            web.perform(get("/api/v1/time-height?station=" + station + SHOWN)).andExpect(jsonPath("$.reports", hasSize(2)));
        }
    }

    @Test
    void everyVersionOfAForecastIsABoxAndAReportIsInsideTheOneInForce() throws Exception {
        station("THAD", "Dorrin", -20, 30);
        Instant from = clock.instant();
        Forecast first = issue(ForecastSamples.withArea(ForecastSamples.moderate(from), Area.box(-21, -19, 29, 31)));
        clock.advance(Duration.ofMinutes(60));
        Forecast second = forecasts.amend(B, first.id(), 1, ForecastSamples.withArea(ForecastSamples.severe(clock.instant(), null, "nobody else in the building"),
                Area.box(-21, -19, 29, 31)), "severe report");
        keepReport(AirReports.automatic(first.recordedAt().plusSeconds(1200), 0.3, 290, -20, 30));
        keepReport(AirReports.automatic(second.recordedAt().plusSeconds(1200), 0.3, 290, -20, 30));
        keepReport(AirReports.automatic(second.recordedAt().plusSeconds(1260), 0.3, 330, -20, 30));
        web.perform(get("/api/v1/time-height?station=THAD" + SHOWN)).andExpect(status().isOk())
                .andExpect(jsonPath("$.boxes", hasSize(2)))
                .andExpect(jsonPath("$.boxes[0].version").value(1)).andExpect(jsonPath("$.boxes[0].superseded").value(true))
                .andExpect(jsonPath("$.boxes[0].intensity").value("MOD_OCNL_SEV")).andExpect(jsonPath("$.boxes[0].baseFlightLevel").value(270))
                .andExpect(jsonPath("$.boxes[1].superseded").value(false)).andExpect(jsonPath("$.boxes[1].cancelled").value(false))
                .andExpect(jsonPath("$.boxes[0].replacedAt").value(second.recordedAt().toString())).andExpect(jsonPath("$.boxes[1].intensity").value("SEV")).andExpect(jsonPath("$.boxes[1].label").value(first.name()))
                .andExpect(jsonPath("$.reports[0].insideForecasts[0]").value(first.name()))
                .andExpect(jsonPath("$.reports[1].insideForecasts[0]").value(first.name() + " v2"))
                .andExpect(jsonPath("$.reports[2].insideForecasts", hasSize(0)));
        forecasts.cancel(B, first.id(), 2, "1800Z ascent shows Ri 0.9");
        web.perform(get("/api/v1/time-height?station=THAD" + SHOWN)).andExpect(jsonPath("$.boxes", hasSize(3)))
                .andExpect(jsonPath("$.boxes[2].cancelled").value(true)).andExpect(jsonPath("$.boxes[1].superseded").value(true));
        web.perform(get("/api/v1/time-height?station=THAD" + SHOWN + "&asKnownAt=" + first.recordedAt())).andExpect(jsonPath("$.boxes", hasSize(1)))
                .andExpect(jsonPath("$.boxes[0].superseded").value(false)).andExpect(jsonPath("$.asKnownAt").value(first.recordedAt().toString()));
    }

    @Test
    void aSoundingThatCouldNotBeAnalysedIsAColumnWithTheReason() throws Exception {
        station("THAE", "Elvar", -30, 10);
        List<ReportedLevel> windless = JetAscents.KELBRITH_DAY_2_12.reported().stream().limit(60)
                .map(level -> new ReportedLevel(level.pressure(), level.height(), level.temperature(), level.dewPoint(), Double.NaN, Double.NaN, level.elapsed(),
                        Double.NaN, Double.NaN, Set.of())).toList();
        keep("THAE", windless, SIX);
        JsonNode column = answer("THAE", SHOWN).at("/columns/0");
        assertThat(column.at("/levels").isNull()).isTrue();
        assertThat(column.at("/notAnalysed").asString()).isNotBlank();
        web.perform(get("/time-height?station=THAE" + SHOWN)).andExpect(content().string(containsString("not analysed: ")));
    }

    @Test
    void thePageShowsTheSameNumbersWithoutAScript() throws Exception {
        station("THAF", "Fenn", -30, 20);
        keep("THAF", JetAscents.KELBRITH_DAY_2_12.reported(), SIX);
        keepReport(AirReports.automatic(Instant.parse("2031-03-12T05:42:00Z"), 0.47, 290, -30, 20));
        String page = web.perform(get("/time-height?station=THAF" + SHOWN)).andExpect(status().isOk())
                .andExpect(content().string(containsString("necessary for Kelvin-Helmholtz instability, not proof of it")))
                .andExpect(content().string(containsString("data-time-height=\"/api/v1/time-height?station=THAF&amp;from=2031-03-12T00:00:00Z&amp;until=2031-03-13T00:00:00Z&amp;distanceNm=120\"")))
                .andExpect(content().string(containsString("Lowest Ri of each ascent in each 1000 ft, 200 m window")))
                .andExpect(content().string(containsString("131 kt")))
                .andExpect(content().string(containsString("0 hidden by distance"))).andReturn().getResponse().getContentAsString();
        assertThat(page).startsWith("<!DOCTYPE html>");
        assertThat(page).containsPattern("FL290</th>\\s*<td class=\"num\"><b>0\\.\\d\\d</b>");
        assertThat(page).containsPattern("0\\.47</td>");
        assertThat(page).doesNotContain("style=\"");
    }

    @Test
    void anEmptyDisplaySaysWhereTheLastAscentIs() throws Exception {
        station("THAG", "Gaddon", -30, 30);
        keep("THAG", JetAscents.KELBRITH_DAY_2_12.reported(), SIX);
        web.perform(get("/time-height?station=THAG&from=2031-04-01T00:00Z&until=2031-04-02T00:00Z")).andExpect(status().isOk())
                .andExpect(content().string(containsString("No ascents or reports for Gaddon between 1 APR 0000Z and 2 APR 0000Z.")))
                .andExpect(content().string(containsString("Last ascent 12 MAR 0600Z")))
                .andExpect(content().string(containsString("/time-height?station=THAG&amp;from=2031-03-12T00:00Z&amp;until=2031-03-13T00:00Z")));
    }

    @Test
    void theWholeRangeHoldsEverySoundingOfTheStation() throws Exception {
        station("THAH", "Harrow", -40, 10);
        keep("THAH", JetAscents.KELBRITH_DAY_1_00.reported(), Instant.parse("2031-03-08T00:00:00Z"));
        keep("THAH", JetAscents.KELBRITH_DAY_2_12.reported(), SIX);
        web.perform(get("/api/v1/time-height?station=THAH&range=whole")).andExpect(jsonPath("$.columns", hasSize(2)))
                .andExpect(jsonPath("$.from").value("2031-03-07T22:15:00Z"));
        web.perform(get("/api/v1/time-height?station=THAH&range=24h")).andExpect(jsonPath("$.columns", hasSize(1)))
                .andExpect(jsonPath("$.from").value("2031-03-11T18:00:00Z")).andExpect(jsonPath("$.until").value("2031-03-12T18:00:00Z"));
    }

    @Test
    void ofOneAscentInTwoFormatsTheFinerIsDrawnAndTheOtherNamed() throws Exception {
        station("THAL", "Lorrin", -40, 30);
        List<ReportedLevel> fine = JetAscents.KELBRITH_DAY_2_12.reported();
        List<ReportedLevel> coarse = IntStream.range(0, fine.size() / 40).mapToObj(k -> fine.get(40 * k)).toList();
        keep("THAL", coarse, SIX, "FM 35 TEMP");
        keep("THAL", fine, SIX, "CSV sounding");
        JsonNode answer = answer("THAL", SHOWN);
        assertThat(answer.at("/columns").size()).isEqualTo(1);
        assertThat(answer.at("/columns/0/coarserSoundingIds").size()).isEqualTo(1);
        assertThat(answer.at("/columns/0/coarserSoundingIds/0").asLong()).isNotEqualTo(answer.at("/columns/0/soundingId").asLong());
        assertThat(soundings.header(new SoundingId(answer.at("/columns/0/soundingId").asLong()), AsKnownAt.now()).orElseThrow().levelCount())
                .isEqualTo(fine.size());
    }

    @Test
    void whatCannotBeShownIsRefusedWithTheFieldAndWhatToDo() throws Exception {
        station("THAI", "Inver", -40, 20);
        refused("/api/v1/time-height?station=NOWHERE", 404, "STATION_UNKNOWN", "station");
        refused("/api/v1/time-height?station=THAI&from=2031-03-12T06:00Z&until=2031-03-12T06:00Z", 400, "UNTIL_NOT_AFTER_FROM", "until");
        refused("/api/v1/time-height?station=THAI&from=2031-03-01T00:00Z&until=2031-05-01T00:00Z", 400, "TOO_LONG", "from");
        refused("/api/v1/time-height?station=THAI&from=yesterday", 400, "MOMENT_UNREADABLE", "from");
        refused("/api/v1/time-height?station=THAI&distanceNm=70", 400, "DISTANCE_NOT_OFFERED", "distanceNm");
        refused("/api/v1/time-height?station=THAI&range=month", 400, "RANGE_UNKNOWN", "range");
        refused("/api/v1/time-height?station=THAI&shading=rainbow", 400, "SHADING_NOT_OFFERED", "shading");
        web.perform(get("/time-height?station=THAI&from=yesterday")).andExpect(status().isBadRequest())
                .andExpect(content().string(containsString("Not shown as asked"))).andExpect(content().string(containsString("href=\"#from\"")))
                .andExpect(content().string(containsString("data-time-height")));
        web.perform(get("/time-height?station=NOWHERE")).andExpect(status().isBadRequest()).andExpect(content().string(containsString("There is no station")));
        web.perform(get("/time-height?station=THAI&distanceNm=many")).andExpect(status().isBadRequest()).andExpect(content().string(containsString("href=\"#distanceNm\"")));
    }

    @Test
    @WithAnonymousUser
    void nobodySeesItWithoutSigningIn() throws Exception {
        web.perform(get("/time-height")).andExpect(status().is3xxRedirection());
        web.perform(get("/api/v1/time-height?station=THAA")).andExpect(content().string(not(containsString("columns"))));
    }

    private void refused(String address, int status, String code, String field) throws Exception {
        web.perform(get(address)).andExpect(status().is(status)).andExpect(jsonPath("$.type", endsWith(code.toLowerCase().replace('_', '-'))))
                .andExpect(jsonPath("$.field").value(field)).andExpect(jsonPath("$.detail").isNotEmpty());
    }

    private void station(String id, String name, double latitude, double longitude) {
        stations.keep(B, name, latitude, longitude, 50, List.of(id));
    }

    private void keep(String station, List<ReportedLevel> levels, Instant nominal) {
        keep(station, levels, nominal, "CSV sounding");
    }

    private void keep(String station, List<ReportedLevel> levels, Instant nominal, String format) {
        DecodedSounding sounding = new DecodedSounding(station, Double.NaN, Double.NaN, Double.NaN, nominal, nominal.minus(Duration.ofMinutes(45)), Set.of(), "", "",
                levels, "invented ascent of " + station + " " + nominal, 1, List.of());
        transaction.executeWithoutResult(status -> soundings.keepAll(B, List.of(new Arrived(sounding, format)), nominal.plusSeconds(2700)));
    }

    private void keepReport(DecodedAirReport report) {
        transaction.executeWithoutResult(status -> reports.keep(B, report, report.observedAt().plusSeconds(60)));
    }

    private Forecast issue(org.shearbook.desk.forecast.ForecastContent content) {
        var draft = forecasts.draft(B, content);
        return forecasts.issue(B, draft.id(), draft.version(), null);
    }

    private JsonNode answer(String station, String shown) throws Exception {
        return JsonMapper.shared().readTree(web.perform(get("/api/v1/time-height?station=" + station + shown)).andExpect(status().isOk())
                .andReturn().getResponse().getContentAsString());
    }
}
