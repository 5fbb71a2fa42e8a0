package nearworld.app.trail;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import nearworld.app.database.OnPostgres;
import nearworld.app.database.OwnerConnection;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.transaction.PlatformTransactionManager;
import org.springframework.transaction.support.TransactionTemplate;

/** The chain on a real database, and what tampering with it looks like. */
@SpringBootTest
@OnPostgres
class TrailIT {
    @Autowired
    private Trail trail;

    @Autowired
    private TrailVerifier verifier;

    @Autowired
    private JdbcTemplate jdbc;

    @Autowired
    private PlatformTransactionManager transactions;

    @Autowired
    private OwnerConnection owner;

    @BeforeEach
    void threeEntries() {
        owner.execute("truncate trail");
        trail.append(NewEntry.of("ann", "person.signedIn", Map.of()));
        trail.append(NewEntry.ofCase("ann", "case.saved", "C-1", Map.of("section", "person"))
                .withSealed("ciphertext".getBytes(StandardCharsets.UTF_8)));
        trail.append(NewEntry.ofCase("ann", Trail.CASE_VIEWED, "C-1", Map.of()));
    }

    @Test
    void anUntouchedChainIsIntact() {
        assertThat(verifier.verify()).isEqualTo(new Verification(true, 3, null, null, 0));
    }

    /** Computed here from the stored text alone, as anybody could with a copy of the table. */
    @Test
    void eachChecksumCoversTheEntryAndTheChecksumBefore() throws Exception {
        String before = "0".repeat(64);
        for (Map<String, Object> row : jdbc.queryForList("select entry, sha256 from trail order by seq")) {
            String entry = (String) row.get("entry");
            byte[] digest = MessageDigest.getInstance("SHA-256").digest(entry.getBytes(StandardCharsets.UTF_8));
            assertThat(row.get("sha256")).isEqualTo(HexFormat.of().formatHex(digest));
            assertThat(entry).contains("\"previous\":\"" + before + "\"");
            before = (String) row.get("sha256");
        }
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', textBlock = """
            update trail set entry = replace(entry, 'ann', 'bob') where seq = 2                                | 2 | hash
            update trail set sha256 = repeat('a', 64) where seq = 1                                            | 1 | hash
            delete from trail where seq = 2                                                                    | 2 | gap
            update trail set sealed = 'other' where seq = 2                                                    | 2 | content
            update trail set sealed = null where seq = 2                                                       | 2 | content
            update trail set sealed = 'new' where seq = 3                                                      | 3 | content
            """)
    void tamperingIsFoundAtTheEntry(String tampering, long at, String reason) {
        owner.execute(tampering);
        assertThat(verifier.verify().intact()).isFalse();
        assertThat(verifier.verify().brokenAt()).isEqualTo(at);
        assertThat(verifier.verify().reason()).isEqualTo(reason);
    }

    /** Whoever writes an entry anew with its own right checksum breaks the next one. */
    @Test
    void anEntryWrittenAnewBreaksItsSuccessor() {
        owner.execute("""
                update trail set entry = replace(entry, 'ann', 'bob'),
                    sha256 = encode(sha256(convert_to(replace(entry, 'ann', 'bob'), 'UTF8')), 'hex') where seq = 1
                """);
        Verification verification = verifier.verify();
        assertThat(verification.brokenAt()).isEqualTo(2);
        assertThat(verification.reason()).isEqualTo("predecessor");
    }

    @ParameterizedTest
    @ValueSource(strings = {"update trail set entry = ''", "delete from trail", "truncate trail", "drop table trail"})
    void theApplicationsRoleIsRefusedEveryChange(String statement) {
        assertThatThrownBy(() -> jdbc.execute(statement))
                .isInstanceOf(DataAccessException.class)
                .rootCause()
                .hasMessageMatching("(?s).*(permission denied|must be owner).*");
        assertThat(verifier.verify().intact()).isTrue();
    }

    @Test
    void anEntryVanishesWithItsAction() {
        TransactionTemplate transaction = new TransactionTemplate(transactions);
        transaction.executeWithoutResult(status -> {
            trail.append(NewEntry.of("ann", "case.created", Map.of()));
            status.setRollbackOnly();
        });
        assertThat(verifier.verify()).isEqualTo(new Verification(true, 3, null, null, 0));
    }

    @Test
    void entriesAppendedAtOnceStillMakeOneChain() throws Exception {
        int writers = 4;
        int each = 25;
        ExecutorService pool = Executors.newFixedThreadPool(writers);
        try {
            List<Callable<Void>> work = new ArrayList<>();
            for (int i = 0; i < writers; i++) {
                String name = "writer" + i;
                work.add(() -> {
                    for (int j = 0; j < each; j++) {
                        trail.append(NewEntry.of(name, "person.signedIn", Map.of()));
                    }
                    return null;
                });
            }
            for (Future<Void> done : pool.invokeAll(work)) {
                done.get();
            }
        } finally {
            pool.shutdown();
        }
        assertThat(verifier.verify()).isEqualTo(new Verification(true, 3 + writers * each, null, null, 0));
    }

    @Test
    void theAccessLogIsShownOnlyWhenAskedFor() {
        assertThat(trail.ofCase("C-1", false))
                .extracting(TrailEntryView::action)
                .containsExactly("case.saved");
        assertThat(trail.ofCase("C-1", true))
                .extracting(TrailEntryView::action)
                .containsExactly("case.saved", Trail.CASE_VIEWED);
        assertThat(trail.page(1, false).total()).isEqualTo(2);
        assertThat(trail.page(1, true).entries())
                .extracting(TrailEntryView::seq)
                .containsExactly(3L, 2L, 1L);
    }
}
