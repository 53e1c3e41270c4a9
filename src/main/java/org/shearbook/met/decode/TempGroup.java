package org.shearbook.met.decode;

/**
 * One group of a coded report, and where it stands.
 *
 * @param text   the group; {@code =} ends a report and is a group of its own
 * @param line   from 1
 * @param column from 1
 * @param start  in the text of the input
 * @param end    in the text of the input, excluded
 */
record TempGroup(String text, int line, int column, int start, int end) {

    /** Whether it has the shape of a group of values: five places, each a digit or a solidus. */
    boolean isValue() {
        if (text.length() != 5) {
            return false;
        }
        for (int i = 0; i < 5; i++) {
            if (text.charAt(i) != '/' && !TempCode.isDigit(text.charAt(i))) {
                return false;
            }
        }
        return true;
    }
}
