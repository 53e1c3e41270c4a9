package org.shearbook.desk.analysis;

/**
 * How the spread of growth over the instrument's errors is asked for. A member costs a few milliseconds per layer, so it
 * is worked out when asked for and not kept.
 *
 * @param members copies of the ascent, 1 to {@value #MOST_MEMBERS}
 * @param seed    of the random numbers: the same seed gives the same copies
 */
public record EnsembleRequest(int members, long seed) {

    public static final int MOST_MEMBERS = 200;

    public EnsembleRequest {
        if (members < 1 || members > MOST_MEMBERS) {
            throw new IllegalArgumentException("ensembleMembers is 1 to %d, not %d.".formatted(MOST_MEMBERS, members));
        }
    }
}
