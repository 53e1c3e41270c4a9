/**
 * Shear layers: proposed by the analysis of a sounding, with what a forecaster needs to judge them.
 *
 * <p><b>Door.</b> {@link org.shearbook.desk.layer.LayerBook}, {@link org.shearbook.desk.layer.LayerHistoryBook}. <b>Heard.</b>
 * {@link org.shearbook.desk.analysis.AnalysisKept} and {@link org.shearbook.desk.sounding.SoundingWithdrawn}, in the
 * transaction they happen in. <b>News.</b> {@link org.shearbook.desk.layer.LayersProposed}. <b>Tables.</b>
 * {@code layer_version}.
 */
@ApplicationModule(displayName = "Layers", allowedDependencies = {"audit", "shell", "sounding", "station", "analysis", "airreport", "staff", "profile", "richardson"})
@NullMarked
package org.shearbook.desk.layer;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
