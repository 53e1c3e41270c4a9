package org.shearbook.desk.forecast;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** What lies inside an area. Expected values are exact: they follow from the geometry. */
class AreaTests {

    @Test
    void theEdgeOfABoxBelongsToIt() {
        Area box = Area.box(46.7, 47.7, -30.8, -29.4);
        assertThat(box.contains(47.2, -30)).isTrue();
        assertThat(box.contains(46.7, -30)).isTrue();
        assertThat(box.contains(47.7, -29.4)).isTrue();
        assertThat(box.contains(46.69, -30)).isFalse();
        assertThat(box.contains(47.2, -29.39)).isFalse();
        assertThat(box.contains(47.2, 150)).isFalse();
    }

    @Test
    void aBoxAcrossTheDateLineLiesOnBothSidesOfIt() {
        Area box = Area.box(50, 51, 179, -178);
        assertThat(box.contains(50.5, 179.5)).isTrue();
        assertThat(box.contains(50.5, -179)).isTrue();
        assertThat(box.contains(50.5, 180)).isTrue();
        assertThat(box.contains(50.5, 178.5)).isFalse();
        assertThat(box.contains(50.5, 0)).isFalse();
    }

    @Test
    void aRadiusIsMeasuredAlongTheGreatCircleEvenOverThePole() {
        Area round = new Area.Radius("", 89, 0, 120);
        assertThat(round.contains(89.5, 180)).isTrue();
        assertThat(round.contains(88.9, 180)).isFalse();
        assertThat(new Area.Radius("", 47.2, -30, 60).contains(48.2, -30)).isTrue();
        assertThat(new Area.Radius("", 47.2, -30, 60).contains(48.21, -30)).isFalse();
    }

    @Test
    void itDoesNotMatterWithWhichCornerAnAreaBegins() {
        long seed = 20310312;
        Random random = new Random(seed);
        List<Area.Corner> corners = List.of(new Area.Corner(46, -31), new Area.Corner(48, -30.5), new Area.Corner(47.5, -29), new Area.Corner(46.2, -29.5));
        for (int i = 0; i < 500; i++) {
            double latitude = 45.5 + 3 * random.nextDouble();
            double longitude = -31.5 + 3 * random.nextDouble();
            boolean expected = new Area.Corners(corners).contains(latitude, longitude);
            for (int shift = 1; shift < 4; shift++) {
                List<Area.Corner> turned = new java.util.ArrayList<>(corners.subList(shift, 4));
                turned.addAll(corners.subList(0, shift));
                assertThat(new Area.Corners(turned).contains(latitude, longitude)).as("seed %d, try %d", seed, i).isEqualTo(expected);
                java.util.Collections.reverse(turned);
                assertThat(new Area.Corners(turned).contains(latitude, longitude)).as("seed %d, try %d, reversed", seed, i).isEqualTo(expected);
            }
        }
    }

    @Test
    void areasThatShareAirAreSaidToOverlap() {
        Area box = Area.box(46.7, 47.7, -30.8, -29.4);
        assertThat(Area.mayOverlap(box, Area.box(47, 48, -30, -29))).isTrue();
        assertThat(Area.mayOverlap(box, Area.box(46, 49, -32, -28))).isTrue();
        assertThat(Area.mayOverlap(Area.box(46, 49, -32, -28), box)).isTrue();
        assertThat(Area.mayOverlap(box, Area.box(48, 49, -30, -29))).isFalse();
        assertThat(Area.mayOverlap(box, new Area.Radius("", 47.2, -30, 10))).isTrue();
        assertThat(Area.mayOverlap(box, new Area.Radius("", 47.2, -29, 30))).isTrue();
        assertThat(Area.mayOverlap(box, new Area.Radius("", 47.2, -27, 30))).isFalse();
        assertThat(Area.mayOverlap(new Area.Radius("", 47, -30, 30), new Area.Radius("", 48, -30, 31))).isTrue();
        assertThat(Area.mayOverlap(new Area.Radius("", 47, -30, 30), new Area.Radius("", 48, -30, 29))).isFalse();
    }

    @Test
    void theInventedThreeDaysHaveTheirReportsInsideAndOutsideAsCountedByHand() {
        // counted for the invented scenario, standing versions: 18 of 26 yes-reports lie inside a forecast, 15 of 23 explicit nil outside
        List<Scenario.Report> yes = Scenario.REPORTS.stream().filter(report -> List.of("MOD", "SEV").contains(report.intensity())).toList();
        List<Scenario.Report> no = Scenario.REPORTS.stream().filter(report -> report.intensity().equals("NIL")).toList();
        assertThat(yes).hasSize(26);
        assertThat(no).hasSize(23);
        assertThat(yes.stream().filter(Scenario::inside)).hasSize(18);
        assertThat(no.stream().filter(report -> !Scenario.inside(report))).hasSize(15);
    }
}
