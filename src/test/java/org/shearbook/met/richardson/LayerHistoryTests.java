package org.shearbook.met.richardson;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.ThermodynamicLevel;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.richardson.LayerStateRule.Evidence;
import org.shearbook.testing.JetAscents;

/** Layers from one sounding to the next, and the word for their state. */
class LayerHistoryTests {

    private static final Instant MIDNIGHT = Instant.parse("2031-03-12T00:00:00Z");
    private static final LayerStateRule RULE = LayerStateRule.DEFAULT;

    private static Instant hour(double hours) {
        return MIDNIGHT.plusSeconds(Math.round(hours * 3600));
    }

    private static LayerState stateAt(double hours, List<Evidence> history, Instant... reports) {
        return RULE.at(history, List.of(reports), hour(hours)).state();
    }

    private static List<Evidence> history(double... hoursAndRichardson) {
        Evidence[] history = new Evidence[hoursAndRichardson.length / 2];
        for (int i = 0; i < history.length; i++) {
            history[i] = new Evidence(hour(hoursAndRichardson[2 * i]), hoursAndRichardson[2 * i + 1]);
        }
        return List.of(history);
    }

    @ParameterizedTest
    @CsvSource({"0.24, SUBCRITICAL", "0.25, MARGINAL", "0.99, MARGINAL", "1.0, STEADY", "37, STEADY", "NaN, UNKNOWN", "Infinity, STEADY"})
    void oneSoundingGivesTheWordOfItsRichardsonNumber(double richardson, LayerState state) {
        assertEquals(state, stateAt(1, history(0, richardson)));
    }

    @Test
    void afterSubcriticalALayerDecaysUntilItIsSteadyAgain() {
        List<Evidence> history = history(0, 0.6, 6, 0.2, 12, 0.38, 18, 0.9, 24, 1.2, 30, 0.7);
        assertEquals(LayerState.MARGINAL, stateAt(1, history));
        assertEquals(LayerState.SUBCRITICAL, stateAt(7, history));
        assertEquals(LayerState.DECAYING, stateAt(13, history));
        assertEquals(LayerState.DECAYING, stateAt(19, history));
        assertEquals(LayerState.STEADY, stateAt(25, history));
        assertEquals(LayerState.MARGINAL, stateAt(31, history));
    }

    @Test
    void anUnknownStretchDoesNotMakeAirSteady() {
        List<Evidence> history = history(0, 0.2, 12, 0.5);
        assertEquals(LayerState.UNKNOWN, stateAt(6, history));
        assertEquals(LayerState.UNKNOWN, stateAt(11.9, history));
        assertEquals(LayerState.DECAYING, stateAt(12, history));
        assertEquals(LayerState.DECAYING, stateAt(13, history(0, 0.2, 6, Double.NaN, 12, 0.5)));
    }

    @Test
    void aReportHoldsALayerInDecayForSixHours() {
        List<Evidence> history = history(12, 0.5);
        assertEquals(LayerState.DECAYING, stateAt(14, history, hour(8)));
        assertEquals(LayerState.MARGINAL, stateAt(14.1, history, hour(8)));
        assertEquals(LayerState.MARGINAL, stateAt(13, history, hour(13.5)), "a report not yet made");
        assertEquals(LayerState.STEADY, stateAt(13, history(12, 1.4), hour(12.5)), "a report does not overrule Ri of 1");
    }

    @Test
    void theStateCarriesTheAgeOfItsEvidence() {
        LayerStateRule.Standing standing = RULE.at(history(6, 0.2, 0, 0.8, 18, 0.1), List.of(), hour(9.5));
        assertEquals(hour(6), standing.evidenceAt());
        assertEquals(Duration.ofMinutes(210), standing.evidenceAge());
        LayerStateRule.Standing stale = RULE.at(history(0, 0.2), List.of(), hour(7.5));
        assertEquals(LayerState.UNKNOWN, stale.state());
        assertTrue(stale.because().contains("7 h 30 min"), stale.because());
        LayerStateRule.Standing none = RULE.at(List.of(), List.of(), hour(1));
        assertEquals(LayerState.UNKNOWN, none.state());
        assertNull(none.evidenceAge());
        assertEquals(LayerState.UNKNOWN, stateAt(1, history(2, 0.2)), "a sounding not yet made");
    }

    @Test
    void brokenRulesAreRefused() {
        Duration six = Duration.ofHours(6);
        assertThrows(IllegalArgumentException.class, () -> new LayerStateRule(Double.NaN, 1, six, six));
        assertThrows(IllegalArgumentException.class, () -> new LayerStateRule(0.25, 0.25, six, six));
        assertThrows(IllegalArgumentException.class, () -> new LayerStateRule(0.25, 1, Duration.ZERO, six));
        assertThrows(IllegalArgumentException.class, () -> new LayerMatching(0, 60, 1000, six));
        assertThrows(IllegalArgumentException.class, () -> new LayerMatching(4, 200, 1000, six));
        assertThrows(IllegalArgumentException.class, () -> new LayerMatching(4, 60, Double.NaN, six));
    }

    private static LayerSighting sighting(double hours, double base, double top, double theta, double direction, double richardson) {
        return new LayerSighting(hour(hours), new HeightBand(base, top), 0.5 * (base + top), theta, direction, richardson, true);
    }

    @Test
    void aSinkingLayerKeepsItsTemperatureAndIsJoinedByIt() {
        List<LayerSighting> earlier = List.of(sighting(0, 5000, 5400, 305, 90, 0.2), sighting(0, 8800, 9300, 322, 70, 0.19));
        // by height alone the layer at 8000 m would be nobody's; a new one appears at 2 km
        List<LayerSighting> later = List.of(sighting(12, 2000, 2300, 292, 80, 0.2), sighting(12, 8100, 8500, 321, 85, 0.16),
                sighting(12, 4900, 5300, 305.5, 95, 0.15));
        List<LayerMatching.Link> links = LayerMatching.DEFAULT.join(earlier, later);
        assertEquals(2, links.size());
        assertEquals(1, links.get(0).later());
        assertEquals(1, links.get(0).earlier());
        assertEquals(2, links.get(1).later());
        assertEquals(0, links.get(1).earlier());
        LayerTrend trend = LayerTrend.of(earlier.get(1), later.get(1));
        // exact: 750 m and −0.03 in 12 h
        assertEquals(750 / 43_200.0, trend.descentRate(), 1e-12);
        assertEquals(-0.03 / 12, trend.richardsonPerHour(), 1e-12);
        assertEquals(-1, trend.temperatureChange(), 1e-12);
    }

    @Test
    void otherAirAnotherDirectionOrAnotherDayIsAnotherLayer() {
        LayerSighting seen = sighting(0, 5000, 5400, 305, 350, 0.2);
        assertEquals(1, joined(seen, sighting(12, 5000, 5400, 305, 10, 0.2)), "20° across north");
        assertEquals(0, joined(seen, sighting(12, 5000, 5400, 310, 350, 0.2)));
        assertEquals(0, joined(seen, sighting(12, 5000, 5400, 305, 90, 0.2)));
        assertEquals(0, joined(seen, sighting(25, 5000, 5400, 305, 350, 0.2)));
        assertEquals(0, joined(seen, sighting(12, 6500, 6900, 306, 350, 0.2)));
        assertEquals(0, joined(seen, sighting(0, 5000, 5400, 305, 350, 0.2)), "the same sounding");
        assertEquals(0, joined(sighting(12, 5000, 5400, 305, 350, 0.2), seen), "the wrong way round");
        assertEquals(1, joined(seen, sighting(12, 5100, 5500, Double.NaN, 350, 0.2)), "overlap serves where θv is not known");
        assertEquals(0, joined(seen, sighting(12, 5500, 5900, Double.NaN, 350, 0.2)));
        assertEquals(1, joined(seen, sighting(12, 5000, 5400, 305, Double.NaN, 0.2)));
        assertTrue(LayerMatching.DEFAULT.join(List.of(), List.of(seen)).isEmpty());
    }

    private static int joined(LayerSighting earlier, LayerSighting later) {
        return LayerMatching.DEFAULT.join(List.of(earlier), List.of(later)).size();
    }

    @Test
    void eachLayerIsJoinedAtMostOnceAndToItsBest() {
        List<LayerSighting> earlier = List.of(sighting(0, 5000, 5400, 305, 90, 0.2), sighting(0, 5600, 6000, 307, 90, 0.2));
        List<LayerSighting> later = List.of(sighting(6, 5550, 5950, 306.9, 92, 0.2));
        List<LayerMatching.Link> links = LayerMatching.DEFAULT.join(earlier, later);
        assertEquals(1, links.size());
        assertEquals(1, links.get(0).earlier());
    }

    @Test
    void theAirOfALayerIsTracedWhereTheNextSoundingShowsNone() {
        // Kelbrith, day 2: 0.16 at 12Z; at 18Z no layer is left, Ri 0.38 in the same air
        RichardsonProfile noon = RichardsonAnalysis.of(JetAscents.KELBRITH_DAY_2_12.profile(), 100);
        RichardsonProfile evening = RichardsonAnalysis.of(JetAscents.KELBRITH_DAY_2_18.profile(), 100);
        ShearLayer layer = noon.layers().stream().filter(l -> l.base() > 7500 && l.base() < 10_000).findFirst().orElseThrow();
        LayerSighting seen = LayerSighting.of(layer, noon, hour(12));
        assertTrue(evening.layers().stream().noneMatch(l -> l.base() > 7500 && l.base() < 10_000));
        LayerSighting traced = LayerMatching.DEFAULT.trace(seen, evening, hour(18)).orElseThrow();
        assertFalse(traced.detected());
        // computed elsewhere from the formulas of the scenario
        assertEquals(0.38, traced.richardsonNumber(), 0.03);
        assertEquals(layer.depth(), traced.extent().depth(), 1e-6);
        assertEquals(0, Math.IEEEremainder(traced.shearDirection() - seen.shearDirection(), 360), 10);
        assertTrue(LayerTrend.of(seen, traced).richardsonPerHour() > 0.03);
        List<Evidence> history = List.of(new Evidence(seen.at(), seen.richardsonNumber()), new Evidence(traced.at(), traced.richardsonNumber()));
        assertEquals(LayerState.DECAYING, stateAt(19, history));
        assertThrows(IllegalArgumentException.class, () -> LayerTrend.of(traced, seen));
    }

    @Test
    void whereNothingIsKnownNothingIsTraced() {
        LayerSighting seen = sighting(0, 5000, 5400, 305, 90, 0.2);
        RichardsonProfile empty = RichardsonAnalysis.of(new VerticalProfile(List.of(new ThermodynamicLevel(0, 100_000, 280, 280)), List.of()), 200);
        assertTrue(LayerMatching.DEFAULT.trace(seen, empty, hour(6)).isEmpty());
        RichardsonProfile shallow = RichardsonAnalysis.of(JetAscents.KELBRITH_DAY_2_12.profile(), 200);
        assertTrue(LayerMatching.DEFAULT.trace(sighting(0, 30_000, 30_400, 600, 90, 0.2), shallow, hour(6)).isEmpty());
    }

    @ParameterizedTest
    @CsvSource({"0.5, 0.41421356, 0.5", "1.0, 1.0, 0.75", "0.25, 0, 0", "0.16, -0.2, -0.5625"})
    void theDistanceFromInstabilityIsInShearAndInStability(double richardson, double shear, double stability) {
        // exact
        DistanceFromInstability distance = DistanceFromInstability.of(richardson);
        assertEquals(shear, distance.shearIncrease(), 1e-8);
        assertEquals(stability, distance.stabilityDecrease(), 1e-12);
        assertEquals(Double.NEGATIVE_INFINITY, DistanceFromInstability.of(0).stabilityDecrease());
        assertThrows(IllegalArgumentException.class, () -> DistanceFromInstability.of(-0.1));
        assertThrows(IllegalArgumentException.class, () -> DistanceFromInstability.of(Double.NaN));
    }
}
