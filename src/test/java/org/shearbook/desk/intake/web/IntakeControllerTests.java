package org.shearbook.desk.intake.web;

import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.not;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.user;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.multipart;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.flash;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.mock.web.MockMultipartFile;
import org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.UserRequestPostProcessor;
import org.springframework.test.web.servlet.MockMvc;

@OnH2
class IntakeControllerTests {

    @Autowired MockMvc mvc;

    private static final UserRequestPostProcessor FORECASTER = user("forecaster-a").roles("FORECASTER");
    private static final UserRequestPostProcessor ADMINISTRATOR = user("administrator-t").roles("ADMINISTRATOR");
    private static final String CSV = """
            # station_id=%s
            # launch_time=2031-03-12T05:15:00Z
            pressure_hPa,geopotential_height_m,temperature_C,wind_direction_deg,wind_speed_kt
            1004.3,87,9.2,240,14
            925.0,780,4.1,250,25
            850.0,1480,0.2,255,31
            700.0,3010,-8.9,260,48
            """;
    private static final String REPORT = "XVKE UA /OV 4712N03000W/TM 0542/FL290/TP B738/TB MOD CHOP 280-300/RM %s";

    @Test
    void filesAndPastedTextComeInTogetherAndTheResultIsShown() throws Exception {
        String batch = mvc.perform(multipart("/intake/messages")
                        .file(new MockMultipartFile("file", "a.csv", "text/plain", CSV.formatted("ICAA").getBytes()))
                        .file(new MockMultipartFile("file", "noise.txt", "text/plain", "nothing that anybody reads".getBytes()))
                        .file(new MockMultipartFile("file", "empty.txt", "text/plain", new byte[0]))
                        .param("pasted", REPORT.formatted("PAGE")).with(FORECASTER).with(csrf()))
                .andExpect(status().is3xxRedirection()).andReturn().getResponse().getRedirectedUrl();
        mvc.perform(get(batch).with(FORECASTER).flashAttr("justTakenIn", true)).andExpect(status().isOk())
                .andExpect(content().string(containsString("2 accepted, 0 of them known already; 1 queued; 1 refused.")))
                .andExpect(content().string(containsString("CSV sounding"))).andExpect(content().string(containsString("UNKNOWN_FORMAT")))
                .andExpect(content().string(containsString("EMPTY_INPUT"))).andExpect(content().string(containsString("Air-report ")));
        mvc.perform(get("/intake").with(FORECASTER)).andExpect(content().string(containsString("noise.txt"))).andExpect(content().string(containsString(batch)));
    }

    @Test
    void anEmptyFormIsAnsweredAtItsField() throws Exception {
        mvc.perform(multipart("/intake/messages").file(new MockMultipartFile("file", "", "application/octet-stream", new byte[0])).param("pasted", " ")
                        .with(FORECASTER).with(csrf()))
                .andExpect(redirectedUrl("/intake")).andExpect(flash().attribute("refusedField", "file"));
    }

    @Test
    void anItemOfTheQueueIsCorrectedOrSetAside() throws Exception {
        String first = mvc.perform(post("/api/v1/messages").content("unreadable, to be corrected").contentType(MediaType.TEXT_PLAIN).with(FORECASTER).with(csrf()))
                .andExpect(jsonPath("$.queued[0].reason").value(containsString("UNKNOWN_FORMAT"))).andReturn().getResponse().getContentAsString();
        String item = "/intake/items/" + com.jayway.jsonpath.JsonPath.read(first, "$.queued[0].id");
        mvc.perform(get(item).with(FORECASTER)).andExpect(content().string(containsString("unreadable, to be corrected")));
        mvc.perform(post(item + "/settlements").param("reason", "").with(FORECASTER).with(csrf())).andExpect(flash().attribute("refusedField", "reason"));
        mvc.perform(post(item + "/corrections").param("corrected", REPORT.formatted("CORRECTED")).with(FORECASTER).with(csrf())).andExpect(status().is3xxRedirection());
        mvc.perform(get(item).with(FORECASTER)).andExpect(content().string(containsString("corrected and taken in as batch"))).andExpect(content().string(not(containsString("Set aside</button>"))));
        mvc.perform(get("/intake/items/999999").with(FORECASTER)).andExpect(status().isNotFound());
    }

    @Test
    void anAdministratorTakesNothingIn() throws Exception {
        mvc.perform(post("/api/v1/messages").content("x").with(ADMINISTRATOR).with(csrf())).andExpect(status().isForbidden());
        mvc.perform(multipart("/intake/messages").param("pasted", "x").with(ADMINISTRATOR).with(csrf())).andExpect(status().isForbidden());
    }

    @Test
    void scriptsSendAnyBytesAndAreToldWhatBecameOfEachMessage() throws Exception {
        String body = REPORT.formatted("API ONE") + "\n" + "XVKE UA /OV /TM 99 ####\n" + REPORT.formatted("API TWO") + "\n";
        for (boolean again : new boolean[] {false, true}) {
            mvc.perform(post("/api/v1/messages").content(body).contentType(MediaType.APPLICATION_FORM_URLENCODED).with(FORECASTER).with(csrf().asHeader()))
                    .andExpect(status().isOk()).andExpect(jsonPath("$.accepted.length()").value(2)).andExpect(jsonPath("$.accepted[0].kind").value("airReport"))
                    .andExpect(jsonPath("$.accepted[0].version").value(1)).andExpect(jsonPath("$.accepted[0].duplicate").value(again))
                    .andExpect(jsonPath("$.queued[0].line").value(2)).andExpect(jsonPath("$.rejected.length()").value(0));
        }
        mvc.perform(post("/api/v1/messages").with(FORECASTER).with(csrf()))
                .andExpect(status().isOk()).andExpect(jsonPath("$.rejected[0].code").value("EMPTY_INPUT")).andExpect(jsonPath("$.rejected[0].line").value(1));
        mvc.perform(multipart("/api/v1/messages").file(new MockMultipartFile("file", "b.csv", null, CSV.formatted("ICFI").getBytes())).with(FORECASTER).with(csrf()))
                .andExpect(jsonPath("$.accepted[0].kind").value("sounding"));
    }

    @Test
    void decodingKeepsNothingAndWritesUnitsInTheNames() throws Exception {
        mvc.perform(post("/api/v1/decodings").content(CSV.formatted("ICDE")).contentType("text/csv").with(FORECASTER).with(csrf())).andExpect(status().isOk())
                .andExpect(jsonPath("$.format").value("CSV sounding")).andExpect(jsonPath("$.messages[0].kind").value("sounding"))
                .andExpect(jsonPath("$.messages[0].station.id").value("ICDE")).andExpect(jsonPath("$.messages[0].station.latitudeDeg").isEmpty())
                .andExpect(jsonPath("$.messages[0].launchedAt").value("2031-03-12T05:15:00Z"))
                .andExpect(jsonPath("$.messages[0].levels[1].pressureHpa").value(925.0)).andExpect(jsonPath("$.messages[0].levels[1].temperatureC").value(4.1))
                .andExpect(jsonPath("$.messages[0].levels[1].dewPointC").isEmpty()).andExpect(jsonPath("$.messages[0].levels[1].flags").isArray())
                .andExpect(content().string(not(containsString("NaN"))));
        mvc.perform(get("/api/v1/soundings").param("station", "ICDE").with(FORECASTER)).andExpect(jsonPath("$.soundings.length()").value(0));
        mvc.perform(post("/api/v1/decodings").content(REPORT.formatted("DECODED")).contentType("text/plain").with(FORECASTER).with(csrf()))
                .andExpect(jsonPath("$.messages[0].kind").value("airReport")).andExpect(jsonPath("$.messages[0].reportClass").value("VOL"))
                .andExpect(jsonPath("$.messages[0].place.latitudeDeg").value(47.2)).andExpect(jsonPath("$.messages[0].flightLevel").value(290.0))
                .andExpect(jsonPath("$.messages[0].turbulence[0].intensity").value("MOD")).andExpect(jsonPath("$.messages[0].turbulence[0].baseFt").value(28000.0))
                .andExpect(jsonPath("$.messages[0].edrPeak").isEmpty());
        mvc.perform(post("/api/v1/decodings").content(REPORT.formatted("WIDE").getBytes(StandardCharsets.UTF_16)).with(FORECASTER).with(csrf()))
                .andExpect(jsonPath("$.messages.length()").value(1));
        mvc.perform(post("/api/v1/decodings").content(new byte[] {'P', 'K', 3, 4, 0}).with(FORECASTER).with(csrf()))
                .andExpect(jsonPath("$.rejected[0].code").value("COMPRESSED"));
    }
}
