package org.shearbook.desk.station;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;

/** Stations and fixes, on both databases. */
class StationBookRepositoryTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        @Autowired StationBook book;
        @Autowired AuditTrail audit;
        @Autowired JdbcTemplate jdbc;

        private static final Actor ADMINISTRATOR = Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1");

        private static byte[] bytes(String text) {
            return text.getBytes(StandardCharsets.UTF_8);
        }

        @Test
        void aStationIsFoundByEachOfItsIdentifiers() {
            Station kept = book.keep(ADMINISTRATOR, "Northholm", 48.5, -31, 20, List.of("SBNO", "99801", "0-999-1-T801"));
            for (String identifier : List.of("SBNO", "99801", "0-999-1-T801", "sbno ")) {
                assertThat(book.find(identifier, AsKnownAt.now())).contains(kept);
            }
            assertThat(book.find("99899", AsKnownAt.now())).isEmpty();
        }

        @Test
        void aStationThatMovedKeepsItsEarlierVersion() {
            Station first = book.keep(ADMINISTRATOR, "Moved", 48, -31, 20, List.of("SBMO"));
            Station second = book.keep(ADMINISTRATOR, "Moved", 48.01, -31, 25, List.of("SBMO", "99802"));
            assertThat(second.version()).isEqualTo(2);
            assertThat(second.identifiers()).containsExactly("SBMO", "99802");
            assertThat(book.find("99802", AsKnownAt.now()).orElseThrow().latitude()).isEqualTo(48.01);
            assertThat(book.find("SBMO", new AsKnownAt(first.recordedAt())).orElseThrow().latitude()).isEqualTo(48);
            assertThat(audit.ofSubject("station", "SBMO", AsKnownAt.now())).extracting(entry -> entry.subject().version()).containsExactly(1, 2);
        }

        @Test
        void sayingAgainWhatIsKnownMakesNoVersion() {
            book.keep(ADMINISTRATOR, "Same", 40, 10, 5, List.of("SBSA"));
            assertThat(book.keep(ADMINISTRATOR, "Same", 40, 10, 5, List.of("SBSA")).version()).isEqualTo(1);
            assertThat(audit.ofSubject("station", "SBSA", AsKnownAt.now())).hasSize(1);
        }

        @Test
        void aListWithOneBadLineKeepsNothing() {
            assertThatThrownBy(() -> book.keepStations(ADMINISTRATOR, bytes("""
                    identifier,name,latitude_deg,longitude_deg,elevation_m
                    SBLA,One,1,1,1
                    SBLB,Two,91,1,1
                    """))).isInstanceOfSatisfying(ListRefused.class, refused -> assertThat(refused.refusals().get(0).line()).isEqualTo(3));
            assertThat(book.find("SBLA", AsKnownAt.now())).isEmpty();
        }

        @Test
        void identifiersOfTwoStationsInOneRowAreRefused() {
            book.keepStations(ADMINISTRATOR, bytes("identifier,name,latitude_deg,longitude_deg\nSBTA,A,1,1\nSBTB,B,2,2\n"));
            assertThatThrownBy(() -> book.keepStations(ADMINISTRATOR, bytes("identifier,name,latitude_deg,longitude_deg\nSBTC,C,3,3\nSBTA SBTB,C,3,3\n")))
                    .isInstanceOfSatisfying(ListRefused.class, refused -> {
                        assertThat(refused.refusals()).extracting(ListRefused.LineRefusal::line).containsExactly(3);
                        assertThat(refused.refusals()).extracting(ListRefused.LineRefusal::code).containsExactly("IDENTIFIERS_OF_TWO_STATIONS");
                    });
            assertThat(book.find("SBTC", AsKnownAt.now())).isEmpty();
        }

        @Test
        void aListLoadedAnewTakesThePlaceOfTheEarlierOneWhichStaysAsAVersion() {
            String header = "ident,type,name,latitude_deg,longitude_deg,elevation_ft,magnetic_variation_deg\n";
            FixList first = book.keepFixes(ADMINISTRATOR, "Station tests", bytes(header + "QQA,VOR,A,10,20,,5\nQQB,NDB,B,11,21,,\n")).list();
            FixList second = book.keepFixes(ADMINISTRATOR, "station tests", bytes(header + "QQA,VOR,A,10.5,20,,5\n")).list();
            assertThat(second.version()).isEqualTo(2);
            assertThat(book.fixes("qqa", AsKnownAt.now())).extracting(Fix::latitude).containsExactly(10.5);
            assertThat(book.fixes("QQB", AsKnownAt.now())).isEmpty();
            assertThat(book.fixes("QQB", new AsKnownAt(first.recordedAt()))).hasSize(1).allSatisfy(fix -> assertThat(fix.magneticVariationEast()).isNaN());
        }

        @Test
        void theTableInMemoryFollowsWhatIsKept() {
            assertThat(book.fixTable().find("QQC")).isEmpty();
            book.keepFixes(ADMINISTRATOR, "table tests", bytes("identifier,kind,latitude_deg,longitude_deg\nQQC,WAYPOINT,10,20\nQQC,WAYPOINT,-10,20\n"));
            assertThat(book.fixTable().find("QQC")).hasSize(2);
            assertThat(book.fixTable()).as("nothing kept since").isSameAs(book.fixTable());
            book.keep(ADMINISTRATOR, "In the table", 5, 6, 7, List.of("QQS"));
            assertThat(book.fixTable().find("qqs")).singleElement().satisfies(fix -> assertThat(fix.kind()).isEqualTo("STATION"));
        }

        @Test
        void eightyThousandFixesAreLoadedAndLookedUp() {
            StringBuilder csv = new StringBuilder("identifier,kind,latitude_deg,longitude_deg,magnetic_variation_east_deg\n");
            for (int i = 0; i < 80_000; i++) {
                csv.append('W').append(Integer.toString(i, 36).toUpperCase(java.util.Locale.ROOT)).append(",WAYPOINT,").append(i % 90).append(",").append(i % 180).append(",1.5\n");
            }
            FixList kept = book.keepFixes(ADMINISTRATOR, "many", bytes(csv.toString())).list();
            assertThat(kept.fixCount()).isEqualTo(80_000);
            FixTable table = book.fixTable();
            assertThat(table.size()).isGreaterThanOrEqualTo(80_000);
            for (int i = 0; i < 80_000; i += 7) {
                assertThat(table.find("W" + Integer.toString(i, 36))).hasSize(1);
            }
        }

        @Test
        void theDesksOwnUserCanNeitherChangeNorDeleteStationsAndFixes() {
            book.keep(ADMINISTRATOR, "Kept", 1, 2, 3, List.of("SBKE"));
            for (String table : List.of("station_version", "station_identifier", "fix_list_version", "fix")) {
                assertThatThrownBy(() -> jdbc.execute("delete from " + table)).as(table).isInstanceOf(DataAccessException.class);
            }
            assertThatThrownBy(() -> jdbc.execute("update station_version set name = ''")).isInstanceOf(DataAccessException.class);
        }
    }
}
