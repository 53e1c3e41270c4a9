package org.shearbook.desk.sounding;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.List;
import java.util.Set;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.Remark;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.BalloonPosition;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.met.quality.CheckedLevel;
import org.shearbook.met.quality.CheckedSounding;
import org.shearbook.met.quality.QualityFlag;
import org.springframework.data.domain.Persistable;

@Entity
@Table(name = "sounding_levels")
class SoundingLevelsEntity implements Persistable<Long> {

    @Id
    Long rowId;
    @Column(name = "pressure_pa")
    double[] pressure;
    @Column(name = "height_m")
    double[] height;
    @Column(name = "temperature_k")
    double[] temperature;
    @Column(name = "dew_point_k")
    double[] dewPoint;
    @Column(name = "wind_from_deg")
    double[] windFrom;
    @Column(name = "wind_speed_ms")
    double[] windSpeed;
    @Column(name = "elapsed_s")
    double[] elapsed;
    @Column(name = "latitude_deg")
    double[] latitude;
    @Column(name = "longitude_deg")
    double[] longitude;
    String significance;
    @Column(name = "height_used_m")
    double[] heightUsed;
    @Column(name = "pressure_used_pa")
    double[] pressureUsed;
    String flags;
    /** One figure a level: 1 for a temperature in the clean profile, 2 for a wind, 3 for both. */
    String inUse;
    String soundingFlags;
    String remarks;
    @Column(name = "surface_height_m")
    @Nullable Double surfaceHeight;
    double[] profileTemperature;
    double[] profileWind;
    @Column(name = "temperature_gaps_m")
    double[] temperatureGaps;
    @Column(name = "wind_gaps_m")
    double[] windGaps;
    double[] profilePosition;

    protected SoundingLevelsEntity() {
    }

    SoundingLevelsEntity(long rowId, CheckedSounding checked, Collection<Remark> remarks) {
        this.rowId = rowId;
        List<CheckedLevel> levels = checked.levels();
        List<ReportedLevel> reported = levels.stream().map(CheckedLevel::reported).toList();
        pressure = column(reported, ReportedLevel::pressure);
        height = column(reported, ReportedLevel::height);
        temperature = column(reported, ReportedLevel::temperature);
        dewPoint = column(reported, ReportedLevel::dewPoint);
        windFrom = column(reported, ReportedLevel::windFromDirection);
        windSpeed = column(reported, ReportedLevel::windSpeed);
        elapsed = column(reported, ReportedLevel::elapsed);
        latitude = column(reported, ReportedLevel::latitude);
        longitude = column(reported, ReportedLevel::longitude);
        significance = ColumnText.ofNames(reported.stream().map(ReportedLevel::significance).toList());
        heightUsed = column(levels, CheckedLevel::height);
        pressureUsed = column(levels, CheckedLevel::pressure);
        flags = ColumnText.ofNames(levels.stream().map(CheckedLevel::flags).toList());
        StringBuilder use = new StringBuilder(levels.size());
        levels.forEach(level -> use.append((level.temperatureUsed() ? 1 : 0) + (level.windUsed() ? 2 : 0)));
        inUse = use.toString();
        soundingFlags = ColumnText.ofFindings(checked.soundingFlags());
        this.remarks = ColumnText.ofRemarks(remarks);
        takeProfile(checked.cleanProfile());
    }

    /** The same levels for another version. */
    SoundingLevelsEntity(long rowId, SoundingLevelsEntity before) {
        this.rowId = rowId;
        pressure = before.pressure;
        height = before.height;
        temperature = before.temperature;
        dewPoint = before.dewPoint;
        windFrom = before.windFrom;
        windSpeed = before.windSpeed;
        elapsed = before.elapsed;
        latitude = before.latitude;
        longitude = before.longitude;
        significance = before.significance;
        heightUsed = before.heightUsed;
        pressureUsed = before.pressureUsed;
        flags = before.flags;
        inUse = before.inUse;
        soundingFlags = before.soundingFlags;
        remarks = before.remarks;
        surfaceHeight = before.surfaceHeight;
        profileTemperature = before.profileTemperature;
        profileWind = before.profileWind;
        temperatureGaps = before.temperatureGaps;
        windGaps = before.windGaps;
        profilePosition = before.profilePosition;
    }

    private void takeProfile(@Nullable VerticalProfile profile) {
        surfaceHeight = profile == null ? null : profile.surfaceHeight();
        profileTemperature = profile == null ? new double[0] : rows(profile.thermodynamicLevels(),
                l -> new double[] {l.height(), l.pressure(), l.temperature(), l.dewPoint()});
        profileWind = profile == null ? new double[0] : rows(profile.windLevels(),
                l -> new double[] {l.height(), l.pressure(), l.eastward(), l.northward()});
        temperatureGaps = profile == null ? new double[0] : rows(profile.temperatureGaps(), gap -> new double[] {gap.base(), gap.top()});
        windGaps = profile == null ? new double[0] : rows(profile.windGaps(), gap -> new double[] {gap.base(), gap.top()});
        profilePosition = profile == null ? new double[0] : rows(profile.positions(),
                p -> new double[] {p.height(), p.elapsed(), p.latitude(), p.longitude()});
    }

    Sounding toSounding(SoundingHeader header) {
        return new Sounding(header, checkedLevels(), ColumnText.findings(soundingFlags), profile(), ColumnText.remarks(remarks));
    }

    private List<CheckedLevel> checkedLevels() {
        int n = pressure.length;
        List<ReportedLevel> reported = reportedLevels(pressure, height, temperature, dewPoint, windFrom, windSpeed, elapsed, latitude, longitude, significance);
        List<Set<QualityFlag>> flagged = ColumnText.names(QualityFlag.class, flags, n);
        List<CheckedLevel> levels = new ArrayList<>(n);
        for (int k = 0; k < n; k++) {
            int use = inUse.charAt(k) - '0';
            levels.add(new CheckedLevel(reported.get(k), heightUsed[k], pressureUsed[k], flagged.get(k), (use & 1) != 0, (use & 2) != 0));
        }
        return levels;
    }

    @Nullable VerticalProfile profile() {
        if (profileTemperature.length == 0) {
            return null;
        }
        return new VerticalProfile(SoundingEntity.orNaN(surfaceHeight),
                records(profileTemperature, 4, r -> new ThermodynamicLevel(r[0], r[1], r[2], r[3])),
                records(profileWind, 4, r -> new WindLevel(r[0], r[1], r[2], r[3])),
                records(temperatureGaps, 2, r -> new HeightBand(r[0], r[1])),
                records(windGaps, 2, r -> new HeightBand(r[0], r[1])),
                records(profilePosition, 4, r -> new BalloonPosition(r[0], r[1], r[2], r[3])));
    }

    static List<ReportedLevel> reportedLevels(double[] pressure, double[] height, double[] temperature, double[] dewPoint, double[] windFrom, double[] windSpeed,
            double[] elapsed, double[] latitude, double[] longitude, String significance) {
        List<Set<Significance>> significances = ColumnText.names(Significance.class, significance, pressure.length);
        List<ReportedLevel> levels = new ArrayList<>(pressure.length);
        for (int k = 0; k < pressure.length; k++) {
            levels.add(new ReportedLevel(pressure[k], height[k], temperature[k], dewPoint[k], windFrom[k], windSpeed[k], elapsed[k], latitude[k], longitude[k],
                    significances.get(k)));
        }
        return levels;
    }

    static <L> double[] column(List<L> levels, ToDoubleFunction<L> quantity) {
        return levels.stream().mapToDouble(quantity).toArray();
    }

    private static <L> double[] rows(List<L> levels, Function<L, double[]> row) {
        return levels.stream().flatMapToDouble(level -> Arrays.stream(row.apply(level))).toArray();
    }

    private static <L> List<L> records(double[] rows, int width, Function<double[], L> record) {
        List<L> records = new ArrayList<>(rows.length / width);
        for (int k = 0; k < rows.length; k += width) {
            records.add(record.apply(Arrays.copyOfRange(rows, k, k + width)));
        }
        return records;
    }

    @Override
    public Long getId() {
        return rowId;
    }

    @Override
    public boolean isNew() {
        return true;
    }
}
