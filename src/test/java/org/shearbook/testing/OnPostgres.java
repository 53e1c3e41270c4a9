package org.shearbook.testing;

import java.lang.annotation.ElementType;
import java.lang.annotation.Inherited;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import org.shearbook.desk.ShearbookApplication;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.boot.webmvc.test.autoconfigure.AutoConfigureMockMvc;
import org.springframework.context.annotation.Import;
import org.springframework.test.context.ActiveProfiles;
import org.springframework.test.context.ContextConfiguration;

/** The whole application on a real PostgreSQL, with a clock that tests set. One context serves all such tests. */
@Target(ElementType.TYPE)
@Retention(RetentionPolicy.RUNTIME)
@Inherited
@SpringBootTest(classes = ShearbookApplication.class)
@AutoConfigureMockMvc
@ActiveProfiles({"fixed-clock", "postgres"})
@Import(SettableClockConfiguration.class)
@ContextConfiguration(initializers = PostgresForTests.class)
public @interface OnPostgres {
}
