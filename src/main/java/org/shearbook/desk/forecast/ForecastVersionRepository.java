package org.shearbook.desk.forecast;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.springframework.data.domain.Limit;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface ForecastVersionRepository extends Repository<ForecastVersionEntity, Long> {

    String NEWEST = "f.version = (select max(n.version) from ForecastVersionEntity n where n.forecastId = f.forecastId and n.recordedAt <= :moment)";

    ForecastVersionEntity save(ForecastVersionEntity version);

    @Query("select f from ForecastVersionEntity f where f.forecastId = :id and " + NEWEST)
    Optional<ForecastVersionEntity> find(long id, Instant moment);

    @Query("select f from ForecastVersionEntity f where f.forecastId = :id and f.recordedAt <= :moment order by f.version")
    List<ForecastVersionEntity> versions(long id, Instant moment);

    @Query("select f from ForecastVersionEntity f where f.validUntil > :at and f.state <> org.shearbook.desk.forecast.Forecast.State.CANCELLED and "
            + NEWEST + " order by f.validUntil, f.slfNumber")
    List<ForecastVersionEntity> live(Instant at, Instant moment);

    @Query("select f from ForecastVersionEntity f where (f.validUntil <= :at or f.state = org.shearbook.desk.forecast.Forecast.State.CANCELLED) "
            + "and f.slfNumber < :below and " + NEWEST + " order by f.slfNumber desc")
    List<ForecastVersionEntity> ended(Instant at, int below, Instant moment, Limit limit);

    @Query("select f from ForecastVersionEntity f where f.validFrom < :until and f.validUntil > :from and f.recordedAt <= :moment order by f.slfNumber, f.version")
    List<ForecastVersionEntity> between(Instant from, Instant until, Instant moment);

    @Query("select f from ForecastVersionEntity f where f.validFrom < :until and f.validUntil > :from and f.slfNumber > :after and "
            + NEWEST + " order by f.slfNumber")
    List<ForecastVersionEntity> page(Instant from, Instant until, int after, Instant moment, Limit limit);

    @Query("select coalesce(max(f.slfNumber), 0) from ForecastVersionEntity f")
    int highestNumber();
}
