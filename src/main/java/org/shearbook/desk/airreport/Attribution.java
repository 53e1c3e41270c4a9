package org.shearbook.desk.airreport;

import java.util.Locale;

/** What a person holds to have caused the turbulence of a report. Nothing but a person ever chooses it. */
public enum Attribution {
    UNKNOWN, SHEAR_LAYER, CONVECTIVE, MOUNTAIN_WAVE, WAKE;

    /** Whether reports of this cause may judge a forecast or index of shear-layer turbulence. */
    public boolean isScored() {
        return this == UNKNOWN || this == SHEAR_LAYER;
    }

    public String inWords() {
        return name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }
}
