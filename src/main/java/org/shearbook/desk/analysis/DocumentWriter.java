package org.shearbook.desk.analysis;

import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.analysis.AnalysisDocument.Distance;
import org.shearbook.desk.analysis.AnalysisDocument.HeightValue;
import org.shearbook.desk.analysis.AnalysisDocument.Index;
import org.shearbook.desk.analysis.AnalysisDocument.Layer;
import org.shearbook.desk.analysis.AnalysisDocument.Level;
import org.shearbook.desk.analysis.AnalysisDocument.Lowest;
import org.shearbook.desk.analysis.AnalysisDocument.Method;
import org.shearbook.desk.analysis.AnalysisDocument.Noise;
import org.shearbook.desk.analysis.AnalysisDocument.Note;
import org.shearbook.desk.analysis.AnalysisDocument.Point;
import org.shearbook.desk.analysis.AnalysisDocument.References;
import org.shearbook.desk.analysis.AnalysisDocument.Rule;
import org.shearbook.desk.analysis.AnalysisDocument.SaturationLimits;
import org.shearbook.desk.analysis.AnalysisDocument.Search;
import org.shearbook.met.billow.BillowScales;
import org.shearbook.met.billow.DepthRule;
import org.shearbook.met.profile.BalloonPosition;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.MoistThermodynamics;
import org.shearbook.met.profile.Saturation;
import org.shearbook.met.profile.SaturationRule;
import org.shearbook.met.profile.StandardAtmosphere;
import org.shearbook.met.profile.Tropopause;
import org.shearbook.met.profile.Units;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindMaximum;
import org.shearbook.met.quality.CheckedLevel;
import org.shearbook.met.richardson.DistanceFromInstability;
import org.shearbook.met.richardson.HiddenSublayer;
import org.shearbook.met.richardson.InstrumentNoise;
import org.shearbook.met.richardson.LayerProbability;
import org.shearbook.met.richardson.LayerRemark;
import org.shearbook.met.richardson.MoistRichardson;
import org.shearbook.met.richardson.PointStatus;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonMinimum;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.met.richardson.RichardsonUncertainty;
import org.shearbook.met.richardson.ShearLayer;
import org.shearbook.met.richardson.SoundingIndices;
import org.shearbook.met.taylorgoldstein.SearchSettings;

/** Runs the methods on one clean profile and writes what they say into a document. Knows no database. */
final class DocumentWriter {

    private static final Map<LayerRemark, String> LAYER_REMARKS = Map.of(
            LayerRemark.FEW_WIND_LEVELS, "Fewer than three reported wind levels lie inside: the layer is a straight line between few points.",
            LayerRemark.OVERTURNED, "Statically unstable somewhere inside as measured; the sorted profile was used.",
            LayerRemark.SATURATED, "At least half of the layer is saturated; Ri, probability and growth here are for unsaturated air. Moist Ri is lower.",
            LayerRemark.HUMIDITY_UNKNOWN, "No humidity was reported inside: saturation is unknown.",
            LayerRemark.BOUNDED_BY_GAP, "The layer ends where a gap in the data begins; it may go on inside the gap.",
            LayerRemark.BOUNDED_BY_END_OF_DATA, "The layer ends where the data end; it may go on beyond.",
            LayerRemark.NEAR_GROUND, "The base is less than 1000 m above the ground: more likely the boundary layer than free air.");

    /** Kept text grows with it; at a third of the window nothing is lost between two values. */
    private static final int HEIGHTS_PER_INDEX_VALUE = 3;

    static final String UNKNOWN_BASIS = "unknown: fewer than three wind levels";

    private final VerticalProfile profile;
    private final RichardsonProfile result;
    private final MoistRichardson moist;
    private final RichardsonUncertainty uncertainty;
    private final List<HiddenSublayer.Stretch> hidden;
    private final LayerStability stability;
    private final ElapsedTime elapsed;

    private DocumentWriter(VerticalProfile profile, RichardsonProfile result, InstrumentNoise noise) {
        this.profile = profile;
        this.result = result;
        this.moist = MoistRichardson.of(result, SaturationRule.DEFAULT);
        this.uncertainty = RichardsonUncertainty.of(result, noise);
        this.hidden = HiddenSublayer.of(profile);
        this.stability = new LayerStability(result, noise);
        this.elapsed = new ElapsedTime(profile.positions(), profile.surfaceHeight());
    }

    /**
     * Analyses one ascent.
     *
     * @param noise  of its sonde
     * @param window full width at half maximum [m], one of {@link RichardsonAnalysis#WINDOWS}
     * @param spread of growth over the instrument's errors, if it is wanted
     * @throws IllegalArgumentException when the methods can't work on this profile; the message says why
     */
    static AnalysisDocument write(@Nullable Long soundingId, @Nullable String station, @Nullable Instant launchedAt, VerticalProfile profile,
            InstrumentNoise noise, double window, @Nullable EnsembleRequest spread) {
        RichardsonProfile result = RichardsonAnalysis.of(profile, window);
        if (result.size() == 0) {
            throw new IllegalArgumentException("wind and temperature overlap nowhere in two levels each");
        }
        DocumentWriter writer = new DocumentWriter(profile, result, noise);
        Lowest lowest = writer.lowest();
        return new AnalysisDocument(soundingId, station, launchedAt, method(window, noise),
                List.of(), writer.points(), writer.layers(spread), lowest,
                StabilityState.ofOneSounding(lowest == null ? null : lowest.richardson()).inWords(),
                writer.references(), writer.indices(), writer.remarks());
    }

    private static Method method(double window, InstrumentNoise noise) {
        SaturationRule saturation = SaturationRule.DEFAULT;
        SearchSettings search = LayerStability.settings();
        return new Method(AnalysisBook.METHOD_VERSION, window, "corners rounded by a Gaussian whose full width at half maximum is the window",
                new Noise(noise.name(), noise.wind(), noise.windCorrelationLength(), noise.temperature(), noise.source()), true,
                new SaturationLimits(saturation.overWater(), saturation.overIce(), Rounded.finite(Units.kelvinToCelsius(saturation.iceBelow()))),
                new Search(search.azimuths(), search.wavenumbers(), Rounded.finite(search.growthFloor()), search.relativeGrowthFloor()));
    }

    /** The levels of a sounding as the document shows them. */
    static List<Level> levels(List<CheckedLevel> levels) {
        return levels.stream().map(level -> new Level(
                Rounded.known(level.height()), Rounded.known(level.pressure() / 100),
                StandardAtmosphere.covers(level.pressure()) ? Rounded.known(StandardAtmosphere.flightLevel(level.pressure())) : null,
                celsius(level.reported().temperature()), celsius(level.reported().dewPoint()),
                Rounded.known(level.reported().windFromDirection()), Rounded.known(level.reported().windSpeed()),
                Rounded.known(level.reported().latitude()), Rounded.known(level.reported().longitude()), Rounded.known(level.reported().elapsed()),
                level.flags().stream().map(Enum::name).toList())).toList();
    }

    private static @Nullable Double celsius(double kelvin) {
        return Double.isNaN(kelvin) ? null : Math.rint(Units.kelvinToCelsius(kelvin) * 1000) / 1000;
    }

    private List<Point> points() {
        double[] height = result.heights();
        double[] pressure = result.pressures();
        double[] n2 = result.measuredBuoyancyFrequencySquared();
        double[] s2 = result.shearSquared();
        double[] ri = result.measuredRichardsonNumber();
        double[] overThousandFeet = result.shearOverThousandFeet();
        double[] n2Moist = moist.measuredBuoyancyFrequencySquared();
        double[] riMoist = moist.measuredRichardsonNumber();
        double[] probability = uncertainty.probabilityBelowQuarter();
        List<Saturation> saturations = moist.saturations();
        List<PointStatus> statuses = result.statuses();
        List<Point> points = new ArrayList<>(height.length);
        for (int i = 0; i < height.length; i++) {
            PointStatus status = statuses.get(i);
            boolean humidityKnown = saturations.get(i) != Saturation.UNKNOWN;
            points.add(new Point(Rounded.finite(height[i]), flightLevel(pressure[i]), Rounded.known(n2[i]),
                    humidityKnown ? Rounded.known(n2Moist[i]) : null,
                    Rounded.known(Math.sqrt(s2[i])), Rounded.known(Units.perSecondToKnotsPerThousandFeet(Math.sqrt(s2[i]))),
                    Rounded.known(Units.perSecondToKnotsPerThousandFeet(overThousandFeet[i])), Rounded.known(ri[i]),
                    humidityKnown ? Rounded.known(riMoist[i]) : null, rounded(probability[i]),
                    Rounded.known(elapsed.at(height[i])), status == PointStatus.KNOWN ? List.of() : List.of(status.name()),
                    humidityKnown ? saturations.get(i).name() : null));
        }
        return points;
    }

    /** A probability to a thousandth: more would be invented. */
    private static @Nullable Double rounded(double probability) {
        return Double.isNaN(probability) ? null : Math.round(probability * 1000) / 1000.0;
    }

    private static @Nullable Double flightLevel(double pressure) {
        return StandardAtmosphere.covers(pressure) ? Rounded.known(StandardAtmosphere.flightLevel(pressure)) : null;
    }

    private @Nullable Lowest lowest() {
        Optional<RichardsonMinimum> found = result.lowestInFreeAir();
        if (found.isEmpty()) {
            return null;
        }
        RichardsonMinimum minimum = found.get();
        HeightBand quarter = minimum.bandBelowQuarter();
        HeightBand one = minimum.bandBelowOne();
        double from = one == null ? minimum.height() - Units.THOUSAND_FEET / 2 : one.base();
        double to = one == null ? minimum.height() + Units.THOUSAND_FEET / 2 : one.top();
        return new Lowest(Rounded.finite(minimum.richardsonNumber()), Rounded.finite(minimum.height()), Rounded.known(minimum.flightLevel()),
                result.window(), Rounded.finite(minimum.depthBelowQuarter()),
                levelOf(quarter == null ? Double.NaN : quarter.base()), levelOf(quarter == null ? Double.NaN : quarter.top()),
                levelOf(one == null ? Double.NaN : one.base()), levelOf(one == null ? Double.NaN : one.top()),
                Rounded.known(Units.perSecondToKnotsPerThousandFeet(result.maximumShearOverThousandFeetBetween(from, to))));
    }

    private @Nullable Double levelOf(double height) {
        return Double.isNaN(height) ? null : Rounded.known(profile.flightLevelAt(height));
    }

    private List<Layer> layers(@Nullable EnsembleRequest spread) {
        return result.layers().stream().map(layer -> layer(layer, spread)).toList();
    }

    private Layer layer(ShearLayer layer, @Nullable EnsembleRequest spread) {
        boolean enoughWind = LayerStability.hasEnoughWind(layer);
        LayerProbability probability = uncertainty.at(layer);
        LayerStability.Solved solved = stability.solve(layer);
        DistanceFromInstability distance = DistanceFromInstability.of(layer.minimum().richardsonNumber());
        BillowScales rule = DepthRule.of(layer);
        double middle = (layer.base() + layer.top()) / 2;
        BalloonPosition position = profile.positionAt(middle);
        return new Layer(layer.letter(), Rounded.finite(layer.base()), Rounded.finite(layer.top()),
                Rounded.known(layer.baseFlightLevel()), Rounded.known(layer.topFlightLevel()), Rounded.finite(layer.depth()),
                Rounded.finite(layer.minimum().richardsonNumber()), Rounded.finite(layer.minimum().height()), Rounded.known(layer.minimum().flightLevel()),
                Rounded.known(layer.bulkRichardsonNumber()), result.window(),
                Rounded.finite(layer.maximumShear()), Rounded.known(Units.perSecondToKnotsPerThousandFeet(layer.maximumShearOverThousandFeet())),
                Rounded.finite(layer.windChange()), Rounded.finite(layer.windChangeDirection()),
                Rounded.finite(Units.fromDirection(layer.meanEastward(), layer.meanNorthward())),
                Rounded.finite(Math.hypot(layer.meanEastward(), layer.meanNorthward())), layer.windLevelCount(),
                position == null ? null : Rounded.known(position.latitude()), position == null ? null : Rounded.known(position.longitude()),
                Rounded.known(elapsed.at(middle)),
                rounded(probability.probability()), probability.isKnown() ? null : probability.unknownBecause(),
                Double.isNaN(layer.saturatedFraction()) ? null : layer.saturatedFraction() >= 0.5,
                moistMinimum(layer), virtualPotentialTemperature(layer.minimum().height()),
                StabilityState.ofOneSounding(layer.minimum().richardsonNumber()).inWords(),
                enoughWind ? new Rule(Rounded.known(rule.wavelength()), Rounded.known(rule.eFoldingTime() / 60), rule.basis()) : new Rule(null, null, UNKNOWN_BASIS),
                solved.mode(), solved.modeReason(), solved.growthByWindow(),
                spread == null ? null : stability.ensemble(layer, spread.members(), spread.seed()), solved.billow(), solved.turbulence(),
                new Distance(Rounded.finite(distance.shearIncrease()), Rounded.known(distance.stabilityDecrease())), hiddenChance(layer), solved.cloud(),
                Stream.concat(layer.remarks().stream().sorted().map(remark -> new Note(remark.name(), LAYER_REMARKS.get(remark))),
                        solved.remarks().stream()).toList());
    }

    private @Nullable Double moistMinimum(ShearLayer layer) {
        double[] height = result.heights();
        double[] ri = moist.measuredRichardsonNumber();
        List<Saturation> saturations = moist.saturations();
        double least = Double.NaN;
        for (int i = 0; i < height.length; i++) {
            if (height[i] >= layer.base() && height[i] <= layer.top() && saturations.get(i) != Saturation.UNKNOWN && !(ri[i] >= least) && !Double.isNaN(ri[i])) {
                least = ri[i];
            }
        }
        return Rounded.known(least);
    }

    private @Nullable Double virtualPotentialTemperature(double height) {
        double temperature = profile.temperatureAt(height);
        double pressure = profile.pressureAt(height);
        return Double.isNaN(temperature) || Double.isNaN(pressure) ? null
                : Rounded.known(MoistThermodynamics.virtualPotentialTemperature(pressure, temperature, profile.dewPointAt(height)));
    }

    private @Nullable Double hiddenChance(ShearLayer layer) {
        return hidden.stream().filter(stretch -> layer.extent().overlaps(stretch.base(), stretch.top())).map(HiddenSublayer.Stretch::chance)
                .max(Double::compare).map(DocumentWriter::rounded).orElse(null);
    }

    private List<Index> indices() {
        // Waves that the wind carries are looked at along the jet.
        double azimuth = WindMaximum.of(profile).map(jet -> (jet.fromDirection() + 180) % 360).filter(Double::isFinite).orElse(90.0);
        return SoundingIndices.of(result, azimuth).stream().map(index -> {
            double[] height = index.heights();
            double[] value = index.values();
            List<HeightValue> values = new ArrayList<>();
            for (int i = 0; i < height.length; i += HEIGHTS_PER_INDEX_VALUE) {
                values.add(new HeightValue(Rounded.finite(height[i]), Rounded.known(value[i])));
            }
            return new Index(index.name(), index.symbol(), index.unit(), index.orientation().name(), index.formula(), index.source(), values);
        }).toList();
    }

    private References references() {
        List<Tropopause> tropopauses = Tropopause.of(profile);
        Tropopause first = tropopauses.isEmpty() ? null : tropopauses.get(0);
        Tropopause second = tropopauses.size() < 2 ? null : tropopauses.get(1);
        WindMaximum jet = WindMaximum.of(profile).orElse(null);
        return new References(
                first == null ? null : Rounded.known(first.height()), first == null ? null : Rounded.known(first.flightLevel()),
                second == null ? null : Rounded.known(second.height()), second == null ? null : Rounded.known(second.flightLevel()),
                jet == null ? null : Rounded.known(jet.speed()), jet == null ? null : Rounded.known(jet.fromDirection()),
                jet == null ? null : Rounded.known(jet.height()), jet == null ? null : Rounded.known(jet.flightLevel()),
                jet == null ? null : jet.atTopOfWind());
    }

    private List<Note> remarks() {
        List<Note> remarks = new ArrayList<>();
        for (HeightBand gap : result.gaps()) {
            remarks.add(new Note("GAP", "Nothing is known from %.0f to %.0f m: wind or temperature is missing, and nothing was put in its place."
                    .formatted(gap.base(), gap.top())));
        }
        if (result.statuses().contains(PointStatus.OVERTURNED)) {
            remarks.add(new Note("OVERTURNED", "Statically unstable somewhere as measured: N² is negative there and Ri is shown as overturned."));
        }
        if (!hidden.isEmpty()) {
            HiddenSublayer.Stretch worst = hidden.stream().max(Comparator.comparingDouble(HiddenSublayer.Stretch::chance)).orElseThrow();
            remarks.add(new Note("HIDDEN_SUBLAYERS", ("%d stretches between reported wind levels are 200 m deep or more. A 100 m sublayer with Ri below ¼ may"
                    + " lie hidden in them; the greatest chance is %.2f, from %.0f to %.0f m.").formatted(hidden.size(), worst.chance(), worst.base(), worst.top())));
        }
        if (!elapsed.isKnown()) {
            remarks.add(new Note("ASCENT_RATE_ASSUMED", "The sounding carries no times: the balloon is taken to rise at 5 m/s."));
        }
        return remarks;
    }
}
