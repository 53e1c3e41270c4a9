package org.shearbook.desk.station;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.SequenceGenerator;
import jakarta.persistence.Table;
import java.time.Instant;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;

@Entity
@Table(name = "station_version")
class StationEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "station_version_seq")
    @SequenceGenerator(name = "station_version_seq", sequenceName = "station_version_seq", allocationSize = 50)
    Long rowId;
    String stationId;
    int version;
    String name;
    double latitudeDeg;
    double longitudeDeg;
    @Column(name = "elevation_m")
    @Nullable Double elevationM;
    String identifiers;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected StationEntity() {
    }

    StationEntity(Station station, Instant receivedAt) {
        stationId = station.id();
        version = station.version();
        name = station.name();
        latitudeDeg = station.latitude();
        longitudeDeg = station.longitude();
        elevationM = Double.isNaN(station.elevation()) ? null : station.elevation();
        identifiers = String.join(" ", station.identifiers());
        observedAt = receivedAt;
        this.receivedAt = receivedAt;
        recordedAt = station.recordedAt();
    }

    Station toStation() {
        Set<String> names = new LinkedHashSet<>(List.of(identifiers.split(" ")));
        return new Station(stationId, name, latitudeDeg, longitudeDeg, elevationM == null ? Double.NaN : elevationM, names, version, recordedAt);
    }
}
