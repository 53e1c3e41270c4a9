package org.shearbook.desk.sounding.web;

import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.hasItem;
import static org.hamcrest.Matchers.not;
import static org.shearbook.desk.sounding.SoundingMessages.NOON;
import static org.shearbook.desk.sounding.SoundingMessages.file;
import static org.shearbook.desk.sounding.SoundingMessages.levels;
import static org.shearbook.desk.sounding.SoundingMessages.part;
import static org.shearbook.desk.sounding.SoundingMessages.significantLevels;
import static org.shearbook.desk.sounding.SoundingMessages.standardLevels;
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

import java.time.Duration;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.sounding.Kept;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.UserRequestPostProcessor;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;

@OnH2
class SoundingControllerTests {

    @Autowired MockMvc mvc;
    @Autowired SoundingArchive archive;
    @Autowired TransactionTemplate transaction;

    private static final UserRequestPostProcessor FORECASTER = user("forecaster-a").roles("FORECASTER");
    private static final UserRequestPostProcessor OBSERVER = user("observer-o").roles("OBSERVER");

    private Kept keep(DecodedSounding message, String format) {
        return transaction.execute(status -> archive.keep(Actor.named("forecaster-a", "FORECASTER", true, "WS-1"), message, format, NOON));
    }

    @Test
    void theListShowsAnAscentWithItsExtremes() throws Exception {
        Kept kept = keep(file("SCLI", NOON, NOON.minusSeconds(2700), levels(11_000, 1)), "CSV sounding");
        mvc.perform(get("/soundings").param("station", "scli").with(FORECASTER)).andExpect(status().isOk())
                .andExpect(content().string(containsString("SCLI"))).andExpect(content().string(containsString("12 MAR 1115Z")))
                .andExpect(content().string(containsString("/soundings/" + kept.id()))).andExpect(content().string(containsString("data-id=\"" + kept.id())));
        mvc.perform(get("/soundings").param("from", "whenever").with(FORECASTER)).andExpect(status().isOk())
                .andExpect(content().string(containsString("error-summary"))).andExpect(content().string(containsString("from is not a moment")));
    }

    @Test
    void aSoundingsPageShowsEveryLevelItsFlagsAndItsVersionsWithoutScript() throws Exception {
        Kept first = keep(part("SCPG", NOON, "TTAA", "", standardLevels(1)), "TEMP");
        keep(part("SCPG", NOON, "TTBB", "", significantLevels()), "TEMP");
        mvc.perform(get("/soundings/" + first.id()).with(FORECASTER)).andExpect(status().isOk())
                .andExpect(content().string(containsString("version 2"))).andExpect(content().string(containsString("TTAA TTBB")))
                .andExpect(content().string(containsString("height computed")))
                .andExpect(content().string(containsString("data-window-m=\"200\""))).andExpect(content().string(containsString("From one balloon, at one place and time")));
        mvc.perform(get("/soundings/" + first.id()).param("windowM", "100").with(FORECASTER)).andExpect(content().string(containsString("data-window-m=\"100\"")));
        mvc.perform(get("/soundings/999999999").with(FORECASTER)).andExpect(status().isNotFound());
    }

    @Test
    void scriptsGetHeaderLevelsAndRawTextWithUnitsAndATag() throws Exception {
        Kept kept = keep(file("SCAP", NOON, null, levels(5_000, 1)), "CSV sounding");
        mvc.perform(get("/api/v1/soundings/" + kept.id()).with(FORECASTER)).andExpect(status().isOk())
                .andExpect(header().string("ETag", "\"" + kept.id() + "-1\""))
                .andExpect(jsonPath("$.sounding.station.latitudeDeg").value(47.2)).andExpect(jsonPath("$.sounding.launchedAt").isEmpty())
                .andExpect(jsonPath("$.remarks[*].code").value(hasItem("STATION_UNKNOWN")));
        mvc.perform(get("/api/v1/soundings/" + kept.id()).header("If-None-Match", "\"" + kept.id() + "-1\"").with(FORECASTER)).andExpect(status().isNotModified());
        mvc.perform(get("/api/v1/soundings/" + kept.id() + "/levels").with(FORECASTER))
                .andExpect(jsonPath("$.levels.length()").value(20)).andExpect(jsonPath("$.levels[0].heightM").value(50.0))
                .andExpect(jsonPath("$.levels[0].windSpeedMs").value(5.125)).andExpect(jsonPath("$.levels[0].dewPointC").isEmpty())
                .andExpect(jsonPath("$.levels[0].significance[0]").value("SURFACE")).andExpect(content().string(not(containsString("NaN"))));
        mvc.perform(get("/api/v1/soundings/" + kept.id() + "/raw").with(FORECASTER)).andExpect(content().string("file of SCAP with 20 levels"));
        mvc.perform(get("/api/v1/soundings/987654321/levels").with(FORECASTER)).andExpect(status().isNotFound()).andExpect(jsonPath("$.code").value("SOUNDING_UNKNOWN"));
    }

    @Test
    void theListForScriptsComesInPages() throws Exception {
        for (int k = 0; k < 3; k++) {
            keep(file("SCPA", NOON.plus(Duration.ofHours(12L * k)), null, levels(5_000, 1)), "CSV sounding");
        }
        String next = com.jayway.jsonpath.JsonPath.read(mvc.perform(get("/api/v1/soundings").param("station", "SCPA").param("limit", "2").with(FORECASTER))
                .andExpect(jsonPath("$.soundings.length()").value(2)).andReturn().getResponse().getContentAsString(), "$.next").toString();
        mvc.perform(get("/api/v1/soundings").param("station", "SCPA").param("limit", "2").param("after", next).with(FORECASTER))
                .andExpect(jsonPath("$.soundings.length()").value(1)).andExpect(jsonPath("$.next").isEmpty());
        mvc.perform(get("/api/v1/soundings").param("station", "SCPA").param("from", "2031-03-13T00:00Z").param("until", "2031-03-13T01:00Z").with(FORECASTER))
                .andExpect(jsonPath("$.soundings.length()").value(1));
        mvc.perform(get("/api/v1/soundings").param("limit", "0").with(FORECASTER)).andExpect(status().isBadRequest()).andExpect(jsonPath("$.field").value("limit"));
    }

    @Test
    void aForecasterWithdrawsWithAReasonAndAnObserverMayNot() throws Exception {
        Kept kept = keep(file("SCWI", NOON, null, levels(5_000, 1)), "CSV sounding");
        String address = "/soundings/" + kept.id();
        mvc.perform(post(address + "/withdrawals").param("reason", "no").with(OBSERVER).with(csrf())).andExpect(redirectedUrl(address))
                .andExpect(flash().attribute("refused", containsString("forecaster")));
        mvc.perform(post(address + "/withdrawals").param("reason", "sonde iced over").with(FORECASTER).with(csrf())).andExpect(flash().attributeExists("done"));
        mvc.perform(get(address).with(FORECASTER)).andExpect(content().string(containsString("Withdrawn: sonde iced over")));
    }
}
