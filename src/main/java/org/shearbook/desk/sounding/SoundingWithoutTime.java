package org.shearbook.desk.sounding;

/** A sounding names neither release nor nominal hour, so nobody knows which ascent it is. */
public class SoundingWithoutTime extends RuntimeException {

    SoundingWithoutTime(int line) {
        super("The sounding in line %d says neither when it was released nor which hour it stands for.".formatted(line));
    }
}
