package org.shearbook.desk.analysis;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The result of an analysis as it is kept and sent: units in the names, null for whatever is not known, and neither
 * NaN nor infinity anywhere. Where the wind does not change with height Ri is null with the flag {@code NO_SHEAR}.
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
     * @param windowM full width at half maximum of the smoothing
     * @param noise   the instrument's noise as used; null while no probability is computed
     * @param moist   whether saturated air was treated as such
     */
    public record Method(String version, double windowM, String smoothing, @Nullable Noise noise, boolean moist) {
    }

    public record Noise(double windMs, double windCorrelationM, double temperatureK) {
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
     * @param flags            {@code OVERTURNED}, {@code NO_SHEAR} or {@code GAP}
     */
    public record Point(
            double heightM, @Nullable Double flightLevel, @Nullable Double n2PerS2, @Nullable Double n2MoistPerS2,
            @Nullable Double shearPerS, @Nullable Double shearKtPer1000Ft, @Nullable Double shear1000FtKt,
            @Nullable Double richardson, @Nullable Double richardsonMoist, @Nullable Double probabilityRichardsonBelowQuarter,
            @Nullable Double elapsedS, List<String> flags) {
    }

    /** The smallest Ri of the free air, and how far small values reach around it; null bounds where there is no such band. */
    public record Lowest(
            double richardson, double heightM, @Nullable Double flightLevel, double windowM, double depthBelowQuarterM,
            @Nullable Double baseBelowQuarterFlightLevel, @Nullable Double topBelowQuarterFlightLevel,
            @Nullable Double baseBelowOneFlightLevel, @Nullable Double topBelowOneFlightLevel, @Nullable Double shear1000FtKt) {
    }

    public record Layer(
            String letter, double baseHeightM, double topHeightM, @Nullable Double baseFlightLevel, @Nullable Double topFlightLevel, double depthM,
            double minRichardson, double minRichardsonHeightM, @Nullable Double minRichardsonFlightLevel, @Nullable Double bulkRichardson, double windowM,
            double maxShearPerS, @Nullable Double shear1000FtKt, double windChangeMs, double shearDirectionDeg,
            double meanWindFromDeg, double meanWindMs, int windLevels, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg, @Nullable Double elapsedS,
            @Nullable Double probabilityRichardsonBelowQuarter, @Nullable Boolean saturated, String state,
            Rule rule, @Nullable Mode mode, @Nullable Billow billow, @Nullable Turbulence turbulence, List<Note> remarks) {
    }

    /**
     * Billow scales by rule of thumb.
     *
     * @param wavelengthM null where the rule expects no growth
     * @param eFoldingMin null likewise
     * @param basis       that it is a rule and not solved
     */
    public record Rule(@Nullable Double wavelengthM, @Nullable Double eFoldingMin, String basis) {
    }

    /** A solved mode of instability. */
    public record Mode(
            double growthRatePerS, double eFoldingMin, double wavelengthM, double azimuthDeg, double phaseSpeedMs,
            @Nullable Double criticalHeightM, @Nullable Double verticalExtentM, boolean converged, @Nullable String reason) {
    }

    /** What the mode means for an observer. */
    public record Billow(
            @Nullable Double heightM, @Nullable Double crestSpacingM, @Nullable Double passingIntervalS, @Nullable Double timeToBreakdownMin,
            List<AtAirspeed> atAirspeed) {
    }

    public record AtAirspeed(double airspeedMs, double intervalS) {
    }

    /** Turbulence as a range of EDR. */
    public record Turbulence(double edrLow, double edr, double edrHigh, String edrClass, String basis) {
    }

    public record References(
            @Nullable Double tropopauseHeightM, @Nullable Double tropopauseFlightLevel, @Nullable Double secondTropopauseHeightM,
            @Nullable Double secondTropopauseFlightLevel, @Nullable Double maxWindMs, @Nullable Double maxWindFromDeg,
            @Nullable Double maxWindHeightM, @Nullable Double maxWindFlightLevel, @Nullable Boolean maxWindAtTopOfData) {
    }

    public record Index(String name, String symbol, String unit, String orientation, List<HeightValue> values) {
    }

    public record HeightValue(double heightM, @Nullable Double value) {
    }

    /** A thing to know, by a stable code and in words. */
    public record Note(String code, String text) {
    }
}
