package org.shearbook.desk.forecast.web;

import java.util.ArrayList;
import java.util.List;

/** What differs between two texts, word by word: the longest common run of words stays, the rest was taken out or put in. */
final class TextDifference {

    /** A run of words with one fate. */
    record Piece(Fate fate, String text) {
    }

    enum Fate { SAME, REMOVED, ADDED }

    private TextDifference() {
    }

    static List<Piece> between(String before, String after) {
        String[] old = before.split("(?<=\\s)(?=\\S)");
        String[] fresh = after.split("(?<=\\s)(?=\\S)");
        int[][] common = new int[old.length + 1][fresh.length + 1];
        for (int i = old.length - 1; i >= 0; i--) {
            for (int j = fresh.length - 1; j >= 0; j--) {
                common[i][j] = old[i].equals(fresh[j]) ? common[i + 1][j + 1] + 1 : Math.max(common[i + 1][j], common[i][j + 1]);
            }
        }
        List<Piece> pieces = new ArrayList<>();
        int i = 0;
        int j = 0;
        while (i < old.length || j < fresh.length) {
            if (i < old.length && j < fresh.length && old[i].equals(fresh[j])) {
                add(pieces, Fate.SAME, old[i++]);
                j++;
            } else if (j == fresh.length || i < old.length && common[i + 1][j] >= common[i][j + 1]) {
                add(pieces, Fate.REMOVED, old[i++]);
            } else {
                add(pieces, Fate.ADDED, fresh[j++]);
            }
        }
        return pieces;
    }

    private static void add(List<Piece> pieces, Fate fate, String word) {
        Piece last = pieces.isEmpty() ? null : pieces.get(pieces.size() - 1);
        if (last != null && last.fate() == fate) {
            pieces.set(pieces.size() - 1, new Piece(fate, last.text() + word));
        } else {
            pieces.add(new Piece(fate, word));
        }
    }
}
