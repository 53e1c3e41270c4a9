package org.shearbook.desk.layer;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.analysis.StabilityState;
import org.shearbook.desk.sounding.SoundingId;

/**
 * One version of a shear layer that the analysis of a sounding proposed. Null is not known.
 *
 * @param standing           whether the newest analysis of the sounding still finds it
 * @param letter             A, B, C … from the lowest up, within its sounding
 * @param base               [m]
 * @param top                [m]
 * @param baseFlightLevel    through the ascent's own pressure [hundreds of feet]
 * @param depth              [m]
 * @param minRichardson      smallest Ri, for {@code window}
 * @param minRichardsonHeight where [m]
 * @param window             full width at half maximum [m]
 * @param maximumShear       largest smoothed shear [s⁻¹]
 * @param shear1000FtKt      largest change of the wind over exactly 1000 ft [kt]
 * @param windChange         |ΔV| from base to top [m s⁻¹]
 * @param shearDirection     towards which ΔV points [degrees]
 * @param meanWindFromDirection [degrees]
 * @param meanWind           [m s⁻¹]
 * @param ruleWavelength     of billows by rule [m]; null where the rule expects none
 * @param ruleEFoldingTime   by rule [s]; null likewise
 * @param ruleBasis          that it is a rule, not solved
 * @param latitude           where the balloon was in the middle of the layer [degrees north]
 * @param saturated          whether at least half of it is saturated
 * @param state              by this sounding alone
 * @param remarkCodes        what to know before leaning on these numbers, as stable names
 * @param observedAt         when the balloon passed the middle of the layer
 */
public record Layer(
        LayerId id, int version, boolean standing, SoundingId soundingId, int soundingVersion, String stationId, String stationName, String letter,
        double base, double top, @Nullable Double baseFlightLevel, @Nullable Double topFlightLevel, double depth,
        double minRichardson, double minRichardsonHeight, @Nullable Double minRichardsonFlightLevel, @Nullable Double bulkRichardson, double window,
        double maximumShear, @Nullable Double shear1000FtKt, double windChange, double shearDirection,
        double meanWindFromDirection, double meanWind,
        @Nullable Double ruleWavelength, @Nullable Double ruleEFoldingTime, String ruleBasis,
        @Nullable Double latitude, @Nullable Double longitude, @Nullable Boolean saturated, StabilityState state, List<String> remarkCodes,
        Instant observedAt, Instant receivedAt, Instant recordedAt) {

    public Layer {
        remarkCodes = List.copyOf(remarkCodes);
    }

    /** Whether too few wind levels lie inside for anything to be said about growth. */
    public boolean growthUnknown() {
        return remarkCodes.contains("FEW_WIND_LEVELS");
    }
}
