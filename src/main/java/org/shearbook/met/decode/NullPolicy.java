package org.shearbook.met.decode;

/** What the absence of a turbulence report means in one class of reports; decides which scores may be computed. */
public enum NullPolicy {
    /** A null exists only where the crew says smooth. */
    EXPLICIT,
    /** Only positives are sent. Absence says nothing. */
    NONE,
    /** Positives, and routine messages from the same aircraft which show that it was listening. */
    HEARTBEAT,
    /** Nulls are sent like everything else: the exposure is known. */
    SYSTEMATIC
}
