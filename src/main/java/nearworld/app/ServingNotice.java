package nearworld.app;

import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.boot.web.server.context.WebServerInitializedEvent;
import org.springframework.context.ApplicationListener;
import org.springframework.stereotype.Component;

/** Says where to sign in, once the port answers. */
@Component
class ServingNotice implements ApplicationListener<WebServerInitializedEvent> {
    private static final Logger LOG = LoggerFactory.getLogger(ServingNotice.class);

    private final String address;

    ServingNotice(@Value("${server.address}") String address) {
        this.address = address;
    }

    @Override
    public void onApplicationEvent(WebServerInitializedEvent event) {
        LOG.info("Sign in at http://{}:{}/", address, event.getWebServer().getPort());
    }
}
