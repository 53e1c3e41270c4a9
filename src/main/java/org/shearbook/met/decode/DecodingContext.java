package org.shearbook.met.decode;

import java.time.Instant;

/**
 * What a decoder can't know from the bytes.
 *
 * @param receivedAt when the bytes arrived; resolves days and hours without month and year to the newest
 *                   moment that is not later than this plus the tolerance of the format
 * @param fixes      where identifiers lie
 */
public record DecodingContext(Instant receivedAt, FixLookup fixes) {
}
