package org.shearbook.desk.airreport;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.springframework.data.domain.Limit;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface AirReportRepository extends Repository<AirReportEntity, Long> {

    /** Draws the ids of so many new reports. */
    @Query(nativeQuery = true, value = """
            with recursive wanted(n) as (select 1 union all select n + 1 from wanted where n < :count)
            select nextval('air_report_seq') from wanted""")
    List<Long> draw(int count);

    AirReportEntity save(AirReportEntity version);

    @Query("""
            select r from AirReportEntity r where r.reportId = :id and r.version =
              (select max(n.version) from AirReportEntity n where n.reportId = r.reportId and n.recordedAt <= :moment)""")
    Optional<AirReportEntity> find(long id, Instant moment);

    @Query("select r from AirReportEntity r where r.reportId = :id and r.recordedAt <= :moment order by r.version")
    List<AirReportEntity> versions(long id, Instant moment);

    @Query("""
            select r from AirReportEntity r where r.observedAt >= :from and r.observedAt < :until and r.version =
              (select max(n.version) from AirReportEntity n where n.reportId = r.reportId and n.recordedAt <= :moment)
            order by r.observedAt, r.reportId""")
    List<AirReportEntity> between(Instant from, Instant until, Instant moment);

    /** Of one window in time and up to two of longitude, since an area may lie on the date line. */
    @Query("""
            select r from AirReportEntity r where r.observedAt >= :from and r.observedAt < :until
              and r.latitudeDeg between :south and :north
              and (r.longitudeDeg between :west and :east or r.longitudeDeg between :otherWest and :otherEast)
              and r.version =
              (select max(n.version) from AirReportEntity n where n.reportId = r.reportId and n.recordedAt <= :moment)
            order by r.observedAt, r.reportId""")
    List<AirReportEntity> near(Instant from, Instant until, double south, double north, double west, double east, double otherWest, double otherEast,
            Instant moment);

    /** Newest first, from just before a place in that order on. */
    @Query("""
            select r from AirReportEntity r where r.observedAt >= :from and r.observedAt < :until
              and (r.observedAt < :beforeObserved or r.observedAt = :beforeObserved and r.reportId < :beforeId)
              and r.version =
              (select max(n.version) from AirReportEntity n where n.reportId = r.reportId and n.recordedAt <= :moment)
            order by r.observedAt desc, r.reportId desc""")
    List<AirReportEntity> newest(Instant from, Instant until, Instant beforeObserved, long beforeId, Instant moment, Limit limit);
}
