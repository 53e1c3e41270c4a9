package org.shearbook.met.richardson;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.shearbook.met.profile.HeightBand;
import org.shearbook.met.profile.Units;

/**
 * Finds the layers of one sounding again in the next of the same station. Limits are our own choice, no source.
 *
 * <p><b>Method.</b> Two sightings may be one layer when θv at the minimum, the direction of the wind change and the gap
 * between their extents are within the limits. Among all that may, the best pair is joined first, then the best of the
 * rest: each layer at most once. θv counts first since air that moves up or down dry keeps it; where it is not known the
 * extents must overlap.
 *
 * @param temperatureLimit largest difference of θv [K], positive
 * @param directionLimit   largest difference of direction [°], positive, at most 180
 * @param gapLimit         largest gap in height between the extents [m], 0 or more
 * @param longest          longest time between soundings, positive
 */
public record LayerMatching(double temperatureLimit, double directionLimit, double gapLimit, Duration longest) {

    /** 4 K, 60°, 1000 m, 24 hours. */
    public static final LayerMatching DEFAULT = new LayerMatching(4, 60, 1000, Duration.ofHours(24));

    public LayerMatching {
        if (!(temperatureLimit > 0) || !(directionLimit > 0 && directionLimit <= 180) || !(gapLimit >= 0)
                || Double.isInfinite(temperatureLimit) || Double.isInfinite(gapLimit) || longest.isNegative() || longest.isZero()) {
            throw new IllegalArgumentException("matching needs positive limits, not " + temperatureLimit + " K, " + directionLimit
                    + "°, " + gapLimit + " m, " + longest);
        }
    }

    /**
     * Two sightings of one layer.
     *
     * @param earlier index into the earlier list
     * @param later   index into the later list
     * @param misfit  0 for the same, 1 where one criterion is at its limit
     */
    public record Link(int earlier, int later, double misfit) {
    }

    /**
     * Joins the layers of two soundings of one station.
     *
     * @param earlier layers of the earlier sounding
     * @param later   layers of the later sounding
     * @return by index in {@code later}; layers that appear or vanish are in none
     */
    public List<Link> join(List<LayerSighting> earlier, List<LayerSighting> later) {
        List<Link> candidates = new ArrayList<>();
        for (int i = 0; i < earlier.size(); i++) {
            for (int j = 0; j < later.size(); j++) {
                double misfit = misfit(earlier.get(i), later.get(j));
                if (!Double.isNaN(misfit)) {
                    candidates.add(new Link(i, j, misfit));
                }
            }
        }
        candidates.sort(Comparator.comparingDouble(Link::misfit).thenComparingInt(Link::earlier).thenComparingInt(Link::later));
        boolean[] earlierTaken = new boolean[earlier.size()];
        boolean[] laterTaken = new boolean[later.size()];
        List<Link> links = new ArrayList<>();
        for (Link link : candidates) {
            if (!earlierTaken[link.earlier] && !laterTaken[link.later]) {
                earlierTaken[link.earlier] = true;
                laterTaken[link.later] = true;
                links.add(link);
            }
        }
        links.sort(Comparator.comparingInt(Link::later));
        return List.copyOf(links);
    }

    /** Root mean square of the three differences over their limits; NaN when they can't be one layer. */
    private double misfit(LayerSighting earlier, LayerSighting later) {
        Duration between = Duration.between(earlier.at(), later.at());
        if (between.isNegative() || between.isZero() || between.compareTo(longest) > 0) {
            return Double.NaN;
        }
        double temperature = Math.abs(later.virtualPotentialTemperature() - earlier.virtualPotentialTemperature()) / temperatureLimit;
        double turned = Math.abs(Math.IEEEremainder(later.shearDirection() - earlier.shearDirection(), 360)) / directionLimit;
        double gap = Math.max(later.extent().base(), earlier.extent().base()) - Math.min(later.extent().top(), earlier.extent().top());
        boolean known = !Double.isNaN(temperature);
        if (temperature > 1 || turned > 1 || gap > (known ? gapLimit : 0)) {
            return Double.NaN;
        }
        // overlap of the thinner layer: 0 misfit when it lies wholly inside the other, 1 at the largest gap
        double thinner = Math.min(earlier.extent().depth(), later.extent().depth());
        double apart = gap < 0 ? 0.5 * (1 - Math.min(1, -gap / thinner)) : 0.5 + 0.5 * gap / Math.max(1, gapLimit);
        double t = known ? temperature : 0.5;
        double d = Double.isNaN(turned) ? 0.5 : turned;
        return Math.sqrt((t * t + d * d + apart * apart) / 3);
    }

    /**
     * Looks for the air of an earlier layer in a sounding that shows no layer there: where has its smallest Ri gone?
     *
     * <p><b>Method.</b> Among the heights within the gap limit of the earlier extent whose θv is within the limit of the
     * earlier one, the one with the smallest Ri. Where the earlier θv is not known, the earlier extent is searched.
     *
     * @param earlier the layer as last seen
     * @param profile the later sounding, analysed
     * @param at      its time
     * @return a sighting of that air, with the earlier depth around the minimum; empty where nothing is known there
     */
    public Optional<LayerSighting> trace(LayerSighting earlier, RichardsonProfile profile, Instant at) {
        boolean byTemperature = !Double.isNaN(earlier.virtualPotentialTemperature());
        double reach = byTemperature ? gapLimit : 0;
        double[] z = profile.heights();
        double[] ri = profile.richardsonNumber();
        int least = -1;
        for (int i = 0; i < z.length; i++) {
            if (z[i] < earlier.extent().base() - reach || z[i] > earlier.extent().top() + reach || Double.isNaN(ri[i])) {
                continue;
            }
            double apart = Math.abs(LayerSighting.thetaV(profile.profile(), z[i]) - earlier.virtualPotentialTemperature());
            if (byTemperature && !(apart <= temperatureLimit)) {
                continue;
            }
            if (least < 0 || ri[i] < ri[least]) {
                least = i;
            }
        }
        if (least < 0) {
            return Optional.empty();
        }
        double half = earlier.extent().depth() / 2;
        HeightBand extent = new HeightBand(z[least] - half, z[least] + half);
        RoundedFlow flow = profile.flowAt(z[least]);
        double direction = Double.NaN;
        if (flow != null) {
            double du = flow.eastward().firstDerivative(z[least]);
            double dv = flow.northward().firstDerivative(z[least]);
            direction = du == 0 && dv == 0 ? Double.NaN : Units.towardsDirection(du, dv);
        }
        return Optional.of(new LayerSighting(at, extent, z[least], LayerSighting.thetaV(profile.profile(), z[least]), direction, ri[least], false));
    }
}
