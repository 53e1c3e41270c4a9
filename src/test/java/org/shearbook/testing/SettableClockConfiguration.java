package org.shearbook.testing;

import org.springframework.boot.test.context.TestConfiguration;
import org.springframework.context.annotation.Bean;

/** Gives a test context its clock, under the profile {@code fixed-clock}. */
@TestConfiguration(proxyBeanMethods = false)
public class SettableClockConfiguration {

    @Bean
    SettableClock clock() {
        return new SettableClock();
    }
}
