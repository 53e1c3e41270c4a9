package org.shearbook.desk.audit;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.ResultSet;
import java.util.Random;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.RepeatedTest;
import org.junit.jupiter.api.io.TempDir;

/** What the embedded database has acknowledged is there after the process is killed in the middle of its work. */
class ProcessDeathTests {

    @TempDir Path folder;

    @RepeatedTest(2)
    void everyAcknowledgedRowIsThereAfterTheProcessIsKilled() throws Exception {
        long seed = 20261201L + folder.hashCode();
        int killAfter = 200 + new Random(seed).nextInt(800);
        String url = "jdbc:h2:file:" + folder.resolve("shearbook") + ";DB_CLOSE_ON_EXIT=FALSE;LOCK_TIMEOUT=30000";
        Process process = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-cp", System.getProperty("java.class.path"), WritesUntilKilled.class.getName(), url, ownersSettings())
                .redirectError(ProcessBuilder.Redirect.DISCARD).start();
        long acknowledged = 0;
        try (BufferedReader said = new BufferedReader(new InputStreamReader(process.getInputStream(), StandardCharsets.US_ASCII))) {
            String line;
            while ((line = said.readLine()) != null) {
                if (line.matches("\\d+")) {
                    acknowledged = Long.parseLong(line);
                    if (acknowledged == killAfter) {
                        process.toHandle().destroyForcibly();
                    }
                }
            }
        } finally {
            process.destroyForcibly().waitFor();
        }
        assertThat(acknowledged).as("rows said to be committed before the kill").isGreaterThanOrEqualTo(killAfter);
        try (Connection connection = DriverManager.getConnection(url, "shearbook_desk", "desk");
                ResultSet kept = connection.createStatement().executeQuery("select count(*), max(entry_sequence) from access_entry")) {
            kept.next();
            assertThat(kept.getLong(2)).as("seed %d", seed).isGreaterThanOrEqualTo(acknowledged);
            assertThat(kept.getLong(1)).as("without a hole").isEqualTo(kept.getLong(2));
        }
    }

    /** What the application's settings add to the address for the owner. */
    private static String ownersSettings() throws IOException {
        Matcher address = Pattern.compile("url: \\$\\{spring\\.datasource\\.url}(;\\S+)")
                .matcher(Files.readString(Path.of("src/main/resources/application.yml"), StandardCharsets.UTF_8));
        assertThat(address.find()).isTrue();
        return address.group(1);
    }
}
