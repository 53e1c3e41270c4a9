package org.shearbook.desk.analysis;

import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.sounding.SoundingId;

/**
 * The analysis of one version of one sounding.
 *
 * @param summary  what lists show
 * @param document null when it was not analysed
 */
public record Analysis(AnalysisSummary summary, @Nullable AnalysisDocument document) {

    public SoundingId soundingId() {
        return summary.soundingId();
    }

    /** Of the analysis; 0 when it was not kept. */
    public int version() {
        return summary.version();
    }

    public Optional<AnalysisDocument> result() {
        return Optional.ofNullable(document);
    }
}
