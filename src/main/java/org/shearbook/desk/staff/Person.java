package org.shearbook.desk.staff;

import java.time.Instant;
import java.util.Set;

/**
 * One version of an account.
 *
 * @param username    what is typed at sign-in
 * @param displayName as shown to others
 * @param enabled     whether this person may sign in
 */
public record Person(String username, int version, String displayName, Set<Role> roles, boolean enabled, Instant recordedAt) {

    public Person {
        roles = Set.copyOf(roles);
    }
}
