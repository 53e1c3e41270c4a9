package org.shearbook.met.decode;

/**
 * A message that could not be read at all. It is kept raw and goes to a person.
 *
 * @param line   line of the input on which it begins, from 1
 * @param column column in that line, from 1; 0 when the whole line is meant
 * @param code   stable name in capitals, for example {@code NO_VERTICAL_COORDINATE}
 * @param text   what is the matter and what to do, for a person
 * @param raw    the text as received (Latin-1 reading of the bytes where it is not text)
 */
public record Rejection(int line, int column, String code, String text, String raw) {
}
