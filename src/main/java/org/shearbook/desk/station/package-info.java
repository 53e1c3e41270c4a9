/**
 * Launch sites, and the fixes that reports name: navigation aids, aerodromes, waypoints.
 *
 * <p><b>Door.</b> {@link org.shearbook.desk.station.StationBook}. <b>News.</b>
 * {@link org.shearbook.desk.station.StationsKept}, {@link org.shearbook.desk.station.FixListKept}.
 * <b>Tables.</b> {@code station_version}, {@code station_identifier}, {@code fix_list_version}, {@code fix}.
 */
@ApplicationModule(displayName = "Stations and Fixes", allowedDependencies = {"audit", "shell", "staff", "profile"})
@NullMarked
package org.shearbook.desk.station;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
