package org.shearbook.testing;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZoneOffset;

/** A clock that stands still until a test moves it, forward or back. */
public final class SettableClock extends Clock {

    public static final Instant START = Instant.parse("2031-03-12T06:15:00Z");

    private volatile Instant now = START;

    public void set(Instant moment) {
        now = moment;
    }

    public void advance(Duration by) {
        now = now.plus(by);
    }

    @Override
    public Instant instant() {
        return now;
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
