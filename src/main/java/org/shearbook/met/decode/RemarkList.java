package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Collects the remarks of one message. From the same cause only the first {@value #SHOWN} are kept in full; one more
 * says how many followed, because a column that is wrong in five thousand rows is one thing to tell a person.
 */
final class RemarkList {

    private static final int SHOWN = 20;

    private final List<Remark> remarks = new ArrayList<>();
    private final Map<String, Integer> counts = new LinkedHashMap<>();

    void add(int line, int column, String code, String text) {
        int count = counts.merge(code, 1, Integer::sum);
        if (count <= SHOWN) {
            remarks.add(new Remark(line, column, code, text));
        }
    }

    int count(String code) {
        return counts.getOrDefault(code, 0);
    }

    List<Remark> toList(int line) {
        List<Remark> all = new ArrayList<>(remarks);
        counts.forEach((code, count) -> {
            if (count > SHOWN) {
                all.add(new Remark(line, 0, code, (count - SHOWN) + " more of the same further down."));
            }
        });
        return List.copyOf(all);
    }
}
