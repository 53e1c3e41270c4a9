package org.shearbook.desk.staff;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface PersonRepository extends Repository<PersonEntity, Long> {

    PersonEntity save(PersonEntity version);

    @Query("""
            select p from PersonEntity p where p.username = :username and p.version =
              (select max(n.version) from PersonEntity n where n.username = p.username and n.recordedAt <= :moment)""")
    Optional<PersonEntity> find(String username, Instant moment);

    @Query("""
            select p from PersonEntity p where p.version =
              (select max(n.version) from PersonEntity n where n.username = p.username and n.recordedAt <= :moment)
            order by p.username""")
    List<PersonEntity> findAll(Instant moment);
}
