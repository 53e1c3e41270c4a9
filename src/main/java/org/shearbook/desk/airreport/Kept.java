package org.shearbook.desk.airreport;

/** What became of a report that was handed over for keeping. */
public record Kept(AirReportId id, int version) {
}
