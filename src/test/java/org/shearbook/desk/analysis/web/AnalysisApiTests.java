package org.shearbook.desk.analysis.web;

import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.hasSize;
import static org.hamcrest.Matchers.lessThan;
import static org.hamcrest.Matchers.nullValue;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.header;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.analysis.Ascents;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.testing.JetAscents;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.security.test.context.support.WithMockUser;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;

/** The analysis document over HTTP. */
@OnH2
@WithMockUser(username = "scientist-v", roles = "SCIENTIST")
class AnalysisApiTests {

    @Autowired MockMvc web;
    @Autowired SoundingArchive soundings;
    @Autowired TransactionTemplate transaction;

    private SoundingId kept(String station) {
        return transaction.execute(status -> soundings.keep(Actor.named("feed", "messages", false, "server"),
                Ascents.of(JetAscents.KELBRITH_DAY_2_12, station, Instant.parse("2031-02-05T12:00:00Z")), "CSV", Instant.parse("2031-02-05T12:45:00Z"))).id();
    }

    @Test
    void theKeptAnalysisIsAnsweredAndOtherWindowsAreComputed() throws Exception {
        SoundingId id = kept("AA-A");
        web.perform(get("/api/v1/soundings/" + id + "/analysis")).andExpect(status().isOk())
                .andExpect(header().string("ETag", "\"" + id + "-1-2-200\""))
                .andExpect(jsonPath("$.soundingId").value(id.value())).andExpect(jsonPath("$.station").value("AA-A"))
                .andExpect(jsonPath("$.launchedAt").value("2031-02-05T11:15:00Z"))
                .andExpect(jsonPath("$.method.windowM").value(200.0)).andExpect(jsonPath("$.levels", hasSize(1596)))
                .andExpect(jsonPath("$.lowest.richardson", lessThan(0.25))).andExpect(jsonPath("$.layers[0].mode.converged").value(true)).andExpect(jsonPath("$.layers[0].turbulence.class").exists())
                .andExpect(jsonPath("$.layers[0].rule.basis").value("rule, not solved"));
        web.perform(get("/api/v1/soundings/" + id + "/analysis").param("windowM", "600")).andExpect(status().isOk())
                .andExpect(jsonPath("$.method.windowM").value(600.0));
    }

    @Test
    void anUnknownWindowOrSoundingIsAProblemThatSaysWhatToDo() throws Exception {
        SoundingId id = kept("AA-B");
        for (String window : new String[] {"80", "-1", "wide", "1e999"}) {
            web.perform(get("/api/v1/soundings/" + id + "/analysis").param("windowM", window)).andExpect(status().isBadRequest())
                    .andExpect(content().contentType("application/problem+json")).andExpect(jsonPath("$.code").value("WINDOW_NOT_OFFERED"))
                    .andExpect(jsonPath("$.detail", containsString("60, 100, 150, 200, 300, 600"))).andExpect(jsonPath("$.field").value("windowM"));
        }
        web.perform(get("/api/v1/soundings/999999999/analysis")).andExpect(status().isNotFound()).andExpect(jsonPath("$.code").value("SOUNDING_UNKNOWN"));
    }

    @Test
    void theSpreadOfGrowthIsWorkedOutWhenAskedFor() throws Exception {
        SoundingId id = kept("AA-E");
        web.perform(get("/api/v1/soundings/" + id + "/analysis").param("ensembleMembers", "4").param("seed", "9")).andExpect(status().isOk())
                .andExpect(header().string("ETag", "\"" + id + "-1-2-200-4-9\"")).andExpect(jsonPath("$.layers[0].ensemble.members").value(4))
                .andExpect(jsonPath("$.layers[0].ensemble.seed").value(9));
        web.perform(get("/api/v1/soundings/" + id + "/analysis").param("ensembleMembers", "100000")).andExpect(status().isBadRequest())
                .andExpect(jsonPath("$.code").value("ENSEMBLE_OUT_OF_RANGE"));
    }

    @Test
    void bytesAreAnalysedWithoutBeingKept() throws Exception {
        long before = soundings.between(null, Instant.parse("0001-01-01T00:00:00Z"), Instant.parse("9999-01-01T00:00:00Z"),
                org.shearbook.desk.audit.AsKnownAt.now()).size();
        web.perform(post("/api/v1/profile-analyses").param("windowM", "100").with(csrf()).contentType("text/csv").content(csv(1)))
                .andExpect(status().isOk()).andExpect(jsonPath("$.soundingId").value(nullValue())).andExpect(jsonPath("$.station").value("AA-C"))
                .andExpect(jsonPath("$.method.windowM").value(100.0)).andExpect(jsonPath("$.state").value("subcritical"));
        org.assertj.core.api.Assertions.assertThat(soundings.between(null, Instant.parse("0001-01-01T00:00:00Z"), Instant.parse("9999-01-01T00:00:00Z"),
                org.shearbook.desk.audit.AsKnownAt.now())).hasSize((int) before);
    }

    @Test
    void bytesThatHoldNoAnalysableSoundingAreRefusedWithTheReason() throws Exception {
        web.perform(post("/api/v1/profile-analyses").with(csrf()).contentType(MediaType.TEXT_PLAIN)).andExpect(status().isUnprocessableContent())
                .andExpect(content().contentType("application/problem+json")).andExpect(jsonPath("$.code").value("EMPTY_INPUT"));
        byte[] noise = new byte[5000];
        new java.util.Random(7).nextBytes(noise);
        web.perform(post("/api/v1/profile-analyses").with(csrf()).contentType(MediaType.APPLICATION_OCTET_STREAM).content(noise))
                .andExpect(status().isUnprocessableContent()).andExpect(jsonPath("$.rejected[0].line").exists());
        web.perform(post("/api/v1/profile-analyses").with(csrf()).contentType("text/csv").content(csv(900)))
                .andExpect(status().isUnprocessableContent()).andExpect(jsonPath("$.code").value("NOT_ANALYSED"))
                .andExpect(jsonPath("$.detail", containsString("not analysed")));
    }

    @Test
    @WithMockUser(username = "key", authorities = "SCOPE_read")
    void aKeyNeedsTheScopeToCompute() throws Exception {
        web.perform(post("/api/v1/profile-analyses").with(csrf()).contentType("text/csv").content(csv(1))).andExpect(status().isForbidden());
    }

    /** Every {@code step}th level of the invented ascent. */
    private static byte[] csv(int step) {
        StringBuilder text = new StringBuilder("# station_id=AA-C\n# nominal_time=2031-02-06T12:00:00Z\n# station_elevation_m=50\n")
                .append("pressure_hPa,geopotential_height_m,temperature_C,wind_direction_deg,wind_speed_ms\n");
        int k = 0;
        for (ReportedLevel level : JetAscents.KELBRITH_DAY_2_12.reported()) {
            if (k++ % step == 0) {
                text.append(String.format(Locale.ROOT, "%.3f,%.1f,%.3f,%.2f,%.3f%n", level.pressure() / 100, level.height(), level.temperature() - 273.15,
                        level.windFromDirection(), level.windSpeed()));
            }
        }
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }
}
