package org.shearbook.desk.analysis;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.EnumType;
import jakarta.persistence.Enumerated;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.SequenceGenerator;
import jakarta.persistence.Table;
import java.time.Instant;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.sounding.SoundingId;

@Entity
@Table(name = "analysis_version")
class AnalysisEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "analysis_version_seq")
    @SequenceGenerator(name = "analysis_version_seq", sequenceName = "analysis_version_seq", allocationSize = 50)
    Long rowId;
    long soundingId;
    int version;
    int soundingVersion;
    String methodVersion;
    @Column(name = "window_m") double window;
    @Nullable String notAnalysed;
    @Enumerated(EnumType.STRING) StabilityState stabilityState;
    @Nullable Double lowestRichardson;
    @Nullable @Column(name = "lowest_richardson_height_m") Double lowestHeight;
    @Nullable @Column(name = "lowest_richardson_level") Double lowestLevel;
    @Nullable @Column(name = "lowest_shear_1000_ft_kt") Double lowestShear;
    @Nullable @Column(name = "tropopause_height_m") Double tropopauseHeight;
    @Nullable Double tropopauseLevel;
    @Nullable @Column(name = "greatest_wind_ms") Double greatestWind;
    @Nullable Double greatestWindLevel;
    boolean greatestWindAtTop;
    int layerCount;
    @Nullable String resultDocument;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected AnalysisEntity() {
    }

    AnalysisEntity(AnalysisSummary summary, @Nullable String document, int version, Instant recordedAt) {
        soundingId = summary.soundingId().value();
        this.version = version;
        soundingVersion = summary.soundingVersion();
        methodVersion = summary.methodVersion();
        window = summary.window();
        notAnalysed = summary.notAnalysed();
        stabilityState = summary.state();
        lowestRichardson = summary.lowestRichardson();
        lowestHeight = summary.lowestHeight();
        lowestLevel = summary.lowestFlightLevel();
        lowestShear = summary.shear1000FtKt();
        tropopauseHeight = summary.tropopauseHeight();
        tropopauseLevel = summary.tropopauseFlightLevel();
        greatestWind = summary.greatestWind();
        greatestWindLevel = summary.greatestWindFlightLevel();
        greatestWindAtTop = summary.windAtTopOfData();
        layerCount = summary.layerCount();
        resultDocument = document;
        observedAt = summary.observedAt();
        receivedAt = summary.receivedAt();
        this.recordedAt = recordedAt;
    }

    AnalysisSummary toSummary() {
        return new AnalysisSummary(new SoundingId(soundingId), soundingVersion, version, methodVersion, window, notAnalysed, stabilityState,
                lowestRichardson, lowestHeight, lowestLevel, lowestShear, tropopauseHeight, tropopauseLevel,
                greatestWind, greatestWindLevel, greatestWindAtTop, layerCount, observedAt, receivedAt, recordedAt);
    }
}
