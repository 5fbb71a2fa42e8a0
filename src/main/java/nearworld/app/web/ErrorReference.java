package nearworld.app.web;

import java.security.SecureRandom;
import java.util.HexFormat;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.boot.web.error.ErrorAttributeOptions;
import org.springframework.boot.webmvc.error.DefaultErrorAttributes;
import org.springframework.stereotype.Component;
import org.springframework.web.context.request.WebRequest;

/**
 * What an error page learns: the status, and for a fault of ours a reference that the log names too. Neither message nor
 * trace, which might hold what somebody typed.
 */
@Component
class ErrorReference extends DefaultErrorAttributes {
    private static final Logger LOG = LoggerFactory.getLogger(ErrorReference.class);
    private static final int REFERENCE_BYTES = 5;
    private static final int OUR_FAULT = 500;

    private final SecureRandom random = new SecureRandom();

    @Override
    public Map<String, @Nullable Object> getErrorAttributes(WebRequest request, ErrorAttributeOptions options) {
        Map<String, @Nullable Object> attributes = super.getErrorAttributes(request, ErrorAttributeOptions.of());
        if (attributes.get("status") instanceof Integer status && status >= OUR_FAULT) {
            byte[] bytes = new byte[REFERENCE_BYTES];
            random.nextBytes(bytes);
            String reference = HexFormat.of().formatHex(bytes);
            attributes.put("reference", reference);
            LOG.error("Reference {}: status {} at {}", reference, status, attributes.get("path"));
        }
        return attributes;
    }
}
