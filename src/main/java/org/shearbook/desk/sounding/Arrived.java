package org.shearbook.desk.sounding;

import org.shearbook.met.decode.DecodedSounding;

/**
 * A decoded message on its way into the archive.
 *
 * @param format the decoder's name of the format: an ascent that comes in two formats is two soundings, because
 *               neither corrects the other
 */
public record Arrived(DecodedSounding message, String format) {
}
