package org.shearbook.desk.sounding;

import java.time.Instant;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.met.decode.Remark;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.quality.CheckedLevel;
import org.shearbook.met.quality.SoundingFlag;

/**
 * One version of a sounding.
 *
 * @param header        what lists show of it
 * @param levels        every level reported, with what the checks say of it
 * @param soundingFlags findings about the sounding as a whole
 * @param profile       built from what passed the checks; null when too little did
 * @param remarks       what the decoder, the joining of parts and the station table had to say
 */
public record Sounding(
        SoundingHeader header, List<CheckedLevel> levels, List<SoundingFlag> soundingFlags,
        @Nullable VerticalProfile profile, List<Remark> remarks) {

    public Sounding {
        levels = List.copyOf(levels);
        soundingFlags = List.copyOf(soundingFlags);
        remarks = List.copyOf(remarks);
    }

    public SoundingId id() {
        return header.id();
    }

    public int version() {
        return header.version();
    }

    public String stationId() {
        return header.stationId();
    }

    public @Nullable Instant nominalAt() {
        return header.nominalAt();
    }

    public @Nullable Instant launchedAt() {
        return header.launchedAt();
    }

    public Instant observedAt() {
        return header.observedAt();
    }

    public Instant receivedAt() {
        return header.receivedAt();
    }

    public Instant recordedAt() {
        return header.recordedAt();
    }

    /** [degrees north]; NaN when unknown. */
    public double latitude() {
        return header.latitude();
    }

    /** [degrees east]; NaN when unknown. */
    public double longitude() {
        return header.longitude();
    }

    /** Of the launch site [m]; NaN when unknown. */
    public double elevation() {
        return header.elevation();
    }

    public Set<String> parts() {
        return header.parts();
    }

    public String correction() {
        return header.correction();
    }

    /** Why {@link #profile()} is null; null when it is not. */
    public @Nullable String notUsable() {
        return header.notUsable();
    }

    public boolean withdrawn() {
        return header.withdrawn();
    }
}
