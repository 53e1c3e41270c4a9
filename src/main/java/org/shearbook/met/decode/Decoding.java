package org.shearbook.met.decode;

import java.util.List;

/**
 * All that one input held, in its order.
 *
 * @param format   the decoder's {@link MessageDecoder#format()}, or {@code UNKNOWN}
 * @param messages what could be read
 * @param rejected what could not, raw text included
 */
public record Decoding(String format, List<DecodedMessage> messages, List<Rejection> rejected) {

    public Decoding {
        messages = List.copyOf(messages);
        rejected = List.copyOf(rejected);
    }
}
