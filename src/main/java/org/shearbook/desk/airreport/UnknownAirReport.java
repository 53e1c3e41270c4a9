package org.shearbook.desk.airreport;

/** There is no such report, or there was none yet at the moment asked for. */
public class UnknownAirReport extends RuntimeException {

    public UnknownAirReport(AirReportId id) {
        super("There is no air-report %s, or it was not yet known at that moment.".formatted(id));
    }
}
