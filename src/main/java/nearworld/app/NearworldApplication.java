package nearworld.app;

import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;

/** Starts the web application. */
@SpringBootApplication
public class NearworldApplication {
    /**
     * Starts the server and returns; the process ends with the server.
     *
     * @param args Spring Boot's command line arguments
     */
    public static void main(String[] args) {
        SpringApplication.run(NearworldApplication.class, args);
    }
}
