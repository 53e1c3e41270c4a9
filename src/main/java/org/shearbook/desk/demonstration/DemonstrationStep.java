package org.shearbook.desk.demonstration;

import java.time.Instant;

/**
 * One act of the play.
 *
 * @param at  the desk's time
 * @param act what is done then
 */
record DemonstrationStep(Instant at, Runnable act) {
}
