package org.shearbook.desk.sounding;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.shearbook.desk.sounding.SoundingMessages.NOON;
import static org.shearbook.desk.sounding.SoundingMessages.file;
import static org.shearbook.desk.sounding.SoundingMessages.levels;
import static org.shearbook.desk.sounding.SoundingMessages.part;
import static org.shearbook.desk.sounding.SoundingMessages.significantLevels;
import static org.shearbook.desk.sounding.SoundingMessages.standardLevels;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.station.StationBook;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Remark;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.quality.CheckedLevel;
import org.shearbook.met.quality.SoundingQuality;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.transaction.support.TransactionTemplate;

/** Soundings and their versions, on both databases. */
class SoundingArchiveRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired SoundingArchive archive;
        @Autowired StationBook stations;
        @Autowired AuditTrail audit;
        @Autowired TransactionTemplate transaction;
        @Autowired JdbcTemplate jdbc;

        private static final Actor FORECASTER = Actor.named("forecaster-b", "FORECASTER", true, "WS-1");

        private List<Kept> keep(DecodedSounding... messages) {
            return keep("CSV sounding", messages);
        }

        private List<Kept> keep(String format, DecodedSounding... messages) {
            return transaction.execute(status -> archive.keepAll(FORECASTER, List.of(messages).stream().map(message -> new Arrived(message, format)).toList(), NOON));
        }

        private Sounding newest(Kept kept) {
            return archive.find(kept.id(), AsKnownAt.now()).orElseThrow();
        }

        @Test
        void everyValueComesBackAsItWasReported() {
            List<ReportedLevel> reported = levels(9_000, 1);
            Kept kept = keep(file("SAVA", NOON, NOON.minusSeconds(2700), reported)).get(0);
            Sounding found = newest(kept);
            assertThat(found.levels()).extracting(CheckedLevel::reported).isEqualTo(reported);
            assertThat(found.levels()).isEqualTo(SoundingQuality.check(reported, 50, null).levels());
            assertThat(found.profile()).isEqualTo(SoundingQuality.check(reported, 50, null).cleanProfile());
            assertThat(found.launchedAt()).isEqualTo(NOON.minusSeconds(2700));
            assertThat(found.observedAt()).isEqualTo(NOON.minusSeconds(2700));
            assertThat(found.header().levelCount()).isEqualTo(reported.size());
            assertThat(found.header().greatestWind()).isCloseTo(5 + 8800 / 400.0, org.assertj.core.api.Assertions.within(1e-9));
            assertThat(archive.raw(kept.id(), 1)).isEqualTo("file of SAVA with 36 levels");
        }

        @Test
        void theSameContentTwiceIsOneVersionAndACorrectionASecond() {
            DecodedSounding first = file("SADU", NOON, null, levels(9_000, 1));
            Kept kept = keep(first).get(0);
            assertThat(kept.duplicate()).isFalse();
            Kept again = keep(first).get(0);
            assertThat(again).satisfies(k -> {
                assertThat(k.duplicate()).isTrue();
                assertThat(k.id()).isEqualTo(kept.id());
                assertThat(k.version()).isEqualTo(1);
            });
            Kept corrected = keep(file("SADU", NOON, null, levels(9_000, 1.02))).get(0);
            assertThat(corrected.id()).isEqualTo(kept.id());
            assertThat(corrected.version()).isEqualTo(2);
            Sounding now = newest(kept);
            assertThat(now.levels().get(0).reported().windSpeed()).isCloseTo(1.02 * 5.125, org.assertj.core.api.Assertions.within(1e-9));
            Sounding before = archive.find(kept.id(), new AsKnownAt(now.recordedAt().minusNanos(1000))).orElseThrow();
            assertThat(before.version()).isEqualTo(1);
            assertThat(before.levels().get(0).reported().windSpeed()).isEqualTo(5.125);
            assertThat(keep(first).get(0)).as("the uncorrected one once more").satisfies(k -> {
                assertThat(k.duplicate()).isTrue();
                assertThat(k.version()).isEqualTo(2);
            });
            assertThat(archive.versions(kept.id(), AsKnownAt.now())).hasSize(2);
        }

        @Test
        void aFileCutOffOnItsWayIsKeptBesideTheAscentAndDoesNotReplaceIt() {
            Kept whole = keep(file("SACU", NOON, null, levels(12_000, 1))).get(0);
            Kept cut = keep(file("SACU", NOON, null, levels(3_000, 1))).get(0);
            assertThat(cut.id()).isEqualTo(whole.id());
            assertThat(cut.version()).isEqualTo(1);
            assertThat(cut.duplicate()).isFalse();
            assertThat(cut.remarks()).extracting(Remark::code).contains("FEWER_LEVELS");
            assertThat(newest(whole).levels()).hasSize(48);
            assertThat(archive.raw(whole.id(), 1)).isEqualTo("file of SACU with 48 levels");
        }

        @Test
        void aPartThatArrivesLaterMakesANewVersionOfTheSameSounding() {
            Kept a = keep("TEMP", part("SAPA", NOON, "TTAA", "", standardLevels(1))).get(0);
            int standard = newest(a).levels().size();
            Kept b = keep("TEMP", part("SAPA", NOON.plus(Duration.ofHours(-1)), "TTBB", "", significantLevels())).get(0);
            assertThat(b.id()).isEqualTo(a.id());
            assertThat(b.version()).isEqualTo(2);
            Sounding whole = newest(b);
            assertThat(whole.levels()).hasSize(standard + significantLevels().size());
            assertThat(whole.parts()).containsExactly("TTAA", "TTBB");
            assertThat(archive.raw(a.id(), 1)).isEqualTo("TTAA of SAPA ");
            assertThat(archive.raw(a.id(), 2)).contains("TTAA of SAPA").contains("TTBB of SAPA");
            assertThat(keep("TEMP", part("SAPA", NOON, "TTAA", "", standardLevels(1))).get(0).duplicate()).isTrue();
            Kept corrected = keep("TEMP", part("SAPA", NOON, "TTAA", "CCA", standardLevels(1.1))).get(0);
            assertThat(corrected.id()).isEqualTo(a.id());
            assertThat(corrected.version()).isEqualTo(3);
            assertThat(newest(a).levels()).as("the correction replaces its part alone").hasSameSizeAs(whole.levels());
            assertThat(newest(a).levels().get(0).reported().windSpeed()).isCloseTo(1.1 * 5.125, org.assertj.core.api.Assertions.within(1e-9));
        }

        @Test
        void aWholeFileTakesThePlaceOfTheCodedPartsOfItsAscentAndLaterPartsAreKeptBesideIt() {
            Kept coded = keep("TEMP", part("SAFO", NOON, "TTAA", "", standardLevels(1))).get(0);
            Kept whole = keep(file("SAFO", NOON, NOON.minusSeconds(2700), levels(12_000, 1))).get(0);
            assertThat(whole.id()).isEqualTo(coded.id());
            assertThat(whole.version()).isEqualTo(2);
            assertThat(newest(whole).levels()).hasSize(48);
            assertThat(newest(whole).parts()).isEmpty();
            Kept late = keep("TEMP", part("SAFO", NOON, "TTBB", "", significantLevels())).get(0);
            assertThat(late.id()).isEqualTo(coded.id());
            assertThat(late.version()).isEqualTo(2);
            assertThat(late.duplicate()).isFalse();
            assertThat(late.remarks()).extracting(Remark::code).contains("COARSER_THAN_THE_FILE");
            assertThat(newest(whole).levels()).hasSize(48);
            assertThat(archive.raw(coded.id(), 1)).isEqualTo("TTAA of SAFO ");
            assertThat(archive.raw(coded.id(), 2)).isEqualTo("file of SAFO with 48 levels");
            assertThat(keep("TEMP", part("SAFO", NOON, "TTBB", "", significantLevels())).get(0).duplicate()).isTrue();
            assertThat(archive.between("SAFO", NOON.minusSeconds(8000), NOON.plusSeconds(1), AsKnownAt.now())).hasSize(1);
        }

        @Test
        void partsOfOneBulletinAreOneVersionAndTheSamePartOfTheNextHourIsAnotherAscent() {
            List<Kept> kept = keep("TEMP", part("SABU", NOON, "TTAA", "", standardLevels(1)), part("SABU", NOON, "TTBB", "", significantLevels()),
                    part("SABU", NOON.plus(Duration.ofHours(2)), "TTAA", "", standardLevels(1.2)));
            assertThat(kept.get(0).id()).isEqualTo(kept.get(1).id()).isNotEqualTo(kept.get(2).id());
            assertThat(kept).extracting(Kept::version).containsExactly(1, 1, 1);
            assertThat(archive.between("SABU", NOON.minusSeconds(1), NOON.plus(Duration.ofHours(6)), AsKnownAt.now())).hasSize(2);
        }

        @Test
        void specialAscentsCloseToEachOtherStayApartAndAFileWithoutItsNominalHourFindsItsTwin() {
            Kept twelve = keep(file("SASP", NOON, NOON.minusSeconds(3000), levels(8_000, 1))).get(0);
            Kept fifteen = keep(file("SASP", NOON.plus(Duration.ofHours(1)), null, levels(8_000, 1.3))).get(0);
            assertThat(fifteen.id()).isNotEqualTo(twelve.id());
            Kept twin = keep(file("SASP", null, NOON.minusSeconds(3000), levels(8_000, 1))).get(0);
            assertThat(twin.id()).isEqualTo(twelve.id());
            assertThat(twin.duplicate()).isTrue();
        }

        @Test
        void aKnownStationIsFoundByAnyOfItsIdentifiersAndFillsInThePosition() {
            stations.keep(Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1"), "Sixholm", 48.5, -31, 33, List.of("SAKN", "99601"));
            Kept a = keep("TEMP", part("99601", NOON, "TTAA", "", standardLevels(1))).get(0);
            Kept b = keep("TEMP", part("SAKN", NOON, "TTBB", "", significantLevels())).get(0);
            assertThat(b.id()).isEqualTo(a.id());
            Sounding found = newest(b);
            assertThat(found.stationId()).isEqualTo("SAKN");
            assertThat(found.header().stationName()).isEqualTo("Sixholm");
            assertThat(found.latitude()).isEqualTo(48.5);
            assertThat(found.elevation()).isEqualTo(33);
            assertThat(found.remarks()).extracting(Remark::code).doesNotContain("STATION_UNKNOWN");
        }

        @Test
        void anUnknownStationIsKeptUnderItsOwnIdentifierWithARemark() {
            Kept kept = keep(file("saun-7", NOON, null, levels(8_000, 1))).get(0);
            assertThat(kept.remarks()).extracting(Remark::code).contains("STATION_UNKNOWN");
            Sounding found = newest(kept);
            assertThat(found.stationId()).isEqualTo("SAUN-7");
            assertThat(found.latitude()).isEqualTo(47.2);
        }

        @Test
        void aPositionFarFromTheStationsIsRemarked() {
            stations.keep(Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1"), "Elsewhere", 10, 10, 1, List.of("SAEL"));
            assertThat(keep(file("SAEL", NOON, null, levels(8_000, 1))).get(0).remarks()).extracting(Remark::code).contains("POSITION_DIFFERS");
        }

        @Test
        void aMessageThatSaysNoAscentWasMadeIsKeptAsNotUsable() {
            Kept kept = keep("TEMP", part("SANI", NOON, "TTAA", "", List.of())).get(0);
            assertThat(newest(kept).profile()).isNull();
            assertThat(newest(kept).notUsable()).isNotBlank();
            assertThat(kept.remarks()).extracting(Remark::code).contains("NO_LEVELS");
            assertThat(archive.latest("SANI", AsKnownAt.now())).isEmpty();
        }

        @Test
        void knotsDeclaredAsMetresPerSecondAreFlaggedAgainstTheSoundingBefore() {
            keep(file("SAKT", NOON.minus(Duration.ofHours(12)), null, levels(12_000, 1)));
            Kept slipped = keep(file("SAKT", NOON, null, levels(12_000, 1.944))).get(0);
            assertThat(slipped.remarks()).extracting(Remark::code).contains("POSSIBLE_UNIT_SLIP");
            assertThat(newest(slipped).soundingFlags()).isNotEmpty();
        }

        @Test
        void aSoundingWithoutAnyTimeIsRefusedAndNothingOfItsBatchIsKept() {
            assertThatThrownBy(() -> keep(file("SATI", NOON, null, levels(8_000, 1)), file("SATJ", null, null, levels(8_000, 1))))
                    .isInstanceOf(SoundingWithoutTime.class);
            assertThat(archive.latest("SATI", AsKnownAt.now())).isEmpty();
        }

        @Test
        void aWithdrawnSoundingLeavesTheListsInUseAndStaysToBeRead() {
            Kept kept = keep(file("SAWI", NOON, null, levels(8_000, 1))).get(0);
            Instant before = newest(kept).recordedAt();
            assertThatThrownBy(() -> archive.withdraw(Actor.named("observer-o", "OBSERVER", false, "WS-2"), kept.id(), "x")).isInstanceOf(WithdrawalRefused.class);
            assertThatThrownBy(() -> archive.withdraw(FORECASTER, kept.id(), " ")).isInstanceOf(WithdrawalRefused.class);
            archive.withdraw(FORECASTER, kept.id(), "sonde iced over");
            assertThat(archive.between("SAWI", NOON.minusSeconds(1), NOON.plusSeconds(1), AsKnownAt.now())).isEmpty();
            assertThat(archive.between("SAWI", NOON.minusSeconds(1), NOON.plusSeconds(1), new AsKnownAt(before))).hasSize(1);
            assertThat(newest(kept).withdrawn()).isTrue();
            assertThat(newest(kept).levels()).isNotEmpty();
            assertThat(audit.ofSubject("sounding", kept.id().toString(), AsKnownAt.now())).extracting(entry -> entry.reason()).containsExactly("sonde iced over");
        }

        @Test
        void theNewestComeInParts() {
            List<Kept> kept = new ArrayList<>();
            for (int k = 0; k < 5; k++) {
                kept.addAll(keep(file("SANE", NOON.plus(Duration.ofHours(6L * k)), null, levels(8_000, 1 + k / 100.0))));
            }
            Instant until = NOON.plus(Duration.ofDays(9));
            List<SoundingHeader> first = archive.newest("SANE", NOON, until, null, AsKnownAt.now(), 3);
            List<SoundingHeader> rest = archive.newest("SANE", NOON, until, first.get(2).id(), AsKnownAt.now(), 3);
            assertThat(first).extracting(SoundingHeader::id).containsExactly(kept.get(4).id(), kept.get(3).id(), kept.get(2).id());
            assertThat(rest).extracting(SoundingHeader::id).containsExactly(kept.get(1).id(), kept.get(0).id());
            assertThat(archive.wholeBetween("SANE", NOON, until, AsKnownAt.now())).hasSize(5).allSatisfy(sounding -> assertThat(sounding.profile()).isNotNull());
        }

        @Test
        void twoPartsThatArriveAtTheSameMomentBecomeOneSounding() throws Exception {
            ExecutorService both = Executors.newFixedThreadPool(2);
            List<Future<List<Kept>>> kept = both.invokeAll(List.<Callable<List<Kept>>>of(
                    () -> keep("TEMP", part("SACO", NOON, "TTAA", "", standardLevels(1))),
                    () -> keep("TEMP", part("SACO", NOON, "TTBB", "", significantLevels()))));
            both.shutdown();
            Kept a = kept.get(0).get().get(0);
            Kept b = kept.get(1).get().get(0);
            assertThat(a.id()).isEqualTo(b.id());
            assertThat(Set.of(a.version(), b.version())).isEqualTo(Set.of(1, 2));
            assertThat(newest(a).parts()).containsExactly("TTAA", "TTBB");
        }

        @Test
        void theDesksOwnUserCanNeitherChangeNorDeleteSoundings() {
            keep(file("SAGR", NOON, null, levels(8_000, 1)));
            for (String table : List.of("sounding_version", "sounding_levels", "sounding_message")) {
                assertThatThrownBy(() -> jdbc.execute("delete from " + table)).as(table).isInstanceOf(DataAccessException.class);
                assertThatThrownBy(() -> jdbc.execute("truncate table " + table)).as(table).isInstanceOf(DataAccessException.class);
            }
            assertThatThrownBy(() -> jdbc.execute("update sounding_version set withdrawn = true")).isInstanceOf(DataAccessException.class);
        }
    }
}
