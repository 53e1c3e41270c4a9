package org.shearbook.desk.layer.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.analysis.AnalysisSummary;
import org.shearbook.desk.analysis.StabilityState;
import org.shearbook.desk.layer.Layer;
import org.shearbook.desk.sounding.SoundingHeader;

/** What the page Layers shows. */
final class LayerPage {

    private LayerPage() {
    }

    /**
     * The newest sounding of a station.
     *
     * @param summary null when it was not analysed
     * @param state   now, which is unknown once its evidence is too old
     */
    record Ascent(SoundingHeader sounding, @Nullable AnalysisSummary summary, @Nullable StabilityState state, List<Row> layers) {


        /** Why there is no result; null when there is one. */
        public @Nullable String notAnalysed() {
            return summary == null ? "no analysis was kept" : summary.notAnalysed();
        }
    }

    /** @param state now, which is unknown once the sounding is too old */
    record Row(Layer layer, StabilityState state) {

        /** The state by the sounding, where it no longer holds; null where it does. */
        public @Nullable String was() {
            return state == layer.state() ? null : layer.state().inWords();
        }
    }
}
