package org.shearbook.met.profile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.shearbook.testing.JetAscents;

class VerticalProfileTests {

    private static final double NONE = Double.NaN;

    private static ThermodynamicLevel standard(double height) {
        return new ThermodynamicLevel(height, StandardAtmosphere.pressure(height), StandardAtmosphere.temperature(height), NONE);
    }

    private static VerticalProfile withGap() {
        return new VerticalProfile(100, List.of(standard(100), standard(1000), standard(3000)),
                List.of(new WindLevel(100, 1, 2), new WindLevel(1000, 3, 4), new WindLevel(2000, 5, 6)),
                List.of(new HeightBand(1000, 3000)), List.of(new HeightBand(1000, 2000)), List.of());
    }

    @Test
    void betweenLevelsTemperatureAndWindAreLinear() {
        VerticalProfile profile = withGap();
        assertEquals((StandardAtmosphere.temperature(100) + StandardAtmosphere.temperature(1000)) / 2, profile.temperatureAt(550), 1e-9);
        WindLevel wind = profile.windAt(550);
        assertNotNull(wind);
        assertEquals(2, wind.eastward(), 1e-12);
        assertEquals(3, wind.northward(), 1e-12);
    }

    @Test
    void insideAGapAndBeyondTheDataNothingIsKnown() {
        VerticalProfile profile = withGap();
        assertTrue(Double.isNaN(profile.temperatureAt(1500)));
        assertNull(profile.windAt(1500));
        assertTrue(Double.isNaN(profile.temperatureAt(99)));
        assertNull(profile.windAt(2001));
        assertTrue(Double.isNaN(profile.pressureAt(3001)));
        assertTrue(Double.isNaN(profile.temperatureAt(Double.NaN)));
    }

    @Test
    void theBoundsOfAGapAreMeasured() {
        VerticalProfile profile = withGap();
        assertEquals(StandardAtmosphere.temperature(3000), profile.temperatureAt(3000));
        WindLevel wind = profile.windAt(2000);
        assertNotNull(wind);
        assertEquals(5, wind.eastward());
        assertTrue(profile.hasWindGapBetween(900, 1100));
        assertTrue(!profile.hasWindGapBetween(100, 1000));
    }

    @Test
    void heightPressureAndFlightLevelComeBackFromEachOther() {
        long seed = 7;
        Random random = new Random(seed);
        VerticalProfile profile = JetAscents.KELBRITH_DAY_2_12.profile();
        for (int i = 0; i < 2000; i++) {
            double height = profile.lowestHeight() + random.nextDouble() * (profile.highestHeight() - profile.lowestHeight());
            assertEquals(height, profile.heightOfPressure(profile.pressureAt(height)), 1e-6, "seed " + seed);
            assertEquals(height, profile.heightOfFlightLevel(profile.flightLevelAt(height)), 1e-6, "seed " + seed);
        }
    }

    @Test
    void flightLevelsComeFromTheAscentsOwnPressureNotFromHeight() {
        // a cold ascent: FL290 lies well below 29 000 ft of height
        VerticalProfile profile = JetAscents.KELBRITH_DAY_2_12.profile();
        assertTrue(profile.heightOfFlightLevel(290) < Units.feetToMetres(29_000) - 100);
    }

    @Test
    void windLevelsGiveTheirPressureToTheAscent() {
        VerticalProfile profile = new VerticalProfile(List.of(standard(0), standard(4000)),
                List.of(new WindLevel(2000, StandardAtmosphere.pressure(2000), 1, 1), new WindLevel(3000, 2, 2)));
        assertEquals(StandardAtmosphere.pressure(2000), profile.pressureAt(2000), 1e-6);
    }

    @Test
    void levelsThatDoNotRiseAreRefusedByIndex() {
        IllegalArgumentException refusal = assertThrows(IllegalArgumentException.class,
                () -> new VerticalProfile(List.of(standard(100), standard(100)), List.of()));
        assertTrue(refusal.getMessage().contains("thermodynamic level 1"), refusal.getMessage());
        assertThrows(IllegalArgumentException.class, () -> new VerticalProfile(List.of(standard(0)),
                List.of(new WindLevel(10, 0, 0), new WindLevel(5, 0, 0))));
        assertThrows(IllegalArgumentException.class, () -> new VerticalProfile(List.of(), List.of()));
    }

    @Test
    void pressureThatRisesWithHeightIsRefused() {
        assertThrows(IllegalArgumentException.class, () -> new VerticalProfile(
                List.of(new ThermodynamicLevel(0, 90_000, 280, NONE), new ThermodynamicLevel(10, 90_001, 280, NONE)), List.of()));
        assertThrows(IllegalArgumentException.class, () -> new VerticalProfile(
                List.of(standard(0), standard(1000)), List.of(new WindLevel(500, StandardAtmosphere.pressure(1001), 0, 0))));
    }

    @Test
    void whatIsNotFiniteCannotBecomeALevel() {
        assertThrows(IllegalArgumentException.class, () -> new ThermodynamicLevel(NONE, 90_000, 280, NONE));
        assertThrows(IllegalArgumentException.class, () -> new ThermodynamicLevel(0, 0, 280, NONE));
        assertThrows(IllegalArgumentException.class, () -> new ThermodynamicLevel(0, 90_000, Double.POSITIVE_INFINITY, NONE));
        assertThrows(IllegalArgumentException.class, () -> new WindLevel(0, NONE, 1));
        assertThrows(IllegalArgumentException.class, () -> new HeightBand(5, 5));
    }

    @Test
    void listsGivenCannotBeChangedAfterwards() {
        List<ThermodynamicLevel> levels = new ArrayList<>(List.of(standard(0), standard(10)));
        VerticalProfile profile = new VerticalProfile(levels, List.of());
        levels.clear();
        assertEquals(2, profile.thermodynamicLevels().size());
        profile.temperatureHeights()[0] = 1e9;
        assertEquals(0, profile.temperatureHeights()[0]);
    }

    @Test
    void aBalloonCrossesTheDateLineTheShortWay() {
        VerticalProfile profile = new VerticalProfile(0, List.of(standard(0), standard(1000)), List.of(), List.of(), List.of(),
                List.of(new BalloonPosition(0, 0, 10, 179.9), new BalloonPosition(1000, 200, 10.2, -179.9)));
        BalloonPosition half = profile.positionAt(500);
        assertNotNull(half);
        assertEquals(180, Math.abs(half.longitude()), 1e-9);
        assertEquals(100, half.elapsed(), 1e-9);
        assertEquals(10.1, half.latitude(), 1e-9);
        assertNull(profile.positionAt(1001));
    }
}
