package org.shearbook.met.decode;

import java.util.List;

/** One message that could be read, wholly or in part. */
public sealed interface DecodedMessage permits DecodedSounding, DecodedAirReport {

    /** The part of the input this came from, as received. */
    String raw();

    /** Line of the input on which it begins, from 1. */
    int line();

    /** What could not be read, was doubtful or was assumed. */
    List<Remark> remarks();
}
