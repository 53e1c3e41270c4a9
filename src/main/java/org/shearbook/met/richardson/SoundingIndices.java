package org.shearbook.met.richardson;

import java.util.Arrays;
import java.util.List;
import java.util.function.IntToDoubleFunction;
import org.shearbook.met.profile.Units;
import org.shearbook.met.richardson.SoundingIndex.Orientation;

/**
 * Turbulence indices that one ascent is enough for, each at every height of the grid. Wind, shear, N² and Ri are those of
 * the {@link RichardsonProfile}, for its window; wind changes are over exactly 1000 ft, from the winds as reported.
 *
 * <p>Not here: indices with horizontal gradients (deformation, tendency of Ri), which one balloon cannot give; and the
 * index of Marroquin (1998), whose constants we have only from memory.
 */
public final class SoundingIndices {

    /** Ri at which the index of Colson and Panofsky changes sign [1]. */
    public static final double COLSON_PANOFSKY_CRITICAL = 0.5;

    /** Eddy viscosity prescribed for the steady balance [m² s⁻¹]: our own choice, it only scales the index. */
    public static final double EDDY_VISCOSITY = 1;

    /** Turbulent Prandtl number of the steady balance [1]. */
    public static final double PRANDTL = 1;

    /** Ri at which mixing stops, for the energy available [1]; laboratory and simulation, from memory. */
    public static final double FINAL_RICHARDSON = 0.32;

    private static final double CALM = 0.1;

    private final RichardsonProfile profile;
    private final double[] z;
    private final double[] u;
    private final double[] v;
    private final double[] s2;
    private final double[] n2;
    private final double[] ri;
    private final double[] shear;
    private final double[] du;
    private final double[] dv;
    private final double[] curvatureU;
    private final double[] curvatureV;

    private SoundingIndices(RichardsonProfile profile) {
        this.profile = profile;
        z = profile.heights();
        u = profile.eastward();
        v = profile.northward();
        s2 = profile.shearSquared();
        n2 = profile.measuredBuoyancyFrequencySquared();
        ri = profile.measuredRichardsonNumber();
        shear = profile.shearOverThousandFeet();
        du = new double[z.length];
        dv = new double[z.length];
        curvatureU = new double[z.length];
        curvatureV = new double[z.length];
        for (double[] column : List.of(du, dv, curvatureU, curvatureV)) {
            Arrays.fill(column, Double.NaN);
        }
        for (RoundedFlow flow : profile.flows()) {
            int from = 0;
            while (from < z.length && z[from] < flow.extent().base()) {
                from++;
            }
            int to = from;
            while (to < z.length && z[to] <= flow.extent().top()) {
                to++;
            }
            double[] heights = Arrays.copyOfRange(z, from, to);
            double[][] east = new double[3][heights.length];
            double[][] north = new double[3][heights.length];
            flow.eastward().derivatives(heights, east);
            flow.northward().derivatives(heights, north);
            System.arraycopy(east[1], 0, du, from, heights.length);
            System.arraycopy(north[1], 0, dv, from, heights.length);
            System.arraycopy(east[2], 0, curvatureU, from, heights.length);
            System.arraycopy(north[2], 0, curvatureV, from, heights.length);
        }
    }

    /**
     * All indices of one ascent. Cost O(heights).
     *
     * @param profile      the ascent analysed for one window
     * @param waveAzimuth  direction for the Scorer parameter [° clockwise from north]
     * @return vertical wind shear, Ri, Colson–Panofsky, Endlich, steady dissipation, Scorer parameter, available energy,
     *         in this order
     * @throws IllegalArgumentException if the azimuth is not finite
     */
    public static List<SoundingIndex> of(RichardsonProfile profile, double waveAzimuth) {
        if (!Double.isFinite(waveAzimuth)) {
            throw new IllegalArgumentException("the Scorer parameter needs a direction, not " + waveAzimuth);
        }
        SoundingIndices indices = new SoundingIndices(profile);
        return List.of(indices.verticalWindShear(), indices.richardsonNumber(), indices.colsonPanofsky(), indices.endlich(),
                indices.steadyDissipation(), indices.scorer(waveAzimuth), indices.availableEnergy());
    }

    private SoundingIndex verticalWindShear() {
        return each("Vertical wind shear", "VWS", "kt/1000 ft", "|V(z + 500 ft) − V(z − 500 ft)|", Orientation.HIGHER_IS_MORE_TURBULENT,
                "practice of the trade: light 3-5, moderate 6-9, severe 10-15, extreme above 15, for layers as coarse charts show them",
                i -> Units.perSecondToKnotsPerThousandFeet(shear[i]));
    }

    private SoundingIndex richardsonNumber() {
        return each("Gradient Richardson number", "Ri", "1", "N² / S², window " + Math.round(profile.window()) + " m",
                Orientation.LOWER_IS_MORE_TURBULENT, "Richardson 1920, Proc. R. Soc. A 97, 354; Miles 1961 and Howard 1961, J. Fluid Mech. 10, 496 and 509",
                i -> ri[i]);
    }

    private SoundingIndex colsonPanofsky() {
        return each("Colson–Panofsky index", "CP", "kt²", "ΔV² (1 − Ri/" + COLSON_PANOFSKY_CRITICAL + "), ΔV over 1000 ft",
                Orientation.HIGHER_IS_MORE_TURBULENT, "Colson and Panofsky 1965, Q. J. R. Meteorol. Soc. 91, 507; thresholds depend on the depth",
                i -> {
                    double change = Units.perSecondToKnotsPerThousandFeet(shear[i]);
                    return change * change * (1 - ri[i] / COLSON_PANOFSKY_CRITICAL);
                });
    }

    private SoundingIndex endlich() {
        return each("Endlich index", "E", "s⁻¹", "|V| |dα/dz| = |V × dV/dz| / |V|; no value in calm below " + CALM + " m/s",
                Orientation.HIGHER_IS_MORE_TURBULENT, "Endlich 1964, J. Appl. Meteorol. 3, 261",
                i -> {
                    double speed = Math.hypot(u[i], v[i]);
                    return speed < CALM ? Double.NaN : Math.abs(u[i] * dv[i] - v[i] * du[i]) / speed;
                });
    }

    private SoundingIndex steadyDissipation() {
        return each("Dissipation of steady turbulence", "ε_K", "m² s⁻³",
                "K (S² − N²/Pr), K = " + EDDY_VISCOSITY + " m²/s, Pr = " + PRANDTL + "; negative where turbulence would die out",
                Orientation.HIGHER_IS_MORE_TURBULENT, "textbook balance of shear production, buoyancy and dissipation; K our own choice",
                i -> EDDY_VISCOSITY * (s2[i] - n2[i] / PRANDTL));
    }

    private SoundingIndex scorer(double azimuth) {
        double east = Math.sin(Math.toRadians(azimuth));
        double north = Math.cos(Math.toRadians(azimuth));
        return each("Scorer parameter", "l²", "m⁻²", "N²/U² − U″/U along " + Math.round(azimuth) + "°; no value where |U| is below " + CALM + " m/s",
                Orientation.NOT_A_MEASURE_OF_TURBULENCE,
                "Scorer 1949, Q. J. R. Meteorol. Soc. 75, 41; waves are trapped where it falls with height",
                i -> {
                    double along = u[i] * east + v[i] * north;
                    double curvature = curvatureU[i] * east + curvatureV[i] * north;
                    return Math.abs(along) < CALM ? Double.NaN : n2[i] / (along * along) - curvature / along;
                });
    }

    private SoundingIndex availableEnergy() {
        return each("Energy available to billows", "A", "m² s⁻²",
                "ΔV²/12 (1 − Ri/" + FINAL_RICHARDSON + "), ΔV over 1000 ft; 0 where Ri is " + FINAL_RICHARDSON + " or more; Ri below 0 counts as 0",
                Orientation.HIGHER_IS_MORE_TURBULENT, "energy budget of a layer that mixes until Ri has risen to that value; derived here, no other authority",
                i -> {
                    double change = shear[i] * Units.THOUSAND_FEET;
                    return Double.isNaN(ri[i]) ? Double.NaN : change * change / 12 * Math.max(0, 1 - Math.max(0, ri[i]) / FINAL_RICHARDSON);
                });
    }

    private SoundingIndex each(String name, String symbol, String unit, String formula, Orientation orientation, String source, IntToDoubleFunction at) {
        double[] values = new double[z.length];
        for (int i = 0; i < values.length; i++) {
            double value = at.applyAsDouble(i);
            // zero over zero in calm unsheared air and the like: missing, never infinite
            values[i] = Double.isInfinite(value) ? Double.NaN : value;
        }
        return new SoundingIndex(name, symbol, unit, formula, orientation, source, z, values);
    }
}
