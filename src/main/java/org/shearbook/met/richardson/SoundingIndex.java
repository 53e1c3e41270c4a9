package org.shearbook.met.richardson;

import java.util.Arrays;

/**
 * One turbulence index of one ascent, at the heights of its {@link RichardsonProfile}.
 *
 * @param name        in words
 * @param symbol      as it stands in formulas
 * @param unit        of the values
 * @param formula     with the numbers in use
 * @param orientation which way means more turbulence
 * @param source      where it comes from
 * @param heights     [m], shape {@code [n]}; a copy
 * @param values      shape {@code [n]}; NaN where it cannot be worked out; a copy
 */
public record SoundingIndex(
        String name, String symbol, String unit, String formula, Orientation orientation, String source, double[] heights, double[] values) {

    /** Stable names. */
    public enum Orientation {
        HIGHER_IS_MORE_TURBULENT,
        LOWER_IS_MORE_TURBULENT,
        /** Describes something else and is not to be scored against turbulence. */
        NOT_A_MEASURE_OF_TURBULENCE
    }

    public SoundingIndex {
        if (heights.length != values.length) {
            throw new IllegalArgumentException(symbol + ": " + values.length + " values do not fit " + heights.length + " heights");
        }
        heights = heights.clone();
        values = values.clone();
    }

    @Override
    public double[] heights() {
        return heights.clone();
    }

    @Override
    public double[] values() {
        return values.clone();
    }

    /**
     * The value at a height, linear between the heights of the grid.
     *
     * @param height [m]
     * @return NaN beyond the grid or beside a missing value
     */
    public double at(double height) {
        int n = heights.length;
        if (n == 0 || !(height >= heights[0] && height <= heights[n - 1])) {
            return Double.NaN;
        }
        int found = Arrays.binarySearch(heights, height);
        if (found >= 0) {
            return values[found];
        }
        int above = -found - 1;
        double weight = (height - heights[above - 1]) / (heights[above] - heights[above - 1]);
        return values[above - 1] + weight * (values[above] - values[above - 1]);
    }
}
