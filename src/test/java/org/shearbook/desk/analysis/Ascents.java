package org.shearbook.desk.analysis;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Set;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.testing.JetAscents;

/** Decoded soundings for tests, all invented. */
public final class Ascents {

    private Ascents() {
    }

    /** An ascent of the analytic jet, released three quarters of an hour before its nominal hour. */
    public static DecodedSounding of(JetAscents jet, String stationId, Instant nominalAt) {
        return decoded(jet.reported(), stationId, nominalAt);
    }

    /** The same without its wind above the first two levels: too little to analyse. */
    public static DecodedSounding almostWithoutWind(JetAscents jet, String stationId, Instant nominalAt) {
        List<ReportedLevel> levels = jet.reported();
        return decoded(levels.stream().map(level -> levels.indexOf(level) < 2 ? level : new ReportedLevel(level.pressure(), level.height(), level.temperature(),
                level.dewPoint(), Double.NaN, Double.NaN, level.elapsed(), Double.NaN, Double.NaN, Set.of())).limit(200).toList(), stationId, nominalAt);
    }

    private static DecodedSounding decoded(List<ReportedLevel> levels, String stationId, Instant nominalAt) {
        return new DecodedSounding(stationId, 47.2, -30, 50, nominalAt, nominalAt.minus(Duration.ofMinutes(45)), Set.of(), "", "", levels,
                "invented ascent of " + stationId + " " + nominalAt, 1, List.of());
    }
}
