package org.shearbook.desk.sounding;

/** There is no sounding of this number, or none was known at the moment asked for. */
public class UnknownSounding extends RuntimeException {

    public UnknownSounding(SoundingId id) {
        super("There is no sounding %s at that moment. Look it up in the list of soundings.".formatted(id));
    }
}
