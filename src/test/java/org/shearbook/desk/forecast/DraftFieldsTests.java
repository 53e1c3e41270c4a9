package org.shearbook.desk.forecast;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** From what was typed to what a forecast says, and back. */
class DraftFieldsTests {

    private static final Instant NOW = Instant.parse("2031-03-12T22:40:00Z");
    private static final Function<String, Optional<DraftFields.Place>> NO_PLACES = name -> Optional.empty();

    @Test
    void aCompleteContentReadsBackAsItWas() {
        ForecastContent box = ForecastSamples.withEvidence(ForecastSamples.severe(NOW.plusSeconds(1200), "supervisor-s", null),
                List.of(new Evidence(Evidence.Kind.LAYER, 41, "XVKE 1200Z layer A, Ri 0.17 at FL291"), new Evidence(Evidence.Kind.AIR_REPORT, 25, "1142Z SEV")));
        ForecastContent round = ForecastSamples.withArea(box, new Area.Radius("Kelbrith", 47.2, -30, 60));
        ForecastContent bare = ForecastSamples.withArea(box, new Area.Radius("", -47.2, 179.75, 60));
        for (ForecastContent content : List.of(box, round, bare)) {
            assertThat(DraftFields.read(DraftFields.of(content), NOW, NO_PLACES).content()).isEqualTo(content);
        }
    }

    @ParameterizedTest
    @CsvSource({
        "2250Z,2031-03-12T22:50:00Z", "2250,2031-03-12T22:50:00Z", "22:50 z,2031-03-12T22:50:00Z", "0030Z,2031-03-13T00:30:00Z",
        "1100Z,2031-03-12T11:00:00Z", "1030Z,2031-03-13T10:30:00Z", "2031-03-12T11:50Z,2031-03-12T11:50:00Z", "2031-03-12T09:50-02:00,2031-03-12T11:50:00Z"})
    void aTimeOfDayMeansTheNearestSuchMoment(String typed, String expected) {
        assertThat(DraftFields.readMoment(typed, NOW)).contains(Instant.parse(expected));
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "2460Z", "tonight", "12", "2031-02-30T10:00Z", "11:50 local"})
    void whatIsNoTimeIsNotGuessed(String typed) {
        assertThat(DraftFields.readMoment(typed, NOW)).isEmpty();
    }

    @Test
    void aKeptTimeOfDayCarriesItsDate() {
        assertThat(DraftFields.kept(Map.of("validFrom", "0030Z", "validUntil", "later"), NOW))
                .containsEntry("validFrom", "2031-03-13T00:30Z").containsEntry("validUntil", "later");
    }

    @Test
    void unknownFieldsAreNotKept() {
        assertThat(DraftFields.kept(Map.of("baseFlightLevel", "270", "_csrf", "secret", "version", "3"), NOW)).containsOnlyKeys("baseFlightLevel");
    }

    @Test
    void tenThousandCharactersAreRefusedByField() {
        assertThatThrownBy(() -> DraftFields.kept(Map.of("wouldChange", "x".repeat(10_000)), NOW)).isInstanceOfSatisfying(ForecastRefused.class,
                refused -> assertThat(refused.refusals()).extracting(Refusal::field, Refusal::code)
                        .containsExactly(org.assertj.core.groups.Tuple.tuple("wouldChange", "TOO_LONG")));
    }

    @Test
    void anEmptyDraftNamesEveryFieldThatIsMissing() {
        assertThat(DraftFields.read(Map.of(), NOW, NO_PLACES).refusals()).extracting(Refusal::field).containsExactlyInAnyOrder(
                "intensity", "conditions", "area", "baseFlightLevel", "topFlightLevel", "validFrom", "validUntil", "probabilityPercent",
                "movingToward", "change", "wouldChange");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "area|'<img>'|AREA_MISSING", "centre|nowhere|CENTRE_NOT_KNOWN", "centre|S9100 W03000|CENTRE_NOT_KNOWN", "radiusNm|sixty|NUMBER_NOT_READ",
        "baseFlightLevel|2700 m|LEVEL_NOT_READ", "convective|on|CONVECTIVE_CAUSE", "wouldChange|VALID 120900/121300|LOOKS_OFFICIAL",
        "wouldChange|end of it =|LOOKS_OFFICIAL", "evidence|LAYER x|EVIDENCE_NOT_READ", "movingToward|left|MOVEMENT_MISSING", "reportedAt|soon|TIME_NOT_READ"})
    void whatCannotBeReadIsRefusedByNameAndCode(String field, String typed, String code) {
        Map<String, String> fields = roundFields();
        fields.put(field, typed);
        assertThat(DraftFields.read(fields, NOW, NO_PLACES).refusals()).extracting(Refusal::field, Refusal::code)
                .containsExactly(org.assertj.core.groups.Tuple.tuple(field, code));
    }

    @Test
    void emojiAndRightToLeftWordsAreTakenAndInvisibleControlsAreNot() {
        Map<String, String> fields = roundFields();
        fields.put("wouldChange", "بحر هادئ 🌊 smooth by 1800Z");
        assertThat(DraftFields.read(fields, NOW, NO_PLACES).refusals()).isEmpty();
        fields.put("wouldChange", "smooth \u202E by 1800Z");
        assertThat(DraftFields.read(fields, NOW, NO_PLACES).refusals()).extracting(Refusal::code).containsExactly("LINE_BROKEN");
        fields.put("wouldChange", "one\nADVISORY two");
        assertThat(DraftFields.read(fields, NOW, NO_PLACES).refusals()).extracting(Refusal::code).containsExactly("LINE_BROKEN");
    }

    @Test
    void aStationIsFoundByWhatWasTyped() {
        Map<String, String> fields = roundFields();
        fields.put("centre", "XVKE");
        ForecastContent content = DraftFields.read(fields, NOW, name -> Optional.of(new DraftFields.Place("Kelbrith", 47.2001, -30.0001))).content();
        // positions of a forecast are whole minutes
        assertThat(content.area()).isEqualTo(new Area.Radius("Kelbrith", 47.2, -30, 60));
    }

    @ParameterizedTest
    @ValueSource(strings = {"N4712 W03000", "N4712W03000", "4712N 03000W", "4712N03000W", "N47°12' W030°00'", "n4712/w03000"})
    void aPositionIsReadInEveryUsualForm(String typed) {
        Map<String, String> fields = roundFields();
        fields.put("centre", typed);
        assertThat(DraftFields.read(fields, NOW, NO_PLACES).content().area()).isEqualTo(new Area.Radius("", 47.2, -30, 60));
    }

    private static Map<String, String> roundFields() {
        return new LinkedHashMap<>(DraftFields.of(ForecastSamples.withArea(ForecastSamples.moderate(NOW), new Area.Radius("", 47.2, -30, 60))));
    }
}
