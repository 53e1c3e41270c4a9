/**
 * Who works here: sign-in, roles, keys, and who holds the desk.
 *
 * <p><b>Doors.</b> {@link org.shearbook.desk.staff.PersonBook} keeps people,
 * {@link org.shearbook.desk.staff.DeskHoldingBook} keeps who holds the desk,
 * {@link org.shearbook.desk.staff.CurrentActor} says who acts in this request.
 * <b>News.</b> {@link org.shearbook.desk.staff.PersonKept}, {@link org.shearbook.desk.staff.DeskHeld}.
 * <b>Tables.</b> {@code person_version}, {@code desk_holding}.
 */
@ApplicationModule(displayName = "People and Keys", allowedDependencies = {"audit", "shell"})
@NullMarked
package org.shearbook.desk.staff;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
