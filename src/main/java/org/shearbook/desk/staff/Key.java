package org.shearbook.desk.staff;

import java.util.Set;

/**
 * A key of a feed or a script.
 *
 * @param name         as it stands in the record
 * @param scopes       what it may do: {@code compute}, {@code read}, {@code messages}
 * @param loopbackOnly whether it is accepted from this machine alone
 */
public record Key(String name, Set<String> scopes, boolean loopbackOnly) {

    public Key {
        scopes = Set.copyOf(scopes);
    }
}
