package org.shearbook.desk.staff;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * Who holds the desk from a moment on.
 *
 * @param version counts the changes since the desk opened
 * @param holder  username; null while the desk is vacant
 * @param since   the moment responsibility moved
 * @param reason  why, where one had to be given
 */
public record DeskHolding(int version, @Nullable String holder, Instant since, @Nullable String reason) {

    public boolean isVacant() {
        return holder == null;
    }
}
