package org.shearbook.desk.layer.web;

import org.shearbook.desk.shell.MenuEntry;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

@Configuration(proxyBeanMethods = false)
class LayerMenu {

    @Bean
    MenuEntry layerMenuEntry() {
        return MenuEntry.page(50, "Layers", "/layers");
    }
}
