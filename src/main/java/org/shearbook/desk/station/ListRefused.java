package org.shearbook.desk.station;

import java.util.List;

/** A list of stations or fixes has rows that can't be right. None of it was kept. */
public class ListRefused extends RuntimeException {

    private final List<LineRefusal> refusals;

    ListRefused(List<LineRefusal> refusals) {
        super("Nothing was kept. " + refusals.get(0).text());
        this.refusals = List.copyOf(refusals);
    }

    /** What is the matter, line by line; the first ones when there are many. */
    public List<LineRefusal> refusals() {
        return refusals;
    }

    /**
     * @param line   of the list, from 1
     * @param column name of the column; empty when the whole line is meant
     * @param code   stable name in capitals
     * @param text   what is the matter and what to do
     */
    public record LineRefusal(int line, String column, String code, String text) {
    }
}
