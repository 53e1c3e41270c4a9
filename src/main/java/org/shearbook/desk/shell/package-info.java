/**
 * The page frame every room's pages stand in: navigation, top bar, notices, error pages, and how units, flight
 * levels and UTC are shown.
 *
 * <p>The shell knows no room. A room puts itself into the frame by beans of three small types:
 * {@link org.shearbook.desk.shell.MenuEntry}, {@link org.shearbook.desk.shell.StatusLine},
 * {@link org.shearbook.desk.shell.PageBanner}. Templates format through the bean {@code show}
 * ({@link org.shearbook.desk.shell.Show}). <b>Tables.</b> None.
 */
@ApplicationModule(displayName = "Shell", allowedDependencies = "profile")
@NullMarked
package org.shearbook.desk.shell;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
