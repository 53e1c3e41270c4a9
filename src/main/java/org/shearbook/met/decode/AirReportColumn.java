package org.shearbook.met.decode;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** Columns of a table of air-reports. Where a quantity has a unit the unit is in the name. */
enum AirReportColumn {

    REPORT_ID("report_id", "id"),
    REPORT_CLASS("report_class", "report_kind"),
    AUTOMATED("automated", "source"),
    OBSERVED_AT("observed_at"),
    RECEIVED_AT("received_at"),
    LATITUDE("latitude_deg"),
    LONGITUDE("longitude_deg"),
    POSITION("position", "place"),
    FLIGHT_LEVEL("flight_level"),
    PRESSURE_ALTITUDE_FEET("pressure_altitude_ft"),
    AIRCRAFT_TYPE("aircraft_type"),
    AIRCRAFT("flight_id", "aircraft", "aircraft_id"),
    WEIGHT_CLASS("weight_class", "wake_category"),
    INTENSITY("turbulence_intensity", "intensity"),
    FREQUENCY("turbulence_frequency"),
    TYPE("turbulence_type"),
    BASE_FEET("turbulence_base_ft"),
    TOP_FEET("turbulence_top_ft"),
    EDR_PEAK("edr_peak", "peak_edr"),
    EDR_MEAN("edr_mean", "mean_edr"),
    GUST("dvg_max_ms", "gust_ms"),
    TEMPERATURE_CELSIUS("temperature_c"),
    TEMPERATURE_KELVIN("temperature_k"),
    WIND_DIRECTION("wind_direction_deg"),
    WIND_SPEED_KNOTS("wind_speed_kt"),
    WIND_SPEED("wind_speed_ms"),
    CLOUD("cloud"),
    REMARK("remarks", "remark"),
    REPORT_TEXT("report_text", "raw_text", "raw_report", "report");

    /** Names that need a unit and here have none. */
    private static final List<String> WITHOUT_UNIT = List.of("latitude", "longitude", "lat", "lon", "temperature", "wind_direction",
            "wind_speed", "turbulence_base", "turbulence_top", "altitude", "height", "pressure_altitude", "dvg_max", "gust");

    /** Only a table of air-reports has one of these. */
    private static final List<AirReportColumn> TELLING = List.of(REPORT_ID, REPORT_CLASS, INTENSITY, EDR_PEAK, EDR_MEAN, REPORT_TEXT);

    private final List<String> names;

    AirReportColumn(String... names) {
        this.names = List.of(names);
    }

    /** @return null when the header is none of these */
    static @Nullable AirReportColumn of(String header) {
        String name = canonical(header);
        return Arrays.stream(values()).filter(column -> column.names.contains(name)).findFirst().orElse(null);
    }

    static boolean lacksUnit(String header) {
        return WITHOUT_UNIT.contains(canonical(header));
    }

    boolean isTelling() {
        return TELLING.contains(this);
    }

    private static String canonical(String header) {
        return header.strip().toLowerCase(Locale.ROOT).replace(' ', '_');
    }
}
