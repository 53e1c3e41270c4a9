package org.shearbook.desk.demonstration;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/**
 * One ascent of the invented scenario: the few numbers that make its air.
 *
 * @param station               where it is launched
 * @param nominalAt             the hour it stands for
 * @param surfaceTemperature    T₀ [K]
 * @param tropopauseHeight      [m]
 * @param jetSpeed              greatest wind of the jet [m s⁻¹]
 * @param jetHeight             [m]
 * @param widthBelow            of the jet below its core [m]
 * @param widthAbove            of the jet above its core [m]
 * @param calmSpeed             wind far from the jet [m s⁻¹]
 * @param layerHeight           centre of the shear layer [m]
 * @param layerHalfDepth        h of tanh((z − z_c)/h) [m]
 * @param layerWindChange       wind change through the shear layer [m s⁻¹]
 * @param layerStability        what the layer adds to N² at its centre [10⁻⁴ s⁻²]
 * @param tropopauseSharpness   half the depth over which N² rises at the tropopause [m]
 * @param cirrus                whether 8.4 to 8.9 km is near saturation over ice
 * @param windDropOut           whether the receiver lost the wind between FL240 and FL260
 */
record ScenarioAscent(
        Site station, Instant nominalAt, double surfaceTemperature, double tropopauseHeight, double jetSpeed, double jetHeight,
        double widthBelow, double widthAbove, double calmSpeed, double layerHeight, double layerHalfDepth, double layerWindChange,
        double layerStability, double tropopauseSharpness, boolean cirrus, boolean windDropOut) {

    /** First day of the scenario, 0000Z. */
    static final Instant DAY_ONE = Instant.parse("2031-03-11T00:00:00Z");

    /** The four launch sites: invented, on open ocean. */
    enum Site {
        DUNVEERY("XVDU", "Dunveery", "0-999-1-S101", "00101", 47.5, -33.0),
        KELBRITH("XVKE", "Kelbrith", "0-999-1-S102", "00102", 47.2, -30.0),
        OSSENFELL("XVOS", "Ossenfell", "0-999-1-S103", "00103", 45.3, -30.4),
        TARQUIDD("XVTA", "Tarquidd", "0-999-1-S104", "00104", 47.0, -27.0);

        /** Height of all four sites above mean sea level [m]. */
        static final double ELEVATION = 50;

        final String ident;
        final String title;
        final String wigosId;
        final String blockNumber;
        final double latitude;
        final double longitude;

        Site(String ident, String title, String wigosId, String blockNumber, double latitude, double longitude) {
            this.ident = ident;
            this.title = title;
            this.wigosId = wigosId;
            this.blockNumber = blockNumber;
            this.latitude = latitude;
            this.longitude = longitude;
        }
    }

    static final List<ScenarioAscent> ALL = List.of(
            ascent("DUNVEERY 1 00", 285, 11600, 38, 10900, 4800, 2600, 6, 9300, 500, 3.0, 0.10),
            ascent("DUNVEERY 1 12", 285, 11400, 48, 10700, 4600, 2600, 6, 9200, 400, 5.5, 0.15),
            ascent("DUNVEERY 2 00", 284, 11000, 60, 10400, 4300, 2500, 7, 9000, 270, 10.4, 0.25),
            ascent("DUNVEERY 2 12", 281, 10000, 50, 9900, 4300, 2500, 7, 8500, 500, 8.0, 0.30),
            ascent("DUNVEERY 3 00", 280, 9600, 40, 9700, 4500, 2600, 6, 8300, 650, 5.0, 0.20),
            ascent("DUNVEERY 3 12", 281, 9900, 34, 9900, 4800, 2800, 5, 8300, 700, 2.5, 0.10),
            ascent("KELBRITH 1 00", 286, 11700, 34, 11000, 4900, 2700, 5, 9400, 600, 2.0, 0.10),
            ascent("KELBRITH 1 12", 286, 11600, 42, 10900, 4800, 2600, 6, 9300, 500, 4.0, 0.15),
            ascent("KELBRITH 2 00", 285, 11300, 54, 10600, 4500, 2500, 7, 9000, 350, 7.0, 0.40),
            ascent("KELBRITH 2 12", 284, 10900, 62, 10400, 4300, 2500, 8, 8750, 250, 11.2, 0.45),
            ascent("KELBRITH 2 18", 283, 10600, 60, 10200, 4300, 2500, 8, 8700, 420, 10.5, 0.45),
            ascent("KELBRITH 3 00", 282, 10300, 50, 10000, 4400, 2500, 7, 8600, 600, 6.5, 0.35),
            ascent("KELBRITH 3 12", 281, 10000, 40, 9900, 4600, 2600, 6, 8500, 700, 3.0, 0.20),
            ascent("OSSENFELL 1 00", 287, 11800, 32, 11100, 5000, 2700, 5, 5600, 600, 2.0, 0.30),
            ascent("OSSENFELL 1 12", 287, 11700, 36, 11000, 4900, 2700, 5, 5500, 500, 4.0, 0.50),
            ascent("OSSENFELL 2 00", 286, 11500, 42, 10900, 4800, 2600, 6, 5400, 350, 7.5, 0.90),
            ascent("OSSENFELL 2 12", 285, 11200, 46, 10700, 4700, 2600, 6, 5200, 220, 12.2, 0.90),
            ascent("OSSENFELL 3 00", 284, 10900, 44, 10500, 4700, 2600, 6, 5000, 450, 8.0, 0.90),
            ascent("OSSENFELL 3 12", 283, 10600, 38, 10300, 4800, 2600, 6, 4900, 600, 4.0, 0.50),
            ascent("TARQUIDD 1 00", 287, 11800, 30, 11100, 5000, 2700, 5, 9500, 700, 1.5, 0.10),
            ascent("TARQUIDD 2 12", 286, 10800, 52, 10150, 4700, 2400, 6, 11250, 300, -7.0, 0.40),
            ascent("TARQUIDD 3 00", 284, 10800, 57, 10400, 4400, 2500, 7, 8900, 280, 10.3, 0.25),
            ascent("TARQUIDD 3 12", 282, 10300, 46, 10100, 4600, 2600, 6, 8800, 600, 4.5, 0.25));

    private static ScenarioAscent ascent(String title, double surfaceTemperature, double tropopause, double jetSpeed, double jetHeight,
            double widthBelow, double widthAbove, double calmSpeed, double layerHeight, double halfDepth, double windChange, double stability) {
        String[] part = title.split(" ");
        Instant nominal = DAY_ONE.plus(Duration.ofDays(Long.parseLong(part[1]) - 1)).plus(Duration.ofHours(Long.parseLong(part[2])));
        return new ScenarioAscent(Site.valueOf(part[0]), nominal, surfaceTemperature, tropopause, jetSpeed, jetHeight, widthBelow, widthAbove,
                calmSpeed, layerHeight, halfDepth, windChange, stability, title.equals("TARQUIDD 2 12") ? 150 : 250,
                title.equals("KELBRITH 2 12"), title.equals("KELBRITH 2 12") || title.equals("KELBRITH 3 00"));
    }

    /** The ascent of this name, for example {@code KELBRITH 2 12}. */
    static ScenarioAscent named(String title) {
        return ALL.stream().filter(ascent -> ascent.title().equals(title)).findFirst().orElseThrow();
    }

    /** Station, day of the scenario and hour: {@code KELBRITH 2 12}. */
    String title() {
        long hours = Duration.between(DAY_ONE, nominalAt).toHours();
        return String.format(Locale.ROOT, "%s %d %02d", station, hours / 24 + 1, hours % 24);
    }

    /** The balloon is let go three quarters of an hour before the hour it stands for. */
    Instant launchedAt() {
        return nominalAt.minus(Duration.ofMinutes(45));
    }

    /** High-resolution data reach the desk three quarters of an hour after the nominal hour. */
    Instant receivedAt() {
        return nominalAt.plus(Duration.ofMinutes(45));
    }

    /** Name of its file: {@code XVKE-D2-12Z.csv}. */
    String fileName() {
        String[] part = title().split(" ");
        return "%s-D%s-%sZ.csv".formatted(station.ident, part[1], part[2]);
    }

    /** The ascent before this one at the same station, if the scenario has one. */
    @Nullable ScenarioAscent previous() {
        return ALL.stream().filter(other -> other.station == station && other.nominalAt.isBefore(nominalAt))
                .reduce((first, second) -> second).orElse(null);
    }
}
