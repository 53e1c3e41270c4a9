package org.shearbook.met.billow;

import java.util.Optional;
import org.shearbook.met.richardson.ShearLayer;
import org.shearbook.met.taylorgoldstein.Mode;

/**
 * The growing wave of a layer that everything about its billows is worked out from, and how it was found.
 *
 * @param wavelength   [m], positive
 * @param growthRate   σ [s⁻¹], positive
 * @param azimuth      of the wave vector [° clockwise from north]
 * @param phaseSpeed   along the azimuth, over the ground [m s⁻¹]
 * @param solved       whether it comes from a solved stability problem; else from the depth rule
 * @param basis        words that stand beside every number worked out from it
 */
public record BillowWave(double wavelength, double growthRate, double azimuth, double phaseSpeed, boolean solved, String basis) {

    /** Basis of a wave that was solved for. */
    public static final String SOLVED = "solved for this profile";

    /** e-foldings needed before an instability shows: while fewer fit, shear passes before billows form. */
    public static final double EFOLDINGS_NEEDED = 5;

    public BillowWave {
        if (!(wavelength > 0) || !(growthRate > 0) || Double.isInfinite(wavelength) || Double.isInfinite(growthRate)
                || !Double.isFinite(azimuth) || !Double.isFinite(phaseSpeed)) {
            throw new IllegalArgumentException("a wave needs positive wavelength and growth and a finite direction and speed, not "
                    + wavelength + " m, " + growthRate + " 1/s, " + azimuth + "°, " + phaseSpeed + " m/s");
        }
    }

    /** A solved wave. */
    public static BillowWave of(Mode mode) {
        return new BillowWave(mode.wavelength(), mode.growthRate(), mode.azimuth(), mode.phaseSpeed(), true,
                mode.converged() ? SOLVED : SOLVED + ", not converged: " + mode.reason());
    }

    /**
     * The wave of a layer for which none was solved, by {@link DepthRule}: along the wind change, carried by the mean wind
     * of the layer.
     *
     * @return empty when the layer is stable by the rule
     */
    public static Optional<BillowWave> byRule(ShearLayer layer) {
        return byRule(layer, DepthRule.BASIS);
    }

    static Optional<BillowWave> byRule(ShearLayer layer, String basis) {
        BillowScales scales = DepthRule.of(layer);
        if (scales.stable()) {
            return Optional.empty();
        }
        double along = layer.windChange();
        double carried = (layer.meanEastward() * layer.eastwardChange() + layer.meanNorthward() * layer.northwardChange()) / along;
        return Optional.of(new BillowWave(scales.wavelength(), scales.growthRate(), layer.windChangeDirection(), carried, false, basis));
    }

    /** e-folding time 1/σ [s]. */
    public double eFoldingTime() {
        return 1 / growthRate;
    }

    /**
     * Whether the wave has time to grow: {@code σ T > 5}. Source: Barad and Fringer 2010, J. Fluid Mech. 644, 61, for
     * shear driven by internal waves.
     *
     * @param unstableFor T, how long the layer stays unstable [s], 0 or more
     * @throws IllegalArgumentException if the time is negative or NaN
     */
    public boolean hasTimeToGrow(double unstableFor) {
        if (!(unstableFor >= 0)) {
            throw new IllegalArgumentException("the time a layer stays unstable must be 0 or more, not " + unstableFor + " s");
        }
        return growthRate * unstableFor > EFOLDINGS_NEEDED;
    }

    /**
     * Time between two crests at a point fixed to the ground, {@code λ/|c|}.
     *
     * @return [s]; +∞ when the wave stands still over the ground
     */
    public double passingIntervalAtFixedPoint() {
        return wavelength / Math.abs(phaseSpeed);
    }

    /**
     * Time between two crests for an aircraft holding a track, {@code λ / |V_g cos δ − c|}, V_g its speed over the ground
     * and δ the angle between track and wave vector. Heading is corrected for the wind so that the track is held.
     *
     * <p><b>Limits.</b> Along the crests the interval is without end: then only the small-scale turbulence is met.
     *
     * @param trueAirspeed  [m s⁻¹], positive
     * @param track         over the ground [° clockwise from north]
     * @param windEastward  at the aircraft [m s⁻¹]
     * @param windNorthward at the aircraft [m s⁻¹]
     * @return [s], positive; +∞ along the crests; NaN when the track can't be held in this wind
     * @throws IllegalArgumentException if the airspeed is not positive or an argument not finite
     */
    public double passingInterval(double trueAirspeed, double track, double windEastward, double windNorthward) {
        if (!(trueAirspeed > 0) || Double.isInfinite(trueAirspeed) || !Double.isFinite(track) || !Double.isFinite(windEastward)
                || !Double.isFinite(windNorthward)) {
            throw new IllegalArgumentException("a passing interval needs a positive airspeed, a track and a wind, not " + trueAirspeed
                    + " m/s, " + track + "°, wind " + windEastward + ", " + windNorthward + " m/s");
        }
        double east = Math.sin(Math.toRadians(track));
        double north = Math.cos(Math.toRadians(track));
        double tail = windEastward * east + windNorthward * north;
        double cross = windEastward * north - windNorthward * east;
        if (Math.abs(cross) >= trueAirspeed) {
            return Double.NaN;
        }
        double overGround = Math.sqrt(trueAirspeed * trueAirspeed - cross * cross) + tail;
        if (overGround <= 0) {
            return Double.NaN;
        }
        double across = overGround * Math.cos(Math.toRadians(track - azimuth)) - phaseSpeed;
        // below a millimetre per second nobody would ever meet a second crest
        return Math.abs(across) < 1e-3 ? Double.POSITIVE_INFINITY : wavelength / Math.abs(across);
    }
}
