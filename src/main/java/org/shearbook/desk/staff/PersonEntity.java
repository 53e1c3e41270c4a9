package org.shearbook.desk.staff;

import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.SequenceGenerator;
import jakarta.persistence.Table;
import java.time.Instant;
import java.util.Arrays;
import java.util.Set;
import java.util.stream.Collectors;

@Entity
@Table(name = "person_version")
class PersonEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "person_version_seq")
    @SequenceGenerator(name = "person_version_seq", sequenceName = "person_version_seq", allocationSize = 50)
    Long rowId;
    String username;
    int version;
    String displayName;
    String roles;
    String passwordHash;
    boolean enabled;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected PersonEntity() {
    }

    PersonEntity(String username, int version, String displayName, Set<Role> roles, String passwordHash, boolean enabled, Instant recordedAt) {
        this.username = username;
        this.version = version;
        this.displayName = displayName;
        this.roles = roles.stream().sorted().map(Role::name).collect(Collectors.joining(","));
        this.passwordHash = passwordHash;
        this.enabled = enabled;
        this.observedAt = recordedAt;
        this.receivedAt = recordedAt;
        this.recordedAt = recordedAt;
    }

    Person toPerson() {
        return new Person(username, version, displayName,
                Arrays.stream(roles.split(",")).map(Role::valueOf).collect(Collectors.toUnmodifiableSet()), enabled, recordedAt);
    }
}
