package org.shearbook.desk.staff;

import java.time.Instant;
import java.util.Optional;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface DeskHoldingRepository extends Repository<DeskHoldingEntity, Long> {

    DeskHoldingEntity save(DeskHoldingEntity version);

    @Query("select h from DeskHoldingEntity h where h.version = (select max(n.version) from DeskHoldingEntity n where n.recordedAt <= :moment)")
    Optional<DeskHoldingEntity> find(Instant moment);
}
