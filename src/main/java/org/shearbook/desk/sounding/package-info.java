/**
 * Keeps soundings: levels as reported, what the checks say of them, every version.
 *
 * <p><b>Door.</b> {@link org.shearbook.desk.sounding.SoundingArchive}. <b>News.</b>
 * {@link org.shearbook.desk.sounding.SoundingKept} for every new version,
 * {@link org.shearbook.desk.sounding.SoundingWithdrawn}.
 * <b>Tables.</b> {@code sounding_version}, {@code sounding_levels}, {@code sounding_message}.
 */
@ApplicationModule(displayName = "Soundings",
        allowedDependencies = {"audit", "shell", "station", "staff", "profile", "decode", "quality"})
@NullMarked
package org.shearbook.desk.sounding;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
