package org.shearbook.desk.analysis.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import org.junit.jupiter.api.Test;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.context.MessageSource;
import org.springframework.security.test.context.support.WithMockUser;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.web.util.HtmlUtils;

/** The page Method and Limits. */
@OnH2
@WithMockUser(username = "scientist-v", roles = "SCIENTIST")
class MethodControllerTests {

    @Autowired MockMvc web;
    @Autowired MessageSource messages;

    @Test
    void thePageHoldsEveryCautionInFullTheNumbersInUseAndWhyToDisagree() throws Exception {
        String page = web.perform(get("/method")).andExpect(status().isOk()).andReturn().getResponse().getContentAsString();
        for (String caution : new String[] {"N1", "N2", "N3", "N5", "N9"}) {
            assertThat(HtmlUtils.htmlUnescape(page)).as(caution).contains("<dt>" + caution + "</dt>")
                    .contains(messages.getMessage("caution." + caution, null, java.util.Locale.ENGLISH));
        }
        assertThat(page).contains("60, 100, 150, 200, 300, 600").contains("84.9").contains("0.20").contains("Why you may disagree")
                .contains("20th edition").doesNotContain("??");
    }

    @Test
    void everyNumberOfAScreenHasAPlaceToLinkToAndTheNoiseInUseIsShown() throws Exception {
        String page = web.perform(get("/method")).andExpect(status().isOk()).andReturn().getResponse().getContentAsString();
        for (String place : new String[] {"numbers", "stability", "moist", "shear", "richardson", "probability", "hidden", "layers", "state", "between", "growth",
            "distance", "breakdown", "turbulence", "indices", "versions", "billows", "references"}) {
            assertThat(page).as(place).containsOnlyOnce("id=\"" + place + "\"");
        }
        assertThat(page).contains("any sonde").contains("RS41").contains("24 × 40").contains("0.03 in Ri").contains("half of the growth rate");
    }
}
