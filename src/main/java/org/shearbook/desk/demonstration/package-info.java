/**
 * Plays the invented scenario through the other rooms' doors on its own clock, in the profile {@code demo} alone.
 *
 * <p>{@link org.shearbook.desk.demonstration.DemonstrationPlayer} plays,
 * {@code ScenarioAscent}, {@code ScenarioReport} and {@code ScenarioForecasts} are the scenario,
 * {@code ScenarioFiles} writes it into {@code demo-data}. <b>Tables.</b> {@code demonstration_step},
 * {@code demonstration_clock}: how far the play has come, and when its clock began to run.
 */
@ApplicationModule(displayName = "Demonstration", allowedDependencies = {"audit", "shell", "staff", "station", "sounding", "airreport", "intake", "analysis",
    "layer", "forecast", "profile"})
@NullMarked
package org.shearbook.desk.demonstration;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
