package org.shearbook.desk.analysis.web;

import static org.hamcrest.Matchers.closeTo;
import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.empty;
import static org.hamcrest.Matchers.hasItem;
import static org.hamcrest.Matchers.not;
import static org.hamcrest.Matchers.nullValue;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.nio.charset.StandardCharsets;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.security.test.context.support.WithMockUser;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.ResultActions;

/** Growing waves of a profile over HTTP. */
@OnH2
@WithMockUser(username = "scientist-v", roles = "SCIENTIST")
class StabilityApiTests {

    @Autowired MockMvc web;

    private ResultActions sent(String body) throws Exception {
        return web.perform(post("/api/v1/stability-analyses").with(csrf()).contentType("application/json").content(body.getBytes(StandardCharsets.UTF_8)));
    }

    private static String list(int levels, double from, double to, DoubleUnaryOperator value) {
        return IntStream.range(0, levels).mapToObj(i -> String.valueOf(value.applyAsDouble(from + (to - from) * i / (levels - 1))))
                .collect(Collectors.joining(",", "[", "]"));
    }

    private static String profile(int levels, double from, double to, DoubleUnaryOperator wind, DoubleUnaryOperator stability, String more) {
        return "{\"heightM\":" + list(levels, from, to, z -> z) + ",\"eastwardMs\":" + list(levels, from, to, wind) + ",\"northwardMs\":" + list(levels, from, to, z -> 0)
                + ",\"n2PerS2\":" + list(levels, from, to, stability) + ",\"lower\":\"radiating\",\"upper\":\"radiating\"" + more + "}";
    }

    @Test
    void aStratifiedTanhLayerHasTheFastestWaveOfTheLiterature() throws Exception {
        // U = tanh z, N2 = 0.1 sech2 z: k 0.44348, growth 0.12594; computed elsewhere by two methods (Hazel's layer).
        sent(profile(161, -8, 8, Math::tanh, z -> 0.1 / Math.pow(Math.cosh(z), 2), "")).andExpect(status().isOk())
                .andExpect(jsonPath("$.fastest.growthRatePerS").value(closeTo(0.12594, 0.002), Double.class)).andExpect(jsonPath("$.fastest.wavenumberPerM").value(closeTo(0.4435, 0.02), Double.class))
                .andExpect(jsonPath("$.fastest.converged").value(true)).andExpect(jsonPath("$.fastest.criticalHeightM").value(closeTo(0, 0.05), Double.class))
                .andExpect(jsonPath("$.modes", not(empty()))).andExpect(jsonPath("$.milesHoward.minRichardson").value(closeTo(0.1, 0.002), Double.class))
                .andExpect(jsonPath("$.milesHoward.stableByTheorem").value(false)).andExpect(jsonPath("$.complete").value(true));
    }

    @Test
    void givenAzimuthsAndWavenumbersAreTheOnesAnswered() throws Exception {
        sent(profile(161, -8, 8, Math::tanh, z -> 0.1 / Math.pow(Math.cosh(z), 2), ",\"azimuthsDeg\":[90],\"wavenumbersPerM\":[0.4]")).andExpect(status().isOk())
                .andExpect(jsonPath("$.modes[0].azimuthDeg").value(90.0)).andExpect(jsonPath("$.modes[0].wavenumberPerM").value(0.4))
                // 0.31119 x 0.4, computed elsewhere by two methods
                .andExpect(jsonPath("$.modes[0].growthRatePerS").value(closeTo(0.12448, 0.002), Double.class)).andExpect(jsonPath("$.modes.length()").value(1));
    }

    @Test
    void airThatIsStableByTheTheoremHasNoWave() throws Exception {
        sent(profile(50, 0, 3000, z -> 0.01 * z, z -> 1e-4, "")).andExpect(status().isOk()).andExpect(jsonPath("$.modes", empty()))
                .andExpect(jsonPath("$.fastest").value(nullValue())).andExpect(jsonPath("$.milesHoward.stableByTheorem").value(true));
    }

    @Test
    void constantWindConvectionAndACentimetreBetweenLevelsAreAnsweredClearly() throws Exception {
        sent(profile(50, 0, 3000, z -> 12, z -> 1e-4, "")).andExpect(status().isOk()).andExpect(jsonPath("$.modes", empty()))
                .andExpect(jsonPath("$.milesHoward.minRichardson").value(nullValue()));
        sent(profile(50, 0, 3000, z -> 0.01 * z, z -> -1e-5, "")).andExpect(status().isOk()).andExpect(jsonPath("$.complete").value(false))
                .andExpect(jsonPath("$.modes", empty())).andExpect(jsonPath("$.remarks", hasItem(containsString("statically unstable"))));
        sent(profile(50, 0, 0.49, z -> 5 * z, z -> 1e-4, "")).andExpect(status().isOk());
        sent(profile(200, 0, 2000, z -> 30 * Math.exp(-Math.pow((z - 1000) / 200, 2)), z -> 1e-4, "")).andExpect(status().isOk());
    }

    @Test
    void tenThousandLevelsAreAnswered() throws Exception {
        sent(profile(10_000, 0, 10_000, z -> 8 * Math.tanh((z - 5000) / 200), z -> 1.2e-4, "")).andExpect(status().isOk())
                .andExpect(jsonPath("$.milesHoward.stableByTheorem").value(false));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '`', value = {
        "`` | 400 | EMPTY_INPUT",
        "{\"heightM\":[0, | 400 | NOT_JSON",
        "{\"heightM\":[0,NaN]} | 400 | NOT_JSON",
        "[1,2] | 400 | NOT_AN_OBJECT",
        "{\"heightM\":[0,1],\"eastwardMs\":[0,1],\"northwardMs\":[0,0],\"lower\":\"rigid\",\"upper\":\"rigid\"} | 422 | FIELD_MISSING",
        "{\"heightM\":[0,1],\"windMs\":[0,1]} | 422 | UNKNOWN_FIELD",
        "{\"heightM\":[0,\"NaN\"],\"eastwardMs\":[0,1],\"northwardMs\":[0,0],\"n2PerS2\":[0,0],\"lower\":\"rigid\",\"upper\":\"rigid\"} | 422 | NOT_A_NUMBER",
        "{\"heightM\":[0,1e999],\"eastwardMs\":[0,1],\"northwardMs\":[0,0],\"n2PerS2\":[0,0],\"lower\":\"rigid\",\"upper\":\"rigid\"} | 422 | NOT_A_NUMBER",
        "{\"heightM\":[0,null],\"eastwardMs\":[0,1],\"northwardMs\":[0,0],\"n2PerS2\":[0,0],\"lower\":\"rigid\",\"upper\":\"rigid\"} | 422 | NOT_A_NUMBER",
        "{\"heightM\":[5],\"eastwardMs\":[0],\"northwardMs\":[0],\"n2PerS2\":[0],\"lower\":\"rigid\",\"upper\":\"rigid\"} | 422 | TOO_FEW_LEVELS",
        "{\"heightM\":[0,10,10],\"eastwardMs\":[0,1,2],\"northwardMs\":[0,0,0],\"n2PerS2\":[0,0,0],\"lower\":\"rigid\",\"upper\":\"rigid\"} | 422 | HEIGHTS_NOT_ASCENDING",
        "{\"heightM\":[0,10],\"eastwardMs\":[0,1,2],\"northwardMs\":[0,0],\"n2PerS2\":[0,0],\"lower\":\"rigid\",\"upper\":\"rigid\"} | 422 | LENGTHS_DIFFER",
        "{\"heightM\":[0,10],\"eastwardMs\":[0,1],\"northwardMs\":[0,0],\"n2PerS2\":[0,0],\"lower\":\"soft\",\"upper\":\"rigid\"} | 422 | BOUNDARY_UNKNOWN",
        "{\"heightM\":[0,10],\"eastwardMs\":[0,1],\"northwardMs\":[0,0],\"n2PerS2\":[0,0],\"lower\":\"rigid\",\"upper\":\"rigid\",\"smoothingM\":-1} | 422 | OUT_OF_RANGE",
        "{\"heightM\":[0,10],\"eastwardMs\":[0,1],\"northwardMs\":[0,0],\"n2PerS2\":[0,0],\"lower\":\"rigid\",\"upper\":\"rigid\",\"wavenumbersPerM\":[0]} | 422 | OUT_OF_RANGE",
        "{\"heightM\":7,\"eastwardMs\":[0,1],\"northwardMs\":[0,0],\"n2PerS2\":[0,0],\"lower\":\"rigid\",\"upper\":\"rigid\"} | 422 | NOT_A_LIST",
    })
    void badInputIsRefusedWithWhatAndWhere(String body, int status, String code) throws Exception {
        sent(body == null ? "" : body).andExpect(status().is(status)).andExpect(content().contentType("application/problem+json")).andExpect(jsonPath("$.code").value(code))
                .andExpect(jsonPath("$.detail").isNotEmpty());
    }

    @Test
    void tooManyLevelsOrCombinationsAreRefused() throws Exception {
        sent(profile(20_001, 0, 20_000, z -> z / 100, z -> 1e-4, "")).andExpect(status().isUnprocessableContent()).andExpect(jsonPath("$.code").value("TOO_MANY"));
        String many = list(200, 0, 179, z -> z);
        sent(profile(10, 0, 1000, z -> z / 50, z -> 1e-5, ",\"azimuthsDeg\":" + many + ",\"wavenumbersPerM\":" + list(200, 1e-3, 1e-2, z -> z)))
                .andExpect(status().isUnprocessableContent()).andExpect(jsonPath("$.code").value("NOT_ANALYSED")).andExpect(jsonPath("$.detail", containsString("20000")));
    }

    @Test
    @WithMockUser(username = "key", authorities = "SCOPE_read")
    void aKeyNeedsTheScopeToCompute() throws Exception {
        sent("{}").andExpect(status().isForbidden());
    }
}
