package nearworld.app;

import java.io.IOException;
import java.net.CookieManager;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.util.HashMap;
import java.util.Map;
import java.util.stream.Collectors;
import org.jsoup.Jsoup;

/** As much of a browser as forms need: cookies, and the hidden field against forged requests. Follows no redirects. */
final class Browser {
    private final HttpClient client =
            HttpClient.newBuilder().cookieHandler(new CookieManager()).build();
    private String base = "";
    private String token = "";

    Browser(ServerProcess server) {
        moveTo(server);
    }

    /** Asks another process from now on, with the same cookies. */
    void moveTo(ServerProcess server) {
        base = "http://localhost:" + server.port();
    }

    HttpResponse<String> signIn(String name, String password) throws IOException, InterruptedException {
        get("/sign-in");
        HttpResponse<String> answer = post("/sign-in", Map.of("username", name, "password", password));
        get("/cases/new");
        get("/trail");
        return answer;
    }

    HttpResponse<String> get(String path) throws IOException, InterruptedException {
        return send(HttpRequest.newBuilder(URI.create(base + path))
                .header("Accept", "text/html")
                .build());
    }

    HttpResponse<String> post(String path, Map<String, String> fields) throws IOException, InterruptedException {
        Map<String, String> all = new HashMap<>(fields);
        all.put("_csrf", token);
        String body = all.entrySet().stream()
                .map(e -> RestartIT.encoded(e.getKey()) + "=" + RestartIT.encoded(e.getValue()))
                .collect(Collectors.joining("&"));
        return send(HttpRequest.newBuilder(URI.create(base + path))
                .header("Accept", "text/html")
                .header("Content-Type", "application/x-www-form-urlencoded")
                .POST(HttpRequest.BodyPublishers.ofString(body))
                .build());
    }

    private HttpResponse<String> send(HttpRequest request) throws IOException, InterruptedException {
        HttpResponse<String> answer = client.send(request, HttpResponse.BodyHandlers.ofString());
        String found = Jsoup.parse(answer.body()).select("input[name=_csrf]").attr("value");
        if (!found.isEmpty()) {
            token = found;
        }
        return answer;
    }
}
