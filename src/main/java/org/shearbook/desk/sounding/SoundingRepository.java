package org.shearbook.desk.sounding;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.data.domain.Limit;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface SoundingRepository extends Repository<SoundingEntity, Long> {

    SoundingEntity save(SoundingEntity version);

    @Query(value = "select nextval('sounding_id_seq')", nativeQuery = true)
    long drawId();

    @Query("select max(s.recordedAt) from SoundingEntity s")
    @Nullable Instant lastRecordedAt();

    @Query("""
            select s from SoundingEntity s where s.soundingId = :id and s.version =
              (select max(n.version) from SoundingEntity n where n.soundingId = s.soundingId and n.recordedAt <= :moment)""")
    Optional<SoundingEntity> find(long id, Instant moment);

    @Query("select s from SoundingEntity s where s.soundingId = :id and s.recordedAt <= :moment order by s.version")
    List<SoundingEntity> versions(long id, Instant moment);

    /** Newest versions of one station, withdrawn ones included, in a window. */
    @Query("""
            select s from SoundingEntity s where s.stationId = :station and s.observedAt > :after and s.observedAt < :before and s.version =
              (select max(n.version) from SoundingEntity n where n.soundingId = s.soundingId) order by s.observedAt, s.soundingId""")
    List<SoundingEntity> near(String station, Instant after, Instant before);

    @Query("""
            select s from SoundingEntity s where (:station = '' or s.stationId = :station) and s.observedAt >= :from and s.observedAt < :until
              and s.withdrawn = false and s.version =
              (select max(n.version) from SoundingEntity n where n.soundingId = s.soundingId and n.recordedAt <= :moment)
            order by s.observedAt, s.soundingId""")
    List<SoundingEntity> between(String station, Instant from, Instant until, Instant moment);

    @Query("""
            select s from SoundingEntity s where (:station = '' or s.stationId = :station) and s.observedAt >= :from and s.observedAt < :until
              and (s.observedAt < :lastObservedAt or s.observedAt = :lastObservedAt and s.soundingId < :lastId) and s.version =
              (select max(n.version) from SoundingEntity n where n.soundingId = s.soundingId and n.recordedAt <= :moment)
            order by s.observedAt desc, s.soundingId desc""")
    List<SoundingEntity> newest(String station, Instant from, Instant until, Instant lastObservedAt, long lastId, Instant moment, Limit limit);
}
