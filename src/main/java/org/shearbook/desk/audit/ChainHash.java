package org.shearbook.desk.audit;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import org.jspecify.annotations.Nullable;

/**
 * SHA-256 over the previous hash and the canonical content of an entry. Each field enters with its name and its
 * length, so that no two different entries share one content.
 */
final class ChainHash {

    static final String START = "0".repeat(64);

    private final MessageDigest digest;

    ChainHash(String previousHash) {
        try {
            digest = MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
        digest.update(previousHash.getBytes(StandardCharsets.US_ASCII));
    }

    ChainHash field(String name, @Nullable Object content) {
        byte[] bytes = content == null ? new byte[0] : content.toString().getBytes(StandardCharsets.UTF_8);
        String head = "\n" + name + ":" + (content == null ? "-" : bytes.length) + ":";
        digest.update(head.getBytes(StandardCharsets.US_ASCII));
        digest.update(bytes);
        return this;
    }

    String hex() {
        return HexFormat.of().formatHex(digest.digest());
    }
}
