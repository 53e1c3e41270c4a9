package org.shearbook.met.decode;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.List;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * Time to read one pilot report out of an upload of ten thousand, and the same with every hundredth broken. The
 * reports are generated from the shapes that occur; the seed is fixed.
 *
 * <p>{@code mvn -Pjmh test -Djmh.include=PilotReportBenchmark}
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 3, time = 2)
@Measurement(iterations = 5, time = 2)
@Fork(1)
public class PilotReportBenchmark {

    private static final int REPORTS = 10_000;
    private static final String[] PLACES = {"LMA350060", "LMA", "4712N 03000W", "LMA-LMB", "5 NE LMB", "KLMA180005", "FINAL RWY 31", "QQQQQ"};
    private static final String[] TURBULENCE = {"MOD CHOP", "LGT", "NEG", "CONS LGT OCNL MOD CHOP 310-400", "LGT-MOD 240-210", "MOD BLO 080",
        "MOD CHOP 155-070/LGT CHOP BLO 070/LGT CHOP ABV 155", "MTW +/-15KTS +/-200FT", "CONTINUOUS MODERATE TURBULANCE"};
    private static final String[] LEVELS = {"350", "290", "DURD", "8000", "095"};

    private final PilotReportDecoder decoder = new PilotReportDecoder();
    private final DecodingContext context = new DecodingContext(Instant.parse("2031-03-12T12:00:00Z"), PilotReportBenchmark::find);
    private byte[] whole;
    private byte[] broken;

    private static List<FixLookup.Fix> find(String identifier) {
        return switch (identifier) {
            case "LMA" -> List.of(new FixLookup.Fix("LMA", "VOR", 40.0, -100.0, 10.0), new FixLookup.Fix("LMA", "NDB", -30.0, 150.0, 12.0));
            case "LMB" -> List.of(new FixLookup.Fix("LMB", "VORTAC", 41.0, -100.0, 9.0));
            default -> List.of();
        };
    }

    /** Writes the two uploads. */
    @Setup
    public void generate() {
        Random random = new Random(20_310_312L);
        StringBuilder good = new StringBuilder();
        StringBuilder mixed = new StringBuilder();
        for (int number = 1; number <= REPORTS; number++) {
            String report = "LMA UA /OV " + PLACES[random.nextInt(PLACES.length)] + " /TM " + String.format("%02d%02d", random.nextInt(12), random.nextInt(60))
                    + " /FL" + LEVELS[random.nextInt(LEVELS.length)] + " /TP B738 /TB " + TURBULENCE[random.nextInt(TURBULENCE.length)] + " /RM NUMBER " + number;
            good.append(report).append('\n');
            mixed.append(number % 100 == 0 ? report.replace(" UA ", " UX ") : report).append('\n');
        }
        whole = good.toString().getBytes(StandardCharsets.US_ASCII);
        broken = mixed.toString().getBytes(StandardCharsets.US_ASCII);
    }

    /** All can be read. */
    @Benchmark
    @OperationsPerInvocation(REPORTS)
    public Decoding oneReport() {
        return decoder.decode(whole, context);
    }

    /** Every hundredth can't. */
    @Benchmark
    @OperationsPerInvocation(REPORTS)
    public Decoding oneReportWithEveryHundredthBroken() {
        return decoder.decode(broken, context);
    }
}
