package org.shearbook.desk.forecast;

import java.util.List;
import java.util.Map;

/**
 * How the area moves.
 *
 * @param toward compass point the area moves to; {@code STNR} when it stays
 * @param speed  [kt], in steps of 5; 0 when it stays
 */
public record Movement(String toward, int speed) {

    static final String STATIONARY = "STNR";

    /** The compass points in the order of a compass card. */
    public static final List<String> POINTS = List.of("N", "NNE", "NE", "ENE", "E", "ESE", "SE", "SSE", "S", "SSW", "SW", "WSW", "W", "WNW", "NW", "NNW");

    private static final Map<Character, String> WORDS = Map.of('N', "north", 'E', "east", 'S', "south", 'W', "west");

    public static Movement stationary() {
        return new Movement(STATIONARY, 0);
    }

    /** @param direction where to [deg from true north]; @param speed [kt], rounded to the nearest 5 */
    public static Movement toward(double direction, double speed) {
        int rounded = (int) Math.round(speed / 5) * 5;
        if (rounded == 0) {
            return stationary();
        }
        return new Movement(POINTS.get((int) Math.floorMod(Math.round(direction / 22.5), 16L)), rounded);
    }

    public boolean isStationary() {
        return toward.equals(STATIONARY);
    }

    /** {@code east 25 kt}; {@code east-northeast 40 kt}; {@code stationary}. */
    public String words() {
        if (isStationary()) {
            return "stationary";
        }
        String first = WORDS.get(toward.charAt(0));
        String point = switch (toward.length()) {
            case 1 -> first;
            case 2 -> first + WORDS.get(toward.charAt(1));
            default -> first + "-" + WORDS.get(toward.charAt(1)) + WORDS.get(toward.charAt(2));
        };
        return point + " " + speed + " kt";
    }
}
