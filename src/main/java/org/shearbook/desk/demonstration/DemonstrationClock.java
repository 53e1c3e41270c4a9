package org.shearbook.desk.demonstration;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZoneOffset;
import org.springframework.context.annotation.Profile;
import org.springframework.stereotype.Component;

/**
 * The desk's clock in the demonstration: stands where the play sets it, then runs on in real time.
 */
@Component
@Profile("demo & !fixed-clock")
class DemonstrationClock extends Clock {

    private final Clock machine = Clock.systemUTC();
    private volatile Instant standsAt = ScenarioAscent.DAY_ONE;
    private volatile Duration ahead = Duration.ZERO;
    private volatile boolean running;

    /** Stands still at this moment until set again or let run. */
    void set(Instant moment) {
        running = false;
        standsAt = moment;
    }

    /** Runs so that it showed {@code deskAt} when the machine's clock showed {@code machineAt}. */
    void run(Instant deskAt, Instant machineAt) {
        ahead = Duration.between(machineAt, deskAt);
        running = true;
    }

    Instant machineTime() {
        return machine.instant();
    }

    @Override
    public Instant instant() {
        return running ? machine.instant().plus(ahead) : standsAt;
    }

    @Override
    public ZoneId getZone() {
        return ZoneOffset.UTC;
    }

    @Override
    public Clock withZone(ZoneId zone) {
        return this;
    }
}
