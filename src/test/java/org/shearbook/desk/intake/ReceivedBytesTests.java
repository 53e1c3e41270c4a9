package org.shearbook.desk.intake;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;

class ReceivedBytesTests {

    private static final String TEXT = "XVKE UA /OV 4712N03000W/TM 1142/FL290/TP B738/TB MOD 280-300\r\n";

    @Test
    void textOfTwoBytesACharacterIsReadWithAndWithoutItsMark() {
        for (Charset wide : List.of(StandardCharsets.UTF_16LE, StandardCharsets.UTF_16BE)) {
            assertThat(new String(ReceivedBytes.readable(TEXT.getBytes(wide)), StandardCharsets.UTF_8)).as(wide.name()).isEqualTo(TEXT);
            assertThat(new String(ReceivedBytes.readable(("\uFEFF" + TEXT).getBytes(wide)), StandardCharsets.UTF_8)).as(wide.name()).isEqualTo(TEXT);
        }
    }

    @Test
    void everythingElseStaysAsItIs() {
        for (byte[] bytes : List.of(TEXT.getBytes(StandardCharsets.UTF_8), "température".getBytes(StandardCharsets.ISO_8859_1), new byte[0], new byte[] {0, 0, 0, 0, 0, 0, 0, 0},
                new byte[] {(byte) 0xFF}, "BUFR\0\0".getBytes(StandardCharsets.ISO_8859_1))) {
            assertThat(ReceivedBytes.readable(bytes)).isSameAs(bytes);
        }
    }

    @Test
    void compressedFilesAreToldByTheirFirstBytesAlone() {
        assertThat(ReceivedBytes.compression(new byte[] {'P', 'K', 3, 4, 20})).isEqualTo("zip");
        assertThat(ReceivedBytes.compression(new byte[] {0x1F, (byte) 0x8B, 8})).isEqualTo("gzip");
        assertThat(ReceivedBytes.compression("BZh91AY".getBytes(StandardCharsets.ISO_8859_1))).isEqualTo("bzip2");
        assertThat(ReceivedBytes.compression("PKWARD UA /OV X".getBytes(StandardCharsets.ISO_8859_1))).isNull();
        assertThat(ReceivedBytes.compression(new byte[0])).isNull();
    }
}
