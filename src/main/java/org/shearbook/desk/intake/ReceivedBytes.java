package org.shearbook.desk.intake;

import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import org.jspecify.annotations.Nullable;

/** What can be told of bytes before any decoder sees them. Names and content types say nothing here. */
final class ReceivedBytes {

    private static final int LOOKED_AT = 4096;

    private ReceivedBytes() {
    }

    /** What a compressed file is called; null for anything else. */
    static @Nullable String compression(byte[] bytes) {
        if (begins(bytes, 'P', 'K', 3, 4) || begins(bytes, 'P', 'K', 5, 6)) {
            return "zip";
        }
        if (begins(bytes, 0x1F, 0x8B)) {
            return "gzip";
        }
        if (begins(bytes, 'B', 'Z', 'h') && bytes.length > 4 && bytes[3] >= '1' && bytes[3] <= '9' && bytes[4] == 0x31) {
            return "bzip2";
        }
        if (begins(bytes, 0xFD, '7', 'z', 'X', 'Z')) {
            return "xz";
        }
        return begins(bytes, '7', 'z', 0xBC, 0xAF) ? "7z" : null;
    }

    /** Text in two bytes a character becomes UTF-8, which every decoder reads; everything else stays as it is. */
    static byte[] readable(byte[] bytes) {
        Charset wide = wideCharset(bytes);
        if (wide == null) {
            return bytes;
        }
        String text = new String(bytes, wide);
        return (text.startsWith("\uFEFF") ? text.substring(1) : text).getBytes(StandardCharsets.UTF_8);
    }

    private static @Nullable Charset wideCharset(byte[] bytes) {
        if (begins(bytes, 0xFF, 0xFE)) {
            return StandardCharsets.UTF_16LE;
        }
        if (begins(bytes, 0xFE, 0xFF)) {
            return StandardCharsets.UTF_16BE;
        }
        int looked = Math.min(bytes.length, LOOKED_AT) & ~1;
        if (looked < 8 || bytes.length % 2 != 0) {
            return null;
        }
        int even = 0;
        int odd = 0;
        for (int i = 0; i < looked; i += 2) {
            even += bytes[i] == 0 ? 1 : 0;
            odd += bytes[i + 1] == 0 ? 1 : 0;
        }
        // Messages are plain Latin letters and figures: of each pair one byte is zero, and always the same one.
        if (odd * 2 > looked * 0.9 && even == 0) {
            return StandardCharsets.UTF_16LE;
        }
        return even * 2 > looked * 0.9 && odd == 0 ? StandardCharsets.UTF_16BE : null;
    }

    private static boolean begins(byte[] bytes, int... with) {
        if (bytes.length < with.length) {
            return false;
        }
        for (int i = 0; i < with.length; i++) {
            if ((bytes[i] & 0xFF) != with[i]) {
                return false;
            }
        }
        return true;
    }
}
