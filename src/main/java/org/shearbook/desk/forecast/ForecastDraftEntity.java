package org.shearbook.desk.forecast;

import jakarta.persistence.Entity;
import jakarta.persistence.EnumType;
import jakarta.persistence.Enumerated;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.time.Instant;
import java.util.Map;
import org.hibernate.annotations.JdbcTypeCode;
import org.hibernate.type.SqlTypes;
import org.jspecify.annotations.Nullable;

@Entity
@Table(name = "forecast_draft")
class ForecastDraftEntity {

    @Id
    Long rowId;
    long forecastId;
    int version;
    @Enumerated(EnumType.STRING)
    ForecastDraft.Purpose purpose;
    @Nullable Integer basedOnVersion;
    @Enumerated(EnumType.STRING)
    ForecastDraft.State state;
    String author;
    @JdbcTypeCode(SqlTypes.JSON)
    Map<String, String> fields;
    @JdbcTypeCode(SqlTypes.JSON)
    Map<String, String> prefilled;
    String reason;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected ForecastDraftEntity() {
    }

    ForecastDraftEntity(long rowId, ForecastDraft draft) {
        this.rowId = rowId;
        forecastId = draft.id().value();
        version = draft.version();
        purpose = draft.purpose();
        basedOnVersion = draft.basedOn();
        state = draft.state();
        author = draft.author();
        fields = draft.fields();
        prefilled = draft.prefilled();
        reason = draft.reason();
        observedAt = draft.recordedAt();
        receivedAt = draft.recordedAt();
        recordedAt = draft.recordedAt();
    }

    ForecastDraft toDraft() {
        return new ForecastDraft(new ForecastId(forecastId), version, purpose, basedOnVersion, state, author, fields, prefilled, reason, recordedAt);
    }
}
