package org.shearbook.desk.station;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface FixListRepository extends Repository<FixListEntity, Long> {

    FixListEntity saveAndFlush(FixListEntity version);

    @Query("""
            select l from FixListEntity l where l.listName = :name and l.version =
              (select max(n.version) from FixListEntity n where n.listName = l.listName and n.recordedAt <= :moment)""")
    Optional<FixListEntity> find(String name, Instant moment);

    @Query("""
            select l from FixListEntity l where l.version =
              (select max(n.version) from FixListEntity n where n.listName = l.listName and n.recordedAt <= :moment)
            order by l.listName""")
    List<FixListEntity> findAll(Instant moment);
}
