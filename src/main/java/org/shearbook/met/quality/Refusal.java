package org.shearbook.met.quality;

/**
 * Why no clean profile can be built. The levels are kept all the same.
 *
 * @param code stable name in capitals, for example {@code FEWER_THAN_THREE_WIND_LEVELS}
 * @param text what is the matter and what to do, for a person
 */
public record Refusal(String code, String text) {
}
