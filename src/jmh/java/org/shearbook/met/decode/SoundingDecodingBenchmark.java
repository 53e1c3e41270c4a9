package org.shearbook.met.decode;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.Locale;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.shearbook.met.profile.StandardAtmosphere;

/**
 * Time from bytes to reported levels, recognition included, for one sounding of each kind. The inputs are generated
 * here from the standard atmosphere with a wind that grows with height.
 *
 * <pre>mvn -Pjmh test -Djmh.include=SoundingDecodingBenchmark</pre>
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 3, time = 2)
@Measurement(iterations = 5, time = 2)
@Fork(1)
public class SoundingDecodingBenchmark {

    private static final double TOP = 30_000;

    private final MessageDecoders decoders = MessageDecoders.all();
    private final DecodingContext context = new DecodingContext(Instant.parse("2031-03-06T13:00:00Z"), FixLookup.NONE);
    private byte[] csv200;
    private byte[] csv5000;
    private byte[] igra200;
    private byte[] temp;

    @Setup
    public void write() {
        csv200 = csv(200);
        csv5000 = csv(5000);
        igra200 = igra(200);
        temp = (TempSamples.PART_A + TempSamples.PART_B).getBytes(StandardCharsets.US_ASCII);
    }

    @Benchmark
    public Decoding csvOf200Levels() {
        return decoders.decode(csv200, context);
    }

    @Benchmark
    public Decoding csvOf5000Levels() {
        return decoders.decode(csv5000, context);
    }

    @Benchmark
    public Decoding igraOf200Levels() {
        return decoders.decode(igra200, context);
    }

    @Benchmark
    public Decoding tempPartsAAndB() {
        return decoders.decode(temp, context);
    }

    private static byte[] csv(int levels) {
        StringBuilder text = new StringBuilder("# station_id=XVDU\n# nominal_time=2031-03-06T12:00:00Z\n"
                + "time_s,pressure_hPa,geopotential_height_m,temperature_C,dewpoint_C,wind_direction_deg,wind_speed_ms,latitude_deg,longitude_deg\n");
        for (int i = 0; i < levels; i++) {
            double height = TOP * i / levels;
            text.append(String.format(Locale.ROOT, "%.1f,%.3f,%.1f,%.2f,%.2f,%.1f,%.2f,%.4f,%.4f%n", height / 5, StandardAtmosphere.pressure(height) / 100, height,
                    StandardAtmosphere.temperature(height) - 273.15, StandardAtmosphere.temperature(height) - 283.15, 200 + height / 600, 5 + height / 1000, 47.5, -33 + height / 1e5));
        }
        return text.toString().getBytes(StandardCharsets.US_ASCII);
    }

    private static byte[] igra(int levels) {
        StringBuilder text = new StringBuilder(String.format(Locale.ROOT, "#XXM00000101 2031 03 06 12 1115 %4d ncdc-nws ncdc-gts  475000  -330000%n", levels));
        for (int i = 0; i < levels; i++) {
            double height = TOP * i / levels;
            text.append(String.format(Locale.ROOT, "20 %5d %6d %5dB%5dB%5d %5d %5d %5d%n", (int) (height / 5) / 60 * 100 + (int) (height / 5) % 60,
                    Math.round(StandardAtmosphere.pressure(height)), Math.round(height), Math.round(10 * (StandardAtmosphere.temperature(height) - 273.15)),
                    500, 100, 270, 50 + Math.round(height / 100)));
        }
        return text.toString().getBytes(StandardCharsets.US_ASCII);
    }
}
