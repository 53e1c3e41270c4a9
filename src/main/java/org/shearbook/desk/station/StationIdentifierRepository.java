package org.shearbook.desk.station;

import java.util.List;
import java.util.Optional;
import org.springframework.data.repository.Repository;

interface StationIdentifierRepository extends Repository<StationIdentifierEntity, String> {

    StationIdentifierEntity save(StationIdentifierEntity identifier);

    Optional<StationIdentifierEntity> findById(String identifier);

    List<StationIdentifierEntity> findAll();
}
