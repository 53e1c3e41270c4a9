package org.shearbook.desk.layer.web;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.analysis.AnalysisBook;
import org.shearbook.desk.analysis.AnalysisSummary;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.layer.Layer;
import org.shearbook.desk.layer.LayerBook;
import org.shearbook.desk.shell.Moments;
import org.shearbook.desk.shell.UnreadableMoment;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingHeader;
import org.shearbook.desk.sounding.SoundingId;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;

/** The page Layers: the newest sounding of each station, then the layers of the days before. */
@Controller
@RequestMapping("/layers")
class LayerController {

    private static final Duration LOOKS_BACK = Duration.ofHours(72);
    private static final int MOST_SHOWN = 300;

    private final LayerBook layers;
    private final SoundingArchive soundings;
    private final AnalysisBook analyses;
    private final Clock clock;

    LayerController(LayerBook layers, SoundingArchive soundings, AnalysisBook analyses, Clock clock) {
        this.layers = layers;
        this.soundings = soundings;
        this.analyses = analyses;
        this.clock = clock;
    }

    @GetMapping
    String page(@RequestParam(required = false) @Nullable String from, @RequestParam(required = false) @Nullable String until, AsKnownAt asKnownAt, Model model) {
        Instant now = asKnownAt.isNow() ? clock.instant() : asKnownAt.moment();
        Instant start = now.minus(LOOKS_BACK).truncatedTo(ChronoUnit.HOURS);
        Instant end = Moments.LATEST;
        try {
            Instant asked = Moments.read("from", from);
            start = asked != null ? asked : start;
            asked = Moments.read("until", until);
            end = asked != null ? asked : end;
        } catch (UnreadableMoment unreadable) {
            model.addAttribute("refusedField", unreadable.field());
            model.addAttribute("refused", unreadable.said());
        }
        List<SoundingHeader> newest = newestOfEachStation(now, asKnownAt);
        List<SoundingId> ids = newest.stream().map(SoundingHeader::id).toList();
        Map<SoundingId, AnalysisSummary> summaries = analyses.summaries(ids, asKnownAt);
        Map<SoundingId, List<Layer>> found = layers.ofSoundings(ids, asKnownAt);
        List<LayerPage.Ascent> ascents = new ArrayList<>();
        for (SoundingHeader sounding : newest) {
            AnalysisSummary summary = summaries.get(sounding.id());
            ascents.add(new LayerPage.Ascent(sounding, summary,
                    summary == null ? null : layers.stateAt(summary.state(), sounding.observedAt(), now),
                    rows(found.getOrDefault(sounding.id(), List.of()), now)));
        }
        model.addAttribute("ascents", ascents);
        model.addAttribute("history", rows(layers.newest(null, start, end, null, asKnownAt, MOST_SHOWN), now));
        model.addAttribute("most", MOST_SHOWN);
        model.addAttribute("from", from != null ? from : start.toString().replace(":00Z", "Z"));
        model.addAttribute("until", until);
        model.addAttribute("evidenceHours", layers.evidenceLasts().toHours());
        model.addAttribute("asKnownAt", asKnownAt.isNow() ? null : asKnownAt.moment());
        return "layer/layers";
    }

    private List<SoundingHeader> newestOfEachStation(Instant now, AsKnownAt asKnownAt) {
        Map<String, SoundingHeader> newest = new LinkedHashMap<>();
        for (SoundingHeader sounding : soundings.between(null, now.minus(LOOKS_BACK), now.plus(Duration.ofHours(1)), asKnownAt)) {
            // One ascent may have come in two formats: the finer one is shown.
            newest.merge(sounding.stationId(), sounding, (before, after) ->
                    after.observedAt().equals(before.observedAt()) && before.levelCount() > after.levelCount() ? before : after);
        }
        return newest.values().stream().sorted(Comparator.comparing(SoundingHeader::stationName)).toList();
    }

    private List<LayerPage.Row> rows(List<Layer> found, Instant now) {
        return found.stream().map(layer -> new LayerPage.Row(layer, layers.stateAt(layer.state(), layer.observedAt(), now))).toList();
    }
}
