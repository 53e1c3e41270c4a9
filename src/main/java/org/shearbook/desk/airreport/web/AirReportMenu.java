package org.shearbook.desk.airreport.web;

import org.shearbook.desk.shell.MenuEntry;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

@Configuration(proxyBeanMethods = false)
class AirReportMenu {

    @Bean
    MenuEntry airReportMenuEntry() {
        return MenuEntry.page(40, "Air Reports", "/air-reports");
    }
}
