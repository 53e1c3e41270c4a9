package org.shearbook.desk.forecast;

/** There is no forecast, or no open draft, with this identifier. */
public class UnknownForecast extends RuntimeException {

    UnknownForecast(String message) {
        super(message);
    }
}
