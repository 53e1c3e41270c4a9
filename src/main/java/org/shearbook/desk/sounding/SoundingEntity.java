package org.shearbook.desk.sounding;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.SequenceGenerator;
import jakarta.persistence.Table;
import java.time.Instant;
import java.util.Collections;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.met.quality.CheckedSounding;
import org.shearbook.met.quality.Refusal;

@Entity
@Table(name = "sounding_version")
class SoundingEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "sounding_version_seq")
    @SequenceGenerator(name = "sounding_version_seq", sequenceName = "sounding_version_seq", allocationSize = 50)
    Long rowId;
    long soundingId;
    int version;
    String stationId;
    String stationName;
    String sourceFormat;
    @Nullable Instant nominalAt;
    @Nullable Instant launchedAt;
    @Nullable Double latitudeDeg;
    @Nullable Double longitudeDeg;
    @Column(name = "elevation_m")
    @Nullable Double elevation;
    String parts;
    String correction;
    String sondeType;
    int levelCount;
    @Column(name = "top_pressure_pa")
    @Nullable Double topPressure;
    @Column(name = "lowest_temperature_k")
    @Nullable Double lowestTemperature;
    @Column(name = "lowest_temperature_pa")
    @Nullable Double lowestTemperaturePressure;
    @Column(name = "greatest_wind_ms")
    @Nullable Double greatestWind;
    @Column(name = "greatest_wind_from_deg")
    @Nullable Double greatestWindFrom;
    @Column(name = "greatest_wind_pa")
    @Nullable Double greatestWindPressure;
    @Nullable String notUsable;
    boolean withdrawn;
    @Nullable String withdrawnReason;
    String contentDigest;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected SoundingEntity() {
    }

    SoundingEntity(long soundingId, int version, Site site, String format, DecodedSounding content, String contentDigest,
            CheckedSounding checked, Instant receivedAt, Instant recordedAt) {
        this.soundingId = soundingId;
        this.version = version;
        stationId = site.stationId();
        stationName = site.name();
        sourceFormat = format;
        nominalAt = content.nominalAt();
        launchedAt = content.launchedAt();
        latitudeDeg = orNull(site.latitude());
        longitudeDeg = orNull(site.longitude());
        elevation = orNull(site.elevation());
        parts = String.join(",", new TreeSet<>(content.parts()));
        correction = content.correction();
        sondeType = content.sondeType();
        levelCount = content.levels().size();
        topPressure = orNull(content.levels().stream().mapToDouble(ReportedLevel::pressure).filter(p -> !Double.isNaN(p)).min().orElse(Double.NaN));
        takeExtremes(checked.cleanProfile());
        notUsable = checked.refusal().map(Refusal::text).orElse(null);
        this.contentDigest = contentDigest;
        observedAt = content.launchedAt() != null ? content.launchedAt() : content.nominalAt();
        this.receivedAt = receivedAt;
        this.recordedAt = recordedAt;
    }

    /** The same sounding, taken out of use. */
    SoundingEntity(SoundingEntity before, String reason, Instant recordedAt) {
        soundingId = before.soundingId;
        version = before.version + 1;
        stationId = before.stationId;
        stationName = before.stationName;
        sourceFormat = before.sourceFormat;
        nominalAt = before.nominalAt;
        launchedAt = before.launchedAt;
        latitudeDeg = before.latitudeDeg;
        longitudeDeg = before.longitudeDeg;
        elevation = before.elevation;
        parts = before.parts;
        correction = before.correction;
        sondeType = before.sondeType;
        levelCount = before.levelCount;
        topPressure = before.topPressure;
        lowestTemperature = before.lowestTemperature;
        lowestTemperaturePressure = before.lowestTemperaturePressure;
        greatestWind = before.greatestWind;
        greatestWindFrom = before.greatestWindFrom;
        greatestWindPressure = before.greatestWindPressure;
        notUsable = before.notUsable;
        withdrawn = true;
        withdrawnReason = reason;
        contentDigest = before.contentDigest;
        observedAt = before.observedAt;
        receivedAt = before.receivedAt;
        this.recordedAt = recordedAt;
    }

    private void takeExtremes(@Nullable VerticalProfile profile) {
        if (profile == null) {
            return;
        }
        ThermodynamicLevel coldest = profile.thermodynamicLevels().stream()
                .min(java.util.Comparator.comparingDouble(ThermodynamicLevel::temperature)).orElseThrow();
        lowestTemperature = coldest.temperature();
        lowestTemperaturePressure = coldest.pressure();
        profile.windLevels().stream().max(java.util.Comparator.comparingDouble(WindLevel::speed)).ifPresent(wind -> {
            greatestWind = wind.speed();
            greatestWindFrom = wind.fromDirection();
            greatestWindPressure = orNull(Double.isNaN(wind.pressure()) ? profile.pressureAt(wind.height()) : wind.pressure());
        });
    }

    SoundingHeader toHeader() {
        return new SoundingHeader(new SoundingId(soundingId), version, stationId, stationName, sourceFormat, nominalAt, launchedAt, observedAt, receivedAt,
                recordedAt, orNaN(latitudeDeg), orNaN(longitudeDeg), orNaN(elevation), partSet(parts), correction, sondeType, levelCount, orNaN(topPressure),
                orNaN(lowestTemperature), orNaN(lowestTemperaturePressure), orNaN(greatestWind), orNaN(greatestWindFrom), orNaN(greatestWindPressure),
                notUsable, withdrawn, withdrawnReason);
    }

    static Set<String> partSet(String parts) {
        return parts.isEmpty() ? Set.of() : Collections.unmodifiableSet(new LinkedHashSet<>(List.of(parts.split(","))));
    }

    static @Nullable Double orNull(double value) {
        return Double.isNaN(value) ? null : value;
    }

    static double orNaN(@Nullable Double value) {
        return value == null ? Double.NaN : value;
    }
}
