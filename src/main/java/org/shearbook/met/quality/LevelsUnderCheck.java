package org.shearbook.met.quality;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.Units;
import org.shearbook.met.profile.VerticalProfile;

/** The working state of the checks on one sounding: passed from check to check, never kept. */
final class LevelsUnderCheck {

    /** One level: what is used of it so far. */
    static final class Level {

        final ReportedLevel reported;
        final Set<QualityFlag> flags = EnumSet.noneOf(QualityFlag.class);
        double height;
        double pressure;
        double dewPoint;
        boolean temperatureUsed;
        boolean windUsed;
        /** Computed once: u and v of a usable wind [m s⁻¹]. */
        final double eastward;
        final double northward;

        Level(ReportedLevel reported) {
            this.reported = reported;
            height = reported.height();
            pressure = reported.pressure();
            dewPoint = reported.dewPoint();
            temperatureUsed = reported.hasTemperature();
            windUsed = reported.hasWind();
            eastward = Units.eastward(reported.windSpeed(), reported.windFromDirection());
            northward = Units.northward(reported.windSpeed(), reported.windFromDirection());
        }

        boolean is(Significance significance) {
            return reported.significance().contains(significance);
        }

        void refuse(QualityFlag flag) {
            flags.add(flag);
            temperatureUsed = false;
            windUsed = false;
        }

        void refuseTemperature(QualityFlag flag) {
            flags.add(flag);
            temperatureUsed = false;
        }

        void refuseWind(QualityFlag flag) {
            flags.add(flag);
            windUsed = false;
        }

        boolean hasHeight() {
            return !Double.isNaN(height);
        }

        boolean hasPressure() {
            return !Double.isNaN(pressure);
        }

        boolean isRefused() {
            return flags.contains(QualityFlag.BELOW_GROUND) || flags.contains(QualityFlag.NO_VERTICAL_COORDINATE);
        }

        /** That of dry air while the humidity can't be true at this pressure. */
        double virtualTemperature() {
            return MoistThermodynamics.virtualTemperature(pressure, reported.temperature(), hasPossibleHumidity() ? dewPoint : Double.NaN);
        }

        /** Whether there is a dew point whose vapour pressure is at most half of the pressure. */
        boolean hasPossibleHumidity() {
            return MoistThermodynamics.saturationVapourPressureOverWater(dewPoint) <= 0.5 * pressure;
        }

        double potentialTemperature() {
            return MoistThermodynamics.potentialTemperature(pressure, reported.temperature());
        }

        double windChangeTo(Level other) {
            return Math.hypot(other.eastward - eastward, other.northward - northward);
        }
    }

    /** In the order reported. */
    final List<Level> levels;
    /** Of the launch site [m]; NaN when unknown. */
    final double elevation;
    final @Nullable VerticalProfile previous;
    final List<SoundingFlag> soundingFlags = new ArrayList<>();
    final List<HeightBand> windGaps = new ArrayList<>();
    final List<HeightBand> temperatureGaps = new ArrayList<>();

    LevelsUnderCheck(List<ReportedLevel> reported, double elevation, @Nullable VerticalProfile previous) {
        levels = reported.stream().map(Level::new).toList();
        this.elevation = elevation;
        this.previous = previous;
    }

    void flagSounding(QualityFlag flag, String text) {
        soundingFlags.add(new SoundingFlag(flag, text));
    }

    /** Levels whose temperature is in use, by height; equal heights in the order reported. */
    List<Level> temperatureLevels() {
        return ascending(levels.stream().filter(l -> l.temperatureUsed && l.hasHeight() && l.hasPressure()).toList());
    }

    /** Levels whose wind is in use, by height; equal heights in the order reported. */
    List<Level> windLevels() {
        return ascending(levels.stream().filter(l -> l.windUsed && l.hasHeight()).toList());
    }

    static List<Level> ascending(List<Level> levels) {
        List<Level> sorted = new ArrayList<>(levels);
        sorted.sort(Comparator.comparingDouble(l -> l.height));
        return sorted;
    }
}
