package org.shearbook.desk.forecast;

import jakarta.persistence.Column;
import jakarta.persistence.CollectionTable;
import jakarta.persistence.ElementCollection;
import jakarta.persistence.Embeddable;
import jakarta.persistence.Entity;
import jakarta.persistence.EnumType;
import jakarta.persistence.Enumerated;
import jakarta.persistence.FetchType;
import jakarta.persistence.Id;
import jakarta.persistence.JoinColumn;
import jakarta.persistence.OrderColumn;
import jakarta.persistence.Table;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.hibernate.annotations.BatchSize;
import org.jspecify.annotations.Nullable;

@Entity
@Table(name = "forecast_version")
class ForecastVersionEntity {

    @Id
    Long rowId;
    long forecastId;
    int slfNumber;
    int version;
    @Enumerated(EnumType.STRING)
    Forecast.State state;
    String productText;
    String author;
    @Nullable String reason;
    Instant issuedAt;

    @Enumerated(EnumType.STRING)
    Intensity intensity;
    @Enumerated(EnumType.STRING)
    Conditions conditions;
    @Nullable Instant reportedAt;
    String placeName;
    @Nullable String centreName;
    @Nullable Double centreLatitudeDeg;
    @Nullable Double centreLongitudeDeg;
    @Nullable Integer radiusNm;
    @Column(name = "corner_latitudes_deg")
    double @Nullable [] cornerLatitudesDeg;
    @Column(name = "corner_longitudes_deg")
    double @Nullable [] cornerLongitudesDeg;
    int baseFlightLevel;
    int topFlightLevel;
    Instant validFrom;
    Instant validUntil;
    int probabilityPercent;
    String movingToward;
    int movingKt;
    @Enumerated(EnumType.STRING)
    StrengthChange strengthChange;
    String wouldChange;
    @Nullable String secondLookBy;
    @Nullable String aloneReason;
    @ElementCollection(fetch = FetchType.EAGER)
    @CollectionTable(name = "forecast_evidence", joinColumns = @JoinColumn(name = "forecast_row_id"))
    @OrderColumn(name = "list_index")
    @BatchSize(size = 100)
    List<EvidenceRow> evidence = new ArrayList<>();

    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected ForecastVersionEntity() {
    }

    ForecastVersionEntity(long rowId, Forecast forecast) {
        ForecastContent content = forecast.content();
        this.rowId = rowId;
        forecastId = forecast.id().value();
        slfNumber = forecast.number();
        version = forecast.version();
        state = forecast.state();
        productText = forecast.text();
        author = forecast.author();
        reason = forecast.reason();
        issuedAt = forecast.issuedAt();
        intensity = content.intensity();
        conditions = content.conditions();
        reportedAt = content.reportedAt();
        placeName = content.placeName();
        if (content.area() instanceof Area.Radius round) {
            centreName = round.centre();
            centreLatitudeDeg = round.latitude();
            centreLongitudeDeg = round.longitude();
            radiusNm = round.nauticalMiles();
        } else if (content.area() instanceof Area.Corners many) {
            cornerLatitudesDeg = many.corners().stream().mapToDouble(Area.Corner::latitude).toArray();
            cornerLongitudesDeg = many.corners().stream().mapToDouble(Area.Corner::longitude).toArray();
        }
        baseFlightLevel = content.baseFlightLevel();
        topFlightLevel = content.topFlightLevel();
        validFrom = content.validFrom();
        validUntil = content.validUntil();
        probabilityPercent = content.probabilityPercent();
        movingToward = content.movement().toward();
        movingKt = content.movement().speed();
        strengthChange = content.change();
        wouldChange = content.wouldChange();
        secondLookBy = content.secondLookBy();
        aloneReason = content.aloneReason();
        content.evidence().forEach(ticked -> evidence.add(new EvidenceRow(ticked)));
        observedAt = content.validFrom();
        receivedAt = forecast.recordedAt();
        recordedAt = forecast.recordedAt();
    }

    Forecast toForecast() {
        Area area = cornerLatitudesDeg == null
                ? new Area.Radius(centreName == null ? "" : centreName, centreLatitudeDeg, centreLongitudeDeg, radiusNm)
                : new Area.Corners(IntStream.range(0, cornerLatitudesDeg.length)
                        .mapToObj(i -> new Area.Corner(cornerLatitudesDeg[i], cornerLongitudesDeg[i])).toList());
        ForecastContent content = new ForecastContent(intensity, conditions, reportedAt, placeName, area, baseFlightLevel, topFlightLevel,
                validFrom, validUntil, probabilityPercent, new Movement(movingToward, movingKt), strengthChange,
                evidence.stream().map(EvidenceRow::toEvidence).toList(), wouldChange, secondLookBy, aloneReason);
        return new Forecast(new ForecastId(forecastId), slfNumber, version, state, content, productText, author, reason, issuedAt, recordedAt);
    }

    @Embeddable
    static class EvidenceRow {

        @Enumerated(EnumType.STRING)
        Evidence.Kind subjectKind;
        long subjectId;
        String label;

        protected EvidenceRow() {
        }

        EvidenceRow(Evidence evidence) {
            subjectKind = evidence.kind();
            subjectId = evidence.id();
            label = evidence.label();
        }

        Evidence toEvidence() {
            return new Evidence(subjectKind, subjectId, label);
        }
    }
}
