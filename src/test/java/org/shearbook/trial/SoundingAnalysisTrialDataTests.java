package org.shearbook.trial;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.shearbook.met.billow.BillowEstimate;
import org.shearbook.met.billow.CloudPossibility;
import org.shearbook.met.billow.TurbulenceEstimate;
import org.shearbook.met.decode.DecodedMessage;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.MessageDecoders;
import org.shearbook.met.profile.SaturationRule;
import org.shearbook.met.profile.Tropopause;
import org.shearbook.met.quality.CheckedLevel;
import org.shearbook.met.quality.CheckedSounding;
import org.shearbook.met.quality.QualityFlag;
import org.shearbook.met.quality.SoundingQuality;
import org.shearbook.met.richardson.HiddenSublayer;
import org.shearbook.met.richardson.InstrumentNoise;
import org.shearbook.met.richardson.LayerProbability;
import org.shearbook.met.richardson.MoistRichardson;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.met.richardson.RichardsonUncertainty;
import org.shearbook.met.richardson.ShearLayer;
import org.shearbook.met.richardson.SoundingIndex;
import org.shearbook.met.richardson.SoundingIndices;

/** Checks and analysis on every real ascent of the trial data. */
@EnabledIfSystemProperty(named = "trial.data", matches = ".+")
class SoundingAnalysisTrialDataTests {

    private static List<DecodedSounding> soundings() {
        List<DecodedSounding> soundings = new ArrayList<>();
        for (String folder : List.of("igra", "hires", "temp-tac")) {
            try (Stream<Path> files = Files.list(Path.of(System.getProperty("trial.data"), folder))) {
                for (Path file : files.filter(Files::isRegularFile).filter(f -> !f.toString().endsWith(".ref.csv")).sorted().toList()) {
                    for (DecodedMessage message : MessageDecoders.all().decode(Files.readAllBytes(file),
                            new DecodingContext(Instant.parse("2026-01-01T00:00:00Z"), FixLookup.NONE)).messages()) {
                        if (message instanceof DecodedSounding sounding) {
                            soundings.add(sounding);
                        }
                    }
                }
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        }
        return soundings;
    }

    @Test
    void everyRealAscentIsCheckedAndAnalysedOrRefusedWithAReason() {
        Map<String, Integer> refusals = new TreeMap<>();
        Map<QualityFlag, Integer> flags = new EnumMap<>(QualityFlag.class);
        int analysed = 0;
        int levels = 0;
        int withTropopause = 0;
        int layers = 0;
        for (DecodedSounding sounding : soundings()) {
            CheckedSounding checked = SoundingQuality.check(sounding.levels(), sounding.elevation(), null);
            assertThat(checked.levels()).extracting(CheckedLevel::reported).containsExactlyElementsOf(sounding.levels());
            checked.levels().forEach(l -> l.flags().forEach(f -> flags.merge(f, 1, Integer::sum)));
            levels += checked.levels().size();
            if (checked.refusal().isPresent()) {
                refusals.merge(checked.refusal().get().code(), 1, Integer::sum);
                continue;
            }
            RichardsonProfile result = RichardsonAnalysis.of(checked.profile().orElseThrow(), RichardsonAnalysis.DEFAULT_WINDOW);
            assertThat(Arrays.stream(result.richardsonNumber()).filter(ri -> ri < 0)).isEmpty();
            for (ShearLayer layer : result.layers()) {
                assertThat(layer.minimum().richardsonNumber()).isLessThan(0.25);
                // 1 s⁻¹ would be 300 m/s over 1000 ft
                assertThat(layer.maximumShear()).isLessThan(0.3);
            }
            layers += result.layers().size();
            withTropopause += Tropopause.of(result.profile()).isEmpty() ? 0 : 1;
            analysed++;
        }
        System.out.println(analysed + " analysed, " + withTropopause + " with tropopause, " + layers + " layers, refused " + refusals
                + "; of " + levels + " levels flagged " + flags);
        assertThat(analysed).isGreaterThan(60);
        assertThat(withTropopause).isGreaterThan(analysed / 3);
        // checks that cry wolf on real ascents would soon be ignored
        assertThat(flags.getOrDefault(QualityFlag.WIND_SPIKE, 0) + flags.getOrDefault(QualityFlag.TEMPERATURE_SPIKE, 0)).isLessThan(levels / 500);
        assertThat(flags.getOrDefault(QualityFlag.HYDROSTATIC, 0)).isLessThan(levels / 100);
        assertThat(flags.getOrDefault(QualityFlag.PRESSURE_NOT_DECREASING, 0)).isLessThan(levels / 100);
    }

    @Test
    void everyRealAscentHasMoistValuesProbabilitiesIndicesAndBillowsOrAReason() {
        int analysed = 0;
        int withSaturation = 0;
        int unknown = 0;
        int billowing = 0;
        List<Long> times = new ArrayList<>();
        for (DecodedSounding sounding : soundings()) {
            CheckedSounding checked = SoundingQuality.check(sounding.levels(), sounding.elevation(), null);
            if (checked.profile().isEmpty()) {
                continue;
            }
            RichardsonProfile result = RichardsonAnalysis.of(checked.profile().orElseThrow(), RichardsonAnalysis.DEFAULT_WINDOW);
            long began = System.nanoTime();
            RichardsonUncertainty uncertainty = RichardsonUncertainty.of(result, InstrumentNoise.DEFAULT);
            times.add(System.nanoTime() - began);
            double[] ri = result.measuredRichardsonNumber();
            double[] n2 = result.measuredBuoyancyFrequencySquared();
            double[] p = uncertainty.probabilityBelowQuarter();
            for (int i = 0; i < p.length; i++) {
                assertThat(Double.isNaN(p[i])).isEqualTo(Double.isNaN(n2[i]));
                if (!Double.isNaN(p[i])) {
                    assertThat(p[i]).isBetween(0.0, 1.0);
                }
            }
            MoistRichardson moist = MoistRichardson.of(result, SaturationRule.DEFAULT);
            double[] moistRi = moist.measuredRichardsonNumber();
            for (int i = 0; i < ri.length; i++) {
                assertThat(Double.isNaN(moistRi[i])).isEqualTo(Double.isNaN(ri[i]));
            }
            withSaturation += moist.hasSaturation() ? 1 : 0;
            for (SoundingIndex index : SoundingIndices.of(result, 270)) {
                assertThat(Arrays.stream(index.values()).filter(Double::isInfinite)).isEmpty();
            }
            for (HiddenSublayer.Stretch stretch : HiddenSublayer.of(result.profile())) {
                assertThat(stretch.chance()).isBetween(0.0, 1.0);
            }
            for (ShearLayer layer : result.layers()) {
                LayerProbability probability = uncertainty.at(layer);
                unknown += probability.isKnown() ? 0 : 1;
                assertThat(probability.isKnown()).isEqualTo(layer.windLevelCount() >= 3);
                Optional<BillowEstimate> billows = BillowEstimate.of(layer, Optional.empty());
                billowing += billows.isPresent() ? 1 : 0;
                billows.ifPresent(b -> {
                    TurbulenceEstimate turbulence = TurbulenceEstimate.of(b);
                    // 2 would be beyond anything an aircraft has survived measuring
                    assertThat(turbulence.high()).isLessThan(2);
                    assertThat(CloudPossibility.of(result.profile(), layer.extent(), b.height()).lift()).isPositive();
                });
            }
            analysed++;
        }
        System.out.println(analysed + " analysed, " + withSaturation + " with saturated air; layers with unknown probability " + unknown
                + ", with billows by rule " + billowing + "; uncertainty, median " + times.stream().sorted().toList().get(times.size() / 2) / 1000 + " µs");
        assertThat(analysed).isGreaterThan(60);
        assertThat(withSaturation).isGreaterThan(10);
        assertThat(billowing).isGreaterThan(10);
    }
}
