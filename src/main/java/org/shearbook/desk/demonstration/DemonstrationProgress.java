package org.shearbook.desk.demonstration;

import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import org.springframework.context.annotation.Profile;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.stereotype.Component;

/** How far the play has come, and when its clock began to run. */
@Component
@Profile("demo")
class DemonstrationProgress {

    private static final int THE_CLOCK = 1;

    private final JdbcTemplate jdbc;

    DemonstrationProgress(JdbcTemplate jdbc) {
        this.jdbc = jdbc;
    }

    int stepsPlayed() {
        Integer count = jdbc.queryForObject("select count(*) from demonstration_step", Integer.class);
        return count == null ? 0 : count;
    }

    void played(int step, Instant at) {
        jdbc.update("insert into demonstration_step (step_number, played_at) values (?, ?)", step, at.atOffset(ZoneOffset.UTC));
    }

    void clockRuns(Anchor anchor) {
        jdbc.update("insert into demonstration_clock (clock_id, desk_at, machine_at) values (?, ?, ?)", THE_CLOCK,
                anchor.deskAt().atOffset(ZoneOffset.UTC), anchor.machineAt().atOffset(ZoneOffset.UTC));
    }

    Optional<Anchor> clock() {
        List<Anchor> anchors = jdbc.query("select desk_at, machine_at from demonstration_clock where clock_id = ?",
                (row, number) -> new Anchor(row.getObject(1, OffsetDateTime.class).toInstant(), row.getObject(2, OffsetDateTime.class).toInstant()), THE_CLOCK);
        return anchors.stream().findFirst();
    }

    /** One moment by the desk's clock and by the machine's. */
    record Anchor(Instant deskAt, Instant machineAt) {
    }
}
