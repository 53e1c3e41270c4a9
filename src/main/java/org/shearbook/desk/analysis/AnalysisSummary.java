package org.shearbook.desk.analysis;

import java.time.Instant;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.sounding.SoundingId;

/**
 * What lists show of an analysis; null where it is not known.
 *
 * @param window             full width at half maximum [m]: belongs beside every Ri
 * @param notAnalysed        why there is no result; null when there is one
 * @param lowestRichardson   the smallest Ri of the free air
 * @param lowestHeight       where [m]
 * @param lowestFlightLevel  there
 * @param shear1000FtKt      largest change of wind over exactly 1000 ft in the band around it in which Ri is below 1 [kt]
 * @param tropopauseHeight   [m]
 * @param greatestWind       [m s⁻¹]
 * @param windAtTopOfData    whether the greatest wind is that of the highest level, so that the true one may lie above
 */
public record AnalysisSummary(
        SoundingId soundingId, int soundingVersion, int version, String methodVersion, double window,
        @Nullable String notAnalysed, StabilityState state,
        @Nullable Double lowestRichardson, @Nullable Double lowestHeight, @Nullable Double lowestFlightLevel, @Nullable Double shear1000FtKt,
        @Nullable Double tropopauseHeight, @Nullable Double tropopauseFlightLevel,
        @Nullable Double greatestWind, @Nullable Double greatestWindFlightLevel, boolean windAtTopOfData,
        int layerCount, Instant observedAt, Instant receivedAt, Instant recordedAt) {
}
