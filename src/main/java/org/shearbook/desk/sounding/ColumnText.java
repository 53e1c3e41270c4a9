package org.shearbook.desk.sounding;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import org.shearbook.met.decode.Remark;
import org.shearbook.met.quality.QualityFlag;
import org.shearbook.met.quality.SoundingFlag;

/**
 * Names and remarks in text columns. Names of one level are joined by commas, levels by semicolons; remarks and
 * findings are lines with tabs between their fields. Most levels have no name at all, so this is short.
 */
final class ColumnText {

    private ColumnText() {
    }

    static <E extends Enum<E>> String ofNames(List<? extends Set<E>> perLevel) {
        return perLevel.stream().map(names -> names.stream().sorted().map(Enum::name).collect(Collectors.joining(","))).collect(Collectors.joining(";"));
    }

    static <E extends Enum<E>> List<Set<E>> names(Class<E> type, String text, int levels) {
        String[] perLevel = text.split(";", -1);
        List<Set<E>> names = new ArrayList<>(levels);
        for (int k = 0; k < levels; k++) {
            Set<E> ofLevel = EnumSet.noneOf(type);
            if (!perLevel[k].isEmpty()) {
                Arrays.stream(perLevel[k].split(",")).forEach(name -> ofLevel.add(Enum.valueOf(type, name)));
            }
            names.add(ofLevel);
        }
        return names;
    }

    static String ofRemarks(Collection<Remark> remarks) {
        return remarks.stream().map(r -> r.line() + "\t" + r.column() + "\t" + r.code() + "\t" + oneLine(r.text())).collect(Collectors.joining("\n"));
    }

    static List<Remark> remarks(String text) {
        return text.isEmpty() ? List.of() : text.lines().map(line -> line.split("\t", 4))
                .map(f -> new Remark(Integer.parseInt(f[0]), Integer.parseInt(f[1]), f[2], f[3])).toList();
    }

    static String ofFindings(Collection<SoundingFlag> findings) {
        return findings.stream().map(f -> f.flag().name() + "\t" + oneLine(f.text())).collect(Collectors.joining("\n"));
    }

    static List<SoundingFlag> findings(String text) {
        return text.isEmpty() ? List.of() : text.lines().map(line -> line.split("\t", 2))
                .map(f -> new SoundingFlag(QualityFlag.valueOf(f[0]), f[1])).toList();
    }

    /** Text columns can't hold the zero character, and the lines above are split at line ends and tabs. */
    private static String oneLine(String text) {
        StringBuilder line = new StringBuilder(text.length());
        text.chars().forEach(c -> line.append(c < ' ' || c == 0x85 || c == 0x2028 || c == 0x2029 ? ' ' : (char) c));
        return line.toString();
    }
}
