package org.shearbook.desk.forecast;

/** Somebody who is neither forecaster nor supervisor tried to write a forecast. */
public class MayNotDraft extends RuntimeException {

    MayNotDraft() {
        super("Only forecasters and supervisors write shear-layer forecasts. Ask the person who holds the desk.");
    }
}
