package org.shearbook.desk.analysis;

import com.fasterxml.jackson.annotation.JsonProperty;
import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The result of an analysis as it is kept and sent: units in the names, null for whatever is not known, and neither
 * NaN nor infinity anywhere. Where the wind does not change with height Ri is null with the flag {@code NO_SHEAR}.
 * A document of an earlier method version reads with null, or an empty list, where that version had nothing.
 *
 * @param soundingId null when the sounding was not kept
 * @param levels     the sounding as kept, every level with its flags; empty in the text that is kept, since the
 *                   sounding itself holds them
 * @param profile    on an even grid of a third of the smoothing's standard deviation
 * @param lowest     the smallest Ri of the free air; null when nowhere known
 */
public record AnalysisDocument(
        @Nullable Long soundingId, @Nullable String station, @Nullable Instant launchedAt, Method method,
        List<Level> levels, List<Point> profile, List<Layer> layers, @Nullable Lowest lowest, String state,
        References references, List<Index> indices, List<Note> remarks) {

    AnalysisDocument withLevels(List<Level> kept) {
        return new AnalysisDocument(soundingId, station, launchedAt, method, kept, profile, layers, lowest, state, references, indices, remarks);
    }

    AnalysisDocument of(@Nullable Long id) {
        return new AnalysisDocument(id, station, launchedAt, method, levels, profile, layers, lowest, state, references, indices, remarks);
    }

    /**
     * @param windowM    full width at half maximum of the smoothing
     * @param noise      the instrument's noise as used for probabilities; null in documents of method version 1
     * @param moist      whether moist values stand beside the dry ones
     * @param saturation by which air counts as saturated; null in documents of method version 1
     * @param search     where growing waves were looked for; null likewise
     */
    public record Method(
            String version, double windowM, String smoothing, @Nullable Noise noise, boolean moist, @Nullable SaturationLimits saturation, @Nullable Search search) {
    }

    /** @param source where the figures come from */
    public record Noise(String name, double windMs, double windCorrelationM, double temperatureK, String source) {
    }

    public record SaturationLimits(double overWater, double overIce, double iceBelowC) {
    }

    public record Search(int azimuths, int wavenumbers, double slowestGrowthPerS, double slowestGrowthOverShear) {
    }

    public record Level(
            @Nullable Double heightM, @Nullable Double pressureHpa, @Nullable Double flightLevel, @Nullable Double temperatureC, @Nullable Double dewPointC,
            @Nullable Double windFromDeg, @Nullable Double windSpeedMs, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg,
            @Nullable Double elapsedS, List<String> flags) {
    }

    /**
     * @param n2PerS2          as measured: negative where the air is statically unstable
     * @param shearPerS        smoothed by the window
     * @param shearKtPer1000Ft the same in the units of the trade
     * @param shear1000FtKt    change of the wind as reported over exactly 1000 ft
     * @param richardson       as measured
     * @param elapsedS         since release, of the balloon at this height
     * @param n2MoistPerS2     with saturated air taken as saturated; null where humidity is not known
     * @param richardsonMoist  likewise
     * @param probabilityRichardsonBelowQuarter at this height, of unsaturated air; null in gaps
     * @param flags            {@code OVERTURNED}, {@code NO_SHEAR} or {@code GAP}
     * @param saturation       {@code UNSATURATED}, {@code OVER_WATER} or {@code OVER_ICE_ASSUMED}; null where it is not known
     */
    public record Point(
            double heightM, @Nullable Double flightLevel, @Nullable Double n2PerS2, @Nullable Double n2MoistPerS2,
            @Nullable Double shearPerS, @Nullable Double shearKtPer1000Ft, @Nullable Double shear1000FtKt,
            @Nullable Double richardson, @Nullable Double richardsonMoist, @Nullable Double probabilityRichardsonBelowQuarter,
            @Nullable Double elapsedS, List<String> flags, @Nullable String saturation) {
    }

    /** The smallest Ri of the free air, and how far small values reach around it; null bounds where there is no such band. */
    public record Lowest(
            double richardson, double heightM, @Nullable Double flightLevel, double windowM, double depthBelowQuarterM,
            @Nullable Double baseBelowQuarterFlightLevel, @Nullable Double topBelowQuarterFlightLevel,
            @Nullable Double baseBelowOneFlightLevel, @Nullable Double topBelowOneFlightLevel, @Nullable Double shear1000FtKt) {
    }

    /**
     * @param probabilityRichardsonBelowQuarter at the height of the smallest Ri; null with the reason when unknown
     * @param minRichardsonMoist                smallest Ri inside with saturated air taken as saturated
     * @param virtualPotentialTemperatureK      at the smallest Ri
     * @param mode                              the fastest growing wave; null with {@code modeReason}
     * @param modeReason                        why there is no mode: stable, or unknown; null when there is one
     * @param growthByWindow                    growth of the same stretch at 100, 150 and 200 m; empty where growth is unknown
     * @param ensemble                          spread of growth over the instrument's errors; null unless it was asked for
     * @param distance                          how far from Ri = ¼
     * @param hiddenSublayerChance              chance of a 100 m sublayer with Ri below ¼ between two wind levels that reach into
     *                                          the layer, the greatest; null where levels are close
     * @param cloud                             whether the crests would show as cloud; null without billows
     */
    public record Layer(
            String letter, double baseHeightM, double topHeightM, @Nullable Double baseFlightLevel, @Nullable Double topFlightLevel, double depthM,
            double minRichardson, double minRichardsonHeightM, @Nullable Double minRichardsonFlightLevel, @Nullable Double bulkRichardson, double windowM,
            double maxShearPerS, @Nullable Double shear1000FtKt, double windChangeMs, double shearDirectionDeg,
            double meanWindFromDeg, double meanWindMs, int windLevels, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg, @Nullable Double elapsedS,
            @Nullable Double probabilityRichardsonBelowQuarter, @Nullable String probabilityUnknownBecause, @Nullable Boolean saturated,
            @Nullable Double minRichardsonMoist, @Nullable Double virtualPotentialTemperatureK, String state,
            Rule rule, @Nullable Mode mode, @Nullable String modeReason, List<GrowthInWindow> growthByWindow, @Nullable Ensemble ensemble,
            @Nullable Billow billow, @Nullable Turbulence turbulence, @Nullable Distance distance, @Nullable Double hiddenSublayerChance,
            @Nullable Cloud cloud, List<Note> remarks) {

        public Layer {
            growthByWindow = growthByWindow == null ? List.of() : growthByWindow;
        }
    }

    /**
     * Billow scales by rule of thumb.
     *
     * @param wavelengthM null where the rule expects no growth, and where growth is unknown: the basis says which
     * @param eFoldingMin null likewise
     * @param basis       that it is a rule and not solved
     */
    public record Rule(@Nullable Double wavelengthM, @Nullable Double eFoldingMin, String basis) {
    }

    /**
     * A solved mode of instability.
     *
     * @param criticalHeightM   where the wind along the azimuth is the phase speed, the one nearest to the strongest shear
     * @param verticalExtentM   between the heights where the wave has fallen to 1/e
     * @param numericalError    relative change of the growth rate on the finer grid
     * @param reason            why not converged; null when converged
     */
    public record Mode(
            double growthRatePerS, double eFoldingMin, double wavelengthM, double azimuthDeg, double phaseSpeedMs,
            @Nullable Double criticalHeightM, @Nullable Double verticalExtentM, boolean converged, @Nullable String reason,
            @Nullable Double numericalError) {
    }

    /**
     * @param growthRatePerS 0 where nothing grows; null where it could not be told
     * @param eFoldingMin    null where nothing grows
     * @param wavelengthM    null likewise
     * @param reason         why nothing grows or nothing could be told; null when a wave grows
     */
    public record GrowthInWindow(
            double windowM, @Nullable Double growthRatePerS, @Nullable Double eFoldingMin, @Nullable Double wavelengthM, @Nullable String reason) {
    }

    /**
     * Percentiles over copies of the ascent with the instrument's errors added once more. Growth is over all members, 0
     * where nothing grows; wavelengths over the growing ones, null when there is none.
     */
    public record Ensemble(
            int members, int growing, long seed, double growthRate10PerS, double growthRate50PerS, double growthRate90PerS,
            @Nullable Double wavelength10M, @Nullable Double wavelength50M, @Nullable Double wavelength90M) {
    }

    /**
     * What billows would become, if they grow.
     *
     * @param passingIntervalS between crests at a fixed point; null where the wave stands still
     * @param basis            whether the wave was solved for or taken from the rule
     */
    public record Billow(
            @Nullable Double heightM, @Nullable Double heightLowM, @Nullable Double heightHighM, @Nullable Double crestSpacingM,
            @Nullable Double passingIntervalS, @Nullable Double timeToBreakdownMin, @Nullable Double timeToBreakdownLowMin,
            @Nullable Double timeToBreakdownHighMin, @Nullable Double lifetimeMin, List<AtAirspeed> atAirspeed, String basis) {
    }

    /**
     * @param direction {@code ALONG} the wave vector, so that crest after crest is met, or {@code ACROSS} it, along the crests
     * @param intervalS between crests; null where no second crest is met or the track can't be held
     */
    public record AtAirspeed(double airspeedMs, String direction, double trackDeg, @Nullable Double intervalS) {
    }

    /** Turbulence as a range of EDR, no finer than 0.01, with its words by the table of one edition. */
    public record Turbulence(
            double edrLow, double edr, double edrHigh, @JsonProperty("class") String edrClass, String basis, String edition, String inWords) {
    }

    /**
     * @param shearIncrease     fraction by which shear must grow to reach ¼; negative: by which it may fall
     * @param stabilityDecrease fraction by which N² must fall to reach ¼; negative: by which it may rise; null for Ri = 0
     */
    public record Distance(double shearIncrease, @Nullable Double stabilityDecrease) {
    }

    /** @param answer {@code WATER_CLOUD}, {@code ICE_CLOUD_POSSIBLE}, {@code NO_CLOUD} or {@code UNKNOWN} */
    public record Cloud(String answer, @Nullable Double heightM, double liftM, @Nullable Double liftToWaterM, @Nullable Double liftToIceM) {
    }

    public record References(
            @Nullable Double tropopauseHeightM, @Nullable Double tropopauseFlightLevel, @Nullable Double secondTropopauseHeightM,
            @Nullable Double secondTropopauseFlightLevel, @Nullable Double maxWindMs, @Nullable Double maxWindFromDeg,
            @Nullable Double maxWindHeightM, @Nullable Double maxWindFlightLevel, @Nullable Boolean maxWindAtTopOfData) {
    }

    /**
     * One turbulence index, at every third height of the profile.
     *
     * @param orientation which way means more turbulence
     */
    public record Index(
            String name, String symbol, String unit, String orientation, @Nullable String formula, @Nullable String source, List<HeightValue> values) {
    }

    public record HeightValue(double heightM, @Nullable Double value) {
    }

    /** A thing to know, by a stable code and in words. */
    public record Note(String code, String text) {
    }
}
