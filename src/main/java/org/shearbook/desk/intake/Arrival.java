package org.shearbook.desk.intake;

/**
 * One file, paste or request body.
 *
 * @param name  file name, or how it came: {@code pasted}
 * @param bytes as received
 */
public record Arrival(String name, byte[] bytes) {

    /** More than this is refused [bytes]. */
    public static final int MOST_BYTES = 64 * 1024 * 1024;
}
