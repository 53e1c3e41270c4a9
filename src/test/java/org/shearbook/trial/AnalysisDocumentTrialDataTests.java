package org.shearbook.trial;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.shearbook.desk.ShearbookApplication;
import org.shearbook.desk.analysis.Analysis;
import org.shearbook.desk.analysis.AnalysisBook;
import org.shearbook.desk.analysis.AnalysisColumn;
import org.shearbook.desk.analysis.AnalysisDocument;
import org.shearbook.desk.sounding.Sounding;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.test.context.ContextConfiguration;
import tools.jackson.databind.json.JsonMapper;

/** The analysis document of every real ascent that can be read, at every window. */
@OnH2
@ContextConfiguration(classes = ShearbookApplication.class)
@EnabledIfSystemProperty(named = "trial.data", matches = ".+")
class AnalysisDocumentTrialDataTests {

    private static final JsonMapper JSON = JsonMapper.shared();
    private static final Instant RECEIVED = Instant.parse("2026-01-01T00:00:00Z");

    @Autowired SoundingArchive soundings;
    @Autowired AnalysisBook analyses;

    @Test
    void everyAscentGivesAWholeDocumentOrTheReasonWhyThereIsNone() throws IOException {
        int documents = 0;
        List<String> reasons = new ArrayList<>();
        for (Path file : files()) {
            for (Sounding sounding : soundings.read(Files.readAllBytes(file), RECEIVED).soundings()) {
                for (double window : AnalysisBook.windows()) {
                    String what = file.getFileName() + " " + sounding.stationId() + " " + sounding.observedAt() + " " + window;
                    Analysis analysis = analyses.compute(sounding, window);
                    if (analysis.document() == null) {
                        assertThat(analysis.summary().notAnalysed()).as(what).isNotBlank().doesNotContain("failed");
                        reasons.add(analysis.summary().notAnalysed());
                        continue;
                    }
                    documents++;
                    check(what, analysis.document(), sounding);
                }
            }
        }
        System.out.println(documents + " documents; " + reasons.size() + " not analysed: " + reasons.stream().distinct().toList());
        assertThat(documents).isGreaterThan(300);
    }

    private static void check(String what, AnalysisDocument document, Sounding sounding) {
        String text = JSON.writeValueAsString(document);
        assertThat(text).as(what).doesNotContain("NaN").doesNotContain("Infinity");
        assertThat(JSON.readValue(text, AnalysisDocument.class)).as(what).isEqualTo(document);
        assertThat(document.levels()).as(what).hasSameSizeAs(sounding.levels());
        assertThat(document.layers()).as(what).allSatisfy(layer -> {
            assertThat(layer.minRichardson()).isGreaterThanOrEqualTo(0).isLessThan(0.25);
            assertThat(layer.baseHeightM()).isLessThan(layer.topHeightM());
        });
        AnalysisColumn column = AnalysisBook.column(sounding.id(), 1, document);
        for (int k = 1; k < column.size(); k++) {
            assertThat(column.flightLevel()[k]).as(what).isGreaterThan(column.flightLevel()[k - 1]);
            assertThat(column.elapsed()[k]).as(what).isNotNaN();
        }
    }

    private static List<Path> files() throws IOException {
        List<Path> found = new ArrayList<>();
        for (String folder : List.of("igra", "csv", "hires", "temp-tac", "temp-drop-tac")) {
            Path path = Path.of(System.getProperty("trial.data"), folder);
            if (Files.isDirectory(path)) {
                try (Stream<Path> files = Files.list(path)) {
                    files.filter(Files::isRegularFile).filter(file -> !file.toString().endsWith(".ref.csv")).sorted().forEach(found::add);
                }
            }
        }
        return found;
    }
}
