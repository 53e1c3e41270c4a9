package org.shearbook.desk.forecast;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.springframework.data.jpa.repository.NativeQuery;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface ForecastDraftRepository extends Repository<ForecastDraftEntity, Long> {

    String NEWEST = "d.version = (select max(n.version) from ForecastDraftEntity n where n.forecastId = d.forecastId and n.recordedAt <= :moment)";

    ForecastDraftEntity save(ForecastDraftEntity version);

    @Query("select d from ForecastDraftEntity d where d.forecastId = :id and " + NEWEST)
    Optional<ForecastDraftEntity> find(long id, Instant moment);

    @Query("select d from ForecastDraftEntity d where d.state = org.shearbook.desk.forecast.ForecastDraft.State.OPEN and " + NEWEST
            + " order by d.recordedAt desc")
    List<ForecastDraftEntity> open(Instant moment);

    /** One sequence gives the identifiers of forecasts and of the rows of both tables. */
    @NativeQuery("select nextval('forecast_seq')")
    long nextId();
}
