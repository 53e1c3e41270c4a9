package org.shearbook.desk.timeheight;

/** The station asked for is not kept. */
public class UnknownStation extends RuntimeException {

    public UnknownStation(String station) {
        super("There is no station \"%s\". Choose one of the list.".formatted(station));
    }
}
