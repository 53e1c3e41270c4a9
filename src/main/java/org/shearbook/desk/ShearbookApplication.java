package org.shearbook.desk;

import java.nio.file.Path;
import java.util.Map;
import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;
import org.springframework.boot.context.properties.ConfigurationPropertiesScan;
import org.springframework.context.ConfigurableApplicationContext;
import org.springframework.core.env.MapPropertySource;
import org.springframework.modulith.Modulithic;

/** The desk. Rooms are the direct sub-packages; the science is the other house, {@code org.shearbook.met}. */
@SpringBootApplication
@ConfigurationPropertiesScan
@Modulithic(systemName = "Shearbook", additionalPackages = "org.shearbook.met", sharedModules = {"audit", "shell"})
public class ShearbookApplication {

    private static final String DATA_FOLDER = "shearbook.data-dir";

    public static void main(String[] args) {
        SpringApplication desk = new SpringApplication(ShearbookApplication.class);
        desk.addInitializers(ShearbookApplication::makeDataFolderAbsolute);
        desk.run(args);
    }

    /** The embedded database refuses a folder that is named relative to the working one. */
    private static void makeDataFolderAbsolute(ConfigurableApplicationContext context) {
        Path folder = Path.of(context.getEnvironment().getRequiredProperty(DATA_FOLDER));
        context.getEnvironment().getPropertySources().addFirst(
                new MapPropertySource("absolute data folder", Map.of(DATA_FOLDER, folder.toAbsolutePath().normalize().toString())));
    }
}
