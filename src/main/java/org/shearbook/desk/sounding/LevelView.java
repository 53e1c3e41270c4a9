package org.shearbook.desk.sounding;

import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.profile.Units;
import org.shearbook.met.quality.CheckedLevel;
import org.shearbook.met.quality.QualityFlag;

/**
 * A level as scripts get it: values as reported, units in the names, null for what is missing.
 *
 * @param heightM geopotential height, as reported
 * @param flags   what the checks found
 */
public record LevelView(
        @Nullable Double pressureHpa, @Nullable Double heightM, @Nullable Double temperatureC, @Nullable Double dewPointC,
        @Nullable Double windFromDeg, @Nullable Double windSpeedMs, @Nullable Double elapsedS, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg,
        List<String> significance, List<String> flags) {

    public static LevelView of(CheckedLevel level) {
        return of(level.reported(), level.flags());
    }

    private static LevelView of(ReportedLevel level, Set<QualityFlag> flags) {
        return new LevelView(rounded(level.pressure() / 100), rounded(level.height()), rounded(Units.kelvinToCelsius(level.temperature())),
                rounded(Units.kelvinToCelsius(level.dewPoint())), rounded(level.windFromDirection()), rounded(level.windSpeed()), rounded(level.elapsed()),
                rounded(level.latitude()), rounded(level.longitude()), level.significance().stream().sorted().map(Enum::name).toList(),
                flags.stream().map(Enum::name).toList());
    }

    /** Far below the resolution of any code, so that a change of unit does not add figures nobody reported. */
    private static @Nullable Double rounded(double value) {
        return Double.isNaN(value) ? null : Math.round(value * 1e6) / 1e6;
    }
}
