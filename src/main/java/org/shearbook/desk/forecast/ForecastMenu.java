package org.shearbook.desk.forecast;

import org.shearbook.desk.shell.MenuEntry;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

@Configuration(proxyBeanMethods = false)
class ForecastMenu {

    @Bean
    MenuEntry forecastMenuEntry() {
        return MenuEntry.page(60, "Shear-layer Forecasts", "/forecasts");
    }
}
