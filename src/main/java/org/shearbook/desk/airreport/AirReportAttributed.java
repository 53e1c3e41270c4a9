package org.shearbook.desk.airreport;

import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/** A person said what caused the turbulence of a report. */
public record AirReportAttributed(Actor actor, AirReport report, Attribution earlier) implements Audited {

    @Override
    public String act() {
        return "attributed";
    }

    @Override
    public Subject subject() {
        return new Subject("airreport", report.id().toString(), report.version());
    }

    @Override
    public String before() {
        return earlier.inWords();
    }

    @Override
    public String after() {
        return report.attribution().inWords();
    }

    @Override
    public @Nullable String reason() {
        return report.attributionReason();
    }
}
