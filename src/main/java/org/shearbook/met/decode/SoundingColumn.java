package org.shearbook.met.decode;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;

/**
 * What one column of a sounding table holds, as its header says: {@code wind_speed_kt}, {@code Pressure (hPa)},
 * {@code temp [K]}; or a bare name, whose unit may stand in the row below.
 *
 * @param quantity null for a column this desk has no use for
 * @param unit     null when the header gives none
 * @param unknownUnit what stands in the brackets when it is no unit of this quantity; empty otherwise
 * @param name     as in the header
 * @param column   position of the name in its line, from 1
 */
record SoundingColumn(@Nullable Quantity quantity, @Nullable ColumnUnit unit, String unknownUnit, String name, int column) {

    /** What a column can hold: its words, its units, and how to write it. */
    enum Quantity {
        TIME("elapsed time", "time_s", ColumnUnit.TIMES, "time", "elapsed", "elapsed_time", "time_since_launch"),
        PRESSURE("pressure", "pressure_hPa or pressure_Pa", ColumnUnit.PRESSURES, "pressure", "press", "pres", "p", "air_pressure"),
        HEIGHT("geopotential height", "geopotential_height_m", ColumnUnit.HEIGHTS,
                "geopotential_height", "height", "hght", "hgt", "gph", "gpheight", "geopotential", "geopot", "geopot_height", "z"),
        GEOMETRIC_HEIGHT("geometric height", "geometric_height_m", ColumnUnit.LENGTHS, "geometric_height", "altitude", "alt", "gps_altitude", "gps_height", "ele"),
        TEMPERATURE("temperature", "temperature_C or temperature_K", ColumnUnit.TEMPERATURES, "temperature", "temp", "t", "air_temp", "air_temperature"),
        DEW_POINT("dew point", "dewpoint_C or dewpoint_K", ColumnUnit.TEMPERATURES,
                "dewpoint", "dew_point", "td", "dewpt", "dwpt", "dewpoint_temperature", "dew_point_temperature"),
        DEW_POINT_DEPRESSION("dew-point depression", "dewpoint_depression_C", ColumnUnit.DIFFERENCES, "dewpoint_depression", "dew_point_depression", "dpd"),
        RELATIVE_HUMIDITY("relative humidity", "relative_humidity_pct", ColumnUnit.HUMIDITIES, "relative_humidity", "rh", "humidity", "relh", "rel_hum"),
        WIND_DIRECTION("wind direction", "wind_direction_deg", ColumnUnit.ANGLES, "wind_direction", "wind_dir", "winddir", "direction", "dir", "wdir", "dd", "drct"),
        WIND_SPEED("wind speed", "wind_speed_kt or wind_speed_ms", ColumnUnit.SPEEDS, "wind_speed", "windspeed", "wind_spd", "speed", "spd", "wspd", "ff"),
        EASTWARD("eastward wind", "u_wind_ms or u_wind_kt", ColumnUnit.SPEEDS, "u_wind", "wind_u", "u", "uwnd", "eastward_wind"),
        NORTHWARD("northward wind", "v_wind_ms or v_wind_kt", ColumnUnit.SPEEDS, "v_wind", "wind_v", "v", "vwnd", "northward_wind"),
        LATITUDE("latitude", "latitude_deg", ColumnUnit.ANGLES, "latitude", "lat"),
        LONGITUDE("longitude", "longitude_deg", ColumnUnit.ANGLES, "longitude", "lon", "long", "lng"),
        LEVEL_TYPE("level type", "level_type", Map.of(), "level_type", "significance");

        final String words;
        final String header;
        final Map<String, ColumnUnit> units;
        final Set<String> names;

        Quantity(String words, String header, Map<String, ColumnUnit> units, String... names) {
            this.words = words;
            this.header = header;
            this.units = units;
            this.names = Set.of(names);
        }

        boolean isVertical() {
            return this == PRESSURE || this == HEIGHT || this == GEOMETRIC_HEIGHT;
        }

        /** Whether a table with this column may be a sounding at all: positions and times stand in every table. */
        boolean isMeteorological() {
            return this != TIME && this != LATITUDE && this != LONGITUDE && this != LEVEL_TYPE && this != GEOMETRIC_HEIGHT;
        }

        /** Angles are in degrees wherever they come from; a level type has no unit. */
        @Nullable ColumnUnit unitWithoutSaying() {
            return units == ColumnUnit.ANGLES || this == LEVEL_TYPE ? ColumnUnit.ONE : null;
        }

        @Nullable ColumnUnit unit(String text) {
            return units.get(ColumnUnit.canonical(text));
        }
    }

    private static final Map<String, Quantity> BY_NAME = byName();

    static SoundingColumn of(DelimitedLine.Cell cell) {
        String text = cell.text();
        int bracket = Math.max(text.indexOf('('), text.indexOf('['));
        if (bracket > 0) {
            Quantity quantity = BY_NAME.get(canonicalName(text.substring(0, bracket)));
            int close = Math.max(text.lastIndexOf(')'), text.lastIndexOf(']'));
            String inside = text.substring(bracket + 1, close > bracket ? close : text.length());
            ColumnUnit unit = quantity == null ? null : quantity.unit(inside);
            return new SoundingColumn(quantity, unit, quantity != null && unit == null ? inside : "", text, cell.column());
        }
        Quantity whole = BY_NAME.get(canonicalName(text));
        if (whole != null) {
            return new SoundingColumn(whole, null, "", text, cell.column());
        }
        // From the right: the shortest ending that is a unit. A header is a few words, and only its last 12 characters are tried.
        for (int i = text.length() - 1; i > 0 && i > text.length() - 12; i--) {
            char c = text.charAt(i);
            if (c == '_' || c == ' ' || c == '/') {
                Quantity quantity = BY_NAME.get(canonicalName(text.substring(0, i)));
                ColumnUnit unit = quantity == null ? null : quantity.unit(text.substring(i + 1));
                if (unit != null) {
                    return new SoundingColumn(quantity, unit, "", text, cell.column());
                }
            }
        }
        return new SoundingColumn(null, null, "", text, cell.column());
    }

    static List<SoundingColumn> of(List<DelimitedLine.Cell> header) {
        return header.stream().map(SoundingColumn::of).toList();
    }

    SoundingColumn withUnit(@Nullable ColumnUnit given) {
        return new SoundingColumn(quantity, given, "", name, column);
    }

    SoundingColumn ignored() {
        return new SoundingColumn(null, null, "", name, column);
    }

    private static String canonicalName(String text) {
        return text.strip().toLowerCase(Locale.ROOT).replace(' ', '_').replace('-', '_').replace('.', '_');
    }

    private static Map<String, Quantity> byName() {
        Map<String, Quantity> names = new TreeMap<>();
        for (Quantity quantity : Quantity.values()) {
            quantity.names.forEach(name -> names.put(name, quantity));
        }
        return names;
    }
}
