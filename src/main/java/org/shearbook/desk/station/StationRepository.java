package org.shearbook.desk.station;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface StationRepository extends Repository<StationEntity, Long> {

    StationEntity save(StationEntity version);

    @Query("""
            select s from StationEntity s where s.stationId = :id and s.version =
              (select max(n.version) from StationEntity n where n.stationId = s.stationId and n.recordedAt <= :moment)""")
    Optional<StationEntity> find(String id, Instant moment);

    @Query("""
            select s from StationEntity s where s.version =
              (select max(n.version) from StationEntity n where n.stationId = s.stationId and n.recordedAt <= :moment)
            order by s.stationId""")
    List<StationEntity> findAll(Instant moment);
}
