package org.shearbook.desk.intake;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class CulpritsTests {

    private static List<Integer> numbers(int count) {
        return IntStream.range(0, count).boxed().toList();
    }

    @Test
    void exactlyThoseThatFailAreFound() {
        long seed = 20310312;
        Random random = new Random(seed);
        for (int round = 0; round < 200; round++) {
            Set<Integer> failing = new TreeSet<>();
            int count = 1 + random.nextInt(500);
            for (int k = 0; k < 1 + random.nextInt(5); k++) {
                failing.add(random.nextInt(count));
            }
            List<Integer> found = Culprits.among(numbers(count), some -> some.stream().noneMatch(failing::contains));
            assertThat(found).as("seed %d, round %d", seed, round).containsExactlyElementsOf(failing);
        }
    }

    @Test
    void theNumberOfTrialsIsBoundedAndWhatStaysInDoubtIsNamed() {
        List<List<Integer>> trials = new ArrayList<>();
        List<Integer> found = Culprits.among(numbers(100_000), some -> {
            trials.add(some);
            return some.stream().noneMatch(number -> number % 3 == 0);
        });
        assertThat(trials.size()).isLessThan(500);
        assertThat(found).containsAll(numbers(100_000).stream().filter(number -> number % 3 == 0).toList());
    }
}
