package org.shearbook.desk.airreport;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.NullPolicy;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.transaction.IllegalTransactionStateException;
import org.springframework.transaction.support.TransactionTemplate;

/** Air-reports in a real database, on both. */
class AirReportArchiveRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired AirReportArchive archive;
        @Autowired AuditTrail audit;
        @Autowired TransactionTemplate transaction;
        @Autowired JdbcTemplate jdbc;

        private static final Actor FEED = Actor.named("feed", "messages", false, "server");
        private static final Actor B = Actor.named("forecaster-b", "FORECASTER", true, "WS-1");

        private Kept kept(DecodedAirReport decoded, Instant receivedAt) {
            return transaction.execute(status -> archive.keep(FEED, decoded, receivedAt));
        }

        @Test
        void aReportComesBackAsItWasDecodedWithItsThreeTimesAndWithoutTheAircraft() {
            Instant observed = Instant.parse("2031-01-02T04:12:00Z");
            Instant received = Instant.parse("2031-01-02T04:18:30Z");
            Kept kept = kept(AirReports.voluntary(observed, "GULX204"), received);
            AirReport report = archive.find(kept.id(), AsKnownAt.now()).orElseThrow();
            DecodedAirReport decoded = AirReports.voluntary(observed, "GULX204");
            assertThat(report.version()).isEqualTo(1);
            assertThat(report.observedAt()).isEqualTo(observed);
            assertThat(report.receivedAt()).isEqualTo(received);
            assertThat(report.recordedAt()).isAfter(received);
            assertThat(report.turbulence()).isEqualTo(decoded.turbulence());
            assertThat(report.place()).isEqualTo(decoded.place());
            assertThat(report.nullPolicy()).isEqualTo(NullPolicy.EXPLICIT);
            assertThat(report.flightLevel()).isEqualTo(290.0);
            assertThat(report.windSpeed()).isEqualTo(62.5);
            assertThat(report.edrPeak()).isNull();
            assertThat(report.worstIntensity()).isEqualTo(Intensity.MOD);
            assertThat(report.worstBasis()).isEqualTo("as reported");
            assertThat(report.attribution()).isEqualTo(Attribution.UNKNOWN);
            assertThat(report.isExcluded()).isFalse();
            assertThat(report.toString().toUpperCase()).doesNotContain("GULX204");
            assertThat(report.remarks()).singleElement().satisfies(remark -> assertThat(remark.code()).isEqualTo("PLACE_AMBIGUOUS"));
            assertThat(archive.rawWithoutIdentity(kept.id())).hasValue("UA /OV KEL /TM 0412 /FL290 /TP A320 /TB LGT-MOD [aircraft]");
        }

        @Test
        void aCauseIsANewVersionWithItsReasonInTheChainAndTheEarlierOneStaysReadable() {
            Kept kept = kept(AirReports.voluntary(Instant.parse("2031-01-03T17:20:00Z"), "TRNX118"), Instant.parse("2031-01-03T17:26:00Z"));
            Instant before = archive.find(kept.id(), AsKnownAt.now()).orElseThrow().recordedAt();
            AirReport attributed = archive.attribute(B, kept.id(), Attribution.CONVECTIVE, " in convective cloud tops ");
            assertThat(attributed.version()).isEqualTo(2);
            assertThat(attributed.excludedBecause()).isEqualTo("convective: in convective cloud tops");
            assertThat(archive.find(kept.id(), new AsKnownAt(before)).orElseThrow().isExcluded()).isFalse();
            assertThat(archive.find(kept.id(), new AsKnownAt(before.minusNanos(1000)))).isEmpty();
            assertThat(archive.versions(kept.id(), AsKnownAt.now())).extracting(AirReport::version).containsExactly(1, 2);
            assertThat(archive.between(Instant.parse("2031-01-03T17:20:00Z"), Instant.parse("2031-01-03T17:21:00Z"), AsKnownAt.now()))
                    .singleElement().isEqualTo(archive.find(kept.id(), AsKnownAt.now()).orElseThrow());
            assertThat(audit.ofSubject("airreport", kept.id().toString(), AsKnownAt.now())).singleElement().satisfies(entry -> {
                assertThat(entry.act()).isEqualTo("attributed");
                assertThat(entry.before()).isEqualTo("unknown");
                assertThat(entry.after()).isEqualTo("convective");
                assertThat(entry.reason()).isEqualTo("in convective cloud tops");
                assertThat(entry.recordedAt()).isEqualTo(attributed.recordedAt());
            });
        }

        @Test
        void noKeyAndNoMachineAttributesAndACauseThatExcludesNeedsAReason() {
            Kept kept = kept(AirReports.voluntary(Instant.parse("2031-01-04T00:00:00Z"), "PETX001"), Instant.parse("2031-01-04T00:06:00Z"));
            assertThatThrownBy(() -> archive.attribute(FEED, kept.id(), Attribution.WAKE, "behind a heavy")).isInstanceOf(AttributionRefused.class);
            assertThatThrownBy(() -> archive.attribute(Actor.desk(), kept.id(), Attribution.WAKE, "behind a heavy")).isInstanceOf(AttributionRefused.class);
            assertThatThrownBy(() -> archive.attribute(B, kept.id(), Attribution.WAKE, "  ")).isInstanceOf(AttributionRefused.class)
                    .satisfies(refused -> assertThat(((AttributionRefused) refused).field()).isEqualTo("reason"));
            assertThatThrownBy(() -> archive.attribute(B, new AirReportId(-1), Attribution.UNKNOWN, null)).isInstanceOf(UnknownAirReport.class);
            assertThat(archive.find(kept.id(), AsKnownAt.now()).orElseThrow().version()).isEqualTo(1);
        }

        @Test
        void manyReportsAreKeptTogetherInTheirOrderOrNotAtAll() {
            Instant start = Instant.parse("2027-02-05T00:00:00Z");
            List<DecodedAirReport> many = new ArrayList<>();
            for (int k = 0; k < 1234; k++) {
                many.add(AirReports.automatic(start.plusSeconds(60L * k), 0.001 * k, 300, 47, -30));
            }
            List<Kept> kept = transaction.execute(status -> archive.keepAll(FEED, many, start.plus(Duration.ofDays(1))));
            assertThat(kept).hasSize(1234);
            List<AirReport> read = archive.between(start, start.plus(Duration.ofDays(1)), AsKnownAt.now());
            assertThat(read).extracting(AirReport::id).containsExactlyElementsOf(kept.stream().map(Kept::id).toList());
            assertThat(read.get(500).edrPeak()).isEqualTo(0.5);
            assertThat(read).extracting(AirReport::recordedAt).containsOnly(read.get(0).recordedAt());

            DecodedAirReport timeless = AirReports.voluntary(null, "HRNX555");
            assertThatThrownBy(() -> transaction.execute(status -> archive.keepAll(FEED,
                    List.of(AirReports.automatic(start.plus(Duration.ofDays(2)), 0.3, 300, 47, -30), timeless), start)))
                    .isInstanceOf(AirReportWithoutTime.class).hasMessageContaining("line 3");
            assertThat(archive.between(start.plus(Duration.ofDays(2)), start.plus(Duration.ofDays(3)), AsKnownAt.now())).isEmpty();
        }

        @Test
        void thePagesOfAListMeetWithoutGapOrOverlapEvenWhereManyHaveOneMoment() {
            Instant moment = Instant.parse("2031-01-08T12:00:00Z");
            List<DecodedAirReport> many = new ArrayList<>();
            for (int k = 0; k < 25; k++) {
                many.add(AirReports.automatic(moment, 0.2, 300, 47, -30));
            }
            List<Kept> kept = transaction.execute(status -> archive.keepAll(FEED, many, moment));
            List<AirReportId> read = new ArrayList<>();
            AirReportId after = null;
            for (int page = 0; page < 4; page++) {
                List<AirReport> part = archive.newest(moment, moment.plusSeconds(1), after, AsKnownAt.now(), 10);
                part.forEach(report -> read.add(report.id()));
                after = read.get(read.size() - 1);
            }
            assertThat(read).containsExactlyInAnyOrderElementsOf(kept.stream().map(Kept::id).toList());
        }

        @Test
        void onlyTheIdentityCanBeDeletedAndTheVersionOutlivesIt() {
            Kept kept = kept(AirReports.voluntary(Instant.parse("2031-01-06T00:00:00Z"), "PETX002"), Instant.parse("2031-01-06T00:06:00Z"));
            for (String act : List.of("delete from air_report_version", "update air_report_version set urgent = urgent",
                    "update air_report_identity set aircraft = aircraft", "truncate table air_report_version")) {
                assertThatThrownBy(() -> jdbc.execute(act)).as(act).isInstanceOf(DataAccessException.class);
            }
            assertThat(jdbc.update("delete from air_report_identity where report_id = ?", kept.id().value())).isEqualTo(1);
            assertThat(archive.rawWithoutIdentity(kept.id())).isEmpty();
            assertThat(archive.find(kept.id(), AsKnownAt.now())).isPresent();
        }

        @Test
        void theDigestIsOfSaltAircraftAndText() {
            Kept kept = kept(AirReports.voluntary(Instant.parse("2031-01-07T00:00:00Z"), "PETX003"), Instant.parse("2031-01-07T00:06:00Z"));
            Kept same = kept(AirReports.voluntary(Instant.parse("2031-01-07T00:00:00Z"), "PETX003"), Instant.parse("2031-01-07T00:06:00Z"));
            String digest = digest(kept);
            byte[] salt = jdbc.queryForObject("select salt from air_report_identity where report_id = ?", byte[].class, kept.id().value());
            assertThat(digest).isEqualTo(AirReportIdentityEntity.digest(salt, "PETX003",
                    AirReports.voluntary(Instant.parse("2031-01-07T00:00:00Z"), "PETX003").raw()));
            assertThat(digest(same)).as("another salt, another digest").isNotEqualTo(digest);
        }

        private String digest(Kept kept) {
            return jdbc.queryForObject("select identity_digest from air_report_version where report_id = ?", String.class, kept.id().value());
        }

        @Test
        void keepingHappensOnlyInsideTheActThatBringsTheReportIn() {
            assertThatThrownBy(() -> archive.keep(FEED, AirReports.voluntary(Instant.parse("2031-01-09T00:00:00Z"), "PETX004"), Instant.EPOCH))
                    .isInstanceOf(IllegalTransactionStateException.class);
        }
    }
}
