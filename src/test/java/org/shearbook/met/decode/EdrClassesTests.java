package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.ReportClass;

class EdrClassesTests {

    /** Published: Annex 3, Appendix 4, as quoted in an ICAO meeting paper of 2025. */
    @ParameterizedTest
    @CsvSource({"0.00, NIL", "0.10, NIL", "0.11, LGT", "0.19, LGT", "0.20, MOD", "0.44, MOD", "0.45, SEV", "1.20, SEV"})
    void thePresentTableHasItsBoundariesOnTheRightSide(double peak, Intensity word) {
        assertThat(EdrClasses.ANNEX_3_PRESENT.intensity(peak)).isEqualTo(word);
    }

    @Test
    void halfIsModerateInTheFormerTableAndSevereInThePresent() {
        assertThat(EdrClasses.ANNEX_3_FORMER.intensity(0.50)).isEqualTo(Intensity.MOD);
        assertThat(EdrClasses.ANNEX_3_PRESENT.intensity(0.50)).isEqualTo(Intensity.SEV);
        assertThat(EdrClasses.known()).extracting(EdrClasses::edition).doesNotHaveDuplicates();
    }

    @Test
    void aTableWhoseBoundariesDoNotRiseIsRefused() {
        assertThatIllegalArgumentException().isThrownBy(() -> new EdrClasses("mine", 0.2, 0.2, 0.45)).withMessageContaining("moderateFrom");
        assertThatIllegalArgumentException().isThrownBy(() -> new EdrClasses(" ", 0.1, 0.2, 0.45)).withMessageContaining("edition");
        assertThatIllegalArgumentException().isThrownBy(() -> EdrClasses.ANNEX_3_PRESENT.intensity(Double.NaN));
    }

    @Test
    void onlyAutomaticAndRecordedReportsKnowTheirNulls() {
        assertThat(ReportClass.VOL.nullPolicy()).isEqualTo(NullPolicy.EXPLICIT);
        assertThat(ReportClass.SPC.nullPolicy()).isEqualTo(NullPolicy.NONE);
        assertThat(ReportClass.TRG.nullPolicy()).isEqualTo(NullPolicy.NONE);
        assertThat(ReportClass.EDR.nullPolicy()).isEqualTo(NullPolicy.SYSTEMATIC);
        assertThat(ReportClass.QAR.nullPolicy()).isEqualTo(NullPolicy.SYSTEMATIC);
    }
}
