package org.shearbook.desk.audit;

import java.time.Instant;
import java.util.List;
import java.util.stream.Stream;
import org.springframework.data.domain.Limit;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface AuditEntryRepository extends Repository<AuditEntryEntity, Long> {

    @Query("select e from AuditEntryEntity e order by e.sequence")
    Stream<AuditEntryEntity> streamAll();

    /** Empty texts ask for nothing in particular. */
    @Query("""
            select e from AuditEntryEntity e
            where e.recordedAt <= :moment and e.sequence < :before and e.recordedAt >= :from and e.recordedAt <= :until
              and (:actor = '' or e.actor = :actor) and (:kind = '' or e.subjectKind = :kind) and (:id = '' or e.subjectId = :id)
            order by e.sequence desc""")
    List<AuditEntryEntity> newest(Instant moment, long before, Instant from, Instant until, String actor, String kind, String id, Limit limit);

    @Query("select distinct e.subjectKind from AuditEntryEntity e order by e.subjectKind")
    List<String> kinds();

    @Query("select e from AuditEntryEntity e where e.subjectKind = :kind and e.subjectId = :id and e.recordedAt <= :moment order by e.sequence")
    List<AuditEntryEntity> ofSubject(String kind, String id, Instant moment);

    long count();
}
