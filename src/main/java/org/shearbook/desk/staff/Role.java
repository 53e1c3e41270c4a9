package org.shearbook.desk.staff;

/** What a person is here. Roles can be combined. */
public enum Role {
    FORECASTER, SCIENTIST, SUPERVISOR, ADMINISTRATOR, OBSERVER
}
