package org.shearbook.browser;

import com.deque.html.axecore.playwright.AxeBuilder;
import com.deque.html.axecore.results.AxeResults;
import com.microsoft.playwright.Browser;
import com.microsoft.playwright.BrowserContext;
import com.microsoft.playwright.Page;
import com.microsoft.playwright.options.ColorScheme;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.AfterEach;
import org.shearbook.testing.BrowserForTests;
import org.shearbook.testing.OnDemonstration;
import org.springframework.boot.test.web.server.LocalServerPort;

/** What every browser test needs: the demonstration served, a person signed in, an eye on the console. */
@OnDemonstration
abstract class DeskInBrowser {

    @LocalServerPort
    int port;

    private final List<BrowserContext> open = new ArrayList<>();
    /** What the browser complained of since the test began: an inline script refused, a missing file. */
    final List<String> complaints = new ArrayList<>();
    /** While the accessibility checker is at work: it writes inline styles of its own, which the policy rightly refuses. */
    private boolean checking;

    String address() {
        return "http://127.0.0.1:" + port;
    }

    /** A new browser of its own, nobody signed in. */
    Page browser(int width, int height, ColorScheme scheme) {
        BrowserContext context = BrowserForTests.get().newContext(new Browser.NewContextOptions()
                .setViewportSize(width, height).setColorScheme(scheme).setBaseURL(address()));
        open.add(context);
        Page page = context.newPage();
        page.setDefaultTimeout(20_000);
        page.onConsoleMessage(message -> {
            if (message.type().equals("error") && !checking) {
                complaints.add(message.text() + " at " + page.url());
            }
        });
        page.onPageError(error -> complaints.add(error + " at " + page.url()));
        return page;
    }

    /** A new browser with this person of the demonstration at the Desk. */
    Page signedIn(String username) {
        return signedIn(username, 1920, 1080, ColorScheme.DARK);
    }

    Page signedIn(String username, int width, int height, ColorScheme scheme) {
        Page page = browser(width, height, scheme);
        page.navigate("/login");
        page.getByLabel("Username").fill(username);
        page.getByLabel("Password").fill("ennersund");
        page.getByRole(com.microsoft.playwright.options.AriaRole.BUTTON, new Page.GetByRoleOptions().setName("Sign in")).click();
        page.waitForURL(address() + "/");
        return page;
    }

    /** A picture for people to look at, below {@code target/screenshots}. */
    void picture(Page page, String name) {
        page.screenshot(new Page.ScreenshotOptions().setPath(Path.of("target", "screenshots", name + ".png")).setFullPage(true));
    }

    /** What breaks the accessibility rules on this page, one line each. */
    List<String> accessibilityFaults(Page page) {
        checking = true;
        AxeResults results = new AxeBuilder(page).withTags(List.of("wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa")).analyze();
        // a round trip, so that what the checker caused has arrived
        page.evaluate("() => document.readyState");
        checking = false;
        return results.getViolations().stream()
                .map(rule -> rule.getId() + ": " + rule.getHelp() + " " + rule.getNodes().stream().limit(3).map(node -> node.getHtml()).toList())
                .toList();
    }

    @AfterEach
    void closeBrowsers() {
        open.forEach(BrowserContext::close);
    }
}
