package org.shearbook.met.richardson;

/**
 * {@code P(Ri < ¼)} at the height of a layer's smallest Ri, or why it is unknown.
 *
 * @param probability    [1]; NaN when unknown
 * @param height         at which it holds [m]
 * @param unknownBecause in words; empty when known
 */
public record LayerProbability(double probability, double height, String unknownBecause) {

    public LayerProbability {
        if (Double.isNaN(probability) == unknownBecause.isEmpty() || probability < 0 || probability > 1) {
            throw new IllegalArgumentException("a probability is from 0 to 1, or unknown for a reason, not " + probability
                    + " because of \"" + unknownBecause + "\"");
        }
    }

    static LayerProbability unknown(double height, String because) {
        return new LayerProbability(Double.NaN, height, because);
    }

    public boolean isKnown() {
        return unknownBecause.isEmpty();
    }
}
