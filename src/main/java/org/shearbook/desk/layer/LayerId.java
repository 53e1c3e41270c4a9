package org.shearbook.desk.layer;

/** Names one shear layer of one sounding; its versions share it. */
public record LayerId(long value) {

    @Override
    public String toString() {
        return Long.toString(value);
    }
}
