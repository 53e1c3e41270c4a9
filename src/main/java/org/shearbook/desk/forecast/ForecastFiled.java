package org.shearbook.desk.forecast;

import org.jspecify.annotations.Nullable;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.Audited;

/** A version of a forecast was issued; it may be an amendment, a correction or a cancellation. */
public record ForecastFiled(Actor actor, Forecast forecast, @Nullable Forecast previous) implements Audited {

    @Override
    public String act() {
        return forecast.state().name().toLowerCase(java.util.Locale.ROOT);
    }

    @Override
    public Subject subject() {
        return new Subject("forecast", Long.toString(forecast.id().value()), forecast.version());
    }

    @Override
    public @Nullable String before() {
        return previous == null ? null : previous.text();
    }

    @Override
    public String after() {
        return forecast.text();
    }

    @Override
    public @Nullable String reason() {
        return forecast.reason() == null ? forecast.content().aloneReason() : forecast.reason();
    }
}
