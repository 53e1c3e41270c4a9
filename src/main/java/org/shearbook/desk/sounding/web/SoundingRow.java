package org.shearbook.desk.sounding.web;

import org.jspecify.annotations.Nullable;
import org.shearbook.desk.sounding.SoundingHeader;

/** A sounding in a list, with its levels as flight levels. */
public record SoundingRow(SoundingHeader header, @Nullable Double topFlightLevel, @Nullable Double coldestFlightLevel, @Nullable Double windFlightLevel) {

    static SoundingRow of(SoundingHeader header) {
        return new SoundingRow(header, SoundingView.flightLevel(header.topPressure()), SoundingView.flightLevel(header.lowestTemperaturePressure()),
                SoundingView.flightLevel(header.greatestWindPressure()));
    }
}
