package org.shearbook.met.quality;

/** One named check. Sets flags and takes values out of use; never changes what was reported. */
interface QualityCheck {

    void apply(LevelsUnderCheck sounding);
}
