package org.shearbook.desk.intake;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;

/**
 * Finds which messages of a batch can't be kept, by trying halves of it. It is asked for only when keeping the whole
 * batch failed, which decoded messages should never cause; then the rest must still be kept.
 */
final class Culprits {

    /** After so many trials what is still in doubt goes to a person, so that a batch ends in bounded time. */
    private static final int MOST_TRIALS = 200;

    private int trials;

    private Culprits() {
    }

    /**
     * @param suspects  messages that can't be kept together
     * @param canBeKept tries to keep some of them and leaves nothing behind
     * @return those that must be left out so that the rest can be kept
     */
    static <T> List<T> among(List<T> suspects, Predicate<List<T>> canBeKept) {
        List<T> found = new ArrayList<>();
        new Culprits().search(suspects, canBeKept, found);
        return found;
    }

    private <T> void search(List<T> suspects, Predicate<List<T>> canBeKept, List<T> found) {
        if (suspects.size() == 1 || trials >= MOST_TRIALS) {
            found.addAll(suspects);
            return;
        }
        int middle = suspects.size() / 2;
        for (List<T> half : List.of(suspects.subList(0, middle), suspects.subList(middle, suspects.size()))) {
            trials++;
            if (!canBeKept.test(half)) {
                search(half, canBeKept, found);
            }
        }
    }
}
