package org.shearbook.desk.airreport;

/** A report that does not say when it was observed can't be kept: a person must find the time first. */
public class AirReportWithoutTime extends RuntimeException {

    AirReportWithoutTime(int line) {
        super("The report on line %d does not say when it was observed. Give it a time before it is kept.".formatted(line));
    }
}
