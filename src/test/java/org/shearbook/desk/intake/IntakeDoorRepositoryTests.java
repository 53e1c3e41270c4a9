package org.shearbook.desk.intake;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.met.decode.Remark;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.shearbook.testing.SettableClock;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;

/** The door, with the real decoders and both databases behind it. */
class IntakeDoorRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired IntakeDoor door;
        @Autowired IntakeQueue queue;
        @Autowired SoundingArchive soundings;
        @Autowired AuditTrail audit;
        @Autowired JdbcTemplate jdbc;
        @Autowired SettableClock clock;

        private static final Actor FORECASTER = Actor.named("forecaster-b", "FORECASTER", true, "WS-1");

        @AfterEach
        void theClockStandsAgain() {
            clock.set(SettableClock.START);
        }

        private TakenIn takeIn(String text) {
            return takeIn(text.getBytes(StandardCharsets.UTF_8));
        }

        private TakenIn takeIn(byte[]... arrivals) {
            List<Arrival> all = new ArrayList<>();
            for (byte[] bytes : arrivals) {
                all.add(new Arrival("arrival " + (all.size() + 1), bytes));
            }
            return door.takeIn(FORECASTER, all, Channel.UPLOAD);
        }

        static String csv(String station, String launch, String speedUnit, double factor) {
            StringBuilder csv = new StringBuilder("# station_id=%s\n# latitude_deg=47.2\n# longitude_deg=-30\n# station_elevation_m=50\n%s".formatted(station,
                    launch.isEmpty() ? "" : "# launch_time=" + launch + "\n"));
            csv.append("pressure_hPa,geopotential_height_m,temperature_C,wind_direction_deg,wind_speed").append(speedUnit).append('\n');
            for (int k = 0; k < 40; k++) {
                double height = 50 + 250.0 * k;
                csv.append("%.2f,%.0f,%.1f,%d,%.1f%n".formatted(1008 * Math.exp(-height / 7800), height, 12 - 0.0065 * height, 250, factor * (5 + height / 300)));
            }
            return csv.toString();
        }

        static String report(int number) {
            return "XVKE UA /OV 4712N03%03dW/TM %02d%02d/FL%03d/TP B738/TB %s %03d-%03d/RM NR %d".formatted(number % 60, number / 60 % 6, number % 60, 250 + number % 150,
                    number % 3 == 0 ? "LGT" : "MOD", 250 + number % 150, 260 + number % 150, number);
        }

        @Test
        void theSameUnreadableBytesTwiceMakeOneItem() {
            byte[] noise = "\u0007\u0008 nobody reads this, whoever sends it".repeat(5).getBytes(java.nio.charset.StandardCharsets.UTF_8);
            Queued first = takeIn(noise).queued().get(0);
            Queued again = takeIn(noise).queued().get(0);
            assertThat(first.duplicate()).isFalse();
            assertThat(again.duplicate()).isTrue();
            assertThat(again.id()).isEqualTo(first.id());
        }

        @Test
        void moreLinesThanOneArrivalMayHoldAreRefusedWholeAtOnce() {
            TakenIn taken = takeIn("UA\n".repeat(500_002).getBytes(java.nio.charset.StandardCharsets.US_ASCII));
            assertThat(taken.accepted()).isEmpty();
            assertThat(taken.queued()).isEmpty();
            assertThat(taken.refused()).singleElement().satisfies(one -> assertThat(one.code()).isEqualTo("TOO_MANY_LINES"));
        }

        @Test
        void aSoundingAndReportsOfOneBatchAreOneActInTheChain() {
            TakenIn taken = takeIn(csv("IDAA", "2031-03-12T05:15:00Z", "_kt", 1).getBytes(StandardCharsets.UTF_8),
                    (report(1) + "\n" + report(2) + "\n").getBytes(StandardCharsets.UTF_8));
            assertThat(taken.accepted()).extracting(Accepted::kind).containsExactly("sounding", "airReport", "airReport");
            assertThat(taken.accepted()).noneMatch(Accepted::duplicate);
            assertThat(taken.queued()).isEmpty();
            assertThat(audit.ofSubject("intake batch", Long.toString(taken.batchId()), AsKnownAt.now())).singleElement().satisfies(entry -> {
                assertThat(entry.act()).isEqualTo("messages taken in");
                assertThat(entry.after()).startsWith("3 accepted, 0 of them known already; 0 queued; 0 refused; digest ");
                assertThat(entry.recordedAt()).isEqualTo(soundings.header(new SoundingId(taken.accepted().get(0).id()), AsKnownAt.now()).orElseThrow().recordedAt());
            });
            assertThat(queue.batch(taken.batchId()).orElseThrow().parts()).extracting(Batch.Part::accepted).containsExactly(1, 2);
        }

        @Test
        void theSameBytesTwiceMakeOneRecord() {
            byte[] sounding = csv("IDSB", "2031-03-12T05:15:00Z", "_kt", 1).getBytes(StandardCharsets.UTF_8);
            byte[] reports = (report(101) + "\n" + report(102) + "\n" + report(101) + "\n").getBytes(StandardCharsets.UTF_8);
            TakenIn first = takeIn(sounding, reports);
            assertThat(first.accepted()).extracting(Accepted::duplicate).containsExactly(false, false, false, true);
            TakenIn second = takeIn(sounding, reports);
            assertThat(second.accepted()).allMatch(Accepted::duplicate);
            assertThat(second.accepted()).extracting(Accepted::id).isEqualTo(first.accepted().stream().map(Accepted::id).toList());
            assertThat(jdbc.queryForObject("select count(*) from sounding_version where station_id = 'IDSB'", Integer.class)).isEqualTo(1);
        }

        @Test
        void theSameWordsOnAnotherDayAreAnotherReport() {
            TakenIn today = takeIn(report(111));
            clock.set(SettableClock.START.plus(java.time.Duration.ofDays(1)));
            TakenIn tomorrow = takeIn(report(111));
            assertThat(tomorrow.accepted()).singleElement().satisfies(one -> {
                assertThat(one.duplicate()).isFalse();
                assertThat(one.id()).isNotEqualTo(today.accepted().get(0).id());
            });
        }

        @Test
        void anEmptyFileIsRefusedWithWhatToDo() {
            TakenIn taken = takeIn(new byte[0]);
            assertThat(taken.refused()).singleElement().satisfies(one -> {
                assertThat(one.code()).isEqualTo("EMPTY_INPUT");
                assertThat(one.text()).isNotBlank();
            });
            assertThat(taken.accepted()).isEmpty();
            assertThat(queue.batch(taken.batchId()).orElseThrow().batch().refused()).isEqualTo(1);
        }

        @Test
        void binaryNoiseIsKeptRawInTheQueue() {
            byte[] noise = new byte[20_000];
            new Random(5).nextBytes(noise);
            TakenIn taken = takeIn(noise);
            assertThat(taken.accepted()).isEmpty();
            assertThat(taken.queued()).singleElement().satisfies(one -> {
                assertThat(one.code()).isEqualTo("UNKNOWN_FORMAT");
                assertThat(one.line()).isEqualTo(1);
            });
            assertThat(jdbc.queryForObject("select bytes from intake_raw where batch_id = ?", byte[].class, taken.batchId())).isEqualTo(noise);
            assertThat(queue.find(taken.queued().get(0).id(), AsKnownAt.now()).orElseThrow().raw()).isNotEmpty();
        }

        @Test
        void aCompressedFileIsRefusedAndNothingOfItKept() {
            TakenIn taken = takeIn(new byte[] {'P', 'K', 3, 4, 20, 0, 0, 0});
            assertThat(taken.refused()).singleElement().satisfies(one -> {
                assertThat(one.code()).isEqualTo("COMPRESSED");
                assertThat(one.text()).contains("zip").contains("Unpack");
            });
            assertThat(jdbc.queryForObject("select count(*) from intake_raw where batch_id = ?", Integer.class, taken.batchId())).isZero();
        }

        @Test
        void aCsvWithoutUnitsIsQueuedWithItsColumn() {
            TakenIn taken = takeIn(csv("IDUN", "2031-03-12T05:15:00Z", "", 1));
            assertThat(taken.accepted()).isEmpty();
            assertThat(taken.queued()).singleElement().satisfies(one -> {
                assertThat(one.code()).isEqualTo("UNITS_MISSING");
                assertThat(one.line()).isEqualTo(6);
                assertThat(one.column()).isPositive();
            });
        }

        @Test
        void knotsDeclaredAsMetresPerSecondAreAcceptedAndSaidToBeDoubtful() {
            takeIn(csv("IDKT", "2031-03-11T17:15:00Z", "_ms", 1));
            TakenIn taken = takeIn(csv("IDKT", "2031-03-12T05:15:00Z", "_ms", 1.944));
            assertThat(taken.accepted()).singleElement().satisfies(one ->
                    assertThat(one.remarks()).extracting(Remark::code).contains("POSSIBLE_UNIT_SLIP"));
        }

        @Test
        void aTempWithAShiftedGroupKeepsWhatIsReadableAndSaysWhere() {
            TakenIn taken = takeIn("USXV01 XVEN 120000\r\r\nTTAA 62001 00102 99008 12456 25010 00050 11256 25012 9275 0 06869 26021\r\r\n85457 02262 26025 70012 06465 26535 88999 77999=\r\r\n");
            assertThat(taken.accepted().size() + taken.queued().size()).isEqualTo(1);
            List<String> codes = new ArrayList<>(taken.queued().stream().map(Queued::code).toList());
            taken.accepted().forEach(one -> one.remarks().forEach(remark -> codes.add(remark.code())));
            assertThat(codes).isNotEmpty();
        }

        @Test
        void ofTenThousandMessagesWithEveryHundredthBrokenTheRestIsKept() {
            StringBuilder text = new StringBuilder();
            for (int k = 1; k <= 10_000; k++) {
                text.append(k % 100 == 0 ? "XVKE UA /OV /TM 99" + k + " #####" : "XVKE UA /OV 4712N03000W/TM %02d%02d/FL%03d/TP B738/TB MOD/RM TEN THOUSAND %d"
                        .formatted(k / 60 % 6, k % 60, 200 + k % 200, k)).append("\n");
            }
            TakenIn taken = takeIn(text.toString());
            assertThat(taken.accepted()).hasSize(9_900).noneMatch(Accepted::duplicate);
            assertThat(taken.queued()).hasSize(100).extracting(Queued::line).contains(100, 5_000, 10_000);
            assertThat(jdbc.queryForObject("select count(*) from intake_record where batch_id = ?", Integer.class, taken.batchId())).isEqualTo(9_900);
        }

        @Test
        void aMessageThatCannotBeKeptDoesNotStopTheOthers() {
            byte[][] arrivals = new byte[21][];
            for (int k = 0; k < 20; k++) {
                arrivals[k] = csv(k == 7 || k == 12 ? FailsOnPurpose.STATION : "IDFA" + k, "2031-03-1%dT05:15:00Z".formatted(k == 12 ? 1 : 2), "_kt", 1)
                        .getBytes(StandardCharsets.UTF_8);
            }
            arrivals[20] = report(201).getBytes(StandardCharsets.UTF_8);
            TakenIn taken = takeIn(arrivals);
            assertThat(taken.accepted()).hasSize(19);
            assertThat(taken.queued()).extracting(Queued::code).containsExactly("KEEPING_FAILED", "KEEPING_FAILED");
            assertThat(taken.queued()).extracting(Queued::arrival).containsExactly(8, 13);
            assertThat(jdbc.queryForObject("select count(*) from sounding_version where station_id = ?", Integer.class, FailsOnPurpose.STATION)).isZero();
            assertThat(jdbc.queryForObject("select count(*) from sounding_version where station_id like 'IDFA%'", Integer.class)).isEqualTo(18);
            assertThat(queue.find(taken.queued().get(0).id(), AsKnownAt.now()).orElseThrow().raw()).contains("station_id=" + FailsOnPurpose.STATION);
            assertThat(audit.integrity().whatIsBroken()).isNull();
        }

        @Test
        void aSoundingWithoutItsTimeIsQueued() {
            assertThat(takeIn(csv("IDTI", "", "_kt", 1)).queued()).extracting(Queued::code).containsExactly("TIME_MISSING");
        }

        @Test
        void textIsReadInEveryCommonEncoding() {
            int number = 300;
            for (Charset charset : List.of(StandardCharsets.UTF_8, StandardCharsets.ISO_8859_1, StandardCharsets.UTF_16LE, StandardCharsets.UTF_16BE, StandardCharsets.UTF_16)) {
                TakenIn taken = takeIn((report(++number) + "\r\n").getBytes(charset));
                assertThat(taken.accepted()).as(charset.name()).hasSize(1);
                assertThat(taken.queued()).as(charset.name()).isEmpty();
            }
        }

        @Test
        void anItemIsSettledOnceByAPersonAndKeepsItsEarlierVersion() {
            TakenIn taken = takeIn("no message at all, queue test");
            long id = taken.queued().get(0).id();
            QueueItem open = queue.find(id, AsKnownAt.now()).orElseThrow();
            assertThat(open.raw()).isEqualTo("no message at all, queue test");
            assertThatThrownBy(() -> queue.settle(FORECASTER, id, ItemState.SET_ASIDE, " ")).isInstanceOf(SettlementRefused.class);
            queue.settle(FORECASTER, id, ItemState.SET_ASIDE, "a test of the line");
            assertThat(queue.find(id, AsKnownAt.now()).orElseThrow().state()).isEqualTo(ItemState.SET_ASIDE);
            assertThat(queue.find(id, new AsKnownAt(open.recordedAt())).orElseThrow().state()).isEqualTo(ItemState.OPEN);
            assertThat(queue.open(AsKnownAt.now(), 1000)).extracting(QueueItem::id).doesNotContain(id);
            assertThatThrownBy(() -> queue.settle(FORECASTER, id, ItemState.SET_ASIDE, "again")).isInstanceOf(SettlementRefused.class);
            assertThat(audit.ofSubject("intake item", Long.toString(id), AsKnownAt.now())).hasSize(1);
        }

        @Test
        void twoSendersOfTheSameReportMakeOneRecord() throws Exception {
            ExecutorService both = Executors.newFixedThreadPool(2);
            Callable<TakenIn> sender = () -> takeIn(report(401));
            List<Future<TakenIn>> sent = both.invokeAll(List.of(sender, sender));
            both.shutdown();
            Accepted a = sent.get(0).get().accepted().get(0);
            Accepted b = sent.get(1).get().accepted().get(0);
            assertThat(a.id()).isEqualTo(b.id());
            assertThat(a.duplicate()).isNotEqualTo(b.duplicate());
        }

        @Test
        void whatMustBeForgottenCanGoAndTheRestOfABatchCannot() {
            TakenIn taken = takeIn("nothing readable, to be forgotten");
            for (String table : List.of("intake_batch", "intake_arrival", "intake_record", "intake_item_version")) {
                assertThatThrownBy(() -> jdbc.execute("delete from " + table)).as(table).isInstanceOf(DataAccessException.class);
            }
            jdbc.update("delete from intake_raw where batch_id = ?", taken.batchId());
            jdbc.update("delete from intake_item_text where batch_id = ?", taken.batchId());
            QueueItem forgotten = queue.find(taken.queued().get(0).id(), AsKnownAt.now()).orElseThrow();
            assertThat(forgotten.raw()).isNull();
            assertThat(forgotten.code()).isEqualTo("UNKNOWN_FORMAT");
            assertThat(audit.integrity().whatIsBroken()).isNull();
        }

        @Test
        void nothingAnAircraftIsCalledByLiesInWhatIsKeptForEver() {
            byte[] csv = ("report_id,report_kind,observed_at,latitude_deg,longitude_deg,flight_level,flight_id,turbulence_intensity\n"
                    + "T-1,PIREP,2031-03-12T05:30:00Z,47,-30,310,HRNX777,MOD\n").getBytes(StandardCharsets.UTF_8);
            TakenIn taken = takeIn(csv);
            assertThat(taken.accepted()).hasSize(1);
            for (String[] column : List.of(new String[] {"audit_entry", "after_text"}, new String[] {"intake_batch", "content_digest"}, new String[] {"intake_arrival", "arrival_name"})) {
                assertThat(jdbc.queryForObject("select count(*) from %s where %s like '%%HRNX777%%'".formatted((Object[]) column), Integer.class)).as(Arrays.toString(column)).isZero();
            }
        }
    }
}
