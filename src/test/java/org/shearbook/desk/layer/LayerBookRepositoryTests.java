package org.shearbook.desk.layer;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.analysis.Ascents;
import org.shearbook.desk.analysis.StabilityState;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.sounding.Kept;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.testing.JetAscents;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.transaction.support.TransactionTemplate;

/** Layers in a real database, on both. */
class LayerBookRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired LayerBook layers;
        @Autowired SoundingArchive soundings;
        @Autowired TransactionTemplate transaction;
        @Autowired JdbcTemplate jdbc;

        private static final Actor FEED = Actor.named("feed", "messages", false, "server");
        private static final Actor B = Actor.named("forecaster-b", "FORECASTER", true, "WS-1");
        private static final Instant NOON = Instant.parse("2030-11-05T12:00:00Z");

        private Kept kept(DecodedSounding decoded) {
            return transaction.execute(status -> soundings.keep(FEED, decoded, "CSV", NOON.plus(Duration.ofMinutes(45))));
        }

        @Test
        void aSubcriticalSoundingGivesItsLayerWithTheMomentTheBalloonPassedIt() {
            Kept sounding = kept(Ascents.of(JetAscents.KELBRITH_DAY_2_12, "LA-A", NOON));
            List<Layer> found = layers.ofSounding(sounding.id(), AsKnownAt.now());
            Layer layer = found.get(found.size() - 1);
            assertThat(layer.stationId()).isEqualTo("LA-A");
            assertThat(layer.minRichardson()).isLessThan(0.25);
            assertThat(layer.window()).isEqualTo(200);
            assertThat(layer.minRichardsonFlightLevel()).isCloseTo(291, within(4.0));
            assertThat(layer.state()).isEqualTo(StabilityState.SUBCRITICAL);
            assertThat(layer.ruleBasis()).isEqualTo("rule, not solved");
            // Released at 1115Z, 5 m/s from 50 m.
            double middle = (layer.base() + layer.top()) / 2;
            assertThat(Duration.between(NOON.minus(Duration.ofMinutes(45)), layer.observedAt()).toSeconds()).isCloseTo((long) ((middle - 50) / 5), within(2L));
            assertThat(layers.find(layer.id(), AsKnownAt.now())).hasValue(layer);
            assertThat(layers.find(layer.id(), new AsKnownAt(layer.recordedAt().minusNanos(1000)))).isEmpty();
            assertThat(layers.between(layer.observedAt(), layer.observedAt().plusSeconds(1), AsKnownAt.now())).contains(layer);
            assertThat(layers.newest("LA-A", NOON.minus(Duration.ofDays(1)), NOON.plus(Duration.ofDays(1)), null, AsKnownAt.now(), 10))
                    .containsExactlyInAnyOrderElementsOf(found);
        }

        @Test
        void aSteadySoundingHasNoLayer() {
            Kept sounding = kept(Ascents.of(JetAscents.KELBRITH_DAY_1_00, "LA-B", NOON));
            assertThat(layers.ofSounding(sounding.id(), AsKnownAt.now())).isEmpty();
            assertThat(layers.ofSoundings(List.of(sounding.id()), AsKnownAt.now())).isEmpty();
            assertThat(layers.ofSoundings(List.of(), AsKnownAt.now())).isEmpty();
        }

        @Test
        void aCorrectionThatStillHasTheLayerIsItsNextVersionAndOneThatHasNotEndsIt() {
            Kept first = kept(Ascents.of(JetAscents.DUNVEERY_DAY_2_00, "LA-C", NOON));
            Layer before = highest(first);
            Kept second = kept(corrected(Ascents.of(JetAscents.KELBRITH_DAY_2_12, "LA-C", NOON), "CCA"));
            assertThat(second.id()).as("a correction of the same ascent").isEqualTo(first.id());
            Layer after = highest(second);
            assertThat(after.id()).isEqualTo(before.id());
            assertThat(after.version()).isEqualTo(2);
            assertThat(after.soundingVersion()).isEqualTo(2);
            assertThat(layers.ofSounding(first.id(), new AsKnownAt(before.recordedAt()))).contains(before);
            kept(corrected(Ascents.of(JetAscents.KELBRITH_DAY_1_00, "LA-C", NOON), "CCB"));
            assertThat(layers.ofSounding(first.id(), AsKnownAt.now())).isEmpty();
            assertThat(layers.find(before.id(), AsKnownAt.now()).orElseThrow().standing()).isFalse();
            assertThat(layers.find(before.id(), new AsKnownAt(after.recordedAt())).orElseThrow()).isEqualTo(after);
        }

        @Test
        void aWithdrawnSoundingTakesItsLayersWithIt() {
            Kept sounding = kept(Ascents.of(JetAscents.OSSENFELL_DAY_2_12, "LA-D", NOON));
            Layer layer = highest(sounding);
            soundings.withdraw(B, sounding.id(), "wind sensor failed");
            assertThat(layers.ofSounding(sounding.id(), AsKnownAt.now())).isEmpty();
            assertThat(layers.ofSounding(sounding.id(), new AsKnownAt(layer.recordedAt()))).contains(layer);
        }

        @Test
        void theStateIsUnknownOnceTheEvidenceIsTooOld() {
            assertThat(layers.stateAt(StabilityState.SUBCRITICAL, NOON, NOON.plus(layers.evidenceLasts()))).isEqualTo(StabilityState.SUBCRITICAL);
            assertThat(layers.stateAt(StabilityState.SUBCRITICAL, NOON, NOON.plus(layers.evidenceLasts()).plusSeconds(1))).isEqualTo(StabilityState.UNKNOWN);
        }

        @Test
        void whatIsKeptCanNeitherBeChangedNorDeleted() {
            for (String act : List.of("delete from layer_version", "update layer_version set standing = false", "truncate table layer_version")) {
                assertThatThrownBy(() -> jdbc.execute(act)).as(act).isInstanceOf(DataAccessException.class);
            }
        }

        private Layer highest(Kept sounding) {
            List<Layer> found = layers.ofSounding(sounding.id(), AsKnownAt.now());
            return found.get(found.size() - 1);
        }

        private static DecodedSounding corrected(DecodedSounding sounding, String correction) {
            return new DecodedSounding(sounding.stationId(), sounding.latitude(), sounding.longitude(), sounding.elevation(), sounding.nominalAt(),
                    sounding.launchedAt(), Set.of(), correction, "", sounding.levels(), sounding.raw() + correction, 1, List.of());
        }
    }
}
