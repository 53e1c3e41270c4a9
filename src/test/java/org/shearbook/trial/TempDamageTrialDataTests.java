package org.shearbook.trial;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.MessageDecoders;
import org.shearbook.met.decode.ReportedLevel;

/**
 * Every real report is damaged at every group in turn, in four ways. A level that the damaged report still gives should
 * be one of the sound report's, or miss values. A few damages leave a report that is as well-formed as the sound one
 * (a lost group before a calm wind, which then reads as 1000 hPa at sea level), so the share is bounded, not zero.
 */
@EnabledIfSystemProperty(named = "trial.data", matches = ".+")
class TempDamageTrialDataTests {

    @Test
    void aLostShortenedLengthenedOrDoubledGroupHardlyEverMovesAValueAndNeverSilently() throws IOException {
        int damages = 0;
        List<String> wrong = new ArrayList<>();
        for (String raw : reports()) {
            DecodedSounding sound = decode(raw);
            String[] groups = raw.replace("=", "").trim().split("\\s+");
            for (int i = 3; i < groups.length; i++) {
                for (Damage damage : Damage.values()) {
                    String damagedReport = damaged(groups, i, damage);
                    DecodedSounding read = decode(damagedReport);
                    damages++;
                    if (read != null && !read.levels().stream().allMatch(l -> sound.levels().stream().anyMatch(s -> agrees(l, s)))) {
                        wrong.add(damage + " at group " + i + " of " + String.join(" ", groups));
                        assertThat(read.remarks()).as(damagedReport).isNotEmpty();
                    }
                }
            }
        }
        assertThat(damages).isGreaterThan(5_000);
        assertThat(wrong.size()).as("of %d: %s", damages, wrong).isLessThan(damages / 400);
    }

    private enum Damage { LOST, SHORTENED, LENGTHENED, DOUBLED }

    private static String damaged(String[] groups, int index, Damage damage) {
        List<String> damaged = new ArrayList<>(List.of(groups));
        switch (damage) {
            case LOST -> damaged.remove(index);
            case SHORTENED -> damaged.set(index, groups[index].substring(1));
            case LENGTHENED -> damaged.set(index, groups[index] + "5");
            case DOUBLED -> damaged.add(index, groups[index]);
        }
        return String.join(" ", damaged) + "=";
    }

    private static boolean agrees(ReportedLevel read, ReportedLevel sound) {
        return same(read.pressure(), sound.pressure()) && same(read.height(), sound.height()) && same(read.temperature(), sound.temperature())
                && same(read.dewPoint(), sound.dewPoint()) && same(read.windFromDirection(), sound.windFromDirection()) && same(read.windSpeed(), sound.windSpeed());
    }

    private static boolean same(double read, double sound) {
        return Double.isNaN(read) || read == sound;
    }

    private static @Nullable DecodedSounding decode(String text) {
        Decoding decoding = MessageDecoders.all().decode(text.getBytes(StandardCharsets.US_ASCII), new DecodingContext(Instant.parse("2026-01-31T23:59:00Z"), FixLookup.NONE));
        return decoding.messages().isEmpty() ? null : (DecodedSounding) decoding.messages().get(0);
    }

    private static List<String> reports() throws IOException {
        List<String> reports = new ArrayList<>();
        try (Stream<Path> files = Files.list(Path.of(System.getProperty("trial.data"), "temp-tac"))) {
            for (Path file : files.filter(f -> f.toString().endsWith(".txt")).sorted().toList()) {
                MessageDecoders.all().decode(Files.readAllBytes(file), new DecodingContext(Instant.parse("2026-01-31T23:59:00Z"), FixLookup.NONE))
                        .messages().stream().filter(m -> !((DecodedSounding) m).levels().isEmpty()).forEach(m -> reports.add(m.raw()));
            }
        }
        return reports;
    }
}
