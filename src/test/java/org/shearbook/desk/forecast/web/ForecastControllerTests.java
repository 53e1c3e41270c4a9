package org.shearbook.desk.forecast.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hamcrest.Matchers.allOf;
import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.hasItem;
import static org.hamcrest.Matchers.not;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.user;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.flash;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.header;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.forecast.DraftFields;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.forecast.ForecastDraft;
import org.shearbook.desk.forecast.ForecastSamples;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.PersonBook;
import org.shearbook.desk.staff.Role;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.SettableClock;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.security.core.authority.SimpleGrantedAuthority;
import org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder;
import org.springframework.test.web.servlet.request.RequestPostProcessor;

/** The pages and calls of forecasts: what they show, and who may do what. */
@OnH2
class ForecastControllerTests {

    private static final Actor B = Actor.named("slf-b", "FORECASTER", true, "WS-1");
    private static final RequestPostProcessor HOLDER = user("slf-b").roles("FORECASTER");
    private static final RequestPostProcessor OTHER = user("slf-c").roles("FORECASTER");
    private static final RequestPostProcessor OBSERVER = user("slf-o").roles("OBSERVER");
    private static final RequestPostProcessor KEY = SecurityMockMvcRequestPostProcessors.user("key:feed")
            .authorities(new SimpleGrantedAuthority("SCOPE_read"), new SimpleGrantedAuthority("SCOPE_compute"), new SimpleGrantedAuthority("SCOPE_messages"));

    @Autowired MockMvc mvc;
    @Autowired ForecastBook forecasts;
    @Autowired DeskHoldingBook holdings;
    @Autowired PersonBook people;
    @Autowired SettableClock clock;

    @BeforeEach
    void bHoldsTheDesk() {
        Actor administrator = Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1");
        if (people.find("slf-b", AsKnownAt.now()).isEmpty()) {
            people.keep(administrator, "slf-b", "Forecaster B", Set.of(Role.FORECASTER), "p");
            people.keep(administrator, "slf-c", "Forecaster C", Set.of(Role.FORECASTER), "p");
            people.keep(administrator, "slf-o", "Observer O", Set.of(Role.OBSERVER), "p");
        }
        vacate();
        holdings.take(B);
    }

    @AfterEach
    void vacate() {
        clock.set(SettableClock.START);
        holdings.find(AsKnownAt.now()).filter(holding -> !holding.isVacant())
                .ifPresent(holding -> holdings.leave(Actor.named(holding.holder(), "FORECASTER", true, "WS-1")));
    }

    @Test
    void theListShowsWhatIsInForceWithMinutesLeftAndTheDrafts() throws Exception {
        Forecast issued = issued();
        forecasts.draft(B, Map.of("placeName", "half a thought"), Map.of());
        mvc.perform(get("/forecasts").with(OBSERVER)).andExpect(status().isOk())
                .andExpect(content().string(allOf(containsString(issued.name()), containsString("3 h 00 min left"), containsString("FL270"), containsString("half a thought"))))
                .andExpect(content().string(not(containsString("/forecasts/new"))));
        mvc.perform(get("/forecasts").with(HOLDER)).andExpect(content().string(allOf(containsString("/forecasts/new"), containsString("/cancel"))));
    }

    @Test
    void aForecastGoesFromTheFormOverTheCheckPageToIssue() throws Exception {
        mvc.perform(get("/forecasts/new").with(HOLDER)).andExpect(status().isOk())
                .andExpect(content().string(allOf(containsString("What would change this"), containsString("inform the SIGMET duty"))));
        String draft = mvc.perform(form(post("/forecasts"), Map.of()).param("act", "check").with(HOLDER)).andExpect(status().is3xxRedirection())
                .andReturn().getResponse().getRedirectedUrl();
        assertThat(draft).matches("/forecasts/\\d+/check");
        long id = Long.parseLong(draft.split("/")[2]);
        String page = mvc.perform(get(draft).with(HOLDER)).andExpect(status().isOk()).andReturn().getResponse().getContentAsString();
        String number = page.replaceAll("(?s).*name=\"number\" value=\"(\\d+)\".*", "$1");
        assertThat(page).contains("SHEAR-LAYER FORECAST " + number + " · version 1 · ").contains("BASIS: FORECASTER JUDGEMENT");
        mvc.perform(post("/forecasts/{id}/issues", id).param("seen", "1").param("number", number).with(csrf()).with(HOLDER))
                .andExpect(redirectedUrl("/forecasts/" + id)).andExpect(flash().attribute("done", containsString("is issued")));
        mvc.perform(get("/forecasts/{id}", id).with(OTHER)).andExpect(status().isOk())
                .andExpect(content().string(allOf(containsString("SHEAR-LAYER FORECAST " + number), containsString("Not for flight planning by itself"),
                        not(containsString("/amend")))));
    }

    @Test
    void whatIsWrongComesBackToTheFormWithItsFieldNamed() throws Exception {
        String back = mvc.perform(form(post("/forecasts"), Map.of("baseFlightLevel", "310", "topFlightLevel", "270")).param("act", "check").with(HOLDER))
                .andReturn().getResponse().getRedirectedUrl();
        assertThat(back).endsWith("/draft?checked=yes");
        mvc.perform(get(back).with(HOLDER)).andExpect(status().isOk()).andExpect(content().string(allOf(
                containsString("class=\"error-summary\""), containsString("href=\"#baseFlightLevel\""), containsString("Base FL310 is not below top FL270"),
                containsString("aria-invalid=\"true\""))));
        // the check page itself can't be reached around the refusal
        mvc.perform(get(back.replace("/draft?checked=yes", "/check")).with(HOLDER)).andExpect(redirectedUrl(back));
    }

    @Test
    void tenThousandCharactersComeBackToTheFormAndNothingIsKept() throws Exception {
        int before = forecasts.openDrafts(AsKnownAt.now()).size();
        mvc.perform(form(post("/forecasts"), Map.of("wouldChange", "x".repeat(10_000))).with(HOLDER)).andExpect(status().isOk())
                .andExpect(content().string(allOf(containsString("href=\"#wouldChange\""), containsString("nothing was saved yet"))));
        assertThat(forecasts.openDrafts(AsKnownAt.now())).hasSize(before);
    }

    @Test
    void markupInATextIsShownAsText() throws Exception {
        ForecastDraft draft = forecasts.draft(B, Map.of("placeName", "<script>alert(1)</script>"), Map.of());
        mvc.perform(get("/forecasts/{id}/draft", draft.id().value()).with(HOLDER))
                .andExpect(content().string(allOf(containsString("&lt;script&gt;alert(1)"), not(containsString("<script>alert(1)")))));
    }

    @Test
    void anObserverMayReadAndNotWrite() throws Exception {
        Forecast issued = issued();
        mvc.perform(get("/forecasts/{id}", issued.id().value()).with(OBSERVER)).andExpect(status().isOk());
        mvc.perform(form(post("/forecasts"), Map.of()).with(OBSERVER)).andExpect(status().isForbidden());
        mvc.perform(post("/forecasts/{id}/cancellations", issued.id().value()).param("seen", "1").param("reason", "layer is gone").with(csrf()).with(OBSERVER))
                .andExpect(flash().attribute("refused", containsString("Only the person who holds the desk")));
        assertThat(forecasts.versions(issued.id(), AsKnownAt.now())).hasSize(1);
    }

    @Test
    void aForecasterOffDeskDraftsAndDoesNotIssue() throws Exception {
        String draft = mvc.perform(form(post("/forecasts"), Map.of()).param("act", "check").with(OTHER)).andReturn().getResponse().getRedirectedUrl();
        mvc.perform(get(draft).with(OTHER)).andExpect(content().string(allOf(not(containsString("name=\"number\"")), containsString("Only the person who holds the desk"))));
        mvc.perform(post(draft.replace("/check", "/issues")).param("seen", "1").param("number", "1").with(csrf()).with(OTHER))
                .andExpect(redirectedUrl(draft)).andExpect(flash().attribute("refused", containsString("Nothing was filed")));
    }

    @Test
    void aDraftChangedByTwoShowsBothTextsToTheSecond() throws Exception {
        ForecastDraft draft = forecasts.draft(B, ForecastSamples.moderate(clock.instant()));
        long id = draft.id().value();
        mvc.perform(form(post("/forecasts/{id}/draft", id), Map.of("placeName", "Kelbrith E")).param("seen", "1").param("purpose", "NEW").with(OTHER))
                .andExpect(redirectedUrl("/forecasts/" + id + "/draft"));
        mvc.perform(form(post("/forecasts/{id}/draft", id), Map.of("placeName", "Kelbrith W")).param("seen", "1").param("purpose", "NEW").with(HOLDER))
                .andExpect(status().isConflict())
                .andExpect(content().string(allOf(containsString("Kelbrith E"), containsString("Kelbrith W"), containsString("saved by slf-c"),
                        containsString("name=\"seen\" value=\"2\""))));
        assertThat(forecasts.openDraft(draft.id(), AsKnownAt.now()).orElseThrow().fields()).containsEntry("placeName", "Kelbrith E");
    }

    @Test
    void aCorrectionShowsWordByWordWhatChangesAndKeepsTheOldVersion() throws Exception {
        Forecast first = issued();
        long id = first.id().value();
        mvc.perform(get("/forecasts/{id}/correct", id).with(HOLDER)).andExpect(status().isOk()).andExpect(content().string(containsString("name=\"basedOn\" value=\"1\"")));
        mvc.perform(form(post("/forecasts/{id}/draft", id), Map.of("baseFlightLevel", "260")).param("seen", "0").param("purpose", "CORRECTION").param("basedOn", "1")
                .param("reason", "base was typed wrong").param("act", "check").with(HOLDER)).andExpect(redirectedUrl("/forecasts/" + id + "/check"));
        String page = mvc.perform(get("/forecasts/{id}/check", id).with(HOLDER)).andExpect(content().string(allOf(
                containsString("<del>FL270 </del>"), containsString("<ins>FL260 </ins>"), containsString("version 2 (corrected)")))).andReturn().getResponse().getContentAsString();
        String seen = page.replaceAll("(?s).*name=\"seen\" value=\"(\\d+)\".*", "$1");
        mvc.perform(post("/forecasts/{id}/issues", id).param("seen", seen).param("number", Integer.toString(first.number())).with(csrf()).with(HOLDER))
                .andExpect(redirectedUrl("/forecasts/" + id));
        mvc.perform(get("/forecasts/{id}", id).with(HOLDER)).andExpect(content().string(allOf(
                containsString("FL260 to FL310"), containsString("FL270 to FL310"), containsString("superseded"), containsString("base was typed wrong"))));
        mvc.perform(get("/forecasts/{id}", id).param("asKnownAt", first.recordedAt().toString()).with(HOLDER))
                .andExpect(content().string(allOf(containsString("FL270 to FL310"), not(containsString("FL260 to FL310")))));
    }

    @Test
    void aCancellationOfAnOlderVersionShowsBothTexts() throws Exception {
        Forecast first = issued();
        long id = first.id().value();
        forecasts.correct(B, first.id(), 1, ForecastSamples.withLevels(first.content(), 260, 310), "base was typed wrong");
        mvc.perform(post("/forecasts/{id}/cancellations", id).param("seen", "1").param("reason", "layer is gone").with(csrf()).with(HOLDER))
                .andExpect(redirectedUrl("/forecasts/" + id + "/cancel?saw=1")).andExpect(flash().attribute("refused", containsString("newest is version 2")));
        mvc.perform(get("/forecasts/{id}/cancel", id).param("saw", "1").with(HOLDER))
                .andExpect(content().string(allOf(containsString("FL260 to FL310"), containsString("FL270 to FL310"))));
        mvc.perform(post("/forecasts/{id}/cancellations", id).param("seen", "2").param("reason", "layer is gone").with(csrf()).with(HOLDER))
                .andExpect(redirectedUrl("/forecasts/" + id));
        mvc.perform(get("/forecasts/{id}", id).with(HOLDER)).andExpect(content().string(containsString("version 3 (cancelled)")));
    }

    @Test
    void anUnknownForecastIsNotFound() throws Exception {
        mvc.perform(get("/forecasts/999999").with(HOLDER)).andExpect(status().isNotFound());
        mvc.perform(get("/forecasts/999999/check").with(HOLDER)).andExpect(status().isNotFound());
        mvc.perform(get("/api/v1/forecasts/999999").with(HOLDER)).andExpect(status().isNotFound()).andExpect(jsonPath("$.code").value("FORECAST_UNKNOWN"));
    }

    @Test
    void aScriptOfASignedInHolderDraftsIssuesAmendsAndCancels() throws Exception {
        String location = mvc.perform(json(post("/api/v1/forecasts"), entry(270, "")).with(HOLDER)).andExpect(status().isCreated())
                .andExpect(header().string("ETag", "\"draft-1\"")).andExpect(jsonPath("$.state").value("DRAFT")).andExpect(jsonPath("$.refusals").isEmpty())
                .andReturn().getResponse().getHeader("Location");
        mvc.perform(post(location + "/issues").with(csrf()).with(HOLDER)).andExpect(status().isPreconditionRequired()).andExpect(jsonPath("$.code").value("IF_MATCH_MISSING"));
        mvc.perform(post(location + "/issues").header("If-Match", "\"draft-2\"").with(csrf()).with(HOLDER)).andExpect(status().isPreconditionFailed())
                .andExpect(jsonPath("$.current").value(1));
        mvc.perform(post(location + "/issues").header("If-Match", "\"draft-1\"").with(csrf()).with(HOLDER)).andExpect(status().isCreated())
                .andExpect(header().string("ETag", "\"1\"")).andExpect(jsonPath("$.state").value("ISSUED")).andExpect(jsonPath("$.area.kind").value("corners"))
                .andExpect(jsonPath("$.area.corners[0].latitudeDeg").value(46.7)).andExpect(jsonPath("$.probabilityWord").value("probable"));
        mvc.perform(json(post(location + "/amendments"), entry(265, "wider after report")).header("If-Match", "\"1\"").with(HOLDER))
                .andExpect(status().isUnprocessableContent()).andExpect(content().contentType(MediaType.APPLICATION_PROBLEM_JSON))
                .andExpect(jsonPath("$.refusals[0].field").value("baseFlightLevel")).andExpect(jsonPath("$.refusals[0].code").value("LEVEL_NOT_IN_TENS"));
        mvc.perform(json(post(location + "/amendments"), entry(260, "wider after report")).header("If-Match", "\"1\"").with(HOLDER))
                .andExpect(status().isCreated()).andExpect(header().string("ETag", "\"2\"")).andExpect(jsonPath("$.state").value("AMENDED"));
        mvc.perform(json(post(location + "/cancellations"), "{\"reason\":\"layer is gone\"}").header("If-Match", "\"1\"").with(HOLDER))
                .andExpect(status().isPreconditionFailed());
        mvc.perform(json(post(location + "/cancellations"), "{\"reason\":\"layer is gone\"}").header("If-Match", "\"2\"").with(HOLDER))
                .andExpect(status().isCreated()).andExpect(jsonPath("$.standing").value("CANCELLED"));
        mvc.perform(get(location + "/versions").with(OBSERVER)).andExpect(status().isOk()).andExpect(jsonPath("$.length()").value(3))
                .andExpect(jsonPath("$[0].text").value(containsString("FL270 to FL310")));
    }

    @Test
    void aKeyReadsAndNeverActs() throws Exception {
        Forecast issued = issued();
        mvc.perform(get("/api/v1/forecasts").param("from", issued.content().validFrom().toString()).with(KEY)).andExpect(status().isOk())
                .andExpect(jsonPath("$.forecasts[*].number", hasItem(issued.number())));
        mvc.perform(json(post("/api/v1/forecasts"), entry(270, "")).with(KEY)).andExpect(status().isForbidden());
        for (String act : new String[] {"issues", "amendments", "corrections", "cancellations"}) {
            mvc.perform(json(post("/api/v1/forecasts/{id}/" + act, issued.id().value()), entry(260, "wider after report")).header("If-Match", "\"1\"").with(KEY))
                    .andExpect(status().isForbidden()).andExpect(content().contentType(MediaType.APPLICATION_PROBLEM_JSON));
        }
        assertThat(forecasts.versions(issued.id(), AsKnownAt.now())).hasSize(1);
    }

    @Test
    void aForecasterWhoDoesNotHoldTheDeskIsToldSoByTheCall() throws Exception {
        Forecast issued = issued();
        mvc.perform(json(post("/api/v1/forecasts/{id}/corrections", issued.id().value()), entry(260, "typed wrong")).header("If-Match", "\"1\"").with(OTHER))
                .andExpect(status().isForbidden()).andExpect(jsonPath("$.code").value("NOT_HOLDING_DESK"));
    }

    private Forecast issued() {
        ForecastDraft draft = forecasts.draft(B, ForecastSamples.moderate(clock.instant()));
        return forecasts.issue(B, draft.id(), 1, null);
    }

    private MockHttpServletRequestBuilder form(MockHttpServletRequestBuilder request, Map<String, String> changed) {
        DraftFields.of(ForecastSamples.moderate(clock.instant())).forEach((name, text) -> request.param(name, changed.getOrDefault(name, text)));
        return request.with(csrf());
    }

    private static MockHttpServletRequestBuilder json(MockHttpServletRequestBuilder request, String body) {
        return request.contentType(MediaType.APPLICATION_JSON).content(body).with(csrf());
    }

    private static String entry(int base, String reason) {
        return """
                {"intensity":"MOD","conditions":"CLEAR_AIR","placeName":"Kelbrith","area":{"kind":"corners","corners":[
                  {"latitudeDeg":46.7,"longitudeDeg":-30.8},{"latitudeDeg":47.7,"longitudeDeg":-30.8},{"latitudeDeg":47.7,"longitudeDeg":-29.4},{"latitudeDeg":46.7,"longitudeDeg":-29.4}]},
                 "baseFlightLevel":%d,"topFlightLevel":310,"validFrom":"2031-03-12T06:15:00Z","validUntil":"2031-03-12T09:00:00Z","probabilityPercent":70,
                 "movingToward":"E","movingKt":25,"change":"NC","wouldChange":"cancel if Ri is 0.5 or more at 1800Z","reason":"%s"}""".formatted(base, reason);
    }
}
