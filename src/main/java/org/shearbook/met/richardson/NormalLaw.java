package org.shearbook.met.richardson;

import org.apache.commons.math3.special.Erf;

/** The standard normal law from a table: error below 2e-9, for sums over many levels. */
final class NormalLaw {

    private static final double REACH = 6;
    private static final int ENTRIES_PER_WIDTH = 256;
    private static final double[] DISTRIBUTION = new double[(int) (2 * REACH) * ENTRIES_PER_WIDTH + 1];
    private static final double[] DENSITY = new double[DISTRIBUTION.length];

    static {
        for (int i = 0; i < DISTRIBUTION.length; i++) {
            double q = (double) i / ENTRIES_PER_WIDTH - REACH;
            DENSITY[i] = Math.exp(-0.5 * q * q) / Math.sqrt(2 * Math.PI);
            DISTRIBUTION[i] = 0.5 * Erf.erfc(-q / Math.sqrt(2));
        }
    }

    private NormalLaw() {
    }

    /** Φ(q); 0 and 1 beyond six standard deviations. */
    static double distribution(double q) {
        if (!(q > -REACH)) {
            return Double.isNaN(q) ? q : 0;
        }
        if (q >= REACH) {
            return 1;
        }
        int entry = (int) ((q + REACH) * ENTRIES_PER_WIDTH + 0.5);
        double node = (double) entry / ENTRIES_PER_WIDTH - REACH;
        double t = q - node;
        // second-order step: Φ' = G, G' = −qG
        return DISTRIBUTION[entry] + DENSITY[entry] * t * (1 - t * (0.5 * node - t * (node * node - 1) / 6));
    }
}
