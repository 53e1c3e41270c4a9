package org.shearbook.met.taylorgoldstein;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonProfile;

/** Growth of one tanh layer at 5000 m, shear 0.06 per second, Ri 0.08 before smoothing. */
class GrowthSensitivityTests {

    private static final HeightBand LAYER = new HeightBand(4800, 5200);
    private static final long SEED = 20261201L;

    private final VerticalProfile profile = ascent();
    private final GrowthSensitivity sensitivity = new GrowthSensitivity(
            new StabilityAnalysis(SearchSettings.forLayers()));

    private static VerticalProfile ascent() {
        List<ThermodynamicLevel> thermodynamic = new ArrayList<>();
        List<WindLevel> winds = new ArrayList<>();
        double exner = 0.85;
        double potential = 300;
        for (double z = 3000; z <= 7000; z += 20) {
            double t = Math.tanh((z - 5000) / 150);
            double n2 = 0.08 * 0.0036 * (1 - t * t) + 2e-5;
            potential *= Math.exp(n2 / 9.80665 * 20);
            exner -= 9.80665 / (1004.7 * potential) * 20;
            thermodynamic.add(new ThermodynamicLevel(z, 100_000 * Math.pow(exner, 3.5), potential * exner, Double.NaN));
            winds.add(new WindLevel(z, 15 + 9 * t, 2));
        }
        return new VerticalProfile(thermodynamic, winds);
    }

    @Test
    void growthFallsWithTheWindow() {
        List<RichardsonProfile> atWindows = GrowthSensitivity.WINDOWS.stream()
                .map(window -> RichardsonAnalysis.of(profile, window)).toList();
        List<GrowthAtWindow> growth = sensitivity.overWindows(atWindows, LAYER);
        assertThat(growth).extracting(GrowthAtWindow::window).containsExactly(100.0, 150.0, 200.0);
        assertThat(growth.get(0).growthRate()).isGreaterThan(growth.get(1).growthRate());
        assertThat(growth.get(1).growthRate()).isGreaterThan(growth.get(2).growthRate());
        assertThat(growth.get(2).growthRate()).isPositive();
    }

    @Test
    void theEnsembleIsTheSameForTheSameSeedAndBracketsTheUnperturbedGrowth() {
        ProfilePerturbation noise = new ProfilePerturbation(0.3, 60, 0.1);
        GrowthSpread spread = sensitivity.overPerturbations(profile, 150, LAYER, noise, 12, SEED);
        assertThat(sensitivity.overPerturbations(profile, 150, LAYER, noise, 12, SEED)).isEqualTo(spread);
        double growth = new StabilityAnalysis(SearchSettings.forLayers())
                .ofLayer(RichardsonAnalysis.of(profile, 150), LAYER).fastest().orElseThrow().growthRate();
        assertThat(spread.members()).isEqualTo(12);
        assertThat(spread.growingFraction()).isGreaterThan(0.9);
        assertThat(spread.growthRate10()).isLessThan(spread.growthRate50());
        assertThat(spread.growthRate50()).isLessThan(spread.growthRate90()).isCloseTo(growth, within(0.3 * growth));
        assertThat(spread.wavelength10()).isLessThanOrEqualTo(spread.wavelength50());
    }

    @Test
    void withoutErrorsEveryMemberIsTheAscentItself() {
        GrowthSpread spread = sensitivity.overPerturbations(profile, 150, LAYER, new ProfilePerturbation(0, 60, 0), 2, SEED);
        double growth = new StabilityAnalysis(SearchSettings.forLayers())
                .ofLayer(RichardsonAnalysis.of(profile, 150), LAYER).fastest().orElseThrow().growthRate();
        // the members know only the levels around the layer, whose bins begin elsewhere
        assertThat(spread.growthRate10()).isEqualTo(spread.growthRate90()).isCloseTo(growth, within(0.03 * growth));
    }

    @Test
    void badRequestsAreRefused() {
        assertThatIllegalArgumentException().isThrownBy(() -> new ProfilePerturbation(-1, 60, 0.1))
                .withMessageContaining("wind");
        assertThatIllegalArgumentException().isThrownBy(() -> sensitivity.overPerturbations(profile, 150, LAYER,
                new ProfilePerturbation(0.3, 60, 0.1), 0, SEED)).withMessageContaining("members");
        assertThatIllegalArgumentException().isThrownBy(() -> sensitivity.overPerturbations(profile, 150,
                new HeightBand(9000, 9100), new ProfilePerturbation(0.3, 60, 0.1), 2, SEED))
                .withMessageContaining("middle of the layer");
    }
}
