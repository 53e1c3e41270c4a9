package org.shearbook.desk;

import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;
import org.springframework.boot.context.properties.ConfigurationPropertiesScan;
import org.springframework.modulith.Modulithic;

/** The desk. Rooms are the direct sub-packages; the science is the other house, {@code org.shearbook.met}. */
@SpringBootApplication
@ConfigurationPropertiesScan
@Modulithic(systemName = "Shearbook", additionalPackages = "org.shearbook.met", sharedModules = {"audit", "shell"})
public class ShearbookApplication {

    public static void main(String[] args) {
        SpringApplication.run(ShearbookApplication.class, args);
    }
}
