package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.Comparator;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.shearbook.met.decode.ReportedLevel.Significance;

class AscentMergeTests {

    private final DecodingContext context = new DecodingContext(Instant.parse("2031-03-06T13:00:00Z"), FixLookup.NONE);

    @Test
    void partsAreUnitedByPressureFromTheGroundUpwards() {
        DecodedSounding ascent = AscentMerge.merge(decode(TempSamples.PART_B + TempSamples.PART_A));
        assertThat(ascent.parts()).containsExactlyInAnyOrder("TTAA", "TTBB");
        assertThat(ascent.levels()).isSortedAccordingTo(Comparator.comparingDouble(ReportedLevel::pressure).reversed());
        assertThat(ascent.levels()).extracting(ReportedLevel::pressure).doesNotHaveDuplicates();
        assertThat(ascent.levels()).as("14 of part A; 1004, 870 and 900 hPa are part B's own").hasSize(14 + 3);
    }

    @Test
    void whatTwoPartsSayOfOneLevelIsJoined() {
        ReportedLevel level = at(AscentMerge.merge(decode(TempSamples.PART_A + TempSamples.PART_B)), 250);
        assertThat(level.height()).isEqualTo(10_730);
        assertThat(level.temperature() - 273.15).isCloseTo(-46.7, within(1e-9));
        assertThat(level.windFromDirection()).isEqualTo(275);
        assertThat(level.significance()).containsExactlyInAnyOrder(Significance.STANDARD, Significance.SIGNIFICANT_TEMPERATURE, Significance.SIGNIFICANT_WIND);
    }

    @Test
    void theSurfaceOfBothPartsIsOneLevel() {
        DecodedSounding ascent = AscentMerge.merge(decode(TempSamples.PART_A + TempSamples.PART_B));
        assertThat(ascent.levels()).filteredOn(l -> l.significance().contains(Significance.SURFACE)).hasSize(1);
    }

    @Test
    void missingPartsAreNamedAndAnAscentWithoutPartBIsCalledPoor() {
        DecodedSounding onlyA = AscentMerge.merge(decode(TempSamples.PART_A));
        assertThat(onlyA.remarks()).anyMatch(r -> r.code().equals("PARTS_MISSING") && r.text().contains("TTBB") && r.text().contains("only standard levels"));
        DecodedSounding all = AscentMerge.merge(decode(TempSamples.PART_A + TempSamples.PART_B + TempSamples.PART_C + TempSamples.PART_D));
        assertThat(all.remarks()).extracting(Remark::code).doesNotContain("PARTS_MISSING");
        assertThat(AscentMerge.missingParts(Set.of("XXAA"))).containsExactly("XXBB");
        assertThat(AscentMerge.missingParts(Set.of("PPBB"))).isEmpty();
    }

    @Test
    void standardLevelsInsideAGapBecomeBoundsThemselves() {
        DecodedSounding ascent = AscentMerge.merge(decode(TempSamples.PART_A + TempSamples.PART_B));
        assertThat(at(ascent, 850).significance()).as("the gap lies between 870 and 700 hPa").contains(Significance.TEMPERATURE_MISSING_BOUNDARY);
        assertThat(at(ascent, 925).significance()).doesNotContain(Significance.TEMPERATURE_MISSING_BOUNDARY);
    }

    @Test
    void aCorrectionReplacesItsPartInWhateverOrderTheyCome() {
        String corrected = "CCA " + TempSamples.PART_A.replace("50565 17358", "50565 17958");
        for (String order : List.of(TempSamples.PART_A + corrected, corrected + TempSamples.PART_A)) {
            DecodedSounding ascent = AscentMerge.merge(decode(order));
            assertThat(at(ascent, 500).temperature() - 273.15).isCloseTo(-17.9, within(1e-9));
            assertThat(ascent.correction()).isEqualTo("CCA");
            assertThat(ascent.remarks()).extracting(Remark::code).contains("PART_REPLACED");
        }
    }

    @Test
    void ofTwoPartsWithoutMarkTheLongerCounts() {
        String shorter = "TTAA 56121 00101 99013 08642 30503 00126 08042 31005=\n";
        assertThat(AscentMerge.merge(decode(TempSamples.PART_A + shorter)).levels()).hasSize(14);
        assertThat(AscentMerge.merge(decode(shorter + TempSamples.PART_A)).levels()).hasSize(14);
    }

    @Test
    void contradictionsAreRemarkedAndTheLowerPartCounts() {
        DecodedSounding ascent = AscentMerge.merge(decode(TempSamples.PART_A + TempSamples.PART_B.replace("66400 28559", "66400 26559")));
        assertThat(at(ascent, 400).temperature() - 273.15).isCloseTo(-28.5, within(1e-9));
        assertThat(ascent.remarks()).extracting(Remark::code).contains("PARTS_DIFFER");
    }

    @Test
    void windsByHeightGetTheirPressureFromTheStandardLevels() {
        String windless = TempSamples.PART_B.substring(0, TempSamples.PART_B.indexOf("21212")) + "=\n";
        DecodedSounding ascent = AscentMerge.merge(decode((TempSamples.PART_A + windless).replace("00101", "72101") + TempSamples.HEIGHT_WINDS));
        ReportedLevel wind = ascent.levels().stream().filter(l -> Math.abs(l.height() - 6 * 304.8) < 1e-6).findFirst().orElseThrow();
        double part = (6 * 304.8 - 1531) / (3098 - 1531);
        assertThat(wind.pressure() / 100).as("ln p linear between 850 hPa at 1531 m and 700 hPa at 3098 m: exact").isCloseTo(850 * Math.pow(700.0 / 850, part), within(1e-6));
        assertThat(ascent.remarks()).extracting(Remark::code).contains("PRESSURE_INTERPOLATED");
    }

    @Test
    void windsByHeightAreNotNeededWhereThoseByPressureAre() {
        DecodedSounding ascent = AscentMerge.merge(decode((TempSamples.PART_A + TempSamples.PART_B).replace("00101", "72101") + TempSamples.HEIGHT_WINDS));
        assertThat(ascent.levels()).hasSize(17);
    }

    @Test
    void partsOfOneAscentLieWithinThreeHoursOfEachOther() {
        List<DecodedSounding> parts = decode(TempSamples.PART_A + TempSamples.PART_B
                + TempSamples.PART_A.replace("56121", "56061") .replace("81130", "80530")
                + TempSamples.PART_B.replace("00101", "00102"));
        List<List<DecodedSounding>> ascents = AscentMerge.ascents(parts);
        assertThat(ascents).hasSize(3);
        assertThat(ascents.get(0)).hasSize(2);
    }

    @Test
    void foreignPartsAreRefused() {
        List<DecodedSounding> parts = decode(TempSamples.PART_A + TempSamples.PART_B.replace("00101", "00102"));
        assertThatThrownBy(() -> AscentMerge.merge(parts)).isInstanceOf(IllegalArgumentException.class).hasMessageContaining("sounding 1").hasMessageContaining("00102");
        assertThatThrownBy(() -> AscentMerge.merge(List.of())).isInstanceOf(IllegalArgumentException.class);
    }

    private static ReportedLevel at(DecodedSounding ascent, int hectopascals) {
        return ascent.levels().stream().filter(l -> l.pressure() == 100.0 * hectopascals).findFirst().orElseThrow();
    }

    private List<DecodedSounding> decode(String text) {
        Decoding decoding = new TempDecoder().decode(text.getBytes(StandardCharsets.US_ASCII), context);
        assertThat(decoding.rejected()).isEmpty();
        return decoding.messages().stream().map(m -> (DecodedSounding) m).toList();
    }
}
