package org.shearbook.met.taylorgoldstein;

import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * What a stability analysis found. A search that could not be finished, a flow the method does not cover and a wave
 * that did not converge are results too, with the reason in words.
 */
public final class StabilityResult {

    private final @Nullable Mode fastest;
    private final GrowthMap map;
    private final MilesHoward milesHoward;
    private final boolean complete;
    private final List<String> remarks;
    private final long evaluations;
    private final StratifiedShearFlow flow;
    private final SampledFlow sampled;

    StabilityResult(@Nullable Mode fastest, GrowthMap map, MilesHoward milesHoward, boolean complete,
            List<String> remarks, long evaluations, StratifiedShearFlow flow, SampledFlow sampled) {
        this.fastest = fastest;
        this.map = map;
        this.milesHoward = milesHoward;
        this.complete = complete;
        this.remarks = List.copyOf(remarks);
        this.evaluations = evaluations;
        this.flow = flow;
        this.sampled = sampled;
    }

    /** The fastest-growing wave, re-solved on a finer grid; empty where none grows above the floor of the search. */
    public Optional<Mode> fastest() {
        return Optional.ofNullable(fastest);
    }

    /** Every growing wave of the map, by azimuth and wavenumber; made anew at each call. */
    public List<Mode> modes() {
        return map.modes(sampled);
    }

    /** Growth over azimuth and wavenumber. */
    public GrowthMap map() {
        return map;
    }

    /** The theorem of Miles and Howard for the flow analysed. */
    public MilesHoward milesHoward() {
        return milesHoward;
    }

    /**
     * Whether every counted wave was found within the work limit and the flow is one the method covers. Without it
     * {@link #remarks()} says what is missing.
     */
    public boolean complete() {
        return complete;
    }

    /** What a reader should know, in words: why nothing grows, what was not finished, what was changed in the input. */
    public List<String> remarks() {
        return remarks;
    }

    /** Evaluations of the dispersion function; one with its derivative counts as two. */
    public long evaluations() {
        return evaluations;
    }

    /** Lowest height of the flow analysed [m]. */
    public double base() {
        return flow.base();
    }

    /** Highest height of the flow analysed [m]. */
    public double top() {
        return flow.top();
    }

    /** Grid intervals between base and top in the search. */
    public int intervals() {
        return sampled.intervals;
    }

    /**
     * The vertical structure of a wave of this result on the real height axis.
     *
     * @param mode a wave of this result
     * @return vertical velocity amplitude and phase with height
     */
    public Eigenfunction eigenfunction(Mode mode) {
        return Eigenfunction.of(flow, sampled.intervals, sampled.greatestShear, mode);
    }
}
