package org.shearbook.desk.staff;

/** A person without the role tried to take the desk. */
public class MayNotHoldDesk extends RuntimeException {

    MayNotHoldDesk(String username) {
        super("%s is neither forecaster nor supervisor and can't hold the desk.".formatted(username));
    }
}
