/**
 * The science: true without a database, a user or a web page. Plain Java and Commons Math; SI units inside,
 * converted at the door ({@code decode} inward, {@code desk.shell} outward). Values are immutable.
 */
@NullMarked
package org.shearbook.met;

import org.jspecify.annotations.NullMarked;
