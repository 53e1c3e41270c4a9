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
            String text = "";
            if (i < line.length() && line.charAt(i) == '"') {
                StringBuilder quoted = new StringBuilder();
                i++;
                while (i < line.length() && (line.charAt(i) != '"' || i + 1 < line.length() && line.charAt(i + 1) == '"')) {
                    quoted.append(line.charAt(i));
                    i += line.charAt(i) == '"' ? 2 : 1;
                }
                i++;
                text = quoted.toString();
            }
            int end = i < line.length() ? line.indexOf(separator, i) : -1;
            end = end < 0 ? line.length() : end;
            text += line.substring(Math.min(i, end), end);
            i = end;
            cells.add(new Cell(text.strip(), start + 1));
            if (i >= line.length()) {
                return cells;
            }
            i++;
        }
    }
}
