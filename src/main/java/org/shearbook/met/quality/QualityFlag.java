package org.shearbook.met.quality;

/**
 * What a check found. The names are stable: they are stored, exported and tested. A flag deletes nothing; which
 * flags keep a value out of the clean profile is said by {@link CheckedLevel#temperatureUsed} and
 * {@link CheckedLevel#windUsed}.
 */
public enum QualityFlag {

    BELOW_GROUND("Lies below the ground: pressure above that of the surface, or marked so in the message. Not used."),
    NO_VERTICAL_COORDINATE("Has neither a pressure nor a height that can be true. Not used."),
    PRESSURE_RANGE("Pressure outside 0.1 to 1100 hPa. The pressure is not used."),
    HEIGHT_RANGE("Height, reported or computed, outside -500 to 60000 m. The height is not used."),
    PRESSURE_NOT_DECREASING("Pressure does not fall with height here. Replaced from the neighbours where the height fits to 60 m, else the level is not used."),
    DUPLICATE_LEVEL("A second value at the same height. The first is used."),
    HEIGHT_COMPUTED("Height not reported, or refused; computed from pressure and virtual temperature."),
    PRESSURE_INTERPOLATED("Pressure not reported, or refused; taken from the neighbours, logarithm of pressure linear in height."),
    HYDROSTATIC("Height and pressure differ by more than 60 m (plus 1 % of the thickness and what rounding explains) from the thickness that the temperatures give."),
    TEMPERATURE_RANGE("Temperature outside -115 to 60 degrees Celsius. Not used."),
    TEMPERATURE_SPIKE("Temperature stands out from both neighbours by more than 5 K within 300 m, or 15 K at any distance. Not used."),
    SUPERADIABATIC("Potential temperature falls by more than 1 K from the level below."),
    HUMIDITY_MISSING("No humidity: counted as dry air."),
    DEW_POINT_ABOVE_TEMPERATURE("Dew point above the temperature. Up to 0.5 K counts as saturated, beyond that the humidity is not used."),
    HUMIDITY_RANGE("Vapour pressure above half of the air pressure. The humidity is not used."),
    WIND_DIRECTION_RANGE("Wind direction outside 0 to 360 degrees. The wind is not used."),
    WIND_SPEED_RANGE("Wind speed outside 0 to 150 m/s. The wind is not used."),
    WIND_SPIKE("Wind stands out from both neighbours by more than 10 m/s within 300 m, or 40 m/s at any distance. Not used."),
    WIND_JUMP("Wind changes by more than 10 m/s from the level below, with a shear above 0.1 per second."),
    WIND_GAP("Bounds a stretch without wind: nothing is interpolated in it."),
    TEMPERATURE_GAP("Bounds a stretch without temperature: nothing is interpolated in it."),
    /** Of the whole sounding. */
    DIRECTION_ROUNDED("All wind directions are multiples of 5 degrees."),
    /** Of the whole sounding. */
    TEMPERATURE_ROUNDED("All temperatures are whole degrees Celsius."),
    /** Of the whole sounding. */
    POSSIBLE_UNIT_SLIP("Wind speeds look like knots taken for metres per second."),
    /** Of the whole sounding. */
    HEIGHT_FROM_STANDARD_ATMOSPHERE("No height is known anywhere: the lowest level was put at its height in the standard atmosphere."),
    /** Of the whole sounding. */
    NO_HUMIDITY("No level has humidity: stability is that of dry air.");

    private final String text;

    QualityFlag(String text) {
        this.text = text;
    }

    /** What was found, by which limit, and what follows from it; for a person. */
    public String text() {
        return text;
    }
}
