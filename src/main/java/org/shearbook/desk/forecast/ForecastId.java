package org.shearbook.desk.forecast;

/** Identifies a forecast from its first draft on; the number SLF nn comes with issue. */
public record ForecastId(long value) {
}
