package org.shearbook.trial;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.intake.Accepted;
import org.shearbook.desk.intake.Arrival;
import org.shearbook.desk.intake.Channel;
import org.shearbook.desk.intake.IntakeDoor;
import org.shearbook.desk.intake.TakenIn;
import org.shearbook.desk.sounding.Sounding;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingId;
import org.shearbook.desk.station.StationBook;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;

/** Real messages through the real door: nothing is lost, and a second time nothing is added. */
@OnH2
@EnabledIfSystemProperty(named = "trial.data", matches = ".+")
class IntakeTrialDataTests {

    private static final Path DATA = Path.of(System.getProperty("trial.data", ""));
    private static final Actor FORECASTER = Actor.named("forecaster-b", "FORECASTER", true, "WS-1");

    @Autowired IntakeDoor door;
    @Autowired SoundingArchive soundings;
    @Autowired StationBook stations;

    private TakenIn takeIn(List<Arrival> arrivals) {
        return door.takeIn(FORECASTER, arrivals, Channel.UPLOAD);
    }

    private static List<Arrival> files(String folder, String suffix) throws IOException {
        List<Arrival> arrivals = new ArrayList<>();
        try (Stream<Path> all = Files.list(DATA.resolve(folder))) {
            for (Path file : all.filter(one -> one.toString().endsWith(suffix)).sorted().toList()) {
                arrivals.add(new Arrival(file.getFileName().toString(), Files.readAllBytes(file)));
            }
        }
        return arrivals;
    }

    @Test
    void everyStationFileOfTheArchiveComesInAndTwiceIsOnce() throws IOException {
        List<Arrival> files = files("igra", ".txt");
        TakenIn first = takeIn(files);
        assertThat(first.queued()).isEmpty();
        assertThat(first.accepted()).hasSizeGreaterThan(60);
        TakenIn second = takeIn(files);
        assertThat(second.accepted()).hasSameSizeAs(first.accepted()).allMatch(Accepted::duplicate);
    }

    @Test
    void thePartsOfOneAscentBecomeOneSounding() throws IOException {
        TakenIn taken = takeIn(List.of(new Arrival("albany", Files.readAllBytes(DATA.resolve("temp-tac/ascent_72518_albany.txt")))));
        assertThat(taken.queued()).isEmpty();
        assertThat(taken.accepted()).extracting(Accepted::id).hasSizeGreaterThan(1).containsOnly(taken.accepted().get(0).id());
        Sounding sounding = soundings.find(new SoundingId(taken.accepted().get(0).id()), AsKnownAt.now()).orElseThrow();
        assertThat(sounding.parts()).contains("TTAA", "TTBB");
        assertThat(sounding.profile()).isNotNull();
    }

    @Test
    void everyBulletinOfCodedAscentsComesIn() throws IOException {
        TakenIn taken = takeIn(files("temp-tac", ".txt"));
        assertThat(taken.queued()).isEmpty();
        assertThat(taken.accepted()).hasSizeGreaterThan(30);
    }

    @Test
    void everyPilotReportRowComesInWithOneUploadAndNoneIsLost() throws IOException {
        stations.keepFixes(Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1"), "trial navaids", Files.readAllBytes(DATA.resolve("fixes/ourairports_navaids.csv")));
        StringBuilder text = new StringBuilder();
        int rows = 0;
        try (Stream<Path> all = Files.list(DATA.resolve("pirep"))) {
            for (Path file : all.filter(one -> one.getFileName().toString().startsWith("dev_pireps")).sorted().toList()) {
                for (CSVRecord row : CSVFormat.DEFAULT.builder().setHeader().setSkipHeaderRecord(true).get().parse(Files.newBufferedReader(file, StandardCharsets.ISO_8859_1))) {
                    text.append(row.get("REPORT")).append('\n');
                    rows++;
                }
            }
        }
        byte[] bytes = text.toString().getBytes(StandardCharsets.UTF_8);
        Clock wall = Clock.systemUTC();
        long before = wall.millis();
        TakenIn taken = takeIn(List.of(new Arrival("pilot reports", bytes)));
        System.out.printf("%d pilot reports in one upload: %d ms%n", rows, wall.millis() - before);
        assertThat(rows).isGreaterThan(8_000);
        assertThat(taken.accepted().size() + taken.queued().size()).isEqualTo(rows);
        assertThat(taken.queued()).as("a few at most").hasSizeLessThan(rows / 100);
        assertThat(takeIn(List.of(new Arrival("pilot reports", bytes))).accepted()).hasSameSizeAs(taken.accepted()).allMatch(Accepted::duplicate);
    }
}
