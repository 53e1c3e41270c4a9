/**
 * Message bytes into reported levels or an air-report, with a {@link Remark} for whatever could not be read.
 * Start with {@link MessageDecoder}. May use {@code profile}. Never throws for bad content: what can't be
 * read is a {@link Rejection} with line, column, code and what to do.
 */
@NullMarked
package org.shearbook.met.decode;

import org.jspecify.annotations.NullMarked;
