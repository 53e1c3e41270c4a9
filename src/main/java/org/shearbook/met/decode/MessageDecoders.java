package org.shearbook.met.decode;

import java.util.List;

/** All decoders in the order in which they are asked. The first that recognises the bytes reads them. */
public final class MessageDecoders {

    private final List<MessageDecoder> decoders;

    /** The formats this desk reads. */
    public static MessageDecoders all() {
        return new MessageDecoders(List.of(
                new IgraDerivedDecoder(),
                new IgraDecoder(),
                new TempDecoder(),
                new CsvSoundingDecoder(),
                new CsvAirReportDecoder(),
                new AmdarDecoder(),
                new AirepDecoder(),
                new PilotReportDecoder()));
    }

    MessageDecoders(List<MessageDecoder> decoders) {
        this.decoders = List.copyOf(decoders);
    }

    /**
     * Finds the decoder for these bytes and lets it read them. Bytes nobody recognises come back as one
     * {@link Rejection} that holds them raw.
     */
    public Decoding decode(byte[] bytes, DecodingContext context) {
        for (MessageDecoder decoder : decoders) {
            if (decoder.recognises(bytes)) {
                return decoder.decode(bytes, context);
            }
        }
        String raw = new String(bytes, java.nio.charset.StandardCharsets.ISO_8859_1);
        String text = bytes.length == 0
                ? "The input is empty. Send the message itself."
                : "No format this desk reads was recognised. See the list of formats on the Intake page; check that the file is complete and is not compressed.";
        return new Decoding("UNKNOWN", List.of(), List.of(new Rejection(1, 0, bytes.length == 0 ? "EMPTY_INPUT" : "UNKNOWN_FORMAT", text, raw)));
    }
}
