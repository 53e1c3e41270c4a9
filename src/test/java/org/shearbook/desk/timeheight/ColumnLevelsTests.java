package org.shearbook.desk.timeheight;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class ColumnLevelsTests {

    private static final double NONE = Double.NaN;

    @Test
    void levelsThatDoNotRiseInFlightLevelAreLeftOut() {
        ColumnLevels levels = levels(new double[] {0, 10, 10, 9, NONE, 20}, new double[] {5, 4, 3, 2, 1, 0.1});
        assertThat(levels.thinned().flightLevel()).containsExactly(0.0, 10.0, 20.0);
        assertThat(levels.thinned().richardson()).containsExactly(5.0, 4.0, 0.1);
    }

    @Test
    void whatIsMissingIsNullAndWhatHasNoShearIsQuietAndFinite() {
        ColumnLevels levels = levels(new double[] {0, 10, 20, 30}, new double[] {NONE, 2, Double.POSITIVE_INFINITY, -5e6});
        assertThat(levels.thinned().richardson()).containsExactly(null, 2.0, 1000.0, -1000.0);
    }

    @Test
    void roundingNeverMovesALevelOverAThreshold() {
        ColumnLevels levels = levels(new double[] {0, 10, 20, 30}, new double[] {0.249999, 0.250001, 0.999999, 1});
        assertThat(levels.thinned().richardson()).containsExactly(0.249999, 0.25, 0.999999, 1.0);
    }

    @Test
    void theLowestOfEachThousandFeetTakesEveryLevelIntoAccount() {
        double[] flightLevel = IntStream.range(0, 4500).mapToDouble(k -> k / 10.0).toArray();
        double[] richardson = new double[4500];
        Arrays.fill(richardson, 3);
        richardson[2915] = 0.16;
        richardson[2899] = 0.3;
        richardson[2900] = NONE;
        Arrays.fill(richardson, 2400, 2600, NONE);
        var lowest = levels(flightLevel, richardson).lowestPerThousandFeet();
        assertThat(lowest).hasSize(45);
        assertThat(lowest.get(29)).isEqualTo(0.16);
        assertThat(lowest.get(28)).isEqualTo(0.3);
        assertThat(lowest.get(24)).isNull();
        assertThat(lowest.get(30)).isEqualTo(3.0);
    }

    @Test
    void theScaleHasTheCriticalValueInItsMiddleAndRisesThroughZero() {
        // exact: Ri / (Ri + 1/4), and Ri / (1/4) below zero
        assertThat(ColumnLevels.quarterScale(0.25)).isEqualTo(0.5);
        assertThat(ColumnLevels.quarterScale(1)).isEqualTo(0.8);
        assertThat(ColumnLevels.quarterScale(-0.25)).isEqualTo(-1);
        assertThat(ColumnLevels.quarterScale(Double.POSITIVE_INFINITY)).isEqualTo(1);
        assertThat(ColumnLevels.quarterScale(NONE)).isNaN();
    }

    private static ColumnLevels levels(double[] flightLevel, double[] richardson) {
        double[] height = IntStream.range(0, flightLevel.length).mapToDouble(k -> 30 * k).toArray();
        double[] same = new double[flightLevel.length];
        return new ColumnLevels(height, flightLevel, height, richardson, same, same);
    }
}
