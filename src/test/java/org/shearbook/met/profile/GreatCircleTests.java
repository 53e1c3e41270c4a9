package org.shearbook.met.profile;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;

class GreatCircleTests {

    @Test
    void aQuarterOfTheCircumferenceLeadsFromTheEquatorToThePole() {
        // exact
        double quarter = Math.PI / 2.0 * GreatCircle.EARTH_RADIUS;
        assertThat(GreatCircle.destination(0.0, 25.0, 0.0, quarter).latitude()).isCloseTo(90.0, within(1e-9));
        GreatCircle.Point east = GreatCircle.destination(0.0, 25.0, 90.0, quarter);
        assertThat(east.latitude()).isCloseTo(0.0, within(1e-9));
        assertThat(east.longitude()).isCloseTo(115.0, within(1e-9));
    }

    @Test
    void aDegreeOfLatitudeIs111195Metres() {
        // exact: π/180 · 6 371 000 m
        assertThat(GreatCircle.distance(10.0, 20.0, 11.0, 20.0)).isCloseTo(111_194.927, within(0.001));
    }

    @Test
    void theDateLineIsCrossed() {
        GreatCircle.Point point = GreatCircle.destination(0.0, 179.5, 90.0, Math.toRadians(1.0) * GreatCircle.EARTH_RADIUS);
        assertThat(point.longitude()).isCloseTo(-179.5, within(1e-9));
    }

    @Test
    void distanceAndBearingOfADestinationAreThoseItWasMadeWith() {
        long seed = 20_310_312L;
        System.out.println("seed " + seed);
        Random random = new Random(seed);
        for (int round = 0; round < 2_000; round++) {
            double latitude = 170.0 * random.nextDouble() - 85.0;
            double longitude = 360.0 * random.nextDouble() - 180.0;
            double bearing = 360.0 * random.nextDouble();
            double distance = 1.0 + 2_000_000.0 * random.nextDouble();
            GreatCircle.Point end = GreatCircle.destination(latitude, longitude, bearing, distance);
            assertThat(GreatCircle.distance(latitude, longitude, end.latitude(), end.longitude())).isCloseTo(distance, within(0.01));
            double turned = Math.abs(GreatCircle.bearing(latitude, longitude, end.latitude(), end.longitude()) - bearing);
            assertThat(Math.min(turned, 360.0 - turned) * Math.toRadians(1.0) * distance).isLessThan(1.0);
            assertThat(end.longitude()).isBetween(-180.0, 180.0);
        }
    }
}
