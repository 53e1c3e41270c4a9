package org.shearbook.trial;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.MessageDecoders;

@EnabledIfSystemProperty(named = "trial.data", matches = ".+")
class CsvSoundingTrialDataTests {

    @Test
    void theDesignExampleIsReadWhole() throws IOException {
        Decoding decoding = decode(text("csv", "sounding_design_example.csv"));
        assertThat(decoding.rejected()).isEmpty();
        DecodedSounding sounding = (DecodedSounding) decoding.messages().get(0);
        assertThat(sounding.levels()).hasSize(5);
        assertThat(sounding.remarks()).isEmpty();
        assertThat(sounding.launchedAt()).isEqualTo("2031-03-12T11:15:32Z");
    }

    @Test
    void eachHostileVariantLoadsOrIsRefusedWithAClearCode() throws IOException {
        String[] variants = text("csv", "sounding_hostile_variants.txt").split("(?m)^----\\R");
        assertThat(variants).hasSize(4);
        assertThat(sounding(variants[0]).levels()).hasSize(2);
        assertThat(sounding(variants[1]).levels().get(0).windSpeed()).as("14 kt").isCloseTo(7.202, within(1e-3));
        assertThat(sounding(variants[2]).levels().get(0).height()).as("853.2 m²/s² / 9.80665").isCloseTo(87.00, within(0.01));
        Decoding fourth = decode(variants[3]);
        assertThat(fourth.messages()).isEmpty();
        assertThat(fourth.rejected()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("DIRECTION_OUT_OF_RANGE");
            assertThat(r.line()).isEqualTo(4);
            assertThat(r.text()).contains("line 4 (SPEED_NEGATIVE)");
        });
    }

    @Test
    void theHighResolutionFileIsRefusedForItsUnitsAndReadOnceTheyStandInTheHeader() throws IOException {
        String file = text("hires", "11240_20210406_0200Z.csv");
        Decoding refused = decode(file);
        assertThat(refused.messages()).isEmpty();
        assertThat(refused.rejected()).singleElement().satisfies(r -> assertThat(r.code()).isEqualTo("UNITS_MISSING"));

        String withUnits = file.replaceFirst(".*", "time,gpheight_m,pressure_hPa,temp_C,dewpoint_C,wind_u_ms,wind_v_ms,lon,lat,ele_m");
        DecodedSounding sounding = sounding(withUnits);
        assertThat(sounding.levels()).hasSize((int) file.lines().count() - 1);
        assertThat(sounding.launchedAt()).isEqualTo("2021-04-06T02:28:23Z");
        assertThat(sounding.levels().get(1).elapsed()).isEqualTo(19);
    }

    private static String text(String folder, String name) throws IOException {
        return Files.readString(Path.of(System.getProperty("trial.data"), folder, name));
    }

    private static DecodedSounding sounding(String text) {
        Decoding decoding = decode(text);
        assertThat(decoding.rejected()).isEmpty();
        return (DecodedSounding) decoding.messages().get(0);
    }

    private static Decoding decode(String text) {
        return MessageDecoders.all().decode(text.getBytes(StandardCharsets.UTF_8), new DecodingContext(Instant.parse("2031-03-13T00:00:00Z"), FixLookup.NONE));
    }
}
