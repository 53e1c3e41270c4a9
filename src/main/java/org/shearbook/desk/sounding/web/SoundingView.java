package org.shearbook.desk.sounding.web;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.sounding.SoundingHeader;
import org.shearbook.met.profile.StandardAtmosphere;
import org.shearbook.met.profile.Units;

/** The header of a sounding as scripts get it. */
record SoundingView(
        long id, int version, Station station, String format, @Nullable Instant nominalAt, @Nullable Instant launchedAt, Instant observedAt,
        Instant receivedAt, Instant recordedAt, List<String> parts, String correction, String sondeType, int levelCount,
        @Nullable Double topPressureHpa, @Nullable Double topFlightLevel, @Nullable Double lowestTemperatureC, @Nullable Double lowestTemperatureFlightLevel,
        @Nullable Double greatestWindMs, @Nullable Double greatestWindFromDeg, @Nullable Double greatestWindFlightLevel,
        @Nullable String notUsable, boolean withdrawn, @Nullable String withdrawnReason) {

    record Station(String id, String name, @Nullable Double latitudeDeg, @Nullable Double longitudeDeg, @Nullable Double elevationM) {
    }

    static SoundingView of(SoundingHeader header) {
        return new SoundingView(header.id().value(), header.version(),
                new Station(header.stationId(), header.stationName(), rounded(header.latitude(), 6), rounded(header.longitude(), 6), rounded(header.elevation(), 3)),
                header.format(), header.nominalAt(), header.launchedAt(), header.observedAt(), header.receivedAt(), header.recordedAt(), List.copyOf(header.parts()),
                header.correction(), header.sondeType(), header.levelCount(), rounded(header.topPressure() / 100, 4), flightLevel(header.topPressure()),
                rounded(Units.kelvinToCelsius(header.lowestTemperature()), 2), flightLevel(header.lowestTemperaturePressure()),
                rounded(header.greatestWind(), 2), rounded(header.greatestWindFromDirection(), 1), flightLevel(header.greatestWindPressure()),
                header.notUsable(), header.withdrawn(), header.withdrawnReason());
    }

    /** Pressure altitude in hundreds of feet, to a tenth; null outside the standard atmosphere. */
    static @Nullable Double flightLevel(double pressure) {
        return StandardAtmosphere.covers(pressure) ? rounded(StandardAtmosphere.flightLevel(pressure), 1) : null;
    }

    private static @Nullable Double rounded(double value, int decimals) {
        double scale = Math.pow(10, decimals);
        return Double.isNaN(value) ? null : Math.round(value * scale) / scale;
    }
}
