package org.shearbook.testing;

import java.lang.annotation.ElementType;
import java.lang.annotation.Inherited;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import org.shearbook.desk.ShearbookApplication;
import org.shearbook.desk.ShearbookApplication;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.boot.webmvc.test.autoconfigure.AutoConfigureMockMvc;
import org.springframework.context.annotation.Import;
import org.springframework.test.context.ActiveProfiles;
import org.springframework.test.context.TestPropertySource;

/** The whole application on an H2 database in memory, with a clock that tests set. One context serves all such tests. */
@Target(ElementType.TYPE)
@Retention(RetentionPolicy.RUNTIME)
@Inherited
@SpringBootTest(classes = ShearbookApplication.class)
@AutoConfigureMockMvc
@ActiveProfiles("fixed-clock")
@Import(SettableClockConfiguration.class)
@TestPropertySource(properties = {
    "spring.flyway.url=jdbc:h2:mem:desk;DB_CLOSE_DELAY=-1",
    "spring.datasource.url=jdbc:h2:mem:desk;LOCK_TIMEOUT=30000"
})
public @interface OnH2 {
}
