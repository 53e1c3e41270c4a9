package org.shearbook.desk.layer.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.empty;
import static org.hamcrest.Matchers.greaterThan;
import static org.hamcrest.Matchers.lessThan;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.time.Instant;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.analysis.Ascents;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.layer.Layer;
import org.shearbook.desk.layer.LayerBook;
import org.shearbook.desk.sounding.Kept;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.testing.JetAscents;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.security.test.context.support.WithMockUser;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;

/** Layers on their page and for scripts. */
@OnH2
@WithMockUser(username = "forecaster-b", roles = "FORECASTER")
class LayerControllerTests {

    @Autowired MockMvc web;
    @Autowired LayerBook layers;
    @Autowired SoundingArchive soundings;
    @Autowired TransactionTemplate transaction;

    private Kept kept(DecodedSounding sounding, String receivedAt) {
        return transaction.execute(status -> soundings.keep(Actor.named("feed", "messages", false, "server"), sounding, "CSV", Instant.parse(receivedAt)));
    }

    @Test
    void thePageShowsTheLayerWithWindowStateRuleAndAWayToAForecast() throws Exception {
        Kept sounding = kept(Ascents.of(JetAscents.KELBRITH_DAY_2_12, "LC-A", Instant.parse("2031-03-12T06:00:00Z")), "2031-03-12T06:10:00Z");
        Layer layer = layers.ofSounding(sounding.id(), AsKnownAt.now()).get(0);
        web.perform(get("/layers")).andExpect(status().isOk())
                .andExpect(content().string(containsString("Ri below 1/4 is necessary")))
                .andExpect(content().string(containsString("/forecasts/new?layer=" + layer.id())))
                .andExpect(content().string(containsString("rule, not solved")))
                .andExpect(content().string(containsString("is-subcritical")))
                .andExpect(content().string(containsString("(200 m)")));
    }

    @Test
    void aStationThatWasNotAnalysedSaysWhyAndOneWithoutLayersSaysThat() throws Exception {
        kept(Ascents.almostWithoutWind(JetAscents.KELBRITH_DAY_2_12, "LC-B", Instant.parse("2031-03-12T05:00:00Z")), "2031-03-12T05:10:00Z");
        kept(Ascents.of(JetAscents.KELBRITH_DAY_1_00, "LC-C", Instant.parse("2031-03-12T05:00:00Z")), "2031-03-12T05:10:00Z");
        String page = web.perform(get("/layers").param("from", "never")).andExpect(status().isOk())
                .andExpect(content().string(containsString("from is not a moment in UTC"))).andReturn().getResponse().getContentAsString();
        assertThat(page).contains("Not analysed: ").contains("No layer: Ri is \u00bc or more");
    }

    @Test
    void aStationsLayersAreShownFromSoundingToSounding() throws Exception {
        kept(Ascents.of(JetAscents.KELBRITH_DAY_2_12, "LC-H", Instant.parse("2031-03-12T06:00:00Z")), "2031-03-12T06:10:00Z");
        String page = web.perform(get("/layers/histories").param("station", "LC-H")).andExpect(status().isOk()).andReturn().getResponse().getContentAsString();
        assertThat(page).contains("Layers between soundings").contains("dRi/dt").contains("Ri is below 0.25").contains("is-subcritical").doesNotContain("??");
        assertThat(web.perform(get("/layers/histories").param("station", "LC-nowhere")).andExpect(status().isOk()).andReturn().getResponse().getContentAsString())
                .contains("No sounding of LC-nowhere");
        web.perform(get("/layers/histories")).andExpect(status().isOk());
    }

    @Test
    void scriptsReadLayersOfAStationInAWindow() throws Exception {
        Kept sounding = kept(Ascents.of(JetAscents.OSSENFELL_DAY_2_12, "LC-D", Instant.parse("2030-03-12T06:00:00Z")), "2030-03-12T06:10:00Z");
        web.perform(get("/api/v1/layers").param("station", "LC-D").param("from", "2030-03-12").param("until", "2030-03-13")).andExpect(status().isOk())
                .andExpect(jsonPath("$.layers.length()", greaterThan(0)))
                .andExpect(jsonPath("$.layers[0].soundingId").value(sounding.id().value()))
                .andExpect(jsonPath("$.layers[0].minRichardson", lessThan(0.25))).andExpect(jsonPath("$.layers[0].windowM").value(200.0))
                .andExpect(jsonPath("$.layers[0].rule.basis").value("rule, not solved")).andExpect(jsonPath("$.layers[0].state").value("subcritical"));
        web.perform(get("/api/v1/layers").param("station", "LC-D").param("from", "2030-04-12")).andExpect(jsonPath("$.layers", empty()));
        web.perform(get("/api/v1/layers").param("from", "?")).andExpect(status().isBadRequest()).andExpect(jsonPath("$.field").value("from"));
        web.perform(get("/api/v1/layers/999999999")).andExpect(status().isNotFound()).andExpect(jsonPath("$.code").value("LAYER_UNKNOWN"));
    }
}
