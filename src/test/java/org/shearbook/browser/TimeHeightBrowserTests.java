package org.shearbook.browser;

import static org.assertj.core.api.Assertions.assertThat;

import com.microsoft.playwright.Locator;
import com.microsoft.playwright.Page;
import com.microsoft.playwright.options.AriaRole;
import com.microsoft.playwright.options.ColorScheme;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The time–height display in a browser, over the second day of the demonstration at Kelbrith. */
class TimeHeightBrowserTests extends DeskInBrowser {

    private static final String KELBRITH = "/time-height?station=XVKE&from=2031-03-12T00:00Z&until=2031-03-13T00:00Z";

    @Test
    void theKeysMoveOneCursorThroughBothPanesAndItIsReadOut() {
        Page page = drawn(1366, 768);
        Locator observed = page.locator(".is-observed .pane-frame");
        observed.focus();
        assertThat(readOut(page)).startsWith("12 MAR 1200Z FL300");
        observed.press("ArrowRight");
        observed.press("Shift+ArrowDown");
        assertThat(readOut(page)).startsWith("12 MAR 1205Z FL290 (").contains("Ri 0.").contains("200 m").contains("kt/1000 ft").contains("SLF 02 v2 inside")
                .contains("nearest report R");
        assertThat(page.locator(".time-height [role=status]").innerText()).contains("flight level 290").contains("inside SLF 02 v2, severe");
        observed.press("End");
        assertThat(readOut(page)).startsWith("13 MAR 0000Z");
        assertThat(complaints).isEmpty();
    }

    @Test
    void theLettersStepThroughReportsAndSoundingsAndShowThem() {
        Page page = drawn(1366, 768);
        Locator detail = page.locator(".time-height-detail");
        page.keyboard().press("n");
        assertThat(detail.innerText()).startsWith("R10, nil");
        for (int step = 0; step < 30 && !detail.innerText().startsWith("R25,"); step++) {
            page.keyboard().press("n");
        }
        assertThat(detail.innerText()).startsWith("R25, severe").contains("12 MAR 1142Z").contains("0.47").contains("SLF 02");
        assertThat(readOut(page)).startsWith("12 MAR 1142Z FL290").contains("SLF 02 inside");
        page.keyboard().press("l");
        assertThat(detail.innerText()).startsWith("Kelbrith 12 MAR").contains("lowest Ri");
        detail.getByRole(AriaRole.LINK, new Locator.GetByRoleOptions().setName("Open sounding")).click();
        assertThat(page.url()).contains("/soundings/");
        assertThat(complaints).isEmpty();
    }

    @Test
    void aBoxOpensWithAllItsVersionsByMouseAndByKey() {
        Page page = drawn(1920, 1080);
        Locator forecast = page.locator(".is-forecast .pane-frame");
        forecast.focus();
        for (String key : List.of("ArrowDown", "ArrowDown", "ArrowDown", "Enter")) {
            forecast.press(key);
        }
        Locator detail = page.locator(".time-height-detail");
        assertThat(detail.innerText()).startsWith("SLF 02 v2, severe").contains("FL270 to FL310").contains("80 %").contains("1: moderate");
        page.keyboard().press("Escape");
        assertThat(detail.innerText()).startsWith("Choose a sounding");
        forecast.click();
        assertThat(detail.innerText()).as("the middle of the pane is noon, FL225: nothing but the sounding there").startsWith("Kelbrith 12 MAR 1200Z");
    }

    @Test
    void thePanesSwapZoomAndKeepTheSameTimes() {
        Page page = drawn(1366, 768);
        assertThat(page.locator(".panes figure").first().getAttribute("class")).contains("is-observed");
        page.keyboard().press("s");
        assertThat(page.locator(".panes figure").first().getAttribute("class")).contains("is-forecast");
        page.locator(".is-observed .pane-frame").focus();
        page.keyboard().press("+");
        page.keyboard().press("u");
        Object ranges = page.evaluate("""
                () => [...document.querySelectorAll('.pane canvas')].map(canvas => Chart.getChart(canvas).scales)
                  .map(scales => [scales.x.min, scales.x.max, scales.y.min, scales.y.max].join(' '))""");
        assertThat((List<?>) ranges).hasSize(2).allMatch(range -> range.equals(((List<?>) ranges).get(0)));
        assertThat(String.valueOf(((List<?>) ranges).get(0))).endsWith(" 200 450");
        page.keyboard().press("w");
        assertThat(page.evaluate("() => { const x = Chart.getChart(document.querySelector('.pane canvas')).scales.x; return x.max - x.min }")).isEqualTo(1440);
    }

    @Test
    void theFieldIsSolidWhereTheBalloonWasHatchedAfterwardsAndBlankWhereNothingIsKnown() {
        Page page = drawn(1366, 768);
        // Share of inked points between FL070 and FL150, air with neither box nor report, in twenty minutes around a moment.
        String share = """
                ([hour]) => {
                  const chart = Chart.getChart(document.querySelector('.is-observed canvas'));
                  const { x, y } = chart.scales;
                  const scale = chart.currentDevicePixelRatio;
                  const minute = Date.UTC(2031, 2, 12) / 60000 + hour * 60;
                  const left = Math.round(x.getPixelForValue(minute - 10) * scale), right = Math.round(x.getPixelForValue(minute + 10) * scale);
                  const top = Math.round(y.getPixelForValue(150) * scale), bottom = Math.round(y.getPixelForValue(70) * scale);
                  const points = chart.ctx.getImageData(left, top, right - left, bottom - top).data;
                  let ink = 0;
                  for (let at = 0; at < points.length; at += 4) if (points[at + 3] > 0) ink++;
                  return ink / (points.length / 4);
                }""";
        double solid = ((Number) page.evaluate(share, List.of(11.6))).doubleValue();
        double carried = ((Number) page.evaluate(share, List.of(14.0))).doubleValue();
        double late = ((Number) page.evaluate(share, List.of(16.0))).doubleValue();
        double unknown = ((Number) page.evaluate(share, List.of(8.5))).doubleValue();
        assertThat(solid).isGreaterThan(0.95);
        assertThat(carried).isBetween(0.3, 0.8);
        assertThat(late).isLessThan(carried).isGreaterThan(0.1);
        assertThat(unknown).as("grid lines only").isLessThan(0.1);
    }

    @Test
    void anEmptyRangeNamesTheLastAscentAndGoesThere() {
        Page page = signedIn("forecaster-b");
        page.navigate("/time-height?station=XVTA&from=2031-03-20T00:00Z&until=2031-03-21T00:00Z");
        assertThat(page.locator("main").innerText()).contains("No ascents or reports for Tarquidd between 20 MAR 0000Z and 21 MAR 0000Z.");
        page.getByText("go there").click();
        page.locator("[data-drawn=yes]").waitFor();
        assertThat(page.locator("#tables caption").count()).isGreaterThan(0);
        assertThat(page.locator("main").innerText()).doesNotContain("No ascents or reports");
    }

    @Test
    void theDisplayIsAccessibleInEveryThemeBrightnessAndState() {
        Page page = drawn(1366, 768);
        page.keyboard().press("n");
        page.locator("#tables summary").click();
        for (String theme : List.of("dark", "light")) {
            page.locator("[data-set-theme=" + theme + "]").click();
            for (String brightness : List.of("day", "evening", "night")) {
                page.locator("[data-set-brightness=" + brightness + "]").click();
                assertThat(accessibilityFaults(page)).as(theme + " " + brightness).isEmpty();
            }
            page.locator("[data-set-brightness=day]").click();
            picture(page, "time-height-" + theme);
        }
        assertThat(complaints).isEmpty();
    }

    @Test
    void noLetterStandsOnTwoButtonsOfThePage() {
        Page page = drawn(1366, 768);
        List<?> letters = (List<?>) page.evaluate("() => [...document.querySelectorAll('[data-key]')].map(button => button.dataset.key.toUpperCase())");
        assertThat(letters).hasSizeGreaterThan(8).doesNotHaveDuplicates();
        // a person can switch them off
        page.keyboard().press("?");
        page.getByText("Single letters off").click();
        page.keyboard().press("Escape");
        page.keyboard().press("s");
        assertThat(page.locator(".panes figure").first().getAttribute("class")).contains("is-observed");
    }

    private Page drawn(int width, int height) {
        Page page = signedIn("forecaster-b", width, height, ColorScheme.DARK);
        page.navigate(KELBRITH);
        page.locator("[data-drawn=yes]").waitFor();
        page.locator("body[data-ready=yes]").waitFor();
        return page;
    }

    private static String readOut(Page page) {
        return String.join(" | ", page.locator(".read-out span").allInnerTexts());
    }
}
