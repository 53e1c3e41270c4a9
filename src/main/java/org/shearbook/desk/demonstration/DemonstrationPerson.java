package org.shearbook.desk.demonstration;

import java.util.Set;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.staff.Role;

/** The people of the demonstration; none of them exists. */
enum DemonstrationPerson {
    FORECASTER_A("forecaster-a", "Forecaster A", Role.FORECASTER),
    FORECASTER_B("forecaster-b", "Forecaster B", Role.FORECASTER),
    FORECASTER_C("forecaster-c", "Forecaster C", Role.FORECASTER),
    SCIENTIST_V("scientist-v", "Scientist V", Role.SCIENTIST),
    SUPERVISOR_S("supervisor-s", "Supervisor S", Role.SUPERVISOR),
    ADMINISTRATOR_T("administrator-t", "Administrator T", Role.ADMINISTRATOR),
    OBSERVER_O("observer-o", "Observer O", Role.OBSERVER);

    static final String PASSWORD = "ennersund";

    final String username;
    final String title;
    final Role role;

    DemonstrationPerson(String username, String title, Role role) {
        this.username = username;
        this.title = title;
        this.role = role;
    }

    Set<Role> roles() {
        return Set.of(role);
    }

    /** This person at the first workstation. */
    Actor acting(boolean holdsDesk) {
        return Actor.named(username, role.name(), holdsDesk, "WS-1");
    }
}
