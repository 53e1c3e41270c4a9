package org.shearbook.desk.airreport.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.hasSize;
import static org.hamcrest.Matchers.nullValue;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.flash;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.header;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.airreport.AirReports;
import org.shearbook.desk.airreport.Attribution;
import org.shearbook.desk.airreport.Kept;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.station.StationBook;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.security.test.context.support.WithAnonymousUser;
import org.springframework.security.test.context.support.WithMockUser;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;

/** Air-reports on pages and for scripts. */
@OnH2
@WithMockUser(username = "forecaster-b", roles = "FORECASTER")
class AirReportControllerTests {

    @Autowired MockMvc web;
    @Autowired AirReportArchive archive;
    @Autowired StationBook stations;
    @Autowired TransactionTemplate transaction;

    private static final Actor FEED = Actor.named("feed", "messages", false, "server");

    private Kept voluntary(String observedAt, String aircraft) {
        Instant observed = Instant.parse(observedAt);
        return transaction.execute(status -> archive.keep(FEED, AirReports.voluntary(observed, aircraft), observed.plusSeconds(360)));
    }

    @Test
    void theListShowsMarkWordLevelAndCautionAndNeverTheAircraft() throws Exception {
        voluntary("2031-03-12T04:12:00Z", "GULX204");
        String page = web.perform(get("/air-reports")).andExpect(status().isOk())
                .andExpect(content().string(containsString("No report does not mean smooth air.")))
                .andExpect(content().string(containsString("/shared/symbols.svg#moderate")))
                .andExpect(content().string(containsString("N4712 W03000")))
                .andExpect(content().string(containsString("FL290"))).andReturn().getResponse().getContentAsString();
        assertThat(page.toUpperCase()).doesNotContain("GULX204");
    }

    @Test
    void aWindowWithoutReportsSaysSo() throws Exception {
        web.perform(get("/air-reports").param("from", "2031-07-01T00:00Z")).andExpect(status().isOk())
                .andExpect(content().string(containsString("Silence is not smooth air.")));
    }

    @Test
    void aMomentThatIsNoneGoesBackToItsField() throws Exception {
        web.perform(get("/air-reports").param("from", "yesterday")).andExpect(status().isOk())
                .andExpect(content().string(containsString("from is not a moment in UTC: &quot;yesterday&quot;")))
                .andExpect(content().string(containsString("aria-invalid=\"true\"")));
        web.perform(get("/api/v1/air-reports").param("until", "31-31-31")).andExpect(status().isBadRequest())
                .andExpect(content().contentType("application/problem+json"))
                .andExpect(jsonPath("$.code").value("MOMENT_UNREADABLE")).andExpect(jsonPath("$.field").value("until"));
    }

    @Test
    void oneReportStandsBesideItsMaskedText() throws Exception {
        Kept kept = voluntary("2031-02-01T04:12:00Z", "TRNX118");
        String page = web.perform(get("/air-reports/" + kept.id())).andExpect(status().isOk())
                .andExpect(content().string(containsString("LGT-MOD [aircraft]")))
                .andExpect(content().string(containsString("occasional light to moderate (CAT) above 28\u2009000 ft")))
                .andExpect(content().string(containsString("by fix"))).andReturn().getResponse().getContentAsString();
        assertThat(page.toUpperCase()).doesNotContain("TRNX118");
        web.perform(get("/air-reports/999999999")).andExpect(status().isNotFound());
    }

    @Test
    void aCauseIsKeptByFormAndARefusalGoesBackWithWhatWasEntered() throws Exception {
        Kept kept = voluntary("2031-02-02T04:12:00Z", "PETX118");
        String address = "/air-reports/" + kept.id() + "/attributions";
        web.perform(post(address).with(csrf()).param("attribution", "WAKE").param("reason", "")).andExpect(redirectedUrl("/air-reports/" + kept.id()))
                .andExpect(flash().attribute("refusedField", "reason")).andExpect(flash().attribute("chosen", Attribution.WAKE));
        web.perform(post(address).with(csrf()).param("attribution", "WAKE").param("reason", "behind a heavy")).andExpect(status().isFound());
        assertThat(archive.find(kept.id(), AsKnownAt.now()).orElseThrow().excludedBecause()).isEqualTo("wake: behind a heavy");
    }

    @Test
    @WithMockUser(username = "observer-o", roles = "OBSERVER")
    void anObserverMayNotSayTheCause() throws Exception {
        Kept kept = voluntary("2031-02-03T04:12:00Z", "PETX119");
        web.perform(post("/air-reports/" + kept.id() + "/attributions").with(csrf()).param("attribution", "SHEAR_LAYER"))
                .andExpect(flash().attribute("refusedField", ""));
        assertThat(archive.find(kept.id(), AsKnownAt.now()).orElseThrow().version()).isEqualTo(1);
    }

    @Test
    void aScriptReadsUnitsInKeysNullForMissingAndAnEtag() throws Exception {
        Kept kept = voluntary("2031-02-04T04:12:00Z", "HRNX700");
        web.perform(get("/api/v1/air-reports/" + kept.id())).andExpect(status().isOk())
                .andExpect(header().string("ETag", "\"%s-1\"".formatted(kept.id())))
                .andExpect(jsonPath("$.kind").value("airReport")).andExpect(jsonPath("$.reportClass").value("VOL"))
                .andExpect(jsonPath("$.observedAt").value("2031-02-04T04:12:00Z"))
                .andExpect(jsonPath("$.aircraft").value(nullValue())).andExpect(jsonPath("$.edrPeak").value(nullValue()))
                .andExpect(jsonPath("$.temperatureC").value(-45.0)).andExpect(jsonPath("$.windSpeedMs").value(62.5))
                .andExpect(jsonPath("$.turbulence", hasSize(2))).andExpect(jsonPath("$.turbulence[0].intensityTo").value("MOD"))
                .andExpect(jsonPath("$.turbulence[0].baseFt").value(28000.0)).andExpect(jsonPath("$.turbulence[0].topFt").value(nullValue()))
                .andExpect(jsonPath("$.place.candidates", hasSize(2))).andExpect(jsonPath("$.place.latitudeDeg").value(47.2));
        web.perform(get("/api/v1/air-reports/" + kept.id()).header("If-None-Match", "\"%s-1\"".formatted(kept.id()))).andExpect(status().isNotModified());
        web.perform(get("/api/v1/air-reports/999999999")).andExpect(status().isNotFound()).andExpect(jsonPath("$.code").value("AIR_REPORT_UNKNOWN"));
    }

    @Test
    void aScriptPagesThroughAWindow() throws Exception {
        Instant start = Instant.parse("2031-02-10T00:00:00Z");
        List<Kept> kept = transaction.execute(status -> archive.keepAll(FEED, List.of(
                AirReports.automatic(start, 0.1, 300, 47, -30), AirReports.automatic(start.plusSeconds(60), 0.2, 300, 47, -30),
                AirReports.automatic(start.plusSeconds(120), 0.3, 300, 47, -30)), start));
        web.perform(get("/api/v1/air-reports").param("from", "2031-02-10").param("until", "2031-02-11").param("limit", "2"))
                .andExpect(jsonPath("$.airReports", hasSize(2))).andExpect(jsonPath("$.airReports[0].edrPeak").value(0.3))
                .andExpect(jsonPath("$.airReports[0].worstIntensity").value("MOD"))
                .andExpect(jsonPath("$.next").value(kept.get(1).id().value()));
        web.perform(get("/api/v1/air-reports").param("from", "2031-02-10").param("until", "2031-02-11").param("after", kept.get(1).id().toString()))
                .andExpect(jsonPath("$.airReports", hasSize(1))).andExpect(jsonPath("$.next").value(nullValue()));
        web.perform(get("/api/v1/air-reports").param("limit", "0")).andExpect(status().isBadRequest());
    }

    @Test
    void reportsNearAStationAreThoseWithinTheDistance() throws Exception {
        stations.keep(Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1"), "Arlenmoor", 60, -30, 20, List.of("AR-NEAR"));
        Instant start = Instant.parse("2031-02-20T00:00:00Z");
        // Exact: one degree of latitude is 60.04 NM on a sphere of 6371.0 km.
        List<Kept> kept = transaction.execute(status -> archive.keepAll(FEED, List.of(
                AirReports.automatic(start, 0.1, 300, 60.9, -30), AirReports.automatic(start.plusSeconds(60), 0.2, 300, 61.1, -30),
                AirReports.automatic(start.plusSeconds(120), 0.3, 300, 60, -30)), start));
        web.perform(get("/api/v1/air-reports").param("from", "2031-02-20").param("until", "2031-02-21").param("station", "AR-NEAR").param("distanceNm", "60"))
                .andExpect(jsonPath("$.airReports", hasSize(2))).andExpect(jsonPath("$.airReports[1].id").value(kept.get(0).id().value()));
        web.perform(get("/api/v1/air-reports").param("from", "2031-02-20").param("until", "2031-02-21").param("station", "AR-NEAR")
                .param("after", kept.get(2).id().toString()).param("limit", "1"))
                .andExpect(jsonPath("$.airReports", hasSize(1))).andExpect(jsonPath("$.airReports[0].id").value(kept.get(1).id().value()))
                .andExpect(jsonPath("$.next").value(kept.get(1).id().value()));
        for (String distance : new String[] {"0", "far", "NaN", "1e9"}) {
            web.perform(get("/api/v1/air-reports").param("station", "AR-NEAR").param("distanceNm", distance)).andExpect(status().isBadRequest())
                    .andExpect(jsonPath("$.field").value("distanceNm"));
        }
        web.perform(get("/air-reports").param("station", "NOWHERE")).andExpect(status().isOk())
                .andExpect(content().string(containsString("There is no station NOWHERE.")));
        web.perform(get("/air-reports").param("from", "2031-02-20").param("until", "2031-02-21").param("station", "AR-NEAR").param("distanceNm", "60"))
                .andExpect(content().string(containsString("selected=\"selected\">Arlenmoor"))).andExpect(content().string(containsString("N6054 W03000")));
    }

    @Test
    @WithAnonymousUser
    void nobodyReadsReportsWithoutSigningIn() throws Exception {
        web.perform(get("/api/v1/air-reports")).andExpect(status().isUnauthorized());
    }
}
