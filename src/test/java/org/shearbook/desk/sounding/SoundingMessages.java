package org.shearbook.desk.sounding;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.StandardAtmosphere;

/** Decoded messages with plausible levels: the standard atmosphere with a wind that grows with height. */
public final class SoundingMessages {

    public static final Instant NOON = Instant.parse("2031-03-12T12:00:00Z");

    private SoundingMessages() {
    }

    /** Levels every 250 m up to a height, the wind speed multiplied by a factor. */
    public static List<ReportedLevel> levels(double top, double windFactor) {
        List<ReportedLevel> levels = new ArrayList<>();
        for (double height = 50; height <= top; height += 250) {
            levels.add(new ReportedLevel(StandardAtmosphere.pressure(height), height, StandardAtmosphere.temperature(height), Double.NaN, 250 + height / 1000,
                    windFactor * (5 + height / 400), height / 5, Double.NaN, Double.NaN, height == 50 ? Set.of(Significance.SURFACE) : Set.of()));
        }
        return levels;
    }

    public static DecodedSounding file(String station, @Nullable Instant nominalAt, @Nullable Instant launchedAt, List<ReportedLevel> levels) {
        return new DecodedSounding(station, 47.2, -30, 50, nominalAt, launchedAt, Set.of(), "", "", levels, "file of " + station + " with " + levels.size() + " levels",
                1, List.of());
    }

    /** One coded part, for the nominal hour. */
    public static DecodedSounding part(String station, Instant nominalAt, String part, String correction, List<ReportedLevel> levels) {
        return new DecodedSounding(station, Double.NaN, Double.NaN, Double.NaN, nominalAt, null, Set.of(part), correction, "", levels,
                part + " of " + station + " " + correction, 1, List.of());
    }

    /** Standard levels: every fourth of {@link #levels}. */
    public static List<ReportedLevel> standardLevels(double windFactor) {
        List<ReportedLevel> all = levels(12_000, windFactor);
        List<ReportedLevel> standard = new ArrayList<>();
        for (int k = 0; k < all.size(); k += 4) {
            standard.add(all.get(k));
        }
        return standard;
    }

    /** The levels between the standard ones, without heights, as significant levels are coded. */
    public static List<ReportedLevel> significantLevels() {
        List<ReportedLevel> all = levels(12_000, 1);
        List<ReportedLevel> significant = new ArrayList<>();
        for (int k = 2; k < all.size(); k += 4) {
            ReportedLevel l = all.get(k);
            significant.add(new ReportedLevel(l.pressure(), Double.NaN, l.temperature(), Double.NaN, l.windFromDirection(), l.windSpeed(), Double.NaN,
                    Double.NaN, Double.NaN, Set.of(Significance.SIGNIFICANT_TEMPERATURE)));
        }
        return significant;
    }
}
