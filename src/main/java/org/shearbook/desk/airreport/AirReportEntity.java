package org.shearbook.desk.airreport;

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
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.decode.DecodedAirReport.Cloud;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.Place;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;
import org.shearbook.met.decode.NullPolicy;

@Entity
@Table(name = "air_report_version")
class AirReportEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "air_report_version_seq")
    @SequenceGenerator(name = "air_report_version_seq", sequenceName = "air_report_version_seq", allocationSize = 50)
    Long rowId;
    long reportId;
    int version;
    @Nullable String sourceId;
    @Enumerated(EnumType.STRING) ReportClass reportClass;
    @Enumerated(EnumType.STRING) NullPolicy nullPolicy;
    boolean urgent;
    String placeText;
    @Nullable Double latitudeDeg;
    @Nullable Double longitudeDeg;
    @Nullable String resolvedBy;
    @Nullable String placeCandidates;
    @Nullable Double flightLevel;
    @Nullable String turbulence;
    @Nullable @Enumerated(EnumType.STRING) Intensity worstIntensity;
    @Nullable String worstBasis;
    @Nullable Double edrMean;
    @Nullable Double edrPeak;
    @Nullable Double gustMs;
    @Nullable Double windFromDeg;
    @Nullable Double windSpeedMs;
    @Nullable @Column(name = "temperature_k") Double temperatureK;
    @Enumerated(EnumType.STRING) Cloud cloud;
    @Nullable String aircraftType;
    @Nullable String weightClass;
    @Nullable String remark;
    @Nullable String decodingRemarks;
    @Enumerated(EnumType.STRING) Attribution attribution;
    @Nullable String attributionReason;
    String identityDigest;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected AirReportEntity() {
    }

    /** A first version as decoded; its id and the moment it is recorded are still to come. */
    AirReportEntity(DecodedAirReport decoded, WorstIntensity worst, String identityDigest, Instant receivedAt) {
        AircraftMask mask = new AircraftMask(decoded.aircraft());
        version = 1;
        sourceId = limited(mask.over(decoded.reportId()), 120);
        reportClass = decoded.reportClass();
        nullPolicy = decoded.reportClass().nullPolicy();
        urgent = decoded.urgent();
        placeText = decoded.place().text().length() > 400 ? decoded.place().text().substring(0, 400) : decoded.place().text();
        latitudeDeg = known(decoded.place().latitude());
        longitudeDeg = known(decoded.place().longitude());
        resolvedBy = limited(decoded.place().resolvedBy(), 80);
        placeCandidates = AirReportText.ofCandidates(decoded.place().candidates());
        flightLevel = known(decoded.flightLevel());
        turbulence = AirReportText.ofTurbulence(decoded.turbulence());
        worstIntensity = worst.word();
        worstBasis = worst.basis();
        edrMean = known(decoded.edrMean());
        edrPeak = known(decoded.edrPeak());
        gustMs = known(decoded.gust());
        windFromDeg = known(decoded.windFromDirection());
        windSpeedMs = known(decoded.windSpeed());
        temperatureK = known(decoded.temperature());
        cloud = decoded.cloud();
        aircraftType = limited(decoded.aircraftType(), 40);
        weightClass = limited(decoded.weightClass(), 1);
        remark = limited(mask.over(decoded.remark()), Integer.MAX_VALUE);
        decodingRemarks = AirReportText.ofRemarks(decoded.remarks(), mask);
        attribution = Attribution.UNKNOWN;
        this.identityDigest = identityDigest;
        observedAt = decoded.observedAt();
        this.receivedAt = receivedAt;
    }

    /** The next version of a report, alike but for its attribution. */
    AirReportEntity(AirReportEntity earlier, Attribution attribution, @Nullable String reason, Instant recordedAt) {
        reportId = earlier.reportId;
        version = earlier.version + 1;
        sourceId = earlier.sourceId;
        reportClass = earlier.reportClass;
        nullPolicy = earlier.nullPolicy;
        urgent = earlier.urgent;
        placeText = earlier.placeText;
        latitudeDeg = earlier.latitudeDeg;
        longitudeDeg = earlier.longitudeDeg;
        resolvedBy = earlier.resolvedBy;
        placeCandidates = earlier.placeCandidates;
        flightLevel = earlier.flightLevel;
        turbulence = earlier.turbulence;
        worstIntensity = earlier.worstIntensity;
        worstBasis = earlier.worstBasis;
        edrMean = earlier.edrMean;
        edrPeak = earlier.edrPeak;
        gustMs = earlier.gustMs;
        windFromDeg = earlier.windFromDeg;
        windSpeedMs = earlier.windSpeedMs;
        temperatureK = earlier.temperatureK;
        cloud = earlier.cloud;
        aircraftType = earlier.aircraftType;
        weightClass = earlier.weightClass;
        remark = earlier.remark;
        decodingRemarks = earlier.decodingRemarks;
        this.attribution = attribution;
        attributionReason = reason;
        identityDigest = earlier.identityDigest;
        observedAt = earlier.observedAt;
        receivedAt = earlier.receivedAt;
        this.recordedAt = recordedAt;
    }

    AirReport toReport() {
        return new AirReport(new AirReportId(reportId), version, orEmpty(sourceId), reportClass, nullPolicy, urgent,
                observedAt, receivedAt, recordedAt,
                new Place(placeText, orNaN(latitudeDeg), orNaN(longitudeDeg), orEmpty(resolvedBy), AirReportText.toCandidates(placeCandidates)),
                flightLevel, AirReportText.toTurbulence(turbulence), worstIntensity, worstBasis,
                edrMean, edrPeak, gustMs, windFromDeg, windSpeedMs, temperatureK,
                cloud, orEmpty(aircraftType), orEmpty(weightClass), orEmpty(remark), AirReportText.toRemarks(decodingRemarks),
                attribution, attributionReason);
    }

    private static @Nullable Double known(double value) {
        return Double.isFinite(value) ? value : null;
    }

    private static double orNaN(@Nullable Double value) {
        return value == null ? Double.NaN : value;
    }

    private static @Nullable String limited(String text, int length) {
        if (text.isBlank()) {
            return null;
        }
        return text.length() <= length ? text : text.substring(0, length);
    }

    private static String orEmpty(@Nullable String text) {
        return text == null ? "" : text;
    }
}
