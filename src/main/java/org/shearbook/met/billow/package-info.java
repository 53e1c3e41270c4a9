/**
 * Billow scales from a layer. May use {@code profile} and {@code richardson}.
 */
@NullMarked
package org.shearbook.met.billow;

import org.jspecify.annotations.NullMarked;
