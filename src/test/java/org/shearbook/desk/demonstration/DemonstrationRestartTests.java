package org.shearbook.desk.demonstration;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.net.CookieManager;
import java.net.ServerSocket;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The desk as a process of its own, on its file database: killed in the middle of the play it goes on where it was
 * cut off; killed afterwards it stands where it stood. Its data folder is named relative to the working one, as by default.
 */
class DemonstrationRestartTests {

    private static final Duration PATIENCE = Duration.ofMinutes(5);

    @TempDir Path folder;

    private Process desk;

    @Test
    void aPlayThatWasCutOffGoesOnAndTheDeskSurvivesItsDeath() throws Exception {
        int port = freePort();
        start(port, "first.log");
        waitFor("first.log", "Started ShearbookApplication");
        Thread.sleep(2500); // in the middle of the play, wherever that is on this machine
        kill();

        start(port, "second.log");
        waitFor("second.log", "Shearbook is ready");
        String said = log("second.log");
        assertThat(said).contains("http://127.0.0.1:" + port + "/").contains("forecaster-a").contains("observer-o").contains("ennersund");
        assertThat(occurrences(get(port, "/api/v1/air-reports?from=2031-03-10T00:00:00Z&until=2031-03-15T00:00:00Z&limit=500"), "\"observedAt\"")).isEqualTo(61);
        assertThat(occurrences(get(port, "/api/v1/soundings?from=2031-03-10T00:00:00Z&until=2031-03-15T00:00:00Z&limit=500"), "\"nominalAt\"")).isEqualTo(23);
        assertThat(getAsSupervisor(port, "/api/v1/audit-entries/integrity")).contains("\"intact\":true");
        Instant before = newestTime(getAsSupervisor(port, "/api/v1/audit-entries?limit=1"));
        kill();

        start(port, "third.log");
        waitFor("third.log", "Shearbook is ready");
        assertThat(occurrences(get(port, "/api/v1/air-reports?from=2031-03-10T00:00:00Z&until=2031-03-15T00:00:00Z&limit=500"), "\"observedAt\"")).isEqualTo(61);
        assertThat(getAsSupervisor(port, "/api/v1/audit-entries/integrity")).contains("\"intact\":true");
        assertThat(newestTime(getAsSupervisor(port, "/api/v1/audit-entries?limit=1"))).as("nothing was played again").isEqualTo(before);
    }

    private void start(int port, String log) throws IOException {
        desk = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(), "-Xmx512m",
                "-cp", System.getProperty("java.class.path"), "org.shearbook.desk.ShearbookApplication",
                "--spring.profiles.active=demo", "--server.port=" + port, "--shearbook.data-dir=" + Path.of("").toAbsolutePath().relativize(folder.resolve("desk")))
                .redirectErrorStream(true).redirectOutput(folder.resolve(log).toFile()).start();
    }

    private void waitFor(String log, String words) throws Exception {
        long end = System.nanoTime() + PATIENCE.toNanos();
        while (!log(log).contains(words)) {
            assertThat(desk.isAlive()).as(log(log)).isTrue();
            assertThat(System.nanoTime()).as("'%s' within %s in: %s", words, PATIENCE, log(log)).isLessThan(end);
            Thread.sleep(200);
        }
    }

    private String log(String log) throws IOException {
        return Files.exists(folder.resolve(log)) ? Files.readString(folder.resolve(log), StandardCharsets.UTF_8) : "";
    }

    @AfterEach
    void kill() throws InterruptedException {
        desk.destroyForcibly().waitFor();
    }

    private static String get(int port, String path) throws Exception {
        HttpResponse<String> answer = HttpClient.newHttpClient().send(HttpRequest.newBuilder(URI.create("http://127.0.0.1:" + port + path))
                .header("Authorization", "Bearer ennersund-demo").build(), HttpResponse.BodyHandlers.ofString());
        assertThat(answer.statusCode()).as(path + " " + answer.body()).isEqualTo(200);
        return answer.body();
    }

    /** What only a supervisor sees. */
    private static String getAsSupervisor(int port, String path) throws Exception {
        HttpClient browser = HttpClient.newBuilder().cookieHandler(new CookieManager()).build();
        URI login = URI.create("http://127.0.0.1:" + port + "/login");
        String form = browser.send(HttpRequest.newBuilder(login).build(), HttpResponse.BodyHandlers.ofString()).body();
        Matcher token = Pattern.compile("name=\"_csrf\" value=\"([^\"]+)\"").matcher(form);
        assertThat(token.find()).isTrue();
        browser.send(HttpRequest.newBuilder(login).header("Content-Type", "application/x-www-form-urlencoded")
                .POST(HttpRequest.BodyPublishers.ofString("username=supervisor-s&password=ennersund&_csrf=" + token.group(1))).build(),
                HttpResponse.BodyHandlers.discarding());
        HttpResponse<String> answer = browser.send(HttpRequest.newBuilder(URI.create("http://127.0.0.1:" + port + path)).build(), HttpResponse.BodyHandlers.ofString());
        assertThat(answer.statusCode()).as(path + " " + answer.body()).isEqualTo(200);
        return answer.body();
    }

    private static Instant newestTime(String entries) {
        Matcher time = Pattern.compile("\"recordedAt\":\"([^\"]+)\"").matcher(entries);
        assertThat(time.find()).as(entries).isTrue();
        return Instant.parse(time.group(1));
    }

    private static int occurrences(String text, String part) {
        return text.split(Pattern.quote(part), -1).length - 1;
    }

    private static int freePort() throws IOException {
        try (ServerSocket socket = new ServerSocket(0)) {
            return socket.getLocalPort();
        }
    }
}
