package org.shearbook.desk.shell.web;

import static org.hamcrest.Matchers.containsString;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.user;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import org.junit.jupiter.api.Test;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.request.RequestPostProcessor;

/** A broken call is answered in our words: problem details for a script, a page for a person. */
@OnH2
class RefusalsControllerTests {

    @Autowired MockMvc mvc;

    private static RequestPostProcessor forecaster() {
        return user("forecaster-b").roles("FORECASTER");
    }

    @Test
    void aScriptIsToldWhichParameterCannotBeRead() throws Exception {
        mvc.perform(get("/api/v1/soundings?limit=abc").with(forecaster())).andExpect(status().isBadRequest())
                .andExpect(jsonPath("$.code").value("PARAMETER_NOT_READABLE")).andExpect(jsonPath("$.field").value("limit"))
                .andExpect(jsonPath("$.detail", containsString("a number")));
        mvc.perform(get("/api/v1/soundings?asKnownAt=xyz").with(forecaster())).andExpect(status().isBadRequest())
                .andExpect(jsonPath("$.code").value("AS_KNOWN_AT_UNREADABLE"));
    }

    @Test
    void aBrokenBodyIsRefusedWithoutTheFrameworksWords() throws Exception {
        mvc.perform(post("/api/v1/forecasts").with(forecaster()).with(csrf()).contentType(MediaType.APPLICATION_JSON).content("{"))
                .andExpect(status().isBadRequest()).andExpect(jsonPath("$.code").value("BODY_NOT_READABLE"));
    }

    @Test
    void aDraftWithEmptyListEntriesIsKeptAsItWasSent() throws Exception {
        mvc.perform(post("/api/v1/forecasts").with(forecaster()).with(csrf()).contentType(MediaType.APPLICATION_JSON)
                .content("{\"area\":{\"kind\":\"CORNERS\",\"corners\":[null]},\"evidence\":[null]}")).andExpect(status().isCreated());
    }

    @Test
    void aPersonIsGivenAPageNotProblemDetails() throws Exception {
        mvc.perform(get("/soundings?asKnownAt=xyz").with(forecaster()).accept(MediaType.TEXT_HTML)).andExpect(status().isBadRequest());
        mvc.perform(get("/error").with(forecaster()).accept(MediaType.TEXT_HTML)
                        .requestAttr("jakarta.servlet.error.status_code", 400).requestAttr(PageRefusals.SAID, "Write it like 2031-03-12T06:15:00Z"))
                .andExpect(content().string(containsString("Write it like 2031-03-12T06:15:00Z"))).andExpect(content().string(containsString("side")));
    }

    @Test
    void aScriptThatIsNotSignedInIsToldSoAndOneWithoutATokenToo() throws Exception {
        mvc.perform(post("/api/v1/forecasts").contentType(MediaType.APPLICATION_JSON).content("{}")).andExpect(status().isUnauthorized())
                .andExpect(jsonPath("$.code").value("NOT_SIGNED_IN"));
        mvc.perform(post("/api/v1/forecasts").with(forecaster()).contentType(MediaType.APPLICATION_JSON).content("{}")).andExpect(status().isForbidden())
                .andExpect(jsonPath("$.code").value("CSRF_TOKEN_MISSING"));
    }
}
