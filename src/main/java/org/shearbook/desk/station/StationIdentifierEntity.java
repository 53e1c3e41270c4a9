package org.shearbook.desk.station;

import jakarta.persistence.Entity;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.time.Instant;
import org.springframework.data.domain.Persistable;

@Entity
@Table(name = "station_identifier")
class StationIdentifierEntity implements Persistable<String> {

    @Id
    String identifier;
    String stationId;
    Instant recordedAt;

    protected StationIdentifierEntity() {
    }

    StationIdentifierEntity(String identifier, String stationId, Instant recordedAt) {
        this.identifier = identifier;
        this.stationId = stationId;
        this.recordedAt = recordedAt;
    }

    @Override
    public String getId() {
        return identifier;
    }

    /** Rows are only ever added: a second station with the same identifier must fail, not overwrite. */
    @Override
    public boolean isNew() {
        return true;
    }
}
