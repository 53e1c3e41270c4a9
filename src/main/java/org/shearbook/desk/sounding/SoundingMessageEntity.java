package org.shearbook.desk.sounding;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.SequenceGenerator;
import jakarta.persistence.Table;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.List;
import java.util.TreeSet;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.ReportedLevel;

/** One message of an ascent. Levels are kept for coded parts alone: those are joined anew when another part comes. */
@Entity
@Table(name = "sounding_message")
class SoundingMessageEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "sounding_message_seq")
    @SequenceGenerator(name = "sounding_message_seq", sequenceName = "sounding_message_seq", allocationSize = 50)
    Long rowId;
    long soundingId;
    int version;
    int messageNumber;
    String stationNamed;
    @Nullable Double latitudeDeg;
    @Nullable Double longitudeDeg;
    @Column(name = "elevation_m")
    @Nullable Double elevation;
    @Nullable Instant nominalAt;
    @Nullable Instant launchedAt;
    String parts;
    String correction;
    String sondeType;
    String remarks;
    String contentDigest;
    byte[] raw;
    @Column(name = "pressure_pa")
    double @Nullable [] pressure;
    @Column(name = "height_m")
    double @Nullable [] height;
    @Column(name = "temperature_k")
    double @Nullable [] temperature;
    @Column(name = "dew_point_k")
    double @Nullable [] dewPoint;
    @Column(name = "wind_from_deg")
    double @Nullable [] windFrom;
    @Column(name = "wind_speed_ms")
    double @Nullable [] windSpeed;
    @Column(name = "elapsed_s")
    double @Nullable [] elapsed;
    @Column(name = "level_latitude_deg")
    double @Nullable [] latitude;
    @Column(name = "level_longitude_deg")
    double @Nullable [] longitude;
    @Nullable String significance;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected SoundingMessageEntity() {
    }

    SoundingMessageEntity(long soundingId, int version, int messageNumber, DecodedSounding message, String contentDigest, Instant receivedAt, Instant recordedAt) {
        this.soundingId = soundingId;
        this.version = version;
        this.messageNumber = messageNumber;
        stationNamed = message.stationId();
        latitudeDeg = SoundingEntity.orNull(message.latitude());
        longitudeDeg = SoundingEntity.orNull(message.longitude());
        elevation = SoundingEntity.orNull(message.elevation());
        nominalAt = message.nominalAt();
        launchedAt = message.launchedAt();
        parts = String.join(",", new TreeSet<>(message.parts()));
        correction = message.correction();
        sondeType = message.sondeType();
        remarks = ColumnText.ofRemarks(message.remarks());
        this.contentDigest = contentDigest;
        raw = message.raw().getBytes(StandardCharsets.UTF_8);
        if (!message.parts().isEmpty()) {
            takeLevels(message.levels());
        }
        observedAt = message.launchedAt() != null ? message.launchedAt() : message.nominalAt();
        this.receivedAt = receivedAt;
        this.recordedAt = recordedAt;
    }

    private void takeLevels(List<ReportedLevel> levels) {
        pressure = SoundingLevelsEntity.column(levels, ReportedLevel::pressure);
        height = SoundingLevelsEntity.column(levels, ReportedLevel::height);
        temperature = SoundingLevelsEntity.column(levels, ReportedLevel::temperature);
        dewPoint = SoundingLevelsEntity.column(levels, ReportedLevel::dewPoint);
        windFrom = SoundingLevelsEntity.column(levels, ReportedLevel::windFromDirection);
        windSpeed = SoundingLevelsEntity.column(levels, ReportedLevel::windSpeed);
        elapsed = SoundingLevelsEntity.column(levels, ReportedLevel::elapsed);
        latitude = SoundingLevelsEntity.column(levels, ReportedLevel::latitude);
        longitude = SoundingLevelsEntity.column(levels, ReportedLevel::longitude);
        significance = ColumnText.ofNames(levels.stream().map(ReportedLevel::significance).toList());
    }

    String rawText() {
        return new String(raw, StandardCharsets.UTF_8);
    }

    /** The message as it was decoded. Only for coded parts: others have their levels in the version alone. */
    DecodedSounding toMessage() {
        if (pressure == null) {
            throw new IllegalStateException("The levels of a message without parts lie in its version");
        }
        return new DecodedSounding(stationNamed, SoundingEntity.orNaN(latitudeDeg), SoundingEntity.orNaN(longitudeDeg), SoundingEntity.orNaN(elevation),
                nominalAt, launchedAt, SoundingEntity.partSet(parts), correction, sondeType,
                SoundingLevelsEntity.reportedLevels(pressure, height, temperature, dewPoint, windFrom, windSpeed, elapsed, latitude, longitude, significance),
                rawText(), 1, ColumnText.remarks(remarks));
    }
}
