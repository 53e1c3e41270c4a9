package org.shearbook.desk.timeheight.web;

import jakarta.servlet.http.HttpServletResponse;
import java.time.Instant;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.Moments;
import org.shearbook.desk.shell.UnreadableMoment;
import org.shearbook.desk.station.Station;
import org.shearbook.desk.timeheight.TimeHeight;
import org.shearbook.desk.timeheight.TimeHeightDisplay;
import org.shearbook.desk.timeheight.TimeRefused;
import org.shearbook.desk.timeheight.UnknownStation;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestParam;

/** The page Time–height. What cannot be shown is said above the display, which then shows the usual day. */
@Controller
class TimeHeightController {

    private static final String USUAL_RANGE = "24h";

    private final TimeHeightDisplay display;

    TimeHeightController(TimeHeightDisplay display) {
        this.display = display;
    }

    @GetMapping("/time-height")
    String page(@RequestParam(required = false) @Nullable String station, @RequestParam(required = false) @Nullable String from,
            @RequestParam(required = false) @Nullable String until, @RequestParam(required = false) @Nullable String range,
            @RequestParam(required = false) @Nullable String distanceNm, AsKnownAt asKnownAt, HttpServletResponse response, Model model) {
        Station found = null;
        try {
            found = display.station(station, asKnownAt);
            Instant start = Moments.read("from", from);
            Instant end = Moments.read("until", until);
            String chosen = (range == null || range.isBlank()) && start == null && end == null ? USUAL_RANGE : range;
            if (found != null) {
                TimeHeight shown = display.of(found, display.time(chosen, start, end, found, asKnownAt), distance(distanceNm), asKnownAt);
                model.addAttribute("page", TimeHeightPage.of(display.stations(asKnownAt), shown, chosen));
            }
        } catch (UnknownStation unknown) {
            refuse(model, "station", unknown.getMessage());
        } catch (UnreadableMoment unreadable) {
            refuse(model, unreadable.field(), unreadable.said());
        } catch (TimeRefused refused) {
            refuse(model, refused.field(), refused.getMessage());
        }
        if (model.containsAttribute("refused")) {
            response.setStatus(HttpServletResponse.SC_BAD_REQUEST);
            Station usual = found == null ? display.station(null, asKnownAt) : found;
            if (usual != null) {
                TimeHeight shown = display.of(usual, display.time(USUAL_RANGE, null, null, usual, asKnownAt), TimeHeightDisplay.USUAL_DISTANCE, asKnownAt);
                model.addAttribute("page", TimeHeightPage.of(display.stations(asKnownAt), shown, USUAL_RANGE));
            }
        }
        return "timeheight/display";
    }

    private static int distance(@Nullable String asked) {
        if (asked == null || asked.isBlank()) {
            return TimeHeightDisplay.USUAL_DISTANCE;
        }
        return TimeHeightDisplay.DISTANCES.stream().filter(it -> it.toString().equals(asked.strip())).findFirst()
                .orElseThrow(() -> new TimeRefused("distanceNm", "DISTANCE_NOT_OFFERED", "Reports are shown within 60, 120 or 240 NM."));
    }

    private static void refuse(Model model, String field, @Nullable String said) {
        model.addAttribute("refused", said);
        model.addAttribute("refusedField", field);
    }
}
