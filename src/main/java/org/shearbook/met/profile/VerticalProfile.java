package org.shearbook.met.profile;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.ToDoubleFunction;
import org.jspecify.annotations.Nullable;

/**
 * One ascent as the whole house speaks of it: what passed the checks, and nothing invented.
 *
 * <p>Temperature and wind are kept apart, because coded ascents report them at different levels: thermodynamic
 * levels (height, pressure, temperature, dew point) and wind levels (height, u, v) each strictly increase in
 * height and are finite; pressure strictly decreases with height over both together. Nothing downstream checks again.
 *
 * <p><b>Gaps.</b> A gap is a stretch in which nothing may be interpolated. Its bounding levels are measured, its
 * inside is not: every "at a height" method gives NaN strictly inside a gap and beyond the data.
 *
 * <p><b>Between levels</b> temperature, dew point and wind components are linear in height; ln p is linear in
 * height, so that height, pressure and flight level of one ascent convert into each other and back exactly.
 *
 * <p>Heights are geopotential metres above mean sea level throughout.
 */
public final class VerticalProfile {

    private final double surfaceHeight;
    private final List<ThermodynamicLevel> thermodynamicLevels;
    private final List<WindLevel> windLevels;
    private final List<HeightBand> temperatureGaps;
    private final List<HeightBand> windGaps;
    private final List<BalloonPosition> positions;

    private final double[] temperatureHeight;
    private final double[] windHeight;
    private final double[] positionHeight;
    private final double[] pressureHeight;
    private final double[] logPressure;

    /** A profile without gaps and positions, whose ground is its lowest level. */
    public VerticalProfile(List<ThermodynamicLevel> thermodynamicLevels, List<WindLevel> windLevels) {
        this(Double.NaN, thermodynamicLevels, windLevels, List.of(), List.of(), List.of());
    }

    /**
     * @param surfaceHeight       of the launch site above mean sea level [m]; NaN when unknown: then the lowest level
     * @param thermodynamicLevels at least one, strictly increasing in height, strictly decreasing in pressure
     * @param windLevels          may be empty; strictly increasing in height
     * @param temperatureGaps     ascending, not overlapping
     * @param windGaps            ascending, not overlapping
     * @param positions           of the balloon where known, strictly increasing in height; may be empty
     * @throws IllegalArgumentException if any of this does not hold (the message names list and index)
     */
    public VerticalProfile(
            double surfaceHeight, List<ThermodynamicLevel> thermodynamicLevels, List<WindLevel> windLevels,
            List<HeightBand> temperatureGaps, List<HeightBand> windGaps, List<BalloonPosition> positions) {
        this.thermodynamicLevels = List.copyOf(thermodynamicLevels);
        this.windLevels = List.copyOf(windLevels);
        this.temperatureGaps = List.copyOf(temperatureGaps);
        this.windGaps = List.copyOf(windGaps);
        this.positions = List.copyOf(positions);
        if (this.thermodynamicLevels.isEmpty()) {
            throw new IllegalArgumentException("a profile needs at least one level with pressure and temperature");
        }
        if (Double.isInfinite(surfaceHeight)) {
            throw new IllegalArgumentException("surface height must be finite or unknown");
        }
        temperatureHeight = heights("thermodynamic level", this.thermodynamicLevels, ThermodynamicLevel::height);
        windHeight = heights("wind level", this.windLevels, WindLevel::height);
        positionHeight = heights("position", this.positions, BalloonPosition::height);
        requireAscendingBands("temperature gap", this.temperatureGaps);
        requireAscendingBands("wind gap", this.windGaps);
        double[][] pressureKnots = pressureKnots();
        pressureHeight = pressureKnots[0];
        logPressure = pressureKnots[1];
        this.surfaceHeight = Double.isNaN(surfaceHeight) ? lowestHeight() : surfaceHeight;
    }

    private static <L> double[] heights(String what, List<L> levels, ToDoubleFunction<L> height) {
        double[] heights = levels.stream().mapToDouble(height).toArray();
        for (int k = 1; k < heights.length; k++) {
            if (!(heights[k] > heights[k - 1])) {
                throw new IllegalArgumentException(
                        what + " " + k + " at " + heights[k] + " m is not above the one before it at " + heights[k - 1] + " m");
            }
        }
        return heights;
    }

    private static void requireAscendingBands(String what, List<HeightBand> bands) {
        for (int k = 1; k < bands.size(); k++) {
            if (bands.get(k).base() < bands.get(k - 1).top()) {
                throw new IllegalArgumentException(what + " " + k + " begins below the top of the one before it");
            }
        }
    }

    private double[][] pressureKnots() {
        List<double[]> knots = new ArrayList<>(temperatureHeight.length + windHeight.length);
        int t = 0;
        int w = 0;
        while (t < temperatureHeight.length || w < windHeight.length) {
            boolean takeTemperature = w == windHeight.length
                    || t < temperatureHeight.length && temperatureHeight[t] <= windHeight[w];
            if (takeTemperature) {
                if (w < windHeight.length && temperatureHeight[t] == windHeight[w]) {
                    w++;
                }
                knots.add(new double[] {temperatureHeight[t], Math.log(thermodynamicLevels.get(t).pressure())});
                t++;
            } else {
                WindLevel level = windLevels.get(w++);
                if (!Double.isNaN(level.pressure())) {
                    knots.add(new double[] {level.height(), Math.log(level.pressure())});
                }
            }
        }
        double[][] columns = {knots.stream().mapToDouble(k -> k[0]).toArray(), knots.stream().mapToDouble(k -> k[1]).toArray()};
        for (int k = 1; k < columns[1].length; k++) {
            if (!(columns[1][k] < columns[1][k - 1])) {
                throw new IllegalArgumentException("pressure at " + columns[0][k] + " m is not below that at " + columns[0][k - 1] + " m");
            }
        }
        return columns;
    }

    /** Height of the ground [m]: the launch site where known, else the lowest level. */
    public double surfaceHeight() {
        return surfaceHeight;
    }

    public List<ThermodynamicLevel> thermodynamicLevels() {
        return thermodynamicLevels;
    }

    public List<WindLevel> windLevels() {
        return windLevels;
    }

    public List<HeightBand> temperatureGaps() {
        return temperatureGaps;
    }

    public List<HeightBand> windGaps() {
        return windGaps;
    }

    /** Where the balloon was, at the heights for which the message says it; may be empty. */
    public List<BalloonPosition> positions() {
        return positions;
    }

    /** [m], shape {@code [thermodynamicLevels]}; a fresh copy. */
    public double[] temperatureHeights() {
        return temperatureHeight.clone();
    }

    /** [K], shape {@code [thermodynamicLevels]}. */
    public double[] virtualPotentialTemperatures() {
        return thermodynamicLevels.stream().mapToDouble(ThermodynamicLevel::virtualPotentialTemperature).toArray();
    }

    /** [m], shape {@code [windLevels]}; a fresh copy. */
    public double[] windHeights() {
        return windHeight.clone();
    }

    /** u [m s⁻¹], shape {@code [windLevels]}. */
    public double[] eastward() {
        return windLevels.stream().mapToDouble(WindLevel::eastward).toArray();
    }

    /** v [m s⁻¹], shape {@code [windLevels]}. */
    public double[] northward() {
        return windLevels.stream().mapToDouble(WindLevel::northward).toArray();
    }

    /** Lowest height with any level [m]. */
    public double lowestHeight() {
        return windHeight.length == 0 ? temperatureHeight[0] : Math.min(temperatureHeight[0], windHeight[0]);
    }

    /** Highest height with any level [m]. */
    public double highestHeight() {
        double highest = temperatureHeight[temperatureHeight.length - 1];
        return windHeight.length == 0 ? highest : Math.max(highest, windHeight[windHeight.length - 1]);
    }

    /**
     * Pressure at a height, ln p linear between levels.
     *
     * @param height [m]
     * @return [Pa]; NaN beyond the levels whose pressure is known
     */
    public double pressureAt(double height) {
        return Math.exp(interpolate(pressureHeight, logPressure, height));
    }

    /**
     * Height of a pressure, inverse of {@link #pressureAt}.
     *
     * @param pressure [Pa]
     * @return [m]; NaN beyond the levels whose pressure is known
     */
    public double heightOfPressure(double pressure) {
        if (!(pressure > 0)) {
            return Double.NaN;
        }
        double log = Math.log(pressure);
        int last = logPressure.length - 1;
        if (log > logPressure[0] || log < logPressure[last]) {
            return Double.NaN;
        }
        int low = 0;
        int high = last;
        while (high - low > 1) {
            int middle = (low + high) >>> 1;
            if (logPressure[middle] >= log) {
                low = middle;
            } else {
                high = middle;
            }
        }
        if (high == low) {
            return pressureHeight[low];
        }
        double weight = (logPressure[low] - log) / (logPressure[low] - logPressure[high]);
        return pressureHeight[low] + weight * (pressureHeight[high] - pressureHeight[low]);
    }

    /**
     * Flight level of a height through the ascent's own pressure, not rounded.
     *
     * @param height [m]
     * @return pressure altitude in hundreds of feet; NaN where the pressure is not known
     */
    public double flightLevelAt(double height) {
        double pressure = pressureAt(height);
        return StandardAtmosphere.covers(pressure) ? StandardAtmosphere.flightLevel(pressure) : Double.NaN;
    }

    /**
     * Height of a flight level in this ascent, inverse of {@link #flightLevelAt}.
     *
     * @return [m]; NaN beyond the levels whose pressure is known
     */
    public double heightOfFlightLevel(double flightLevel) {
        double altitude = Units.flightLevelToPressureAltitude(flightLevel);
        if (!(altitude >= StandardAtmosphere.LOWEST && altitude <= StandardAtmosphere.HIGHEST)) {
            return Double.NaN;
        }
        return heightOfPressure(StandardAtmosphere.pressure(altitude));
    }

    /** Temperature at a height [K]; NaN beyond the data and inside a gap. */
    public double temperatureAt(double height) {
        return thermodynamicAt(height, ThermodynamicLevel::temperature);
    }

    /** Dew point at a height [K]; NaN beyond the data, inside a gap, and where a bounding level has no humidity. */
    public double dewPointAt(double height) {
        return thermodynamicAt(height, ThermodynamicLevel::dewPoint);
    }

    private double thermodynamicAt(double height, ToDoubleFunction<ThermodynamicLevel> quantity) {
        if (isInside(temperatureGaps, height)) {
            return Double.NaN;
        }
        int k = segment(temperatureHeight, height);
        if (k < 0) {
            return Double.NaN;
        }
        double below = quantity.applyAsDouble(thermodynamicLevels.get(k));
        if (temperatureHeight[k] == height) {
            return below;
        }
        double weight = (height - temperatureHeight[k]) / (temperatureHeight[k + 1] - temperatureHeight[k]);
        return below + weight * (quantity.applyAsDouble(thermodynamicLevels.get(k + 1)) - below);
    }

    /** Wind at a height, components linear between levels; null beyond the data and inside a gap. */
    public @Nullable WindLevel windAt(double height) {
        int k = isInside(windGaps, height) ? -1 : segment(windHeight, height);
        if (k < 0) {
            return null;
        }
        WindLevel below = windLevels.get(k);
        if (windHeight[k] == height) {
            return below;
        }
        WindLevel above = windLevels.get(k + 1);
        double weight = (height - below.height()) / (above.height() - below.height());
        return new WindLevel(height, pressureAt(height),
                below.eastward() + weight * (above.eastward() - below.eastward()),
                below.northward() + weight * (above.northward() - below.northward()));
    }

    /** Where the balloon was at a height, linear between known positions; null beyond them. */
    public @Nullable BalloonPosition positionAt(double height) {
        int k = segment(positionHeight, height);
        if (k < 0) {
            return null;
        }
        BalloonPosition below = positions.get(k);
        if (positionHeight[k] == height) {
            return below;
        }
        BalloonPosition above = positions.get(k + 1);
        double weight = (height - positionHeight[k]) / (positionHeight[k + 1] - positionHeight[k]);
        // the shorter way round, for a balloon that crosses the date line
        double eastward = Math.IEEEremainder(above.longitude() - below.longitude(), 360);
        return new BalloonPosition(height,
                below.elapsed() + weight * (above.elapsed() - below.elapsed()),
                below.latitude() + weight * (above.latitude() - below.latitude()),
                Math.IEEEremainder(below.longitude() + weight * eastward, 360));
    }

    /** Whether a temperature gap overlaps this stretch. */
    public boolean hasTemperatureGapBetween(double base, double top) {
        return temperatureGaps.stream().anyMatch(gap -> gap.overlaps(base, top));
    }

    /** Whether a wind gap overlaps this stretch. */
    public boolean hasWindGapBetween(double base, double top) {
        return windGaps.stream().anyMatch(gap -> gap.overlaps(base, top));
    }

    private static boolean isInside(List<HeightBand> gaps, double height) {
        for (HeightBand gap : gaps) {
            if (gap.encloses(height)) {
                return true;
            }
        }
        return false;
    }

    private static double interpolate(double[] heights, double[] values, double height) {
        int k = segment(heights, height);
        if (k < 0) {
            return Double.NaN;
        }
        if (heights[k] == height) {
            return values[k];
        }
        return values[k] + (height - heights[k]) / (heights[k + 1] - heights[k]) * (values[k + 1] - values[k]);
    }

    /** Index of the level at or next below the height; −1 beyond the levels and for NaN. */
    private static int segment(double[] heights, double height) {
        int n = heights.length;
        if (n == 0 || !(height >= heights[0] && height <= heights[n - 1])) {
            return -1;
        }
        int found = Arrays.binarySearch(heights, height);
        return found >= 0 ? found : -found - 2;
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof VerticalProfile that && surfaceHeight == that.surfaceHeight
                && thermodynamicLevels.equals(that.thermodynamicLevels) && windLevels.equals(that.windLevels)
                && temperatureGaps.equals(that.temperatureGaps) && windGaps.equals(that.windGaps) && positions.equals(that.positions);
    }

    @Override
    public int hashCode() {
        return 31 * thermodynamicLevels.hashCode() + windLevels.hashCode();
    }

    @Override
    public String toString() {
        return "VerticalProfile[" + thermodynamicLevels.size() + " thermodynamic and " + windLevels.size() + " wind levels, "
                + lowestHeight() + " to " + highestHeight() + " m]";
    }
}
