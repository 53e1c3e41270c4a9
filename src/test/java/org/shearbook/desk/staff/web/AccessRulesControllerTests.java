package org.shearbook.desk.staff.web;

import static org.hamcrest.Matchers.containsString;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.user;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.header;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import org.junit.jupiter.api.Test;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.test.web.servlet.MockMvc;

/** Who comes in, and what is said to those who don't. */
@OnH2
class AccessRulesControllerTests {

    @Autowired MockMvc mvc;

    @Test
    void aPageAsksForSignInAndAScriptIsToldWhatToSend() throws Exception {
        mvc.perform(get("/staff")).andExpect(status().isFound()).andExpect(redirectedUrl("/login"));
        mvc.perform(get("/api/v1/stations")).andExpect(status().isUnauthorized())
                .andExpect(content().contentType(MediaType.APPLICATION_PROBLEM_JSON))
                .andExpect(jsonPath("$.code").value("NOT_SIGNED_IN"));
    }

    @Test
    void anUnknownKeyIsRefusedAndTheDemonstrationsKeyIsUnknownOutsideTheDemonstration() throws Exception {
        for (String key : new String[] {"something", "ennersund-demo", ""}) {
            mvc.perform(get("/api/v1/stations").header("Authorization", "Bearer " + key)).andExpect(status().isUnauthorized())
                    .andExpect(jsonPath("$.code").value("KEY_NOT_KNOWN"));
        }
    }

    @Test
    void aFormWithoutItsTokenIsRefused() throws Exception {
        mvc.perform(post("/staff/desk-holdings").with(user("forecaster-b").roles("FORECASTER"))).andExpect(status().isForbidden());
    }

    @Test
    void theBrowserIsToldToLoadNothingFromElsewhere() throws Exception {
        mvc.perform(get("/login")).andExpect(status().isOk())
                .andExpect(header().string("Content-Security-Policy", containsString("script-src 'self'")))
                .andExpect(header().string("X-Frame-Options", "DENY"))
                .andExpect(content().string(containsString("<!DOCTYPE html>")))
                .andExpect(content().string(containsString("name=\"username\"")));
    }

    @Test
    void withoutPeopleNobodySignsIn() throws Exception {
        mvc.perform(post("/login").with(csrf()).param("username", "forecaster-b").param("password", "ennersund"))
                .andExpect(redirectedUrl("/login?error"));
    }

    @Test
    void metricsAreForTheAdministratorAlone() throws Exception {
        mvc.perform(get("/actuator/prometheus").with(user("forecaster-b").roles("FORECASTER"))).andExpect(status().isForbidden());
        mvc.perform(get("/actuator/health")).andExpect(status().isOk());
    }
}
