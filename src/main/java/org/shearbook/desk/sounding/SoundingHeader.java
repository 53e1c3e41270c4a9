package org.shearbook.desk.sounding;

import java.time.Instant;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/**
 * One version of a sounding without its levels.
 *
 * @param stationId   id of the station; the identifier of the message where the station is not known
 * @param format      the format it came in
 * @param nominalAt   the hour the ascent stands for; null when unknown
 * @param launchedAt  moment of release; null when unknown
 * @param observedAt  the release where known, else the nominal hour
 * @param latitude    of the launch site [degrees north]; NaN when neither message nor station table says
 * @param longitude   [degrees east]; NaN likewise
 * @param elevation   of the launch site [m]; NaN likewise
 * @param parts       which parts of the code are in it, in order; empty for formats without parts
 * @param correction  correction mark of the newest message; empty when none
 * @param topPressure lowest pressure of any level [Pa]; NaN when no level has one
 * @param lowestTemperature [K] with its pressure [Pa]; NaN when there is none in the clean profile
 * @param greatestWind      [m s⁻¹] with direction [degrees] and pressure [Pa]; NaN likewise
 * @param notUsable   why there is no clean profile; null when there is one
 */
public record SoundingHeader(
        SoundingId id, int version, String stationId, String stationName, String format,
        @Nullable Instant nominalAt, @Nullable Instant launchedAt, Instant observedAt, Instant receivedAt, Instant recordedAt,
        double latitude, double longitude, double elevation, Set<String> parts, String correction, String sondeType,
        int levelCount, double topPressure, double lowestTemperature, double lowestTemperaturePressure,
        double greatestWind, double greatestWindFromDirection, double greatestWindPressure,
        @Nullable String notUsable, boolean withdrawn, @Nullable String withdrawnReason) {

    public boolean isUsable() {
        return notUsable == null && !withdrawn;
    }
}
