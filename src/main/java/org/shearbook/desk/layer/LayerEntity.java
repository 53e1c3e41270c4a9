package org.shearbook.desk.layer;

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
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.analysis.AnalysisDocument;
import org.shearbook.desk.analysis.AnalysisSummary;
import org.shearbook.desk.analysis.StabilityState;
import org.shearbook.desk.sounding.SoundingHeader;
import org.shearbook.desk.sounding.SoundingId;

@Entity
@Table(name = "layer_version")
class LayerEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "layer_version_seq")
    @SequenceGenerator(name = "layer_version_seq", sequenceName = "layer_version_seq", allocationSize = 50)
    Long rowId;
    long layerId;
    int version;
    boolean standing;
    long soundingId;
    int soundingVersion;
    String stationId;
    String stationName;
    String letter;
    @Column(name = "base_m") double base;
    @Column(name = "top_m") double top;
    @Nullable Double baseLevel;
    @Nullable Double topLevel;
    @Column(name = "depth_m") double depth;
    double minRichardson;
    @Column(name = "min_richardson_m") double minRichardsonHeight;
    @Nullable Double minRichardsonLevel;
    @Nullable Double bulkRichardson;
    @Column(name = "window_m") double window;
    @Column(name = "max_shear_per_s") double maximumShear;
    @Nullable @Column(name = "shear_1000_ft_kt") Double shearOverThousandFeet;
    @Column(name = "wind_change_ms") double windChange;
    @Column(name = "shear_direction_deg") double shearDirection;
    @Column(name = "mean_wind_from_deg") double meanWindFromDirection;
    @Column(name = "mean_wind_ms") double meanWind;
    @Nullable @Column(name = "rule_wavelength_m") Double ruleWavelength;
    @Nullable @Column(name = "rule_e_folding_s") Double ruleEFoldingTime;
    String ruleBasis;
    @Nullable @Column(name = "latitude_deg") Double latitude;
    @Nullable @Column(name = "longitude_deg") Double longitude;
    @Nullable Boolean saturated;
    @Enumerated(EnumType.STRING) StabilityState stabilityState;
    String remarkCodes;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected LayerEntity() {
    }

    LayerEntity(long layerId, int version, SoundingHeader sounding, AnalysisSummary analysis, AnalysisDocument.Layer layer, Instant recordedAt) {
        this.layerId = layerId;
        this.version = version;
        standing = true;
        soundingId = sounding.id().value();
        soundingVersion = analysis.soundingVersion();
        stationId = sounding.stationId();
        stationName = sounding.stationName();
        letter = layer.letter();
        base = layer.baseHeightM();
        top = layer.topHeightM();
        baseLevel = layer.baseFlightLevel();
        topLevel = layer.topFlightLevel();
        depth = layer.depthM();
        minRichardson = layer.minRichardson();
        minRichardsonHeight = layer.minRichardsonHeightM();
        minRichardsonLevel = layer.minRichardsonFlightLevel();
        bulkRichardson = layer.bulkRichardson();
        window = layer.windowM();
        maximumShear = layer.maxShearPerS();
        shearOverThousandFeet = layer.shear1000FtKt();
        windChange = layer.windChangeMs();
        shearDirection = layer.shearDirectionDeg();
        meanWindFromDirection = layer.meanWindFromDeg();
        meanWind = layer.meanWindMs();
        ruleWavelength = layer.rule().wavelengthM();
        ruleEFoldingTime = layer.rule().eFoldingMin() == null ? null : layer.rule().eFoldingMin() * 60;
        ruleBasis = layer.rule().basis();
        latitude = layer.latitudeDeg();
        longitude = layer.longitudeDeg();
        saturated = layer.saturated();
        stabilityState = StabilityState.valueOf(layer.state().toUpperCase(Locale.ROOT));
        remarkCodes = layer.remarks().stream().map(AnalysisDocument.Note::code).collect(Collectors.joining(","));
        observedAt = sounding.launchedAt() == null || layer.elapsedS() == null ? sounding.observedAt()
                : sounding.launchedAt().plusSeconds(Math.round(layer.elapsedS()));
        receivedAt = sounding.receivedAt();
        this.recordedAt = recordedAt;
    }

    /** A last version of a layer that is no longer found. */
    LayerEntity(LayerEntity earlier, int soundingVersion, Instant recordedAt) {
        layerId = earlier.layerId;
        version = earlier.version + 1;
        standing = false;
        soundingId = earlier.soundingId;
        this.soundingVersion = soundingVersion;
        stationId = earlier.stationId;
        stationName = earlier.stationName;
        letter = earlier.letter;
        base = earlier.base;
        top = earlier.top;
        baseLevel = earlier.baseLevel;
        topLevel = earlier.topLevel;
        depth = earlier.depth;
        minRichardson = earlier.minRichardson;
        minRichardsonHeight = earlier.minRichardsonHeight;
        minRichardsonLevel = earlier.minRichardsonLevel;
        bulkRichardson = earlier.bulkRichardson;
        window = earlier.window;
        maximumShear = earlier.maximumShear;
        shearOverThousandFeet = earlier.shearOverThousandFeet;
        windChange = earlier.windChange;
        shearDirection = earlier.shearDirection;
        meanWindFromDirection = earlier.meanWindFromDirection;
        meanWind = earlier.meanWind;
        ruleWavelength = earlier.ruleWavelength;
        ruleEFoldingTime = earlier.ruleEFoldingTime;
        ruleBasis = earlier.ruleBasis;
        latitude = earlier.latitude;
        longitude = earlier.longitude;
        saturated = earlier.saturated;
        stabilityState = earlier.stabilityState;
        remarkCodes = earlier.remarkCodes;
        observedAt = earlier.observedAt;
        receivedAt = earlier.receivedAt;
        this.recordedAt = recordedAt;
    }

    Layer toLayer() {
        return new Layer(new LayerId(layerId), version, standing, new SoundingId(soundingId), soundingVersion, stationId, stationName, letter,
                base, top, baseLevel, topLevel, depth, minRichardson, minRichardsonHeight, minRichardsonLevel, bulkRichardson, window,
                maximumShear, shearOverThousandFeet, windChange, shearDirection, meanWindFromDirection, meanWind,
                ruleWavelength, ruleEFoldingTime, ruleBasis, latitude, longitude, saturated, stabilityState,
                remarkCodes.isEmpty() ? List.of() : Arrays.asList(remarkCodes.split(",")), observedAt, receivedAt, recordedAt);
    }
}
