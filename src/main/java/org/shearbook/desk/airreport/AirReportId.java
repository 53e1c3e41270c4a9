package org.shearbook.desk.airreport;

/** Names one air-report through all its versions. */
public record AirReportId(long value) {

    @Override
    public String toString() {
        return Long.toString(value);
    }
}
