package org.shearbook.desk.shell;

import java.time.Clock;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.context.annotation.Profile;

/** The one clock of the application; the demonstration brings its own. */
@Configuration(proxyBeanMethods = false)
class ClockOfTheDesk {

    @Bean
    @Profile("!demo & !fixed-clock")
    Clock clock() {
        return Clock.systemUTC();
    }
}
