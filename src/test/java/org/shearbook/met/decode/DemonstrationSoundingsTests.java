package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The invented ascents of the demonstration come in through the same decoders as any other. */
class DemonstrationSoundingsTests {

    private static final Path FOLDER = Path.of("demo-data", "sounding");

    private final DecodingContext context = new DecodingContext(Instant.parse("2031-03-12T00:45:00Z"), FixLookup.NONE);

    static Stream<Path> tables() throws IOException {
        return Files.list(FOLDER).filter(f -> f.toString().endsWith(".csv")).sorted();
    }

    @ParameterizedTest
    @MethodSource("tables")
    void everyTableIsReadWithoutARemark(Path file) throws IOException {
        Decoding decoding = MessageDecoders.all().decode(Files.readAllBytes(file), context);
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).singleElement().satisfies(m -> {
            DecodedSounding sounding = (DecodedSounding) m;
            assertThat(sounding.levels()).hasSize((int) Files.lines(file).filter(l -> !l.startsWith("#")).count() - 1);
            assertThat(sounding.launchedAt()).isEqualTo(sounding.nominalAt().minusSeconds(45 * 60));
            assertThat(sounding.remarks()).isEmpty();
        });
    }

    @Test
    void theCodedPartsOfOneAscentMergeAndTheCorrectionCounts() throws IOException {
        List<DecodedSounding> parts = Stream.of("XVDU-D2-00Z-TTAA.txt", "XVDU-D2-00Z-TTBB.txt", "XVDU-D2-00Z-TTBB-corrected.txt").map(this::part).toList();
        assertThat(parts).allSatisfy(p -> {
            assertThat(p.nominalAt()).isEqualTo("2031-03-12T00:00:00Z");
            assertThat(p.remarks()).extracting(Remark::code).doesNotContain("GROUP_SHIFTED");
        });
        assertThat(AscentMerge.ascents(parts)).hasSize(1);
        DecodedSounding ascent = AscentMerge.merge(parts);
        assertThat(ascent.correction()).isEqualTo("CCA");
        assertThat(ascent.launchedAt()).isEqualTo("2031-03-11T23:15:00Z");
        ReportedLevel corrected = ascent.levels().stream().filter(l -> l.pressure() == 25_800).findFirst().orElseThrow();
        assertThat(corrected.windSpeed()).as("the corrected part says 127 kt").isEqualTo(127 * 1852 / 3600.0);
    }

    private DecodedSounding part(String name) {
        try {
            Decoding decoding = MessageDecoders.all().decode(Files.readAllBytes(FOLDER.resolve(name)), context);
            assertThat(decoding.rejected()).isEmpty();
            return (DecodedSounding) decoding.messages().get(0);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
