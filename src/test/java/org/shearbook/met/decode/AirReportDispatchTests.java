package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Every kind of air-report finds its decoder among all. */
class AirReportDispatchTests {

    private final MessageDecoders decoders = MessageDecoders.all();

    private Decoding decode(String text) {
        return decoders.decode(text.getBytes(StandardCharsets.UTF_8), new DecodingContext(Instant.parse("2031-03-12T12:00:00Z"), FixLookup.NONE));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '>', value = {
        "XVKE UA /OV 4712N03000W/TM 1142/FL290/TB MOD > pilot report",
        "UBXX01 XVEN 121200|PRCUS|XVKE UUA /OV 4712N03000W/TM 1142/FL290/TB MOD= > pilot report",
        "UA /OV 4712N03000W /TM 1142 /FL290 /TB MOD /RM TTAA ARP AMDAR > pilot report",
        "UAXX01 XVEN 121145|ARP TRNX101 4712N03000W 1142 F290 TB MOD= > AIREP",
        "ARS|B738 SEV TURB OBS AT 1143Z N4712W03000 FL290= > AIREP",
        "UDXX01 XVEN 121200|AMDAR 1211|LVR TRNX2 4712N 03015W 121143 F390 MS635 344/076 TB2= > AMDAR",
        "report_id,observed_at,latitude_deg,longitude_deg,edr_peak|Q1,2031-03-12T11:42:00Z,47.2,-30,0.31 > CSV air-reports",
        "report_id,observed_at,latitude_deg,longitude_deg,report_text|Q1,2031-03-12T11:42:00Z,47.2,-30,XVKE UA /OV X/TM 1142/FL290/TB MOD > CSV air-reports"})
    void eachKindIsReadByItsOwnDecoder(String text, String format) {
        for (String ending : new String[] {"\n", "\r\n", "\r\r\n"}) {
            Decoding decoding = decode(text.replace("|", ending) + ending);
            assertThat(decoding.format()).isEqualTo(format);
            assertThat(decoding.messages()).hasSize(1);
            assertThat(decoding.rejected()).isEmpty();
        }
    }

    @Test
    void whatNobodyKnowsIsKeptRaw() {
        Decoding decoding = decode("The weather is fine.");
        assertThat(decoding.rejected()).singleElement().satisfies(rejection -> assertThat(rejection.raw()).isEqualTo("The weather is fine."));
    }
}
