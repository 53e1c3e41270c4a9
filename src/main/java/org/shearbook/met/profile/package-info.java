/**
 * The vertical profile everybody speaks: levels, height bands, constants, units, standard atmosphere, moist
 * thermodynamics. Uses no other room. Start with {@link VerticalProfile}.
 */
@NullMarked
package org.shearbook.met.profile;

import org.jspecify.annotations.NullMarked;
