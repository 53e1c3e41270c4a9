package org.shearbook.met.taylorgoldstein;

/** Ends a search that has used up its evaluations; it never leaves this room, where it becomes a stated reason. */
final class EvaluationLimitReached extends RuntimeException {

    private static final long serialVersionUID = 1L;

    EvaluationLimitReached() {
        super("the limit of evaluations was reached", null, false, false);
    }
}
