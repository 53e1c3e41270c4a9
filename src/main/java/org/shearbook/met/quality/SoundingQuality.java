package org.shearbook.met.quality;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.profile.BalloonPosition;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;

/**
 * Checks the reported levels of one ascent and builds a clean profile from what passed. The entry to this room.
 *
 * <p>Every level reported comes back, with its flags; none is deleted or changed. The checks are one class each,
 * with limit and source in their comment, and run in the order given here.
 */
public final class SoundingQuality {

    private static final int FEWEST_LEVELS = 3;

    // Ranges first, so that nonsense takes no part in hydrostatics; spikes before jumps and gaps, which go by neighbours.
    private static final List<QualityCheck> CHECKS = List.of(
            new CoordinateRangeCheck(), new BelowGroundCheck(), new TemperatureRangeCheck(), new WindRangeCheck(),
            new VerticalCoordinateCompletion(), new HumidityRangeCheck(), new DuplicateLevelCheck(), new StrictOrderCheck(),
            new SpikeCheck(), new SuperadiabaticCheck(), new WindJumpCheck(), new GapCheck(), new RoundingCheck(), new UnitSlipCheck());

    private SoundingQuality() {
    }

    /**
     * Checks one ascent. Never throws for bad values: what can't be used is flagged, and when too little is left the
     * answer is a {@link Refusal}. Cost O(n log n) in the number of levels.
     *
     * @param levels    as reported, SI, NaN for missing, in any order
     * @param elevation of the launch site above mean sea level [m]; NaN when unknown
     * @param previous  the sounding before it of the same station, to find a slip of units; null when there is none
     * @return flagged levels in the order given, and the clean profile or the reason why there is none
     */
    public static CheckedSounding check(List<ReportedLevel> levels, double elevation, @Nullable VerticalProfile previous) {
        LevelsUnderCheck sounding = new LevelsUnderCheck(levels, Double.isFinite(elevation) ? elevation : Double.NaN, previous);
        for (QualityCheck check : CHECKS) {
            check.apply(sounding);
        }
        Refusal refusal = refusal(sounding);
        VerticalProfile profile = refusal == null ? profile(sounding) : null;
        List<CheckedLevel> checked = sounding.levels.stream().map(l -> new CheckedLevel(l.reported, l.height, l.pressure, l.flags,
                l.temperatureUsed && l.hasHeight() && l.hasPressure(), l.windUsed && l.hasHeight())).toList();
        return new CheckedSounding(checked, sounding.soundingFlags, profile, refusal);
    }

    private static @Nullable Refusal refusal(LevelsUnderCheck sounding) {
        if (sounding.levels.isEmpty()) {
            return new Refusal("NO_LEVELS", "The sounding has no levels. Check whether the ascent was made and the message is complete.");
        }
        if (sounding.levels.size() == 1) {
            return new Refusal("SINGLE_LEVEL", "The sounding has a single level. A profile needs at least three with wind and three with temperature.");
        }
        if (sounding.levels.stream().allMatch(l -> l.flags.contains(QualityFlag.NO_VERTICAL_COORDINATE))) {
            return new Refusal("NO_VERTICAL_COORDINATE", "No level has a pressure or a height. Check the columns and their units.");
        }
        if (sounding.levels.stream().noneMatch(l -> !l.isRefused() && l.hasPressure())) {
            return new Refusal("NO_PRESSURE", "No level has a pressure, so stability and flight levels are unknown. Send the part that carries pressure and temperature.");
        }
        int temperatures = sounding.temperatureLevels().size();
        if (temperatures < FEWEST_LEVELS) {
            return new Refusal("FEWER_THAN_THREE_TEMPERATURE_LEVELS",
                    "Only " + temperatures + " levels have a usable temperature; three are the least. See the flags of the levels.");
        }
        int winds = sounding.windLevels().size();
        if (winds < FEWEST_LEVELS) {
            return new Refusal("FEWER_THAN_THREE_WIND_LEVELS",
                    "Only " + winds + " levels have a usable wind; three are the least. See the flags of the levels.");
        }
        return null;
    }

    private static VerticalProfile profile(LevelsUnderCheck sounding) {
        List<ThermodynamicLevel> temperatures = sounding.temperatureLevels().stream()
                .map(l -> new ThermodynamicLevel(l.height, l.pressure, l.reported.temperature(), l.dewPoint)).toList();
        List<WindLevel> winds = winds(sounding.windLevels(), temperatures);
        return new VerticalProfile(sounding.elevation, temperatures, winds, sounding.temperatureGaps, sounding.windGaps, positions(sounding));
    }

    /** A wind keeps its own pressure only where that lies strictly between those around it. */
    private static List<WindLevel> winds(List<LevelsUnderCheck.Level> levels, List<ThermodynamicLevel> temperatures) {
        List<WindLevel> winds = new ArrayList<>(levels.size());
        double last = Double.POSITIVE_INFINITY;
        int above = 0;
        for (LevelsUnderCheck.Level level : levels) {
            while (above < temperatures.size() && temperatures.get(above).height() <= level.height) {
                last = Math.min(last, temperatures.get(above).pressure());
                above++;
            }
            double next = above < temperatures.size() ? temperatures.get(above).pressure() : 0;
            boolean fits = level.pressure < last && level.pressure > next;
            winds.add(new WindLevel(level.height, fits ? level.pressure : Double.NaN, level.eastward, level.northward));
            if (fits) {
                last = level.pressure;
            }
        }
        return winds;
    }

    private static List<BalloonPosition> positions(LevelsUnderCheck sounding) {
        List<BalloonPosition> positions = new ArrayList<>();
        double last = Double.NEGATIVE_INFINITY;
        for (LevelsUnderCheck.Level level : LevelsUnderCheck.ascending(
                sounding.levels.stream().filter(l -> l.hasHeight() && !l.isRefused()).toList())) {
            ReportedLevel reported = level.reported;
            boolean known = !Double.isNaN(reported.elapsed()) || !Double.isNaN(reported.latitude()) && !Double.isNaN(reported.longitude());
            if (known && level.height > last) {
                positions.add(new BalloonPosition(level.height, reported.elapsed(), reported.latitude(), reported.longitude()));
                last = level.height;
            }
        }
        return positions;
    }
}
