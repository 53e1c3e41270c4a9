package org.shearbook.desk.station;

import java.time.Instant;

/**
 * One version of a list of fixes.
 *
 * @param name     what the office calls the list: {@code navaids}, {@code aerodromes}, {@code waypoints}
 * @param fixCount number of names in it
 */
public record FixList(String name, int version, int fixCount, Instant recordedAt) {
}
