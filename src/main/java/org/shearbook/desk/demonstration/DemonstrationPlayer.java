package org.shearbook.desk.demonstration;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Collectors;
import org.shearbook.desk.airreport.AirReport;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.airreport.Attribution;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.forecast.Forecast;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.forecast.ForecastDraft;
import org.shearbook.desk.intake.Arrival;
import org.shearbook.desk.intake.Channel;
import org.shearbook.desk.intake.IntakeDoor;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.PersonBook;
import org.shearbook.desk.station.StationBook;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.boot.ApplicationArguments;
import org.springframework.boot.ApplicationRunner;
import org.springframework.boot.web.server.context.WebServerApplicationContext;
import org.springframework.context.annotation.Profile;
import org.springframework.core.io.ClassPathResource;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionTemplate;

/**
 * Plays the three days of the scenario through the doors of the other rooms, setting the desk's clock before each
 * act, and lets the clock run afterwards. Each step and the note that it was played are one transaction: a play that
 * was cut off goes on where it stopped.
 */
@Component
@Profile("demo & !fixed-clock")
class DemonstrationPlayer implements ApplicationRunner {

    private static final Logger log = LoggerFactory.getLogger(DemonstrationPlayer.class);
    /** After the last arrival of the scenario. */
    private static final Instant CURTAIN = ScenarioForecast.at(3, 1300);
    private static final Actor FEED = Actor.named("key:demonstration-feed", "messages", false, "feed");

    private final DemonstrationClock clock;
    private final DemonstrationProgress progress;
    private final PersonBook people;
    private final DeskHoldingBook holdings;
    private final StationBook stations;
    private final IntakeDoor intake;
    private final AirReportArchive reports;
    private final ForecastBook forecasts;
    private final TransactionTemplate transaction;
    private final WebServerApplicationContext server;

    DemonstrationPlayer(DemonstrationClock clock, DemonstrationProgress progress, PersonBook people, DeskHoldingBook holdings, StationBook stations,
            IntakeDoor intake, AirReportArchive reports, ForecastBook forecasts, TransactionTemplate transaction, WebServerApplicationContext server) {
        this.clock = clock;
        this.progress = progress;
        this.people = people;
        this.holdings = holdings;
        this.stations = stations;
        this.intake = intake;
        this.reports = reports;
        this.forecasts = forecasts;
        this.transaction = transaction;
        this.server = server;
    }

    @Override
    public void run(ApplicationArguments arguments) {
        play();
        announce();
    }

    private void play() {
        progress.clock().ifPresentOrElse(anchor -> clock.run(anchor.deskAt(), anchor.machineAt()), () -> {
            List<DemonstrationStep> steps = steps();
            for (int number = progress.stepsPlayed(); number < steps.size(); number++) {
                DemonstrationStep step = steps.get(number);
                int played = number + 1;
                clock.set(step.at());
                transaction.executeWithoutResult(status -> {
                    step.act().run();
                    progress.played(played, step.at());
                });
            }
            DemonstrationProgress.Anchor anchor = new DemonstrationProgress.Anchor(CURTAIN, clock.machineTime());
            progress.clockRuns(anchor);
            clock.run(anchor.deskAt(), anchor.machineAt());
        });
    }

    private List<DemonstrationStep> steps() {
        List<DemonstrationStep> steps = new ArrayList<>();
        Actor administrator = DemonstrationPerson.ADMINISTRATOR_T.acting(false);
        for (DemonstrationPerson person : DemonstrationPerson.values()) {
            steps.add(new DemonstrationStep(ScenarioAscent.DAY_ONE,
                    () -> people.keep(administrator, person.username, person.title, person.roles(), DemonstrationPerson.PASSWORD)));
        }
        for (ScenarioAscent.Site site : ScenarioAscent.Site.values()) {
            steps.add(new DemonstrationStep(ScenarioAscent.DAY_ONE, () -> stations.keep(administrator, site.title, site.latitude, site.longitude,
                    ScenarioAscent.Site.ELEVATION, List.of(site.ident, site.wigosId, site.blockNumber))));
        }
        for (ScenarioAscent ascent : ScenarioAscent.ALL) {
            Instant receivedAt = ascent.receivedAt();
            if (ascent == ScenarioFiles.CODED) {
                arrival(steps, ascent.nominalAt().plus(Duration.ofMinutes(20)), ScenarioFiles.CODED_FILE.formatted("TTAA"));
                arrival(steps, ascent.nominalAt().plus(Duration.ofMinutes(30)), ScenarioFiles.CODED_FILE.formatted("TTBB"));
                arrival(steps, ascent.nominalAt().plus(Duration.ofMinutes(38)), ScenarioFiles.CODED_FILE.formatted("TTBB-corrected"));
            }
            if (ascent == ScenarioFiles.WRONG_UNIT) {
                arrival(steps, receivedAt, ScenarioFiles.WRONG_UNIT_FILE);
                receivedAt = receivedAt.plus(Duration.ofMinutes(27));
            }
            arrival(steps, receivedAt, ascent.fileName());
        }
        reports(steps);
        shift(steps, DemonstrationPerson.FORECASTER_B, ScenarioForecast.at(1, 600), ScenarioForecast.at(1, 1800));
        shift(steps, DemonstrationPerson.FORECASTER_A, ScenarioForecast.at(1, 1801), ScenarioForecast.at(2, 600));
        shift(steps, DemonstrationPerson.FORECASTER_B, ScenarioForecast.at(2, 601), ScenarioForecast.at(2, 1757));
        shift(steps, DemonstrationPerson.FORECASTER_C, ScenarioForecast.at(2, 1758), ScenarioForecast.at(3, 600));
        ScenarioForecast.ALL.forEach(forecast -> steps.add(new DemonstrationStep(forecast.at(), () -> file(forecast))));
        // Of equal moments the first named comes first, so people and stations are there before anybody acts.
        steps.sort(Comparator.comparing(DemonstrationStep::at));
        return steps;
    }

    private void arrival(List<DemonstrationStep> steps, Instant at, String file) {
        steps.add(new DemonstrationStep(at, () -> intake.takeIn(FEED, List.of(new Arrival(file, bytes("sounding/" + file))), Channel.DEMONSTRATION)));
    }

    /** Each row of the report file arrives by itself, at its own time, with the header it needs. */
    private void reports(List<DemonstrationStep> steps) {
        List<String> rows = Arrays.asList(new String(bytes("airreport/reports.csv"), StandardCharsets.UTF_8).split("\n"));
        for (int k = 0; k < ScenarioReport.ALL.size(); k++) {
            ScenarioReport report = ScenarioReport.ALL.get(k);
            byte[] bytes = (rows.get(0) + "\n" + rows.get(k + 1) + "\n").getBytes(StandardCharsets.UTF_8);
            steps.add(new DemonstrationStep(report.receivedAt(), () -> intake.takeIn(FEED, List.of(new Arrival(report.id() + ".csv", bytes)), Channel.DEMONSTRATION)));
        }
        ScenarioReport convective = ScenarioReport.ALL.get(6);
        steps.add(new DemonstrationStep(ScenarioForecast.at(1, 1740), () -> {
            AirReport found = reports.between(convective.observedAt(), convective.observedAt().plusSeconds(60), AsKnownAt.now()).get(0);
            reports.attribute(DemonstrationPerson.FORECASTER_B.acting(true), found.id(), Attribution.CONVECTIVE, "in convective cloud tops");
        }));
    }

    private void shift(List<DemonstrationStep> steps, DemonstrationPerson person, Instant from, Instant until) {
        steps.add(new DemonstrationStep(from, () -> holdings.take(person.acting(false))));
        steps.add(new DemonstrationStep(until, () -> holdings.leave(person.acting(true))));
    }

    private void file(ScenarioForecast forecast) {
        Actor author = forecast.author().acting(true);
        if (forecast.act().equals("issue")) {
            ForecastDraft draft = forecasts.draft(author, forecast.content());
            forecasts.issue(author, draft.id(), draft.version(), null);
            return;
        }
        Forecast standing = forecasts.between(forecast.content().validFrom().minus(Duration.ofHours(6)), forecast.content().validUntil(), AsKnownAt.now()).stream()
                .filter(known -> known.number() == forecast.number()).max(Comparator.comparingInt(Forecast::version)).orElseThrow();
        if (forecast.act().equals("amend")) {
            forecasts.amend(author, standing.id(), standing.version(), forecast.content(), forecast.reason());
        } else {
            forecasts.correct(author, standing.id(), standing.version(), forecast.content(), forecast.reason());
        }
    }

    private static byte[] bytes(String file) {
        try {
            return new ClassPathResource("demo-data/" + file).getContentAsByteArray();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private void announce() {
        String names = Arrays.stream(DemonstrationPerson.values()).map(person -> person.username).collect(Collectors.joining(", "));
        log.info("""


                Shearbook is ready:  http://127.0.0.1:{}/
                Sign in as {}
                each with the password {}. Scripts send: Authorization: Bearer {}
                DEMONSTRATION DATA. Invented country, stations, aircraft and people.
                """, server.getWebServer().getPort(), names, DemonstrationPerson.PASSWORD, DemonstrationKey.SECRET);
    }
}
