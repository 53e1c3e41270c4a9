package org.shearbook.desk.layer;

import java.time.Instant;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import org.springframework.data.domain.Limit;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface LayerRepository extends Repository<LayerEntity, Long> {

    @Query(nativeQuery = true, value = "select nextval('layer_seq')")
    long drawId();

    @Query("""
            select l from LayerEntity l where l.layerId = :id and l.version =
              (select max(n.version) from LayerEntity n where n.layerId = l.layerId and n.recordedAt <= :moment)""")
    Optional<LayerEntity> find(long id, Instant moment);

    @Query("""
            select l from LayerEntity l where l.soundingId in :soundingIds and l.standing = true and l.version =
              (select max(n.version) from LayerEntity n where n.layerId = l.layerId and n.recordedAt <= :moment)
            order by l.soundingId, l.base""")
    List<LayerEntity> standingOf(Collection<Long> soundingIds, Instant moment);

    @Query("""
            select l from LayerEntity l where l.observedAt >= :from and l.observedAt < :until and l.standing = true and l.version =
              (select max(n.version) from LayerEntity n where n.layerId = l.layerId and n.recordedAt <= :moment)
            order by l.observedAt, l.layerId""")
    List<LayerEntity> between(Instant from, Instant until, Instant moment);

    /** Newest first, from just before a place in that order on; the empty station is every station. */
    @Query("""
            select l from LayerEntity l where l.observedAt >= :from and l.observedAt < :until and l.standing = true
              and (:stationId = '' or l.stationId = :stationId)
              and (l.observedAt < :beforeObserved or l.observedAt = :beforeObserved and l.layerId < :beforeId)
              and l.version =
              (select max(n.version) from LayerEntity n where n.layerId = l.layerId and n.recordedAt <= :moment)
            order by l.observedAt desc, l.layerId desc""")
    List<LayerEntity> newest(String stationId, Instant from, Instant until, Instant beforeObserved, long beforeId, Instant moment, Limit limit);
}
