package org.shearbook.met.profile;

/** The vertical profile everybody speaks; being written. */
public final class VerticalProfile {
    private VerticalProfile() {
    }
}
