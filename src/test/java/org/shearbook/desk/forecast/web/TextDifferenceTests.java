package org.shearbook.desk.forecast.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.forecast.web.TextDifference.Fate;
import org.shearbook.desk.forecast.web.TextDifference.Piece;

/** Word by word. Expected values are exact. */
class TextDifferenceTests {

    @Test
    void aCorrectedWordIsTakenOutAndPutIn() {
        assertThat(TextDifference.between("Levels  FL160 to FL310\nWhen", "Levels  FL260 to FL310\nWhen")).containsExactly(
                new Piece(Fate.SAME, "Levels  "), new Piece(Fate.REMOVED, "FL160 "), new Piece(Fate.ADDED, "FL260 "), new Piece(Fate.SAME, "to FL310\nWhen"));
    }

    @Test
    void equalTextsDifferNowhere() {
        assertThat(TextDifference.between("one two\nthree", "one two\nthree")).containsExactly(new Piece(Fate.SAME, "one two\nthree"));
    }

    @Test
    void bothTextsCanBeReadOutOfTheDifference() {
        String before = "MOD turbulence in clear air, 60 %\nMoving east 25 kt\n";
        String after = "SEV turbulence reported 1142Z in clear air, 80 %\nMoving east-northeast 25 kt, weakening\n";
        List<Piece> pieces = TextDifference.between(before, after);
        assertThat(pieces.stream().filter(piece -> piece.fate() != Fate.ADDED).map(Piece::text).collect(Collectors.joining())).isEqualTo(before);
        assertThat(pieces.stream().filter(piece -> piece.fate() != Fate.REMOVED).map(Piece::text).collect(Collectors.joining())).isEqualTo(after);
    }
}
