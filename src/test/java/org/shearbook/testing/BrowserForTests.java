package org.shearbook.testing;

import com.microsoft.playwright.Browser;
import com.microsoft.playwright.BrowserType;
import com.microsoft.playwright.Playwright;
import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;

/**
 * The one browser of the test JVM. It takes the browser that is named ({@code -Dbrowser.path} or {@code BROWSER_PATH}),
 * else one that is installed, else Playwright's own, else installs one. It fails where none can be had: a browser test
 * is never skipped in silence.
 */
public final class BrowserForTests {

    private static final List<String> NAMES = List.of("chromium-headless-shell", "chromium", "chromium-browser", "google-chrome-stable",
            "google-chrome", "chrome", "microsoft-edge");
    private static final List<String> ELSEWHERE = List.of("/Applications/Google Chrome.app/Contents/MacOS/Google Chrome",
            "/Applications/Chromium.app/Contents/MacOS/Chromium", "C:/Program Files/Google/Chrome/Application/chrome.exe",
            "C:/Program Files (x86)/Microsoft/Edge/Application/msedge.exe");
    private static final List<String> ARGUMENTS = List.of("--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run",
            "--disable-background-networking", "--disable-component-update", "--disable-sync");

    private static Browser browser;

    private BrowserForTests() {
    }

    public static synchronized Browser get() {
        if (browser == null) {
            Playwright playwright = Playwright.create(new Playwright.CreateOptions().setEnv(Map.of("PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD", "1")));
            BrowserType.LaunchOptions options = new BrowserType.LaunchOptions().setArgs(ARGUMENTS);
            find(playwright).ifPresent(options::setExecutablePath);
            browser = playwright.chromium().launch(options);
            Runtime.getRuntime().addShutdownHook(new Thread(playwright::close));
        }
        return browser;
    }

    /** Empty means Playwright's own browser. */
    private static Optional<Path> find(Playwright playwright) {
        String named = System.getProperty("browser.path", "");
        named = named.isBlank() ? System.getenv().getOrDefault("BROWSER_PATH", "") : named;
        if (!named.isBlank()) {
            return Optional.of(Path.of(named));
        }
        // The switch shows on a machine with a browser what happens on one without.
        Optional<Path> installed = Boolean.getBoolean("browser.ignoreInstalled") ? Optional.empty() : installed();
        if (installed.isPresent()) {
            return installed;
        }
        if (Files.isExecutable(Path.of(playwright.chromium().executablePath()))) {
            return Optional.empty();
        }
        String java = Path.of(System.getProperty("java.home"), "bin", "java").toString();
        if (run(java, "-cp", System.getProperty("java.class.path"), "com.microsoft.playwright.CLI", "install", "--only-shell", "chromium")) {
            return Optional.empty();
        }
        if ("root".equals(System.getProperty("user.name")) && onPath("apt-get").isPresent()) {
            run("apt-get", "-o", "DPkg::Lock::Timeout=240", "update");
            for (String name : List.of("chromium-headless-shell", "chromium")) {
                if (run("apt-get", "-o", "DPkg::Lock::Timeout=240", "install", "-y", "--no-install-recommends", name) && installed().isPresent()) {
                    return installed();
                }
            }
        }
        throw new IllegalStateException("The browser tests need a Chromium: install Chrome or Chromium, or name one with -Dbrowser.path=…");
    }

    private static Optional<Path> installed() {
        return Stream.concat(NAMES.stream().flatMap(name -> onPath(name).stream()), ELSEWHERE.stream().map(Path::of).filter(Files::isExecutable)).findFirst();
    }

    private static Optional<Path> onPath(String name) {
        return Stream.of(System.getenv().getOrDefault("PATH", "").split(File.pathSeparator))
                .map(folder -> Path.of(folder, name)).filter(Files::isExecutable).findFirst();
    }

    private static boolean run(String... command) {
        try {
            Path log = Path.of("target", "browser-install.log");
            Files.createDirectories(log.getParent());
            Process process = new ProcessBuilder(command).redirectErrorStream(true)
                    .redirectOutput(ProcessBuilder.Redirect.appendTo(log.toFile())).start();
            if (!process.waitFor(300, TimeUnit.SECONDS)) {
                process.destroyForcibly();
                return false;
            }
            return process.exitValue() == 0;
        } catch (IOException e) {
            return false;
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            return false;
        }
    }
}
