package nearworld.app.trail;

import jakarta.persistence.EntityManager;
import java.time.Clock;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Optional;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;

/** Appends to the trail and reads it. An entry lives or dies with the transaction of the action that it tells of. */
@Service
public class Trail {
    /** Somebody looked at a case: part of the access log, which only some may read. */
    public static final String CASE_VIEWED = "case.viewed";

    private static final String NOTHING_HIDDEN = "";
    private static final int PAGE_SIZE = 50;

    private final TrailRows rows;
    private final EntityManager entities;
    private final Clock clock;

    Trail(TrailRows rows, EntityManager entities, Clock clock) {
        this.rows = rows;
        this.entities = entities;
        this.clock = clock;
    }

    /**
     * Appends one entry in the transaction of the action. Everything else that the action changes is written first, so
     * that whoever waits for the end of the chain holds all other locks that it needs.
     *
     * @return the entry's number
     */
    @Transactional(propagation = Propagation.REQUIRED)
    public long append(NewEntry entry) {
        entities.flush();
        rows.lock();
        Optional<TrailRows.Row> last = rows.last();
        long seq = last.map(TrailRows.Row::seq).orElse(0L) + 1;
        String previous = last.map(TrailRows.Row::sha256).orElse(EntryCodec.NO_PREDECESSOR);
        String text = EntryCodec.write(seq, clock.instant().truncatedTo(ChronoUnit.MICROS), previous, entry);
        rows.insert(seq, text, entry.sealed(), EntryCodec.sha256(text));
        return seq;
    }

    /**
     * What happened to a case, oldest first.
     *
     * @param withAccessLog whether to tell who looked at it
     */
    @Transactional(readOnly = true)
    public List<TrailEntryView> ofCase(String caseRef, boolean withAccessLog) {
        return rows.ofCase(caseRef, withAccessLog ? NOTHING_HIDDEN : CASE_VIEWED).stream()
                .map(EntryCodec::read)
                .toList();
    }

    /**
     * A page of everything that happened, newest first.
     *
     * @param page from 1
     * @param withAccessLog whether to tell who looked at cases
     */
    @Transactional(readOnly = true)
    public TrailPage page(int page, boolean withAccessLog) {
        String hidden = withAccessLog ? NOTHING_HIDDEN : CASE_VIEWED;
        long total = rows.count(hidden);
        int pages = (int) Math.max(1, (total + PAGE_SIZE - 1) / PAGE_SIZE);
        int shown = Math.min(Math.max(page, 1), pages);
        List<TrailEntryView> entries = rows.newest(hidden, PAGE_SIZE, (long) (shown - 1) * PAGE_SIZE).stream()
                .map(EntryCodec::read)
                .toList();
        return new TrailPage(entries, shown, pages, total);
    }
}
