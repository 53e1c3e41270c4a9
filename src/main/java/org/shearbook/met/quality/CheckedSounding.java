package org.shearbook.met.quality;

import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.profile.VerticalProfile;

/**
 * All reported levels with their flags, and the clean profile or the reason why there is none.
 *
 * @param levels          every reported level, in the order reported
 * @param soundingFlags   findings about the sounding as a whole
 * @param cleanProfile    null exactly when {@code refusalReason} is not
 * @param refusalReason   null exactly when {@code cleanProfile} is not
 */
public record CheckedSounding(
        List<CheckedLevel> levels, List<SoundingFlag> soundingFlags,
        @Nullable VerticalProfile cleanProfile, @Nullable Refusal refusalReason) {

    public CheckedSounding {
        levels = List.copyOf(levels);
        soundingFlags = List.copyOf(soundingFlags);
        if ((cleanProfile == null) == (refusalReason == null)) {
            throw new IllegalArgumentException("a checked sounding has either a profile or a refusal");
        }
    }

    public Optional<VerticalProfile> profile() {
        return Optional.ofNullable(cleanProfile);
    }

    public Optional<Refusal> refusal() {
        return Optional.ofNullable(refusalReason);
    }

    /** Whether the sounding as a whole carries this flag. */
    public boolean hasSoundingFlag(QualityFlag flag) {
        return soundingFlags.stream().anyMatch(f -> f.flag() == flag);
    }
}
