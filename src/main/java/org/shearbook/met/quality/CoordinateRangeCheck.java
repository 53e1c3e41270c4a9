package org.shearbook.met.quality;

/**
 * Pressure 0.1 to 1100 hPa and height −500 to 60 000 m: wider than any balloon has seen, so what is outside is a
 * fault of the message. Own limits, no source.
 */
final class CoordinateRangeCheck implements QualityCheck {

    private static final double LEAST_PRESSURE = 10;
    private static final double GREATEST_PRESSURE = 110_000;
    private static final double LEAST_HEIGHT = -500;
    private static final double GREATEST_HEIGHT = 60_000;

    @Override
    public void apply(LevelsUnderCheck sounding) {
        for (LevelsUnderCheck.Level level : sounding.levels) {
            if (level.hasPressure() && !(level.pressure >= LEAST_PRESSURE && level.pressure <= GREATEST_PRESSURE)) {
                level.flags.add(QualityFlag.PRESSURE_RANGE);
                level.pressure = Double.NaN;
            }
            if (level.hasHeight() && !isPossibleHeight(level.height)) {
                level.flags.add(QualityFlag.HEIGHT_RANGE);
                level.height = Double.NaN;
            }
            if (!level.hasPressure() && !level.hasHeight()) {
                level.refuse(QualityFlag.NO_VERTICAL_COORDINATE);
            }
        }
    }

    static boolean isPossibleHeight(double height) {
        return height >= LEAST_HEIGHT && height <= GREATEST_HEIGHT;
    }
}
