package org.shearbook.desk.staff;

import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.security.crypto.password.PasswordEncoder;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Keeps the accounts of the people who work here, every version of them. */
@Service
public class PersonBook {

    private final PersonRepository people;
    private final AuditTrail audit;
    private final PasswordEncoder passwords;
    private final ApplicationEventPublisher events;

    PersonBook(PersonRepository people, AuditTrail audit, PasswordEncoder passwords, ApplicationEventPublisher events) {
        this.people = people;
        this.audit = audit;
        this.passwords = passwords;
        this.events = events;
    }

    /** Makes an account, or a new version of it where the username is known. */
    @Transactional
    public Person keep(Actor actor, String username, String displayName, Set<Role> roles, String password) {
        String hash = passwords.encode(password);
        PersonEntity before = people.find(username, AsKnownAt.now().moment()).orElse(null);
        PersonEntity kept = people.save(new PersonEntity(username, before == null ? 1 : before.version + 1, displayName, roles, hash,
                true, audit.recordingMoment()));
        Person person = kept.toPerson();
        events.publishEvent(new PersonKept(actor, person, before == null ? null : PersonKept.describe(before.toPerson()), null));
        return person;
    }

    @Transactional(readOnly = true)
    public Optional<Person> find(String username, AsKnownAt asKnownAt) {
        return people.find(username, asKnownAt.moment()).map(PersonEntity::toPerson);
    }

    @Transactional(readOnly = true)
    public List<Person> all(AsKnownAt asKnownAt) {
        return people.findAll(asKnownAt.moment()).stream().map(PersonEntity::toPerson).toList();
    }

    /** The stored hash of the newest version, for sign-in alone. */
    Optional<String> passwordHash(String username) {
        return people.find(username, AsKnownAt.now().moment()).map(person -> person.passwordHash);
    }
}
