/**
 * Linear stability of a stratified shear flow: which waves grow, how fast, how long, in which direction and at which
 * phase speed. Start with {@link org.shearbook.met.taylorgoldstein.StabilityAnalysis}. May use {@code profile} and
 * {@code richardson}.
 */
@NullMarked
package org.shearbook.met.taylorgoldstein;

import org.jspecify.annotations.NullMarked;
