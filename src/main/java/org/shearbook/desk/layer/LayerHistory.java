package org.shearbook.desk.layer;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.analysis.StabilityState;
import org.shearbook.desk.sounding.SoundingId;

/**
 * One layer of air as the successive soundings of a station saw it.
 *
 * @param sightings from the earliest on, at least one
 * @param state     at the moment asked for, with hysteresis
 * @param because   why, in words
 * @param evidenceAt time of the newest sounding that says something; null when there is none
 * @param evidenceAge its age then; null likewise
 */
public record LayerHistory(
        String stationId, String stationName, List<Sighting> sightings, StabilityState state, String because, @Nullable Instant evidenceAt,
        @Nullable Duration evidenceAge) {

    public LayerHistory {
        sightings = List.copyOf(sightings);
    }

    public Sighting last() {
        return sightings.get(sightings.size() - 1);
    }

    /**
     * What one sounding showed of it.
     *
     * @param letter           of the layer within its sounding; null where that sounding shows no layer and the air was followed by
     *                         its potential temperature
     * @param base             [m]
     * @param top              [m]
     * @param minimumHeight    of the smallest Ri [m]
     * @param flightLevel      there; null when not known
     * @param temperature      θv there [K]; null when not known
     * @param shearDirection   towards which the wind change points [degrees]; null when there is none
     * @param richardsonPerHour dRi/dt since the sighting before; null for the first
     * @param descentRate      of the minimum since then, positive when it sinks [m s⁻¹]; null for the first
     */
    public record Sighting(
            SoundingId soundingId, Instant at, @Nullable String letter, double base, double top, double minimumHeight, @Nullable Double flightLevel,
            @Nullable Double temperature, @Nullable Double shearDirection, @Nullable Double richardsonNumber, @Nullable Double richardsonPerHour,
            @Nullable Double descentRate) {

        public boolean detected() {
            return letter != null;
        }
    }
}
