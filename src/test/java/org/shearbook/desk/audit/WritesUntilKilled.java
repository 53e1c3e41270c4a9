package org.shearbook.desk.audit;

import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.PreparedStatement;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.Map;
import org.flywaydb.core.Flyway;

/** A process of its own that commits one row after another to a file database and says so after each, until it is killed. */
final class WritesUntilKilled {

    private WritesUntilKilled() {
    }

    public static void main(String[] arguments) throws Exception {
        Flyway.configure().dataSource(arguments[0] + arguments[1], "shearbook_owner", "owner")
                .locations("classpath:db/migration/common", "classpath:db/migration/h2").outOfOrder(true)
                .placeholders(Map.of("desk-password", "desk")).load().migrate();
        try (Connection connection = DriverManager.getConnection(arguments[0], "shearbook_desk", "desk");
                PreparedStatement insert = connection.prepareStatement(
                        "insert into access_entry values (?, '2031-03', ?, 'forecaster-b', '-', 'local', '-', 'signed in', '', 'p', 'h')")) {
            connection.setAutoCommit(false);
            for (long row = 1; row <= 200_000; row++) {
                insert.setLong(1, row);
                insert.setObject(2, Instant.EPOCH.plusSeconds(row).atOffset(ZoneOffset.UTC));
                insert.executeUpdate();
                connection.commit();
                System.out.println(row);
            }
        }
    }
}
