package org.shearbook.trial;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.MessageDecoders;
import org.shearbook.met.decode.Remark;

/** Every station file of the trial data, counted against its own headers. */
@EnabledIfSystemProperty(named = "trial.data", matches = ".+")
class IgraTrialDataTests {

    static Stream<Path> files() {
        try {
            return Files.list(Path.of(System.getProperty("trial.data"), "igra")).sorted();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    @ParameterizedTest
    @MethodSource("files")
    void everySoundingAndEveryAnnouncedLevelIsRead(Path file) throws IOException {
        List<Integer> announced = new ArrayList<>();
        for (String line : Files.readAllLines(file)) {
            if (line.startsWith("#")) {
                announced.add(Integer.parseInt(line.substring(31, 36).strip()));
            }
        }
        Decoding decoding = decode(file);
        assertThat(decoding.rejected()).isEmpty();
        assertThat(decoding.messages()).extracting(m -> ((DecodedSounding) m).levels().size()).containsExactlyElementsOf(announced);
        assertThat(decoding.messages()).allSatisfy(m -> assertThat(m.remarks()).extracting(Remark::code)
                .doesNotContain("LEVEL_TRUNCATED", "LEVEL_SHIFTED", "VALUE_UNREADABLE", "LEVELS_MISSING", "ELAPSED_TIME_UNREADABLE", "DIRECTION_OUT_OF_RANGE"));
    }

    @Test
    void theUndocumentedLevelTypeOccursAndIsKept() throws IOException {
        Decoding decoding = decode(files().filter(f -> f.getFileName().toString().startsWith("CAM00071701")).findFirst().orElseThrow());
        assertThat(decoding.messages()).anyMatch(m -> m.remarks().stream().anyMatch(r -> r.code().equals("LEVEL_TYPE_UNDOCUMENTED")));
    }

    @Test
    void theSwedishTwinsWithAndWithoutHourGetTheSameReleaseTime() throws IOException {
        Decoding decoding = decode(files().filter(f -> f.getFileName().toString().startsWith("SWM00002527_obs")).findFirst().orElseThrow());
        DecodedSounding withHour = (DecodedSounding) decoding.messages().get(0);
        DecodedSounding withoutHour = (DecodedSounding) decoding.messages().get(1);
        assertThat(withHour.nominalAt()).isNotNull();
        assertThat(withoutHour.nominalAt()).isNull();
        assertThat(withoutHour.launchedAt()).isEqualTo(withHour.launchedAt());
        assertThat(withoutHour.remarks()).extracting(Remark::code).contains("NOMINAL_HOUR_MISSING", "REPEATED_SOUNDING");
    }

    private static Decoding decode(Path file) throws IOException {
        return MessageDecoders.all().decode(Files.readAllBytes(file), new DecodingContext(Instant.parse("2026-01-01T00:00:00Z"), FixLookup.NONE));
    }
}
