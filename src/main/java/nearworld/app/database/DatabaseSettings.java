package nearworld.app.database;

import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.boot.context.properties.ConfigurationProperties;

/**
 * Settings of an external server. Without {@code url} the embedded server is used; with it all five are required.
 *
 * @param url JDBC address, {@code jdbc:postgresql://host:port/database}
 * @param user role that migrates and owns the tables
 * @param password its password
 * @param appUser role of the application: {@code nearworld_app} or a member of it
 * @param appPassword its password
 */
@ConfigurationProperties("nearworld.database")
record DatabaseSettings(
        @Nullable String url,
        @Nullable String user,
        @Nullable String password,
        @Nullable String appUser,
        @Nullable String appPassword) {

    /** The external server, if one is set. */
    Optional<Database> external() {
        if (url == null || url.isBlank()) {
            return Optional.empty();
        }
        if (!url.startsWith("jdbc:postgresql:")) {
            throw new DatabaseRefusedException(
                    "NEARWORLD_DATABASE_URL must start with jdbc:postgresql:, was \"" + url + "\"");
        }
        return Optional.of(new ExternalDatabase(
                url,
                new Login(required(user, "NEARWORLD_DATABASE_USER"), required(password, "NEARWORLD_DATABASE_PASSWORD")),
                new Login(
                        required(appUser, "NEARWORLD_DATABASE_APP_USER"),
                        required(appPassword, "NEARWORLD_DATABASE_APP_PASSWORD"))));
    }

    private static String required(@Nullable String value, String variable) {
        if (value == null || value.isBlank()) {
            throw new DatabaseRefusedException(variable + " must be set when NEARWORLD_DATABASE_URL is set");
        }
        return value;
    }
}
