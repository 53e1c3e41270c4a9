package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;

/** Groups of our own making in each of the shapes the trade uses. Expected readings are by hand. */
class TurbulenceGroupTests {

    /** Layers as {@code frequency low-high type base..top}, joined by a bar; an open or missing bound is a star. */
    private static String read(String group, double flightLevel) {
        List<String> layers = new ArrayList<>();
        for (TurbulenceLayer layer : TurbulenceGroup.read(group, flightLevel).layers()) {
            StringBuilder text = new StringBuilder();
            text.append(layer.frequency() == null ? "" : layer.frequency() + " ");
            text.append(layer.intensity() == null ? "?" : layer.intensity() + (layer.intensity() == layer.intensityTo() ? "" : "-" + layer.intensityTo()));
            text.append(layer.type().isEmpty() ? "" : " " + layer.type());
            text.append(' ').append(bound(layer.baseFeet())).append("..").append(bound(layer.topFeet()));
            layers.add(text.toString());
        }
        return String.join(" | ", layers);
    }

    private static String bound(double feet) {
        return Double.isNaN(feet) ? "*" : String.valueOf(Math.round(feet));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '>', value = {
        "MOD > MOD *..*",
        "MDT > MOD *..*",
        "SVR > SEV *..*",
        "SMTH > NIL *..*",
        "NO TURBULENCE > NIL *..*",
        "EXTREME > EXTRM *..*",
        "LGT-MOD > LGT-MOD *..*",
        "MOD-LGT > LGT-MOD *..*",
        "LGT - MOD > LGT-MOD *..*",
        "LGT/MOD > LGT-MOD *..*",
        "LGT TO MOD CHOP > LGT-MOD CHOP *..*",
        "MOD SEV > MOD-SEV *..*",
        "SMOOTH TO LIGHT > NIL-LGT *..*",
        "CONS LGT OCNL MOD CHOP > CONT LGT *..* | OCNL MOD CHOP *..*",
        "LGT-OCNL MOD > LGT *..* | OCNL MOD *..*",
        "LGT CONS CHOP > CONT LGT CHOP *..*",
        "MOD CHOP OCNL > OCNL MOD CHOP *..*",
        "CHOP > ? CHOP *..*",
        "INTMT > INTMT ? *..*"})
    void intensityFrequencyAndTypeStandInAnyOrder(String group, String layers) {
        assertThat(read(group, 350.0)).isEqualTo(layers);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '>', value = {
        "MOD 270-310 > MOD 27000..31000",
        "MOD 310-270 > MOD 27000..31000",
        "MOD FL270 TO FL310 > MOD 27000..31000",
        "MOD BTN FL310-FL270 > MOD 27000..31000",
        "LGT BETWEEN 080 AND 120 > LGT 8000..12000",
        "LGT CHOP 115 > LGT CHOP 11500..11500",
        "MOD BLO 080 > MOD *..8000",
        "MOD 080 BLO > MOD *..8000",
        "MOD 080-BLO > MOD *..8000",
        "MOD 080/BLO > MOD *..8000",
        "MOD 080 AND BELOW > MOD *..8000",
        "MOD ABV 240 > MOD 24000..*",
        "MOD FL240 AND ABV > MOD 24000..*",
        "MOD SFC-090 > MOD 0..9000",
        "MOD FL090 TO SFC > MOD 0..9000",
        "MOD 70-80 > MOD 7000..8000",
        "MOD090-050 > MOD 5000..9000",
        "LGT BLO045 > LGT *..4500",
        "MOD 11O-O75 > MOD 7500..11000",
        "MOD BELOW 8000FT > MOD *..8000",
        "LGT BLW 400FT > LGT *..400",
        "LGT ABV FL300 BLO 350 > LGT 30000..35000",
        "LGT BLO 250 ABV 350 > LGT *..25000 | LGT 35000..*",
        "050-180 MOD TURB > MOD 5000..18000",
        "FL280-CONT LIGHT CHOP. FL300-SMOOTH > CONT LGT CHOP 28000..28000 | NIL 30000..30000"})
    void altitudesAreReadInAllTheirForms(String group, String layers) {
        assertThat(read(group, 350.0)).isEqualTo(layers);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '>', value = {
        "MOD CHOP 155-070/LGT CHOP BLO 070/LGT CHOP ABV 155 > MOD CHOP 7000..15500 | LGT CHOP *..7000 | LGT CHOP 15500..*",
        "CONS LGT OCNL MOD CHOP 310-400 > CONT LGT 31000..40000 | OCNL MOD CHOP 31000..40000",
        "CONS LGT/OCNL MOD BLO 090 > CONT LGT *..9000 | OCNL MOD *..9000",
        "LGT CHOP / OCNL LGT CHOP 330 > LGT CHOP *..* | OCNL LGT CHOP 33000..33000",
        "MOD CHOP/NEG 370 > MOD CHOP *..* | NIL 37000..37000",
        "MOD 320 NEG ABV > MOD 32000..32000 | NIL 32000..*",
        "MOD ABOVE 9000 LIGHT BELOW 9000 > MOD 9000..* | LGT *..9000",
        "240-210 CONS LGT OCNL MOD > CONT LGT 21000..24000 | OCNL MOD 21000..24000",
        "MOD CHOP SMOOTH BELOW > MOD CHOP *..* | NIL *..35000"})
    void severalLayersKeepTheirOwnAltitudes(String group, String layers) {
        assertThat(read(group, 350.0)).isEqualTo(layers);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '>', value = {
        "MTW +/-15KTS +/-200FT > ? MTW *..*",
        "MOD MTN WAVE +/-400FT > MOD MTW *..*",
        "LGT TURB/LGT MTN WAVE +-300FT > LGT *..* | LGT MTW *..*",
        "MOD TURB WITH MTW +/-20KTS > MOD *..* | ? MTW *..*",
        "MOD TURB RY27 > MOD *..*",
        "LGT ON FINAL RWY 31 > LGT *..*",
        "SMOOTH LOSS OF 10 KNOTS AT 500 FEET > NIL *..*",
        "MOD UPDRAFT 500FPM > MOD *..*",
        "LGT 10 MILES OUT 120-100 > LGT 10000..12000",
        "MOD FOR 5 MINUTES > MOD *..*",
        "MOD B737 > MOD *..*",
        "MOD /ZLC > MOD *..*",
        "MOD 767 RPTD > MOD *..*",
        "LLWS +/- 10 KTS > ? LLWS *..*",
        "LGT RIME > LGT *..*",
        "LGT BETTER RIDE AT 330 > LGT *..*"})
    void speedsRunwaysAndTypesAreNoAltitudes(String group, String layers) {
        assertThat(read(group, 350.0)).isEqualTo(layers);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '>', value = {
        "OCCL LGHT CHP > OCNL LGT CHOP *..*",
        "OCDNL MODT > OCNL MOD *..*",
        "ONCL LIT COP > OCNL LGT CHOP *..*",
        "CONTS GLT TURBULANCE > CONT LGT *..*",
        "MODERTE TURBULNCE > MOD *..*",
        "CONSMOD CHOP > CONT MOD CHOP *..*",
        "LGTCHOP > LGT CHOP *..*",
        "RIGHT TURN > ''",
        "FRZ RAIN > ''",
        "N/A > ''",
        "+50KT AT 002 > ''",
        "380-400 > ''"})
    void wordsMistypedAreReadAndOtherWordsAreNot(String group, String layers) {
        assertThat(read(group, 350.0)).isEqualTo(layers);
    }

    @Test
    void aBoundWithoutANumberNeedsALevelToCountFrom() {
        assertThat(read("SMOOTH ABV", Double.NaN)).isEqualTo("NIL *..*");
        assertThat(read("SMOOTH ABV", 120.0)).isEqualTo("NIL 12000..*");
    }

    @Test
    void anEndlessGroupIsReadToABoundAndSaysSo() {
        TurbulenceGroup group = TurbulenceGroup.read("MOD CHOP 310 ".repeat(100_000), 310.0);
        assertThat(group.isCutShort()).isTrue();
        assertThat(group.layers()).hasSizeLessThanOrEqualTo(20);
    }
}
