package org.shearbook.desk.station.web;

import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.hasItem;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.user;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.multipart;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.put;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.flash;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import org.junit.jupiter.api.Test;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.mock.web.MockMultipartFile;
import org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.UserRequestPostProcessor;
import org.springframework.test.web.servlet.MockMvc;

@OnH2
class StationControllerTests {

    @Autowired MockMvc mvc;

    private static final UserRequestPostProcessor ADMINISTRATOR = user("administrator-t").roles("ADMINISTRATOR");
    private static final UserRequestPostProcessor FORECASTER = user("forecaster-a").roles("FORECASTER");

    @Test
    void anAdministratorLoadsStationsAndSeesThem() throws Exception {
        MockMultipartFile file = new MockMultipartFile("file", "stations.csv", "text/csv",
                "identifier,name,latitude_deg,longitude_deg,elevation_m\nSCPA 99701,Pageholm,47.5,-33,50\n".getBytes());
        mvc.perform(multipart("/stations/lists").file(file).with(ADMINISTRATOR).with(csrf()))
                .andExpect(redirectedUrl("/stations")).andExpect(flash().attribute("done", containsString("1 stations kept")));
        mvc.perform(get("/stations").with(FORECASTER)).andExpect(status().isOk())
                .andExpect(content().string(containsString("Pageholm"))).andExpect(content().string(containsString("N4730 W03300")));
        mvc.perform(get("/api/v1/stations").param("limit", "1000").with(FORECASTER)).andExpect(status().isOk())
                .andExpect(jsonPath("$.stations[?(@.id=='SCPA')].identifiers[1]").value(hasItem("99701")));
    }

    @Test
    void aRefusedListNamesItsLinesOnThePage() throws Exception {
        MockMultipartFile file = new MockMultipartFile("file", "stations.csv", "text/csv", "identifier,latitude_deg,longitude_deg\nSCRA,100,0\n".getBytes());
        mvc.perform(multipart("/stations/lists").file(file).with(ADMINISTRATOR).with(csrf()))
                .andExpect(redirectedUrl("/stations")).andExpect(flash().attribute("refusedField", "stations-file"));
        mvc.perform(get("/stations").with(ADMINISTRATOR).flashAttr("refusedField", "stations-file")
                        .flashAttr("refusals", java.util.List.of(new org.shearbook.desk.station.ListRefused.LineRefusal(2, "latitude_deg", "X", "latitude_deg is '100'"))))
                .andExpect(content().string(containsString("Line 2: latitude_deg is")));
    }

    @Test
    void onlyAnAdministratorLoadsLists() throws Exception {
        byte[] csv = "identifier,latitude_deg,longitude_deg\nSCOA,1,0\n".getBytes();
        mvc.perform(put("/api/v1/stations").content(csv).contentType("text/csv").with(FORECASTER).with(csrf())).andExpect(status().isForbidden());
        mvc.perform(multipart("/stations/lists").file(new MockMultipartFile("file", csv)).with(FORECASTER).with(csrf())).andExpect(status().isForbidden());
        mvc.perform(get("/stations").with(FORECASTER)).andExpect(content().string(org.hamcrest.Matchers.not(containsString("fixes-file"))));
    }

    @Test
    void aScriptLoadsAndFindsFixesAndIsToldTheLineOfARefusal() throws Exception {
        mvc.perform(put("/api/v1/fixes").param("list", "api tests").contentType("text/csv")
                        .content("ident,type,name,latitude_deg,longitude_deg,elevation_ft,magnetic_variation_deg\nQAP,VORTAC,Ap,41,-93,,3.5\n").with(ADMINISTRATOR).with(csrf()))
                .andExpect(status().isOk()).andExpect(jsonPath("$.fixes").value(1));
        mvc.perform(get("/api/v1/fixes").param("identifier", "qap").with(FORECASTER))
                .andExpect(jsonPath("$.fixes[0].magneticVariationEastDeg").value(3.5)).andExpect(jsonPath("$.fixes[0].elevationM").isEmpty());
        mvc.perform(put("/api/v1/fixes").contentType("text/csv").content("ident,latitude_deg,longitude_deg\nQAP,41,-193\n").with(ADMINISTRATOR).with(csrf()))
                .andExpect(status().isUnprocessableContent()).andExpect(jsonPath("$.code").value("LIST_REFUSED"))
                .andExpect(jsonPath("$.lines[0].line").value(2)).andExpect(jsonPath("$.detail").value(containsString("Line 2")));
        mvc.perform(get("/api/v1/fixes").param("asKnownAt", "soon").with(FORECASTER))
                .andExpect(status().isBadRequest()).andExpect(jsonPath("$.code").value("AS_KNOWN_AT_UNREADABLE"));
    }

    @Test
    void stationsComeInPages() throws Exception {
        mvc.perform(put("/api/v1/stations").contentType("text/csv").content("identifier,latitude_deg,longitude_deg\nZZP1,1,0\nZZP2,1,0\nZZP3,1,0\n").with(ADMINISTRATOR).with(csrf()))
                .andExpect(status().isOk());
        mvc.perform(get("/api/v1/stations").param("limit", "2").param("after", "ZZP0").with(FORECASTER))
                .andExpect(jsonPath("$.stations.length()").value(2)).andExpect(jsonPath("$.next").value("ZZP2"));
    }
}
