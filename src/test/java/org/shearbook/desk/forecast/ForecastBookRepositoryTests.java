package org.shearbook.desk.forecast;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.NotHoldingDesk;
import org.shearbook.desk.staff.PersonBook;
import org.shearbook.desk.staff.Role;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.shearbook.testing.SettableClock;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;

/** Forecasts in a real database, on both. */
class ForecastBookRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired ForecastBook forecasts;
        @Autowired DeskHoldingBook holdings;
        @Autowired PersonBook people;
        @Autowired AuditTrail audit;
        @Autowired JdbcTemplate jdbc;
        @Autowired SettableClock clock;

        private static final Actor B = Actor.named("slf-b", "FORECASTER", true, "WS-1");
        private static final Actor C = Actor.named("slf-c", "FORECASTER", false, "WS-2");

        @BeforeEach
        void bHoldsTheDesk() {
            Actor administrator = Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1");
            if (people.find("slf-b", AsKnownAt.now()).isEmpty()) {
                people.keep(administrator, "slf-b", "Forecaster B", Set.of(Role.FORECASTER), "p");
                people.keep(administrator, "slf-c", "Forecaster C", Set.of(Role.FORECASTER), "p");
                people.keep(administrator, "slf-o", "Observer O", Set.of(Role.OBSERVER), "p");
            }
            vacate();
            holdings.take(B);
        }

        @AfterEach
        void theClockGoesBack() {
            clock.set(SettableClock.START);
            vacate();
        }

        private void vacate() {
            holdings.find(AsKnownAt.now()).filter(holding -> !holding.isVacant())
                    .ifPresent(holding -> holdings.leave(Actor.named(holding.holder(), "FORECASTER", true, "WS-1")));
        }

        @Test
        void anIssuedForecastReadsBackWholeAndItsTextIsInTheChain() {
            ForecastContent content = ForecastSamples.withEvidence(ForecastSamples.severe(clock.instant(), "slf-c", null),
                    List.of(new Evidence(Evidence.Kind.LAYER, 3, "layer A"), new Evidence(Evidence.Kind.AIR_REPORT, 5, "1142Z SEV")));
            Forecast issued = issued(content);
            assertThat(forecasts.find(issued.id(), AsKnownAt.now())).contains(issued);
            assertThat(issued.content()).isEqualTo(content);
            assertThat(issued.version()).isEqualTo(1);
            assertThat(issued.text()).startsWith("SHEAR-LAYER FORECAST %d · version 1 · ".formatted(issued.number()));
            assertThat(audit.ofSubject("forecast", Long.toString(issued.id().value()), AsKnownAt.now())).singleElement().satisfies(entry -> {
                assertThat(entry.act()).isEqualTo("issued");
                assertThat(entry.after()).isEqualTo(issued.text());
                assertThat(entry.recordedAt()).isEqualTo(issued.recordedAt());
            });
            assertThat(forecasts.openDraft(issued.id(), AsKnownAt.now())).isEmpty();
        }

        @Test
        void aRadiusReadsBackAsItWas() {
            ForecastContent content = ForecastSamples.withArea(ForecastSamples.moderate(clock.instant()), new Area.Radius("Kelbrith", 47.2, -30, 60));
            assertThat(forecasts.find(issued(content).id(), AsKnownAt.now()).orElseThrow().content()).isEqualTo(content);
        }

        @Test
        void anAmendedForecastKeepsItsEarlierVersion() {
            Forecast first = issued(ForecastSamples.moderate(clock.instant()));
            Forecast amended = forecasts.amend(B, first.id(), 1, ForecastSamples.severe(clock.instant(), "slf-c", null), "severe report at 1142Z");
            Forecast corrected = forecasts.correct(B, first.id(), 2, ForecastSamples.withLevels(amended.content(), 260, 310), "base was typed wrong");
            assertThat(forecasts.versions(first.id(), AsKnownAt.now())).containsExactly(first, amended, corrected);
            assertThat(List.of(first.state(), amended.state(), corrected.state()))
                    .containsExactly(Forecast.State.ISSUED, Forecast.State.AMENDED, Forecast.State.CORRECTED);
            assertThat(corrected.number()).isEqualTo(first.number());
            assertThat(corrected.issuedAt()).isEqualTo(first.recordedAt());
            assertThat(corrected.reason()).isEqualTo("base was typed wrong");
            assertThat(forecasts.find(first.id(), new AsKnownAt(first.recordedAt()))).contains(first);
            assertThat(forecasts.find(first.id(), new AsKnownAt(amended.recordedAt()))).contains(amended);
            assertThat(forecasts.find(first.id(), new AsKnownAt(first.recordedAt().minusNanos(1000)))).isEmpty();
            assertThat(audit.ofSubject("forecast", Long.toString(first.id().value()), AsKnownAt.now())).extracting(entry -> entry.act())
                    .containsExactly("issued", "amended", "corrected");
        }

        @Test
        void theDesksOwnUserCanNotRewriteAnIssuedForecast() {
            issued(ForecastSamples.moderate(clock.instant()));
            for (String act : List.of("update forecast_version set product_text = 'other'", "delete from forecast_version",
                    "update forecast_evidence set label = 'other'", "delete from forecast_evidence", "update forecast_draft set reason = 'other'")) {
                assertThatThrownBy(() -> jdbc.execute(act)).as(act).isInstanceOf(DataAccessException.class);
            }
        }

        @Test
        void onlyTheHolderFilesAndOthersMayDraft() {
            Forecast first = issued(ForecastSamples.moderate(clock.instant()));
            ForecastDraft draft = forecasts.draft(C, ForecastSamples.moderate(clock.instant()));
            assertThatThrownBy(() -> forecasts.issue(C, draft.id(), 1, null)).isInstanceOf(NotHoldingDesk.class);
            assertThatThrownBy(() -> forecasts.amend(C, first.id(), 1, first.content(), "wider area")).isInstanceOf(NotHoldingDesk.class);
            assertThatThrownBy(() -> forecasts.correct(C, first.id(), 1, first.content(), "typed wrong")).isInstanceOf(NotHoldingDesk.class);
            assertThatThrownBy(() -> forecasts.cancel(C, first.id(), 1, "layer is gone")).isInstanceOf(NotHoldingDesk.class);
            assertThat(forecasts.versions(first.id(), AsKnownAt.now())).containsExactly(first);
            assertThatThrownBy(() -> forecasts.draft(Actor.named("slf-o", "OBSERVER", false, "WS-2"), Map.of(), Map.of())).isInstanceOf(MayNotDraft.class);
            // the holder may file what a colleague drafted
            assertThat(forecasts.issue(B, draft.id(), 1, null).author()).isEqualTo("slf-b");
        }

        @Test
        void aFormPostedAfterAShiftChangeIsRefused() {
            ForecastDraft draft = forecasts.draft(B, ForecastSamples.moderate(clock.instant()));
            vacate();
            holdings.take(C);
            assertThatThrownBy(() -> forecasts.issue(B, draft.id(), 1, null)).isInstanceOf(NotHoldingDesk.class);
            assertThat(forecasts.openDraft(draft.id(), AsKnownAt.now())).isPresent();
        }

        @Test
        void aRefusedForecastLeavesTheDraftAndGivesNoNumber() {
            ForecastDraft draft = forecasts.draft(B, ForecastSamples.withLevels(ForecastSamples.moderate(clock.instant()), 310, 270));
            assertThatThrownBy(() -> forecasts.issue(B, draft.id(), 1, null)).isInstanceOf(ForecastRefused.class).hasMessageContaining("Base FL310 is not below top FL270");
            assertThat(forecasts.openDraft(draft.id(), AsKnownAt.now())).contains(draft);
            Forecast next = issued(ForecastSamples.moderate(clock.instant()));
            assertThat(issued(ForecastSamples.moderate(clock.instant())).number()).isEqualTo(next.number() + 1);
        }

        @Test
        void anOlderVersionCanNotBeChangedAnyMore() {
            Forecast first = issued(ForecastSamples.moderate(clock.instant()));
            forecasts.correct(B, first.id(), 1, ForecastSamples.withLevels(first.content(), 260, 310), "base was typed wrong");
            assertThatThrownBy(() -> forecasts.amend(B, first.id(), 1, first.content(), "wider area")).isInstanceOfSatisfying(StaleForecast.class, stale -> {
                assertThat(stale.seen()).isEqualTo(1);
                assertThat(stale.current()).isEqualTo(2);
            });
            assertThat(forecasts.versions(first.id(), AsKnownAt.now())).hasSize(2);
        }

        @Test
        void aDraftSavedByTwoIsRefusedToTheSecond() {
            ForecastDraft draft = forecasts.draft(B, Map.of("placeName", "Kelbrith"), Map.of());
            ForecastDraft revised = forecasts.revise(C, draft.id(), 1, ForecastDraft.Purpose.NEW, null, Map.of("placeName", "Kelbrith E"), Map.of(), "");
            assertThat(revised.version()).isEqualTo(2);
            assertThatThrownBy(() -> forecasts.revise(B, draft.id(), 1, ForecastDraft.Purpose.NEW, null, Map.of("placeName", "Kelbrith W"), Map.of(), ""))
                    .isInstanceOf(StaleForecast.class);
            assertThat(forecasts.openDraft(draft.id(), AsKnownAt.now()).orElseThrow().fields()).containsEntry("placeName", "Kelbrith E");
            forecasts.discard(B, draft.id(), 2);
            assertThat(forecasts.openDraft(draft.id(), AsKnownAt.now())).isEmpty();
            assertThat(forecasts.openDraft(draft.id(), new AsKnownAt(revised.recordedAt()))).contains(revised);
            assertThatThrownBy(() -> forecasts.issue(B, draft.id(), 2, null)).isInstanceOf(UnknownForecast.class);
        }

        @Test
        void theChainHoldsADigestOfADraftAndNotItsWords() {
            ForecastDraft draft = forecasts.draft(B, Map.of("wouldChange", "a thought to be forgotten"), Map.of());
            assertThat(audit.ofSubject("forecast draft", Long.toString(draft.id().value()), AsKnownAt.now())).singleElement()
                    .satisfies(entry -> assertThat(entry.after()).contains("SHA-256").doesNotContain("thought"));
        }

        @Test
        void anAmendmentIsDraftedCheckedAndFiled() {
            Forecast first = issued(ForecastSamples.moderate(clock.instant()));
            Map<String, String> fields = new java.util.HashMap<>(DraftFields.of(first.content()));
            fields.put(DraftFields.TOP, "320");
            ForecastDraft draft = forecasts.revise(B, first.id(), 0, ForecastDraft.Purpose.AMENDMENT, 1, fields, Map.of(), "");
            ForecastBook.Check early = forecasts.check(draft);
            assertThat(early.text()).isNull();
            assertThat(early.refusals()).extracting(Refusal::field).containsExactly("reason");
            draft = forecasts.revise(B, first.id(), draft.version(), ForecastDraft.Purpose.AMENDMENT, 1, fields, Map.of(), "report at FL318");
            ForecastBook.Check check = forecasts.check(draft);
            assertThat(check.refusals()).isEmpty();
            Forecast amended = forecasts.issue(B, first.id(), draft.version(), null);
            assertThat(amended.text()).isEqualTo(check.text()).contains("version 2 (amended)").contains("FL270 to FL320");
            assertThat(amended.reason()).isEqualTo("report at FL318");
        }

        @Test
        void theTextOnTheCheckPageIsTheTextThatIsFiled() {
            ForecastDraft draft = forecasts.draft(B, ForecastSamples.moderate(clock.instant()));
            ForecastBook.Check check = forecasts.check(draft);
            Forecast other = issued(ForecastSamples.moderate(clock.instant()));
            assertThat(other.number()).isEqualTo(check.number());
            assertThatThrownBy(() -> forecasts.issue(B, draft.id(), 1, check.number())).isInstanceOf(StaleForecast.class);
            ForecastBook.Check again = forecasts.check(draft);
            assertThat(forecasts.issue(B, draft.id(), 1, again.number()).text()).isEqualTo(again.text());
            assertThat(again.overlaps()).contains(other);
        }

        @Test
        void aForecastIsInForceUntilItsEndOrItsCancellation() {
            Instant from = clock.instant();
            Forecast one = issued(ForecastSamples.moderate(from));
            Forecast two = issued(ForecastSamples.withTimes(ForecastSamples.moderate(from), from.plusSeconds(1800), from.plusSeconds(5400)));
            assertThat(forecasts.inForce(from, AsKnownAt.now())).containsSubsequence(two, one);
            Forecast cancelled = forecasts.cancel(B, one.id(), 1, "layer gone by 0700Z");
            assertThat(cancelled.state()).isEqualTo(Forecast.State.CANCELLED);
            assertThat(cancelled.standing(from)).isEqualTo(Forecast.Standing.CANCELLED);
            assertThat(forecasts.inForce(from, AsKnownAt.now())).contains(two).doesNotContain(one, cancelled);
            assertThat(forecasts.inForce(from, new AsKnownAt(two.recordedAt()))).contains(one);
            clock.set(from.plusSeconds(5400));
            assertThat(forecasts.inForce(clock.instant(), AsKnownAt.now())).doesNotContain(two);
            assertThat(two.standing(clock.instant())).isEqualTo(Forecast.Standing.EXPIRED);
            assertThat(forecasts.ended(clock.instant(), null, 2, AsKnownAt.now())).containsExactly(two, cancelled);
            assertThatThrownBy(() -> forecasts.cancel(B, two.id(), 1, "layer gone by 0700Z")).isInstanceOf(ForecastRefused.class).hasMessageContaining("is over");
            assertThat(forecasts.between(from, from.plusSeconds(60), AsKnownAt.now())).contains(one, cancelled).doesNotContain(two);
        }

        @Test
        void manyWhoIssueAtOnceGetNumbersWithoutGapOrDouble() throws Exception {
            List<ForecastDraft> drafts = java.util.stream.IntStream.range(0, 6).mapToObj(i -> forecasts.draft(B, ForecastSamples.moderate(clock.instant()))).toList();
            ExecutorService issuers = Executors.newFixedThreadPool(6);
            List<Future<Forecast>> filed = issuers.invokeAll(drafts.stream().<Callable<Forecast>>map(draft -> () -> forecasts.issue(B, draft.id(), 1, null)).toList(), 60, TimeUnit.SECONDS);
            issuers.shutdown();
            List<Integer> numbers = new java.util.ArrayList<>();
            for (Future<Forecast> one : filed) {
                numbers.add(one.get().number());
            }
            numbers.sort(null);
            assertThat(numbers).doesNotHaveDuplicates();
            assertThat(numbers.get(5) - numbers.get(0)).isEqualTo(5);
        }

        @Test
        void theSecondLookMustBeSomebodyWhoMay() {
            ForecastDraft draft = forecasts.draft(B, ForecastSamples.severe(clock.instant(), "slf-o", null));
            assertThatThrownBy(() -> forecasts.issue(B, draft.id(), 1, null)).isInstanceOf(ForecastRefused.class).hasMessageContaining("slf-o");
        }

        private Forecast issued(ForecastContent content) {
            ForecastDraft draft = forecasts.draft(B, content);
            return forecasts.issue(B, draft.id(), draft.version(), null);
        }
    }
}
