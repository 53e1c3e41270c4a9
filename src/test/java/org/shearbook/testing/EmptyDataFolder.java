package org.shearbook.testing;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.springframework.boot.test.util.TestPropertyValues;
import org.springframework.context.ApplicationContextInitializer;
import org.springframework.context.ConfigurableApplicationContext;

/** Gives a context a data folder that nobody used before. */
public class EmptyDataFolder implements ApplicationContextInitializer<ConfigurableApplicationContext> {

    @Override
    public void initialize(ConfigurableApplicationContext context) {
        try {
            Files.createDirectories(Path.of("target"));
            TestPropertyValues.of("shearbook.data-dir=" + Files.createTempDirectory(Path.of("target").toAbsolutePath(), "desk-")).applyTo(context);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
