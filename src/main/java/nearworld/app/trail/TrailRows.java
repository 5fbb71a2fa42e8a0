package nearworld.app.trail;

import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.RowMapper;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;

/** The table of the trail. Rows are added and read, nothing else. */
@Repository
class TrailRows {
    /** The number of the lock that lets one transaction at a time append: "trail" in ASCII. */
    private static final long APPEND_LOCK = 0x747261696CL;

    private static final String ROW = "select seq, entry, sealed, sha256, action, case_ref from trail ";
    private static final RowMapper<Row> MAPPER = (rows, number) -> new Row(
            rows.getLong("seq"),
            rows.getString("entry"),
            rows.getBytes("sealed"),
            rows.getString("sha256"),
            rows.getString("action"),
            rows.getString("case_ref"));

    private final JdbcClient jdbc;

    TrailRows(JdbcClient jdbc) {
        this.jdbc = jdbc;
    }

    /** Waits until no other transaction is appending; the lock ends with this transaction. */
    void lock() {
        jdbc.sql("select pg_advisory_xact_lock(:lock)")
                .param("lock", APPEND_LOCK)
                .query((rows, number) -> true)
                .single();
    }

    Optional<Row> last() {
        return jdbc.sql(ROW + "order by seq desc limit 1").query(MAPPER).optional();
    }

    void insert(long seq, String entry, byte @Nullable [] sealed, String sha256) {
        jdbc.sql("insert into trail (seq, entry, sealed, sha256) values (:seq, :entry, :sealed, :sha256)")
                .param("seq", seq)
                .param("entry", entry)
                .param("sealed", sealed, java.sql.Types.BINARY)
                .param("sha256", sha256)
                .update();
    }

    List<Row> after(long seq, int limit) {
        return jdbc.sql(ROW + "where seq > :seq order by seq limit :limit")
                .param("seq", seq)
                .param("limit", limit)
                .query(MAPPER)
                .list();
    }

    List<Row> ofCase(String caseRef, String hiddenAction) {
        return jdbc.sql(ROW + "where case_ref = :ref and action <> :hidden order by seq")
                .param("ref", caseRef)
                .param("hidden", hiddenAction)
                .query(MAPPER)
                .list();
    }

    List<Row> newest(String hiddenAction, int limit, long offset) {
        return jdbc.sql(ROW + "where action <> :hidden order by seq desc limit :limit offset :offset")
                .param("hidden", hiddenAction)
                .param("limit", limit)
                .param("offset", offset)
                .query(MAPPER)
                .list();
    }

    long count(String hiddenAction) {
        return jdbc.sql("select count(*) from trail where action <> :hidden")
                .param("hidden", hiddenAction)
                .query(Long.class)
                .single();
    }

    /** A stored entry; {@code sealed} is ciphertext. */
    record Row(
            long seq,
            String entry,
            byte @Nullable [] sealed,
            String sha256,
            String action,
            @Nullable String caseRef) {}
}
