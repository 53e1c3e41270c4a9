package org.shearbook.desk.station;

import java.util.HashMap;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/** Every place that has a name, held in memory: a bulletin of pilot reports asks for thousands. Immutable. */
public final class FixTable {

    private final Map<String, List<Fix>> byIdentifier;
    private final int size;

    FixTable(List<Fix> fixes) {
        Map<String, List<Fix>> places = new HashMap<>(fixes.size() * 2);
        for (Fix fix : fixes) {
            places.computeIfAbsent(fix.identifier(), identifier -> new ArrayList<>(1)).add(fix);
        }
        places.replaceAll((identifier, found) -> List.copyOf(found));
        byIdentifier = places;
        size = fixes.size();
    }

    /** Every place of that name, in no particular order; empty when unknown. */
    public List<Fix> find(String identifier) {
        return byIdentifier.getOrDefault(identifier.toUpperCase(Locale.ROOT), List.of());
    }

    public int size() {
        return size;
    }
}
