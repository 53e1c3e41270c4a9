/**
 * Checks reported values, flags them and builds a clean profile from what passed. Deletes nothing. Start with
 * {@link SoundingQuality}. May use {@code profile} and {@code decode}.
 */
@NullMarked
package org.shearbook.met.quality;

import org.jspecify.annotations.NullMarked;
