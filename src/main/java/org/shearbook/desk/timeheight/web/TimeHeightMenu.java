package org.shearbook.desk.timeheight.web;

import org.shearbook.desk.shell.MenuEntry;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

@Configuration(proxyBeanMethods = false)
class TimeHeightMenu {

    @Bean
    MenuEntry timeHeightMenuEntry() {
        return MenuEntry.page(20, "Time–height", "/time-height");
    }
}
