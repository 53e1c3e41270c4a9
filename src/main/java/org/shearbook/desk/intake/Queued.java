package org.shearbook.desk.intake;

/**
 * A message that nobody could read, kept raw for a person.
 *
 * @param id      of the item in the queue
 * @param arrival which arrival it came in, from 1
 * @param line    of the arrival, from 1
 * @param column  in that line, from 1; 0 when the whole line is meant
 * @param code    stable name in capitals
 * @param text    what is the matter and what to do
 * @param duplicate whether the same bytes are in the queue already, as that item
 */
public record Queued(long id, int arrival, int line, int column, String code, String text, boolean duplicate) {
}
