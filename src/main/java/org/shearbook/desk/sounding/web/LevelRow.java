package org.shearbook.desk.sounding.web;

import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.quality.CheckedLevel;
import org.shearbook.met.quality.QualityFlag;

/**
 * A level in the table of levels.
 *
 * @param level       values as reported
 * @param flightLevel of the pressure used
 * @param flags       names of what was found, and the same in words
 */
public record LevelRow(CheckedLevel level, @Nullable Double flightLevel, String significance, String flags, String flagsInWords) {

    static LevelRow of(CheckedLevel level) {
        return new LevelRow(level, SoundingView.flightLevel(level.pressure()), words(level.reported().significance().stream().sorted().map(Enum::name)
                .collect(Collectors.joining(", "))), words(level.flags().stream().map(Enum::name).collect(Collectors.joining(", "))),
                level.flags().stream().map(QualityFlag::text).collect(Collectors.joining(" ")));
    }

    private static String words(String names) {
        return names.toLowerCase(java.util.Locale.ROOT).replace('_', ' ');
    }
}
