package org.shearbook.desk.sounding;

import java.util.List;
import java.util.Optional;
import org.springframework.data.repository.Repository;

interface SoundingLevelsRepository extends Repository<SoundingLevelsEntity, Long> {

    SoundingLevelsEntity save(SoundingLevelsEntity levels);

    Optional<SoundingLevelsEntity> findById(long rowId);

    List<SoundingLevelsEntity> findByRowIdIn(List<Long> rowIds);
}
