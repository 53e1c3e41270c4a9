package org.shearbook.desk.layer;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.analysis.Ascents;
import org.shearbook.desk.analysis.StabilityState;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.sounding.Kept;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.testing.JetAscents;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.transaction.support.TransactionTemplate;

/** Layers from sounding to sounding, on both databases. */
class LayerHistoryBookRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired LayerHistoryBook histories;
        @Autowired SoundingArchive soundings;
        @Autowired TransactionTemplate transaction;

        private static final Actor FEED = Actor.named("feed", "messages", false, "server");
        private static final Instant NOON = Instant.parse("2029-11-05T12:00:00Z");
        /** The ascents of these tests are released three quarters of an hour before their nominal hour. */
        private static final Instant RELEASED = NOON.minus(Duration.ofMinutes(45));

        private Kept kept(JetAscents ascent, String station, Instant nominalAt) {
            return transaction.execute(status -> soundings.keep(FEED, Ascents.of(ascent, station, nominalAt), "CSV", nominalAt.plus(Duration.ofMinutes(45))));
        }

        private List<LayerHistory> at(String station, Instant moment) {
            return histories.of(station, NOON.minus(Duration.ofDays(3)), moment, AsKnownAt.now());
        }

        @Test
        void theSameAirIsJoinedWithItsTrendAndDecaysUntilTheRichardsonNumberIsOne() {
            kept(JetAscents.KELBRITH_DAY_2_12, "LH-A", NOON);
            kept(JetAscents.KELBRITH_DAY_2_18, "LH-A", NOON.plus(Duration.ofHours(6)));
            List<LayerHistory> found = at("LH-A", RELEASED.plus(Duration.ofHours(7)));
            LayerHistory history = found.stream().filter(one -> one.sightings().size() == 2).findFirst().orElseThrow();
            LayerHistory.Sighting first = history.sightings().get(0);
            LayerHistory.Sighting second = history.last();
            assertThat(first.detected()).isTrue();
            assertThat(first.richardsonNumber()).isLessThan(0.25);
            assertThat(first.richardsonPerHour()).isNull();
            assertThat(second.richardsonNumber()).isBetween(0.25, 1.0);
            assertThat(second.detected()).as("its Ri is no longer below a quarter anywhere").isFalse();
            // Exact: the differences over the six hours between the releases.
            assertThat(second.richardsonPerHour()).isCloseTo((second.richardsonNumber() - first.richardsonNumber()) / 6, within(1e-9));
            assertThat(second.descentRate()).isCloseTo((first.minimumHeight() - second.minimumHeight()) / 21_600, within(1e-9));
            assertThat(history.state()).isEqualTo(StabilityState.DECAYING);
            assertThat(history.evidenceAge()).isEqualTo(Duration.ofHours(1));
            assertThat(history.because()).contains("was below");
        }

        @Test
        void theStateIsThatOfTheMomentAskedForAndUnknownWhenTheEvidenceIsTooOld() {
            kept(JetAscents.KELBRITH_DAY_2_12, "LH-B", NOON);
            kept(JetAscents.KELBRITH_DAY_2_18, "LH-B", NOON.plus(Duration.ofHours(6)));
            assertThat(at("LH-B", RELEASED.minusSeconds(1))).isEmpty();
            assertThat(at("LH-B", RELEASED.plus(Duration.ofHours(1)))).as("the later sounding is not looked at").isNotEmpty()
                    .allSatisfy(history -> assertThat(history.sightings()).hasSize(1)).anySatisfy(history -> assertThat(history.state()).isEqualTo(StabilityState.SUBCRITICAL));
            assertThat(at("LH-B", RELEASED.plus(Duration.ofHours(13)))).isNotEmpty().allSatisfy(history -> {
                assertThat(history.state()).isEqualTo(StabilityState.UNKNOWN);
                assertThat(history.evidenceAge()).isEqualTo(Duration.ofHours(7));
            });
        }

        @Test
        void soundingsMoreThanADayApartAreNotJoinedAndQuietOnesShowNothing() {
            kept(JetAscents.KELBRITH_DAY_2_12, "LH-C", NOON);
            kept(JetAscents.KELBRITH_DAY_2_12, "LH-C", NOON.plus(Duration.ofHours(30)));
            assertThat(at("LH-C", RELEASED.plus(Duration.ofHours(31)))).isNotEmpty().allSatisfy(history -> assertThat(history.sightings()).hasSize(1));
            kept(JetAscents.KELBRITH_DAY_1_00, "LH-D", NOON);
            assertThat(at("LH-D", RELEASED.plus(Duration.ofHours(1)))).isEmpty();
            assertThat(at("LH-nowhere", RELEASED)).isEmpty();
        }

        @Test
        void whatWasNotYetKnownIsNotSeen() {
            Kept sounding = kept(JetAscents.KELBRITH_DAY_2_12, "LH-E", NOON);
            Instant recordedAt = soundings.header(sounding.id(), AsKnownAt.now()).orElseThrow().recordedAt();
            assertThat(histories.of("LH-E", NOON.minus(Duration.ofDays(3)), NOON, new AsKnownAt(recordedAt.minusNanos(1000)))).isEmpty();
        }
    }
}
