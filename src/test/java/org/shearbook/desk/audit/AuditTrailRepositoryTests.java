package org.shearbook.desk.audit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.staff.PersonBook;
import org.shearbook.desk.staff.Role;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.shearbook.testing.SettableClock;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.transaction.support.TransactionTemplate;

/** The chain in a real database, on both. */
class AuditTrailRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired AuditTrail audit;
        @Autowired PersonBook people;
        @Autowired JdbcTemplate jdbc;
        @Autowired TransactionTemplate transaction;
        @Autowired SettableClock clock;

        private static final Actor ADMINISTRATOR = Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1");

        @Test
        void anActAndItsEntryAreKeptTogetherOrNotAtAll() {
            long before = entries();
            assertThatThrownBy(() -> transaction.executeWithoutResult(status -> {
                people.keep(ADMINISTRATOR, "half-kept", "Half Kept", Set.of(Role.OBSERVER), "a long enough passphrase");
                throw new IllegalStateException("power failed");
            })).hasMessage("power failed");
            assertThat(entries()).isEqualTo(before);
            assertThat(people.find("half-kept", AsKnownAt.now())).isEmpty();
            people.keep(ADMINISTRATOR, "wholly-kept", "Wholly Kept", Set.of(Role.OBSERVER), "a long enough passphrase");
            assertThat(entries()).isEqualTo(before + 1);
        }

        @Test
        void theDesksOwnUserCanNeitherChangeNorDeleteWhatIsKept() {
            people.keep(ADMINISTRATOR, "kept", "Kept", Set.of(Role.OBSERVER), "a long enough passphrase");
            for (String table : List.of("audit_entry", "access_entry", "person_version", "desk_holding")) {
                assertThatThrownBy(() -> jdbc.execute("delete from " + table)).as("delete from " + table).isInstanceOf(DataAccessException.class);
                assertThatThrownBy(() -> jdbc.execute("truncate table " + table)).as("truncate " + table).isInstanceOf(DataAccessException.class);
                assertThatThrownBy(() -> jdbc.execute("update " + table + " set recorded_at = recorded_at")).as("update " + table)
                        .isInstanceOf(DataAccessException.class);
                assertThatThrownBy(() -> jdbc.execute("drop table " + table)).as("drop " + table).isInstanceOf(DataAccessException.class);
            }
        }

        @Test
        void recordedAtNeverRunsBackwardsWhenTheClockDoes() {
            Instant first = people.keep(ADMINISTRATOR, "steady", "Steady", Set.of(Role.OBSERVER), "a long enough passphrase").recordedAt();
            clock.advance(Duration.ofHours(-2));
            try {
                Instant second = people.keep(ADMINISTRATOR, "steady", "Steady", Set.of(Role.OBSERVER), "another passphrase").recordedAt();
                assertThat(second).isAfter(first);
                assertThat(people.find("steady", new AsKnownAt(first)).orElseThrow().version()).isEqualTo(1);
                assertThat(people.find("steady", new AsKnownAt(first.minusNanos(1000)))).isEmpty();
                assertThat(people.find("steady", AsKnownAt.now()).orElseThrow().version()).isEqualTo(2);
            } finally {
                clock.set(SettableClock.START);
            }
        }

        @Test
        void manyWritersMakeOneUnbrokenChain() throws Exception {
            long before = entries();
            ExecutorService writers = Executors.newFixedThreadPool(6);
            List<Future<?>> running = new ArrayList<>();
            for (int i = 0; i < 60; i++) {
                String username = "writer-" + i;
                running.add(writers.submit(() -> people.keep(ADMINISTRATOR, username, username, Set.of(Role.OBSERVER), "p")));
            }
            for (Future<?> one : running) {
                one.get(60, TimeUnit.SECONDS);
            }
            writers.shutdown();
            assertThat(entries()).isEqualTo(before + 60);
            AuditTrail.Integrity integrity = audit.integrity();
            assertThat(integrity.whatIsBroken()).isNull();
            List<Instant> moments = jdbc.queryForList("select recorded_at from audit_entry order by entry_sequence", java.time.OffsetDateTime.class)
                    .stream().map(java.time.OffsetDateTime::toInstant).toList();
            for (int i = 1; i < moments.size(); i++) {
                assertThat(moments.get(i)).as("entry %d", i + 1).isAfter(moments.get(i - 1));
            }
        }

        private long entries() {
            return jdbc.queryForObject("select count(*) from audit_entry", Long.class);
        }
    }
}
