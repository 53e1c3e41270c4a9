package org.shearbook.desk.staff;

import java.util.Optional;

/** Knows the keys that are accepted. None is, unless a bean of this type says so. */
public interface KeyRing {

    /** The key with this secret, if there is one. */
    Optional<Key> find(String secret);
}
