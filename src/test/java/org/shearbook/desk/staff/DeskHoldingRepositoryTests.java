package org.shearbook.desk.staff;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Set;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.springframework.beans.factory.annotation.Autowired;

/** One person holds the desk, on both databases. */
class DeskHoldingRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired DeskHoldingBook holdings;
        @Autowired PersonBook people;
        @Autowired AuditTrail audit;

        private static final Actor A = Actor.named("holder-a", "FORECASTER", false, "WS-1");
        private static final Actor B = Actor.named("holder-b", "FORECASTER", false, "WS-2");
        private static final Actor O = Actor.named("looker-o", "OBSERVER", false, "WS-2");

        @BeforeEach
        void thePeopleAreKnownAndTheDeskIsVacant() {
            Actor administrator = Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1");
            if (people.find("holder-a", AsKnownAt.now()).isEmpty()) {
                people.keep(administrator, "holder-a", "Holder A", Set.of(Role.FORECASTER), "p");
                people.keep(administrator, "holder-b", "Holder B", Set.of(Role.FORECASTER), "p");
                people.keep(administrator, "looker-o", "Looker O", Set.of(Role.OBSERVER), "p");
            }
            holdings.find(AsKnownAt.now()).filter(holding -> !holding.isVacant())
                    .ifPresent(holding -> holdings.leave(Actor.named(holding.holder(), "FORECASTER", true, "WS-1")));
        }

        @Test
        void aVacantDeskIsTakenAndTheActIsInTheChain() {
            DeskHolding taken = holdings.take(A);
            assertThat(taken.holder()).isEqualTo("holder-a");
            assertThat(holdings.isHeldBy("holder-a")).isTrue();
            assertThat(audit.ofSubject("desk", "desk", AsKnownAt.now())).last()
                    .satisfies(entry -> {
                        assertThat(entry.act()).isEqualTo("desk taken");
                        assertThat(entry.after()).isEqualTo("holder-a");
                        assertThat(entry.recordedAt()).isEqualTo(taken.since());
                    });
        }

        @Test
        void aHeldDeskIsRefusedToOthersAndLeftOnlyByItsHolder() {
            holdings.take(A);
            assertThatThrownBy(() -> holdings.take(B)).isInstanceOf(DeskNotVacant.class).hasMessageContaining("holder-a");
            assertThatThrownBy(() -> holdings.leave(B)).isInstanceOf(NotHoldingDesk.class);
            assertThat(holdings.leave(A).isVacant()).isTrue();
            assertThat(holdings.take(B).holder()).isEqualTo("holder-b");
        }

        @Test
        void anObserverCannotTakeTheDesk() {
            assertThatThrownBy(() -> holdings.take(O)).isInstanceOf(MayNotHoldDesk.class);
        }

        @Test
        void ofTwoWhoTakeAtOnceOneWins() throws Exception {
            ExecutorService both = Executors.newFixedThreadPool(2);
            List<Future<Object>> tries = both.invokeAll(List.<Callable<Object>>of(() -> attempt(A), () -> attempt(B)));
            both.shutdown();
            List<Object> outcomes = List.of(tries.get(0).get(), tries.get(1).get());
            assertThat(outcomes).filteredOn(DeskHolding.class::isInstance).hasSize(1);
            assertThat(outcomes).filteredOn(DeskNotVacant.class::isInstance).hasSize(1);
        }

        private Object attempt(Actor actor) {
            try {
                return holdings.take(actor);
            } catch (DeskNotVacant refused) {
                return refused;
            }
        }
    }
}
