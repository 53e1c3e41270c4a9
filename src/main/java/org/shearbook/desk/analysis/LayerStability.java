package org.shearbook.desk.analysis;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.analysis.AnalysisDocument.AtAirspeed;
import org.shearbook.desk.analysis.AnalysisDocument.Billow;
import org.shearbook.desk.analysis.AnalysisDocument.Cloud;
import org.shearbook.desk.analysis.AnalysisDocument.Ensemble;
import org.shearbook.desk.analysis.AnalysisDocument.GrowthInWindow;
import org.shearbook.desk.analysis.AnalysisDocument.Turbulence;
import org.shearbook.met.billow.BillowEstimate;
import org.shearbook.met.billow.CloudPossibility;
import org.shearbook.met.billow.DepthRule;
import org.shearbook.met.billow.TurbulenceEstimate;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.EdrClasses;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.richardson.InstrumentNoise;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonNumber;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.met.richardson.ShearLayer;
import org.shearbook.met.taylorgoldstein.GrowthSensitivity;
import org.shearbook.met.taylorgoldstein.GrowthSpread;
import org.shearbook.met.taylorgoldstein.Mode;
import org.shearbook.met.taylorgoldstein.ProfilePerturbation;
import org.shearbook.met.taylorgoldstein.SearchSettings;
import org.shearbook.met.taylorgoldstein.StabilityAnalysis;
import org.shearbook.met.taylorgoldstein.StabilityResult;

/**
 * Solves for the growing waves of one ascent's layers, one after the other, and says what they would become. Growth
 * is never given with fewer than {@value #FEWEST_WIND_LEVELS} wind levels in a layer. Not for use by two at once.
 */
final class LayerStability {

    static final int FEWEST_WIND_LEVELS = 3;

    /** The speed of the airspeed example: a transport aircraft at jet level [m s⁻¹]. */
    static final double AIRSPEED = 230;

    /** What noise easily makes of a Richardson number: the difference growth is told for. */
    static final double RICHARDSON_ERROR = 0.03;

    /** From this fraction of the growth rate on, that difference is worth a remark. */
    private static final double LARGE_PART_OF_GROWTH = 0.3;

    /** Of one layer, and of one ascent, in evaluations times grid levels at 5 to 20 ns: a hostile ascent must not hold up the intake. */
    private static final long LAYER_WORK = 60_000_000L;
    private static final long ASCENT_WORK = 300_000_000L;

    private final VerticalProfile profile;
    private final InstrumentNoise noise;
    private final StabilityAnalysis analysis = new StabilityAnalysis(settings());
    private final RichardsonProfile atWindow;
    private @Nullable List<RichardsonProfile> atGrowthWindows;
    private long work;

    LayerStability(RichardsonProfile atWindow, InstrumentNoise noise) {
        this.profile = atWindow.profile();
        this.atWindow = atWindow;
        this.noise = noise;
    }

    static SearchSettings settings() {
        SearchSettings usual = SearchSettings.forLayers();
        return new SearchSettings(usual.azimuths(), usual.wavenumbers(), usual.searchStride(), usual.relativeGrowthFloor(), usual.growthFloor(), LAYER_WORK);
    }

    /**
     * What was solved of one layer.
     *
     * @param modeReason why there is no mode
     */
    record Solved(
            AnalysisDocument.@Nullable Mode mode, @Nullable String modeReason, List<GrowthInWindow> growthByWindow, @Nullable Billow billow,
            @Nullable Turbulence turbulence, @Nullable Cloud cloud, List<AnalysisDocument.Note> remarks) {

        static Solved unknown(String reason) {
            return new Solved(null, "unknown: " + reason, List.of(), null, null, null, List.of());
        }
    }

    static boolean hasEnoughWind(ShearLayer layer) {
        return layer.windLevelCount() >= FEWEST_WIND_LEVELS;
    }

    Solved solve(ShearLayer layer) {
        if (!hasEnoughWind(layer)) {
            return Solved.unknown("only %d reported wind levels lie in the layer; growth needs %d".formatted(layer.windLevelCount(), FEWEST_WIND_LEVELS));
        }
        StabilityResult result = resultAt(atWindow, layer);
        if (result == null) {
            return Solved.unknown("this ascent needs more work than one analysis may take");
        }
        Optional<Mode> fastest = result.fastest();
        List<GrowthInWindow> growth = new ArrayList<>();
        for (RichardsonProfile window : growthWindows()) {
            growth.add(growth(window.window(), window.window() == atWindow.window() ? result : resultAt(window, layer)));
        }
        Optional<BillowEstimate> billows = BillowEstimate.of(layer, result);
        return new Solved(fastest.map(LayerStability::mode).orElse(null), fastest.isPresent() ? null : reason(result), List.copyOf(growth),
                billows.map(estimate -> billow(estimate, layer)).orElse(null), billows.map(LayerStability::turbulence).orElse(null),
                billows.map(estimate -> cloud(layer, estimate)).orElse(null),
                fastest.isPresent() ? nearQuarter(layer.minimum().richardsonNumber()) : List.of());
    }

    private @Nullable StabilityResult resultAt(RichardsonProfile window, ShearLayer layer) {
        if (work > ASCENT_WORK || window.flowAt(0.5 * (layer.base() + layer.top())) == null) {
            return null;
        }
        StabilityResult result = analysis.ofLayer(window, layer.extent());
        work += result.evaluations() * result.intervals();
        return result;
    }

    private List<RichardsonProfile> growthWindows() {
        if (atGrowthWindows == null) {
            atGrowthWindows = GrowthSensitivity.WINDOWS.stream()
                    .map(window -> window == atWindow.window() ? atWindow : RichardsonAnalysis.of(profile, window)).toList();
        }
        return atGrowthWindows;
    }

    private static GrowthInWindow growth(double window, @Nullable StabilityResult result) {
        if (result == null) {
            return new GrowthInWindow(window, null, null, null, "unknown: not solved at this window");
        }
        Optional<Mode> fastest = result.fastest();
        if (fastest.isPresent()) {
            Mode mode = fastest.get();
            return new GrowthInWindow(window, Rounded.finite(mode.growthRate()), Rounded.finite(mode.eFoldingTime() / 60), Rounded.finite(mode.wavelength()),
                    mode.converged() ? null : mode.reason());
        }
        return new GrowthInWindow(window, result.complete() ? 0.0 : null, null, null, reason(result));
    }

    /** Why no wave is given: a search that could not be finished says nothing about stability. */
    private static String reason(StabilityResult result) {
        String said = String.join("; ", result.remarks());
        return result.complete() ? said.startsWith("stable") ? said : "stable: " + said : "unknown: " + said;
    }

    private static AnalysisDocument.Mode mode(Mode mode) {
        return new AnalysisDocument.Mode(Rounded.finite(mode.growthRate()), Rounded.finite(mode.eFoldingTime() / 60), Rounded.finite(mode.wavelength()),
                Rounded.finite(mode.azimuth()), Rounded.finite(mode.phaseSpeed()),
                mode.criticalHeights().isEmpty() ? null : Rounded.known(mode.criticalHeights().get(0)),
                mode.extent() == null ? null : Rounded.known(mode.extent().depth()), mode.converged(), mode.converged() ? null : mode.reason(),
                Rounded.known(mode.numericalError()));
    }

    private static Billow billow(BillowEstimate estimate, ShearLayer layer) {
        double along = estimate.wave().azimuth();
        double across = (along + 90) % 360;
        return new Billow(Rounded.known(estimate.height()), Rounded.known(estimate.lowHeight()), Rounded.known(estimate.highHeight()),
                Rounded.known(estimate.crestSpacing()), Rounded.known(estimate.wave().passingIntervalAtFixedPoint()),
                Rounded.known(estimate.timeToBreakdown() / 60), Rounded.known(estimate.shortTimeToBreakdown() / 60),
                Rounded.known(estimate.longTimeToBreakdown() / 60), Rounded.known(estimate.turbulentLifetime() / 60),
                List.of(atAirspeed("ALONG", along, estimate, layer), atAirspeed("ACROSS", across, estimate, layer)), estimate.wave().basis());
    }

    private static AtAirspeed atAirspeed(String direction, double track, BillowEstimate estimate, ShearLayer layer) {
        return new AtAirspeed(AIRSPEED, direction, Rounded.finite(track),
                Rounded.known(estimate.wave().passingInterval(AIRSPEED, track, layer.meanEastward(), layer.meanNorthward())));
    }

    private static Turbulence turbulence(BillowEstimate estimate) {
        EdrClasses classes = EdrClasses.ANNEX_3_PRESENT;
        TurbulenceEstimate range = TurbulenceEstimate.of(estimate);
        return new Turbulence(range.low(), range.middle(), range.high(), word(classes, range.middle()), range.basis(), classes.edition(),
                range.inWords(edr -> word(classes, edr), classes.edition()));
    }

    private static String word(EdrClasses classes, double edr) {
        Intensity intensity = classes.intensity(edr);
        return switch (intensity) {
            case NIL -> "nil";
            case LGT -> "light";
            case MOD -> "moderate";
            case SEV -> "severe";
            default -> intensity.name().toLowerCase(Locale.ROOT);
        };
    }

    private Cloud cloud(ShearLayer layer, BillowEstimate estimate) {
        CloudPossibility cloud = CloudPossibility.of(profile, layer.extent(), estimate.height());
        return new Cloud(cloud.answer().name(), Rounded.known(cloud.height()), Rounded.finite(cloud.lift()), Rounded.known(cloud.liftToWater()),
                Rounded.known(cloud.liftToIce()));
    }

    /** Growth falls to nothing at ¼, so close to it a small error of Ri is a large one of growth; by the rule, which is quick. */
    static List<AnalysisDocument.Note> nearQuarter(double richardson) {
        double here = DepthRule.relativeGrowthRate(richardson);
        double part = here == 0 ? 1 : 1 - DepthRule.relativeGrowthRate(Math.min(RichardsonNumber.CRITICAL, richardson + RICHARDSON_ERROR)) / here;
        return part < LARGE_PART_OF_GROWTH ? List.of() : List.of(new AnalysisDocument.Note("GROWTH_NEAR_QUARTER",
                "So near to Ri = ¼ a difference of %.2f in Ri, well within the noise of a sonde, is %s of the growth rate.".formatted(RICHARDSON_ERROR,
                        part < 0.4 ? "a third" : part < 0.6 ? "half" : part < 0.9 ? "most" : "all")));
    }

    /** Spread of growth over the instrument's errors; null where growth is unknown. */
    @Nullable Ensemble ensemble(ShearLayer layer, int members, long seed) {
        if (!hasEnoughWind(layer) || atWindow.flowAt(0.5 * (layer.base() + layer.top())) == null) {
            return null;
        }
        GrowthSpread spread = new GrowthSensitivity(analysis).overPerturbations(profile, atWindow.window(), layer.extent(),
                new ProfilePerturbation(noise.wind(), noise.windCorrelationLength(), noise.temperature()), members, seed);
        return new Ensemble(spread.members(), spread.growing(), spread.seed(), Rounded.finite(spread.growthRate10()), Rounded.finite(spread.growthRate50()),
                Rounded.finite(spread.growthRate90()), Rounded.known(spread.wavelength10()), Rounded.known(spread.wavelength50()),
                Rounded.known(spread.wavelength90()));
    }
}
