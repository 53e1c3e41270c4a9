/**
 * What billows a layer would have: height, spacing, time, cloud and turbulence, from its wave or by rule. Start with
 * {@link BillowEstimate}. May use {@code profile}, {@code richardson} and {@code taylorgoldstein}.
 */
@NullMarked
package org.shearbook.met.billow;

import org.jspecify.annotations.NullMarked;
