package org.shearbook.met.decode;

/**
 * Something a person should know about one place of a message. Tests assert the code, not the text.
 *
 * @param line   line of the input, from 1
 * @param column column in that line, from 1; 0 when the whole line is meant
 * @param code   stable name in capitals, for example {@code GROUP_SHIFTED}
 * @param text   what is the matter and what to do, for a person
 */
public record Remark(int line, int column, String code, String text) {
}
