package org.shearbook.desk.forecast;

import java.util.List;
import java.util.stream.Collectors;

/** A forecast can't be filed as it stands. */
public class ForecastRefused extends RuntimeException {

    private final transient List<Refusal> refusals;

    ForecastRefused(List<Refusal> refusals) {
        super(refusals.stream().map(Refusal::text).collect(Collectors.joining(" ")));
        this.refusals = List.copyOf(refusals);
    }

    public List<Refusal> refusals() {
        return refusals;
    }
}
