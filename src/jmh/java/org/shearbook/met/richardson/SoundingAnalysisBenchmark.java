package org.shearbook.met.richardson;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.Set;
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
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.profile.StandardAtmosphere;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.quality.CheckedSounding;
import org.shearbook.met.quality.SoundingQuality;

/**
 * Checks and Richardson analysis of one ascent to 30 km with the noise of a sonde, from reported levels on; decoding is
 * measured elsewhere. 200 levels stand for a coded ascent, 5000 for a high-resolution one (6 m).
 *
 * <p>{@code mvn -o -Pjmh test -Djmh.include=SoundingAnalysisBenchmark}
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 3, time = 2)
@Measurement(iterations = 5, time = 2)
@Fork(1)
public class SoundingAnalysisBenchmark {

    @Param({"200", "5000"})
    public int levels;

    private List<ReportedLevel> reported;
    private VerticalProfile profile;

    @Setup
    public void prepare() {
        Random random = new Random(1);
        reported = new ArrayList<>();
        double error = 0;
        double spacing = 30_000.0 / levels;
        double memory = Math.exp(-spacing / 60);
        for (int i = 0; i < levels; i++) {
            double z = i * spacing;
            error = memory * error + 0.3 * Math.sqrt(1 - memory * memory) * random.nextGaussian();
            double speed = 6 + 50 * Math.exp(-Math.pow((z - 10_400) / 3500, 2)) + 6 * (1 + Math.tanh((z - 8750) / 250)) + error;
            double temperature = StandardAtmosphere.temperature(z) + 0.1 * random.nextGaussian();
            reported.add(new ReportedLevel(StandardAtmosphere.pressure(z), z, temperature, temperature - 8,
                    250 + 2 * random.nextGaussian(), Math.abs(speed), z / 5, Double.NaN, Double.NaN, Set.of()));
        }
        profile = SoundingQuality.check(reported, 0, null).profile().orElseThrow();
    }

    @Benchmark
    public CheckedSounding check() {
        return SoundingQuality.check(reported, 0, null);
    }

    @Benchmark
    public RichardsonProfile analyse() {
        return RichardsonAnalysis.of(profile, RichardsonAnalysis.DEFAULT_WINDOW);
    }

    @Benchmark
    public RichardsonProfile checkAndAnalyse() {
        return RichardsonAnalysis.of(SoundingQuality.check(reported, 0, null).profile().orElseThrow(), RichardsonAnalysis.DEFAULT_WINDOW);
    }
}
