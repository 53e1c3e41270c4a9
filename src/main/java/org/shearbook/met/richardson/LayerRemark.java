package org.shearbook.met.richardson;

/** What a forecaster should know before leaning on a layer's numbers. Stable names. */
public enum LayerRemark {
    /** Fewer than three reported wind levels lie inside: the layer is a straight line between few points. */
    FEW_WIND_LEVELS,
    /** As measured the air is statically unstable somewhere inside; the sorted profile was used. */
    OVERTURNED,
    /** At least half of the layer is saturated; Ri here is for unsaturated air, and moist Ri is lower. */
    SATURATED,
    /** No humidity was reported inside: saturation is unknown. */
    HUMIDITY_UNKNOWN,
    /** The layer ends where a gap begins: it may go on inside it. */
    BOUNDED_BY_GAP,
    /** The layer ends where the data end: it may go on beyond. */
    BOUNDED_BY_END_OF_DATA,
    /** The base is less than 1000 m above the ground: more likely the boundary layer than free air. */
    NEAR_GROUND
}
