package nearworld.app.database;

import java.io.IOException;
import java.util.Optional;
import javax.sql.DataSource;
import nearworld.app.installation.DataFolder;
import org.springframework.boot.context.properties.EnableConfigurationProperties;
import org.springframework.boot.flyway.autoconfigure.FlywayConnectionDetails;
import org.springframework.boot.jdbc.autoconfigure.JdbcConnectionDetails;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** Gives the owner's login to the migrations and the application's to everything else. */
@Configuration(proxyBeanMethods = false)
@EnableConfigurationProperties(DatabaseSettings.class)
class DatabaseConfiguration {
    @Bean(destroyMethod = "close")
    Database database(DatabaseSettings settings, DataFolder folder) throws IOException {
        Optional<Database> external = settings.external();
        return external.isPresent() ? external.get() : EmbeddedDatabase.open(folder);
    }

    @Bean
    DatabaseKind databaseKind(Database database) {
        return database.kind();
    }

    @Bean
    FlywayConnectionDetails ownerConnection(Database database) {
        return new OwnerConnection(database.url(), database.owner());
    }

    @Bean
    JdbcConnectionDetails applicationConnection(Database database) {
        return new ApplicationConnection(database.url(), database.application());
    }

    @Bean
    ApplicationRoleGuard applicationRoleGuard(DataSource dataSource) {
        return new ApplicationRoleGuard(dataSource);
    }

    private record OwnerConnection(String url, Login login) implements FlywayConnectionDetails {
        @Override
        public String getUsername() {
            return login.user();
        }

        @Override
        public String getPassword() {
            return login.password();
        }

        @Override
        public String getJdbcUrl() {
            return url;
        }
    }

    private record ApplicationConnection(String url, Login login) implements JdbcConnectionDetails {
        @Override
        public String getUsername() {
            return login.user();
        }

        @Override
        public String getPassword() {
            return login.password();
        }

        @Override
        public String getJdbcUrl() {
            return url;
        }
    }
}
