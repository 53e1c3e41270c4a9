package org.shearbook.browser;

import static org.assertj.core.api.Assertions.assertThat;

import com.microsoft.playwright.Page;
import com.microsoft.playwright.Response;
import com.microsoft.playwright.options.ColorScheme;
import com.microsoft.playwright.options.Cookie;
import com.microsoft.playwright.options.Media;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Every page, in both themes: it answers, it breaks no accessibility rule, and the browser has nothing to complain of. */
class PagesBrowserTests extends DeskInBrowser {

    private static final List<String> PAGES = List.of("/", "/time-height", "/soundings", "/air-reports", "/layers", "/forecasts", "/forecasts/new", "/intake",
            "/audit", "/staff", "/stations", "/method");

    @ParameterizedTest
    @ValueSource(strings = {"dark", "light"})
    void everyPageIsWholeAndAccessible(String theme) {
        Page page = signedIn("forecaster-b", 1366, 768, ColorScheme.DARK);
        page.context().addCookies(List.of(new Cookie("shearbook-theme", theme).setUrl(address())));
        List<String> addresses = new ArrayList<>(PAGES);
        for (String list : List.of("/soundings", "/air-reports", "/forecasts")) {
            page.navigate(list);
            addresses.add((String) page.locator("main a[href^='" + list + "/']").first().getAttribute("href"));
        }
        List<String> faults = new ArrayList<>();
        for (String address : addresses) {
            Response response = page.navigate(address);
            page.locator("body[data-ready=yes]").waitFor();
            assertThat(response.status()).as(address).isEqualTo(200);
            assertThat(page.locator("html").getAttribute("data-theme")).isEqualTo(theme);
            accessibilityFaults(page).forEach(fault -> faults.add(address + ": " + fault));
            picture(page, theme + address.replaceAll("[^a-z0-9]+", "-"));
        }
        assertThat(faults).isEmpty();
        assertThat(complaints).isEmpty();
    }

    @Test
    void everyPageCarriesItsCautionsAndSaysThatTheDataAreInvented() {
        Page page = signedIn("forecaster-b");
        for (String address : PAGES) {
            page.navigate(address);
            assertThat(page.locator(".demonstration-line").innerText()).as(address).contains("DEMONSTRATION DATA");
            assertThat(page.locator(".page-foot").innerText()).as(address).contains("It does not replace official products");
        }
        for (String address : List.of("/", "/soundings", "/time-height", "/layers")) {
            page.navigate(address);
            assertThat(page.locator("main").innerText()).as(address).contains("Ri below 1/4 is necessary for Kelvin-Helmholtz instability, not proof of it");
        }
        for (String address : List.of("/", "/air-reports")) {
            page.navigate(address);
            assertThat(page.locator("main").innerText()).as(address).contains("No report does not mean smooth air");
        }
    }

    @Test
    void thePagesArePrintedBlackOnWhite() {
        Page page = signedIn("forecaster-b", 1366, 768, ColorScheme.DARK);
        page.emulateMedia(new Page.EmulateMediaOptions().setMedia(Media.PRINT));
        for (String address : List.of("/", "/time-height", "/soundings", "/layers", "/forecasts")) {
            page.navigate(address);
            page.locator("body[data-ready=yes]").waitFor();
            assertThat(page.evaluate("() => getComputedStyle(document.body).backgroundColor + ' ' + getComputedStyle(document.body).color"))
                    .as(address).isEqualTo("rgb(255, 255, 255) rgb(0, 0, 0)");
            assertThat(page.locator(".side").isVisible()).isFalse();
            picture(page, "print" + address.replaceAll("[^a-z0-9]+", "-"));
        }
    }

    @Test
    void thePagesSayEverythingWithoutScript() {
        com.microsoft.playwright.BrowserContext context = org.shearbook.testing.BrowserForTests.get().newContext(
                new com.microsoft.playwright.Browser.NewContextOptions().setJavaScriptEnabled(false).setBaseURL(address()));
        try {
            Page page = context.newPage();
            page.navigate("/login");
            page.getByLabel("Username").fill("forecaster-b");
            page.getByLabel("Password").fill("ennersund");
            page.locator("main button").click();
            page.navigate("/time-height?station=XVKE&from=2031-03-12T00:00Z&until=2031-03-13T00:00Z");
            assertThat(page.locator("main table").first().textContent()).isNotBlank();
            assertThat(page.locator("main").textContent()).contains("SLF 02");
            page.navigate("/layers");
            assertThat(page.locator("main").textContent()).contains("Kelbrith A");
        } finally {
            context.close();
        }
    }
}
