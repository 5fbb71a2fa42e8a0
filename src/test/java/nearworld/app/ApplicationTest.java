package nearworld.app;

import java.lang.annotation.ElementType;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import nearworld.app.database.OnPostgres;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.boot.webmvc.test.autoconfigure.AutoConfigureMockMvc;

/**
 * Runs a test against the whole application with the demo in it, on a PostgreSQL database that all such tests of a JVM
 * share.
 */
@Target(ElementType.TYPE)
@Retention(RetentionPolicy.RUNTIME)
@SpringBootTest(properties = "nearworld.demo=true")
@AutoConfigureMockMvc
@OnPostgres
public @interface ApplicationTest {}
