package org.shearbook.desk.shell;

import java.io.IOException;
import java.util.Arrays;
import org.springframework.context.MessageSource;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.context.support.ResourceBundleMessageSource;
import org.springframework.core.io.support.PathMatchingResourcePatternResolver;

/** Each room's texts lie in {@code messages/<room>.properties}; this gathers them. */
@Configuration(proxyBeanMethods = false)
class Messages {

    @Bean
    MessageSource messageSource() throws IOException {
        String[] basenames = Arrays.stream(new PathMatchingResourcePatternResolver().getResources("classpath:messages/*.properties"))
                .map(resource -> "messages." + resource.getFilename().replace(".properties", ""))
                .sorted().toArray(String[]::new);
        ResourceBundleMessageSource source = new ResourceBundleMessageSource();
        source.setBasenames(basenames);
        source.setDefaultEncoding("UTF-8");
        source.setFallbackToSystemLocale(false);
        return source;
    }
}
