package org.shearbook.desk.sounding;

/** A sounding can't be withdrawn like this; the message says why. */
public class WithdrawalRefused extends RuntimeException {

    WithdrawalRefused(String message) {
        super(message);
    }
}
