package org.shearbook.desk.layer.web;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.layer.LayerBook;
import org.shearbook.desk.layer.LayerHistory;
import org.shearbook.desk.layer.LayerHistoryBook;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingHeader;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestParam;

/** The layers of one station from sounding to sounding. */
@Controller
class LayerHistoryController {

    private static final Duration LOOKS_BACK = Duration.ofHours(72);

    private final LayerHistoryBook histories;
    private final LayerBook layers;
    private final SoundingArchive soundings;
    private final Clock clock;

    LayerHistoryController(LayerHistoryBook histories, LayerBook layers, SoundingArchive soundings, Clock clock) {
        this.histories = histories;
        this.layers = layers;
        this.soundings = soundings;
        this.clock = clock;
    }

    @GetMapping("/layers/histories")
    String page(@RequestParam(required = false) @Nullable String station, AsKnownAt asKnownAt, Model model) {
        Instant now = asKnownAt.isNow() ? clock.instant() : asKnownAt.moment();
        Instant from = now.minus(LOOKS_BACK);
        Map<String, String> names = new TreeMap<>();
        for (SoundingHeader sounding : soundings.between(null, from, now.plusNanos(1000), asKnownAt)) {
            names.put(sounding.stationId(), sounding.stationName());
        }
        String shown = station != null && !station.isBlank() ? station.strip()
                : names.entrySet().stream().min(Map.Entry.<String, String>comparingByValue(Comparator.naturalOrder())).map(Map.Entry::getKey).orElse(null);
        List<LayerHistory> found = shown == null ? List.of() : histories.of(shown, from, now, asKnownAt);
        model.addAttribute("stations", names);
        model.addAttribute("station", shown);
        model.addAttribute("stationName", shown == null ? null : names.getOrDefault(shown, shown));
        model.addAttribute("histories", found);
        model.addAttribute("now", now);
        model.addAttribute("evidenceHours", layers.evidenceLasts().toHours());
        model.addAttribute("asKnownAt", asKnownAt.isNow() ? null : asKnownAt.moment());
        return "layer/histories";
    }
}
