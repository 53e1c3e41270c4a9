/**
 * Keeps air-reports: voluntary, special, automatic; their versions and what a person holds to be their cause.
 *
 * <p><b>Door.</b> {@link org.shearbook.desk.airreport.AirReportArchive}. <b>News.</b>
 * {@link org.shearbook.desk.airreport.AirReportsKept}, {@link org.shearbook.desk.airreport.AirReportAttributed}.
 * <b>Tables.</b> {@code air_report_version}; and {@code air_report_identity}, the only one from which rows may go:
 * it holds what names an aircraft, and the versions keep no more than a salted digest of it.
 */
@ApplicationModule(displayName = "Air Reports", allowedDependencies = {"audit", "shell", "station", "staff", "profile", "decode"})
@NullMarked
package org.shearbook.desk.airreport;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
