package nearworld.app.database;

import java.lang.annotation.ElementType;
import java.lang.annotation.Inherited;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import nearworld.app.installation.DataFolder;
import org.springframework.boot.jdbc.test.autoconfigure.AutoConfigureTestDatabase;
import org.springframework.context.annotation.Import;
import org.springframework.test.context.ContextConfiguration;

/**
 * Runs a Spring test (the whole application or a slice such as {@code @DataJpaTest}) on a fresh, migrated PostgreSQL
 * database of its own, signed in as the application's role.
 */
@Target(ElementType.TYPE)
@Retention(RetentionPolicy.RUNTIME)
@Inherited
@ContextConfiguration(initializers = PostgresForTests.Initializer.class)
@Import({DatabaseConfiguration.class, DataFolder.class, OwnerConnection.class})
@AutoConfigureTestDatabase(replace = AutoConfigureTestDatabase.Replace.NONE)
public @interface OnPostgres {}
