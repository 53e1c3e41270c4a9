package org.shearbook.met.quality;

/**
 * A finding about a sounding as a whole.
 *
 * @param flag stable name
 * @param text with the numbers of this sounding, for a person
 */
public record SoundingFlag(QualityFlag flag, String text) {
}
