package org.shearbook.met.billow;

import java.util.Locale;
import java.util.function.DoubleFunction;

/**
 * Turbulence of breaking billows as an eddy dissipation rate, always a range. Rates are {@code ε^⅓} [m^⅔ s⁻¹], given to
 * two decimals and no more: what is left out would be invented.
 *
 * @param low    mean of the event when it is spread over the longest time and the least depth is mixed
 * @param middle mean of the event
 * @param high   peak inside the event, dissipation ten times the greatest mean
 * @param basis  sentence that stands beside the range
 */
public record TurbulenceEstimate(double low, double middle, double high, String basis) {

    /*
     * A straight-line layer that mixes from h₀ to h_f, per unit area and mass density,
     *
     *   loses      ΔKE = ΔU² (h_f − h₀)/12,
     *   raises     ΔPE = ΔB (h_f² − h₀²)/24,      ΔB = Ri₀ ΔU²/h₀, the buoyancy change across the layer,
     *   dissipates ΔKE − ΔPE,  at the mean rate ε = (ΔKE − ΔPE)/(h_f T),  T one to two times 5 λ/ΔU.
     *
     * Derived here; the ratio ΔPE/ΔKE is 0.21 at Ri₀ = 0.1, a mixing efficiency close to the usual 0.2 (Osborn 1980,
     * J. Phys. Oceanogr. 10, 83; Peltier and Caulfield 2003, Annu. Rev. Fluid Mech. 35, 135). Peaks inside a turbulent patch
     * dissipate 3 to 10 times the mean: from memory, our own choice.
     */

    private static final double PEAK_OVER_MEAN = 10;

    public TurbulenceEstimate {
        if (!(low >= 0) || !(middle >= low) || !(high >= middle) || Double.isInfinite(high)) {
            throw new IllegalArgumentException("a turbulence range must rise from 0 or more, not " + low + ", " + middle + ", " + high);
        }
    }

    /**
     * The range for the billows of a layer.
     *
     * <p><b>Limits.</b> Only if the billows grow and break. Dissipation is known to a factor of ten, its cube root to a
     * factor of two. What an aircraft feels depends on its size and speed as well.
     *
     * @param billows expected billows
     */
    public static TurbulenceEstimate of(BillowEstimate billows) {
        double time = billows.laboratoryTime();
        double shortest = meanDissipation(billows, billows.height(), time);
        double longest = meanDissipation(billows, billows.height(), 2 * time);
        double least = Math.min(longest, meanDissipation(billows, billows.lowHeight(), 2 * time));
        double greatest = Math.max(shortest, meanDissipation(billows, billows.highHeight(), time));
        String basis = "Mean over the break-up of the billows to a peak within it, from the energy the wind loses when the layer mixes to a"
                + " Richardson number of " + BillowEstimate.FINAL_RICHARDSON + ". Wave: " + billows.wave().basis()
                + ". Only if they grow and break; uncertain by a factor of two.";
        return new TurbulenceEstimate(rounded(Math.cbrt(least)), rounded(Math.cbrt(Math.sqrt(shortest * longest))),
                rounded(Math.cbrt(PEAK_OVER_MEAN * greatest)), basis);
    }

    /**
     * Mean dissipation ε of the mixing event.
     *
     * @param billows    expected billows
     * @param mixedDepth h_f [m], at least the initial depth
     * @param duration   T [s], positive
     * @return ε [m² s⁻³], 0 or more
     */
    static double meanDissipation(BillowEstimate billows, double mixedDepth, double duration) {
        double change2 = billows.windChange() * billows.windChange();
        double h0 = billows.initialDepth();
        double kinetic = change2 * (mixedDepth - h0) / 12;
        double potential = billows.richardsonNumber() * change2 / h0 * (mixedDepth * mixedDepth - h0 * h0) / 24;
        return Math.max(0, kinetic - potential) / (mixedDepth * duration);
    }

    private static double rounded(double edr) {
        return Math.round(edr * 100) / 100.0;
    }

    /**
     * The range in words with its figures and the edition of the class table, such as
     * "0.12-0.32, light to moderate (edition)".
     *
     * @param wordOf  the class of a rate, by a table of one edition
     * @param edition of that table
     */
    public String inWords(DoubleFunction<String> wordOf, String edition) {
        String least = wordOf.apply(low);
        String most = wordOf.apply(high);
        String words = least.equals(most) ? least : least + " to " + most;
        return String.format(Locale.ROOT, "%.2f-%.2f, %s (%s)", low, high, words, edition);
    }
}
