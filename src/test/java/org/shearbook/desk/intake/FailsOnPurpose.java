package org.shearbook.desk.intake;

import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.sounding.SoundingKept;
import org.springframework.context.event.EventListener;
import org.springframework.stereotype.Component;

/** A listener in the transaction of the intake that fails for one invented station: what a fault in a later room would do. */
@Component
class FailsOnPurpose {

    static final String STATION = "FAILS-ON-PURPOSE";

    private final SoundingArchive soundings;

    FailsOnPurpose(SoundingArchive soundings) {
        this.soundings = soundings;
    }

    @EventListener
    void on(SoundingKept kept) {
        if (soundings.header(kept.id(), AsKnownAt.now()).orElseThrow().stationId().equals(STATION)) {
            throw new IllegalStateException("failed on purpose");
        }
    }
}
