package org.shearbook.desk.timeheight;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.timeheight.LevelThinning.Quantity;

class LevelThinningTests {

    private static final double[] NO_THRESHOLD = {};

    @Test
    void ofAStraightLineOnlyTheEndsAreKept() {
        double[] line = IntStream.range(0, 1000).mapToDouble(k -> 3 + 0.01 * k).toArray();
        assertThat(LevelThinning.kept(line, List.of(new Quantity(line, 0.001)), line, NO_THRESHOLD)).containsExactly(0, 999);
    }

    @Test
    void aKinkIsKeptWhereItIs() {
        double[] coordinate = IntStream.range(0, 101).mapToDouble(k -> k).toArray();
        double[] kink = IntStream.range(0, 101).mapToDouble(k -> Math.abs(k - 40)).toArray();
        assertThat(LevelThinning.kept(coordinate, List.of(new Quantity(kink, 0.5)), kink, NO_THRESHOLD)).containsExactly(0, 40, 100);
    }

    @Test
    void aQuantityThatIsMissingWhereTheOthersAreNotKeepsItsEdges() {
        double[] coordinate = {0, 1, 2, 3, 4, 5, 6};
        double[] flat = {1, 1, 1, 1, 1, 1, 1};
        double[] gap = {1, 1, Double.NaN, Double.NaN, Double.NaN, 1, 1};
        assertThat(LevelThinning.kept(coordinate, List.of(new Quantity(flat, 0.1), new Quantity(gap, 0.1)), flat, NO_THRESHOLD))
                .containsExactly(0, 1, 2, 4, 5, 6);
    }

    @Test
    void aSmoothHighResolutionSoundingShrinksToLittle() {
        // a jet-like curve on 1600 levels of 10 m; a picture of it needs a few dozen
        double[] height = IntStream.range(0, 1600).mapToDouble(k -> 10 * k).toArray();
        double[] speed = IntStream.range(0, 1600).mapToDouble(k -> 60 * Math.exp(-Math.pow((10 * k - 10_000) / 3000.0, 2))).toArray();
        assertThat(LevelThinning.kept(height, List.of(new Quantity(speed, 0.3)), speed, NO_THRESHOLD).length).isBetween(10, 60);
    }

    @Test
    void oneOrTwoLevelsStayAsTheyAre() {
        assertThat(LevelThinning.kept(new double[] {5}, List.of(), new double[] {1}, 0.25)).containsExactly(0);
        assertThat(LevelThinning.kept(new double[] {5, 6}, List.of(), new double[] {1, 0}, 0.25)).containsExactly(0, 1);
    }
}
