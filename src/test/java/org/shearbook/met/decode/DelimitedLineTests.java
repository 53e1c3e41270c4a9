package org.shearbook.met.decode;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.shearbook.met.decode.DelimitedLine.Cell;

class DelimitedLineTests {

    @Test
    void cellsKnowTheirColumn() {
        assertThat(DelimitedLine.split("a, b,,c", ',')).containsExactly(new Cell("a", 1), new Cell("b", 3), new Cell("", 6), new Cell("c", 7));
    }

    @Test
    void anEndingSeparatorMakesAnEmptyCell() {
        assertThat(DelimitedLine.split("a;", ';')).containsExactly(new Cell("a", 1), new Cell("", 3));
        assertThat(DelimitedLine.split("", ';')).containsExactly(new Cell("", 1));
    }

    @Test
    void quotesKeepSeparatorsAndDoubledQuotes() {
        assertThat(DelimitedLine.split("\"a,b\",\"say \"\"x\"\"\",c", ',')).extracting(Cell::text).containsExactly("a,b", "say \"x\"", "c");
    }

    @Test
    void anOpenQuoteRunsToTheEnd() {
        assertThat(DelimitedLine.split("1,\"a,b", ',')).extracting(Cell::text).containsExactly("1", "a,b");
    }

    @Test
    void semicolonAndTabWinOverCommas() {
        assertThat(DelimitedLine.separatorOf("p,hPa;z,m")).isEqualTo(';');
        assertThat(DelimitedLine.separatorOf("p,hPa\tz,m")).isEqualTo('\t');
        assertThat(DelimitedLine.separatorOf("\"p;q\",z")).isEqualTo(',');
        assertThat(DelimitedLine.separatorOf("one")).isEqualTo('\0');
    }
}
