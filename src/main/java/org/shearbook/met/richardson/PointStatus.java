package org.shearbook.met.richardson;

/** What can be said at one height of a {@link RichardsonProfile}. */
public enum PointStatus {
    /** Ri is known. */
    KNOWN,
    /** Ri is known; as measured N² is negative there: statically unstable. */
    OVERTURNED,
    /** The wind does not change with height, so Ri has no value; NaN. */
    NO_SHEAR,
    /** Wind or temperature is missing; everything that needs it is NaN. */
    GAP
}
