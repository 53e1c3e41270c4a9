package org.shearbook.desk.intake;

/**
 * An arrival that was not taken in at all, because there is nothing in it that a person could make good here.
 *
 * @param arrival which one, from 1
 */
public record Refused(int arrival, String name, String code, String text) {
}
