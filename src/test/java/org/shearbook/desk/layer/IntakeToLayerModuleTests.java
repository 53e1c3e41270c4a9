package org.shearbook.desk.layer;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.analysis.Analysis;
import org.shearbook.desk.analysis.AnalysisBook;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditEntry;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.intake.Arrival;
import org.shearbook.desk.intake.Channel;
import org.shearbook.desk.intake.IntakeDoor;
import org.shearbook.desk.intake.TakenIn;
import org.shearbook.desk.sounding.Sounding;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.met.decode.ReportedLevel;
import org.shearbook.testing.JetAscents;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.transaction.support.TransactionTemplate;

/** From bytes to layers and the audit chain, through every room on the way. */
@OnH2
class IntakeToLayerModuleTests {

    @Autowired IntakeDoor door;
    @Autowired SoundingArchive soundings;
    @Autowired AnalysisBook analyses;
    @Autowired LayerBook layers;
    @Autowired AuditTrail audit;
    @Autowired TransactionTemplate transaction;
    @Autowired JdbcTemplate jdbc;

    private static final Actor B = Actor.named("forecaster-b", "FORECASTER", true, "WS-1");

    @Test
    void oneActKeepsSoundingAnalysisLayersAndOneEntryAtOneMoment() {
        TakenIn taken = door.takeIn(B, List.of(new Arrival("kel.csv", csv("IL-A", 1))), Channel.UPLOAD);
        assertThat(taken.queued()).isEmpty();
        SoundingId id = new SoundingId(taken.accepted().get(0).id());
        Sounding sounding = soundings.find(id, AsKnownAt.now()).orElseThrow();
        Analysis analysis = analyses.of(id, AsKnownAt.now()).orElseThrow();
        List<Layer> found = layers.ofSounding(id, AsKnownAt.now());
        assertThat(found).hasSize(analysis.result().orElseThrow().layers().size()).isNotEmpty();
        assertThat(analysis.summary().recordedAt()).isEqualTo(sounding.recordedAt());
        assertThat(found).allSatisfy(layer -> assertThat(layer.recordedAt()).isEqualTo(sounding.recordedAt()));
        assertThat(audit.newest(AsKnownAt.now(), null, 50)).filteredOn(entry -> entry.recordedAt().equals(sounding.recordedAt()))
                .singleElement().extracting(AuditEntry::act).isEqualTo("messages taken in");
        assertThat(audit.integrity().whatIsBroken()).isNull();
    }

    @Test
    void aSoundingThatCannotBeAnalysedStopsNothing() {
        TakenIn taken = door.takeIn(B, List.of(new Arrival("thin.csv", csv("IL-B", 900)), new Arrival("kel.csv", csv("IL-C", 1))), Channel.UPLOAD);
        assertThat(taken.accepted()).hasSize(2);
        List<Analysis> kept = taken.accepted().stream().map(one -> analyses.of(new SoundingId(one.id()), AsKnownAt.now()).orElseThrow()).toList();
        assertThat(kept.get(0).summary().notAnalysed()).isNotBlank();
        assertThat(kept.get(1).result()).isPresent();
    }

    @Test
    void anActThatFailsLaterLeavesNeitherAnalysisNorLayers() {
        long analysesBefore = count("analysis_version");
        long layersBefore = count("layer_version");
        assertThatThrownBy(() -> transaction.executeWithoutResult(status -> {
            door.takeIn(B, List.of(new Arrival("kel.csv", csv("IL-D", 1))), Channel.UPLOAD);
            throw new IllegalStateException("power failed");
        })).hasMessage("power failed");
        assertThat(count("analysis_version")).isEqualTo(analysesBefore);
        assertThat(count("layer_version")).isEqualTo(layersBefore);
    }

    private long count(String table) {
        return jdbc.queryForObject("select count(*) from " + table, Long.class);
    }

    /** Every {@code step}th level of an invented ascent with a subcritical layer. */
    private static byte[] csv(String station, int step) {
        StringBuilder text = new StringBuilder("# station_id=%s\n# latitude_deg=47.2\n# longitude_deg=-30\n# station_elevation_m=50\n".formatted(station))
                .append("# launch_time=").append(Instant.parse("2030-10-05T11:15:00Z")).append('\n')
                .append("pressure_hPa,geopotential_height_m,temperature_C,wind_direction_deg,wind_speed_ms\n");
        int k = 0;
        for (ReportedLevel level : JetAscents.KELBRITH_DAY_2_12.reported()) {
            if (k++ % step == 0) {
                text.append(String.format(Locale.ROOT, "%.3f,%.1f,%.3f,%.2f,%.3f%n", level.pressure() / 100, level.height(), level.temperature() - 273.15,
                        level.windFromDirection(), level.windSpeed()));
            }
        }
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }
}
