/**
 * Runs the methods on every sounding that is kept, and keeps result, version of the method and parameters. The page
 * Method and Limits is its own.
 *
 * <p><b>Door.</b> {@link org.shearbook.desk.analysis.AnalysisBook}. <b>Heard.</b>
 * {@link org.shearbook.desk.sounding.SoundingKept}, in the transaction that keeps the sounding. <b>News.</b>
 * {@link org.shearbook.desk.analysis.AnalysisKept}. <b>Tables.</b> {@code analysis_version}.
 *
 * <p>Decode and quality are among the allowed rooms because a sounding's levels are shown with the flags of quality,
 * and because bytes that can't be read are answered with the remarks of decode.
 */
@ApplicationModule(displayName = "Method and Limits", allowedDependencies = {"audit", "shell", "sounding", "station", "staff",
        "profile", "decode", "quality", "richardson", "taylorgoldstein", "billow"})
@NullMarked
package org.shearbook.desk.analysis;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
