package org.shearbook.desk.staff;

import org.shearbook.desk.audit.AsKnownAt;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.boot.context.event.ApplicationReadyEvent;
import org.springframework.context.event.EventListener;
import org.springframework.stereotype.Component;

/** Says at the start when nobody can sign in, so that a locked desk is not taken for a broken one. */
@Component
class SignInNotice {

    private static final Logger log = LoggerFactory.getLogger(SignInNotice.class);

    private final PersonBook people;

    SignInNotice(PersonBook people) {
        this.people = people;
    }

    @EventListener(ApplicationReadyEvent.class)
    void say() {
        if (people.all(AsKnownAt.now()).isEmpty()) {
            log.warn("Nobody can sign in yet: this desk has no people. To look around with invented ones, start it with the profile demo.");
        }
    }
}
