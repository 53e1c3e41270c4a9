package org.shearbook.desk.airreport;

import java.time.Instant;
import org.shearbook.met.decode.EdrClasses;
import org.springframework.boot.context.properties.ConfigurationProperties;
import org.springframework.boot.context.properties.bind.DefaultValue;

/**
 * How air-reports are read at this office.
 *
 * @param presentEdrClassesFrom observations from this moment on have their EDR put into words by the present table,
 *                              earlier ones by the former; the date the table came into force is from memory
 */
@ConfigurationProperties("shearbook.air-report")
record AirReportSettings(@DefaultValue("2020-11-05T00:00:00Z") Instant presentEdrClassesFrom) {

    /** The table in force when a report was observed: archives keep the scale of their date. */
    EdrClasses edrClassesAt(Instant observedAt) {
        return observedAt.isBefore(presentEdrClassesFrom) ? EdrClasses.ANNEX_3_FORMER : EdrClasses.ANNEX_3_PRESENT;
    }
}
