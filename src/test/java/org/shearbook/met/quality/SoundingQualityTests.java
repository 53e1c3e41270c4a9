package org.shearbook.met.quality;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.Duration;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import java.util.Set;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.met.decode.ReportedLevel.Significance;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.StandardAtmosphere;
import org.shearbook.met.profile.VerticalProfile;
import org.shearbook.met.profile.WindLevel;
import org.shearbook.met.richardson.RichardsonAnalysis;
import org.shearbook.met.richardson.RichardsonProfile;
import org.shearbook.testing.JetAscents;

class SoundingQualityTests {

    private static final double NONE = Double.NaN;

    private static ReportedLevel level(
            double pressure, double height, double temperature, double dewPoint, double direction, double speed, Significance... significance) {
        return new ReportedLevel(pressure, height, temperature, dewPoint, direction, speed, NONE, NONE, NONE, Set.of(significance));
    }

    private static ReportedLevel standard(double height, double direction, double speed) {
        return level(StandardAtmosphere.pressure(height), height, StandardAtmosphere.temperature(height),
                StandardAtmosphere.temperature(height) - 5, direction, speed);
    }

    /** Every 100 m from the ground to 10 km of the standard atmosphere, wind growing evenly. */
    private static List<ReportedLevel> clean() {
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i <= 100; i++) {
            levels.add(standard(100 * i, 250.5, 3 + 0.3 * i));
        }
        return levels;
    }

    private static List<ReportedLevel> cleanBut(int index, UnaryOperator<ReportedLevel> change) {
        List<ReportedLevel> levels = clean();
        levels.set(index, change.apply(levels.get(index)));
        return levels;
    }

    private static CheckedSounding check(List<ReportedLevel> levels) {
        CheckedSounding checked = SoundingQuality.check(levels, NONE, null);
        assertEquals(levels, checked.levels().stream().map(CheckedLevel::reported).toList(), "nothing is deleted, changed or moved");
        return checked;
    }

    private static void assertFlagged(CheckedSounding checked, int index, QualityFlag flag) {
        assertTrue(checked.levels().get(index).flags().contains(flag), checked.levels().get(index).toString());
        for (int i = 0; i < checked.levels().size(); i++) {
            assertTrue(i == index || !checked.levels().get(i).flags().contains(flag), "also at " + i);
        }
    }

    @Test
    void aCleanAscentPassesWithoutAFlag() {
        CheckedSounding checked = check(clean());
        assertTrue(checked.levels().stream().allMatch(l -> l.flags().isEmpty() && l.temperatureUsed() && l.windUsed()));
        assertTrue(checked.soundingFlags().isEmpty());
        VerticalProfile profile = checked.profile().orElseThrow();
        assertEquals(101, profile.thermodynamicLevels().size());
        assertEquals(101, profile.windLevels().size());
        assertTrue(profile.windGaps().isEmpty());
        assertTrue(checked.refusal().isEmpty());
    }

    @Test
    void aLevelBelowTheGroundIsKeptAndNotUsed() {
        List<ReportedLevel> levels = clean();
        levels.set(2, level(StandardAtmosphere.pressure(200), 200, 287, NONE, 250, 4, Significance.SURFACE));
        CheckedSounding checked = check(levels);
        assertTrue(checked.levels().get(0).flags().contains(QualityFlag.BELOW_GROUND));
        assertTrue(checked.levels().get(1).flags().contains(QualityFlag.BELOW_GROUND));
        assertFalse(checked.levels().get(1).windUsed());
        assertFalse(checked.levels().get(2).flags().contains(QualityFlag.BELOW_GROUND));
        assertEquals(200, checked.profile().orElseThrow().lowestHeight());
        CheckedSounding marked = check(cleanBut(0, l -> level(l.pressure(), l.height(), NONE, NONE, NONE, NONE, Significance.BELOW_GROUND)));
        assertFlagged(marked, 0, QualityFlag.BELOW_GROUND);
    }

    @Test
    void withoutSurfacePressureTheElevationTellsWhatIsBelowGround() {
        CheckedSounding checked = SoundingQuality.check(clean(), 350, null);
        assertEquals(400, checked.profile().orElseThrow().lowestHeight());
        assertEquals(350, checked.profile().orElseThrow().surfaceHeight());
    }

    @Test
    void impossibleTemperaturesAreNotUsedTheirWindsAre() {
        CheckedSounding checked = check(cleanBut(50, l -> level(l.pressure(), l.height(), 400, NONE, l.windFromDirection(), l.windSpeed())));
        assertFlagged(checked, 50, QualityFlag.TEMPERATURE_RANGE);
        assertFalse(checked.levels().get(50).temperatureUsed());
        assertTrue(checked.levels().get(50).windUsed());
        VerticalProfile profile = checked.profile().orElseThrow();
        assertEquals(100, profile.thermodynamicLevels().size());
        assertEquals(101, profile.windLevels().size());
    }

    @Test
    void impossibleWindsAreNotUsedTheirTemperaturesAre() {
        assertWindRefused(QualityFlag.WIND_DIRECTION_RANGE, 361, 10);
        assertWindRefused(QualityFlag.WIND_DIRECTION_RANGE, -1, 10);
        assertWindRefused(QualityFlag.WIND_SPEED_RANGE, 250, 151);
        assertWindRefused(QualityFlag.WIND_SPEED_RANGE, 250, -1);
        CheckedSounding north = check(cleanBut(50, l -> level(l.pressure(), l.height(), l.temperature(), l.dewPoint(), 360, 0)));
        assertFalse(north.levels().get(50).flags().contains(QualityFlag.WIND_DIRECTION_RANGE));
    }

    private static void assertWindRefused(QualityFlag flag, double direction, double speed) {
        CheckedSounding checked = check(cleanBut(50, l -> level(l.pressure(), l.height(), l.temperature(), l.dewPoint(), direction, speed)));
        assertFlagged(checked, 50, flag);
        assertFalse(checked.levels().get(50).windUsed());
        assertTrue(checked.levels().get(50).temperatureUsed());
    }

    @Test
    void aDewPointAboveTheTemperatureIsCutOrRefused() {
        CheckedSounding slight = check(cleanBut(50, l -> level(l.pressure(), l.height(), l.temperature(), l.temperature() + 0.4, 250, 18)));
        assertFlagged(slight, 50, QualityFlag.DEW_POINT_ABOVE_TEMPERATURE);
        VerticalProfile profile = slight.profile().orElseThrow();
        assertEquals(profile.temperatureAt(5000), profile.dewPointAt(5000));
        CheckedSounding gross = check(cleanBut(50, l -> level(l.pressure(), l.height(), l.temperature(), l.temperature() + 5, 250, 18)));
        assertTrue(Double.isNaN(gross.profile().orElseThrow().dewPointAt(5000)));
        assertTrue(gross.levels().get(50).temperatureUsed());
    }

    @Test
    void missingHumidityCountsAsDryAndIsFlagged() {
        CheckedSounding one = check(cleanBut(50, l -> level(l.pressure(), l.height(), l.temperature(), NONE, 250, 18)));
        assertFlagged(one, 50, QualityFlag.HUMIDITY_MISSING);
        assertFalse(one.hasSoundingFlag(QualityFlag.NO_HUMIDITY));
        CheckedSounding none = check(clean().stream().map(l -> level(l.pressure(), l.height(), l.temperature(), NONE, 250.5, l.windSpeed())).toList());
        assertTrue(none.hasSoundingFlag(QualityFlag.NO_HUMIDITY));
        assertTrue(none.profile().isPresent());
    }

    @Test
    void pressureThatRisesIsReplacedWhereTheHeightFits() {
        // a dense ascent in which one pressure exceeds that two levels, 40 m, below
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i <= 200; i++) {
            levels.add(standard(20 * i, 250, 5 + 0.05 * i));
        }
        ReportedLevel wrong = levels.get(100);
        levels.set(100, level(levels.get(98).pressure() + 10, wrong.height(), wrong.temperature(), wrong.dewPoint(), 250, 10));
        CheckedSounding checked = check(levels);
        assertFlagged(checked, 100, QualityFlag.PRESSURE_NOT_DECREASING);
        assertTrue(checked.levels().get(100).temperatureUsed());
        assertEquals(StandardAtmosphere.pressure(2000), checked.levels().get(100).pressure(), 5);
    }

    @Test
    void pressureThatRisesAndDoesNotFitIsNotUsed() {
        CheckedSounding checked = check(cleanBut(50, l -> level(95_000, l.height(), l.temperature(), l.dewPoint(), 250, 18)));
        assertFlagged(checked, 50, QualityFlag.PRESSURE_NOT_DECREASING);
        assertFalse(checked.levels().get(50).temperatureUsed());
        assertFalse(checked.levels().get(50).windUsed());
        assertEquals(100, checked.profile().orElseThrow().thermodynamicLevels().size());
    }

    @Test
    void aSecondValueAtTheSameHeightIsNotUsed() {
        List<ReportedLevel> levels = clean();
        levels.add(51, standard(5000, 90, 40));
        CheckedSounding checked = check(levels);
        assertFlagged(checked, 51, QualityFlag.DUPLICATE_LEVEL);
        assertFalse(checked.levels().get(51).windUsed() || checked.levels().get(51).temperatureUsed());
        WindLevel wind = checked.profile().orElseThrow().windAt(5000);
        assertNotNull(wind);
        assertEquals(18, wind.speed(), 1e-9);
    }

    @Test
    void temperatureAndWindOfOneHeightMayComeInTwoLevels() {
        List<ReportedLevel> levels = new ArrayList<>();
        for (ReportedLevel l : clean()) {
            levels.add(level(l.pressure(), l.height(), l.temperature(), l.dewPoint(), NONE, NONE));
            levels.add(level(l.pressure(), NONE, NONE, NONE, l.windFromDirection(), l.windSpeed()));
        }
        VerticalProfile profile = check(levels).profile().orElseThrow();
        assertEquals(101, profile.thermodynamicLevels().size());
        assertEquals(101, profile.windLevels().size());
        assertEquals(5000, profile.windLevels().get(50).height(), 1e-6);
    }

    @Test
    void missingHeightsAreHypsometric() {
        // exact to the curvature of temperature over ln p: the standard atmosphere, only the lowest height known
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i <= 100; i++) {
            double z = 100 * i;
            levels.add(level(StandardAtmosphere.pressure(z), i == 0 ? 0 : NONE, StandardAtmosphere.temperature(z), NONE, 250, 3 + 0.3 * i));
        }
        CheckedSounding checked = check(levels);
        for (int i = 1; i <= 100; i++) {
            assertEquals(100 * i, checked.levels().get(i).height(), 0.05);
            assertTrue(checked.levels().get(i).flags().contains(QualityFlag.HEIGHT_COMPUTED));
        }
    }

    @Test
    void heightsBetweenReportedOnesMeetBoth() {
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i <= 100; i++) {
            ReportedLevel l = standard(100 * i, 250, 3 + 0.3 * i);
            levels.add(i % 10 == 0 ? level(l.pressure(), l.height() + (i == 50 ? 8 : 0), l.temperature(), NONE, 250, 10)
                    : level(l.pressure(), NONE, l.temperature(), NONE, 250, 10));
        }
        CheckedSounding checked = check(levels);
        double before = Double.NEGATIVE_INFINITY;
        for (CheckedLevel level : checked.levels()) {
            assertTrue(level.height() > before);
            before = level.height();
        }
        assertEquals(5008, checked.levels().get(50).height());
        assertEquals(4504, checked.levels().get(45).height(), 0.2);
    }

    @Test
    void withoutAnyHeightTheElevationOrTheStandardAtmosphereIsTheAnchor() {
        List<ReportedLevel> levels = clean().stream()
                .map(l -> level(l.pressure(), NONE, l.temperature(), NONE, 250, l.windSpeed())).toList();
        CheckedSounding checked = check(levels);
        assertTrue(checked.hasSoundingFlag(QualityFlag.HEIGHT_FROM_STANDARD_ATMOSPHERE));
        assertEquals(10_000, checked.levels().get(100).height(), 0.05);
        CheckedSounding elevated = SoundingQuality.check(levels, 30, null);
        assertEquals(30, elevated.levels().get(0).height());
        assertFalse(elevated.hasSoundingFlag(QualityFlag.HEIGHT_FROM_STANDARD_ATMOSPHERE));
    }

    @Test
    void windsByHeightGetTheirPressureFromTheAscent() {
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i <= 20; i++) {
            ReportedLevel l = standard(500 * i, NONE, NONE);
            levels.add(l);
            levels.add(level(NONE, 500 * i + 250, NONE, NONE, 250, 5 + i));
        }
        CheckedSounding checked = check(levels);
        assertEquals(StandardAtmosphere.pressure(5250), checked.levels().get(21).pressure(), 30);
        assertTrue(checked.levels().get(21).flags().contains(QualityFlag.PRESSURE_INTERPOLATED));
        assertEquals(21, checked.profile().orElseThrow().windLevels().size());
    }

    @Test
    void aHeightThatContradictsPressureAndTemperatureIsComputedAnew() {
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i <= 10; i++) {
            levels.add(standard(1000 * i, 250, 5 + i));
        }
        ReportedLevel wrong = levels.get(5);
        levels.set(5, level(wrong.pressure(), 5400, wrong.temperature(), wrong.dewPoint(), 250, 10));
        CheckedSounding checked = check(levels);
        assertFlagged(checked, 5, QualityFlag.HYDROSTATIC);
        assertEquals(5000, checked.levels().get(5).height(), 10);
    }

    @Test
    void aSuperadiabaticStepIsFlaggedAndUsed() {
        CheckedSounding checked = check(cleanBut(50, l -> level(l.pressure(), l.height(), l.temperature() - 2, NONE, 250, 18)));
        assertFlagged(checked, 50, QualityFlag.SUPERADIABATIC);
        assertTrue(checked.levels().get(50).temperatureUsed());
    }

    @Test
    void spikesAreNotUsed() {
        CheckedSounding temperature = check(cleanBut(50, l -> level(l.pressure(), l.height(), l.temperature() + 9, NONE, 250.5, 18)));
        assertFlagged(temperature, 50, QualityFlag.TEMPERATURE_SPIKE);
        assertFalse(temperature.levels().get(50).temperatureUsed());
        CheckedSounding wind = check(cleanBut(50, l -> level(l.pressure(), l.height(), l.temperature(), l.dewPoint(), 160, 18)));
        assertFlagged(wind, 50, QualityFlag.WIND_SPIKE);
        assertFalse(wind.levels().get(50).windUsed());
    }

    @Test
    void aJumpThatStaysIsFlaggedAndUsed() {
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i <= 100; i++) {
            levels.add(standard(50 * i, 250, i < 50 ? 10 : 25));
        }
        CheckedSounding checked = check(levels);
        assertFlagged(checked, 50, QualityFlag.WIND_JUMP);
        assertTrue(checked.levels().get(50).windUsed());
    }

    @Test
    void aDropOutOfWindIsAGapAndGivesNoShear() {
        // the demonstration's defect: no wind for 600 m at the sharpest layer of a 10 m ascent
        List<ReportedLevel> levels = JetAscents.KELBRITH_DAY_2_12.reported().stream().map(l -> l.height() > 8450 && l.height() < 9050
                ? level(l.pressure(), l.height(), l.temperature(), l.dewPoint(), NONE, NONE) : l).toList();
        CheckedSounding checked = check(levels);
        VerticalProfile profile = checked.profile().orElseThrow();
        assertEquals(List.of(new HeightBand(8450, 9050)), profile.windGaps());
        assertTrue(profile.temperatureGaps().isEmpty());
        assertEquals(2, checked.levels().stream().filter(l -> l.flags().contains(QualityFlag.WIND_GAP)).count());
        RichardsonProfile result = RichardsonAnalysis.of(profile, 200);
        assertTrue(result.minimumBetween(8451, 9049).isEmpty());
        assertTrue(Double.isNaN(result.maximumShearOverThousandFeetBetween(8451, 9049)));
    }

    @Test
    void codedLevelsFarApartAreNoGapUnlessTheMessageSaysSo() {
        double[] heights = {0, 800, 1500, 3000, 5500, 7200, 9200, 10_400};
        List<ReportedLevel> levels = new ArrayList<>();
        for (double z : heights) {
            levels.add(standard(z, 250, 5 + z / 500));
        }
        assertTrue(check(levels).profile().orElseThrow().windGaps().isEmpty());
        for (int i : new int[] {3, 4}) {
            ReportedLevel l = levels.get(i);
            levels.set(i, level(l.pressure(), l.height(), l.temperature(), l.dewPoint(), 250, l.windSpeed(),
                    Significance.WIND_MISSING_BOUNDARY, Significance.TEMPERATURE_MISSING_BOUNDARY));
        }
        VerticalProfile profile = check(levels).profile().orElseThrow();
        assertEquals(List.of(new HeightBand(3000, 5500)), profile.windGaps());
        assertEquals(List.of(new HeightBand(3000, 5500)), profile.temperatureGaps());
        assertNull(profile.windAt(4000));
    }

    @Test
    void roundedDirectionsAndTemperaturesAreSaid() {
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i <= 20; i++) {
            levels.add(level(StandardAtmosphere.pressure(400 * i), 400 * i, 273.15 + 15 - 2 * i, NONE, 5 * (50 + i), 10));
        }
        CheckedSounding checked = check(levels);
        assertTrue(checked.hasSoundingFlag(QualityFlag.DIRECTION_ROUNDED));
        assertTrue(checked.hasSoundingFlag(QualityFlag.TEMPERATURE_ROUNDED));
    }

    @Test
    void knotsTakenForMetresPerSecondAreSuspectedAboveAHundred() {
        List<ReportedLevel> levels = JetAscents.KELBRITH_DAY_2_00.reported().stream().map(l -> level(l.pressure(), l.height(),
                l.temperature(), l.dewPoint(), l.windFromDirection(), l.windSpeed() * 3600 / 1852)).toList();
        CheckedSounding checked = check(levels);
        assertTrue(checked.hasSoundingFlag(QualityFlag.POSSIBLE_UNIT_SLIP));
        assertTrue(checked.profile().isPresent(), "a suspicion is for a person to decide");
    }

    @Test
    void knotsTakenForMetresPerSecondAreSuspectedAgainstThePreviousSounding() {
        VerticalProfile previous = check(clean()).profile().orElseThrow();
        List<ReportedLevel> slipped = clean().stream().map(l -> level(l.pressure(), l.height(), l.temperature(), l.dewPoint(),
                l.windFromDirection(), l.windSpeed() * 3600 / 1852)).toList();
        assertTrue(SoundingQuality.check(slipped, NONE, previous).hasSoundingFlag(QualityFlag.POSSIBLE_UNIT_SLIP));
        assertFalse(SoundingQuality.check(slipped, NONE, null).hasSoundingFlag(QualityFlag.POSSIBLE_UNIT_SLIP));
        assertFalse(SoundingQuality.check(clean(), NONE, previous).hasSoundingFlag(QualityFlag.POSSIBLE_UNIT_SLIP));
    }

    @Test
    void tooLittleIsRefusedWithItsReason() {
        assertRefused("NO_LEVELS", List.of());
        assertRefused("SINGLE_LEVEL", clean().subList(0, 1));
        assertRefused("NO_VERTICAL_COORDINATE", List.of(level(NONE, NONE, 280, NONE, 250, 5), level(NONE, NONE, 270, NONE, 250, 5)));
        assertRefused("NO_PRESSURE", List.of(level(NONE, 100, 280, NONE, 250, 5), level(NONE, 200, 279, NONE, 250, 5),
                level(NONE, 300, 278, NONE, 250, 5)));
        assertRefused("FEWER_THAN_THREE_WIND_LEVELS", clean().stream().map(l -> l.height() < 200 ? l
                : level(l.pressure(), l.height(), l.temperature(), l.dewPoint(), NONE, NONE)).toList());
        assertRefused("FEWER_THAN_THREE_TEMPERATURE_LEVELS", clean().stream().map(l -> l.height() < 200 ? l
                : level(l.pressure(), l.height(), NONE, NONE, l.windFromDirection(), l.windSpeed())).toList());
    }

    private static void assertRefused(String code, List<ReportedLevel> levels) {
        CheckedSounding checked = check(levels);
        assertEquals(code, checked.refusal().orElseThrow().code());
        assertTrue(checked.profile().isEmpty());
        assertFalse(checked.refusal().orElseThrow().text().isBlank());
    }

    @Test
    void nonsenseInAnyFieldNeverThrows() {
        long seed = 271_828;
        System.out.println("SoundingQualityTests seed " + seed);
        Random random = new Random(seed);
        double[] nonsense = {NONE, 0, -1, 1e300, -1e300, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, Double.MIN_VALUE, 360, 101_325};
        for (int run = 0; run < 2000; run++) {
            List<ReportedLevel> levels = new ArrayList<>();
            int n = random.nextInt(30);
            boolean byPressure = random.nextBoolean();
            for (int i = 0; i < n; i++) {
                double z = 200 * random.nextInt(60);
                double[] v = {StandardAtmosphere.pressure(z), byPressure ? NONE : z, StandardAtmosphere.temperature(z),
                    StandardAtmosphere.temperature(z) - 3, 360 * random.nextDouble(), 60 * random.nextDouble(), i, 47, -30};
                for (int field = 0; field < v.length; field++) {
                    if (random.nextInt(run % 2 == 0 ? 8 : 60) == 0) {
                        v[field] = nonsense[random.nextInt(nonsense.length)];
                    }
                }
                Significance[] all = Significance.values();
                levels.add(new ReportedLevel(v[0], v[1], v[2], v[3], v[4], v[5], v[6], v[7], v[8],
                        random.nextInt(5) == 0 ? Set.of(all[random.nextInt(all.length)]) : Set.of()));
            }
            CheckedSounding checked = SoundingQuality.check(levels, random.nextInt(4) == 0 ? NONE : 50, null);
            assertEquals(n, checked.levels().size());
            checked.profile().ifPresent(p -> RichardsonAnalysis.of(p, 200));
        }
    }

    @Test
    void theOrderOfTheMessageDoesNotMatter() {
        List<ReportedLevel> shuffled = new ArrayList<>(clean());
        Collections.shuffle(shuffled, new Random(3));
        assertEquals(check(clean()).profile(), check(shuffled).profile());
    }

    @Test
    void tenThousandLevelsWithPressureInWholeHectopascalsAreCheckedInTime() {
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i < 10_000; i++) {
            double z = 3 * i;
            levels.add(level(100 * Math.rint(StandardAtmosphere.pressure(z) / 100), z, StandardAtmosphere.temperature(z), NONE, 250.3, 10));
        }
        CheckedSounding checked = assertTimeoutPreemptively(Duration.ofSeconds(10), () -> check(levels));
        assertEquals(10_000, checked.profile().orElseThrow().thermodynamicLevels().size());
        assertTrue(checked.levels().stream().noneMatch(l -> l.flags().contains(QualityFlag.PRESSURE_NOT_DECREASING)));
    }

    @Test
    void levelsOneCentimetreApartSurvive() {
        List<ReportedLevel> levels = new ArrayList<>();
        for (int i = 0; i < 1000; i++) {
            levels.add(standard(1000 + 0.01 * i, 250, 10));
        }
        assertEquals(1000, check(levels).profile().orElseThrow().windLevels().size());
    }
}
