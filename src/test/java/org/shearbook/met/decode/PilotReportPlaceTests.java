package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.shearbook.met.decode.DecodedAirReport.Place;
import org.shearbook.met.decode.FixLookup.Fix;

/**
 * Places against invented fixes. One nautical mile is a minute of latitude to 0.1 %; expected values along meridians
 * are exact on the sphere: 60 NM = 111 120 m = 0.99933°.
 */
class PilotReportPlaceTests {

    private static final double DEGREES_PER_60_MILES = Math.toDegrees(60 * 1852.0 / 6_371_000.0);

    private static final Map<String, List<Fix>> FIXES = Map.of(
            "KLMA", List.of(new Fix("KLMA", "AERODROME", 40.0, -100.0, Double.NaN)),
            "LMA", List.of(new Fix("LMA", "VOR", 40.1, -100.0, 10.0), new Fix("LMA", "NDB", -30.0, 150.0, 12.0), new Fix("LMA", "VOR-DME", 50.0, 10.0, 2.0)),
            "LMB", List.of(new Fix("LMB", "VORTAC", 41.1, -100.0, 10.0)),
            "LMC", List.of(new Fix("LMC", "VOR", 55.0, 20.0, 3.0), new Fix("LMC", "VOR", -35.0, 140.0, 9.0)),
            "P10", List.of(new Fix("P10", "AERODROME", 40.5, -100.0, Double.NaN)),
            "CYQX", List.of(new Fix("CYQX", "AERODROME", 48.9, -54.6, Double.NaN)),
            "YQX", List.of(new Fix("YQX", "VOR", 48.9, -54.5, -20.0), new Fix("YQX", "VOR", 10.0, 100.0, 0.0)),
            "WAYPT", List.of(new Fix("WAYPT", "WAYPOINT", 39.0, -100.0, Double.NaN)));

    private final PilotReportDecoder decoder = new PilotReportDecoder();

    private DecodedAirReport report(String leading, String place) {
        String text = leading + " UA /OV " + place + " /TM 1142 /FL290 /TP A320 /TB MOD";
        Decoding decoding = decoder.decode(text.strip().getBytes(StandardCharsets.UTF_8),
                new DecodingContext(Instant.parse("2031-03-12T12:00:00Z"), name -> FIXES.getOrDefault(name, List.of())));
        assertThat(decoding.rejected()).isEmpty();
        return (DecodedAirReport) decoding.messages().get(0);
    }

    private Place place(String leading, String place) {
        return report(leading, place).place();
    }

    private static List<String> codes(DecodedAirReport report) {
        return report.remarks().stream().map(Remark::code).toList();
    }

    @ParameterizedTest
    @CsvSource({
        "3810N07009W, 38.166667, -70.15", "2802N 08219W, 28.033333, -82.316667", "62N040W, 62, -40", "47N051W, 47, -51",
        "3656N07415W, 36.933333, -74.25", "3900N 4500W, 39, -45", "2500S07000E, -25, 70", "44N 050W, 44, -50", "4135N 16500E, 41.583333, 165",
        "38O5N07009W, 38.083333, -70.15", "N4712W03000, 47.2, -30", "47.25N 30.5W, 47.25, -30.5", "0000N00000W, 0, 0"})
    void coordinatesAreReadInAllTheirForms(String written, double latitude, double longitude) {
        Place place = place("XVKE", written);
        assertThat(place.latitude()).isCloseTo(latitude, within(1e-6));
        assertThat(place.longitude()).isCloseTo(longitude, within(1e-6));
        assertThat(place.resolvedBy()).isEqualTo("coordinates");
        assertThat(place.text()).isEqualTo(written);
    }

    @ParameterizedTest
    @ValueSource(strings = {"9110N07009W", "3870N07009W", "3810N19009W", "381N07009W"})
    void coordinatesThatDoNotExistAreNotResolved(String written) {
        DecodedAirReport report = report("XVKE", written);
        assertThat(report.place().isResolved()).isFalse();
        assertThat(codes(report)).contains("COORDINATES_IMPOSSIBLE");
    }

    @Test
    void wholeDegreesSayHowCoarseTheyAre() {
        assertThat(codes(report("XVKE", "62N040W"))).contains("PLACE_IN_WHOLE_DEGREES");
    }

    @Test
    void anIdentifierMeansThePlaceNearestToTheLeadingStationAndKeepsTheOthers() {
        Place place = place("LMA", "LMA");
        assertThat(place.latitude()).isCloseTo(40.1, within(1e-9));
        assertThat(place.resolvedBy()).isEqualTo("fix");
        assertThat(place.candidates()).hasSize(4);
        assertThat(place("LMA", "KLMA").latitude()).isCloseTo(40.0, within(1e-9));
        assertThat(place("LMA", "WAYPT").latitude()).isCloseTo(39.0, within(1e-9));
    }

    @ParameterizedTest
    @ValueSource(strings = {"LMA350060", "LMA35060", "KLMA350060", "LMA 350060", "LMA 350/60", "LMA350@60", "LMA 350 @ 060", "LMA.350060"})
    void aRadialIsMagnetic(String written) {
        // radial 350 with a variation of 10° east is true north
        Place place = place("LMA", written);
        assertThat(place.latitude()).isCloseTo(40.1 + DEGREES_PER_60_MILES, within(1e-6));
        assertThat(place.longitude()).isCloseTo(-100.0, within(1e-6));
        assertThat(place.resolvedBy()).isEqualTo("fix-radial-distance (magnetic)");
    }

    @Test
    void anIdentifierThatEndsInDigitsIsNotTakenForARadial() {
        Place place = place("LMA", "P10350060");
        assertThat(place.latitude()).isCloseTo(40.5 + DEGREES_PER_60_MILES, within(1e-6));
    }

    @Test
    void aFixWithoutVariationBorrowsThatOfTheLeadingStation() {
        DecodedAirReport report = report("LMA", "P10350060");
        assertThat(codes(report)).contains("VARIATION_OF_STATION");
        DecodedAirReport alone = report("", "WAYPT360060");
        assertThat(codes(alone)).contains("VARIATION_UNKNOWN");
        assertThat(alone.place().latitude()).isCloseTo(39.0 + DEGREES_PER_60_MILES, within(1e-6));
    }

    @Test
    void aRadialAbove360IsLeftToAPerson() {
        DecodedAirReport report = report("LMA", "LMA361060");
        assertThat(report.place().isResolved()).isFalse();
        assertThat(report.place().candidates()).extracting(Fix::identifier).containsExactly("LMA");
        assertThat(codes(report)).contains("RADIAL_OVER_360");
    }

    @Test
    void aBareRadialCountsFromTheLeadingStation() {
        Place place = place("LMA", "350060");
        assertThat(place.latitude()).isCloseTo(40.0 + DEGREES_PER_60_MILES, within(1e-6));
        assertThat(place.resolvedBy()).startsWith("radial and distance from the leading station");
    }

    @ParameterizedTest
    @ValueSource(strings = {"LMA-LMB", "LMA - LMB", "LMA-LMB350000", "KLMA-LMB", "LMA LMB"})
    void aSegmentStandsAtItsMiddle(String written) {
        DecodedAirReport report = report("LMA", written);
        assertThat(report.place().latitude()).isCloseTo(40.6, within(1e-6));
        assertThat(report.place().resolvedBy()).isEqualTo("midpoint assumed");
        assertThat(report.place().candidates()).hasSize(2);
        assertThat(codes(report)).contains("MIDPOINT_ASSUMED");
    }

    @Test
    void aChainStandsHalfWayAlongItsLength() {
        // 39.0 to 40.1 to 41.1: half of 2.1° from the south end
        assertThat(place("LMA", "WAYPT-LMA-LMB").latitude()).isCloseTo(40.05, within(1e-6));
    }

    @Test
    void aSegmentWithAnUnknownEndIsNotHalved() {
        DecodedAirReport report = report("LMA", "LMA-QQQ");
        assertThat(report.place().isResolved()).isFalse();
        assertThat(codes(report)).contains("PLACE_UNKNOWN");
    }

    @ParameterizedTest
    @ValueSource(strings = {"60 N LMB", "60N LMB", "60NM N OF LMB", "60 MILES NORTH LMB", "60N-LMB", "LMB 60N", "LMB 60 NORTH", "60NLMB", "60 N LMB VOR"})
    void aDistanceAndADirectionCountFromTheFix(String written) {
        Place place = place("LMA", written);
        assertThat(place.latitude()).isCloseTo(41.1 + DEGREES_PER_60_MILES, within(1e-6));
        assertThat(place.resolvedBy()).isEqualTo("distance and direction");
    }

    @ParameterizedTest
    @CsvSource({"60 E, 90", "60SW, 225", "60 NORTH EAST, 45", "60 MILES SOUTH EAST, 135", "60 WNW, 292.5", "60 NORTHWEST, 315"})
    void withoutAFixTheyCountFromTheLeadingStation(String written, double direction) {
        Place place = place("LMA", written);
        double bearing = org.shearbook.met.profile.GreatCircle.bearing(40.0, -100.0, place.latitude(), place.longitude());
        assertThat(bearing).isCloseTo(direction, within(1e-6));
        assertThat(org.shearbook.met.profile.GreatCircle.distance(40.0, -100.0, place.latitude(), place.longitude())).isCloseTo(111_120.0, within(0.01));
    }

    @ParameterizedTest
    @ValueSource(strings = {"FINAL RWY 31", "RWY 8R", "4 MILE FINAL", "RY22L FINAL", "KLMA RWY 25", "1/2 MILE FINAL RWY 4", "ILS 36"})
    void aRunwayStandsForTheLeadingStation(String written) {
        DecodedAirReport report = report("LMA", written);
        assertThat(report.place().latitude()).isCloseTo(40.0, within(1e-9));
        assertThat(report.place().resolvedBy()).isEqualTo("leading station");
        assertThat(codes(report)).contains("PLACE_IS_RUNWAY");
    }

    @Test
    void aNameNobodyKnowsStandsAtTheLeadingStationAndSaysSo() {
        DecodedAirReport report = report("LMA", "QQQQQ");
        assertThat(report.place().resolvedBy()).isEqualTo("leading station");
        assertThat(codes(report)).contains("PLACE_UNKNOWN");
        DecodedAirReport nowhere = report("QQQ", "QQQQQ");
        assertThat(nowhere.place().isResolved()).isFalse();
    }

    @Test
    void aFixOnAnotherContinentIsNotResolvedAndBothPlacesAreKept() {
        DecodedAirReport report = report("LMA", "LMC090020");
        assertThat(report.place().isResolved()).isFalse();
        assertThat(codes(report)).contains("PLACE_FAR_FROM_STATION");
        assertThat(report.place().candidates()).extracting(Fix::identifier).containsExactlyInAnyOrder("LMC", "LMC", "KLMA");
    }

    @Test
    void aDistanceNobodyFliesARadialToIsNotResolved() {
        DecodedAirReport report = report("LMA", "LMA090948");
        assertThat(report.place().isResolved()).isFalse();
        assertThat(codes(report)).contains("PLACE_FAR_FROM_STATION");
    }

    @Test
    void aNameOnSeveralContinentsWithoutALeadingStationIsLeftToAPerson() {
        DecodedAirReport report = report("", "LMC");
        assertThat(report.place().isResolved()).isFalse();
        assertThat(report.place().candidates()).hasSize(2);
        assertThat(codes(report)).contains("IDENTIFIER_AMBIGUOUS");
    }

    @Test
    void aCanadianNameWithoutALeadingStationIsFoundByItsLongForm() {
        assertThat(place("", "YQX 020000").longitude()).isCloseTo(-54.5, within(1e-9));
        assertThat(place("", "CYQX 020060").latitude()).isCloseTo(48.9 + DEGREES_PER_60_MILES, within(1e-6));
    }
}
