package org.shearbook.desk.intake;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/** SHA-256 as hexadecimal text. */
final class Digests {

    private Digests() {
    }

    static String of(byte[]... pieces) {
        MessageDigest digest = sha256();
        for (byte[] piece : pieces) {
            digest.update(piece);
        }
        return HexFormat.of().formatHex(digest.digest());
    }

    static String of(String text) {
        return of(text.getBytes(StandardCharsets.UTF_8));
    }

    private static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
    }
}
