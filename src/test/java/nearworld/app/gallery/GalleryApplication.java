package nearworld.app.gallery;

import jakarta.servlet.Filter;
import java.util.Locale;
import org.springframework.boot.SpringBootConfiguration;
import org.springframework.boot.autoconfigure.ImportAutoConfiguration;
import org.springframework.boot.autoconfigure.context.MessageSourceAutoConfiguration;
import org.springframework.boot.autoconfigure.context.PropertyPlaceholderAutoConfiguration;
import org.springframework.boot.http.converter.autoconfigure.HttpMessageConvertersAutoConfiguration;
import org.springframework.boot.servlet.autoconfigure.HttpEncodingAutoConfiguration;
import org.springframework.boot.test.context.TestComponent;
import org.springframework.boot.thymeleaf.autoconfigure.ThymeleafAutoConfiguration;
import org.springframework.boot.tomcat.autoconfigure.servlet.TomcatServletWebServerAutoConfiguration;
import org.springframework.boot.webmvc.autoconfigure.DispatcherServletAutoConfiguration;
import org.springframework.boot.webmvc.autoconfigure.WebMvcAutoConfiguration;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.ComponentScan;

/** The pages alone, without people, database or engine: real templates, words, styles and drawings on invented models. */
@SpringBootConfiguration
@ImportAutoConfiguration({
    PropertyPlaceholderAutoConfiguration.class,
    MessageSourceAutoConfiguration.class,
    HttpMessageConvertersAutoConfiguration.class,
    HttpEncodingAutoConfiguration.class,
    ThymeleafAutoConfiguration.class,
    TomcatServletWebServerAutoConfiguration.class,
    DispatcherServletAutoConfiguration.class,
    WebMvcAutoConfiguration.class
})
@ComponentScan({"nearworld.app.gallery", "nearworld.app.results", "nearworld.app.fields", "nearworld.app.web"})
@TestComponent
class GalleryApplication {
    /** The policy under which the pages live in the application, too. */
    static final String POLICY = "default-src 'none'; style-src 'self'; script-src 'self'; img-src 'self' data:;"
            + " font-src 'self'; form-action 'self'; frame-ancestors 'none'; base-uri 'none'; connect-src 'self'";

    @Bean
    Filter policy() {
        return (request, response, chain) -> {
            ((jakarta.servlet.http.HttpServletResponse) response).setHeader("Content-Security-Policy", POLICY);
            chain.doFilter(request, response);
        };
    }

    @Bean
    org.springframework.web.servlet.LocaleResolver localeResolver() {
        var resolver = new org.springframework.web.servlet.i18n.AcceptHeaderLocaleResolver();
        resolver.setDefaultLocale(Locale.ENGLISH);
        resolver.setSupportedLocales(java.util.List.of(Locale.ENGLISH, Locale.GERMAN));
        return resolver;
    }
}
