package org.shearbook.desk.overview.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hamcrest.Matchers.allOf;
import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.matchesPattern;
import static org.hamcrest.Matchers.not;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.user;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.airreport.AirReports;
import org.shearbook.desk.analysis.Ascents;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.forecast.DraftFields;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.forecast.ForecastDraft;
import org.shearbook.desk.forecast.ForecastSamples;
import org.shearbook.desk.layer.Layer;
import org.shearbook.desk.layer.LayerBook;
import org.shearbook.desk.overview.Desk;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.PersonBook;
import org.shearbook.desk.staff.Role;
import org.shearbook.testing.JetAscents;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.shearbook.testing.SettableClock;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.request.RequestPostProcessor;
import org.springframework.transaction.support.TransactionTemplate;

/** The first screen of a shift, on both databases; and a draft begun from a layer it shows. */
class OverviewControllerTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        private static final Actor B = Actor.named("ovw-b", "FORECASTER", true, "WS-1");
        private static final Actor FEED = Actor.named("feed", "messages", false, "server");
        private static final RequestPostProcessor FORECASTER = user("ovw-b").roles("FORECASTER");
        private static final RequestPostProcessor OBSERVER = user("ovw-o").roles("OBSERVER");

        @Autowired MockMvc mvc;
        @Autowired Desk desk;
        @Autowired ForecastBook forecasts;
        @Autowired SoundingArchive soundings;
        @Autowired AirReportArchive reports;
        @Autowired LayerBook layers;
        @Autowired DeskHoldingBook holdings;
        @Autowired PersonBook people;
        @Autowired TransactionTemplate transaction;
        @Autowired SettableClock clock;

        /** A day of its own; before the other tests' days, so that the moments at which acts are recorded do not run ahead of them. */
        private static final Instant MORNING = Instant.parse("2030-06-01T06:15:00Z");

        @BeforeEach
        void aDayOfItsOwn() {
            Actor administrator = Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1");
            if (people.find("ovw-b", AsKnownAt.now()).isEmpty()) {
                people.keep(administrator, "ovw-b", "Forecaster B", Set.of(Role.FORECASTER), "p");
            }
            vacate();
            clock.set(MORNING);
        }

        @AfterEach
        void theClockGoesBack() {
            clock.set(SettableClock.START);
            vacate();
        }

        private void vacate() {
            holdings.find(AsKnownAt.now()).filter(holding -> !holding.isVacant())
                    .ifPresent(holding -> holdings.leave(Actor.named(holding.holder(), "FORECASTER", true, "WS-1")));
        }

        @Test
        void aVacantDeskIsTakenWithOneClickAndLeftAgain() throws Exception {
            mvc.perform(get("/").with(FORECASTER)).andExpect(status().isOk())
                    .andExpect(content().string(allOf(containsString("Nobody holds the desk"), containsString("Take the desk"), not(containsString("Leave the desk")))));
            mvc.perform(get("/").with(OBSERVER)).andExpect(content().string(not(containsString("Take the desk"))));
            mvc.perform(post("/staff/desk-holdings").with(csrf()).with(FORECASTER)).andExpect(status().is3xxRedirection());
            mvc.perform(get("/").with(FORECASTER)).andExpect(content().string(allOf(containsString("Leave the desk"), containsString("Forecaster B"),
                    not(containsString("Nobody holds the desk")))));
        }

        @Test
        void withNothingInForceItNamesTheLastForecastThatWas() throws Exception {
            Forecast ended = issuedNow(Duration.ofHours(1));
            // long after every forecast of any test, so that none is to come
            clock.set(ended.recordedAt().plus(Duration.ofDays(400)));
            Desk.Situation situation = desk.situation(AsKnownAt.now());
            assertThat(situation.live()).isEmpty();
            assertThat(situation.lastEnded().endsAt()).isAfterOrEqualTo(ended.endsAt()).isBefore(clock.instant());
            mvc.perform(get("/").with(FORECASTER)).andExpect(status().isOk()).andExpect(content().string(
                    containsString("No layer forecasts in force. Last one, %s, ended".formatted(situation.lastEnded().name()))));
        }

        @Test
        void whatIsInForceStandsInTheOrderOfItsEndWithTheReportsInside() throws Exception {
            holdings.take(B);
            Forecast longer = issued(MORNING, MORNING.plus(Duration.ofHours(4)));
            Forecast shorter = issued(MORNING, MORNING.plus(Duration.ofHours(2)));
            clock.advance(Duration.ofMinutes(30));
            report(clock.instant(), 0.30, 290, 47.2, -30);
            report(clock.instant().plusSeconds(1), 0.15, 290, 47.2, -30);
            report(clock.instant().plusSeconds(2), 0.05, 290, 47.2, -30);
            report(clock.instant().plusSeconds(3), 0.30, 330, 47.2, -30);
            List<Desk.Live> live = desk.situation(AsKnownAt.now()).live();
            assertThat(live).extracting(one -> one.forecast().id()).containsSubsequence(shorter.id(), longer.id());
            assertThat(live).filteredOn(one -> one.forecast().id().equals(longer.id())).singleElement().satisfies(one -> {
                assertThat(one.inside()).isEqualTo("1 yes, 1 light, 1 no");
            });
            mvc.perform(get("/").with(FORECASTER)).andExpect(content().string(allOf(containsString("1 h 30 min left"), containsString("reports inside: 1 yes, 1 light, 1 no"),
                    containsString("30 of 120 minutes gone"), not(containsString(" style=")))));
        }

        @Test
        void aSevereReportStandsInTheActNowRowForSixHours() throws Exception {
            clock.set(Instant.parse("2030-06-05T11:42:00Z"));
            mvc.perform(get("/").with(OBSERVER)).andExpect(content().string(not(containsString("class=\"act-now\""))));
            long id = report(clock.instant(), 0.47, 290, 47.2, -30);
            clock.advance(Duration.ofMinutes(4));
            mvc.perform(get("/").with(OBSERVER)).andExpect(content().string(allOf(containsString("class=\"act-now\""), containsString("/air-reports/" + id),
                    containsString("severe, FL290, N4712 W03000, EDR 0.47"))));
            clock.advance(Duration.ofHours(6));
            mvc.perform(get("/").with(OBSERVER)).andExpect(content().string(not(containsString("class=\"act-now\""))));
        }

        @Test
        void aForecastThatEndsWithNothingToFollowIsToBeActedOn() {
            holdings.take(B);
            Instant day = Instant.parse("2030-06-08T06:15:00Z");
            clock.set(day);
            Forecast ending = issued(day, day.plus(Duration.ofHours(1)));
            clock.advance(Duration.ofMinutes(46));
            assertThat(desk.situation(AsKnownAt.now()).actNow()).extracting(Desk.ActNow::expiring).contains(ending);
            issued(clock.instant(), clock.instant().plus(Duration.ofHours(2)));
            assertThat(desk.situation(AsKnownAt.now()).actNow()).extracting(Desk.ActNow::expiring).doesNotContain(ending);
        }

        @Test
        void theNewestSoundingOfAStationIsShownWithItsAgeWindowStateAndWhatIsMissing() throws Exception {
            Instant midnight = Instant.parse("2030-06-12T00:00:00Z");
            sounding("OVW-1", midnight.minus(Duration.ofHours(12)), JetAscents.KELBRITH_DAY_1_00);
            sounding("OVW-1", midnight, JetAscents.KELBRITH_DAY_2_12);
            clock.set(midnight.plus(Duration.ofHours(3)));
            Desk.StationRow fresh = row("OVW-1");
            assertThat(fresh.nominal()).isEqualTo(midnight);
            assertThat(fresh.state().inWords()).isEqualTo("subcritical");
            assertThat(fresh.missingSince()).isNull();
            assertThat(fresh.analysis().window()).isEqualTo(200);
            mvc.perform(get("/").with(OBSERVER)).andExpect(content().string(allOf(containsString("OVW-1"), containsString("3 h 00 min"), containsString("200 m"),
                    containsString("is-subcritical"), containsString("Between ascents the atmosphere is not observed"), containsString("No report does not mean smooth air"))));
            clock.set(midnight.plus(Duration.ofHours(14)));
            Desk.StationRow old = row("OVW-1");
            assertThat(old.state().inWords()).isEqualTo("unknown");
            assertThat(old.missingSince()).isEqualTo(midnight.plus(Duration.ofHours(12)));
            mvc.perform(get("/").with(OBSERVER)).andExpect(content().string(containsString("missing since 1200Z")));
        }

        @Test
        void theDeskIsDrawnAsItWasKnownAtAMoment() throws Exception {
            Forecast first = issuedNow(Duration.ofHours(3));
            forecasts.cancel(B, first.id(), 1, "layer is gone");
            mvc.perform(get("/").with(OBSERVER)).andExpect(content().string(not(containsString(">" + first.name() + "</a>"))));
            mvc.perform(get("/").param("asKnownAt", first.recordedAt().toString()).with(FORECASTER))
                    .andExpect(content().string(allOf(containsString(">" + first.name() + "</a>"), not(containsString("data-live=")), not(containsString("Leave the desk")))));
        }

        @Test
        void aDraftFromALayerIsFilledAndMarkedUntilTouched() throws Exception {
            Instant noon = Instant.parse("2030-06-20T12:00:00Z");
            sounding("OVW-2", noon, JetAscents.KELBRITH_DAY_2_12);
            clock.set(noon.plus(Duration.ofMinutes(53)));
            Layer layer = layers.newest("OVW-2", noon.minus(Duration.ofHours(2)), noon.plus(Duration.ofHours(2)), null, AsKnownAt.now(), 1).get(0);
            String page = mvc.perform(get("/forecasts/new").param("layer", layer.id().toString()).with(FORECASTER)).andExpect(status().isOk())
                    .andReturn().getResponse().getContentAsString();
            String mark = "from %s".formatted(layer.stationName());
            assertThat(page.split(java.util.regex.Pattern.quote(mark), -1).length - 1).as("prefilled fields marked").isGreaterThanOrEqualTo(8);
            // layer FL 263 to 304 in the scenario's table (computed elsewhere): outward in tens
            int base = (int) Math.floor(layer.baseFlightLevel() / 10) * 10;
            int top = (int) Math.ceil(layer.topFlightLevel() / 10) * 10;
            assertThat(page).contains("value=\"%03d\"".formatted(base)).contains("value=\"%03d\"".formatted(top)).contains("value=\"2030-06-20T13:00Z\"");
            assertThat(page).contains("LAYER " + layer.id());
            // wind from 250 degrees moves the area toward 070
            assertThat(page).containsPattern("<option value=\"ENE\"\\s+selected");
            String back = mvc.perform(post("/forecasts").param("layer", layer.id().toString()).param("baseFlightLevel", "%03d".formatted(base)).param("topFlightLevel", "330")
                    .param("evidence", "LAYER " + layer.id()).with(csrf()).with(FORECASTER)).andExpect(status().is3xxRedirection()).andReturn().getResponse().getRedirectedUrl();
            assertThat(back).satisfies(url -> assertThat(url).matches("/forecasts/\\d+/draft"));
            ForecastDraft draft = forecasts.openDrafts(AsKnownAt.now()).stream().filter(one -> back.contains("/" + one.id().value() + "/")).findFirst().orElseThrow();
            assertThat(draft.prefilled()).containsKeys(DraftFields.BASE, DraftFields.EVIDENCE).doesNotContainKey(DraftFields.TOP);
            assertThat(draft.fields().get(DraftFields.EVIDENCE)).contains("layer " + layer.letter()).contains("200 m window");
        }

        @Test
        void aLayerThatIsNotThereLeavesAnEmptyForm() throws Exception {
            mvc.perform(get("/forecasts/new").param("layer", "987654").with(FORECASTER)).andExpect(status().isOk())
                    .andExpect(content().string(allOf(containsString("There is no layer 987654"), not(matchesPattern("(?s).*class=\"prefilled\".*")))));
        }

        private Desk.StationRow row(String station) {
            return desk.situation(AsKnownAt.now()).stations().stream().filter(row -> row.sounding().stationId().equals(station)).findFirst().orElseThrow();
        }

        /** Issued at the moment the record stands at, whatever day other tests left it at. */
        private Forecast issuedNow(Duration validity) {
            Instant recordStandsAt = holdings.take(B).since().plusMillis(1);
            clock.set(recordStandsAt);
            return issued(recordStandsAt, recordStandsAt.plus(validity));
        }

        private Forecast issued(Instant from, Instant until) {
            ForecastDraft draft = forecasts.draft(B, ForecastSamples.withTimes(ForecastSamples.moderate(from), from, until));
            return forecasts.issue(B, draft.id(), 1, null);
        }

        private long report(Instant observedAt, double edr, double flightLevel, double latitude, double longitude) {
            return transaction.execute(status -> reports.keep(FEED, AirReports.automatic(observedAt, edr, flightLevel, latitude, longitude), observedAt)).id().value();
        }

        private void sounding(String station, Instant nominal, JetAscents jet) {
            transaction.executeWithoutResult(status -> soundings.keep(FEED, Ascents.of(jet, station, nominal), "CSV", nominal.plus(Duration.ofMinutes(45))));
        }
    }
}
