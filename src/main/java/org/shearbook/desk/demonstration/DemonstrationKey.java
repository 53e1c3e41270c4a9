package org.shearbook.desk.demonstration;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.util.Optional;
import java.util.Set;
import org.shearbook.desk.staff.Key;
import org.shearbook.desk.staff.KeyRing;
import org.springframework.context.annotation.Profile;
import org.springframework.stereotype.Component;

/** The one fixed key of the demonstration, from this machine only. */
@Component
@Profile("demo")
class DemonstrationKey implements KeyRing {

    static final String SECRET = "ennersund-demo";

    @Override
    public Optional<Key> find(String secret) {
        boolean same = MessageDigest.isEqual(secret.getBytes(StandardCharsets.UTF_8), SECRET.getBytes(StandardCharsets.UTF_8));
        return same ? Optional.of(new Key("demonstration", Set.of("compute", "read", "messages"), true)) : Optional.empty();
    }
}
