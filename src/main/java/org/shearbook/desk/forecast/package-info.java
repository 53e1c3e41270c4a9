/**
 * Shear-layer forecasts (SLF): draft, issue, amend, correct, cancel. A version never changes once it is issued.
 *
 * <p><b>Door.</b> {@link org.shearbook.desk.forecast.ForecastBook}. <b>News.</b>
 * {@link org.shearbook.desk.forecast.ForecastFiled} for every issued version,
 * {@link org.shearbook.desk.forecast.ForecastDrafted} for work on a draft.
 * <b>Tables.</b> {@code forecast_version} and {@code forecast_evidence} for what was issued;
 * {@code forecast_draft} for what was only thought of, which an office forgets after a month.
 *
 * <p>Decode is among the allowed rooms because a report's place and intensity are of its types.
 */
@ApplicationModule(displayName = "Shear-layer Forecasts", allowedDependencies = {"layer", "airreport", "station", "staff", "audit", "shell", "decode"})
@NullMarked
package org.shearbook.desk.forecast;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
