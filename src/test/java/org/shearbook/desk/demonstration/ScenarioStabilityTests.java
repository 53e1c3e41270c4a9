package org.shearbook.desk.demonstration;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.MessageDecoders;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.quality.SoundingQuality;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.met.richardson.ShearLayer;
import org.shearbook.met.taylorgoldstein.Mode;
import org.shearbook.met.taylorgoldstein.SearchSettings;
import org.shearbook.met.taylorgoldstein.StabilityAnalysis;
import org.shearbook.met.taylorgoldstein.StabilityResult;

/**
 * The growing waves of the scenario. The expected values were computed elsewhere, by a program of our own in another
 * language, without noise. Growth of the four subcritical ascents with noise is not tested: a difference of 0.03 in Ri,
 * which the noise makes, is half of the growth rate there.
 */
class ScenarioStabilityTests {

    private static final List<String> SUBCRITICAL = List.of("DUNVEERY 2 00", "KELBRITH 2 12", "OSSENFELL 2 12", "TARQUIDD 3 00");

    private final StabilityAnalysis analysis = new StabilityAnalysis(SearchSettings.forLayers());

    static Stream<ScenarioAscent> stableAscents() {
        return ScenarioAscent.ALL.stream().filter(ascent -> !SUBCRITICAL.contains(ascent.title()));
    }

    @ParameterizedTest
    @CsvSource({
        // ascent, wavelength km, e-folding min
        "DUNVEERY 2 00, 4.2, 15.1",
        "KELBRITH 2 12, 4.5, 8.6",
        "OSSENFELL 2 12, 3.1, 11.9",
        "TARQUIDD 3 00, 4.4, 22.8"
    })
    void withoutNoiseWavelengthAndGrowthAreThoseOfTheTable(String title, double wavelength, double eFoldingTime) {
        ScenarioAscent ascent = ScenarioAscent.named(title);
        RichardsonProfile profile = RichardsonAnalysis.of(ScenarioTests.profile(ScenarioColumn.noiseFree(ascent)), 100);
        ShearLayer layer = profile.layers().stream()
                .filter(found -> found.extent().contains(ascent.layerHeight())).findFirst().orElseThrow();
        Mode mode = analysis.ofLayer(profile, layer.extent()).fastest().orElseThrow();
        assertThat(mode.converged()).isTrue();
        assertThat(mode.wavelength() / 1000).as("wavelength, km").isCloseTo(wavelength, within(0.10 * wavelength));
        assertThat(mode.eFoldingTime() / 60).as("e-folding, min").isCloseTo(eFoldingTime, within(0.20 * eFoldingTime));
    }

    @ParameterizedTest
    @MethodSource("stableAscents")
    void withNoiseNothingGrowsWhereTheTableSaysStable(ScenarioAscent ascent) throws IOException {
        byte[] file = Files.readAllBytes(Path.of("demo-data/sounding", ascent.fileName()));
        Decoding decoding = MessageDecoders.all().decode(file, new DecodingContext(ascent.receivedAt(), FixLookup.NONE));
        DecodedSounding sounding = (DecodedSounding) decoding.messages().get(0);
        VerticalProfile clean = SoundingQuality.check(sounding.levels(), sounding.elevation(), null).profile().orElseThrow();
        RichardsonProfile profile = RichardsonAnalysis.of(clean, 200);
        assertThat(profile.layers()).filteredOn(layer -> layer.base() > clean.surfaceHeight() + RichardsonAnalysis.FREE_AIR).isEmpty();
        // There being no layer, the air where the scenario put its shear is searched as if there were one.
        StabilityResult result = analysis.ofLayer(profile, new HeightBand(ascent.layerHeight() - 300, ascent.layerHeight() + 300));
        assertThat(result.complete()).as("%s", result.remarks()).isTrue();
        assertThat(result.fastest()).isEmpty();
    }
}
