package org.shearbook.testing;

import io.zonky.test.db.postgres.embedded.EmbeddedPostgres;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import org.springframework.boot.test.util.TestPropertyValues;
import org.springframework.context.ApplicationContextInitializer;
import org.springframework.context.ConfigurableApplicationContext;

/**
 * One real PostgreSQL for the life of the test JVM: {@code -Dtest.pg.url=…} (with an owner {@code postgres}) where
 * the machine forbids starting one, else an embedded one. It is never stopped by hand, since cached contexts hold
 * connections to it until the JVM ends.
 */
public class PostgresForTests implements ApplicationContextInitializer<ConfigurableApplicationContext> {

    private static EmbeddedPostgres embedded;

    @Override
    public void initialize(ConfigurableApplicationContext context) {
        TestPropertyValues.of(
                "spring.datasource.url=" + url(),
                "shearbook.database.owner-user=shearbook_owner").applyTo(context);
    }

    static synchronized String url() {
        String named = System.getProperty("test.pg.url");
        if (named != null) {
            return named;
        }
        if (embedded == null) {
            try {
                embedded = EmbeddedPostgres.builder().start();
                // The desk's two users come from outside the desk: the owner from whoever sets up the server.
                try (Connection connection = embedded.getPostgresDatabase().getConnection(); Statement statement = connection.createStatement()) {
                    statement.execute("create role shearbook_owner login createrole password 'owner'");
                    statement.execute("create database shearbook owner shearbook_owner");
                }
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            } catch (SQLException e) {
                throw new IllegalStateException("The test PostgreSQL started but refused its owner", e);
            }
        }
        return embedded.getJdbcUrl("shearbook_owner", "shearbook").replaceAll("\\?.*$", "");
    }
}
