package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.List;

/** Splits one line of separated values and keeps where each cell stands. */
final class DelimitedLine {

    /**
     * @param text   without the quotes and blanks around it
     * @param column at which the cell begins in its line, from 1
     */
    record Cell(String text, int column) {
    }

    private DelimitedLine() {
    }

    /**
     * The separator of a header line: the most frequent of tab, semicolon and comma outside quotes; a semicolon
     * or a tab wins over commas, which may be decimal commas.
     */
    static char separatorOf(CharSequence header) {
        int commas = 0;
        boolean quoted = false;
        for (int i = 0; i < header.length(); i++) {
            char c = header.charAt(i);
            if (c == '"') {
                quoted = !quoted;
            } else if (!quoted && (c == ';' || c == '\t')) {
                return c;
            } else if (!quoted && c == ',') {
                commas++;
            }
        }
        return commas > 0 ? ',' : '\0';
    }

    /** Cells of a line. Doubled quotes inside quotes stand for one; a quote left open runs to the end of the line. */
    static List<Cell> split(String line, char separator) {
        List<Cell> cells = new ArrayList<>();
        int i = 0;
        while (true) {
            int start = i;
            while (i < line.length() && line.charAt(i) == ' ') {
                i++;
            }
            StringBuilder text = new StringBuilder();
            if (i < line.length() && line.charAt(i) == '"') {
                i++;
                while (i < line.length() && (line.charAt(i) != '"' || i + 1 < line.length() && line.charAt(i + 1) == '"')) {
                    text.append(line.charAt(i));
                    i += line.charAt(i) == '"' ? 2 : 1;
                }
                i++;
            }
            while (i < line.length() && line.charAt(i) != separator) {
                text.append(line.charAt(i++));
            }
            cells.add(new Cell(text.toString().strip(), start + 1));
            if (i >= line.length()) {
                return cells;
            }
            i++;
        }
    }
}
