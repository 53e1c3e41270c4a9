package org.shearbook.desk.airreport;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;
import org.shearbook.met.decode.EdrClasses;

/** The one word of a report. */
class WorstIntensityTests {

    private static final EdrClasses NOW = EdrClasses.ANNEX_3_PRESENT;

    @Test
    void theUpperWordOfARangeInTheWorstLayerCounts() {
        WorstIntensity worst = WorstIntensity.of(List.of(layer(Intensity.MOD, Intensity.SEV), layer(Intensity.LGT, Intensity.LGT)), Double.NaN, NOW);
        assertThat(worst).isEqualTo(new WorstIntensity(Intensity.SEV, "as reported"));
    }

    @Test
    void aWordOfTheCrewCountsBeforeTheTable() {
        assertThat(WorstIntensity.of(List.of(layer(Intensity.LGT, Intensity.LGT)), 0.5, NOW).word()).isEqualTo(Intensity.LGT);
    }

    @Test
    void withoutAWordThePeakSpeaksByTheTableOfItsDate() {
        // 0.50 is severe in the 20th edition of ICAO Annex 3 (second-hand) and was moderate before it (from memory).
        AirReportSettings settings = new AirReportSettings(Instant.parse("2020-11-05T00:00:00Z"));
        assertThat(WorstIntensity.of(List.of(), 0.5, settings.edrClassesAt(Instant.parse("2031-03-12T00:00:00Z"))).word()).isEqualTo(Intensity.SEV);
        assertThat(WorstIntensity.of(List.of(), 0.5, settings.edrClassesAt(Instant.parse("2019-03-12T00:00:00Z"))).word()).isEqualTo(Intensity.MOD);
        assertThat(WorstIntensity.of(List.of(), 0.5, NOW).basis()).isEqualTo("peak EDR by " + NOW.edition());
    }

    @Test
    void turbulenceThatWasNotReportedIsNotNil() {
        assertThat(WorstIntensity.of(List.of(), Double.NaN, NOW)).isEqualTo(new WorstIntensity(null, null));
        assertThat(WorstIntensity.of(List.of(layer(null, null)), Double.NaN, NOW).word()).isNull();
    }

    private static TurbulenceLayer layer(Intensity from, Intensity to) {
        return new TurbulenceLayer(from, to, null, "", Double.NaN, Double.NaN);
    }
}
