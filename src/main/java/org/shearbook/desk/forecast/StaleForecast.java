package org.shearbook.desk.forecast;

/** An act was based on a version that is no longer the newest. */
public class StaleForecast extends RuntimeException {

    private final int seen;
    private final int current;

    StaleForecast(String what, int seen, int current) {
        super("%s has changed since you opened it: you saw version %d, the newest is version %d. Compare the two and decide again."
                .formatted(what, seen, current));
        this.seen = seen;
        this.current = current;
    }

    /** The version the act was based on. */
    public int seen() {
        return seen;
    }

    public int current() {
        return current;
    }
}
