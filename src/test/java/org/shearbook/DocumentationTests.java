package org.shearbook;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** What the pages for people name is there. */
class DocumentationTests {

    private static final Pattern PATH = Pattern.compile("(?<![\\w/.])((?:src|frontend|db-migrations|demo-data)/[\\w./-]*\\w|LICENSE|README\\.md|DEVELOPERS\\.md)");
    private static final Pattern TEST_CLASS = Pattern.compile("(?<![\\w…$])([A-Z]\\w+(?:Tests|Benchmark))\\b");

    @Test
    void everyPathNamedInTheGuidesExists() throws IOException {
        TreeSet<String> missing = new TreeSet<>();
        for (Path guide : guides()) {
            Matcher paths = PATH.matcher(Files.readString(guide, StandardCharsets.UTF_8));
            while (paths.find()) {
                if (!Files.exists(Path.of(paths.group(1)))) {
                    missing.add(guide + ": " + paths.group(1));
                }
            }
        }
        assertThat(missing).isEmpty();
    }

    @Test
    void everyTestAndBenchmarkNamedInTheGuidesExists() throws IOException {
        TreeSet<String> known = new TreeSet<>();
        for (String root : List.of("src/test/java", "src/jmh/java")) {
            try (Stream<Path> files = Files.walk(Path.of(root))) {
                files.map(file -> file.getFileName().toString()).filter(name -> name.endsWith(".java")).forEach(name -> known.add(name.replace(".java", "")));
            }
        }
        TreeSet<String> missing = new TreeSet<>();
        for (Path guide : guides()) {
            Matcher names = TEST_CLASS.matcher(Files.readString(guide, StandardCharsets.UTF_8));
            while (names.find()) {
                if (!known.contains(names.group(1))) {
                    missing.add(guide + ": " + names.group(1));
                }
            }
        }
        assertThat(missing).isEmpty();
    }

    @Test
    void everyPageBeginsWithItsDocumentTypeAndCarriesNoScriptOrStyleOfItsOwn() throws IOException {
        try (Stream<Path> files = Files.walk(Path.of("src/main/resources/templates"))) {
            for (Path file : files.filter(path -> path.toString().endsWith(".html")).toList()) {
                String page = Files.readString(file, StandardCharsets.UTF_8);
                if (page.contains("frame :: page(")) {
                    assertThat(page).as(file.toString()).startsWith("<!DOCTYPE html>");
                }
                assertThat(page).as(file.toString()).doesNotContainPattern("<script(?![^>]*(src|type=\"application/json\"))").doesNotContainPattern("\\sstyle=\"").doesNotContainPattern("\\son[a-z]+=\"");
            }
        }
    }

    @Test
    void aPageWithAScriptHasASheetOfTheSameName() throws IOException {
        try (Stream<Path> files = Files.walk(Path.of("src/main/resources/templates"))) {
            for (Path file : files.filter(path -> path.toString().endsWith(".html") && !path.endsWith("frame.html")).toList()) {
                Matcher named = Pattern.compile("frame :: page\\(.*,\\s*'([a-z/-]+)'\\s*\\)\\}").matcher(Files.readString(file, StandardCharsets.UTF_8));
                if (named.find()) {
                    assertThat(Path.of("frontend", named.group(1) + ".js")).as(file.toString()).exists();
                    assertThat(Path.of("frontend", named.group(1) + ".css")).as(file.toString()).exists();
                }
            }
        }
    }

    private static List<Path> guides() throws IOException {
        try (Stream<Path> decisions = Files.walk(Path.of("src/docs"))) {
            return Stream.concat(Stream.of(Path.of("README.md"), Path.of("DEVELOPERS.md")), decisions.filter(path -> path.toString().endsWith(".md"))).toList();
        }
    }
}
