package org.shearbook.desk.forecast;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.layer.Layer;
import org.shearbook.desk.layer.LayerBook;
import org.shearbook.desk.layer.LayerId;
import org.shearbook.desk.shell.Show;
import org.shearbook.desk.station.StationBook;
import org.springframework.stereotype.Component;

/**
 * Fills what a layer already says into a new draft, so that only judgement is left to type. Intensity, probability and
 * what would change the forecast are judgement and stay empty.
 */
@Component
public class LayerPrefill {

    private static final double KNOT = 1852.0 / 3600;

    private final LayerBook layers;
    private final StationBook stations;
    private final EvidenceList evidence;
    private final Clock clock;
    private final Show show;
    private final ForecastSettings settings;

    LayerPrefill(LayerBook layers, StationBook stations, EvidenceList evidence, Clock clock, Show show, ForecastSettings settings) {
        this.layers = layers;
        this.stations = stations;
        this.evidence = evidence;
        this.clock = clock;
        this.show = show;
        this.settings = settings;
    }

    /**
     * What a layer gives.
     *
     * @param fields text by field name
     * @param from   where it came from: {@code from Kelbrith 1152Z layer A}
     */
    public record Filled(Map<String, String> fields, String from) {
    }

    /** The fields of a draft for this layer; empty when there is no such layer. */
    public Optional<Filled> of(long layerId) {
        return layers.find(new LayerId(layerId), AsKnownAt.now()).map(this::of);
    }

    private Filled of(Layer layer) {
        Map<String, String> fields = new LinkedHashMap<>();
        fields.put(DraftFields.PLACE_NAME, layer.stationName());
        fields.put(DraftFields.AREA, "RADIUS");
        if (stations.find(layer.stationId(), AsKnownAt.now()).isPresent()) {
            fields.put(DraftFields.CENTRE, layer.stationId());
        } else if (layer.latitude() != null && layer.longitude() != null) {
            fields.put(DraftFields.CENTRE, DraftFields.position(layer.latitude(), layer.longitude()));
        }
        fields.put(DraftFields.RADIUS, Integer.toString(settings.radiusNm()));
        if (layer.baseFlightLevel() != null && layer.topFlightLevel() != null) {
            // outward to the steps of a forecast: a layer of a few hundred feet never becomes an empty one
            int base = (int) Math.floor(layer.baseFlightLevel() / 10) * 10;
            fields.put(DraftFields.BASE, "%03d".formatted(base));
            fields.put(DraftFields.TOP, "%03d".formatted(Math.max(base + 10, (int) Math.ceil(layer.topFlightLevel() / 10) * 10)));
        }
        Instant from = nextTenMinutes(clock.instant());
        fields.put(DraftFields.FROM, DraftFields.minute(from));
        fields.put(DraftFields.UNTIL, DraftFields.minute(from.plus(settings.longest())));
        Movement movement = Movement.toward(layer.meanWindFromDirection() + 180, layer.meanWind() / KNOT);
        fields.put(DraftFields.TOWARD, movement.toward());
        if (!movement.isStationary()) {
            fields.put(DraftFields.SPEED, Integer.toString(Math.min(150, movement.speed())));
        }
        fields.put(DraftFields.EVIDENCE, evidence.of(layer).ticked());
        return new Filled(fields, "from %s %s layer %s".formatted(layer.stationName(), show.utc(layer.observedAt()), layer.letter()));
    }

    private static Instant nextTenMinutes(Instant now) {
        Instant minute = now.truncatedTo(ChronoUnit.MINUTES);
        long over = minute.getEpochSecond() / 60 % 10;
        return minute.equals(now) && over == 0 ? minute : minute.plus(Duration.ofMinutes(10 - over));
    }
}
