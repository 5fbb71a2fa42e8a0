package nearworld.app.people;

import jakarta.servlet.DispatcherType;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.security.access.AccessDeniedException;
import org.springframework.security.config.annotation.web.builders.HttpSecurity;
import org.springframework.security.crypto.bcrypt.BCryptPasswordEncoder;
import org.springframework.security.crypto.password.DelegatingPasswordEncoder;
import org.springframework.security.crypto.password.PasswordEncoder;
import org.springframework.security.web.SecurityFilterChain;
import org.springframework.security.web.header.writers.ReferrerPolicyHeaderWriter.ReferrerPolicy;

/** Sign-in by form, the headers of every answer, and the matrix for everything that is not public. */
@Configuration(proxyBeanMethods = false)
class SecurityConfiguration {
    /** Nothing but what this server sends: no inline scripts or styles, no frames, no other hosts. */
    static final String CONTENT_POLICY =
            "default-src 'none'; style-src 'self'; script-src 'self'; img-src 'self' data:;"
                    + " font-src 'self'; form-action 'self'; frame-ancestors 'none'; base-uri 'none'; connect-src 'self'";

    private static final String PERMISSIONS_POLICY = "camera=(), geolocation=(), microphone=(), payment=(), usb=()";
    private static final String SIGN_IN = "/sign-in";
    private static final int BCRYPT_STRENGTH = 12;

    private static final String[] PUBLIC = {
        "/css/**",
        "/js/**",
        "/images/**",
        "/fonts/**",
        "/webjars/**",
        "/favicon.ico",
        "/favicon.svg",
        "/error",
        "/actuator/health",
        "/actuator/health/**"
    };

    @Bean
    SecurityFilterChain everything(HttpSecurity http, RouteGuard guard) throws Exception {
        http.authorizeHttpRequests(
                        requests -> requests.dispatcherTypeMatchers(DispatcherType.ERROR, DispatcherType.FORWARD)
                                .permitAll()
                                .requestMatchers(PUBLIC)
                                .permitAll()
                                .requestMatchers(SIGN_IN)
                                .permitAll()
                                .anyRequest()
                                .access(guard))
                .formLogin(form ->
                        form.loginPage(SIGN_IN).defaultSuccessUrl("/", false).failureUrl(SIGN_IN + "?error"))
                .logout(out -> out.logoutUrl("/sign-out").logoutSuccessUrl(SIGN_IN + "?out"))
                .headers(headers -> headers.contentSecurityPolicy(csp -> csp.policyDirectives(CONTENT_POLICY))
                        .referrerPolicy(referrer -> referrer.policy(ReferrerPolicy.SAME_ORIGIN))
                        .permissionsPolicyHeader(policy -> policy.policy(PERMISSIONS_POLICY)))
                .exceptionHandling(handling -> handling.accessDeniedHandler(
                        (request, response, denied) -> deny(guard, request, response, denied)));
        return http.build();
    }

    /** An address that the matrix does not know is not found, for everybody alike. */
    private static void deny(
            RouteGuard guard, HttpServletRequest request, HttpServletResponse response, AccessDeniedException denied)
            throws IOException {
        boolean unknown = !(denied instanceof org.springframework.security.web.csrf.CsrfException)
                && guard.permission(request).isEmpty();
        response.sendError(unknown ? HttpServletResponse.SC_NOT_FOUND : HttpServletResponse.SC_FORBIDDEN);
    }

    /** bcrypt, named in front of each hash so that a later algorithm can take over person by person. */
    @Bean
    PasswordEncoder passwordEncoder() {
        return new DelegatingPasswordEncoder(
                "bcrypt", java.util.Map.of("bcrypt", new BCryptPasswordEncoder(BCRYPT_STRENGTH)));
    }

    @Bean
    PermissionMatrix permissionMatrix() {
        return PermissionMatrix.read();
    }
}
