package org.shearbook.desk.sounding;

/** Names one ascent; its versions share it. */
public record SoundingId(long value) {

    @Override
    public String toString() {
        return Long.toString(value);
    }
}
