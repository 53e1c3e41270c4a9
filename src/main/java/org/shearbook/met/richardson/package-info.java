/**
 * N², shear, gradient and bulk Richardson number dry and moist, how sure they are, the layers where Ri is small and how
 * those change from one sounding to the next. Start with {@link RichardsonAnalysis}; beside it stand
 * {@link MoistRichardson}, {@link RichardsonUncertainty} and {@link SoundingIndices}, and {@link LayerMatching} with
 * {@link LayerStateRule} between soundings. May use {@code profile}.
 */
@NullMarked
package org.shearbook.met.richardson;

import org.jspecify.annotations.NullMarked;
