package org.shearbook.desk.audit;

/**
 * Who acts, and from where.
 *
 * @param username    account, name of a key, or {@code shearbook} for the desk's own background work
 * @param role        the roles in force, joined by commas
 * @param holdsDesk   whether this person held the desk at that moment
 * @param workstation name of the workstation; the address where it has no name
 * @param address     network address
 * @param session     a digest of the session, so that two acts can be told to be of one session
 */
public record Actor(String username, String role, boolean holdsDesk, String workstation, String address, String session) {

    /** The desk's own work: what no person and no key asked for. */
    public static Actor desk() {
        return new Actor("shearbook", "DESK", false, "server", "local", "-");
    }

    /** A person or key that acts outside a web session. */
    public static Actor named(String username, String role, boolean holdsDesk, String workstation) {
        return new Actor(username, role, holdsDesk, workstation, "local", "-");
    }
}
