package org.shearbook.met.decode;

/**
 * One kind of message. A new format is one new implementation of this interface and one line in
 * {@link MessageDecoders}.
 */
public interface MessageDecoder {

    /** The name of the format as the desk shows it, for example {@code TEMP}. */
    String format();

    /**
     * Whether these bytes look like this decoder's format. Cheap, without side effects, and never throws.
     *
     * @param bytes the message as received; may be anything, empty and binary noise included
     */
    boolean recognises(byte[] bytes);

    /**
     * Reads what can be read. Never throws for bad content and never drops any: each message of the input is
     * in the result either as a {@link DecodedMessage}, with remarks on what was lost, or as a {@link Rejection}.
     *
     * @param bytes   the message or messages as received
     * @param context what can't be known from the bytes: when they arrived, where fixes lie
     */
    Decoding decode(byte[] bytes, DecodingContext context);
}
