package org.shearbook.desk.analysis;

import org.shearbook.desk.audit.Actor;

/** A sounding was analysed, or it was found why it can't be. Told in the transaction that keeps the sounding; no act of its own. */
public record AnalysisKept(Actor actor, Analysis analysis) {
}
