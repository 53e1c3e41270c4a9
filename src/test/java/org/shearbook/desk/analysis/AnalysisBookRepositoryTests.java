package org.shearbook.desk.analysis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.sounding.Sounding;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.testing.JetAscents;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.transaction.support.TransactionTemplate;

/** Analyses in a real database, on both. */
class AnalysisBookRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired AnalysisBook analyses;
        @Autowired SoundingArchive soundings;
        @Autowired TransactionTemplate transaction;
        @Autowired JdbcTemplate jdbc;

        private static final Actor FEED = Actor.named("feed", "messages", false, "server");

        private SoundingId kept(DecodedSounding decoded) {
            return transaction.execute(status -> soundings.keep(FEED, decoded, "CSV", Instant.parse("2031-02-01T01:00:00Z"))).id();
        }

        @Test
        void aSoundingIsAnalysedInTheTransactionThatKeepsIt() {
            SoundingId id = kept(Ascents.of(JetAscents.KELBRITH_DAY_2_12, "AN-A", Instant.parse("2031-02-01T00:00:00Z")));
            Analysis analysis = analyses.of(id, AsKnownAt.now()).orElseThrow();
            Sounding sounding = soundings.find(id, AsKnownAt.now()).orElseThrow();
            assertThat(analysis.version()).isEqualTo(1);
            assertThat(analysis.summary().soundingVersion()).isEqualTo(1);
            assertThat(analysis.summary().recordedAt()).isEqualTo(sounding.recordedAt());
            assertThat(analysis.summary().methodVersion()).isEqualTo(AnalysisBook.METHOD_VERSION);
            assertThat(analysis.summary().window()).isEqualTo(200);
            assertThat(analysis.summary().state()).isEqualTo(StabilityState.SUBCRITICAL);
            assertThat(analysis.result().orElseThrow()).isEqualTo(analyses.compute(sounding, 200).document());
            assertThat(analysis.result().orElseThrow().levels()).hasSameSizeAs(sounding.levels());
            assertThat(analyses.of(id, new AsKnownAt(sounding.recordedAt().minusNanos(1000)))).isEmpty();
        }

        @Test
        void aSoundingThatCannotBeAnalysedIsKeptWithTheReason() {
            SoundingId id = kept(Ascents.almostWithoutWind(JetAscents.KELBRITH_DAY_2_12, "AN-B", Instant.parse("2031-02-01T00:00:00Z")));
            Analysis analysis = analyses.of(id, AsKnownAt.now()).orElseThrow();
            assertThat(analysis.result()).isEmpty();
            assertThat(analysis.summary().notAnalysed()).contains("wind");
            assertThat(analysis.summary().state()).isEqualTo(StabilityState.UNKNOWN);
            assertThat(soundings.find(id, AsKnownAt.now())).isPresent();
            assertThat(analyses.columns(List.of(id), AsKnownAt.now())).isEmpty();
        }

        @Test
        void listsReadSummariesAndDisplaysReadColumns() {
            SoundingId subcritical = kept(Ascents.of(JetAscents.DUNVEERY_DAY_2_00, "AN-C", Instant.parse("2031-02-01T00:00:00Z")));
            SoundingId steady = kept(Ascents.of(JetAscents.KELBRITH_DAY_1_00, "AN-C", Instant.parse("2031-02-02T00:00:00Z")));
            var summaries = analyses.summaries(List.of(subcritical, steady, new SoundingId(-5)), AsKnownAt.now());
            assertThat(summaries).containsOnlyKeys(subcritical, steady);
            assertThat(summaries.get(subcritical).lowestFlightLevel()).isCloseTo(299, within(3.0));
            assertThat(summaries.get(subcritical)).isEqualTo(analyses.of(subcritical, AsKnownAt.now()).orElseThrow().summary());
            assertThat(summaries.get(steady).state()).isEqualTo(StabilityState.STEADY);
            assertThat(analyses.summaries(List.of(), AsKnownAt.now())).isEmpty();
            AnalysisColumn column = analyses.columns(List.of(subcritical, steady), AsKnownAt.now()).get(subcritical);
            assertThat(column.size()).isGreaterThan(400);
            assertThat(column.height()).isSorted().hasSize(column.size());
            assertThat(column.flightLevel()).isSorted().doesNotHaveDuplicates();
            assertThat(column.elapsed()[100]).as("the balloon rises at 5 m/s in this ascent").isCloseTo((column.height()[100] - 50) / 5, within(0.1));
            assertThat(column.richardson()).hasSize(column.size());
        }

        @Test
        void whatIsKeptCanNeitherBeChangedNorDeleted() {
            for (String act : List.of("delete from analysis_version", "update analysis_version set version = version", "truncate table analysis_version")) {
                assertThatThrownBy(() -> jdbc.execute(act)).as(act).isInstanceOf(DataAccessException.class);
            }
        }

        @Test
        void aWindowThatIsNotOfferedIsRefusedWithThoseThatAre() {
            SoundingId id = kept(Ascents.of(JetAscents.KELBRITH_DAY_1_00, "AN-D", Instant.parse("2031-02-01T00:00:00Z")));
            Sounding sounding = soundings.find(id, AsKnownAt.now()).orElseThrow();
            assertThatThrownBy(() -> analyses.compute(sounding, 80)).isInstanceOf(WindowNotOffered.class).hasMessageContaining("60, 100, 150, 200, 300, 600");
        }
    }
}
