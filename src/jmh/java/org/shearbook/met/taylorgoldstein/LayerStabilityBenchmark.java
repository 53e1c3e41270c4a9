package org.shearbook.met.taylorgoldstein;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.met.richardson.ShearLayer;

/**
 * The whole chain from an ascent's levels to the fastest wave of every layer, 24 azimuths by 40 wavenumbers, on one
 * core: {@code mvn -Pjmh test -Djmh.include=LayerStabilityBenchmark}
 *
 * <p>The ascents are synthetic: a jet with turning wind, waves of a saturated spectrum, sheared layers. "200" has
 * three layers, "5000" thirteen; "5000 deep" has the levels of "5000" and the layers of "200", and "200" against it
 * shows that cost follows the layers and hardly the levels.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 3, time = 2)
@Measurement(iterations = 5, time = 2)
@Fork(value = 1)
public class LayerStabilityBenchmark {

    @Param({"200", "5000", "5000 deep"})
    public String ascent;

    private final StabilityAnalysis analysis = new StabilityAnalysis(SearchSettings.forLayers());
    private VerticalProfile profile;
    private double window;

    /** Makes the ascent and says how many layers it has. */
    @Setup
    public void makeAscent() {
        boolean many = ascent.equals("5000");
        profile = ascent(ascent.startsWith("5000") ? 5000 : 200, many ? 13 : 3);
        window = many ? 100 : 150;
        System.out.println(ascent + ": " + RichardsonAnalysis.of(profile, window).layers().size() + " layers");
    }

    /** @return the fastest growth of every layer, so that nothing is optimised away */
    @Benchmark
    public double fromLevelsToWaves() {
        RichardsonProfile richardson = RichardsonAnalysis.of(profile, window);
        double growth = 0;
        for (ShearLayer layer : richardson.layers()) {
            growth += analysis.ofLayer(richardson, layer.extent()).fastest()
                    .map(org.shearbook.met.taylorgoldstein.Mode::growthRate).orElse(0.0);
        }
        return growth;
    }

    private static VerticalProfile ascent(int levels, int layers) {
        Random random = new Random(7);
        double top = 20_000;
        List<ThermodynamicLevel> thermodynamic = new ArrayList<>(levels);
        List<WindLevel> winds = new ArrayList<>(levels);
        double potential = 290;
        double exner = 1;
        double previous = 0;
        for (int i = 0; i < levels; i++) {
            double z = 20 + (top - 20) * i / (levels - 1);
            double n2 = z < 11_000 ? 1.1e-4 : 4.4e-4;
            potential *= Math.exp(n2 / 9.80665 * (z - previous));
            double u = 8 + 30 * Math.exp(-Math.pow((z - 10_500) / 3200, 2));
            double v = 5 * Math.sin(z / 3500);
            for (int layer = 0; layer < layers; layer++) {
                double centre = 2500 + 15_000.0 * layer / layers;
                double strength = Math.sqrt(n2 / 1.1e-4);
                double direction = 0.4 * layer;
                double t = Math.tanh((z - centre) / 130);
                u += 4.2 * strength * t * Math.cos(direction);
                v += 4.2 * strength * t * Math.sin(direction);
            }
            exner -= 9.80665 / (1004.7 * potential) * (z - previous);
            previous = z;
            double pressure = 101_325 * Math.pow(exner, 3.5);
            thermodynamic.add(new ThermodynamicLevel(z, pressure,
                    potential * exner + 0.02 * random.nextGaussian(), Double.NaN));
            winds.add(new WindLevel(z, u + 0.05 * random.nextGaussian(), v + 0.05 * random.nextGaussian()));
        }
        return new VerticalProfile(thermodynamic, winds);
    }
}
