/**
 * N², shear, gradient and bulk Richardson number, and the layers where it is small. Start with
 * {@link RichardsonAnalysis}. May use {@code profile}.
 */
@NullMarked
package org.shearbook.met.richardson;

import org.jspecify.annotations.NullMarked;
