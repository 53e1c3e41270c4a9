package org.shearbook.desk.analysis;

import java.time.Instant;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface AnalysisRepository extends Repository<AnalysisEntity, Long> {

    @Query("select max(a.version) from AnalysisEntity a where a.soundingId = :soundingId")
    Optional<Integer> newestVersion(long soundingId);

    @Query("""
            select a from AnalysisEntity a where a.soundingId = :soundingId and a.version =
              (select max(n.version) from AnalysisEntity n where n.soundingId = a.soundingId and n.recordedAt <= :moment)""")
    Optional<AnalysisEntity> find(long soundingId, Instant moment);

    @Query("""
            select a from AnalysisEntity a where a.soundingId in :soundingIds and a.version =
              (select max(n.version) from AnalysisEntity n where n.soundingId = a.soundingId and n.recordedAt <= :moment)""")
    List<AnalysisEntity> findAll(Collection<Long> soundingIds, Instant moment);

    /** Without the documents, which lists do not need. */
    @Query("""
            select new org.shearbook.desk.analysis.AnalysisSummary(new org.shearbook.desk.sounding.SoundingId(a.soundingId),
                a.soundingVersion, a.version, a.methodVersion, a.window, a.notAnalysed, a.stabilityState,
                a.lowestRichardson, a.lowestHeight, a.lowestLevel, a.lowestShear, a.tropopauseHeight, a.tropopauseLevel,
                a.greatestWind, a.greatestWindLevel, a.greatestWindAtTop, a.layerCount, a.observedAt, a.receivedAt, a.recordedAt)
            from AnalysisEntity a where a.soundingId in :soundingIds and a.version =
              (select max(n.version) from AnalysisEntity n where n.soundingId = a.soundingId and n.recordedAt <= :moment)""")
    List<AnalysisSummary> summaries(Collection<Long> soundingIds, Instant moment);
}
