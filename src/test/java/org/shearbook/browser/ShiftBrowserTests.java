package org.shearbook.browser;

import static org.assertj.core.api.Assertions.assertThat;

import com.microsoft.playwright.Locator;
import com.microsoft.playwright.Page;
import com.microsoft.playwright.options.AriaRole;
import org.junit.jupiter.api.Test;

/** The main job of a shift, end to end: take the desk, draft from a layer, check, issue, see it in force, cancel it, leave. */
class ShiftBrowserTests extends DeskInBrowser {

    @Test
    void aForecasterTakesTheDeskAndIssuesAForecastFromALayer() {
        Page page = signedIn("forecaster-b");
        assertThat(page.locator(".top-bar").innerText()).contains("vacant");
        button(page, "Take the desk").click();
        assertThat(page.locator(".top-bar").innerText()).contains("Forecaster B since");

        page.navigate("/layers");
        page.locator("tr", new Page.LocatorOptions().setHasText("Kelbrith A")).getByRole(AriaRole.LINK, new Locator.GetByRoleOptions().setName("Draft a forecast")).click();
        assertThat(page.locator("#baseFlightLevel").inputValue()).matches("2[67]0");
        assertThat(page.locator("#topFlightLevel").inputValue()).matches("3[01]0");
        assertThat(page.locator("main").innerText()).containsIgnoringCase("from Kelbrith");

        button(page, "Check page").click();
        Locator refused = page.locator(".error-summary");
        assertThat(refused.innerText()).as("what is missing is named").isNotBlank();

        page.locator("input[name=intensity][value=MOD]").check();
        page.locator("input[name=conditions][value=CLEAR_AIR]").check();
        page.locator("#validFrom").fill("1315");
        page.locator("#validUntil").fill("1645");
        page.locator("#probabilityPercent").selectOption("60");
        page.locator("#change").selectOption("NC");
        page.locator("#wouldChange").fill("cancel if Ri is 0.5 or more at 0000Z and no yes-report in 90 min");
        button(page, "Check page").click();
        String text = page.locator("#text").innerText();
        assertThat(text).contains("ADVISORY, NOT A SIGMET").contains("Levels").contains("moderate turbulence in clear air")
                .contains("60 %, even chance").contains("Would change it").doesNotContain("VALID ").doesNotContain("=");
        button(page, "Issue").click();
        assertThat(page.locator("main").innerText()).contains("SLF 07").contains("ADVISORY ONLY");

        page.navigate("/");
        Locator card = page.locator(".forecast-card", new Page.LocatorOptions().setHasText("SLF 07"));
        assertThat(card.innerText()).contains("left");
        picture(page, "desk-with-a-forecast-in-force");
        card.getByRole(AriaRole.LINK, new Locator.GetByRoleOptions().setName("Cancel SLF 07")).click();
        page.locator("#reason").fill("played through in a test");
        button(page, "Cancel the forecast").click();
        page.navigate("/");
        assertThat(page.locator(".forecast-card", new Page.LocatorOptions().setHasText("SLF 07")).filter(new Locator.FilterOptions().setHasText("left")).count()).isZero();
        button(page, "Leave the desk").click();
        assertThat(page.locator(".top-bar").innerText()).contains("vacant since");

        Page supervisor = signedIn("supervisor-s");
        supervisor.navigate("/audit");
        assertThat(supervisor.locator("main table").first().innerText()).contains("desk left").contains("desk taken").contains("forecaster-b");
        assertThat(supervisor.locator("main").innerText()).containsIgnoringCase("intact");
        assertThat(complaints).isEmpty();
    }

    @Test
    void nothingLiveIsOutOfSightOnAWideScreen() {
        Page page = signedIn("forecaster-c");
        Number height = (Number) page.evaluate("() => document.documentElement.scrollHeight");
        assertThat(height.intValue()).as("height of the Desk at 1920 × 1080").isLessThanOrEqualTo(1080);
    }

    private static Locator button(Page page, String name) {
        return page.getByRole(AriaRole.BUTTON, new Page.GetByRoleOptions().setName(name)).first();
    }
}
