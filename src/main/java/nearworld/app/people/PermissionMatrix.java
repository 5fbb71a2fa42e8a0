package nearworld.app.people;

import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Set;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;

/** The permission matrix as the file {@code permissions.csv} holds it; broken files are refused at the start. */
public final class PermissionMatrix {
    private static final String FILE = "/permissions.csv";
    private static final CSVFormat FORMAT = CSVFormat.DEFAULT
            .builder()
            .setHeader()
            .setSkipHeaderRecord(true)
            .setCommentMarker('#')
            .setIgnoreSurroundingSpaces(true)
            .get();

    private final Map<String, Permission> byAction;

    private PermissionMatrix(Map<String, Permission> byAction) {
        this.byAction = byAction;
    }

    /** The matrix of this application. */
    public static PermissionMatrix read() {
        Map<String, Permission> permissions = new LinkedHashMap<>();
        try (InputStream in = Objects.requireNonNull(PermissionMatrix.class.getResourceAsStream(FILE), FILE)) {
            for (CSVRecord row : FORMAT.parse(new InputStreamReader(in, StandardCharsets.UTF_8))) {
                Permission permission = permission(row);
                if (permissions.put(permission.action(), permission) != null) {
                    throw new IllegalArgumentException(FILE + " names " + permission.action() + " twice");
                }
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return new PermissionMatrix(permissions);
    }

    private static Permission permission(CSVRecord row) {
        Map<Role, Set<Scope>> scopes = new EnumMap<>(Role.class);
        for (Role role : Role.values()) {
            scopes.put(role, scopes(row.get(role.id())));
        }
        String routes = row.get("routes");
        List<Permission.Route> parsed = routes.isBlank()
                ? List.of()
                : Arrays.stream(routes.split(";", -1))
                        .map(Permission.Route::parse)
                        .toList();
        return new Permission(row.get("action"), parsed, scopes);
    }

    private static Set<Scope> scopes(String cell) {
        Set<Scope> scopes = EnumSet.noneOf(Scope.class);
        if (!cell.equals("none")) {
            for (String word : cell.split(" +", -1)) {
                scopes.add(Scope.ofId(word));
            }
        }
        return scopes;
    }

    /** All rows, in the file's order. */
    public List<Permission> all() {
        return List.copyOf(byAction.values());
    }

    /** Whose cases a role reaches in an action; what the matrix does not name is a programming mistake. */
    public Set<Scope> scopes(String action, Role role) {
        Permission permission = byAction.get(action);
        if (permission == null) {
            throw new IllegalArgumentException("permissions.csv names no action " + action);
        }
        return permission.of(role);
    }
}
