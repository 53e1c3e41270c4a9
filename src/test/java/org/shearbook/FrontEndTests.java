package org.shearbook;

import static org.assertj.core.api.Assertions.assertThat;

import com.microsoft.playwright.impl.driver.Driver;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;

/** The tests of the pages' scripts, run by the Node that comes with Playwright, so that no other is needed. */
class FrontEndTests {

    private static final Path FRONT_END = Path.of("frontend");

    @TestFactory
    Stream<DynamicTest> everyScriptTestPasses() throws IOException {
        Path node = Driver.ensureDriverInstalled(Map.of("PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD", "1"), false).driverDir()
                .resolve(System.getProperty("os.name").startsWith("Windows") ? "node.exe" : "node");
        List<Path> tests;
        try (Stream<Path> files = Files.walk(FRONT_END)) {
            tests = files.filter(file -> file.toString().endsWith(".test.js")).sorted().toList();
        }
        assertThat(tests).isNotEmpty();
        return tests.stream().map(file -> DynamicTest.dynamicTest(FRONT_END.relativize(file).toString(), () -> {
            Process process = new ProcessBuilder(node.toString(), "--test", file.toString()).redirectErrorStream(true).start();
            process.getOutputStream().close();
            String said = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
            assertThat(process.waitFor(60, TimeUnit.SECONDS)).isTrue();
            assertThat(process.exitValue()).as(said).isZero();
        }));
    }
}
