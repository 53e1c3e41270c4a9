/**
 * The one door for bytes: recognises, decodes, hands on, and queues what needs a person.
 *
 * <p><b>Door.</b> {@link org.shearbook.desk.intake.IntakeDoor} takes in, {@link org.shearbook.desk.intake.IntakeQueue}
 * shows and settles. <b>News.</b> {@link org.shearbook.desk.intake.MessagesTakenIn},
 * {@link org.shearbook.desk.intake.ItemSettled}. <b>Tables.</b> {@code intake_batch}, {@code intake_arrival},
 * {@code intake_record}, {@code intake_item_version}; and those from which rows may go: {@code intake_raw},
 * {@code intake_fingerprint}, {@code intake_item_text}.
 */
@ApplicationModule(displayName = "Intake",
        allowedDependencies = {"audit", "shell", "sounding", "airreport", "station", "staff", "decode"})
@NullMarked
package org.shearbook.desk.intake;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
